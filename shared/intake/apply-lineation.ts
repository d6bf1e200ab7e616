import { lineFromFields, lineOf, parseLineation, type LineationReading } from '../structure/lineation-text'
import type { Application, PartOutcome } from './apply'
import type { Mapping, PointTarget } from './mapping'
import { parseNumber } from './numbers'
import type { PointBasis } from './point-basis'
import { fromStatedNorth } from './readings'
import { attributeText, type IntakeRecord } from './records'

interface StatedLine {
  reading: LineationReading
  text: string
  field: string
}

/** What a point of a record becomes as a lineation: trend and plunge in two columns, or both in one text. */
export function lineationItem(
  record: IntakeRecord,
  { type }: PointTarget & { kind: 'lineation' },
  { point, station, note, conversions }: PointBasis,
  { mapping, ground }: Application,
): PartOutcome {
  const { reading, text, field } = statedLine(record, mapping.points)
  // A rake alone is refused: the file's plane columns are of attitudes, not of the plane it was measured on.
  const line = lineOf(reading, null)
  if (line.outcome === 'refused') return { outcome: 'refused', field, value: text, reason: line.reason }
  const turned =
    line.trend === null
      ? { azimuth: null, conversions: [] }
      : fromStatedNorth(line.trend, mapping, () =>
          ground.projection.convergenceAt(point.geometry.coordinates),
        )
  const properties = {
    note,
    type,
    trend: turned.azimuth,
    plunge: line.plunge,
    plane: null,
    station,
    reading: {
      text: text.slice(0, 200),
      convention: 'trend-plunge' as const,
      northReference: mapping.northReference,
      declination: mapping.northReference === 'magnetic' ? mapping.declination : null,
    },
  }
  const item = { kind: 'lineation' as const, ...point, properties }
  return { outcome: 'item', item, conversions: [...conversions, ...turned.conversions] }
}

function statedLine(record: IntakeRecord, points: Mapping['points']): StatedLine {
  const { readingColumn, trendColumn, plungeColumn } = points
  if (trendColumn !== null && plungeColumn !== null) {
    return statedInTwo(attributeText(record, trendColumn), attributeText(record, plungeColumn), {
      trendColumn,
      plungeColumn,
    })
  }
  if (readingColumn === null) {
    const reason = 'No columns are chosen for trend and plunge.'
    return { reading: { outcome: 'refused', reason }, text: '', field: 'reading' }
  }
  const text = attributeText(record, readingColumn)
  return { reading: parseLineation(text), text, field: readingColumn }
}

function statedInTwo(
  trendText: string,
  plungeText: string,
  { trendColumn, plungeColumn }: { trendColumn: string; plungeColumn: string },
): StatedLine {
  const text = `${trendText}/${plungeText}`
  // A trend in letters, S60E, is read as it would be in one text.
  if (/[a-z]/i.test(trendText)) return { reading: parseLineation(text), text, field: trendColumn }
  const plunge = plungeText === '' ? null : (parseNumber(plungeText) ?? NaN)
  const trend = trendText === '' ? null : (parseNumber(trendText) ?? NaN)
  const isTrendAtFault = plunge !== null && plunge >= 0 && plunge <= 90
  return {
    reading: lineFromFields({ trend, plunge }),
    text,
    field: isTrendAtFault ? trendColumn : plungeColumn,
  }
}
