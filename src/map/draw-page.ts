import type { SheetComposition } from '@shared/sheet-face/compose-sheet'
import { replay } from '@shared/symbols/interpreter'
import { canvasSurface } from './canvas-surface'

type Composed = Extract<SheetComposition, { outcome: 'composed' }>

/** Most pixels of a picture of a page: beyond, browsers give up silently. The picture is then a little softer. */
const MOST_PIXELS = 48_000_000

/** Draws a composed page on a canvas, a part per frame, so that the page that shows it stays usable.
 *  @param pxPerMm CSS pixels to the millimetre   @returns stops the drawing */
export function drawPage(canvas: HTMLCanvasElement, { page, parts }: Composed, pxPerMm: number): () => void {
  const [width, height] = [page.width * pxPerMm, page.height * pxPerMm]
  const density = Math.min(window.devicePixelRatio, Math.sqrt(MOST_PIXELS / (width * height)))
  canvas.width = Math.round(width * density)
  canvas.height = Math.round(height * density)
  canvas.style.width = `${width}px`
  canvas.style.height = `${height}px`
  const context = canvas.getContext('2d')
  if (!context) return () => {}
  const surface = canvasSurface(context)
  const scale = pxPerMm * density
  const transform = { scale, x: 0, y: page.height * scale, flipY: true }
  let [next, frame] = [0, 0]
  const step = (): void => {
    const part = parts[next++]
    if (!part) return
    replay(part.draw(), surface, transform)
    frame = requestAnimationFrame(step)
  }
  // Letters are measured when they are drawn: without the fonts they would come out in another.
  let stopped = false
  void Promise.all([400, 700, 900].map((weight) => document.fonts.load(`${weight} 12px Lato`))).then(() => {
    if (!stopped) step()
  })
  return () => {
    stopped = true
    cancelAnimationFrame(frame)
  }
}
