import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { pino } from 'pino'
import type { DataSource } from 'typeorm'
import type { Job } from '@shared/api/jobs'
import { createDataSource } from '../../../server/platform/database'
import { Jobs, type JobHandler } from '../../../server/platform/jobs'
import { problem } from '../../../server/platform/problem'
import { migratedDatabase, type TestDatabase } from '../../support/database'

let database: TestDatabase
const open: { jobs: Jobs; dataSource: DataSource }[] = []

beforeEach(async () => {
  database = await migratedDatabase()
})
afterEach(async () => {
  for (const { jobs, dataSource } of open.splice(0)) {
    await jobs.stop()
    await dataSource.destroy()
  }
  await database.drop()
})

/** A process of its own, as far as the database can tell. */
async function aProcess(handler: JobHandler, work = true) {
  const dataSource = await createDataSource(database.url).initialize()
  const jobs = new Jobs(dataSource, database.url, pino({ level: 'silent' }))
  jobs.handle('release', handler)
  await jobs.start({ work })
  open.push({ jobs, dataSource })
  return { jobs, dataSource, enqueue: () => dataSource.transaction((em) => jobs.enqueue(em, aJob)) }
}

const aJob = { kind: 'release', sheet: 'MI-14', data: { submission: 'x' } } as const
const PATIENCE_MS = 15_000

async function reached(jobs: Jobs, id: string, state: Job['state']): Promise<Job> {
  const limit = Date.now() + PATIENCE_MS
  for (;;) {
    const job = await jobs.find(id)
    if (job?.state === state) return job
    if (Date.now() > limit) throw new Error(`The job is ${job?.state}: ${job?.message}`)
    await new Promise((resolve) => setTimeout(resolve, 30))
  }
}

describe('a job', () => {
  it('is done with its data, and keeps how far it is', async () => {
    const seen: unknown[] = []
    const { jobs, enqueue } = await aProcess(async (data, report) => {
      seen.push(data)
      await report(0.5, 'Half of it')
      await report(0.9, 'Edition 1 is released')
    })
    const { id, state } = await enqueue()
    expect(state).toBe('waiting')
    expect(await reached(jobs, id, 'done')).toMatchObject({ progress: 1, message: 'Edition 1 is released' })
    expect(seen).toEqual([{ submission: 'x' }])
  })

  it('does not exist if the transaction that asked for it is taken back', async () => {
    const done: unknown[] = []
    const { jobs, dataSource, enqueue } = await aProcess(async (data) => void done.push(data))
    let taken = ''
    await expect(
      dataSource.transaction(async (em) => {
        taken = (await jobs.enqueue(em, aJob)).id
        throw new Error('taken back')
      }),
    ).rejects.toThrow('taken back')
    await reached(jobs, (await enqueue()).id, 'done')
    expect(await jobs.find(taken)).toBeUndefined()
    expect(done).toHaveLength(1)
  })

  it('that fails says why: in its own words for a problem, without any word of the inside for a fault', async () => {
    const faults = [
      problem('cannot-print', 'A name holds Є.'),
      new TypeError('cannot read secrets of undefined'),
    ]
    const { jobs, enqueue } = await aProcess(async () => {
      throw faults.shift()
    })
    expect((await reached(jobs, (await enqueue()).id, 'failed')).message).toBe('A name holds Є.')
    expect((await reached(jobs, (await enqueue()).id, 'failed')).message).not.toContain('secrets')
  })

  it('is done by one worker, however many there are', async () => {
    let times = 0
    const handler: JobHandler = async () => {
      times += 1
      await new Promise((resolve) => setTimeout(resolve, 300))
    }
    const first = await aProcess(handler)
    await aProcess(handler)
    const ids = [(await first.enqueue()).id, (await first.enqueue()).id, (await first.enqueue()).id]
    for (const id of ids) await reached(first.jobs, id, 'done')
    expect(times).toBe(3)
  })

  it('whose process died is begun again by the next', async () => {
    let begun = false
    const dying = await aProcess(() => {
      begun = true
      return new Promise(() => undefined)
    })
    const { id } = await dying.enqueue()
    await reached(dying.jobs, id, 'running')
    expect(begun).toBe(true)
    // What a kill -9 leaves: the process's connections are gone, its job is neither done nor failed.
    await open[0]?.dataSource.query(
      'SELECT pg_terminate_backend(pid) FROM pg_stat_activity WHERE datname = current_database() AND pid <> pg_backend_pid()',
    )
    open.splice(0)
    const next = await aProcess(async (_data, report) => report(1, 'Done after all'))
    expect((await reached(next.jobs, id, 'done')).message).toBe('Done after all')
  })
})
