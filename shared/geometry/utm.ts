import type { Degrees } from '../units'

/** A geographic box, WGS 84 degrees. `west` may be greater than `east` only across the antimeridian. */
export interface LonLatBox {
  west: Degrees
  south: Degrees
  east: Degrees
  north: Degrees
}

/** EPSG code of the WGS 84 / UTM zone for a place; undefined beyond 84° N and 80° S, where UTM is not defined.
 *  Includes the exceptions of south-west Norway and Svalbard. Source: reference rule zone = ⌊(lon + 180) / 6⌋ + 1. */
export function utmSrid(lon: Degrees, lat: Degrees): number | undefined {
  if (lat < -80 || lat > 84) return undefined
  return (lat >= 0 ? 32600 : 32700) + utmZone(lon, lat)
}

/** UTM zone number, 1–60. Longitude 180 counts as zone 60. */
export function utmZone(lon: Degrees, lat: Degrees): number {
  if (lat >= 56 && lat < 64 && lon >= 3 && lon < 12) return 32
  if (lat >= 72 && lat <= 84 && lon >= 0 && lon < 42) {
    if (lon < 9) return 31
    if (lon < 21) return 33
    return lon < 33 ? 35 : 37
  }
  return Math.min(60, Math.floor((lon + 180) / 6) + 1)
}
