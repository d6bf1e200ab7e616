import { z } from 'zod'
import { nothing } from './common'
import { endpoint } from './endpoint'

export const getOpenApi = endpoint({
  id: 'getOpenApi',
  room: 'openapi',
  method: 'get',
  path: '/openapi.json',
  summary: 'This description of the API, as OpenAPI 3.1',
  access: { to: 'anyone' },
  params: nothing,
  query: nothing,
  body: nothing,
  answer: z.looseObject({ openapi: z.string(), paths: z.record(z.string(), z.unknown()) }),
  problems: [],
})
