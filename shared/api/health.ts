import { z } from 'zod'
import { nothing } from './common'
import { endpoint } from './endpoint'

export const getHealth = endpoint({
  id: 'getHealth',
  room: 'health',
  method: 'get',
  path: '/health',
  summary: 'Whether the service is up, and its version',
  access: { to: 'anyone' },
  params: nothing,
  query: nothing,
  body: nothing,
  answer: z.strictObject({ status: z.literal('ok'), version: z.string(), database: z.string() }),
  problems: ['unavailable'],
})
