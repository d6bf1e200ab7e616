import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { Edition } from '@shared/api/catalogue'
import { Account } from '../accounts/account.entity'
import { SubmissionRow } from '../review/submission.entity'
import { SheetRow } from '../sheets/sheet.entity'

/** A released edition of a sheet. It keeps what it was released with; a trigger refuses every change but that of its state
 *  from current to superseded or withdrawn. */
@Entity('edition')
@Index('edition_number_unique', ['sheetId', 'number'], { unique: true })
@Index('edition_submission_unique', ['submissionId'], { unique: true })
@Index('edition_current', ['sheetId'], { unique: true, where: `state = 'current'` })
@Check('edition_state_known', `"state" IN ('current', 'superseded', 'withdrawn')`)
export class EditionRow {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'edition_pkey' })
  id: string

  @Column({ name: 'sheet_id', type: 'uuid' })
  @ForeignKey(() => SheetRow, { name: 'edition_sheet_fkey' })
  sheetId: string

  /** 1, 2, 3 … per sheet. */
  @Column({ name: 'number', type: 'integer' })
  number: number

  @Column({ name: 'submission_id', type: 'uuid' })
  @ForeignKey(() => SubmissionRow, { name: 'edition_submission_fkey' })
  submissionId: string

  @Column({ name: 'revision', type: 'integer' })
  revision: number

  /** The submission's: SHA-256 of the sheet and every item at the revision. */
  @Column({ name: 'digest', type: 'text' })
  digest: string

  @Column({ name: 'title', type: 'text' })
  title: string

  @Column({ name: 'authors', type: 'text' })
  authors: string

  @Column({ name: 'scale', type: 'integer' })
  scale: number

  @Column({ name: 'srid', type: 'integer' })
  srid: number

  @Column({ name: 'crs_name', type: 'text' })
  crsName: string

  /** Closed ring, WGS 84 degrees. */
  @Column({ name: 'footprint', type: 'jsonb' })
  footprint: Edition['footprint']

  @Column({ name: 'citation', type: 'text' })
  citation: string

  @Column({ name: 'caution', type: 'text' })
  caution: string

  @Column({ name: 'released_at', type: 'timestamptz' })
  releasedAt: Date

  @Column({ name: 'approved_by', type: 'uuid' })
  @ForeignKey(() => Account, { name: 'edition_approved_by_fkey' })
  approvedBy: string

  @Column({ name: 'state', type: 'text', default: 'current' })
  state: Edition['state']
}
