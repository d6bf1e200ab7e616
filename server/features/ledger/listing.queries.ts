import type { EntityManager } from 'typeorm'
import type { LedgerFilter } from '@shared/api/ledger'
import type { LedgerEntry } from '@shared/api/sheets'
import { entryColumns, toEntry, type EntryRow } from './entries.queries'

/** Which entries of a sheet a page lists. */
export interface Listing {
  filter: LedgerFilter
  /** Only numbers below this one. */
  before?: number | undefined
  limit: number
}

/** Ledger entries that a filter leaves, newest first. Walks the entries of the sheet from the newest on (or those of one
 *  person or one item, by their indexes) and stops when the page is full; kinds and extent stand on the entry itself, so
 *  that versions are only looked at where an entry may be meant. */
export async function selectPage(
  em: EntityManager,
  sheetId: string,
  { filter, before, limit }: Listing,
): Promise<LedgerEntry[]> {
  const values: unknown[] = [sheetId]
  const value = (given: unknown): string => `$${values.push(given)}`
  const conditions = [
    'revision.sheet_id = $1',
    ...(before === undefined ? [] : [`revision.number < ${value(before)}`]),
    ...conditionsOf(filter, value),
  ]
  const rows = await em.query<EntryRow[]>(
    `SELECT ${entryColumns} FROM revision JOIN account ON account.id = revision.author_id
     WHERE ${conditions.join('\n       AND ')}
     ORDER BY revision.number DESC LIMIT ${value(limit)}`,
    values,
  )
  return rows.map(toEntry)
}

function conditionsOf(
  { person, kind, itemKind, item, place, text }: LedgerFilter,
  value: (given: unknown) => string,
): string[] {
  return [
    ...(person ? [`revision.author_id = ${value(person)}`] : []),
    ...(kind ? [`revision.kind = ${value(kind)}`] : []),
    ...(item ? [touchesItem(value(item))] : []),
    ...(itemKind ? [`revision.kinds @> ARRAY[${value(itemKind)}]::text[]`] : []),
    ...(place ? touchesPlace(place.split(',').map(Number), itemKind, value) : []),
    ...(text ? [holdsText(value(`%${text.replace(/[\\%_]/g, '\\$&')}%`))] : []),
  ]
}

const touchesItem = (item: string): string =>
  `revision.number IN (
     SELECT unnest(ARRAY[since, until]) FROM item_version WHERE item_id = ${item}::uuid AND sheet_id = $1)`

/** The rectangle around everything that an entry changed is only a first look: one of its items has to be in the place,
 *  as it became or as it was. */
function touchesPlace(
  bounds: number[],
  itemKind: string | undefined,
  value: (given: unknown) => string,
): string[] {
  const numbers = bounds.map((bound) => `${value(bound)}::float8`).join(', ')
  const box = `ST_MakeEnvelope(${numbers}, (SELECT srid FROM sheet WHERE id = $1))`
  const ofKind = itemKind ? `AND version.kind = ${value(itemKind)}` : ''
  const touched = (number: string): string =>
    `EXISTS (SELECT FROM item_version AS version WHERE version.sheet_id = $1 AND version.${number} = revision.number
       AND ST_Intersects(version.geometry, ${box}) ${ofKind})`
  return [`revision.extent && ${box}`, `(${touched('since')} OR ${touched('until')})`]
}

const holdsText = (pattern: string): string =>
  `(revision.message ILIKE ${pattern} OR revision.what ILIKE ${pattern} OR EXISTS (
     SELECT FROM named_revision AS named WHERE named.sheet_id = $1 AND named.revision = revision.number
       AND (named.name ILIKE ${pattern} OR named.note ILIKE ${pattern})))`
