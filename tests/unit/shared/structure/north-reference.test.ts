import { describe, expect, it } from 'vitest'
import { toGridAzimuth, toTrueAzimuth } from '@shared/structure/north-reference'
import { northConversions } from '../../../reference/geodesy'

describe('the three norths', () => {
  it.each(northConversions)(
    'turns magnetic $magnetic to true $true and grid $grid',
    ({ magnetic, declination, convergence, true: trueAzimuth, grid }) => {
      const correction = { declination, convergence }
      // The source prints nine decimals.
      expect(toTrueAzimuth(magnetic, 'magnetic', correction)).toBeCloseTo(trueAzimuth, 8)
      expect(toGridAzimuth(trueAzimuth, convergence)).toBeCloseTo(grid, 8)
      expect(toTrueAzimuth(grid, 'grid', correction)).toBeCloseTo(trueAzimuth, 8)
      expect(toTrueAzimuth(trueAzimuth, 'true', correction)).toBe(trueAzimuth)
    },
  )

  it('turns a reading east for an east declination, and stays within the circle', () => {
    expect(toTrueAzimuth(0, 'magnetic', { declination: 10, convergence: 0 })).toBe(10)
    expect(toTrueAzimuth(355, 'magnetic', { declination: 10, convergence: 0 })).toBe(5)
    expect(toTrueAzimuth(5, 'magnetic', { declination: -10, convergence: 0 })).toBe(355)
  })
})
