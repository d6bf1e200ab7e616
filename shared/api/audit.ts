import { z } from 'zod'
import { auditEventSchema, auditKinds } from '../audit/audit-event'
import { nothing, personSchema, sheetNumberSchema, timestamp } from './common'
import { endpoint } from './endpoint'

/** One entry of the audit trail: who, when, on which sheet, what, chained to the one before. */
export const auditEntrySchema = z
  .strictObject({
    /** 1, 2, 3 … without gaps. */
    number: z.number().int(),
    at: timestamp,
    /** Null where nobody was signed in. */
    person: personSchema.nullable(),
    /** Number of the sheet that it is about. */
    sheet: z.string().nullable(),
    event: auditEventSchema,
    /** SHA-256 over all of it and the hash of the entry before, hexadecimal. */
    hash: z.string(),
  })
  .meta({ id: 'AuditEntry' })
export type AuditEntry = z.infer<typeof auditEntrySchema>

export const listAuditEntries = endpoint({
  id: 'listAuditEntries',
  room: 'administration',
  method: 'get',
  path: '/audit',
  summary: 'The audit trail, newest first; all of it, or what a filter leaves',
  access: { to: 'administrator' },
  params: nothing,
  query: z.strictObject({
    kind: z.enum(auditKinds).optional(),
    person: z.uuid().optional(),
    sheet: sheetNumberSchema.optional(),
    since: timestamp.optional(),
    until: timestamp.optional(),
    /** Only entries before this one: `next` of the page before. */
    before: z.coerce.number().int().optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  body: nothing,
  answer: z.strictObject({ entries: z.array(auditEntrySchema), next: z.number().int().nullable() }),
  problems: ['invalid-input'],
})
export type AuditQuery = z.output<typeof listAuditEntries.query>
