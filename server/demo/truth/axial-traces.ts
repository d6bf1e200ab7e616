import { toDegrees, type Degrees, type Metres, type XY } from '@shared/units'
import { levelLines, type Line } from './contours'
import { lengthOf, thin } from './cut-lines'
import type { FoldBelt, Hinge, Vector3 } from './fold-belt'
import type { Side } from './island'
import { reachesEdge } from './lattice'
import { atLevel, keptParts, sides, type MapBounds } from './map-bounds'
import type { Truth } from './truth'

/** The axis of a fold at a place: trend from grid north of its down-going end, and plunge, degrees. */
export interface Axis {
  gridTrend: Degrees
  plunge: Degrees
}

/** Where a hinge surface meets the ground. Lines run with the folds' own axes. */
export interface Trace {
  hinge: Hinge
  series: 'lower' | 'upper'
  side: Side
  line: Line
  concealed: boolean
  /** Whether a limb beside it is overturned. */
  overturned: boolean
  /** The axis at the middle of the piece; of a doubly plunging one at both ends. Null for pieces too short for an arrow. */
  axis: Axis | { atStart: Axis; atEnd: Axis } | null
}

/** Traces shorter than this, some 5 cm on the map, are left out. */
const SHORTEST_TRACE: Metres = 1200
const SHORTEST_PIECE: Metres = 120
const SHORTEST_WITH_AXIS: Metres = 900
/** Share of a trace between its ends and the places where its plunge is looked at. */
const FROM_END = 0.18
/** Least plunge at both ends of an axis that is called doubly plunging. */
const LEAST_DOUBLE: Degrees = 3

/** All axial traces of an extent. */
export function makeTraces(bounds: MapBounds): Trace[] {
  return sides.flatMap((side) => [...tracesOf(bounds, 'lower', side), ...tracesOf(bounds, 'upper', side)])
}

function tracesOf(bounds: MapBounds, series: 'lower' | 'upper', side: Side): Trace[] {
  const { truth } = bounds
  const conditions = bounds.conditionsOf(series, side)
  const belt = truth.island.belt(series, side)
  const sampled = bounds.sampleWhere(belt.across, conditions)
  const [low, high] = rangeOf(sampled.values)
  const isLong = (line: Line, shortest: Metres) =>
    lengthOf(line) > shortest || reachesEdge(bounds.lattice.extent, line)
  return belt.hinges.flatMap((hinge) => {
    if (hinge.across < low || hinge.across > high) return []
    const own = atLevel(sampled, hinge.across)
    return levelLines(sampled, hinge.across)
      .flatMap((line) => keptParts(line, own, conditions, false))
      .filter((line) => isLong(line, SHORTEST_TRACE))
      .flatMap((line) => bounds.cutAtCover(line, own, false))
      .filter(({ line }) => isLong(line, SHORTEST_PIECE))
      .map(({ line, concealed }) => {
        const drawn = alongAxes(thin(line, [], 1.5, 400), truth.island.axes.along)
        const carries = !concealed && lengthOf(drawn) > SHORTEST_WITH_AXIS
        return {
          hinge,
          series,
          side,
          line: drawn,
          concealed,
          overturned: isOverturned(truth, belt, hinge, placeAlong(drawn, 0.5)),
          axis: carries ? axisOf(truth, belt, drawn) : null,
        }
      })
  })
}

function rangeOf(values: Float64Array): [low: number, high: number] {
  let [low, high] = [Infinity, -Infinity]
  for (const value of values) {
    // Comparisons with NaN are false: unsampled nodes do not count.
    if (value < low) low = value
    if (value > high) high = value
  }
  return [low, high]
}

function alongAxes(line: Line, [east, north]: XY): Line {
  const [first, last] = [line[0], line.at(-1)]
  if (!first || !last) return line
  return (last[0] - first[0]) * east + (last[1] - first[1]) * north < 0 ? line.toReversed() : line
}

/** The vertex nearest to a share of a line's length. */
export function placeAlong(line: Line, share: number): XY {
  let left = lengthOf(line) * share
  for (const [index, [x, y]] of line.entries()) {
    const [nextX, nextY] = line[index + 1] ?? [x, y]
    left -= Math.hypot(nextX - x, nextY - y)
    if (left <= 0) return [x, y]
  }
  return line.at(-1) ?? [0, 0]
}

/** The axis of the middle; where the ends plunge apart or toward each other, those of both ends. */
function axisOf(truth: Truth, belt: FoldBelt, line: Line): Trace['axis'] {
  const at = (share: number) => axisAt(truth, belt, placeAlong(line, share))
  const [atStart, atEnd] = [at(FROM_END), at(1 - FROM_END)]
  const turn = Math.abs(Math.cos(((atStart.gridTrend - atEnd.gridTrend) * Math.PI) / 180))
  const isDouble =
    Math.cos(((atStart.gridTrend - atEnd.gridTrend) * Math.PI) / 180) < 0 &&
    turn > 0.5 &&
    Math.min(atStart.plunge, atEnd.plunge) >= LEAST_DOUBLE
  return isDouble ? { atStart, atEnd } : at(0.5)
}

/** Trend and plunge of the fold axis at a place on the ground: the line in which layer and hinge surface meet. */
export function axisAt(
  { ground }: Truth,
  { height, across }: Pick<FoldBelt, 'height' | 'across'>,
  xy: XY,
): Axis {
  const z = ground(xy)
  const [a, b, c] = height.gradient(xy, z)
  const [p, q, r] = across.gradient(xy, z)
  const axis: Vector3 = [b * r - c * q, c * p - a * r, a * q - b * p]
  const down = axis[2] > 0 ? -1 : 1
  return {
    gridTrend: toDegrees(Math.atan2(axis[0] * down, axis[1] * down)),
    plunge: toDegrees(Math.atan2(Math.abs(axis[2]), Math.hypot(axis[0], axis[1]))),
  }
}

/** Whether the limb on either side of a hinge is overturned somewhere before the next hinge. */
function isOverturned({ ground, island }: Truth, belt: FoldBelt, hinge: Hinge, at: XY): boolean {
  const index = belt.hinges.findIndex(({ across }) => across === hinge.across)
  const [east, north] = island.axes.along
  const limb = (next: Hinge | undefined): boolean => {
    if (!next) return false
    const reach = next.across - hinge.across
    return [0.3, 0.4, 0.5, 0.6, 0.7].some((share) => {
      const beside: XY = [at[0] + north * reach * share, at[1] - east * reach * share]
      return belt.height.gradient(beside, ground(beside))[2] < 0
    })
  }
  return limb(belt.hinges[index - 1]) || limb(belt.hinges[index + 1])
}
