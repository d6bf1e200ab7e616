import type { NorthReference, Reading } from '@shared/items/points'
import { toTrueAzimuth } from '@shared/structure/north-reference'
import type { Azimuth, Degrees } from '@shared/units'

/** What a reading is counted from, as it is being written. */
export interface NorthDraft {
  northReference: NorthReference
  /** As typed, degrees, east positive, or with E or W. */
  declination: string
}

/** How azimuths of a draft come to true north, or why that is not known. */
export type NorthOutcome =
  | {
      outcome: 'north'
      toTrue: (azimuth: Degrees) => Azimuth
      /** Degrees added to come to true north. */
      turned: Degrees
      /** As it is kept with the reading. */
      stated: Pick<Reading, 'northReference' | 'declination'>
    }
  | { outcome: 'refused'; field: 'declination'; reason: string }

/** @param convergence grid convergence at the place, degrees */
export function readNorth({ northReference, declination }: NorthDraft, convergence: Degrees): NorthOutcome {
  const degrees = northReference === 'magnetic' ? parseDeclination(declination) : 0
  if (degrees === undefined) {
    const reason =
      'A magnetic reading needs the declination, degrees, east positive, for example −14.5 or 14.5 W.'
    return { outcome: 'refused', field: 'declination', reason }
  }
  return {
    outcome: 'north',
    toTrue: (azimuth) => toTrueAzimuth(azimuth, northReference, { declination: degrees, convergence }),
    turned: { true: 0, grid: convergence, magnetic: degrees }[northReference],
    stated: { northReference, declination: northReference === 'magnetic' ? degrees : null },
  }
}

/** A declination as typed: `-14.5`, `−14.5°`, `14.5 W`. Undefined for anything else and beyond 180. */
export function parseDeclination(text: string): Degrees | undefined {
  const match = /^([+\-−–])?\s*(\d{1,3}(?:[.,]\d+)?)\s*°?\s*([EW])?$/i.exec(text.trim())
  if (!match?.[2]) return undefined
  const size = Number(match[2].replace(',', '.'))
  if (size > 180) return undefined
  const west = match[3]?.toUpperCase() === 'W'
  const minus = match[1] !== undefined && match[1] !== '+'
  return west !== minus ? -size : size
}

/** The north of a kept reading, as a draft to go on with; true north where there is none. */
export const northOf = (reading: Pick<Reading, 'northReference' | 'declination'> | null): NorthDraft => ({
  northReference: reading?.northReference ?? 'true',
  declination: reading?.declination === null || reading === null ? '' : declinationWords(reading.declination),
})

/** A declination as people write it: `14.5 W`, `3 E`. */
const declinationWords = (degrees: Degrees): string =>
  degrees === 0 ? '0' : `${Math.abs(degrees)} ${degrees < 0 ? 'W' : 'E'}`

/** What was added to a reading to come to true north: `Magnetic to true north: −14.5°`; empty for a true one. */
export function turnWords(northReference: NorthReference, turned: Degrees): string {
  if (northReference === 'true') return ''
  const north = northReference === 'grid' ? 'Grid' : 'Magnetic'
  return `${north} to true north: ${turned < 0 ? '−' : '+'}${Math.abs(turned).toFixed(1)}°`
}
