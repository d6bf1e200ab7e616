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

/** A ledger entry as a sentence: `Rosa Kelp drew 1 contact`; a message that is a sentence itself stands after a colon. */
export function entryWords({ author, message }: LedgerEntry): string {
  const text = message.trim() || 'changed the sheet'
  return /^\p{Lowercase}/u.test(text) ? `${author.name} ${text}` : `${author.name}: ${text}`
}
