import { measureLine, type MeasuredLine } from '../geometry/measured-line'
import type { Identity, LocationConfidence } from '../items/confidence'
import type { Degrees, Millimetres, MM } from '../units'
import type { LineAttributes, LineSymbol } from './definition'
import { plungeHead, plungeHeadMarks, plungeNumeral } from './definitions/folds'
import type { DisplayList, Mark, StrokeMark } from './display-list'
import { numeralBeside } from './numeral'
import { polyline } from './paths'
import { placeAlong, type Stretch } from './place-along'
import { alongDirection, placeMarks } from './place-marks'
import { measureText } from './text-metrics'

/** Everything about a line item that its drawing depends on. */
export interface LineDrawing {
  locationConfidence: LocationConfidence
  identity: Identity
  attributes: LineAttributes
  /** The plunge of an axis and the end of the line that is its down-plunge end; `figure` false leaves the numeral out. */
  plunge?: { degrees: Degrees; end: 'start' | 'end'; figure: boolean }
}

/** The question mark set in a line of questioned identity. Source of the size: 8 points, FGDC as cited in
 *  symbolization.md section 2; the interval is ours. */
const query = { size: 2.8, weight: 700, interval: 20, gap: 0.5 } as const
const queryWidth: Millimetres = measureText('?', query.size, query.weight) + 2 * query.gap

/** Draws a line symbol along a line, in time proportional to its vertices.
 *  @param points the line on the drawing, millimetres, at least two */
export function drawLine(symbol: LineSymbol, points: readonly MM[], drawing: LineDrawing): DisplayList {
  const line = measureLine(points)
  if (line.length === 0) return []
  const drawn = strokeStretch(line, drawing)
  const { decorations, queries } = placesOn(line, drawn, symbol, drawing)
  const head = plungeArrow(line, drawing)
  return [
    ...strokes(symbol, line, drawing, { between: betweenQueries(drawn, queries), decorations }),
    ...decorations.flatMap((at) => decorate(symbol, line, at, drawing)),
    ...queries.map((at) => queryMark(symbol, line.pointAt(at))),
    ...head,
    ...plungeFigure(symbol, line, drawing, head),
  ]
}

/** The part of the line that its stroke covers: all of it, but for the plunge arrowhead. */
function strokeStretch(line: MeasuredLine, { plunge }: LineDrawing): Stretch {
  const covered = plunge ? Math.min(line.length, plungeHead.length - plungeHead.notch) : 0
  return plunge?.end === 'start' ? [covered, line.length] : [0, line.length - covered]
}

/** Where decorations and question marks stand. Decorations come first, unless that leaves no room for a single question
 *  mark: doubt must show. */
function placesOn(line: MeasuredLine, drawn: Stretch, symbol: LineSymbol, drawing: LineDrawing) {
  const within = drawing.plunge ? roomBesideHead(line, drawing.plunge.end) : drawn
  const decorationsClearOf = (taken: readonly Stretch[]) =>
    symbol.decoration ? placeAlong(line, { ...symbol.decoration, within, taken }) : []
  const queriesClearOf = (taken: readonly Stretch[]) =>
    placeAlong(line, { size: queryWidth, interval: query.interval, within: drawn, taken })
  const spans = (places: readonly Millimetres[], size: Millimetres): Stretch[] =>
    places.map((at) => [at - size / 2, at + size / 2])

  const decorations = decorationsClearOf([])
  if (drawing.identity === 'certain') return { decorations, queries: [] }
  const queries = queriesClearOf(spans(decorations, symbol.decoration?.size ?? 0))
  if (queries.length > 0) return { decorations, queries }
  const first = queriesClearOf([])
  return { decorations: decorationsClearOf(spans(first, queryWidth)), queries: first }
}

/** Decorations keep off the plunge arrowhead and its figure. */
function roomBesideHead(line: MeasuredLine, end: 'start' | 'end'): Stretch {
  const room = Math.min(line.length, plungeHead.length + 1)
  return end === 'start' ? [room, line.length] : [0, line.length - room]
}

/** The stretches between the question marks. */
function betweenQueries([from, to]: Stretch, queries: readonly Millimetres[]): Stretch[] {
  const edges = [from, ...queries.flatMap((at) => [at - queryWidth / 2, at + queryWidth / 2]), to]
  return edges.flatMap((start, index): Stretch[] => {
    const end = edges[index + 1]
    return index % 2 === 0 && end !== undefined && end > start ? [[start, end]] : []
  })
}

