import { describe, expect, it } from 'vitest'
import { sectionTicks } from '@shared/sheet-face/section-ticks'
import { textsOf } from '../../../support/printed-sheet'

describe('the ends of a cross-section', () => {
  it('carry its letter beyond each end, the second with a prime', () => {
    const [first, second] = textsOf(sectionTicks([0, 0], [40, 0], 'A'))
    expect(first).toMatchObject({ text: 'A', at: [-3.4, 0] })
    expect(second?.text).toBe("A'")
    expect(second?.at[0]).toBeGreaterThan(40)
  })

  it('keep their letters upright in every direction', () => {
    for (let azimuth = 0; azimuth < 360; azimuth += 15) {
      const turn = (azimuth * Math.PI) / 180
      for (const text of textsOf(sectionTicks([0, 0], [40 * Math.sin(turn), 40 * Math.cos(turn)], 'B'))) {
        expect(text.turn ?? 0).toBe(0)
      }
    }
  })

  it('meet in the middle of a section that is shorter than both, and draw nothing of one without length', () => {
    const [start] = sectionTicks([0, 0], [6, 0], 'C')
    expect(start?.mark === 'stroke' && start.path[1]).toEqual(['line', 3, 0])
    expect(sectionTicks([5, 5], [5, 5], 'C')).toEqual([])
  })
})
