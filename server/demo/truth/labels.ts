import type { Metres, XY } from '@shared/units'
import type { Line } from './contours'
import type { Truth } from './truth'
import { layerAt, markerBed } from './units'
import { slope } from './vectors'

/** A place inside an area, with what the area is: a layer's number, or a kind of cover. */
export interface Label {
  at: XY
  unit: number | 'alluvium' | 'peat'
}

const CELL: Metres = 25
/** Areas of more than this reach get more than one label. */
const BETWEEN_LABELS: Metres = 3200
/** A place for a label that is free of the area's edge. */
const CLEAR: Metres = 140

/** What the map shows at a place. */
export function unitAt(truth: Truth, xy: XY): Label['unit'] {
  const patch = truth.cover.find(({ surface }) => surface(xy) > 0)
  if (patch) return patch.unit
  return layerAt(truth.onGround.height(truth.onGround.blockAt(xy))(xy))
}

/** At least one label in each area, as far from the area's edge as can be. Areas are found on a raster: cells that touch
 *  and show the same in the same block. */
export function makeLabels(truth: Truth, leftOut: readonly Line[]): Label[] {
  const raster = rasterize(truth)
  return areasOf(raster).flatMap((cells) => {
    const free = cells.filter((cell) => !leftOut.some((ring) => isInside(ring, raster.placeOf(cell))))
    return spread(truth, raster, free).map((cell) => ({
      at: raster.placeOf(cell),
      unit: raster.unitOf(cell),
    }))
  })
}

interface Raster {
  columns: number
  rows: number
  /** What each cell shows, as one number. */
  codes: number[]
  /** Cells to the nearest edge of the cell's area. */
  depths: number[]
  placeOf(cell: number): XY
  unitOf(cell: number): Label['unit']
}

function rasterize(truth: Truth): Raster {
  const columns = Math.floor(truth.extent.width / CELL)
  const rows = Math.floor(truth.extent.height / CELL)
  const placeOf = (cell: number): XY => [
    ((cell % columns) + 0.5) * CELL,
    (Math.floor(cell / columns) + 0.5) * CELL,
  ]
  const codes = Array.from({ length: columns * rows }, (_, cell) => {
    const xy = placeOf(cell)
    const patch = truth.cover.findIndex(({ surface }) => surface(xy) > 0)
    if (patch >= 0) return 1000 + patch
    const block = truth.onGround.blockAt(xy)
    return layerAt(truth.onGround.height(block)(xy)) + (block === 'east' ? 100 : 0)
  })
  return {
    columns,
    rows,
    codes,
    depths: depthsOf(codes, columns, rows),
    placeOf,
    unitOf: (cell) => unitAt(truth, placeOf(cell)),
  }
}

const neighboursOf = (cell: number, columns: number, rows: number): number[] => {
  const [column, row] = [cell % columns, Math.floor(cell / columns)]
  return [
    ...(column > 0 ? [cell - 1] : []),
    ...(column < columns - 1 ? [cell + 1] : []),
    ...(row > 0 ? [cell - columns] : []),
    ...(row < rows - 1 ? [cell + columns] : []),
  ]
}

/** Neighbours by a side or a corner. */
const aroundOf = (cell: number, columns: number, rows: number): number[] => {
  const column = cell % columns
  const beside = [cell, ...(column > 0 ? [cell - 1] : []), ...(column < columns - 1 ? [cell + 1] : [])]
  return beside
    .flatMap((middle) => [middle, middle - columns, middle + columns])
    .filter((other) => other !== cell && other >= 0 && other < columns * rows)
}

/** Steps from each cell to the edge of its area, from the edges inward. */
function depthsOf(codes: readonly number[], columns: number, rows: number): number[] {
  const depths = new Array<number>(codes.length).fill(-1)
  let front = codes.flatMap((code, cell) => {
    const around = neighboursOf(cell, columns, rows)
    return around.length < 4 || around.some((other) => codes[other] !== code) ? [cell] : []
  })
  for (let depth = 0; front.length > 0; depth++) {
    for (const cell of front) depths[cell] = depth
    const next = front
      .flatMap((cell) => neighboursOf(cell, columns, rows))
      .filter((cell) => depths[cell] === -1)
    front = [...new Set(next)]
  }
  return depths
}

/** Cells that touch by a side or a corner, for narrow areas run aslant, and show the same. */
function areasOf({ codes, columns, rows }: Raster): number[][] {
  const seen = new Set<number>()
  return codes.flatMap((code, start) => {
    if (seen.has(start)) return []
    const area = [start]
    seen.add(start)
    for (let index = 0; index < area.length; index++) {
      for (const cell of aroundOf(area[index] ?? start, columns, rows)) {
        if (codes[cell] !== code || seen.has(cell)) continue
        seen.add(cell)
        area.push(cell)
      }
    }
    return [area]
  })
}

/** The deepest cell, then the deepest of those far from all before; none on another line if that can be helped. */
function spread(truth: Truth, { depths, placeOf }: Raster, cells: readonly number[]): number[] {
  const deepest = cells.map((cell) => ({ cell, depth: depths[cell] ?? 0 })).sort((a, b) => b.depth - a.depth)
  const isFree = ({ cell, depth }: { cell: number; depth: number }) =>
    depth * CELL >= CLEAR && !isOnLine(truth, placeOf(cell))
  const first = deepest.find(isFree) ?? deepest[0]
  const chosen = first ? [first.cell] : []
  for (const candidate of deepest) {
    if (candidate.depth * CELL < CLEAR) break
    const [x, y] = placeOf(candidate.cell)
    const isFar = chosen.every((other) => {
      const [otherX, otherY] = placeOf(other)
      return Math.hypot(x - otherX, y - otherY) > BETWEEN_LABELS
    })
    if (isFar && isFree(candidate)) chosen.push(candidate.cell)
  }
  return chosen
}

/** Whether an axial trace or the marker bed runs beneath. */
function isOnLine({ onGround, field }: Truth, xy: XY): boolean {
  const block = onGround.blockAt(xy)
  const across = onGround.across(block)(xy)
  const height = onGround.height(block)
  const fromMarker = Math.abs(height(xy) - markerBed.height) / Math.hypot(...slope(height, xy))
  return fromMarker < 110 || field.hinges.some((hinge) => Math.abs(across - hinge.across) < 150)
}

/** Whether a place lies inside a closed line. Source: the even-odd rule. */
function isInside(ring: Line, [x, y]: XY): boolean {
  return ring.slice(1).reduce((inside, [x2, y2], index) => {
    const [x1, y1] = ring[index] ?? [x2, y2]
    const crosses = y1 > y !== y2 > y && x < x1 + ((y - y1) / (y2 - y1)) * (x2 - x1)
    return crosses ? !inside : inside
  }, false)
}
