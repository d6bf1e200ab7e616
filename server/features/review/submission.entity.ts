import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { RevisionContents, Submission } from '@shared/api/review'
import { Account } from '../accounts/account.entity'
import { SheetRow } from '../sheets/sheet.entity'

/** A revision handed to an approver, pinned by its digest, and what was decided. A trigger keeps it as it was made: only
 *  the decision is added once, and the job that releases it. */
@Entity('submission')
@Index('submission_open', ['sheetId'], { unique: true, where: 'decision IS NULL' })
@Index('submission_latest', ['sheetId', 'at'])
@Check('submission_decision_known', `"decision" IN ('approved', 'returned')`)
@Check(
  'submission_decided_whole',
  '(decision IS NULL) = (decided_by IS NULL) AND (decision IS NULL) = (decided_at IS NULL)',
)
@Check('submission_two_people', 'decided_by <> submitted_by')
export class SubmissionRow {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'submission_pkey' })
  id: string

  @Column({ name: 'sheet_id', type: 'uuid' })
  @ForeignKey(() => SheetRow, { name: 'submission_sheet_fkey' })
  sheetId: string

  @Column({ name: 'revision', type: 'integer' })
  revision: number

  /** Revision of the edition before; 0 for a first edition. */
  @Column({ name: 'since', type: 'integer' })
  since: number

  /** SHA-256 of the sheet and every item at the revision, hexadecimal. */
  @Column({ name: 'digest', type: 'text' })
  digest: string

  @Column({ name: 'contents', type: 'jsonb' })
  contents: RevisionContents['contents']

  @Column({ name: 'differences', type: 'jsonb' })
  differences: RevisionContents['differences']

  @Column({ name: 'submitted_by', type: 'uuid' })
  @ForeignKey(() => Account, { name: 'submission_submitted_by_fkey' })
  submittedBy: string

  @Column({ name: 'at', type: 'timestamptz', default: () => 'now()' })
  at: Date

  @Column({ name: 'message', type: 'text' })
  message: string

  @Column({ name: 'decision', type: 'text', nullable: true })
  decision: NonNullable<Submission['decision']>['decision'] | null

  @Column({ name: 'decided_by', type: 'uuid', nullable: true })
  @ForeignKey(() => Account, { name: 'submission_decided_by_fkey' })
  decidedBy: string | null

  @Column({ name: 'decided_at', type: 'timestamptz', nullable: true })
  decidedAt: Date | null

  @Column({ name: 'note', type: 'text', default: '' })
  note: string

  /** The job that releases it, the latest if one failed. */
  @Column({ name: 'job_id', type: 'uuid', nullable: true })
  jobId: string | null
}
