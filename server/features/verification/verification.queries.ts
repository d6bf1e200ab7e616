import type { EntityManager } from 'typeorm'
import type { ChainedEntry } from '../../platform/audit'

/** A row that is not as it has to be: of which sheet, and what is wrong in a sentence. */
export interface LedgerFault {
  sheet: string
  what: string
}

/** Each rule of the ledger as a query for what breaks it. */
const rules: readonly string[] = [
  // Entries run 1, 2, 3 … without gaps.
  `SELECT sheet.number AS sheet, format('entry %s follows entry %s: the numbers have a gap', walked.number, walked.before)
     AS what
   FROM (SELECT sheet_id, number, lag(number, 1, 0) OVER (PARTITION BY sheet_id ORDER BY number) AS before FROM revision)
     AS walked JOIN sheet ON sheet.id = walked.sheet_id
   WHERE walked.number <> walked.before + 1`,
  // The sheet stands at its newest entry.
  `SELECT sheet.number AS sheet, format('the sheet is at revision %s, but its newest entry is %s', sheet.revision,
     coalesce(max(entry.number), 0)) AS what
   FROM sheet LEFT JOIN revision AS entry ON entry.sheet_id = sheet.id
   GROUP BY sheet.id HAVING sheet.revision <> coalesce(max(entry.number), 0)`,
  // A version begins and ends with an entry.
  `SELECT sheet.number AS sheet, format('item %s has a version from %s to %s, and one of these entries does not exist',
     version.item_id, version.since, coalesce(version.until::text, 'now')) AS what
   FROM item_version AS version JOIN sheet ON sheet.id = version.sheet_id
   LEFT JOIN revision AS began ON began.sheet_id = version.sheet_id AND began.number = version.since
   LEFT JOIN revision AS ended ON ended.sheet_id = version.sheet_id AND ended.number = version.until
   WHERE began.number IS NULL OR (version.until IS NOT NULL AND ended.number IS NULL)`,
  // The versions of an item follow one another, stay on one sheet and of one kind.
  `SELECT sheet.number AS sheet, format('item %s: the version from %s to %s runs into the one from %s', walked.item_id,
     walked.since, coalesce(walked.until::text, 'now'), walked.next) AS what
   FROM (SELECT item_id, sheet_id, since, until, lead(since) OVER (PARTITION BY item_id ORDER BY since) AS next
     FROM item_version) AS walked JOIN sheet ON sheet.id = walked.sheet_id
   WHERE walked.next < coalesce(walked.until, 2147483647)`,
  `SELECT min(sheet.number) AS sheet, format('item %s is of several kinds or on several sheets', version.item_id) AS what
   FROM item_version AS version JOIN sheet ON sheet.id = version.sheet_id
   GROUP BY version.item_id
   HAVING count(DISTINCT version.kind) > 1 OR count(DISTINCT version.sheet_id) > 1`,
  // An entry changed as many items as it says.
  `SELECT sheet.number AS sheet, format('entry %s says that it changed %s items, but %s have a version begun or ended there',
     entry.number, entry.changed, coalesce(found.items, 0)) AS what
   FROM revision AS entry JOIN sheet ON sheet.id = entry.sheet_id
   LEFT JOIN (
     SELECT sheet_id, number, count(DISTINCT item_id) AS items FROM (
       SELECT sheet_id, since AS number, item_id FROM item_version
       UNION ALL SELECT sheet_id, until, item_id FROM item_version WHERE until IS NOT NULL
     ) AS touched GROUP BY sheet_id, number
   ) AS found ON found.sheet_id = entry.sheet_id AND found.number = entry.number
   WHERE entry.changed <> coalesce(found.items, 0)`,
  // Geometry is in the sheet's own system.
  `SELECT sheet.number AS sheet, format('item %s, version %s, is in system %s and not in the sheet''s, %s', version.item_id,
     version.since, ST_SRID(version.geometry), sheet.srid) AS what
   FROM item_version AS version JOIN sheet ON sheet.id = version.sheet_id
   WHERE ST_SRID(version.geometry) <> sheet.srid`,
]

