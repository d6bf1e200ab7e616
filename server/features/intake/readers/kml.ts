import toGeoJSON from '@mapbox/togeojson'
import type { Document, Element } from '@xmldom/xmldom'
import type { IntakeRecord } from '@shared/intake/records'
import { cleanAttributes } from './clean-attributes'
import { readGeometry } from './geojson-geometry'
import { unreadable, type ReadOutcome } from './read-outcome'
import { parseXml } from './xml'

/** Things of KML that are neither points nor lines of a record. */
const passedOver = ['GroundOverlay', 'PhotoOverlay', 'ScreenOverlay', 'NetworkLink', 'Model'] as const

/** Reads KML: every placemark is a record, in the file's order, also those without geometry; the names of the folders
 *  around it become the column `folder`. Nothing that the file points to is fetched.
 *  Source: OGC KML 2.2 by way of @mapbox/togeojson, one placemark at a time. */
export function readKml(text: string): ReadOutcome {
  const parsed = parseXml(text, 'kml', 'KML')
  if (parsed.outcome === 'unreadable') return parsed
  const { document } = parsed
  const placemarks = [...document.getElementsByTagName('Placemark')]
  if (placemarks.length === 0) return unreadable('The file is KML, but holds no placemarks.')
  const records = placemarks.map((placemark, index) => toRecord(placemark, index + 1, document))
  return { outcome: 'read', reader: 'kml', records, notes: notesOf(document) }
}

function toRecord(placemark: Element, number: number, document: Document): IntakeRecord {
  const [feature] = featuresOf(placemark)
  const read = feature ?? withoutGeometry(placemark, document)
  const folder = folderOf(placemark)
  const properties = { ...read?.properties }
  const attributes =
    folder === '' || Object.hasOwn(properties, 'folder') ? properties : { ...properties, folder }
  return { number, parts: readGeometry(feature?.geometry), attributes: cleanAttributes(attributes) }
}

/** One placemark at a time, so that none is dropped unseen and each keeps its number. */
const featuresOf = (placemark: Element) =>
  toGeoJSON.kml({ getElementsByTagName: (name) => (name === 'Placemark' ? [placemark] : []) }).features

/** The library drops a placemark without geometry; one that it is lent for the moment lets it read the attributes. */
function withoutGeometry(placemark: Element, document: Document) {
  const point = document.createElement('Point')
  const coordinates = document.createElement('coordinates')
  coordinates.appendChild(document.createTextNode('0,0'))
  point.appendChild(coordinates)
  placemark.appendChild(point)
  const [feature] = featuresOf(placemark)
  placemark.removeChild(point)
  return feature
}

/** Names of the folders around a placemark, outermost first. */
function folderOf(placemark: Element): string {
  const names: string[] = []
  for (let around = placemark.parentNode; around; around = around.parentNode) {
    if (around.nodeName !== 'Folder') continue
    const name = [...around.childNodes].find((child) => child.nodeName === 'name')?.textContent?.trim()
    if (name) names.unshift(name)
  }
  return names.join(' / ')
}

function notesOf(document: Document): string[] {
  const counts = passedOver
    .map((name) => ({ name, count: document.getElementsByTagName(name).length }))
    .filter(({ count }) => count > 0)
    .map(({ name, count }) => `${count} <${name}>`)
  return counts.length === 0 ? [] : [`Not read: ${counts.join(', ')}. Placemarks with points and lines are.`]
}
