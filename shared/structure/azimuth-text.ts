import { normalizeAzimuth, type Azimuth } from '../units'
import { normalizeAttitudeText } from './attitude-spelling'
import { compassAzimuth } from './compass'

/** An azimuth as typed, or why it is none, as a sentence. */
export type AzimuthReading = { outcome: 'azimuth'; azimuth: Azimuth } | { outcome: 'refused'; reason: string }

const refused = (reason: string): AzimuthReading => ({ outcome: 'refused', reason })

/** Reads a direction: `045`, `45°`, `N45E`, `S20W`, `SE`, `north-east`. Refused: outside 0–360, quadrants beyond 90. */
export function parseAzimuth(text: string): AzimuthReading {
  const { body } = normalizeAttitudeText(text)
  if (/^-?\d+(\.\d+)?$/.test(body)) {
    const degrees = Number(body)
    if (degrees >= 0 && degrees <= 360) return { outcome: 'azimuth', azimuth: normalizeAzimuth(degrees) }
    const side = degrees < 0 ? 'less than 0' : 'more than 360'
    return refused(`Azimuth ${degrees} is ${side}: azimuths run from 0 to 360.`)
  }
  const quadrant = /^([NS])\s*(\d+(?:\.\d+)?)\s*([EW])$/.exec(body)
  if (quadrant) {
    const turn = Number(quadrant[2])
    if (turn > 90) return refused(`${body} does not read: in quadrants the angle runs from 0 to 90.`)
    const fromNorth = quadrant[3] === 'E' ? turn : -turn
    return {
      outcome: 'azimuth',
      azimuth: normalizeAzimuth(quadrant[1] === 'N' ? fromNorth : 180 - fromNorth),
    }
  }
  const point = compassAzimuth(body)
  if (point !== undefined) return { outcome: 'azimuth', azimuth: point }
  return refused(`“${text.trim()}” is not a direction. Write it like 045, N45E or NE.`)
}
