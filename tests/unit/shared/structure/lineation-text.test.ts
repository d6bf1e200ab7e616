import { describe, expect, it } from 'vitest'
import { formatLine } from '@shared/structure/line-on-plane'
import { lineOf, parseLineation } from '@shared/structure/lineation-text'
import type { Plane } from '@shared/structure/plane'

const plane: Plane = { strike: 45, dip: 40, overturned: false }

describe('reading a line', () => {
  it.each([
    ['120/35', 120, 35],
    ['120-35', 120, 35],
    ['120 35', 120, 35],
    ['120, 35', 120, 35],
    ['120°/35°', 120, 35],
    ['35→120', 120, 35],
    ['35 -> 120', 120, 35],
    ['35 toward 120', 120, 35],
    ['plunges 35° toward 120°', 120, 35],
    ['35 → S60E', 120, 35],
    ['S60E 35', 120, 35],
    ['35 S60E', 120, 35],
    ['35 SE', 135, 35],
    ['N30W/10', 330, 10],
    ['360/12', 0, 12],
    ['045,5/40,5', 45.5, 40.5],
    ['120 horizontal', 120, 0],
  ])('takes %s as trend %d and plunge %d', (text, trend, plunge) => {
    expect(parseLineation(text)).toEqual({ outcome: 'line', trend, plunge })
  })

  it.each(['vertical', '90', '120/90', '90→200'])('takes %s as vertical, without a trend', (text) => {
    expect(parseLineation(text)).toEqual({ outcome: 'line', trend: null, plunge: 90 })
  })

  it.each([
    ['rake 40', 40, null],
    ['pitch 40', 40, null],
    ['40 rake', 40, null],
    ['rake 138.4', 138.4, null],
    ['pitch 60NW', 60, 315],
    ['60 NE pitch', 60, 45],
  ])('takes %s as a rake of %d', (text, rake, from) => {
    expect(parseLineation(text)).toEqual({ outcome: 'rake', rake, from })
  })

  it.each([
    ['', 'Write a line'],
    ['120/95', 'Plunge 95 is more than 90'],
    ['35/120', 'Perhaps the two numbers are swapped: the trend comes first, 120/35.'],
    ['370/35', 'Trend 370 is more than 360'],
    ['120/-35', 'write 300/35'],
    ['35', '35 alone is not a line'],
    ['0', 'A horizontal line needs a trend too'],
    ['N95E 10', 'in quadrants the angle runs from 0 to 90'],
    ['rake 190', 'from 0 to 180'],
    ['rake 100 NE', 'from 0 to 90'],
    ['north by north', '“north by north” does not read as a line'],
  ])('refuses “%s” and says why: %s', (text, reason) => {
    const read = parseLineation(text)
    expect(read.outcome === 'refused' && read.reason).toContain(reason)
  })

  it('reads back what it writes, all round the compass', () => {
    for (let trend = 0; trend < 360; trend++) {
      for (const plunge of [0, 7, 35.5, 89]) {
        expect(parseLineation(formatLine({ trend, plunge }))).toEqual({ outcome: 'line', trend, plunge })
      }
    }
  })
})

describe('a rake', () => {
  it('is resolved on its plane', () => {
    const line = lineOf(parseLineation('rake 90'), plane)
    expect(line).toEqual({
      outcome: 'line',
      trend: expect.closeTo(135, 9) as number,
      plunge: expect.closeTo(40, 9) as number,
    })
  })

  it('runs from the end of the strike that its letter names', () => {
    // Source: orientation.md section 1: the older form is an acute angle and the letter of the strike's end.
    expect(lineOf(parseLineation('pitch 30 NE'), plane)).toEqual(lineOf(parseLineation('rake 30'), plane))
    expect(lineOf(parseLineation('pitch 30 SW'), plane)).toEqual(lineOf(parseLineation('rake 150'), plane))
  })

  it.each([
    ['rake 30', null, 'A rake needs the plane'],
    ['rake 30', { strike: null, dip: 0, overturned: false }, 'needs a plane that dips'],
    ['pitch 30 SE', plane, 'lies across the strike N45E'],
  ])('%s is refused where it cannot be resolved', (text, on, reason) => {
    const read = lineOf(parseLineation(text), on)
    expect(read.outcome === 'refused' && read.reason).toContain(reason)
  })
})
