import type { MeasuredLine } from '../geometry/measured-line'
import type { Millimetres, MM } from '../units'
import type { Ink, Mark } from './display-list'
import { favouredWay, ROUNDING, straightestPlace, straightPlaceNear, type Stretch } from './place-along'
import { capHeight, measureText } from './text-metrics'

/** The question mark set in a line of questioned identity. Source of the size: 8 points, FGDC as cited in
 *  symbolization.md section 2; the interval is ours. */
const query = { size: 2.8, weight: 700, interval: 20, gap: 0.55 } as const
const width: Millimetres = measureText('?', query.size, query.weight)
const height: Millimetres = capHeight(query.size, query.weight)

/** Most room that a question mark takes: on a line that runs up the page. */
const MOST_ROOM: Millimetres = Math.hypot(width, height) + 2 * query.gap

/** Room that an upright question mark takes along a line at a place: less on a level line than on an upright one. */
export function queryRoom(line: MeasuredLine, at: Millimetres): Millimetres {
  const [dx, dy] = line.directionAt(at, MOST_ROOM)
  return Math.min(width / Math.abs(dx), height / Math.abs(dy)) + 2 * query.gap
}

/** Where question marks stand: in the middles of free stretches, at about even intervals, off sharp bends; at least one
 *  wherever there is any room. */
export function placeQueries(
  line: MeasuredLine,
  { within: whole, taken }: { within: Stretch; taken: readonly Stretch[] },
): Millimetres[] {
  const within = withoutStubs(whole)
  const gaps = gapsBetween(within, taken).filter(([from, to]) => to - from >= MOST_ROOM - ROUNDING)
  const places = gaps.flatMap(shared)
  const wanted = Math.max(1, Math.round((within[1] - within[0]) / query.interval))
  const chosen = everyNth(places, wanted, favouredWay(line))
  const good = chosen.flatMap((middle) => {
    const gap = gaps.find(([from, to]) => middle > from && middle < to)
    const slack = gap ? Math.min(middle - gap[0], gap[1] - middle) - MOST_ROOM / 2 : 0
    return straightPlaceNear(line, middle, { size: MOST_ROOM, slack: Math.max(0, slack) }) ?? []
  })
  if (good.length > 0) return good
  const room = Math.min(MOST_ROOM, within[1] - within[0])
  return [straightestPlace(line, { size: room, within, taken }) ?? []].flat()
}

/** Line that is left between a question mark and the end of the line: less would be a stub. */
const STUB: Millimetres = 1.2

const withoutStubs = ([from, to]: Stretch): Stretch =>
  to - from >= MOST_ROOM + 2 * STUB ? [from + STUB, to - STUB] : [from, to]

/** The free stretches. */
function gapsBetween([from, to]: Stretch, taken: readonly Stretch[]): Stretch[] {
  const edges = [from, ...taken.toSorted((a, b) => a[0] - b[0]).flat(), to]
  return edges.flatMap((start, index): Stretch[] => {
    const end = edges[index + 1]
    return index % 2 === 0 && end !== undefined && end > start ? [[start, end]] : []
  })
}

/** Even places in one free stretch. */
function shared([from, to]: Stretch): Millimetres[] {
  const count = Math.max(1, Math.round((to - from) / query.interval))
  return Array.from({ length: count }, (_, index) => from + ((to - from) * (index + 0.5)) / count)
}

/** Some of several places, spread evenly and symmetrically; all where no more are there than wanted. */
function everyNth(places: readonly Millimetres[], wanted: number, favoured: 1 | -1): Millimetres[] {
  if (places.length <= wanted) return [...places]
  const middle = (places.length - 1) / 2
  const even = Array.from({ length: wanted }, (_, index) => ((index + 0.5) * places.length) / wanted - 0.5)
  const indices = even.map((share) => {
    const isBefore = share === middle ? favoured === 1 : share < middle
    return isBefore ? Math.ceil(share - 0.5) : Math.floor(share + 0.5)
  })
  return [...new Set(indices)].flatMap((index) => places[index] ?? [])
}

/** The mark itself. */
export const queryMark = (at: MM, ink: Ink): Mark => ({
  mark: 'text',
  text: '?',
  at,
  size: query.size,
  weight: query.weight,
  ink,
  align: 'middle',
})
