import { describe, expect, it } from 'vitest'
import { importanceOf, planesApart } from '@shared/symbols/importance'
import type { ItemOf } from '@shared/items/item'
import { aPoint } from '../../../support/sheet-items'

const anAttitude = (properties: Partial<ItemOf<'attitude'>['properties']>): ItemOf<'attitude'> =>
  aPoint('attitude', [0, 0], { strike: 45, dip: 40, ...properties })

/** One of a hundred, five degrees from its neighbours. */
const usual = { distinctness: 5, alike: 100 }

describe('importance of a point symbol', () => {
  it('puts overturned before vertical, vertical before horizontal, and that before inclined bedding', () => {
    const inOrder = [
      anAttitude({ overturned: true }),
      anAttitude({ dip: 90 }),
      anAttitude({ strike: null, dip: 0 }),
      anAttitude({}),
    ].map((item) => importanceOf(item, usual))
    expect(inOrder).toEqual(inOrder.toSorted((a, b) => b - a))
    expect(new Set(inOrder).size).toBe(4)
  })

  it('puts bedding before foliation, foliation before cleavage, and that before joints', () => {
    const inOrder = (['bedding', 'foliation', 'cleavage', 'joint'] as const).map((type) =>
      importanceOf(anAttitude({ type }), usual),
    )
    expect(inOrder).toEqual(inOrder.toSorted((a, b) => b - a))
  })

  it('prefers the steeper of two beds, and the one that its neighbours do not repeat', () => {
    expect(importanceOf(anAttitude({ dip: 70 }), usual)).toBeGreaterThan(
      importanceOf(anAttitude({ dip: 20 }), usual),
    )
    expect(importanceOf(anAttitude({}), { ...usual, distinctness: 60 })).toBeGreaterThan(
      importanceOf(anAttitude({}), usual),
    )
  })

  it('prefers what is rare on the sheet', () => {
    expect(importanceOf(anAttitude({}), { ...usual, alike: 2 })).toBeGreaterThan(
      importanceOf(anAttitude({}), usual),
    )
  })

  it('never lets a unit label give way, and plain stations first', () => {
    const label = aPoint('unit-label', [0, 0], { unit: '00000000-0000-4000-8000-000000000001' })
    expect(importanceOf(label, usual)).toBe(Infinity)
    const station = importanceOf(aPoint('station', [0, 0], {}), usual)
    expect(station).toBeLessThan(importanceOf(anAttitude({ type: 'joint', dip: 1 }), usual))
    expect(station).toBeLessThan(importanceOf(aPoint('station', [0, 0], { type: 'borehole' }), usual))
  })
})

describe('angle between planes', () => {
  it('is the difference of dips for one strike, and the strikes do not matter to horizontal planes', () => {
    expect(planesApart({ strike: 30, dip: 10 }, { strike: 30, dip: 55 })).toBeCloseTo(45, 9)
    expect(planesApart({ strike: null, dip: 0 }, { strike: 200, dip: 35 })).toBeCloseTo(35, 9)
  })

  it('knows a vertical plane by either of its strikes', () => {
    expect(planesApart({ strike: 20, dip: 90 }, { strike: 200, dip: 90 })).toBeCloseTo(0, 5)
  })
})
