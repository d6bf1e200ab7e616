import { booleanPointInPolygon, polygon } from '@turf/turf'
import { describe, expect, it } from 'vitest'
import type { Face } from '@shared/api/faces'
import { doubtsOf } from '@shared/review/doubts'
import type { XY } from '@shared/units'
import { aSheetFace, aUnit } from '../../../support/sheet-items'

const unit = aUnit({})
const signed = aSheetFace({ authors: 'Rosa Kelp' })
/** A horseshoe: its middle is outside it. */
const horseshoe: XY[] = [[0, 0], [90, 0], [90, 90], [60, 90], [60, 30], [30, 30], [30, 90], [0, 90], [0, 0]] // prettier-ignore
const named: Face = { unit: unit.id, rings: [horseshoe] }
const nameless: Face = { unit: null, rings: [horseshoe] }

describe('doubts about a sheet', () => {
  it('are none where every area has its unit and the authors are named', () => {
    expect(doubtsOf([named], [unit, signed])).toEqual([])
  })

  it('count areas without a unit, and say where each is', () => {
    const [doubt, ...more] = doubtsOf([nameless, named, nameless], [unit, signed])
    expect(more).toEqual([])
    expect(doubt?.sentence).toMatch(/^2 areas have no unit label/)
    for (const place of doubt?.places ?? []) {
      expect(booleanPointInPolygon(place, polygon([horseshoe]))).toBe(true)
    }
    expect(doubt?.places).toHaveLength(2)
  })

  it('name a legend without units and a sheet without authors', () => {
    expect(doubtsOf([], [aSheetFace()]).map(({ sentence }) => sentence)).toEqual([
      'The legend has no units.',
      'No authors are named in the title block.',
    ])
  })
})
