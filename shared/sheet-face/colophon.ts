import type { Sheet } from '../api/sheets'
import type { Millimetres } from '../units'
import { paragraph, rule, space, stack, type Block } from './block'
import { citation, type EditionStatement } from './edition-statement'
import { textLines, textWidth, type TextStyle } from './text-block'
import type { TypeScale } from './type-scale'

/** Foot of the margin: how to cite the sheet, and its number large in the corner, where one looks for it in a drawer. */
export function colophon(
  sheet: Pick<Sheet, 'number' | 'title' | 'scale'>,
  authors: string,
  statement: EditionStatement,
  width: Millimetres,
  type: TypeScale,
): Block {
  const numeral: TextStyle = {
    size: 7.5 * Math.min(1.2, type.factor),
    weight: 900,
    ink: 'black',
    leading: 1.1,
  }
  const edition = statement.released ? `edition ${statement.edition}` : 'draft'
  const corner = Math.max(textWidth(sheet.number, numeral), textWidth(edition, type.small))
  const cite = stack([
    paragraph('CITE AS', width, type.age),
    space(0.8 * type.factor),
    paragraph(citation(sheet, authors, statement), width - corner - 8, type.small),
  ])
  const cornerHeight = numeral.size * numeral.leading + type.small.size * type.small.leading
  const body: Block = {
    height: Math.max(cite.height, cornerHeight),
    draw: (x, top) => [
      ...cite.draw(x, top),
      ...textLines([sheet.number], { x: x + width, top, align: 'end' }, numeral),
      ...textLines(
        [edition],
        { x: x + width, top: top - numeral.size * numeral.leading, align: 'end' },
        type.small,
      ),
    ],
  }
  return stack([rule(width, 0.13), space(2.5 * type.factor), body])
}
