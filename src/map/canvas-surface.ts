import type { Path } from '@shared/symbols/display-list'
import type { Paint, Surface, TextRun } from '@shared/symbols/interpreter'

/** What a canvas context and a Path2D have in common. */
export type PathTarget = Pick<CanvasPath, 'moveTo' | 'lineTo' | 'bezierCurveTo' | 'closePath'>

/** A surface that draws on a canvas at once. Paths and text come in the canvas's own unit, y downward. */
export function canvasSurface(context: CanvasRenderingContext2D): Surface {
  return {
    path(path, paint) {
      context.beginPath()
      tracePath(path, context)
      applyPaint(context, paint)
      if (paint.paint === 'stroke') context.stroke()
      else context.fill('evenodd')
      context.globalAlpha = 1
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

/** Adds a path's steps to a context or a Path2D. */
export function tracePath(path: Path, target: PathTarget): void {
  for (const step of path) {
    if (step[0] === 'line') target.lineTo(step[1], step[2])
    else if (step[0] === 'move') target.moveTo(step[1], step[2])
    else if (step[0] === 'close') target.closePath()
    else target.bezierCurveTo(step[1], step[2], step[3], step[4], step[5], step[6])
  }
}

/** Sets how the next stroke or fill looks. */
export function applyPaint(context: CanvasRenderingContext2D, paint: Paint): void {
  if (paint.paint === 'fill') {
    context.fillStyle = paint.colour
    context.globalAlpha = paint.opacity
    return
  }
  context.strokeStyle = paint.colour
  context.lineWidth = paint.width
  context.lineCap = paint.cap
  context.lineJoin = 'round'
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
