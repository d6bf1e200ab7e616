import type { Millimetres, MM } from '../units'
import type { Ink, Mark, TextMark } from './display-list'
import { inkPoints } from './place-marks'
import { capHeight, measureText } from './text-metrics'

/** How a figure beside a symbol is set. */
export interface NumeralType {
  size: Millimetres
  weight: TextMark['weight']
  /** White space between the figure and the symbol's ink. */
  gap: Millimetres
}

/** Finest step in which a figure is moved out until it is clear. */
const STEP: Millimetres = 0.05

/** An upright figure beside a symbol: as near to it as its ink allows, straight away from `from` in one direction.
 *  @param away unit vector on the drawing: the down-dip direction, or the side of an arrow
 *  @param ink marks that the figure keeps clear of, as they lie on the drawing
 *  @param furthest distance at which the search ends, and the figure stands whatever is there */
export function numeralBeside(
  text: string,
  { from, away, ink, furthest }: { from: MM; away: MM; ink: readonly Mark[]; furthest: Millimetres },
  type: NumeralType & { ink: Ink },
): TextMark {
  const half: MM = [measureText(text, type.size, type.weight) / 2, capHeight(type.size, type.weight) / 2]
  const lines = inkPoints(ink)
  let distance = type.gap
  while (distance < furthest) {
    const middle: MM = [from[0] + away[0] * distance, from[1] + away[1] * distance]
    const isClear = lines.every(({ points, halfWidth }) => {
      const [x, y] = [half[0] + type.gap + halfWidth, half[1] + type.gap + halfWidth]
      return points.every((point, index) => !crossesBox(points[index - 1] ?? point, point, middle, [x, y]))
    })
    if (isClear) break
    distance += STEP
  }
  return {
    mark: 'text',
    text,
    at: [from[0] + away[0] * distance, from[1] + away[1] * distance],
    size: type.size,
    weight: type.weight,
    ink: type.ink,
    align: 'middle',
  }
}

/** Whether a straight piece enters a box, by clipping it against the box's four sides. Source: Liang and Barsky 1984. */
export function crossesBox(a: MM, b: MM, middle: MM, half: MM): boolean {
  let [enter, leave] = [0, 1]
  for (const axis of [0, 1] as const) {
    const start = a[axis] - middle[axis]
    const run = b[axis] - a[axis]
    if (run === 0) {
      if (Math.abs(start) >= half[axis]) return false
      continue
    }
    const [first, second] = [(-half[axis] - start) / run, (half[axis] - start) / run]
    enter = Math.max(enter, Math.min(first, second))
    leave = Math.min(leave, Math.max(first, second))
  }
  return enter < leave || (a[0] === b[0] && a[1] === b[1])
}
