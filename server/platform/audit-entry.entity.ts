import { Check, Column, Entity, Index, PrimaryColumn } from 'typeorm'
import type { AuditKind } from '@shared/audit/audit-event'

/** One entry of the audit trail. The application may only add; a trigger refuses everything else, whoever asks. */
@Entity('audit_entry')
@Index('audit_entry_kind', ['kind', 'number'])
@Index('audit_entry_account', ['accountId', 'number'])
@Index('audit_entry_sheet', ['sheet', 'number'])
@Check('audit_entry_number_positive', '"number" > 0')
export class AuditEntryRow {
  @PrimaryColumn({ name: 'number', type: 'integer', primaryKeyConstraintName: 'audit_entry_pkey' })
  number: number

  @Column({ name: 'at', type: 'timestamptz' })
  at: Date

  @Column({ name: 'kind', type: 'text' })
  kind: AuditKind

  /** Who; null where nobody was signed in. No foreign key: the trail outlives everything that it speaks of. */
  @Column({ name: 'account_id', type: 'uuid', nullable: true })
  accountId: string | null

  /** Number of the sheet that it is about. */
  @Column({ name: 'sheet', type: 'text', nullable: true })
  sheet: string | null

  /** What an event of its kind has besides. */
  @Column({ name: 'detail', type: 'jsonb' })
  detail: Record<string, unknown>

  /** Hash of the entry before; 64 zeros for the first. */
  @Column({ name: 'previous', type: 'text' })
  previous: string

  /** SHA-256 over everything above, hexadecimal. */
  @Column({ name: 'hash', type: 'text' })
  hash: string
}
