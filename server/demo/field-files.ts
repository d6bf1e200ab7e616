import type { XY } from '@shared/units'
import { normalizeAzimuth, toRadians } from '@shared/units'
import { gannetHeadOptions, makeGannetHead, toLonLat } from './gannet-head'
import type { DemoSheet } from './truth/generate-sheet'
import { seededRandom, type Random } from './truth/random'
import { makeStations, type Station } from './truth/stations'

/** A field file as a device would have written it. */
export interface FieldFile {
  name: string
  text: string
}

/** Largest error of a reading, degrees, evenly spread. */
const NOISE = 3

/** Field files that fit the demo sheet and hold nothing that is on it yet. Some records cannot be taken in: a dip of 95,
 *  a plane that dips along its strike, places far from the sheet, a missing dip. */
export function demoFieldFiles(): FieldFile[] {
  const sheet = makeGannetHead()
  const random = seededRandom(gannetHeadOptions.seed + 100)
  const { origin } = gannetHeadOptions
  const taken = [...sheet.attitudes, ...sheet.labels].map(({ geometry: { coordinates } }): XY => {
    return [coordinates[0] - origin[0], coordinates[1] - origin[1]]
  })
  const stations = makeStations(sheet.truth, random, { wanted: 36, apart: 520, clearOf: taken, clear: 260 })
  const readings = stations.map((station) => measure(station, random))
  const half = Math.ceil(readings.length / 2)
  return [
    { name: 'ridge-traverse.geojson', text: ridgeTraverse(readings.slice(0, half)) },
    { name: 'valley-traverse.kml', text: valleyTraverse(sheet, readings.slice(half)) },
  ]
}

interface Reading {
  at: XY
  strike: number
  dip: number
  overturned: boolean
}

/** A station as a person measures it, with the stated noise. */
function measure(station: Station, random: Random): Reading {
  const at: XY = [gannetHeadOptions.origin[0] + station.at[0], gannetHeadOptions.origin[1] + station.at[1]]
  const error = () => (random() * 2 - 1) * NOISE
  return {
    at,
    strike: normalizeAzimuth(Math.round(station.gridStrike + gannetHeadOptions.convergenceAt(at) + error())),
    dip: Math.max(1, Math.min(90, Math.round(station.dip + error()))),
    overturned: station.overturned,
  }
}

const degrees = (at: XY): string[] => toLonLat(at).map((value) => value.toFixed(7))
const lonLat = (at: XY): number[] => degrees(at).map(Number)

/** GeoJSON with one column per figure, and three short lines. */
function ridgeTraverse(readings: readonly Reading[]): string {
  const points = readings.map(({ at, strike, dip, overturned }, index) =>
    pointFeature(at, {
      station: `RT-${index + 1}`,
      type: overturned ? 'overturned bedding' : 'bedding',
      strike,
      dip,
      notes: index % 5 === 0 ? 'good outcrop' : '',
    }),
  )
  const { origin } = gannetHeadOptions
  const place = (x: number, y: number): XY => [origin[0] + x, origin[1] + y]
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
    lineFeature([place(1850, 8500), place(1980, 8760), place(2120, 8990)], {
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
  return `${JSON.stringify({ type: 'FeatureCollection', features: [...points, ...refused, ...lines] }, null, 1)}\n`
}

const pointFeature = (at: XY, properties: object) => ({
  type: 'Feature',
  properties,
  geometry: { type: 'Point', coordinates: lonLat(at) },
})

const lineFeature = (line: readonly XY[], properties: object) => ({
  type: 'Feature',
  properties,
  geometry: { type: 'LineString', coordinates: line.map(lonLat) },
})

/** KML with the readings written as quadrants in extended data, and one contact. */
function valleyTraverse(sheet: DemoSheet, readings: readonly Reading[]): string {
  const points = readings.map(({ at, strike, dip, overturned }, index) =>
    placemark(
      `VT-${index + 1}`,
      { type: 'bedding', attitude: `${inQuadrants(strike, dip)}${overturned ? ' overturned' : ''}` },
      pointKml(at),
    ),
  )
  const [first] = sheet.attitudes
  const at: XY = first ? [first.geometry.coordinates[0] + 300, first.geometry.coordinates[1] + 250] : [0, 0]
  const near = (east: number, north: number): XY => [at[0] + east, at[1] + north]
  const others = [
    placemark('VT-90', { type: 'bedding', attitude: 'N45E 40NE' }, pointKml(near(0, 0))),
    placemark('VT-91', { type: 'bedding', attitude: 'see sketch' }, pointKml(near(60, 90))),
    placemark(
      'Stream bank',
      { type: 'contact', confidence: 'approximate' },
      lineKml([near(200, 0), near(310, 60), near(450, 75), near(600, 140)]),
    ),
  ]
  return [
    '<?xml version="1.0" encoding="UTF-8"?>',
    '<kml xmlns="http://www.opengis.net/kml/2.2"><Document><name>Valley traverse</name>',
    ...points,
    ...others,
    '</Document></kml>\n',
  ].join('\n')
}

/** A plane as a compass with four quadrants gives it: N45E 40SE. */
function inQuadrants(strike: number, dip: number): string {
  const along = strike % 180
  const bearing = along <= 90 ? `N${along}E` : `N${180 - along}W`
  const toward = toRadians(strike + 90)
  const northSouth = Math.cos(toward) >= 0 ? 'N' : 'S'
  const eastWest = Math.sin(toward) >= 0 ? 'E' : 'W'
  // Along the meridian or the parallel only one letter tells the two sides apart.
  if (along === 0) return `${bearing} ${dip}${eastWest}`
  if (along === 90) return `${bearing} ${dip}${northSouth}`
  return `${bearing} ${dip}${northSouth}${eastWest}`
}

const placemark = (name: string, data: Record<string, string>, geometry: string): string =>
  [
    `<Placemark><name>${name}</name><ExtendedData>`,
    ...Object.entries(data).map(([key, value]) => `<Data name="${key}"><value>${value}</value></Data>`),
    `</ExtendedData>${geometry}</Placemark>`,
  ].join('')

const pointKml = (at: XY): string => `<Point><coordinates>${degrees(at).join(',')},0</coordinates></Point>`
const lineKml = (line: readonly XY[]): string =>
  `<LineString><coordinates>${line.map((at) => `${degrees(at).join(',')},0`).join(' ')}</coordinates></LineString>`
