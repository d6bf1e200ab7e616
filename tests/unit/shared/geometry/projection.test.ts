import { describe, expect, it } from 'vitest'
import { sheetProjection } from '@shared/geometry/projection'
import { utmConvergence, utmDefinition } from '../../../reference/geodesy'

describe('the projection of a sheet', () => {
  it.each(utmConvergence)(
    'agrees with PROJ at $lat, $lon',
    ({ lat, lon, zone, east, north, convergence }) => {
      const projection = sheetProjection(utmDefinition(zone))
      const [x, y] = projection.fromLonLat([lon, lat])
      // A millimetre: the source prints tenths of one.
      expect(Math.abs(x - east)).toBeLessThan(0.001)
      expect(Math.abs(y - north)).toBeLessThan(0.001)
      // A hundredth of a second of arc, far below what a drawing can show.
      expect(Math.abs(projection.convergenceAt([east, north]) - convergence)).toBeLessThan(3e-6)
    },
  )

  it('agrees with the spherical estimate tan γ = tan Δλ · sin φ', () => {
    const { convergenceAt, fromLonLat } = sheetProjection(utmDefinition('26'))
    for (let lat = -80; lat <= 80; lat += 20) {
      for (const lon of [-29.5, -28, -27, -26, -24.5]) {
        const estimate = Math.atan(Math.tan(((lon + 27) * Math.PI) / 180) * Math.sin((lat * Math.PI) / 180))
        // The ellipsoid differs from the sphere by up to 1e-5° here (geodesy.md section 3); twice that is allowed.
        expect(Math.abs(convergenceAt(fromLonLat([lon, lat])) - (estimate * 180) / Math.PI)).toBeLessThan(
          2e-5,
        )
      }
    }
  })

  it('comes back to where it started', () => {
    const { fromLonLat, toLonLat } = sheetProjection(utmDefinition('26'))
    const [lon, lat] = toLonLat(fromLonLat([-29.8, 47.6]))
    expect(lon).toBeCloseTo(-29.8, 9)
    expect(lat).toBeCloseTo(47.6, 9)
  })
})
