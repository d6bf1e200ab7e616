import type { Sheet } from '../api/sheets'
import type { Millimetres } from '../units'
import { paragraph, rule, space, stack, type Block } from './block'
import { editionLine, type EditionStatement } from './edition-statement'
import { groupThousands } from './figures'
import type { TextStyle } from './text-block'
import type { TypeScale } from './type-scale'

/** A wide margin carries a large title, as on a wall map; small type beside it asks for a smaller one. */
const titleStyle = (width: Millimetres, type: TypeScale): TextStyle => ({
  size: Math.min(13, Math.max(6.4, width / 28)) * Math.min(1, type.factor),
  weight: 900,
  ink: 'black',
  leading: 1.14,
})

/** Title, authors, scale, and which edition and revision this is. */
export function titleBlock(
  sheet: Pick<Sheet, 'number' | 'title' | 'scale'>,
  authors: string,
  statement: EditionStatement,
  width: Millimetres,
  type: TypeScale,
): Block {
  const gap = type.factor
  return stack([
    paragraph(`Geologic map of\n${sheet.title}`, width, titleStyle(width, type)),
    space(2.4 * gap),
    ...(authors === ''
      ? []
      : [
          paragraph(authors, width, { ...type.subtitle, weight: 700, ink: 'black', size: 3.4 * gap }),
          space(1.2 * gap),
        ]),
    paragraph(editionLine(sheet.number, statement), width, type.subtitle),
    paragraph(`Scale 1:${groupThousands(sheet.scale)}`, width, type.subtitle),
    space(4 * gap),
    rule(width, 0.35),
  ])
}
