import type { Path } from '../symbols/display-list'
import { polyline } from '../symbols/paths'
import type { Millimetres } from '../units'

/** A rectangle as a closed path, from its lower left corner. */
export const rectangle = (x: Millimetres, y: Millimetres, width: Millimetres, height: Millimetres): Path =>
  polyline(
    [
      [x, y],
      [x + width, y],
      [x + width, y + height],
      [x, y + height],
    ],
    true,
  )
