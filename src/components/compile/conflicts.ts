import { z } from 'zod'
import type { Problem } from '@shared/api/problems'
import { describeChanges } from '@shared/changes/describe-changes'
import { itemSchema, type Item } from '@shared/items/item'
import { isSame } from '@/stores/same-item'

const conflictSchema = z.object({
  id: z.uuid(),
  base: itemSchema.nullable(),
  theirs: itemSchema.nullable(),
  yours: itemSchema.nullable(),
})

/** One item that two people changed. */
export type Conflict = z.infer<typeof conflictSchema>

/** The items of a conflict that the server reported; empty for any other problem. */
export function conflictsOf(problem: Problem | undefined): Conflict[] {
  if (!problem?.type.endsWith('/item-conflict')) return []
  return (problem.items ?? []).flatMap((item) => conflictSchema.safeParse(item).data ?? [])
}

/** One thing in which two versions of an item differ, with what each side has. */
export interface Difference {
  what: string
  theirs: string
  yours: string
}

/** Where the two sides differ: each property with both values, and the line or place with what each side did to it.
 *  Where one side removed the item there is nothing to compare field by field, so it says what each did. */
export function differencesOf({ base, theirs, yours }: Conflict): Difference[] {
  if (!theirs || !yours) {
    return [{ what: 'item', theirs: sideWords(base, theirs), yours: sideWords(base, yours) }]
  }
  const [their, your] = [fieldsOf(theirs), fieldsOf(yours)]
  const fields = Object.keys(your)
    .filter((key) => !isSame(their[key], your[key]))
    .map((key) => ({ what: words(key), theirs: inWords(their[key]), yours: inWords(your[key]) }))
  if (isSame(theirs.geometry, yours.geometry)) return fields
  const placeOnly = (after: Item) => sideWords(base, base ? withPlaceOf(base, after) : after)
  const what = yours.geometry?.type === 'Point' ? 'place' : 'line'
  return [{ what, theirs: placeOnly(theirs), yours: placeOnly(yours) }, ...fields]
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
