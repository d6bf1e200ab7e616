import { describe, expect, it } from 'vitest'
import { greatestDeparture } from '@shared/geometry/line-distance'
import type { XY } from '@shared/units'

describe('greatestDeparture', () => {
  it('is the discrete Hausdorff distance of the PostGIS manual’s example', () => {
    // Source: PostGIS 3.3 manual, ST_HausdorffDistance, second example without densifying: 14.142135623730951.
    const a: XY[] = [
      [130, 0],
      [0, 0],
      [0, 150],
    ]
    const b: XY[] = [
      [10, 10],
      [10, 150],
      [130, 10],
    ]
    expect(greatestDeparture(a, b)).toBeCloseTo(14.142135623730951, 12)
    expect(greatestDeparture(b, a)).toBeCloseTo(14.142135623730951, 12)
  })

  it('is nothing for one line drawn either way, and the step of a line moved whole', () => {
    const line = Array.from({ length: 50 }, (_, index): XY => [index * 10, Math.sin(index) * 40])
    expect(greatestDeparture(line, line.toReversed())).toBe(0)
    const straight = line.map(([x]): XY => [x, 0])
    expect(
      greatestDeparture(
        straight,
        straight.map(([x]): XY => [x, 7]),
      ),
    ).toBe(7)
  })

  it('measures the distance of two points', () => {
    expect(greatestDeparture([[0, 0]], [[3, 4]])).toBe(5)
  })

  it('looks at each vertex about once where one line is a version of the other', () => {
    const long = Array.from({ length: 100_000 }, (_, index): XY => [index, Math.sin(index / 9) * 30])
    const moved = long.map(([x, y]): XY => [x, y + 0.25])
    const thinned = long.filter((_, index) => index % 2 === 0)
    // A look from every vertex at every segment would be 10¹⁰ looks and take minutes.
    expect(greatestDeparture(long, moved)).toBeLessThanOrEqual(0.25)
    expect(greatestDeparture(long, thinned)).toBeGreaterThan(0)
  })
})
