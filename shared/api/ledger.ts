import { z } from 'zod'
import { changeSetSchema } from '../changes/change-set'
import { itemKinds, itemSchema } from '../items/item'
import { roles } from './accounts'
import { empty, nothing, personSchema, sheetParams, timestamp } from './common'
import { endpoint } from './endpoint'
import { entryKinds, ledgerEntrySchema } from './sheets'

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

const nameSchema = z.string().trim().min(1, 'A name has at least one letter.').max(80)
const noteSchema = z.string().trim().max(2000)

/** A name put on a revision afterwards: a checkpoint to find, compare and restore by. */
export const namedRevisionSchema = z
  .strictObject({
    revision: z.number().int(),
    /** Unique on the sheet. */
    name: nameSchema,
    note: noteSchema,
    by: personSchema,
    at: timestamp,
  })
  .meta({ id: 'NamedRevision' })
export type NamedRevision = z.infer<typeof namedRevisionSchema>

/** An entry as the ledger lists it, with the name that its revision was given. */
export const ledgerRowSchema = z
  .strictObject({ ...ledgerEntrySchema.shape, name: namedRevisionSchema.nullable() })
  .meta({ id: 'LedgerRow' })
export type LedgerRow = z.infer<typeof ledgerRowSchema>

const coordinate = String.raw`-?\d{1,9}(\.\d{1,3})?`

/** What the ledger can be searched by; everything stated has to hold. */
const ledgerFilter = {
  /** Who wrote the entry. */
  person: z.uuid().optional(),
  kind: z.enum(entryKinds).optional(),
  /** Entries that changed items of this kind. */
  itemKind: z.enum(itemKinds).optional(),
  /** Entries that changed this item. */
  item: z.uuid().optional(),
  /** Entries that changed something in a rectangle of the sheet: west,south,east,north in sheet metres. */
  place: z
    .string()
    .regex(
      new RegExp(`^${coordinate}(,${coordinate}){3}$`),
      'A place is west,south,east,north in sheet metres.',
    )
    .optional(),
  /** Part of the message, of what changed in words, or of the revision's name. */
  text: z.string().trim().min(1).max(200).optional(),
}

export const listRevisions = endpoint({
  id: 'listRevisions',
  room: 'ledger',
  method: 'get',
  path: '/sheets/{sheet}/revisions',
  summary: 'Ledger entries, newest first; all, or those that a filter leaves',
  access: { to: 'members', roles },
  params: sheetParams,
  query: z.strictObject({
    ...ledgerFilter,
    /** Only entries before this one: `next` of the page before. */
    before: z.coerce.number().int().optional(),
    limit: z.coerce.number().int().min(1).max(200).default(50),
  }),
  body: nothing,
  answer: z.strictObject({ entries: z.array(ledgerRowSchema), next: z.number().int().nullable() }),
  problems: ['not-found', 'invalid-input'],
})
export type LedgerFilter = Omit<z.output<typeof listRevisions.query>, 'before' | 'limit'>

const revisionParams = sheetParams.extend({ revision: z.coerce.number().int().min(1) })

export const nameRevision = endpoint({
  id: 'nameRevision',
  room: 'ledger',
  method: 'put',
  path: '/sheets/{sheet}/revisions/{revision}/name',
  summary: 'Put a name and a note on a revision; a second time changes them',
  access: { to: 'members', roles: ['compiler', 'editor'] },
  params: revisionParams,
  query: nothing,
  body: z.strictObject({ name: nameSchema, note: noteSchema.default('') }),
  answer: namedRevisionSchema,
  problems: ['invalid-input', 'not-found', 'not-allowed', 'name-taken', 'stale-form'],
})

export const unnameRevision = endpoint({
  id: 'unnameRevision',
  room: 'ledger',
  method: 'delete',
  path: '/sheets/{sheet}/revisions/{revision}/name',
  summary: 'Take the name off a revision',
  access: { to: 'members', roles: ['compiler', 'editor'] },
  params: revisionParams,
  query: nothing,
  body: nothing,
  answer: empty,
  status: 204,
  problems: ['not-found', 'not-allowed', 'stale-form'],
})

export const listNamedRevisions = endpoint({
  id: 'listNamedRevisions',
  room: 'ledger',
  method: 'get',
  path: '/sheets/{sheet}/named-revisions',
  summary: 'Revisions that have a name, newest first',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: z.array(namedRevisionSchema),
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
