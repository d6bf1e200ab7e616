import { strToU8, zipSync, type Zippable } from 'fflate'
import { describe, expect, it } from 'vitest'
import { MAX_UNPACKED_BYTES } from '../../../../../../server/features/intake/readers/zip'
import { kml, placemark, read, reasonOf } from '../../../../../support/field-text'

const zip = (files: Zippable) => zipSync(files)
const document = strToU8(kml(placemark))

describe('KMZ', () => {
  it('is the document in it', () => {
    expect(
      read(zip({ 'doc.kml': document, 'files/photo.jpg': new Uint8Array(9) }), 'walk.kmz'),
    ).toMatchObject({
      reader: 'kmz',
      records: [{ number: 1, parts: [{ form: 'point', position: [3, 45] }] }],
      notes: [],
    })
  })

  it('says which of several documents was read', () => {
    const other = strToU8(kml('<Placemark><name>other</name></Placemark>'))
    expect(read(zip({ 'a.kml': other, 'doc.kml': document }), 'walk.kmz')).toMatchObject({
      records: [{ parts: [{ form: 'point' }] }],
      notes: ['Read: doc.kml. Not read: 1 other KML file.'],
    })
  })

  it('is refused for what its document is refused for', () => {
    expect(reasonOf(zip({ 'doc.kml': strToU8('<!DOCTYPE kml><kml/>') }), 'walk.kmz')).toMatch(
      /entities of its own/,
    )
    expect(reasonOf(zip({ 'doc.kml': new Uint8Array() }), 'walk.kmz')).toMatch(/The file is empty/)
  })
})

describe('a zip archive', () => {
  it.each<[string, Uint8Array, RegExp]>([
    ['with nothing in it', zip({}), /holds nothing\./],
    ['with other files', zip({ 'notes.txt': strToU8('x') }), /holds “notes\.txt”\. GeoJSON, KML/],
    [
      'with an archive inside, which stays shut',
      zip({ 'inner.kmz': zip({ 'doc.kml': document }) }),
      /holds “inner\.kmz”/,
    ],
    [
      'with no more than litter',
      zip({ '__MACOSX/doc.kml': document, '.hidden.kml': document }),
      /holds nothing/,
    ],
    ['cut off', zip({ 'doc.kml': document }).slice(0, -30), /not whole: its list of files cannot be read/],
    ['whose packed bytes are broken', broken(), /not whole/],
    [
      'with too many files',
      zip(Object.fromEntries(Array.from({ length: 2001 }, (_, i) => [`${i}.kml`, document]))),
      /holds 2001 files; at most 2000/,
    ],
  ])('%s is refused', (_, bytes, reason) => {
    expect(reasonOf(bytes, 'field.zip')).toMatch(reason)
  })

  it('that would swell beyond measure is refused before it is unpacked', () => {
    expect(reasonOf(claiming(zip({ 'doc.kml': document }), MAX_UNPACKED_BYTES + 1), 'bomb.kmz')).toBe(
      'Unpacked, the zip archive would fill 201 MB; up to 200 MB are read.',
    )
  })

  it.each([
    ['smaller', 200],
    ['larger', 2_000_000],
  ])('that says it is %s than it is, is refused', (_, size) => {
    const bytes = zip({ 'doc.kml': strToU8(kml(placemark.repeat(500))) })
    expect(reasonOf(claiming(bytes, size), 'lie.kmz')).toMatch(/its files are not as long as it says/)
  })

  it('that swells beyond what it says is dropped at the first step', () => {
    // Thirty million zeros in thirty thousand bytes.
    const bytes = claiming(zip({ 'doc.kml': new Uint8Array(30_000_000) }), 1000)
    expect(reasonOf(bytes, 'bomb.kmz')).toMatch(/its files are not as long as it says/)
  })

  it('keeps files that are stored and not packed', () => {
    expect(read(zipSync({ 'doc.kml': document }, { level: 0 }), 'walk.kmz').outcome).toBe('read')
  })

  it('with names that climb out of it is read like any other: names are not paths here', () => {
    expect(read(zip({ '../../etc/doc.kml': document }), 'walk.kmz').outcome).toBe('read')
  })
})

/** An archive whose list of files is whole and whose packed bytes are not. */
function broken(): Uint8Array {
  const bytes = zip({ 'doc.kml': strToU8(kml(placemark.repeat(50))) })
  // After the entry's header of 30 bytes and its name.
  return bytes.fill(0xff, 40, 120)
}

/** The archive with another unpacked size in the first entry of its list of files.
 *  Source: PKWARE APPNOTE 4.3.12, the entry begins with 50 4b 01 02 and has the size at 24. */
function claiming(bytes: Uint8Array, size: number): Uint8Array {
  const entry = Buffer.from(bytes).indexOf('PK\u0001\u0002')
  new DataView(bytes.buffer, bytes.byteOffset).setUint32(entry + 24, size, true)
  return bytes
}
