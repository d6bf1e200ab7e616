import type { NorthReference } from '../items/points'
import { normalizeAzimuth, type Azimuth, type Degrees } from '../units'

/** What lies between a reading's north and true north. */
export interface NorthCorrection {
  /** Magnetic declination at the place and date of the reading, degrees, east positive. */
  declination: Degrees
  /** Grid convergence at the place: azimuth of grid north from true north, degrees, clockwise positive. */
  convergence: Degrees
}

/** The azimuth from true north of a direction read against another north: true = magnetic + declination,
 *  true = grid + convergence. Source: geodesy.md section 1. */
export function toTrueAzimuth(azimuth: Degrees, from: NorthReference, correction: NorthCorrection): Azimuth {
  const turn = { true: 0, grid: correction.convergence, magnetic: correction.declination }
  return normalizeAzimuth(azimuth + turn[from])
}

/** The azimuth from grid north of a direction known from true north: grid = true − convergence. */
export const toGridAzimuth = (azimuth: Azimuth, convergence: Degrees): Azimuth =>
  normalizeAzimuth(azimuth - convergence)
