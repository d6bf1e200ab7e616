import { describe, expect, it } from 'vitest'
import { toRadians, type XY } from '@shared/units'
import { merrowTruth } from '../../../../../server/demo/merrow-island'
import type { SpaceField } from '../../../../../server/demo/truth/fold-belt'
import { rockAt } from '../../../../../server/demo/truth/truth'

const { island, ground } = merrowTruth

/** Derivative by central differences at three steps, extrapolated to none: independent of the field's own formula, good to
 *  the sixth power of the step. Source: Richardson 1911; the weights for steps h, h/2, h/4 by elimination of h² and h⁴. */
function extrapolated(value: (step: number) => number): number {
  const difference = (step: number) => (value(step) - value(-step)) / (2 * step)
  const [coarse, middle, fine] = [difference(4), difference(2), difference(1)]
  const [first, second] = [(4 * middle - coarse) / 3, (4 * fine - middle) / 3]
  return (16 * second - first) / 15
}

/** Places all over the island and beneath it, by a sequence that fills space evenly (Halton 1960). */
const places = Array.from({ length: 60 }, (_, index) => {
  const part = (base: number) => {
    let [left, share, sum] = [index + 1, 1, 0]
    while (left > 0) {
      share /= base
      sum += share * (left % base)
      left = Math.floor(left / base)
    }
    return sum
  }
  return { xy: [-10_000 + 20_000 * part(2), -11_000 + 22_000 * part(3)] as XY, z: -300 + 900 * part(5) }
})

const fields: Record<string, SpaceField> = {
  'the fault': island.fault,
  ...Object.fromEntries(
    (['west', 'east'] as const).flatMap((side) => [
      [`the thrust, ${side}`, island.thrust(side)],
      ...(['lower', 'upper', 'younger'] as const).map((series) => [
        `height, ${series}, ${side}`,
        island.height(series, side),
      ]),
      ...(['lower', 'upper'] as const).map((series) => [
        `across, ${series}, ${side}`,
        island.belt(series, side).across,
      ]),
    ]),
  ),
  ...Object.fromEntries(island.dikes.map(({ name, surface }) => [name, surface])),
}

describe('fields of the truth', () => {
  it.each(Object.entries(fields))('%s: the gradient is the derivative of the value', (_, field) => {
    for (const { xy, z } of places) {
      const [x, y] = xy
      const numeric = [
        extrapolated((step) => field.value([x + step, y], z)),
        extrapolated((step) => field.value([x, y + step], z)),
        extrapolated((step) => field.value(xy, z + step)),
      ]
      // Values reach thousands of metres: sixteen digits less the division by the step leave some 1e-9.
      field.gradient(xy, z).forEach((part, axis) => expect(part).toBeCloseTo(numeric[axis] ?? NaN, 7))
    }
  })

  it('jump across the fault by its throw: the hanging wall is the footwall, moved down the dip of the fault', () => {
    for (const { xy, z } of places) {
      const [x, y] = xy
      // Down the dip of the fault by its displacement: the same layer is met again.
      const heave = 330 / Math.tan((68 * Math.PI) / 180)
      const strike = (-14 * Math.PI) / 180
      const moved: XY = [x + heave * Math.cos(strike), y - heave * Math.sin(strike)]
      expect(island.height('upper', 'east').value(moved, z - 330)).toBeCloseTo(
        island.height('upper', 'west').value(xy, z),
        6,
      )
    }
  })

  it('put older rock on the thrust than beneath it, nearly everywhere along its trace on the ground', () => {
    let [older, all] = [0, 0]
    for (let x = 0; x < 6000; x += 200) {
      for (let y = 0; y < 11_000; y += 50) {
        const at: XY = [x, y]
        const [here, beside] = [
          island.thrust('west').value(at, ground(at)),
          island.thrust('west').value([x + 50, y], ground([x + 50, y])),
        ]
        if (here > 0 || beside < 0) continue
        all += 1
        const below = island.height('lower', 'west').value(at, ground(at))
        const above = island.height('upper', 'west').value(at, ground(at))
        if (above < below) older += 1
      }
    }
    expect(all).toBeGreaterThan(30)
    expect(older / all).toBeGreaterThan(0.85)
  })

  it('lay the younger beds on the folds wherever their height is positive, and nowhere else', () => {
    for (const { xy, z } of places) {
      const { series, side, field, layer } = rockAt(merrowTruth, xy, z)
      const above = island.height('younger', side).value(xy, z)
      expect(series === 'younger').toBe(above > 0)
      expect(field.value(xy, z)).toBeLessThanOrEqual(layer.top)
    }
  })
})

describe('thickness', () => {
  /** The place on the ground where a field has a value, met in a direction from a start. */
  function meet(field: SpaceField, value: number, start: XY, [east, north]: XY): XY {
    const at = (far: number): XY => [start[0] + east * far, start[1] + north * far]
    const beyond = (far: number) => field.value(at(far), ground(at(far))) - value
    let [low, high] = [0, 0]
    while (beyond(low) > 0 === beyond(high) > 0 && high < 2000) high += 5
    for (let round = 0; round < 60; round++) {
      const middle = (low + high) / 2
      if (beyond(middle) > 0 === beyond(high) > 0) high = middle
      else low = middle
    }
    return at(high)
  }

  it('across the outcrop by the trade’s formula is the difference of height over its gradient, where the layer is planar', () => {
    /** Thin enough for any layer to be planar across it: folds bend over hundreds of metres. */
    const thickness = 4
    let tested = 0
    for (const { xy } of places) {
      const { field } = rockAt(merrowTruth, xy)
      const gradient = field.gradient(xy, ground(xy))
      const [east, north, up] = gradient
      const level = Math.hypot(east, north)
      const downDip: XY = [(east / level) * Math.sign(up), (north / level) * Math.sign(up)]
      const there = meet(
        field,
        field.value(xy, ground(xy)) + thickness * Math.hypot(...gradient),
        xy,
        downDip,
      )
      const far = Math.hypot(there[0] - xy[0], there[1] - xy[1])
      const dip = Math.atan2(level, Math.abs(up))
      const fall = Math.atan2(ground(xy) - ground(there), far)
      // Where ground and layer are nearly parallel the outcrop is wide and the formula says little.
      if (Math.abs(dip - fall) < toRadians(15) || far > 60) continue
      const slopeDistance = Math.hypot(far, ground(there) - ground(xy))
      // Ground that falls toward the dip side: t = w sin(δ − σ). Source: map-computation.md section 2.
      const found = slopeDistance * Math.abs(Math.sin(dip - fall))
      expect(Math.abs(found - thickness) / thickness).toBeLessThan(0.03)
      tested += 1
    }
    expect(tested).toBeGreaterThan(20)
  })
})
