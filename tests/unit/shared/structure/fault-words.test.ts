import { describe, expect, it } from 'vitest'
import { reversedSide, type FaultProperties } from '@shared/items/lines'
import { describeFault } from '@shared/structure/fault-words'
import { sideWords } from '@shared/structure/line-side'
import type { XY } from '@shared/units'
import { straight } from '../../../support/drawn-items'

const fault = (properties: Partial<FaultProperties>) =>
  ({ type: 'normal', side: 'right', dip: null, ...properties }) as const
const words = (properties: Partial<FaultProperties>, line: XY[] = straight(0, 100)) =>
  describeFault(fault(properties), line, () => 0)

describe('a fault in words', () => {
  it('says which side is down, or up, and how it dips', () => {
    expect(words({ type: 'normal', dip: 60 })).toBe('Normal fault, down to the east, dipping 60°')
    expect(words({ type: 'thrust', side: 'left' })).toBe('Thrust, upper plate to the west')
    expect(words({ type: 'unspecified' })).toBe('Fault')
    expect(words({ type: 'left-lateral', dip: 80 })).toBe('Left-lateral fault, dipping 80° to the east')
    expect(words({ type: 'reverse', dip: 90 })).toBe('Reverse fault, upper plate to the east, vertical')
    expect(words({ type: 'rotational' })).toBe(
      'Rotational fault, down to the east at its southern end and to the west at its northern end',
    )
  })

  it('says the same of the ground when the line is turned round, all round the compass', () => {
    for (const type of ['normal', 'reverse', 'thrust', 'unspecified'] as const) {
      for (let azimuth = 1; azimuth < 360; azimuth += 7) {
        const line = straight(azimuth, 100)
        const turned = { type, dip: 50, side: reversedSide(fault({ type })) }
        expect(words(turned, line.toReversed())).toBe(words({ type, dip: 50 }, line))
      }
    }
  })

  it('keeps what is down at each end of a rotational fault when its line is turned round', () => {
    const type = 'rotational'
    const turned = words({ type, side: reversedSide(fault({ type })) }, straight(0, 100).toReversed())
    // The same two facts, told from the other end.
    expect(turned).toBe(
      'Rotational fault, down to the west at its northern end and to the east at its southern end',
    )
  })

  it('names the inside and outside of a ring, whichever way round it was drawn', () => {
    const ring: XY[] = [
      [500_000, 5_000_000],
      [500_100, 5_000_000],
      [500_100, 5_000_100],
      [500_000, 5_000_100],
      [500_000, 5_000_000],
    ]
    expect(sideWords(ring, 'left', () => 0)).toBe('inside')
    expect(sideWords(ring, 'right', () => 0)).toBe('outside')
    expect(sideWords(ring.toReversed(), 'left', () => 0)).toBe('outside')
  })
})
