import { Check, Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { Intake } from '@shared/api/intake'
import type { Mapping } from '@shared/intake/mapping'
import { Account } from '../accounts/account.entity'
import { SheetRow } from '../sheets/sheet.entity'
import type { FileSummary } from './intake-task'
import type { FileCrs } from './readers/read-outcome'

/** What taking a file in gave. */
export interface IntakeReport {
  accepted: number
  refused: number
  outside: number
  leftOut: number
}

/** A field file brought to a sheet: the original is in storage, what was read of it here. */
@Entity('intake')
@Index('intake_sheet', ['sheetId', 'createdAt'])
@Index('intake_same_file', ['sheetId', 'sha256'])
@Check('intake_state_known', `"state" IN ('read', 'taken-in', 'discarded')`)
@Check('intake_revision_if_taken_in', `("state" = 'taken-in') = ("revision" IS NOT NULL)`)
export class IntakeRow {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'intake_pkey' })
  id: string

  @Column({ name: 'sheet_id', type: 'uuid' })
  @ForeignKey(() => SheetRow, { name: 'intake_sheet_fkey' })
  sheetId: string

  /** Who brought it. */
  @Column({ name: 'account_id', type: 'uuid' })
  @ForeignKey(() => Account, { name: 'intake_account_fkey' })
  accountId: string

  @Column({ name: 'file', type: 'text' })
  file: string

  @Column({ name: 'bytes', type: 'integer' })
  bytes: number

  /** Of the original, hexadecimal. */
  @Column({ name: 'sha256', type: 'char', length: 64 })
  sha256: string

  /** Where the original lies in storage. */
  @Column({ name: 'storage_key', type: 'text' })
  storageKey: string

  @Column({ name: 'state', type: 'text', default: 'read' })
  state: Intake['state']

  /** The system that the file names, if it is not WGS 84. */
  @Column({ name: 'crs', type: 'jsonb', nullable: true })
  crs: FileCrs | null

  @Column({ name: 'summary', type: 'jsonb' })
  summary: FileSummary

  /** The mapping that it was taken in with. */
  @Column({ name: 'mapping', type: 'jsonb', nullable: true })
  mapping: Mapping | null

  @Column({ name: 'report', type: 'jsonb', nullable: true })
  report: IntakeReport | null

  /** Revision of the sheet that it became. */
  @Column({ name: 'revision', type: 'integer', nullable: true })
  revision: number | null

  @Column({ name: 'created_at', type: 'timestamptz', default: () => 'now()' })
  createdAt: Date
}
