import type { Item, ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import { faceRings } from '../truth/face-rings'
import { isInside } from '../truth/small-rings'
import { distance, type Bench } from './bench'

type Box = readonly [west: number, south: number, east: number, north: number]

export const lengthOf = (line: readonly XY[]): number =>
  line.slice(1).reduce((sum, at, index) => sum + distance(line[index] ?? at, at), 0)

/** The neatline, by the farthest ends of the linework: contacts of the truth end on all four edges. */
export function neatlineBox(bench: Bench): Box {
  const places = bench.all('contact').flatMap(({ geometry }) => geometry.coordinates)
  const [xs, ys] = [places.map(([x]) => x), places.map(([, y]) => y)]
  const least = (values: number[]) => values.reduce((low, value) => Math.min(low, value), Infinity)
  const most = (values: number[]) => values.reduce((high, value) => Math.max(high, value), -Infinity)
  return [least(xs), least(ys), most(xs), most(ys)]
}

/** Tells whether a line ends on another line, away from the neatline. */
export function endsInside(bench: Bench): (line: readonly XY[]) => boolean {
  const [west, south, east, north] = neatlineBox(bench)
  return (line) => {
    const [x, y] = line.at(-1) ?? [west, south]
    return Math.min(x - west, y - south, east - x, north - y) > 100 && String(line[0]) !== String(line.at(-1))
  }
}

/** Labels that are the only ones of their area, which is larger than 200 m by 200 m. */
export function singleLabels(bench: Bench): ItemOf<'unit-label'>[] {
  const all = bench.all('unit-label')
  const rings = facesOf(bench).toSorted((a, b) => a.area - b.area)
  const ringOf = new Map(
    all.map(({ id, geometry: { coordinates } }) => [
      id,
      rings.find(({ ring }) => isInside(ring, coordinates)),
    ]),
  )
  const counts = new Map<unknown, number>()
  for (const ring of ringOf.values()) counts.set(ring, (counts.get(ring) ?? 0) + 1)
  return bench.untouched('unit-label', ({ id }) => {
    const own = ringOf.get(id)
    return own !== undefined && own.area > 40_000 && counts.get(own) === 1
  })
}

function facesOf(bench: Bench) {
  const [west, south, east, north] = neatlineBox(bench)
  const lines = [...bench.all('contact'), ...bench.all('fault')]
    .filter(({ properties }) => properties.locationConfidence !== 'concealed')
    .map(({ geometry }) => geometry.coordinates)
  return faceRings(lines, { origin: [west, south], width: east - west, height: north - south })
}

/** Points of a kind within reach of a place. */
export const near =
  (at: XY, reach: number) =>
  (item: Item): boolean =>
    item.geometry?.type === 'Point' && distance(item.geometry.coordinates, at) < reach
