import type { PNG } from 'pngjs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { lithologyPatterns } from '@shared/symbols/definitions/lithology'
import type { DisplayList, Tile } from '@shared/symbols/display-list'
import { rectangle } from '@shared/sheet-face/rectangle'
import { marksOverCells } from '@shared/symbols/tile'
import { comparePictures } from '../support/surface-pictures/compare'
import { openSurfacePictures, type SurfacePictures } from '../support/surface-pictures/pictures'

/** 300 dpi, at which every cell is a whole number of pixels. */
const PX_PER_MM = 300 / 25.4
/** Share of pixels that may differ beyond smoothed edges. Canvas and SVG are drawn by one browser. */
const SAME_BROWSER = 0.0001
/** PDF is drawn by poppler, which sets some cells a third of a pixel off: slanted lines come out a little softer. So colours
 *  may differ by a fifth, and then in so few pixels; a cell one pixel off differs in six times as many and more. */
const ANOTHER_RENDERER = { share: 0.002, tolerance: 0.2 }
/** Difference of one pixel, of 255. Edges smoothed at another place differ by up to 80; marks cut at the cells' edges, as was
 *  tried, by 170 and more. */
const SEAM = 120

let pictures: SurfacePictures
beforeAll(async () => {
  pictures = await openSurfacePictures()
})
afterAll(() => pictures.close())

/** Millimetres that are so many pixels. */
const px = (count: number): number => count / PX_PER_MM
const size = { width: px(496), height: px(354) }

/** A pattern in a frame, its anchor outside: cells are cut on all sides. */
const framed = (tile: Tile, ink: 'black' | `#${string}`, ground: `#${string}`): DisplayList => {
  const path = rectangle(px(12), px(12), size.width - px(24), size.height - px(24))
  return [
    { mark: 'fill', path, ink: ground },
    { mark: 'pattern', path, tile, ink, anchor: [px(-39), px(67)] },
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
    const { share } = comparePictures(canvas, await draw('pdf', list), ANOTHER_RENDERER.tolerance)
    expect(share).toBeLessThanOrEqual(ANOTHER_RENDERER.share)
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
      {
        mark: 'pattern',
        path: rectangle(0, 0, size.width, size.height),
        tile,
        ink: '#000000',
        anchor: [0, 0],
      },
    ])
    const whole = darkness(black, { x: 0, y: 0, width: black.width, height: black.height })
    expect(whole).toBeGreaterThan(0.02)
    expect(whole).toBeLessThan(0.14)
    for (const x of [0, 106, 212, 318]) {
      for (const y of [0, 88, 176]) {
        const part = darkness(black, { x, y, width: 178, height: 178 })
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

/** Share of ink in a part of a picture of black on white, 0–1; the part in pixels. */
function darkness(picture: PNG, part: { x: number; y: number; width: number; height: number }): number {
  let sum = 0
  for (let y = part.y; y < part.y + part.height; y++) {
    for (let x = part.x; x < part.x + part.width; x++) {
      sum += 255 - (picture.data[(y * picture.width + x) * 4] ?? 255)
    }
  }
  return sum / (part.width * part.height * 255)
}
