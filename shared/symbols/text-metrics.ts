import type { Millimetres } from '../units'
import type { TextMark } from './display-list'
import { LATO_UNITS_PER_EM, latoCodePoints, latoWeights } from './lato-widths'

type Weight = TextMark['weight']

const tableOf = (weight: Weight): ReadonlyMap<number, number> =>
  new Map(latoCodePoints.map((code, index) => [code, latoWeights[weight].widths[index] ?? 0]))

const tables: Record<Weight, ReadonlyMap<number, number>> = {
  400: tableOf(400),
  700: tableOf(700),
  900: tableOf(900),
}

/** Width taken for a character that Lato does not have: that of a figure. Another font will draw it. */
const UNKNOWN_WIDTH = 1160

/** Width of a text set in Lato without kerning, in the unit of `size`. Kerning, which renderers may apply, changes a word
 *  by a few hundredths of an em. Tracking is not included.
 *  @param size em size */
export function measureText(text: string, size: Millimetres, weight: Weight): Millimetres {
  let units = 0
  for (const character of text) {
    units += tables[weight].get(character.codePointAt(0) ?? 0) ?? UNKNOWN_WIDTH
  }
  return (units * size) / LATO_UNITS_PER_EM
}

/** Height of capitals and figures above the base line, in the unit of `size`. */
export const capHeight = (size: Millimetres, weight: Weight): Millimetres =>
  (latoWeights[weight].capHeight * size) / LATO_UNITS_PER_EM
