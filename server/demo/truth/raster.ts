import type { Metres, XY } from '@shared/units'
import type { Line } from './contours'
import type { Extent } from './lattice'
import type { Area, MapBounds } from './map-bounds'

/** Areas of the map on square cells: which touch, and how far each cell is from the edge of its area. */
export interface Raster {
  extent: Extent
  cell: Metres
  columns: number
  rows: number
  /** Number of each cell's kind of area. */
  codes: Int32Array
  areas: readonly Area[]
  /** Cells from each cell to the edge of its area. */
  depths: Int32Array
  centreOf(index: number): XY
  /** Cell that holds a place; -1 outside. */
  cellAt(xy: XY): number
}

export function rasterize(bounds: MapBounds, cell: Metres): Raster {
  const { extent } = bounds.lattice
  const { origin, width, height } = extent
  const [columns, rows] = [Math.floor(width / cell), Math.floor(height / cell)]
  const centreOf = (index: number): XY => [
    origin[0] + ((index % columns) + 0.5) * cell,
    origin[1] + (Math.floor(index / columns) + 0.5) * cell,
  ]
  const numbers = new Map<string, number>()
  const areas: Area[] = []
  const codes = new Int32Array(columns * rows)
  for (let index = 0; index < codes.length; index++) {
    const area = bounds.areaAt(centreOf(index))
    const number = numbers.get(area.key) ?? areas.push(area) - 1
    numbers.set(area.key, number)
    codes[index] = number
  }
  return {
    extent,
    cell,
    columns,
    rows,
    codes,
    areas,
    depths: depthsOf(codes, columns, rows),
    centreOf,
    cellAt([x, y]) {
      const [column, row] = [Math.floor((x - origin[0]) / cell), Math.floor((y - origin[1]) / cell)]
      return column < 0 || row < 0 || column >= columns || row >= rows ? -1 : row * columns + column
    },
  }
}

/** Steps from each cell to the edge of its area or of the sheet, by sides and corners, from the edges inward. */
function depthsOf(codes: Int32Array, columns: number, rows: number): Int32Array {
  const depths = new Int32Array(codes.length).fill(-1)
  let front: number[] = []
  for (let index = 0; index < codes.length; index++) {
    const around = neighboursOf(index, columns, rows)
    if (around.length < 8 || around.some((other) => codes[other] !== codes[index])) front.push(index)
  }
  for (let depth = 0; front.length > 0; depth++) {
    for (const index of front) depths[index] = depth
    const next: number[] = []
    for (const index of front) {
      for (const other of neighboursOf(index, columns, rows)) {
        if (depths[other] !== -1) continue
        depths[other] = depth + 1
        next.push(other)
      }
    }
    front = next
  }
  return depths
}

/** Cells beside a cell by a side or a corner. */
export function neighboursOf(index: number, columns: number, rows: number): number[] {
  const [column, row] = [index % columns, Math.floor(index / columns)]
  const found: number[] = []
  for (let up = Math.max(0, row - 1); up <= Math.min(rows - 1, row + 1); up++) {
    for (let right = Math.max(0, column - 1); right <= Math.min(columns - 1, column + 1); right++) {
      const other = up * columns + right
      if (other !== index) found.push(other)
    }
  }
  return found
}

/** Cells of each area: those that touch by a side or a corner, for narrow areas run aslant, and show the same. */
export function areasOf({ codes, columns, rows }: Raster): number[][] {
  const seen = new Uint8Array(codes.length)
  const found: number[][] = []
  for (let start = 0; start < codes.length; start++) {
    if (seen[start]) continue
    seen[start] = 1
    const area = [start]
    for (let at = 0; at < area.length; at++) {
      for (const other of neighboursOf(area[at] ?? start, columns, rows)) {
        if (seen[other] || codes[other] !== codes[start]) continue
        seen[other] = 1
        area.push(other)
      }
    }
    found.push(area)
  }
  return found
}

/** Cells that lines pass, and those up to `reach` cells from them. */
export function cellsNear(raster: Raster, lines: readonly Line[], reach: number): Uint8Array {
  const marked = new Uint8Array(raster.codes.length)
  const mark = (xy: XY): void => {
    for (let up = -reach; up <= reach; up++) {
      for (let right = -reach; right <= reach; right++) {
        const index = raster.cellAt([xy[0] + right * raster.cell, xy[1] + up * raster.cell])
        if (index >= 0) marked[index] = 1
      }
    }
  }
  for (const line of lines) {
    for (const [index, from] of line.entries()) {
      const to = line[index + 1] ?? from
      const steps = Math.max(1, Math.ceil(Math.hypot(to[0] - from[0], to[1] - from[1]) / raster.cell))
      for (let step = 0; step < steps; step++) {
        mark([from[0] + ((to[0] - from[0]) * step) / steps, from[1] + ((to[1] - from[1]) * step) / steps])
      }
    }
  }
  return marked
}
