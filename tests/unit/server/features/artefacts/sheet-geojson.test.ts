import type { FeatureCollection, LineString, Polygon, Position } from 'geojson'
import { expect, it } from 'vitest'
import { CAUTION } from '@shared/sheet-face/caution'
import { itemSchema } from '@shared/items/item'
import type { XY } from '@shared/units'
import { sheetGeoJson } from '../../../../../server/features/artefacts/sheet-geojson'
import { utmConvergence, utmDefinition } from '../../../../reference/geodesy'
import { aPoint } from '../../../../support/sheet-items'
import {
  aPrintedSheet,
  mapItems,
  rectangleRing,
  released,
  unitItems,
} from '../../../../support/printed-sheet'

const signedArea = (ring: readonly Position[]): number =>
  ring.reduce((sum, [x = 0, y = 0], index) => {
    const [nextX = 0, nextY = 0] = ring[(index + 1) % ring.length] ?? []
    return sum + (x * nextY - nextX * y) / 2
  }, 0)

const [unit] = unitItems(1)
// Clockwise outside and counter-clockwise inside: the wrong way round for GeoJSON.
const faces = [
  {
    unit: unit?.id ?? null,
    rings: [
      rectangleRing(285_000, 5_279_000, 287_000, 5_281_000).toReversed(),
      rectangleRing(285_500, 5_279_500, 286_000, 5_280_000),
    ],
  },
]

const read = async (): Promise<FeatureCollection & Record<string, unknown>> =>
  JSON.parse(
    await sheetGeoJson({
      sheet: aPrintedSheet(),
      items: [...unitItems(2), ...mapItems()],
      faces,
      edition: released,
    }),
  )

it('writes every line and point with its kind, properties and words, and the caution beside them', async () => {
  const data = await read()
  const attitude = data.features.find((feature) => feature.properties?.['kind'] === 'attitude')
  expect(attitude?.properties).toMatchObject({
    strike: 45,
    dip: 40,
    words: expect.stringContaining('Strikes 045°'),
  })
  const fold = data.features.find((feature) => feature.properties?.['kind'] === 'axial-trace')
  expect(fold?.properties?.['words']).toBe('Anticline, plunging 21° toward 090°')
  const contacts = data.features.filter((feature) => feature.properties?.['kind'] === 'contact')
  expect(contacts.map((feature) => feature.properties?.['words'])).toEqual([
    'Contact, certain',
    'Contact, approximate',
  ])
  expect(data['caution']).toBe(CAUTION)
  expect(data['sheet']).toMatchObject({ number: 'MI-14', scale: 24_000, crs: { srid: 32626 } })
  expect(data['edition']).toMatchObject({ number: 1, revision: 37, approvedBy: 'Edda Marr' })
  expect(data['legend']).toHaveLength(2)
})

it('writes lineations with their plane, places with their type, and what more is seen of a bed', async () => {
  const at: XY = [286_000, 5_280_000]
  const plane = { type: 'foliation', strike: 45, dip: 40, overturned: false } as const
  const items = [
    aPoint('lineation', at, { trend: 75, plunge: 23, plane }),
    aPoint('station', at, { type: 'mine-adit', name: 'Long Geo', azimuth: 120 }),
    aPoint('attitude', at, { strike: 45, dip: 40, topsKnown: true, undulating: true }),
  ]
  const { features }: FeatureCollection = JSON.parse(
    await sheetGeoJson({ sheet: aPrintedSheet(), items, faces: [], edition: released }),
  )
  expect(features.map((feature) => feature.properties)).toMatchObject([
    {
      kind: 'lineation',
      trend: 75,
      plunge: 23,
      plane,
      words:
        'Lineation, plunges 23° toward 075° (east), on foliation that strikes 045°, dips 40° toward 135° (south-east)',
    },
    {
      kind: 'station',
      type: 'mine-adit',
      azimuth: 120,
      words: 'Mine adit Long Geo, goes in toward 120°',
    },
    {
      kind: 'attitude',
      topsKnown: true,
      undulating: true,
      words: 'Strikes 045°, dips 40° toward 135° (south-east), undulating, tops known',
    },
  ])
})

it('winds rings as RFC 7946 asks: outer counter-clockwise, holes clockwise', async () => {
  const face = (await read()).features.find((feature) => feature.properties?.['kind'] === 'face')
  const { coordinates } = face?.geometry as Polygon
  expect(face?.properties).toMatchObject({ unitLabel: 'U0', unitName: 'Unit number 0' })
  expect(signedArea(coordinates[0] ?? [])).toBeGreaterThan(0)
  expect(signedArea(coordinates[1] ?? [])).toBeLessThan(0)
})

it.each(utmConvergence)(
  'puts $east, $north of zone $zone at $lat, $lon',
  async ({ zone, east, north, lat, lon }) => {
    const crs = { srid: 1, name: 'Test', proj4: utmDefinition(zone) }
    const line = itemSchema.parse({
      kind: 'contact',
      id: unit?.id,
      geometry: {
        type: 'LineString',
        coordinates: [
          [east, north],
          [east + 10, north],
        ],
      },
      properties: {},
    })
    const sheet = aPrintedSheet({ crs, neatline: rectangleRing(east, north, east + 1000, north + 1000) })
    const data: FeatureCollection<LineString> = JSON.parse(
      await sheetGeoJson({ sheet, items: [line], faces: [], edition: released }),
    )
    const [place] = data.features[0]?.geometry.coordinates ?? []
    // PROJ's metres have four decimals, which is 1e-9 degrees; the file is written to 1e-8, about a millimetre.
    expect(Math.abs((place?.[0] ?? NaN) - lon)).toBeLessThan(2e-8)
    expect(Math.abs((place?.[1] ?? NaN) - lat)).toBeLessThan(2e-8)
  },
)
