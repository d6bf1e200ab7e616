import { describe, expect, it } from 'vitest'
import { filterOf, isSameFilter, placeOf, placeWords, withPart } from '@/composables/ledger-filter'
import { rosa } from '../../../support/ledger-rows'

describe('the ledger’s filter in an address', () => {
  it('is read part by part, whatever else the address says', () => {
    const query = { person: rosa.id, kind: 'intake', itemKind: 'attitude', place: '1,2,3,4', from: '12' }
    expect(filterOf(query)).toEqual({
      person: rosa.id,
      kind: 'intake',
      itemKind: 'attitude',
      place: '1,2,3,4',
    })
  })

  it('leaves out what cannot be meant', () => {
    expect(filterOf({ person: 'Rosa', kind: 'sealed', place: '1,2,3', text: '  ', item: null })).toEqual({})
  })

  it('takes the first of a part stated twice', () => {
    expect(filterOf({ text: ['spring', 'autumn'] })).toEqual({ text: 'spring' })
  })

  it('changes part by part; an empty one goes', () => {
    const filter = withPart({ text: 'spring' }, 'kind', 'edit')
    expect(filter).toEqual({ text: 'spring', kind: 'edit' })
    expect(withPart(filter, 'text', '')).toEqual({ kind: 'edit' })
  })

  it('is the same only where every part is', () => {
    expect(isSameFilter({ text: 'a' }, { text: 'a' })).toBe(true)
    expect(isSameFilter({ text: 'a' }, { text: 'a', kind: 'edit' })).toBe(false)
  })
})

describe('a place', () => {
  it('is asked for in whole metres, outward, in a form that the filter takes', () => {
    const place = placeOf([288_430.4, 5_283_107.9, 290_119.2, 5_284_000])
    expect(place).toBe('288430,5283107,290120,5284000')
    expect(filterOf({ place })).toEqual({ place })
    expect(placeWords(place).replaceAll('\u00a0', ' ')).toBe('288 430–290 120 E, 5 283 107–5 284 000 N')
  })
})
