import type { DisplayList } from '@shared/symbols/display-list'
import { replay } from '@shared/symbols/interpreter'
import { canvasSurface } from '@/map/canvas-surface'

/** Draws a list on a canvas of the page, as the app does, and gives it as a data address.
 *  @param size millimetres; the list's (0, 0) is the lower left corner */
export async function drawOnCanvas(
  list: DisplayList,
  size: { width: number; height: number },
  pxPerMm: number,
  ground: string,
): Promise<string> {
  await Promise.all([400, 700, 900].map((weight) => document.fonts.load(`${weight} 12px Lato`)))
  const canvas = document.createElement('canvas')
  canvas.width = Math.round(size.width * pxPerMm)
  canvas.height = Math.round(size.height * pxPerMm)
  const context = canvas.getContext('2d')
  if (!context) throw new TypeError('This browser has no 2D canvas.')
  context.fillStyle = ground
  context.fillRect(0, 0, canvas.width, canvas.height)
  replay(list, canvasSurface(context), { scale: pxPerMm, x: 0, y: size.height * pxPerMm, flipY: true })
  return canvas.toDataURL('image/png')
}
