import type { AttitudeConvention } from '../items/points'
import { normalizeAzimuth, type Azimuth } from '../units'
import { compassAzimuth } from './compass'
import { normalizeAttitudeText } from './attitude-spelling'
import {
  checkedPlane,
  dipSides,
  letterProblem,
  planeFromFields,
  refused,
  strikeByLetter,
  type AttitudeReading,
} from './plane-check'

export { planeFromFields, type AttitudeReading, type PlaneFields } from './plane-check'

const NUMBER = '(-?\\d+(?:\\.\\d+)?)'
/** A hyphen with a blank before it only is a minus, which the checks refuse. */
const SEPARATOR = '(?:\\s*[/\\\\,;:|]\\s*|\\s+-\\s+|-|\\s+)'
const DIP = `\\s*[/\\\\,;:|-]?\\s*${NUMBER}?\\s*([A-Z]+)?`

const azimuthForm = new RegExp(`^${NUMBER}${SEPARATOR}${NUMBER}\\s*([A-Z]+)?$`)
const quadrantForm = new RegExp(`^([NS])\\s*${NUMBER}\\s*([EW])${DIP}$`)
/** Both ends of a strike: `E-W`, `NS`, `NE-SW`. Letters after it belong to a dip: “see sketch” is not a strike. */
const twoEndedForm = new RegExp(
  `^([NESW]{1,3})\\s*-?\\s*([NESW]{1,3})(?![A-Z])(?:\\s*[/\\\\,;:|-]?\\s*${NUMBER}\\s*([A-Z]+)?)?$`,
)
const oneNumber = new RegExp(`^${NUMBER}$`)

/** Reads an attitude as it stands in a notebook: `045/40` in the sheet's convention, `N45E 40SE`, `E-W 20N`, with a dip
 *  letter as a check (`045/40 SE`), `0` or `horizontal`, `045 vertical`, and ` overturned` or ` ot` at the end.
 *  Azimuths come back against the north they were read against.
 *  Refused, with the reason as a sentence: what does not read, dips outside 0–90, azimuths outside 0–360, a dip letter along
 *  the strike or on the other side, an overturned horizontal bed. Source: orientation.md section 1.
 *  @param convention what `045/40` means on this sheet; quadrant notation says it by itself */
export function parseAttitude(text: string, convention: AttitudeConvention): AttitudeReading {
  const { body, overturned } = normalizeAttitudeText(text)
  if (body === '') return refused(`Write an attitude, for example ${examples[convention]}.`)
  const single = oneNumber.exec(body)
  if (single) return readSingle(Number(single[1]), overturned, convention)
  const azimuth = azimuthForm.exec(body)
  if (azimuth) return readAzimuthForm(azimuth, overturned, convention)
  const quadrant = quadrantForm.exec(body)
  if (quadrant) return readQuadrant(quadrant, overturned)
  const ends = twoEndedForm.exec(body)
  if (ends) return readTwoEnded(ends, overturned, text)
  return unreadable(text, convention)
}

const examples: Record<AttitudeConvention, string> = {
  'strike-dip': '045/40 (strike and dip by the right-hand rule) or N45E 40SE',
  'dip-direction-dip': '135/40 (dip direction and dip) or N45E 40SE',
}

function unreadable(text: string, convention: AttitudeConvention): AttitudeReading {
  const shown = text.trim().length > 40 ? `${text.trim().slice(0, 40)}…` : text.trim()
  return refused(`“${shown}” does not read as an attitude. Write it like ${examples[convention]}.`)
}

function readSingle(value: number, overturned: boolean, convention: AttitudeConvention): AttitudeReading {
  if (value === 0) return checkedPlane({ strike: null, dip: 0, overturned }, convention)
  if (value === 90) return refused(`A vertical plane needs an azimuth too, for example 045/90.`)
  return refused(`${value} alone is not an attitude. Write it like ${examples[convention]}.`)
}

function readAzimuthForm(
  [, azimuth, dip, letters]: RegExpExecArray,
  overturned: boolean,
  convention: AttitudeConvention,
): AttitudeReading {
  const reading = planeFromFields({ azimuth: Number(azimuth), dip: Number(dip), overturned }, convention)
  if (reading.outcome === 'refused' || letters === undefined) return reading
  const problem = letterProblem(letters, reading, convention)
  return problem === undefined ? reading : refused(problem)
}

function readQuadrant(match: RegExpExecArray, overturned: boolean): AttitudeReading {
  const [, from = '', angle = '', toward = '', dip, letters] = match
  const written = `${from}${angle}${toward}`
  const turn = Number(angle)
  if (turn < 0 || turn > 90) {
    return refused(`The strike ${written} does not read: in quadrants the angle runs from 0 to 90.`)
  }
  const fromNorth = (from === 'N') === (toward === 'E') ? turn : -turn
  return readDip({ line: from === 'N' ? fromNorth : fromNorth + 180, written }, dip, letters, overturned)
}

function readTwoEnded(match: RegExpExecArray, overturned: boolean, text: string): AttitudeReading {
  const [, first = '', second = '', dip, letters] = match
  const [from, to] = [compassAzimuth(first), compassAzimuth(second)]
  if (from === undefined || to === undefined || Math.abs(from - to) !== 180) {
    return refused(
      `“${text.trim()}” does not read: ${first} and ${second} are not opposite ends of a strike.`,
    )
  }
  return readDip({ line: from, written: `${first}-${second}` }, dip, letters, overturned)
}

/** The dip and its letter, after a strike whose dip side is still open. */
function readDip(
  { line, written }: { line: Azimuth; written: string },
  dipText: string | undefined,
  letters: string | undefined,
  overturned: boolean,
): AttitudeReading {
  if (dipText === undefined)
    return refused(`The dip is missing: add it after ${written}, like ${written} 40.`)
  const dip = Number(dipText)
  if (letters === undefined) {
    const isSideless = dip === 0 || dip === 90
    if (isSideless) return checkedPlane({ strike: normalizeAzimuth(line), dip, overturned }, 'quadrant')
    return refused(`${written} may dip toward ${dipSides(line)}: add the letter after the dip.`)
  }
  const strike = strikeByLetter(letters, line, written)
  if (typeof strike === 'string') return refused(strike)
  return checkedPlane({ strike, dip, overturned }, 'quadrant')
}
