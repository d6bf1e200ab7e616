import type { Sheet } from '../api/sheets'
import type { SheetFaceProperties } from '../items/legend'
import { rectangle } from './rectangle'
import type { Millimetres } from '../units'
import { paragraph, space, stack, type Block } from './block'
import { CAUTION } from './caution'
import { dayInWords, type EditionStatement } from './edition-statement'
import type { TypeScale } from './type-scale'

/** Projection and datum in words. CRS names read "datum / projection"; a name without the stroke is given whole. */
export function projectionWords(crs: Sheet['crs']): string[] {
  const [datum, projection] = crs.name.split(' / ')
  return [
    ...(projection === undefined
      ? [`Coordinate reference system: ${crs.name} (EPSG:${crs.srid}).`]
      : [`Projection: ${projection}. Datum: ${datum ?? ''} (EPSG:${crs.srid}).`]),
    'Grid ticks: kilometres east and north in this system. Crosses and corner figures: longitude and latitude, WGS 84.',
  ]
}

function headed(heading: string, text: readonly string[], width: Millimetres, type: TypeScale): Block {
  return stack([
    paragraph(heading.toUpperCase(), width, type.age),
    space(0.8 * type.factor),
    ...text
      .filter((line) => line !== '')
      .flatMap((line) => [paragraph(line, width, type.small), space(0.8 * type.factor)]),
  ])
}

export const projectionBlock = (crs: Sheet['crs'], width: Millimetres, type: TypeScale): Block =>
  headed('Projection and grid', projectionWords(crs), width, type)

/** Who made the sheet, who approved it, and what it was made from. */
export function creditsBlock(
  face: Pick<SheetFaceProperties, 'authors' | 'credit'>,
  statement: EditionStatement,
  width: Millimetres,
  type: TypeScale,
): Block {
  const released = statement.released
  return headed(
    'Credits',
    [
      face.authors === '' ? '' : `Geology by ${face.authors.replace(/\.$/, '')}.`,
      face.credit.trim(),
      released
        ? `Approved by ${released.approvedBy}. Released ${dayInWords(released.at)} as edition ${statement.edition}, from revision ${statement.revision}.`
        : `Draft toward edition ${statement.edition}, revision ${statement.revision}. Not reviewed, not released.`,
    ],
    width,
    type,
  )
}

/** The caution in a ruled box. */
export function cautionBox(width: Millimetres, type: TypeScale): Block {
  const inset = 3 * type.factor
  const text = stack([
    paragraph('CAUTION', width - 2 * inset, { ...type.age, ink: 'fold' }),
    space(0.8 * type.factor),
    paragraph(CAUTION, width - 2 * inset, type.small),
  ])
  const height = text.height + 2 * inset
  return {
    height,
    draw: (x, top) => [
      {
        mark: 'stroke',
        path: rectangle(x, top - height, width, height),
        width: 0.2,
        ink: 'frame',
      },
      ...text.draw(x + inset, top - inset),
    ],
  }
}
