import type { DisplayList } from '@shared/symbols/display-list'
import { replay } from '@shared/symbols/interpreter'
import { canvasSurface } from '@/map/canvas-surface'
import { drawDrawing, makeDrawing } from '@/map/drawing'

/** Draws a list on a canvas of the page, as the app does, and gives it as a data address.
 *  @param size millimetres; the list's (0, 0) is the lower left corner */
export async function drawOnCanvas(
  list: DisplayList,
  size: { width: number; height: number },
  pxPerMm: number,
  ground: string,
): Promise<string> {
  await Promise.all([400, 700, 900].map((weight) => document.fonts.load(`${weight} 12px Lato`)))
  const [width, height] = [Math.round(size.width * pxPerMm), Math.round(size.height * pxPerMm)]
  const { canvas, context } = blankCanvas({ width, height }, ground)
  replay(list, canvasSurface(context), { scale: pxPerMm, x: 0, y: size.height * pxPerMm, flipY: true })
  return canvas.toDataURL('image/png')
}

/** Draws a list on a canvas as the map does: made ready once, then laid into a view.
 *  @param list in millimetres from the view's middle   @param size pixels */
export function drawInView(
  list: DisplayList,
  size: { width: number; height: number },
  { at, pxPerMm, patternPxPerMm }: { at: [x: number, y: number]; pxPerMm: number; patternPxPerMm: number },
): string {
  const { canvas, context } = blankCanvas(size, '#ffffff')
  const drawing = makeDrawing(list, { origin: [0, 0], mmPerMetre: 1 })
  // One metre to the millimetre: the view's place and scale are then those of the list.
  const view = { ...size, center: at, pxPerMetre: pxPerMm }
  drawDrawing(context, drawing, {
    view,
    pxPerMm,
    ratio: 1,
    pattern: { pxPerMm: patternPxPerMm, settle: true },
  })
  return canvas.toDataURL('image/png')
}

function blankCanvas(size: { width: number; height: number }, ground: string) {
  const canvas = document.createElement('canvas')
  canvas.width = size.width
  canvas.height = size.height
  const context = canvas.getContext('2d')
  if (!context) throw new TypeError('This browser has no 2D canvas.')
  context.fillStyle = ground
  context.fillRect(0, 0, canvas.width, canvas.height)
  return { canvas, context }
}
