import { randomUUID } from 'node:crypto'
import type { IntakeColumn, ProposalNote } from '@shared/intake/report'
import type { Mapping } from '@shared/intake/mapping'
import type { IntakePreview } from '@shared/api/intake'
import { applyMapping, countByKind, type Applied } from '@shared/intake/apply'
import { summarizeColumns } from '@shared/intake/columns'
import { sheetGround } from '@shared/intake/place'
import { toPreview } from '@shared/intake/preview'
import { proposeMapping } from '@shared/intake/propose'
import { hasLines, hasPoints } from '@shared/intake/records'
import type { XY } from '@shared/units'
import { readFieldFile } from './readers/read-file'
import { findPlaces, type Places } from './places'
import {
  unreadable,
  type AsksCrs,
  type FileCrs,
  type FileRead,
  type Unreadable,
} from './readers/read-outcome'

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
  extent: Places['extent']
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
  if (task.task === 'read') return readOf(read)
  const from = read.system === undefined ? undefined : `${read.system}, by way of WGS 84,`
  const ground = sheetGround(task.sheet.crs, task.sheet.neatline, from)
  const applied = applyMapping(read.records, name, { mapping: task.mapping, ground, newId: randomUUID })
  return task.task === 'preview'
    ? { outcome: 'preview', preview: toPreview(applied, ground) }
    : { outcome: 'applied', applied, byKind: countByKind(applied.items) }
}

/** A file whose every position is impossible is in another system, or broken: nothing could ever be taken in. */
function readOf(read: FileRead): TaskAnswers['read'] {
  const places = findPlaces(read.records)
  if (places.extent === null && places.faulty > 0) {
    return unreadable(`No position in it is a longitude and latitude in degrees. ${places.example}`)
  }
  return { outcome: 'summary', summary: summarize(read, places) }
}

function summarize({ reader, records, notes }: FileRead, places: Places): FileSummary {
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
    extent: places.extent,
    notes: [...notes, ...placeNotes(places)],
    proposal: mapping,
    proposalNotes,
  }
}

function placeNotes({ faulty, example }: Places): string[] {
  if (faulty === 0) return []
  return [`${faulty} ${faulty === 1 ? 'position is' : 'positions are'} not in degrees. ${example}`]
}
