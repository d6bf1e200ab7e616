import { facePath } from '@shared/sheet-face/graticule'
import { isLineItem, type Item, type LineItem } from '@shared/items/item'
import { SYMBOL_REACH } from '@shared/symbols/symbol-reach'
import { tracePath } from './canvas-paths'
import { drawDrawing, groundPxPerMm } from './drawing'
import { mayReach } from './in-face'
import { paintPlain } from './paint-plain'
import type { Scene } from './scene'
import { thinningStep } from './thinning'
import { fromPx, relativeScale, toPx, type ViewFrame } from './view-frame'
import { bandOf } from './zoom-bands'

export interface SheetPaint {
  view: ViewFrame
  /** Device pixels per px. */
  ratio: number
  symbols: 'print' | 'screen'
  /** @param step how far symbols are thinned out at this zoom */
  isHidden(item: Item, step: number): boolean
  isFaceHidden(unit: string | null): boolean
  /** False in the middle of a move: pictures of patterns, and the frame, made for another scale will do for now. */
  settle: boolean
  /** Lines whose drawing is not ready are drawn plainly and points not at all, so that there is something to see at once. */
  isFirst?: boolean
  /** Without the frame: the picture lies over one that has it. */
  frameless?: boolean
}

/** Draws the sheet in one pass: unit areas, items, frame. It pauses after each, so that a large sheet can be drawn a little
 *  at a time. Keeps nothing: what is kept is in the scene. */
export function* paintSheet(
  context: CanvasRenderingContext2D,
  scene: Scene,
  paint: SheetPaint,
): Generator<undefined> {
  const { view, ratio } = paint
  const relative = relativeScale(view, scene.sheet.scale, paint.symbols)
  const { symbolPx } = relative
  // Points come with the second picture, and so does the work of thinning them out.
  const [band, step] = [bandOf(relative.scale), paint.isFirst ? 0 : thinningStep(relative.scale)]
  context.save()
  clipToFace(context, scene, paint)
  const ground = groundInView(view, 0)
  for (const face of scene.faces) {
    const isShown = mayReach(face, ground) && !paint.isFaceHidden(face.unit)
    const drawing = isShown ? scene.areaOf(face) : undefined
    if (!drawing) continue
    const pxPerMm = groundPxPerMm(view, drawing.mmPerMetre)
    const pattern = { pxPerMm: symbolPx, settle: paint.settle }
    drawDrawing(context, drawing, { view, pxPerMm, ratio, pattern })
    yield
  }
  const notReady: LineItem[] = []
  for (const item of scene.index.within(groundInView(view, SYMBOL_REACH * symbolPx))) {
    if (paint.isHidden(item, step)) continue
    if (paint.isFirst && !scene.isReady(item, band)) {
      if (isLineItem(item)) notReady.push(item)
      continue
    }
    const drawing = scene.drawingOf(item, band)
    const pxPerMm = isLineItem(item) ? groundPxPerMm(view, drawing.mmPerMetre) : symbolPx
    drawDrawing(context, drawing, { view, pxPerMm, ratio })
    yield
  }
  paintPlain(context, notReady, { view, ratio, symbolPx, printing: scene.printing })
  context.restore()
  if (paint.frameless) return
  const frame = scene.frame(view.pxPerMetre / symbolPx, paint.settle)
  drawDrawing(context, frame, { view, pxPerMm: groundPxPerMm(view, frame.mmPerMetre), ratio })
}

function clipToFace(context: CanvasRenderingContext2D, scene: Scene, { view, ratio }: SheetPaint): void {
  const { min } = scene.bounds
  const [x, y] = toPx(view, min)
  const path = facePath(scene.sheet, { origin: min, mmPerMetre: 1, convergenceAt: () => 0 })
  const scale = view.pxPerMetre * ratio
  context.setTransform(scale, 0, 0, -scale, x * ratio, y * ratio)
  context.beginPath()
  tracePath(path, context)
  context.clip('evenodd')
}

/** Ground on screen and a little beyond, sheet metres. */
export function groundInView(view: ViewFrame, beyondPx: number) {
  const [west, north] = fromPx(view, [-beyondPx, -beyondPx])
  const [east, south] = fromPx(view, [view.width + beyondPx, view.height + beyondPx])
  return { min: [west, south] as [number, number], max: [east, north] as [number, number] }
}
