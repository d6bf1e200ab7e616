import { z } from 'zod'
import { roles } from './accounts'
import { nothing, sheetParams } from './common'
import { endpoint } from './endpoint'

/** A unit's area on the map, derived from linework and unit labels. */
export const faceSchema = z
  .strictObject({
    /** Legend unit of the face; null where no label, or labels that disagree, stand in it. */
    unit: z.uuid().nullable(),
    /** Polygon rings in sheet metres: outer first. */
    rings: z.array(z.array(z.tuple([z.number(), z.number()]))),
  })
  .meta({ id: 'Face' })
export type Face = z.infer<typeof faceSchema>

export const getFaces = endpoint({
  id: 'getFaces',
  room: 'faces',
  method: 'get',
  path: '/sheets/{sheet}/faces',
  summary: 'Unit areas built from the linework and labels of the latest revision',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: z.strictObject({ revision: z.number().int(), faces: z.array(faceSchema) }),
  problems: ['not-found'],
})
