import type { Degrees, Millimetres, MM } from '../units'
import type { Ink, Mark, TextMark } from './display-list'
import { turnTo } from './paths'
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

/** A figure would sooner stand twice as far away than be turned by this. */
const TURN_AS_FAR: Degrees = 90

/** Where a figure is to stand. */
export interface NumeralPlace {
  from: MM
  /** Unit vector on the drawing: the down-dip direction, or the side of an arrow. */
  away: MM
  /** Marks that the figure keeps clear of, as they lie on the drawing. */
  ink: readonly Mark[]
  /** Distance at which the search ends, and the figure stands whatever is there. */
  furthest: Millimetres
  /** Turns from `away` that will do as well, degrees: where the nearest place is, and the least turn among equals. */
  turns?: readonly Degrees[]
}

/** An upright figure beside a symbol: as near to `from` as its ink allows, straight away from it in one direction. */
export function numeralBeside(text: string, place: NumeralPlace, type: NumeralType & { ink: Ink }): TextMark {
  const { from, ink, furthest, turns = [0] } = place
  const half: MM = [measureText(text, type.size, type.weight) / 2, capHeight(type.size, type.weight) / 2]
  const lines = inkPoints(ink)
  const isClear = (middle: MM): boolean =>
    lines.every(({ points, halfWidth }) => {
      const box: MM = [half[0] + type.gap + halfWidth, half[1] + type.gap + halfWidth]
      return points.every((point, index) => !crossesBox(points[index - 1] ?? point, point, middle, box))
    })
  const ways = turns.map((turn) => {
    const away = turnTo(turn, [0, 0])(place.away)
    const pointAt = (distance: Millimetres): MM => [
      from[0] + away[0] * distance,
      from[1] + away[1] * distance,
    ]
    let distance = type.gap
    while (distance < furthest && !isClear(pointAt(distance))) distance += STEP
    return { at: pointAt(distance), effort: distance * (1 + Math.abs(turn) / TURN_AS_FAR) }
  })
  const [first] = ways.toSorted((a, b) => a.effort - b.effort)
  return {
    mark: 'text',
    text,
    at: first?.at ?? from,
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
