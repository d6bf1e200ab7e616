import type { Tiling } from '@shared/symbols/interpreter'
import { canvasPaths } from './canvas-paths'

/** A block of cells as a picture in whole device pixels. */
export interface TilePicture {
  pattern: CanvasPattern
  width: number
  height: number
}

/** How far the picture's period may be off the true one, as a share of it: half a pixel over the width of a large screen. */
const PERIOD_ERROR = 1 / 8000
/** Longest side of a picture: a larger cell costs less drawn than repeated. */
export const LONGEST_SIDE = 1024
/** Pictures that are kept: all patterns of a busy sheet, in colour, at two zooms. */
const MOST_KEPT = 64

const kept = new Map<string, TilePicture>()

/** The picture of a tiling's cells at a size, made once.
 *  @param scale device pixels to the tiling's unit   @param flip where the tiling's y runs up */
export function tilePicture(tiling: Tiling, scale: number, flip: boolean): TilePicture | undefined {
  const [width, height] = [tiling.width * scale, tiling.height * scale]
  const key = [tiling.name, tiling.colour, width.toFixed(3), height.toFixed(3), flip].join(' ')
  const known = kept.get(key)
  if (known) {
    // Put last, as the one used last.
    kept.delete(key)
    kept.set(key, known)
    return known
  }
  const made = makePicture(tiling, scale, flip)
  if (!made) return undefined
  kept.set(key, made)
  const [oldest] = kept.keys()
  if (kept.size > MOST_KEPT && oldest !== undefined) kept.delete(oldest)
  return made
}

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
  return pattern ? { pattern, width, height } : undefined
}

/** How many cells side by side come closest to whole pixels: the fewest that are as good as can be seen. */
export function wholeCells(cell: number): number {
  const most = Math.max(1, Math.floor(LONGEST_SIDE / cell))
  let best = 1
  for (let count = 1; count <= most; count++) {
    if (offBy(cell, count) <= PERIOD_ERROR) return count
    if (offBy(cell, count) < offBy(cell, best)) best = count
  }
  return best
}

const offBy = (cell: number, count: number): number => Math.abs(Math.round(cell * count) / (cell * count) - 1)
