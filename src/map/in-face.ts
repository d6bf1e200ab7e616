import { booleanPointInPolygon } from '@turf/turf'
import type { Face } from '@shared/api/faces'
import type { XY } from '@shared/units'
import type { GroundBox } from './item-index'

type Ring = readonly (readonly [number, number])[]

/** Whether a place lies within closed rings, the outer one first, or on their edge; sheet metres. */
export const isInRings = (rings: readonly Ring[], at: XY): boolean =>
  booleanPointInPolygon(at, {
    type: 'Polygon',
    coordinates: rings.map((ring) => ring.map(([east, north]) => [east, north])),
  })

const bounds = new WeakMap<Face, [number, number, number, number]>()

/** Whether a place lies in a unit's area. */
export function isInFace(face: Face, at: XY): boolean {
  const [west, south, east, north] = boundsOf(face)
  if (at[0] < west || at[0] > east || at[1] < south || at[1] > north) return false
  return isInRings(face.rings, at)
}

/** Whether a unit's area may reach into a box: its bounds do. */
export function mayReach(face: Face, { min, max }: GroundBox): boolean {
  const [west, south, east, north] = boundsOf(face)
  return west <= max[0] && east >= min[0] && south <= max[1] && north >= min[1]
}

/** The pointer asks for every area at every move: bounds are worked out once. */
function boundsOf(face: Face): [number, number, number, number] {
  const known = bounds.get(face)
  if (known) return known
  const found: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity]
  for (const [east, north] of face.rings[0] ?? []) {
    found[0] = Math.min(found[0], east)
    found[1] = Math.min(found[1], north)
    found[2] = Math.max(found[2], east)
    found[3] = Math.max(found[3], north)
  }
  bounds.set(face, found)
  return found
}
