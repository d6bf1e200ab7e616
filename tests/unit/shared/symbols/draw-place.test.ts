import { describe, expect, it } from 'vitest'
import { planeTypes, stationTypes } from '@shared/items/points'
import { drawAttitude } from '@shared/symbols/draw-attitude'
import { drawPlace, placeSymbolOf } from '@shared/symbols/draw-place'
import { SYMBOL_REACH } from '@shared/symbols/symbol-reach'
import { along, closestInk, furthestInk, inkOf, numeralsOf, vectorOf } from '../../../support/drawn-marks'

const everyAzimuth = Array.from({ length: 360 }, (_, azimuth) => azimuth)
const turned = stationTypes.filter((type) => placeSymbolOf(type).azimuth !== undefined)
const upright = stationTypes.filter((type) => placeSymbolOf(type).azimuth === undefined)

describe('the symbol of a place', () => {
  it('is turned for adits and directions of tops alone', () => {
    expect(turned).toEqual(['mine-adit', 'tops-direction'])
  })

  it.each(turned)('of a %s reaches furthest toward its azimuth, less the convergence', (type) => {
    for (const azimuth of everyAzimuth) {
      const ink = inkOf(drawPlace({ type, azimuth }, [0, 0], 2))
      const reach = (toward: number) => Math.max(...ink.map((point) => along(point, vectorOf(toward))))
      expect(reach(azimuth - 2)).toBeGreaterThan(reach(azimuth + 178) + 1)
      const across = ink.map((point) => along(point, vectorOf(azimuth + 88)))
      expect(Math.max(...across)).toBeCloseTo(-Math.min(...across), 9)
    }
  })

  it.each(turned)('of a %s without an azimuth stands upright and queried', (type) => {
    const list = drawPlace({ type, azimuth: null }, [0, 0], 2)
    const [query] = numeralsOf(list)
    expect(query?.text).toBe('?')
    expect(query && closestInk(list, query)).toBeGreaterThan(0.25)
    expect(list.slice(0, -1)).toEqual(placeSymbolOf(type).marks)
  })

  it.each(upright)('of a %s stands as it is drawn, whatever the grid', (type) => {
    expect(drawPlace({ type, azimuth: 50 }, [0, 0], 2.5)).toEqual(placeSymbolOf(type).marks)
  })

  it('is in one ink, no stroke finer than prints, and within reach of the place', () => {
    for (const type of stationTypes) {
      const list = drawPlace({ type, azimuth: null }, [0, 0], 0)
      for (const mark of list) {
        if (mark.mark === 'group') throw new Error('A place is drawn without groups.')
        if ('ink' in mark) expect(mark.ink).toBe('black')
        // Source: FGDC-STD-013-2006 as cited in symbolization.md section 1: finer lines may fail in print.
        if (mark.mark === 'stroke') expect(mark.width).toBeGreaterThanOrEqual(0.125)
      }
      expect(furthestInk(list)).toBeLessThan(6)
    }
  })
})

describe('a plane’s symbol', () => {
  it('stays within reach of the place at every attitude', () => {
    for (const type of planeTypes) {
      for (const strike of everyAzimuth) {
        for (const dip of [0, 5, 88, 90]) {
          for (const topsKnown of [false, true]) {
            const plane = { type, strike, dip, overturned: topsKnown, undulating: topsKnown, topsKnown }
            expect(furthestInk(drawAttitude(plane, [0, 0], 0))).toBeLessThan(SYMBOL_REACH)
          }
        }
      }
    }
  })
})
