import type { Lithology } from '../../../items/lithology'
import type { Millimetres } from '../../../units'
import type { Tile } from '../../display-list'
import { mapPath } from '../../paths'

/** The area pattern of a rock or deposit. */
export interface LithologyPattern {
  id: Lithology
  title: string
  /** Named after the pattern. */
  readonly tile: Tile
}

/** Patterns are drawn on a grid of twelve dots of a printer of 300 to the inch, about a millimetre. Cells and the distances
 *  of rows measure whole dots, so that at 300, 600 or 1200 dpi all rows come out alike, where they would else be thicker and
 *  thinner in turn. */
const GRID: Millimetres = (12 * 25.4) / 300

/** A pattern of our own drawing. It is drawn when it is first asked for: scattering stones takes some milliseconds.
 *  @param draw the cell, in grid units; widths of lines in millimetres */
export function pattern(id: Lithology, title: string, draw: () => Omit<Tile, 'id'>): LithologyPattern {
  let drawn: Tile | undefined
  return {
    id,
    title,
    get tile() {
      return (drawn ??= { id, ...onGrid(draw()) })
    },
  }
}

const onGrid = ({ width, height, marks }: Omit<Tile, 'id'>): Omit<Tile, 'id'> => ({
  width: width * GRID,
  height: height * GRID,
  marks: marks.map((mark) => ({ ...mark, path: mapPath(mark.path, ([x, y]) => [x * GRID, y * GRID]) })),
})
