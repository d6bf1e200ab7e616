import { describe, expect, it } from 'vitest'
import { faultTypes, foldForms, foldWords, otherLineTypes } from '@shared/items/lines'
import { isSenseless, readConfidence, readLineType, suggestLineType } from '@shared/intake/line-words'

const fault = (type: string) => ({ kind: 'fault', type })
const fold = (form: string) => ({ kind: 'axial-trace', form })

describe('readLineType', () => {
  it.each([
    ['Geologic boundary', { kind: 'contact' }],
    ['Lithological contact', { kind: 'contact' }],
    ['Fault', fault('unspecified')],
    ['Concealed fault', fault('unspecified')],
    ['normal', fault('normal')],
    ['Reverse fault', fault('reverse')],
    ['THRUST', fault('thrust')],
    ['left slip', fault('left-lateral')],
    ['right-slip', fault('right-lateral')],
    ['dextral strike-slip fault', fault('right-lateral')],
    ['strike_slip', fault('unspecified')],
    ['Antiform axis', fold('antiform')],
    ['AnticlineAxialTrace', fold('anticline')],
    ['syncline, approximately located', fold('syncline')],
    ['overturned synclinal axis', fold('overturned-syncline')],
    ['Monocline (synclinal bend)', fold('monocline-synclinal-bend')],
    ['scissor fault', fault('rotational')],
    ['dyke', { kind: 'other-line', type: 'dike' }],
    ['marker bed', { kind: 'other-line', type: 'marker-bed' }],
    ['Map frame', { kind: 'leave-out' }],
  ])('reads “%s”', (text, target) => {
    expect(readLineType(text)).toEqual(target)
  })

  it.each([
    'fold',
    'fault contact',
    'fault breccia',
    'Fault?',
    'anticline or syncline',
    'normal thrust',
    'monocline',
    'overturned fault',
    'overturned',
    'c',
    '',
    '1611',
  ])('does not guess at “%s”', (text) => {
    expect(readLineType(text)).toBeUndefined()
  })
})

describe('every type that there is', () => {
  it('is read by its own name', () => {
    const stated = faultTypes.filter((type) => type !== 'unspecified')
    expect(stated.map((type) => readLineType(`${type} fault`))).toEqual(stated.map(fault))
    expect(foldForms.map((form) => readLineType(foldWords[form]))).toEqual(foldForms.map(fold))
    expect(otherLineTypes.map(readLineType)).toEqual(
      otherLineTypes.map((type) => ({ kind: 'other-line', type })),
    )
  })
})

describe('suggestLineType', () => {
  it.each([
    ['thrsut', fault('thrust')],
    ['snycline', fold('syncline')],
    ['striek-slip', fault('unspecified')],
    ['lrft slip', fault('left-lateral')],
    ['Fault?', fault('unspecified')],
    ['South Skerry Thrust', fault('thrust')],
  ])('offers a likely meaning for “%s”', (text, target) => {
    expect(suggestLineType(text)).toEqual(target)
  })

  it.each(['c', 'road', 'fault contact', '1611'])('offers nothing for “%s”', (text) => {
    expect(suggestLineType(text)).toBeUndefined()
  })
})

describe('readConfidence', () => {
  it.each([
    ['certain', 'certain'],
    ['Accurately located', 'certain'],
    ['approx.', 'approximate'],
    ['APPROXIMATE', 'approximate'],
    ['inferred', 'inferred'],
    ['concealed', 'concealed'],
    ['buried', 'concealed'],
  ])('reads “%s”', (text, confidence) => {
    expect(readConfidence(text)).toBe(confidence)
  })

  it('reads a confidence among other words only where asked to', () => {
    expect(readConfidence('Concealed fault')).toBeUndefined()
    expect(readConfidence('Concealed fault', true)).toBe('concealed')
  })

  it.each(['2', 'probable', 'certain or inferred', ''])('does not guess at “%s”', (text) => {
    expect(readConfidence(text)).toBeUndefined()
  })
})

it('tells strike-slip of unstated sense from stated', () => {
  expect(isSenseless('strike-slip')).toBe(true)
  expect(isSenseless('left-lateral strike-slip')).toBe(false)
  expect(isSenseless('thrust')).toBe(false)
})
