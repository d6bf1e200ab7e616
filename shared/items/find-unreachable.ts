import { sheetProjection } from '../geometry/projection'
import { findOutOfReach } from '../geometry/system-reach'
import type { XY } from '../units'
import type { Item } from './item'
import { boundsOf, verticesOf, type Bounds } from './item-bounds'

/** An item with a place that the sheet's projected system is not made for. */
export interface Unreachable {
  id: string
  /** The first vertex out there, sheet metres. */
  at: XY
}

/** Why such a place is not taken, as a sentence.
 *  @param srid EPSG code of the sheet's system */
export const unreachableSentence = ({ at }: Unreachable, srid: number): string =>
  `The place ${at[0]} ${at[1]} lies outside the region that the sheet’s coordinate system (EPSG:${srid}) is made for.`

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
