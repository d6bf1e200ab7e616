import { z } from 'zod'
import { differenceSchema } from '../changes/differences'
import { itemKinds } from '../items/item'
import { roles } from './accounts'
import { nothing, sheetParams } from './common'
import { endpoint } from './endpoint'

/** A state of a sheet to compare: a revision's number (0 is the sheet before anything was on it), `edition-2`, or `latest`. */
export const stateSchema = z
  .string()
  .regex(/^(\d{1,9}|edition-\d{1,6}|latest)$/, 'A state is a revision number, edition-… or latest.')

const states = { from: stateSchema, to: stateSchema.default('latest') }

/** How many items of a kind differ, and how. An item that was moved and had fields changed counts as both. */
export const differenceCountSchema = z
  .strictObject({
    kind: z.enum(itemKinds),
    added: z.number().int(),
    removed: z.number().int(),
    /** At another place: moved, reshaped or reversed. */
    moved: z.number().int(),
    /** With other properties. */
    reattributed: z.number().int(),
  })
  .meta({ id: 'DifferenceCount' })
export type DifferenceCount = z.infer<typeof differenceCountSchema>

const namedState = z.strictObject({ revision: z.number().int(), edition: z.number().int().nullable() })
export type NamedState = z.infer<typeof namedState>

export const compareStates = endpoint({
  id: 'compareStates',
  room: 'ledger',
  method: 'get',
  path: '/sheets/{sheet}/comparison',
  summary:
    'What differs between two revisions or editions: legend and sheet face included, by item id, page by page',
  access: { to: 'members', roles },
  params: sheetParams,
  query: z.strictObject({
    ...states,
    /** Only items after this one: `next` of the page before. */
    after: z.uuid().optional(),
    limit: z.coerce.number().int().min(1).max(2000).default(500),
  }),
  body: nothing,
  answer: z.strictObject({
    from: namedState,
    to: namedState,
    /** Of the whole comparison; null on every page but the first. */
    counts: z.array(differenceCountSchema).nullable(),
    differences: z.array(differenceSchema),
    next: z.uuid().nullable(),
  }),
  problems: ['not-found', 'invalid-input'],
})
export type Comparison = z.infer<typeof compareStates.answer>

const exported = {
  room: 'ledger',
  method: 'get',
  access: { to: 'members', roles },
  params: sheetParams,
  query: z.strictObject(states),
  body: nothing,
  answer: nothing,
  form: 'download',
  problems: ['not-found', 'invalid-input'],
} as const

export const exportComparisonTable = endpoint({
  ...exported,
  id: 'exportComparisonTable',
  path: '/sheets/{sheet}/comparison.csv',
  summary: 'What differs between two states as a table: one row per item and field (CSV)',
})

export const exportComparisonMap = endpoint({
  ...exported,
  id: 'exportComparisonMap',
  path: '/sheets/{sheet}/comparison.geojson',
  summary: 'What differs between two states as features before and after (GeoJSON, WGS 84)',
})
