import type { Metres, XY } from '@shared/units'

/** A function of the place on the ground. */
export type Surface = (xy: XY) => number

/** Step of numeric derivatives: far above rounding, far below any feature of the demo. */
const STEP: Metres = 0.05

/** Slope of a surface toward east and north, by central differences. */
export function slope(surface: Surface, [x, y]: XY): XY {
  return [
    (surface([x + STEP, y]) - surface([x - STEP, y])) / (2 * STEP),
    (surface([x, y + STEP]) - surface([x, y - STEP])) / (2 * STEP),
  ]
}

/** The nearest place where a surface has the value zero, by Newton's method down its slope. */
export function ontoZero(surface: Surface, start: XY): XY {
  let [x, y] = start
  for (let round = 0; round < 12; round++) {
    const value = surface([x, y])
    const [east, north] = slope(surface, [x, y])
    const square = east * east + north * north
    if (Math.abs(value) < 1e-9 || square < 1e-12) break
    x -= (value * east) / square
    y -= (value * north) / square
  }
  return [x, y]
}

/** The place near `start` where two surfaces are both zero, by Newton's method in the plane. */
export function ontoBothZero(first: Surface, second: Surface, start: XY): XY {
  let [x, y] = start
  for (let round = 0; round < 20; round++) {
    const [a, b] = [first([x, y]), second([x, y])]
    const [ax, ay] = slope(first, [x, y])
    const [bx, by] = slope(second, [x, y])
    const determinant = ax * by - ay * bx
    if (Math.abs(determinant) < 1e-12) break
    const [dx, dy] = [(a * by - b * ay) / determinant, (ax * b - bx * a) / determinant]
    x -= dx
    y -= dy
    if (Math.hypot(dx, dy) < 1e-7) break
  }
  return [x, y]
}

/** Where a function of one number passes zero between two numbers at which it has unlike signs. */
export function bisect(value: (at: number) => number, from: number, to: number): number {
  let [low, high] = [from, to]
  const rising = value(high) > 0
  for (let round = 0; round < 60; round++) {
    const middle = (low + high) / 2
    if (value(middle) > 0 === rising) high = middle
    else low = middle
  }
  return (low + high) / 2
}
