import type { EntityManager } from 'typeorm'
import type { Intake } from '@shared/api/intake'
import type { Person } from '@shared/api/common'
import type { Mapping } from '@shared/intake/mapping'
import type { IntakeReport } from './intake.entity'
import type { FileSummary } from './intake-task'
import type { FileCrs } from './readers/read-outcome'

/** An intake with who brought it and the earlier intake of the same bytes on this sheet, if there was one. */
export interface StoredIntake {
  id: string
  sheetId: string
  file: string
  bytes: number
  sha256: string
  storageKey: string
  state: Intake['state']
  crs: FileCrs | null
  summary: FileSummary
  mapping: Mapping | null
  revision: number | null
  createdAt: Date
  by: Person
  same: { file: string; name: string; revision: number; at: string } | null
}

const intakeColumns = `intake.id, intake.sheet_id AS "sheetId", intake.file, intake.bytes, intake.sha256,
  intake.storage_key AS "storageKey", intake.state, intake.crs, intake.summary, intake.mapping, intake.revision,
  intake.created_at AS "createdAt",
  json_build_object('id', account.id, 'name', account.name, 'initials', account.initials) AS by,
  (SELECT json_build_object('file', other.file, 'name', taker.name, 'revision', other.revision, 'at', entry.at)
   FROM intake AS other
   JOIN revision AS entry ON entry.sheet_id = other.sheet_id AND entry.number = other.revision
   JOIN account AS taker ON taker.id = entry.author_id
   WHERE other.sheet_id = intake.sheet_id AND other.sha256 = intake.sha256 AND other.id <> intake.id
     AND other.state = 'taken-in'
   ORDER BY other.revision LIMIT 1) AS same`

const fromIntake = 'FROM intake JOIN account ON account.id = intake.account_id'

/** Files brought to a sheet, newest first. */
export async function selectIntakes(em: EntityManager, sheetId: string): Promise<StoredIntake[]> {
  return em.query(
    `SELECT ${intakeColumns} ${fromIntake} WHERE intake.sheet_id = $1 ORDER BY intake.created_at DESC, intake.id`,
    [sheetId],
  )
}

export async function findIntake(
  em: EntityManager,
  sheetId: string,
  id: string,
): Promise<StoredIntake | undefined> {
  const [row] = await em.query<StoredIntake[]>(
    `SELECT ${intakeColumns} ${fromIntake} WHERE intake.sheet_id = $1 AND intake.id = $2`,
    [sheetId, id],
  )
  return row
}

/** State of an intake whose row is locked until the transaction ends: of two hands that take it in, one waits. */
export async function lockIntakeState(em: EntityManager, id: string): Promise<Intake['state'] | undefined> {
  const [row] = await em.query<{ state: Intake['state'] }[]>(
    'SELECT state FROM intake WHERE id = $1 FOR UPDATE',
    [id],
  )
  return row?.state
}

export interface NewIntake {
  id: string
  sheetId: string
  accountId: string
  file: string
  bytes: number
  sha256: string
  storageKey: string
  crs: FileCrs | null
  summary: FileSummary
}

export async function insertIntake(em: EntityManager, intake: NewIntake): Promise<void> {
  await em.query(
    `INSERT INTO intake (id, sheet_id, account_id, file, bytes, sha256, storage_key, crs, summary)
     VALUES ($1, $2, $3, $4, $5, $6, $7, $8, $9)`,
    [
      intake.id,
      intake.sheetId,
      intake.accountId,
      intake.file,
      intake.bytes,
      intake.sha256,
      intake.storageKey,
      JSON.stringify(intake.crs),
      JSON.stringify(intake.summary),
    ],
  )
}

export async function markTakenIn(
  em: EntityManager,
  id: string,
  taken: { revision: number; mapping: Mapping; report: IntakeReport },
): Promise<void> {
  await em.query(
    `UPDATE intake SET state = 'taken-in', revision = $2, mapping = $3, report = $4 WHERE id = $1`,
    [id, taken.revision, JSON.stringify(taken.mapping), JSON.stringify(taken.report)],
  )
}

export async function markDiscarded(em: EntityManager, id: string): Promise<void> {
  await em.query(`UPDATE intake SET state = 'discarded' WHERE id = $1`, [id])
}

/** PROJ definition of a coordinate system as PostGIS holds it. */
export async function findProj4(em: EntityManager, srid: number): Promise<string | undefined> {
  const [row] = await em.query<{ proj4text: string }[]>(
    'SELECT proj4text FROM spatial_ref_sys WHERE srid = $1',
    [srid],
  )
  return row?.proj4text.trim()
}
