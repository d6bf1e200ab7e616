import { applyMapping, type Applied } from '@shared/intake/apply'
import type { Mapping } from '@shared/intake/mapping'
import { sheetGround, type SheetGround } from '@shared/intake/place'
import type { IntakeRecord, RecordPart } from '@shared/intake/records'

/** A record with a point at a place, unless given another geometry. */
export const aRecord = (
  attributes: Record<string, unknown> = {},
  parts: RecordPart[] = [aPoint(3, 45)],
  number = 1,
): IntakeRecord => ({ number, parts, attributes })

export const aPoint = (lon: number, lat: number): RecordPart => ({ form: 'point', position: [lon, lat] })
export const aLine = (...positions: number[][]): RecordPart => ({ form: 'line', positions })

/** A sheet around 3° E 45° N in UTM zone 31, twenty kilometres square. */
export const aGround = (): SheetGround =>
  sheetGround({ name: 'EPSG:32631', proj4: '+proj=utm +zone=31 +datum=WGS84 +units=m +no_defs' }, [
    [490_000, 4_972_000],
    [510_000, 4_972_000],
    [510_000, 4_992_000],
    [490_000, 4_992_000],
    [490_000, 4_972_000],
  ])

/** A mapping in which nothing is mapped yet: lines become contacts, points stations. */
export function aMapping(given: {
  lines?: Partial<Mapping['lines']>
  points?: Partial<Mapping['points']>
  northReference?: Mapping['northReference']
  declination?: number | null
}): Mapping {
  return {
    northReference: given.northReference ?? 'true',
    declination: given.declination ?? null,
    lines: {
      typeColumn: null,
      types: {},
      otherwise: { kind: 'contact' },
      confidenceColumn: null,
      confidences: {},
      confidenceOtherwise: 'certain',
      faultSide: 'right',
      foldSide: 'right',
      nameColumn: null,
      plungeColumn: null,
      trendColumn: null,
      noteColumn: null,
      ...given.lines,
    },
    points: {
      typeColumn: null,
      types: {},
      otherwise: { kind: 'station', type: 'station' },
      readingColumn: null,
      azimuthColumn: null,
      dipColumn: null,
      convention: 'strike-dip',
      overturnedColumn: null,
      trendColumn: null,
      plungeColumn: null,
      stationColumn: null,
      noteColumn: null,
      ...given.points,
    },
  }
}

/** A bed that is only measured. */
export const aBed = {
  kind: 'attitude',
  type: 'bedding',
  overturned: false,
  undulating: false,
  topsKnown: false,
} as const

/** Two columns of numbers, each point a bedding attitude. */
export const strikeAndDip: Partial<Mapping['points']> = {
  azimuthColumn: 'strike',
  dipColumn: 'dip',
  otherwise: aBed,
}

/** What a mapping makes of records, on the ground above; the items are numbered from 1. */
export function applied(records: readonly IntakeRecord[], mapping: Mapping): Applied {
  let made = 0
  const newId = () => `00000000-0000-4000-8000-${String(++made).padStart(12, '0')}`
  return applyMapping(records, 'field.geojson', { mapping, ground: aGround(), newId })
}

export const propertiesOf = ({ items }: Applied) => items.map(({ item }) => item.properties)
export const reasonsOf = ({ refusals }: Applied) => refusals.map(({ reason }) => reason)
