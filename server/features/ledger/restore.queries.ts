import type { EntityManager } from 'typeorm'
import { entryColumns, toEntry, type EntryRow } from './entries.queries'
import type { LedgerEntry } from '@shared/api/sheets'

/** Of the given items, those that were changed after a revision, by id. */
export async function selectChangedAfter(
  em: EntityManager,
  sheetId: string,
  ids: readonly string[],
  revision: number,
): Promise<string[]> {
  const rows = await em.query<{ id: string }[]>(
    `SELECT touched.id FROM unnest($2::uuid[]) AS touched (id)
     WHERE EXISTS (SELECT FROM item_version AS version WHERE version.item_id = touched.id AND version.sheet_id = $1
       AND (version.since > $3 OR version.until > $3)) ORDER BY id`,
    [sheetId, ids, revision],
  )
  return rows.map((row) => row.id)
}

/** Entries that changed items after a revision, by item, newest first. */
export async function selectEntriesAfter(
  em: EntityManager,
  sheetId: string,
  ids: readonly string[],
  revision: number,
): Promise<Map<string, LedgerEntry[]>> {
  const rows = await em.query<(EntryRow & { item: string })[]>(
    `SELECT DISTINCT version.item_id AS item, ${entryColumns}
     FROM item_version AS version
     CROSS JOIN LATERAL (VALUES (version.since), (version.until)) AS changed (number)
     JOIN revision ON revision.sheet_id = version.sheet_id AND revision.number = changed.number
     JOIN account ON account.id = revision.author_id
     WHERE version.item_id = ANY($2::uuid[]) AND version.sheet_id = $1 AND changed.number > $3
     ORDER BY item, revision DESC`,
    [sheetId, ids, revision],
  )
  const byItem = new Map<string, LedgerEntry[]>()
  for (const { item, ...entry } of rows) byItem.set(item, [...(byItem.get(item) ?? []), toEntry(entry)])
  return byItem
}
