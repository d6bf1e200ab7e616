import { gridAzimuth, gridLength } from '@shared/geometry/bearings'
import { normalizeAzimuth, type Degrees, type XY } from '@shared/units'

/** A length on the ground: 840 m, 4.2 km. */
export function lengthWords(line: readonly XY[]): string {
  const metres = gridLength(line)
  if (metres < 1000) return `${metres < 10 ? metres.toFixed(1) : Math.round(metres)} m`
  return `${(metres / 1000).toFixed(metres < 10_000 ? 2 : 1)} km`
}

/** Direction from one place to another as three figures, from true north: 028°.
 *  @param convergence grid convergence at `from`, degrees */
export function bearingWords(from: XY, to: XY, convergence: Degrees): string {
  const azimuth = Math.round(normalizeAzimuth(gridAzimuth(from, to) + convergence)) % 360
  return `${azimuth.toString().padStart(3, '0')}°`
}
