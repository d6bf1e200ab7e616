import { expect, it } from 'vitest'
import { planScaleBar, scaleBar } from '@shared/sheet-face/scale-bar'
import type { Path } from '@shared/symbols/display-list'
import { textsOf } from '../../../support/printed-sheet'

const extent = (path: Path): { left: number; right: number } => {
  const xs = path.flatMap((step) => (step[0] === 'move' || step[0] === 'line' ? [step[1]] : []))
  return { left: Math.min(...xs), right: Math.max(...xs) }
}

it('makes a kilometre 41.667 mm long at 1:24 000', () => {
  // 1 000 000 mm / 24 000; a hundredth of a millimetre is 24 cm on the ground.
  expect(planScaleBar(24_000, 400).unitMm).toBeCloseTo(41.667, 2)
})

it.each([1000, 10_000, 24_000, 25_000, 50_000, 62_500, 100_000, 250_000])(
  'draws figures as far apart as they say at 1:%i',
  (scale) => {
    const marks = scaleBar(scale, 300).draw(0, 0)
    const inKilometres = textsOf(marks).some((text) => text.text === 'kilometres')
    const figures = textsOf(marks)
      .filter((text) => /^[\d.]+$/.test(text.text) && text.align === 'middle')
      .map((text) => ({ metres: Number(text.text) * (inKilometres ? 1000 : 1), x: text.at[0] }))
    const zero = figures.find(({ metres }) => metres === 0)
    expect(figures.length).toBeGreaterThanOrEqual(3)
    for (const { metres, x } of figures) {
      expect(Math.abs(x - (zero?.x ?? 0))).toBeCloseTo((metres * 1000) / scale, 6)
    }
  },
)

it('draws a bar as long as its figures, with the divided unit in equal parts left of zero', () => {
  const plan = planScaleBar(24_000, 300)
  const marks = scaleBar(24_000, 300).draw(0, 0)
  const outline = marks.find((mark) => mark.mark === 'stroke')
  if (outline?.mark !== 'stroke') throw new Error('The bar has an outline.')
  const { left, right } = extent(outline.path)
  expect(right - left).toBeCloseTo(plan.unitMm * (plan.units + 1), 9)
  const widths = marks.flatMap((mark) => (mark.mark === 'fill' ? [extent(mark.path)] : []))
  const parts = widths
    .filter((box) => box.left < left + plan.unitMm - 1e-9)
    .map((box) => box.right - box.left)
  expect(parts).toHaveLength(plan.parts)
  for (const part of parts) expect(part).toBeCloseTo(plan.unitMm / plan.parts, 9)
})

it('stays within the width that it is given', () => {
  for (const width of [90, 120, 200, 420]) {
    const plan = planScaleBar(24_000, width)
    expect(plan.unitMm * (plan.units + 1)).toBeLessThanOrEqual(width)
  }
})
