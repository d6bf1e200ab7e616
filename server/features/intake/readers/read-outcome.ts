import type { Format } from '@shared/intake/formats'
import type { IntakeRecord } from '@shared/intake/records'

/** What a reader makes of a file: its records in order, or a plain sentence why it cannot. */
export type ReadOutcome = FileRead | Unreadable

export interface FileRead {
  outcome: 'read'
  reader: Format
  records: IntakeRecord[]
  /** What a person should know about how the file was read. */
  notes: string[]
  /** Name of the system that positions were converted from, if they were not in degrees. */
  system?: string
}

export interface Unreadable {
  outcome: 'unreadable'
  reason: string
}

/** The file names a coordinate system whose definition the reader needs before it can go on. */
export interface AsksCrs {
  outcome: 'asks-crs'
  srid: number
}

/** A coordinate system that a file names, with its PROJ definition. */
export interface FileCrs {
  srid: number
  proj4: string
}

export const unreadable = (reason: string): Unreadable => ({ outcome: 'unreadable', reason })
