import type { Random } from '../../../seeded-random'
import type { Degrees, Millimetres, MM } from '../../../units'
import { toRadians } from '../../../units'
import type { PathStep, TileMark } from '../../display-list'
import { circle, mapPath, polyline, turnTo } from '../../paths'

/** Line of all patterns: the finest that is sure to come out in print. Source: symbolization.md section 1. */
export const FINE: Millimetres = 0.13

/** A line through points, round at its ends. */
export const line = (points: readonly MM[], width = FINE): TileMark => ({
  mark: 'stroke',
  path: polyline(points),
  width,
  cap: 'round',
})

/** A level dash, from its left end. */
export const dash = ([x, y]: MM, length: Millimetres, width = FINE): TileMark =>
  line(
    [
      [x, y],
      [x + length, y],
    ],
    width,
  )

export const outline = (path: PathStep[], width = FINE): TileMark => ({ mark: 'stroke', path, width })

export const dot = (at: MM, radius: Millimetres): TileMark => ({ mark: 'fill', path: circle(at, radius) })

/** Straight strokes about a place, turned clockwise together. */
export const strokesAt = (
  at: MM,
  turn: Degrees,
  strokes: readonly (readonly MM[])[],
  width = FINE,
): TileMark => ({
  mark: 'stroke',
  path: mapPath(
    strokes.flatMap((points) => polyline(points)),
    turnTo(turn, at),
  ),
  width,
  cap: 'round',
})

/** A closed curve through points about a place: smooth, without corners. */
export function smoothRing(points: readonly MM[]): PathStep[] {
  const at = (index: number): MM => points[(index + points.length) % points.length] ?? [0, 0]
  const [startX, startY] = at(0)
  const curves = points.map((_, index): PathStep => {
    const [before, from, to, after] = [at(index - 1), at(index), at(index + 1), at(index + 2)]
    return [
      'curve',
      from[0] + (to[0] - before[0]) / 6,
      from[1] + (to[1] - before[1]) / 6,
      to[0] - (after[0] - from[0]) / 6,
      to[1] - (after[1] - from[1]) / 6,
      to[0],
      to[1],
    ]
  })
  return [['move', startX, startY], ...curves, ['close']]
}

/** Points all round a place at uneven distances: the outline of a stone.
 *  @param uneven share by which a corner may be nearer or farther   @param flat height over width */
export function stone(
  [x, y]: MM,
  radius: Millimetres,
  shape: { corners: number; uneven: number; flat: number },
  random: Random,
): MM[] {
  const start = random() * 360
  const lean = (random() - 0.5) * 40
  const place = turnTo(lean, [x, y])
  return Array.from({ length: shape.corners }, (_, index): MM => {
    const step = 360 / shape.corners
    const angle = toRadians(start + index * step + (random() - 0.5) * step * shape.uneven)
    const reach = radius * (1 + (random() - 0.5) * 2 * shape.uneven)
    return place([Math.cos(angle) * reach, Math.sin(angle) * reach * shape.flat])
  })
}

/** A rounded pebble in outline. */
export const pebble = (at: MM, radius: Millimetres, random: Random): TileMark =>
  outline(smoothRing(stone(at, radius, { corners: 7, uneven: 0.12, flat: 0.72 }, random)))

/** A broken piece of rock in outline. */
export const fragment = (at: MM, radius: Millimetres, corners: number, random: Random): TileMark =>
  outline(polyline(stone(at, radius, { corners, uneven: 0.3, flat: 0.85 }, random), true))

/** Sizes from large to small, evenly stepped. */
export const graded = (count: number, largest: Millimetres, smallest: Millimetres): Millimetres[] =>
  Array.from(
    { length: count },
    (_, index) => largest + ((smallest - largest) * index) / Math.max(1, count - 1),
  )

/** Between two numbers. */
export const between = (low: number, high: number, random: Random): number => low + (high - low) * random()
