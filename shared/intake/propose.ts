import type { Mapping } from './mapping'
import { proposeLines } from './propose-lines'
import { proposeNorth } from './propose-north'
import { proposePoints } from './propose-points'
import type { IntakeColumn, ProposalNote } from './report'

export interface Proposal {
  mapping: Mapping
  notes: ProposalNote[]
}

/** How many records of a file have points and how many have lines. */
export interface FormCounts {
  points: number
  lines: number
}

/** A mapping proposed from the names and values of a file's columns, with the reason for each choice. What is not
 *  understood is proposed to be left out and pointed out; an azimuth column that may be read in two ways is asked. */
export function proposeMapping(columns: readonly IntakeColumn[], counts: FormCounts): Proposal {
  const points = proposePoints(columns, counts.points)
  const lines = proposeLines(columns, counts.lines)
  const notes = [...points.notes, ...lines.notes]
  const azimuths =
    points.proposed.azimuthColumn ??
    points.proposed.readingColumn ??
    points.proposed.trendColumn ??
    lines.proposed.trendColumn
  const { north, note } = proposeNorth(columns)
  const counted = azimuths === null ? { northReference: 'true' as const, declination: null } : north
  if (azimuths !== null) notes.push(note)
  return { mapping: { ...counted, lines: lines.proposed, points: points.proposed }, notes }
}
