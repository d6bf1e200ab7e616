import { formatsInWords } from '@shared/intake/formats'
import { lineAndColumn } from './text-position'
import { unreadable, type Unreadable } from './read-outcome'

export type DecodedText = { outcome: 'text'; text: string; notes: string[] } | Unreadable

/** First bytes by which files that are not text give themselves away. */
const signatures: readonly (readonly [name: string, bytes: readonly number[]])[] = [
  ['a PNG picture', [0x89, 0x50, 0x4e, 0x47]],
  ['a JPEG picture', [0xff, 0xd8, 0xff]],
  ['a GIF picture', [0x47, 0x49, 0x46, 0x38]],
  ['a TIFF picture', [0x49, 0x49, 0x2a, 0x00]],
  ['a TIFF picture', [0x4d, 0x4d, 0x00, 0x2a]],
  ['a PDF document', [0x25, 0x50, 0x44, 0x46]],
  ['a gzip archive: unpack it first', [0x1f, 0x8b]],
  ['a SQLite database (GeoPackages are such)', [0x53, 0x51, 0x4c, 0x69, 0x74, 0x65]],
  ['a part of a shapefile: bring all its files as one zip archive', [0x00, 0x00, 0x27, 0x0a]],
  ['an old office document', [0xd0, 0xcf, 0x11, 0xe0]],
]

/** A file's bytes as text. UTF-8 with or without byte order mark, UTF-16 told by its mark or its zeros, and whatever an
 *  XML file declares. Anything else is refused with what it looks like. */
export function decodeText(bytes: Uint8Array): DecodedText {
  if (bytes.length === 0) return unreadable('The file is empty.')
  const known = signatures.find(([, start]) => start.every((byte, index) => bytes[index] === byte))
  if (known) return unreadable(`The file is ${known[0]}. ${formatsInWords} are read here.`)
  const encoding = encodingOf(bytes)
  const decoded = decodeAs(bytes, encoding)
  if (decoded.outcome === 'unreadable') return decoded
  if (decoded.text.includes('\0')) return unreadable('The file is not text: it holds zero bytes.')
  if (decoded.text.trim() === '') return unreadable('The file holds nothing but blanks.')
  const notes =
    encoding === 'utf-8' ? [] : [`The text is encoded in ${encoding.toUpperCase()}; it was converted.`]
  return { ...decoded, notes }
}

function encodingOf(bytes: Uint8Array): string {
  const [first, second, third] = bytes
  if (first === 0xff && second === 0xfe) return 'utf-16le'
  if (first === 0xfe && second === 0xff) return 'utf-16be'
  // Without a mark: both formats begin with an ASCII character, whose other byte in UTF-16 is zero.
  if (first !== 0 && second === 0 && third !== 0) return 'utf-16le'
  if (first === 0 && second !== 0) return 'utf-16be'
  return declaredEncoding(bytes) ?? 'utf-8'
}

/** Encoding that an XML declaration names. */
function declaredEncoding(bytes: Uint8Array): string | undefined {
  const start = Buffer.from(bytes.subarray(0, 200)).toString('latin1')
  const declared = /^\s*(?:\u00ef\u00bb\u00bf)?<\?xml[^>]*\bencoding\s*=\s*["']([A-Za-z0-9._-]+)["']/.exec(
    start,
  )?.[1]
  return declared?.toLowerCase()
}

function decodeAs(bytes: Uint8Array, encoding: string): DecodedText {
  const decoder = decoderFor(encoding)
  if (!decoder) return unreadable(`The file says that it is encoded in “${encoding}”, which is not known.`)
  try {
    return { outcome: 'text', text: decoder.decode(bytes), notes: [] }
  } catch {
    const name = encoding.toUpperCase()
    const place =
      encoding === 'utf-8' ? ` Line ${firstBadLine(bytes)} holds the first byte that does not fit.` : ''
    return unreadable(`The file is not text in ${name}.${place} Save it as UTF-8.`)
  }
}

function decoderFor(encoding: string) {
  try {
    return new TextDecoder(encoding, { fatal: true })
  } catch {
    // A label that the Encoding Standard does not list.
    return undefined
  }
}

/** Line of the first byte that is not UTF-8: the line after which a lenient reading first puts a replacement. */
function firstBadLine(bytes: Uint8Array): number {
  const text = new TextDecoder('utf-8').decode(bytes)
  return lineAndColumn(text, text.indexOf('\ufffd')).line
}
