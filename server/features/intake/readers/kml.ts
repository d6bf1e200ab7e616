import toGeoJSON from '@mapbox/togeojson'
import { DOMParser, onErrorStopParsing, ParseError, type Document, type Element } from '@xmldom/xmldom'
import type { IntakeRecord } from '@shared/intake/records'
import { cleanAttributes } from './clean-attributes'
import { readGeometry } from './geojson-geometry'
import { unreadable, type ReadOutcome, type Unreadable } from './read-outcome'

/** Things of KML that are neither points nor lines of a record. */
const passedOver = ['GroundOverlay', 'PhotoOverlay', 'ScreenOverlay', 'NetworkLink', 'Model'] as const

/** Reads KML: every placemark is a record, in the file's order, also those without geometry; the names of the folders
 *  around it become the column `folder`. Nothing that the file points to is fetched.
 *  Source: OGC KML 2.2 by way of @mapbox/togeojson, one placemark at a time. */
export function readKml(text: string): ReadOutcome {
  // Inside comments and CDATA these are mere text; anywhere else `<!` can only open a declaration.
  const markup = text.replace(/<!--[\s\S]*?-->|<!\[CDATA\[[\s\S]*?\]\]>/g, '')
  if (/<!(DOCTYPE|ENTITY)/i.test(markup)) {
    return unreadable(
      'The file declares a document type or entities of its own. KML needs none, and such files are not read.',
    )
  }
  const parsed = parseXml(text)
  if (parsed.outcome === 'unreadable') return parsed
  const { document } = parsed
  const placemarks = [...document.getElementsByTagName('Placemark')]
  if (placemarks.length === 0) return unreadable('The file is KML, but holds no placemarks.')
  const records = placemarks.map((placemark, index) => toRecord(placemark, index + 1, document))
  return { outcome: 'read', reader: 'kml', records, notes: notesOf(document) }
}

function parseXml(text: string): { outcome: 'xml'; document: Document } | Unreadable {
  try {
    const document = new DOMParser({ onError: onErrorStopParsing }).parseFromString(text, 'text/xml')
    const root = document.documentElement?.nodeName ?? ''
    if (root === 'kml') return { outcome: 'xml', document }
    return unreadable(`The file is XML, but not KML: its first element is <${root.slice(0, 40)}>.`)
  } catch (cause) {
    if (!(cause instanceof ParseError)) throw cause
    const cutOff = !/<\/kml\s*>\s*$/.test(text.slice(-200))
    if (cutOff)
      return unreadable('The file is not whole: it does not end with </kml>, so it seems to be cut off.')
    const { lineNumber } = lineOf(cause.locator)
    const place = lineNumber > 0 ? ` near line ${lineNumber}` : ''
    return unreadable(`The file is not whole XML: its elements do not fit together${place}.`)
  }
}

/** xmldom does not type its locator. */
function lineOf(locator: unknown): { lineNumber: number } {
  const line =
    typeof locator === 'object' && locator !== null && 'lineNumber' in locator ? locator.lineNumber : 0
  return { lineNumber: typeof line === 'number' ? line : 0 }
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
