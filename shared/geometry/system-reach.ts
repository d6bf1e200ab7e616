import { angleBetween, toRadians, type Degrees, type LonLat, type Metres, type XY } from '../units'
import { gridDistance } from './bearings'
import type { SheetProjection } from './projection'

/** Why a place cannot be mapped in a projected system: it is nowhere on Earth, too far from the central meridian of a
 *  transverse Mercator grid, or where the system's scale is not to be trusted. */
export type OutOfReach =
  { why: 'nowhere' } | { why: 'far-from-meridian'; degrees: Degrees } | { why: 'distorted' }

/** How far from true scale a sheet may be: beyond 6 % its stated scale would mislead. */
const MOST_DISTORTION = 0.06
/** Farthest from the central meridian that a transverse Mercator grid is used; its neighbours are within 9°. */
const FARTHEST_FROM_MERIDIAN: Degrees = 20

/** Why a place lies outside the region that a projected system is made for; undefined where it lies within.
 *  @param place the same place as WGS 84 degrees and as metres of the system
 *  @param definition PROJ definition of the system */
export function findOutOfReach(
  { lonLat: [lon, lat], xy }: { lonLat: LonLat; xy: XY },
  projection: SheetProjection,
  definition: string,
): OutOfReach | undefined {
  if (![lon, lat, ...xy].every(Number.isFinite) || Math.abs(lat) > 90) return { why: 'nowhere' }
  const degrees = degreesFromMeridian(lon, definition)
  if (degrees > FARTHEST_FROM_MERIDIAN) return { why: 'far-from-meridian', degrees }
  const back = projection.fromLonLat([lon, lat])
  const distortion = Math.abs(scaleFactor([lon, lat], projection) - 1)
  return gridDistance(back, xy) < 1 && distortion < MOST_DISTORTION ? undefined : { why: 'distorted' }
}

/** Degrees of longitude from the central meridian; 0 for systems that are not transverse Mercator. */
function degreesFromMeridian(lon: Degrees, definition: string): Degrees {
  const zone = /\+proj=utm .*\+zone=(\d+)/.exec(definition)?.[1]
  if (zone) return angleBetween(lon, Number(zone) * 6 - 183)
  const meridian = /\+proj=tmerc .*\+lon_0=(-?[\d.]+)/.exec(definition)?.[1]
  return meridian ? angleBetween(lon, Number(meridian)) : 0
}

/** Grid distance over true distance of a short step along the meridian.
 *  Source: radius of the meridian on the WGS 84 ellipsoid, a(1 − e²)/(1 − e² sin² φ)^1.5. */
function scaleFactor([lon, lat]: LonLat, projection: SheetProjection): number {
  const step: Degrees = 0.001
  const [a, e2] = [6378137, 0.00669437999014]
  const radius: Metres = (a * (1 - e2)) / (1 - e2 * Math.sin(toRadians(lat)) ** 2) ** 1.5
  const grid = gridDistance(
    projection.fromLonLat([lon, lat - step / 2]),
    projection.fromLonLat([lon, lat + step / 2]),
  )
  return grid / (radius * toRadians(step))
}
