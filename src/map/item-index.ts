import Flatbush from 'flatbush'
import { gridDistance } from '@shared/geometry/bearings'
import { nearestOnLine } from '@shared/geometry/nearest'
import { isLineItem, isPointItem, type Item, type LineItem, type PointItem } from '@shared/items/item'
import { drawingOrder } from '@shared/symbols/drawing-order'
import type { Metres, XY } from '@shared/units'

export interface GroundBox {
  min: XY
  max: XY
}

/** Distances that count as a hit, metres. */
export interface PickReach {
  line: Metres
  point: Metres
  /** Arrows that symbols of points have beside their place, and how far from it one may end. */
  arrows?: { furthest: Metres; of(item: PointItem): readonly XY[] | undefined }
}

/** The items that have a place, by where they are. Made anew after changes: for thousands of items that is a few
 *  milliseconds, and answers stay exact. */
export class ItemIndex {
  private readonly items: readonly (LineItem | PointItem)[]
  private readonly tree: Flatbush | undefined
  /** All items that are points, in drawing order. */
  readonly points: readonly PointItem[]

  constructor(items: readonly Item[]) {
    const placed = items.filter((item): item is LineItem | PointItem => item.geometry !== null)
    this.items = drawingOrder.flatMap((kind) => placed.filter((item) => item.kind === kind))
    this.points = this.items.filter(isPointItem)
    if (this.items.length === 0) return
    this.tree = new Flatbush(this.items.length)
    for (const item of this.items) {
      const { min, max } = itemBounds(item)
      this.tree.add(min[0], min[1], max[0], max[1])
    }
    this.tree.finish()
  }

  /** Items whose bounds touch a box, in drawing order. */
  within({ min, max }: GroundBox): (LineItem | PointItem)[] {
    const found = this.tree?.search(min[0], min[1], max[0], max[1]) ?? []
    return found.sort((a, b) => a - b).flatMap((index) => this.items[index] ?? [])
  }

  /** Items within reach of a place: points before lines, the nearest first, drawn on top before drawn beneath. */
  pick(at: XY, reach: PickReach): (LineItem | PointItem)[] {
    const far = Math.max(reach.line, reach.point, reach.arrows?.furthest ?? 0)
    const hits = this.within(boxAround(at, far)).flatMap((item, order) => {
      const point = isPointItem(item)
      const distance = point ? distanceToPoint(item, at, reach) : distanceToLine(item, at, reach)
      return distance === undefined ? [] : [{ item, distance, point, order }]
    })
    hits.sort((a, b) => Number(b.point) - Number(a.point) || a.distance - b.distance || b.order - a.order)
    return hits.map((hit) => hit.item)
  }

  /** Lines that come within a distance of a place. */
  linesNear(at: XY, radius: Metres): LineItem[] {
    return this.within(boxAround(at, radius)).filter(
      (item): item is LineItem =>
        isLineItem(item) && nearestOnLine(item.geometry.coordinates, at).distance <= radius,
    )
  }

  pointsNear(at: XY, radius: Metres): PointItem[] {
    return this.within(boxAround(at, radius)).filter(
      (item): item is PointItem => isPointItem(item) && gridDistance(item.geometry.coordinates, at) <= radius,
    )
  }
}

/** How far a point is from a place, by its own place or by the arrow that its symbol has; undefined out of reach. */
function distanceToPoint(item: PointItem, at: XY, { point, line, arrows }: PickReach): Metres | undefined {
  const distance = gridDistance(item.geometry.coordinates, at)
  if (distance <= point) return distance
  const arrow = arrows && distance <= arrows.furthest + line ? arrows.of(item) : undefined
  if (!arrow) return undefined
  const beside = nearestOnLine(arrow, at).distance
  return beside <= line ? beside : undefined
}

function distanceToLine(item: LineItem, at: XY, { line }: PickReach): Metres | undefined {
  const { distance } = nearestOnLine(item.geometry.coordinates, at)
  return distance <= line ? distance : undefined
}

const boxAround = ([east, north]: XY, reach: Metres): GroundBox => ({
  min: [east - reach, north - reach],
  max: [east + reach, north + reach],
})

/** Bounds of an item with a place, sheet metres. */
export function itemBounds(item: LineItem | PointItem): GroundBox {
  const places = isPointItem(item) ? [item.geometry.coordinates] : item.geometry.coordinates
  const min: XY = [Infinity, Infinity]
  const max: XY = [-Infinity, -Infinity]
  for (const [east, north] of places) {
    min[0] = Math.min(min[0], east)
    min[1] = Math.min(min[1], north)
    max[0] = Math.max(max[0], east)
    max[1] = Math.max(max[1], north)
  }
  return { min, max }
}
