import { expect, it } from 'vitest'
import type { IntakeRecord } from '@shared/intake/records'
import { demoFieldFiles, type FieldFile } from '../../../../../../server/demo/field-files/field-files'
import { doFieldWork } from '../../../../../../server/demo/field-files/field-work'
import { toLonLat } from '../../../../../../server/demo/merrow-island'
import { read, recordsOf } from '../../../../../support/field-text'

/** What was measured, and the files that it was written to: each reader gives back what went in. */
const work = doFieldWork()
const files = demoFieldFiles(work)

function fileNamed(name: string): FieldFile {
  const file = files.find((each) => each.name === name)
  if (!file) throw new Error(`The demo has no ${name}.`)
  return file
}

/** Ten-millionths of a degree, about a centimetre: what files with seven decimals keep. */
const WRITTEN = 1e-7

/** Expects the points to be the readings in order, where they were made; a station visited twice is there twice. */
function expectReadings(
  records: readonly IntakeRecord[],
  readings: readonly { station: string; at: readonly [number, number] }[],
  nameColumn: string,
): void {
  const points = records.flatMap(({ parts: [part], attributes }) =>
    part?.form === 'point' ? [{ name: attributes[nameColumn], position: part.position }] : [],
  )
  expect(points.map(({ name }) => name)).toEqual(readings.map(({ station }) => station))
  points.forEach(({ position }, index) => {
    const [lon, lat] = toLonLat([...(readings[index]?.at ?? [0, 0])])
    expect(Math.abs((position[0] ?? NaN) - lon)).toBeLessThan(WRITTEN)
    expect(Math.abs((position[1] ?? NaN) - lat)).toBeLessThan(WRITTEN)
  })
}

it.each([
  ['skua-burn.kmz', work.burn, 'name', 'kmz'],
  ['coast-mapping.zip', work.coast, 'STN', 'shapefile'],
  ['burn-walk.gpx', work.walk, 'name', 'gpx'],
  ['stations-strike-dip.csv', work.strikes, 'station', 'csv'],
  ['stations-magnetic.csv', work.magnetic, 'stn', 'csv'],
] as const)('%s gives every reading where it was made', (name, readings, nameColumn, reader) => {
  const { bytes } = fileNamed(name)
  expect(read(bytes, name)).toMatchObject({ outcome: 'read', reader })
  expectReadings(recordsOf(bytes, name), readings, nameColumn)
})

it('the KMZ gives the traces walked, each with its name', () => {
  const lines = recordsOf(fileNamed('skua-burn.kmz').bytes).filter(({ parts }) => parts[0]?.form === 'line')
  expect(lines).toHaveLength(work.ashBand.length)
})

it('the shapefile gives both its layers, says what they were converted from, and keeps every figure', () => {
  const { bytes, name } = fileNamed('coast-mapping.zip')
  expect(read(bytes, name)).toMatchObject({
    system: 'WGS_1984_UTM_Zone_25N',
    notes: expect.arrayContaining([
      'stations.shp: Its coordinates were converted from WGS_1984_UTM_Zone_25N to longitude and latitude (WGS 84).',
    ]),
  })
  const records = recordsOf(bytes)
  expect(records.map(({ attributes }) => attributes['layer'])).toEqual([
    ...work.coast.map(() => 'stations'),
    ...work.siltBoundary.map(() => 'contacts'),
  ])
  expect(
    records.slice(0, work.coast.length).map(({ attributes }) => [attributes['STRIKE'], attributes['DIP']]),
  ).toEqual(work.coast.map(({ strike, dip }) => [strike, dip]))
})

it('the table of metres of an unnamed grid is refused', () => {
  const { bytes, name } = fileNamed('stations-dip-direction.csv')
  expect(read(bytes, name)).toMatchObject({
    outcome: 'unreadable',
    reason: expect.stringContaining('“Easting”, “Northing” are metres of a grid that the file does not name'),
  })
})
