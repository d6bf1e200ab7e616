import { snapToGrid } from '../geometry/grid'
import type { XY } from '../units'
import type { Item } from './item'

/** An item as it is stored: every coordinate on the 1 mm grid, and no vertex twice in a row. The same object if nothing
 *  had to change; undefined for a line that has no length on the grid. */
export function snapItem(item: Item): Item | undefined {
  if (item.geometry === null) return item
  if (item.geometry.type === 'Point') {
    const at = snapToGrid(item.geometry.coordinates)
    if (isSame(at, item.geometry.coordinates)) return item
    // The spread keeps kind and properties together; TypeScript cannot follow that through the union.
    return { ...item, geometry: { type: 'Point', coordinates: at } } as Item
  }
  const given = item.geometry.coordinates
  const line = given.map(snapToGrid).filter((point, index, all) => !isSame(point, all[index - 1]))
  if (line.length < 2) return undefined
  if (line.length === given.length && line.every((point, index) => isSame(point, given[index]))) return item
  return { ...item, geometry: { type: 'LineString', coordinates: line } } as Item // As above.
}

const isSame = (a: XY, b: readonly [number, number] | undefined): boolean =>
  b !== undefined && a[0] === b[0] && a[1] === b[1]
