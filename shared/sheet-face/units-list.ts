import type { UnitProperties } from '../items/legend'
import { groupByAge } from '../legend/group-by-age'
import type { UnitFill } from '../symbols/unit-fill'
import { drawUnitSwatch } from '../symbols/unit-swatch'
import type { Millimetres } from '../units'
import { heightOf, paragraph, space, stack, type Block } from './block'
import { sectionHeading } from './section-heading'
import { place } from './place'
import { SWATCH, type TypeScale } from './type-scale'

/** A unit of the list, and how its areas are filled on the sheet. */
export interface ListedUnit {
  properties: UnitProperties
  fill: UnitFill
}

/** The list of units: swatch with label, name, description. */
export function unitsList(units: readonly ListedUnit[], width: Millimetres, type: TypeScale): Block[] {
  if (units.length === 0) return []
  return [
    ...sectionHeading('Units', width, type),
    ...groupByAge(units).flatMap((group) => [
      ...ageHeading(group.age, width, type),
      ...group.units.flatMap((unit) => [unitRow(unit, width, type), space(1.7 * type.factor)]),
    ]),
  ]
}

function ageHeading(age: string, width: Millimetres, type: TypeScale): Block[] {
  if (age === '') return []
  return [
    { ...space(0.9 * type.factor), staysWithNext: true },
    paragraph(age.toUpperCase(), width, type.age, { staysWithNext: true }),
    { ...space(0.7 * type.factor), staysWithNext: true },
  ]
}

function unitRow({ properties, fill }: ListedUnit, width: Millimetres, type: TypeScale): Block {
  const indent = type.swatch.width + 3 * type.factor
  const words = [
    paragraph(properties.name, width - indent, type.name),
    paragraph(properties.description.trim(), width - indent, type.text),
  ]
  const text = stack(words)
  const height = Math.max(type.swatch.height, heightOf(words))
  return {
    height,
    draw(x, top) {
      const lift = Math.max(0, (type.swatch.height - text.height) / 2)
      return [
        ...place(drawUnitSwatch(properties, fill, SWATCH), x, top - type.swatch.height, type.factor),
        ...text.draw(x + indent, top - lift),
      ]
    },
  }
}
