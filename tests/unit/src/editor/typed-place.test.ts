import { describe, expect, it } from 'vitest'
import { parsePlace } from '@/editor/typed-place'

describe('typed places', () => {
  it.each([
    ['288430 5283107', [288430, 5283107]],
    ['288430.5, 5283107.25', [288430.5, 5283107.25]],
    ['288 430 5 283 107', [288430, 5283107]],
    ['288\u2009430 E 5\u2009283\u2009107 N', [288430, 5283107]],
    ['E 288430 m N 5283107 m', [288430, 5283107]],
    ['288430.12345;5283107', [288430.123, 5283107]],
  ])('reads %s', (text, place) => {
    expect(parsePlace(text)).toEqual({ outcome: 'place', at: place })
  })

  const face = { min: [284_000, 5_278_000], max: [294_000, 5_289_000] } as const
  const onSheet = (text: string) => parsePlace(text, { min: [...face.min], max: [...face.max] })

  it('takes places on the map face and a little over its edge', () => {
    expect(onSheet('284000 5278000').outcome).toBe('place')
    expect(onSheet('283000 5289400').outcome).toBe('place')
  })

  it.each([
    ['5280000 290000', 'Easting and northing look exchanged: 290000 5280000 lies on the map face.'],
    ['285000 5270000', 'This place lies 8000 m outside the map face. Eastings run from 284000 to 294000'],
    ['0 0', 'This place lies 5286 km outside the map face.'],
  ])('refuses %s, far from the sheet, and says where it lies', (text, reason) => {
    expect(onSheet(text)).toMatchObject({ outcome: 'refused', reason: expect.stringContaining(reason) })
  })

  it.each(['', 'here', '288430', '288430,', '1,2,3'])('refuses “%s” and says how to write it', (text) => {
    expect(parsePlace(text)).toMatchObject({
      outcome: 'refused',
      reason: expect.stringMatching(/easting and northing/),
    })
  })
})
