import { describe, expect, it } from 'vitest'
import { snap } from '@/editor/behaviours/snap'
import { aWorkbench } from '../../../../support/fake-map'
import { aLine, aPoint } from '../../../../support/sheet-items'

const line = aLine(
  'contact',
  [
    [0, 0],
    [100, 0],
    [200, 0.123],
  ],
  {},
)
const { map } = aWorkbench([line, aPoint('station', [60.5, 6], {})])

describe('snapping', () => {
  it('prefers an end to a vertex, a vertex to a side', () => {
    expect(snap(map, [3, 4])).toEqual({ at: [0, 0], to: 'end', id: line.id })
    expect(snap(map, [96, 3])).toEqual({ at: [100, 0], to: 'vertex', id: line.id })
    expect(snap(map, [30, 5])).toEqual({ at: [30, 0], to: 'line', id: line.id })
  })

  it('gives the very numbers of the vertex it caught', () => {
    expect(snap(map, [195, -4]).at).toBe(line.geometry.coordinates[2])
  })

  it('catches a station before the side of the line beside it', () => {
    expect(snap(map, [58, 3])).toMatchObject({ at: [60.5, 6], to: 'point' })
  })

  it('leaves a place beyond its reach where it is, on the 1 mm grid', () => {
    expect(snap(map, [30.12345, 40])).toEqual({ at: [30.123, 40], to: null, id: null })
  })

  it('does not catch what is being moved', () => {
    expect(snap(map, [3, 4], { exclude: new Set([line.id]) }).to).toBeNull()
  })
})
