import { describe, expect, it } from 'vitest'
import type { Tile } from '@shared/symbols/display-list'
import { replay, type Tiling } from '@shared/symbols/interpreter'
import { circle, polyline } from '@shared/symbols/paths'
import { boundsOf } from '@shared/symbols/place-marks'
import { marksOverCells } from '@shared/symbols/tile'
import { recordingSurface } from '../../../support/recording-surface'

const tileWith = (marks: Tile['marks']): Tile => ({ id: 'test', width: 10, height: 6, marks })
const placesOf = (tile: Tile, columns = 1, rows = 1) =>
  marksOverCells(tile, columns, rows).map((mark) => {
    const box = boundsOf([{ ...mark, ink: 'black' }])
    return (
      box && [box.x + box.width / 2, box.y + box.height / 2].map((value) => Math.round(value * 1000) / 1000)
    )
  })

describe('the marks of a block of cells', () => {
  it('are each drawn once where they lie within their cell', () => {
    expect(placesOf(tileWith([{ mark: 'fill', path: circle([5, 3], 1) }]))).toEqual([[5, 3]])
  })

  it('come back at the opposite edge where they reach over one, and at all corners over a corner', () => {
    expect(placesOf(tileWith([{ mark: 'fill', path: circle([9.5, 3], 1) }]))).toEqual([
      [-0.5, 3],
      [9.5, 3],
    ])
    expect(placesOf(tileWith([{ mark: 'fill', path: circle([0, 0], 1) }]))).toEqual([
      [0, 0],
      [10, 0],
      [0, 6],
      [10, 6],
    ])
  })

  it('count the width of a line', () => {
    const line = polyline([
      [1, 0.05],
      [9, 0.05],
    ])
    expect(placesOf(tileWith([{ mark: 'stroke', path: line, width: 0.2 }]))).toEqual([
      [5, 0.05],
      [5, 6.05],
    ])
  })

  it('fill a larger block without doubling what cells share', () => {
    expect(placesOf(tileWith([{ mark: 'fill', path: circle([0, 3], 1) }]), 3, 1)).toEqual([
      [0, 3],
      [10, 3],
      [20, 3],
      [30, 3],
    ])
  })
})

describe('a pattern on a surface', () => {
  const tile = tileWith([
    {
      mark: 'fill',
      path: polyline(
        [
          [2, 1],
          [3, 1],
          [3, 2],
        ],
        true,
      ),
    },
  ])
  const path = polyline(
    [
      [0, 0],
      [40, 0],
      [40, 30],
    ],
    true,
  )

  function tilingAt(transform?: Parameters<typeof replay>[2]): Tiling {
    const surface = recordingSurface()
    replay([{ mark: 'pattern', path, tile, ink: 'fold', anchor: [4, 5] }], surface, transform)
    const [call] = surface.calls
    if (call?.call !== 'tile') throw new Error('Nothing was tiled.')
    return call.tiling
  }

  it('has its cell’s size, corner and colour in the surface’s unit', () => {
    expect(tilingAt()).toMatchObject({ name: 'test', colour: '#a8321c', width: 10, height: 6, x: 4, y: 5 })
    expect(tilingAt({ scale: 2, x: 100, y: 200, flipY: true })).toMatchObject({
      width: 20,
      height: 12,
      x: 108,
      // The anchor lies at 190; the cell stands upon it, so its smallest y is one cell higher.
      y: 178,
    })
  })

  it('draws its cell the right way up where y runs down', () => {
    const surface = recordingSurface()
    tilingAt({ scale: 2, x: 100, y: 200, flipY: true }).draw(surface)
    expect(surface.calls).toEqual([
      {
        call: 'path',
        path: [['move', 4, 10], ['line', 6, 10], ['line', 6, 8], ['close']],
        paint: { paint: 'fill', colour: '#a8321c', opacity: 1 },
      },
    ])
  })
})
