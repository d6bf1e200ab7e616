import type { EntityManager } from 'typeorm'
import type { NamedRevision } from '@shared/api/ledger'
import { personColumn } from './entries.queries'

type Row = Omit<NamedRevision, 'at'> & { at: Date }
const toNamed = (row: Row): NamedRevision => ({ ...row, at: row.at.toISOString() })

const columns = `named.revision, named.name, named.note, ${personColumn} AS by, named.at`
const source = 'named_revision AS named JOIN account ON account.id = named.named_by'

/** Names on revisions of a sheet, newest revision first; only of the given revisions, if any are given. */
export async function selectNamedRevisions(
  em: EntityManager,
  sheetId: string,
  revisions?: readonly number[],
): Promise<NamedRevision[]> {
  const rows = await em.query<Row[]>(
    `SELECT ${columns} FROM ${source} WHERE named.sheet_id = $1 ${revisions ? 'AND named.revision = ANY($2::integer[])' : ''}
     ORDER BY named.revision DESC`,
    revisions ? [sheetId, revisions] : [sheetId],
  )
  return rows.map(toNamed)
}

/** The revision that has this name, if one has. */
export async function findByName(
  em: EntityManager,
  sheetId: string,
  name: string,
): Promise<number | undefined> {
  const [row] = await em.query<{ revision: number }[]>(
    'SELECT revision FROM named_revision WHERE sheet_id = $1 AND name = $2',
    [sheetId, name],
  )
  return row?.revision
}

/** Writes a name, over an earlier one of the same revision. */
export async function putName(
  em: EntityManager,
  sheetId: string,
  { revision, name, note, by }: { revision: number; name: string; note: string; by: string },
): Promise<void> {
  await em.query(
    `INSERT INTO named_revision (sheet_id, revision, name, note, named_by) VALUES ($1, $2, $3, $4, $5)
     ON CONFLICT (sheet_id, revision) DO UPDATE
       SET name = excluded.name, note = excluded.note, named_by = excluded.named_by, at = now()`,
    [sheetId, revision, name, note, by],
  )
}

/** Takes a name off; the name that it was, undefined if there was none. */
export async function removeName(
  em: EntityManager,
  sheetId: string,
  revision: number,
): Promise<string | undefined> {
  const [rows] = await em.query<[{ name: string }[], number]>(
    'DELETE FROM named_revision WHERE sheet_id = $1 AND revision = $2 RETURNING name',
    [sheetId, revision],
  )
  return rows[0]?.name
}
