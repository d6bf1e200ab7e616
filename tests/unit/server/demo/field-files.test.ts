import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { DOMParser } from '@xmldom/xmldom'
import { unzipSync, strFromU8 } from 'fflate'
import { describe, expect, it } from 'vitest'
import { parseAttitude } from '@shared/structure/attitude-text'
import { toRadians } from '@shared/units'
import { demoFieldFiles } from '../../../../server/demo/field-files/field-files'
import { doFieldWork, fieldDeclination } from '../../../../server/demo/field-files/field-work'
import type { Reading } from '../../../../server/demo/field-files/party'
import { convergenceAt, merrowTruth, toIsland } from '../../../../server/demo/merrow-island'
import { fieldNoise } from '../../../../server/demo/truth/noise'

const work = doFieldWork()
const files = demoFieldFiles(work)
const bytes = (name: string): Uint8Array =>
  files.find((file) => file.name === name)?.bytes ?? new Uint8Array()
const text = (name: string): string => strFromU8(bytes(name))
const readings: Reading[] = Object.values(work)
  .flat()
  .filter((entry): entry is Reading => 'truth' in entry)

interface Feature {
  properties: { strike?: number | null; dip?: number | null; type?: string }
  geometry: { type: string; coordinates: [number, number] }
}

describe('field files of the demo', () => {
  it('are of all kinds that devices write, and the same every time', () => {
    expect(files.map(({ name }) => name.split('.').at(-1)).sort()).toEqual(
      ['csv', 'csv', 'csv', 'geojson', 'gpx', 'kml', 'kmz', 'zip'].sort(),
    )
    expect(demoFieldFiles()).toEqual(files)
  }, 60_000)

  const { features }: { features: Feature[] } = JSON.parse(text('ridge-traverse.geojson'))

  it('hold points and lines in longitude and latitude, most of them on the sheet', () => {
    const points = features.filter((feature) => feature.geometry.type === 'Point')
    const onSheet = points.filter(({ geometry: { coordinates } }) => {
      const [lon, lat] = coordinates
      return lon > -29.9 && lon < -29.7 && lat > 47.6 && lat < 47.8
    })
    expect(onSheet.length).toBeGreaterThan(12)
    expect(points.length - onSheet.length).toBe(1)
    expect(features.some((feature) => feature.geometry.type === 'LineString')).toBe(true)
  })

  it('hold records that cannot be taken in: a dip of 95, none, and one far away', () => {
    expect(features.filter((feature) => feature.properties.dip === 95)).toHaveLength(1)
    expect(features.filter((feature) => feature.properties.dip === null)).toHaveLength(1)
  })

  it('write readings as quadrants that read back, but for two that do not', () => {
    const written = [...text('valley-traverse.kml').matchAll(/name="attitude"><value>([^<]+)/g)].map(
      (match) => match[1] ?? '',
    )
    expect(written.length).toBeGreaterThan(12)
    const refused = written.filter((reading) => parseAttitude(reading, 'strike-dip').outcome === 'refused')
    expect(refused).toEqual(['N45E 40NE', 'see sketch'])
  })

  it('pack the KMZ with one document, well-formed, with the ash band in pieces', () => {
    const archive = unzipSync(bytes('skua-burn.kmz'))
    expect(Object.keys(archive)).toEqual(['doc.kml'])
    const document = new DOMParser().parseFromString(
      strFromU8(archive['doc.kml'] ?? new Uint8Array()),
      'text/xml',
    )
    expect(document.getElementsByTagName('LineString')).toHaveLength(work.ashBand.length)
    expect(work.ashBand.length).toBeGreaterThan(8)
  })

  it('zip a shapefile that GDAL reads: two layers, in the zone next to the sheet’s, as many records as were brought', () => {
    const folder = mkdtempSync(join(tmpdir(), 'sheetwright-field-'))
    const path = join(folder, 'coast-mapping.zip')
    writeFileSync(path, bytes('coast-mapping.zip'))
    const described = execFileSync('ogrinfo', ['-so', '-al', `/vsizip/${path}`]).toString()
    rmSync(folder, { recursive: true })
    const counts = new Map(
      [...described.matchAll(/Layer name: (\w+)[\s\S]*?Feature Count: (\d+)/g)].map(([, name, count]) => [
        name,
        Number(count),
      ]),
    )
    expect(counts).toEqual(
      new Map([
        ['contacts', work.siltBoundary.length],
        ['stations', work.coast.length],
      ]),
    )
    expect(described.match(/UTM[ _]zone[ _]25N/gi)?.length).toBeGreaterThanOrEqual(2)
  })

  it('write the GPX with a waypoint for each reading', () => {
    const document = new DOMParser().parseFromString(text('burn-walk.gpx'), 'text/xml')
    expect(document.getElementsByTagName('wpt')).toHaveLength(work.walk.length)
    expect(document.getElementsByTagName('trkpt').length).toBeGreaterThan(50)
  })

  it('write three conventions of one thing: strike, dip direction, and magnetic quadrants', () => {
    const rows = (name: string, separator: string) =>
      text(name)
        .trim()
        .split('\r\n')
        .slice(1)
        .map((row) => row.split(separator))
    rows('stations-strike-dip.csv', ',').forEach((row, index) =>
      expect([Number(row[3]), Number(row[4])]).toEqual([
        work.strikes[index]?.strike,
        work.strikes[index]?.dip,
      ]),
    )
    rows('stations-dip-direction.csv', ';').forEach((row, index) =>
      expect(Number(row[3])).toBe(((work.dipDirections[index]?.strike ?? NaN) + 90) % 360),
    )
    rows('stations-magnetic.csv', ',').forEach((row, index) => {
      const read = parseAttitude(row[3] ?? '', 'strike-dip')
      if (read.outcome === 'refused') throw new Error(read.reason)
      // True = magnetic + declination. Source: geodesy.md section 1. Half a degree of declination is rounded.
      const strike = (read.strike ?? NaN) + fieldDeclination
      const off = Math.abs(((strike - (work.magnetic[index]?.strike ?? NaN) + 540) % 360) - 180)
      expect(off).toBeLessThanOrEqual(0.5)
      expect(row[4]).toBe('magnetic')
    })
  })
})

