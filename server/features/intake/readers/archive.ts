import { formatsInWords } from '@shared/intake/formats'
import { decodeText } from './decode-text'
import { readKml } from './kml'
import { unreadable, type ReadOutcome } from './read-outcome'
import { readShapefile, shapefileEndings } from './shapefile'
import { unpack } from './zip'

/** What packing programs add of their own. */
const isLitter = (name: string): boolean => /(^|\/)(__MACOSX\/|\.[^./])/.test(name)
const endsIn = (name: string, endings: readonly string[]): boolean =>
  !isLitter(name) && endings.some((ending) => name.toLowerCase().endsWith(`.${ending}`))

/** Reads a zip archive by what is in it: a KML document (KMZ), or the files of shapefiles. */
export function readArchive(bytes: Uint8Array): ReadOutcome {
  const unpacked = unpack(bytes, (name) => endsIn(name, ['kml', ...shapefileEndings]))
  if (unpacked.outcome === 'unreadable') return unpacked
  const { files, others } = unpacked
  const documents = [...files.keys()].filter((name) => endsIn(name, ['kml']))
  if (documents.length > 0) return readKmz(files, documents)
  if ([...files.keys()].some((name) => endsIn(name, ['shp']))) return readShapefile(files)
  const inside = [...files.keys(), ...others].filter((name) => !isLitter(name))
  const listed = inside.slice(0, 3).map((name) => `“${name.slice(0, 80)}”`)
  const holds =
    listed.length === 0 ? 'nothing' : `${listed.join(', ')}${inside.length > 3 ? ' and more' : ''}`
  return unreadable(`The file is a zip archive that holds ${holds}. ${formatsInWords} are read here.`)
}

/** The document of a KMZ is `doc.kml`, or the first that there is. Source: OGC KML 2.2, KMZ. */
function readKmz(files: ReadonlyMap<string, Uint8Array>, documents: readonly string[]): ReadOutcome {
  const name = documents.find((each) => each.toLowerCase() === 'doc.kml') ?? documents[0] ?? ''
  const decoded = decodeText(files.get(name) ?? new Uint8Array())
  if (decoded.outcome === 'unreadable') return decoded
  const read = readKml(decoded.text)
  if (read.outcome === 'unreadable') return read
  const more = documents.length - 1
  const note =
    more === 0 ? [] : [`Read: ${name}. Not read: ${more} other KML ${more === 1 ? 'file' : 'files'}.`]
  return { ...read, reader: 'kmz', notes: [...decoded.notes, ...note, ...read.notes] }
}
