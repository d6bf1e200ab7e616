import { z } from 'zod'
import { roles } from './accounts'
import { empty, nothing, personSchema, sheetParams } from './common'
import { endpoint } from './endpoint'
import { jobSchema } from './jobs'
import { sheetStates } from './sheets'

/** Most items that presence names: more are not looked at one by one. */
export const MOST_ITEMS_AT_HAND = 20

/** Where a person is at work on a sheet. */
export const presenceSchema = z
  .strictObject({
    /** The open page: one person may have several. */
    page: z.uuid(),
    /** What of the sheet they see, sheet metres: west, south, east, north; null once they have left. */
    extent: z.tuple([z.number(), z.number(), z.number(), z.number()]).nullable(),
    /** What they have selected. */
    items: z.array(z.uuid()).max(MOST_ITEMS_AT_HAND),
  })
  .meta({ id: 'Presence' })
export type Presence = z.infer<typeof presenceSchema>

/** Everything the server tells open clients of a sheet, as server-sent events. Announcements carry numbers, not data. */
export const pushSchema = z
  .discriminatedUnion('event', [
    z.strictObject({ event: z.literal('revision'), revision: z.number().int() }),
    z.strictObject({ event: z.literal('state'), state: z.enum(sheetStates) }),
    z.strictObject({ event: z.literal('job'), job: jobSchema }),
    z.strictObject({ event: z.literal('presence'), person: personSchema, presence: presenceSchema }),
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

export const tellPresence = endpoint({
  id: 'tellPresence',
  room: 'events',
  method: 'post',
  path: '/sheets/{sheet}/presence',
  summary: 'Tell the others on a sheet where one is at work; nothing of it is kept',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: presenceSchema,
  answer: empty,
  status: 204,
  problems: ['not-found', 'invalid-input'],
})
