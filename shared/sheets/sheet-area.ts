import type { Area } from '../api/sheets'
import { snapToGrid } from '../geometry/grid'
import { gridDistance } from '../geometry/bearings'
import type { SheetProjection } from '../geometry/projection'
import { findOutOfReach } from '../geometry/system-reach'
import type { LonLat, Metres, XY } from '../units'

/** The neatline of a new sheet, or why the area cannot be drawn in the projected system. */
export type SheetArea = { outcome: 'ring'; neatline: XY[] } | { outcome: 'refused'; reason: string }

/** Largest departure of a straight piece from the curve of a parallel or meridian, on paper: the width of a fine pen. */
const SAGITTA_MM = 0.05
const MOST_PIECES = 512

/** Closed ring, counter-clockwise from the south-west corner, sheet metres on the 1 mm grid. Sides of an area in degrees
 *  are parallels and meridians, in as many straight pieces as keep within 0.05 mm of the curve on the printed sheet;
 *  an area in metres is a rectangle of the grid.
 *  @param scale denominator   @param definition PROJ definition of the projected system */
export function sheetArea(
  area: Area,
  projection: SheetProjection,
  definition: string,
  scale: number,
): SheetArea {
  const corners = cornersOf(area, projection)
  const reason = corners.map((corner) => whyUnfit(corner, projection, definition)).find(Boolean)
  if (reason) return { outcome: 'refused', reason }
  const sides =
    area.by === 'metres'
      ? [...cornersOfBox(area)]
      : curvedSides(area, projection, (SAGITTA_MM * scale) / 1000)
  const ring = sides.map(snapToGrid)
  const [first] = ring
  return { outcome: 'ring', neatline: first ? [...ring, first] : ring }
}

type Box = Pick<Area, 'west' | 'south' | 'east' | 'north'>

const cornersOfBox = ({ west, south, east, north }: Box): [XY, XY, XY, XY] => [
  [west, south],
  [east, south],
  [east, north],
  [west, north],
]

/** Corners in degrees and in sheet metres. */
function cornersOf(area: Area, projection: SheetProjection): { lonLat: LonLat; xy: XY }[] {
  return cornersOfBox(area).map((corner) =>
    area.by === 'degrees'
      ? { lonLat: corner, xy: projection.fromLonLat(corner) }
      : { lonLat: projection.toLonLat(corner), xy: corner },
  )
}

/** Why a corner cannot be mapped in the chosen system; undefined if it can. */
function whyUnfit(
  corner: { lonLat: LonLat; xy: XY },
  projection: SheetProjection,
  definition: string,
): string | undefined {
  const found = findOutOfReach(corner, projection, definition)
  if (!found) return undefined
  if (found.why === 'nowhere') return 'The area does not exist in the chosen coordinate system.'
  if (found.why === 'far-from-meridian') {
    return `The area lies ${Math.round(found.degrees)}° from the central meridian of the chosen coordinate system: choose the zone that the area lies in.`
  }
  return 'The area lies outside the region that the chosen coordinate system is made for.'
}

/** Points along the four sides, counter-clockwise, each corner once. */
function curvedSides(area: Box, projection: SheetProjection, sagitta: Metres): XY[] {
  const corners = cornersOfBox(area)
  return corners.flatMap((from, index) => {
    const to = corners[(index + 1) % 4] ?? from
    const at = (fraction: number): XY =>
      projection.fromLonLat([from[0] + (to[0] - from[0]) * fraction, from[1] + (to[1] - from[1]) * fraction])
    const pieces = piecesFor(at, sagitta)
    return Array.from({ length: pieces }, (_, piece) => at(piece / pieces))
  })
}

/** Fewest pieces, doubling, whose middles lie within the sagitta of the curve. */
function piecesFor(at: (fraction: number) => XY, sagitta: Metres): number {
  let pieces = 1
  while (pieces < MOST_PIECES && departure(at, pieces) > sagitta) pieces *= 2
  return pieces
}

/** Distance of the curve's middle from the middle of its chord, the largest of all pieces. */
function departure(at: (fraction: number) => XY, pieces: number): Metres {
  const distances = Array.from({ length: pieces }, (_, piece) => {
    const [from, middle, to] = [at(piece / pieces), at((piece + 0.5) / pieces), at((piece + 1) / pieces)]
    return gridDistance(middle, [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2])
  })
  return Math.max(...distances)
}
