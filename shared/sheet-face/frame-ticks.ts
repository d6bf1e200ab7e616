import type { SheetProjection } from '../geometry/projection'
import type { LonLat, Metres, XY } from '../units'
import { multiplesBetween } from './intervals'
import { openRing, type Edge, type Side } from './neatline'

/** Where a round line of the grid or graticule meets the neatline. */
export interface Crossing {
  at: XY
  side: Side
  /** Easting or northing in metres, or longitude or latitude in degrees. */
  value: number
}

/** Halvings of a neatline edge when looking for a meridian or parallel: 2⁻⁴⁰ of any edge is far below 1 mm. */
const HALVINGS = 40

const isUpright = (side: Side): boolean => side === 'top' || side === 'bottom'

/** Where round eastings meet top and bottom, and round northings the sides. */
export function gridCrossings(edges: readonly Edge[], step: Metres): Crossing[] {
  return once(
    edges.flatMap(({ from, to, side }) => {
      const axis = isUpright(side) ? 0 : 1
      return multiplesBetween(from[axis], to[axis], step).map((value) => ({
        at: pointAlong(from, to, (value - from[axis]) / (to[axis] - from[axis])),
        side,
        value,
      }))
    }),
    step,
  )
}

/** Where round meridians meet top and bottom, and round parallels the sides. */
export function graticuleCrossings(
  edges: readonly Edge[],
  projection: SheetProjection,
  step: number,
): Crossing[] {
  return once(
    edges.flatMap(({ from, to, side }) => {
      const axis = isUpright(side) ? 0 : 1
      const valueAt = (share: number): number => projection.toLonLat(pointAlong(from, to, share))[axis]
      return multiplesBetween(valueAt(0), valueAt(1), step).map((value) => ({
        at: pointAlong(from, to, shareWhere(valueAt, value)),
        side,
        value,
      }))
    }),
    step,
  )
}

/** Round graticule intersections inside the neatline, sheet metres. */
export function graticuleNodes(
  neatline: readonly (readonly [number, number])[],
  projection: SheetProjection,
  step: number,
): XY[] {
  const ring = openRing(neatline)
  const lonLats = ring.map((xy): LonLat => projection.toLonLat(xy))
  const spread = (axis: 0 | 1): number[] => {
    const values = lonLats.map((lonLat) => lonLat[axis])
    return multiplesBetween(Math.min(...values), Math.max(...values), step)
  }
  const latitudes = spread(1)
  return spread(0)
    .flatMap((lon) => latitudes.map((lat) => projection.fromLonLat([lon, lat])))
    .filter((xy) => isInside(xy, ring))
}

const pointAlong = (from: XY, to: XY, share: number): XY => [
  from[0] + (to[0] - from[0]) * share,
  from[1] + (to[1] - from[1]) * share,
]

/** Share of an edge at which a value that runs one way along it is reached. */
function shareWhere(valueAt: (share: number) => number, value: number): number {
  const rises = valueAt(1) > valueAt(0)
  let [low, high] = [0, 1]
  for (let halving = 0; halving < HALVINGS; halving++) {
    const middle = (low + high) / 2
    if (valueAt(middle) < value === rises) low = middle
    else high = middle
  }
  return (low + high) / 2
}

/** Crossings without those that two neighbouring edges both report at their shared vertex. */
function once(crossings: readonly Crossing[], step: number): Crossing[] {
  const known = new Map(
    crossings.map((crossing) => [`${crossing.side} ${Math.round(crossing.value / step)}`, crossing]),
  )
  return [...known.values()]
}

/** Even-odd test of a point in an open ring. Source: common practice (ray casting). */
function isInside([x, y]: XY, ring: readonly XY[]): boolean {
  let inside = false
  ring.forEach(([ax, ay], index) => {
    const [bx, by] = ring[(index + 1) % ring.length] ?? [ax, ay]
    if (ay > y !== by > y && x < ((bx - ax) * (y - ay)) / (by - ay) + ax) inside = !inside
  })
  return inside
}
