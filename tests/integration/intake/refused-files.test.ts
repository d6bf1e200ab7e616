import { describe, expect, it } from 'vitest'
import { MAX_FILE_BYTES } from '../../../server/features/intake/intake.service'
import { collection, feature, kml, line, placemark, useIntakeDesk } from '../../support/intake-desk'

const desk = useIntakeDesk()

const utm = { type: 'Point', coordinates: [286_500.25, 5_281_250.5] }
const named = (name: string) => ({ crs: { type: 'name', properties: { name } } })
const png = Buffer.from(
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==',
  'base64',
)
const whole = collection([feature({ type: 'bedding', strike: 310, dip: 40 })])

/** Nine levels of ten: a thousand million words, were they expanded. */
const laughs = `<!DOCTYPE kml [<!ENTITY a0 "ha">${Array.from(
  { length: 9 },
  (_, level) => `<!ENTITY a${level + 1} "${`&a${level};`.repeat(10)}">`,
).join('')}]>`
const reachesOut = '<!DOCTYPE kml [<!ENTITY secret SYSTEM "file:///etc/passwd">]>'

/** Rows of intakes and of items, whatever the API would show of them. */
async function rows(): Promise<{ intakes: number; versions: number }> {
  const [counts] = await desk.server.dataSource.query<{ intakes: number; versions: number }[]>(
    `SELECT (SELECT count(*)::int FROM intake WHERE sheet_id = $1) AS intakes,
       (SELECT count(*)::int FROM item_version WHERE sheet_id = $1) AS versions`,
    [await desk.sheetId()],
  )
  if (!counts) throw new Error('PostgreSQL counted nothing.')
  return counts
}

describe('a file that cannot be read is refused in a sentence, and nothing of it is kept', () => {
  it.each<[string, string | Buffer, string, RegExp]>([
    ['a PNG named .kml', png, 'traverse.kml', /^traverse\.kml: The file is a PNG picture\./],
    ['an empty one', '', 'field.geojson', /The file is empty\./],
    [
      'GeoJSON cut off',
      whole.slice(0, -40),
      'field.geojson',
      /not whole: it breaks off at line 1, column \d+\./,
    ],
    ['KML cut off', kml(placemark({})).slice(0, -30), 'field.kml', /not whole: it does not end with <\/kml>/],
    [
      'a table without places',
      'station,strike\nK 7,12\n',
      'field.csv',
      /No columns of longitude and latitude/,
    ],
    ['a letter', 'Dear Rosa', 'field.kml', /looks like text/],
    ['JSON that is not GeoJSON', '{"name":"K 7"}', 'field.json', /not GeoJSON: it states no type/],
    ['a collection without records', collection([]), 'field.geojson', /holds no records/],
    ['KML without placemarks', kml('<name>Empty</name>'), 'field.kml', /holds no placemarks/],
    ['entity expansion', kml(placemark({ a: '&a9;' }), laughs), 'field.kml', /entities of its own/],
    ['an external entity', kml(placemark({ a: '&secret;' }), reachesOut), 'field.kml', /entities of its own/],
    [
      'projected coordinates of which the file says nothing',
      collection([feature({ type: 'bedding' }, utm)]),
      'field.geojson',
      /No position in it is a longitude and latitude in degrees\. These are not degrees: 286500\.25, 5281250\.5/,
    ],
    [
      'longitude and latitude exchanged beyond doubt',
      collection([feature({}, { type: 'Point', coordinates: [35.6, 136.9] })]),
      'field.geojson',
      /latitude of 136\.9° is beyond 90°: longitude and latitude seem to be exchanged/,
    ],
    [
      'infinity in every place',
      collection([feature({}, line())]).replaceAll(/-29\.\d+/g, '1e999'),
      'field.geojson',
      /A coordinate is not a number\./,
    ],
    ['NaN in every place', kml(placemark({}, 'NaN,NaN')), 'field.kml', /A coordinate is not a number\./],
    ['NaN in JSON', whole.replace('310', 'NaN'), 'field.geojson', /not JSON: “NaN” at line 1, column \d+/],
    [
      'a system that nobody knows',
      collection([feature({}, utm)], named('EPSG:999999')),
      'field.geojson',
      /EPSG:999999, which is not known here/,
    ],
    [
      'a system that needs a datum grid',
      collection([feature({}, utm)], named('EPSG:26717')),
      'field.geojson',
      /EPSG:26717, which the file names, needs a datum shift grid/,
    ],
    [
      'a crs member that names nothing',
      collection([feature({}, utm)], { crs: { type: 'link', properties: { href: 'http://crs.invalid' } } }),
      'field.geojson',
      /“crs” member that does not name a coordinate system/,
    ],
  ])('%s', async (_, content, name, reason) => {
    const before = await rows()
    const { status, body } = await desk.bring(content, name)
    expect(body.detail).toMatch(reason)
    expect([status, body.type]).toEqual([422, '/problems/unreadable-file'])
    expect(await rows()).toEqual(before)
    expect(await desk.latest()).toBe(1)
  })

  it('one that is too large', async () => {
    const { status, body } = await desk.bring(Buffer.alloc(MAX_FILE_BYTES + 1, ' '), 'large.geojson')
    expect([status, body.type]).toEqual([413, '/problems/file-too-large'])
    expect(body.detail).toBe('The file has 51 MB; files of up to 50 MB are read.')
    expect((await rows()).intakes).toBe(0)
  })

  it('a call without a file', async () => {
    const { status, body } = await desk.compiler
      .post(`/api/sheets/${desk.sheet}/intakes`)
      .field('note', 'no file')
    expect([status, body.type]).toEqual([400, '/problems/invalid-input'])
  })

  it('and the next file is read as ever', async () => {
    await desk.bring(kml(placemark({}), laughs), 'field.kml')
    expect((await desk.bring(whole)).status).toBe(201)
  })
})
