import { isDeepStrictEqual } from 'node:util'
import type { Change } from '@shared/changes/change-set'
import { kindWords, type Item, type ItemOf } from '@shared/items/item'
import type { LatestVersion } from './ledger.queries'

/** What a change set is checked against: rows of the sheet as they are now. */
export interface SheetRows {
  sheetId: string
  /** Newest versions of the items that the changes name, by item id. */
  latest: ReadonlyMap<string, LatestVersion>
  /** Units of the sheet as they are now. */
  unitIds: ReadonlySet<string>
  /** The sheet's one sheet-face item. */
  sheetFaceId: string | undefined
  /** How many unit labels that the changes leave alone use each unit. */
  labelsOfUnits: ReadonlyMap<string, number>
}

/** A place in the request that is not right. */
export interface Fault {
  pointer: string
  detail: string
  /** The item that it is about. */
  item: string
}

export const changedId = (change: Change): string => (change.op === 'put' ? change.item.id : change.id)

/** What is wrong with a change set, whoever sent it; empty if nothing is. */
export function findFaults(changes: readonly Change[], base: number, rows: SheetRows): Fault[] {
  const seen = new Set<string>()
  const faults: Fault[] = []
  changes.forEach((change, index) => {
    const id = changedId(change)
    const pointer = `/changes/${index}`
    const detail = seen.has(id)
      ? `Item ${id} is changed twice in one change set.`
      : change.op === 'put'
        ? faultOfPut(change.item, rows)
        : faultOfRemove(change.id, base, rows)
    seen.add(id)
    if (detail) faults.push({ pointer, detail, item: id })
  })
  return faults.concat(findUnitFaults(changes, rows))
}

function faultOfPut(item: Item, { sheetId, latest, sheetFaceId }: SheetRows): string | undefined {
  const known = latest.get(item.id)
  if (known && known.sheetId !== sheetId) return `Item ${item.id} belongs to another sheet.`
  if (known && known.item.kind !== item.kind) {
    return `Item ${item.id} is ${aKind(known.item)} and cannot become ${aKind(item)}: remove it and draw a new one.`
  }
  if (item.kind === 'sheet-face' && sheetFaceId && sheetFaceId !== item.id) {
    return `A sheet has one sheet face: change item ${sheetFaceId}.`
  }
  return undefined
}

function faultOfRemove(id: string, base: number, { sheetId, latest }: SheetRows): string | undefined {
  const known = latest.get(id)
  if (!known) return `There is no item ${id} on this sheet.`
  if (known.sheetId !== sheetId) return `Item ${id} belongs to another sheet.`
  if (known.item.kind === 'sheet-face') return 'The sheet face cannot be removed.'
  // An item that someone removed after the base is a conflict, found below.
  if (known.until !== null && known.until <= base) return `Item ${id} was removed at revision ${known.until}.`
  return undefined
}

/** Unit labels name units that exist after the change; units in use stay. */
function findUnitFaults(changes: readonly Change[], rows: SheetRows): Fault[] {
  const units = new Set(rows.unitIds)
  for (const change of changes) {
    if (change.op === 'put' && change.item.kind === 'unit') units.add(change.item.id)
    if (change.op === 'remove') units.delete(change.id)
  }
  return changes.flatMap((change, index) => {
    const pointer = `/changes/${index}`
    if (change.op === 'put' && change.item.kind === 'unit-label' && !units.has(change.item.properties.unit)) {
      const detail = `The unit ${change.item.properties.unit} is not in the legend of this sheet.`
      return [{ pointer: `${pointer}/item/properties/unit`, detail, item: change.item.id }]
    }
    const labels = change.op === 'remove' ? (rows.labelsOfUnits.get(change.id) ?? 0) : 0
    if (change.op !== 'remove' || labels === 0) return []
    const unit = rows.latest.get(change.id)?.item
    const name = unit?.kind === 'unit' ? `Unit ${unit.properties.label}` : 'This unit'
    return [
      {
        pointer,
        detail: `${name} is used by ${labels} unit ${labels === 1 ? 'label' : 'labels'}: give them another unit or remove them first.`,
        item: change.id,
      },
    ]
  })
}

const aKind = (item: Item): string => {
  const word = kindWords[item.kind].one
  return /^[aeiou]/.test(word) && item.kind !== 'unit' && item.kind !== 'unit-label'
    ? `an ${word}`
    : `a ${word}`
}

/** Kinds that only editors change: legend and sheet face. */
export const isEditorsItem = (item: Item): item is ItemOf<'unit' | 'sheet-face'> =>
  item.kind === 'unit' || item.kind === 'sheet-face'

/** One item that was changed since the base, by another person or in another window of the same one. */
export interface Conflict {
  id: string
  /** As it was when the changes were made; null if it did not exist. */
  base: Item | null
  /** As it is now; null if it was removed. */
  theirs: Item | null
  /** As it was sent; null if it was to be removed. */
  yours: Item | null
}

/** Changes whose item has a newer version than their base. Both having done the same is no conflict. */
export function findConflicts(
  changes: readonly Change[],
  base: number,
  { latest }: SheetRows,
): Omit<Conflict, 'base'>[] {
  return changes.flatMap((change) => {
    const id = changedId(change)
    const known = latest.get(id)
    if (!known || Math.max(known.since, known.until ?? 0) <= base) return []
    const theirs = known.until === null ? known.item : null
    const yours = change.op === 'put' ? change.item : null
    return theirs !== null && isDeepStrictEqual(theirs, yours) ? [] : [{ id, theirs, yours }]
  })
}
