import { formats, formatsInWords, type Format } from '@shared/intake/formats'
import { readArchive } from './archive'
import { readCsv } from './csv'
import { decodeText } from './decode-text'
import { readGeoJson } from './geojson'
import { readGpx } from './gpx'
import { readKml } from './kml'
import { unreadable, type AsksCrs, type FileCrs, type ReadOutcome, type Unreadable } from './read-outcome'
import { isZip } from './zip'

/** Reads a field file by what is in it, not by its name; a name that says otherwise is noted.
 *  @param crs definition of the system that the file names, once asked for */
export function readFieldFile(bytes: Uint8Array, name: string, crs: FileCrs | null): ReadOutcome | AsksCrs {
  const read = tryRead(() => (isZip(bytes) ? readArchive(bytes) : readText(bytes, crs)))
  if (read.outcome !== 'read') return read
  if (read.records.length === 0) return unreadable('The file holds no records.')
  return { ...read, notes: [...nameNotes(name, read.reader), ...read.notes] }
}

function readText(bytes: Uint8Array, crs: FileCrs | null): ReadOutcome | AsksCrs {
  const decoded = decodeText(bytes)
  if (decoded.outcome === 'unreadable') return decoded
  const { text, notes } = decoded
  const read = readAs(formatOf(text), text, crs)
  return read.outcome === 'read' ? { ...read, notes: [...notes, ...read.notes] } : read
}

function readAs(
  format: 'geojson' | 'kml' | 'gpx' | 'csv' | Unreadable,
  text: string,
  crs: FileCrs | null,
): ReadOutcome | AsksCrs {
  switch (format) {
    case 'geojson':
      return readGeoJson(text, crs)
    case 'kml':
      return readKml(text)
    case 'gpx':
      return readGpx(text)
    case 'csv':
      return readCsv(text)
    default:
      return format
  }
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

function formatOf(text: string): 'geojson' | 'kml' | 'gpx' | 'csv' | Unreadable {
  const start = text.slice(0, 2000).trimStart()
  if (/^[{[]/.test(start)) return 'geojson'
  if (/^<!doctype\s+html|^<html/i.test(start)) {
    return unreadable(
      'The file is a web page (HTML), perhaps a sign-in page that was saved in place of the file.',
    )
  }
  if (start.startsWith('<')) return /<gpx[\s>]/.test(start) ? 'gpx' : 'kml'
  const header = start.split(/\r\n|\r|\n/).find((line) => line.trim() !== '' && !line.startsWith('#')) ?? ''
  return /[,;\t|]/.test(header)
    ? 'csv'
    : unreadable(`The file looks like text. ${formatsInWords} are read here.`)
}

function nameNotes(name: string, format: Format): string[] {
  const ending = /\.([a-z0-9]+)$/i.exec(name)?.[1]?.toLowerCase()
  const { words, endings } = formats[format]
  const fits: readonly string[] = endings
  if (ending === undefined || fits.includes(ending)) return []
  return [`The name ends in .${ending}, but the file was read as what it is: ${words}.`]
}
