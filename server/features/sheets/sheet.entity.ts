import { Check, Column, Entity, Index, PrimaryGeneratedColumn } from 'typeorm'
import type { SheetState } from '@shared/api/sheets'

/** A map sheet. Its content is items in the ledger; this row holds what cannot change without a new sheet, its state,
 *  and the numbers that order its changes. */
@Entity('sheet')
@Index('sheet_number_unique', ['number'], { unique: true })
@Check('sheet_state_known', `"state" IN ('drafting', 'submitted', 'approved', 'releasing')`)
export class SheetRow {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'sheet_pkey' })
  id: string

  @Column({ name: 'number', type: 'varchar', length: 20 })
  number: string

  @Column({ name: 'title', type: 'text' })
  title: string

  /** Scale denominator. */
  @Column({ name: 'scale', type: 'integer' })
  scale: number

  /** EPSG code of the projected system, metres. */
  @Column({ name: 'srid', type: 'integer' })
  srid: number

  /** Closed ring, counter-clockwise, on the 1 mm grid, in the sheet's own system. */
  @Column({ name: 'neatline', type: 'geometry', spatialFeatureType: 'Geometry', srid: 0 })
  neatline: unknown

  /** Millimetres. */
  @Column({ name: 'page_width', type: 'double precision' })
  pageWidth: number

  /** Millimetres. */
  @Column({ name: 'page_height', type: 'double precision' })
  pageHeight: number

  @Column({ name: 'state', type: 'text', default: 'drafting' })
  state: SheetState

  /** Number of the latest ledger entry. */
  @Column({ name: 'revision', type: 'integer', default: 0 })
  revision: number

  /** Latest revision that changed linework or unit labels: faces built before it are stale. */
  @Column({ name: 'linework_revision', type: 'integer', default: 0 })
  lineworkRevision: number

  /** Number of the current edition; null before the first. */
  @Column({ name: 'edition', type: 'integer', nullable: true })
  edition: number | null

  @Column({ name: 'created_at', type: 'timestamptz', default: () => 'now()' })
  createdAt: Date
}
