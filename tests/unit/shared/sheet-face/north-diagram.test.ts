import { describe, expect, it } from 'vitest'
import { declinationWords, drawnNorths } from '@shared/sheet-face/north-diagram'
import { northConversions, utmConvergence } from '../../../reference/geodesy'

const namesOf = (norths: ReturnType<typeof drawnNorths>): string[] =>
  norths.map(({ names }) => names.join(' '))

describe('the north diagram', () => {
  it('has true north west of a grid north that lies east of it', () => {
    const eastern = utmConvergence.find(({ lon }) => lon === 6)?.convergence ?? 0
    expect(namesOf(drawnNorths(eastern))).toEqual(['true', 'grid'])
    expect(namesOf(drawnNorths(-eastern))).toEqual(['grid', 'true'])
    expect(namesOf(drawnNorths(0))).toEqual(['true grid'])
  })

  it('puts magnetic north where a magnetic bearing of 0° points', () => {
    for (const { declination, convergence } of northConversions) {
      const norths = drawnNorths(convergence, { declination, asOf: '' })
      const magnetic = norths.find(({ names }) => names.includes('magnetic'))
      const grid = norths.find(({ names }) => names.includes('grid'))
      // grid = magnetic + D − γ, for a magnetic bearing of 0°: reference/geodesy.md section 1.
      expect(Math.sign((magnetic?.azimuth ?? 0) - (grid?.azimuth ?? 0))).toBe(
        Math.sign(declination - convergence),
      )
    }
  })

  it('states the angle from grid north: that of the first published conversion is 10°23′ east', () => {
    const [first] = northConversions
    if (!first) throw new Error('There is no conversion.')
    const words = declinationWords({ declination: first.declination, asOf: '2026.9' }, first.convergence)
    // 110.377700283° of grid from 100° of magnetic azimuth: 10.3777° is 10°23′ (Source: the table's own difference).
    expect(words).toBe(
      "Magnetic north lies 12°30' east of true north and 10°23' east of grid north (2026.9).",
    )
  })

  it('keeps arrows far enough apart to be told from one another, and never lays one flat', () => {
    for (const convergence of [-5, -0.1, 0.05, 2]) {
      for (const declination of [-30, -2, 0, 0.1, 12, 60]) {
        const azimuths = drawnNorths(convergence, { declination, asOf: '' }).map(({ azimuth }) => azimuth)
        for (const [index, azimuth] of azimuths.entries()) {
          expect(Math.abs(azimuth)).toBeLessThanOrEqual(48)
          if (index > 0) expect(azimuth - (azimuths[index - 1] ?? 0)).toBeGreaterThanOrEqual(0.99 * 7)
        }
      }
    }
  })
})
