import { measureLine, type MeasuredLine } from '../geometry/measured-line'
import type { Millimetres, MM } from '../units'
import type { Beneath, Decoration, LineSymbol } from './definition'
import { faultDip, faultDipMarks } from './definitions/faults'
import type { DisplayList, Mark } from './display-list'
import { plungeMarks } from './draw-plunge'
import type { LineDrawing } from './line-drawing'
import { layOutLine, type PlacedDecoration } from './line-layout'
import { lineStrokes } from './line-strokes'
import { numeralBeside } from './numeral'
import { polyline } from './paths'
import type { Stretch } from './place-along'
import { alongDirection, placeMarks } from './place-marks'
import { queryMark, queryRoom } from './place-queries'

/** Draws a line symbol along a line, in time proportional to its vertices.
 *  @param points the line on the drawing, millimetres, at least two */
export function drawLine(symbol: LineSymbol, points: readonly MM[], drawing: LineDrawing): DisplayList {
  const line = measureLine(points)
  if (line.length === 0) return []
  const { heads, drawn, decorations, dipAt, queries } = layOutLine(line, symbol, drawing)
  const between = betweenQueries(line, drawn, queries)
  const onDash = [...decorations.map(({ at }) => at), ...(dipAt === undefined ? [] : [dipAt])]
  const { ink } = symbol
  const decorated = decorations.flatMap((placed) => decorate(symbol, line, placed, drawing))
  return [
    ...lineStrokes(symbol, line, drawing, { between, onDash: onDash.toSorted((a, b) => a - b) }),
    ...decorated,
    ...queries.map((at) => queryMark(line.pointAt(at), ink)),
    ...plungeMarks(line, heads, { ink, width: symbol.strokes.certain.width }),
    ...(dipAt === undefined ? [] : dipMarks(symbol, line, dipAt, { drawing, decorated })),
  ]
}

/** The stretches between the question marks. */
function betweenQueries(line: MeasuredLine, [from, to]: Stretch, queries: readonly Millimetres[]): Stretch[] {
  const edges = [
    from,
    ...queries
      .toSorted((a, b) => a - b)
      .flatMap((at) => [at - queryRoom(line, at) / 2, at + queryRoom(line, at) / 2]),
    to,
  ]
  return edges.flatMap((start, index): Stretch[] => {
    const end = edges[index + 1]
    return index % 2 === 0 && end !== undefined && end > start ? [[start, end]] : []
  })
}

function decorate(
  { decoration }: LineSymbol,
  line: MeasuredLine,
  { at, end, scale }: PlacedDecoration,
  { attributes }: LineDrawing,
): Mark[] {
  if (!decoration) return []
  const place = placementOf(decoration, line, at)
  const beneath = { end, bow: bowAt(line, at, decoration) }
  return placeMarks(decoration.marks(attributes, beneath), ([x, y]) => place([x * scale, y * scale]))
}

/** How far the line bows to either side of a decoration's axis, as far as the decoration runs along it. */
function bowAt(line: MeasuredLine, at: Millimetres, { size, bearingOver }: Decoration): Beneath['bow'] {
  const [dx, dy] = line.directionAt(at, bearingOver)
  const [ox, oy] = line.pointAt(at)
  const lefts = line.slice(at - size / 2, at + size / 2).map(([x, y]) => (y - oy) * dx - (x - ox) * dy)
  return { left: Math.max(0, ...lefts), right: Math.max(0, ...lefts.map((left) => -left)) }
}

/** From a decoration's own frame to the drawing: straight along the line's direction, or bent with the line. */
function placementOf(
  { bearingOver, follows }: Pick<Decoration, 'bearingOver' | 'follows'>,
  line: MeasuredLine,
  at: Millimetres,
): (point: MM) => MM {
  const [dx, dy] = line.directionAt(at, bearingOver)
  if (!follows) return alongDirection([dx, dy], line.pointAt(at))
  return ([along, left]) => {
    const [x, y] = line.pointAt(at + along)
    return [x - left * dy, y + left * dx]
  }
}

/** The arrow of a fault's dip and its figure in whole degrees, upright beyond the arrow's tip. */
function dipMarks(
  symbol: LineSymbol,
  line: MeasuredLine,
  at: Millimetres,
  { drawing, decorated }: { drawing: LineDrawing; decorated: readonly Mark[] },
): Mark[] {
  const { dip, attributes } = drawing
  if (!dip) return []
  const degrees = Math.round(dip.degrees)
  const [dx, dy] = line.directionAt(at, faultDip.bearingOver)
  const from = line.pointAt(at)
  const arrow = placeMarks(faultDipMarks(attributes.side, degrees === 90), alongDirection([dx, dy], from))
  if (!dip.figure) return arrow
  const near = polyline(line.slice(at - FURTHEST_FIGURE, at + FURTHEST_FIGURE))
  const trace: Mark = { mark: 'stroke', path: near, width: symbol.strokes.certain.width, ink: symbol.ink }
  const away: MM = [-dy * attributes.side, dx * attributes.side]
  const place = { from, away, ink: [...arrow, ...decorated, trace], furthest: FURTHEST_FIGURE }
  return [...arrow, numeralBeside(String(degrees), place, { ...faultDip.numeral, ink: symbol.ink })]
}

const FURTHEST_FIGURE: Millimetres = 9
