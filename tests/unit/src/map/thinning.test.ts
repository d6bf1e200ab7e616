import { describe, expect, it } from 'vitest'
import { isPointItem, type Item } from '@shared/items/item'
import type { XY } from '@shared/units'
import { thinningStep, thinOut } from '@/map/thinning'
import { crowdedItems } from '../../../support/crowded-sheet'
import { aPoint } from '../../../support/sheet-items'

const SCALE = 24_000
const farther = [1, 0.99, 0.8, 0.6, 0.5, 0.35, 0.2, 0.1, 0.04]
const shownAt = (points: readonly Item[], steps: ReadonlyMap<Item, number>, relative: number): Item[] =>
  points.filter((item) => (steps.get(item) ?? Infinity) >= thinningStep(relative))

describe('thinning of crowded point symbols', () => {
  const points = crowdedItems(0, 1500).filter(isPointItem)
  const steps = thinOut(points, SCALE)

  it('shows everything at print size and larger', () => {
    expect(shownAt(points, steps, 1)).toHaveLength(points.length)
    expect(thinningStep(8)).toBe(0)
  })

  it('keeps what it shows when one zooms in, and shows more', () => {
    const counts = farther.map((relative) => {
      const shown = new Set(shownAt(points, steps, relative))
      for (const item of shownAt(points, steps, relative * 0.8)) expect(shown).toContain(item)
      return shown.size
    })
    expect(counts).toEqual(counts.toSorted((a, b) => b - a))
    expect(counts.at(-1)).toBeGreaterThan(0)
    expect(counts.at(-1)).toBeLessThan(points.length / 10)
  })

  it('leaves no two symbols nearer than 7 mm once the sheet is half its printed size', () => {
    for (const relative of [0.5, 0.3, 0.1]) {
      const shown = shownAt(points, steps, relative).filter((item) => item.geometry?.type === 'Point')
      const places = shown.map((item) => item.geometry?.coordinates as XY) // Points, by the line above.
      const nearest = places.flatMap(([e, n], index) =>
        places.slice(index + 1).map(([east, north]) => Math.hypot(east - e, north - n)),
      )
      expect(
        (nearest.reduce((least, each) => Math.min(least, each), Infinity) * relative * 1000) / SCALE,
      ).toBeGreaterThanOrEqual(7)
    }
  })

  it('does not depend on the order in which items come', () => {
    const turned = thinOut(points.toReversed(), SCALE)
    for (const item of points) expect(turned.get(item)).toBe(steps.get(item))
  })

  it('keeps the overturned bed of a crowd, and the one that is unlike its neighbours', () => {
    const crowd = [0, 10, 20, 30].map((east, index) =>
      aPoint('attitude', [east, 0], { strike: 40 + index, dip: 30 + index, overturned: index === 2 }),
    )
    expect(shownAt(crowd, thinOut(crowd, SCALE), 0.5)).toEqual([crowd[2]])
    const repeated = [0, 10, 20, 30].map((east, index) =>
      aPoint('attitude', [east, 0], { strike: index === 1 ? 130 : 40, dip: 30 }),
    )
    expect(shownAt(repeated, thinOut(repeated, SCALE), 0.5)).toEqual([repeated[1]])
  })

  it('lets unit letters give way to one another, those of a common unit to those of a rare one', () => {
    const [common, rare] = [1, 2].map((digit) => `00000000-0000-4000-8000-00000000000${digit}`)
    const label = (unit: string | undefined, east: number) => aPoint('unit-label', [east, 0], { unit })
    const crowd = [label(common, 0), label(rare, 30), label(common, 60), label(common, 9000)]
    expect(shownAt(crowd, thinOut(crowd, SCALE), 1)).toEqual(crowd)
    expect(shownAt(crowd, thinOut(crowd, SCALE), 0.4)).toEqual([crowd[1], crowd[3]])
  })

  it('never hides a symbol that stands alone, nor the letters of an area for a symbol', () => {
    const label = aPoint('unit-label', [3, 3], { unit: '00000000-0000-4000-8000-000000000001' })
    const apart = aPoint('attitude', [0, 0], { strike: 40, dip: 30 })
    const sparse = [label, apart]
    expect(shownAt(sparse, thinOut(sparse, SCALE), 0.01)).toEqual(sparse)
    expect(thinOut([], SCALE).size).toBe(0)
  })
})
