import { describe, expect, it } from 'vitest'
import { misplaced, tilted } from '../../../../../server/demo/truth/noise'
import { seededRandom, shuffled } from '../../../../../server/demo/truth/random'

const DRAWS = 20_000
const noise = { attitude: 2.5, position: 4 }

/** Root of the mean square. */
const rms = (values: readonly number[]) =>
  Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length)

describe('noise', () => {
  it('tilts directions by the stated spread in each of two directions, whichever way they point', () => {
    for (const direction of [
      [0, 0, 1],
      [0.3, -0.5, 0.2],
      [1, 0, 0],
      [-0.1, 0.2, -2],
    ] as const) {
      const random = seededRandom(5)
      const length = Math.hypot(...direction)
      const angles = Array.from({ length: DRAWS }, () => {
        const turned = tilted(direction, noise, random)
        expect(Math.hypot(...turned)).toBeCloseTo(1, 12)
        const cosine = turned.reduce((sum, part, axis) => sum + (part * (direction[axis] ?? 0)) / length, 0)
        return (Math.acos(Math.min(1, cosine)) * 180) / Math.PI
      })
      // Two directions at right angles: the angle between has σ√2. Its spread over so many draws is σ√2/(2√n) = 0.0125.
      expect(Math.abs(rms(angles) - 2.5 * Math.SQRT2)).toBeLessThan(0.05)
    }
  })

  it('misplaces by the stated spread in east and north, about the true place', () => {
    const random = seededRandom(6)
    const moved = Array.from({ length: DRAWS }, () => misplaced([100, 200], noise, random))
    for (const axis of [0, 1] as const) {
      const errors = moved.map((at) => at[axis] - [100, 200][axis]!) // Both axes have a true place.
      // σ/√n = 0.028 for the mean, σ/√(2n) = 0.02 for the spread: four of each.
      expect(Math.abs(errors.reduce((sum, error) => sum + error, 0) / DRAWS)).toBeLessThan(0.12)
      expect(Math.abs(rms(errors) - 4)).toBeLessThan(0.08)
    }
  })

  it('leaves everything as it is where there is none', () => {
    const random = seededRandom(7)
    expect(misplaced([1, 2], { attitude: 0, position: 0 }, random)).toEqual([1, 2])
    expect(tilted([0, 3, 4], { attitude: 0, position: 0 }, random)).toEqual([0, 0.6, 0.8])
  })
})

describe('shuffling', () => {
  it('keeps all members, and puts each in each place about equally often', () => {
    const random = seededRandom(8)
    const counts = new Map<string, number>()
    for (let round = 0; round < 6000; round++) {
      const order = shuffled(['a', 'b', 'c'], random).join('')
      counts.set(order, (counts.get(order) ?? 0) + 1)
    }
    expect(counts.size).toBe(6)
    // Each of six orders is expected 1000 times, with a spread of 29.
    for (const count of counts.values()) expect(Math.abs(count - 1000)).toBeLessThan(120)
  })
})
