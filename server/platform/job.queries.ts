import type { DataSource, EntityManager } from 'typeorm'
import type { Job } from '@shared/api/jobs'

export interface JobChange {
  state: Job['state']
  /** 0–1; as it was, if left out. */
  progress?: number
  message: string
}

/** Longest message kept, letters: an announcement has to fit into a notification. */
const MAX_MESSAGE = 1000

const columns = 'id, kind, sheet, state, progress, message'

export async function insertJob(
  em: EntityManager,
  job: { kind: Job['kind']; sheet: string; data: object },
): Promise<Job> {
  const [row] = await em.query<Job[]>(
    `INSERT INTO job (kind, sheet, data, message) VALUES ($1, $2, $3, 'Waiting for its turn') RETURNING ${columns}`,
    [job.kind, job.sheet, JSON.stringify(job.data)],
  )
  if (!row) throw new Error('A job was not written.')
  return row
}

export async function updateJob(em: EntityManager, id: string, change: JobChange): Promise<Job> {
  const [[row]] = await em.query<[Job[], number]>(
    `UPDATE job SET state = $2, progress = coalesce($3, progress), message = $4, changed_at = now()
     WHERE id = $1 RETURNING ${columns}`,
    [id, change.state, change.progress ?? null, change.message.slice(0, MAX_MESSAGE)],
  )
  if (!row) throw new Error(`There is no job ${id}.`)
  return row
}

/** Jobs that nobody has finished. */
export const listOpenJobs = (em: EntityManager): Promise<Job[]> =>
  em.query(`SELECT ${columns} FROM job WHERE state IN ('waiting', 'running') ORDER BY created_at`)

/** Open jobs of a sheet, and those that ended within the last minutes: who was away meanwhile should hear of them. */
export const listRecentJobs = (em: EntityManager, sheet: string): Promise<Job[]> =>
  em.query(
    `SELECT ${columns} FROM job
     WHERE sheet = $1 AND (state IN ('waiting', 'running') OR changed_at > now() - interval '5 minutes')
     ORDER BY created_at`,
    [sheet],
  )

/** Holds a job for this process by an advisory lock on a connection of its own; undefined if another process holds it.
 *  PostgreSQL lets go when the process dies, so a job of a dead worker can be told from one being done. */
export async function holdJob(
  dataSource: DataSource,
  id: string,
): Promise<{ release(): Promise<void> } | undefined> {
  const runner = dataSource.createQueryRunner()
  const [row] = await runner.query('SELECT pg_try_advisory_lock(hashtextextended($1, 0)) AS held', [id])
  if (!row.held) {
    await runner.release()
    return undefined
  }
  return {
    async release() {
      await runner.query('SELECT pg_advisory_unlock(hashtextextended($1, 0))', [id])
      await runner.release()
    },
  }
}
