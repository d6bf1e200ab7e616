import { sheetProjection } from '@shared/geometry/projection'
import type { IntakeRecord, RecordPart } from '@shared/intake/records'
import { cleanAttributes } from './clean-attributes'
import { readGeometry } from './geojson-geometry'
import { namedCrs } from './geojson-crs'
import { findJsonFault } from './json-fault'
import { isJsonObject, type JsonObject } from './json-object'
import { unreadable, type AsksCrs, type FileCrs, type ReadOutcome, type Unreadable } from './read-outcome'
import { lineAndColumn } from './text-position'
import { toDegrees } from './to-degrees'

const geometryTypes: readonly unknown[] = [
  'Point',
  'MultiPoint',
  'LineString',
  'MultiLineString',
  'Polygon',
  'MultiPolygon',
  'GeometryCollection',
]

/** Reads GeoJSON: a FeatureCollection, one Feature or one geometry. Source: RFC 7946; the `crs` member of its
 *  forerunner (GeoJSON 2008, section 3) is honoured where `crs` gives the definition it names. */
export function readGeoJson(text: string, crs: FileCrs | null): ReadOutcome | AsksCrs {
  const parsed = parseJson(text)
  if (parsed.outcome === 'unreadable') return parsed
  const features = featuresOf(parsed.value)
  if (features.outcome === 'unreadable') return features
  const named = namedCrs(parsed.value)
  if (named.outcome === 'unreadable') return named
  if (named.srid !== null && named.srid !== crs?.srid) return { outcome: 'asks-crs', srid: named.srid }
  const read = features.features.map((feature, index) => toRecord(feature, index + 1))
  if (crs === null || named.srid === null) {
    return { outcome: 'read', reader: 'geojson', records: read, notes: named.notes }
  }
  const note = `The file names EPSG:${crs.srid}; its coordinates were converted to longitude and latitude (WGS 84).`
  return {
    outcome: 'read',
    reader: 'geojson',
    records: toDegrees(read, sheetProjection(crs.proj4)),
    notes: [...named.notes, note],
    system: `EPSG:${crs.srid}`,
  }
}

function parseJson(text: string): { outcome: 'json'; value: unknown } | Unreadable {
  try {
    return { outcome: 'json', value: JSON.parse(text) }
  } catch {
    const at = findJsonFault(text) ?? 0
    const cutOff = isCutOff(text.slice(at))
    const { line, column } = lineAndColumn(text, cutOff ? text.length : at)
    const place = `line ${line}, column ${column}`
    if (cutOff) return unreadable(`The file is not whole: it breaks off at ${place}.`)
    const found = text.slice(at, at + 12).split(/[\s,\]}]/)[0] || text[at]
    return unreadable(`The file is not JSON: “${found}” at ${place} does not belong there.`)
  }
}

/** Whether what remains from a fault on is nothing, or the beginning of a text, number or word. */
const isCutOff = (rest: string): boolean =>
  rest.trim() === '' ||
  (rest.startsWith('"') && !rest.includes('"', 1)) ||
  /^([-+.eE\d]+|tr?u?|fa?l?s?|nu?l?)$/.test(rest)

function featuresOf(value: unknown): { outcome: 'features'; features: unknown[] } | Unreadable {
  if (!isJsonObject(value)) return unreadable('The file is JSON, but not GeoJSON: it holds no object.')
  const { type } = value
  if (type === 'FeatureCollection') {
    if (Array.isArray(value['features'])) return { outcome: 'features', features: value['features'] }
    return unreadable('The file is a FeatureCollection without a list of features.')
  }
  if (type === 'Feature') return { outcome: 'features', features: [value] }
  if (geometryTypes.includes(type)) {
    return { outcome: 'features', features: [{ type: 'Feature', properties: {}, geometry: value }] }
  }
  const what = typeof type === 'string' ? `its type is “${type.slice(0, 40)}”` : 'it states no type'
  return unreadable(`The file is JSON, but not GeoJSON: ${what}.`)
}

function toRecord(feature: unknown, number: number): IntakeRecord {
  if (!isJsonObject(feature) || feature['type'] !== 'Feature') {
    const part: RecordPart = { form: 'unreadable', reason: 'This is not a GeoJSON feature.' }
    return { number, parts: [part], attributes: {} }
  }
  return { number, parts: readGeometry(feature['geometry']), attributes: attributesOf(feature) }
}

/** Properties, and the feature's own id as the column `id` unless there is one. */
function attributesOf(feature: JsonObject): Record<string, unknown> {
  const properties = isJsonObject(feature['properties']) ? feature['properties'] : {}
  const id = feature['id']
  return cleanAttributes(
    id === undefined || Object.hasOwn(properties, 'id') ? properties : { ...properties, id },
  )
}
