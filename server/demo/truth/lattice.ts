import type { Metres, XY } from '@shared/units'
import type { SpaceField } from './fold-belt'
import type { Surface } from './vectors'

/** A rectangle of the island: south-west corner and size, metres. */
export interface Extent {
  origin: XY
  width: Metres
  height: Metres
}

/** Whether a line begins or ends on the edge of an extent, where it goes on: on the next sheet it has no end. */
export function reachesEdge({ origin, width, height }: Extent, line: readonly XY[]): boolean {
  return [line[0], line.at(-1)].some((end) => {
    if (!end) return false
    const [x, y] = end
    return x === origin[0] || y === origin[1] || x === origin[0] + width || y === origin[1] + height
  })
}

/** Nodes in rows from the south-west, over a whole extent; two extents that share an edge share the nodes on it. */
export interface Lattice {
  extent: Extent
  columns: number
  rows: number
  nodeAt(column: number, row: number): XY
  /** Height of the ground at each node. */
  heights: Float64Array
}

/** A surface with its values at the nodes of a lattice; NaN where it does not matter. */
export interface Sampled {
  surface: Surface
  lattice: Lattice
  values: Float64Array
}

/** Lays nodes over an extent, about `cell` metres apart, and measures the ground at each. */
export function layLattice(extent: Extent, cell: Metres, ground: Surface): Lattice {
  const { origin, width, height } = extent
  const [columns, rows] = [Math.max(1, Math.round(width / cell)), Math.max(1, Math.round(height / cell))]
  const nodeAt = (column: number, row: number): XY => [
    origin[0] + (column * width) / columns,
    origin[1] + (row * height) / rows,
  ]
  const lattice = { extent, columns, rows, nodeAt, heights: new Float64Array((columns + 1) * (rows + 1)) }
  forEachNode(lattice, (index, xy) => (lattice.heights[index] = ground(xy)))
  return lattice
}

function forEachNode(lattice: Lattice, visit: (index: number, xy: XY) => void): void {
  const across = lattice.columns + 1
  for (let row = 0; row <= lattice.rows; row++) {
    for (let column = 0; column < across; column++) visit(row * across + column, lattice.nodeAt(column, row))
  }
}

/** Samples a surface at the nodes, for all levels that are asked of it. */
export function sample(surface: Surface, lattice: Lattice): Sampled {
  const values = new Float64Array(lattice.heights.length)
  forEachNode(lattice, (index, xy) => (values[index] = surface(xy)))
  return { surface, lattice, values }
}

/** Samples a field on the ground at the nodes where it matters. */
export function sampleField(
  field: SpaceField,
  ground: Surface,
  lattice: Lattice,
  where?: Uint8Array,
): Sampled {
  const values = new Float64Array(lattice.heights.length)
  forEachNode(lattice, (index, xy) => {
    values[index] = where?.[index] === 0 ? NaN : field.value(xy, lattice.heights[index] ?? 0)
  })
  return { surface: (xy) => field.value(xy, ground(xy)), lattice, values }
}

/** Nodes at which every sampled surface has its wanted sign, and those within two cells of them. */
export function nodesWhere(
  lattice: Lattice,
  conditions: readonly (readonly [Sampled, sign: 1 | -1])[],
): Uint8Array {
  const met = new Uint8Array(lattice.heights.length)
  for (let index = 0; index < met.length; index++) {
    met[index] = conditions.every(([{ values }, sign]) => (values[index] ?? 0) * sign >= 0) ? 1 : 0
  }
  const across = lattice.columns + 1
  return widened(widened(met, 1, across), across, across)
}

/** Nodes that are marked or have a marked one up to two steps away. */
function widened(marked: Uint8Array, step: number, across: number): Uint8Array {
  return marked.map((mark, index) => {
    if (mark === 1) return 1
    const column = index % across
    for (const count of [-2, -1, 1, 2]) {
      const beside = step === 1 ? column + count : 0
      if (beside >= 0 && beside < across && marked[index + count * step] === 1) return 1
    }
    return 0
  })
}
