import { isLineItem, type LineItem, type PointItem } from '@shared/items/item'
import type { Drawing } from './drawing'

/** Bands that a line's drawings are kept for: the one in view, and those that one zooms to and fro between. */
const MOST_BANDS = 4

type Placed = LineItem | PointItem

/** Drawings of items, kept as long as the item is the same object. Those of lines depend on the zoom, by bands; those of
 *  points do not. */
export class KeptDrawings {
  private lines = new WeakMap<Placed, Map<number, Drawing>>()
  private points = new WeakMap<Placed, Drawing>()
  private labels = new WeakMap<Placed, Drawing>()

  /** The drawing for a band, made where there is none yet. */
  of(item: Placed, band: number, make: () => Drawing): Drawing {
    const known = this.known(item, band)
    if (known) return known
    const made = make()
    if (isLineItem(item)) this.keep(item, band, made)
    else this.withoutBands(item).set(item, made)
    return made
  }

  has(item: Placed, band: number): boolean {
    return this.known(item, band) !== undefined
  }

  forget(): void {
    this.lines = new WeakMap()
    this.points = new WeakMap()
    this.labels = new WeakMap()
  }

  /** Letters of units, or the room they have, have changed. */
  forgetLabels(): void {
    this.labels = new WeakMap()
  }

  private withoutBands(item: Placed): WeakMap<Placed, Drawing> {
    return item.kind === 'unit-label' ? this.labels : this.points
  }

  private known(item: Placed, band: number): Drawing | undefined {
    return isLineItem(item) ? this.lines.get(item)?.get(band) : this.withoutBands(item).get(item)
  }

  private keep(item: Placed, band: number, drawing: Drawing): void {
    const bands = this.lines.get(item) ?? new Map<number, Drawing>()
    this.lines.set(item, bands.set(band, drawing))
    const [oldest] = bands.keys()
    if (bands.size > MOST_BANDS && oldest !== undefined) bands.delete(oldest)
  }
}
