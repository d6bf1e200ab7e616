import type { XY } from '../units'
import type { Mapping } from './mapping'
import type { IntakeRecord } from './records'
import { fitText, mappedText } from './texts'

/** What every point of a record carries. */
export interface PointBasis {
  point: { id: string; geometry: { type: 'Point'; coordinates: XY } }
  station: string
  note: string
  conversions: string[]
}

/** The basis of a record's point at a place, with the station and note that the mapping names. */
export function pointBasis(record: IntakeRecord, points: Mapping['points'], xy: XY, id: string): PointBasis {
  const station = fitText(mappedText(record, points.stationColumn), 100, 'station')
  const note = fitText(mappedText(record, points.noteColumn), 2000, 'note')
  return {
    point: { id, geometry: { type: 'Point', coordinates: xy } },
    station: station.text,
    note: note.text,
    conversions: [...station.conversions, ...note.conversions],
  }
}
