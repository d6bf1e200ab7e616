import type { ItemOf, PointItem } from '../items/item'
import { dot, poleDirection } from '../structure/directions'
import { toDegrees, type Degrees } from '../units'
import { attitudeCaseOf } from './draw-attitude'

/** How much a kind of plane says about the structure of a sheet. Source: common practice: bedding first, then what was
 *  made later. */
const planeRank: Record<ItemOf<'attitude'>['properties']['type'], number> = {
  bedding: 60,
  foliation: 45,
  cleavage: 35,
  joint: 25,
}
/** Cases that a reader looks for: they turn the reading of all that stand around them. */
const caseRank: Record<ReturnType<typeof attitudeCaseOf>, number> = {
  overturned: 25,
  vertical: 15,
  horizontal: 10,
  inclined: 0,
}
const lineationRank: Record<ItemOf<'lineation'>['properties']['type'], number> = {
  'minor-fold-axis': 50,
  lineation: 40,
}
/** Named places come before plain stations, of which there are most and which say least. */
const PLACE_RANK = 55
const STATION_RANK = 5
/** What a plane gains by its steepness, and by being unlike its neighbours, at most. */
const STEEPNESS_WORTH = 8
const DISTINCTNESS_WORTH = 22
/** What the only symbol of its sort on a sheet gains; of several each gains less. */
const RARITY_WORTH = 24

/** How a symbol stands among the others of its sheet. */
export interface Standing {
  /** Smallest angle to the like planes nearest to it, degrees, 0–90. */
  distinctness: Degrees
  /** How many symbols of the sheet look like it, itself among them. */
  alike: number
}

/** How much a symbol matters where there is no room for all of them; the greater number stays. Overturned and vertical
 *  bedding come first; of two of a sort the steeper one, and the one that tells more than its neighbours do already;
 *  and what is rare on the sheet before what is repeated. Source: common practice; the numbers are ours. */
export function importanceOf(item: PointItem, standing: Standing): number {
  return ownImportance(item, standing.distinctness) + RARITY_WORTH / Math.sqrt(standing.alike)
}

function ownImportance(item: PointItem, distinctness: Degrees): number {
  switch (item.kind) {
    case 'attitude': {
      const { type, dip, topsKnown } = item.properties
      const own = planeRank[type] + caseRank[attitudeCaseOf(item.properties)] + (topsKnown ? 5 : 0)
      return own + (dip / 90) * STEEPNESS_WORTH + (distinctness / 90) * DISTINCTNESS_WORTH
    }
    case 'lineation':
      return lineationRank[item.properties.type] + (item.properties.plane ? 5 : 0)
    case 'station':
      return item.properties.type === 'station' ? STATION_RANK : PLACE_RANK
    case 'unit-label':
      // Every area is labelled: a label never gives way.
      return Infinity
  }
}

/** Angle between two planes, degrees, 0–90: that between their poles. */
export function planesApart(a: Plane, b: Plane): Degrees {
  const cosine = Math.abs(dot(poleDirection(a), poleDirection(b)))
  return toDegrees(Math.acos(Math.min(1, cosine)))
}

interface Plane {
  strike: Degrees | null
  dip: Degrees
}
