import { describe, expect, it } from 'vitest'
import { drawMark, lineMarks, marksInUse } from '@shared/symbols/line-marks'
import { boundsOf } from '@shared/symbols/place-marks'
import { aDrawnAxialTrace, aDrawnContact, aDrawnFault, straight } from '../../../support/drawn-items'

const line = straight(90, 20)
const inUse = (items: Parameters<typeof marksInUse>[0]) => marksInUse(items).map(({ id }) => id)

describe('marks on lines', () => {
  it('are explained where one stands on the sheet, and only then', () => {
    expect(inUse([aDrawnContact(line), aDrawnFault(line), aDrawnAxialTrace(line)])).toEqual([])
    expect(inUse([aDrawnContact(line, { identity: 'questionable' })])).toEqual(['mark.questioned'])
    expect(inUse([aDrawnFault(line, { dip: 60 }), aDrawnFault(line, { dip: 0 })])).toEqual(['mark.fault-dip'])
    expect(inUse([aDrawnAxialTrace(line, { plunge: 20, trend: 90 })])).toEqual(['mark.plunge'])
    expect(inUse([aDrawnAxialTrace(line, { plunge: 0, trend: 90 })])).toEqual([])
    expect(
      inUse([
        aDrawnAxialTrace(line, { doubly: 'inward' }),
        aDrawnAxialTrace(line, { doubly: 'outward', plunge: 20, trend: 90, otherPlunge: 5 }),
      ]),
    ).toEqual(['mark.plunge-outward', 'mark.plunge-inward'])
  })

  it('have samples that differ and stay in their row', () => {
    const box = { width: 18, height: 8 }
    const samples = lineMarks.map((mark) => drawMark(mark, box))
    expect(new Set(samples.map((list) => JSON.stringify(list))).size).toBe(lineMarks.length)
    for (const list of samples) {
      const bounds = boundsOf(list) ?? { x: NaN, y: NaN, width: NaN, height: NaN }
      expect(bounds.x).toBeGreaterThan(-0.6)
      expect(bounds.x + bounds.width).toBeLessThan(18.6)
      expect(bounds.y).toBeGreaterThan(-0.6)
      expect(bounds.y + bounds.height).toBeLessThan(8.6)
    }
  })
})
