import { isLineItem, itemWord, kindWords, lineKinds, type Item, type ItemKind } from '../items/item'
import { carryingPlaneSchema } from '../items/points'
import { reversedLine } from '../items/reversed-line'
import { formatAttitude } from '../structure/attitude-words'
import type { Edit } from './change-set'
import { changedFields, changedPlace, type FieldChange } from './compare-items'

const LONGEST = 300

/** What a set of edits did, in words for the ledger: "drew 1 contact", "moved 3 contacts, dip of attitude 14: 35 → 53".
 *  At most 300 characters. */
export function describeChanges(edits: readonly Edit[]): string {
  const [only] = edits
  const words = edits.length === 1 && only ? describeOne(only) : describeMany(edits)
  return words.length > LONGEST ? `${words.slice(0, LONGEST - 1)}…` : words
}

const isLineKind = (kind: ItemKind): boolean => lineKinds.some((line) => line === kind)
const counted = (count: number, kind: ItemKind): string =>
  `${count} ${count === 1 ? kindWords[kind].one : kindWords[kind].many}`

function verbOfAdding(kind: ItemKind): string {
  if (isLineKind(kind)) return 'drew'
  return kind === 'unit' ? 'added' : 'placed'
}

function describeOne({ before, after }: Edit): string {
  if (!before && after) {
    if (after.kind === 'sheet-face') return 'set up the sheet face'
    if (after.kind === 'unit') return `added unit ${after.properties.label}`
    return `${verbOfAdding(after.kind)} 1 ${named(after)}`
  }
  if (before && !after) return `removed 1 ${named(before)}`
  if (!before || !after) return 'changed nothing'
  const parts = [describePlace(before, after), describeFields(before, after)]
  return parts.filter(Boolean).join('; ') || `changed ${counted(1, after.kind)}`
}

/** Most edits of fields alone that are told with their values, beside others. */
const MOST_VALUES = 2

/** Edits of one kind that did the same: told together. */
interface Group {
  kind: ItemKind
  /** The words before the number of items. */
  did: string
  edits: Edit[]
}

function describeMany(edits: readonly Edit[]): string {
  const groups = new Map<string, Group>()
  for (const edit of edits) {
    const kind = (edit.after ?? edit.before)?.kind
    if (!kind) continue
    const did = whatWasDone(edit, kind)
    const group = groups.get(`${did} ${kind}`) ?? { kind, did, edits: [] }
    group.edits.push(edit)
    groups.set(`${did} ${kind}`, group)
  }
  return [...groups.values()].map(describeGroup).join(', ') || 'changed nothing'
}

function describeGroup({ kind, did, edits }: Group): string {
  const changesFields = did.startsWith('changed')
  return changesFields && edits.length <= MOST_VALUES
    ? edits.map(describeOne).join(', ')
    : `${did} ${counted(edits.length, kind)}`
}

/** Fields that were changed; of a line that was turned round, those that say something else of the ground than before. */
function fieldsChanged(before: Item, after: Item): FieldChange[] {
  const isReversed = isLineItem(before) && changedPlace(before, after)?.how === 'reversed'
  return changedFields(isReversed ? reversedLine(before) : before, after)
}

function whatWasDone({ before, after }: Edit, kind: ItemKind): string {
  if (!before) return verbOfAdding(kind)
  if (!after) return 'removed'
  const place = changedPlace(before, after)
  const fields = fieldsChanged(before, after)
  if (place) return fields.length > 0 ? `${place.how} and changed` : place.how
  const told = toldOf(fields)
  return told.length === 1 && told[0] ? `changed ${fieldWords(told[0].field)} of` : 'changed'
}

/** What tells an item from others of its kind: the proper name of a line, the label of a unit, the station of an attitude. */
export function called(item: Item): string {
  if (item.kind === 'unit') return ` ${item.properties.label}`
  const properties: Record<string, unknown> = item.properties
  const name = properties['name'] ?? properties['station']
  return typeof name === 'string' && name !== '' ? ` ${name}` : ''
}

/** An item in a sentence: "fault Cormorant", "attitude 14". */
export const named = (item: Item): string => `${itemWord(item)}${called(item)}`

function describePlace(before: Item, after: Item): string {
  const place = changedPlace(before, after)
  if (!place) return ''
  if (place.how !== 'moved' || !isLineItem(after)) return `${place.how} ${named(after)}`
  return `moved ${place.vertices} ${place.vertices === 1 ? 'vertex' : 'vertices'} of ${named(after)}`
}

/** Fields whose values mean nothing to a reader, or are too long to be told. */
const untold: readonly string[] = ['reading', 'unit', 'description', 'note']

/** A reading is only how the values were written; where they changed they say it all. */
const toldOf = <F extends { field: string }>(fields: readonly F[]): readonly F[] =>
  fields.length > 1 ? fields.filter(({ field }) => field !== 'reading') : fields

/** Most fields of one item that are told one by one. */
const MOST_FIELDS = 3

function describeFields(before: Item, after: Item): string {
  const told = toldOf(fieldsChanged(before, after))
  const words = told
    .slice(0, MOST_FIELDS)
    .map(({ field, before: from, after: to }) =>
      untold.includes(field)
        ? `changed ${fieldWords(field)} of ${named(before)}`
        : `${fieldWords(field)} of ${named(before)}: ${valueWords(from)} → ${valueWords(to)}`,
    )
  const more = told.length - MOST_FIELDS
  return [...words, ...(more > 0 ? [`${more} more fields`] : [])].join(', ')
}

/** Fields whose name is no word for what they say. */
const fieldNames: Partial<Record<string, string>> = { doubly: 'double plunge' }

/** locationConfidence → location confidence. */
export const fieldWords = (key: string): string =>
  fieldNames[key] ?? key.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)

const LONGEST_VALUE = 60

/** The value of a field, short enough for a sentence. */
export function valueWords(value: unknown): string {
  if (value === null || value === undefined || value === '') return 'none'
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'number') return String(value)
  const plane = carryingPlaneSchema.safeParse(value).data
  if (plane) return `${plane.type} ${formatAttitude(plane, 'strike-dip')}`
  const text = typeof value === 'string' ? value : JSON.stringify(value)
  return text.length > LONGEST_VALUE ? `${text.slice(0, LONGEST_VALUE - 1)}…` : text
}
