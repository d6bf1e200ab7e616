import type { Degrees, Metres, XY } from '@shared/units'
import { coverOf, type Cover, type CoverKind } from './cover'
import type { SpaceField } from './fold-belt'
import { merrowIsland, type Island, type Series, type Side } from './island'
import type { Extent } from './lattice'
import { land } from './terrain'
import { foldedLayers, layerAt, youngerLayers, type Layer } from './units'
import type { Surface } from './vectors'

/** All that is known of the island. Places are metres from the island's origin. */
export interface Truth {
  island: Island
  /** Height of the ground above sea. */
  ground: Surface
  /** What lies on the rock, the uppermost first. */
  cover: readonly Cover[]
}

/** What the rock is at a place on or beneath the ground. */
export interface Rock {
  side: Side
  series: Series
  layer: Layer
  field: SpaceField
}

/** The known island. @param gridTrend trend of the fold axes, degrees from grid north */
export function makeTruth(gridTrend: Degrees): Truth {
  const island = merrowIsland(gridTrend)
  const relief = land(island.axes)
  const remembered = { ...relief, ground: rememberLast((xy) => relief.ground(xy)) }
  return { island, ground: remembered.ground, cover: coverOf(remembered) }
}

/** A surface that is not worked out again for the place that was asked for last: many fields ask for the same ground. */
function rememberLast(surface: Surface): Surface {
  let last: { at: XY; value: number } | undefined
  return (xy) => {
    if (last?.at !== xy) last = { at: xy, value: surface(xy) }
    return last.value
  }
}

/** Which side of the fault a place is on. */
export const sideAt = ({ island }: Truth, xy: XY, z: Metres): Side =>
  island.fault.value(xy, z) > 0 ? 'east' : 'west'

/** The rock at a place in space, on the ground if no height is given. */
export function rockAt(truth: Truth, xy: XY, z: Metres = truth.ground(xy)): Rock {
  const { island } = truth
  const side = sideAt(truth, xy, z)
  const series = seriesAt(island, side, xy, z)
  const field = island.height(series, side)
  const layers = series === 'younger' ? youngerLayers : foldedLayers
  return { side, series, field, layer: layerAt(layers, field.value(xy, z)) }
}

function seriesAt(island: Island, side: Side, xy: XY, z: Metres): Series {
  if (island.height('younger', side).value(xy, z) > 0) return 'younger'
  return island.thrust(side).value(xy, z) > 0 ? 'upper' : 'lower'
}

/** What hides the rock at a place, if anything does. */
export const coverAt = ({ cover }: Truth, xy: XY): CoverKind | undefined =>
  cover.find(({ surface }) => surface(xy) > 0)?.kind

/** What the map shows at a place: the label of a unit of the legend, rock or cover. */
export const shownAt = (truth: Truth, xy: XY): CoverKind | Layer =>
  coverAt(truth, xy) ?? rockAt(truth, xy).layer

/** A field on the ground. */
export const onGround =
  (field: SpaceField, ground: Surface): Surface =>
  (xy) =>
    field.value(xy, ground(xy))

export type { Extent }
