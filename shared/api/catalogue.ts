import { z } from 'zod'
import { nothing, personSchema, sheetNumberSchema, timestamp } from './common'
import { endpoint } from './endpoint'

/** A file of an edition. */
export const artefactSchema = z
  .strictObject({
    name: z.string(),
    /** What it is, in words. */
    title: z.string(),
    mediaType: z.string(),
    bytes: z.number().int(),
    sha256: z.string(),
  })
  .meta({ id: 'Artefact' })
export type Artefact = z.infer<typeof artefactSchema>

export const editionSchema = z
  .strictObject({
    sheet: z.string(),
    edition: z.number().int(),
    title: z.string(),
    authors: z.string(),
    scale: z.number().int(),
    crs: z.strictObject({ srid: z.number().int(), name: z.string() }),
    footprint: z.array(z.tuple([z.number(), z.number()])),
    releasedAt: timestamp,
    state: z.enum(['current', 'superseded', 'withdrawn']),
    approvedBy: personSchema,
    revision: z.number().int(),
    artefacts: z.array(artefactSchema),
    citation: z.string(),
    caution: z.string(),
  })
  .meta({ id: 'Edition' })
export type Edition = z.infer<typeof editionSchema>

const editionParams = z.strictObject({ sheet: sheetNumberSchema, edition: z.coerce.number().int().min(1) })

export const listEditions = endpoint({
  id: 'listEditions',
  room: 'catalogue',
  method: 'get',
  path: '/catalogue',
  summary: 'Released editions, newest first',
  access: { to: 'anyone' },
  params: nothing,
  query: z.strictObject({ text: z.string().trim().max(200).optional() }),
  body: nothing,
  answer: z.array(editionSchema),
  problems: [],
})

export const getEdition = endpoint({
  id: 'getEdition',
  room: 'catalogue',
  method: 'get',
  path: '/catalogue/{sheet}/{edition}',
  summary: 'A released edition',
  access: { to: 'anyone' },
  params: editionParams,
  query: nothing,
  body: nothing,
  answer: editionSchema,
  problems: ['not-found'],
})

export const getArtefact = endpoint({
  id: 'getArtefact',
  room: 'catalogue',
  method: 'get',
  path: '/catalogue/{sheet}/{edition}/files/{name}',
  summary: 'A file of an edition',
  access: { to: 'anyone' },
  params: editionParams.extend({ name: z.string().max(200) }),
  query: nothing,
  body: nothing,
  answer: z.any(),
  form: 'download',
  problems: ['not-found'],
})
