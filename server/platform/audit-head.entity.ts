import { Check, Column, Entity, PrimaryColumn } from 'typeorm'

/** The end of the audit trail, one row: who adds an entry locks it, and an entry taken off the end is missed here. */
@Entity('audit_head')
@Check('audit_head_one_row', 'one')
export class AuditHeadRow {
  @PrimaryColumn({ name: 'one', type: 'boolean', primaryKeyConstraintName: 'audit_head_pkey' })
  one: boolean

  /** Number and hash of the newest entry. */
  @Column({ name: 'number', type: 'integer' })
  number: number

  @Column({ name: 'hash', type: 'text' })
  hash: string
}
