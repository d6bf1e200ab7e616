import { z } from 'zod'

/** Most different values of a column that are listed one by one. */
export const MAX_LISTED_VALUES = 60

export const columnSchema = z.strictObject({
  name: z.string(),
  /** Up to five different values, as text. */
  samples: z.array(z.string()),
  /** Different values with the number of records (and of those with points and with lines) that have them, most
   *  frequent first; empty if there are more than MAX_LISTED_VALUES (numbers, names). '' stands for no value. */
  values: z.array(
    z.strictObject({
      value: z.string(),
      count: z.number().int(),
      points: z.number().int(),
      lines: z.number().int(),
    }),
  ),
  /** Records that have a value. */
  filled: z.number().int(),
  /** How many of the values are numbers, and their range; null if none is. */
  numbers: z.strictObject({ count: z.number().int(), least: z.number(), greatest: z.number() }).nullable(),
})
export type IntakeColumn = z.infer<typeof columnSchema>

/** Why something is proposed (`reason`), what a person should look at (`check`), and what must be answered before the
 *  file can be taken in (`ask`). */
export const proposalNoteSchema = z.strictObject({
  weight: z.enum(['reason', 'check', 'ask']),
  /** Place in the mapping, for example lines.typeColumn. */
  field: z.string(),
  text: z.string(),
})
export type ProposalNote = z.infer<typeof proposalNoteSchema>

export const refusalSchema = z.strictObject({
  /** Number of the record in the file, from 1. */
  record: z.number().int(),
  field: z.string(),
  value: z.string(),
  reason: z.string(),
})
export type Refusal = z.infer<typeof refusalSchema>
