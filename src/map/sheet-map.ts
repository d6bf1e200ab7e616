import type OlMap from 'ol/Map'
import type { Face } from '@shared/api/faces'
import type { Sheet } from '@shared/api/sheets'
import type { SheetProjection } from '@shared/geometry/projection'
import type { Item, LineItem, PointItem } from '@shared/items/item'
import { SYMBOL_REACH } from '@shared/symbols/symbol-reach'
import type { Metres, XY } from '@shared/units'
import { isInFace, isInRings } from './in-face'
import type { GroundBox } from './item-index'
import { openOlMap } from './open-ol-map'
import { fitPage, pageBoxes, type PageBoxes, type PageGround } from './page-boxes'
import { paintMarks, type Marks } from './paint-marks'
import { paintSheet } from './paint-sheet'
import { pointerOf, PointerGestures, type GestureHandlers } from './pointer-gestures'
import { Scene } from './scene'
import { SheetLayer, viewOf } from './sheet-layer'
import { thinningStep } from './thinning'
import { relativeScale, toPx, type ViewFrame } from './view-frame'
import { middle, ViewMoves } from './view-moves'

export type { GroundBox, Marks, PageBoxes, ViewFrame }
export type { MapPointer } from './pointer-gestures'
export type { Sketch } from './sketch'

/** How far beyond the whole page one may zoom out. */
const BEYOND_PAGE = 2.2
/** How near to a line, and to a point's symbol, a click counts. */
const LINE_REACH_PX = 7
const POINT_REACH_MM = 3.2

export interface SheetMapHandlers extends GestureHandlers {
  leave(): void
  /** Every frame that is drawn: where the page lies now. */
  frame(view: ViewFrame, boxes: PageBoxes): void
  /** The view has come to rest. */
  rest(view: ViewFrame): void
}

export interface SheetMapOptions {
  target: HTMLElement
  sheet: Sheet
  projection: SheetProjection
  handlers: SheetMapHandlers
}

/** The sheet's page on its desk, to be looked at and drawn on. */
export class SheetMap {
  private readonly map: OlMap
  private readonly scene: Scene
  private readonly moves: ViewMoves
  private readonly sheetLayer: SheetLayer
  private readonly marksLayer: SheetLayer
  private marks: Marks = {
    selected: [],
    hovered: [],
    areas: [],
    sketch: null,
    place: null,
    others: [],
    compared: [],
  }
  private hidden = { item: (_item: Item): boolean => false, face: (_unit: string | null): boolean => false }
  private symbols: 'print' | 'screen' = 'print'
  private last: ViewFrame | null = null

  constructor(private readonly options: SheetMapOptions) {
    const { sheet, projection, target } = options
    this.scene = new Scene(sheet, projection)
    this.sheetLayer = new SheetLayer(({ context, ...request }) =>
      paintSheet(context, this.scene, {
        ...request,
        symbols: this.symbols,
        isHidden: (item, step) => this.hidden.item(item) || this.givesWay(item, step),
        isFaceHidden: this.hidden.face,
      }),
    )
    const marks = this.paintMarks.bind(this)
    this.marksLayer = new SheetLayer(marks)
    this.map = openOlMap(target, sheet, [this.sheetLayer, this.marksLayer], {
      center: middle(this.scene.bounds),
      farthest: this.farthestResolution(target),
    })
    this.moves = new ViewMoves(this.map, this.ground(), () => this.symbols)
    this.listen(options.handlers)
    void this.waitForLato()
  }

  private *paintMarks(request: {
    context: CanvasRenderingContext2D
    view: ViewFrame
    ratio: number
  }): Generator<undefined> {
    const { symbolPx } = relativeScale(request.view, this.scene.sheet.scale, this.symbols)
    paintMarks(request.context, this.marks, { ...request, symbolPx })
  }

  /** The page cannot be zoomed out to a stamp. */
  private farthestResolution(target: HTMLElement): Metres {
    const size = { width: target.clientWidth || 1200, height: target.clientHeight || 800 }
    return BEYOND_PAGE / fitPage(size, this.ground(), this.symbols).pxPerMetre
  }

  private listen(handlers: SheetMapHandlers): void {
    this.map.addInteraction(new PointerGestures(handlers))
    this.map.on('click', (event) => handlers.click(pointerOf(event)))
    const viewport = this.map.getViewport()
    // OpenLayers takes any two quick clicks for a double one, however far apart; the browser's own event does not.
    viewport.addEventListener('dblclick', (event) => {
      const [east = 0, north = 0] = this.map.getEventCoordinate(event)
      handlers.doubleClick({ at: [east, north], alt: event.altKey, shift: event.shiftKey })
    })
    viewport.addEventListener('pointerleave', () => handlers.leave())
    this.map.on('precompose', ({ frameState }) => {
      if (!frameState) return
      this.last = viewOf(frameState)
      handlers.frame(this.last, pageBoxes(this.last, this.ground(), this.symbols))
    })
    this.map.on('moveend', () => {
      if (this.last) handlers.rest(this.last)
    })
  }

