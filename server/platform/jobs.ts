import type { Logger } from 'pino'
import PgBoss from 'pg-boss'
import type { DataSource, EntityManager } from 'typeorm'
import type { Job } from '@shared/api/jobs'
import { announce } from './announce'
import { JobRow } from './job.entity'
import { holdJob, insertJob, listOpenJobs, listRecentJobs, updateJob, type JobChange } from './job.queries'
import { ProblemError } from './problem'

/** Work for later. */
export interface NewJob {
  kind: Job['kind']
  /** Number of the sheet that it works on. */
  sheet: string
  /** JSON for the handler. */
  data: object
}

/** Tells how far the work is.
 *  @param progress 0–1   @param message what is being done, in words */
export type ReportProgress = (progress: number, message: string) => Promise<void>

/** Does the work of one job. A job whose process died is begun again, so what it did before may be there already. */
export type JobHandler = (data: unknown, report: ReportProgress) => Promise<void>

const kinds: readonly Job['kind'][] = ['release']

/** The queue gives a job up after this long; ours are found much sooner when their process dies (see `resume`). */
const QUEUE_EXPIRY_HOURS = 23
/** Shortest that the queue allows: a person waits for the first progress. */
const POLLING_S = 0.5
const RESUME_EVERY_MS = 30_000
/** What went wrong, to somebody who cannot read a log. */
const FAILED =
  'It failed on our side, and nothing was released or changed. Try again; if it stays, tell the administrator.'

/** Long work in PostgreSQL: queued in the transaction that asks for it, done by any worker process, its progress kept in
 *  the `job` table and announced to the sheet's open clients. */
export class Jobs {
  private readonly handlers = new Map<Job['kind'], JobHandler>()
  private readonly boss: PgBoss
  private resuming: NodeJS.Timeout | undefined
  private working = false

  constructor(
    private readonly dataSource: DataSource,
    connectionString: string,
    private readonly log: Logger,
  ) {
    this.boss = new PgBoss({
      connectionString,
      max: 3,
      application_name: 'sheetwright-jobs',
      schedule: false,
    })
    this.boss.on('error', (fault) => this.log.error({ err: fault }, 'The job queue reports a fault'))
  }

  /** Names who does the jobs of a kind; before `start`. */
  handle(kind: Job['kind'], handler: JobHandler): void {
    this.handlers.set(kind, handler)
  }

  /** Makes the queues; with `work`, this process also does jobs. */
  async start({ work }: { work: boolean }): Promise<void> {
    await this.boss.start()
    for (const kind of kinds) await this.boss.createQueue(kind)
    if (!work) return
    this.working = true
    for (const kind of this.handlers.keys()) {
      await this.boss.work<{ job: string }>(kind, { pollingIntervalSeconds: POLLING_S }, async (queued) => {
        for (const { data } of queued) await this.run(data.job)
      })
    }
    await this.resume()
    this.resuming = setInterval(() => {
      this.resume().catch((fault: unknown) =>
        this.log.error({ err: fault }, 'Cannot look for jobs to resume'),
      )
    }, RESUME_EVERY_MS)
  }

  /** Ends after the jobs that this process is doing. */
  async stop(): Promise<void> {
    clearInterval(this.resuming)
    await this.boss.stop({ graceful: this.working, wait: true, timeout: 20_000 })
  }

  /** Queues a job in the caller's transaction: it exists if and only if that commits. */
  async enqueue(em: EntityManager, newJob: NewJob): Promise<Job> {
    const job = await insertJob(em, newJob)
    await this.send(em, job)
    await announce(em, job.sheet, { event: 'job', job })
    return job
  }

  /** How far a job is; undefined if there is none. */
  async find(id: string): Promise<Job | undefined> {
    const row = await this.dataSource.manager.findOneBy(JobRow, { id })
    return row ? toJobAnswer(row) : undefined
  }

  /** The jobs of a sheet that are open or ended a moment ago, oldest first. */
  listRecent(sheetNumber: string): Promise<Job[]> {
    return listRecentJobs(this.dataSource.manager, sheetNumber)
  }

  private async send(em: EntityManager, job: Job): Promise<void> {
    await this.boss.send(
      job.kind,
      { job: job.id },
      {
        id: job.id,
        retryLimit: 0,
        expireInHours: QUEUE_EXPIRY_HOURS,
        db: { executeSql: async (text, values) => ({ rows: await em.query(text, values) }) },
      },
    )
  }

  /** Queues again what a process that died had begun: no living worker holds it, and the queue thinks it gone. */
  private async resume(): Promise<void> {
    for (const job of await listOpenJobs(this.dataSource.manager)) {
      const hold = await holdJob(this.dataSource, job.id)
      if (!hold) continue
      try {
        const queued = await this.boss.getJobById(job.kind, job.id)
        if (queued?.state === 'created') continue
        await this.change(job.id, { state: 'waiting', progress: 0, message: 'Waiting to begin again' })
        await this.boss.deleteJob(job.kind, job.id)
        await this.send(this.dataSource.manager, job)
      } finally {
        await hold.release()
      }
    }
  }

  /** Does one job, unless another worker holds it or it has ended. */
  private async run(id: string): Promise<void> {
    const hold = await holdJob(this.dataSource, id)
    if (!hold) return
    try {
      const row = await this.dataSource.manager.findOneBy(JobRow, { id })
      const handler = row && this.handlers.get(row.kind)
      if (!row || !handler || row.state === 'done' || row.state === 'failed') return
      await this.change(id, { state: 'running', progress: 0, message: 'Begun' })
      let last = ''
      await handler(row.data, async (progress, message) => {
        last = message
        await this.change(id, { state: 'running', progress, message })
      })
      await this.change(id, { state: 'done', progress: 1, message: last })
    } catch (fault) {
      this.log.error({ err: fault, job: id }, 'A job failed')
      await this.change(id, {
        state: 'failed',
        message: fault instanceof ProblemError ? fault.message : FAILED,
      })
    } finally {
      await hold.release()
    }
  }

  private async change(id: string, change: JobChange): Promise<void> {
    await this.dataSource.transaction(async (em) => {
      const job = await updateJob(em, id, change)
      await announce(em, job.sheet, { event: 'job', job })
    })
  }
}

const toJobAnswer = ({ id, kind, sheet, state, progress, message }: JobRow): Job => ({
  id,
  kind,
  sheet,
  state,
  progress,
  message,
})
