import { describe, expect, it } from 'vitest'
import type { Area, Crs } from '@shared/api/sheets'
import { layOutSheet } from '@shared/sheets/sheet-layout'

const zone26: Crs = {
  srid: 32626,
  name: 'WGS 84 / UTM zone 26N',
  proj4: '+proj=utm +zone=26 +datum=WGS84 +units=m +no_defs',
}
const gannetHead: Area = { by: 'metres', west: 284_000, south: 5_278_000, east: 294_000, north: 5_289_000 }

const laidOut = (...input: Parameters<typeof layOutSheet>) => {
  const found = layOutSheet(...input)
  if (found.outcome === 'refused') throw new Error(found.reason)
  return found.layout
}

describe('layOutSheet', () => {
  it('proposes the smallest page that holds the face, and says so', () => {
    const layout = laidOut(gannetHead, zone26, 24_000, undefined)
    // 10 km and 11 km at 1:24 000 are 416.7 mm and 458.3 mm on paper.
    expect(layout.face.width).toBeCloseTo(10_000_000 / 24_000, 6)
    expect(layout.face.height).toBeCloseTo(11_000_000 / 24_000, 6)
    expect(layout.page).toEqual({ width: 841, height: 594 })
    expect(layout.reason).toMatch(/417 × 458 mm\. A1 landscape/)
  })

  it('gives the footprint where PROJ puts the corner', () => {
    // cs2cs EPSG:32626 → EPSG:4326, PROJ 9.1.1, of 284000 5278000: 47.61936627 -29.87464497.
    const [first] = laidOut(gannetHead, zone26, 24_000, undefined).footprint
    expect(first?.[0]).toBeCloseTo(-29.87464497, 7)
    expect(first?.[1]).toBeCloseTo(47.61936627, 7)
  })

  it('says which page would do where the chosen one does not', () => {
    const layout = laidOut(gannetHead, zone26, 24_000, { width: 594, height: 420 })
    expect(layout.fits).toBe(false)
    expect(layout.reason).toMatch(/does not fit this page\. A1 landscape does\./)
  })

  it('proposes no page for a face that none holds', () => {
    const layout = laidOut(gannetHead, zone26, 5_000, undefined)
    expect(layout).toMatchObject({
      page: undefined,
      fits: false,
      reason: expect.stringMatching(/larger than any/),
    })
  })

  it('refuses an area too small to be a map at its scale', () => {
    const tiny: Area = { ...gannetHead, east: 284_050 }
    expect(layOutSheet(tiny, zone26, 24_000, undefined)).toMatchObject({ outcome: 'refused', field: 'area' })
  })

  it('refuses an area that the projected system is not made for', () => {
    const far: Area = { by: 'degrees', west: 100, south: 10, east: 100.1, north: 10.1 }
    expect(layOutSheet(far, zone26, 24_000, undefined)).toMatchObject({
      outcome: 'refused',
      field: 'area',
      reason: expect.stringMatching(/central meridian/),
    })
  })

  it('says that a projection is not supported instead of failing', () => {
    const odd: Crs = { srid: 1, name: 'An odd grid', proj4: '+proj=nothing' }
    expect(layOutSheet(gannetHead, odd, 24_000, undefined)).toMatchObject({
      outcome: 'refused',
      field: 'srid',
    })
  })
})
