import { describe, expect, it } from 'vitest'
import { isInFace } from '@/map/in-face'
import { ItemIndex } from '@/map/item-index'
import type { XY } from '@shared/units'
import { aLine, aPoint, aUnit } from '../../../support/sheet-items'

const contact = aLine(
  'contact',
  [
    [0, 0],
    [100, 0],
  ],
  {},
)
const fault = aLine(
  'fault',
  [
    [0, 3],
    [100, 3],
  ],
  {},
)
const station = aPoint('station', [50, 8], {})
const index = new ItemIndex([station, fault, contact, aUnit({})])

describe('picking', () => {
  it('gives points before lines, and the nearer line first', () => {
    const hits = index.pick([50, 2], { line: 5, point: 8 })
    expect(hits.map(({ id }) => id)).toEqual([station.id, fault.id, contact.id])
  })

  it('gives what is drawn on top first where distances are equal', () => {
    const twin = aLine(
      'axial-trace',
      [
        [0, 0],
        [100, 0],
      ],
      { form: 'anticline' },
    )
    const hits = new ItemIndex([twin, contact]).pick([50, 0], { line: 5, point: 5 })
    expect(hits.map(({ id }) => id)).toEqual([twin.id, contact.id])
  })

  it('tests the line itself, not the box around it', () => {
    const slanting = new ItemIndex([
      aLine(
        'contact',
        [
          [0, 0],
          [100, 100],
        ],
        {},
      ),
    ])
    expect(slanting.pick([90, 10], { line: 5, point: 5 })).toEqual([])
  })

  it('finds a point by the arrow of its symbol too, and only within the arrow', () => {
    const lineation = aPoint('lineation', [0, 0], { trend: 90, plunge: 20 })
    const arrows = {
      furthest: 12,
      of: () =>
        [
          [0, 0],
          [6, 0],
        ] as XY[],
    }
    const found = (at: XY) => new ItemIndex([lineation]).pick(at, { line: 1, point: 3, arrows }).length
    expect(found([5.5, 0.8])).toBe(1)
    expect(found([5.5, 1.2])).toBe(0)
    expect(found([-2.5, 0])).toBe(1)
    expect(found([-5.5, 0])).toBe(0)
  })

  it('finds nothing on an empty sheet', () => {
    expect(new ItemIndex([aUnit({})]).pick([0, 0], { line: 5, point: 5 })).toEqual([])
  })
})

describe('what is in view', () => {
  it('comes in the order of drawing: contacts, faults, points', () => {
    const all = index.within({ min: [-10, -10], max: [200, 200] })
    expect(all.map(({ kind }) => kind)).toEqual(['contact', 'fault', 'station'])
  })
})

describe('the unit under the pointer', () => {
  const face = {
    unit: contact.id,
    rings: [
      [
        [0, 0],
        [10, 0],
        [10, 10],
        [0, 10],
        [0, 0],
      ],
      [
        [4, 4],
        [6, 4],
        [6, 6],
        [4, 6],
        [4, 4],
      ],
    ] as [number, number][][],
  }

  it('is that of the area, not of the hole in it', () => {
    expect(isInFace(face, [2, 2])).toBe(true)
    expect(isInFace(face, [5, 5])).toBe(false)
    expect(isInFace(face, [20, 5])).toBe(false)
  })
})
