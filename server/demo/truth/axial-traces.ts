import { toDegrees, type Degrees, type XY } from '@shared/units'
import { levelLines, sample, type Line } from './contours'
import { cutLine, thin } from './cut-lines'
import type { Block, Hinge, Vector3 } from './field'
import { cutAtCover, lengthOf, levelOf } from './linework'
import type { Truth } from './truth'
import { slope } from './vectors'

/** Where a hinge surface meets the ground. Lines run down-plunge. */
export interface Trace {
  hinge: Hinge
  block: Block
  line: Line
  concealed: boolean
  /** The axis at the middle of the piece, degrees; null for pieces that are too short to carry an arrow. */
  axis: { gridTrend: Degrees; plunge: Degrees } | null
}

/** Traces shorter than this, some 5 cm on the map, are left out. */
const SHORTEST_TRACE = 1200
const SHORTEST_PIECE = 120
const SHORTEST_WITH_AXIS = 1000

/** All axial traces of the known ground. */
export function makeTraces(truth: Truth): Trace[] {
  return (['west', 'east'] as const).flatMap((block) => {
    const sampled = sample(truth.onGround.across(block), truth.extent)
    return truth.field.hinges.flatMap((hinge) => {
      const own = levelOf(sampled.surface, hinge.across)
      const kept = levelLines(sampled, hinge.across)
        .flatMap((line) => cutLine(line, own, truth.onGround.fault).pieces)
        .filter((piece) => piece.positive === (block === 'east') && lengthOf(piece.line) > SHORTEST_TRACE)
      return kept
        .flatMap(({ line }) => cutAtCover(truth, line, own))
        .filter(({ line }) => lengthOf(line) > SHORTEST_PIECE)
        .map(({ line, concealed }) => toTrace(truth, hinge, block, line, concealed))
    })
  })
}

function toTrace(truth: Truth, hinge: Hinge, block: Block, line: Line, concealed: boolean): Trace {
  const drawn = downPlunge(thin(line, [], 1.5, 400), truth.field.along)
  const carries = !concealed && lengthOf(drawn) > SHORTEST_WITH_AXIS
  return {
    hinge,
    block,
    line: drawn,
    concealed,
    axis: carries ? axisAt(truth, middleOf(drawn), block) : null,
  }
}

function downPlunge(line: Line, [east, north]: XY): Line {
  const [first, last] = [line[0], line.at(-1)]
  if (!first || !last) return line
  return (last[0] - first[0]) * east + (last[1] - first[1]) * north < 0 ? line.toReversed() : line
}

export const middleOf = (line: Line): XY => line[Math.floor(line.length / 2)] ?? [0, 0]

/** Trend and plunge of the fold axis at a place: the line in which layer and hinge surface meet. */
export function axisAt(truth: Truth, xy: XY, block: Block): { gridTrend: Degrees; plunge: Degrees } {
  const z = truth.ground(xy)
  const { field } = truth
  const [a, b, c] = field.gradient(xy, z, block)
  const [p, q] = slope((at) => field.across(at, z, block), xy)
  const r = (field.across(xy, z + 0.05, block) - field.across(xy, z - 0.05, block)) / 0.1
  const axis: Vector3 = [b * r - c * q, c * p - a * r, a * q - b * p]
  const [east, north, up] = axis[2] > 0 ? axis.map((part) => -part) : axis
  if (east === undefined || north === undefined || up === undefined) throw new RangeError('No axis here.')
  return {
    gridTrend: toDegrees(Math.atan2(east, north)),
    plunge: toDegrees(Math.atan2(-up, Math.hypot(east, north))),
  }
}
