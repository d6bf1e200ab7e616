import type { MeasuredLine } from '../geometry/measured-line'
import type { Degrees, Millimetres } from '../units'

/** A stretch of a line, by distances from its start. */
export type Stretch = readonly [from: Millimetres, to: Millimetres]

/** Most that a line may turn beneath a decoration: a sharper bend would tear it off the line. */
export const SHARPEST_BEND: Degrees = 30

/** How much of the line is judged beneath a decoration, in its sizes: a little more than it covers, so that it does not
 *  crowd a corner. */
const JUDGED = 1.2
/** A smaller stretch is not judged: its turns are those of a hand, not of the ground. */
const LEAST_JUDGED: Millimetres = 1.8

/** How far a repeated decoration may move from its even place, as a share of the spacing: more would bring two together. */
const MOST_MOVED = 0.35

/** How decorations share out a line. */
export interface Sharing {
  /** Room one takes along the line. */
  size: Millimetres
  /** Stretch of line that had better be straight: as wide as the drawing reaches beside the line. `size` unless given. */
  bearingOver?: Millimetres
  /** From one to the next, about. */
  interval: Millimetres
  /** The part of the line that is to be decorated. */
  within: Stretch
  /** Parts that are taken already. */
  taken?: readonly Stretch[]
  /** Whether the middle of the line stays free: an even number of decorations leaves it so. */
  even?: boolean
}

/** Where decorations stand, distances from the line's start. They are equally spaced and symmetric in the part given to
 *  them, so that a reversed line carries the same ones on the same ground; each moves, as little as it must, off sharp
 *  bends and off what is taken, and is left out where there is no such place near. If that would leave the line bare, one
 *  stands where the line is straightest: without any it would say something else. */
export function placeAlong(line: MeasuredLine, sharing: Sharing): Millimetres[] {
  const { size, interval, even = false } = sharing
  const [from, to] = sharing.within
  const room = to - from
  if (room < size - ROUNDING || size <= 0) return []
  const count = evenedCount(room / interval, Math.floor(room / size), even)
  const spacing = room / count
  const slack = count === 1 ? (room - size) / 2 : Math.min((spacing - size) / 2, spacing * MOST_MOVED)
  const places = Array.from({ length: count }, (_, index) => from + spacing * (index + 0.5)).flatMap(
    (middle) => straightPlaceNear(line, middle, { ...sharing, slack }) ?? [],
  )
  return places.length > 0 ? places : [straightestPlace(line, sharing) ?? []].flat()
}

function evenedCount(wanted: number, most: number, even: boolean): number {
  if (!even || most < 2) return Math.max(1, Math.min(Math.round(wanted), most))
  return 2 * Math.max(1, Math.min(Math.round(wanted / 2), Math.floor(most / 2)))
}

/** The nearest place to `middle`, at most `slack` away, that is free and straight, if possible for as far as the drawing
 *  reaches beside the line; undefined where there is none. */
export function straightPlaceNear(
  line: MeasuredLine,
  middle: Millimetres,
  {
    size,
    bearingOver = size,
    ...near
  }: Pick<Sharing, 'size' | 'bearingOver' | 'taken'> & { slack: Millimetres },
): Millimetres | undefined {
  const best = nearestStraight(line, middle, { ...near, size, straightOver: Math.max(size, bearingOver) })
  return best ?? nearestStraight(line, middle, { ...near, size, straightOver: size })
}

function nearestStraight(
  line: MeasuredLine,
  middle: Millimetres,
  {
    size,
    straightOver,
    slack,
    taken = [],
  }: Pick<Sharing, 'size' | 'taken'> & { straightOver: Millimetres; slack: Millimetres },
): Millimetres | undefined {
  const step = stepFor(size)
  const first = favouredWay(line)
  for (let away = 0; away <= slack + ROUNDING; away += step) {
    for (const place of away === 0 ? [middle] : [middle + first * away, middle - first * away]) {
      if (!isTaken(place, size, taken) && sharpestTurn(line, place, straightOver) <= SHARPEST_BEND + ROUNDING)
        return place
    }
  }
  return undefined
}

/** The free place where the line turns least, nearest to the middle among equals; undefined where all is taken. */
export function straightestPlace(
  line: MeasuredLine,
  { size, within: [from, to], taken = [] }: Pick<Sharing, 'size' | 'within' | 'taken'>,
): Millimetres | undefined {
  const [middle, slack] = [(from + to) / 2, (to - from - size) / 2]
  const step = Math.max(stepFor(size), slack / MOST_TRIED)
  const first = favouredWay(line)
  let best: { place: Millimetres; turn: Degrees } | undefined
  for (let away = 0; away <= slack + ROUNDING; away += step) {
    for (const place of [middle + first * away, middle - first * away]) {
      if (isTaken(place, size, taken)) continue
      const turn = sharpestTurn(line, place, size)
      if (!best || turn < best.turn - LEAST_GAIN) best = { place, turn }
    }
  }
  return best?.place
}

/** Places tried on either side of the middle when looking for the straightest: enough for any line that could be read. */
const MOST_TRIED = 400
/** Turns nearer than this are equal: a place nearer to the middle is worth more. */
const LEAST_GAIN: Degrees = 3

const stepFor = (size: Millimetres): Millimetres => Math.max(0.1, Math.min(size / 4, 0.5))

/** Two that touch do not overlap, whatever the last digit of a sum. */
export const ROUNDING: Millimetres = 1e-6

const isTaken = (place: Millimetres, size: Millimetres, taken: readonly Stretch[]): boolean =>
  taken.some(([from, to]) => place + size / 2 > from + ROUNDING && place - size / 2 < to - ROUNDING)

/** Which way along the line wins where both would do: the eastern, else the northern one. Depends on the ground and not on
 *  the way the line was drawn. */
export function favouredWay(line: MeasuredLine): 1 | -1 {
  const isClosed = isClosedLine(line)
  const [ax, ay] = line.pointAt(isClosed ? line.length / 3 : 0)
  const [bx, by] = line.pointAt(isClosed ? (line.length * 2) / 3 : line.length)
  return bx > ax || (bx === ax && by > ay) ? 1 : -1
}

/** Whether a line ends where it begins. */
export function isClosedLine(line: MeasuredLine): boolean {
  const [ax, ay] = line.pointAt(0)
  const [bx, by] = line.pointAt(line.length)
  return line.length > 0 && ax === bx && ay === by
}

/** Spots across a decoration at which the line's turn is looked for, as shares of its size: close enough that no corner
 *  hides between two. */
const SPOTS = [-0.4, -0.3, -0.2, -0.1, 0, 0.1, 0.2, 0.3, 0.4]

function sharpestTurn(line: MeasuredLine, place: Millimetres, size: Millimetres): Degrees {
  const judged = Math.max(size * JUDGED, LEAST_JUDGED)
  const inside = (spot: Millimetres) => Math.max(judged / 8, Math.min(line.length - judged / 8, spot))
  return Math.max(...SPOTS.map((share) => line.turnAt(inside(place + share * judged), judged / 2)))
}
