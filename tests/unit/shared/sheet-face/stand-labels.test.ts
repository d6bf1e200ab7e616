import { describe, expect, it } from 'vitest'
import type { Face } from '@shared/api/faces'
import { boxAround, boxesMeet } from '@shared/geometry/box-edges'
import type { ItemOf } from '@shared/items/item'
import { standLabels } from '@shared/sheet-face/stand-labels'
import { drawUnitLabel, unitLabelSize, type LabelStand } from '@shared/symbols/draw-unit-label'
import type { MM } from '@shared/units'
import { aPoint, aUnit } from '../../../support/sheet-items'

/** Metres are millimetres, so that areas can be given in print's measure. */
const frame = { origin: [0, 0] as [number, number], mmPerMetre: 1, convergenceAt: () => 0 }
const unit = aUnit({ label: 'Dr' })
const size = unitLabelSize('Dr')

const area = (west: number, south: number, east: number, north: number, ...holes: Face['rings']): Face => ({
  unit: unit.id,
  rings: [
    [
      [west, south],
      [east, south],
      [east, north],
      [west, north],
      [west, south],
    ],
    ...holes,
  ],
})
const label = (at: MM) => aPoint('unit-label', at, { unit: unit.id })
const stands = (faces: Face[], ...labels: ItemOf<'unit-label'>[]) =>
  standLabels(faces, labels, frame, () => unit.properties)
const boxOf = (at: MM, stand?: LabelStand) =>
  boxAround([at[0] + (stand?.offset[0] ?? 0), at[1] + (stand?.offset[1] ?? 0)], size)

describe('where the letters of a unit stand', () => {
  it('is their place, where they fit', () => {
    expect(stands([area(0, 0, 20, 20)], label([10, 10])).size).toBe(0)
  })

  it('is the nearest place within their area, where they touch its edge', () => {
    const [stand] = stands([area(0, 0, 20, 20)], label([1, 10])).values()
    expect(stand?.leader).toBe(false)
    const box = boxOf([1, 10], stand)
    expect(box.x).toBeGreaterThan(0)
    expect(box.x).toBeLessThan(1.5)
    expect(stand?.offset[1]).toBeCloseTo(0, 10)
  })

  it('keeps off a hole in the area', () => {
    const hole = area(8, 8, 12, 12).rings[0] ?? []
    const [stand] = stands([area(0, 0, 30, 30, hole), area(8, 8, 12, 12)], label([7, 10])).values()
    expect(stand?.leader).toBe(false)
    expect(boxesMeet(boxOf([7, 10], stand), { x: 8, y: 8, width: 4, height: 4 })).toBe(false)
  })

  it('is outside, with a leader, where the area is too small', () => {
    const hole = area(14, 14, 16, 16)
    const [stand] = stands([area(0, 0, 30, 30, hole.rings[0] ?? []), hole], label([15, 15])).values()
    expect(stand?.leader).toBe(true)
    const box = boxOf([15, 15], stand)
    expect(boxesMeet(box, { x: 14, y: 14, width: 2, height: 2 })).toBe(false)
    expect(Math.hypot(...(stand?.offset ?? [99, 99]))).toBeLessThan(8)
    const [leader] = drawUnitLabel('Dr', [15, 15], stand)
    const [from] = leader?.mark === 'stroke' ? leader.path : []
    // Long enough to be seen as one.
    expect(Math.hypot(Number(from?.[1]) - 15, Number(from?.[2]) - 15)).toBeGreaterThanOrEqual(2)
  })

  it('is on no boundary and no other letters, if there is room beside them', () => {
    const small = area(14, 14, 16, 16)
    const other = label([19.5, 15])
    const faces = [area(0, 0, 17, 30, small.rings[0] ?? []), area(17, 0, 30, 30), small]
    const stand = stands(faces, label([15, 15]), other)
      .values()
      .next().value
    const box = boxOf([15, 15], stand)
    expect(boxesMeet(box, boxOf([19.5, 15]))).toBe(false)
    expect(box.x < 17 && box.x + box.width > 17).toBe(false)
  })

  it('is never off the sheet while there is room on it', () => {
    const small = area(0, 14, 1.5, 16)
    const stand = stands([small, area(1.5, 0, 30, 30)], label([0.7, 15]))
      .values()
      .next().value
    expect(stand?.leader).toBe(true)
    expect(boxOf([0.7, 15], stand).x).toBeGreaterThan(1.5)
  })

  it('is their place, where no area is known', () => {
    expect(stands([], label([1, 1])).size).toBe(0)
  })
})

describe('a unit label drawn', () => {
  it('has a leader from its letters to a dot at its place', () => {
    const [line, dot, letters] = drawUnitLabel('Dr', [5, 5], { offset: [10, 0], leader: true })
    expect(letters).toMatchObject({ mark: 'text', text: 'Dr', at: [15, 5] })
    expect(dot?.mark).toBe('fill')
    if (line?.mark !== 'stroke') throw new Error('No leader was drawn.')
    const [from, to] = line.path
    expect(to).toEqual(['line', 5, 5])
    // It begins left of the letters, half a millimetre off.
    expect(from?.[1]).toBeCloseTo(15 - size.width / 2 - 0.5, 10)
    expect(from?.[2]).toBe(5)
  })

  it('has none within its area', () => {
    expect(drawUnitLabel('Dr', [5, 5], { offset: [2, 0], leader: false })).toHaveLength(1)
  })
})
