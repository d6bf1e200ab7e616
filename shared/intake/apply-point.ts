import { parseAzimuth } from '../structure/azimuth-text'
import { placeSymbolOf } from '../symbols/draw-place'
import type { Application, PartOutcome } from './apply'
import type { Mapping, PointTarget } from './mapping'
import { lineationItem } from './apply-lineation'
import { placePoint } from './place'
import { pointBasis, type PointBasis } from './point-basis'
import { saysTopsUnknown } from './point-words'
import { readReading, fromStatedNorth } from './readings'
import { attributeText, type FilePosition, type IntakeRecord } from './records'
import { mappedText } from './texts'

/** What a point of a record becomes. */
export function pointItem(
  record: IntakeRecord,
  position: FilePosition,
  application: Application,
): PartOutcome {
  const { points } = application.mapping
  const target = targetFor(record, points)
  if (target === undefined) {
    const reason = 'The record does not say what the point is.'
    return { outcome: 'refused', field: points.typeColumn ?? 'type', value: '', reason }
  }
  if (target.kind === 'leave-out') return { outcome: 'left-out' }
  const placed = placePoint(position, application.ground)
  if (placed.outcome === 'misplaced') return { ...placed, outcome: 'refused', field: 'geometry' }
  const common = pointBasis(record, points, placed.geometry, application.newId())
  const conversions = [...placed.conversions, ...common.conversions]
  switch (target.kind) {
    case 'attitude':
      return attitudeItem(record, target, { ...common, conversions }, application)
    case 'lineation':
      return lineationItem(record, target, { ...common, conversions }, application)
    case 'station':
      return placeItem(record, target, { ...common, conversions }, application)
  }
}

function attitudeItem(
  record: IntakeRecord,
  target: PointTarget & { kind: 'attitude' },
  { point, station, note, conversions }: PointBasis,
  { mapping, ground }: Application,
): PartOutcome {
  const read = readReading(record, mapping.points)
  if (read.outcome === 'refused') return read
  const column = mapping.points.overturnedColumn
  const stated = mappedText(record, column)
  const isStated = readYesOrNo(stated)
  if (column !== null && isStated === undefined) {
    const reason = 'This does not say whether the bed is overturned: yes or no is understood.'
    return { outcome: 'refused', field: column, value: stated, reason }
  }
  const overturned = target.overturned || read.overturned || isStated === true
  if (overturned && read.strike === null) {
    return {
      outcome: 'refused',
      field: 'reading',
      value: read.text,
      reason: 'A horizontal plane cannot be overturned.',
    }
  }
  const turned =
    read.strike === null
      ? null
      : fromStatedNorth(read.strike, mapping, () =>
          ground.projection.convergenceAt(point.geometry.coordinates),
        )
  const typeText = mappedText(record, mapping.points.typeColumn)
  const tops = saysTopsUnknown(typeText) ? ['tops unknown in the file: drawn as not overturned'] : []
  const properties = {
    note,
    type: target.type,
    strike: turned?.azimuth ?? null,
    dip: read.dip,
    overturned,
    undulating: target.undulating,
    topsKnown: target.topsKnown,
    station,
    reading: {
      text: read.text.slice(0, 200),
      convention: read.convention,
      northReference: mapping.northReference,
      declination: mapping.northReference === 'magnetic' ? mapping.declination : null,
    },
  }
  return {
    outcome: 'item',
    item: { kind: 'attitude', ...point, properties },
    conversions: [...conversions, ...read.conversions, ...(turned?.conversions ?? []), ...tops],
  }
}

/** Source: common practice of tables and forms. */
function readYesOrNo(text: string): boolean | undefined {
  if (/^(yes|y|true|t|1|overturned|inverted)$/i.test(text)) return true
  return /^(no|n|false|f|0|normal|upright|)$/i.test(text) ? false : undefined
}

function placeItem(
  record: IntakeRecord,
  { type }: PointTarget & { kind: 'station' },
  { point, station, note, conversions }: PointBasis,
  { mapping, ground }: Application,
): PartOutcome {
  const { trendColumn } = mapping.points
  const text = placeSymbolOf(type).azimuth === undefined ? '' : mappedText(record, trendColumn)
  const place = { kind: 'station' as const, ...point }
  if (trendColumn === null || text === '') {
    const properties = { note, type, name: station, azimuth: null }
    return { outcome: 'item', item: { ...place, properties }, conversions }
  }
  const read = parseAzimuth(text)
  if (read.outcome === 'refused') {
    return { outcome: 'refused', field: trendColumn, value: text, reason: read.reason }
  }
  const turned = fromStatedNorth(read.azimuth, mapping, () =>
    ground.projection.convergenceAt(point.geometry.coordinates),
  )
  const properties = { note, type, name: station, azimuth: turned.azimuth }
  return {
    outcome: 'item',
    item: { ...place, properties },
    conversions: [...conversions, ...turned.conversions],
  }
}

/** Undefined where the record states no type and the mapping does not say what that means. */
function targetFor(record: IntakeRecord, points: Mapping['points']): PointTarget | undefined {
  if (points.typeColumn === null) return points.otherwise
  const value = attributeText(record, points.typeColumn)
  if (Object.hasOwn(points.types, value)) return points.types[value]
  return value === '' && points.otherwise.kind === 'leave-out' ? undefined : points.otherwise
}
