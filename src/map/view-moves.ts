import { easeOut } from 'ol/easing'
import type OlMap from 'ol/Map'
import type { LineItem, PointItem } from '@shared/items/item'
import type { Metres, XY } from '@shared/units'
import { itemBounds, type GroundBox } from './item-index'
import { DOCKED_WIDTH, fitPage, type PageGround } from './page-boxes'
import { printShare, pxPerMetreAt } from './view-frame'

export const ANIMATION_MS = 160

export const reducesMotion = (): boolean => window.matchMedia('(prefers-reduced-motion: reduce)').matches

/** Moves a map's view, by itself or when asked; knows whether the whole page is shown. */
export class ViewMoves {
  /** Whether someone has moved the view away from the whole page. */
  private moved = false

  constructor(
    private readonly map: OlMap,
    private readonly ground: PageGround,
    private readonly symbols: () => 'print' | 'screen',
  ) {
    this.map.on('change:size', () => {
      // A page that was shown whole stays whole when the window changes; any other view stays where it is.
      if (!this.moved) this.showPage(false)
    })
    this.map.on('movestart', () => {
      this.moved ||= this.map.getView().getInteracting() || this.map.getView().getAnimating()
    })
  }

  metresPerPx(): Metres {
    return this.map.getView().getResolution() ?? 1
  }

  /** Share of print size that the ground is shown at, per cent. */
  percent(): number {
    return 100 * printShare(1 / this.metresPerPx(), this.ground.scale)
  }

  /** Whether the view is the one of `showPage`, to within a pixel. */
  isPageShown(): boolean {
    const [width, height] = this.map.getSize() ?? []
    if (!width || !height) return false
    const fit = fitPage({ width, height }, this.ground, this.symbols())
    const [east, north] = this.center()
    const step = this.metresPerPx()
    const moved = Math.hypot(east - fit.center[0], north - fit.center[1]) / step
    return moved < 1 && Math.abs(fit.pxPerMetre * step - 1) < 0.001
  }

  /** Shows the whole page. */
  showPage(animated = true): void {
    const [width, height] = this.map.getSize() ?? []
    if (!width || !height) return
    const { center, pxPerMetre } = fitPage({ width, height }, this.ground, this.symbols())
    this.go(center, pxPerMetre, animated)
    this.moved = false
  }

  /** Moves so that some ground fills the free part of the view, but no nearer than 200 %. */
  showGround({ min, max }: GroundBox): void {
    const [width = 1, height = 1] = this.map.getSize() ?? []
    const docked = this.ground.bare ? 0 : DOCKED_WIDTH
    const free = { width: Math.max(120, width - docked - 80), height: Math.max(120, height - 80) }
    const fit = Math.min(
      free.width / Math.max(1, max[0] - min[0]),
      free.height / Math.max(1, max[1] - min[1]),
    )
    const pxPerMetre = Math.min(fit, pxPerMetreAt(2, this.ground.scale))
    const [east, north] = middle({ min, max })
    this.go([east + docked / 2 / pxPerMetre, north], pxPerMetre, true)
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
    this.go(at, pxPerMetreAt(percent / 100, this.ground.scale), false)
  }

  /** Middle of the view and its scale, for an address. */
  place(): { at: XY; percent: number } {
    return { at: this.center(), percent: this.percent() }
  }

  panBy(rightPx: number, downPx: number): void {
    const [east, north] = this.center()
    const step = this.metresPerPx()
    this.go([east + rightPx * step, north - downPx * step], 1 / step, true)
  }

  zoomBy(factor: number): void {
    this.go(this.center(), factor / this.metresPerPx(), true)
  }

  go(center: XY, pxPerMetre: number, animated: boolean): void {
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

  private center(): XY {
    const [east = 0, north = 0] = this.map.getView().getCenter() ?? []
    return [east, north]
  }
}

/** Middle of some ground. */
export const middle = ({ min, max }: GroundBox): XY => [(min[0] + max[0]) / 2, (min[1] + max[1]) / 2]
