import { describe, expect, it } from 'vitest'
import { utmSrid, utmZone } from '@shared/geometry/utm'
import { utmZones } from '../../../reference/geodesy'

describe('UTM zones', () => {
  it.each(utmZones)('puts %d, %d in zone %d', (lon, lat, zone) => expect(utmZone(lon, lat)).toBe(zone))

  it('names the EPSG code by hemisphere, and none beyond the grid', () => {
    expect(utmSrid(-30, 47)).toBe(32626)
    expect(utmSrid(144, -37)).toBe(32755)
    expect(utmSrid(10, 84.1)).toBeUndefined()
    expect(utmSrid(10, -80.1)).toBeUndefined()
  })
})
