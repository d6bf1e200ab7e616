import type { EntityManager } from 'typeorm'
import type { Person } from '@shared/api/common'
import type { LedgerEntry, SheetState } from '@shared/api/sheets'
import type { Item } from '@shared/items/item'
import { itemColumns, toItem, type ItemRow } from './item-row'

/** A sheet whose row is locked until the transaction ends: nobody else can write to its ledger. */
export interface LockedSheet {
  id: string
  number: string
  srid: number
  /** PROJ definition of its system. */
  proj4: string
  state: SheetState
  revision: number
}

export async function lockSheet(em: EntityManager, sheetId: string): Promise<LockedSheet> {
  const [row] = await em.query<LockedSheet[]>(
    `SELECT id, number, srid, proj4text AS proj4, state, revision FROM sheet JOIN spatial_ref_sys USING (srid)
     WHERE id = $1 FOR UPDATE OF sheet`,
    [sheetId],
  )
  if (!row) throw new RangeError(`There is no sheet ${sheetId}.`)
  return row
}

export async function latestRevision(em: EntityManager, sheetId: string): Promise<number> {
  const [row] = await em.query<{ revision: number }[]>('SELECT revision FROM sheet WHERE id = $1', [sheetId])
  if (!row) throw new RangeError(`There is no sheet ${sheetId}.`)
  return row.revision
}

export interface NewEntry {
  kind: LedgerEntry['kind']
  authorId: string
  message: string
  changed: number
  /** Now, unless given. */
  at?: Date | undefined
  call?: { key: string; bodyDigest: string; altered: string[] } | undefined
}

/** Writes the entry and moves the sheet to its number. */
export async function insertEntry(
  em: EntityManager,
  sheet: LockedSheet,
  number: number,
  entry: NewEntry,
  touchesFaces: boolean,
): Promise<void> {
  await em.query(
    `INSERT INTO revision (sheet_id, number, kind, author_id, at, message, changed, change_key, body_digest, altered)
     VALUES ($1, $2, $3, $4, coalesce($5, now()), $6, $7, $8, $9, $10)`,
    [
      sheet.id,
      number,
      entry.kind,
      entry.authorId,
      entry.at ?? null,
      entry.message,
      entry.changed,
      entry.call?.key ?? null,
      entry.call?.bodyDigest ?? null,
      entry.call?.altered ?? [],
    ],
  )
  await em.query(
    `UPDATE sheet SET revision = $2, linework_revision = CASE WHEN $3 THEN $2 ELSE linework_revision END WHERE id = $1`,
    [sheet.id, number, touchesFaces],
  )
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

/** Ids that have a version begun or ended after one revision and up to another. */
export async function selectTouchedIds(
  em: EntityManager,
  sheetId: string,
  from: number,
  to: number,
): Promise<string[]> {
  const rows = await em.query<{ id: string }[]>(
    `SELECT item_id AS id FROM item_version WHERE sheet_id = $1 AND since > $2 AND since <= $3
     UNION SELECT item_id FROM item_version WHERE sheet_id = $1 AND until > $2 AND until <= $3
     ORDER BY id`,
    [sheetId, from, to],
  )
  return rows.map((row) => row.id)
}

const personColumn = `json_build_object('id', account.id, 'name', account.name, 'initials', account.initials)`

/** Columns that make a LedgerEntry from `revision` joined to `account`. */
const entryColumns = `revision.number AS revision, revision.kind, ${personColumn} AS author, revision.at,
  revision.message, revision.changed`

type EntryRow = Omit<LedgerEntry, 'at'> & { at: Date }

const toEntry = ({ revision, kind, author, at, message, changed }: EntryRow): LedgerEntry => ({
  revision,
  kind,
  author,
  at: at.toISOString(),
  message,
  changed,
})

/** Ledger entries, newest first: numbers above `above` and below `below`, at most `limit`. */
export async function selectEntries(
  em: EntityManager,
  sheetId: string,
  { above = 0, below, limit }: { above?: number; below?: number | undefined; limit?: number },
): Promise<LedgerEntry[]> {
  const rows = await em.query<EntryRow[]>(
    `SELECT ${entryColumns} FROM revision JOIN account ON account.id = revision.author_id
     WHERE sheet_id = $1 AND number > $2 AND number < coalesce($3::integer, 2147483647)
     ORDER BY number DESC LIMIT $4`,
    [sheetId, above, below ?? null, limit ?? null],
  )
  return rows.map(toEntry)
}

/** The entries with these numbers, by number. */
export async function selectEntriesOf(
  em: EntityManager,
  sheetId: string,
  numbers: number[],
): Promise<Map<number, LedgerEntry>> {
  const rows = await em.query<EntryRow[]>(
    `SELECT ${entryColumns} FROM revision JOIN account ON account.id = revision.author_id
     WHERE sheet_id = $1 AND number = ANY($2::integer[])`,
    [sheetId, numbers],
  )
  return new Map(rows.map((row) => [row.revision, toEntry(row)]))
}

/** The newest entry of each sheet, by sheet id. */
export async function selectLastEntries(
  em: EntityManager,
  sheetIds: string[],
): Promise<Map<string, LedgerEntry>> {
  const rows = await em.query<(EntryRow & { sheetId: string })[]>(
    `SELECT sheet.id AS "sheetId", ${entryColumns} FROM sheet
     JOIN revision ON revision.sheet_id = sheet.id AND revision.number = sheet.revision
     JOIN account ON account.id = revision.author_id
     WHERE sheet.id = ANY($1::uuid[])`,
    [sheetIds],
  )
  return new Map(rows.map((row) => [row.sheetId, toEntry(row)]))
}

/** The entry that a call with this key wrote, if there was one. */
export async function findEntryByKey(
  em: EntityManager,
  sheetId: string,
  authorId: string,
  key: string,
): Promise<{ entry: LedgerEntry; bodyDigest: string; altered: string[] } | undefined> {
  const [row] = await em.query<(EntryRow & { bodyDigest: string; altered: string[] })[]>(
    `SELECT ${entryColumns}, body_digest AS "bodyDigest", altered
     FROM revision JOIN account ON account.id = revision.author_id
     WHERE sheet_id = $1 AND author_id = $2 AND change_key = $3`,
    [sheetId, authorId, key],
  )
  return row && { entry: toEntry(row), bodyDigest: row.bodyDigest, altered: row.altered }
}

/** Everyone who wrote an entry after one revision and up to another, by name. */
export async function selectAuthors(
  em: EntityManager,
  sheetId: string,
  from: number,
  to: number,
): Promise<Person[]> {
  return em.query(
    `SELECT account.id, account.name, account.initials FROM account
     WHERE id IN (SELECT author_id FROM revision WHERE sheet_id = $1 AND number > $2 AND number <= $3)
     ORDER BY account.name, account.id`,
    [sheetId, from, to],
  )
}
