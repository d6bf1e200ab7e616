import type { Edit } from '@shared/changes/change-set'
import { editedId } from '@shared/changes/change-set'
import { snapToGrid } from '@shared/geometry/grid'
import { itemSchema, type Item } from '@shared/items/item'

export interface EditError {
  /** Id of the item. */
  item: string
  /** JSON pointer into the item, for example /properties/dip. */
  pointer: string
  detail: string
}

/** An item with its coordinates on the 1 mm grid. */
export function snapItem(item: Item): Item {
  if (!item.geometry) return item
  if (item.geometry.type === 'Point') {
    return {
      ...item,
      geometry: { ...item.geometry, coordinates: snapToGrid(item.geometry.coordinates) },
    } as Item
  }
  return {
    ...item,
    geometry: { ...item.geometry, coordinates: item.geometry.coordinates.map(snapToGrid) },
  } as Item
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
    const parsed = itemSchema.safeParse(snapItem(edit.after))
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
