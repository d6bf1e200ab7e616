/** A plane point; metres or millimetres, as the line is. */
type Point = [x: number, y: number]

/** A line with its length measured: places on it are told by their distance from its start. All lengths are in the unit
 *  of its vertices. */
export interface MeasuredLine {
  readonly length: number
  /** The place at a distance from the start; before the start or beyond the end, the start or the end. */
  pointAt(distance: number): Point
  /** Unit direction along the line at a distance, as the chord over a width about it; [1, 0] on a line without length. */
  directionAt(distance: number, width: number): Point
  /** How far the line turns within a width about a place, degrees 0–180. */
  turnAt(distance: number, width: number): number
  /** The part between two distances, at least two points. */
  slice(from: number, to: number): Point[]
}

/** Measures a line once, so that every place on it is found by bisection: n vertices cost n, a place costs log n. */
export function measureLine(line: readonly (readonly [number, number])[]): MeasuredLine {
  const upTo = new Float64Array(Math.max(1, line.length))
  for (let index = 1; index < line.length; index++) {
    const [a, b] = [vertex(index - 1), vertex(index)]
    upTo[index] = (upTo[index - 1] ?? 0) + Math.hypot(b[0] - a[0], b[1] - a[1])
  }
  const length = upTo.at(-1) ?? 0

  function vertex(index: number): Point {
    const point = line[index]
    if (!point) throw new RangeError(`The line has ${line.length} vertices; there is no vertex ${index}.`)
    return [point[0], point[1]]
  }

  /** Index of the segment that a distance falls on. */
  function segmentAt(distance: number): number {
    let [low, high] = [0, Math.max(0, line.length - 2)]
    while (low < high) {
      const middle = (low + high + 1) >> 1
      if ((upTo[middle] ?? 0) <= distance) low = middle
      else high = middle - 1
    }
    return low
  }

  function pointAt(distance: number): Point {
    if (distance <= 0 || line.length < 2) return vertex(0)
    if (distance >= length) return vertex(line.length - 1)
    const index = segmentAt(distance)
    const [a, b] = [vertex(index), vertex(index + 1)]
    const start = upTo[index] ?? 0
    const share = (distance - start) / ((upTo[index + 1] ?? length) - start)
    return [a[0] + (b[0] - a[0]) * share, a[1] + (b[1] - a[1]) * share]
  }

  function direction(from: number, to: number): Point {
    const [a, b] = [pointAt(from), pointAt(to)]
    const size = Math.hypot(b[0] - a[0], b[1] - a[1])
    return size === 0 ? [1, 0] : [(b[0] - a[0]) / size, (b[1] - a[1]) / size]
  }

  return {
    length,
    pointAt,
    directionAt: (distance, width) => direction(distance - width / 2, distance + width / 2),
    turnAt(distance, width) {
      const before = direction(distance - width / 2, distance)
      const after = direction(distance, distance + width / 2)
      const cosine = before[0] * after[0] + before[1] * after[1]
      return (Math.acos(Math.max(-1, Math.min(1, cosine))) * 180) / Math.PI
    },
    slice(from, to) {
      const points = [pointAt(from)]
      let index = segmentAt(Math.max(0, from)) + 1
      for (; index < line.length - 1 && (upTo[index] ?? 0) < to; index++) {
        if ((upTo[index] ?? 0) > from) points.push(vertex(index))
      }
      points.push(pointAt(to))
      return points
    },
  }
}
