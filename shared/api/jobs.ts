import { z } from 'zod'
import { nothing } from './common'
import { endpoint } from './endpoint'

export const jobSchema = z
  .strictObject({
    id: z.uuid(),
    kind: z.enum(['release']),
    sheet: z.string(),
    state: z.enum(['waiting', 'running', 'done', 'failed']),
    /** 0–1. */
    progress: z.number().min(0).max(1),
    /** What is being done, or why it failed, in words. */
    message: z.string(),
  })
  .meta({ id: 'Job' })
export type Job = z.infer<typeof jobSchema>

export const getJob = endpoint({
  id: 'getJob',
  room: 'jobs',
  method: 'get',
  path: '/jobs/{job}',
  summary: 'How far a job is',
  access: { to: 'signed-in' },
  params: z.strictObject({ job: z.uuid() }),
  query: nothing,
  body: nothing,
  answer: jobSchema,
  problems: ['not-found'],
})
