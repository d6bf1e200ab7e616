import type { Edit } from '@shared/changes/change-set'
import { describeChanges } from '@shared/changes/describe-changes'
import type { Item, ItemOf } from '@shared/items/item'
import { isSame } from '@shared/changes/same-value'
import { useSheetStore } from '@/stores/sheet'

/** Why an edit was refused: sentences by JSON pointer into the item (`/properties/dip`), '' for the whole. Undefined
 *  where it was taken. */
export type Refusal = Record<string, string> | undefined

/** Edits from forms: each goes through the sheet's one door, named by what it changes. */
export function useItemEdits() {
  const sheet = useSheetStore()

  /** Commits edits as one change; one that changes nothing is left out. */
  function commit(edits: readonly Edit[]): Refusal {
    const real = edits.filter((edit) => !isSame(edit.before, edit.after))
    if (real.length === 0) return undefined
    const outcome = sheet.commit(describeChanges(real), real)
    if (outcome.outcome === 'done') return undefined
    return Object.fromEntries(outcome.errors.map((error) => [error.pointer, error.detail]))
  }

  /** Changes properties of one item on top of what it is now, so that a field left late undoes nobody's work. */
  function change<K extends Item['kind']>(
    item: ItemOf<K>,
    properties: Partial<ItemOf<K>['properties']>,
  ): Refusal {
    return changeAll([item], properties)
  }

  /** The same for several items at once: one change. */
  function changeAll<K extends Item['kind']>(
    items: readonly ItemOf<K>[],
    properties: Partial<ItemOf<K>['properties']>,
  ): Refusal {
    return commit(
      items.flatMap((item) => {
        const now = sheet.get(item.id)
        return now ? [{ before: now, after: withProperties(now, properties) }] : []
      }),
    )
  }

  /** Takes items off the sheet. */
  const remove = (items: readonly Item[]): Refusal =>
    commit(items.map((item) => ({ before: item, after: null })))

  /** Puts a new item on the sheet. */
  const add = (item: Item): Refusal => commit([{ before: null, after: item }])

  return { commit, change, changeAll, remove, add }
}

const withProperties = (item: Item, properties: object): Item =>
  // The door checks the outcome with the schema of the item's kind, which the type of a spread cannot say.
  ({ ...item, properties: { ...item.properties, ...properties } }) as Item
