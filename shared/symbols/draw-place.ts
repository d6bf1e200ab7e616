import type { StationProperties, StationType } from '../items/points'
import type { Degrees, MM } from '../units'
import type { PlaceSymbol } from './definition'
import { missingAzimuth, places } from './definitions/points'
import type { DisplayList } from './display-list'
import { numeralBeside } from './numeral'
import { turnTo } from './paths'
import { placeMarks } from './place-marks'

const FURTHEST_QUERY = 6

/** The symbol of a kind of place. */
export function placeSymbolOf(type: StationType): PlaceSymbol {
  const symbol = places.find((candidate) => candidate.type === type)
  if (!symbol) throw new RangeError(`There is no symbol for ${type}.`)
  return symbol
}

/** Draws a place: upright, or turned to its azimuth where the symbol shows one. Where that is not stated, the symbol stands
 *  upright with a query, so that it says nothing that nobody measured.
 *  @param convergence of the grid at the place, degrees, clockwise positive */
export function drawPlace(
  { type, azimuth }: Pick<StationProperties, 'type' | 'azimuth'>,
  at: MM,
  convergence: Degrees,
): DisplayList {
  const symbol = placeSymbolOf(type)
  const showsAzimuth = symbol.azimuth !== undefined
  const turn = showsAzimuth && azimuth !== null ? azimuth - convergence : 0
  const marks = placeMarks(symbol.marks, turnTo(turn, at))
  if (!showsAzimuth || azimuth !== null) return marks
  const place = { from: at, away: [1, 0] as MM, ink: marks, furthest: FURTHEST_QUERY }
  return [...marks, numeralBeside(missingAzimuth.text, place, { ...missingAzimuth, ink: 'black' })]
}
