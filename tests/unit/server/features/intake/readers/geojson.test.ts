import { describe, expect, it } from 'vitest'
import { readFieldFile } from '../../../../../../server/features/intake/readers/read-file'
import { bytes, feature, point, read, reasonOf, recordsOf } from '../../../../../support/field-text'

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
