import { findOutOfReach } from '@shared/geometry/system-reach'
import { sheetProjection } from '@shared/geometry/projection'
import type { Item } from '@shared/items/item'
import type { XY } from '@shared/units'
import { boundsOf, verticesOf, type Bounds } from './bounds'

/** An item with a place that the sheet's projected system is not made for. */
export interface Unreachable {
  id: string
  /** The first vertex out there, sheet metres. */
  at: XY
}

/** Items that reach beyond the region of a sheet's system. What lies within four corners that are in reach is in reach
 *  itself, so that usually four places are looked at and not every vertex.
 *  @param definition PROJ definition of the system */
export function findUnreachable(items: readonly Item[], definition: string): Unreachable[] {
  const projection = sheetProjection(definition)
  const isBeyond = (xy: XY): boolean =>
    findOutOfReach({ xy, lonLat: projection.toLonLat(xy) }, projection, definition) !== undefined
  const isClear = (some: readonly Item[]): boolean => !cornersOf(boundsOf(some)).some(isBeyond)
  if (isClear(items)) return []
  return items.flatMap((item) => {
    const at = isClear([item]) ? undefined : verticesOf(item).find(isBeyond)
    return at ? [{ id: item.id, at }] : []
  })
}

function cornersOf(bounds: Bounds | undefined): XY[] {
  if (!bounds) return []
  const [west, south, east, north] = bounds
  return [
    [west, south],
    [east, south],
    [east, north],
    [west, north],
  ]
}
