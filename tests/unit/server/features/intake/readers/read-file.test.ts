import { describe, expect, it } from 'vitest'
import { bytes, feature, kml, placemark, read, reasonOf, recordsOf } from '../../../../../support/field-text'

const utf16 = (text: string, bigEndian: boolean): Uint8Array => {
  const little = Buffer.from(`\ufeff${text}`, 'utf16le')
  return bigEndian ? little.swap16() : little
}

describe('a file is read by what is in it', () => {
  it('whatever its name says, and that is noted', () => {
    expect(read(feature, 'traverse.kml')).toMatchObject({
      reader: 'geojson',
      notes: ['The name ends in .kml, but the file was read as what it is: GeoJSON.'],
    })
    expect(read(kml(placemark), 'traverse.kml')).toMatchObject({ reader: 'kml', notes: [] })
  })

  it.each([
    ['a byte order mark', bytes(`\ufeff${feature}`)],
    ['UTF-16, little end first', utf16(feature, false)],
    ['UTF-16, big end first', utf16(feature, true)],
    ['UTF-16 without a mark', utf16(feature, false).subarray(2)],
  ])('with %s', (_, content) => {
    expect(recordsOf(content)).toHaveLength(1)
  })

  it('in the encoding that its XML declares', () => {
    const text = kml(
      '<Placemark><name>Île de Gréve</name><Point><coordinates>3,45</coordinates></Point></Placemark>',
    )
    const latin = Buffer.from(text.replace('UTF-8', 'ISO-8859-1'), 'latin1')
    expect(recordsOf(latin)[0]?.attributes).toMatchObject({ name: 'Île de Gréve' })
  })
})

describe('a file that is not what it should be is refused with what it looks like', () => {
  it.each([
    ['nothing', '', /empty/],
    ['blanks', ' \n\t\n', /nothing but blanks/],
    ['a PNG named .kml', Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a), /a PNG picture/],
    ['a gzip archive', Uint8Array.of(0x1f, 0x8b, 0x08, 0x00), /gzip archive: unpack it first/],
    ['a bare shape file', Uint8Array.of(0, 0, 0x27, 0x0a, 0, 0), /bring all its files as one zip archive/],
    ['zero bytes', Uint8Array.of(0x7b, 0x22, 0x00, 0x00, 0x7d), /zero bytes/],
    ['a web page', '<!DOCTYPE html><html><body>Sign in</body></html>', /web page/],
    ['another XML', '<?xml version="1.0"?><svg></svg>', /not KML: its first element is <svg>/],
    ['a letter', 'Dear Rosa', /looks like text/],
    ['broken UTF-8', Uint8Array.of(0x7b, 0x0a, 0x22, 0xe9, 0x22, 0x7d), /not text in UTF-8\. Line 2/],
    [
      'an unknown encoding',
      '<?xml version="1.0" encoding="klingon-8"?><kml></kml>',
      /“klingon-8”, which is not known/,
    ],
  ])('%s', (_, content, reason) => {
    expect(reasonOf(content)).toMatch(reason)
  })
})
