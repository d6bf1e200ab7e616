import type { LonLat, XY } from '@shared/units'
import { toLonLat } from '../merrow-island'

const degrees = (at: XY): string[] => toLonLat(at).map((value) => value.toFixed(7))
const lonLat = (at: XY): number[] => degrees(at).map(Number)

export const pointFeature = (at: XY, properties: object) => ({
  type: 'Feature',
  properties,
  geometry: { type: 'Point', coordinates: lonLat(at) },
})

export const lineFeature = (line: readonly XY[], properties: object) => ({
  type: 'Feature',
  properties,
  geometry: { type: 'LineString', coordinates: line.map(lonLat) },
})

export const geoJson = (features: readonly object[]): string =>
  `${JSON.stringify({ type: 'FeatureCollection', features }, null, 1)}\n`

const escaped = (text: string): string =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;')

const placemark = (name: string, data: Record<string, string>, geometry: string): string =>
  [
    `<Placemark><name>${escaped(name)}</name><ExtendedData>`,
    ...Object.entries(data).map(
      ([key, value]) => `<Data name="${escaped(key)}"><value>${escaped(value)}</value></Data>`,
    ),
    `</ExtendedData>${geometry}</Placemark>`,
  ].join('')

export const kmlPoint = (name: string, data: Record<string, string>, at: XY): string =>
  placemark(name, data, `<Point><coordinates>${degrees(at).join(',')},0</coordinates></Point>`)

export const kmlLine = (name: string, data: Record<string, string>, line: readonly XY[]): string =>
  placemark(
    name,
    data,
    `<LineString><coordinates>${line.map((at) => `${degrees(at).join(',')},0`).join(' ')}</coordinates></LineString>`,
  )

export const kml = (name: string, placemarks: readonly string[]): string =>
  [
    '<?xml version="1.0" encoding="UTF-8"?>',
    `<kml xmlns="http://www.opengis.net/kml/2.2"><Document><name>${escaped(name)}</name>`,
    ...placemarks,
    '</Document></kml>\n',
  ].join('\n')

/** A traverse as a receiver keeps it: the way walked, and a waypoint at each stop. Source: GPX 1.1 schema. */
export function gpx(
  name: string,
  way: readonly { at: XY; ele: number }[],
  stops: readonly { name: string; desc: string; at: XY; ele: number }[],
): string {
  const place = (tag: string, at: XY, inner: string): string => {
    const [lon, lat]: LonLat = toLonLat(at)
    return `<${tag} lat="${lat.toFixed(7)}" lon="${lon.toFixed(7)}">${inner}</${tag}>`
  }
  const elevation = (ele: number) => `<ele>${ele.toFixed(1)}</ele>`
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    '<gpx version="1.1" creator="Merrow Island Survey" xmlns="http://www.topografix.com/GPX/1/1">',
    ...stops.map(({ name: stop, desc, at, ele }) =>
      place('wpt', at, `${elevation(ele)}<name>${escaped(stop)}</name><desc>${escaped(desc)}</desc>`),
    ),
    `<trk><name>${escaped(name)}</name><trkseg>`,
    ...way.map(({ at, ele }) => place('trkpt', at, elevation(ele))),
    '</trkseg></trk></gpx>\n',
  ].join('\n')
}

/** Rows under a header; cells with separators or quotes are quoted. Source: RFC 4180. */
export function csv(rows: readonly (readonly (string | number)[])[], separator = ','): string {
  const cell = (value: string | number): string => {
    const text = String(value)
    return text.includes(separator) || text.includes('"') ? `"${text.replaceAll('"', '""')}"` : text
  }
  return `${rows.map((row) => row.map(cell).join(separator)).join('\r\n')}\r\n`
}

export { degrees }
