import { z } from 'zod'
import { fieldWords, valueWords } from '@shared/changes/describe-changes'
import type { Difference } from '@shared/changes/differences'
import { itemKinds, kindWords, type ItemKind } from '@shared/items/item'
import type { DifferenceCount } from '@shared/api/comparisons'

/** Differences of one kind of item. */
export interface ComparedGroup {
  kind: ItemKind
  /** "contacts: 3 added, 1 moved" */
  words: string
  differences: Difference[]
}

/** A reading, whatever it is of. */
const writtenSchema = z.object({ text: z.string() })

const parts = [
  ['added', 'added'],
  ['removed', 'removed'],
  ['moved', 'moved'],
  ['reattributed', 're-attributed'],
] as const

/** How many differ, in words: "3 added, 1 moved". */
export const countWords = (count: DifferenceCount): string =>
  parts.flatMap(([key, word]) => (count[key] > 0 ? [`${count[key]} ${word}`] : [])).join(', ')

/** Differences under their kinds, in the order of kinds; a kind that has none read yet stands there with its counts. */
export function groupByKind(
  differences: readonly Difference[],
  counts: readonly DifferenceCount[],
): ComparedGroup[] {
  return itemKinds.flatMap((kind) => {
    const count = counts.find((each) => each.kind === kind)
    if (!count) return []
    const ofKind = differences.filter((difference) => difference.kind === kind)
    const only = count.added + count.removed + Math.max(count.moved, count.reattributed) === 1
    const words = `${kindWords[kind][only ? 'one' : 'many']}: ${countWords(count)}`
    return [{ kind, words, differences: ofKind }]
  })
}

/** How an item differs: "added", "moved 42 m, re-attributed". */
export function howWords({ what, place, fields }: Difference): string {
  if (what !== 'changed') return what
  const moved = place && (place.metres > 0 ? `${place.how} ${metresWords(place.metres)}` : place.how)
  return [moved, fields.length > 0 ? 're-attributed' : null].filter(Boolean).join(', ')
}

/** A distance as figures need it: below ten metres to the decimetre. */
const metresWords = (metres: number): string => `${metres < 10 ? metres.toFixed(1) : Math.round(metres)} m`

/** The fields that differ, each with both values in words.
 *  @param labelOf label of a legend unit by its id; undefined for one that is gone */
export function fieldRows(
  { fields }: Difference,
  labelOf: (unit: string) => string | undefined,
): { field: string; before: string; after: string }[] {
  const words = (field: string, value: unknown): string => {
    if (field === 'unit' && typeof value === 'string') return labelOf(value) ?? 'a unit that is gone'
    // How a reading was written says it all; the rest of it is what follows from that.
    const written = field === 'reading' ? writtenSchema.safeParse(value).data : undefined
    return written ? `“${written.text}”` : valueWords(value)
  }
  return fields.map(({ field, before, after }) => ({
    field: fieldWords(field),
    before: words(field, before),
    after: words(field, after),
  }))
}

/** One item of a list in a few words: "attitude GH-001: dip 53 → 35", "contact: moved 363 m". */
export function differenceWords(
  difference: Difference,
  labelOf: (unit: string) => string | undefined,
): string {
  const fields = fieldRows(difference, labelOf).map(
    ({ field, before, after }) => `${field} ${before} → ${after}`,
  )
  const how = fields.length > 0 && !difference.place ? [] : [howWords({ ...difference, fields: [] })]
  return `${difference.name}: ${[...how, ...fields].join(', ')}`
}
