import type { Degrees, LonLat } from '@shared/units'

/** A geographic window and how it lies on a plate of drawing units, y down. */
export interface Plate {
  width: number
  height: number
  west: Degrees
  south: Degrees
  east: Degrees
  north: Degrees
  toPlate(lonLat: LonLat): [x: number, y: number]
}

/** Least span of a plate: the neighbourhood of a single small sheet. */
const LEAST_SPAN: Degrees = 0.05
/** White around the footprints, as a share of their span. */
const AROUND = 0.35

/** Fits footprints on a plate of the given size. An equirectangular projection true to scale at the middle parallel:
 *  shapes hold for the few degrees that a team's sheets cover. Source: common practice.
 *  @param rings closed rings, WGS 84 degrees; made continuous with {@link unwrap} across the antimeridian */
export function fitPlate(rings: readonly (readonly LonLat[])[], width: number, height: number): Plate {
  const points = rings.flat()
  const lons = points.map(([lon]) => lon)
  const lats = points.map(([, lat]) => lat)
  const [midLon, midLat] = points.length ? [middle(lons), middle(lats)] : [0, 0]
  const squeeze = Math.max(0.05, Math.cos((midLat * Math.PI) / 180))
  const spanLon = Math.max(LEAST_SPAN / squeeze, span(lons)) * (1 + AROUND)
  const spanLat = Math.max(LEAST_SPAN, span(lats)) * (1 + AROUND)
  const perDegreeLat = Math.min(width / (spanLon * squeeze), height / spanLat)
  const perDegreeLon = perDegreeLat * squeeze
  const west = midLon - width / 2 / perDegreeLon
  const north = midLat + height / 2 / perDegreeLat
  return {
    width,
    height,
    west,
    north,
    east: west + width / perDegreeLon,
    south: north - height / perDegreeLat,
    toPlate: ([lon, lat]) => [(lon - west) * perDegreeLon, (north - lat) * perDegreeLat],
  }
}

const middle = (values: readonly number[]): number => (Math.min(...values) + Math.max(...values)) / 2
const span = (values: readonly number[]): number =>
  values.length ? Math.max(...values) - Math.min(...values) : 0

/** Brings longitudes within half a turn of the first, so that rings on both sides of 180° lie together. */
export function unwrap(rings: readonly (readonly LonLat[])[]): LonLat[][] {
  const origin = rings[0]?.[0]?.[0] ?? 0
  return rings.map((ring) =>
    ring.map(([lon, lat]): LonLat => [lon - 360 * Math.round((lon - origin) / 360), lat]),
  )
}

/** Distances between meridians and parallels that people read easily: degrees, then minutes and seconds. */
const STEPS: readonly Degrees[] = [
  30,
  10,
  5,
  2,
  1,
  30 / 60,
  15 / 60,
  10 / 60,
  5 / 60,
  2 / 60,
  1 / 60,
  30 / 3600,
]

/** Values of a graticule between two limits, at the finest step that leaves at most `most` of them. */
export function graticule(from: Degrees, to: Degrees, most: number): Degrees[] {
  const count = (step: Degrees): number => Math.floor(to / step) - Math.ceil(from / step) + 1
  const step = STEPS.findLast((candidate) => count(candidate) <= most) ?? STEPS[0] ?? 30
  return Array.from(
    { length: Math.max(0, count(step)) },
    (_, index) => (Math.ceil(from / step) + index) * step,
  )
}

/** SVG path of a ring on the plate. */
export const ringPath = (ring: readonly LonLat[], plate: Plate): string =>
  `M${ring
    .map((point) =>
      plate
        .toPlate(point)
        .map((value) => value.toFixed(1))
        .join(' '),
    )
    .join('L')}Z`

/** A longitude brought back to −180…180, for a figure. */
export const wrapLon = (lon: Degrees): Degrees => lon - 360 * Math.round(lon / 360)
