import type { Application, PartOutcome } from './apply'
import type { Mapping, PointTarget } from './mapping'
import { placePoint } from './place'
import { saysTopsUnknown } from './point-words'
import { readReading, fromStatedNorth } from './readings'
import { attributeText, type FilePosition, type IntakeRecord } from './records'
import { fitText, mappedText } from './texts'
import type { XY } from '../units'

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
  const common = commonOf(record, points, placed.geometry, application.newId())
  const conversions = [...placed.conversions, ...common.conversions]
  if (target.kind === 'attitude') return attitudeItem(record, target, { ...common, conversions }, application)
  const properties = { note: common.note, type: 'station' as const, name: common.station, azimuth: null }
  return { outcome: 'item', item: { kind: 'station', ...common.point, properties }, conversions }
}

interface Common {
  point: { id: string; geometry: { type: 'Point'; coordinates: XY } }
  station: string
  note: string
  conversions: string[]
}

function commonOf(record: IntakeRecord, points: Mapping['points'], xy: XY, id: string): Common {
  const station = fitText(mappedText(record, points.stationColumn), 100, 'station')
  const note = fitText(mappedText(record, points.noteColumn), 2000, 'note')
  return {
    point: { id, geometry: { type: 'Point', coordinates: xy } },
    station: station.text,
    note: note.text,
    conversions: [...station.conversions, ...note.conversions],
  }
}

function attitudeItem(
  record: IntakeRecord,
  target: PointTarget & { kind: 'attitude' },
  { point, station, note, conversions }: Common,
  { mapping, ground }: Application,
): PartOutcome {
  const read = readReading(record, mapping.points)
  if (read.outcome === 'refused') return read
  const overturned = target.overturned || read.overturned
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
    undulating: false,
    topsKnown: false,
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

/** Undefined where the record states no type and the mapping does not say what that means. */
function targetFor(record: IntakeRecord, points: Mapping['points']): PointTarget | undefined {
  if (points.typeColumn === null) return points.otherwise
  const value = attributeText(record, points.typeColumn)
  if (Object.hasOwn(points.types, value)) return points.types[value]
  return value === '' && points.otherwise.kind === 'leave-out' ? undefined : points.otherwise
}
