import { describe, expect, it } from 'vitest'
import { readPointType, saysTopsUnknown, suggestPointType } from '@shared/intake/point-words'

const attitude = (type: string, overturned = false) => ({ kind: 'attitude', type, overturned })

describe('readPointType', () => {
  it.each([
    ['Strike and dip of strata (tops unknown)', attitude('bedding')],
    ['Strike of vertical strata', attitude('bedding')],
    ['Overturned bedding', attitude('bedding', true)],
    ['Bedding-parallel foliation', attitude('foliation')],
    ['cleavage', attitude('cleavage')],
    ['Joint plane', attitude('joint')],
    ['S0', attitude('bedding')],
    ['outcrop', { kind: 'station' }],
  ])('reads “%s”', (text, target) => {
    expect(readPointType(text)).toEqual(target)
  })

  it.each(['fault', 'bedding and cleavage', 'sample', 'overturned', '10', ''])(
    'does not guess at “%s”',
    (text) => {
      expect(readPointType(text)).toBeUndefined()
    },
  )

  it('offers a likely meaning for a misspelling', () => {
    expect(suggestPointType('beding')).toEqual(attitude('bedding'))
    expect(suggestPointType('foliaton plane')).toEqual(attitude('foliation'))
  })
})

it('hears that tops are unknown', () => {
  expect(saysTopsUnknown('Strike and dip of strata (tops unknown)')).toBe(true)
  expect(saysTopsUnknown('Strike and dip of strata')).toBe(false)
})
