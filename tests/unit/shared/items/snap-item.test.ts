import { describe, expect, it } from 'vitest'
import { itemSchema, type Item } from '@shared/items/item'
import { snapItem } from '@shared/items/snap-item'

const id = '5d0a1f6e-3f0b-4c43-9a51-0d9f3c1f7a10'
const contact = (coordinates: number[][]): Item =>
  itemSchema.parse({ kind: 'contact', id, geometry: { type: 'LineString', coordinates }, properties: {} })
const attitude = (coordinates: number[]): Item =>
  itemSchema.parse({
    kind: 'attitude',
    id,
    geometry: { type: 'Point', coordinates },
    properties: { strike: 45, dip: 40 },
  })

describe('snapItem', () => {
  it('puts every vertex on the 1 mm grid', () => {
    const snapped = snapItem(
      contact([
        [284000.00049, 5278000.0006],
        [284100.1, 5278100.12345],
      ]),
    )
    expect(snapped?.geometry?.coordinates).toEqual([
      [284000, 5278000.001],
      [284100.1, 5278100.123],
    ])
  })

  it('gives back the same object where nothing changes', () => {
    const line = contact([
      [284000.001, 5278000.002],
      [284100.003, 5278100.004],
    ])
    const point = attitude([284000.123, 5278000.456])
    expect(snapItem(line)).toBe(line)
    expect(snapItem(point)).toBe(point)
  })

  it('moves a point and keeps its figures', () => {
    const point = attitude([284000.1234, 5278000.4567])
    expect(snapItem(point)).toEqual({
      ...point,
      geometry: { type: 'Point', coordinates: [284000.123, 5278000.457] },
    })
  })

  it('drops a vertex that falls on the one before it', () => {
    const snapped = snapItem(
      contact([
        [0, 0],
        [0.0002, 0.0003],
        [5, 5],
      ]),
    )
    expect(snapped?.geometry?.coordinates).toEqual([
      [0, 0],
      [5, 5],
    ])
  })

  it('has nothing for a line without length on the grid', () => {
    expect(
      snapItem(
        contact([
          [1, 1],
          [1.0004, 1.0001],
        ]),
      ),
    ).toBeUndefined()
  })

  it('leaves items without a place alone', () => {
    const unit = itemSchema.parse({
      kind: 'unit',
      id,
      geometry: null,
      properties: { label: 'Sp', name: 'Spindrift Limestone', colour: '#b7cdc9', rank: 1 },
    })
    expect(snapItem(unit)).toBe(unit)
  })
})
