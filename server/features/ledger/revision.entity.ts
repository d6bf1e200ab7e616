import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { LedgerEntry } from '@shared/api/sheets'
import type { ItemKind } from '@shared/items/item'
import { Account } from '../accounts/account.entity'
import { SheetRow } from '../sheets/sheet.entity'

/** One entry of a sheet's ledger: who changed it, when, and why. Numbers run 1, 2, 3 … per sheet without gaps. */
@Entity('revision')
@Index('revision_change_key_unique', ['sheetId', 'authorId', 'changeKey'], {
  unique: true,
  where: 'change_key IS NOT NULL',
})
@Index('revision_of_author', ['sheetId', 'authorId', 'number'])
@Index('revision_extent', ['extent'], { spatial: true })
@Check('revision_number_positive', '"number" > 0')
@Check('revision_key_with_digest', '(change_key IS NULL) = (body_digest IS NULL)')
export class RevisionRow {
  @PrimaryColumn({ name: 'sheet_id', type: 'uuid', primaryKeyConstraintName: 'revision_pkey' })
  @ForeignKey(() => SheetRow, { name: 'revision_sheet_fkey' })
  sheetId: string

  @PrimaryColumn({ name: 'number', type: 'integer', primaryKeyConstraintName: 'revision_pkey' })
  number: number

  @Column({ name: 'kind', type: 'text' })
  kind: LedgerEntry['kind']

  @Column({ name: 'author_id', type: 'uuid' })
  @ForeignKey(() => Account, { name: 'revision_author_fkey' })
  authorId: string

  @Column({ name: 'at', type: 'timestamptz', default: () => 'now()' })
  at: Date

  @Column({ name: 'message', type: 'text' })
  message: string

  /** Items put and removed. */
  @Column({ name: 'changed', type: 'integer' })
  changed: number

  /** Idempotency key of the call that wrote this entry; null for entries written by the server itself. */
  @Column({ name: 'change_key', type: 'uuid', nullable: true })
  changeKey: string | null

  /** SHA-256 of that call's body, hexadecimal. */
  @Column({ name: 'body_digest', type: 'text', nullable: true })
  bodyDigest: string | null

  /** Items that were stored otherwise than sent, so that a repeated call gets the same answer. */
  @Column({ name: 'altered', type: 'uuid', array: true, default: () => `'{}'` })
  altered: string[]

  /** What changed, in words made from the versions. */
  @Column({ name: 'what', type: 'text', default: '' })
  what: string

  /** Kinds of the items that changed. */
  @Column({ name: 'kinds', type: 'text', array: true, default: () => `'{}'` })
  kinds: ItemKind[]

  /** Rectangle around what changed, as it is and as it was; null for changes of the legend or the sheet face alone. */
  @Column({ name: 'extent', type: 'geometry', spatialFeatureType: 'Geometry', srid: 0, nullable: true })
  extent: unknown
}
