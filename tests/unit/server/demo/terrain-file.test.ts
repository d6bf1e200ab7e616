import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { XY } from '@shared/units'
import { gannetHead, merrowTruth, toIsland } from '../../../../server/demo/merrow-island'
import { TERRAIN_MARGIN, TERRAIN_PIXEL, terrainFile } from '../../../../server/demo/terrain-file'

let folder: string
let path: string
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'sheetwright-terrain-'))
  path = join(folder, 'MI-14.tif')
  writeFileSync(path, terrainFile(merrowTruth.ground, gannetHead.extent))
})
afterAll(() => rmSync(folder, { recursive: true, force: true }))

interface Described {
  size: [number, number]
  geoTransform: number[]
  coordinateSystem: { wkt: string }
  bands: { type: string }[]
}

/** GDAL reads the file independently of the library that wrote it. */
describe('the elevation model of the demo, as GDAL reads it', () => {
  it('is in UTM zone 26N, with origin and pixels where they should be', () => {
    const described: Described = JSON.parse(execFileSync('gdalinfo', ['-json', path]).toString())
    expect(described.coordinateSystem.wkt).toContain('ID["EPSG",32626]')
    const [west, pixel, , north, , down] = described.geoTransform
    expect([west, north]).toEqual([284_000 - TERRAIN_MARGIN, 5_289_000 + TERRAIN_MARGIN])
    expect([pixel, down]).toEqual([TERRAIN_PIXEL, -TERRAIN_PIXEL])
    expect(described.size).toEqual([
      (10_000 + 2 * TERRAIN_MARGIN) / TERRAIN_PIXEL,
      (11_000 + 2 * TERRAIN_MARGIN) / TERRAIN_PIXEL,
    ])
    expect(described.bands.map(({ type }) => type)).toEqual(['Float32'])
  })

  it('holds the height of the known ground at the middle of each pixel', () => {
    // Middles of pixels, from corner to corner.
    const places: XY[] = Array.from({ length: 40 }, (_, index) => [
      284_010 + 20 * ((index * 137) % 500),
      5_278_010 + 20 * ((index * 211) % 550),
    ])
    const asked = places.map((place) => place.join(' ')).join('\n')
    const answer = execFileSync('gdallocationinfo', ['-valonly', '-geoloc', path], {
      input: asked,
    }).toString()
    const heights = answer.trim().split('\n').map(Number)
    places.forEach((place, index) => {
      // Single precision keeps seven digits of some hundreds of metres; GDAL prints as many.
      expect(heights[index]).toBeCloseTo(merrowTruth.ground(toIsland(place)), 3)
    })
  })
})
