import { z } from 'zod'
import { itemSchema, type Item } from '../items/item'

/** Most changes that one call may carry; an intake has its own door. */
export const MAX_CHANGES = 5000

export const changeSchema = z
  .discriminatedUnion('op', [
    z.strictObject({ op: z.literal('put'), item: itemSchema }),
    z.strictObject({ op: z.literal('remove'), id: z.uuid() }),
  ])
  .meta({ id: 'Change' })
export type Change = z.infer<typeof changeSchema>

/** What one call asks of a sheet: all or nothing. */
export const changeSetSchema = z.strictObject({
  /** Revision that the changes were made on. */
  base: z.number().int().min(0),
  message: z.string().trim().max(500).default(''),
  changes: z.array(changeSchema).min(1, 'A change set needs at least one change.').max(MAX_CHANGES),
})
export type ChangeSet = z.infer<typeof changeSetSchema>

/** One item before and after; null where it did not exist. The editor's own form of a change: it can be turned round. */
export interface Edit {
  before: Item | null
  after: Item | null
}

/** Edits that take back the given ones, last first. */
export const invertEdits = (edits: readonly Edit[]): Edit[] =>
  edits.toReversed().map(({ before, after }) => ({ before: after, after: before }))

/** Edits that do the first and then the second, one per item; an item made and removed again drops out. */
export function composeEdits(first: readonly Edit[], second: readonly Edit[]): Edit[] {
  const byItem = new Map<string, Edit>()
  for (const edit of [...first, ...second]) {
    const id = editedId(edit)
    byItem.set(id, { before: (byItem.get(id) ?? edit).before, after: edit.after })
  }
  return [...byItem.values()].filter((edit) => edit.before !== null || edit.after !== null)
}

/** Edits as the server takes them. */
export const toChanges = (edits: readonly Edit[]): Change[] =>
  edits.map((edit) => (edit.after ? { op: 'put', item: edit.after } : { op: 'remove', id: editedId(edit) }))

/** Id of the item that an edit is about. */
export function editedId(edit: Edit): string {
  const item = edit.after ?? edit.before
  if (!item) throw new TypeError('An edit needs an item before or after it.')
  return item.id
}
