import { describe, expect, it } from 'vitest'
import { nearestOnLine } from '@shared/geometry/nearest'
import { circle, polyline } from '@shared/symbols/paths'
import { simplifyLine, simplifyPath, simplifyStrokes } from '@shared/symbols/simplify'
import type { MM } from '@shared/units'

const wave = Array.from({ length: 400 }, (_, index): MM => [index / 10, Math.sin(index / 20)])

describe('simplifying strokes', () => {
  it('leaves out no vertex farther from the line than the tolerance', () => {
    for (const tolerance of [0.01, 0.07, 0.5]) {
      const simpler = simplifyLine(wave, tolerance)
      const farthest = Math.max(...wave.map((at) => nearestOnLine(simpler, at).distance))
      // Room for the rounding of a distance, nothing else.
      expect(farthest).toBeLessThanOrEqual(tolerance + 1e-9)
      expect(simpler.length).toBeLessThan(wave.length / 2)
    }
  })

  it('keeps both ends, and the corner of an angle', () => {
    const corner: MM[] = [
      [0, 0],
      [5, 0],
      [10, 0],
      [10, 5],
      [10, 10],
    ]
    expect(simplifyLine(corner, 0.07)).toEqual([
      [0, 0],
      [10, 0],
      [10, 10],
    ])
  })

  it('keeps the ends of a line that comes back to where it began', () => {
    const ring = Array.from({ length: 33 }, (_, index): MM => {
      const turn = (index / 16) * Math.PI
      return [Math.cos(turn), Math.sin(turn)]
    })
    expect(simplifyLine(ring, 0.01).length).toBeGreaterThan(8)
  })

  it('leaves curves as they are, and every mark that is not a long stroke', () => {
    expect(simplifyPath(circle([0, 0], 1), 5)).toEqual(circle([0, 0], 1))
    const tick = { mark: 'stroke', path: polyline(wave.slice(0, 4)), width: 0.3, ink: 'black' } as const
    const fill = { mark: 'fill', path: polyline(wave, true), ink: 'black' } as const
    expect(simplifyStrokes([tick, fill], 0.5)).toEqual([tick, fill])
  })
})
