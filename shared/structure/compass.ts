import { angleBetween, normalizeAzimuth, type Azimuth, type Degrees } from '../units'

const points = [
  ['N', 'north'],
  ['NNE', 'north-north-east'],
  ['NE', 'north-east'],
  ['ENE', 'east-north-east'],
  ['E', 'east'],
  ['ESE', 'east-south-east'],
  ['SE', 'south-east'],
  ['SSE', 'south-south-east'],
  ['S', 'south'],
  ['SSW', 'south-south-west'],
  ['SW', 'south-west'],
  ['WSW', 'west-south-west'],
  ['W', 'west'],
  ['WNW', 'west-north-west'],
  ['NW', 'north-west'],
  ['NNW', 'north-north-west'],
] as const

/** Azimuth of a compass point of the sixteen (`SE`, `NNE`), capitals; undefined for anything else. */
export function compassAzimuth(letters: string): Azimuth | undefined {
  const index = points.findIndex(([name]) => name === letters)
  return index < 0 ? undefined : index * 22.5
}

/** Nearest of the eight principal compass points. */
const octant = (azimuth: Degrees) => points[(Math.round(normalizeAzimuth(azimuth) / 45) % 8) * 2] ?? points[0]

/** Letters of the nearest of the eight principal compass points: `SE`. */
export const compassLetters = (azimuth: Degrees): string => octant(azimuth)[0]

/** Name of the nearest of the eight principal compass points: `south-east`. */
export const compassWords = (azimuth: Degrees): string => octant(azimuth)[1]

/** An azimuth as maps print it: three digits, `045°`; a tenth only where it has one. */
export function azimuthFigure(azimuth: Azimuth): string {
  const tenths = normalizeAzimuth(Math.round(azimuth * 10) / 10)
  return Number.isInteger(tenths) ? String(tenths).padStart(3, '0') : tenths.toFixed(1).padStart(5, '0')
}

/** A strike in quadrant notation: `N45E`, `N30W`; one of its two ends, the northern. */
export function quadrantFigure(strike: Azimuth): string {
  const figure = (value: number) => String(Math.round(value * 10) / 10)
  const half = normalizeAzimuth(strike) % 180
  if (half === 0) return 'N-S'
  if (half === 90) return 'E-W'
  return half < 90 ? `N${figure(half)}E` : `N${figure(180 - half)}W`
}

/** Angle between a direction and a line that runs both ways, degrees 0–90. */
export const angleToLine = (direction: Degrees, line: Degrees): Degrees => {
  const angle = angleBetween(direction, line)
  return Math.min(angle, 180 - angle)
}
