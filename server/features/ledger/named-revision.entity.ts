import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import { Account } from '../accounts/account.entity'
import { RevisionRow } from './revision.entity'

/** A name put on a revision after it was written; the revision itself stays as it is. */
@Entity('named_revision')
@Index('named_revision_name_unique', ['sheetId', 'name'], { unique: true })
@Check('named_revision_has_name', `"name" <> ''`)
@ForeignKey(() => RevisionRow, ['sheetId', 'revision'], ['sheetId', 'number'], {
  name: 'named_revision_revision_fkey',
})
export class NamedRevisionRow {
  @PrimaryColumn({ name: 'sheet_id', type: 'uuid', primaryKeyConstraintName: 'named_revision_pkey' })
  sheetId: string

  @PrimaryColumn({ name: 'revision', type: 'integer', primaryKeyConstraintName: 'named_revision_pkey' })
  revision: number

  @Column({ name: 'name', type: 'text' })
  name: string

  @Column({ name: 'note', type: 'text', default: '' })
  note: string

  @Column({ name: 'named_by', type: 'uuid' })
  @ForeignKey(() => Account, { name: 'named_revision_named_by_fkey' })
  namedBy: string

  @Column({ name: 'at', type: 'timestamptz', default: () => 'now()' })
  at: Date
}
