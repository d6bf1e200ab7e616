import type { Edit } from '@shared/changes/change-set'
import { isLineItem, isPointItem, type Item } from '@shared/items/item'
import type { XY } from '@shared/units'
import { drafted, refused, type Drafted, type EditorView } from './change-draft'
import { itemWord, itemsWord, withArticle } from './item-words'
import { isSamePlace, nodeEdits, withLine, type Node } from './line-nodes'

/** New vertices for some lines: one vertex moved, put in or taken out of each. */
export interface ReshapedLine {
  id: string
  line: readonly XY[]
}

/** Gives lines other vertices, and a vertex to each line that a moved one was snapped onto.
 *  @param deed what was done, for the ledger: "moved a vertex of" */
export function reshapeLines(
  view: EditorView,
  { deed, lines, nodes }: { deed: string; lines: readonly ReshapedLine[]; nodes: readonly Node[] },
): Drafted {
  const edits: Edit[] = []
  const items: Item[] = []
  for (const { id, line } of lines) {
    const item = view.item(id)
    if (!item || !isLineItem(item)) return refused('The line is no longer there.')
    const vertices = withoutRepeats(line)
    if (vertices.length < 2)
      return refused('A line needs two different places. Delete the line itself instead.')
    edits.push({ before: item, after: withLine(item, vertices) })
    items.push(item)
  }
  const moved = new Set(lines.map(({ id }) => id))
  const others = nodes.filter((node) => !moved.has(node.id))
  return drafted(`${deed} ${itemsWord(items)}`, [...edits, ...nodeEdits(view, others)])
}

/** Moves a point item to another place. */
export function movePoint(view: EditorView, { id, at }: { id: string; at: XY }): Drafted {
  const item = view.item(id)
  if (!item || !isPointItem(item)) return refused('The point is no longer there.')
  const after = { ...item, geometry: { ...item.geometry, coordinates: at } } as Item
  return drafted(`moved ${withArticle(itemWord(item))}`, [{ before: item, after }])
}

const withoutRepeats = (line: readonly XY[]): XY[] =>
  line.filter((vertex, index) => {
    const before = line[index - 1]
    return !before || !isSamePlace(before, vertex)
  })
