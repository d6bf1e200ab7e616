import type { Degrees, Millimetres, MM } from '../units'
import type { Path, PathStep } from './display-list'

/** Straight pieces that a curve is cut into: at symbol size, under a hundredth of a millimetre off. */
const CURVE_PIECES = 16

/** Handle length of a cubic curve that follows a quarter circle of radius 1. Source: derived; 4/3 · (√2 − 1). */
export const QUARTER_HANDLE = (4 / 3) * (Math.SQRT2 - 1)

/** A path through points, open unless `closed`. */
export const polyline = (points: readonly MM[], closed = false): PathStep[] => [
  ...points.map(([x, y], index): PathStep => [index === 0 ? 'move' : 'line', x, y]),
  ...(closed ? ([['close']] as const) : []),
]

/** A full circle. */
export function circle([x, y]: MM, radius: Millimetres): PathStep[] {
  const h = radius * QUARTER_HANDLE
  return [
    ['move', x + radius, y],
    ['curve', x + radius, y + h, x + h, y + radius, x, y + radius],
    ['curve', x - h, y + radius, x - radius, y + h, x - radius, y],
    ['curve', x - radius, y - h, x - h, y - radius, x, y - radius],
    ['curve', x + h, y - radius, x + radius, y - h, x + radius, y],
    ['close'],
  ]
}

/** The half circle from `at + (0, radius)` round the side of smaller x to `at − (0, radius)`, without its first step. */
export function halfCircleLeft([x, y]: MM, radius: Millimetres): PathStep[] {
  const h = radius * QUARTER_HANDLE
  return [
    ['curve', x - h, y + radius, x - radius, y + h, x - radius, y],
    ['curve', x - radius, y - h, x - h, y - radius, x, y - radius],
  ]
}

/** Every point of a path put through a function: moves, turns, scales. */
export const mapPath = (path: Path, map: (point: MM) => MM): PathStep[] =>
  path.map((step): PathStep => {
    switch (step[0]) {
      case 'move':
      case 'line':
        return [step[0], ...map([step[1], step[2]])]
      case 'curve':
        return ['curve', ...map([step[1], step[2]]), ...map([step[3], step[4]]), ...map([step[5], step[6]])]
      case 'close':
        return step
    }
  })

/** Turns a symbol drawn with y up the strike to its azimuth on the drawing and moves it to its place.
 *  @param azimuth degrees clockwise from the drawing's up */
export function turnTo(azimuth: Degrees, [x, y]: MM): (point: MM) => MM {
  const turn = (azimuth * Math.PI) / 180
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)]
  return ([px, py]) => [x + px * cos + py * sin, y - px * sin + py * cos]
}

/** A path as polylines, curves cut into straight pieces; a closed part ends where it began. */
export function flatten(path: Path): MM[][] {
  const parts: MM[][] = []
  let part: MM[] = []
  for (const step of path) {
    if (step[0] === 'move') parts.push((part = [[step[1], step[2]]]))
    else if (step[0] === 'line') part.push([step[1], step[2]])
    else if (step[0] === 'curve') part.push(...curvePoints(part.at(-1), step))
    else {
      const first = part[0]
      if (first) part.push([...first])
    }
  }
  return parts.filter((points) => points.length > 1)
}

function curvePoints(from: MM | undefined, step: Extract<PathStep, readonly ['curve', ...number[]]>): MM[] {
  const [, x1, y1, x2, y2, x3, y3] = step
  const [x0, y0] = from ?? [x1, y1]
  return Array.from({ length: CURVE_PIECES }, (_, index): MM => {
    const t = (index + 1) / CURVE_PIECES
    const u = 1 - t
    const [a, b, c, d] = [u * u * u, 3 * u * u * t, 3 * u * t * t, t * t * t]
    return [a * x0 + b * x1 + c * x2 + d * x3, a * y0 + b * y1 + c * y2 + d * y3]
  })
}
