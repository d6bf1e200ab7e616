import type { SheetProjection } from '@shared/geometry/projection'
import type { FilePosition, IntakeRecord, RecordPart } from '@shared/intake/records'

/** Records whose positions are in a system, as longitude and latitude (WGS 84); heights stay. */
export function toDegrees(records: readonly IntakeRecord[], projection: SheetProjection): IntakeRecord[] {
  const convert = (position: FilePosition): FilePosition => {
    const [east, north, ...rest] = position
    if (east === undefined || north === undefined) return position
    if (!Number.isFinite(east) || !Number.isFinite(north)) return [NaN, NaN]
    return [...projection.toLonLat([east, north]), ...rest]
  }
  const convertPart = (part: RecordPart): RecordPart => {
    if (part.form === 'point') return { form: 'point', position: convert(part.position) }
    return part.form === 'line' ? { form: 'line', positions: part.positions.map(convert) } : part
  }
  return records.map((record) => ({ ...record, parts: record.parts.map(convertPart) }))
}
