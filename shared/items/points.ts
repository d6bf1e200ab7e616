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
    /** The bed undulates, or the foliation is crenulated: strike and dip are its average. */
    undulating: z.boolean().default(false),
    /** Sedimentary structures show which side of the bed is its top. */
    topsKnown: z.boolean().default(false),
    station: z.string().max(100).default(''),
    reading: readingSchema.nullable().default(null),
  })
  .refine((plane) => plane.strike !== null || plane.dip === 0, {
    message: 'A dipping plane needs a strike.',
    path: ['strike'],
  })
export type AttitudeProperties = z.infer<typeof attitudePropertiesSchema>

/** A lineation measured for itself, or the axis of a fold too small for a trace of its own. */
export const lineationTypes = ['lineation', 'minor-fold-axis'] as const

/** How a lineation was written: `120/35` as trend and plunge, or as a rake on its plane. */
export const lineationReadingSchema = readingSchema.extend({ convention: z.enum(['trend-plunge', 'rake']) })
export type LineationReading = z.infer<typeof lineationReadingSchema>

/** The plane that a lineation lies on. */
export const carryingPlaneSchema = z
  .strictObject({
    type: z.enum(planeTypes).default('foliation'),
    /** As an attitude's: null only for a horizontal plane. */
    strike: azimuthSchema.nullable(),
    dip: inclinationSchema,
    overturned: z.boolean().default(false),
  })
  .refine((plane) => plane.strike !== null || plane.dip === 0, {
    message: 'A dipping plane needs a strike.',
    path: ['strike'],
  })

export const lineationPropertiesSchema = z
  .strictObject({
    ...pointBasis,
    type: z.enum(lineationTypes).default('lineation'),
    /** Azimuth of the down-going end, degrees from true north; null only for a vertical line. */
    trend: azimuthSchema.nullable(),
    /** Plunge, degrees below horizontal, 0–90. */
    plunge: inclinationSchema,
    /** The plane it was measured on, drawn together with it; null where none is stated. */
    plane: carryingPlaneSchema.nullable().default(null),
    station: z.string().max(100).default(''),
    reading: lineationReadingSchema.nullable().default(null),
  })
  .refine((line) => line.trend !== null || line.plunge === 90, {
    message: 'A line that is not vertical needs a trend.',
    path: ['trend'],
  })
export type LineationProperties = z.infer<typeof lineationPropertiesSchema>

export const stationTypes = [
  'station',
  'sample',
  'fossil-locality',
  'borehole',
  'spring',
  'quarry',
  'mine-adit',
  'tops-direction',
] as const
export type StationType = (typeof stationTypes)[number]

/** What a person calls a line and a place of each type. */
export const lineationWords: Record<LineationProperties['type'], string> = {
  lineation: 'lineation',
  'minor-fold-axis': 'minor fold axis',
}
export const placeWords: Record<StationType, string> = {
  station: 'station',
  sample: 'sample',
  'fossil-locality': 'fossil locality',
  borehole: 'borehole',
  spring: 'spring',
  quarry: 'quarry',
  'mine-adit': 'mine adit',
  'tops-direction': 'tops direction',
}
export const stationPropertiesSchema = z.strictObject({
  ...pointBasis,
  type: z.enum(stationTypes).default('station'),
  name: z.string().max(100).default(''),
  /** Degrees from true north: the way an adit goes in, or the direction in which beds get younger; null where it is not
   *  stated, and for every other type. */
  azimuth: azimuthSchema.nullable().default(null),
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
