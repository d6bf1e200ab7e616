import proj4 from 'proj4'
import { strToU8 } from 'fflate'
import { normalizeAzimuth, type XY } from '@shared/units'
import { fromIsland, merrowTruth, toIsland, toLonLat } from '../merrow-island'
import { kmz, zippedShapefile } from './archives'
import { doFieldWork, fieldDeclination, type FieldWork } from './field-work'
import type { Reading } from './party'
import { inQuadrants } from './quadrants'
import { csv, degrees, geoJson, gpx, kml, kmlLine, kmlPoint, lineFeature, pointFeature } from './text-files'

/** A field file as a device would have written it. */
export interface FieldFile {
  name: string
  /** Who brought it, from what device, and what is in it, in a sentence. */
  about: string
  bytes: Uint8Array
}

/** The field files. Some records cannot be taken in: a dip of 95, a plane that dips along its strike, a place far from the
 *  sheet, a missing dip, a reading that is no reading. */
export function demoFieldFiles(work = doFieldWork()): FieldFile[] {
  const text = (name: string, about: string, content: string): FieldFile => ({
    name,
    about,
    bytes: strToU8(content),
  })
  return [
    text(
      'ridge-traverse.geojson',
      'Rosa Kelp, telephone: strike and dip in columns, three lines',
      ridgeTraverse(work.ridge),
    ),
    text(
      'valley-traverse.kml',
      'Finn Garrick, tablet: readings in quadrants, a stream-bank contact',
      valleyTraverse(work.valley),
    ),
    {
      name: 'skua-burn.kmz',
      about: 'Una Storr, tablet: dip direction and dip; the ash band walked in pieces',
      bytes: kmz(burnDocument(work)),
    },
    {
      name: 'coast-mapping.zip',
      about:
        'Ansel Vane, office: shapefile in UTM zone 25N, the next zone; stations and the top of the banded silts',
      bytes: coastShapefile(work),
    },
    text(
      'burn-walk.gpx',
      'Finn Garrick, receiver: the way walked, readings as waypoints',
      burnWalk(work.walk),
    ),
    text(
      'stations-strike-dip.csv',
      'Finn Garrick: longitude and latitude, strike by the right-hand rule',
      csv([
        ['station', 'lon', 'lat', 'strike', 'dip', 'overturned'],
        ...work.strikes.map(({ station, at, strike, dip, overturned }) => [
          station,
          ...degrees(at),
          strike,
          dip,
          overturned ? 'yes' : 'no',
        ]),
      ]),
    ),
    text(
      'stations-dip-direction.csv',
      'Una Storr: UTM metres, semicolons and decimal commas, dip direction',
      csv(
        [
          ['Station', 'Easting', 'Northing', 'Dip direction', 'Dip', 'Remark'],
          ...work.dipDirections.map(({ station, at, strike, dip, overturned }) => [
            station,
            at[0].toFixed(1).replace('.', ','),
            at[1].toFixed(1).replace('.', ','),
            normalizeAzimuth(strike + 90),
            dip,
            overturned ? 'overturned' : '',
          ]),
        ],
        ';',
      ),
    ),
    text(
      'stations-magnetic.csv',
      `Ansel Vane: quadrants read against magnetic north, declination ${fieldDeclination}° on 14 May 2026`,
      csv([
        ['stn', 'latitude', 'longitude', 'attitude', 'north', 'declination', 'date'],
        ...work.magnetic.map(({ station, at, strike, dip, overturned }) => [
          station,
          ...degrees(at).toReversed(),
          `${inQuadrants(normalizeAzimuth(Math.round(strike - fieldDeclination)), dip)}${overturned ? ' overturned' : ''}`,
          'magnetic',
          fieldDeclination,
          '2026-05-14',
        ]),
      ]),
    ),
  ]
}

/** GeoJSON with one column per figure, and three short lines. */
function ridgeTraverse(readings: readonly Reading[]): string {
  const points = readings.map(({ station, at, strike, dip, overturned }, index) =>
    pointFeature(at, {
      station,
      type: overturned ? 'overturned bedding' : 'bedding',
      strike,
      dip,
      notes: index % 5 === 0 ? 'good outcrop' : '',
    }),
  )
  const place = (x: number, y: number): XY => fromIsland([x, y])
  const refused = [
    pointFeature(place(3100, 4200), { station: 'RT-90', type: 'bedding', strike: 212, dip: 95, notes: '' }),
    pointFeature(place(3350, 4400), {
      station: 'RT-91',
      type: 'bedding',
      strike: 30,
      dip: null,
      notes: 'too dark',
    }),
    pointFeature(place(48_000, 4400), { station: 'RT-92', type: 'bedding', strike: 30, dip: 44, notes: '' }),
  ]
  const lines = [
    lineFeature([place(1850, 7500), place(1980, 7760), place(2120, 7990)], {
      type: 'anticline',
      confidence: 'approximate',
      plunge: 17,
      trend: 28,
      notes: 'small fold on the limb',
    }),
    lineFeature([place(6500, 1500), place(6710, 1580), place(6930, 1600), place(7140, 1690)], {
      type: 'dike',
      confidence: 'certain',
      notes: 'dolerite, two metres wide',
    }),
    lineFeature([place(8300, 6900), place(8420, 6720), place(8500, 6510)], {
      type: 'fault',
      confidence: 'inferred',
      notes: '',
    }),
  ]
  return geoJson([...points, ...refused, ...lines])
}

