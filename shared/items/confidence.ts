import { z } from 'zod'

/** How well a line is located. Source: the trade's four steps (see the symbol set). */
export const locationConfidences = ['certain', 'approximate', 'inferred', 'concealed'] as const
export const locationConfidenceSchema = z.enum(locationConfidences)
export type LocationConfidence = z.infer<typeof locationConfidenceSchema>

/** Whether a thing is what it is called. */
export const identities = ['certain', 'questionable'] as const
export const identitySchema = z.enum(identities)
export type Identity = z.infer<typeof identitySchema>

const noteSchema = z.string().max(2000).default('')

/** What every line kind carries beside its own properties. */
export const lineBasis = {
  locationConfidence: locationConfidenceSchema.default('certain'),
  identity: identitySchema.default('certain'),
  /** Proper name, for example of a fault. */
  name: z.string().max(200).default(''),
  note: noteSchema,
}

export const pointBasis = { note: noteSchema }
