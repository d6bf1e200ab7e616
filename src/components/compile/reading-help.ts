import type { AttitudeConvention } from '@shared/items/points'
import { fieldsOf, textOf } from './attitude-draft'
import { lineFieldsOf, lineTextOf } from './lineation-draft'

/** How a reading is to be written, as a form says it. */
export interface ReadingHelp {
  /** What is to be typed, in words, with an example. */
  name: string
  example: string
  /** Another way of writing it. */
  or: string
  /** The two figures of a reading, for separate fields. */
  labels: readonly [string, string]
  split: (text: string) => [string, string]
  join: (fields: readonly [string, string]) => string
}

/** How an attitude is written on a sheet of this convention. */
export const attitudeHelp = (convention: AttitudeConvention): ReadingHelp => ({
  ...(convention === 'strike-dip'
    ? { name: 'strike and dip, right-hand rule', example: '045/40', labels: ['Strike', 'Dip'] }
    : { name: 'dip direction and dip', example: '135/40', labels: ['Dip direction', 'Dip'] }),
  or: 'N45E 40SE',
  split: (text) => fieldsOf(text, convention),
  join: textOf,
})

/** How a line is written. */
export const lineationHelp: ReadingHelp = {
  name: 'trend and plunge',
  example: '120/35',
  or: '35→120',
  labels: ['Trend', 'Plunge'],
  split: lineFieldsOf,
  join: lineTextOf,
}
