import { z } from 'zod'
import { azimuthSchema, inclinationSchema } from './angles'
import { lineBasis } from './confidence'

/** Left or right of a line, looking along it as it was drawn. */
export const sides = ['left', 'right'] as const
export type Side = (typeof sides)[number]
const sideSchema = z.enum(sides)

export const otherSide = (side: Side): Side => (side === 'left' ? 'right' : 'left')

export const contactPropertiesSchema = z.strictObject({ ...lineBasis })
export type ContactProperties = z.infer<typeof contactPropertiesSchema>

export const faultTypes = [
  'unspecified',
  'normal',
  'reverse',
  'thrust',
  'left-lateral',
  'right-lateral',
  'rotational',
] as const
export type FaultType = (typeof faultTypes)[number]

export const faultPropertiesSchema = z
  .strictObject({
    ...lineBasis,
    type: z.enum(faultTypes).default('unspecified'),
    /** The hanging wall: the downthrown side of a normal fault, the upper plate of a reverse fault or thrust, the side to
     *  which any other fault dips. Of a rotational fault, the downthrown side at the line's start; at its end it is the
     *  other one. {@link reversedSide} says what becomes of it when the line is turned round. */
    side: sideSchema.default('right'),
    /** Dip of the fault plane toward `side`, degrees below horizontal, 0–90; null where it is not stated. */
    dip: inclinationSchema.nullable().default(null),
  })
  .refine((fault) => fault.type !== 'rotational' || fault.dip === null, {
    message:
      'A rotational fault takes no dip: its downthrown side changes along it, so that a dip toward that side would say two ' +
      'things. Clear the dip first.',
    path: ['dip'],
  })
export type FaultProperties = z.infer<typeof faultPropertiesSchema>

/** The side of a fault once its line is turned round, so that it names the same ground: the other one; but the same word
 *  for a rotational fault, whose start has moved to the other end, where the other side is down. */
export const reversedSide = ({ type, side }: Pick<FaultProperties, 'type' | 'side'>): Side =>
  type === 'rotational' ? side : otherSide(side)

export const foldForms = [
  'anticline',
  'syncline',
  'antiform',
  'synform',
  'overturned-anticline',
  'overturned-syncline',
  'monocline-anticlinal-bend',
  'monocline-synclinal-bend',
] as const
export type FoldForm = (typeof foldForms)[number]

/** What a person calls a fold of each form. */
export const foldWords: Record<FoldForm, string> = {
  anticline: 'anticline',
  syncline: 'syncline',
  antiform: 'antiform',
  synform: 'synform',
  'overturned-anticline': 'overturned anticline',
  'overturned-syncline': 'overturned syncline',
  'monocline-anticlinal-bend': 'monocline, anticlinal bend',
  'monocline-synclinal-bend': 'monocline, synclinal bend',
}

/** Whether a fold's drawing depends on its `side`: both limbs of an overturned fold, the steep limb of a monocline dip there. */
export const isSidedFold = (form: FoldForm): boolean =>
  form.startsWith('overturned') || form.startsWith('monocline')

export const doublyPlunging = ['no', 'outward', 'inward'] as const
export type DoublyPlunging = (typeof doublyPlunging)[number]

export const axialTracePropertiesSchema = z
  .strictObject({
    ...lineBasis,
    form: z.enum(foldForms),
    /** Side to which both limbs of an overturned fold dip, or the steep limb of a monocline; nothing of another form. */
    side: sideSchema.default('right'),
    /** Plunge of the axis, degrees below horizontal, 0–90; null where it is not stated. */
    plunge: inclinationSchema.nullable().default(null),
    /** Trend of the axis: azimuth of its down-going end, degrees from true north; null where no plunge is stated. */
    trend: azimuthSchema.nullable().default(null),
    /** Whether the axis goes down both ways: outward from a culmination toward both ends of the trace, or inward from
     *  both ends toward a depression. `plunge` and `trend` are then those of one half. */
    doubly: z.enum(doublyPlunging).default('no'),
    /** Plunge of the other half of a doubly plunging axis, whose trend is opposite; null where it is not stated. */
    otherPlunge: inclinationSchema.nullable().default(null),
  })
  .refine((axis) => (axis.plunge === null) === (axis.trend === null), {
    message: 'Plunge and trend go together: state both or neither.',
    path: ['trend'],
  })
  .refine((axis) => axis.otherPlunge === null || (axis.doubly !== 'no' && axis.plunge !== null), {
    message: 'A second plunge belongs to a doubly plunging axis whose first plunge and trend are stated.',
    path: ['otherPlunge'],
  })
export type AxialTraceProperties = z.infer<typeof axialTracePropertiesSchema>

export const otherLineTypes = ['dike', 'vein', 'marker-bed'] as const
export const otherLinePropertiesSchema = z.strictObject({ ...lineBasis, type: z.enum(otherLineTypes) })
export type OtherLineProperties = z.infer<typeof otherLinePropertiesSchema>
