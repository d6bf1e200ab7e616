import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { sheetProjection } from '@shared/geometry/projection'
import { lineationPropertiesSchema, lineationTypes, planeTypes } from '@shared/items/points'
import { drawItem } from '@shared/symbols/draw-item'
import { arrowOf, drawLineation, lineationCaseOf, type DrawnLineation } from '@shared/symbols/draw-lineation'
import { SYMBOL_REACH } from '@shared/symbols/symbol-reach'
import type { MM } from '@shared/units'
import { utmConvergence, utmDefinition } from '../../../reference/geodesy'
import { along, closestInk, furthestInk, inkOf, numeralsOf, vectorOf } from '../../../support/drawn-marks'

const everyAzimuth = Array.from({ length: 360 }, (_, azimuth) => azimuth)
const aLineation = (properties: Partial<DrawnLineation>): DrawnLineation => ({
  type: 'lineation',
  trend: 120,
  plunge: 35,
  plane: null,
  ...properties,
})

/** White space that every figure keeps, millimetres: half of what the definition asks, as curves are measured by chords. */
const CLEAR = 0.25

describe.each(lineationTypes)('the arrow of a %s', (type) => {
  it('starts at the place and points down the plunge, all round the compass', () => {
    for (const trend of everyAzimuth) {
      const ink = inkOf(drawLineation(aLineation({ type, trend }), [0, 0], 0))
      const ahead = ink.map((point) => along(point, vectorOf(trend)))
      expect(Math.min(...ahead)).toBeCloseTo(0, 9)
      const tip = ink[ahead.indexOf(Math.max(...ahead))] as MM
      expect(Math.abs(along(tip, vectorOf(trend + 90)))).toBeLessThan(1e-9)
      expect(Math.max(...ahead)).toBeGreaterThan(5)
    }
  })

  it('has its figure upright beyond its head, in whole degrees', () => {
    for (const trend of everyAzimuth) {
      const list = drawLineation(aLineation({ type, trend, plunge: 34.6 }), [0, 0], 0)
      const [numeral, ...others] = numeralsOf(list)
      expect(others).toEqual([])
      expect(numeral?.text).toBe('35')
      expect(numeral?.turn ?? 0).toBe(0)
      expect(along(numeral?.at ?? [0, 0], vectorOf(trend))).toBeGreaterThan(6)
      expect(numeral && closestInk(list, numeral)).toBeGreaterThan(CLEAR)
    }
  })

  it('has two heads and no figure where the line is horizontal: either end will do', () => {
    for (const trend of everyAzimuth.slice(0, 180)) {
      const list = drawLineation(aLineation({ type, trend, plunge: 0.4 }), [0, 0], 0)
      expect(numeralsOf(list)).toEqual([])
      const ahead = inkOf(list).map((point) => along(point, vectorOf(trend)))
      expect(Math.max(...ahead)).toBeCloseTo(-Math.min(...ahead), 9)
      const other = inkOf(drawLineation(aLineation({ type, trend: trend + 180, plunge: 0 }), [0, 0], 0))
      const covered = (points: MM[]) =>
        points
          .map(([x, y]) => `${x.toFixed(6)} ${y.toFixed(6)}`.replaceAll('-0.000000', '0.000000'))
          .toSorted()
      expect(new Set(covered(other))).toEqual(new Set(covered(inkOf(list))))
    }
  })

  it('is seen along itself where the line is vertical, with or without a trend', () => {
    const vertical = drawLineation(aLineation({ type, trend: null, plunge: 90 }), [0, 0], 0)
    expect(numeralsOf(vertical)).toEqual([])
    expect(drawLineation(aLineation({ type, trend: 77, plunge: 89.6 }), [0, 0], 3)).toEqual(vertical)
  })
})

