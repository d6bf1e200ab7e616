import { isLineItem, kindWords, lineKinds, type Item, type ItemKind } from '../items/item'
import type { XY } from '../units'
import type { Edit } from './change-set'

/** What a set of edits did, in words for the ledger: "drew 1 contact", "dip of attitude: 35 → 53",
 *  "2 attitudes added, 1 contact changed". At most 300 characters. */
export function describeChanges(edits: readonly Edit[]): string {
  const [only] = edits
  const words = edits.length === 1 && only ? describeOne(only) : describeMany(edits)
  return words.length > 300 ? `${words.slice(0, 299)}…` : words
}

const isLineKind = (kind: ItemKind): boolean => lineKinds.some((line) => line === kind)
const counted = (count: number, kind: ItemKind): string =>
  `${count} ${count === 1 ? kindWords[kind].one : kindWords[kind].many}`

function describeOne({ before, after }: Edit): string {
  if (!before && after) {
    if (after.kind === 'sheet-face') return 'set up the sheet face'
    if (after.kind === 'unit') return `added unit ${after.properties.label}`
    return `${isLineKind(after.kind) ? 'drew' : 'placed'} ${counted(1, after.kind)}${called(after)}`
  }
  if (before && !after) return `removed ${counted(1, before.kind)}${called(before)}`
  if (!before || !after) return 'changed nothing'
  const fields = describeFields(before, after)
  const place = describePlace(before, after)
  return [place, fields].filter(Boolean).join('; ') || `changed ${counted(1, after.kind)}`
}

function describeMany(edits: readonly Edit[]): string {
  const counts = new Map<string, { kind: ItemKind; what: 'added' | 'changed' | 'removed'; count: number }>()
  for (const { before, after } of edits) {
    const kind = (after ?? before)?.kind
    if (!kind) continue
    const what = !before ? 'added' : !after ? 'removed' : 'changed'
    const entry = counts.get(`${what} ${kind}`) ?? { kind, what, count: 0 }
    counts.set(`${what} ${kind}`, { ...entry, count: entry.count + 1 })
  }
  const groups = [...counts.values()]
  const [only] = groups
  if (groups.length === 1 && only?.what === 'added') {
    return `${isLineKind(only.kind) ? 'drew' : only.kind === 'unit' ? 'added' : 'placed'} ${counted(only.count, only.kind)}`
  }
  return (
    groups.map(({ kind, what, count }) => `${counted(count, kind)} ${what}`).join(', ') || 'changed nothing'
  )
}

/** The proper name of a line, the label of a unit, the station of an attitude: what tells it from others of its kind. */
function called(item: Item): string {
  if (item.kind === 'unit') return ` ${item.properties.label}`
  const properties: Record<string, unknown> = item.properties
  const name = properties['name'] ?? properties['station']
  return typeof name === 'string' && name !== '' ? ` ${name}` : ''
}

const named = (item: Item): string => `${kindWords[item.kind].one}${called(item)}`

function describePlace(before: Item, after: Item): string {
  if (JSON.stringify(before.geometry) === JSON.stringify(after.geometry)) return ''
  if (!isLineItem(before) || !isLineItem(after)) return `moved ${named(after)}`
  const [from, to] = [before.geometry.coordinates, after.geometry.coordinates]
  if (from.length !== to.length) return `reshaped ${named(after)}`
  if (from.every((point, index) => isSame(point, to[to.length - 1 - index])))
    return `reversed ${named(after)}`
  const moved = from.filter((point, index) => !isSame(point, to[index])).length
  return `moved ${moved} ${moved === 1 ? 'vertex' : 'vertices'} of ${named(after)}`
}

const isSame = (a: XY, b: XY | undefined): boolean => a[0] === b?.[0] && a[1] === b[1]

/** Fields whose values mean nothing to a reader, with what to say instead. */
const untold: Record<string, string> = {
  reading: 'reading',
  unit: 'unit',
  description: 'description',
  note: 'note',
}

function describeFields(before: Item, after: Item): string {
  const [from, to]: Record<string, unknown>[] = [before.properties, after.properties]
  if (!from || !to) return ''
  const changed = Object.keys(to).filter((key) => JSON.stringify(from[key]) !== JSON.stringify(to[key]))
  // A reading is only how the values were written; where they changed they say it all.
  const told = changed.length > 1 ? changed.filter((key) => key !== 'reading') : changed
  return told
    .slice(0, 3)
    .map((key) =>
      untold[key]
        ? `changed ${untold[key]} of ${named(before)}`
        : `${words(key)} of ${named(before)}: ${inWords(from[key])} → ${inWords(to[key])}`,
    )
    .concat(told.length > 3 ? [`${told.length - 3} more fields`] : [])
    .join(', ')
}

/** locationConfidence → location confidence. */
const words = (key: string): string => key.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)

function inWords(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'none'
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'string') return value.length > 60 ? `${value.slice(0, 59)}…` : value
  return typeof value === 'number' ? String(value) : JSON.stringify(value)
}
