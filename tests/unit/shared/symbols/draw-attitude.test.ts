import { describe, expect, it } from 'vitest'
import { sheetProjection } from '@shared/geometry/projection'
import { planeTypes } from '@shared/items/points'
import { drawAttitude, attitudeCaseOf, type DrawnPlane } from '@shared/symbols/draw-attitude'
import { drawItem } from '@shared/symbols/draw-item'
import type { DisplayList, StrokeMark, TextMark } from '@shared/symbols/display-list'
import { inkPoints } from '@shared/symbols/place-marks'
import { angleBetween, type MM } from '@shared/units'
import { utmConvergence, utmDefinition } from '../../../reference/geodesy'
import { aDrawnAttitude, plainFrame } from '../../../support/drawn-items'
import { along, closestInk, inkOf, numeralsOf, strokesOf, vectorOf } from '../../../support/drawn-marks'

const everyAzimuth = Array.from({ length: 360 }, (_, azimuth) => azimuth)

const bedding = (properties: Partial<DrawnPlane>): DrawnPlane => ({
  type: 'bedding',
  strike: 45,
  dip: 40,
  overturned: false,
  ...properties,
})

const numeralOf = (list: DisplayList): TextMark | undefined => numeralsOf(list)[0]

/** First and last point of a stroke. */
function endsOf(stroke: StrokeMark | undefined): [MM, MM] {
  const points = stroke ? (inkPoints([stroke])[0]?.points ?? []) : []
  const [first, last] = [points[0], points.at(-1)]
  if (!first || !last) throw new Error('The stroke has no points.')
  return [first, last]
}

/** Azimuth of a vector on the drawing, degrees clockwise from its up. */
const azimuthOf = ([x, y]: MM): number => ((Math.atan2(x, y) * 180) / Math.PI + 360) % 360

describe('a bedding symbol', () => {
  it('runs along strike with its tick down dip, all round the compass', () => {
    for (const strike of everyAzimuth) {
      const [strikeLine, tick] = strokesOf(drawAttitude(bedding({ strike }), [0, 0], 0))
      const [from, to] = endsOf(strikeLine)
      expect(angleBetween(azimuthOf([to[0] - from[0], to[1] - from[1]]), strike)).toBeLessThan(1e-9)
      const [foot, tip] = endsOf(tick)
      expect(Math.hypot(...foot)).toBeLessThan(1e-9)
      // Source: orientation.md section 1, dip direction = strike + 90 by the right-hand rule.
      expect(angleBetween(azimuthOf(tip), strike + 90)).toBeLessThan(1e-9)
    }
  })

  it('has the measured place at the middle of its strike line', () => {
    const [strikeLine] = strokesOf(drawAttitude(bedding({ strike: 77 }), [100, -50], 0))
    const [from, to] = endsOf(strikeLine)
    expect((from[0] + to[0]) / 2).toBeCloseTo(100, 12)
    expect((from[1] + to[1]) / 2).toBeCloseTo(-50, 12)
  })

  it.each(utmConvergence.filter(({ convergence }) => Math.abs(convergence) > 2))(
    'turns by strike minus the convergence that PROJ gives at $lat, $lon',
    ({ zone, east, north, convergence }) => {
      const { convergenceAt } = sheetProjection(utmDefinition(zone))
      for (const strike of [0, 1, 45, 179, 200, 359]) {
        const item = {
          ...aDrawnAttitude({ strike }),
          geometry: { type: 'Point' as const, coordinates: [east, north] as MM },
        }
        const list = drawItem(item, { origin: [east, north], mmPerMetre: 0.04, convergenceAt })
        const [from, to] = endsOf(strokesOf(list)[0])
        const drawn = azimuthOf([to[0] - from[0], to[1] - from[1]])
        // A hundredth of a second of arc, as precise as the projection is tested.
        expect(angleBetween(drawn, strike - convergence)).toBeLessThan(3e-6)
      }
    },
  )

  it('keeps its figure upright, in whole degrees, on the down-dip side', () => {
    for (const strike of everyAzimuth) {
      for (const overturned of [false, true]) {
        const numeral = numeralOf(drawAttitude(bedding({ strike, dip: 62.4, overturned }), [10, 20], 0))
        expect(numeral?.text).toBe('62')
        expect(numeral?.turn ?? 0).toBe(0)
        const at = numeral?.at ?? [0, 0]
        expect(along([at[0] - 10, at[1] - 20], vectorOf(strike + 90))).toBeGreaterThan(1)
      }
    }
  })

  it('keeps its figure off its own ink at every rotation, yet close to it', () => {
    for (const type of planeTypes) {
      for (const overturned of [false, true]) {
        for (const dip of [4, 40, 88]) {
          for (const strike of everyAzimuth) {
            const list = drawAttitude({ type, strike, dip, overturned }, [0, 0], 0)
            const numeral = numeralOf(list)
            if (!numeral) throw new Error('An inclined plane has a figure.')
            expect(closestInk(list, numeral), `${type} ${strike}/${dip}`).toBeGreaterThan(0.25)
            expect(Math.hypot(...numeral.at)).toBeLessThan(4.5)
          }
        }
      }
    }
  })
})

