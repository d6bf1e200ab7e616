import { mkdtempSync, readdirSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import express from 'express'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { z } from 'zod'
import { nothing } from '@shared/api/common'
import { endpoint } from '@shared/api/endpoint'
import { problems, problemSchema } from '@shared/api/problems'
import { handleProblems } from '../../../server/platform/http/problem-handler'
import { serve } from '../../../server/platform/http/serve'
import { createLog, logRequests } from '../../../server/platform/log'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'

let server: TestServer
let editor: Agent
let sheet: string

beforeAll(async () => {
  server = await startTestServer()
  editor = await signInAs(server, 'editor')
  sheet = (await aSheet(server)).number
})
afterAll(() => server.close())

const revisions = () =>
  editor.post(`/api/sheets/${sheet}/revisions`).set('Idempotency-Key', crypto.randomUUID())

describe('a problem', () => {
  it('is problem details: what, what happened, what to do, and a number for the log', async () => {
    const { status, type, body } = await editor.get('/api/sheets/NO-SUCH')
    expect(status).toBe(404)
    expect(type).toBe('application/problem+json')
    expect(problemSchema.parse(body)).toMatchObject({
      type: '/problems/not-found',
      title: problems['not-found'].title,
      todo: problems['not-found'].todo,
      status: 404,
    })
    expect(body.instance).toMatch(/^urn:uuid:[0-9a-f-]{36}$/)
  })

  it('names every place that is wrong by a JSON pointer', async () => {
    const { status, body } = await editor.post('/api/sheets').send({
      number: 'mi 14',
      title: ' ',
      scale: 24_000,
      srid: 32626,
      area: { by: 'degrees', west: -200, south: 47, east: -29, north: 48 },
      page: { width: 841, height: 594 },
      colour: 'red',
    })
    expect(status).toBe(400)
    const pointers = body.errors.map((error: { pointer: string }) => error.pointer)
    expect(pointers.sort()).toEqual(['/area/west', '/colour', '/number', '/title'])
  })

  it.each([
    ['no JSON', '{"base": 1,', 'application/json', 'invalid-input'],
    ['another media type', 'base=1', 'application/x-www-form-urlencoded', 'invalid-input'],
    ['an encoding that is none', '{}', 'application/json; charset=nonsense', 'invalid-input'],
    [
      'more than a call may carry',
      `{"message":"${'x'.repeat(33 * 1024 * 1024)}"}`,
      'application/json',
      'file-too-large',
    ],
  ])('says so when the body is %s', async (_, text, mediaType, slug) => {
    const { status, body } = await revisions().set('Content-Type', mediaType).send(text)
    expect(body.type).toBe(`/problems/${slug}`)
    expect(status).toBe(problems[slug as keyof typeof problems].status)
  })

  it.each([
    ['a NUL', 'text \u0000 here'],
    ['half a surrogate pair', 'text \ud800 here'],
  ])('says where text cannot be stored: %s', async (_, message) => {
    const { status, body } = await revisions().send({ base: 1, message, changes: [] })
    expect(status).toBe(400)
    expect(body.errors).toEqual([
      { pointer: '/message', detail: expect.stringContaining('cannot be stored') },
    ])
  })

  it('takes a body nested a hundred thousand deep without falling over', async () => {
    const deep = `{"base":1,"changes":${'['.repeat(100_000)}${']'.repeat(100_000)}}`
    const { status, body } = await revisions().set('Content-Type', 'application/json').send(deep)
    expect(status).toBe(400)
    expect(body.type).toBe('/problems/invalid-input')
    expect((await request(server.url).get('/api/health')).status).toBe(200)
  })

  it.each([
    '/api/sheets/%E0%A4%A',
    '/api/sheets/%00',
    '/api/catalogue/MI-14/1/files/%00.pdf',
    '/api/nothing',
    '/api/sheets/../../etc',
  ])('says that there is nothing at %s', async (path) => {
    const { status, body } = await editor.get(path)
    expect(status).toBe(404)
    expect(body.type).toBe('/problems/not-found')
  })
})

describe('an upload', () => {
  const upload = () => editor.post(`/api/sheets/${sheet}/intakes`)
  const uploads = () => readdirSync(join(server.services.config.dataFolder, 'uploads'))

  it('without a file, or as something else, is refused in words', async () => {
    expect((await upload().field('note', 'no file')).body.type).toBe('/problems/invalid-input')
    expect((await upload().send({})).body.type).toBe('/problems/invalid-input')
    expect((await upload().attach('other', Buffer.from('{}'), 'a.geojson')).body.type).toBe(
      '/problems/invalid-input',
    )
  })

  it('leaves nothing behind when it has been answered', async () => {
    const { status } = await upload().attach('file', Buffer.from('not what it says'), 'notes.geojson')
    expect(status).toBe(422)
    expect(uploads()).toEqual([])
  })
})

describe('what nobody foresaw', () => {
  const anyone = {
    room: 'health',
    method: 'get',
    access: { to: 'anyone' },
    params: nothing,
    query: nothing,
  } as const
  const broken = endpoint({
    ...anyone,
    id: 'b',
    path: '/broken',
    summary: '',
    body: nothing,
    answer: z.null(),
    problems: [],
  })
  const wrong = endpoint({
    ...anyone,
    id: 'w',
    path: '/wrong',
    summary: '',
    body: nothing,
    answer: z.null(),
    problems: [],
  })
  const folder = mkdtempSync(join(tmpdir(), 'sheetwright-files-'))
  const app = express()
  app.use(logRequests(createLog('silent')))
  app.use((_request, response, next) => {
    response.locals.context = {
      access: server.services.accounts,
      uploadFolder: folder,
      checkAnswers: true,
      noteDownload: () => Promise.resolve(),
    }
    next()
  })
  serve(app, broken, () => {
    throw new Error('relation "secret_table" does not exist')
  })
  serve(app, wrong, () => JSON.parse('"an answer against the contract"'))
  app.use(handleProblems)
  afterAll(() => rmSync(folder, { recursive: true }))

  it('is answered with a number and no word of the inside', async () => {
    const { status, body, text } = await request(app).get('/broken')
    expect(status).toBe(500)
    expect(body.type).toBe('/problems/unexpected')
    expect(text).not.toMatch(/secret_table|Error|\.ts|node_modules/)
  })

  it('includes an answer that breaks its contract, where answers are checked', async () => {
    expect((await request(app).get('/wrong')).status).toBe(500)
  })
})

describe('every answer', () => {
  it('carries a policy that lets no inline script run, and hides what serves it', async () => {
    const { headers } = await request(server.url).get('/api/health')
    const policy = String(headers['content-security-policy'])
    expect(policy).toContain("script-src 'self';")
    expect(policy).toContain("frame-ancestors 'none'")
    expect(policy).toContain("object-src 'none'")
    expect(policy).not.toMatch(/script-src[^;]*unsafe/)
    expect(headers['x-content-type-options']).toBe('nosniff')
    expect(headers['x-powered-by']).toBeUndefined()
  })
})
