import type { XY } from '@shared/units'
import type { Line } from './contours'
import type { Extent } from './lattice'

/** A part of a line between two places where lines meet, walked one way. */
export interface Arc {
  places: Line
  /** Index of the line that it is part of; −1 for the neatline. */
  line: number
  /** Whether it is all of its line. */
  isWhole: boolean
}

/** An area that lines enclose: its outer ring, counter-clockwise, its first place repeated at the end. What lies inside it as a hole is not known here. */
export interface FaceRing {
  ring: Line
  area: number
  arcs: readonly Arc[]
}

interface Node {
  leaving: { arc: Arc; angle: number }[]
}

const keyOf = ([x, y]: XY): string => `${x} ${y}`

/** The areas that lines enclose within a neatline. Lines must meet in shared vertices, as those of the truth do.
 *  Source: walking each arc's left side, taking the next arc clockwise at every node; common practice. */
export function faceRings(lines: readonly Line[], extent: Extent): FaceRing[] {
  const all = [...lines.map((line, index) => ({ line, index })), ...neatline(lines, extent)]
  const meetings = countMeetings(all.map(({ line }) => line))
  const nodes = new Map<string, Node>()
  for (const { line, index } of all) {
    for (const arc of arcsOf(line, index, meetings)) {
      for (const way of [arc, { ...arc, places: arc.places.toReversed() }]) leave(nodes, way)
    }
  }
  for (const node of nodes.values()) node.leaving.sort((a, b) => a.angle - b.angle)
  return walkAll(nodes).filter(({ area }) => area > 0)
}

function leave(nodes: Map<string, Node>, arc: Arc): void {
  const [from, to] = [arc.places[0], arc.places[1]]
  if (!from || !to) return
  const node = nodes.get(keyOf(from)) ?? { leaving: [] }
  nodes.set(keyOf(from), node)
  node.leaving.push({ arc, angle: Math.atan2(to[1] - from[1], to[0] - from[0]) })
}

/** The four edges of the neatline, with a vertex wherever a line ends there. */
function neatline(lines: readonly Line[], { origin: [west, south], width, height }: Extent) {
  const [east, north] = [west + width, south + height]
  const ends = lines.flatMap((line) => [line[0], line.at(-1)]).filter((end) => end !== undefined)
  const edge = (from: XY, to: XY, isOn: (at: XY) => boolean): { line: Line; index: number } => {
    const along = ([x, y]: XY) => Math.abs(x - from[0]) + Math.abs(y - from[1])
    const between = ends.filter((at) => isOn(at) && along(at) > 0 && along(at) < along(to))
    const sorted = new Map(between.sort((a, b) => along(a) - along(b)).map((at) => [keyOf(at), at]))
    return { line: [from, ...sorted.values(), to], index: -1 }
  }
  return [
    edge([west, south], [east, south], ([, y]) => y === south),
    edge([east, south], [east, north], ([x]) => x === east),
    edge([east, north], [west, north], ([, y]) => y === north),
    edge([west, north], [west, south], ([x]) => x === west),
  ]
}

/** How many arcs end at a vertex, counting each line that passes it twice and each that ends there once. */
function countMeetings(lines: readonly Line[]): Map<string, number> {
  const counts = new Map<string, number>()
  const add = (at: XY | undefined, count: number) => {
    if (at) counts.set(keyOf(at), (counts.get(keyOf(at)) ?? 0) + count)
  }
  for (const line of lines) {
    line.forEach((at, index) => add(at, index === 0 || index === line.length - 1 ? 1 : 2))
  }
  return counts
}

function arcsOf(line: Line, index: number, meetings: ReadonlyMap<string, number>): Arc[] {
  const arcs: Arc[] = []
  let places: Line = []
  line.forEach((at, place) => {
    places.push(at)
    const isEnd = place === line.length - 1
    if (place === 0 || (!isEnd && (meetings.get(keyOf(at)) ?? 0) <= 2)) return
    arcs.push({ places, line: index, isWhole: isEnd && arcs.length === 0 })
    places = [at]
  })
  return arcs
}

function walkAll(nodes: ReadonlyMap<string, Node>): FaceRing[] {
  const walked = new Set<Arc>()
  const rings: FaceRing[] = []
  for (const { leaving } of nodes.values()) {
    for (const { arc } of leaving) if (!walked.has(arc)) rings.push(walk(arc, nodes, walked))
  }
  return rings
}

/** From an arc on with the area at its left, until it comes round. */
function walk(start: Arc, nodes: ReadonlyMap<string, Node>, walked: Set<Arc>): FaceRing {
  const arcs: Arc[] = []
  for (let arc: Arc | undefined = start; arc && !walked.has(arc); arc = nextOf(arc, nodes)) {
    walked.add(arc)
    arcs.push(arc)
  }
  const ring = arcs.flatMap(({ places }, index) => (index === 0 ? places : places.slice(1)))
  return { ring, arcs, area: signedArea(ring) }
}

/** At the end of an arc: the one that leaves next clockwise from the way back. */
function nextOf({ places }: Arc, nodes: ReadonlyMap<string, Node>): Arc | undefined {
  const [end, before] = [places.at(-1), places.at(-2)]
  if (!end || !before) return undefined
  const leaving = nodes.get(keyOf(end))?.leaving ?? []
  const back = Math.atan2(before[1] - end[1], before[0] - end[0])
  const next = leaving.findLast(({ angle }) => angle < back) ?? leaving.at(-1)
  return next?.arc
}

function signedArea(ring: Line): number {
  const [fromX, fromY] = ring[0] ?? [0, 0]
  return ring.reduce((sum, [x, y], index) => {
    const [nextX, nextY] = ring[(index + 1) % ring.length] ?? [x, y]
    return sum + ((x - fromX) * (nextY - fromY) - (nextX - fromX) * (y - fromY)) / 2
  }, 0)
}

/** A place well inside a ring: the middle of the widest gap on a few lines across it. */
export function placeInside(ring: Line): XY {
  const [low, high] = [Math.min(...ring.map(([, y]) => y)), Math.max(...ring.map(([, y]) => y))]
  let best = { width: -1, at: ring[0] ?? ([0, 0] as XY) }
  for (let step = 1; step < 16; step++) {
    const y = low + ((high - low) * step) / 16
    const crossings = ring
      .flatMap(([x1, y1], index) => {
        const [x2, y2] = ring[(index + 1) % ring.length] ?? [x1, y1]
        return y1 > y !== y2 > y ? [x1 + ((y - y1) / (y2 - y1)) * (x2 - x1)] : []
      })
      .sort((a, b) => a - b)
    for (let index = 0; index + 1 < crossings.length; index += 2) {
      const [from, to] = [crossings[index] ?? 0, crossings[index + 1] ?? 0]
      if (to - from > best.width) best = { width: to - from, at: [(from + to) / 2, y] }
    }
  }
  return best.at
}
