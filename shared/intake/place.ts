import { bboxPolygon, booleanIntersects, booleanPointInPolygon, lineString, polygon } from '@turf/turf'
import type { Feature, Polygon } from 'geojson'
import { snapToGrid } from '../geometry/grid'
import { sheetProjection, type SheetProjection } from '../geometry/projection'
import { MAX_VERTICES } from '../items/geometry'
import type { LonLat, XY } from '../units'
import type { FilePosition } from './records'

/** What intake needs to know of a sheet. */
export interface SheetGround {
  /** From what to what coordinates are converted, in words. */
  conversion: string
  projection: SheetProjection
  /** Neatline in sheet metres. */
  face: Feature<Polygon>
  /** West, south, east, north of the neatline, sheet metres. */
  box: Box
}

type Box = readonly [west: number, south: number, east: number, north: number]

/** A sheet's ground from its CRS (name and PROJ definition) and neatline, a closed ring in sheet metres.
 *  @param from what the file's coordinates were, in words */
export function sheetGround(
  crs: { name: string; proj4: string },
  neatline: readonly XY[],
  from = 'longitude and latitude (WGS 84)',
): SheetGround {
  const ring = neatline.map(([east, north]) => [east, north])
  return {
    conversion: `${from} to ${crs.name}, to the millimetre`,
    projection: sheetProjection(crs.proj4),
    face: polygon([ring]),
    box: boxOf(neatline),
  }
}

export type Placed<G> =
  | { outcome: 'placed'; geometry: G; conversions: string[] }
  | { outcome: 'misplaced'; value: string; reason: string; outside: boolean }

/** A point of a file on the sheet, snapped to the grid; misplaced if it is no position in degrees or lies outside. */
export function placePoint(position: FilePosition, ground: SheetGround): Placed<XY> {
  const fault = positionFault(position)
  if (fault) return { outcome: 'misplaced', value: positionText(position), reason: fault, outside: false }
  const xy = toSheet(position, ground)
  if (!xy || !booleanPointInPolygon(xy, ground.face)) return outside(position, 'This point', ground)
  return { outcome: 'placed', geometry: xy, conversions: conversionsOf([position], ground) }
}

/** A line of a file on the sheet, snapped to the grid, equal neighbours dropped. A line that meets the neatline is
 *  taken whole; one wholly outside is misplaced, as is one without length. */
export function placeLine(positions: readonly FilePosition[], ground: SheetGround): Placed<XY[]> {
  const wrong = positions.findIndex((position) => positionFault(position) !== undefined)
  const bad = positions[wrong]
  if (bad) {
    const reason = `Vertex ${wrong + 1}: ${positionFault(bad) ?? ''}`
    return { outcome: 'misplaced', value: positionText(bad), reason, outside: false }
  }
  const first = positions[0]
  if (!first) return noLength('', 'The line has no vertices.')
  const line = positions.map((position) => toSheet(position, ground))
  // Where the projection has no answer, the place is a hemisphere away.
  const known = line.filter((xy) => xy !== undefined)
  if (known.length < line.length) return outside(first, 'This line', ground)
  const vertices = known.filter((xy, index) => index === 0 || !isSame(xy, known[index - 1]))
  if (vertices.length < 2)
    return noLength(positionText(first), 'The line has no length: all its vertices are one point.')
  if (vertices.length > MAX_VERTICES)
    return noLength(`${vertices.length} vertices`, `A line may have at most ${MAX_VERTICES} vertices.`)
  if (!meetsFace(vertices, ground)) return outside(first, 'This line', ground)
  return { outcome: 'placed', geometry: vertices, conversions: lineConversions(positions, vertices, ground) }
}

/** Why a position is no place on earth; undefined if it is one. */
export function positionFault(position: FilePosition): string | undefined {
  const [lon, lat] = position
  if (lon === undefined || lat === undefined) return 'A position needs a longitude and a latitude.'
  if (!Number.isFinite(lon) || !Number.isFinite(lat)) return 'A coordinate is not a number.'
  if (Math.abs(lon) <= 180 && Math.abs(lat) <= 90) return undefined
  if (Math.abs(lon) <= 90 && Math.abs(lat) <= 180) {
    return `A latitude of ${lat}° is beyond 90°: longitude and latitude seem to be exchanged.`
  }
  return `These are not degrees: ${positionText(position)}; the file seems to be in a projected system. Save it in WGS 84.`
}

const noLength = (value: string, reason: string): Placed<never> => ({
  outcome: 'misplaced',
  value,
  reason,
  outside: false,
})

function outside(position: FilePosition, what: string, ground: SheetGround): Placed<never> {
  const exchanged = [position[1] ?? NaN, position[0] ?? NaN]
  const swapped = positionFault(exchanged) === undefined ? toSheet(exchanged, ground) : undefined
  const hint =
    swapped && booleanPointInPolygon(swapped, ground.face)
      ? ' With longitude and latitude exchanged it would lie on the sheet.'
      : ''
  const reason = `${what} lies outside the sheet’s neatline.${hint}`
  return { outcome: 'misplaced', value: positionText(position), reason, outside: true }
}

/** Sheet metres on the grid; undefined where the projection has no answer. The position is known to be in degrees. */
function toSheet(position: FilePosition, ground: SheetGround): XY | undefined {
  const lonLat: LonLat = [position[0] ?? NaN, position[1] ?? NaN]
  const xy = snapToGrid(ground.projection.fromLonLat(lonLat))
  return xy.every((metres) => Math.abs(metres) <= 1e8) ? xy : undefined
}

function meetsFace(line: readonly XY[], ground: SheetGround): boolean {
  const [west, south, east, north] = boxOf(line)
  const [faceWest, faceSouth, faceEast, faceNorth] = ground.box
  if (west > faceEast || east < faceWest || south > faceNorth || north < faceSouth) return false
  if (line.some((xy) => booleanPointInPolygon(xy, ground.face))) return true
  if (!booleanIntersects(bboxPolygon([west, south, east, north]), ground.face)) return false
  return booleanIntersects(lineString(line.map(([x, y]) => [x, y])), ground.face)
}

function lineConversions(
  positions: readonly FilePosition[],
  vertices: readonly XY[],
  ground: SheetGround,
): string[] {
  const dropped = positions.length - vertices.length
  const repeated =
    dropped === 0 ? [] : [`${dropped} repeated ${dropped === 1 ? 'vertex' : 'vertices'} dropped`]
  return [...conversionsOf(positions, ground), ...repeated]
}

function conversionsOf(positions: readonly FilePosition[], ground: SheetGround): string[] {
  const heights = positions.some((position) => position.length > 2 && position[2] !== 0)
  return heights ? [ground.conversion, 'heights dropped'] : [ground.conversion]
}

function boxOf(line: readonly XY[]): Box {
  const box: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const [east, north] of line) {
    box[0] = Math.min(box[0], east)
    box[1] = Math.min(box[1], north)
    box[2] = Math.max(box[2], east)
    box[3] = Math.max(box[3], north)
  }
  return box
}

const isSame = (a: XY, b: XY | undefined): boolean => b !== undefined && a[0] === b[0] && a[1] === b[1]

/** To a decimetre where the figures are degrees: more tells nobody where it is. */
const positionText = (position: FilePosition): string =>
  position
    .slice(0, 2)
    .map((figure) => Number(figure.toFixed(6)))
    .join(', ')
