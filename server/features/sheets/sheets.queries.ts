import type { EntityManager } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import type { NewSheet, SheetState } from '@shared/api/sheets'
import type { XY } from '@shared/units'

/** A coordinate reference system as PostGIS keeps it. */
export interface CrsRow {
  srid: number
  srtext: string
  proj4text: string
}

export async function findCrs(em: EntityManager, srid: number): Promise<CrsRow | undefined> {
  const [row] = await em.query<CrsRow[]>(
    'SELECT srid, srtext, proj4text FROM spatial_ref_sys WHERE srid = $1',
    [srid],
  )
  return row
}

/** Id of the new sheet; undefined if its number is taken, also by someone who is creating it at this moment. */
export async function insertSheet(
  em: EntityManager,
  sheet: NewSheet,
  neatline: readonly XY[],
): Promise<string | undefined> {
  const [row] = await em.query<{ id: string }[]>(
    `INSERT INTO sheet (number, title, scale, srid, neatline, page_width, page_height)
     VALUES ($1, $2, $3, $4, ST_SetSRID(ST_GeomFromGeoJSON($5), $4::integer), $6, $7)
     ON CONFLICT (number) DO NOTHING RETURNING id`,
    [
      sheet.number,
      sheet.title,
      sheet.scale,
      sheet.srid,
      JSON.stringify({ type: 'Polygon', coordinates: [neatline] }),
      sheet.page.width,
      sheet.page.height,
    ],
  )
  return row?.id
}

/** A sheet with its system and the roles that one account has on it. */
export interface SheetWithRoles extends CrsRow {
  id: string
  number: string
  title: string
  scale: number
  /** GeoJSON text of the polygon. */
  neatline: string
  pageWidth: number
  pageHeight: number
  state: SheetState
  revision: number
  edition: number | null
  roles: Role[]
}

const sheetColumns = `sheet.id, sheet.number, sheet.title, sheet.scale, ST_AsGeoJSON(sheet.neatline, 3, 0) AS neatline,
  sheet.page_width AS "pageWidth", sheet.page_height AS "pageHeight", sheet.state, sheet.revision, sheet.edition,
  crs.srid, crs.srtext, crs.proj4text,
  ARRAY(SELECT role FROM membership WHERE sheet_id = sheet.id AND account_id = $1 ORDER BY role)::text[] AS roles`

/** Sheets that the account is a member of, or all, by number. */
export async function selectSheets(
  em: EntityManager,
  accountId: string,
  all: boolean,
): Promise<SheetWithRoles[]> {
  return em.query(
    `SELECT ${sheetColumns} FROM sheet JOIN spatial_ref_sys AS crs ON crs.srid = sheet.srid
     WHERE $2 OR EXISTS (SELECT FROM membership WHERE sheet_id = sheet.id AND account_id = $1)
     ORDER BY sheet.number`,
    [accountId, all],
  )
}

export async function findSheet(
  em: EntityManager,
  accountId: string | null,
  sheetId: string,
): Promise<SheetWithRoles | undefined> {
  const [row] = await em.query<SheetWithRoles[]>(
    `SELECT ${sheetColumns} FROM sheet JOIN spatial_ref_sys AS crs ON crs.srid = sheet.srid WHERE sheet.id = $2`,
    [accountId, sheetId],
  )
  return row
}

export async function isEditorSomewhere(em: EntityManager, accountId: string): Promise<boolean> {
  const rows = await em.query<unknown[]>(
    `SELECT FROM membership WHERE account_id = $1 AND role = 'editor' LIMIT 1`,
    [accountId],
  )
  return rows.length > 0
}

export async function insertMembership(
  em: EntityManager,
  sheetId: string,
  accountId: string,
  role: Role,
): Promise<void> {
  await em.query('INSERT INTO membership (sheet_id, account_id, role) VALUES ($1, $2, $3)', [
    sheetId,
    accountId,
    role,
  ])
}

export async function findSheetId(em: EntityManager, number: string): Promise<string | undefined> {
  const [row] = await em.query<{ id: string }[]>('SELECT id FROM sheet WHERE number = $1', [number])
  return row?.id
}
