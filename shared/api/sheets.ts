import { z } from 'zod'
import { roleSchema } from './accounts'
import { nothing, personSchema, sheetNumberSchema, sheetParams, timestamp } from './common'
import { endpoint } from './endpoint'

/** drafting → submitted → (returned → drafting) or (approved → released as edition n), then drafting again. */
export const sheetStates = ['drafting', 'submitted', 'approved', 'releasing'] as const
export type SheetState = (typeof sheetStates)[number]

/** A coordinate reference system as PostGIS's spatial_ref_sys describes it. */
export const crsSchema = z
  .strictObject({ srid: z.number().int(), name: z.string(), proj4: z.string() })
  .meta({ id: 'Crs' })
export type Crs = z.infer<typeof crsSchema>

const ring = z.array(z.tuple([z.number(), z.number()]))

/** The printed page, millimetres. The map face's south-west corner stands at (left, bottom) from the page's own. */
export const pageSchema = z.strictObject({
  width: z.number().min(100).max(2000),
  height: z.number().min(100).max(2000),
})
export type Page = z.infer<typeof pageSchema>

/** How an entry came about: with the sheet, by hand, from a field file, or by going back to an earlier state. */
export const entryKinds = ['creation', 'edit', 'intake', 'restore'] as const

export const ledgerEntrySchema = z
  .strictObject({
    revision: z.number().int(),
    kind: z.enum(entryKinds),
    author: personSchema,
    at: timestamp,
    /** What the author wrote, or what changed in words. */
    message: z.string(),
    /** What changed, in words made from the versions: "moved 3 contacts, dip of attitude 14: 35 → 53". */
    what: z.string(),
    /** Items put and removed. */
    changed: z.number().int(),
  })
  .meta({ id: 'LedgerEntry' })
export type LedgerEntry = z.infer<typeof ledgerEntrySchema>

export const sheetSchema = z
  .strictObject({
    number: z.string(),
    title: z.string(),
    /** Scale denominator, for example 24000. */
    scale: z.number().int(),
    crs: crsSchema,
    /** Neatline, a closed ring in sheet metres, counter-clockwise. */
    neatline: ring,
    /** Centre and corners for the footprint plate: closed ring, WGS 84 degrees. */
    footprint: ring,
    page: pageSchema,
    state: z.enum(sheetStates),
    revision: z.number().int(),
    /** Number of the current edition; null before the first. */
    edition: z.number().int().nullable(),
    myRoles: z.array(roleSchema),
    lastEntry: ledgerEntrySchema.nullable(),
  })
  .meta({ id: 'Sheet' })
export type Sheet = z.infer<typeof sheetSchema>

export const areaSchema = z.discriminatedUnion('by', [
  z.strictObject({
    by: z.literal('degrees'),
    west: z.number().min(-180).max(180),
    south: z.number().min(-80).max(84),
    east: z.number().min(-180).max(180),
    north: z.number().min(-80).max(84),
  }),
  z.strictObject({
    by: z.literal('metres'),
    west: z.number(),
    south: z.number(),
    east: z.number(),
    north: z.number(),
  }),
])
export type Area = z.infer<typeof areaSchema>

export const newSheetSchema = z
  .strictObject({
    number: sheetNumberSchema,
    title: z.string().trim().min(1, 'A sheet needs a title.').max(200),
    scale: z
      .number()
      .int()
      .min(500, 'The scale is written as its denominator, for example 24000.')
      .max(10_000_000),
    srid: z.number().int(),
    area: areaSchema,
    page: pageSchema,
    attitudeConvention: z.enum(['strike-dip', 'dip-direction-dip']).default('strike-dip'),
    authors: z.string().trim().max(500).default(''),
  })
  .refine((sheet) => sheet.area.west < sheet.area.east, {
    message: 'West lies east of east.',
    path: ['area', 'east'],
  })
  .refine((sheet) => sheet.area.south < sheet.area.north, {
    message: 'South lies north of north.',
    path: ['area', 'north'],
  })
export type NewSheet = z.infer<typeof newSheetSchema>

export const listSheets = endpoint({
  id: 'listSheets',
  room: 'sheets',
  method: 'get',
  path: '/sheets',
  summary: 'The sheets you belong to; administrators see all',
  access: { to: 'signed-in' },
  params: nothing,
  query: nothing,
  body: nothing,
  answer: z.strictObject({ sheets: z.array(sheetSchema), mayCreate: z.boolean() }),
  problems: [],
})

export const createSheet = endpoint({
  id: 'createSheet',
  room: 'sheets',
  method: 'post',
  path: '/sheets',
  summary: 'Create a sheet; who creates it edits it',
  access: { to: 'signed-in' },
  params: nothing,
  query: nothing,
  body: newSheetSchema,
  answer: sheetSchema,
  status: 201,
  problems: ['invalid-input', 'number-taken', 'not-allowed', 'stale-form'],
})

export const getSheet = endpoint({
  id: 'getSheet',
  room: 'sheets',
  method: 'get',
  path: '/sheets/{sheet}',
  summary: 'A sheet',
  access: { to: 'members', roles: roleSchema.options },
  params: sheetParams,
  query: nothing,
  body: nothing,
  answer: sheetSchema,
  problems: ['not-found'],
})

export const getCrs = endpoint({
  id: 'getCrs',
  room: 'sheets',
  method: 'get',
  path: '/crs/{srid}',
  summary: 'A projected coordinate reference system',
  access: { to: 'signed-in' },
  params: z.strictObject({ srid: z.coerce.number().int() }),
  query: nothing,
  body: nothing,
  answer: crsSchema,
  problems: ['not-found'],
})