function strokes(
  symbol: LineSymbol,
  line: MeasuredLine,
  { locationConfidence }: LineDrawing,
  { between, decorations }: { between: readonly Stretch[]; decorations: readonly Millimetres[] },
): Mark[] {
  const stroke = symbol.strokes[locationConfidence]
  const reach = (stroke.dash?.[0] ?? 0) / 2
  const runs = stroke.dash ? between.flatMap((stretch) => runsBetween(stretch, decorations, reach)) : between
  const path = runs.flatMap(([from, to]) => polyline(line.slice(from, to)))
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

function decorate(
  symbol: LineSymbol,
  line: MeasuredLine,
  at: Millimetres,
  { attributes }: LineDrawing,
): Mark[] {
  if (!symbol.decoration) return []
  const direction = line.directionAt(at, symbol.decoration.bearingOver)
  return placeMarks(symbol.decoration.marks(attributes), alongDirection(direction, line.pointAt(at)))
}

const queryMark = (symbol: LineSymbol, at: MM): Mark => ({
  mark: 'text',
  text: '?',
  at,
  size: query.size,
  weight: query.weight,
  ink: symbol.ink,
  align: 'middle',
})

/** The arrowhead at the down-plunge end: its tip is the line's end, its axis the chord of the line beneath it. */
function plungeArrow(line: MeasuredLine, { plunge }: LineDrawing): Mark[] {
  if (!plunge) return []
  return placeMarks(
    plungeHeadMarks,
    alongDirection(outwardDirection(line, plunge.end), tipOf(line, plunge.end)),
  )
}

const tipOf = (line: MeasuredLine, end: 'start' | 'end'): MM => line.pointAt(end === 'end' ? line.length : 0)

function outwardDirection(line: MeasuredLine, end: 'start' | 'end'): MM {
  const half = plungeHead.length / 2
  const [x, y] = line.directionAt(end === 'end' ? line.length - half : half, plungeHead.length)
  return end === 'end' ? [x, y] : [-x, -y]
}

/** The plunge in whole degrees, upright beside the arrowhead: on its eastern side, or below an arrow that runs east or
 *  west; on the other side where the line itself bends into that place. */
function plungeFigure(
  symbol: LineSymbol,
  line: MeasuredLine,
  { plunge }: LineDrawing,
  head: readonly Mark[],
): Mark[] {
  if (!plunge?.figure) return []
  const [dx, dy] = outwardDirection(line, plunge.end)
  const [x, y] = tipOf(line, plunge.end)
  const from: MM = [x - dx * FIGURE_BEHIND_TIP, y - dy * FIGURE_BEHIND_TIP]
  const ink = [...head, traceNear(symbol, line, plunge.end)]
  const text = String(Math.round(plunge.degrees))
  const beside = (away: MM) =>
    numeralBeside(text, { from, away, ink, furthest: FURTHEST_FIGURE }, { ...plungeNumeral, ink: symbol.ink })
  const rightIsEast = Math.abs(dy) < 1e-6 ? dx > 0 : dy > 0
  const east = beside(rightIsEast ? [dy, -dx] : [-dy, dx])
  const west = beside(rightIsEast ? [-dy, dx] : [dy, -dx])
  const further = Math.hypot(east.at[0] - from[0], east.at[1] - from[1])
  const nearer = Math.hypot(west.at[0] - from[0], west.at[1] - from[1])
  return [further - nearer > WORTH_THE_OTHER_SIDE ? west : east]
}

/** From the tip back to where the figure stands beside the arrowhead. */
const FIGURE_BEHIND_TIP: Millimetres = plungeHead.length * 0.6
const FURTHEST_FIGURE: Millimetres = 9
/** Not a multiple of the search's step, so that rounding never decides between the sides. */
const WORTH_THE_OTHER_SIDE: Millimetres = 0.52

/** The stretch of the trace that a figure at its end could meet. */
function traceNear(symbol: LineSymbol, line: MeasuredLine, end: 'start' | 'end'): Mark {
  const reach = Math.min(line.length, FURTHEST_FIGURE + plungeHead.length)
  const [from, to] = end === 'end' ? [line.length - reach, line.length] : [0, reach]
  return {
    mark: 'stroke',
    path: polyline(line.slice(from, to)),
    width: symbol.strokes.certain.width,
    ink: symbol.ink,
  }
}
