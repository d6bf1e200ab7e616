import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  angleToPlane,
  FURTHEST_OFF_PLANE,
  lineAtRake,
  offPlaneWarning,
  rakeOf,
} from '@shared/structure/line-on-plane'
import type { Plane } from '@shared/structure/plane'
import { angleBetween } from '@shared/units'
import { computedRakes, lineToPlane, printedRakes } from '../../../reference/orientation'

const planeOf = (text: string): Plane => {
  const [strike = 0, dip = 0] = text.split('/').map(Number)
  return { strike, dip, overturned: false }
}

/** Half a unit of the last printed digit; the printed trend and plunge are rounded too, which moves a rake as much again. */
const PRINTED = 0.1
const COMPUTED = 1e-6

describe('the rake of a line on a plane', () => {
  it.each(printedRakes)('agrees with the printed answer for $trend/$plunge on $plane', (given) => {
    expect(Math.abs(rakeOf(planeOf(given.plane), given) - given.rake)).toBeLessThan(PRINTED)
    const line = lineAtRake(planeOf(given.plane), given.rake)
    expect(angleBetween(line.trend ?? NaN, given.trend)).toBeLessThan(PRINTED)
    expect(Math.abs(line.plunge - given.plunge)).toBeLessThan(PRINTED)
  })

  it.each(computedRakes)('is $rake for $trend/$plunge on $plane, and back', (given) => {
    expect(Math.abs(rakeOf(planeOf(given.plane), given) - given.rake)).toBeLessThan(COMPUTED)
    const line = lineAtRake(planeOf(given.plane), given.rake)
    expect(angleBetween(line.trend ?? NaN, given.trend)).toBeLessThan(COMPUTED)
    expect(Math.abs(line.plunge - given.plunge)).toBeLessThan(COMPUTED)
  })

  it('comes back from any rake on any plane, and the line lies on the plane', () => {
    const plane = fc.record({
      strike: fc.double({ min: 0, max: 359.9, noNaN: true }),
      dip: fc.double({ min: 1, max: 90, noNaN: true }),
      overturned: fc.boolean(),
    })
    fc.assert(
      fc.property(plane, fc.double({ min: 0.01, max: 179.99, noNaN: true }), (on, rake) => {
        const line = lineAtRake(on, rake)
        expect(angleToPlane(line, on)).toBeLessThan(1e-6)
        // Near the vertical the trend is ill conditioned, not the rake.
        expect(Math.abs(rakeOf(on, line) - rake)).toBeLessThan(1e-4)
      }),
      { numRuns: 1000, seed: 20261201 },
    )
  })

  it('is without a trend straight down a vertical plane', () => {
    expect(lineAtRake({ strike: 30, dip: 90, overturned: false }, 90)).toEqual({
      trend: null,
      plunge: expect.closeTo(90, 9) as number,
    })
  })
})

describe('a line and its plane', () => {
  it('stand at the angle that was computed elsewhere', () => {
    expect(angleToPlane(lineToPlane, planeOf(lineToPlane.plane))).toBeCloseTo(lineToPlane.angle, 9)
  })

  it('agree where the line lies on the plane within what a compass reads', () => {
    const plane = planeOf('045/40')
    for (let rake = 0; rake <= 180; rake += 10) {
      const line = lineAtRake(plane, rake)
      expect(offPlaneWarning(line, plane)).toBeUndefined()
      const off = { ...line, plunge: line.plunge + FURTHEST_OFF_PLANE - 1 }
      expect(offPlaneWarning(off, plane), `rake ${rake}`).toBeUndefined()
    }
  })

  it('contradict beyond that, with the figures of both', () => {
    const warning = offPlaneWarning({ trend: 135, plunge: 60 }, planeOf('045/40'))
    expect(warning).toContain('135/60 lies 20° off the plane 045/40')
    expect(warning).toContain('135/40, at a rake of 90°')
  })
})
