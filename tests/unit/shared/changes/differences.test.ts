import { describe, expect, it } from 'vitest'
import { changedFields, changedPlace } from '@shared/changes/compare-items'
import { differenceFeatures, differenceHead, differenceRows, toDifference } from '@shared/changes/differences'
import { csvLine } from '@shared/tables/csv'
import type { Item } from '@shared/items/item'
import { aLine, aPoint, aUnit } from '../../../support/sheet-items'

const withGeometry = (item: Item, coordinates: unknown): Item =>
  ({ ...item, geometry: { ...item.geometry, coordinates } }) as Item // A test's own geometry of the same type.
const withProperties = (item: Item, properties: object): Item =>
  ({ ...item, properties: { ...item.properties, ...properties } }) as Item // Properties of the same kind.

const contact = aLine(
  'contact',
  [
    [0, 0],
    [10, 0],
    [20, 5],
  ],
  { name: 'Spindrift' },
)
const attitude = aPoint('attitude', [5, 5], { strike: 45, dip: 35, station: '14' })

describe('comparing two versions of an item', () => {
  it('finds every field that differs, with both values', () => {
    expect(
      changedFields(contact, withProperties(contact, { identity: 'questionable', note: 'scree' })),
    ).toEqual([
      { field: 'identity', before: 'certain', after: 'questionable' },
      { field: 'note', before: '', after: 'scree' },
    ])
    expect(changedFields(contact, contact)).toEqual([])
  })

  it('takes the same content in another order of keys for the same', () => {
    const reading = { text: '045/35', convention: 'strike-dip', northReference: 'true', declination: null }
    const turned = Object.fromEntries(Object.entries(reading).toReversed())
    expect(
      changedFields(withProperties(attitude, { reading }), withProperties(attitude, { reading: turned })),
    ).toEqual([])
  })

  it('says how far a line was moved, and tells reshaping and reversing apart', () => {
    const vertices = contact.geometry.coordinates
    expect(changedPlace(contact, contact)).toBeUndefined()
    expect(changedPlace(contact, withGeometry(contact, [[0, 0], [10, -3], vertices[2]]))).toEqual({
      how: 'moved',
      metres: 3,
      vertices: 1,
    })
    expect(changedPlace(contact, withGeometry(contact, vertices.toReversed()))?.how).toBe('reversed')
    expect(changedPlace(contact, withGeometry(contact, [...vertices, [30, 5]]))).toMatchObject({
      how: 'reshaped',
      metres: 10,
    })
    expect(changedPlace(attitude, withGeometry(attitude, [8, 9]))).toMatchObject({ how: 'moved', metres: 5 })
  })
})

describe('a difference', () => {
  const both = withProperties(withGeometry(attitude, [8, 9]), { dip: 53 })

  it('says what, where, which fields, and all of it in words', () => {
    expect(toDifference({ before: attitude, after: both })).toMatchObject({
      kind: 'attitude',
      name: 'attitude 14',
      what: 'changed',
      place: { how: 'moved', metres: 5 },
      fields: [{ field: 'dip', before: 35, after: 53 }],
      words: 'moved attitude 14; dip of attitude 14: 35 → 53',
    })
    expect(toDifference({ before: null, after: contact })).toMatchObject({
      what: 'added',
      place: null,
      fields: [],
    })
    expect(toDifference({ before: aUnit({}), after: null })).toMatchObject({
      what: 'removed',
      name: 'unit Dr',
    })
  })

  it('fills one row of a table per field, and at least one', () => {
    const several = withProperties(both, { note: '=SUM(A1)' })
    const rows = differenceRows(toDifference({ before: attitude, after: several }))
    expect(rows.map((row) => row.slice(4))).toEqual([
      ['moved', '5.000', 'note', '', '=SUM(A1)'],
      ['moved', '5.000', 'dip', '35', '53'],
    ])
    expect(rows.every((row) => row.length === differenceHead.length)).toBe(true)
    expect(csvLine(rows[0] ?? [])).toContain(`,'=SUM(A1)`)
    expect(differenceRows(toDifference({ before: contact, after: null }))).toHaveLength(1)
  })

  it('makes a feature of each state that shows something', () => {
    const states = (before: Item | null, after: Item | null) =>
      differenceFeatures(toDifference({ before, after }), ([x, y]) => [x / 100, y / 100])
    expect(states(attitude, both)).toMatchObject([
      { geometry: { coordinates: [0.05, 0.05] }, properties: { state: 'before' } },
      { geometry: { coordinates: [0.08, 0.09] }, properties: { state: 'after', metres: 5 } },
    ])
    expect(states(attitude, withProperties(attitude, { dip: 1 }))).toHaveLength(1)
    expect(states(contact, null)).toMatchObject([{ properties: { state: 'before', what: 'removed' } }])
    expect(states(null, aUnit({}))).toMatchObject([{ geometry: null }])
  })
})
