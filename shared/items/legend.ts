import { z } from 'zod'
import { lithologies } from './lithology'
import { attitudeConventionSchema } from './points'

export const colourSchema = z.string().regex(/^#[0-9a-f]{6}$/, 'A colour is written like #c9a26b.')

/** A rock unit in the legend. */
export const unitPropertiesSchema = z.strictObject({
  /** Letters on the map, for example Dr. */
  label: z.string().trim().min(1, 'A unit needs a label.').max(12),
  name: z.string().trim().min(1, 'A unit needs a name.').max(120),
  /** Age in words, for example Devonian; units of one age stand under one heading. */
  age: z.string().trim().max(80).default(''),
  colour: colourSchema,
  /** The lithology whose pattern is drawn over the colour. */
  pattern: z.enum(['none', ...lithologies]).default('none'),
  description: z.string().max(4000).default(''),
  /** Place in the legend: the youngest unit has the smallest number. */
  rank: z.number().min(-1e9).max(1e9),
})
export type UnitProperties = z.infer<typeof unitPropertiesSchema>

/** What is printed around the map face, and how the sheet writes attitudes. One item per sheet. */
export const sheetFacePropertiesSchema = z.strictObject({
  authors: z.string().max(500).default(''),
  attitudeConvention: attitudeConventionSchema.default('strike-dip'),
  credit: z.string().max(1000).default(''),
  /** In one ink, units are told apart by pattern and grey alone, and all linework is black. */
  printing: z.enum(['colour', 'one-ink']).default('colour'),
})
export type SheetFaceProperties = z.infer<typeof sheetFacePropertiesSchema>
