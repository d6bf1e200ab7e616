import type { AttitudeProperties } from '../items/points'
import { toRadians, type Degrees, type MM } from '../units'
import type { AttitudeCase, AttitudeSymbol } from './definition'
import { attitudes, dipNumeral } from './definitions/attitudes'
import type { DisplayList } from './display-list'
import { numeralBeside } from './numeral'
import { turnTo } from './paths'
import { placeMarks } from './place-marks'

/** What a plane's drawing depends on. */
export type DrawnPlane = Pick<AttitudeProperties, 'type' | 'strike' | 'dip' | 'overturned'>

const FURTHEST_FIGURE = 8

/** The symbol of a kind of plane. */
export function attitudeSymbolOf(type: AttitudeProperties['type']): AttitudeSymbol {
  const symbol = attitudes.find((candidate) => candidate.type === type)
  if (!symbol) throw new RangeError(`There is no symbol for ${type}.`)
  return symbol
}

/** Which of its drawings a plane gets. Dips are shown in whole degrees, so they are judged in whole degrees: 89.6 is
 *  drawn vertical rather than as an inclined plane with the figure 90. */
export function attitudeCaseOf(plane: DrawnPlane): AttitudeCase {
  const dip = Math.round(plane.dip)
  if (plane.strike === null || dip === 0) return 'horizontal'
  if (dip === 90) return 'vertical'
  return plane.overturned && attitudeSymbolOf(plane.type).cases.overturned ? 'overturned' : 'inclined'
}

/** Draws a plane at its place. Drawn angle = strike − convergence, clockwise from the drawing's up.
 *  @param convergence of the grid at the place, degrees, clockwise positive */
export function drawAttitude(plane: DrawnPlane, at: MM, convergence: Degrees): DisplayList {
  const attitudeCase = attitudeCaseOf(plane)
  const gridStrike = attitudeCase === 'horizontal' ? 0 : (plane.strike ?? 0) - convergence
  const own = attitudeSymbolOf(plane.type).cases[attitudeCase] ?? []
  const marks = placeMarks(own, turnTo(gridStrike, at))
  if (attitudeCase === 'horizontal' || attitudeCase === 'vertical') return marks
  const downDip = toRadians(gridStrike + 90)
  const away: MM = [Math.sin(downDip), Math.cos(downDip)]
  const text = String(Math.round(plane.dip))
  const place = { from: at, away, ink: marks, furthest: FURTHEST_FIGURE }
  return [...marks, numeralBeside(text, place, { ...dipNumeral, ink: 'black' })]
}
