import { describe, expect, it } from 'vitest'
import { isPointItem, type Item } from '@shared/items/item'
import { demoFieldFiles } from '../../../server/demo/field-files/field-files'
import {
  bedding,
  collection,
  feature,
  kml,
  line,
  onSheet,
  placemark,
  useIntakeDesk,
} from '../../support/intake-desk'

const desk = useIntakeDesk()

const versionsOf = async (item: Item) =>
  (await desk.compiler.get(`/api/sheets/${desk.sheet}/items/${item.id}/versions`)).body
const takenItems = async (): Promise<Item[]> =>
  (await desk.items()).filter((item) => item.kind !== 'sheet-face')

describe('taking a file in', () => {
  it('makes one ledger entry of all that is accepted, and says what was refused', async () => {
    const intake = await desk.brought(
      collection([
        bedding(),
        bedding({ strike: 130 }),
        feature({ type: 'contact' }, line()),
        bedding({ dip: '' }),
      ]),
      'ridge.geojson',
    )
    const { status, body } = await desk.takeIn(intake)
    expect(status).toBe(201)
    expect(body).toMatchObject({
      revision: 2,
      accepted: 3,
      refused: 1,
      entry: {
        revision: 2,
        kind: 'intake',
        author: { name: 'Rosa Kelp' },
        message: 'took in “ridge.geojson”: 2 attitudes, 1 contact',
        changed: 3,
      },
    })
    expect(await desk.latest()).toBe(2)
    expect(await takenItems()).toHaveLength(3)
    expect(await desk.intakes()).toMatchObject([{ state: 'taken-in', revision: 2, mapping: intake.proposal }])
  })

  it('keeps the message that a person wrote', async () => {
    const { body } = await desk.takeIn(await desk.brought(collection([bedding()])), {
      message: 'north shore',
    })
    expect(body.entry.message).toBe('north shore')
  })

  it('keeps with each item its file, its record, the values in it and what was done to them', async () => {
    const properties = { type: 'bedding', strike: 310, dip: 40, collector: '=HYPERLINK("x")' }
    const point = { type: 'Point', coordinates: [...onSheet[1], 212.5] }
    await desk.takeIn(
      await desk.brought(collection([feature({ type: 'x' }, null), feature(properties, point)]), 'a.geojson'),
    )
    const [item] = await takenItems()
    const [version] = await versionsOf(item as Item)
    expect(version.provenance).toEqual({
      file: 'a.geojson',
      record: 2,
      attributes: properties,
      conversions: ['longitude and latitude (WGS 84) to EPSG:32626, to the millimetre', 'heights dropped'],
    })
    expect(version.entry).toMatchObject({ kind: 'intake', revision: 2 })
  })

  it('puts items where PROJ puts their coordinates, to a millimetre', async () => {
    await desk.takeIn(
      await desk.brought(
        collection(onSheet.map((at) => feature({ name: at.join() }, { type: 'Point', coordinates: at }))),
      ),
    )
    // Outside check: PostGIS's ST_Transform, which is PROJ; ours is proj4js.
    const expected = await desk.server.dataSource.query<{ name: string; east: number; north: number }[]>(
      `SELECT lon || ',' || lat AS name, ST_X(place) AS east, ST_Y(place) AS north
       FROM unnest($1::float8[], $2::float8[]) AS at(lon, lat),
         ST_Transform(ST_SetSRID(ST_MakePoint(lon, lat), 4326), 32626) AS place`,
      [onSheet.map(([lon]) => lon), onSheet.map(([, lat]) => lat)],
    )
    const stations = (await takenItems()).filter(isPointItem)
    expect(stations).toHaveLength(expected.length)
    for (const { name, east, north } of expected) {
      const [x, y] = stations.find((item) => 'name' in item.properties && item.properties.name === name)
        ?.geometry.coordinates ?? [NaN, NaN]
      expect(Math.hypot(x - east, y - north)).toBeLessThan(0.001)
    }
  })

  it('converts coordinates of the system that an old crs member names', async () => {
    const crs = { type: 'name', properties: { name: 'urn:ogc:def:crs:EPSG::32626' } }
    const station = feature({ name: 'K 7' }, { type: 'Point', coordinates: [286_500.25, 5_281_250.5] })
    const intake = await desk.brought(collection([station], { crs }))
    expect(intake.notes).toContain(
      'The file names EPSG:32626; its coordinates were converted to longitude and latitude (WGS 84).',
    )
    await desk.takeIn(intake)
    const [item] = await takenItems()
    expect(item?.geometry?.coordinates).toEqual([286_500.25, 5_281_250.5])
  })

  it('reads KML with its extended data', async () => {
    const intake = await desk.brought(kml(placemark({ attitude: 'N40W 40NE' })), 'valley.kml')
    expect((await desk.takeIn(intake)).body).toMatchObject({ accepted: 1, refused: 0 })
    const [item] = await takenItems()
    expect(item).toMatchObject({
      kind: 'attitude',
      properties: { strike: 320, dip: 40, reading: { text: 'N40W 40NE', convention: 'quadrant' } },
    })
  })

  it('takes in the demo’s field files but for the records that cannot be', async () => {
    const refused: string[] = []
    for (const { name, bytes } of demoFieldFiles().filter((file) =>
      /traverse\.(geojson|kml)$/.test(file.name),
    )) {
      const text = new TextDecoder().decode(bytes)
      const intake = await desk.brought(text, name)
      const { refusals } = await desk.preview(intake)
      const { body } = await desk.takeIn(intake)
      expect([body.accepted, body.refused]).toEqual([intake.records - refusals.length, refusals.length])
      const stations = [...text.matchAll(/(?:"station": "|<Placemark><name>)([^"<]*)/g)].map(([, at]) => at)
      refused.push(...refusals.map(({ record, reason }) => `${stations[record - 1]}: ${reason}`))
    }
    // As field-files.ts plants them.
    expect(refused).toEqual([
      expect.stringMatching(/^RT-90: Dip 95 is more than 90/),
      'RT-91: No dip is given.',
      'RT-92: This point lies outside the sheet’s neatline.',
      expect.stringMatching(/^VT-90: The dip letter NE lies along the strike N45E/),
      expect.stringMatching(/^VT-91: “see sketch” does not read/),
    ])
    expect(await desk.latest()).toBe(3)
  })
})

