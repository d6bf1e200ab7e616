import { describe, expect, it } from 'vitest'
import { locationConfidences } from '@shared/items/confidence'
import { itemSchema } from '@shared/items/item'
import { faultTypes, foldForms } from '@shared/items/lines'
import { drawEntry, legendEntries, legendEntryOf } from '@shared/symbols/legend-entries'
import { boundsOf } from '@shared/symbols/place-marks'
import {
  aDrawnAttitude,
  aDrawnAxialTrace,
  aDrawnContact,
  aDrawnFault,
  straight,
} from '../../../support/drawn-items'

const box = { width: 24, height: 8 }
const line = straight(90, 20)

describe('legend entries', () => {
  it('are named once each', () => {
    expect(new Set(legendEntries.map(({ id }) => id)).size).toBe(legendEntries.length)
    expect(new Set(legendEntries.map(({ title }) => title)).size).toBe(legendEntries.length)
  })

  it('no two look alike', () => {
    const samples = legendEntries.map((entry) => JSON.stringify(drawEntry(entry, box)))
    expect(new Set(samples).size).toBe(samples.length)
  })

  it('draw nothing finer than an eighth of a millimetre', () => {
    // Source: FGDC-STD-013-2006 as cited in symbolization.md section 1: finer lines may fail in print.
    const widths = legendEntries.flatMap((entry) =>
      drawEntry(entry, box).flatMap((mark) => (mark.mark === 'stroke' ? [mark.width] : [])),
    )
    expect(Math.min(...widths)).toBeGreaterThanOrEqual(0.125)
  })

  it('fit the row they are drawn in', () => {
    for (const entry of legendEntries) {
      const bounds = boundsOf(drawEntry(entry, box))
      expect(bounds?.x, entry.id).toBeGreaterThan(-0.6)
      expect((bounds?.x ?? 0) + (bounds?.width ?? 99), entry.id).toBeLessThan(24.6)
      expect(bounds?.y, entry.id).toBeGreaterThan(0)
      expect((bounds?.y ?? 0) + (bounds?.height ?? 99), entry.id).toBeLessThan(8)
    }
  })

  it('start items that the schema accepts', () => {
    for (const entry of legendEntries) {
      const geometry =
        entry.group === 'lines'
          ? { type: 'LineString', coordinates: line }
          : { type: 'Point', coordinates: [0, 0] }
      const item = {
        id: '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e01',
        kind: entry.kind,
        geometry,
        properties: entry.properties,
      }
      const parsed = itemSchema.parse(item)
      expect(legendEntryOf(parsed)?.id).toBe(entry.id)
    }
  })
})

describe('the entry of an item', () => {
  it('follows its type and location confidence', () => {
    for (const locationConfidence of locationConfidences) {
      expect(legendEntryOf(aDrawnContact(line, { locationConfidence })).id).toBe(
        `contact.${locationConfidence}`,
      )
      for (const type of faultTypes) {
        expect(legendEntryOf(aDrawnFault(line, { type, locationConfidence })).id).toBe(
          `fault.${type}.${locationConfidence}`,
        )
      }
      for (const form of foldForms) {
        const trace = aDrawnAxialTrace(line, { form, locationConfidence, plunge: 20, trend: 90 })
        expect(legendEntryOf(trace).id).toBe(`axial-trace.${form}.${locationConfidence}`)
      }
    }
  })

  it('is the same for a questioned line', () =>
    expect(legendEntryOf(aDrawnContact(line, { identity: 'questionable' })).id).toBe('contact.certain'))

  it('follows how a plane lies', () => {
    expect(legendEntryOf(aDrawnAttitude({ dip: 90 })).title).toBe('Bedding, vertical')
    expect(legendEntryOf(aDrawnAttitude({ strike: null, dip: 0 })).title).toBe('Bedding, horizontal')
    expect(legendEntryOf(aDrawnAttitude({ overturned: true })).title).toBe('Bedding, overturned')
    expect(legendEntryOf(aDrawnAttitude({ overturned: true, type: 'joint' })).title).toBe('Joint, inclined')
  })
})
