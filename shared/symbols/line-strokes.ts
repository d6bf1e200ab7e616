import type { MeasuredLine } from '../geometry/measured-line'
import type { Degrees, Millimetres, MM } from '../units'
import type { LineSymbol } from './definition'
import type { Mark, StrokeMark } from './display-list'
import type { LineDrawing } from './line-drawing'
import { polyline } from './paths'
import { isClosedLine, type Stretch } from './place-along'

/** A line's own strokes.
 *  @param between the stretches to draw
 *  @param onDash places that stand on a dash, in their order along the line */
export function lineStrokes(
  symbol: LineSymbol,
  line: MeasuredLine,
  { locationConfidence }: LineDrawing,
  { between, onDash }: { between: readonly Stretch[]; onDash: readonly Millimetres[] },
): Mark[] {
  const stroke = symbol.strokes[locationConfidence]
  const { dash } = stroke
  const runs = dash ? between.flatMap((stretch) => dashedRuns(line, stretch, { onDash, dash })) : between
  const path = stretchesOf(line, runs).flatMap((points) => polyline(points))
  if (path.length === 0) return []
  const mark: StrokeMark = { mark: 'stroke', path, ink: symbol.ink, ...stroke }
  if (symbol.core === undefined) return [mark]
  return [mark, { ...mark, ...symbol.core }]
}

/** A dashed stretch in runs from one decoration or corner to the next, each reaching past it by half a dash: as runs start
 *  and end in a dash, each stands on one and none over a gap. */
function dashedRuns(
  line: MeasuredLine,
  [from, to]: Stretch,
  { onDash, dash }: { onDash: readonly Millimetres[]; dash: readonly Millimetres[] },
): Stretch[] {
  const reach = (dash[0] ?? 0) / 2
  const period = dash.reduce((sum, piece) => sum + piece, 0)
  const decorated = onDash.filter((at) => at > from && at < to)
  const inside = withCorners(line, [from, ...decorated, to], FEWEST_PERIODS * period)
  const ends = [...inside.map((at) => Math.min(to, at + reach)), to]
  return [from, ...inside.map((at) => Math.max(from, at - reach))].map((start, index) => [
    start,
    ends[index] ?? to,
  ])
}

/** A corner sharper than this is drawn, and not left out in a gap, where the pattern can keep its measure. */
const CORNER: Degrees = 50
/** Length over which a corner turns, and the step in which corners are looked for. */
const CORNER_WIDTH: Millimetres = 2
const STEP: Millimetres = 0.5
/** Fewest periods of the pattern between two places that stand on a dash because of a corner: a shorter run would be
 *  stretched or shrunk so much that it looks like another pattern. */
const FEWEST_PERIODS = 2.5

/** The places between the first and the last, with corners put in where they are far enough from all others. */
function withCorners(line: MeasuredLine, places: readonly Millimetres[], apart: Millimetres): Millimetres[] {
  return places.flatMap((place, index) => {
    const next = places[index + 1]
    if (next === undefined) return []
    const corners: Millimetres[] = []
    let last = place
    for (let at = place + apart; at <= next - apart; at += STEP) {
      if (at - last < apart || !isCorner(line, at)) continue
      corners.push(at)
      last = at
    }
    return index === 0 ? corners : [place, ...corners]
  })
}

/** Whether the line turns sharply at a place, and less a step before and after it. */
function isCorner(line: MeasuredLine, at: Millimetres): boolean {
  const turn = line.turnAt(at, CORNER_WIDTH)
  return (
    turn > CORNER &&
    turn >= line.turnAt(at - STEP, CORNER_WIDTH) &&
    turn >= line.turnAt(at + STEP, CORNER_WIDTH)
  )
}

/** The parts of the line that runs cover. Where a ring is cut only by its own beginning, the last run goes on into the
 *  first, so that the dashes do not show where the drawing of it began. */
function stretchesOf(line: MeasuredLine, runs: readonly Stretch[]): MM[][] {
  const parts = runs.map(([from, to]) => line.slice(from, to))
  const [first, last] = [runs[0], runs.at(-1)]
  if (!first || !last || runs.length < 2 || !isClosedLine(line)) return parts
  if (first[0] > 0 || last[1] < line.length) return parts
  return [...parts.slice(1, -1), [...(parts.at(-1) ?? []), ...(parts[0] ?? []).slice(1)]]
}
