import type { Metres, XY } from '@shared/units'
import type { Line } from './contours'
import type { MapBounds } from './map-bounds'
import { areasOf, cellsNear, type Raster } from './raster'
import { RingIndex } from './small-rings'

/** A place inside an area, with the label of the unit or the kind of cover that the area shows. */
export interface Label {
  at: XY
  shows: string
}

/** Areas of more than this reach get more than one label. */
const BETWEEN_LABELS: Metres = 3200
/** A place for a label that is free of the area's edge. */
const CLEAR: Metres = 130
/** Areas of fewer cells may be patches so small that no line was drawn around them. */
const FEWEST_CELLS = 4
/** Least distance of any label from its area's edge: drawn lines depart a little from the true ones. */
const WITHIN: Metres = 5
/** Labels stand at least so far from lines that cross their area. */
const OFF_LINES: Metres = 130

/** At least one label in each area of some size, as far from the area's edge as can be.
 *  @param lines traces, dikes and marker beds, beside which no label stands if that can be helped
 *  @param leftOut closed lines that are not drawn */
export function makeLabels(
  bounds: MapBounds,
  raster: Raster,
  lines: readonly Line[],
  leftOut: readonly Line[],
): Label[] {
  const hidden = new RingIndex(leftOut)
  const isWithin = (cell: number): boolean => {
    const [x, y] = raster.centreOf(cell)
    const key = raster.areas[raster.codes[cell] ?? 0]?.key
    const around: XY[] = [
      [x - WITHIN, y],
      [x + WITHIN, y],
      [x, y - WITHIN],
      [x, y + WITHIN],
    ]
    return around.every((place) => bounds.areaAt(place).key === key)
  }
  const near = cellsNear(raster, lines, Math.round(OFF_LINES / raster.cell))
  return areasOf(raster).flatMap((cells) => {
    if (cells.length < FEWEST_CELLS) return []
    const free = cells.filter((cell) => !hidden.holds(raster.centreOf(cell)))
    return spread(raster, near, free, isWithin).map((cell) => ({
      at: raster.centreOf(cell),
      shows: raster.areas[raster.codes[cell] ?? 0]?.shows ?? '',
    }))
  })
}

/** The deepest cell, then the deepest of those far from all before; none beside a line if that can be helped. */
function spread(
  raster: Raster,
  near: Uint8Array,
  cells: readonly number[],
  isWithin: (cell: number) => boolean,
): number[] {
  const { depths, cell: side, centreOf } = raster
  const clear = CLEAR / side
  const deepest = cells.toSorted((a, b) => (depths[b] ?? 0) - (depths[a] ?? 0))
  const isFree = (cell: number) => (depths[cell] ?? 0) >= clear && near[cell] === 0
  const first =
    deepest.find(isFree) ??
    deepest.find((cell) => near[cell] === 0 && isWithin(cell)) ??
    deepest.find((cell) => isWithin(cell))
  const chosen = first === undefined ? [] : [first]
  for (const candidate of deepest) {
    if ((depths[candidate] ?? 0) < clear) break
    if (!isOnCoarseCell(raster, candidate) || !isFree(candidate)) continue
    const [x, y] = centreOf(candidate)
    const isFar = chosen.every((other) => {
      const [otherX, otherY] = centreOf(other)
      return Math.hypot(x - otherX, y - otherY) > BETWEEN_LABELS
    })
    if (isFar) chosen.push(candidate)
  }
  return chosen
}

/** Further labels need not be looked for on every cell. */
const COARSE = 4
const isOnCoarseCell = ({ columns }: Raster, cell: number): boolean =>
  (cell % columns) % COARSE === 0 && Math.floor(cell / columns) % COARSE === 0