describe('a lineation', () => {
  it('has its arrow where it is drawn, for whoever aims at it', () => {
    for (const plunge of [0, 35]) {
      for (const trend of everyAzimuth) {
        const line = aLineation({ trend, plunge })
        const [from, to] = arrowOf(line, 2) ?? [
          [NaN, NaN],
          [NaN, NaN],
        ]
        const toward = vectorOf(trend - 2)
        const ahead = inkOf(drawLineation(line, [0, 0], 2)).map((point) => along(point, toward))
        expect(along(to, toward)).toBeCloseTo(Math.max(...ahead), 9)
        expect(along(from, toward)).toBeCloseTo(Math.min(...ahead), 9)
      }
    }
    expect(arrowOf(aLineation({ trend: null, plunge: 90 }), 0)).toBeUndefined()
  })

  it('judges its case by the whole degrees it prints', () => {
    expect(lineationCaseOf({ trend: 10, plunge: 0.4 })).toBe('horizontal')
    expect(lineationCaseOf({ trend: 10, plunge: 0.6 })).toBe('plunging')
    expect(lineationCaseOf({ trend: 10, plunge: 89.4 })).toBe('plunging')
    expect(lineationCaseOf({ trend: 10, plunge: 89.6 })).toBe('vertical')
  })

  it.each(utmConvergence.filter(({ convergence }) => Math.abs(convergence) > 2))(
    'turns by trend minus the convergence that PROJ gives at $lat, $lon',
    ({ zone, east, north, convergence }) => {
      const { convergenceAt } = sheetProjection(utmDefinition(zone))
      for (const trend of [0, 45, 179, 300]) {
        const list = drawItem(
          {
            kind: 'lineation',
            id: '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e01',
            geometry: { type: 'Point', coordinates: [east, north] },
            properties: lineationPropertiesSchema.parse({ trend, plunge: 30 }),
          },
          { origin: [east, north], mmPerMetre: 0.04, convergenceAt },
        )
        const ahead = inkOf(list).map((point) => along(point, vectorOf(trend - convergence)))
        // The tip is 6 mm from the place; a hundredth of a degree would shorten that by less than a ten-millionth, so the
        // reach across is what shows a wrong turn.
        const tip = inkOf(list)[ahead.indexOf(Math.max(...ahead))] as MM
        expect(Math.abs(along(tip, vectorOf(trend - convergence + 90)))).toBeLessThan(1e-6)
      }
    },
  )
})

describe('a lineation on a plane', () => {
  const azimuth = fc.double({ min: 0, max: 359.99, noNaN: true })
  const inclination = fc.double({ min: 0, max: 90, noNaN: true })
  const anyLine = fc.record({
    type: fc.constantFrom(...lineationTypes),
    trend: azimuth,
    plunge: inclination,
    plane: fc.record({
      type: fc.constantFrom(...planeTypes),
      strike: azimuth,
      dip: inclination,
      overturned: fc.boolean(),
    }),
  })

  it('keeps both figures clear of all ink and of one another, and all of it within reach of the place', () => {
    fc.assert(
      fc.property(anyLine, (line) => {
        const list = drawLineation(line, [0, 0], 0)
        for (const numeral of numeralsOf(list)) expect(closestInk(list, numeral)).toBeGreaterThan(CLEAR)
        expect(furthestInk(list)).toBeLessThan(SYMBOL_REACH)
      }),
      { numRuns: 1500, seed: 20261201 },
    )
  })

  it('has the dip’s figure on the down-dip side and the plunge’s beyond the arrow', () => {
    fc.assert(
      fc.property(anyLine, (line) => {
        const list = drawLineation(line, [0, 0], 0)
        const numerals = numeralsOf(list)
        if (lineationCaseOf(line) === 'plunging') {
          const plunge = numerals.shift()
          expect(plunge?.text).toBe(String(Math.round(line.plunge)))
          expect(along(plunge?.at ?? [0, 0], vectorOf(line.trend))).toBeGreaterThan(6)
        }
        const [dip] = numerals
        if (dip === undefined) return
        expect(dip.text).toBe(String(Math.round(line.plane.dip)))
        expect(along(dip.at, vectorOf(line.plane.strike + 90))).toBeGreaterThan(1)
      }),
      { numRuns: 500, seed: 20261202 },
    )
  })

  it('stands at one place: the middle of the strike line is the arrow’s tail', () => {
    const line = aLineation({ plane: { type: 'bedding', strike: 45, dip: 40, overturned: false } })
    const list = drawLineation(line, [30, 40], 0)
    const [strikeLine] = list
    const points = inkOf(strikeLine ? [strikeLine] : [])
    const [from, to] = [points[0], points.at(-1)] as [MM, MM]
    expect([(from[0] + to[0]) / 2, (from[1] + to[1]) / 2]).toEqual([
      expect.closeTo(30, 9),
      expect.closeTo(40, 9),
    ])
    const alone = drawLineation({ ...line, plane: null }, [30, 40], 0)
    expect(list).toEqual(expect.arrayContaining(alone.filter((mark) => mark.mark !== 'text')))
  })
})
