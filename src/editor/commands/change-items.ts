import type { Edit } from '@shared/changes/change-set'
import { isLineItem, type Item } from '@shared/items/item'
import { reversedLine } from '@shared/items/reversed-line'
import { drafted, refused, type Drafted, type EditorView } from './change-draft'
import { itemsWord } from './item-words'

const existing = (view: EditorView, ids: readonly string[]): Item[] =>
  ids.flatMap((id) => view.item(id) ?? [])

/** Takes items off the sheet. A unit that still has labels on the map stays: its areas would lose their name. */
export function removeItems(view: EditorView, ids: readonly string[]): Drafted {
  const items = existing(view, ids)
  if (items.length === 0) return refused('There is nothing to remove.')
  return drafted(
    `removed ${itemsWord(items)}`,
    items.map((before) => ({ before, after: null })),
  )
}

/** Sets some properties of items to other values; what an item does not have is left out.
 *  @param deed what was done, for the ledger: "made approximate" */
export function changeProperties(
  view: EditorView,
  { ids, change, deed }: { ids: readonly string[]; change: Readonly<Record<string, unknown>>; deed: string },
): Drafted {
  const items = existing(view, ids)
  const edits = items.flatMap((before): Edit[] => {
    const known = Object.entries(change).filter(([name]) => name in before.properties)
    if (known.length === 0) return []
    // The one door checks the result with the item's schema.
    const after = { ...before, properties: { ...before.properties, ...Object.fromEntries(known) } } as Item
    return [{ before, after }]
  })
  if (edits.length === 0) return refused('None of the selected items has this property.')
  return drafted(`${deed} ${itemsWord(edits.flatMap((edit) => edit.before ?? []))}`, edits)
}

/** Turns lines round. What they mean on the ground stays: the side of a fault or fold is renamed, and a fold's trend is an azimuth
 *  of its own that no direction of drawing touches. */
export function reverseLines(view: EditorView, ids: readonly string[]): Drafted {
  const lines = existing(view, ids).filter(isLineItem)
  if (lines.length === 0) return refused('Select a line to reverse it.')
  return drafted(
    `reversed ${itemsWord(lines)}`,
    lines.map((before) => ({ before, after: reversedLine(before) })),
  )
}
