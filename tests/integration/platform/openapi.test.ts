import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { endpoints } from '@shared/api'
import { startTestServer, type TestServer } from '../../support/server'

interface Operation {
  operationId: string
  parameters: { name: string; in: string; required: boolean; schema: object }[]
  requestBody?: { content: Record<string, { schema: object }> }
  responses: Record<string, { description: string; content?: Record<string, { schema: object }> }>
  security?: Record<string, string[]>[]
}
interface Document {
  openapi: string
  info: { title: string; version: string }
  paths: Record<string, Record<string, Operation>>
  components: { schemas: Record<string, Record<string, unknown>>; securitySchemes: Record<string, object> }
}

let server: TestServer
let document: Document
let text: string

beforeAll(async () => {
  server = await startTestServer()
  const response = await request(server.url).get('/api/openapi.json')
  document = response.body
  text = response.text
})
afterAll(() => server.close())

const operations = () =>
  Object.entries(document.paths).flatMap(([path, methods]) =>
    Object.entries(methods).map(([method, operation]) => ({ path, method, operation })),
  )

/** Every value of a key, however deep. */
function valuesOf(key: string, value: unknown): unknown[] {
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([name, inner]) => [
    ...(name === key ? [inner] : []),
    ...valuesOf(key, inner),
  ])
}

describe('the OpenAPI document', () => {
  it('is OpenAPI 3.1 and describes every endpoint once', () => {
    expect(document.openapi).toBe('3.1.0')
    expect(document.info).toMatchObject({ title: 'Sheetwright', version: server.services.config.version })
    expect(
      operations()
        .map(({ operation }) => operation.operationId)
        .sort(),
    ).toEqual(endpoints.map(({ id }) => id).sort())
  })

  it('has a definition for every reference, and uses every definition', () => {
    const references = new Set(valuesOf('$ref', document).map(String))
    const defined = Object.keys(document.components.schemas).map((name) => `#/components/schemas/${name}`)
    expect([...references].filter((reference) => !defined.includes(reference))).toEqual([])
    expect(defined.filter((name) => !references.has(name))).toEqual([])
  })

  it('declares the parameters of each path, as OpenAPI wants them', () => {
    for (const { path, operation } of operations()) {
      const named = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name)
      const declared = operation.parameters.filter((parameter) => parameter.in === 'path')
      expect(declared.map(({ name }) => name)).toEqual(named)
      expect(declared.every(({ required }) => required)).toBe(true)
    }
  })

  it('gives every answer a description, and problems as problem details', () => {
    for (const { operation } of operations()) {
      for (const [status, response] of Object.entries(operation.responses)) {
        expect(response.description).not.toBe('')
        if (Number(status) >= 400) {
          expect(response.content).toEqual({
            'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } },
          })
        }
      }
      expect(operation.responses['500']).toBeDefined()
    }
  })

  it('asks for a session exactly where access does, and for the token with every change', () => {
    for (const { path, method, operation } of operations()) {
      const found = endpoints.find((each) => each.path === path && each.method === method)
      expect(operation.security !== undefined).toBe(found?.access.to !== 'anyone')
      const token = operation.parameters.some(({ name }) => name === 'X-CSRF-Token')
      expect(token).toBe(method !== 'get')
    }
  })

  it('tells what is sent from what is answered: a default need not be sent, but is always answered', () => {
    const { Item, ItemInput } = document.components.schemas
    const attitude = (schema: unknown) =>
      [valuesOf('oneOf', schema), valuesOf('anyOf', schema)]
        .flat(2)
        .find((option) => JSON.stringify(option).includes('"const":"attitude"'))
    const required = (schema: unknown) =>
      (attitude(schema) as { properties: { properties: { required?: string[] } } }).properties.properties
        .required ?? []
    expect(required(Item)).toContain('overturned')
    expect(required(ItemInput)).not.toContain('overturned')
    expect(required(ItemInput)).toContain('dip')
    expect(valuesOf('$ref', document.components.schemas['Change'])).toEqual([
      '#/components/schemas/ItemInput',
    ])
    const answered = operations().find(({ operation }) => operation.operationId === 'getItems')?.operation
    expect(valuesOf('$ref', answered?.responses['200'])).toEqual(['#/components/schemas/Item'])
  })

  it('keeps the words of JSON Schema and none of the tools', () => {
    expect(text).not.toContain('$defs')
    expect(text).not.toContain('"$id"')
    expect(text).not.toContain('\\u0001')
    expect(valuesOf('$schema', document)).toEqual([])
  })
})

describe('health', () => {
  it('is up while the database answers', async () => {
    const { status, body } = await request(server.url).get('/api/health')
    expect(status).toBe(200)
    expect(body).toEqual({ status: 'ok', version: server.services.config.version, database: 'ready' })
  })

  it('is refused by a process that is being stopped, so that nobody new is sent to it', async () => {
    const other = await startTestServer()
    other.services.health.stop()
    const { status, body } = await request(other.url).get('/api/health')
    expect(status).toBe(503)
    expect(body.type).toBe('/problems/unavailable')
    await other.close()
  })
})
