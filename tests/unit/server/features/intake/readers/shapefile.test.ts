import { strToU8, unzipSync, zipSync } from 'fflate'
import { describe, expect, it } from 'vitest'
import { zippedShapefile } from '../../../../../../server/demo/field-files/archives'
import { read, reasonOf, recordsOf } from '../../../../../support/field-text'

const wgs84 =
  'GEOGCS["GCS_WGS_1984",DATUM["D_WGS_1984",SPHEROID["WGS_1984",6378137.0,298.257223563]],PRIMEM["Greenwich",0.0],UNIT["Degree",0.0174532925199433]]'
const nad27 = wgs84.replaceAll('WGS_1984', 'North_American_1927')

/** Two stations as a shapefile, with files changed, added or, undefined, left out. */
function shapefile(changes: Record<string, Uint8Array | undefined> = {}, prj = wgs84): Uint8Array {
  const rows = [
    { STN: 'K 7', STRIKE: 12 },
    { STN: 'K 8', STRIKE: 190 },
  ]
  const places: [number, number][] = [
    [3, 45],
    [3.25, 45.5],
  ]
  const files = unzipSync(
    zippedShapefile([{ name: 'stations', rows, geometry: { type: 'POINT', places } }], prj),
  )
  const kept = Object.entries({ ...files, ...changes }).filter(([, bytes]) => bytes !== undefined)
  return zipSync(Object.fromEntries(kept) as Record<string, Uint8Array>)
}
const part = (ending: string): Uint8Array => unzipSync(shapefile())[`stations.${ending}`] ?? new Uint8Array()

describe('a zipped shapefile', () => {
  it('gives its shapes with their rows', () => {
    expect(read(shapefile(), 'stations.zip')).toMatchObject({ reader: 'shapefile', notes: [] })
    expect(recordsOf(shapefile())).toEqual([
      { number: 1, parts: [{ form: 'point', position: [3, 45] }], attributes: { STN: 'K 7', STRIKE: 12 } },
      {
        number: 2,
        parts: [{ form: 'point', position: [3.25, 45.5] }],
        attributes: { STN: 'K 8', STRIKE: 190 },
      },
    ])
  })

  it('without .prj is read in degrees, without .dbf without attributes, and that is said', () => {
    const bare = shapefile({ 'stations.prj': undefined, 'stations.dbf': undefined })
    expect(read(bare, 'stations.zip')).toMatchObject({
      records: [{ attributes: {} }, { attributes: {} }],
      notes: [
        'stations.shp: It has no .dbf file, so its records have no attributes.',
        'stations.shp: It has no .prj file; its coordinates were read as longitude and latitude (WGS 84).',
      ],
    })
  })

  it('reads Windows-1252 where the table is not UTF-8 and does not say what it is', () => {
    const table = part('dbf')
    const at = Buffer.from(table).indexOf('K 7')
    table.set([0xce], at) // Î
    const files = { 'stations.dbf': table, 'stations.cpg': undefined }
    expect(read(shapefile(files), 'stations.zip')).toMatchObject({
      records: [{ attributes: { STN: 'Î 7' } }, {}],
      notes: expect.arrayContaining([expect.stringContaining('read as Windows-1252')]),
    })
  })

  const cut = (bytes: Uint8Array, length: number) => bytes.slice(0, length)
  const with32 = (bytes: Uint8Array, at: number, value: number, little = false): Uint8Array => {
    new DataView(bytes.buffer, bytes.byteOffset).setInt32(at, value, little)
    return bytes
  }
  it.each<[string, Record<string, Uint8Array | undefined>, RegExp]>([
    [
      'shapes cut off',
      { 'stations.shp': cut(part('shp'), 110) },
      /^stations\.shp: It is cut off: 110 of 156 bytes/,
    ],
    [
      'shapes that are something else',
      { 'stations.shp': strToU8('not a shapefile') },
      /does not begin as a shapefile/,
    ],
    [
      'a record of negative length',
      { 'stations.shp': with32(part('shp'), 104, -40) },
      /its shapes cannot be read/,
    ],
    [
      'a table of other rows',
      { 'stations.dbf': with32(part('dbf'), 4, 1, true) },
      /table has 1 rows for 2 shapes/,
    ],
    [
      'a table of four thousand million rows',
      { 'stations.dbf': with32(part('dbf'), 4, -1, true) },
      /\.dbf table is cut off, or its header is wrong/,
    ],
    [
      'rows of no bytes',
      { 'stations.dbf': part('dbf').fill(0, 10, 12) },
      /\.dbf table is cut off, or its header is wrong/,
    ],
    ['a table of a few bytes', { 'stations.dbf': cut(part('dbf'), 20) }, /\.dbf table is not whole/],
    [
      'a .prj that is none',
      { 'stations.prj': strToU8('UTM zone 26') },
      /does not describe a coordinate system/,
    ],
    [
      'a datum whose shift is not kept',
      { 'stations.prj': strToU8(nad27) },
      /datum “D_North_American_1927”, whose shift to WGS 84 is not kept/,
    ],
    [
      'a projection that is not known',
      { 'stations.prj': strToU8(`PROJCS["Odd",${wgs84},PROJECTION["Peirce_Folding"],UNIT["Meter",1]]`) },
      /“Odd”, cannot be converted here/,
    ],
  ])('with %s is refused', (_, files, reason) => {
    expect(reasonOf(shapefile(files), 'stations.zip')).toMatch(reason)
  })
})
