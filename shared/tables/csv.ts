/** Begins a CSV file so that any spreadsheet reads it as UTF-8. */
export const CSV_MARK = '\ufeff'

/** First characters that spreadsheets take for a formula. */
const formula = /^[=+\-@\t\r]/
const plainNumber = /^[+-]?\d+([.,]\d+)?$/

/** One record of a CSV file (RFC 4180), with its line end. Texts that a spreadsheet would run as a formula get an
 *  apostrophe before them; numbers stay numbers. */
export const csvLine = (cells: readonly string[]): string => `${cells.map(cell).join(',')}\r\n`

function cell(text: string): string {
  const safe = formula.test(text) && !plainNumber.test(text) ? `'${text}` : text
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}
