import { describe, expect, it } from 'vitest'
import type { IntakeRecord } from '@shared/intake/records'
import { readFieldFile } from '../../../../../../server/features/intake/readers/read-file'

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text)
const read = (content: Uint8Array | string, name = 'field.geojson') =>
  readFieldFile(typeof content === 'string' ? bytes(content) : content, name, null)
const recordsOf = (content: Uint8Array | string, name?: string): IntakeRecord[] => {
  const outcome = read(content, name)
  if (outcome.outcome !== 'read') throw new Error(JSON.stringify(outcome))
  return outcome.records
}
const reasonOf = (content: Uint8Array | string, name?: string): string => {
  const outcome = read(content, name)
  return outcome.outcome === 'unreadable' ? outcome.reason : `not refused: ${outcome.outcome}`
}
const point = '{"type":"Point","coordinates":[3,45]}'
const feature = `{"type":"Feature","properties":{"name":"Holm"},"geometry":${point}}`
const kml = (inside: string) =>
  `<?xml version="1.0" encoding="UTF-8"?><kml xmlns="http://www.opengis.net/kml/2.2"><Document>${inside}</Document></kml>`
const placemark = '<Placemark><Point><coordinates>3,45</coordinates></Point></Placemark>'

const utf16 = (text: string, bigEndian: boolean): Uint8Array => {
  const little = Buffer.from(`\ufeff${text}`, 'utf16le')
  return bigEndian ? little.swap16() : little
}

