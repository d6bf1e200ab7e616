import type { LocationConfidence } from '../items/confidence'
import type { Item } from '../items/item'
import { isSidedFold, type Side } from '../items/lines'
import type { Application, PartOutcome } from './apply'
import type { LineTarget, Mapping } from './mapping'
import { parseNumber } from './numbers'
import { placeLine } from './place'
import { fromStatedNorth } from './readings'
import { attributeText, type FilePosition, type IntakeRecord } from './records'
import { faultSideMeaning } from './sides'
import { fitText, mappedText } from './texts'

/** What a line of a record becomes. */
export function lineItem(
  record: IntakeRecord,
  positions: readonly FilePosition[],
  { mapping, ground, newId }: Application,
): PartOutcome {
  const { lines } = mapping
  const target = targetFor(record, lines)
  if (target === undefined) return missingType(lines)
  if (target.kind === 'leave-out') return { outcome: 'left-out' }
  const placed = placeLine(positions, ground)
  if (placed.outcome === 'misplaced') return { ...placed, outcome: 'refused', field: 'geometry' }
  const confidence = confidenceOf(record, lines)
  if (typeof confidence !== 'string') return confidence
  const name = fitText(mappedText(record, lines.nameColumn), 200, 'name')
  const remark = fitText(mappedText(record, lines.noteColumn), 2000, 'note')
  const basis = {
    locationConfidence: confidence,
    identity: 'certain' as const,
    name: name.text,
    note: remark.text,
  }
  const line = { id: newId(), geometry: { type: 'LineString' as const, coordinates: placed.geometry } }
  const conversions = [...placed.conversions, ...name.conversions, ...remark.conversions]

  switch (target.kind) {
    case 'contact':
      return { outcome: 'item', item: { kind: 'contact', ...line, properties: basis }, conversions }
    case 'other-line':
      return {
        outcome: 'item',
        item: { kind: 'other-line', ...line, properties: { ...basis, type: target.type } },
        conversions,
      }
    case 'fault': {
      const properties = { ...basis, type: target.type, side: lines.faultSide, dip: null }
      return {
        outcome: 'item',
        item: { kind: 'fault', ...line, properties },
        conversions: [...conversions, ...sideWords(faultSideMeaning(target.type), lines.faultSide)],
      }
    }
    case 'axial-trace': {
      const axis = axisOf(record, mapping, () =>
        ground.projection.convergenceAt(placed.geometry[0] ?? [0, 0]),
      )
      if (axis.outcome === 'refused') return axis
      const properties = {
        ...basis,
        form: target.form,
        side: lines.foldSide,
        plunge: axis.plunge,
        trend: axis.trend,
        doubly: 'no' as const,
        otherPlunge: null,
      }
      const item: Item = { kind: 'axial-trace', ...line, properties }
      const side = isSidedFold(target.form) ? sideWords('dip of its limbs', lines.foldSide) : []
      return { outcome: 'item', item, conversions: [...conversions, ...axis.conversions, ...side] }
    }
  }
}

/** Undefined where the record states no type and the mapping does not say what that means. */
function targetFor(record: IntakeRecord, lines: Mapping['lines']): LineTarget | undefined {
  if (lines.typeColumn === null) return lines.otherwise
  const value = attributeText(record, lines.typeColumn)
  if (Object.hasOwn(lines.types, value)) return lines.types[value]
  return value === '' && lines.otherwise.kind === 'leave-out' ? undefined : lines.otherwise
}

const missingType = (lines: Mapping['lines']): PartOutcome => ({
  outcome: 'refused',
  field: lines.typeColumn ?? 'type',
  value: '',
  reason: 'The record does not say what the line is.',
})

function confidenceOf(record: IntakeRecord, lines: Mapping['lines']): LocationConfidence | PartOutcome {
  const { confidenceColumn } = lines
  const value = mappedText(record, confidenceColumn)
  if (confidenceColumn === null || value === '') return lines.confidenceOtherwise
  const known = Object.hasOwn(lines.confidences, value) ? lines.confidences[value] : undefined
  const reason = 'This location confidence is not known: say in the mapping what it means.'
  return known ?? { outcome: 'refused', field: confidenceColumn, value, reason }
}

/** A line whose symbol has a side states where the side came from: a person said so, the file did not. */
const sideWords = (meaning: string | undefined, side: Side): string[] =>
  meaning ? [`${meaning} on the ${side} of the line as drawn: stated at intake`] : []

type Axis =
  | { outcome: 'axis'; plunge: number | null; trend: number | null; conversions: string[] }
  | (PartOutcome & { outcome: 'refused' })

function axisOf(record: IntakeRecord, mapping: Mapping, convergence: () => number): Axis {
  const { plungeColumn, trendColumn } = mapping.lines
  const none: Axis = { outcome: 'axis', plunge: null, trend: null, conversions: [] }
  if (plungeColumn === null || trendColumn === null) return none
  const plungeText = attributeText(record, plungeColumn)
  const trendText = attributeText(record, trendColumn)
  if (plungeText === '' && trendText === '') return none
  const plunge = parseNumber(plungeText)
  const trend = parseNumber(trendText)
  if (plunge === undefined || plunge < 0 || plunge > 90) {
    return {
      outcome: 'refused',
      field: plungeColumn,
      value: plungeText,
      reason: 'A plunge is a number between 0° and 90°, stated with a trend.',
    }
  }
  if (trend === undefined || trend < 0 || trend > 360) {
    return {
      outcome: 'refused',
      field: trendColumn,
      value: trendText,
      reason: 'A trend is a number between 0° and 360°, stated with a plunge.',
    }
  }
  const turned = fromStatedNorth(trend, mapping, convergence)
  return { outcome: 'axis', plunge, trend: turned.azimuth, conversions: turned.conversions }
}
