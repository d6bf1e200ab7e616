import { describe, expect, it } from 'vitest'
import type { LocationConfidence } from '@shared/items/confidence'
import { cutDashes } from '@shared/symbols/dashes'
import type { StrokeMark } from '@shared/symbols/display-list'
import { drawItem } from '@shared/symbols/draw-item'
import { flatten } from '@shared/symbols/paths'
import type { MM } from '@shared/units'
import { aDrawnContact, aDrawnFault, plainFrame } from '../../../support/drawn-items'

/** Dashes of a line's own stroke. */
function dashesOf(list: ReturnType<typeof drawItem>): MM[][] {
  const [stroke] = list.filter((mark): mark is StrokeMark => mark.mark === 'stroke')
  return stroke?.dash ? flatten(cutDashes(stroke.path, stroke.dash)) : []
}
const lengthOf = (points: MM[]): number =>
  points
    .slice(1)
    .reduce((sum, [x, y], at) => sum + Math.hypot(x - (points[at]?.[0] ?? x), y - (points[at]?.[1] ?? y)), 0)

const dashed = ['approximate', 'inferred'] as const

describe('the dashes of a line', () => {
  it.each(dashed)('draw a corner rather than leave it out, located %s', (locationConfidence) => {
    for (let leg = 20; leg < 40; leg += 0.7) {
      const corner: MM = [leg, 0]
      const line: MM[] = [[0, 0], corner, [leg - 8, 25]]
      const touches = dashesOf(drawItem(aDrawnContact(line, { locationConfidence }), plainFrame())).some(
        (dash) => dash.some(([x, y]) => Math.hypot(x - corner[0], y - corner[1]) < 1e-6),
      )
      expect(touches, `a leg of ${leg} mm`).toBe(true)
    }
  })

  it.each(dashed)('do not tell where the drawing of a ring began, located %s', (locationConfidence) => {
    const ring = Array.from({ length: 120 }, (_, at): MM => {
      const turn = (at / 120) * 2 * Math.PI
      return [12 * Math.sin(turn), 12 * Math.cos(turn)]
    })
    const item = aDrawnFault([...ring, ring[0] ?? [0, 0]], { type: 'normal', locationConfidence })
    const lengths = dashesOf(drawItem(item, plainFrame())).map(lengthOf)
    expect(lengths.length).toBeGreaterThan(10)
    expect(Math.max(...lengths) / Math.min(...lengths)).toBeLessThan(1.2)
  })

  it('are kept apart from every other confidence by the share of ink, in the order of the trade', () => {
    // Source: symbolization.md section 2: certain > approximate > inferred > concealed.
    const share = (locationConfidence: LocationConfidence): number => {
      const item = aDrawnContact(
        [
          [0, 0],
          [100, 0],
        ],
        { locationConfidence },
      )
      const list = drawItem(item, plainFrame())
      const dashes = dashesOf(list)
      return dashes.length === 0 ? 1 : dashes.reduce((sum, dash) => sum + lengthOf(dash), 0) / 100
    }
    const shares = (['certain', 'approximate', 'inferred', 'concealed'] as const).map(share)
    expect(shares).toEqual(shares.toSorted((a, b) => b - a))
    expect(new Set(shares).size).toBe(4)
  })
})
