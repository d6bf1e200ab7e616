import type { XY } from '../units'
import type { Item } from './item'

/** West, south, east and north, sheet metres. */
export type Bounds = readonly [number, number, number, number]

/** Vertices of an item; none for kinds without a place. */
export function verticesOf({ geometry }: Item): readonly XY[] {
  if (geometry === null) return []
  return geometry.type === 'Point' ? [geometry.coordinates] : geometry.coordinates
}

/** The rectangle around items; undefined where none has a place. */
export function boundsOf(items: readonly Item[]): Bounds | undefined {
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const item of items) {
    for (const [x, y] of verticesOf(item)) {
      west = Math.min(west, x)
      south = Math.min(south, y)
      east = Math.max(east, x)
      north = Math.max(north, y)
    }
  }
  return west === Infinity ? undefined : [west, south, east, north]
}
