import type { Path } from '@shared/symbols/display-list'
import type { Paint, Surface } from '@shared/symbols/interpreter'

/** Any canvas that can be drawn on: the page's, or one that is never shown. */
export type AnyContext = CanvasRenderingContext2D | OffscreenCanvasRenderingContext2D

/** What a canvas context and a Path2D have in common. */
export type PathTarget = Pick<CanvasPath, 'moveTo' | 'lineTo' | 'bezierCurveTo' | 'closePath'>

/** The verb of a canvas surface that paints paths: all that the cell of a pattern needs. */
export const canvasPaths = (context: AnyContext): Pick<Surface, 'path'> => ({
  path(path, paint) {
    context.beginPath()
    tracePath(path, context)
    applyPaint(context, paint)
    if (paint.paint === 'stroke') context.stroke()
    else context.fill('evenodd')
    context.globalAlpha = 1
  },
})

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
export function applyPaint(context: AnyContext, paint: Paint): void {
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
