import { describe, expect, it } from 'vitest'
import { parseAzimuth } from '@shared/structure/azimuth-text'

describe('reading a direction', () => {
  it.each([
    ['045', 45],
    ['45°', 45],
    ['360', 0],
    ['N45E', 45],
    ['S20W', 200],
    ['N30W', 330],
    ['S10E', 170],
    ['SE', 135],
    ['north-east', 45],
    ['NNW', 337.5],
  ])('takes %s as %d', (text, azimuth) => {
    expect(parseAzimuth(text)).toEqual({ outcome: 'azimuth', azimuth })
  })

  it.each([
    ['400', 'Azimuth 400 is more than 360'],
    ['-5', 'Azimuth -5 is less than 0'],
    ['N95E', 'from 0 to 90'],
    ['uphill', 'is not a direction'],
  ])('refuses %s and says why', (text, reason) => {
    const read = parseAzimuth(text)
    expect(read.outcome === 'refused' && read.reason).toContain(reason)
  })
})
