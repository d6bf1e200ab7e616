import { groupThousands } from './figures'

/** Which state of a sheet a printed page or download shows. */
export interface EditionStatement {
  /** Number of the edition; of a draft, the number that it goes toward. */
  edition: number
  /** Revision of the ledger that everything on it was taken from. */
  revision: number
  /** Time of release (ISO 8601) and the approver's name; null on a draft. */
  released: { at: string; approvedBy: string } | null
}

const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const

/** 1 December 2026, in UTC: the same on every machine. */
export function dayInWords(iso: string): string {
  const day = new Date(iso)
  return `${day.getUTCDate()} ${months[day.getUTCMonth()] ?? ''} ${day.getUTCFullYear()}`
}

/** One line under the title: sheet, edition and revision. */
export function editionLine(sheetNumber: string, statement: EditionStatement): string {
  const edition = statement.released
    ? `edition ${statement.edition}, ${dayInWords(statement.released.at)}`
    : `draft toward edition ${statement.edition}`
  return `Sheet ${sheetNumber}  ·  ${edition}  ·  revision ${statement.revision}`
}

/** How to cite an edition. A draft cannot be cited, and says so. */
export function citation(
  sheet: { number: string; title: string; scale: number },
  authors: string,
  statement: EditionStatement,
): string {
  if (!statement.released) return 'A draft: not to be cited.'
  const year = new Date(statement.released.at).getUTCFullYear()
  const title = `Geologic map of ${sheet.title}`
  const head = authors === '' ? `${title}, ${year}.` : `${authors}, ${year}. ${title}.`
  return `${head} Sheet ${sheet.number}, scale 1:${groupThousands(sheet.scale)}, edition ${statement.edition}.`
}
