import type { LineItem } from '@shared/items/item'
import { lineSymbolOf } from '@shared/symbols/draw-item'
import { inkColour } from '@shared/symbols/ink'
import { printedInk } from '@shared/symbols/one-ink'
import type { Printing } from '@shared/symbols/unit-fill'
import type { XY } from '@shared/units'
import { LEAST_WIDTH_PX } from './drawing'
import { toPx, type ViewFrame } from './view-frame'

/** Draws lines as plain strokes in their ink: for the moment until their symbols are ready. One path for each pen, vertices
 *  within a pixel left out. */
export function paintPlain(
  context: CanvasRenderingContext2D,
  lines: readonly LineItem[],
  {
    view,
    ratio,
    symbolPx,
    printing,
  }: { view: ViewFrame; ratio: number; symbolPx: number; printing: Printing },
): void {
  const pens = new Map<string, { colour: string; width: number; lines: LineItem[] }>()
  for (const line of lines) {
    const { ink, strokes } = lineSymbolOf(line)
    const width = Math.max(LEAST_WIDTH_PX, strokes.certain.width * symbolPx)
    const key = `${ink} ${width}`
    const pen = pens.get(key)
    if (pen) pen.lines.push(line)
    else pens.set(key, { colour: inkColour(printedInk(ink, printing)), width, lines: [line] })
  }
  context.setTransform(ratio, 0, 0, ratio, 0, 0)
  context.lineJoin = context.lineCap = 'round'
  for (const { colour, width, lines: drawn } of pens.values()) {
    context.strokeStyle = colour
    context.lineWidth = width
    context.beginPath()
    for (const line of drawn) trace(context, view, line.geometry.coordinates)
    context.stroke()
  }
}

function trace(context: CanvasRenderingContext2D, view: ViewFrame, line: readonly XY[]): void {
  let [lastX, lastY] = [NaN, NaN]
  line.forEach((vertex, index) => {
    const [x, y] = toPx(view, vertex)
    if (index === 0) context.moveTo(x, y)
    else if (index < line.length - 1 && Math.abs(x - lastX) < 1 && Math.abs(y - lastY) < 1) return
    else context.lineTo(x, y)
    ;[lastX, lastY] = [x, y]
  })
}
