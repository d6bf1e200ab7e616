import { isJsonObject } from './json-object'
import { unreadable, type Unreadable } from './read-outcome'

/** System that a file's old `crs` member names; null is WGS 84 longitude and latitude, as GeoJSON has it today. */
export type NamedCrs = { outcome: 'crs'; srid: number | null; notes: string[] } | Unreadable

const LON_LAT_WGS_84 = 4326

/** Reads the `crs` member. Names: `EPSG:2449`, `urn:ogc:def:crs:EPSG::2449`, `urn:ogc:def:crs:OGC:1.3:CRS84` and their
 *  web addresses. Writers of EPSG:4326 in GeoJSON put longitude first, whatever the registry says. */
export function namedCrs(file: unknown): NamedCrs {
  const crs = isJsonObject(file) ? file['crs'] : undefined
  if (crs === undefined) return { outcome: 'crs', srid: null, notes: [] }
  if (crs === null) {
    const note =
      'The file says that its coordinate system is unknown; it was read as longitude and latitude (WGS 84).'
    return { outcome: 'crs', srid: null, notes: [note] }
  }
  const name = isJsonObject(crs) && isJsonObject(crs['properties']) ? crs['properties']['name'] : undefined
  if (typeof name !== 'string')
    return unreadable('The file has a “crs” member that does not name a coordinate system.')
  if (/CRS:?84$/i.test(name)) return { outcome: 'crs', srid: null, notes: [] }
  const code = /\bEPSG[:/]+(?:[\d.]*[:/]+)?(\d{4,6})$/i.exec(name)?.[1]
  if (code === undefined) {
    return unreadable(
      `The file’s coordinate system, “${name.slice(0, 80)}”, is not known. Save the file in longitude and latitude (WGS 84).`,
    )
  }
  const srid = Number(code)
  return { outcome: 'crs', srid: srid === LON_LAT_WGS_84 ? null : srid, notes: [] }
}
