import { Check, Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { Job } from '@shared/api/jobs'

/** Long work and how far it is. The queue decides when it runs; this row outlives the queue's own. */
@Entity('job')
@Index('job_open', ['kind'], { where: `(state = ANY (ARRAY['waiting'::text, 'running'::text]))` })
@Check('job_state_known', `"state" IN ('waiting', 'running', 'done', 'failed')`)
@Check('job_progress_range', '"progress" BETWEEN 0 AND 1')
export class JobRow {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'job_pkey' })
  id: string

  @Column({ name: 'kind', type: 'text' })
  kind: Job['kind']

  /** Number of the sheet that it works on. */
  @Column({ name: 'sheet', type: 'text' })
  sheet: string

  /** What the handler gets. */
  @Column({ name: 'data', type: 'jsonb' })
  data: object

  @Column({ name: 'state', type: 'text', default: 'waiting' })
  state: Job['state']

  /** 0–1. */
  @Column({ name: 'progress', type: 'double precision', default: 0 })
  progress: number

  /** What is being done, or why it failed, in words. */
  @Column({ name: 'message', type: 'text', default: '' })
  message: string

  @Column({ name: 'created_at', type: 'timestamptz', default: () => 'now()' })
  createdAt: Date

  @Column({ name: 'changed_at', type: 'timestamptz', default: () => 'now()' })
  changedAt: Date
}
