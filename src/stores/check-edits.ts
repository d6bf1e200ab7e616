import { editedId, type Edit } from '@shared/changes/change-set'
import { findUnreachable, unreachableSentence } from '@shared/items/find-unreachable'
import { itemSchema, type Item } from '@shared/items/item'
import { snapItem } from '@shared/items/snap-item'

export interface EditError {
  /** Id of the item. */
  item: string
  /** JSON pointer into the item, for example /properties/dip. */
  pointer: string
  detail: string
}

/** Edits as they may be stored: snapped, checked with the items' schemas, within reach of the sheet's system where one is
 *  given, and on top of what is shown now. */
export function checkEdits(
  edits: readonly Edit[],
  current: (id: string) => Item | undefined,
  crs?: { srid: number; proj4: string },
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
  const placed = checked.flatMap(({ after }) => after ?? [])
  const beyond = crs ? findUnreachable(placed, crs.proj4) : []
  errors.push(
    ...beyond.map((item) => ({
      item: item.id,
      pointer: '/geometry/coordinates',
      detail: unreachableSentence(item, crs?.srid ?? 0),
    })),
  )
  return errors.length > 0 ? { outcome: 'refused', errors } : { outcome: 'ok', edits: checked }
}
