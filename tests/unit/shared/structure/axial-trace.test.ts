import { describe, expect, it } from 'vitest'
import { plungeAgainstTrace, traceTrends } from '@shared/structure/axial-trace'
import { angleBetween, normalizeAzimuth } from '@shared/units'
import { straight, waving } from '../../../support/drawn-items'

const noConvergence = () => 0

describe('the directions in which a trace leaves', () => {
  it('gives both ends outward, against true north', () => {
    for (let azimuth = 0; azimuth < 360; azimuth += 7) {
      const { atEnd, atStart } = traceTrends(straight(azimuth, 1000), () => 2.5)
      // Grid azimuth + convergence = true azimuth; a straight line leaves no other error than rounding.
      expect(angleBetween(atEnd, azimuth + 2.5)).toBeLessThan(1e-9)
      expect(angleBetween(atStart, azimuth + 182.5)).toBeLessThan(1e-9)
    }
  })

  it('is not decided by a last small wiggle', () => {
    const line = [...straight(30, 1000), ...straight(120, 5, [500, 866]).slice(1)]
    expect(angleBetween(traceTrends(line, noConvergence).atEnd, 30)).toBeLessThan(2)
  })
})

describe('a plunge against its trace', () => {
  it('finds the down-plunge end in every direction, and the same place on the reversed line', () => {
    for (let azimuth = 0; azimuth < 360; azimuth += 5) {
      const line = waving(azimuth, 100)
      for (const trend of [azimuth, azimuth + 25, azimuth - 25].map(normalizeAzimuth)) {
        expect(plungeAgainstTrace(line, trend, noConvergence)).toMatchObject({ outcome: 'ok', end: 'end' })
        expect(plungeAgainstTrace(line.toReversed(), trend, noConvergence)).toMatchObject({
          outcome: 'ok',
          end: 'start',
        })
        const backward = normalizeAzimuth(trend + 180)
        expect(plungeAgainstTrace(line, backward, noConvergence)).toMatchObject({
          outcome: 'ok',
          end: 'start',
        })
      }
    }
  })

  it('refuses a trend across the trace and says where its ends lead', () => {
    const across = plungeAgainstTrace(straight(28, 1000), 118, noConvergence)
    expect(across).toMatchObject({
      outcome: 'across',
      reason:
        'A plunge toward 118° does not run along this trace: its ends lead toward 028° and 208°, 90° away at the nearest. ' +
        'Give a trend within 30° of one of them.',
    })
  })

  it('draws the line at 30 degrees, measured from true north', () => {
    const outcome = (trend: number, convergence: number) =>
      plungeAgainstTrace(straight(0, 1000), trend, () => convergence).outcome
    expect(outcome(30, 0)).toBe('ok')
    expect(outcome(30.1, 0)).toBe('across')
    expect(outcome(32, 2.1)).toBe('ok')
    expect(outcome(329.9, 0)).toBe('across')
  })
})
