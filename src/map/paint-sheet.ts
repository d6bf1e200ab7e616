import { facePath } from '@shared/sheet-face/graticule'
import { isLineItem, type Item } from '@shared/items/item'
import { SYMBOL_REACH } from '@shared/symbols/symbol-reach'
import { tracePath } from './canvas-surface'
import { drawDrawing, groundPxPerMm } from './drawing'
import type { Scene } from './scene'
import { fromPx, printShare, symbolPxPerMm, toPx, type ViewFrame } from './view-frame'

export interface SheetPaint {
  view: ViewFrame
  /** Device pixels per px. */
  ratio: number
  symbols: 'print' | 'screen'
  isHidden(item: Item): boolean
  isFaceHidden(unit: string | null): boolean
  /** False in the middle of a zoom: drawings made for another scale will do for now. */
  settle: boolean
}

/** Draws the sheet in one pass: unit areas, items, frame. Returns nothing and keeps nothing: what is kept is in the scene. */
export function paintSheet(context: CanvasRenderingContext2D, scene: Scene, paint: SheetPaint): void {
  const { view, ratio } = paint
  const symbolPx = symbolPxPerMm(printShare(view.pxPerMetre, scene.sheet.scale), paint.symbols)
  const mmPerMetre = view.pxPerMetre / symbolPx
  context.setTransform(1, 0, 0, 1, 0, 0)
  context.clearRect(0, 0, view.width * ratio, view.height * ratio)
  context.save()
  clipToFace(context, scene, paint)
  for (const face of scene.faces) {
    const drawing = paint.isFaceHidden(face.unit) ? undefined : scene.areaOf(face)
    if (drawing) {
      drawDrawing(context, drawing, { view, pxPerMm: groundPxPerMm(view, drawing.mmPerMetre), ratio })
    }
  }
  for (const item of scene.index.within(groundInView(view, SYMBOL_REACH * symbolPx))) {
    if (paint.isHidden(item)) continue
    const drawing = scene.drawingOf(item, mmPerMetre, paint.settle)
    const pxPerMm = isLineItem(item) ? groundPxPerMm(view, drawing.mmPerMetre) : symbolPx
    drawDrawing(context, drawing, { view, pxPerMm, ratio })
  }
  context.restore()
  const frame = scene.frame(mmPerMetre, paint.settle)
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
