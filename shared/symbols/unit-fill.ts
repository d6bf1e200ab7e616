import { mixColours } from '../colour'
import type { SheetFaceProperties, UnitProperties } from '../items/legend'
import { findPattern } from './definitions/lithology'
import type { Ink, Tile } from './display-list'
import { inkColour } from './ink'

export type Printing = SheetFaceProperties['printing']

/** How a unit's areas are filled: a ground, and its pattern over it. Without a ground the paper shows. */
export interface UnitFill {
  ground?: Ink
  pattern?: { tile: Tile; ink: Ink }
}

/** Share of black in a pattern printed over its unit's colour: it reads as texture, linework and letters stand before it. */
const PATTERN_STRENGTH = 0.5

/** Grounds of units without a pattern where only one ink is printed: paper first, then greys so light that letters read on
 *  them. Neighbours in the legend are told apart; after the last they come again, and letters tell. */
const greys: readonly (Ink | undefined)[] = [undefined, '#d2d2d2', '#ededed', '#c4c4c4', '#e0e0e0']

/** A unit's fill in colour. */
export function colourFill({ colour, pattern }: Pick<UnitProperties, 'colour' | 'pattern'>): UnitFill {
  const ground: Ink = `#${colour.slice(1)}`
  const tile = findPattern(pattern)?.tile
  if (!tile) return { ground }
  return { ground, pattern: { tile, ink: mixColours(inkColour('black'), colour, PATTERN_STRENGTH) } }
}

/** Fills of all units of a legend, by their ids: in colour, or in one ink by pattern and grey alone. */
export function unitFills(
  units: readonly { id: string; properties: Pick<UnitProperties, 'colour' | 'pattern' | 'rank'> }[],
  printing: Printing,
): Map<string, UnitFill> {
  if (printing !== 'one-ink') return new Map(units.map(({ id, properties }) => [id, colourFill(properties)]))
  let plain = 0
  const inOrder = units.toSorted((a, b) => a.properties.rank - b.properties.rank)
  return new Map(
    inOrder.map(({ id, properties: { pattern } }): [string, UnitFill] => {
      const tile = findPattern(pattern)?.tile
      if (tile) return [id, { pattern: { tile, ink: 'black' } }]
      const ground = greys[plain++ % greys.length]
      return [id, ground === undefined ? {} : { ground }]
    }),
  )
}
