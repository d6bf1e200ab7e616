import { z } from 'zod'
import { itemKinds, itemSchema } from '../items/item'
import type { LonLat, XY } from '../units'
import { editedId, type Edit } from './change-set'
import { changedFields, changedPlace } from './compare-items'
import { describeChanges, fieldWords, named } from './describe-changes'

/** What two states of a sheet show of one item. */
export const differenceSchema = z
  .strictObject({
    id: z.uuid(),
    kind: z.enum(itemKinds),
    /** What a person calls it: "fault Cormorant". */
    name: z.string(),
    what: z.enum(['added', 'removed', 'changed']),
    before: itemSchema.nullable(),
    after: itemSchema.nullable(),
    /** How its place differs, and by how many metres at most; null where it does not. */
    place: z
      .strictObject({ how: z.enum(['moved', 'reshaped', 'reversed']), metres: z.number().min(0) })
      .nullable(),
    /** Properties that differ, of an item that is in both states. */
    fields: z.array(z.strictObject({ field: z.string(), before: z.unknown(), after: z.unknown() })),
    /** All of it in words. */
    words: z.string(),
  })
  .meta({ id: 'Difference' })
export type Difference = z.infer<typeof differenceSchema>

/** An edit, told: what it did, where and to which fields. */
export function toDifference(edit: Edit): Difference {
  const { before, after } = edit
  const item = after ?? before
  if (!item) throw new TypeError('A difference needs an item before or after it.')
  const both = before && after
  const place = both ? changedPlace(before, after) : undefined
  return {
    id: editedId(edit),
    kind: item.kind,
    name: named(item),
    what: both ? 'changed' : after ? 'added' : 'removed',
    before,
    after,
    place: place ? { how: place.how, metres: place.metres } : null,
    fields: both ? changedFields(before, after) : [],
    words: describeChanges([edit]),
  }
}

/** Head of the table that {@link differenceRows} fills. */
export const differenceHead = [
  'item',
  'kind',
  'name',
  'what',
  'place',
  'moved at most (m)',
  'field',
  'before',
  'after',
]

/** Rows of a table: one per field that differs, at least one per item. Distances to the millimetre of the sheet's grid. */
export function differenceRows({ id, kind, name, what, place, fields }: Difference): string[][] {
  const item = [id, kind, name, what, place?.how ?? '', place ? place.metres.toFixed(3) : '']
  if (fields.length === 0) return [[...item, '', '', '']]
  return fields.map(({ field, before, after }) => [...item, fieldWords(field), cell(before), cell(after)])
}

const cell = (value: unknown): string => {
  if (value === null || value === undefined) return ''
  return typeof value === 'object' ? JSON.stringify(value) : String(value)
}

/** GeoJSON features (RFC 7946) of a difference: the item as it is after, and as it was before where that was at another
 *  place or it is gone. Items without a place have a null geometry.
 *  @param toLonLat sheet metres → WGS 84 degrees */
export function differenceFeatures(difference: Difference, toLonLat: (xy: XY) => LonLat): object[] {
  const { before, after, place, fields, ...told } = difference
  const states = [
    ...(before && (place || !after) ? [{ state: 'before', item: before }] : []),
    ...(after ? [{ state: 'after', item: after }] : []),
  ]
  return states.map(({ state, item }) => ({
    type: 'Feature',
    id: `${told.id}/${state}`,
    geometry: placed(item.geometry, toLonLat),
    properties: {
      ...told,
      state,
      place: place?.how ?? null,
      metres: place?.metres ?? null,
      fields: Object.fromEntries(fields.map(({ field, ...values }) => [field, values])),
    },
  }))
}

type Geometry = NonNullable<Difference['after']>['geometry']

function placed(geometry: Geometry, toLonLat: (xy: XY) => LonLat): object | null {
  if (geometry === null) return null
  return geometry.type === 'Point'
    ? { type: 'Point', coordinates: toLonLat(geometry.coordinates) }
    : { type: 'LineString', coordinates: geometry.coordinates.map(toLonLat) }
}
