import type { LedgerEntry, Sheet } from '@shared/api/sheets'

/** How a sheet stands, in a few words. */
export function stateWords(sheet: Pick<Sheet, 'state' | 'edition'>): string {
  const next = (sheet.edition ?? 0) + 1
  switch (sheet.state) {
    case 'drafting':
      return `Drafting edition ${next}`
    case 'submitted':
      return 'Submitted for review'
    case 'approved':
      return `Approved for edition ${next}`
    case 'releasing':
      return `Releasing edition ${next}`
  }
}

/** Verbs with which the messages of the ledger begin besides those in -ed. */
const VERBS = /^(\p{Lowercase}+ed|drew|took|set|put|gave|cut)\b/u

/** A ledger entry as a sentence: `Rosa Kelp drew 1 contact`; a message that begins otherwise stands after a colon. */
export function entryWords({ author, message }: LedgerEntry): string {
  const text = message.trim() || 'changed the sheet'
  return VERBS.test(text) ? `${author.name} ${text}` : `${author.name}: ${text}`
}
