import { decodeText } from './decode-text'
import { readGeoJson } from './geojson'
import { readKml } from './kml'
import { unreadable, type AsksCrs, type FileCrs, type ReadOutcome, type Unreadable } from './read-outcome'

/** Reads a field file by what is in it, not by its name; a name that says otherwise is noted.
 *  @param crs definition of the system that the file names, once asked for */
export function readFieldFile(bytes: Uint8Array, name: string, crs: FileCrs | null): ReadOutcome | AsksCrs {
  const decoded = decodeText(bytes)
  if (decoded.outcome === 'unreadable') return decoded
  const format = formatOf(decoded.text)
  if (typeof format !== 'string') return format
  const read = tryRead(() => (format === 'kml' ? readKml(decoded.text) : readGeoJson(decoded.text, crs)))
  if (read.outcome !== 'read') return read
  if (read.records.length === 0) return unreadable('The file holds no records.')
  return { ...read, notes: [...decoded.notes, ...nameNotes(name, format), ...read.notes] }
}

/** Elements nested in the ten thousands exhaust the stack of any reader; that is the file's fault, not ours. */
function tryRead<T>(read: () => T): T | Unreadable {
  try {
    return read()
  } catch (cause) {
    if (cause instanceof RangeError) return unreadable('The file is nested too deeply to be read.')
    throw cause
  }
}

function formatOf(text: string): 'geojson' | 'kml' | Unreadable {
  const start = text.slice(0, 2000).trimStart()
  if (/^[{[]/.test(start)) return 'geojson'
  if (/^<!doctype\s+html|^<html/i.test(start)) {
    return unreadable(
      'The file is a web page (HTML), perhaps a sign-in page that was saved in place of the file.',
    )
  }
  if (start.startsWith('<')) return 'kml'
  const firstLine = start.split(/\r|\n/)[0] ?? ''
  const table = /[,;\t].*[,;\t]/.test(firstLine) ? 'a table as text' : 'text'
  return unreadable(`The file looks like ${table}. GeoJSON and KML are read here.`)
}

function nameNotes(name: string, format: 'geojson' | 'kml'): string[] {
  const ending = /\.([a-z0-9]+)$/i.exec(name)?.[1]?.toLowerCase()
  const fits = format === 'kml' ? ['kml'] : ['geojson', 'json']
  if (ending === undefined || fits.includes(ending)) return []
  const words = format === 'kml' ? 'KML' : 'GeoJSON'
  return [`The name ends in .${ending}, but the file is ${words}; it was read as that.`]
}
