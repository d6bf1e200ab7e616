import type { Item, ItemKind } from '../items/item'
import { itemSchema } from '../items/item'
import type { Provenance } from '../api/ledger'
import { lineItem } from './apply-line'
import { pointItem } from './apply-point'
import type { Mapping } from './mapping'
import type { SheetGround } from './place'
import type { IntakeRecord, RecordPart } from './records'
import type { Refusal } from './report'

/** What one part of a record becomes. */
export type PartOutcome =
  | { outcome: 'item'; item: Item; conversions: string[] }
  | { outcome: 'refused'; field: string; value: string; reason: string; outside?: boolean }
  | { outcome: 'left-out' }

export interface TakenItem {
  item: Item
  provenance: Provenance
}

export interface Applied {
  items: TakenItem[]
  refusals: Refusal[]
  /** Of the refusals, those outside the neatline. */
  outside: number
  /** Parts left out as the mapping says. */
  leftOut: number
}

/** What the parts of a record are judged with. */
export interface Application {
  mapping: Mapping
  ground: SheetGround
  newId: () => string
}

/** What a mapping makes of a file's records on a sheet: items with their provenance, or the reason why not. Every part of
 *  every record ends in exactly one of items, refusals and left out. */
export function applyMapping(
  records: readonly IntakeRecord[],
  file: string,
  application: Application,
): Applied {
  const applied: Applied = { items: [], refusals: [], outside: 0, leftOut: 0 }
  for (const record of records) {
    if (record.parts.length === 0) {
      applied.refusals.push({
        record: record.number,
        field: 'geometry',
        value: '',
        reason: 'The record has no geometry.',
      })
    }
    record.parts.forEach((part, index) => {
      const outcome = checked(applyPart(record, part, application))
      note(applied, record, { outcome, index, file })
    })
  }
  return applied
}

/** Number of accepted items by kind, in the order of the kinds' first appearance. */
export function countByKind(items: readonly TakenItem[]): { kind: ItemKind; items: number }[] {
  const counts = new Map<ItemKind, number>()
  for (const { item } of items) counts.set(item.kind, (counts.get(item.kind) ?? 0) + 1)
  return [...counts].map(([kind, count]) => ({ kind, items: count }))
}

function applyPart(record: IntakeRecord, part: RecordPart, application: Application): PartOutcome {
  switch (part.form) {
    case 'point':
      return pointItem(record, part.position, application)
    case 'line':
      return lineItem(record, part.positions, application)
    case 'area':
      return {
        outcome: 'refused',
        field: 'geometry',
        value: 'polygon',
        reason: 'Polygons are not taken in: a sheet’s areas follow from its lines.',
      }
    case 'unreadable':
      return { outcome: 'refused', field: 'geometry', value: '', reason: part.reason }
  }
}

/** The item's own schema has the last word, so that nothing enters by intake that could not be drawn by hand. */
function checked(outcome: PartOutcome): PartOutcome {
  if (outcome.outcome !== 'item') return outcome
  const parsed = itemSchema.safeParse(outcome.item)
  if (parsed.success) return { ...outcome, item: parsed.data }
  const issue = parsed.error.issues[0]
  return {
    outcome: 'refused',
    field: issue?.path.join('.') ?? '',
    value: '',
    reason: issue?.message ?? 'The record does not fit.',
  }
}

function note(
  applied: Applied,
  record: IntakeRecord,
  { outcome, index, file }: { outcome: PartOutcome; index: number; file: string },
): void {
  const several = record.parts.length > 1
  if (outcome.outcome === 'left-out') {
    applied.leftOut += 1
  } else if (outcome.outcome === 'item') {
    const part = several
      ? [`part ${index + 1} of ${record.parts.length} of a record with several geometries`]
      : []
    const conversions = [...part, ...outcome.conversions]
    const provenance = { file, record: record.number, attributes: { ...record.attributes }, conversions }
    applied.items.push({ item: outcome.item, provenance })
  } else {
    const reason = several ? `Part ${index + 1} of ${record.parts.length}: ${outcome.reason}` : outcome.reason
    const value = outcome.value.slice(0, 200)
    applied.refusals.push({ record: record.number, field: outcome.field, value, reason })
    if (outcome.outside) applied.outside += 1
  }
}
