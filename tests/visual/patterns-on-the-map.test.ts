import type { PNG } from 'pngjs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { rectangle } from '@shared/sheet-face/rectangle'
import { findPattern } from '@shared/symbols/definitions/lithology'
import type { Mark, PatternMark } from '@shared/symbols/display-list'
import { marksOverCells } from '@shared/symbols/tile'
import { openSurfacePictures, type SurfacePictures } from '../support/surface-pictures/pictures'

let pictures: SurfacePictures
beforeAll(async () => {
  pictures = await openSurfacePictures()
})
afterAll(() => pictures.close())

const conglomerate = findPattern('conglomerate')
if (!conglomerate) throw new Error('There is no pattern of conglomerate.')
const { tile } = conglomerate
const area = (x: number, width: number): PatternMark => ({
  mark: 'pattern',
  path: rectangle(x, -40, width, 80),
  tile,
  ink: 'black',
  anchor: [0, 0],
})
const size = { width: 300, height: 200 }
const draw = (list: Mark[], at: [number, number], pxPerMm: number, patternPxPerMm = pxPerMm) =>
  pictures.drawInView(list, size, { at, pxPerMm, patternPxPerMm })

/** The pixels of a part of a picture, one after another. */
function part(picture: PNG, left: number, top: number, width: number, height: number): number[] {
  return Array.from({ length: width * height }, (_, index) => {
    const [x, y] = [left + (index % width), top + Math.floor(index / width)]
    return picture.data[(y * picture.width + x) * 4] ?? -1
  })
}

const differing = (a: readonly number[], b: readonly number[], by = 0): number =>
  a.filter((value, index) => Math.abs(value - (b[index] ?? -1)) > by).length

describe('a pattern on the map', () => {
  it('moves with the sheet, pixel by pixel', async () => {
    // A screen's odd scale: cells are no whole pixels.
    const pxPerMm = 3.59
    const before = await draw([area(-60, 120)], [0, 0], pxPerMm)
    const after = await draw([area(-60, 120)], [17 / pxPerMm, -9 / pxPerMm], pxPerMm)
    // The view went 17 px to the right and 9 px down, so the sheet went left and up.
    expect(differing(part(before, 37, 29, 240, 150), part(after, 20, 20, 240, 150))).toBe(0)
  })

  it('runs on from one area to its neighbour without a break', async () => {
    const pxPerMm = 4
    const whole = await draw([area(-40, 80)], [0, 0], pxPerMm)
    const parted = await draw([area(-40, 37), area(-3, 43)], [0, 0], pxPerMm)
    expect(differing(part(whole, 0, 0, 300, 200), part(parted, 0, 0, 300, 200))).toBe(0)
  })

  it('keeps its size while the ground shrinks beneath it', async () => {
    const large = await draw([area(-60, 120)], [0, 0], 4, 4)
    const small = await draw([area(-60, 120)], [0, 0], 2, 4)
    expect(differing(part(large, 50, 50, 100, 100), part(small, 50, 50, 100, 100))).toBe(0)
  })

  it.each([6.3, 12.2, 60, 90])(
    'is as sharp as its marks drawn one by one, at %d pixels a millimetre',
    async (pxPerMm) => {
      const [columns, rows] = [4, 5]
      const origin: [number, number] = [tile.width * 2, tile.height * 2]
      const block: PatternMark = {
        ...area(0, 0),
        path: rectangle(0, 0, tile.width * columns, tile.height * rows),
      }
      const repeated = await draw([block], origin, pxPerMm)
      const single = await draw(
        marksOverCells(tile, columns, rows).map((mark) => ({ ...mark, ink: 'black' })),
        origin,
        pxPerMm,
      )
      // A repeated cell begins at a whole pixel, which shifts it by half of one at most: ink stays, edges differ.
      const ink = (picture: PNG): number =>
        part(picture, 20, 20, 260, 160).reduce((sum, value) => sum + 255 - value, 0)
      expect(ink(repeated) / ink(single)).toBeGreaterThan(0.97)
      expect(ink(repeated) / ink(single)).toBeLessThan(1.03)
      const darkest = (picture: PNG): number => Math.min(...part(picture, 20, 20, 260, 160))
      expect(Math.abs(darkest(repeated) - darkest(single))).toBeLessThan(40)
    },
  )
})