/** KML with the readings written as quadrants in extended data, and one contact. */
function valleyTraverse(readings: readonly Reading[]): string {
  const [first] = readings
  const near = (east: number, north: number): XY => [(first?.at[0] ?? 0) + east, (first?.at[1] ?? 0) + north]
  return kml('Valley traverse', [
    ...readings.map(({ station, at, strike, dip, overturned }) =>
      kmlPoint(
        station,
        { type: 'bedding', attitude: `${inQuadrants(strike, dip)}${overturned ? ' overturned' : ''}` },
        at,
      ),
    ),
    kmlPoint('VT-90', { type: 'bedding', attitude: 'N45E 40NE' }, near(0, 30)),
    kmlPoint('VT-91', { type: 'bedding', attitude: 'see sketch' }, near(60, 90)),
    kmlLine('Stream bank', { type: 'contact', confidence: 'approximate' }, [
      near(100, 0),
      near(210, 60),
      near(350, 75),
      near(500, 140),
    ]),
  ])
}

const burnDocument = ({ burn, ashBand }: FieldWork): string =>
  kml('Skua Burn', [
    ...burn.map(({ station, at, strike, dip, overturned }) =>
      kmlPoint(
        station,
        {
          kind: overturned ? 'overturned bedding' : 'bedding',
          dip_direction: String(normalizeAzimuth(strike + 90)),
          dip: String(dip),
        },
        at,
      ),
    ),
    ...ashBand.map(({ name, line }, index) =>
      kmlLine(`${name} ${index + 1}`, { kind: 'marker bed', location: 'approximate' }, line),
    ),
  ])

/** UTM zone 25N as a shapefile's companion states it. Source: EPSG:32625. */
const zone25 =
  'PROJCS["WGS_1984_UTM_Zone_25N",GEOGCS["GCS_WGS_1984",DATUM["D_WGS_1984",SPHEROID["WGS_1984",6378137.0,298.257223563]],' +
  'PRIMEM["Greenwich",0.0],UNIT["Degree",0.0174532925199433]],PROJECTION["Transverse_Mercator"],' +
  'PARAMETER["False_Easting",500000.0],PARAMETER["False_Northing",0.0],PARAMETER["Central_Meridian",-33.0],' +
  'PARAMETER["Scale_Factor",0.9996],PARAMETER["Latitude_Of_Origin",0.0],UNIT["Meter",1.0]]'

function coastShapefile({ coast, siltBoundary }: FieldWork): Uint8Array {
  const toZone25 = (at: XY): XY => {
    const [east, north] = proj4('EPSG:4326', '+proj=utm +zone=25 +datum=WGS84').forward(toLonLat(at))
    return [east ?? NaN, north ?? NaN]
  }
  return zippedShapefile(
    [
      {
        name: 'stations',
        rows: coast.map(({ station, strike, dip, overturned }) => ({
          STN: station,
          TYPE: overturned ? 'overturned bedding' : 'bedding',
          STRIKE: strike,
          DIP: dip,
        })),
        geometry: { type: 'POINT', places: coast.map(({ at }) => toZone25(at)) },
      },
      {
        name: 'contacts',
        rows: siltBoundary.map(({ name }) => ({ TYPE: 'contact', LOCATED: 'approximate', NAME: name })),
        geometry: { type: 'POLYLINE', lines: siltBoundary.map(({ line }) => line.map(toZone25)) },
      },
    ],
    zone25,
  )
}

/** Readings as a person speaks them into a receiver. */
function burnWalk(readings: readonly Reading[]): string {
  const ground = (at: XY): number => merrowTruth.ground(toIsland(at))
  return gpx(
    'Burn walk',
    readings
      .flatMap(({ at }, index) => stepsTo(at, readings[index + 1]?.at ?? at))
      .map((at) => ({ at, ele: ground(at) })),
    readings.map(({ station, at, strike, dip, overturned }) => ({
      name: station,
      desc: `bedding ${String(strike).padStart(3, '0')}/${String(dip).padStart(2, '0')}${overturned ? ' overturned' : ''}`,
      at,
      ele: ground(at),
    })),
  )
}

const STEPS = 8
const stepsTo = (from: XY, to: XY): XY[] =>
  Array.from({ length: STEPS }, (_, step): XY => [
    from[0] + ((to[0] - from[0]) * step) / STEPS,
    from[1] + ((to[1] - from[1]) * step) / STEPS + 12 * Math.sin((Math.PI * step) / STEPS),
  ])
