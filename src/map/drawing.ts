import type { DisplayList } from '@shared/symbols/display-list'
import { replay, type Paint, type Surface, type TextRun, type Tiling } from '@shared/symbols/interpreter'
import type { Metres, XY } from '@shared/units'
import { applyPaint, tracePath } from './canvas-paths'
import { drawText } from './canvas-surface'
import { fillTiled } from './fill-tiled'
import { toPx, type ViewFrame } from './view-frame'

type Step =
  | { step: 'paint'; path: Path2D; paint: Paint }
  | { step: 'tile'; path: Path2D; tiling: Tiling }
  | { step: 'text'; run: TextRun }
  | { step: 'clip'; path: Path2D }
  | { step: 'save' }
  | { step: 'restore' }

/** A display list made ready for the canvas once, to be drawn at any place and size: its paths are built, its dashes cut,
 *  its colours known. Steps are in the list's millimetres, y up. */
export interface Drawing {
  /** Sheet metres at the list's origin. */
  origin: XY
  /** Scale that the list was made for. */
  mmPerMetre: number
  steps: readonly Step[]
}

/** Thinnest stroke on screen: a finer one turns grey and patchy. */
export const LEAST_WIDTH_PX = 0.8

/** Makes a display list ready for the canvas. */
export function makeDrawing(list: DisplayList, at: { origin: XY; mmPerMetre: number }): Drawing {
  const surface = recordingSurface()
  replay(list, surface)
  return { ...at, steps: surface.steps }
}

function recordingSurface(): Surface & { steps: Step[] } {
  const steps: Step[] = []
  const built = (path: Parameters<Surface['clip']>[0]): Path2D => {
    const made = new Path2D()
    tracePath(path, made)
    return made
  }
  return {
    steps,
    path: (path, paint) => steps.push({ step: 'paint', path: built(path), paint }),
    tile: (path, tiling) => steps.push({ step: 'tile', path: built(path), tiling }),
    text: (run) => steps.push({ step: 'text', run }),
    clip: (path) => steps.push({ step: 'clip', path: built(path) }),
    group(_name, draw) {
      steps.push({ step: 'save' })
      draw()
      steps.push({ step: 'restore' })
    },
  }
}

/** Draws it where its origin falls in the view.
 *  @param pxPerMm size of the list's millimetre on screen, px
 *  @param ratio device pixels per px
 *  @param pattern size of a pattern's millimetre, px, where patterns do not shrink and grow with the ground, and whether they
 *  must be made for just this size */
export function drawDrawing(
  context: CanvasRenderingContext2D,
  drawing: Drawing,
  {
    view,
    pxPerMm,
    ratio,
    pattern,
  }: {
    view: ViewFrame
    pxPerMm: number
    ratio: number
    pattern?: { pxPerMm: number; settle: boolean }
  },
): void {
  const [x, y] = toPx(view, drawing.origin)
  const scale = pxPerMm * ratio
  context.setTransform(scale, 0, 0, -scale, x * ratio, y * ratio)
  for (const step of drawing.steps) {
    switch (step.step) {
      case 'paint':
        applyPaint(context, step.paint)
        if (step.paint.paint === 'stroke') {
          context.lineWidth = Math.max(step.paint.width, LEAST_WIDTH_PX / pxPerMm)
          context.stroke(step.path)
        } else {
          context.fill(step.path, 'evenodd')
          context.globalAlpha = 1
        }
        break
      case 'tile':
        fillTiled(context, step.tiling, {
          path: step.path,
          ...(pattern ? { scale: pattern.pxPerMm * ratio, settle: pattern.settle } : {}),
        })
        break
      case 'text':
        // Letters would stand on their heads in a frame with y up.
        context.setTransform(scale, 0, 0, scale, x * ratio, y * ratio)
        drawText(context, { ...step.run, y: -step.run.y })
        context.setTransform(scale, 0, 0, -scale, x * ratio, y * ratio)
        break
      case 'clip':
        context.clip(step.path, 'evenodd')
        break
      case 'save':
        context.save()
        break
      case 'restore':
        context.restore()
    }
  }
}

/** Size of a drawing's millimetre that lays its ground exactly on the view's: for lines and faces, whose shape is the
 *  ground's. */
export const groundPxPerMm = (view: ViewFrame, mmPerMetre: Metres): number => view.pxPerMetre / mmPerMetre
