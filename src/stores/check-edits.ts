import { editedId, type Edit } from '@shared/changes/change-set'
import { itemSchema, type Item } from '@shared/items/item'
import { snapItem } from '@shared/items/snap-item'

export interface EditError {
  /** Id of the item. */
  item: string
  /** JSON pointer into the item, for example /properties/dip. */
  pointer: string
  detail: string
}

/** Edits as they may be stored: snapped, checked with the items' schemas, and on top of what is shown now. */
export function checkEdits(
  edits: readonly Edit[],
  current: (id: string) => Item | undefined,
): { outcome: 'ok'; edits: Edit[] } | { outcome: 'refused'; errors: EditError[] } {
  const errors: EditError[] = []
  const checked = edits.flatMap((edit): Edit[] => {
    const id = editedId(edit)
    const before = current(id) ?? null
    if (!edit.after) return before ? [{ before, after: null }] : []
    const parsed = itemSchema.safeParse(snapItem(edit.after) ?? edit.after)
    if (parsed.success) return [{ before, after: parsed.data }]
    errors.push(
      ...parsed.error.issues.map((issue) => ({
        item: id,
        pointer: issue.path.map((part) => `/${String(part)}`).join(''),
        detail: issue.message,
      })),
    )
    return []
  })
  return errors.length > 0 ? { outcome: 'refused', errors } : { outcome: 'ok', edits: checked }
}
