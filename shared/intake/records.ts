/** One position as the file has it: WGS 84 longitude and latitude in degrees, perhaps a height; unchecked numbers. */
export type FilePosition = readonly number[]

/** One simple geometry of a record. Multi-part geometries and collections are taken apart in the file's order. */
export type RecordPart =
  | { form: 'point'; position: FilePosition }
  | { form: 'line'; positions: readonly FilePosition[] }
  | { form: 'area' }
  | { form: 'unreadable'; reason: string }

/** One record of a field file, as it was read: nothing judged yet. */
export interface IntakeRecord {
  /** Number in the file, from 1. */
  number: number
  /** Empty where the record has no geometry. */
  parts: readonly RecordPart[]
  attributes: Readonly<Record<string, unknown>>
}

/** An attribute as text without blanks at its ends; '' where the record has no value. */
export function attributeText(record: IntakeRecord, column: string): string {
  if (!Object.hasOwn(record.attributes, column)) return ''
  return valueText(record.attributes[column])
}

/** Any attribute value as one line of text. */
export function valueText(value: unknown): string {
  if (value === null || value === undefined) return ''
  if (typeof value === 'string') return value.trim()
  if (typeof value === 'object') return JSON.stringify(value)
  return String(value)
}

export const hasPoints = (record: IntakeRecord): boolean => record.parts.some((part) => part.form === 'point')
export const hasLines = (record: IntakeRecord): boolean => record.parts.some((part) => part.form === 'line')
