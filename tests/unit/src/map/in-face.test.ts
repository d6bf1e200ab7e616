import { describe, expect, it } from 'vitest'
import type { Face } from '@shared/api/faces'
import { isInFace, mayReach } from '@/map/in-face'

const ring = (west: number, south: number, east: number, north: number): [number, number][] => [
  [west, south],
  [east, south],
  [east, north],
  [west, north],
  [west, south],
]
const face: Face = { unit: null, rings: [ring(0, 0, 100, 50), ring(40, 20, 60, 30)] }

describe('a unit’s area', () => {
  it('holds places within its outer ring and not in a hole', () => {
    expect(isInFace(face, [10, 10])).toBe(true)
    expect(isInFace(face, [50, 25])).toBe(false)
    expect(isInFace(face, [101, 10])).toBe(false)
  })

  it('is drawn where its bounds reach into the view', () => {
    expect(mayReach(face, { min: [90, 40], max: [200, 200] })).toBe(true)
    expect(mayReach(face, { min: [-50, -50], max: [200, 200] })).toBe(true)
    expect(mayReach(face, { min: [101, 0], max: [200, 50] })).toBe(false)
    expect(mayReach(face, { min: [0, -60], max: [100, -1] })).toBe(false)
  })
})
