import { z } from 'zod'
import { azimuthSchema, inclinationSchema } from './angles'
import { identitySchema, pointBasis } from './confidence'

export const northReferences = ['true', 'grid', 'magnetic'] as const
export type NorthReference = (typeof northReferences)[number]

/** How a sheet's team writes attitudes: `045/40` as strike and dip by the right-hand rule, or `135/40` as dip
 *  direction and dip. */
export const attitudeConventions = ['strike-dip', 'dip-direction-dip'] as const
export const attitudeConventionSchema = z.enum(attitudeConventions)
export type AttitudeConvention = z.infer<typeof attitudeConventionSchema>

/** The reading as it was written, kept unchanged beside the values derived from it. */
export const readingSchema = z.strictObject({
  text: z.string().max(200),
  convention: z.enum([...attitudeConventions, 'quadrant']),
  northReference: z.enum(northReferences),
  /** Declination applied, degrees, east positive; null unless the reading is magnetic. */
  declination: z.number().min(-180).max(180).nullable(),
})
export type Reading = z.infer<typeof readingSchema>

export const planeTypes = ['bedding', 'foliation', 'cleavage', 'joint'] as const
export const attitudePropertiesSchema = z
  .strictObject({
    ...pointBasis,
    type: z.enum(planeTypes).default('bedding'),
    /** Strike by the right-hand rule, degrees from true north; null only for a horizontal plane. */
    strike: azimuthSchema.nullable(),
    /** Dip, degrees below horizontal, 0–90. */
    dip: inclinationSchema,
    overturned: z.boolean().default(false),
    station: z.string().max(100).default(''),
    reading: readingSchema.nullable().default(null),
  })
  .refine((plane) => plane.strike !== null || plane.dip === 0, {
    message: 'A dipping plane needs a strike.',
    path: ['strike'],
  })
export type AttitudeProperties = z.infer<typeof attitudePropertiesSchema>

export const stationPropertiesSchema = z.strictObject({
  ...pointBasis,
  name: z.string().max(100).default(''),
})
export type StationProperties = z.infer<typeof stationPropertiesSchema>

/** A point inside a face that says which unit the face is. */
export const unitLabelPropertiesSchema = z.strictObject({
  ...pointBasis,
  /** Id of the legend unit. */
  unit: z.uuid(),
  identity: identitySchema.default('certain'),
})
export type UnitLabelProperties = z.infer<typeof unitLabelPropertiesSchema>
