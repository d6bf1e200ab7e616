import { describe, expect, it } from 'vitest'
import type { FoldForm } from '@shared/items/lines'
import { drawItem } from '@shared/symbols/draw-item'
import type { DisplayList, FillMark, StrokeMark, TextMark } from '@shared/symbols/display-list'
import { inkPoints } from '@shared/symbols/place-marks'
import { textCorners } from '@shared/symbols/text-box'
import { angleBetween, normalizeAzimuth, type MM, type XY } from '@shared/units'
import { aDrawnAxialTrace, plainFrame, straight, waving } from '../../../support/drawn-items'

const azimuths = Array.from({ length: 72 }, (_, index) => index * 5)

const fillsOf = (list: DisplayList): FillMark[] => list.filter((mark) => mark.mark === 'fill')
const textsOf = (list: DisplayList): TextMark[] => list.filter((mark) => mark.mark === 'text')
const pointsOf = (mark: FillMark | StrokeMark): MM[] => inkPoints([mark])[0]?.points ?? []

/** Strokes of a fold on a straight trace, their points told along the trace and left of it. */
function arrowsOn(form: FoldForm, azimuth: number): MM[][] {
  const list = drawItem(aDrawnAxialTrace(straight(azimuth, 30), { form }), plainFrame())
  const turn = (azimuth * Math.PI) / 180
  const [dx, dy] = [Math.sin(turn), Math.cos(turn)]
  const [, ...arrows] = list.filter((mark) => mark.mark === 'stroke')
  return arrows.map((mark) => pointsOf(mark).map(([x, y]): MM => [x * dx + y * dy, -x * dy + y * dx]))
}

/** The tip of an open arrow head: the middle of its three points. */
const headTips = (arrows: MM[][]): MM[] =>
  arrows.filter((points) => points.length === 3).flatMap((points) => points.slice(1, 2))
const headBacks = (arrows: MM[][]): MM[] =>
  arrows.filter((points) => points.length === 3).flatMap((points) => points.slice(0, 1))

describe('the arrows of a fold', () => {
  it('point away from an anticline’s trace and toward a syncline’s, all round the compass', () => {
    for (const azimuth of azimuths) {
      for (const [form, away] of [
        ['anticline', true],
        ['syncline', false],
      ] as const) {
        const arrows = arrowsOn(form, azimuth)
        const [tips, backs] = [headTips(arrows), headBacks(arrows)]
        expect(tips).toHaveLength(2)
        tips.forEach(([, left], index) => {
          const back = backs[index]?.[1] ?? 0
          expect(Math.sign(left)).toBe(Math.sign(back))
          expect(Math.abs(left) > Math.abs(back)).toBe(away)
        })
      }
    }
  })

  it('mirror each other across the trace', () => {
    for (const form of ['anticline', 'syncline', 'antiform', 'synform'] as const) {
      const arrows = arrowsOn(form, 0).flat()
      const sorted = (points: MM[]) =>
        points
          .map(([x, y]) => `${x.toFixed(6)} ${(y + 0).toFixed(6)}`.replace('-0.000000', '0.000000'))
          .toSorted()
      expect(sorted(arrows.map(([x, y]): MM => [x, -y]))).toEqual(sorted(arrows))
    }
  })

  it('stand about six millimetres across', () => {
    const lefts = arrowsOn('anticline', 30)
      .flat()
      .map(([, left]) => left)
    expect(Math.max(...lefts) - Math.min(...lefts)).toBeCloseTo(6.2, 6)
  })
})

