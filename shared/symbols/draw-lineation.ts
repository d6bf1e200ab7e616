import type { LineationProperties } from '../items/points'
import { toRadians, type Degrees, type MM } from '../units'
import type { LineationCase, LineationSymbol } from './definition'
import { arrowEnds, lineations, plungeNumeral } from './definitions/lineations'
import type { DisplayList, Mark } from './display-list'
import { dipFigure, planeMarks } from './draw-attitude'
import { numeralBeside } from './numeral'
import { turnTo } from './paths'
import { placeMarks } from './place-marks'

/** What a lineation's drawing depends on. */
export type DrawnLineation = Pick<LineationProperties, 'type' | 'trend' | 'plunge' | 'plane'>

const FURTHEST_FIGURE = 6

/** Where the dip's figure may stand when an arrow takes its place: still on the down-dip side of the strike line. */
const DIP_FIGURE_TURNS: readonly Degrees[] = [0, 15, -15, 30, -30, 45, -45, 60, -60]

/** The symbol of a kind of line. */
export function lineationSymbolOf(type: LineationProperties['type']): LineationSymbol {
  const symbol = lineations.find((candidate) => candidate.type === type)
  if (!symbol) throw new RangeError(`There is no symbol for ${type}.`)
  return symbol
}

/** Which of its drawings a line gets, judged by the whole degrees that are printed. */
export function lineationCaseOf({ trend, plunge }: Pick<DrawnLineation, 'trend' | 'plunge'>): LineationCase {
  const shown = Math.round(plunge)
  if (trend === null || shown === 90) return 'vertical'
  return shown === 0 ? 'horizontal' : 'plunging'
}

/** Draws a lineation at its place, with the plane it lies on: both symbols share the place, and their figures keep clear of
 *  both and of one another. Drawn angle = trend − convergence, clockwise from the drawing's up.
 *  @param convergence of the grid at the place, degrees, clockwise positive */
export function drawLineation(line: DrawnLineation, at: MM, convergence: Degrees): DisplayList {
  const { plane } = line
  const arrow = lineMarks(line, at, convergence)
  if (!plane) return [...arrow, ...plungeFigure(line, { at, convergence, ink: arrow })]
  const ink = [...planeMarks(plane, at, convergence), ...arrow]
  const withPlunge = [...ink, ...plungeFigure(line, { at, convergence, ink })]
  return [...withPlunge, ...dipFigure(plane, { at, convergence, ink: withPlunge, turns: DIP_FIGURE_TURNS })]
}

/** The two ends of a lineation's arrow about its place, millimetres: what one aims at on a map beside the place itself.
 *  Undefined for a vertical line, which has none. */
export function arrowOf(line: DrawnLineation, convergence: Degrees): readonly [MM, MM] | undefined {
  const lineationCase = lineationCaseOf(line)
  if (lineationCase === 'vertical') return undefined
  const [from, to] = arrowEnds[lineationCase]
  const turn = turnTo(drawnTrend(line, convergence), [0, 0])
  return [turn(from), turn(to)]
}

const drawnTrend = (line: DrawnLineation, convergence: Degrees): Degrees =>
  lineationCaseOf(line) === 'vertical' ? 0 : (line.trend ?? 0) - convergence

const lineMarks = (line: DrawnLineation, at: MM, convergence: Degrees): Mark[] =>
  placeMarks(
    lineationSymbolOf(line.type).cases[lineationCaseOf(line)],
    turnTo(drawnTrend(line, convergence), at),
  )

/** The plunge's figure, beyond the arrow's head; none for horizontal and vertical lines, whose symbols say it. */
function plungeFigure(
  line: DrawnLineation,
  { at, convergence, ink }: { at: MM; convergence: Degrees; ink: readonly Mark[] },
): Mark[] {
  if (lineationCaseOf(line) !== 'plunging') return []
  const trend = drawnTrend(line, convergence)
  const away: MM = [Math.sin(toRadians(trend)), Math.cos(toRadians(trend))]
  const place = { from: turnTo(trend, at)(arrowEnds.plunging[1]), away, ink, furthest: FURTHEST_FIGURE }
  return [numeralBeside(String(Math.round(line.plunge)), place, { ...plungeNumeral, ink: 'black' })]
}
