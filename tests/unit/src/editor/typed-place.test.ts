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

  it.each(['', 'here', '288430', '288430,', '1,2,3'])('refuses “%s” and says how to write it', (text) => {
    expect(parsePlace(text)).toMatchObject({
      outcome: 'refused',
      reason: expect.stringMatching(/easting and northing/),
    })
  })
})
