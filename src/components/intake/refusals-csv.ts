import type { Refusal } from '@shared/intake/report'
import { CSV_MARK, csvLine } from '@shared/tables/csv'

/** Refused records as CSV, for any spreadsheet. */
export function refusalsCsv(refusals: readonly Refusal[]): string {
  const rows = refusals.map(({ record, field, value, reason }) => [String(record), field, value, reason])
  return CSV_MARK + [['record', 'field', 'value', 'reason'], ...rows].map(csvLine).join('')
}
