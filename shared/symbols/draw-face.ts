import type { UnitProperties } from '../items/legend'
import type { DisplayList, Ink, Path } from './display-list'

/** A colour of the legend as an ink. */
export const unitInk = (unit: Pick<UnitProperties, 'colour'>): Ink => `#${unit.colour.slice(1)}`

/** The area of a unit, filled.
 *  @param rings outer ring and holes in one path, millimetres, each closed */
export const drawFace = (rings: Path, unit: Pick<UnitProperties, 'colour'>): DisplayList => [
  { mark: 'fill', path: rings, ink: unitInk(unit) },
]
