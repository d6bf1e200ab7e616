import type { MeasuredLine } from '../geometry/measured-line'
import type { Millimetres } from '../units'
import type { Decoration, LineEnd, LineSymbol } from './definition'
import { faultDip } from './definitions/faults'
import { placeHeads, type PlacedHead } from './draw-plunge'
import type { LineDrawing } from './line-drawing'
import { placeAlong, straightestPlace, straightPlaceNear, type Stretch } from './place-along'
import { placeQueries, queryRoom } from './place-queries'

/** A decoration in its place. */
export interface PlacedDecoration {
  /** Distance from the line's start. */
  at: Millimetres
  /** The end it stands near. */
  end: LineEnd
  /** Share of its full size; below 1 on a line too short for it. */
  scale: number
}

/** What stands where on a line. */
export interface LineLayout {
  heads: readonly PlacedHead[]
  /** The part that is stroked: all of it, but for arrowheads at its ends. */
  drawn: Stretch
  decorations: readonly PlacedDecoration[]
  /** Where the arrow of a fault's dip stands. */
  dipAt: Millimetres | undefined
  /** Middles of question marks. */
  queries: readonly Millimetres[]
}

/** Smallest share of its size in which a decoration is still drawn, on a line that is too short for the whole. */
const LEAST_SCALE = 0.6

/** Shares out a line: the arrowheads at its ends, the arrow of the dip at its middle, decorations, and question marks between
 *  them. Where there is no room for all, doubt must show before what the line is, and that before its dip.
 *  Depends on the whole line and nothing else, so that it is the same in every view, tile and print at one size. */
export function layOutLine(line: MeasuredLine, symbol: LineSymbol, drawing: LineDrawing): LineLayout {
  const heads = placeHeads(line, drawing.plunge ?? [])
  const lengthAt = (end: LineEnd, of: 'covers' | 'room') => heads.find((head) => head.end === end)?.[of] ?? 0
  const stretchBeside = (of: 'covers' | 'room'): Stretch => {
    const [first, last] = [lengthAt('start', of), lengthAt('end', of)]
    // On a line too short for both, what is left between them is nothing, but in the same place from either end.
    const fit = Math.min(1, line.length / Math.max(first + last, line.length))
    return [first * fit, line.length - last * fit]
  }
  const [drawn, within] = [stretchBeside('covers'), stretchBeside('room')]

  const decorate = (dipAt: Millimetres | undefined, taken: readonly Stretch[]) =>
    symbol.decoration ? placeDecoration(line, symbol.decoration, { within, taken, dipAt }) : []
  const middle = drawing.dip && middlePlace(line, within)
  const besideDip = decorate(middle, dipSpan(middle))
  const dipAt = symbol.decoration && besideDip.length === 0 ? undefined : middle
  const decorations = dipAt === middle ? besideDip : decorate(undefined, [])
  const layout = { heads, drawn, decorations, dipAt, queries: [] }
  if (drawing.identity === 'certain') return layout

  const size = symbol.decoration?.size ?? 0
  const taken = [...decorations.map(({ at, scale }) => around(at, size * scale)), ...dipSpan(dipAt)]
  const queries = placeQueries(line, { within, taken })
  if (queries.length > 0) return { ...layout, queries }
  const alone = placeQueries(line, { within: drawn, taken: [] })
  const queried = alone.map((at) => around(at, queryRoom(line, at)))
  return { ...layout, decorations: decorate(alone[0], queried), dipAt: undefined, queries: alone }
}

const dipSpan = (at: Millimetres | undefined): Stretch[] =>
  at === undefined ? [] : [around(at, faultDip.size)]

const around = (at: Millimetres, size: Millimetres): Stretch => [at - size / 2, at + size / 2]

/** The straight place nearest to the middle. */
function middlePlace(line: MeasuredLine, within: Stretch): Millimetres | undefined {
  const [from, to] = within
  const size = Math.min(faultDip.size, to - from)
  const slack = (to - from - size) / 2
  return (
    straightPlaceNear(line, (from + to) / 2, { size, bearingOver: faultDip.bearingOver, slack }) ??
    straightestPlace(line, { size, within })
  )
}

function placeDecoration(
  line: MeasuredLine,
  { size, placed, bearingOver }: Decoration,
  { within, taken, dipAt }: { within: Stretch; taken: readonly Stretch[]; dipAt: Millimetres | undefined },
): PlacedDecoration[] {
  const [from, to] = within
  const isAtEnds = 'fromEnds' in placed
  const scale = Math.min(1, (to - from) / (isAtEnds ? 2.5 * size : size))
  if (scale < LEAST_SCALE) return []
  const fitted = size * scale
  const nearest = (at: Millimetres): LineEnd => (at < (from + to) / 2 ? 'start' : 'end')
  if (!isAtEnds) {
    const sharing = {
      size: fitted,
      bearingOver,
      interval: placed.every,
      within,
      taken,
      even: dipAt !== undefined,
    }
    return placeAlong(line, sharing).map((at) => ({ at, end: nearest(at), scale }))
  }
  const inset = Math.max(fitted / 2, Math.min(placed.fromEnds, (to - from) / 4))
  const slack = Math.min(inset - fitted / 2, (to - from) / 2 - inset - fitted / 2)
  return [from + inset, to - inset].flatMap((middle, index): PlacedDecoration[] => {
    const half: Stretch = index === 0 ? [from, from + 2 * inset] : [to - 2 * inset, to]
    const at =
      straightPlaceNear(line, middle, { size: fitted, bearingOver, slack: Math.max(0, slack), taken }) ??
      straightestPlace(line, { size: fitted, within: half, taken })
    return at === undefined ? [] : [{ at, end: index === 0 ? 'start' : 'end', scale }]
  })
}
