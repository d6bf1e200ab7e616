import type { MM } from '../units'
import type { DisplayList, Mark, Path } from './display-list'
import type { UnitFill } from './unit-fill'

/** The area of a unit, filled.
 *  @param path outer ring and holes in one path, millimetres, each closed
 *  @param anchor where the sheet's patterns hang, millimetres: the same for all its areas */
export function drawFace(path: Path, { ground, pattern }: UnitFill, anchor: MM): DisplayList {
  const marks: Mark[] = []
  if (ground) marks.push({ mark: 'fill', path, ink: ground })
  if (pattern) marks.push({ mark: 'pattern', path, ...pattern, anchor })
  return marks
}
