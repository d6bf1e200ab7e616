import type { ItemOf } from '../items/item'
import {
  attitudePropertiesSchema,
  lineationPropertiesSchema,
  planeTypes,
  stationPropertiesSchema,
  type AttitudeProperties,
} from '../items/points'
import { attitudeCases, lineationCases, type AttitudeCase, type LineationCase } from './definition'
import { attitudes } from './definitions/attitudes'
import { lineations } from './definitions/lineations'
import { places } from './definitions/points'
import type { DisplayList } from './display-list'
import { attitudeCaseOf, attitudeSymbolOf, drawAttitude, type DrawnPlane } from './draw-attitude'
import { drawLineation, lineationCaseOf } from './draw-lineation'
import { drawPlace } from './draw-place'
import type { LegendPointKind, PointEntry } from './legend-entry'

/** Planes shown as samples: striking east-north-east, so that they lie along the row with mark and figure below. */
const samplePlanes: Record<AttitudeCase, { strike: number | null; dip: number; overturned: boolean }> = {
  inclined: { strike: 70, dip: 35, overturned: false },
  horizontal: { strike: null, dip: 0, overturned: false },
  vertical: { strike: 70, dip: 90, overturned: false },
  overturned: { strike: 70, dip: 75, overturned: true },
}

type Traits = Pick<AttitudeProperties, 'undulating' | 'topsKnown'>
const allTraits: readonly Traits[] = [false, true].flatMap((topsKnown) =>
  [false, true].map((undulating) => ({ undulating, topsKnown })),
)

/** What of a plane's traits its symbol shows. */
function shownTraits(plane: DrawnPlane): Traits {
  const symbol = attitudeSymbolOf(plane.type)
  return {
    undulating: Boolean(plane.undulating && symbol.undulating),
    topsKnown: Boolean(plane.topsKnown && symbol.topsKnown?.[attitudeCaseOf(plane)]),
  }
}

const traitWords = ({ undulating, topsKnown }: Traits): string[] => [
  ...(undulating ? ['undulating'] : []),
  ...(topsKnown ? ['tops known'] : []),
]

const attitudeId = (plane: DrawnPlane): string =>
  ['attitude', plane.type, attitudeCaseOf(plane), ...traitWords(shownTraits(plane))]
    .join('.')
    .replaceAll(' ', '-')

const attitudeEntries: PointEntry[] = attitudes.flatMap(({ type, title, cases, undulating, topsKnown }) =>
  allTraits
    .filter((traits) => (undulating || !traits.undulating) && (topsKnown || !traits.topsKnown))
    .flatMap((traits) =>
      attitudeCases
        .filter((attitudeCase) => cases[attitudeCase] !== undefined)
        .map((attitudeCase): PointEntry => {
          const properties = attitudePropertiesSchema.parse({
            type,
            ...samplePlanes[attitudeCase],
            ...traits,
          })
          const words = traitWords(traits)
          const isPen = words.length === 0 || (words.length === 1 && attitudeCase === 'inclined')
          return {
            id: attitudeId(properties),
            kind: 'attitude',
            group: 'points',
            title: [title, attitudeCase, ...words].join(', '),
            properties,
            ...(isPen ? {} : { onlyExplains: true }),
          }
        }),
    ),
)

/** Lines shown as samples: to the upper right, so that arrow and figure lie across the row. */
const sampleLines: Record<LineationCase, { trend: number | null; plunge: number }> = {
  plunging: { trend: 70, plunge: 25 },
  horizontal: { trend: 70, plunge: 0 },
  vertical: { trend: null, plunge: 90 },
}
/** A plane that lies along the row, and a line on it. */
const samplePlane = { strike: 60, dip: 40, overturned: false }
const sampleLineOnPlane = { trend: 105, plunge: 31 }

type DescribedLine = ItemOf<'lineation'>['properties']
const lineationId = (line: Pick<DescribedLine, 'type' | 'trend' | 'plunge' | 'plane'>): string =>
  ['lineation', line.type, line.plane ? `on-${line.plane.type}` : lineationCaseOf(line)].join('.')

const lineationEntries: PointEntry[] = lineations.flatMap(({ type, title }) => {
  const entry = (words: string, properties: DescribedLine, isPen: boolean): PointEntry => ({
    id: lineationId(properties),
    kind: 'lineation',
    group: 'points',
    title: `${title}${words}`,
    properties,
    ...(isPen ? {} : { onlyExplains: true }),
  })
  return [
    ...lineationCases.map((lineationCase) =>
      entry(
        `, ${lineationCase}`,
        lineationPropertiesSchema.parse({ type, ...sampleLines[lineationCase] }),
        lineationCase === 'plunging',
      ),
    ),
    ...planeTypes.map((plane) =>
      entry(
        ` on ${plane}`,
        lineationPropertiesSchema.parse({
          type,
          ...sampleLineOnPlane,
          plane: { type: plane, ...samplePlane },
        }),
        plane === 'foliation',
      ),
    ),
  ]
})

const SAMPLE_AZIMUTH = 60

const placeId = (type: string): string => (type === 'station' ? 'station' : `station.${type}`)

const placeEntries: PointEntry[] = places.map(({ type, title }) => ({
  id: placeId(type),
  kind: 'station',
  group: 'points',
  title,
  properties: stationPropertiesSchema.parse({ type }),
}))

/** Every entry of a point, in the order of the palette. */
export const pointEntries: readonly PointEntry[] = [...attitudeEntries, ...lineationEntries, ...placeEntries]

/** Id of the entry that explains a point. */
export function pointEntryIdOf(item: ItemOf<LegendPointKind>): string {
  switch (item.kind) {
    case 'attitude':
      return attitudeId(item.properties)
    case 'lineation':
      return lineationId(item.properties)
    case 'station':
      return placeId(item.properties.type)
  }
}

/** The sample of a point's entry, about its place. */
export function drawPointEntry(entry: PointEntry): DisplayList {
  switch (entry.kind) {
    case 'attitude':
      return drawAttitude(entry.properties, [0, 0], 0)
    case 'lineation':
      return drawLineation(entry.properties, [0, 0], 0)
    case 'station':
      // Its azimuth is only the sample's: a place that is drawn with this entry does not have one yet.
      return drawPlace({ ...entry.properties, azimuth: SAMPLE_AZIMUTH }, [0, 0], 0)
  }
}
