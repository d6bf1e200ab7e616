import type { Mark } from '../symbols/display-list'
import { mmPerMetreAtScale } from '../symbols/frame'
import type { Metres, Millimetres } from '../units'
import type { Block } from './block'
import { groupThousands, kilometreFigure } from './figures'
import { rectangle } from './rectangle'
import { gridInterval } from './intervals'
import { textLines, type TextStyle } from './text-block'

const BAR_HEIGHT: Millimetres = 1.6
const FIGURE: TextStyle = { size: 2.5, weight: 400, ink: 'frame', leading: 1.2 }
const RATIO: TextStyle = { size: 3.6, weight: 700, ink: 'black', leading: 1.2 }
/** From the top of the ratio to the foot of the words below the bar. */
export const SCALE_BAR_HEIGHT: Millimetres = 13.8
/** From the top of the ratio to the top of the bar. */
const BAR_BELOW: Millimetres = 8.4

/** Share of its room that a bar takes at most: its unit stands beside it. */
const SHARE = 0.85

/** What a scale bar measures: whole units to the right of zero, and one divided unit to its left. */
export interface ScaleBarPlan {
  unit: Metres
  /** Length of one unit on paper: exactly unit × 1000 / scale. */
  unitMm: Millimetres
  units: number
  /** Parts of the divided unit left of zero. */
  parts: number
}

/** Chooses round units, 24–60 mm each, so that the bar fits a width. */
export function planScaleBar(scale: number, width: Millimetres): ScaleBarPlan {
  const mmPerMetre = mmPerMetreAtScale(scale)
  const unit = gridInterval(mmPerMetre, 0)
  const unitMm = unit * mmPerMetre
  const units = Math.max(1, Math.min(4, Math.floor(width / unitMm) - 1))
  const leading = Number(unit.toPrecision(1)) / 10 ** Math.floor(Math.log10(unit))
  return { unit, unitMm, units, parts: leading === 2 ? 4 : leading === 5 ? 5 : 10 }
}

/** Scale as a ratio and as a bar, centred on a width. Lengths are exact grid lengths at the sheet's scale. */
export function scaleBar(scale: number, width: Millimetres): Block {
  const plan = planScaleBar(scale, width * SHARE)
  const length = plan.unitMm * (plan.units + 1)
  return {
    height: SCALE_BAR_HEIGHT,
    draw(x, top) {
      const zero = x + (width - length) / 2 + plan.unitMm
      const bottom = top - BAR_BELOW - BAR_HEIGHT
      return [
        ...textLines([`Scale 1:${groupThousands(scale)}`], { x: x + width / 2, top, align: 'middle' }, RATIO),
        ...barMarks(plan, zero, bottom),
        ...barFigures(plan, zero, bottom + BAR_HEIGHT + 3.4),
        ...textLines(
          [groundWords(scale)],
          { x: x + width / 2, top: bottom - 0.7, align: 'middle' },
          { ...FIGURE, ink: 'quiet' },
        ),
      ]
    },
  }
}

/** What one centimetre of the sheet is on the ground. */
function groundWords(scale: number): string {
  const metres = scale / 100
  const ground =
    metres >= 1000
      ? `${groupThousands(Math.floor(metres / 1000))}${
          metres % 1000 === 0
            ? ''
            : '.' +
              String(metres % 1000)
                .padStart(3, '0')
                .replace(/0+$/, '')
        } kilometres`
      : `${metres} metres`
  return `1 centimetre on the sheet is ${ground} on the ground`
}

function barMarks(plan: ScaleBarPlan, zero: Millimetres, bottom: Millimetres): Mark[] {
  const part = plan.unitMm / plan.parts
  const middle = bottom + BAR_HEIGHT / 2
  const dark = [
    ...Array.from({ length: plan.parts }, (_, index) => index)
      .filter((index) => index % 2 === 0)
      .map((index) => rectangle(zero - (index + 1) * part, bottom, part, BAR_HEIGHT / 2)),
    ...Array.from({ length: plan.parts }, (_, index) => index)
      .filter((index) => index % 2 === 1)
      .map((index) => rectangle(zero - (index + 1) * part, middle, part, BAR_HEIGHT / 2)),
    ...Array.from({ length: plan.units }, (_, index) =>
      rectangle(zero + index * plan.unitMm, index % 2 === 0 ? middle : bottom, plan.unitMm, BAR_HEIGHT / 2),
    ),
  ]
  const whole = rectangle(zero - plan.unitMm, bottom, plan.unitMm * (plan.units + 1), BAR_HEIGHT)
  return [
    ...dark.map((path): Mark => ({ mark: 'fill', path, ink: 'frame' })),
    { mark: 'stroke', path: whole, width: 0.13, ink: 'frame' },
  ]
}

function barFigures(plan: ScaleBarPlan, zero: Millimetres, top: Millimetres): Mark[] {
  const inKilometres = plan.unit >= 1000
  const text = (metres: Metres): string => (inKilometres ? kilometreFigure(metres) : String(metres))
  const last = plan.units * plan.unit
  const at = (x: Millimetres, words: string, align: 'middle' | 'start' = 'middle'): Mark[] =>
    textLines([words], { x, top, align }, FIGURE)
  return [
    ...at(zero - plan.unitMm, text(plan.unit)),
    ...Array.from({ length: plan.units + 1 }, (_, index) =>
      at(zero + index * plan.unitMm, text(index * plan.unit)),
    ).flat(),
    ...at(
      zero + plan.units * plan.unitMm + 1.6 + text(last).length,
      inKilometres ? 'kilometres' : 'metres',
      'start',
    ),
  ]
}