  /** Widths of canvas text are wrong until the faces are loaded; a canvas does not load them by itself. */
  private async waitForLato(): Promise<void> {
    const weights = [400, 700, 900]
    await Promise.all(weights.map((weight) => document.fonts.load(`${weight} 12px Lato`)))
    this.scene.forgetDrawings()
    this.sheetLayer.touch()
  }

  private ground(): PageGround {
    return { ...this.scene.bounds, scale: this.scene.sheet.scale }
  }

  setItems(items: readonly Item[]): void {
    this.scene.setItems(items)
    this.sheetLayer.touch()
  }

  setFaces(faces: readonly Face[]): void {
    this.scene.setFaces(faces)
    this.sheetLayer.touch()
  }

  setHidden(item: (item: Item) => boolean, face: (unit: string | null) => boolean): void {
    this.hidden = { item, face }
    this.sheetLayer.touch()
  }

  setSymbolSize(symbols: 'print' | 'screen'): void {
    this.symbols = symbols
    this.sheetLayer.touch()
    this.marksLayer.touch()
  }

  setMarks(change: Partial<Marks>): void {
    const before = this.marks.selected
    this.marks = { ...this.marks, ...change }
    this.marksLayer.touch()
    // What is selected is shown whatever crowds it.
    const isCrowded = [...before, ...this.marks.selected].some((item) =>
      this.scene.isThinned(item, this.step()),
    )
    if (change.selected && isCrowded) this.sheetLayer.touch()
  }

  /** Point symbols that are not drawn at this zoom because more important ones stand too near. */
  thinned(): PointItem[] {
    const step = this.step()
    if (step === 0) return []
    return this.scene.index.points.filter((item) => this.givesWay(item, step) && !this.hidden.item(item))
  }

  private givesWay(item: Item, step: number): boolean {
    return this.scene.isThinned(item, step) && !this.marks.selected.some(({ id }) => id === item.id)
  }

  private step(): number {
    const view = { pxPerMetre: 1 / this.metresPerPx() }
    return thinningStep(relativeScale(view, this.scene.sheet.scale, this.symbols).scale)
  }

  setCursor(cursor: string): void {
    this.map.getViewport().style.cursor = cursor
  }

  metresPerPx(): Metres {
    return this.moves.metresPerPx()
  }

  percent(): number {
    return this.moves.percent()
  }

  /** Items at a place, the likeliest first; those that are not drawn are not there. */
  pick(at: XY): (LineItem | PointItem)[] {
    const metresPerPx = this.metresPerPx()
    const { symbolPx } = relativeScale({ pxPerMetre: 1 / metresPerPx }, this.scene.sheet.scale, this.symbols)
    const step = this.step()
    const metresPerMm = symbolPx * metresPerPx
    const arrows = {
      furthest: SYMBOL_REACH * metresPerMm,
      of: (item: PointItem) => this.scene.arrowOf(item, metresPerMm),
    }
    return this.scene.index
      .pick(at, { line: LINE_REACH_PX * metresPerPx, point: POINT_REACH_MM * metresPerMm, arrows })
      .filter((item) => !this.hidden.item(item) && !this.givesWay(item, step))
  }

  linesNear(at: XY, radius: Metres): LineItem[] {
    return this.scene.index.linesNear(at, radius)
  }

  pointsNear(at: XY, radius: Metres): PointItem[] {
    return this.scene.index.pointsNear(at, radius)
  }

  /** Legend unit whose area a place lies in; null outside all areas, or in one that nobody claims. */
  unitAt(at: XY): string | null {
    return this.scene.faces.find((face) => isInFace(face, at))?.unit ?? null
  }

  /** Whether a place lies on the map face: inside the neatline. */
  isOnFace(at: XY): boolean {
    return isInRings([this.options.sheet.neatline], at)
  }

  isPageShown(): boolean {
    return this.moves.isPageShown()
  }

  showPage(animated = true): void {
    this.moves.showPage(animated)
  }

  showGround(ground: GroundBox): void {
    this.moves.showGround(ground)
  }

  showItems(items: readonly (LineItem | PointItem)[]): void {
    this.moves.showItems(items)
  }

  showPlace(at: XY, percent: number): void {
    this.moves.showPlace(at, percent)
  }

  place(): { at: XY; percent: number } {
    return this.moves.place()
  }

  /** Moves a place into the middle of the view if it is not in view. */
  bringIntoView(at: XY): void {
    if (!this.last) return
    const [x, y] = toPx(this.last, at)
    const isOut = x < 0 || y < 0 || x > this.last.width || y > this.last.height
    if (isOut) this.moves.go(at, this.last.pxPerMetre, true)
  }

  panBy(rightPx: number, downPx: number): void {
    this.moves.panBy(rightPx, downPx)
  }

  zoomBy(factor: number): void {
    this.moves.zoomBy(factor)
  }

  close(): void {
    this.map.setTarget(undefined)
    this.map.dispose()
  }
}
