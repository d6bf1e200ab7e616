import type { FilePosition, RecordPart } from '@shared/intake/records'
import { isJsonObject, type JsonObject } from './json-object'

/** Deepest nesting of geometry collections that is read. */
const MAX_DEPTH = 16

/** The parts of a geometry in the file's order: multi-part geometries and collections are taken apart. None if it is
 *  null. What is not as RFC 7946 has it becomes an unreadable part, so that the record is refused with the reason. */
export function readGeometry(geometry: unknown, depth = 0): RecordPart[] {
  if (geometry === null || geometry === undefined) return []
  if (!isJsonObject(geometry)) return [broken('The geometry is not an object.')]
  if (depth > MAX_DEPTH) return [broken('Geometry collections are nested too deeply.')]
  if (geometry['type'] === 'GeometryCollection') {
    const members = geometry['geometries']
    if (!Array.isArray(members)) return [broken('A geometry collection has no list of geometries.')]
    return members.flatMap((member) => readGeometry(member, depth + 1))
  }
  return readSimple(geometry)
}

function readSimple({ type, coordinates }: JsonObject): RecordPart[] {
  switch (type) {
    case 'Point':
      return [toPoint(coordinates)]
    case 'MultiPoint':
      return listOf(coordinates, toPoint)
    case 'LineString':
      return [toLine(coordinates)]
    case 'MultiLineString':
      return listOf(coordinates, toLine)
    case 'Polygon':
      return [{ form: 'area' }]
    case 'MultiPolygon':
      return listOf(coordinates, () => ({ form: 'area' }))
    default:
      return [broken(`“${String(type).slice(0, 40)}” is not a geometry type of GeoJSON.`)]
  }
}

const listOf = (value: unknown, toPart: (member: unknown) => RecordPart): RecordPart[] =>
  Array.isArray(value) ? value.map(toPart) : [broken('The coordinates are not a list.')]

function toPoint(value: unknown): RecordPart {
  const position = toPosition(value)
  return position ? { form: 'point', position } : broken('The coordinates are not numbers.')
}

function toLine(value: unknown): RecordPart {
  if (!Array.isArray(value)) return broken('The coordinates are not a list.')
  const positions = value.map(toPosition)
  const whole = positions.filter((position) => position !== undefined)
  const wrong = positions.indexOf(undefined)
  if (wrong >= 0) return broken(`Vertex ${wrong + 1}: the coordinates are not numbers.`)
  return { form: 'line', positions: whole }
}

function toPosition(value: unknown): FilePosition | undefined {
  if (!Array.isArray(value)) return undefined
  const numbers = value.slice(0, 3)
  return numbers.every((member) => typeof member === 'number') ? numbers : undefined
}

const broken = (reason: string): RecordPart => ({ form: 'unreadable', reason })
