import { describe, expect, it } from 'vitest'
import { mergeItem } from '@shared/changes/merge-item'
import type { ItemOf } from '@shared/items/item'
import { aLine, aPoint } from '../../../support/sheet-items'

const fault = aLine('fault', [[0, 0], [100, 0], [200, 10]], { type: 'thrust', side: 'left' }) // prettier-ignore
const moved: ItemOf<'fault'> = {
  ...fault,
  geometry: { ...fault.geometry, coordinates: [[0, 0], [100, 8], [200, 10]] }, // prettier-ignore
}
const located = (item: ItemOf<'fault'>): ItemOf<'fault'> => ({
  ...item,
  properties: { ...item.properties, locationConfidence: 'inferred' },
})

describe('what two people made of one item', () => {
  it('is laid together where one moved it and the other changed what it says', () => {
    const both = { outcome: 'merged', item: located(moved) }
    expect(mergeItem(fault, moved, located(fault))).toEqual(both)
    expect(mergeItem(fault, located(fault), moved)).toEqual(both)
  })

  it('is as either has it where both did the same, whatever the order of the keys', () => {
    const reordered = Object.fromEntries(Object.entries(moved.properties).toReversed())
    const theirs = { ...moved, properties: reordered as ItemOf<'fault'>['properties'] }
    expect(mergeItem(fault, theirs, moved)).toEqual({ outcome: 'merged', item: moved })
  })

  it('names the part that both changed', () => {
    const elsewhere = {
      ...fault,
      geometry: { ...fault.geometry, coordinates: [[0, 0], [200, 30]] as [number, number][] }, // prettier-ignore
    }
    expect(mergeItem(fault, moved, elsewhere)).toEqual({ outcome: 'conflict', parts: ['geometry'] })
    const named = { ...fault, properties: { ...fault.properties, name: 'Skua thrust' } }
    expect(mergeItem(fault, located(fault), named)).toEqual({ outcome: 'conflict', parts: ['properties'] })
    expect(mergeItem(fault, located(moved), { ...elsewhere, properties: named.properties })).toEqual({
      outcome: 'conflict',
      parts: ['geometry', 'properties'],
    })
  })

  it('never mixes strike and dip of two readings', () => {
    const station = aPoint('attitude', [0, 0], { strike: 45, dip: 40 })
    const turned = { ...station, properties: { ...station.properties, strike: 225 } }
    const steeper = { ...station, properties: { ...station.properties, dip: 70 } }
    expect(mergeItem(station, turned, steeper)).toEqual({ outcome: 'conflict', parts: ['properties'] })
  })

  it('keeps the side of a line that one reversed while the other changed what it says apart', () => {
    const reversed: ItemOf<'fault'> = {
      ...fault,
      geometry: { ...fault.geometry, coordinates: fault.geometry.coordinates.toReversed() },
      properties: { ...fault.properties, side: 'right' },
    }
    expect(mergeItem(fault, reversed, located(fault))).toEqual({
      outcome: 'conflict',
      parts: ['properties'],
    })
  })
})
