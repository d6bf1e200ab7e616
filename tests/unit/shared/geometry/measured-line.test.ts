import { describe, expect, it } from 'vitest'
import { measureLine } from '@shared/geometry/measured-line'

const bent = measureLine([
  [0, 0],
  [3, 4],
  [3, 14],
])

describe('a measured line', () => {
  it('tells places by their distance from the start', () => {
    expect(bent.length).toBe(15)
    expect(bent.pointAt(2.5)).toEqual([1.5, 2])
    expect(bent.pointAt(5)).toEqual([3, 4])
    expect(bent.pointAt(10)).toEqual([3, 9])
    expect(bent.pointAt(-1)).toEqual([0, 0])
    expect(bent.pointAt(99)).toEqual([3, 14])
  })

  it('gives the direction as the chord over a width', () => {
    expect(bent.directionAt(10, 2)).toEqual([0, 1])
    const [x, y] = bent.directionAt(2, 2)
    expect(x).toBeCloseTo(0.6, 12)
    expect(y).toBeCloseTo(0.8, 12)
  })

  it('measures how far it turns', () => {
    // Between the directions (0.6, 0.8) and (0, 1): acos 0.8.
    expect(bent.turnAt(5, 2)).toBeCloseTo((Math.acos(0.8) * 180) / Math.PI, 9)
    expect(bent.turnAt(10, 2)).toBe(0)
  })

  it('cuts out a part with the vertices inside it', () => {
    expect(bent.slice(2.5, 10)).toEqual([
      [1.5, 2],
      [3, 4],
      [3, 9],
    ])
    expect(bent.slice(0, 15)).toEqual([
      [0, 0],
      [3, 4],
      [3, 14],
    ])
    expect(bent.slice(6, 7)).toEqual([
      [3, 5],
      [3, 6],
    ])
  })

  it('survives lines without length and repeated vertices', () => {
    const dot = measureLine([
      [1, 1],
      [1, 1],
    ])
    expect(dot.length).toBe(0)
    expect(dot.pointAt(3)).toEqual([1, 1])
    expect(dot.directionAt(0, 1)).toEqual([1, 0])
    const doubled = measureLine([
      [0, 0],
      [1, 0],
      [1, 0],
      [2, 0],
    ])
    expect(doubled.pointAt(1.5)).toEqual([1.5, 0])
    expect(doubled.slice(0, 2)).toContainEqual([1, 0])
  })
})
