import { isLineItem, type LineItem, type PointItem } from '@shared/items/item'
import { toPx, type Px, type ViewFrame } from './view-frame'

const FULL_TURN = 2 * Math.PI

/** A soft light beneath items, so that fine linework is found among much else. Sizes are screen pixels.
 *  @param colour `#rrggbb`   @param alpha 0–1 */
export function paintHalos(
  context: CanvasRenderingContext2D,
  items: readonly (LineItem | PointItem)[],
  {
    view,
    ratio,
    colour,
    alpha,
    width,
  }: { view: ViewFrame; ratio: number; colour: string; alpha: number; width: Px },
): void {
  context.save()
  context.setTransform(ratio, 0, 0, ratio, 0, 0)
  context.globalAlpha = alpha
  context.strokeStyle = context.fillStyle = colour
  context.lineJoin = context.lineCap = 'round'
  context.lineWidth = width
  for (const item of items) {
    context.beginPath()
    if (isLineItem(item)) {
      item.geometry.coordinates.forEach((vertex, index) => {
        const [x, y] = toPx(view, vertex)
        if (index === 0) context.moveTo(x, y)
        else context.lineTo(x, y)
      })
      context.stroke()
    } else {
      const [x, y] = toPx(view, item.geometry.coordinates)
      context.arc(x, y, 1.6 * width, 0, FULL_TURN)
      context.fill()
    }
  }
  context.restore()
}
