import type { SheetState } from '@shared/api/sheets'
import type { LedgerEntry } from '@shared/api/sheets'
import type { Role } from '@shared/api/accounts'
import { kindWords, type Item } from '@shared/items/item'

/** Why a sheet cannot be changed by this person now, as a sentence; null where it can. */
export function readOnlyReason(state: SheetState, roles: readonly Role[]): string | null {
  if (!roles.includes('compiler') && !roles.includes('editor')) {
    return 'You may read this sheet. Drawing needs the role of compiler or editor.'
  }
  if (state === 'drafting') return null
  if (state === 'submitted')
    return 'The sheet is submitted for review. It can be changed again once it is returned or released.'
  if (state === 'approved')
    return 'The sheet is approved. It can be changed again once the edition is released.'
  return 'The edition is being released. The sheet can be changed again in a moment.'
}

/** Why undo stops, where somebody else has changed an item since. */
export function changedSinceSentence(item: Item, entries: readonly LedgerEntry[]): string {
  const kind = kindWords[item.kind].one
  const [entry] = entries
  if (!entry) return `This ${kind} has changed since, so this step cannot be taken back any more.`
  const who = [...new Set(entries.map((each) => each.author.name))].join(' or ')
  const last = Math.max(...entries.map((each) => each.revision))
  return `${who} changed this ${kind} since (revision ${last}, ${clockTime(entry.at)}). Undo stops here so that nothing of theirs is lost.`
}

/** Hours and minutes of an ISO time, in the reader's own zone. */
const clockTime = (at: string): string =>
  new Date(at).toLocaleTimeString(undefined, { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' })
