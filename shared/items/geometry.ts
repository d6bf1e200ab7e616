import { z } from 'zod'

/** Most vertices that one line may carry: above this a line is an import error, not a trace. */
export const MAX_VERTICES = 100_000

const metresRule = 'A coordinate is a number of metres within 100 000 km of the origin.'
const metres = z.number(metresRule).min(-1e8, metresRule).max(1e8, metresRule)

/** Point geometry in sheet metres. */
export const pointGeometrySchema = z.strictObject({
  type: z.literal('Point'),
  coordinates: z.tuple([metres, metres]),
})

/** Line geometry in sheet metres, 2 to MAX_VERTICES vertices. */
export const lineGeometrySchema = z.strictObject({
  type: z.literal('LineString'),
  coordinates: z
    .array(z.tuple([metres, metres]))
    .min(2, 'A line needs at least two vertices.')
    .max(MAX_VERTICES, `A line may have at most ${MAX_VERTICES} vertices.`),
})

export type PointGeometry = z.infer<typeof pointGeometrySchema>
export type LineGeometry = z.infer<typeof lineGeometrySchema>
