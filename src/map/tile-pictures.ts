import type { Tiling } from '@shared/symbols/interpreter'
import { canvasPaths } from './canvas-paths'

/** A block of cells as a picture in whole device pixels. */
export interface TilePicture {
  pattern: CanvasPattern
  width: number
  height: number
  /** Device pixels to the tiling's unit that it was made for. */
  scale: number
}

/** How far the picture's period may be off the true one, as a share of it: a pixel over the width of a large screen. */
const PERIOD_ERROR = 1 / 3000
/** Longest side of a picture of one cell, device pixels: a larger one costs less drawn than repeated. */
export const LONGEST_CELL = 1024
/** Longest side of a picture of several cells: what it takes to draw grows with its area. */
const LONGEST_BLOCK = 640
/** Pictures that are kept: all patterns of a busy sheet, in colour, at two zooms. */
const MOST_KEPT = 64

/** By look and size, the one used last at the end. */
const kept = new Map<string, TilePicture>()
/** The last one of each look. */
const latest = new Map<string, TilePicture>()

const lookOf = (tiling: Tiling, flip: boolean): string => [tiling.name, tiling.colour, flip].join(' ')

/** The picture of a tiling's cells at a size, made once.
 *  @param scale device pixels to the tiling's unit   @param flip where the tiling's y runs up */
export function tilePicture(tiling: Tiling, scale: number, flip: boolean): TilePicture | undefined {
  const look = lookOf(tiling, flip)
  const key = [look, (tiling.width * scale).toFixed(3), (tiling.height * scale).toFixed(3)].join(' ')
  const picture = kept.get(key) ?? makePicture(tiling, scale, flip)
  if (!picture) return undefined
  kept.delete(key)
  kept.set(key, picture)
  latest.set(look, picture)
  const [oldest] = kept.keys()
  if (kept.size > MOST_KEPT && oldest !== undefined) kept.delete(oldest)
  return picture
}

/** A picture of the cells that is there already, of any size: it will do while the size is changing. */
export const readyPicture = (tiling: Tiling, flip: boolean): TilePicture | undefined =>
  latest.get(lookOf(tiling, flip))

function makePicture(tiling: Tiling, scale: number, flip: boolean): TilePicture | undefined {
  const cell = { width: tiling.width * scale, height: tiling.height * scale }
  const [columns, rows] = [wholeCells(cell.width), wholeCells(cell.height)]
  const [width, height] = [Math.round(columns * cell.width), Math.round(rows * cell.height)]
  const context = new OffscreenCanvas(width, height).getContext('2d')
  if (!context) return undefined
  // The block is stretched to whole pixels: its edges then fall on theirs, and copies meet without a seam.
  const [across, down] = [width / (columns * tiling.width), height / (rows * tiling.height)]
  context.setTransform(across, 0, 0, flip ? -down : down, 0, flip ? height : 0)
  tiling.draw(canvasPaths(context), columns, rows)
  const pattern = context.createPattern(context.canvas, 'repeat')
  return pattern ? { pattern, width, height, scale } : undefined
}

/** How many cells side by side come close enough to whole pixels, or closest of those that fit into a picture. */
export function wholeCells(cell: number): number {
  const most = Math.max(1, Math.floor(LONGEST_BLOCK / cell))
  let best = 1
  for (let count = 1; count <= most; count++) {
    if (offBy(cell, count) <= PERIOD_ERROR) return count
    if (offBy(cell, count) < offBy(cell, best)) best = count
  }
  return best
}

const offBy = (cell: number, count: number): number => Math.abs(Math.round(cell * count) / (cell * count) - 1)
