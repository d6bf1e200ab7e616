import type { Millimetres, MM } from '../units'
import type { DisplayList, Path, PathStep } from './display-list'

/** Parts of a path with fewer steps are left as they are: a decoration is not simplified. */
const FEWEST = 8

/** A list with its long strokes drawn by fewer vertices, for pictures in which the difference cannot be seen. Only strokes
 *  change; what stands on a line, and where, was settled before.
 *  @param tolerance farthest that a vertex left out may lie from the stroke, millimetres */
export const simplifyStrokes = (list: DisplayList, tolerance: Millimetres): DisplayList =>
  list.map((mark) =>
    mark.mark === 'stroke' && mark.path.length >= FEWEST
      ? { ...mark, path: simplifyPath(mark.path, tolerance) }
      : mark,
  )

/** A path with fewer vertices; curves and closed parts stay. */
export function simplifyPath(path: Path, tolerance: Millimetres): Path {
  if (path.some((step) => step[0] === 'curve' || step[0] === 'close')) return path
  const parts: MM[][] = []
  for (const step of path) {
    if (step[0] === 'move') parts.push([[step[1], step[2]]])
    else if (step[0] === 'line') parts.at(-1)?.push([step[1], step[2]])
  }
  return parts.flatMap((part) =>
    simplifyLine(part, tolerance).map(([x, y], index): PathStep =>
      index === 0 ? ['move', x, y] : ['line', x, y],
    ),
  )
}

/** A line without the vertices that lie within a tolerance of what is left; its ends stay.
 *  Source: Douglas and Peucker 1973. */
export function simplifyLine(line: readonly MM[], tolerance: Millimetres): MM[] {
  const kept = new Uint8Array(line.length)
  kept[0] = kept[line.length - 1] = 1
  const open: [number, number][] = [[0, line.length - 1]]
  for (let span = open.pop(); span; span = open.pop()) {
    const [from, to] = span
    const farthest = farthestBetween(line, from, to)
    if (farthest.distance <= tolerance) continue
    kept[farthest.index] = 1
    open.push([from, farthest.index], [farthest.index, to])
  }
  return line.filter((_, index) => kept[index] === 1)
}

/** The vertex farthest from the straight piece between two others. */
function farthestBetween(
  line: readonly MM[],
  from: number,
  to: number,
): { index: number; distance: Millimetres } {
  const [ax, ay] = line[from] ?? [0, 0]
  const [bx, by] = line[to] ?? [0, 0]
  const [dx, dy] = [bx - ax, by - ay]
  const square = dx * dx + dy * dy
  let [index, distance] = [from, 0]
  for (let at = from + 1; at < to; at++) {
    const [x, y] = line[at] ?? [0, 0]
    const share = square === 0 ? 0 : Math.max(0, Math.min(1, ((x - ax) * dx + (y - ay) * dy) / square))
    const away = Math.hypot(x - ax - share * dx, y - ay - share * dy)
    if (away > distance) [index, distance] = [at, away]
  }
  return { index, distance }
}
