import type { Tiling } from '@shared/symbols/interpreter'
import { canvasPaths } from './canvas-paths'
import { LONGEST_CELL, readyPicture, tilePicture } from './tile-pictures'

/** How the cells lie on a canvas, device pixels. */
interface Laid {
  /** Where the tiling's (x, y) falls. */
  corner: { x: number; y: number }
  /** Device pixels to the tiling's unit. */
  scale: number
  /** The tiling's y runs up. */
  flip: boolean
}

/** Fills a path with a tiling, its cells in whole device pixels: as crisp as its marks drawn one by one. The pattern hangs
 *  on the tiling's corner, so areas of one anchor share it without a break, and it moves with the sheet pixel by pixel.
 *  @param path the path; without one, the context's current path
 *  @param scale device pixels to the tiling's unit where they are not the context's own
 *  @param settle false where a picture made for another size will do for now, stretched */
export function fillTiled(
  context: CanvasRenderingContext2D,
  tiling: Tiling,
  { path, scale, settle = true }: { path?: Path2D; scale?: number; settle?: boolean } = {},
): void {
  const { a, d, e, f } = context.getTransform()
  const laid: Laid = {
    corner: { x: a * tiling.x + e, y: d * tiling.y + f },
    scale: scale ?? Math.abs(a),
    flip: d < 0,
  }
  if (Math.max(tiling.width, tiling.height) * laid.scale > LONGEST_CELL) {
    context.save()
    if (path) context.clip(path, 'evenodd')
    else context.clip('evenodd')
    drawCells(context, tiling, laid)
    context.restore()
    return
  }
  const ready = settle ? undefined : readyPicture(tiling, laid.flip)
  const picture = ready ?? tilePicture(tiling, laid.scale, laid.flip)
  if (!picture) return
  const stretch = ready ? laid.scale / ready.scale : 1
  const left = Math.round(laid.corner.x)
  const top = Math.round(laid.flip ? laid.corner.y - picture.height * stretch : laid.corner.y)
  // The context's own scale must not stretch the picture: it is undone.
  picture.pattern.setTransform({ a: stretch / a, d: stretch / d, e: (left - e) / a, f: (top - f) / d })
  context.imageSmoothingEnabled = stretch !== 1
  context.fillStyle = picture.pattern
  if (path) context.fill(path, 'evenodd')
  else context.fill('evenodd')
  context.imageSmoothingEnabled = true
}

/** Draws the cells that are on the canvas, mark by mark: for cells so large that few are. */
function drawCells(context: CanvasRenderingContext2D, tiling: Tiling, { corner, scale, flip }: Laid): void {
  const [width, height] = [tiling.width * scale, tiling.height * scale]
  const { width: right, height: bottom } = context.canvas
  const firstColumn = Math.floor(-corner.x / width)
  const columns = Math.ceil((right - corner.x) / width) - firstColumn
  const lowest = flip ? corner.y - bottom : -corner.y
  const firstRow = Math.floor(lowest / height)
  const rows = Math.ceil((lowest + bottom) / height) - firstRow
  const y = corner.y + (flip ? -firstRow : firstRow) * height
  context.setTransform(scale, 0, 0, flip ? -scale : scale, corner.x + firstColumn * width, y)
  tiling.draw(canvasPaths(context), columns, rows)
}
