import type { MeasuredLine } from '../geometry/measured-line'
import type { Degrees, Millimetres } from '../units'

/** A stretch of a line, by distances from its start. */
export type Stretch = readonly [from: Millimetres, to: Millimetres]

/** Most that a line may turn beneath a decoration: a sharper bend would tear it off the line. */
const SHARPEST_BEND: Degrees = 30

/** How decorations share out a line. */
export interface Sharing {
  /** Room one takes along the line. */
  size: Millimetres
  /** From one to the next, about. */
  interval: Millimetres
  /** The part of the line that is to be decorated. */
  within: Stretch
  /** Parts that are taken already. */
  taken?: readonly Stretch[]
}

/** Where decorations stand, distances from the line's start. They are equally spaced and symmetric in the part given to
 *  them, so that a reversed line carries the same ones; each moves, as little as it must, off sharp bends and off what is
 *  taken, and stands on the least sharp bend where there is no straight place near. One where only one fits, none where
 *  none fits, or where all its room is taken. */
export function placeAlong(line: MeasuredLine, sharing: Sharing): Millimetres[] {
  const { size, interval } = sharing
  const [from, to] = sharing.within
  const room = to - from
  if (room < size || size <= 0) return []
  const count = Math.max(1, Math.min(Math.round(room / interval), Math.floor(room / size)))
  const spacing = room / count
  const slack = (spacing - size) / 2
  return Array.from({ length: count }, (_, index) => from + spacing * (index + 0.5)).flatMap((middle) => {
    const place = nearestGoodPlace(line, middle, slack, sharing)
    return place === undefined ? [] : [place]
  })
}

/** The nearest place on either side of `middle` that is free and straight; else the straightest free one. */
function nearestGoodPlace(
  line: MeasuredLine,
  middle: Millimetres,
  slack: Millimetres,
  { size, taken = [] }: Sharing,
): Millimetres | undefined {
  const step = size / 4
  let best: { place: Millimetres; turn: Degrees } | undefined
  for (let away = 0; away <= slack; away += step) {
    for (const place of away === 0 ? [middle] : [middle + away, middle - away]) {
      const isTaken = taken.some(([from, to]) => place + size / 2 > from && place - size / 2 < to)
      if (isTaken) continue
      const turn = sharpestTurn(line, place, size)
      if (turn <= SHARPEST_BEND) return place
      if (!best || turn < best.turn) best = { place, turn }
    }
  }
  return best?.place
}

/** The sharpest turn under a decoration, looked for at a few places across its size. */
const sharpestTurn = (line: MeasuredLine, place: Millimetres, size: Millimetres): Degrees =>
  Math.max(...[-0.4, -0.2, 0, 0.2, 0.4].map((share) => line.turnAt(place + share * size, size / 2)))
