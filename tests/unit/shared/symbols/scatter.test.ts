import { describe, expect, it } from 'vitest'
import { scatter } from '@shared/symbols/scatter'

const cell = { width: 20, height: 16 }
const radii = [...Array.from({ length: 12 }, () => 1), ...Array.from({ length: 30 }, () => 0.2)]

describe('scattered places', () => {
  it('are the same for the same seed and others for another', () => {
    const placesOf = (seed: number) => scatter(radii, cell, seed).map(({ at }) => at)
    expect(placesOf(7)).toEqual(placesOf(7))
    expect(placesOf(7)).not.toEqual(placesOf(8))
  })

  it('leave a gap between all things, over the edges of the cell too', () => {
    const placed = scatter(radii, cell, 7)
    for (const [index, one] of placed.entries()) {
      for (const other of placed.slice(0, index)) {
        const dx = Math.abs(one.at[0] - other.at[0])
        const dy = Math.abs(one.at[1] - other.at[1])
        const apart = Math.hypot(Math.min(dx, cell.width - dx), Math.min(dy, cell.height - dy))
        expect(apart).toBeGreaterThan(one.radius + other.radius + 0.4)
      }
    }
  })

  it('spread the large ones evenly: each quarter of the cell has its share', () => {
    const large = scatter(radii, cell, 7).slice(0, 12)
    for (const isQuarter of [
      ([x, y]: readonly number[]) => (x ?? 0) < 10 && (y ?? 0) < 8,
      ([x, y]: readonly number[]) => (x ?? 0) >= 10 && (y ?? 0) < 8,
      ([x, y]: readonly number[]) => (x ?? 0) < 10 && (y ?? 0) >= 8,
      ([x, y]: readonly number[]) => (x ?? 0) >= 10 && (y ?? 0) >= 8,
    ]) {
      expect(large.filter(({ at }) => isQuarter(at)).length).toBeGreaterThanOrEqual(2)
    }
  })
})
