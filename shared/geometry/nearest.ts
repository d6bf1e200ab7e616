import { gridDistance } from './bearings'
import type { Metres, XY } from '../units'

/** The place of a line that is nearest to a point. */
export interface NearestPlace {
  at: XY
  distance: Metres
  /** Index of the vertex that the place's segment begins with. */
  segment: number
}

/** Nearest place of a line (at least one vertex) to a point, sheet metres.
 *  Source: foot of the perpendicular, held within the segment; common practice. */
export function nearestOnLine(line: readonly XY[], point: XY): NearestPlace {
  const first = line[0] ?? point
  let best: NearestPlace = { at: first, distance: gridDistance(first, point), segment: 0 }
  for (let segment = 0; segment + 1 < line.length; segment++) {
    const at = nearestOnSegment(line[segment] ?? first, line[segment + 1] ?? first, point)
    const distance = gridDistance(at, point)
    if (distance < best.distance) best = { at, distance, segment }
  }
  return best
}

/** Nearest place of a segment to a point, sheet metres. Source: as above. */
export function nearestOnSegment(a: XY, b: XY, point: XY): XY {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]]
  const square = dx * dx + dy * dy
  if (square === 0) return a
  const share = ((point[0] - a[0]) * dx + (point[1] - a[1]) * dy) / square
  if (share <= 0) return a
  if (share >= 1) return b
  return [a[0] + dx * share, a[1] + dy * share]
}

/** Index of the nearest vertex within a distance; undefined where none is. */
export function nearestVertex(line: readonly XY[], point: XY, within: Metres): number | undefined {
  let best: number | undefined
  let distance = within
  line.forEach((vertex, index) => {
    const here = gridDistance(vertex, point)
    if (here <= distance) {
      best = index
      distance = here
    }
  })
  return best
}
