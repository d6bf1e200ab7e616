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
  const { from, furthest, turns = [0] } = place
  const half: MM = [measureText(text, type.size, type.weight) / 2, capHeight(type.size, type.weight) / 2]
  const pieces = inkPoints(place.ink).flatMap(({ points, halfWidth }) =>
    points.map((to, index): Piece => {
      const grown: MM = [half[0] + type.gap + halfWidth, half[1] + type.gap + halfWidth]
      return { from: points[index - 1] ?? to, to, half: grown }
    }),
  )
  const ways = turns.map((turn) => {
    const away = turnTo(turn, [0, 0])(place.away)
    const distance = Math.min(furthest, firstClear(pieces, { from, away }, type.gap))
    const at: MM = [from[0] + away[0] * distance, from[1] + away[1] * distance]
    return { at, effort: distance * (1 + Math.abs(turn) / TURN_AS_FAR) }
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

/** A straight piece of ink, and half the box of a figure with its white space and half the stroke. */
interface Piece {
  from: MM
  to: MM
  half: MM
}

/** A way out from a place, by a unit vector. */
interface Way {
  from: MM
  away: MM
}

/** The least distance along a way, from `least` on, at which a figure meets no piece. */
function firstClear(pieces: readonly Piece[], way: Way, least: Millimetres): Millimetres {
  const blocks = pieces.flatMap((piece) => {
    const block = blockOf(piece, way)
    return block ? [block] : []
  })
  let distance = least
  for (const [enter, leave] of blocks.toSorted((a, b) => a[0] - b[0])) {
    if (enter >= distance) return distance
    distance = Math.max(distance, leave)
  }
  return distance
}

/** From which to which distance along a way a figure's box meets a piece; undefined where it never does. It meets it while
 *  the figure's middle is inside the piece grown by the box, a convex hexagon, which a straight way crosses once.
 *  Source: Minkowski sum, derived; clipping between pairs of sides as by Liang and Barsky 1984. */
function blockOf(
  { from: a, to: b, half }: Piece,
  { from, away }: Way,
): [Millimetres, Millimetres] | undefined {
  let [enter, leave] = [-Infinity, Infinity]
  for (const [x, y] of [
    [1, 0],
    [0, 1],
    [a[1] - b[1], b[0] - a[0]],
  ] as const) {
    if (x === 0 && y === 0) continue
    const reach = Math.abs(x) * half[0] + Math.abs(y) * half[1]
    const [first, second] = [x * a[0] + y * a[1], x * b[0] + y * b[1]]
    const [low, high] = [Math.min(first, second) - reach, Math.max(first, second) + reach]
    const [start, run] = [x * from[0] + y * from[1], x * away[0] + y * away[1]]
    if (run === 0) {
      if (start <= low || start >= high) return undefined
      continue
    }
    const [one, other] = [(low - start) / run, (high - start) / run]
    enter = Math.max(enter, Math.min(one, other))
    leave = Math.min(leave, Math.max(one, other))
  }
  return enter < leave ? [enter, leave] : undefined
}
