import Flatbush from 'flatbush'
import { faceRings, placeInside, type FaceRing } from './face-rings'
import type { Label } from './labels'
import { reachesEdge, type Extent } from './lattice'
import type { MapLine } from './linework'
import type { MapBounds } from './map-bounds'
import type { Line } from './contours'
import { boxOf, isInside, RingIndex } from './small-rings'

/** Areas smaller than this, some 2.6 mm² at 1:24 000, are too small to be shown: square metres. */
const LEAST_FACE = 1500

/** Linework without areas too small to be shown: each is thrown together with a neighbour by leaving out the longest line
 *  between them, unless all its lines go on elsewhere or on the next sheet. */
export function withoutSlivers(
  lines: readonly MapLine[],
  extent: Extent,
): { lines: MapLine[]; leftOut: Line[] } {
  let kept = lines.slice()
  const leftOut: Line[] = []
  // Leaving one line out may make a sliver of what was beside it.
  for (let round = 0; round < 6; round++) {
    const bounding = kept.filter(bounds)
    const slivers = faceRings(
      bounding.map(({ line }) => line),
      extent,
    ).filter(({ area }) => area < LEAST_FACE)
    const dropped = new Set<MapLine>()
    for (const sliver of slivers) {
      const line = longestWhole(sliver, bounding, extent)
      if (!line || dropped.has(line)) continue
      dropped.add(line)
      leftOut.push(sliver.ring)
    }
    if (dropped.size === 0) break
    kept = kept.filter((line) => !dropped.has(line))
  }
  return { lines: kept, leftOut }
}

const bounds = ({ subject, concealed }: MapLine): boolean =>
  !concealed && subject.kind !== 'marker-bed' && subject.kind !== 'dike'

function longestWhole({ arcs }: FaceRing, lines: readonly MapLine[], extent: Extent): MapLine | undefined {
  const whole = arcs
    .filter(({ line, isWhole }) => isWhole && line >= 0)
    .toSorted((a, b) => b.places.length - a.places.length)
    .map(({ line }) => lines[line])
  return whole.find((line) => line && !reachesEdge(extent, line.line))
}

/** A label for every area that has none of its own: those too narrow for the raster. */
export function labelsForRest(
  at: MapBounds,
  lines: readonly MapLine[],
  labels: readonly Label[],
  leftOut: readonly Line[],
): Label[] {
  const rings = faceRings(
    lines.filter(bounds).map(({ line }) => line),
    at.lattice.extent,
  )
  const hidden = new RingIndex(leftOut)
  const byPlace = indexLabels(labels)
  return rings.flatMap(({ ring }) => {
    const place = placeInside(ring)
    if (hidden.holds(place)) return []
    const { shows } = at.areaAt(place)
    const isLabelled = byPlace(ring).some((label) => label.shows === shows && isInside(ring, label.at))
    return isLabelled ? [] : [{ at: place, shows }]
  })
}

/** Finds labels in the box of a ring. */
function indexLabels(labels: readonly Label[]): (ring: Line) => Label[] {
  if (labels.length === 0) return () => []
  const index = new Flatbush(labels.length)
  for (const { at } of labels) index.add(at[0], at[1], at[0], at[1])
  index.finish()
  return (ring) => index.search(...boxOf(ring)).flatMap((found) => labels[found] ?? [])
}
