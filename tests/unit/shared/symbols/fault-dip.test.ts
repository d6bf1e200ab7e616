import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { measureLine } from '@shared/geometry/measured-line'
import type { FaultProperties } from '@shared/items/lines'
import type { DisplayList, Mark } from '@shared/symbols/display-list'
import { drawItem } from '@shared/symbols/draw-item'
import { inkPoints } from '@shared/symbols/place-marks'
import { textCorners } from '@shared/symbols/text-box'
import type { MM } from '@shared/units'
import { aWalk } from '../../../support/arbitrary-lines'
import { aDrawnFault, plainFrame, straight } from '../../../support/drawn-items'

const azimuths = Array.from({ length: 72 }, (_, index) => index * 5)
const draw = (line: MM[], properties: Partial<FaultProperties>): DisplayList =>
  drawItem(aDrawnFault(line, properties), plainFrame())
const centre = (mark: Mark): MM => {
  const points = inkPoints([mark]).flatMap((part) => part.points)
  return [
    points.reduce((sum, [x]) => sum + x, 0) / points.length,
    points.reduce((sum, [, y]) => sum + y, 0) / points.length,
  ]
}
/** How far left of a straight line through the origin a place lies. */
const leftOf = ([x, y]: MM, azimuth: number): number => {
  const turn = (azimuth * Math.PI) / 180
  return -x * Math.cos(turn) + y * Math.sin(turn)
}

describe('the dip of a fault', () => {
  it('is an arrow and an upright figure down dip, near the middle, all round the compass', () => {
    for (const azimuth of azimuths) {
      for (const [side, sign] of [
        ['left', 1],
        ['right', -1],
      ] as const) {
        const list = draw(straight(azimuth, 40), { dip: 54.6, side })
        const [head] = list.filter((mark) => mark.mark === 'fill')
        const [figure, ...others] = list.filter((mark) => mark.mark === 'text')
        expect(others).toEqual([])
        expect(figure?.text).toBe('55')
        expect(figure?.turn ?? 0).toBe(0)
        const [headLeft, figureLeft] = [
          head ? leftOf(centre(head), azimuth) : NaN,
          leftOf(figure?.at ?? [0, 0], azimuth),
        ]
        expect(headLeft * sign).toBeGreaterThan(2)
        expect(figureLeft * sign).toBeGreaterThan(headLeft * sign)
        const [x, y] = figure?.at ?? [0, 0]
        const along = x * Math.sin((azimuth * Math.PI) / 180) + y * Math.cos((azimuth * Math.PI) / 180)
        expect(along).toBeCloseTo(20, 6)
      }
    }
  })

  it('keeps its figure clear of the line and of its own arrow on any crooked line', () => {
    fc.assert(
      fc.property(aWalk({ steps: [10, 40], step: [1, 4], turn: 15 }), (line) => {
        const list = draw(line, { type: 'thrust', dip: 30 })
        const [figure] = list.filter((mark) => mark.mark === 'text')
        const [lower, , upper] = figure ? textCorners(figure) : [[NaN, NaN], , [NaN, NaN]]
        for (const { points, halfWidth } of inkPoints(list.filter((mark) => mark !== figure))) {
          for (const [x, y] of points) {
            const isInside =
              x > lower[0] - halfWidth &&
              x < upper[0] + halfWidth &&
              y > lower[1] - halfWidth &&
              y < upper[1] + halfWidth
            expect(isInside).toBe(false)
          }
        }
      }),
    )
  })

  it('is a bar to both sides where the fault is vertical, and nothing where it lies flat or is not stated', () => {
    const vertical = draw(straight(0, 40), { dip: 89.7 })
    expect(vertical.filter((mark) => mark.mark === 'fill')).toEqual([])
    expect(vertical.filter((mark) => mark.mark === 'text').map(({ text }) => text)).toEqual(['90'])
    const [, bar] = vertical.filter((mark) => mark.mark === 'stroke')
    const xs = bar ? inkPoints([bar]).flatMap(({ points }) => points.map(([x]) => x)) : []
    expect(Math.max(...xs)).toBeCloseTo(-Math.min(...xs), 9)
    for (const dip of [null, 0.3]) expect(draw(straight(0, 40), { dip })).toHaveLength(1)
  })
})

describe('a rotational fault', () => {
  it('has its ball on the stated side at its start and on the other at its end', () => {
    for (const azimuth of azimuths) {
      for (const [side, sign] of [
        ['left', 1],
        ['right', -1],
      ] as const) {
        const balls = draw(straight(azimuth, 60), { type: 'rotational', side })
          .filter((mark) => mark.mark === 'fill')
          .map(centre)
          .toSorted((a, b) => Math.hypot(...a) - Math.hypot(...b))
        expect(balls.map((at) => Math.sign(leftOf(at, azimuth)))).toEqual([sign, -sign])
      }
    }
  })
})

describe('the arrows of a lateral fault', () => {
  it('run beside the line and never touch it, however it bows', () => {
    fc.assert(
      fc.property(aWalk({ steps: [20, 60], step: [1, 3], turn: 20 }), (line) => {
        const list = draw(line, { type: 'right-lateral' })
        const measured = measureLine(line)
        const ground = Array.from({ length: Math.ceil(measured.length * 5) }, (_, at) =>
          measured.pointAt(at / 5),
        )
        const arrows = list.slice(1)
        for (const { points } of inkPoints(arrows)) {
          for (const [x, y] of points) {
            const nearest = Math.min(...ground.map(([gx, gy]) => Math.hypot(gx - x, gy - y)))
            expect(nearest).toBeGreaterThan(0.35)
          }
        }
      }),
      { numRuns: 60 },
    )
  })
})
