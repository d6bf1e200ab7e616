import type { AttitudeConvention, Reading } from '../items/points'
import type { Azimuth, Degrees } from '../units'
import { angleBetween, normalizeAzimuth } from '../units'
import { dipFigure, formatAttitude } from './attitude-words'
import {
  angleToLine,
  azimuthFigure,
  compassAzimuth,
  compassLetters,
  compassWords,
  quadrantFigure,
} from './compass'
import { dipDirectionOf, strikeFrom, type Plane } from './plane'
import { upperFirst } from '../words'

/** How a reading was written: one of the two sheet conventions, or in quadrants. */
export type Notation = Reading['convention']

/** What became of a reading: a plane, or the reason why it is none, as a sentence for whoever wrote it. */
export type AttitudeReading =
  ({ outcome: 'plane'; convention: Notation } & Plane) | { outcome: 'refused'; reason: string }

export const refused = (reason: string): AttitudeReading => ({ outcome: 'refused', reason })

/** Nearest to the strike that a dip letter may lie and still say which side is meant. `N30E 40NE` is 15° away and says
 *  nothing; `N30W 60N`, 30° away, is written in the field. Source: orientation.md section 1, needs.md A.2; the limit is ours. */
const LETTER_OFF_STRIKE: Degrees = 30

/** Values as read, before any check. */
export interface PlaneFields {
  /** The azimuth that the convention writes first, degrees; null where none is given. */
  azimuth: Degrees | null
  /** Degrees below horizontal; null where none is given. */
  dip: Degrees | null
  overturned: boolean
}

/** A plane from separate fields, checked exactly as text is.
 *  @param convention what the azimuth is: the strike by the right-hand rule, or the dip direction */
export function planeFromFields(fields: PlaneFields, convention: AttitudeConvention): AttitudeReading {
  const { azimuth, dip } = fields
  const name = convention === 'strike-dip' ? 'strike' : 'dip direction'
  if (dip === null) return refused(`The dip is missing: add it after the ${name}.`)
  const wrongAzimuth = azimuth === null ? undefined : azimuthProblem(azimuth, name)
  if (wrongAzimuth !== undefined) return refused(wrongAzimuth)
  const strike = azimuth === null ? null : strikeFrom(azimuth, convention)
  return checkedPlane({ strike, dip, overturned: fields.overturned }, convention)
}

function azimuthProblem(azimuth: Degrees, name: string): string | undefined {
  const title = upperFirst(name)
  if (!Number.isFinite(azimuth)) return `The ${name} is not a number.`
  if (azimuth < 0) return `${title} ${azimuth} is less than 0: azimuths run from 0 to 360.`
  if (azimuth > 360) return `${title} ${azimuth} is more than 360: azimuths run from 0 to 360.`
  return undefined
}

/** A plane whose strike is known, with its dip and facing checked. */
export function checkedPlane(plane: Plane, notation: Notation): AttitudeReading {
  const problem = dipProblem(plane, notation)
  if (problem !== undefined) return refused(problem)
  if (plane.dip === 0)
    return { outcome: 'plane', strike: null, dip: 0, overturned: false, convention: notation }
  return { outcome: 'plane', ...plane, convention: notation }
}

function dipProblem({ strike, dip, overturned }: Plane, notation: Notation): string | undefined {
  if (!Number.isFinite(dip)) return 'The dip is not a number.'
  if (dip < 0) return `Dip ${dip} is less than 0: a dip is measured down from the horizontal, 0 to 90.`
  if (dip > 90) return `Dip ${dip} is more than 90: ${steepHint({ strike, dip, overturned }, notation)}`
  if (dip === 0 && overturned) {
    return 'A horizontal bed cannot be written as overturned: leave that out, or give the dip it has.'
  }
  if (dip > 0 && strike === null) {
    const name = notation === 'dip-direction-dip' ? 'dip direction' : 'strike'
    return `A plane that dips ${dip} needs a ${name} as well.`
  }
  return undefined
}

/** What to write instead of a dip above 90. Dips of 90 to 180 are used for overturned beds by the right-hand rule of the
 *  upright side: strike turns by 180 and the dip becomes 180 minus it. Source: orientation.md section 1. */
function steepHint({ strike, dip, overturned }: Plane, notation: Notation): string {
  if (dip >= 180)
    return 'dips run from 0 to 90. Perhaps the two numbers are swapped: the azimuth comes first.'
  if (strike === null || overturned) return 'give the dip of an overturned bed as it is measured, 0 to 90.'
  const same: Plane = { strike: normalizeAzimuth(strike + 180), dip: 180 - dip, overturned: true }
  return `dips run from 0 to 90. If the bed is overturned, write ${formatPlane(same, notation)}.`
}

/** A plane in the notation that its writer used. */
function formatPlane(plane: Plane, notation: Notation): string {
  if (notation !== 'quadrant' || plane.strike === null) {
    return formatAttitude(plane, notation === 'quadrant' ? 'strike-dip' : notation)
  }
  const letters = compassLetters(dipDirectionOf(plane.strike))
  const figures = `${quadrantFigure(plane.strike)} ${dipFigure(plane.dip)}${letters}`
  return plane.overturned ? `${figures} overturned` : figures
}

/** Whether a dip letter agrees with a plane that is already known; undefined if it does, else why not. */
export function letterProblem(
  letters: string,
  plane: Plane,
  notation: AttitudeConvention,
): string | undefined {
  const toward = compassAzimuth(letters)
  if (toward === undefined) return `“${letters}” is not a compass direction.`
  if (plane.strike === null) return undefined
  if (angleToLine(toward, plane.strike) < LETTER_OFF_STRIKE) return alongStrike(letters, plane.strike)
  const dipDirection = dipDirectionOf(plane.strike)
  if (angleBetween(toward, dipDirection) <= 90 - LETTER_OFF_STRIKE) return undefined
  const other = { ...plane, strike: normalizeAzimuth(plane.strike + 180) }
  return (
    `${formatAttitude(plane, notation)} dips toward ${azimuthFigure(dipDirection)}° (${compassWords(dipDirection)}), ` +
    `not ${letters}. For a dip toward ${letters} write ${formatAttitude(other, notation)}.`
  )
}

/** The strike by the right-hand rule of a line of strike whose dip side a letter picks; a sentence if it picks none. */
export function strikeByLetter(letters: string, line: Azimuth, written: string): Azimuth | string {
  const toward = compassAzimuth(letters)
  if (toward === undefined) return `“${letters}” is not a compass direction.`
  if (angleToLine(toward, line) < LETTER_OFF_STRIKE) return alongStrike(letters, line, written)
  const strike = normalizeAzimuth(line)
  return angleBetween(toward, dipDirectionOf(strike)) < 90 ? strike : normalizeAzimuth(strike + 180)
}

/** The two compass points that a plane of this strike may dip toward. */
export function dipSides(line: Azimuth): string {
  const side = dipDirectionOf(line)
  return `${compassLetters(side)} or ${compassLetters(side + 180)}`
}

const alongStrike = (letters: string, line: Azimuth, written = `${azimuthFigure(line)}°`): string =>
  `The dip letter ${letters} lies along the strike ${written}; a dip toward ${dipSides(line)} would fit.`
