import type { EntityManager } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import type { Person } from '@shared/api/common'
import type { Change } from '@shared/changes/change-set'
import { mergeItem } from '@shared/changes/merge-item'
import type { Item } from '@shared/items/item'
import { problem } from '../../platform/problem'
import { changedId, findConflicts, isEditorsItem, type Conflict, type SheetRows } from './check-changes'
import { findUnreachable, unreachableSentence } from '@shared/items/find-unreachable'
import {
  countLabelsOfUnits,
  findLatestVersions,
  selectCurrentItems,
  selectItemsAt,
  type LedgerSheet,
} from './ledger.queries'

/** Who changes a sheet, and as what. */
export interface Author {
  person: Person
  roles: readonly Role[]
}

/** A sheet that is submitted, approved or being released stays as it is. */
export function requireDrafting(sheet: LedgerSheet): void {
  if (sheet.state === 'drafting') return
  throw problem(
    'wrong-state',
    `Sheet ${sheet.number} is ${sheet.state}: it cannot be changed until it is back in drafting.`,
  )
}

/** A place beyond the region of the sheet's system would be drawn, measured and printed wrong. */
export function requireWithinSystem(sheet: LedgerSheet, changes: readonly Change[]): void {
  const items = changes.flatMap((change) => (change.op === 'put' ? [change.item] : []))
  const beyond = findUnreachable(items, sheet.proj4)
  if (beyond.length === 0) return
  const errors = beyond.slice(0, 100).map((item) => ({
    pointer: `/changes/${changes.findIndex((change) => changedId(change) === item.id)}/item/geometry/coordinates`,
    detail: unreachableSentence(item, sheet.srid),
    item: item.id,
  }))
  throw problem('invalid-input', errors[0]?.detail ?? '', { errors })
}

/** The rows of the sheet that changes meet. */
export async function loadRows(
  em: EntityManager,
  sheetId: string,
  changes: readonly Change[],
): Promise<SheetRows> {
  const ids = changes.map(changedId)
  const latest = await findLatestVersions(em, ids)
  const units = await selectCurrentItems(em, sheetId, 'unit')
  const [sheetFace] = await selectCurrentItems(em, sheetId, 'sheet-face')
  const removed = changes.flatMap((change) => (change.op === 'remove' ? [change.id] : []))
  const counts = await countLabelsOfUnits(em, sheetId, removed, ids)
  return {
    sheetId,
    latest,
    unitIds: new Set(units.map((unit) => unit.id)),
    sheetFaceId: sheetFace?.id,
    labelsOfUnits: new Map(counts.map(({ unit, labels }) => [unit, labels])),
  }
}

/** Legend and sheet face are the editor's. */
export function requireEditorForLegend(
  { roles }: Author,
  changes: readonly Change[],
  { latest }: SheetRows,
): void {
  if (roles.includes('editor')) return
  const item = changes
    .map((change) => (change.op === 'put' ? change.item : latest.get(change.id)?.item))
    .find((item) => item !== undefined && isEditorsItem(item))
  if (!item) return
  const what = item.kind === 'unit' ? `the unit ${item.properties.label} of the legend` : 'the sheet face'
  throw problem('not-allowed', `Only an editor of this sheet changes ${what}.`)
}

/** Lays changes on top of what others did to the same items since the base, where they touched other parts of them
 *  (place, or what is said of it). Where both changed the same part nothing is overwritten: all sides are shown instead.
 *  @returns the changes as they are to be stored, and the items among them that now hold both people's work */
export async function mergeChanges(
  em: EntityManager,
  sheetId: string,
  author: Author,
  { base, changes }: { base: number; changes: readonly Change[] },
  rows: SheetRows,
): Promise<{ changes: readonly Change[]; merged: Item[] }> {
  const found = findConflicts(changes, base, rows)
  if (found.length === 0) return { changes, merged: [] }
  const ids = found.map(({ id }) => id)
  const bases = new Map((await selectItemsAt(em, sheetId, base, ids)).map((item) => [item.id, item]))
  const met = found.map((conflict): Conflict => ({ ...conflict, base: bases.get(conflict.id) ?? null }))
  const merged = met.flatMap(mergedItem)
  const mergedIds = new Set(merged.map(({ id }) => id))
  const conflicts = met.filter(({ id }) => !mergedIds.has(id))
  if (conflicts.length > 0) throw conflictProblem(author, base, conflicts, rows)
  const byId = new Map(merged.map((item) => [item.id, item]))
  return {
    changes: changes.map((change): Change => {
      const item = byId.get(changedId(change))
      return item ? { op: 'put', item } : change
    }),
    merged,
  }
}

function mergedItem({ base, theirs, yours }: Conflict): Item[] {
  if (!base || !theirs || !yours) return []
  const merge = mergeItem(base, theirs, yours)
  return merge.outcome === 'merged' ? [merge.item] : []
}

function conflictProblem(author: Author, base: number, items: readonly Conflict[], { latest }: SheetRows) {
  const names = new Set(
    items.map(({ id }) => {
      const other = latest.get(id)?.author
      return !other || other.id === author.person.id ? 'You, elsewhere,' : other.name
    }),
  )
  const what = items.length === 1 ? 'the same item' : `${items.length} of the same items`
  return problem(
    'item-conflict',
    `${[...names].join(' and ')} changed ${what} after revision ${base}. Nothing of yours was stored.`,
    { items: [...items] },
  )
}

/** A field of the request that cannot be used, in a sentence. */
export const invalidField = (field: string, detail: string) =>
  problem('invalid-input', detail, { errors: [{ pointer: `/${field}`, detail }] })

/** Refuses a revision from the future, naming the field that asked for it. */
export function requireReached(revision: number, latest: number, field: string): void {
  if (revision <= latest) return
  throw invalidField(field, `The sheet is at revision ${latest}; revision ${revision} does not exist yet.`)
}