describe('the cases of an attitude', () => {
  it('shows 0 and 90 by symbols of their own, without a figure', () => {
    const horizontal = drawAttitude(bedding({ strike: null, dip: 0 }), [0, 0], 0)
    const vertical = drawAttitude(bedding({ dip: 90 }), [0, 0], 0)
    expect(numeralOf(horizontal)).toBeUndefined()
    expect(numeralOf(vertical)).toBeUndefined()
    expect(horizontal).not.toEqual(vertical)
  })

  it('ticks a vertical bed on both sides', () => {
    const [, ...ticks] = strokesOf(drawAttitude(bedding({ strike: 30, dip: 90 }), [0, 0], 0))
    const sides = ticks.map((tick) => azimuthOf(endsOf(tick)[1]))
    expect(sides.map(Math.round).toSorted((a, b) => a - b)).toEqual([120, 300])
  })

  it('does not turn a horizontal bed with the grid', () => {
    expect(drawAttitude(bedding({ strike: null, dip: 0 }), [0, 0], 2.5)).toEqual(
      drawAttitude(bedding({ strike: null, dip: 0 }), [0, 0], 0),
    )
  })

  it('tells an overturned bed from an upright one by the hook, not by its side', () => {
    for (const strike of everyAzimuth) {
      const downDip = vectorOf(strike + 90)
      const upright = strokesOf(drawAttitude(bedding({ strike }), [0, 0], 0))
      const overturned = strokesOf(drawAttitude(bedding({ strike, overturned: true }), [0, 0], 0))
      expect(overturned[0]).toEqual(upright[0])
      expect(overturned[1]).not.toEqual(upright[1])
      const hook = overturned[1] ? (inkPoints([overturned[1]])[0]?.points ?? []) : []
      const sides = hook.map((point) => along(point, downDip))
      expect(Math.min(...sides)).toBeLessThan(-0.5)
      expect(sides.at(-1)).toBeCloseTo(along(endsOf(upright[1])[1], downDip), 9)
    }
  })

  it('judges by the whole degrees it prints', () => {
    expect(attitudeCaseOf(bedding({ dip: 89.6 }))).toBe('vertical')
    expect(attitudeCaseOf(bedding({ dip: 0.4 }))).toBe('horizontal')
    expect(attitudeCaseOf(bedding({ dip: 89.4 }))).toBe('inclined')
    expect(attitudeCaseOf(bedding({ dip: 70, overturned: true }))).toBe('overturned')
  })
})

describe('a bed that undulates', () => {
  it('has a waving strike line with the same ends and the same mark', () => {
    for (const overturned of [false, true]) {
      for (const strike of everyAzimuth) {
        const straight = drawAttitude(bedding({ strike, overturned }), [0, 0], 0)
        const waving = drawAttitude(bedding({ strike, overturned, undulating: true }), [0, 0], 0)
        const [line, wave] = [strokesOf(straight)[0], strokesOf(waving)[0]]
        expect(inkOf([wave as StrokeMark]).length).toBeGreaterThan(20)
        expect(endsOf(wave).flat()).toEqual(
          endsOf(line)
            .flat()
            .map((value) => expect.closeTo(value, 9)),
        )
        expect(strokesOf(waving).slice(1)).toEqual(strokesOf(straight).slice(1))
      }
    }
  })

  it('is a plain plane where its kind does not undulate', () => {
    expect(drawAttitude(bedding({ type: 'joint', undulating: true }), [0, 0], 0)).toEqual(
      drawAttitude(bedding({ type: 'joint' }), [0, 0], 0),
    )
  })
})

describe('a bed whose tops are known', () => {
  const withTops = (plane: Partial<DrawnPlane>) =>
    drawAttitude(bedding({ ...plane, topsKnown: true }), [0, 0], 0)
  const ballOf = (list: DisplayList): MM => {
    const points = inkOf(list.filter((mark) => mark.mark === 'fill'))
    const once = points.slice(0, -2) // A closed circle comes back to its start twice.
    return [
      once.reduce((sum, [x]) => sum + x, 0) / once.length,
      once.reduce((sum, [, y]) => sum + y, 0) / once.length,
    ]
  }

  it('carries a ball at the end of its mark, down dip, all round the compass', () => {
    for (const strike of everyAzimuth) {
      for (const overturned of [false, true]) {
        const list = withTops({ strike, overturned })
        const [, mark] = strokesOf(list)
        expect(
          Math.hypot(endsOf(mark)[1][0] - ballOf(list)[0], endsOf(mark)[1][1] - ballOf(list)[1]),
        ).toBeLessThan(0.02)
        expect(along(ballOf(list), vectorOf(strike + 90))).toBeGreaterThan(1)
      }
    }
  })

  it('carries it on the side of the top where the bed is vertical', () => {
    for (const strike of everyAzimuth) {
      // Source: orientation.md section 1, facing vector: an upright bed faces down dip, an overturned one the other way.
      const upright = ballOf(withTops({ strike, dip: 90 }))
      const overturned = ballOf(withTops({ strike, dip: 90, overturned: true }))
      expect(along(upright, vectorOf(strike + 90))).toBeCloseTo(1.3, 3)
      expect(along(overturned, vectorOf(strike + 90))).toBeCloseTo(-1.3, 3)
    }
  })
})

describe('a unit label', () => {
  const label = {
    kind: 'unit-label' as const,
    id: '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e02',
    geometry: { type: 'Point' as const, coordinates: [3, 4] as MM },
    properties: { note: '', unit: '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e03', identity: 'certain' as const },
  }
  const unit = {
    label: 'Dr',
    name: 'Rill Sandstone',
    age: '',
    colour: '#cf9d87',
    pattern: 'none' as const,
    description: '',
    rank: 1,
  }
  const textOf = (identity: 'certain' | 'questionable', known = true) =>
    numeralOf(
      drawItem({ ...label, properties: { ...label.properties, identity } }, plainFrame(), {
        unitOf: () => (known ? unit : undefined),
      }),
    )?.text

  it('shows its unit’s letters, queried where they are doubted or missing', () => {
    expect(textOf('certain')).toBe('Dr')
    expect(textOf('questionable')).toBe('Dr?')
    expect(textOf('certain', false)).toBe('?')
  })
})
