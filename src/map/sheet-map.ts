import OlMap from 'ol/Map'
import View from 'ol/View'
import { defaults as defaultInteractions } from 'ol/interaction/defaults'
import MouseWheelZoom from 'ol/interaction/MouseWheelZoom'
import { easeOut } from 'ol/easing'
import type { Face } from '@shared/api/faces'
import type { Sheet } from '@shared/api/sheets'
import type { SheetProjection } from '@shared/geometry/projection'
import type { Item, LineItem, PointItem } from '@shared/items/item'
import type { Metres, XY } from '@shared/units'
import { isInFace, isInRings } from './in-face'
import { itemBounds, type GroundBox } from './item-index'
import { DOCKED_WIDTH, fitPage, pageBoxes, type PageBoxes } from './page-boxes'
import { paintMarks, type Marks } from './paint-marks'
import { paintSheet } from './paint-sheet'
import { pointerOf, PointerGestures, type GestureHandlers } from './pointer-gestures'
import { viewProjection } from './projection'
import { Scene } from './scene'
import { SheetLayer, viewOf } from './sheet-layer'
import { printShare, pxPerMetreAt, symbolPxPerMm, toPx, type ViewFrame } from './view-frame'

export type { GroundBox, Marks, PageBoxes, ViewFrame }
export type { MapPointer } from './pointer-gestures'
export type { Sketch } from './sketch'

