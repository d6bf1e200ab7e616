import { z } from 'zod'
import type { Endpoint } from '@shared/api/endpoint'
import { problems, problemSchema, type ProblemSlug } from '@shared/api/problems'
import { Schemas, settleReferences, type JsonSchema } from './schemas'

/** The OpenAPI 3.1 document of a list of endpoints; nothing about the API is written down a second time. */
export function describeApi(endpoints: readonly Endpoint[], version: string): JsonSchema {
  const schemas = new Schemas()
  const problem = schemas.add(problemSchema, 'output')
  const paths: Record<string, JsonSchema> = {}
  for (const endpoint of endpoints) {
    paths[endpoint.path] = {
      ...paths[endpoint.path],
      [endpoint.method]: describe(endpoint, schemas, problem),
    }
  }
  const { schemas: named, differing } = schemas.components()
  const document = {
    openapi: '3.1.0',
    info: {
      title: 'Sheetwright',
      version,
      summary: 'From field traces and attitude measurements to released geologic map sheets.',
      license: { name: 'MIT', identifier: 'MIT' },
    },
    servers: [{ url: '/api' }],
    tags: [...new Set(endpoints.map((endpoint) => endpoint.room))].map((name) => ({ name })),
    paths,
    components: {
      schemas: named,
      securitySchemes: {
        session: {
          type: 'apiKey',
          in: 'cookie',
          name: 'sheetwright',
          description: 'Set by signing in; the name ends in the port of the server.',
        },
      },
    },
  }
  return settleReferences(document, differing)
}

function describe(endpoint: Endpoint, schemas: Schemas, problem: JsonSchema): JsonSchema {
  const { access } = endpoint
  const open = access.to === 'anyone'
  return {
    operationId: endpoint.id,
    tags: [endpoint.room],
    summary: endpoint.summary,
    description: whoMay(endpoint),
    ...(open ? {} : { security: [{ session: [] }] }),
    parameters: [
      ...listParameters(endpoint.params, 'path', schemas),
      ...listParameters(endpoint.query, 'query', schemas),
      ...(endpoint.method === 'get' ? [] : [csrfParameter]),
    ],
    ...describeBody(endpoint, schemas),
    responses: { ...describeAnswer(endpoint, schemas), ...describeProblems(endpoint, problem) },
  }
}

function whoMay({ access }: Endpoint): string {
  if (access.to === 'members') return `For members of the sheet: ${access.roles.join(', ')}.`
  return {
    anyone: 'For anyone.',
    'signed-in': 'For whoever is signed in.',
    administrator: 'For administrators.',
  }[access.to]
}

const csrfParameter = {
  name: 'X-CSRF-Token',
  in: 'header',
  required: true,
  description: 'The token that GET /session answers.',
  schema: { type: 'string' },
}

function listParameters(schema: z.ZodType, place: 'path' | 'query', schemas: Schemas): JsonSchema[] {
  if (!(schema instanceof z.ZodObject)) throw new TypeError('Parameters are described by an object schema.')
  return Object.entries(schema.shape).map(([name, value]) => {
    const parameter: z.ZodType = value
    // Text that is turned into a number is described as the number that it has to be.
    return {
      name,
      in: place,
      required: place === 'path' || !parameter.safeParse(undefined).success,
      schema: schemas.add(parameter, 'output'),
    }
  })
}

function describeBody(endpoint: Endpoint, schemas: Schemas): JsonSchema {
  if (endpoint.form === 'upload') {
    const file = { type: 'string', contentMediaType: 'application/octet-stream' }
    const schema = { type: 'object', properties: { file }, required: ['file'] }
    return { requestBody: { required: true, content: { 'multipart/form-data': { schema } } } }
  }
  if (endpoint.method === 'get' || isEmpty(endpoint.body)) return {}
  const schema = schemas.add(endpoint.body, 'input')
  return { requestBody: { required: true, content: { 'application/json': { schema } } } }
}

const isEmpty = (schema: z.ZodType): boolean =>
  schema instanceof z.ZodObject && Object.keys(schema.shape).length === 0

function describeAnswer(endpoint: Endpoint, schemas: Schemas): JsonSchema {
  const status = String(endpoint.status ?? 200)
  if (endpoint.status === 204) return { [status]: { description: 'Done.' } }
  const schema = endpoint.form === 'download' ? {} : schemas.add(endpoint.answer, 'output')
  return { [status]: { description: endpoint.summary, content: { [mediaTypeOf(endpoint)]: { schema } } } }
}

function mediaTypeOf({ form }: Endpoint): string {
  if (form === 'download') return 'application/octet-stream'
  return form === 'events' ? 'text/event-stream' : 'application/json'
}

function describeProblems({ access, problems: own }: Endpoint, problem: JsonSchema): JsonSchema {
  const slugs = new Set<ProblemSlug>([
    ...own,
    ...(access.to === 'anyone' ? [] : (['not-signed-in'] as const)),
    ...(access.to === 'administrator' ? (['not-allowed'] as const) : []),
    'unexpected',
  ])
  const statuses = [...new Set([...slugs].map((slug) => problems[slug].status))].sort()
  return Object.fromEntries(
    statuses.map((status) => [
      String(status),
      {
        description: [...slugs]
          .filter((slug) => problems[slug].status === status)
          .map((slug) => `/problems/${slug}: ${problems[slug].title}.`)
          .join('\n'),
        content: { 'application/problem+json': { schema: problem } },
      },
    ]),
  )
}
