import { findOutOfReach } from '@shared/geometry/system-reach'
import { sheetProjection } from '@shared/geometry/projection'
import type { Item } from '@shared/items/item'
import type { XY } from '@shared/units'

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
  const isClear = (places: readonly XY[]): boolean => !cornersOf(places).some(isBeyond)
  if (isClear(items.flatMap((item) => cornersOf(placesOf(item))))) return []
  return items.flatMap((item) => {
    const places = placesOf(item)
    const at = isClear(places) ? undefined : places.find(isBeyond)
    return at ? [{ id: item.id, at }] : []
  })
}

function placesOf({ geometry }: Item): readonly XY[] {
  if (geometry === null) return []
  return geometry.type === 'Point' ? [geometry.coordinates] : geometry.coordinates
}

function cornersOf(places: readonly XY[]): XY[] {
  if (places.length === 0) return []
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const [x, y] of places) {
    west = Math.min(west, x)
    south = Math.min(south, y)
    east = Math.max(east, x)
    north = Math.max(north, y)
  }
  return [
    [west, south],
    [east, south],
    [east, north],
    [west, north],
  ]
}
