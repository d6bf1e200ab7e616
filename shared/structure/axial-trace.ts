import { gridAzimuth } from '../geometry/bearings'
import { measureLine } from '../geometry/measured-line'
import { angleBetween, normalizeAzimuth, type Azimuth, type Degrees, type XY } from '../units'
import { azimuthFigure } from './compass'

/** Grid convergence at a place, degrees, clockwise positive. */
type ConvergenceAt = (xy: XY) => Degrees

/** Furthest that a stated trend may lie from the trace's own direction at its end before the two contradict. An axis runs
 *  along its trace where the axial plane is steep; this leaves room for a bent trace and an inclined plane. Source: common practice. */
export const FURTHEST_OFF_TRACE: Degrees = 30

/** Share of the trace's length over which its direction at an end is taken, so that a last small wiggle does not decide. */
const END_SHARE = 0.2

/** How a plunge stands to the trace it is drawn on. */
export type PlungeOnTrace =
  | { outcome: 'ok'; end: 'start' | 'end'; offTrace: Degrees }
  | { outcome: 'across'; end: 'start' | 'end'; offTrace: Degrees; reason: string }

/** Azimuths from true north in which a trace leaves at its two ends: the trends that its axis may have.
 *  @param line sheet metres, at least two vertices */
export function traceTrends(
  line: readonly XY[],
  convergenceAt: ConvergenceAt,
): { atEnd: Azimuth; atStart: Azimuth } {
  const measured = measureLine(line)
  const stretch = measured.length * END_SHARE
  const outward = (from: number, to: number): Azimuth => {
    const tip = measured.pointAt(to)
    return normalizeAzimuth(gridAzimuth(measured.pointAt(from), tip) + convergenceAt(tip))
  }
  return {
    atEnd: outward(measured.length - stretch, measured.length),
    atStart: outward(stretch, 0),
  }
}

/** Which end of a trace is its down-plunge end, and whether the stated trend runs along the trace there, within
 *  {@link FURTHEST_OFF_TRACE}. Depends on the ground alone: a reversed line names the other end, which is the same place.
 *  @param line sheet metres   @param trend azimuth of the axis' down-going end, from true north */
export function plungeAgainstTrace(
  line: readonly XY[],
  trend: Azimuth,
  convergenceAt: ConvergenceAt,
): PlungeOnTrace {
  const { atEnd, atStart } = traceTrends(line, convergenceAt)
  const [offEnd, offStart] = [angleBetween(trend, atEnd), angleBetween(trend, atStart)]
  const end = offEnd <= offStart ? 'end' : 'start'
  const offTrace = Math.min(offEnd, offStart)
  if (offTrace <= FURTHEST_OFF_TRACE) return { outcome: 'ok', end, offTrace }
  return { outcome: 'across', end, offTrace, reason: acrossReason(trend, [atEnd, atStart], offTrace) }
}

function acrossReason(trend: Azimuth, ends: [Azimuth, Azimuth], offTrace: Degrees): string {
  const whole = (azimuth: Azimuth) => `${azimuthFigure(Math.round(azimuth))}°`
  return (
    `A plunge toward ${whole(trend)} does not run along this trace: its ends lead toward ${whole(ends[0])} and ` +
    `${whole(ends[1])}, ${Math.round(offTrace)}° away at the nearest. Give a trend within ${FURTHEST_OFF_TRACE}° of one of them.`
  )
}
