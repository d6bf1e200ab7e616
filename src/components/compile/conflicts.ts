import { z } from 'zod'
import type { Problem } from '@shared/api/problems'
import { describeChanges } from '@shared/changes/describe-changes'
import { isSame } from '@shared/changes/same-value'
import { itemSchema, type Item } from '@shared/items/item'

const conflictSchema = z.object({ id: z.uuid(), base: itemSchema.nullable() })

/** One item that two people changed: as both found it, as it is now, and as this page has it. Null: not there. */
export interface Conflict {
  id: string
  base: Item | null
  theirs: Item | null
  mine: Item | null
}

/** The items of a conflict that the server reported; empty for any other problem. Both sides may have gone on since, so
 *  each is taken as it is now.
 *  @param now both sides' versions of an item */
export function conflictsOf(
  problem: Problem | undefined,
  now: { theirs(id: string): Item | undefined; mine(id: string): Item | undefined },
): Conflict[] {
  if (!problem?.type.endsWith('/item-conflict')) return []
  return (problem.items ?? []).flatMap((item): Conflict[] => {
    const known = conflictSchema.safeParse(item).data
    if (!known) return []
    const { id, base } = known
    return [{ id, base, theirs: now.theirs(id) ?? null, mine: now.mine(id) ?? null }]
  })
}

/** Whose version of a row is taken. */
export type Side = 'theirs' | 'mine'

/** One thing in which two versions of an item differ, with what each side has. */
export interface ConflictRow {
  /** The whole item where one side removed it, its place, or one of its properties. */
  field: 'item' | 'geometry' | { property: string }
  what: string
  theirs: string
  mine: string
  /** The only side that changed it; undefined where both did, so that somebody has to choose. */
  changedBy?: Side
}

/** A key for a row of an item's conflict. */
export const rowKey = ({ field }: ConflictRow): string => (typeof field === 'string' ? field : field.property)

/** Where the two sides differ: each property with both values, and the line or place with what each side did to it.
 *  Where one side removed the item there is nothing to compare field by field, so it says what each did. */
export function rowsOf({ base, theirs, mine }: Conflict): ConflictRow[] {
  if (!theirs || !mine) {
    const [their, own] = [sideWords(base, theirs), sideWords(base, mine)]
    return [{ field: 'item', what: 'item', theirs: their, mine: own }]
  }
  const [was, their, own] = [base && fieldsOf(base), fieldsOf(theirs), fieldsOf(mine)]
  const properties = Object.keys(own)
    .filter((key) => !isSame(their[key], own[key]))
    .map((key) => ({
      field: { property: key },
      what: words(key),
      theirs: inWords(their[key]),
      mine: inWords(own[key]),
      ...onlyBy(was?.[key], their[key], own[key]),
    }))
  if (isSame(theirs.geometry, mine.geometry)) return properties
  const placeOnly = (after: Item) => sideWords(base, base ? withPlaceOf(base, after) : after)
  const place: ConflictRow = {
    field: 'geometry',
    what: mine.geometry?.type === 'Point' ? 'place' : 'line',
    theirs: placeOnly(theirs),
    mine: placeOnly(mine),
    ...onlyBy(base?.geometry, theirs.geometry, mine.geometry),
  }
  return [place, ...properties]
}

const onlyBy = (was: unknown, theirs: unknown, mine: unknown): { changedBy?: Side } =>
  isSame(was, theirs) ? { changedBy: 'mine' } : isSame(was, mine) ? { changedBy: 'theirs' } : {}

/** The item as the choices make it, row by row; null where it is to be removed.
 *  @param sideOf whose version of a row is taken */
export function combine(conflict: Conflict, sideOf: (row: ConflictRow) => Side): Item | null {
  const { theirs, mine } = conflict
  const rows = rowsOf(conflict)
  if (!theirs || !mine) {
    const [whole] = rows
    return whole && sideOf(whole) === 'theirs' ? theirs : mine
  }
  let [geometry, properties] = [mine.geometry, fieldsOf(mine)]
  for (const row of rows.filter((each) => sideOf(each) === 'theirs')) {
    if (row.field === 'geometry') geometry = theirs.geometry
    else if (typeof row.field === 'object') {
      properties = { ...properties, [row.field.property]: fieldsOf(theirs)[row.field.property] }
    }
  }
  // Versions of one item are of one kind; the one door checks the result with its schema.
  return { ...mine, geometry, properties } as Item
}

const sideWords = (base: Item | null, after: Item | null): string =>
  isSame(base, after) ? 'as it was' : describeChanges([{ before: base, after }])

const fieldsOf = (item: Item): Record<string, unknown> => ({ ...item.properties })

const withPlaceOf = (base: Item, after: Item): Item =>
  // Versions of one item are of one kind, so that its geometry fits.
  ({ ...base, geometry: after.geometry }) as Item

/** locationConfidence → location confidence. */
const words = (key: string): string => key.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)

function inWords(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'none'
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'object' && 'text' in value) return String(value.text)
  return typeof value === 'string' ? value : String(value)
}
