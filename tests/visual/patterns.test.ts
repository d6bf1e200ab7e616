import type { PNG } from 'pngjs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { lithologyPatterns } from '@shared/symbols/definitions/lithology'
import type { DisplayList, Tile } from '@shared/symbols/display-list'
import { rectangle } from '@shared/sheet-face/rectangle'
import { marksOverCells } from '@shared/symbols/tile'
import { comparePictures } from '../support/surface-pictures/compare'
import { openSurfacePictures, type SurfacePictures } from '../support/surface-pictures/pictures'

/** 254 dpi; every cell is a whole number of pixels. */
const PX_PER_MM = 10
/** Share of pixels that may differ beyond smoothed edges. Canvas and SVG are drawn by one browser, PDF by poppler. */
const SAME_BROWSER = 0.0001
const ANOTHER_RENDERER = 0.002
/** Difference of one pixel, of 255. Edges smoothed at another place differ by up to 80; marks cut at the cells' edges, as was
 *  tried, by 170 and more. */
const SEAM = 120

let pictures: SurfacePictures
beforeAll(async () => {
  pictures = await openSurfacePictures()
})
afterAll(() => pictures.close())

const size = { width: 42, height: 30 }

/** A pattern in a frame, its anchor outside: cells are cut on all sides. */
const framed = (tile: Tile, ink: 'black' | `#${string}`, ground: `#${string}`): DisplayList => {
  const path = rectangle(1, 1, size.width - 2, size.height - 2)
  return [
    { mark: 'fill', path, ink: ground },
    { mark: 'pattern', path, tile, ink, anchor: [-3.3, 5.7] },
  ]
}

const inColour = (tile: Tile) => framed(tile, '#8f7f5c', '#e3d2b0')
const inOneInk = (tile: Tile) => framed(tile, 'black', '#ffffff')

const draw = (surface: 'canvas' | 'svg' | 'pdf', list: DisplayList, of = size): Promise<PNG> =>
  pictures.draw(surface, { list, size: of, pxPerMm: PX_PER_MM })

describe.each(lithologyPatterns)('the pattern of $id', ({ tile }) => {
  it.each([
    ['colour', inColour(tile)],
    ['one ink', inOneInk(tile)],
  ])('is the same on canvas, in SVG and in PDF, in %s', async (_, list) => {
    const canvas = await draw('canvas', list)
    expect(comparePictures(canvas, await draw('svg', list)).share).toBeLessThanOrEqual(SAME_BROWSER)
    expect(comparePictures(canvas, await draw('pdf', list)).share).toBeLessThanOrEqual(ANOTHER_RENDERER)
  })

  it('shows no seam: nine cells are what their marks are when drawn one by one', async () => {
    const block = { width: tile.width * 3, height: tile.height * 3 }
    const path = rectangle(0, 0, block.width, block.height)
    const repeated = await draw(
      'canvas',
      [{ mark: 'pattern', path, tile, ink: 'black', anchor: [0, 0] }],
      block,
    )
    const single = await draw(
      'canvas',
      marksOverCells(tile, 3, 3).map((mark) => ({ ...mark, ink: 'black' })),
      block,
    )
    expect(greatestDifference(repeated, single)).toBeLessThan(SEAM)
  })

  it('is light and of an even tone', async () => {
    const black = await draw('canvas', [
      { mark: 'pattern', path: rectangle(0, 0, 42, 30), tile, ink: '#000000', anchor: [0, 0] },
    ])
    const whole = darkness(black, { x: 0, y: 0, width: 42, height: 30 })
    expect(whole).toBeGreaterThan(0.02)
    expect(whole).toBeLessThan(0.14)
    for (const x of [0, 9, 18, 27]) {
      for (const y of [0, 7.5, 15]) {
        const part = darkness(black, { x, y, width: 15, height: 15 })
        expect(Math.abs(part / whole - 1)).toBeLessThan(0.2)
      }
    }
  })
})

describe('the patterns together', () => {
  it('can be told from each other', async () => {
    const drawn: { id: string; picture: PNG }[] = []
    for (const { id, tile } of lithologyPatterns)
      drawn.push({ id, picture: await draw('canvas', inOneInk(tile)) })
    const alike = drawn.flatMap((one, index) =>
      drawn
        .slice(index + 1)
        .filter((other) => comparePictures(one.picture, other.picture).share < 0.008)
        .map((other) => `${one.id} and ${other.id}`),
    )
    expect(alike).toEqual([])
  })
})

/** The greatest difference of two pixels at one place, 0–255. */
function greatestDifference(a: PNG, b: PNG): number {
  expect([a.width, a.height]).toEqual([b.width, b.height])
  return a.data.reduce((most, value, index) => Math.max(most, Math.abs(value - (b.data[index] ?? 0))), 0)
}

/** Share of ink in a part of a picture of black on white, 0–1. */
function darkness(picture: PNG, part: { x: number; y: number; width: number; height: number }): number {
  const [left, top, width, height] = [part.x, part.y, part.width, part.height].map((mm) => mm * PX_PER_MM)
  let sum = 0
  for (let y = top ?? 0; y < (top ?? 0) + (height ?? 0); y++) {
    for (let x = left ?? 0; x < (left ?? 0) + (width ?? 0); x++) {
      sum += 255 - (picture.data[(y * picture.width + x) * 4] ?? 255)
    }
  }
  return sum / ((width ?? 0) * (height ?? 0) * 255)
}
