import type { RevisionContents } from '@shared/api/review'
import type { Edit } from '@shared/changes/change-set'
import { itemKinds, type Item } from '@shared/items/item'

/** Items per kind, in the order of kinds; kinds without items are left out. */
export function countContents(items: readonly Item[]): RevisionContents['contents'] {
  return itemKinds
    .map((kind) => ({ kind, items: items.filter((item) => item.kind === kind).length }))
    .filter((row) => row.items > 0)
}

/** Items added, changed and removed per kind; kinds without differences are left out. */
export function countDifferences(edits: readonly Edit[]): RevisionContents['differences'] {
  return itemKinds
    .map((kind) => {
      const ofKind = edits.filter(({ before, after }) => (after ?? before)?.kind === kind)
      return {
        kind,
        added: ofKind.filter(({ before }) => before === null).length,
        changed: ofKind.filter(({ before, after }) => before !== null && after !== null).length,
        removed: ofKind.filter(({ after }) => after === null).length,
      }
    })
    .filter((row) => row.added + row.changed + row.removed > 0)
}
