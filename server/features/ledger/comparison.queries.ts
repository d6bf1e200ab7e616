import type { EntityManager } from 'typeorm'
import type { DifferenceCount } from '@shared/api/comparisons'
import type { Edit } from '@shared/changes/change-set'
import type { ItemKind } from '@shared/items/item'
import { toItem } from './item-row'

/** Two revisions of a sheet; `from` may be the later one. */
export interface Span {
  sheetId: string
  from: number
  to: number
}

/** Ids with a version begun or ended after the earlier and up to the later revision: found by the indexes on both numbers,
 *  so that the cost grows with the changes in between and not with the sheet. */
const touchedIds = `SELECT item_id FROM item_version
    WHERE sheet_id = $1 AND since > least($2::integer, $3) AND since <= greatest($2::integer, $3)
  UNION SELECT item_id FROM item_version
    WHERE sheet_id = $1 AND until > least($2::integer, $3) AND until <= greatest($2::integer, $3)`

/** The versions of touched items at both revisions. `=` on geometries is exact: every coordinate, in order. */
const bothVersions = `LEFT JOIN item_version AS before
    ON before.item_id = touched.item_id AND before.sheet_id = $1
    AND before.since <= $2 AND (before.until IS NULL OR before.until > $2)
  LEFT JOIN item_version AS after
    ON after.item_id = touched.item_id AND after.sheet_id = $1
    AND after.since <= $3 AND (after.until IS NULL OR after.until > $3)
  WHERE (before.properties IS DISTINCT FROM after.properties OR before.geometry IS DISTINCT FROM after.geometry)`

/** Ids of items that may differ between two revisions, ordered; some may have been changed and changed back. */
export async function selectTouchedIds(em: EntityManager, span: Span): Promise<string[]> {
  const rows = await em.query<{ id: string }[]>(
    `SELECT item_id AS id FROM (${touchedIds}) AS touched ORDER BY id`,
    [span.sheetId, span.from, span.to],
  )
  return rows.map((row) => row.id)
}

interface EditRow {
  id: string
  kind: ItemKind
  beforeProperties: unknown
  beforeGeometry: string | null
  afterProperties: unknown
  afterGeometry: string | null
}

const editColumns = `touched.item_id AS id, coalesce(before.kind, after.kind) AS kind,
  before.properties AS "beforeProperties", ST_AsGeoJSON(before.geometry, 3, 0) AS "beforeGeometry",
  after.properties AS "afterProperties", ST_AsGeoJSON(after.geometry, 3, 0) AS "afterGeometry"`

function toEdit(row: EditRow): Edit {
  const { id, kind } = row
  const item = (properties: unknown, geometry: string | null) =>
    properties === null ? null : toItem({ id, kind, geometry, properties })
  return {
    before: item(row.beforeProperties, row.beforeGeometry),
    after: item(row.afterProperties, row.afterGeometry),
  }
}

/** What differs of the given items between two revisions, ordered by id. */
export async function selectEditsOf(em: EntityManager, span: Span, ids: readonly string[]): Promise<Edit[]> {
  const rows = await em.query<EditRow[]>(
    `SELECT ${editColumns} FROM unnest($4::uuid[]) AS touched (item_id) ${bothVersions} ORDER BY id`,
    [span.sheetId, span.from, span.to, ids],
  )
  return rows.map(toEdit)
}

/** A page of what differs between two revisions, by id. */
export async function selectEdits(
  em: EntityManager,
  span: Span,
  { after, limit }: { after?: string | undefined; limit: number },
): Promise<Edit[]> {
  const rows = await em.query<EditRow[]>(
    `SELECT ${editColumns} FROM (${touchedIds}) AS touched ${bothVersions}
       AND ($4::uuid IS NULL OR touched.item_id > $4) ORDER BY id LIMIT $5`,
    [span.sheetId, span.from, span.to, after ?? null, limit],
  )
  return rows.map(toEdit)
}

const counts = `coalesce(before.kind, after.kind) AS kind,
  count(*) FILTER (WHERE before.item_id IS NULL)::integer AS added,
  count(*) FILTER (WHERE after.item_id IS NULL)::integer AS removed,
  count(*) FILTER (WHERE before.item_id = after.item_id AND before.geometry IS DISTINCT FROM after.geometry)::integer
    AS moved,
  count(*) FILTER (WHERE before.properties <> after.properties)::integer AS reattributed`

/** How many items differ between two revisions, by kind and how; of the given items, if any are given. */
export async function countEdits(
  em: EntityManager,
  span: Span,
  ids?: readonly string[],
): Promise<DifferenceCount[]> {
  const touched = ids ? 'unnest($4::uuid[]) AS touched (item_id)' : `(${touchedIds}) AS touched`
  return em.query(
    `SELECT ${counts} FROM ${touched} ${bothVersions} GROUP BY coalesce(before.kind, after.kind) ORDER BY kind`,
    [span.sheetId, span.from, span.to, ...(ids ? [ids] : [])],
  )
}
