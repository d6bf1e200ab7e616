import { toRadians, type Azimuth, type Degrees } from '@shared/units'

/** A plane as a compass with four quadrants gives it: N45E 40SE. */
export function inQuadrants(strike: Azimuth, dip: Degrees): string {
  const along = strike % 180
  const bearing = along <= 90 ? `N${along}E` : `N${180 - along}W`
  const toward = toRadians(strike + 90)
  const northSouth = Math.cos(toward) >= 0 ? 'N' : 'S'
  const eastWest = Math.sin(toward) >= 0 ? 'E' : 'W'
  // Along the meridian or the parallel only one letter tells the two sides apart.
  if (along === 0) return `${bearing} ${dip}${eastWest}`
  if (along === 90) return `${bearing} ${dip}${northSouth}`
  return `${bearing} ${dip}${northSouth}${eastWest}`
}
