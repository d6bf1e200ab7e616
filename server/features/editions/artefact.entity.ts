import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm'
import { EditionRow } from './edition.entity'

/** A file of an edition: what it is called, its checksum, and where storage keeps it. Sealed by a trigger. */
@Entity('artefact')
export class ArtefactRow {
  @PrimaryColumn({ name: 'edition_id', type: 'uuid', primaryKeyConstraintName: 'artefact_pkey' })
  @ForeignKey(() => EditionRow, { name: 'artefact_edition_fkey' })
  editionId: string

  @PrimaryColumn({ name: 'name', type: 'text', primaryKeyConstraintName: 'artefact_pkey' })
  name: string

  /** Place in the list of files, from 0. */
  @Column({ name: 'place', type: 'integer' })
  place: number

  @Column({ name: 'title', type: 'text' })
  title: string

  @Column({ name: 'media_type', type: 'text' })
  mediaType: string

  @Column({ name: 'bytes', type: 'bigint' })
  bytes: string

  @Column({ name: 'sha256', type: 'text' })
  sha256: string

  @Column({ name: 'storage_key', type: 'text' })
  storageKey: string
}
