import toGeoJSON from '@mapbox/togeojson'
import type { Element } from '@xmldom/xmldom'
import type { IntakeRecord } from '@shared/intake/records'
import { cleanAttributes } from './clean-attributes'
import { readGeometry } from './geojson-geometry'
import { unreadable, type ReadOutcome } from './read-outcome'
import { parseXml } from './xml'

const kinds = ['wpt', 'rte', 'trk'] as const

/** Reads GPX: waypoints, routes and tracks are records, in this order and within it in the file's; each has its kind as
 *  the column `gpx`. Nothing that the file points to is fetched.
 *  Source: GPX 1.1 by way of @mapbox/togeojson, one element at a time. */
export function readGpx(text: string): ReadOutcome {
  const parsed = parseXml(text, 'gpx', 'GPX')
  if (parsed.outcome === 'unreadable') return parsed
  const elements = kinds.flatMap((kind) =>
    [...parsed.document.getElementsByTagName(kind)].map((element) => ({ kind, element })),
  )
  if (elements.length === 0) {
    return unreadable('The file is GPX, but holds no waypoints, routes or tracks.')
  }
  const records = elements.map(({ kind, element }, index) => toRecord(kind, element, index + 1))
  return { outcome: 'read', reader: 'gpx', records, notes: [] }
}

const words = { wpt: 'waypoint', rte: 'route', trk: 'track' } as const

function toRecord(kind: (typeof kinds)[number], element: Element, number: number): IntakeRecord {
  // One element at a time, so that none is dropped unseen and each keeps its number.
  const { features } = toGeoJSON.gpx({ getElementsByTagName: (name) => (name === kind ? [element] : []) })
  const [feature] = features
  // A way of fewer than two places has no line; its texts are all that remains.
  const properties = feature?.properties ?? textsOf(element)
  return {
    number,
    parts: readGeometry(feature?.geometry),
    attributes: cleanAttributes({ ...properties, gpx: words[kind] }),
  }
}

const textsOf = (element: Element): Record<string, string> =>
  Object.fromEntries(
    [...element.childNodes]
      .filter(({ nodeName }) => ['name', 'cmt', 'desc', 'type'].includes(nodeName))
      .map(({ nodeName, textContent }) => [nodeName, textContent ?? '']),
  )
