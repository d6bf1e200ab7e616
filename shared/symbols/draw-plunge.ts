import type { MeasuredLine } from '../geometry/measured-line'
import type { Millimetres, MM } from '../units'
import type { LineEnd } from './definition'
import { plungeHead, plungeHeadMarks, plungeNumeral } from './definitions/folds'
import type { Ink, Mark } from './display-list'
import type { PlungeHead } from './line-drawing'
import { numeralBeside } from './numeral'
import { polyline } from './paths'
import { alongDirection, placeMarks } from './place-marks'

/** An arrowhead in its place on the trace. */
export interface PlacedHead extends PlungeHead {
  tip: MM
  /** Unit vector toward the tip, along the chord of the trace beneath the head. */
  direction: MM
  /** Share of its full size; below 1 on a trace too short for it. */
  scale: number
  /** Length at its end of the line that the stroke leaves out. */
  covers: Millimetres
  /** Length at its end of the line that decorations keep off. */
  room: Millimetres
}

/** A head that points into the line stands this far from its end, so that it has a shaft. */
const SHAFT: Millimetres = 2.5
/** From the head to the nearest decoration. */
const CLEAR: Millimetres = 1
const LEAST_SCALE = 0.5

/** Arrowheads on a trace: one that points out has its tip at the line's end, one that points in stands a shaft's length
 *  within it. They shrink where the line is too short for them. */
export function placeHeads(line: MeasuredLine, heads: readonly PlungeHead[]): PlacedHead[] {
  return heads.map((head) => {
    const shaft = head.points === 'in' ? SHAFT : 0
    const available = line.length * (heads.length === 1 ? 0.75 : 0.42)
    const scale = Math.max(LEAST_SCALE, Math.min(1, available / (shaft + plungeHead.length)))
    const [near, far] = [shaft * scale, (shaft + plungeHead.length) * scale]
    const [base, tip] = head.points === 'in' ? [near, far] : [far, near]
    const at = (fromEnd: Millimetres): Millimetres =>
      head.end === 'start' ? Math.min(fromEnd, line.length) : Math.max(0, line.length - fromEnd)
    const [dx, dy] = line.directionAt((at(base) + at(tip)) / 2, Math.abs(at(tip) - at(base)))
    return {
      ...head,
      tip: line.pointAt(at(tip)),
      direction: at(tip) < at(base) ? [-dx, -dy] : [dx, dy],
      scale,
      covers:
        head.points === 'in' ? 0 : Math.min(line.length, (plungeHead.length - plungeHead.notch) * scale),
      room: Math.min(line.length, far + CLEAR),
    }
  })
}

/** The heads and their figures: whole degrees, upright, beside the head and clear of the trace and of one another. */
export function plungeMarks(
  line: MeasuredLine,
  heads: readonly PlacedHead[],
  { ink, width }: { ink: Ink; width: Millimetres },
): Mark[] {
  const drawn = heads.flatMap(headMarks)
  const figures: Mark[] = []
  for (const head of heads) {
    if (head.degrees === null) continue
    const trace: Mark = { mark: 'stroke', path: polyline(traceNear(line, head.end)), width, ink }
    const near = [...drawn, ...figures, trace]
    figures.push(figureBeside(head, String(Math.round(head.degrees)), { ink, near }))
  }
  return [...drawn, ...figures]
}

/** The stretch of the trace that a figure at its end could meet. */
function traceNear(line: MeasuredLine, end: LineEnd): MM[] {
  const reach = Math.min(line.length, FURTHEST_FIGURE + plungeHead.length + SHAFT)
  return end === 'end' ? line.slice(line.length - reach, line.length) : line.slice(0, reach)
}

const headMarks = ({ tip, direction, scale }: PlacedHead): Mark[] =>
  placeMarks(plungeHeadMarks, ([x, y]) => alongDirection(direction, tip)([x * scale, y * scale]))

/** A figure on the eastern side of its arrowhead, or below one that points east or west; on the other side where the trace
 *  itself bends into that place. */
function figureBeside(
  { tip: [x, y], direction: [dx, dy], scale }: PlacedHead,
  text: string,
  { ink, near }: { ink: Ink; near: readonly Mark[] },
): Mark {
  const behind = FIGURE_BEHIND_TIP * scale
  const from: MM = [x - dx * behind, y - dy * behind]
  const beside = (away: MM) =>
    numeralBeside(text, { from, away, ink: near, furthest: FURTHEST_FIGURE }, { ...plungeNumeral, ink })
  const rightIsEast = Math.abs(dy) < 1e-6 ? dx > 0 : dy > 0
  const east = beside(rightIsEast ? [dy, -dx] : [-dy, dx])
  const west = beside(rightIsEast ? [-dy, dx] : [dy, -dx])
  const further = Math.hypot(east.at[0] - from[0], east.at[1] - from[1])
  const nearer = Math.hypot(west.at[0] - from[0], west.at[1] - from[1])
  return further - nearer > WORTH_THE_OTHER_SIDE ? west : east
}

/** From the tip back to where the figure stands beside the arrowhead. */
const FIGURE_BEHIND_TIP: Millimetres = plungeHead.length * 0.6
const FURTHEST_FIGURE: Millimetres = 9
/** Not a multiple of the search's step, so that rounding never decides between the sides. */
const WORTH_THE_OTHER_SIDE: Millimetres = 0.52
