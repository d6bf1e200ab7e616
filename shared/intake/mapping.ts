import { z } from 'zod'
import { locationConfidences } from '../items/confidence'
import { faultTypes, foldForms, otherLineTypes, sides } from '../items/lines'
import {
  attitudeConventions,
  lineationTypes,
  northReferences,
  planeTypes,
  stationTypes,
} from '../items/points'

/** What one value of the type column (or every line of a file) becomes. */
export const lineTargetSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('contact') }),
  z.strictObject({ kind: z.literal('fault'), type: z.enum(faultTypes) }),
  z.strictObject({ kind: z.literal('axial-trace'), form: z.enum(foldForms) }),
  z.strictObject({ kind: z.literal('other-line'), type: z.enum(otherLineTypes) }),
  z.strictObject({ kind: z.literal('leave-out') }),
])
export type LineTarget = z.infer<typeof lineTargetSchema>

/** What one value of the type column (or every point of a file) becomes. */
export const pointTargetSchema = z.discriminatedUnion('kind', [
  z.strictObject({
    kind: z.literal('attitude'),
    type: z.enum(planeTypes),
    overturned: z.boolean().default(false),
    undulating: z.boolean().default(false),
    topsKnown: z.boolean().default(false),
  }),
  z.strictObject({ kind: z.literal('lineation'), type: z.enum(lineationTypes) }),
  z.strictObject({ kind: z.literal('station'), type: z.enum(stationTypes).default('station') }),
  z.strictObject({ kind: z.literal('leave-out') }),
])
export type PointTarget = z.infer<typeof pointTargetSchema>

const column = z.string().max(500).nullable().default(null)

/** How the attributes of a file become ours. Columns are named as in the file; null means that there is none. */
export const mappingSchema = z
  .strictObject({
    /** What the azimuths of the file (strikes, dip directions, trends) are counted from. */
    northReference: z.enum(northReferences),
    /** Degrees, east positive; needed where the reference is magnetic. */
    declination: z.number().min(-180).max(180).nullable(),
    lines: z.strictObject({
      /** Column that says what a line is. */
      typeColumn: column,
      /** Value of the type column → what it becomes; '' stands for a missing value. */
      types: z.record(z.string(), lineTargetSchema),
      /** What lines become whose value is not in `types`, or all if there is no type column. */
      otherwise: lineTargetSchema,
      confidenceColumn: column,
      /** Value of the confidence column → ours; a value that is missing here is refused. */
      confidences: z.record(z.string(), z.enum(locationConfidences)),
      /** What lines become that state no confidence: no column, or no value in it. */
      confidenceOtherwise: z.enum(locationConfidences),
      /** Side of faults whose symbol has one, looking along the line as the file has it: the downthrown side or the
       *  upper plate. Files seldom say so; the person who brings it does. */
      faultSide: z.enum(sides).default('right'),
      /** Side to which the limbs of overturned folds and the steep limbs of monoclines dip, stated likewise. */
      foldSide: z.enum(sides).default('right'),
      nameColumn: column,
      plungeColumn: column,
      trendColumn: column,
      noteColumn: column,
    }),
    points: z.strictObject({
      typeColumn: column,
      types: z.record(z.string(), pointTargetSchema),
      otherwise: pointTargetSchema,
      /** One column with the whole reading as text (`N45E 40SE`, `045/40`), or separate ones below. */
      readingColumn: column,
      /** Column with strike or dip direction, as `convention` says. */
      azimuthColumn: column,
      dipColumn: column,
      convention: z.enum(attitudeConventions),
      /** Column that says whether a bed is overturned, beside what its type says. */
      overturnedColumn: column,
      /** Trend of lineations; azimuth of places that have one. */
      trendColumn: column,
      plungeColumn: column,
      stationColumn: column,
      noteColumn: column,
    }),
  })
  .meta({ id: 'IntakeMapping' })
export type Mapping = z.infer<typeof mappingSchema>
