import type { EntityManager } from 'typeorm'
import type { Person } from '@shared/api/common'
import type { LedgerEntry } from '@shared/api/sheets'
import type { ItemKind } from '@shared/items/item'
import type { Bounds } from '@shared/items/item-bounds'
import type { LockedSheet } from './ledger.queries'

export interface NewEntry {
  kind: LedgerEntry['kind']
  authorId: string
  message: string
  /** What changed, in words. */
  what: string
  changed: number
  /** Kinds of the items that changed. */
  kinds: readonly ItemKind[]
  /** Where they are and were; none for kinds without a place. */
  extent: Bounds | undefined
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
    `INSERT INTO revision (sheet_id, number, kind, author_id, at, message, changed, change_key, body_digest, altered,
       what, kinds, extent)
     VALUES ($1, $2, $3, $4, coalesce($5, now()), $6, $7, $8, $9, $10, $11, $12, ST_MakeEnvelope($13, $14, $15, $16, $17))`,
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
      entry.what,
      entry.kinds,
      // Without bounds the envelope is null.
      ...(entry.extent ?? [null, null, null, null]),
      sheet.srid,
    ],
  )
  await em.query(
    `UPDATE sheet SET revision = $2, linework_revision = CASE WHEN $3 THEN $2 ELSE linework_revision END WHERE id = $1`,
    [sheet.id, number, touchesFaces],
  )
}

/** An account as a Person. */
export const personColumn = `jsonb_build_object('id', account.id, 'name', account.name, 'initials', account.initials)`

/** Columns that make a LedgerEntry from `revision` joined to `account`. */
export const entryColumns = `revision.number AS revision, revision.kind, ${personColumn} AS author, revision.at,
  revision.message, revision.what, revision.changed`

export type EntryRow = Omit<LedgerEntry, 'at'> & { at: Date }

export const toEntry = ({ revision, kind, author, at, message, what, changed }: EntryRow): LedgerEntry => ({
  revision,
  kind,
  author,
  at: at.toISOString(),
  message,
  what,
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