/** Everything in the ledgers of all sheets that breaks a rule. */
export async function selectLedgerFaults(em: EntityManager): Promise<LedgerFault[]> {
  const found: LedgerFault[] = []
  for (const rule of rules) found.push(...(await em.query<LedgerFault[]>(`${rule} ORDER BY sheet, what`)))
  return found
}

export interface LedgerSize {
  sheets: number
  entries: number
  versions: number
}

/** How much the ledgers hold. */
export async function countLedger(em: EntityManager): Promise<LedgerSize> {
  const [row] = await em.query<LedgerSize[]>(
    `SELECT (SELECT count(*) FROM sheet)::integer AS sheets, (SELECT count(*) FROM revision)::integer AS entries,
       (SELECT count(*) FROM item_version)::integer AS versions`,
  )
  return row ?? { sheets: 0, entries: 0, versions: 0 }
}

export interface StoredAudit extends ChainedEntry {
  hash: string
}

/** Entries of the audit trail after a number, oldest first. */
export const selectAuditAfter = (em: EntityManager, after: number, limit: number): Promise<StoredAudit[]> =>
  em.query(
    `SELECT number, at, kind, account_id AS "accountId", sheet, detail, previous, hash FROM audit_entry
     WHERE number > $1 ORDER BY number LIMIT $2`,
    [after, limit],
  )

/** What the trail's end is said to be. */
export async function getAuditHead(em: EntityManager): Promise<{ number: number; hash: string }> {
  const [head] = await em.query<{ number: number; hash: string }[]>('SELECT number, hash FROM audit_head')
  return head ?? { number: -1, hash: '' }
}

/** Triggers that keep what is sealed and are switched off. */
export async function selectSleepingTriggers(em: EntityManager): Promise<string[]> {
  const rows = await em.query<{ name: string }[]>(
    `SELECT format('%s on %s', tgname, tgrelid::regclass) AS name FROM pg_trigger
     WHERE NOT tgisinternal AND tgenabled NOT IN ('O', 'A')
       AND tgrelid IN ('audit_entry'::regclass, 'edition'::regclass, 'artefact'::regclass, 'submission'::regclass)
     ORDER BY name`,
  )
  return rows.map((row) => row.name)
}

/** Whether the role that asks could change or empty the audit trail. */
export async function mayAlterAudit(em: EntityManager): Promise<boolean> {
  const [row] = await em.query<{ may: boolean }[]>(
    `SELECT bool_or(has_table_privilege('audit_entry', privilege)) AS may
     FROM unnest(ARRAY['UPDATE', 'DELETE', 'TRUNCATE', 'TRIGGER']) AS privilege`,
  )
  return row?.may ?? true
}

export interface SealedEdition {
  id: string
  sheetId: string
  sheet: string
  number: number
  revision: number
  digest: string
  title: string
  scale: number
}

/** Every released edition, by sheet and number. */
export const selectEditionsToVerify = (em: EntityManager): Promise<SealedEdition[]> =>
  em.query(
    `SELECT edition.id, edition.sheet_id AS "sheetId", sheet.number AS sheet, edition.number, edition.revision,
       edition.digest, edition.title, edition.scale
     FROM edition JOIN sheet ON sheet.id = edition.sheet_id ORDER BY sheet.number, edition.number`,
  )

export interface SealedFile {
  name: string
  /** A bigint, which the driver gives as text. */
  bytes: string
  sha256: string
  storageKey: string
}

/** The files of an edition. */
export const selectFilesOf = (em: EntityManager, editionId: string): Promise<SealedFile[]> =>
  em.query(
    `SELECT name, bytes, sha256, storage_key AS "storageKey" FROM artefact WHERE edition_id = $1 ORDER BY place`,
    [editionId],
  )
