import type { Metres, XY } from '../units'

/** Side of the grid that every stored coordinate is snapped to, metres. Shared vertices become equal numbers. */
export const GRID_METRES: Metres = 0.001

/** The nearest point of the 1 mm grid, sheet metres. */
export function snapToGrid([east, north]: readonly [Metres, Metres]): XY {
  return [Math.round(east * 1000) / 1000, Math.round(north * 1000) / 1000]
}