describe('readings of the field parties', () => {
  it('depart from the truth by the stated spread', () => {
    const angles = readings.map(({ strike, dip, overturned, at, truth }) => {
      const pole = (gridStrike: number, inclination: number, isOver: boolean) => {
        const [s, d, sign] = [toRadians(gridStrike), toRadians(inclination), isOver ? -1 : 1]
        return [
          sign * Math.sin(d) * Math.cos(s),
          -sign * Math.sin(d) * Math.sin(s),
          sign * Math.cos(d),
        ] as const
      }
      const measured = pole(strike - convergenceAt(at), dip, overturned)
      const exact = pole(truth.plane.gridStrike, truth.plane.dip, truth.plane.overturned)
      const cosine = measured.reduce((sum, part, axis) => sum + part * (exact[axis] ?? 0), 0)
      return (Math.acos(Math.min(1, Math.abs(cosine))) * 180) / Math.PI
    })
    const rms = Math.sqrt(angles.reduce((sum, angle) => sum + angle ** 2, 0) / angles.length)
    // σ√2 = 3.54°, and 0.3° of rounding; over some 140 readings the spread of the root mean square is 0.15°.
    expect(angles.length).toBeGreaterThan(100)
    expect(Math.abs(rms - fieldNoise.attitude * Math.SQRT2)).toBeLessThan(0.5)
  })

  it('are misplaced by a few metres', () => {
    const errors = readings.flatMap(({ at, truth }) => [at[0] - truth.at[0], at[1] - truth.at[1]])
    const rms = Math.sqrt(errors.reduce((sum, error) => sum + error ** 2, 0) / errors.length)
    expect(Math.abs(rms - fieldNoise.position)).toBeLessThan(0.8)
  })

  it('hold a few duplicates: the same station read twice', () => {
    const names = readings.map(({ station }) => station)
    const twice = names.length - new Set(names).size
    expect(twice).toBeGreaterThanOrEqual(5)
    expect(twice).toBeLessThan(names.length / 5)
  })

  it('walk levels in pieces that overlap or fall short of one another by a few metres', () => {
    for (const { line, level } of [...work.ashBand, ...work.siltBoundary]) {
      for (const at of line.map(toIsland)) {
        const z = merrowTruth.ground(at)
        // Beside the fault the error may put a place on its other side.
        const off = (['west', 'east'] as const).map((side) => {
          const field = merrowTruth.island.height('upper', side)
          return Math.abs(field.value(at, z) - level) / Math.hypot(...field.gradient(at, z))
        })
        // Two metres of error in each direction, times four.
        expect(Math.min(...off)).toBeLessThan(8)
      }
    }
    const ends = work.ashBand.flatMap(({ line }) => [line[0], line.at(-1)])
    const gaps = ends.flatMap((end, index) => {
      const distances = ends.flatMap((other, otherIndex) =>
        end && other && Math.floor(index / 2) !== Math.floor(otherIndex / 2)
          ? [Math.hypot(end[0] - other[0], end[1] - other[1])]
          : [],
      )
      return [Math.min(...distances)]
    })
    const near = gaps.filter((gap) => gap < 25)
    expect(near.length).toBeGreaterThan(6)
    expect(near.every((gap) => gap > 0)).toBe(true)
  })
})
