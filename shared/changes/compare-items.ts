import { greatestDeparture } from '../geometry/line-distance'
import { isLineItem, itemSchema, type Item } from '../items/item'
import type { Metres, XY } from '../units'
import { isSame } from './same-value'

/** One property of an item that two versions state differently. */
export interface FieldChange {
  /** Its key, for example locationConfidence. */
  field: string
  before: unknown
  after: unknown
}

/** How two versions of an item differ on the map. */
export interface PlaceChange {
  /** A line that kept its number of vertices was moved; one with others was reshaped, or merely turned round. */
  how: 'moved' | 'reshaped' | 'reversed'
  /** How far apart the two lie where they lie farthest apart; 0 for a reversed line. */
  metres: Metres
  /** Vertices of a moved line that are at another place; 1 for a point, 0 otherwise. */
  vertices: number
}

/** Properties that differ between two versions of one item, in the order of the later one. A version from before a property
 *  existed has its default, as wherever it is read. */
export function changedFields(before: Item, after: Item): FieldChange[] {
  const [from, to] = [propertiesOf(before, after), propertiesOf(after, before)]
  return [...new Set([...Object.keys(to), ...Object.keys(from)])]
    .filter((field) => !isSame(from[field], to[field]))
    .map((field) => ({ field, before: from[field] ?? null, after: to[field] ?? null }))
}

/** The properties of a version; with what its schema fills in, where the other one has more. */
function propertiesOf(version: Item, other: Item): Record<string, unknown> {
  const lacks = Object.keys(other.properties).some((key) => !(key in version.properties))
  return { ...((lacks && itemSchema.safeParse(version).data) || version).properties }
}

/** How the place of an item differs between two versions; undefined where it does not. */
export function changedPlace(before: Item, after: Item): PlaceChange | undefined {
  const [from, to] = [verticesOf(before), verticesOf(after)]
  const vertices = from.filter((vertex, index) => !isSamePlace(vertex, to[index])).length
  if (from.length === to.length && vertices === 0) return undefined
  const metres = greatestDeparture(from, to)
  if (isLineItem(after) && from.length !== to.length) return { how: 'reshaped', metres, vertices: 0 }
  const reversed =
    isLineItem(after) && from.every((vertex, index) => isSamePlace(vertex, to[to.length - 1 - index]))
  return reversed ? { how: 'reversed', metres: 0, vertices: 0 } : { how: 'moved', metres, vertices }
}

function verticesOf({ geometry }: Item): readonly XY[] {
  if (geometry === null) return []
  return geometry.type === 'Point' ? [geometry.coordinates] : geometry.coordinates
}

const isSamePlace = (a: XY, b: XY | undefined): boolean => a[0] === b?.[0] && a[1] === b[1]