describe('the plunge arrow', () => {
  const trace = (line: XY[], trend: number, plunge = 21) =>
    drawItem(aDrawnAxialTrace(line, { plunge, trend }), plainFrame())

  /** Tip and outward direction of the one arrowhead. */
  function headOf(list: DisplayList): { tip: MM; azimuth: number } {
    const [head, ...others] = fillsOf(list)
    expect(others).toEqual([])
    const [tip = [0, 0], left = [0, 0], , right = [0, 0]] = head ? pointsOf(head) : []
    const back = [(left[0] + right[0]) / 2, (left[1] + right[1]) / 2] as const
    return {
      tip,
      azimuth: normalizeAzimuth((Math.atan2(tip[0] - back[0], tip[1] - back[1]) * 180) / Math.PI),
    }
  }

  it('lies on the trace at its down-plunge end and points down-plunge, whichever way the line was drawn', () => {
    for (const azimuth of azimuths) {
      for (const line of [straight(azimuth, 40), straight(azimuth, 40).toReversed()]) {
        for (const off of [0, 20, -20]) {
          const trend = normalizeAzimuth(azimuth + off)
          const { tip, azimuth: points } = headOf(trace(line, trend))
          const [, end] = straight(azimuth, 40)
          expect(Math.hypot(tip[0] - (end?.[0] ?? 0), tip[1] - (end?.[1] ?? 0))).toBeLessThan(1e-9)
          expect(angleBetween(points, azimuth)).toBeLessThan(1e-6)
        }
        const up = headOf(trace(line, normalizeAzimuth(azimuth + 180)))
        expect(Math.hypot(...up.tip)).toBeLessThan(1e-9)
        expect(angleBetween(up.azimuth, azimuth + 180)).toBeLessThan(1e-6)
      }
    }
  })

  it('follows true north, not the grid’s', () => {
    // Trend 088 true is grid 085 at a convergence of 3: east; trend 268 is the other end.
    const frame = plainFrame(3)
    const line = straight(85, 40)
    const east = headOf(drawItem(aDrawnAxialTrace(line, { plunge: 20, trend: 88 }), frame))
    const west = headOf(drawItem(aDrawnAxialTrace(line, { plunge: 20, trend: 268 }), frame))
    expect(east.tip[0]).toBeGreaterThan(39)
    expect(Math.hypot(...west.tip)).toBeLessThan(1e-9)
  })

  it('does not change when a waving line is reversed: the same ink, seen from either end', () => {
    for (const azimuth of azimuths) {
      const line = waving(azimuth, 90)
      const ink = (list: DisplayList) =>
        list
          .flatMap((mark) => inkPoints([mark]).flatMap(({ points }) => points))
          .map(([x, y]) =>
            `${(x + 1e-12).toFixed(5)} ${(y + 1e-12).toFixed(5)}`.replaceAll('-0.00000', '0.00000'),
          )
          .toSorted()
      expect(ink(trace(line.toReversed(), azimuth))).toEqual(ink(trace(line, azimuth)))
    }
  })

  it('carries its whole degrees, upright, beside the head and clear of it', () => {
    for (const azimuth of azimuths) {
      const list = trace(waving(azimuth, 60), azimuth, 20.6)
      const [numeral, ...others] = textsOf(list)
      expect(others).toEqual([])
      expect(numeral?.text).toBe('21')
      expect(numeral?.turn ?? 0).toBe(0)
      const { tip } = headOf(list)
      const at = numeral?.at ?? [0, 0]
      expect(Math.hypot(at[0] - tip[0], at[1] - tip[1])).toBeLessThan(6)
      if (numeral) expect(isClearOf(numeral, list)).toBe(true)
    }
  })

  it('stands only where a plunge is stated and is not horizontal', () => {
    expect(fillsOf(drawItem(aDrawnAxialTrace(straight(30, 40)), plainFrame()))).toEqual([])
    expect(fillsOf(trace(straight(30, 40), 30, 0))).toEqual([])
    expect(textsOf(trace(straight(30, 40), 30, 0))).toEqual([])
  })

  it('keeps the pairs of arrows away from itself', () => {
    const list = trace(straight(90, 60), 90)
    const [, ...arrows] = list.filter((mark) => mark.mark === 'stroke')
    const furthest = Math.max(...arrows.flatMap((mark) => pointsOf(mark)).map(([x]) => x))
    expect(furthest).toBeLessThan(60 - 4.5)
  })
})

/** Whether no point of other ink lies within a numeral's box. */
function isClearOf(numeral: TextMark, list: DisplayList): boolean {
  const [lower, , upper] = textCorners(numeral)
  return inkPoints(list.filter((mark) => mark !== numeral)).every(({ points, halfWidth }) =>
    points.every(
      ([x, y]) =>
        x < lower[0] - halfWidth ||
        x > upper[0] + halfWidth ||
        y < lower[1] - halfWidth ||
        y > upper[1] + halfWidth,
    ),
  )
}