describe('a file is read by what is in it', () => {
  it('whatever its name says, and that is noted', () => {
    expect(read(feature, 'traverse.kml')).toMatchObject({
      reader: 'geojson',
      notes: ['The name ends in .kml, but the file is GeoJSON; it was read as that.'],
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
    ['a zip archive', Uint8Array.of(0x50, 0x4b, 0x03, 0x04, 0x14, 0x00), /zip archive.*KMZ/],
    ['zero bytes', Uint8Array.of(0x7b, 0x22, 0x00, 0x00, 0x7d), /zero bytes/],
    ['a web page', '<!DOCTYPE html><html><body>Sign in</body></html>', /web page/],
    ['another XML', '<?xml version="1.0"?><gpx version="1.1"></gpx>', /not KML: its first element is <gpx>/],
    ['a table', 'lon,lat,strike\n3,45,12', /a table as text/],
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

describe('GeoJSON', () => {
  it('is read as a collection, a feature or a bare geometry', () => {
    expect(recordsOf(`{"type":"FeatureCollection","features":[${feature},${feature}]}`)).toHaveLength(2)
    expect(recordsOf(feature)[0]?.attributes).toEqual({ name: 'Holm' })
    expect(recordsOf(point)[0]?.parts).toEqual([{ form: 'point', position: [3, 45] }])
  })

  it('keeps broken records, so that each can be refused by its number', () => {
    const features = [
      'null',
      '{"type":"Feature","geometry":null,"properties":null}',
      '{"type":"Feature","geometry":{"type":"LineString","coordinates":[[3,45],["4","45"]]}}',
      '{"type":"Feature","geometry":{"type":"Circle","coordinates":[3,45]}}',
      '{"type":"Feature","geometry":{"type":"Polygon","coordinates":[]}}',
    ]
    expect(recordsOf(`{"type":"FeatureCollection","features":[${features.join()}]}`)).toEqual([
      {
        number: 1,
        parts: [{ form: 'unreadable', reason: 'This is not a GeoJSON feature.' }],
        attributes: {},
      },
      { number: 2, parts: [], attributes: {} },
      {
        number: 3,
        parts: [{ form: 'unreadable', reason: 'Vertex 2: the coordinates are not numbers.' }],
        attributes: {},
      },
      {
        number: 4,
        parts: [{ form: 'unreadable', reason: '“Circle” is not a geometry type of GeoJSON.' }],
        attributes: {},
      },
      { number: 5, parts: [{ form: 'area' }], attributes: {} },
    ])
  })

  it('takes multi-part geometries and collections apart in order', () => {
    const geometry = `{"type":"GeometryCollection","geometries":[${point},
      {"type":"MultiLineString","coordinates":[[[3,45],[4,45]],[[5,45],[6,45]]]},
      {"type":"MultiPoint","coordinates":[[7,45]]}]}`
    expect(recordsOf(geometry)[0]?.parts.map((part) => part.form)).toEqual(['point', 'line', 'line', 'point'])
  })

  it('keeps the id of a feature as a column', () => {
    expect(
      recordsOf('{"type":"Feature","id":12,"geometry":null,"properties":{"a":1}}')[0]?.attributes,
    ).toEqual({
      a: 1,
      id: 12,
    })
  })

  it.each([
    [
      'cut off',
      '{"type":"FeatureCollection",\n"features":[{"type":"Fea',
      /not whole: it breaks off at line 2, column 25/,
    ],
    ['NaN', '{"type":"Point",\n"coordinates":[NaN,45]}', /“NaN” at line 2, column 16 does not belong there/],
    ['text after its end', `${point} ok`, /“ok” at line 1, column 39/],
    ['a trailing comma', '[1,]', /“\]” at line 1, column 4/],
    ['TopoJSON', '{"type":"Topology","objects":{}}', /not GeoJSON: its type is “Topology”/],
    ['a list', '[1,2]', /not GeoJSON/],
    ['no features', '{"type":"FeatureCollection","features":[]}', /holds no records/],
    ['features that are no list', '{"type":"FeatureCollection","features":{}}', /without a list of features/],
  ])('with %s is refused, naming the place', (_, content, reason) => {
    expect(reasonOf(content)).toMatch(reason)
  })

  it('survives deep nesting', () => {
    const deep = `${'{"type":"GeometryCollection","geometries":['.repeat(20_000)}${']}'.repeat(20_000)}`
    expect(recordsOf(deep)[0]?.parts).toEqual([
      { form: 'unreadable', reason: 'Geometry collections are nested too deeply.' },
    ])
    const list = `{"type":"Feature","geometry":null,"properties":{"a":${'['.repeat(100_000)}${']'.repeat(100_000)}}}`
    expect(JSON.stringify(recordsOf(list)[0]?.attributes)).toContain('(nested too deeply to be kept)')
  })

  it('replaces characters that the database cannot hold, and names no property of objects', () => {
    const text =
      '{"type":"Feature","geometry":null,"properties":{"a\\u0000":"x\\u0000\\ud800","__proto__":{"b":1}}}'
    const attributes = recordsOf(text)[0]?.attributes ?? {}
    expect(Object.entries(attributes)).toEqual([
      ['a\ufffd', 'x\ufffd\ufffd'],
      ['__proto__', { b: 1 }],
    ])
    expect(Object.getPrototypeOf(attributes)).toBe(Object.prototype)
  })
})

describe('the old crs member', () => {
  const named = (name: string) =>
    `{"type":"FeatureCollection","crs":{"type":"name","properties":{"name":"${name}"}},"features":[
      {"type":"Feature","properties":{},"geometry":{"type":"Point","coordinates":[736446.0261,4987329.5047]}}]}`

  it.each(['urn:ogc:def:crs:OGC:1.3:CRS84', 'urn:ogc:def:crs:EPSG::4326', 'EPSG:4326'])(
    'is longitude and latitude for %s',
    (name) => {
      expect(read(named(name)).outcome).toBe('read')
    },
  )

  it.each(['EPSG:32631', 'urn:ogc:def:crs:EPSG::32631', 'http://www.opengis.net/def/crs/EPSG/0/32631'])(
    'asks for the definition of %s and converts with it',
    (name) => {
      expect(read(named(name))).toEqual({ outcome: 'asks-crs', srid: 32631 })
      const crs = { srid: 32631, proj4: '+proj=utm +zone=31 +datum=WGS84 +units=m +no_defs' }
      const converted = readFieldFile(bytes(named(name)), 'field.geojson', crs)
      if (converted.outcome !== 'read') throw new Error(converted.outcome)
      // Outside value: geodesy.md section 3, 45° N 6° E in zone 31. A ten-millionth of a degree is a centimetre.
      const part = converted.records[0]?.parts[0]
      expect(part?.form === 'point' && part.position[0]).toBeCloseTo(6, 7)
      expect(part?.form === 'point' && part.position[1]).toBeCloseTo(45, 7)
    },
  )

  it('is refused where it names something unknown', () => {
    expect(reasonOf(named('Merrow local grid'))).toMatch(/“Merrow local grid”, is not known/)
  })
})

describe('KML', () => {
  it('gives placemarks in order, with folders, data and those without geometry', () => {
    const text = kml(`<Schema name="s" id="s"><SimpleField name="dip" type="int"/></Schema>
      <Folder><name>North shore</name><Folder><name>Day 2</name>
        <Placemark><name>K 1</name><ExtendedData><SchemaData schemaUrl="#s"><SimpleData name="dip">40</SimpleData></SchemaData>
          <Data name="strike"><value>045</value></Data></ExtendedData><Point><coordinates>3,45,12</coordinates></Point></Placemark>
      </Folder></Folder>
      <Placemark><name>K 2</name><description>no place</description></Placemark>
      <Placemark><LineString><coordinates>
        3,45 3.1,45
        3.2,45 </coordinates></LineString></Placemark>`)
    expect(recordsOf(text, 'a.kml')).toEqual([
      {
        number: 1,
        parts: [{ form: 'point', position: [3, 45, 12] }],
        attributes: { name: 'K 1', dip: '40', strike: '045', folder: 'North shore / Day 2' },
      },
      { number: 2, parts: [], attributes: { name: 'K 2', description: 'no place' } },
      {
        number: 3,
        parts: [
          {
            form: 'line',
            positions: [
              [3, 45],
              [3.1, 45],
              [3.2, 45],
            ],
          },
        ],
        attributes: {},
      },
    ])
  })

  it('reads multi-geometries and tracks', () => {
    const text = kml(`<Placemark><MultiGeometry><LineString><coordinates>3,45 4,45</coordinates></LineString>
        <LineString><coordinates>5,45 6,45</coordinates></LineString></MultiGeometry></Placemark>
      <Placemark xmlns:gx="http://www.google.com/kml/ext/2.2"><gx:Track><gx:coord>3 45 0</gx:coord>
        <gx:coord>4 45 0</gx:coord></gx:Track></Placemark>`)
    expect(recordsOf(text, 'a.kml').map(({ parts }) => parts.map((part) => part.form))).toEqual([
      ['line', 'line'],
      ['line'],
    ])
  })

  it('says what it passes over', () => {
    const text = kml(
      `${placemark}<GroundOverlay/><NetworkLink><Link><href>http://merrow.example/</href></Link></NetworkLink>`,
    )
    expect(read(text, 'a.kml')).toMatchObject({
      notes: ['Not read: 1 <GroundOverlay>, 1 <NetworkLink>. Placemarks with points and lines are.'],
    })
  })

  it('keeps coordinates that are no numbers for the refusal to name', () => {
    const [record] = recordsOf(
      kml('<Placemark><Point><coordinates>east,45</coordinates></Point></Placemark>'),
      'a.kml',
    )
    expect(record?.parts).toEqual([{ form: 'point', position: [NaN, 45] }])
  })

  const entities = '<!DOCTYPE kml [<!ENTITY a "aaaa"><!ENTITY b "&a;&a;&a;&a;">]>'
  it.each([
    [
      'entity expansion',
      `<?xml version="1.0"?>${entities}<kml><Document>${placemark}</Document></kml>`,
      /entities of its own/,
    ],
    [
      'an external entity',
      `<!DOCTYPE kml [<!ENTITY x SYSTEM "file:///etc/hostname">]><kml>&x;</kml>`,
      /entities of its own/,
    ],
    ['a declaration behind a comment', `<!-- <kml> --><!doctype kml []><kml></kml>`, /entities of its own/],
    ['unclosed elements', kml(placemark).slice(0, -20), /seems to be cut off/],
    ['crossed elements', '<kml>\n<Document>\n</Folder></kml>', /do not fit together near line \d/],
    ['no placemarks', kml(''), /holds no placemarks/],
  ])('with %s is refused', (_, content, reason) => {
    expect(reasonOf(content, 'a.kml')).toMatch(reason)
  })

  it('may quote a declaration in a description', () => {
    const html = '<Placemark><description><![CDATA[<!DOCTYPE html><b>Holm</b>]]></description></Placemark>'
    expect(recordsOf(kml(html), 'a.kml')[0]?.attributes).toEqual({
      description: '<!DOCTYPE html><b>Holm</b>',
    })
  })

  it('survives deep nesting', () => {
    const depth = 50_000
    const deep = `<kml>${'<Folder>'.repeat(depth)}${placemark}${'</Folder>'.repeat(depth)}</kml>`
    const outcome = read(deep, 'a.kml')
    expect(['read', 'unreadable']).toContain(outcome.outcome)
  })
})
