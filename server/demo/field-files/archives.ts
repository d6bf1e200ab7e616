import shapefile from '@mapbox/shp-write'
import { strToU8, zipSync, type Zippable } from 'fflate'
import type { XY } from '@shared/units'

/** One layer of a shapefile: one kind of geometry, a row of attributes for each. */
export interface Layer {
  name: string
  rows: readonly Record<string, string | number>[]
  geometry: { type: 'POINT'; places: readonly XY[] } | { type: 'POLYLINE'; lines: readonly (readonly XY[])[] }
}

/** All files carry the day on which the survey handed them in, so that they are the same whenever they are written. */
const HANDED_IN = new Date(2026, 4, 14, 12)

/** A zip archive of a shapefile's layers, each with its projection as WKT. */
export function zippedShapefile(layers: readonly Layer[], projection: string): Uint8Array {
  const files: Zippable = {}
  for (const { name, rows, geometry } of layers) {
    const shapes =
      geometry.type === 'POINT'
        ? geometry.places.map((place) => [...place])
        : geometry.lines.map((line) => [line])
    shapefile.write([...rows], geometry.type, shapes, (fault, written) => {
      if (fault) throw new Error(`The shapefile ${name} could not be written.`, { cause: fault })
      files[`${name}.shp`] = bytesOf(written.shp)
      files[`${name}.shx`] = bytesOf(written.shx)
      files[`${name}.dbf`] = dated(bytesOf(written.dbf))
      files[`${name}.prj`] = strToU8(projection)
      files[`${name}.cpg`] = strToU8('UTF-8')
    })
  }
  return zipSync(files, { mtime: HANDED_IN })
}

const bytesOf = (view: { buffer: ArrayBuffer }): Uint8Array => new Uint8Array(view.buffer)

/** The table with the day of its last change, bytes 1 to 3: year since 1900, month, day. Source: dBASE III table header. */
function dated(table: Uint8Array): Uint8Array {
  table.set([HANDED_IN.getFullYear() - 1900, HANDED_IN.getMonth() + 1, HANDED_IN.getDate()], 1)
  return table
}

/** A KML document packed as KMZ. Source: OGC KML 2.2, the document is named doc.kml. */
export const kmz = (document: string): Uint8Array =>
  zipSync({ 'doc.kml': strToU8(document) }, { mtime: HANDED_IN })
