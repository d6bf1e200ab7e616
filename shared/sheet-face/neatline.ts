import { toMm, type DrawingFrame } from '../symbols/frame'
import type { Path } from '../symbols/display-list'
import { polyline } from '../symbols/paths'
import type { Millimetres, MM, XY } from '../units'

/** A side of the map face by the way its outward normal points. */
export type Side = 'top' | 'bottom' | 'left' | 'right'

/** One straight piece of the neatline, sheet metres, with the side of the map face that it belongs to. */
export interface Edge {
  from: XY
  to: XY
  side: Side
}

/** The neatline without its repeated last point, counter-clockwise. */
export function openRing(neatline: readonly (readonly [number, number])[]): XY[] {
  const ring = neatline.map(([east, north]): XY => [east, north])
  const [first, last] = [ring[0], ring.at(-1)]
  if (first && last && ring.length > 1 && first[0] === last[0] && first[1] === last[1]) ring.pop()
  return signedArea(ring) < 0 ? ring.reverse() : ring
}

/** The pieces of a neatline in order. Curved sides of degree sheets come as many short pieces. */
export function neatlineEdges(neatline: readonly (readonly [number, number])[]): Edge[] {
  const ring = openRing(neatline)
  return ring
    .map((from, index) => {
      const to = ring[(index + 1) % ring.length] ?? from
      return { from, to, side: sideOf(to[0] - from[0], to[1] - from[1]) }
    })
    .filter(({ from, to }) => from[0] !== to[0] || from[1] !== to[1])
}

/** Corners of the map face: where the neatline passes from one side to another; clockwise order is not promised. */
export function neatlineCorners(edges: readonly Edge[]): { at: XY; sides: [Side, Side] }[] {
  return edges.flatMap((edge, index) => {
    const before = edges[(index - 1 + edges.length) % edges.length]
    return before && before.side !== edge.side
      ? [{ at: edge.from, sides: [before.side, edge.side] as [Side, Side] }]
      : []
  })
}

/** The neatline as a closed path in the drawing's millimetres; map marks are clipped to it. */
export const facePath = (
  sheet: { neatline: readonly (readonly [number, number])[] },
  frame: DrawingFrame,
): Path =>
  polyline(
    openRing(sheet.neatline).map((xy) => toMm(frame, xy)),
    true,
  )

/** A ring moved outward by a distance, corners mitred. The ring is open and counter-clockwise; sides of a map face
 *  turn gently or squarely, so that mitres stay short. */
export function offsetRing(ring: readonly MM[], distance: Millimetres): MM[] {
  return ring.map((point, index) => {
    const before = outward(ring.at(index - 1) ?? point, point)
    const after = outward(point, ring[(index + 1) % ring.length] ?? point)
    const half = 1 + before[0] * after[0] + before[1] * after[1]
    return [
      point[0] + (distance * (before[0] + after[0])) / half,
      point[1] + (distance * (before[1] + after[1])) / half,
    ]
  })
}

function outward(from: MM, to: MM): MM {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]) || 1
  return [(to[1] - from[1]) / length, (from[0] - to[0]) / length]
}

function sideOf(east: number, north: number): Side {
  if (Math.abs(east) >= Math.abs(north)) return east > 0 ? 'bottom' : 'top'
  return north > 0 ? 'right' : 'left'
}

function signedArea(ring: readonly XY[]): number {
  return ring.reduce((sum, [x, y], index) => {
    const [nextX, nextY] = ring[(index + 1) % ring.length] ?? [x, y]
    return sum + (x * nextY - nextX * y) / 2
  }, 0)
}
