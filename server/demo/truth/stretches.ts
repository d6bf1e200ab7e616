import type { LocationConfidence } from '@shared/items/confidence'
import type { Metres, XY } from '@shared/units'
import type { Line } from './contours'
import { lengthOf } from './cut-lines'

/** A stretch of a line with its own location confidence. */
export interface Stretch {
  line: Line
  locationConfidence: LocationConfidence
}

/** Cuts a line at the vertices nearest to two fractions of its length; what lies between gets another confidence. */
export function withStretch(
  line: Line,
  [from, to]: readonly [number, number],
  locationConfidence: LocationConfidence,
): Stretch[] {
  const length = lengthOf(line)
  const [start, end] = [vertexAt(line, from * length), vertexAt(line, to * length)]
  if (start < 1 || end <= start || end > line.length - 2) return [{ line, locationConfidence: 'certain' }]
  return [
    { line: line.slice(0, start + 1), locationConfidence: 'certain' },
    { line: line.slice(start, end + 1), locationConfidence },
    { line: line.slice(end), locationConfidence: 'certain' },
  ]
}

/** Index of the first vertex at or beyond a length along the line. */
function vertexAt(line: Line, along: Metres): number {
  let passed = 0
  return line.findIndex(([x, y], index) => {
    const [fromX, fromY] = line[index - 1] ?? [x, y]
    passed += Math.hypot(x - fromX, y - fromY)
    return passed >= along
  })
}

/** The vertex in the middle of a line's list. */
export const middleOf = (line: Line): XY => line[Math.floor(line.length / 2)] ?? [0, 0]
