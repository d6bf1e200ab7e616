import { gridAzimuth, gridDistance, gridLength } from '../geometry/bearings'
import type { Side } from '../items/lines'
import { normalizeAzimuth, type Azimuth, type Degrees, type XY } from '../units'
import { azimuthFigure, compassWords } from './compass'

/** Grid convergence at a place, degrees, clockwise positive. */
export type ConvergenceAt = (xy: XY) => Degrees

/** A line whose ends are nearer than this share of its length has no sides that a compass could name. */
const ALMOST_CLOSED = 0.1

/** Azimuth from true north square to a line from its one end to the other, toward one of its sides; undefined for a ring.
 *  @param line sheet metres, at least two vertices */
export function sideAzimuth(
  line: readonly XY[],
  side: Side,
  convergenceAt: ConvergenceAt,
): Azimuth | undefined {
  const [first, last] = [line[0], line.at(-1)]
  if (!first || !last || gridDistance(first, last) <= ALMOST_CLOSED * gridLength(line)) return undefined
  const along = gridAzimuth(first, last) + convergenceAt(first)
  return normalizeAzimuth(along + (side === 'right' ? 90 : -90))
}

/** A side of a line by the ground, to follow a "to the" or "toward the": `east`, or of a ring `inside` or `outside`. */
export function sideWords(line: readonly XY[], side: Side, convergenceAt: ConvergenceAt): string {
  const azimuth = sideAzimuth(line, side, convergenceAt)
  if (azimuth !== undefined) return compassWords(azimuth)
  // The area of a ring is counted positive where it runs counterclockwise: its inside then lies to the left.
  return isCounterclockwise(line) === (side === 'left') ? 'inside' : 'outside'
}

/** The same with its azimuth, as a form says it: `east (093°)`. */
export function sideFigureWords(line: readonly XY[], side: Side, convergenceAt: ConvergenceAt): string {
  const azimuth = sideAzimuth(line, side, convergenceAt)
  const words = sideWords(line, side, convergenceAt)
  return azimuth === undefined ? words : `${words} (${azimuthFigure(Math.round(azimuth))}°)`
}

/** By the signed area between the line and the chord that closes it, counted from its first vertex, as coordinates are large. */
function isCounterclockwise(line: readonly XY[]): boolean {
  const [ox, oy] = line[0] ?? [0, 0]
  const twice = line.reduce((sum, [x, y], index) => {
    const [nextX, nextY] = line[(index + 1) % line.length] ?? [x, y]
    return sum + (x - ox) * (nextY - oy) - (nextX - ox) * (y - oy)
  }, 0)
  return twice > 0
}
