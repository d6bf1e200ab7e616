import { z } from 'zod'

/** Most vertices that one line may carry: above this a line is an import error, not a trace. */
export const MAX_VERTICES = 100_000

const metresRule = 'A coordinate is a number of metres within 100 000 km of the origin.'
const metres = z.number(metresRule).min(-1e8, metresRule).max(1e8, metresRule)
const place = z.tuple([metres, metres], 'A place is two numbers, east and north in metres.')

/** Says what a geometry has to be where something else came; a field that is too many is named as everywhere. */
const onlyType = (rule: string) => ({
  error: ({ code }: { code?: string }) => (code === 'invalid_type' ? rule : undefined),
})
const pointRule = 'An item of this kind is a point: its geometry has to be of type Point.'
const lineRule = 'An item of this kind is a line: its geometry has to be of type LineString.'

/** Point geometry in sheet metres. */
export const pointGeometrySchema = z.strictObject(
  { type: z.literal('Point', pointRule), coordinates: place },
  onlyType(pointRule),
)

/** Line geometry in sheet metres, 2 to MAX_VERTICES vertices. */
export const lineGeometrySchema = z.strictObject(
  {
    type: z.literal('LineString', lineRule),
    coordinates: z
      .array(place, 'The coordinates of a line are a list of places.')
      .min(2, 'A line needs at least two vertices.')
      .max(MAX_VERTICES, `A line may have at most ${MAX_VERTICES} vertices.`),
  },
  onlyType(lineRule),
)

/** Kinds that stand in the margin have no place on the map face. */
export const noGeometrySchema = z.null('An item of this kind has no place: its geometry has to be null.')

export type PointGeometry = z.infer<typeof pointGeometrySchema>
export type LineGeometry = z.infer<typeof lineGeometrySchema>
