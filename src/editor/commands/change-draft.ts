import type { Edit } from '@shared/changes/change-set'
import type { Item } from '@shared/items/item'

/** What a gesture wants to change, with one sentence for ledger and undo. */
export interface ChangeDraft {
  label: string
  edits: Edit[]
}

/** A command's answer: the change, or why there is none. */
export type Drafted = { outcome: 'drafted'; draft: ChangeDraft } | { outcome: 'refused'; reason: string }

/** The sheet's items as a command reads them. */
export interface EditorView {
  item(id: string): Item | undefined
}

export const drafted = (label: string, edits: Edit[]): Drafted => ({
  outcome: 'drafted',
  draft: { label, edits },
})
export const refused = (reason: string): Drafted => ({ outcome: 'refused', reason })
