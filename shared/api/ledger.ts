import { z } from 'zod'
import { changeSetSchema } from '../changes/change-set'
import { itemSchema } from '../items/item'
import { roles } from './accounts'
import { nothing, sheetParams } from './common'
import { endpoint } from './endpoint'
import { ledgerEntrySchema } from './sheets'

export const getItems = endpoint({
  id: 'getItems',
  room: 'ledger',
  method: 'get',
  path: '/sheets/{sheet}/items',
  summary: 'All items of a sheet at a revision, the latest unless given',
  access: { to: 'members', roles },
  params: sheetParams,
  query: z.strictObject({ revision: z.coerce.number().int().min(0).optional() }),
  body: nothing,
  answer: z.strictObject({ revision: z.number().int(), items: z.array(itemSchema) }),
  problems: ['not-found', 'invalid-input'],
})

export const postRevision = endpoint({
  id: 'postRevision',
  room: 'ledger',
  method: 'post',
  path: '/sheets/{sheet}/revisions',
  summary:
    'Change a sheet: all or nothing, one ledger entry. Send an Idempotency-Key header (a UUID): the same key gets the same answer',
  access: { to: 'members', roles: ['compiler', 'editor'] },
  params: sheetParams,
  query: nothing,
  body: changeSetSchema,
  answer: z.strictObject({
    revision: z.number().int(),
    entry: ledgerEntrySchema,
    /** Items that the server stored otherwise than sent (coordinates snapped to the 1 mm grid). */
    altered: z.array(itemSchema),
  }),
  status: 201,
  problems: [
    'invalid-input',
    'not-found',
    'not-allowed',
    'item-conflict',
    'wrong-state',
    'key-reused',
    'stale-form',
  ],
})

export const listRevisions = endpoint({
  id: 'listRevisions',
  room: 'ledger',
  method: 'get',
  path: '/sheets/{sheet}/revisions',
  summary: 'Ledger entries, newest first',
  access: { to: 'members', roles },
  params: sheetParams,
  query: z.strictObject({
    before: z.coerce.number().int().optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  body: nothing,
  answer: z.strictObject({ entries: z.array(ledgerEntrySchema), next: z.number().int().nullable() }),
  problems: ['not-found'],
})

export const getChanges = endpoint({
  id: 'getChanges',
  room: 'ledger',
  method: 'get',
  path: '/sheets/{sheet}/changes',
  summary: 'What has changed since a revision: items as they now are, and ids gone',
  access: { to: 'members', roles },
  params: sheetParams,
  query: z.strictObject({ since: z.coerce.number().int().min(0) }),
  body: nothing,
  answer: z.strictObject({
    revision: z.number().int(),
    put: z.array(itemSchema),
    removed: z.array(z.uuid()),
    entries: z.array(ledgerEntrySchema),
  }),
  problems: ['not-found', 'invalid-input'],
})

/** Where an item came from, kept by intake. */
export const provenanceSchema = z
  .strictObject({
    file: z.string(),
    /** Number of the record in the file, from 1. */
    record: z.number().int(),
    attributes: z.record(z.string(), z.unknown()),
    /** What was done to it, in words. */
    conversions: z.array(z.string()),
  })
  .meta({ id: 'Provenance' })
export type Provenance = z.infer<typeof provenanceSchema>

export const itemVersionSchema = z.strictObject({
  since: z.number().int(),
  /** Null for the version that holds now. */
  until: z.number().int().nullable(),
  item: itemSchema,
  entry: ledgerEntrySchema,
  provenance: provenanceSchema.nullable(),
})

export const getItemHistory = endpoint({
  id: 'getItemHistory',
  room: 'ledger',
  method: 'get',
  path: '/sheets/{sheet}/items/{item}/versions',
  summary: 'Every version of one item, newest first',
  access: { to: 'members', roles },
  params: sheetParams.extend({ item: z.uuid() }),
  query: nothing,
  body: nothing,
  answer: z.array(itemVersionSchema),
  problems: ['not-found'],
})
