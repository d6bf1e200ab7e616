import { toDegrees, type Degrees } from '@shared/units'
import type { Vector3 } from './fold-belt'

/** A plane measured against grid north: strike by the right-hand rule, dip 0–90, degrees. */
export interface GridPlane {
  gridStrike: Degrees
  dip: Degrees
  overturned: boolean
}

/** The layer whose stratigraphic height has this gradient. The upward normal of a plane leans toward its dip direction. */
export function planeOfGradient([east, north, up]: Vector3): GridPlane {
  // The layer is overturned where its younger side faces down.
  const facing = up < 0 ? -1 : 1
  const dipDirection = toDegrees(Math.atan2(east * facing, north * facing))
  return {
    gridStrike: dipDirection - 90,
    dip: toDegrees(Math.atan2(Math.hypot(east, north), up * facing)),
    overturned: up < 0,
  }
}

/** A plane of no younger side, for example a cleavage, from its normal. */
export const planeOfNormal = (normal: Vector3): GridPlane => ({
  ...planeOfGradient(normal),
  overturned: false,
})
