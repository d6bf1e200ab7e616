import { z } from 'zod'
import { roles } from './accounts'
import { nothing, sheetParams } from './common'
import { endpoint } from './endpoint'
import { jobSchema } from './jobs'
import { sheetStates } from './sheets'

/** Everything the server tells open clients of a sheet, as server-sent events. Announcements carry numbers, not data. */
export const pushSchema = z
  .discriminatedUnion('event', [
    z.strictObject({ event: z.literal('revision'), revision: z.number().int() }),
    z.strictObject({ event: z.literal('state'), state: z.enum(sheetStates) }),
    z.strictObject({ event: z.literal('job'), job: jobSchema }),
  ])
  .meta({ id: 'Push' })
export type Push = z.infer<typeof pushSchema>

export const listenToSheet = endpoint({
  id: 'listenToSheet',
  room: 'events',
  method: 'get',
  path: '/sheets/{sheet}/events',
  summary: 'Server-sent events of a sheet',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: pushSchema,
  form: 'events',
  problems: ['not-found'],
})
