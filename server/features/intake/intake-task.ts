import { randomUUID } from 'node:crypto'
import type { IntakeColumn, ProposalNote } from '@shared/intake/report'
import type { Mapping } from '@shared/intake/mapping'
import type { IntakePreview } from '@shared/api/intake'
import { applyMapping, countByKind, type Applied } from '@shared/intake/apply'
import { summarizeColumns } from '@shared/intake/columns'
import { positionFault, sheetGround } from '@shared/intake/place'
import { toPreview } from '@shared/intake/preview'
import { proposeMapping } from '@shared/intake/propose'
import { hasLines, hasPoints, type FilePosition, type IntakeRecord } from '@shared/intake/records'
import type { XY } from '@shared/units'
import { readFieldFile } from './readers/read-file'
import type { AsksCrs, FileCrs, FileRead, Unreadable } from './readers/read-outcome'

/** A field file as a task is given it. */
export interface TaskFile {
  bytes: Uint8Array
  name: string
  /** Definition of the system that the file names, once it is known. */
  crs: FileCrs | null
}

/** The sheet that a mapping is applied on. */
export interface TaskSheet {
  crs: { name: string; proj4: string }
  neatline: XY[]
}

/** Work on a whole file: kept off the thread that answers requests. */
export type IntakeTask =
  | { task: 'read'; file: TaskFile }
  | { task: 'preview'; file: TaskFile; mapping: Mapping; sheet: TaskSheet }
  | { task: 'take-in'; file: TaskFile; mapping: Mapping; sheet: TaskSheet }

/** What was read of a file, without its records. */
export interface FileSummary {
  reader: FileRead['reader']
  records: number
  points: number
  lines: number
  others: number
  columns: IntakeColumn[]
  extent: [west: number, south: number, east: number, north: number] | null
  notes: string[]
  proposal: Mapping
  proposalNotes: ProposalNote[]
}

export interface TaskAnswers {
  read: { outcome: 'summary'; summary: FileSummary } | Unreadable | AsksCrs
  preview: { outcome: 'preview'; preview: IntakePreview } | Unreadable | AsksCrs
  'take-in':
    { outcome: 'applied'; applied: Applied; byKind: ReturnType<typeof countByKind> } | Unreadable | AsksCrs
}
export type TaskAnswer<T extends IntakeTask> = TaskAnswers[T['task']]

/** Does one task. Pure but for the ids of the items that it makes. */
export function runTask(task: IntakeTask): TaskAnswers[IntakeTask['task']] {
  const { bytes, name, crs } = task.file
  const read = readFieldFile(bytes, name, crs)
  if (read.outcome !== 'read') return read
  if (task.task === 'read') return { outcome: 'summary', summary: summarize(read) }
  const from = crs ? `EPSG:${crs.srid}, by way of WGS 84,` : undefined
  const ground = sheetGround(task.sheet.crs, task.sheet.neatline, from)
  const applied = applyMapping(read.records, name, { mapping: task.mapping, ground, newId: randomUUID })
  return task.task === 'preview'
    ? { outcome: 'preview', preview: toPreview(applied, ground) }
    : { outcome: 'applied', applied, byKind: countByKind(applied.items) }
}

function summarize({ reader, records, notes }: FileRead): FileSummary {
  const columns = summarizeColumns(records)
  const points = records.filter(hasPoints).length
  const lines = records.filter(hasLines).length
  const others = records.filter((record) => !hasPoints(record) && !hasLines(record)).length
  const { mapping, notes: proposalNotes } = proposeMapping(columns, { points, lines })
  return {
    reader,
    records: records.length,
    points,
    lines,
    others,
    columns,
    ...extentAndNotes(records, notes),
    proposal: mapping,
    proposalNotes,
  }
}

/** Extent of what lies in degrees; positions that do not are counted and said. */
function extentAndNotes(
  records: readonly IntakeRecord[],
  notes: readonly string[],
): Pick<FileSummary, 'extent' | 'notes'> {
  const extent: NonNullable<FileSummary['extent']> = [Infinity, Infinity, -Infinity, -Infinity]
  let faulty = 0
  let example = ''
  for (const position of positionsOf(records)) {
    const fault = positionFault(position)
    if (fault) {
      faulty += 1
      example ||= fault
    } else widen(extent, position)
  }
  const remark = faulty === 0 ? [] : [`${faulty} positions are not in degrees. ${example}`]
  return { extent: Number.isFinite(extent[0]) ? extent : null, notes: [...notes, ...remark] }
}

function* positionsOf(records: readonly IntakeRecord[]): Generator<FilePosition> {
  for (const { parts } of records) {
    for (const part of parts) {
      if (part.form === 'point') yield part.position
      else if (part.form === 'line') yield* part.positions
    }
  }
}

function widen(extent: NonNullable<FileSummary['extent']>, [lon = NaN, lat = NaN]: FilePosition): void {
  extent[0] = Math.min(extent[0], lon)
  extent[1] = Math.min(extent[1], lat)
  extent[2] = Math.max(extent[2], lon)
  extent[3] = Math.max(extent[3], lat)
}
