import type { Refusal } from '@shared/intake/report'

/** First characters that spreadsheets take for a formula. */
const formula = /^[=+\-@\t\r]/
const plainNumber = /^[+-]?\d+([.,]\d+)?$/

/** Refused records as CSV (RFC 4180) with a byte order mark, for any spreadsheet. Texts that one would run as a formula
 *  get an apostrophe before them; numbers stay numbers. */
export function refusalsCsv(refusals: readonly Refusal[]): string {
  const rows = refusals.map(({ record, field, value, reason }) => [String(record), field, value, reason])
  const lines = [['record', 'field', 'value', 'reason'], ...rows].map((row) => row.map(cell).join(','))
  return `\ufeff${lines.join('\r\n')}\r\n`
}

function cell(text: string): string {
  const safe = formula.test(text) && !plainNumber.test(text) ? `'${text}` : text
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}
