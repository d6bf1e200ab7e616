import type { Surface, TextRun } from '@shared/symbols/interpreter'
import { canvasPaths, tracePath } from './canvas-paths'
import { fillTiled } from './fill-tiled'

/** A surface that draws on a canvas at once. Paths and text come in the canvas's own unit, y downward. */
export function canvasSurface(context: CanvasRenderingContext2D): Surface {
  return {
    ...canvasPaths(context),
    tile(path, tiling) {
      context.beginPath()
      tracePath(path, context)
      fillTiled(context, tiling)
    },
    text: (run) => drawText(context, run),
    clip(path) {
      context.beginPath()
      tracePath(path, context)
      context.clip('evenodd')
    },
    group(_name, draw) {
      context.save()
      draw()
      context.restore()
    },
  }
}

/** Writes a run of Lato from the left end of its base line. */
export function drawText(context: CanvasRenderingContext2D, run: TextRun): void {
  context.font = `${run.weight} ${run.size}px Lato, sans-serif`
  context.letterSpacing = `${run.tracking}px`
  context.textBaseline = 'alphabetic'
  context.textAlign = 'left'
  if (run.turn === 0) return writeAt(context, run, run.x, run.y)
  context.save()
  context.translate(run.x, run.y)
  context.rotate((run.turn * Math.PI) / 180)
  writeAt(context, run, 0, 0)
  context.restore()
}

function writeAt(context: CanvasRenderingContext2D, run: TextRun, x: number, y: number): void {
  if (run.halo) {
    context.strokeStyle = run.halo.colour
    context.lineWidth = run.halo.width
    context.lineJoin = 'round'
    context.strokeText(run.text, x, y)
  }
  context.fillStyle = run.colour
  context.fillText(run.text, x, y)
}
