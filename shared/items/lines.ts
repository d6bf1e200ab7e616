import { z } from 'zod'
import { azimuthSchema, inclinationSchema } from './angles'
import { lineBasis } from './confidence'

export const contactPropertiesSchema = z.strictObject({ ...lineBasis })
export type ContactProperties = z.infer<typeof contactPropertiesSchema>

export const faultTypes = [
  'unspecified',
  'normal',
  'reverse',
  'thrust',
  'left-lateral',
  'right-lateral',
] as const
export const faultPropertiesSchema = z.strictObject({
  ...lineBasis,
  type: z.enum(faultTypes).default('unspecified'),
  /** Side of the line, looking along it, that carries the decoration: the downthrown side of a normal fault, the
   *  upper plate of a reverse fault or thrust. Reversing the line swaps it, so that the ground meaning stays. */
  side: z.enum(['left', 'right']).default('right'),
})
export type FaultProperties = z.infer<typeof faultPropertiesSchema>

export const foldForms = ['anticline', 'syncline', 'antiform', 'synform', 'monocline'] as const
export type FoldForm = (typeof foldForms)[number]
export const axialTracePropertiesSchema = z
  .strictObject({
    ...lineBasis,
    form: z.enum(foldForms),
    /** Plunge of the axis, degrees below horizontal, 0–90; null where it is not stated. */
    plunge: inclinationSchema.nullable().default(null),
    /** Trend of the axis: azimuth of its down-going end, degrees from true north; null where no plunge is stated. */
    trend: azimuthSchema.nullable().default(null),
  })
  .refine((axis) => (axis.plunge === null) === (axis.trend === null), {
    message: 'Plunge and trend go together: state both or neither.',
    path: ['trend'],
  })
export type AxialTraceProperties = z.infer<typeof axialTracePropertiesSchema>

export const otherLineTypes = ['dike', 'vein', 'marker-bed'] as const
export const otherLinePropertiesSchema = z.strictObject({ ...lineBasis, type: z.enum(otherLineTypes) })
export type OtherLineProperties = z.infer<typeof otherLinePropertiesSchema>
