import { normalizeAzimuth, toDegrees, type Azimuth, type Metres, type XY } from '../units'

/** Grid azimuth from one point to another, degrees clockwise from grid north, 0–360. Two equal points give 0. */
export function gridAzimuth(from: XY, to: XY): Azimuth {
  return normalizeAzimuth(toDegrees(Math.atan2(to[0] - from[0], to[1] - from[1])))
}

/** Distance on the sheet's grid, metres. */
export const gridDistance = (a: XY, b: XY): Metres => Math.hypot(b[0] - a[0], b[1] - a[1])

/** Length of a line on the sheet's grid, metres. */
export function gridLength(line: readonly XY[]): Metres {
  return line.slice(1).reduce((sum, point, index) => sum + gridDistance(line[index] ?? point, point), 0)
}
