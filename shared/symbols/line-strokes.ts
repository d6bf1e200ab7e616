import type { MeasuredLine } from '../geometry/measured-line'
import type { Millimetres, MM } from '../units'
import type { LineSymbol } from './definition'
import type { Mark, StrokeMark } from './display-list'
import type { LineDrawing } from './line-drawing'
import { polyline } from './paths'
import { isClosedLine, type Stretch } from './place-along'

/** A line's own strokes.
 *  @param between the stretches to draw
 *  @param decorations places that stand on a dash */
export function lineStrokes(
  symbol: LineSymbol,
  line: MeasuredLine,
  { locationConfidence }: LineDrawing,
  { between, decorations }: { between: readonly Stretch[]; decorations: readonly Millimetres[] },
): Mark[] {
  const stroke = symbol.strokes[locationConfidence]
  const reach = (stroke.dash?.[0] ?? 0) / 2
  const runs = stroke.dash ? between.flatMap((stretch) => runsBetween(stretch, decorations, reach)) : between
  const path = stretchesOf(line, runs).flatMap((points) => polyline(points))
  if (path.length === 0) return []
  const mark: StrokeMark = { mark: 'stroke', path, ink: symbol.ink, ...stroke }
  if (symbol.core === undefined) return [mark]
  return [mark, { ...mark, ...symbol.core }]
}

/** A dashed stretch in runs from one decoration to the next, each reaching past it by half a dash: as runs start and end
 *  in a dash, every decoration stands on one and none over a gap. */
function runsBetween(
  [from, to]: Stretch,
  decorations: readonly Millimetres[],
  reach: Millimetres,
): Stretch[] {
  const inside = decorations.filter((at) => at > from && at < to)
  const ends = [...inside.map((at) => Math.min(to, at + reach)), to]
  return [from, ...inside.map((at) => Math.max(from, at - reach))].map((start, index) => [
    start,
    ends[index] ?? to,
  ])
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
