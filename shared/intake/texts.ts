import { attributeText, type IntakeRecord } from './records'

/** The text of a mapped column; '' where none is mapped or the record has no value. */
export const mappedText = (record: IntakeRecord, column: string | null): string =>
  column === null ? '' : attributeText(record, column)

/** A text cut to what an item can carry; the whole stays in its provenance. */
export function fitText(text: string, most: number, what: string): { text: string; conversions: string[] } {
  if (text.length <= most) return { text, conversions: [] }
  return { text: `${text.slice(0, most - 1)}…`, conversions: [`${what} cut to ${most} characters`] }
}
