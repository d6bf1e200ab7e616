import { itemSchema, type Item } from '@shared/items/item'
import type { XY } from '@shared/units'
import type { Pen } from '../host'
import { drafted, refused, type Drafted, type EditorView } from './change-draft'
import { itemsWord } from './item-words'
import { isSamePlace, nodeEdits, type Node } from './line-nodes'

/** A line of the pen's kind through some vertices, and a vertex in each line that it was snapped onto. */
export function drawLine(
  view: EditorView,
  { id, pen, line, nodes }: { id: string; pen: Pen; line: readonly XY[]; nodes: readonly Node[] },
): Drafted {
  const vertices = line.filter((vertex, index) => {
    const before = line[index - 1]
    return !before || !isSamePlace(before, vertex)
  })
  if (vertices.length < 2) return refused('A line needs two different places.')
  const made = makeItem({
    id,
    kind: pen.kind,
    properties: pen.properties,
    geometry: { type: 'LineString', coordinates: vertices },
  })
  if (!made) return refused(`${pen.title} cannot be drawn as a line.`)
  return drafted(`drew ${itemsWord([made])}`, [{ before: null, after: made }, ...nodeEdits(view, nodes)])
}

/** A point of the pen's kind at a place. */
export function placePoint({ id, pen, at }: { id: string; pen: Pen; at: XY }): Drafted {
  const made = makeItem({
    id,
    kind: pen.kind,
    properties: pen.properties,
    geometry: { type: 'Point', coordinates: at },
  })
  if (!made) return refused(`${pen.title} cannot be placed as a point.`)
  return drafted(`placed ${itemsWord([made])}`, [{ before: null, after: made }])
}

/** The schema fills in what the pen leaves open. */
function makeItem(input: unknown): Item | undefined {
  return itemSchema.safeParse(input).data
}