/** Farthest zooms, as shares of print size. */
const MOST_SHARE = 16
/** How far beyond the whole page one may zoom out. */
const BEYOND_PAGE = 2.2
/** How near to a line, and to a point's symbol, a click counts. */
const LINE_REACH_PX = 7
const POINT_REACH_MM = 3.2
const ANIMATION_MS = 160
/** Zoom of one notch of the wheel, powers of two. */
const WHEEL_LEVELS = 0.5

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
  private readonly sheetLayer: SheetLayer
  private readonly marksLayer: SheetLayer
  private marks: Marks = { selected: [], hovered: [], areas: [], sketch: null, place: null }
  private hidden = { item: (_item: Item): boolean => false, face: (_unit: string | null): boolean => false }
  private symbols: 'print' | 'screen' = 'print'
  private last: { view: ViewFrame; boxes: PageBoxes } | null = null
  private moved = false

  constructor(private readonly options: SheetMapOptions) {
    const { sheet, projection, target } = options
    this.scene = new Scene(sheet, projection)
    this.sheetLayer = new SheetLayer(({ context, ...request }) =>
      paintSheet(context, this.scene, {
        ...request,
        symbols: this.symbols,
        isHidden: this.hidden.item,
        isFaceHidden: this.hidden.face,
      }),
    )
    this.marksLayer = new SheetLayer(({ context, view, ratio }) =>
      paintMarks(context, this.marks, { view, ratio, symbolPx: this.symbolPx(view) }),
    )
    this.map = new OlMap({
      target,
      controls: [],
      interactions: defaultInteractions({
        altShiftDragRotate: false,
        pinchRotate: false,
        doubleClickZoom: false,
        shiftDragZoom: false,
        keyboard: false,
        mouseWheelZoom: false,
      }).extend([
        new MouseWheelZoom({ maxDelta: WHEEL_LEVELS, duration: reducesMotion() ? 0 : ANIMATION_MS }),
      ]),
      layers: [this.sheetLayer, this.marksLayer],
      view: new View({
        projection: viewProjection(sheet.crs),
        center: middle(this.scene.bounds),
        resolution: 10,
        minResolution: 1 / pxPerMetreAt(MOST_SHARE, sheet.scale),
        maxResolution: this.farthestResolution(target),
        enableRotation: false,
        constrainResolution: false,
        showFullExtent: true,
      }),
    })
    this.listen(options.handlers)
    void this.waitForLato()
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
      const view = viewOf(frameState)
      this.last = { view, boxes: pageBoxes(view, this.ground(), this.symbols) }
      handlers.frame(view, this.last.boxes)
    })
    this.map.on('moveend', () => {
      if (this.last) handlers.rest(this.last.view)
    })
    this.map.on('change:size', () => {
      // A page that was shown whole stays whole when the window changes; any other view stays where it is.
      if (!this.moved) this.showPage(false)
    })
    this.map.on('movestart', () => {
      this.moved ||= this.map.getView().getInteracting() || this.map.getView().getAnimating()
    })
  }

  /** Widths of canvas text are wrong until the faces are loaded; a canvas does not load them by itself. */
  private async waitForLato(): Promise<void> {
    const weights = [400, 700, 900]
    await Promise.all(weights.map((weight) => document.fonts.load(`${weight} 12px Lato`)))
    this.scene.forgetDrawings()
    this.sheetLayer.touch()
  }

  private ground() {
    return { ...this.scene.bounds, scale: this.scene.sheet.scale }
  }

  private symbolPx(view: ViewFrame): number {
    return symbolPxPerMm(printShare(view.pxPerMetre, this.scene.sheet.scale), this.symbols)
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
    this.marks = { ...this.marks, ...change }
    this.marksLayer.touch()
  }

  setCursor(cursor: string): void {
    this.map.getViewport().style.cursor = cursor
  }

  metresPerPx(): Metres {
    return this.map.getView().getResolution() ?? 1
  }

  /** Share of print size that the ground is shown at, per cent. */
  percent(): number {
    return 100 * printShare(1 / this.metresPerPx(), this.scene.sheet.scale)
  }

  /** Items at a place, the likeliest first; hidden ones are not there. */
  pick(at: XY): (LineItem | PointItem)[] {
    const metresPerPx = this.metresPerPx()
    const symbolPx = symbolPxPerMm(this.percent() / 100, this.symbols)
    return this.scene.index
      .pick(at, { line: LINE_REACH_PX * metresPerPx, point: POINT_REACH_MM * symbolPx * metresPerPx })
      .filter((item) => !this.hidden.item(item))
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

  /** Whether the view is the one of `showPage`, to within a pixel. */
  isPageShown(): boolean {
    const [width, height] = this.map.getSize() ?? []
    if (!width || !height) return false
    const fit = fitPage({ width, height }, this.ground(), this.symbols)
    const [east = 0, north = 0] = this.map.getView().getCenter() ?? []
    const step = this.metresPerPx()
    const moved = Math.hypot(east - fit.center[0], north - fit.center[1]) / step
    return moved < 1 && Math.abs(fit.pxPerMetre * step - 1) < 0.001
  }

  /** Shows the whole page. */
  showPage(animated = true): void {
    const [width, height] = this.map.getSize() ?? []
    if (!width || !height) return
    const { center, pxPerMetre } = fitPage({ width, height }, this.ground(), this.symbols)
    this.go(center, pxPerMetre, animated)
    this.moved = false
  }

  /** Moves so that some ground fills the free part of the view, but no nearer than 200 %. */
  showGround({ min, max }: GroundBox): void {
    const [width = 1, height = 1] = this.map.getSize() ?? []
    const free = { width: Math.max(120, width - DOCKED_WIDTH - 80), height: Math.max(120, height - 80) }
    const fit = Math.min(
      free.width / Math.max(1, max[0] - min[0]),
      free.height / Math.max(1, max[1] - min[1]),
    )
    const pxPerMetre = Math.min(fit, pxPerMetreAt(2, this.scene.sheet.scale))
    const [east, north] = middle({ min, max })
    this.go([east + DOCKED_WIDTH / 2 / pxPerMetre, north], pxPerMetre, true)
  }

  showItems(items: readonly (LineItem | PointItem)[]): void {
    const boxes = items.map(itemBounds)
    if (boxes.length === 0) return
    this.showGround({
      min: [Math.min(...boxes.map(({ min }) => min[0])), Math.min(...boxes.map(({ min }) => min[1]))],
      max: [Math.max(...boxes.map(({ max }) => max[0])), Math.max(...boxes.map(({ max }) => max[1]))],
    })
  }

  showPlace(at: XY, percent: number): void {
    this.moved = true
    this.go(at, pxPerMetreAt(percent / 100, this.scene.sheet.scale), false)
  }

  /** Middle of the view and its scale, for an address. */
  place(): { at: XY; percent: number } {
    const [east = 0, north = 0] = this.map.getView().getCenter() ?? []
    return { at: [east, north], percent: this.percent() }
  }

  /** Moves a place into the middle of the view if it is not in view. */
  bringIntoView(at: XY): void {
    if (!this.last) return
    const { view } = this.last
    const [x, y] = toPx(view, at)
    if (x < 0 || y < 0 || x > view.width || y > view.height) this.go(at, view.pxPerMetre, true)
  }

  panBy(rightPx: number, downPx: number): void {
    const [east = 0, north = 0] = this.map.getView().getCenter() ?? []
    const step = this.metresPerPx()
    this.go([east + rightPx * step, north - downPx * step], 1 / step, true)
  }

  zoomBy(factor: number): void {
    const [east = 0, north = 0] = this.map.getView().getCenter() ?? []
    this.go([east, north], factor / this.metresPerPx(), true)
  }

  private go(center: XY, pxPerMetre: number, animated: boolean): void {
    const view = this.map.getView()
    const resolution = 1 / pxPerMetre
    view.cancelAnimations()
    if (!animated || reducesMotion()) {
      view.setCenter(center)
      view.setResolution(resolution)
      return
    }
    view.animate({ center, resolution, duration: ANIMATION_MS, easing: easeOut })
  }

  close(): void {
    this.map.setTarget(undefined)
    this.map.dispose()
  }
}

const middle = ({ min, max }: GroundBox): XY => [(min[0] + max[0]) / 2, (min[1] + max[1]) / 2]

const reducesMotion = (): boolean => window.matchMedia('(prefers-reduced-motion: reduce)').matches
