import { isLineItem } from '@shared/items/item'
import type { XY } from '@shared/units'
import type { EditorView } from '../commands/change-draft'
import { isSamePlace } from '../commands/line-nodes'
import type { MapPort } from '../map-port'

/** A vertex of one line. */
export interface VertexPlace {
  id: string
  index: number
}

/** Every vertex that lies exactly at a place: the lines that meet there move together. */
export function verticesAt(map: MapPort, view: EditorView, at: XY): VertexPlace[] {
  return map.linesNear(at, map.metresPerPx()).flatMap(({ id }) => {
    const item = id === null ? undefined : view.item(id)
    if (!item || !isLineItem(item)) return []
    return item.geometry.coordinates.flatMap((vertex, index) =>
      isSamePlace(vertex, at) ? [{ id: item.id, index }] : [],
    )
  })
}
