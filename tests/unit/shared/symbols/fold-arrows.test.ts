import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { measureLine } from '@shared/geometry/measured-line'
import type { AxialTraceProperties, FoldForm } from '@shared/items/lines'
import type { DisplayList } from '@shared/symbols/display-list'
import { drawItem, lineSymbolOf } from '@shared/symbols/draw-item'
import { layOutLine } from '@shared/symbols/line-layout'
import { inkPoints } from '@shared/symbols/place-marks'
import { angleBetween, normalizeAzimuth, type MM } from '@shared/units'
import { aWalk } from '../../../support/arbitrary-lines'
import { aDrawnAxialTrace, plainFrame, straight } from '../../../support/drawn-items'

/** Arrow heads of a fold on a line: how far left of the trace each has its tip and the ends of its barbs. */
function headsOn(line: MM[], properties: Partial<AxialTraceProperties>): { tip: number; back: number }[] {
  const item = aDrawnAxialTrace(line, properties)
  const measured = measureLine(line)
  const symbol = lineSymbolOf(item)
  const side = item.properties.side === 'left' ? 1 : -1
  const { decorations } = layOutLine(measured, symbol, {
    locationConfidence: 'certain',
    identity: 'certain',
    attributes: { side },
  })
  const frames = decorations.map(({ at }) => ({
    at: measured.pointAt(at),
    way: measured.directionAt(at, symbol.decoration?.bearingOver ?? 1),
  }))
  // The heads are the strokes with round ends.
  const heads = drawItem(item, plainFrame()).filter((mark) => mark.mark === 'stroke' && mark.cap === 'round')
  return heads.flatMap((mark) => {
    const [back = [0, 0], tip = [0, 0]] = inkPoints([mark])[0]?.points ?? []
    const nearest = frames.toSorted((a, b) => distance(a.at, tip) - distance(b.at, tip))[0]
    if (!nearest) return []
    const left = ([x, y]: MM) => (y - nearest.at[1]) * nearest.way[0] - (x - nearest.at[0]) * nearest.way[1]
    return [{ tip: left(tip), back: left(back) }]
  })
}

const distance = (a: MM, b: MM): number => Math.hypot(a[0] - b[0], a[1] - b[1])

const aLine = aWalk({ steps: [8, 50], step: [1, 5], turn: 35 })
const aSide = fc.constantFrom('left', 'right')

describe('the arrows of a fold, on any crooked line', () => {
  it.each<[FoldForm, 'away' | 'toward']>([
    ['anticline', 'away'],
    ['antiform', 'away'],
    ['syncline', 'toward'],
    ['synform', 'toward'],
  ])('of an %s point %s from or to the trace, one on each side', (form, way) => {
    fc.assert(
      fc.property(aLine, (line) => {
        const heads = headsOn(line, { form })
        expect(heads.length).toBeGreaterThan(0)
        expect(heads.filter(({ tip }) => tip > 0)).toHaveLength(heads.length / 2)
        for (const { tip, back } of heads) {
          expect(Math.abs(tip) > Math.abs(back)).toBe(way === 'away')
          expect(Math.sign(tip)).toBe(Math.sign(back))
        }
      }),
    )
  })

  it.each<[FoldForm, 'away' | 'toward']>([
    ['overturned-anticline', 'away'],
    ['overturned-syncline', 'toward'],
  ])('of an %s both stand on the side to which its limbs dip', (form, way) => {
    // Source: common practice, as told in symbolization.md section 3.
    fc.assert(
      fc.property(aLine, aSide, (line, side) => {
        const heads = headsOn(line, { form, side })
        expect(heads.length).toBeGreaterThan(0)
        for (const { tip, back } of heads) {
          expect(Math.sign(tip)).toBe(side === 'left' ? 1 : -1)
          expect(Math.sign(back)).toBe(Math.sign(tip))
          expect(Math.abs(tip) > Math.abs(back)).toBe(way === 'away')
        }
      }),
    )
  })

  it.each<FoldForm>(['monocline-anticlinal-bend', 'monocline-synclinal-bend'])(
    'of a %s point the way its steep limb dips, away from the upper bend and toward the lower',
    (form) => {
      fc.assert(
        fc.property(aLine, aSide, (line, side) => {
          const sign = side === 'left' ? 1 : -1
          for (const { tip, back } of headsOn(line, { form, side })) {
            expect(Math.sign(tip - back)).toBe(sign)
            expect(Math.sign(tip)).toBe(form === 'monocline-anticlinal-bend' ? sign : -sign)
          }
        }),
      )
    },
  )
})

describe('a doubly plunging axis', () => {
  /** Tip and azimuth of each arrowhead, and the figure nearest to it. */
  function headsOf(list: DisplayList) {
    const figures = list.filter((mark) => mark.mark === 'text')
    return list
      .filter((mark) => mark.mark === 'fill')
      .map((head) => {
        const [tip = [0, 0], left = [0, 0], , right = [0, 0]] = inkPoints([head])[0]?.points ?? []
        const back: MM = [(left[0] + right[0]) / 2, (left[1] + right[1]) / 2]
        const azimuth = normalizeAzimuth((Math.atan2(tip[0] - back[0], tip[1] - back[1]) * 180) / Math.PI)
        const nearest = figures.toSorted((a, b) => distance(a.at, tip) - distance(b.at, tip))[0]
        return { tip, azimuth, figure: nearest?.text }
      })
  }
  const draw = (line: MM[], properties: Partial<AxialTraceProperties>) =>
    headsOf(drawItem(aDrawnAxialTrace(line, properties), plainFrame()))

  it('has an arrow down each half, with its own figure, whichever way its trace was drawn', () => {
    for (let azimuth = 0; azimuth < 360; azimuth += 5) {
      for (const doubly of ['outward', 'inward'] as const) {
        for (const line of [straight(azimuth, 40), straight(azimuth, 40).toReversed()]) {
          const heads = draw(line, { doubly, plunge: 21, trend: azimuth, otherPlunge: 12 })
          expect(heads.map(({ figure }) => figure).toSorted()).toEqual(['12', '21'])
          for (const { azimuth: points, figure } of heads) {
            expect(angleBetween(points, figure === '21' ? azimuth : azimuth + 180)).toBeLessThan(1e-6)
          }
        }
      }
    }
  })

  it('points out of its trace from a culmination, and into it toward a depression', () => {
    for (let azimuth = 0; azimuth < 360; azimuth += 15) {
      const middle = straight(azimuth, 20)[1] ?? [0, 0]
      for (const [doubly, sign] of [
        ['outward', 1],
        ['inward', -1],
      ] as const) {
        for (const { tip, azimuth: points } of draw(straight(azimuth, 40), { doubly })) {
          const turn = (points * Math.PI) / 180
          const outward = (tip[0] - middle[0]) * Math.sin(turn) + (tip[1] - middle[1]) * Math.cos(turn)
          expect(Math.sign(outward)).toBe(sign)
        }
      }
    }
  })

  it('shows both ways where no plunge is stated, without figures; and none for a half that lies flat', () => {
    const list = drawItem(aDrawnAxialTrace(straight(30, 40), { doubly: 'outward' }), plainFrame())
    expect(list.filter((mark) => mark.mark === 'fill')).toHaveLength(2)
    expect(list.filter((mark) => mark.mark === 'text')).toEqual([])
    expect(draw(straight(30, 40), { doubly: 'outward', plunge: 20, trend: 30, otherPlunge: 0 })).toHaveLength(
      1,
    )
  })
})
