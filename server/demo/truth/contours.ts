import type { Metres, XY } from '@shared/units'
import type { Lattice, Sampled } from './lattice'
import { bisect, ontoZero, type Surface } from './vectors'

/** A level line: open ones begin and end on the edge of the area, closed ones repeat their first place. */
export type Line = XY[]

/** Lines on which a sampled surface has a value, by marching squares, each vertex then moved onto the level exactly. Ends
 *  lie exactly on the edges of the area. Source: common practice; the middle of a cell decides its saddle. */
export function levelLines(sampled: Sampled, level: number): Line[] {
  const { surface, lattice, values } = sampled
  const above: Surface = (xy) => surface(xy) - level
  const grid: Grid = {
    surface: above,
    lattice,
    valueAt(column, row) {
      const value = (values[row * (lattice.columns + 1) + column] ?? NaN) - level
      // A value of exactly zero would leave the level between two cells.
      return value === 0 ? 1e-12 : value
    },
  }
  const graph = new CrossingGraph()
  for (let row = 0; row < lattice.rows; row++) {
    for (let column = 0; column < lattice.columns; column++) {
      if (!isCrossed(sampled, level, column, row)) continue
      for (const [from, to] of cellPairs(grid, column, row)) graph.join(from, to)
    }
  }
  return graph.lines().map((line) =>
    withBends(
      line.map((crossing) => placeOf(grid, crossing)),
      above,
    ),
  )
}

/** Whether a level may pass a cell. Most cells are passed by none: this must be quick. */
function isCrossed({ values, lattice }: Sampled, level: number, column: number, row: number): boolean {
  const southWest = row * (lattice.columns + 1) + column
  const northWest = southWest + lattice.columns + 1
  const [a, b] = [(values[southWest] ?? NaN) - level, (values[southWest + 1] ?? NaN) - level]
  const [c, d] = [(values[northWest] ?? NaN) - level, (values[northWest + 1] ?? NaN) - level]
  const allAbove = a > 0 && b > 0 && c > 0 && d > 0
  const allBelow = a < 0 && b < 0 && c < 0 && d < 0
  return !allAbove && !allBelow && !Number.isNaN(a + b + c + d)
}

/** How far a piece of a line may depart from the level between its vertices. */
const LARGEST_BEND: Metres = 0.25

/** A line with further vertices on the level wherever it bends. */
const withBends = (line: Line, surface: Surface): Line =>
  line.flatMap((place, index) => {
    const next = line[index + 1]
    return next ? [place, ...bendsBetween(place, next, surface, 5)] : [place]
  })

function bendsBetween(from: XY, to: XY, surface: Surface, depth: number): Line {
  const middle: XY = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]
  const bend = ontoZero(surface, middle)
  const departure = Math.hypot(bend[0] - middle[0], bend[1] - middle[1])
  if (departure < LARGEST_BEND || depth === 0) return []
  return [
    ...bendsBetween(from, bend, surface, depth - 1),
    bend,
    ...bendsBetween(bend, to, surface, depth - 1),
  ]
}

interface Grid {
  surface: Surface
  lattice: Lattice
  valueAt(column: number, row: number): number
}

/** A grid edge that the level passes: from a node toward east or north. */
interface Crossing {
  column: number
  row: number
  toward: 'east' | 'north'
}

const keyOf = ({ column, row, toward }: Crossing): string => `${column} ${row} ${toward}`

/** Which crossings of a cell's edges the level joins. */
function cellPairs({ valueAt, surface, lattice }: Grid, column: number, row: number): [Crossing, Crossing][] {
  const [sw, se, nw, ne] = [
    valueAt(column, row) > 0,
    valueAt(column + 1, row) > 0,
    valueAt(column, row + 1) > 0,
    valueAt(column + 1, row + 1) > 0,
  ]
  if (sw === se && se === ne && ne === nw) return []
  const bottom: Crossing = { column, row, toward: 'east' }
  const top: Crossing = { column, row: row + 1, toward: 'east' }
  const left: Crossing = { column, row, toward: 'north' }
  const right: Crossing = { column: column + 1, row, toward: 'north' }
  const crossed = [
    ...(sw !== se ? [bottom] : []),
    ...(se !== ne ? [right] : []),
    ...(ne !== nw ? [top] : []),
    ...(nw !== sw ? [left] : []),
  ]
  const [first, second] = crossed
  if (crossed.length === 2 && first && second) return [[first, second]]
  if (crossed.length < 4) return []
  const middle = surface(lattice.nodeAt(column + 0.5, row + 0.5)) > 0
  return middle === sw
    ? [
        [bottom, right],
        [top, left],
      ]
    : [
        [bottom, left],
        [top, right],
      ]
}

/** Crossings and what they are joined to; walks them into lines. */
class CrossingGraph {
  private readonly nodes = new Map<string, { crossing: Crossing; joined: string[] }>()

  join(from: Crossing, to: Crossing): void {
    this.node(from).joined.push(keyOf(to))
    this.node(to).joined.push(keyOf(from))
  }

  /** Open lines first, then closed ones, which repeat their first crossing. */
  lines(): Crossing[][] {
    const seen = new Set<string>()
    const ends = [...this.nodes].filter(([, node]) => node.joined.length === 1)
    const open = ends.flatMap(([key]) => (seen.has(key) ? [] : [this.walk(key, seen)]))
    const closed = [...this.nodes.keys()].flatMap((key) => {
      if (seen.has(key)) return []
      const line = this.walk(key, seen)
      return [[...line, ...line.slice(0, 1)]]
    })
    return [...open, ...closed]
  }

  private walk(start: string, seen: Set<string>): Crossing[] {
    const line: Crossing[] = []
    for (let key: string | undefined = start; key !== undefined;) {
      const node = this.nodes.get(key)
      if (!node) break
      seen.add(key)
      line.push(node.crossing)
      key = node.joined.find((next) => !seen.has(next))
    }
    return line
  }

  private node(crossing: Crossing): { crossing: Crossing; joined: string[] } {
    const key = keyOf(crossing)
    const known = this.nodes.get(key) ?? { crossing, joined: [] }
    this.nodes.set(key, known)
    return known
  }
}

/** The exact place of a crossing: on the edge of the area it stays on the edge, inside it moves down the slope. */
function placeOf({ surface, lattice, valueAt }: Grid, { column, row, toward }: Crossing): XY {
  const [x, y] = lattice.nodeAt(column, row)
  const [nextX, nextY] = lattice.nodeAt(column + 1, row + 1)
  const isEast = toward === 'east'
  const onEdge = isEast ? row === 0 || row === lattice.rows : column === 0 || column === lattice.columns
  if (onEdge) {
    return isEast
      ? [bisect((at) => surface([at, y]), x, nextX), y]
      : [x, bisect((at) => surface([x, at]), y, nextY)]
  }
  const from = valueAt(column, row)
  const to = isEast ? valueAt(column + 1, row) : valueAt(column, row + 1)
  const fraction = from / (from - to)
  return ontoZero(surface, isEast ? [x + fraction * (nextX - x), y] : [x, y + fraction * (nextY - y)])
}
