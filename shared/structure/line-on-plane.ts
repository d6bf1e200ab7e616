import { normalizeAzimuth, toDegrees, toRadians, type Azimuth, type Degrees } from '../units'
import { dipFigure, formatAttitude } from './attitude-words'
import { azimuthFigure } from './compass'
import { dipDirection, dot, lineDirection, poleDirection, strikeDirection } from './directions'
import type { Plane } from './plane'

/** The attitude of a line: azimuth of its down-going end from true north, null for a vertical line; plunge 0–90. */
export interface Line {
  trend: Azimuth | null
  plunge: Degrees
}

/** Furthest that a line may lie off the plane it is stated to lie on before the two contradict. A hand-held compass reads
 *  a line and a plane to a few degrees each. Source: common practice; the limit is ours. */
export const FURTHEST_OFF_PLANE: Degrees = 5

/** A line whose horizontal part is shorter than this share of it has no trend that anybody could measure. */
const NO_TREND = 1e-9

/** The line at a rake on a plane: v = cos r · strike line + sin r · dip line. Source: orientation.md section 6.
 *  @param rake degrees from the strike by the right-hand rule toward down dip, 0–180 */
export function lineAtRake(plane: Plane, rake: Degrees): Line {
  const [along, down] = [strikeDirection(plane), dipDirection(plane)]
  const [cos, sin] = [Math.cos(toRadians(rake)), Math.sin(toRadians(rake))]
  const part = (axis: 0 | 1 | 2): number => cos * along[axis] + sin * down[axis]
  const [east, north, up] = [part(0), part(1), part(2)]
  const plunge = toDegrees(Math.asin(Math.min(1, Math.max(0, -up))))
  const isVertical = Math.hypot(east, north) < NO_TREND
  return { trend: isVertical ? null : normalizeAzimuth(toDegrees(Math.atan2(east, north))), plunge }
}

/** Rake of a line on a plane, or of its projection onto it: degrees from the strike by the right-hand rule toward down dip,
 *  0–180. Source: orientation.md section 6. */
export function rakeOf(plane: Plane, line: Line): Degrees {
  const direction = lineDirection(line)
  const [along, down] = [dot(direction, strikeDirection(plane)), dot(direction, dipDirection(plane))]
  const rake = toDegrees(Math.atan2(down, along))
  // A line that leaves the plane upward by a rounding error is at one of the strike's ends, not beyond it.
  return rake < 0 ? (rake > -90 ? 0 : 180) : rake
}

/** Angle between a line and a plane, degrees 0–90; 0 where it lies on it. Source: orientation.md section 8, 90 − angle to
 *  the pole. */
export const angleToPlane = (line: Line, plane: Plane): Degrees =>
  toDegrees(Math.asin(Math.min(1, Math.abs(dot(lineDirection(line), poleDirection(plane))))))

/** Why a line and the plane it is stated to lie on contradict each other, as a sentence with the figures of both; undefined
 *  within {@link FURTHEST_OFF_PLANE}. */
export function offPlaneWarning(line: Line, plane: Plane): string | undefined {
  const off = angleToPlane(line, plane)
  if (off <= FURTHEST_OFF_PLANE) return undefined
  const rake = rakeOf(plane, line)
  const near = lineAtRake(plane, rake)
  return (
    `The line ${formatLine(line)} lies ${Math.round(off)}° off the plane ${formatAttitude(plane, 'strike-dip')}; ` +
    `nearest on that plane is ${formatLine(near)}, at a rake of ${Math.round(rake)}°. Check both readings.`
  )
}

/** A line as notebooks write it, `120/35`: trend and plunge; `vertical` without a trend. `parseLineation` reads it back. */
export const formatLine = ({ trend, plunge }: Line): string =>
  trend === null || plunge === 90 ? 'vertical' : `${azimuthFigure(trend)}/${dipFigure(plunge)}`
