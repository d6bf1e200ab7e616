import type { Metres, XY } from '../units'
import { gridDistance } from './bearings'
import { nearestOnSegment } from './nearest'

/** How far two lines (each at least one vertex, sheet metres) lie apart where they lie farthest apart: the greatest
 *  distance of a vertex of either from the other line. 0 for the same line, also reversed.
 *  Source: the discrete Hausdorff distance; leaving off once a vertex cannot be the farthest is Taha and Hanbury 2015, An
 *  efficient algorithm for calculating the exact Hausdorff distance (from memory), so that two versions of one line cost
 *  about one look per vertex. */
export const greatestDeparture = (a: readonly XY[], b: readonly XY[]): Metres =>
  Math.max(departureOf(a, b), departureOf(b, a))

/** Greatest distance of a vertex of a line from another line. */
function departureOf(line: readonly XY[], other: readonly XY[]): Metres {
  let greatest = 0
  line.forEach((vertex, index) => {
    // Versions of one line have their counterparts at about the same place along it.
    const begin = Math.round((index * (other.length - 1)) / Math.max(1, line.length - 1))
    greatest = Math.max(greatest, distanceTo(other, vertex, begin, greatest))
  })
  return greatest
}

/** Distance of a point from a line, or any smaller figure once it is certain to be at most `enough`. Looks outward from the
 *  vertex with the index `begin`. */
function distanceTo(line: readonly XY[], point: XY, begin: number, enough: Metres): Metres {
  let nearest = gridDistance(line[begin] ?? point, point)
  for (let step = 0; nearest > enough && step < line.length; step++) {
    for (const segment of [begin - 1 - step, begin + step]) {
      const [from, to] = [line[segment], line[segment + 1]]
      if (from && to) nearest = Math.min(nearest, gridDistance(nearestOnSegment(from, to, point), point))
    }
  }
  return nearest
}