describe('the same file again', () => {
  it('is refused once it was taken in', async () => {
    const intake = await desk.brought(collection([bedding()]))
    await desk.takeIn(intake)
    const { status, body } = await desk.takeIn(intake)
    expect(status).toBe(409)
    expect(body).toMatchObject({
      type: '/problems/wrong-state',
      detail: 'field.geojson was taken in already. Bring it again to read it anew.',
    })
    expect(await desk.latest()).toBe(2)
    expect(await takenItems()).toHaveLength(1)
  })

  it('taken in by two hands at once makes one entry', async () => {
    const intake = await desk.brought(collection([bedding(), bedding()]))
    const answers = await Promise.all([
      desk.takeIn(intake).then(({ status }) => status),
      desk.takeIn(intake, { agent: desk.editor }).then(({ status }) => status),
      desk.takeIn(intake).then(({ status }) => status),
    ])
    expect(answers.sort()).toEqual([201, 409, 409])
    expect(await desk.latest()).toBe(2)
    expect(await takenItems()).toHaveLength(2)
  })

  it('brought a second time says that it was taken in', async () => {
    await desk.takeIn(await desk.brought(collection([bedding()]), 'first.geojson'))
    expect((await desk.brought(collection([bedding()]), 'copy.geojson')).sameFileTakenIn).toBe(
      'Rosa Kelp took in the same file as “first.geojson” at revision 2.',
    )
    expect((await desk.brought(collection([bedding({ dip: 41 })]))).sameFileTakenIn).toBeNull()
  })
})
