import { Column, Entity, ForeignKey, Index, PrimaryGeneratedColumn } from 'typeorm'
import { SheetRow } from '../sheets/sheet.entity'

/** A unit's area, derived from linework and unit labels; rebuilt whole, never edited. */
@Entity('face')
@Index('face_sheet', ['sheetId'])
@Index('face_outline', ['outline'], { spatial: true })
export class FaceRow {
  @PrimaryGeneratedColumn('uuid', { primaryKeyConstraintName: 'face_pkey' })
  id: string

  @Column({ name: 'sheet_id', type: 'uuid' })
  @ForeignKey(() => SheetRow, { name: 'face_sheet_fkey' })
  sheetId: string

  /** Legend unit; null where no label, or labels that disagree, stand in the face. */
  @Column({ name: 'unit_id', type: 'uuid', nullable: true })
  unitId: string | null

  @Column({ name: 'outline', type: 'geometry', spatialFeatureType: 'Geometry', srid: 0 })
  outline: unknown
}
