import type { Edit } from '@shared/changes/change-set'
import { isLineItem, type LineItem } from '@shared/items/item'
import type { XY } from '@shared/units'
import { nearestOnLine } from '@shared/geometry/nearest'
import type { EditorView } from './change-draft'

/** A place where a new line was snapped onto the side of another: the other gets a vertex there, so that both have the
 *  very same numbers and the network closes. */
export interface Node {
  id: string
  at: XY
}

export const isSamePlace = (a: XY, b: XY): boolean => a[0] === b[0] && a[1] === b[1]

/** A line with a vertex at a place on its side; itself where it has one already. */
export function withVertex(line: readonly XY[], at: XY): XY[] {
  if (line.some((vertex) => isSamePlace(vertex, at))) return [...line]
  const { segment } = nearestOnLine(line, at)
  return [...line.slice(0, segment + 1), at, ...line.slice(segment + 1)]
}

/** A line item with other vertices. */
export const withLine = <I extends LineItem>(item: I, line: readonly XY[]): I => ({
  ...item,
  geometry: { ...item.geometry, coordinates: [...line] },
})

/** Edits that give every line its nodes. */
export function nodeEdits(view: EditorView, nodes: readonly Node[]): Edit[] {
  const ids = new Set(nodes.map((node) => node.id))
  return [...ids].flatMap((id): Edit[] => {
    const places = nodes.filter((node) => node.id === id)
    const item = view.item(id)
    if (!item || !isLineItem(item)) return []
    const line = places.reduce<XY[]>((so, { at }) => withVertex(so, at), item.geometry.coordinates)
    return line.length === item.geometry.coordinates.length
      ? []
      : [{ before: item, after: withLine(item, line) }]
  })
}
