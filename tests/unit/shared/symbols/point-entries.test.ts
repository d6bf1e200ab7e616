import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { lineationTypes, planeTypes, stationTypes } from '@shared/items/points'
import { legendEntryOf } from '@shared/symbols/legend-entries'
import { drawPointEntry, pointEntries } from '@shared/symbols/point-entries'
import { boundsOf } from '@shared/symbols/place-marks'
import { aPoint } from '../../../support/sheet-items'

const azimuth = fc.double({ min: 0, max: 359.99, noNaN: true })
const inclination = fc.double({ min: 0, max: 90, noNaN: true })
const plane = fc.record({
  type: fc.constantFrom(...planeTypes),
  strike: azimuth,
  dip: inclination,
  overturned: fc.boolean(),
})

describe('legend entries of points', () => {
  it('explain every attitude, lineation and place there can be', () => {
    const traits = fc.record({ undulating: fc.boolean(), topsKnown: fc.boolean() })
    const line = fc.record({
      type: fc.constantFrom(...lineationTypes),
      trend: azimuth,
      plunge: inclination,
      plane: fc.option(plane),
    })
    fc.assert(
      fc.property(plane, traits, line, (attitude, seen, lineation) => {
        expect(legendEntryOf(aPoint('attitude', [0, 0], { ...attitude, ...seen }))).toBeDefined()
        expect(legendEntryOf(aPoint('lineation', [0, 0], lineation))).toBeDefined()
      }),
      { seed: 20261201 },
    )
    for (const type of stationTypes) expect(legendEntryOf(aPoint('station', [0, 0], { type }))).toBeDefined()
  })

  it('say what the symbol says', () => {
    const titleOf = (...given: Parameters<typeof aPoint>) => legendEntryOf(aPoint(...given))?.title
    expect(titleOf('attitude', [0, 0], { strike: 10, dip: 20, topsKnown: true, undulating: true })).toBe(
      'Bedding, inclined, undulating, tops known',
    )
    expect(titleOf('attitude', [0, 0], { type: 'joint', strike: 10, dip: 20, topsKnown: true })).toBe(
      'Joint, inclined',
    )
    expect(titleOf('lineation', [0, 0], { trend: 10, plunge: 0.3 })).toBe('Lineation, horizontal')
    expect(
      titleOf('lineation', [0, 0], {
        type: 'minor-fold-axis',
        trend: 10,
        plunge: 20,
        plane: { type: 'cleavage', strike: 0, dip: 60, overturned: false },
      }),
    ).toBe('Minor fold axis on cleavage')
    expect(titleOf('station', [0, 0], { type: 'mine-adit' })).toBe('Mine adit')
  })

  it('are drawn small enough for a row of the palette', () => {
    for (const entry of pointEntries) {
      if (entry.onlyExplains) continue
      const bounds = boundsOf(drawPointEntry(entry))
      // The palette's rows give 15.4 by 5.6 mm.
      expect(bounds?.width, entry.id).toBeLessThan(15.4)
      expect(bounds?.height, entry.id).toBeLessThan(5.6)
    }
  })

  it('give what is drawn with them no azimuth that nobody measured', () => {
    for (const entry of pointEntries) {
      if (entry.kind === 'station') expect(entry.properties.azimuth, entry.id).toBeNull()
    }
  })

  it('offer a pen for every kind of plane, line and place', () => {
    const pens = pointEntries.filter((entry) => !entry.onlyExplains)
    const typesOf = (kind: string) =>
      new Set(pens.filter((pen) => pen.kind === kind).map((pen) => pen.properties.type))
    expect(typesOf('attitude')).toEqual(new Set(planeTypes))
    expect(typesOf('lineation')).toEqual(new Set(lineationTypes))
    expect(typesOf('station')).toEqual(new Set(stationTypes))
  })
})
