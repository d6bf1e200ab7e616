import { describe, expect, it } from 'vitest'
import { lineationTypes, planeTypes, stationTypes } from '@shared/items/points'
import { readPointType, saysTopsUnknown, suggestPointType } from '@shared/intake/point-words'

const attitude = (type: string, traits: object = {}) => ({
  kind: 'attitude',
  type,
  overturned: false,
  undulating: false,
  topsKnown: false,
  ...traits,
})
const place = (type: string) => ({ kind: 'station', type })

describe('readPointType', () => {
  it.each([
    ['Strike and dip of strata (tops unknown)', attitude('bedding')],
    ['Strike of vertical strata', attitude('bedding')],
    ['Overturned bedding', attitude('bedding', { overturned: true })],
    ['Bedding-parallel foliation', attitude('foliation')],
    ['cleavage', attitude('cleavage')],
    ['Joint plane', attitude('joint')],
    ['S0', attitude('bedding')],
    ['undulating bedding, tops known', attitude('bedding', { undulating: true, topsKnown: true })],
    ['crenulated foliation', attitude('foliation', { undulating: true })],
    ['outcrop', place('station')],
    ['Sample', place('sample')],
    ['fossils', place('fossil-locality')],
    ['adit', place('mine-adit')],
    ['younging direction', place('tops-direction')],
    ['Stretching lineation', { kind: 'lineation', type: 'lineation' }],
    ['fold axis', { kind: 'lineation', type: 'minor-fold-axis' }],
  ])('reads “%s”', (text, target) => {
    expect(readPointType(text)).toEqual(target)
  })

  it.each(['fault', 'bedding and cleavage', 'overturned joint', 'sample of bedding', 'overturned', '10', ''])(
    'does not guess at “%s”',
    (text) => {
      expect(readPointType(text)).toBeUndefined()
    },
  )

  it('reads every type that there is by its own name', () => {
    const words = (type: string) => type.replaceAll('-', ' ')
    expect(planeTypes.map((type) => readPointType(words(type)))).toEqual(
      planeTypes.map((type) => attitude(type)),
    )
    expect(stationTypes.map((type) => readPointType(words(type)))).toEqual(stationTypes.map(place))
    expect(lineationTypes.map((type) => readPointType(words(type)))).toEqual(
      lineationTypes.map((type) => ({ kind: 'lineation', type })),
    )
  })

  it('offers a likely meaning for a misspelling', () => {
    expect(suggestPointType('beding')).toEqual(attitude('bedding'))
    expect(suggestPointType('foliaton plane')).toEqual(attitude('foliation'))
  })
})

it('hears that tops are unknown', () => {
  expect(saysTopsUnknown('Strike and dip of strata (tops unknown)')).toBe(true)
  expect(saysTopsUnknown('Strike and dip of strata')).toBe(false)
})
