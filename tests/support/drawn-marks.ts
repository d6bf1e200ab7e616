import type { DisplayList, StrokeMark, TextMark } from '@shared/symbols/display-list'
import { inkPoints } from '@shared/symbols/place-marks'
import { textCorners } from '@shared/symbols/text-box'
import { toRadians, type Degrees, type Millimetres, type MM } from '@shared/units'

export const strokesOf = (list: DisplayList): StrokeMark[] => list.filter((mark) => mark.mark === 'stroke')
export const numeralsOf = (list: DisplayList): TextMark[] => list.filter((mark) => mark.mark === 'text')

/** The unit vector of an azimuth on the drawing. */
export const vectorOf = (azimuth: Degrees): MM => [Math.sin(toRadians(azimuth)), Math.cos(toRadians(azimuth))]
/** How far a vector reaches in a direction. */
export const along = ([x, y]: MM, [dx, dy]: MM): Millimetres => x * dx + y * dy

/** Points of all ink but figures. */
export const inkOf = (list: DisplayList): MM[] =>
  inkPoints(list.filter((mark) => mark.mark !== 'text')).flatMap(({ points }) => points)

/** Furthest that any ink lies from a place, millimetres. */
export const furthestInk = (list: DisplayList, [x, y]: MM = [0, 0]): Millimetres =>
  Math.max(
    ...inkPoints(list).flatMap(({ points, halfWidth }) =>
      points.map((point) => Math.hypot(point[0] - x, point[1] - y) + halfWidth),
    ),
  )

/** Least distance between a numeral's box and the edge of any other ink, measured at points along the ink. */
export function closestInk(list: DisplayList, numeral: TextMark): Millimetres {
  const [lower, , upper] = textCorners(numeral)
  const others = list.filter((mark) => mark !== numeral)
  return Math.min(
    ...inkPoints(others).flatMap(({ points, halfWidth }) =>
      points.slice(1).flatMap((to, index) => {
        const from = points[index] ?? to
        return Array.from({ length: 21 }, (_, step) => {
          const [x, y] = [
            from[0] + ((to[0] - from[0]) * step) / 20,
            from[1] + ((to[1] - from[1]) * step) / 20,
          ]
          const dx = Math.max(lower[0] - x, 0, x - upper[0])
          const dy = Math.max(lower[1] - y, 0, y - upper[1])
          return Math.hypot(dx, dy) - halfWidth
        })
      }),
    ),
  )
}
