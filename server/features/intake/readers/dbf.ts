import { parseDbf } from 'shpjs'
import { unreadable, type Unreadable } from './read-outcome'

type Rows = { outcome: 'rows'; rows: Record<string, unknown>[]; notes: string[] } | Unreadable

const HEADER_BYTES = 32
/** What such files are encoded in where nothing says it and they are not UTF-8. Source: common practice. */
const USUAL_ENCODING = 'windows-1252'

/** Rows of a shapefile's table, with dates as text and figures that are none as null. Without a `.cpg` file the text is
 *  read as UTF-8, or, where it is not, as Windows-1252, which is said. Source: dBASE III table header. */
export function readDbf(bytes: Uint8Array, cpg: Uint8Array | undefined): Rows {
  if (bytes.length < HEADER_BYTES) return unreadable('Its .dbf table is not whole.')
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  const [rows, headerBytes, rowBytes] = [
    view.getUint32(4, true),
    view.getUint16(8, true),
    view.getUint16(10, true),
  ]
  // Checked before the parser trusts these figures: a row of no bytes could be read without end.
  if (rows > 0 && (rowBytes === 0 || headerBytes + rows * rowBytes > bytes.length + 1)) {
    return unreadable('Its .dbf table is cut off, or its header is wrong.')
  }
  try {
    const read = parseDbf(bytes, cpg).map(cleanRow)
    if (cpg !== undefined || !read.some(isBroken)) return { outcome: 'rows', rows: read, notes: [] }
    const encoded = new TextEncoder().encode(USUAL_ENCODING)
    const note = 'Its table does not state its encoding and is not UTF-8; it was read as Windows-1252.'
    return { outcome: 'rows', rows: parseDbf(bytes, encoded).map(cleanRow), notes: [note] }
  } catch {
    return unreadable('Its .dbf table cannot be read.')
  }
}

const cleanRow = (row: Record<string, unknown>): Record<string, unknown> =>
  Object.fromEntries(Object.entries(row).map(([name, value]) => [name, cleanCell(value)]))

function cleanCell(value: unknown): unknown {
  if (typeof value === 'number') return Number.isFinite(value) ? value : null
  if (!(value instanceof Date)) return value
  if (Number.isNaN(value.getTime())) return null
  // The parser makes local dates of days.
  const two = (figure: number) => String(figure).padStart(2, '0')
  return `${value.getFullYear()}-${two(value.getMonth() + 1)}-${two(value.getDate())}`
}

const isBroken = (row: Record<string, unknown>): boolean =>
  Object.entries(row).some(([name, value]) =>
    `${name}${typeof value === 'string' ? value : ''}`.includes('\ufffd'),
  )
