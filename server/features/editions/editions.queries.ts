import type { EntityManager } from 'typeorm'
import type { Edition } from '@shared/api/catalogue'
import type { Person } from '@shared/api/common'

/** An edition with its approver and files, as the database gives it. */
export interface StoredEdition extends Omit<Edition, 'releasedAt' | 'crs' | 'approvedBy'> {
  releasedAt: Date
  srid: number
  crsName: string
  approvedBy: Person
}

const editionQuery = `SELECT sheet.number AS sheet, edition.number AS edition, edition.title, edition.authors,
    edition.scale, edition.srid, edition.crs_name AS "crsName", edition.footprint, edition.released_at AS "releasedAt",
    edition.state, edition.revision, edition.citation, edition.caution,
    json_build_object('id', account.id, 'name', account.name, 'initials', account.initials) AS "approvedBy",
    (SELECT json_agg(json_build_object('name', artefact.name, 'title', artefact.title, 'mediaType', artefact.media_type,
       'bytes', artefact.bytes, 'sha256', artefact.sha256) ORDER BY artefact.place)
     FROM artefact WHERE artefact.edition_id = edition.id) AS artefacts
  FROM edition JOIN sheet ON sheet.id = edition.sheet_id JOIN account ON account.id = edition.approved_by`

/** Editions, newest first; those whose number, title or authors contain a text, if given. */
export async function selectEditions(em: EntityManager, text?: string): Promise<StoredEdition[]> {
  const pattern = text ? `%${text.replace(/[\\%_]/g, '\\$&')}%` : '%'
  return em.query(
    `${editionQuery} WHERE concat_ws(' ', sheet.number, edition.title, edition.authors) ILIKE $1
     ORDER BY edition.released_at DESC, sheet.number`,
    [pattern],
  )
}

export async function findEdition(
  em: EntityManager,
  sheetNumber: string,
  edition: number,
): Promise<StoredEdition | undefined> {
  const [row] = await em.query<StoredEdition[]>(
    `${editionQuery} WHERE sheet.number = $1 AND edition.number = $2`,
    [sheetNumber, edition],
  )
  return row
}

/** The revision that an edition was made of, whatever its state. */
export async function findEditionRevision(
  em: EntityManager,
  sheetId: string,
  edition: number,
): Promise<number | undefined> {
  const [row] = await em.query<{ revision: number }[]>(
    'SELECT revision FROM edition WHERE sheet_id = $1 AND number = $2',
    [sheetId, edition],
  )
  return row?.revision
}

/** The latest edition of a sheet, whatever its state. */
export async function findLatestEdition(
  em: EntityManager,
  sheetId: string,
): Promise<{ number: number; revision: number } | undefined> {
  const [row] = await em.query<{ number: number; revision: number }[]>(
    'SELECT number, revision FROM edition WHERE sheet_id = $1 ORDER BY number DESC LIMIT 1',
    [sheetId],
  )
  return row
}

/** Where storage keeps a file that an edition lists. */
export async function getStorageKey(
  em: EntityManager,
  sheetNumber: string,
  edition: number,
  name: string,
): Promise<string> {
  const [row] = await em.query<{ key: string }[]>(
    `SELECT artefact.storage_key AS key FROM artefact
     JOIN edition ON edition.id = artefact.edition_id JOIN sheet ON sheet.id = edition.sheet_id
     WHERE sheet.number = $1 AND edition.number = $2 AND artefact.name = $3`,
    [sheetNumber, edition, name],
  )
  if (!row) throw new RangeError(`Edition ${edition} of sheet ${sheetNumber} has no file ${name}.`)
  return row.key
}

export interface NewEdition {
  number: number
  submissionId: string
  revision: number
  digest: string
  title: string
  authors: string
  scale: number
  srid: number
  crsName: string
  footprint: Edition['footprint']
  citation: string
  caution: string
  releasedAt: Date
  approvedBy: string
}

/** Puts an edition in the place of the current one; answers with its id. */
export async function insertEdition(
  em: EntityManager,
  sheetId: string,
  edition: NewEdition,
): Promise<string> {
  await em.query(`UPDATE edition SET state = 'superseded' WHERE sheet_id = $1 AND state = 'current'`, [
    sheetId,
  ])
  const [row] = await em.query<{ id: string }[]>(
    `INSERT INTO edition (sheet_id, number, submission_id, revision, digest, title, authors, scale, srid, crs_name,
       footprint, citation, caution, released_at, approved_by)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9, $10, $11, $12, $13, $14, $15) RETURNING id`,
    [
      sheetId,
      edition.number,
      edition.submissionId,
      edition.revision,
      edition.digest,
      edition.title,
      edition.authors,
      edition.scale,
      edition.srid,
      edition.crsName,
      JSON.stringify(edition.footprint),
      edition.citation,
      edition.caution,
      edition.releasedAt,
      edition.approvedBy,
    ],
  )
  if (!row) throw new Error(`Edition ${edition.number} was not written.`)
  await em.query(`UPDATE sheet SET edition = $2, state = 'drafting' WHERE id = $1`, [sheetId, edition.number])
  return row.id
}

export interface NewArtefact {
  name: string
  title: string
  mediaType: string
  bytes: number
  sha256: string
  storageKey: string
}

export async function insertArtefacts(
  em: EntityManager,
  editionId: string,
  artefacts: readonly NewArtefact[],
): Promise<void> {
  for (const [place, file] of artefacts.entries()) {
    await em.query(
      `INSERT INTO artefact (edition_id, name, place, title, media_type, bytes, sha256, storage_key)
       VALUES ($1, $2, $3, $4, $5, $6, $7, $8)`,
      [editionId, file.name, place, file.title, file.mediaType, file.bytes, file.sha256, file.storageKey],
    )
  }
}

/** A sheet row, locked until the transaction ends. */
export async function lockReleasing(
  em: EntityManager,
  sheetId: string,
): Promise<{ number: string; state: string }> {
  const [row] = await em.query<{ number: string; state: string }[]>(
    'SELECT number, state FROM sheet WHERE id = $1 FOR UPDATE',
    [sheetId],
  )
  if (!row) throw new RangeError(`There is no sheet ${sheetId}.`)
  return row
}
