import type { IntakeRecord } from '@shared/intake/records'
import { readFieldFile } from '../../server/features/intake/readers/read-file'

export const bytes = (text: string): Uint8Array => new TextEncoder().encode(text)

/** What the reader makes of a file that names no coordinate system. */
export const read = (content: Uint8Array | string, name = 'field.geojson') =>
  readFieldFile(typeof content === 'string' ? bytes(content) : content, name, null)

/** The records of a file that has to be readable. */
export const recordsOf = (content: Uint8Array | string, name?: string): IntakeRecord[] => {
  const outcome = read(content, name)
  if (outcome.outcome !== 'read') throw new Error(JSON.stringify(outcome))
  return outcome.records
}

/** Why a file is refused. */
export const reasonOf = (content: Uint8Array | string, name?: string): string => {
  const outcome = read(content, name)
  return outcome.outcome === 'unreadable' ? outcome.reason : `not refused: ${outcome.outcome}`
}

export const point = '{"type":"Point","coordinates":[3,45]}'
export const feature = `{"type":"Feature","properties":{"name":"Holm"},"geometry":${point}}`
export const kml = (inside: string) =>
  `<?xml version="1.0" encoding="UTF-8"?><kml xmlns="http://www.opengis.net/kml/2.2"><Document>${inside}</Document></kml>`
export const placemark = '<Placemark><Point><coordinates>3,45</coordinates></Point></Placemark>'
