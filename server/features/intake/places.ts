import { positionFault } from '@shared/intake/place'
import type { FilePosition, IntakeRecord } from '@shared/intake/records'

/** Where a file's records lie. */
export interface Places {
  /** Of the positions that lie in degrees, WGS 84; null where none does. */
  extent: [west: number, south: number, east: number, north: number] | null
  /** Positions that are no longitude and latitude. */
  faulty: number
  /** What is wrong with the first of them, as a sentence; '' where none is. */
  example: string
}

/** Looks at every position of a file. */
export function findPlaces(records: readonly IntakeRecord[]): Places {
  const extent: NonNullable<Places['extent']> = [Infinity, Infinity, -Infinity, -Infinity]
  let faulty = 0
  let example = ''
  for (const position of positionsOf(records)) {
    const fault = positionFault(position)
    if (fault) {
      faulty += 1
      example ||= fault
    } else widen(extent, position)
  }
  return { extent: Number.isFinite(extent[0]) ? extent : null, faulty, example }
}

function* positionsOf(records: readonly IntakeRecord[]): Generator<FilePosition> {
  for (const { parts } of records) {
    for (const part of parts) {
      if (part.form === 'point') yield part.position
      else if (part.form === 'line') yield* part.positions
    }
  }
}

function widen(extent: NonNullable<Places['extent']>, [lon = NaN, lat = NaN]: FilePosition): void {
  extent[0] = Math.min(extent[0], lon)
  extent[1] = Math.min(extent[1], lat)
  extent[2] = Math.max(extent[2], lon)
  extent[3] = Math.max(extent[3], lat)
}
