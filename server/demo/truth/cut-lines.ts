import type { Metres, XY } from '@shared/units'
import type { Line } from './contours'
import { bisect, ontoBothZero, ontoZero, type Surface } from './vectors'

/** A piece of a line on one side of a surface's zero, with the places where it was cut. */
export interface Piece {
  line: Line
  /** On the positive side of the cutting surface. */
  positive: boolean
}

/** Cuts a level line of `own` where `cutter` is zero. Cut ends lie exactly on both. */
export function cutLine(line: Line, own: Surface, cutter: Surface): { pieces: Piece[]; nodes: XY[] } {
  const pieces: Piece[] = []
  const nodes: XY[] = []
  let current: XY[] = []
  let positive = cutter(line[0] ?? [0, 0]) > 0
  withHiddenCrossings(line, own, cutter).forEach((place, index, places) => {
    const value = cutter(place)
    const before = places[index - 1]
    if (before && value > 0 !== positive) {
      const node = nodeBetween(before, place, own, cutter)
      nodes.push(node)
      pieces.push({ line: [...current, node], positive })
      current = [node]
      positive = value > 0
    }
    current.push(place)
  })
  pieces.push({ line: current, positive })
  return { pieces: joinClosed(line, pieces), nodes }
}

/** The line with a further place in each piece whose middle lies across the cutter though both its ends do not. */
function withHiddenCrossings(line: Line, own: Surface, cutter: Surface): Line {
  return line.flatMap((place, index) => {
    const next = line[index + 1]
    if (!next) return [place]
    const middle: XY = [(place[0] + next[0]) / 2, (place[1] + next[1]) / 2]
    const [from, to, between] = [cutter(place) > 0, cutter(next) > 0, cutter(middle) > 0]
    return from === to && between !== from ? [place, ontoZero(own, middle)] : [place]
  })
}

/** Where a piece of a line of `own` passes the cutter's zero, near the piece and exactly on both. */
function nodeBetween(from: XY, to: XY, own: Surface, cutter: Surface): XY {
  const at = (share: number): XY => [from[0] + (to[0] - from[0]) * share, from[1] + (to[1] - from[1]) * share]
  const [before, after] = [cutter(from), cutter(to)]
  const start = at(before / (before - after))
  const node = ontoBothZero(own, cutter, start)
  const length = Math.hypot(to[0] - from[0], to[1] - from[1])
  if (Math.hypot(node[0] - start[0], node[1] - start[1]) <= length) return node
  // Where the two nearly touch, Newton's method may run off to another place at which they meet.
  return ontoZero(own, at(bisect((share) => cutter(ontoZero(own, at(share))), 0, 1)))
}

/** The first and last piece of a closed line are one piece if the line was cut at all. */
function joinClosed(line: Line, pieces: Piece[]): Piece[] {
  const [first, last] = [pieces[0], pieces.at(-1)]
  if (pieces.length < 2 || !first || !last || !isClosed(line)) return pieces
  return [...pieces.slice(1, -1), { ...first, line: [...last.line, ...first.line.slice(1)] }]
}

export const isClosed = (line: Line): boolean => {
  const [first, last] = [line[0], line.at(-1)]
  return line.length > 3 && first !== undefined && last !== undefined && isSame(first, last)
}

export const isSame = (a: XY, b: XY): boolean => a[0] === b[0] && a[1] === b[1]

/** Nodes farther than this from a line belong to another. */
const NODE_REACH: Metres = 1

/** The line with those nodes of other lines that lie on it as vertices, each in its nearest segment. */
export function withNodes(line: Line, nodes: readonly XY[]): Line {
  const places = nodes
    .flatMap((node) => {
      const { distance, at } = positionAlong(line, node)
      return distance < NODE_REACH ? [{ node, at }] : []
    })
    .sort((a, b) => a.at - b.at)
  const result: XY[] = []
  line.forEach((place, index) => {
    result.push(place)
    for (const { node, at } of places) {
      if (at >= index && at < index + 1 && index < line.length - 1 && !isSame(node, place)) result.push(node)
    }
  })
  return result
}

/** Number of the nearest segment plus the fraction along it, and the distance from it. */
function positionAlong(line: Line, place: XY): { distance: Metres; at: number } {
  let nearest = { distance: Infinity, at: 0 }
  line.slice(1).forEach((to, index) => {
    const from = line[index] ?? to
    const fraction = Math.min(0.999999, fractionAlong(from, to, place))
    const distance = distanceTo(from, to, place)
    if (distance < nearest.distance) nearest = { distance, at: index + fraction }
  })
  return nearest
}

function fractionAlong(from: XY, to: XY, place: XY): number {
  const [dx, dy] = [to[0] - from[0], to[1] - from[1]]
  const square = dx * dx + dy * dy
  if (square === 0) return 0
  return Math.max(0, Math.min(1, ((place[0] - from[0]) * dx + (place[1] - from[1]) * dy) / square))
}

/** Distance of a place from a segment. */
export function distanceTo(from: XY, to: XY, place: XY): Metres {
  const fraction = fractionAlong(from, to, place)
  return Math.hypot(
    place[0] - from[0] - (to[0] - from[0]) * fraction,
    place[1] - from[1] - (to[1] - from[1]) * fraction,
  )
}

/** The line with fewer vertices: none is farther from the new line than the tolerance, no piece is longer than
 *  `longest`, and the vertices in `kept` stay. Source: Douglas and Peucker 1973. */
export function thin(line: Line, kept: readonly XY[], tolerance: Metres, longest: Metres): Line {
  const fixed = new Set(kept.map(String))
  const breaks = line.flatMap((place, index) =>
    index === 0 || index === line.length - 1 || fixed.has(String(place)) ? [index] : [],
  )
  const middle = Math.floor(line.length / 2)
  // A closed line needs a second place to measure from.
  const starts = breaks.length === 2 && isClosed(line) ? [0, middle, line.length - 1] : breaks
  const runs = starts
    .slice(1)
    .map((end, index) => thinRun(line.slice(starts[index], end + 1), tolerance, longest))
  return [...line.slice(0, 1), ...runs.flatMap((run) => run.slice(1))]
}

function thinRun(run: Line, tolerance: Metres, longest: Metres): Line {
  const [from, to] = [run[0], run.at(-1)]
  if (!from || !to || run.length < 3) return run
  const distances = run.map((place) => distanceTo(from, to, place))
  const farthest = Math.max(...distances)
  const isLong = Math.hypot(to[0] - from[0], to[1] - from[1]) > longest
  if (farthest <= tolerance && !isLong) return [from, to]
  const at = farthest > tolerance ? distances.indexOf(farthest) : Math.floor(run.length / 2)
  return [
    ...thinRun(run.slice(0, at + 1), tolerance, longest),
    ...thinRun(run.slice(at), tolerance, longest).slice(1),
  ]
}

/** Length of a line, metres. */
export function lengthOf(line: Line): Metres {
  let length = 0
  for (let index = 1; index < line.length; index++) {
    const [from, to] = [line[index - 1], line[index]]
    if (from && to) length += Math.hypot(to[0] - from[0], to[1] - from[1])
  }
  return length
}
