import type { EntityManager } from 'typeorm'
import type { Person } from '@shared/api/common'
import type { SheetState } from '@shared/api/sheets'
import type { Item } from '@shared/items/item'
import { personColumn } from './entries.queries'
import { itemColumns, toItem, type ItemRow } from './item-row'

/** What writing to a sheet's ledger has to know of it. */
export interface LedgerSheet {
  id: string
  number: string
  srid: number
  /** PROJ definition of its system. */
  proj4: string
  state: SheetState
  revision: number
}

/** A sheet whose row is locked until the transaction ends: nobody else can write to its ledger. */
export type LockedSheet = LedgerSheet

const sheetRow = `SELECT id, number, srid, proj4text AS proj4, state, revision FROM sheet JOIN spatial_ref_sys USING (srid)
     WHERE id = $1`

export const lockSheet = (em: EntityManager, sheetId: string): Promise<LockedSheet> =>
  getSheet(em, sheetId, `${sheetRow} FOR UPDATE OF sheet`)

/** A sheet as it stands, for who only looks: others go on writing. */
export const getLedgerSheet = (em: EntityManager, sheetId: string): Promise<LedgerSheet> =>
  getSheet(em, sheetId, sheetRow)

async function getSheet(em: EntityManager, sheetId: string, sql: string): Promise<LedgerSheet> {
  const [row] = await em.query<LedgerSheet[]>(sql, [sheetId])
  if (!row) throw new RangeError(`There is no sheet ${sheetId}.`)
  return row
}

export async function latestRevision(em: EntityManager, sheetId: string): Promise<number> {
  const [row] = await em.query<{ revision: number }[]>('SELECT revision FROM sheet WHERE id = $1', [sheetId])
  if (!row) throw new RangeError(`There is no sheet ${sheetId}.`)
  return row.revision
}

/** Ends the current versions of items: from this revision on they no longer hold. */
export async function closeVersions(em: EntityManager, sheetId: string, ids: string[], revision: number) {
  await em.query(
    'UPDATE item_version SET until = $3 WHERE sheet_id = $1 AND item_id = ANY($2::uuid[]) AND until IS NULL',
    [sheetId, ids, revision],
  )
}

/** Rows sent in one statement: large enough that the statement's cost vanishes, small enough to be built in memory. */
const BATCH = 2000

/** Writes new current versions of items, in the sheet's system. */
export async function insertVersions(
  em: EntityManager,
  sheet: LockedSheet,
  revision: number,
  puts: readonly { item: Item; provenance?: unknown }[],
): Promise<void> {
  for (let start = 0; start < puts.length; start += BATCH) {
    const rows = puts.slice(start, start + BATCH).map(({ item, provenance }) => ({ ...item, provenance }))
    await em.query(
      `INSERT INTO item_version (item_id, since, sheet_id, kind, geometry, properties, provenance)
       SELECT id, $1, $2, kind, ST_SetSRID(ST_GeomFromGeoJSON(geometry::text), $3), properties, provenance
       FROM json_to_recordset($4::json)
         AS sent (id uuid, kind text, geometry json, properties jsonb, provenance jsonb)`,
      [revision, sheet.id, sheet.srid, JSON.stringify(rows)],
    )
  }
}

/** The newest version of an item, whether or not it still holds. */
export interface LatestVersion {
  item: Item
  sheetId: string
  since: number
  until: number | null
  /** Who wrote or removed it last. */
  author: Person
}

/** Newest versions by item id; items that never were are missing. */
export async function findLatestVersions(
  em: EntityManager,
  ids: string[],
): Promise<Map<string, LatestVersion>> {
  const rows = await em.query<(ItemRow & Omit<LatestVersion, 'item'>)[]>(
    `SELECT DISTINCT ON (version.item_id) ${itemColumns}, version.sheet_id AS "sheetId", version.since, version.until,
       ${personColumn} AS author
     FROM item_version AS version
     JOIN revision ON revision.sheet_id = version.sheet_id AND revision.number = coalesce(version.until, version.since)
     JOIN account ON account.id = revision.author_id
     WHERE version.item_id = ANY($1::uuid[])
     ORDER BY version.item_id, version.since DESC`,
    [ids],
  )
  return new Map(
    rows.map((row) => {
      const { sheetId, since, until, author } = row
      return [row.id, { item: toItem(row), sheetId, since, until, author }]
    }),
  )
}

/** Items as they were at a revision, ordered by id; all of the sheet, or the given ones. */
export async function selectItemsAt(
  em: EntityManager,
  sheetId: string,
  revision: number,
  ids?: string[],
): Promise<Item[]> {
  const rows = await em.query<ItemRow[]>(
    `SELECT ${itemColumns} FROM item_version AS version
     WHERE sheet_id = $1 AND since <= $2 AND (until IS NULL OR until > $2)
       ${ids ? 'AND item_id = ANY($3::uuid[])' : ''}
     ORDER BY item_id`,
    ids ? [sheetId, revision, ids] : [sheetId, revision],
  )
  return rows.map(toItem)
}

/** Items as they were at a revision as JSON texts without brackets, some thousand items in each, ordered by id. */
export async function selectItemTextsAt(
  em: EntityManager,
  sheetId: string,
  revision: number,
): Promise<string[]> {
  const rows = await em.query<{ items: string }[]>(
    `SELECT string_agg(item, ',' ORDER BY place) AS items FROM (
       SELECT row_number() OVER (ORDER BY version.item_id) AS place,
         '{"kind":"' || version.kind || '","id":"' || version.item_id || '","geometry":'
           || coalesce(ST_AsGeoJSON(version.geometry, 3, 0), 'null') || ',"properties":' || version.properties || '}' AS item
       FROM item_version AS version
       WHERE sheet_id = $1 AND since <= $2 AND (until IS NULL OR until > $2)
     ) AS written GROUP BY place / ${BATCH} ORDER BY place / ${BATCH}`,
    [sheetId, revision],
  )
  return rows.map((row) => row.items)
}

/** Current items of a sheet, ordered by id; of one kind, if given. */
export async function selectCurrentItems(em: EntityManager, sheetId: string, kind?: string): Promise<Item[]> {
  const rows = await em.query<ItemRow[]>(
    `SELECT ${itemColumns} FROM item_version AS version
     WHERE sheet_id = $1 AND until IS NULL ${kind ? 'AND kind = $2' : ''} ORDER BY item_id`,
    kind ? [sheetId, kind] : [sheetId],
  )
  return rows.map(toItem)
}

/** Ids of the given units that unit labels use, with the number of labels, leaving out labels that are themselves
 *  about to change. */
export async function countLabelsOfUnits(
  em: EntityManager,
  sheetId: string,
  units: string[],
  except: string[],
): Promise<{ unit: string; labels: number }[]> {
  return em.query(
    `SELECT properties->>'unit' AS unit, count(*)::integer AS labels FROM item_version
     WHERE sheet_id = $1 AND until IS NULL AND kind = 'unit-label'
       AND properties->>'unit' = ANY($2::text[]) AND item_id <> ALL($3::uuid[])
     GROUP BY 1`,
    [sheetId, units, except],
  )
}
