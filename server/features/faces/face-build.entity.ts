import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'
import { SheetRow } from '../sheets/sheet.entity'

/** Which revision a sheet's faces were built from. */
@Entity('face_build')
export class FaceBuildRow {
  @PrimaryColumn({ name: 'sheet_id', type: 'uuid', primaryKeyConstraintName: 'face_build_pkey' })
  @ForeignKey(() => SheetRow, { name: 'face_build_sheet_fkey' })
  sheetId: string

  @Column({ name: 'revision', type: 'integer' })
  revision: number
}
