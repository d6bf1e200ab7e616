import type { Azimuth, Metres, XY } from '@shared/units'
import type { Extent } from './contours'
import { coverPatches, type CoverPatch } from './cover'
import { foldBelt, onGround, type Field, type GroundField } from './field'
import { terrain } from './terrain'
import type { Surface } from './vectors'

/** All that is known of a demo sheet. Places are metres from its south-west corner. */
export interface Truth {
  extent: Extent
  ground: Surface
  field: Field
  onGround: GroundField
  cover: readonly CoverPatch[]
}

export interface TruthOptions {
  width: Metres
  height: Metres
  /** Trend of the fold axes on the grid, degrees. */
  gridTrend: Azimuth
  /** Side of the cells that lines are found in. */
  cell?: Metres
}

/** The known ground of a sheet of this size. */
export function makeTruth({ width, height, gridTrend, cell = 40 }: TruthOptions): Truth {
  const ground = terrain()
  const centre: XY = [width / 2, height / 2]
  const field = foldBelt({ centre, gridTrend, throw: 420 })
  return {
    extent: { width, height, cell },
    ground,
    field,
    onGround: onGround(field, ground),
    cover: coverPatches,
  }
}
