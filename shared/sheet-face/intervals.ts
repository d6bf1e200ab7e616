import type { Degrees, Metres, Millimetres } from '../units'

/** Grid ticks stand at least this far apart; steps of 1, 2, 5 keep them below 60 mm. */
const LEAST_GRID_GAP: Millimetres = 24
/** Graticule crosses stand at least this far apart along a meridian. */
const LEAST_GRATICULE_GAP: Millimetres = 90
/** No side of a map face carries more ticks than this, however far one zooms in. */
const MOST_TICKS = 200
/** Length of one degree of latitude, metres, to a hundredth: enough to choose an interval. */
const METRES_PER_DEGREE: Metres = 111_000

/** Round grid interval for a drawing scale: 1, 2 or 5 × 10ⁿ metres, so that lines lie 24–60 mm apart.
 *  @param extent longest side of the area, metres; the interval grows so that no side carries more than 200 ticks */
export function gridInterval(mmPerMetre: Millimetres, extent: Metres): Metres {
  const least = Math.max(LEAST_GRID_GAP / mmPerMetre, extent / MOST_TICKS)
  const power = 10 ** Math.floor(Math.log10(least))
  const factor = [1, 2, 5, 10].find((step) => step * power >= least * (1 - 1e-9)) ?? 10
  return factor * power
}

const SECOND: Degrees = 1 / 3600
const MINUTE: Degrees = 1 / 60
const graticuleSteps: readonly Degrees[] = [
  ...[1, 2, 5, 10, 15, 30].map((seconds) => seconds * SECOND),
  ...[1, 2.5, 5, 10, 15, 30].map((minutes) => minutes * MINUTE),
  ...[1, 2, 5, 10, 15, 30].map((degrees) => degrees),
]

/** Round graticule interval for a drawing scale, degrees, so that crosses lie at least 90 mm apart along a meridian.
 *  @param extent longest side of the area, metres; the interval grows so that no side carries more than 200 ticks */
export function graticuleInterval(mmPerMetre: Millimetres, extent: Metres): Degrees {
  const least = Math.max(LEAST_GRATICULE_GAP / mmPerMetre, extent / MOST_TICKS) / METRES_PER_DEGREE
  return graticuleSteps.find((step) => step >= least) ?? 30
}

/** Multiples of a step between two values, both ends included within a millionth of the step. Each is the multiple
 *  itself, not a running sum, so that rounding does not add up. */
export function multiplesBetween(a: number, b: number, step: number): number[] {
  const first = Math.ceil(Math.min(a, b) / step - 1e-6)
  const last = Math.floor(Math.max(a, b) / step + 1e-6)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => (first + index) * step)
}
