import { describe, expect, it } from 'vitest'
import type { Area } from '@shared/api/sheets'
import { sheetProjection } from '@shared/geometry/projection'
import { sheetArea } from '@shared/sheets/sheet-area'
import type { XY } from '@shared/units'

const utm = (zone: number) => `+proj=utm +zone=${zone} +datum=WGS84 +units=m +no_defs`
const areaIn = (definition: string, area: Area, scale = 24_000) =>
  sheetArea(area, sheetProjection(definition), definition, scale)
const quad: Area = { by: 'degrees', west: -29.9, south: 47.6, east: -29.75, north: 47.7 }

function ringOf(definition: string, area: Area, scale?: number): XY[] {
  const found = areaIn(definition, area, scale)
  if (found.outcome === 'refused') throw new Error(found.reason)
  return found.neatline
}
const signedArea = (ring: readonly XY[]): number =>
  ring.slice(1).reduce((sum, [x, y], index) => {
    const [fromX, fromY] = ring[index] ?? [x, y]
    return sum + (fromX * y - x * fromY) / 2
  }, 0)

describe('sheetArea', () => {
  it('makes a rectangle of the grid from metres', () => {
    const area: Area = { by: 'metres', west: 284_000, south: 5_278_000, east: 294_000, north: 5_289_000 }
    expect(ringOf(utm(26), area)).toEqual([
      [284_000, 5_278_000],
      [294_000, 5_278_000],
      [294_000, 5_289_000],
      [284_000, 5_289_000],
      [284_000, 5_278_000],
    ])
  })

  it('follows parallels and meridians of an area in degrees', () => {
    const ring = ringOf(utm(26), quad)
    const projection = sheetProjection(utm(26))
    expect(ring[0]).toEqual(ring.at(-1))
    expect(ring.length).toBeGreaterThan(5)
    for (const corner of ring) {
      const [lon, lat] = projection.toLonLat(corner)
      const off = Math.min(
        ...[quad.west, quad.east].map((side) => Math.abs(lon - side)),
        ...[quad.south, quad.north].map((side) => Math.abs(lat - side)),
      )
      // The 1 mm grid is about a hundred-millionth of a degree.
      expect(off).toBeLessThan(2e-8)
    }
  })

  it('departs from the curve by less than 0.05 mm on the sheet, with more pieces on larger scales', () => {
    const coarse = ringOf(utm(26), quad, 250_000)
    const fine = ringOf(utm(26), quad, 5_000)
    expect(fine.length).toBeGreaterThan(coarse.length)
    const projection = sheetProjection(utm(26))
    const southern = fine
      .slice(0, -1)
      .filter((corner) => Math.abs(projection.toLonLat(corner)[1] - quad.south) < 2e-8)
    southern.slice(1).forEach((to, index) => {
      const from = southern[index] ?? to
      const middle: XY = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]
      const offNorth = Math.abs(projection.toLonLat(middle)[1] - quad.south) * 111_000
      // 0.05 mm at 1:5 000 are 0.25 m.
      expect(offNorth).toBeLessThan(0.26)
    })
  })

  it('runs counter-clockwise', () => {
    expect(signedArea(ringOf(utm(26), quad))).toBeGreaterThan(0)
  })

  it('allows the zone beside', () => {
    expect(areaIn(utm(25), quad).outcome).toBe('ring')
    expect(areaIn(utm(27), quad).outcome).toBe('ring')
  })

  it.each([
    ['a zone on the other side of the world', utm(56), quad],
    ['a zone thirty degrees away', utm(31), quad],
    [
      'grid metres far outside',
      utm(26),
      { ...quad, by: 'metres', west: 6e6, south: 1e6, east: 6.01e6, north: 1.01e6 },
    ],
    [
      'grid metres beyond the pole',
      utm(26),
      { ...quad, by: 'metres', west: 4e5, south: 2e7, east: 4.1e5, north: 2.1e7 },
    ],
    [
      'a conic far from its parallels',
      '+proj=lcc +lat_0=46.5 +lon_0=3 +lat_1=49 +lat_2=44 +x_0=700000 +y_0=6600000 +ellps=GRS80 +units=m +no_defs',
      { by: 'degrees', west: 3, south: -20, east: 3.2, north: -19.8 },
    ],
  ] as [string, string, Area][])('refuses %s, with a sentence', (_, definition, area) => {
    const found = areaIn(definition, area)
    expect(found.outcome).toBe('refused')
    if (found.outcome === 'refused') expect(found.reason).toMatch(/^[A-Z].*\.$/)
  })
})
