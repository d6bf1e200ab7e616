import type { Person } from '@shared/api/common'
import type { LedgerEntry } from '@shared/api/sheets'

/** Ledger entries named before the rest is only counted. */
const NAMED = 2

/** Why a person may not decide on or release a submission: their own work is in it. Null if none is. */
export function ownWork(
  person: { id: string },
  submission: { submittedBy: Person; revision: number },
  entries: readonly LedgerEntry[],
): string | null {
  const own = entries.filter((entry) => entry.author.id === person.id)
  if (submission.submittedBy.id === person.id) {
    return `You submitted revision ${submission.revision} yourself; another approver has to look at it.`
  }
  if (own.length === 0) return null
  return `Changes of yours are in it: ${nameEntries(own)}. Another approver has to look at it.`
}

function nameEntries(entries: readonly LedgerEntry[]): string {
  const named = entries
    .slice(0, NAMED)
    .map((entry) => `revision ${entry.revision} (“${entry.message}”)`)
    .join(', ')
  const rest = entries.length - NAMED
  return rest > 0 ? `${named} and ${rest} more` : named
}
