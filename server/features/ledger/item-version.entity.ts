import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm'
import type { Provenance } from '@shared/api/ledger'
import type { Item, ItemKind } from '@shared/items/item'
import { SheetRow } from '../sheets/sheet.entity'
import { RevisionRow } from './revision.entity'

/** One version of one item: it held from revision `since` until before revision `until`. Never changed but for closing. */
@Entity('item_version')
@Index('item_version_current', ['itemId'], { unique: true, where: 'until IS NULL' })
@Index('item_version_current_kind', ['sheetId', 'kind'], { where: 'until IS NULL' })
@Index('item_version_since', ['sheetId', 'since'])
@Index('item_version_until', ['sheetId', 'until'], { where: 'until IS NOT NULL' })
@Index('item_version_geometry', ['geometry'], { spatial: true, where: 'until IS NULL' })
@Check('item_version_order', 'until > since')
@ForeignKey(() => RevisionRow, ['sheetId', 'since'], ['sheetId', 'number'], {
  name: 'item_version_revision_fkey',
})
export class ItemVersionRow {
  @PrimaryColumn({ name: 'item_id', type: 'uuid', primaryKeyConstraintName: 'item_version_pkey' })
  itemId: string

  @PrimaryColumn({ name: 'since', type: 'integer', primaryKeyConstraintName: 'item_version_pkey' })
  since: number

  /** Null for the version that holds now. */
  @Column({ name: 'until', type: 'integer', nullable: true })
  until: number | null

  @Column({ name: 'sheet_id', type: 'uuid' })
  @ForeignKey(() => SheetRow, { name: 'item_version_sheet_fkey' })
  sheetId: string

  @Column({ name: 'kind', type: 'text' })
  kind: ItemKind

  /** In the sheet's system, on the 1 mm grid; null for kinds without a place. */
  @Column({ name: 'geometry', type: 'geometry', spatialFeatureType: 'Geometry', srid: 0, nullable: true })
  geometry: unknown

  /** Checked by the kind's schema before it is stored. */
  @Column({ name: 'properties', type: 'jsonb' })
  properties: Item['properties']

  @Column({ name: 'provenance', type: 'jsonb', nullable: true })
  provenance: Provenance | null
}
