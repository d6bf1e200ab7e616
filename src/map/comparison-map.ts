import type OlMap from 'ol/Map'
import type { Sheet } from '@shared/api/sheets'
import type { SheetProjection } from '@shared/geometry/projection'
import { isLineItem, isPointItem, type Item, type LineItem, type PointItem } from '@shared/items/item'
import { inkColour } from '@shared/symbols/ink'
import type { XY } from '@shared/units'
import { palettes } from '@/theme/tokens'
import { openOlMap } from './open-ol-map'
import { fitPage, pageBoxes, type PageGround, type PxBox } from './page-boxes'
import { paintHalos } from './paint-halos'
import { groundInView, paintSheet } from './paint-sheet'
import { Scene } from './scene'
import { SheetLayer, viewOf } from './sheet-layer'
import { middle, ViewMoves } from './view-moves'

const SYMBOLS = 'print'
/** Slate and oxide: the inks of what is selected and of folds. */
const INKS = { before: 'selection', after: 'fold' } as const
const BEYOND_PAGE = 1.4
/** Most items in view that stand on a light of their ink: more of it would only dim the sheet. */
const MOST_LIT = 150
/** How near a click counts. */
const REACH_PX = 8
/** How what is the same in both states stands back. */
const QUIET = 'grayscale(1) opacity(0.42)'

/** Two states of a sheet: what both have, and what each has alone. */
export interface ComparedItems {
  same: readonly Item[]
  before: readonly Item[]
  after: readonly Item[]
}

export interface ComparisonMapOptions {
  target: HTMLElement
  sheet: Sheet
  projection: SheetProjection
  /** Every frame that is drawn: where the paper lies now. */
  frame(paper: PxBox): void
  /** An item of either state was clicked; null for none. */
  pick(id: string | null): void
}

/** Two states of a sheet over each other: what differs in two inks, before in slate and after in oxide, over what is the same
 *  in grey. */
export class ComparisonMap {
  private readonly map: OlMap
  private readonly moves: ViewMoves
  private readonly scenes: Record<keyof ComparedItems, Scene>
  private readonly layers: Record<keyof ComparedItems, SheetLayer>
  private readonly selectedOnes: SheetLayer
  private selected: readonly (LineItem | PointItem)[] = []

  constructor(options: ComparisonMapOptions) {
    const { sheet, projection, target } = options
    this.scenes = {
      same: new Scene(sheet, projection),
      before: new Scene(sheet, projection, INKS.before),
      after: new Scene(sheet, projection, INKS.after),
    }
    this.layers = {
      same: this.sameLayer(),
      before: this.inkedLayer('before'),
      after: this.inkedLayer('after'),
    }
    this.layers.same.box.style.filter = QUIET
    this.selectedOnes = this.selectedLayer()
    const ground: PageGround = { ...this.scenes.same.bounds, scale: sheet.scale, bare: true }
    const size = { width: target.clientWidth || 900, height: target.clientHeight || 800 }
    const { same, before, after } = this.layers
    this.map = openOlMap(target, sheet, [same, this.selectedOnes, before, after], {
      center: middle(ground),
      farthest: BEYOND_PAGE / fitPage(size, ground, SYMBOLS).pxPerMetre,
    })
    this.moves = new ViewMoves(this.map, ground, () => SYMBOLS)
    this.map.on('precompose', ({ frameState }) => {
      if (frameState) options.frame(pageBoxes(viewOf(frameState), ground, SYMBOLS).paper)
    })
    this.map.on('click', ({ coordinate: [east = 0, north = 0] }) => options.pick(this.pick([east, north])))
    this.moves.showPage(false)
    void this.waitForLato()
  }

  private sameLayer(): SheetLayer {
    const scene = this.scenes.same
    return new SheetLayer(({ context, ...request }) =>
      paintSheet(context, scene, {
        ...request,
        symbols: SYMBOLS,
        isHidden: (item, step) => scene.isThinned(item, step),
        isFaceHidden: () => true,
      }),
    )
  }

  /** What differs is drawn whole, however crowded; where it is not much, on a light of its ink. */
  private inkedLayer(state: keyof typeof INKS): SheetLayer {
    const scene = this.scenes[state]
    const halo = { colour: inkColour(INKS[state]), alpha: 0.2, width: 8 }
    return new SheetLayer(function* ({ context, ...request }) {
      const { view, ratio } = request
      const inView = scene.index.within(groundInView(view, 2 * halo.width))
      if (inView.length <= MOST_LIT) paintHalos(context, inView, { view, ratio, ...halo })
      yield* paintSheet(context, scene, {
        ...request,
        symbols: SYMBOLS,
        frameless: true,
        isHidden: () => false,
        isFaceHidden: () => true,
      })
    })
  }

  private selectedLayer(): SheetLayer {
    const halo = { colour: palettes.light.ochre, alpha: 0.45, width: 18 }
    const selected = () => this.selected
    return new SheetLayer(function* ({ context, view, ratio }) {
      yield paintHalos(context, selected(), { view, ratio, ...halo })
    })
  }

  /** Widths of canvas text are wrong until the faces are loaded. */
  private async waitForLato(): Promise<void> {
    await Promise.all([400, 700, 900].map((weight) => document.fonts.load(`${weight} 12px Lato`)))
    for (const scene of Object.values(this.scenes)) scene.forgetDrawings()
    this.touch()
  }

  private touch(): void {
    for (const layer of Object.values(this.layers)) layer.touch()
  }

  setItems({ same, before, after }: ComparedItems): void {
    // Letters of labels come from the legend, which differs itself perhaps.
    const isUnit = (item: Item): boolean => item.kind === 'unit'
    const units = same.filter(isUnit)
    this.scenes.same.setItems([...same, ...after.filter(isUnit)])
    this.scenes.before.setItems([...units, ...before])
    this.scenes.after.setItems([...units, ...after])
    this.touch()
  }

  /** Shows the state before left of a line and the one after right of it; both over each other without one.
   *  @param share of the map's width, 0–1 */
  setSwipe(share: number | null): void {
    const cut = share === null ? null : `${(share * 100).toFixed(2)}%`
    this.layers.before.box.style.clipPath = cut === null ? '' : `inset(0 calc(100% - ${cut}) 0 0)`
    this.layers.after.box.style.clipPath = cut === null ? '' : `inset(0 0 0 ${cut})`
  }

  /** Lights what is looked at, and brings it into view. */
  setSelected(items: readonly Item[], { shows }: { shows: boolean }): void {
    this.selected = items.filter((item) => isLineItem(item) || isPointItem(item))
    this.selectedOnes.touch()
    if (shows && this.selected.length > 0) this.moves.showItems(this.selected)
  }

  private pick(at: XY): string | null {
    const metresPerPx = this.moves.metresPerPx()
    const reach = { line: REACH_PX * metresPerPx, point: 2 * REACH_PX * metresPerPx }
    const [found] = [this.scenes.after, this.scenes.before].flatMap((scene) => scene.index.pick(at, reach))
    return found?.id ?? null
  }

  panBy(rightPx: number, downPx: number): void {
    this.moves.panBy(rightPx, downPx)
  }

  zoomBy(factor: number): void {
    this.moves.zoomBy(factor)
  }

  showPage(): void {
    this.moves.showPage()
  }

  close(): void {
    this.map.setTarget(undefined)
    this.map.dispose()
  }
}
