import { stack, type Block } from '../sheet-face/block'
import { textLines, textWidth, type TextStyle } from '../sheet-face/text-block'
import type { Millimetres, MM } from '../units'
import { enlarge } from './enlarge'
import type { Printing } from '../symbols/unit-fill'
import { caseIn, type SpecimenCase } from './entry'

/** One way in which the whole set is printed. */
export interface SpecimenSetting {
  percent: 100 | 400
  printing: Printing
}

const BETWEEN: Millimetres = 5
const BELOW: Millimetres = 3.2
const CAPTION: TextStyle = { size: 2.3, weight: 400, ink: 'quiet', leading: 1.25 }

/** Cases side by side, each with its caption below, in as many rows as a width asks for. */
export function caseRows(
  cases: readonly SpecimenCase[],
  setting: SpecimenSetting,
  width: Millimetres,
): Block[] {
  const rows: SpecimenCase[][] = []
  let left = -1
  for (const each of cases) {
    const taken = cellWidth(each, setting) + BETWEEN
    if (left < taken - BETWEEN) {
      rows.push([])
      left = width
    }
    rows.at(-1)?.push(each)
    left -= taken
  }
  return rows.map((row) => caseRow(row, setting))
}

/** Cases of one symbol are set in a grid: cells as wide as the drawing or its caption. */
const cellWidth = ({ box, caption }: SpecimenCase, { percent }: SpecimenSetting): Millimetres =>
  Math.max((box.width * percent) / 100, textWidth(caption, CAPTION))

/** Drawings of a row are level: their lines and places stand on one height. */
function caseRow(row: readonly SpecimenCase[], setting: SpecimenSetting): Block {
  const factor = setting.percent / 100
  const up = Math.max(...row.map(({ box }) => box.y + box.height)) * factor
  const down = Math.min(...row.map(({ box }) => box.y)) * factor
  const caption = CAPTION.size * CAPTION.leading
  return {
    height: up - down + caption + BELOW,
    draw(x, top) {
      let at = x
      return row.flatMap((each) => {
        const place: MM = [at - each.box.x * factor, top - up]
        const marks = enlarge(caseIn(each, setting.printing), factor, place)
        const words = textLines([each.caption], { x: at, top: top - up + down }, CAPTION)
        at += cellWidth(each, setting) + BETWEEN
        return [...marks, ...words]
      })
    },
  }
}

/** Width of cases set in one row. */
export const rowWidth = (cases: readonly SpecimenCase[], setting: SpecimenSetting): Millimetres =>
  cases.reduce((sum, each) => sum + cellWidth(each, setting), 0) + BETWEEN * (cases.length - 1)

/** Rows as one block that is not broken. */
export const wholeRows = (
  cases: readonly SpecimenCase[],
  setting: SpecimenSetting,
  width: Millimetres,
): Block => stack(caseRows(cases, setting, width))
