import type { AttitudeConvention } from '../items/points'
import { normalizeAzimuth, type Azimuth, type Degrees } from '../units'

/** The attitude of a plane: strike by the right-hand rule, azimuth from true north, null for a horizontal plane;
 *  dip 0–90 as measured, also on an overturned bed. */
export interface Plane {
  strike: Azimuth | null
  dip: Degrees
  overturned: boolean
}

/** Dip direction of a plane of this strike. Source: right-hand rule, orientation.md section 1. */
export const dipDirectionOf = (strike: Azimuth): Azimuth => normalizeAzimuth(strike + 90)

/** Strike by the right-hand rule of a plane dipping this way. Source: orientation.md section 1. */
export const strikeOf = (dipDirection: Azimuth): Azimuth => normalizeAzimuth(dipDirection - 90)

/** Strike of a plane from the azimuth that a convention writes first. */
export const strikeFrom = (azimuth: Azimuth, convention: AttitudeConvention): Azimuth =>
  convention === 'strike-dip' ? normalizeAzimuth(azimuth) : strikeOf(azimuth)

/** The azimuth that a convention writes first, of a plane of this strike. */
export const azimuthFor = (strike: Azimuth, convention: AttitudeConvention): Azimuth =>
  convention === 'strike-dip' ? normalizeAzimuth(strike) : dipDirectionOf(strike)
