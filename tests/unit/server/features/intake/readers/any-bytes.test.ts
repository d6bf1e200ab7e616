import { assert, constantFrom, nat, property, tuple, uint8Array, type Arbitrary } from 'fast-check'
import { strToU8, zipSync } from 'fflate'
import { describe, it } from 'vitest'
import { readFieldFile } from '../../../../../../server/features/intake/readers/read-file'
import { zippedShapefile } from '../../../../../../server/demo/field-files/archives'
import { feature, kml, placemark } from '../../../../../support/field-text'

const wgs84 =
  'GEOGCS["GCS_WGS_1984",DATUM["D_WGS_1984",SPHEROID["WGS_1984",6378137,298.257223563]],PRIMEM["Greenwich",0],UNIT["Degree",0.0174532925199433]]'

/** A whole file of each kind. */
const whole: Record<string, Uint8Array> = {
  geojson: strToU8(`{"type":"FeatureCollection","features":[${feature},${feature}]}`),
  kml: strToU8(kml(placemark)),
  kmz: zipSync({ 'doc.kml': strToU8(kml(placemark)) }),
  gpx: strToU8('<gpx version="1.1"><wpt lat="45" lon="3"><name>K 7</name></wpt></gpx>'),
  csv: strToU8('station,lon,lat\n"K 7",3,45\n'),
  shapefile: zippedShapefile(
    [{ name: 'a', rows: [{ STN: 'K 7' }], geometry: { type: 'POINT', places: [[3, 45]] } }],
    wgs84,
  ),
}

/** A whole file with some of its bytes overwritten, cut out or put in anywhere. */
const damaged = (bytes: Uint8Array): Arbitrary<Uint8Array> =>
  tuple(nat(bytes.length), nat(40), uint8Array({ maxLength: 40 })).map(([at, gone, instead]) =>
    Uint8Array.from([...bytes.subarray(0, at), ...instead, ...bytes.subarray(at + gone)]),
  )

/** Reads without a throw, which would be a fault of ours: a file is read, refused in a sentence, or asks for its system. */
const isAnswered = (bytes: Uint8Array): boolean => {
  const read = readFieldFile(bytes, 'field.bin', null)
  return read.outcome !== 'unreadable' || /^\S.*[.?]$/s.test(read.reason)
}

describe('whatever bytes come, the reader answers', () => {
  it('to any', () => {
    assert(property(uint8Array({ maxLength: 400 }), isAnswered), { numRuns: 500, seed: 1 })
  })

  it.each(Object.entries(whole))('to a damaged %s', (_, bytes) => {
    assert(property(damaged(bytes), isAnswered), { numRuns: 400, seed: 1 })
  })

  it('to one kind that begins as another', () => {
    const kinds = constantFrom(...Object.values(whole))
    const spliced = tuple(kinds, kinds, nat(200)).map(([first, second, at]) =>
      Uint8Array.from([...first.subarray(0, at), ...second]),
    )
    assert(property(spliced, isAnswered), { numRuns: 400, seed: 1 })
  })
})
