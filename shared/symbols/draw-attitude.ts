import type { AttitudeProperties } from '../items/points'
import { toRadians, type Degrees, type MM } from '../units'
import type { AttitudeCase, AttitudeSymbol } from './definition'
import { attitudes, dipNumeral } from './definitions/attitudes'
import type { DisplayList, Mark } from './display-list'
import { numeralBeside, type NumeralPlace } from './numeral'
import { turnTo } from './paths'
import { placeMarks } from './place-marks'

/** What a plane's drawing depends on. */
export type DrawnPlane = Pick<AttitudeProperties, 'type' | 'strike' | 'dip' | 'overturned'> &
  Partial<Pick<AttitudeProperties, 'undulating' | 'topsKnown'>>

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
  const marks = planeMarks(plane, at, convergence)
  return [...marks, ...dipFigure(plane, { at, convergence, ink: marks })]
}

/** A plane's symbol without its figure. */
export function planeMarks(plane: DrawnPlane, at: MM, convergence: Degrees): Mark[] {
  const attitudeCase = attitudeCaseOf(plane)
  const symbol = attitudeSymbolOf(plane.type)
  const cases = (plane.undulating && symbol.undulating) || symbol.cases
  const tops = (plane.topsKnown && symbol.topsKnown?.[attitudeCase]) || []
  return placeMarks([...(cases[attitudeCase] ?? []), ...tops], turnTo(drawnStrike(plane, convergence), at))
}

/** Azimuth on the drawing of the symbol's y. A vertical bed's top lies down dip, and up dip where it is overturned: it is
 *  the same plane as the upright one that strikes the other way. Source: facing vector, orientation.md section 1. */
function drawnStrike(plane: DrawnPlane, convergence: Degrees): Degrees {
  const attitudeCase = attitudeCaseOf(plane)
  if (attitudeCase === 'horizontal' || plane.strike === null) return 0
  const facesBack = attitudeCase === 'vertical' && plane.overturned && plane.topsKnown
  return plane.strike - convergence + (facesBack ? 180 : 0)
}

/** The dip's figure, on the down-dip side and clear of ink; none for horizontal and vertical planes, whose symbols say it.
 *  @param turns where the figure may stand instead of straight down dip, degrees from there */
export function dipFigure(
  plane: DrawnPlane,
  { at, convergence, ink, turns }: { at: MM; convergence: Degrees } & Pick<NumeralPlace, 'ink' | 'turns'>,
): Mark[] {
  const attitudeCase = attitudeCaseOf(plane)
  if (attitudeCase === 'horizontal' || attitudeCase === 'vertical') return []
  const downDip = toRadians(drawnStrike(plane, convergence) + 90)
  const away: MM = [Math.sin(downDip), Math.cos(downDip)]
  const place = { from: at, away, ink, furthest: FURTHEST_FIGURE, ...(turns ? { turns } : {}) }
  return [numeralBeside(String(Math.round(plane.dip)), place, { ...dipNumeral, ink: 'black' })]
}
