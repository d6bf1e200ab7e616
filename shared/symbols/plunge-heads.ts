import type { ItemOf } from '../items/item'
import { plungeAgainstTrace } from '../structure/axial-trace'
import type { Degrees, XY } from '../units'
import type { LineEnd } from './definition'
import type { PlungeHead } from './line-drawing'

/** The arrowheads of an axis, by whole degrees: one at its down-plunge end; of a doubly plunging axis one at each end, out
 *  of the line where it goes down toward both ends, into it where it goes down toward its middle. A horizontal axis, or
 *  half of one, has none. A trend that contradicts the trace still draws at the nearer end: the contradiction is shown by
 *  the checks, not by a missing arrow. */
export function plungeHeads(
  { geometry, properties }: ItemOf<'axial-trace'>,
  convergenceAt: (xy: XY) => Degrees,
): PlungeHead[] {
  const { plunge, trend, doubly, otherPlunge } = properties
  const lineEnd = trend === null ? 'end' : plungeAgainstTrace(geometry.coordinates, trend, convergenceAt).end
  if (doubly === 'no') {
    return plunge === null || isFlat(plunge) ? [] : [{ end: lineEnd, points: 'out', degrees: plunge }]
  }
  const points = doubly === 'outward' ? 'out' : 'in'
  // The half that goes down toward the line's end lies beyond the culmination, or before the depression.
  const end = points === 'out' ? lineEnd : otherEnd(lineEnd)
  const both: PlungeHead[] = [
    { end, points, degrees: plunge },
    { end: otherEnd(end), points, degrees: otherPlunge },
  ]
  return both.filter(({ degrees }) => !isFlat(degrees))
}

const isFlat = (degrees: Degrees | null): boolean => degrees !== null && Math.round(degrees) === 0

const otherEnd = (end: LineEnd): LineEnd => (end === 'start' ? 'end' : 'start')
