import { z } from 'zod'
import { formatNames } from '../intake/formats'
import { mappingSchema } from '../intake/mapping'
import { columnSchema, proposalNoteSchema, refusalSchema } from '../intake/report'
import { itemKinds } from '../items/item'
import { roles } from './accounts'
import { empty, nothing, personSchema, sheetParams, timestamp } from './common'
import { endpoint } from './endpoint'
import { ledgerEntrySchema } from './sheets'

/** What was read from an uploaded file. */
export const intakeSchema = z
  .strictObject({
    id: z.uuid(),
    file: z.string(),
    bytes: z.number().int(),
    sha256: z.string(),
    reader: z.enum(formatNames),
    state: z.enum(['read', 'taken-in', 'discarded']),
    at: timestamp,
    by: personSchema,
    records: z.number().int(),
    points: z.number().int(),
    lines: z.number().int(),
    /** Records with neither points nor lines. */
    others: z.number().int(),
    columns: z.array(columnSchema),
    /** Extent of the file, WGS 84 degrees: west, south, east, north; null without geometry. */
    extent: z.tuple([z.number(), z.number(), z.number(), z.number()]).nullable(),
    /** Anything a person should know about how the file was read. */
    notes: z.array(z.string()),
    proposal: mappingSchema,
    proposalNotes: z.array(proposalNoteSchema),
    /** The mapping that it was taken in with; null until it is. */
    mapping: mappingSchema.nullable(),
    /** Revision that it became. */
    revision: z.number().int().nullable(),
    /** An earlier intake of the same bytes on this sheet, in words; null if there was none. */
    sameFileTakenIn: z.string().nullable(),
  })
  .meta({ id: 'Intake' })
export type Intake = z.infer<typeof intakeSchema>

/** Most refusals and drawn items that a preview lists; the counts are always whole. */
export const MAX_LISTED_REFUSALS = 20_000
export const MAX_DRAWN_ITEMS = 5000

export const previewSchema = z
  .strictObject({
    accepted: z.number().int(),
    refused: z.number().int(),
    /** Of the refused, those that fall outside the neatline. */
    outside: z.number().int(),
    /** Not refused, but left out as the mapping says. */
    leftOut: z.number().int(),
    byKind: z.array(z.strictObject({ kind: z.enum(itemKinds), items: z.number().int() })),
    /** At most MAX_LISTED_REFUSALS. */
    refusals: z.array(refusalSchema),
    /** The first readings, as written and in words. */
    echoes: z.array(z.strictObject({ record: z.number().int(), text: z.string(), words: z.string() })),
    /** Items as they would lie on the sheet, to look at: at most MAX_DRAWN_ITEMS, thinned evenly; lines without the
     *  vertices that cannot be seen at the size of a preview. Places are east, north, east, north …, whole metres. */
    sample: z.array(z.strictObject({ kind: z.enum(itemKinds), places: z.array(z.number()) })),
  })
  .meta({ id: 'IntakePreview' })
export type IntakePreview = z.infer<typeof previewSchema>

const intakeParams = sheetParams.extend({ intake: z.uuid() })
const writers = ['compiler', 'editor'] as const

export const uploadIntake = endpoint({
  id: 'uploadIntake',
  room: 'intake',
  method: 'post',
  path: '/sheets/{sheet}/intakes',
  summary:
    'Bring a field file (GeoJSON, KML, KMZ, GPX, CSV or zipped shapefile): it is read, nothing is taken in yet',
  access: { to: 'members', roles: writers },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: intakeSchema,
  status: 201,
  form: 'upload',
  problems: ['not-found', 'not-allowed', 'file-too-large', 'unreadable-file', 'invalid-input', 'stale-form'],
})

export const listIntakes = endpoint({
  id: 'listIntakes',
  room: 'intake',
  method: 'get',
  path: '/sheets/{sheet}/intakes',
  summary: 'Files brought to a sheet, newest first',
  access: { to: 'members', roles },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: z.array(intakeSchema),
  problems: ['not-found'],
})

export const getIntake = endpoint({
  id: 'getIntake',
  room: 'intake',
  method: 'get',
  path: '/sheets/{sheet}/intakes/{intake}',
  summary: 'A file brought to a sheet',
  access: { to: 'members', roles },
  params: intakeParams,
  query: nothing,
  body: nothing,
  answer: intakeSchema,
  problems: ['not-found'],
})

export const previewIntake = endpoint({
  id: 'previewIntake',
  room: 'intake',
  method: 'post',
  path: '/sheets/{sheet}/intakes/{intake}/preview',
  summary: 'What a mapping would take in and refuse; changes nothing',
  access: { to: 'members', roles: writers },
  params: intakeParams,
  query: nothing,
  body: z.strictObject({ mapping: mappingSchema }),
  answer: previewSchema,
  problems: ['invalid-input', 'not-found', 'not-allowed', 'stale-form'],
})

export const takeInIntake = endpoint({
  id: 'takeInIntake',
  room: 'intake',
  method: 'post',
  path: '/sheets/{sheet}/intakes/{intake}/items',
  summary: 'Take a file in as one ledger entry',
  access: { to: 'members', roles: writers },
  params: intakeParams,
  query: nothing,
  body: z.strictObject({ mapping: mappingSchema, message: z.string().trim().max(500).default('') }),
  answer: z.strictObject({
    revision: z.number().int(),
    entry: ledgerEntrySchema,
    accepted: z.number().int(),
    refused: z.number().int(),
  }),
  status: 201,
  problems: [
    'invalid-input',
    'not-found',
    'not-allowed',
    'wrong-state',
    'outside-sheet',
    'nothing-to-take-in',
    'stale-form',
  ],
})

export const discardIntake = endpoint({
  id: 'discardIntake',
  room: 'intake',
  method: 'delete',
  path: '/sheets/{sheet}/intakes/{intake}',
  summary: 'Put a file aside without taking it in',
  access: { to: 'members', roles: writers },
  params: intakeParams,
  query: nothing,
  body: nothing,
  answer: empty,
  status: 204,
  problems: ['not-found', 'not-allowed', 'wrong-state', 'stale-form'],
})

export const getIntakeFile = endpoint({
  id: 'getIntakeFile',
  room: 'intake',
  method: 'get',
  path: '/sheets/{sheet}/intakes/{intake}/file',
  summary: 'The file as it was brought, byte for byte',
  access: { to: 'members', roles },
  params: intakeParams,
  query: nothing,
  body: nothing,
  answer: z.any(),
  form: 'download',
  problems: ['not-found'],
})
