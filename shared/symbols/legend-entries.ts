import { locationConfidences, type LocationConfidence } from '../items/confidence'
import type { Item, ItemOf, LineItem } from '../items/item'
import type { UnitProperties } from '../items/legend'
import {
  axialTracePropertiesSchema,
  contactPropertiesSchema,
  faultPropertiesSchema,
  otherLinePropertiesSchema,
} from '../items/lines'
import { attitudePropertiesSchema, stationPropertiesSchema } from '../items/points'
import type { Millimetres } from '../units'
import { attitudeCases, type AttitudeCase, type LineSymbol } from './definition'
import { attitudes } from './definitions/attitudes'
import { stationMarks } from './definitions/points'
import type { DisplayList, Mark } from './display-list'
import { attitudeCaseOf, drawAttitude } from './draw-attitude'
import { unitInk } from './draw-face'
import { lineSymbolOf, lineSymbols, variantOf } from './draw-item'
import { drawLine } from './draw-line'
import { polyline } from './paths'
import { boundsOf, placeMarks } from './place-marks'
import { measureText } from './text-metrics'

/** Kinds of item that the legend explains by a drawn sample; units have swatches instead. */
export type LegendKind = LineItem['kind'] | 'attitude' | 'station'

interface EntryOf<K extends LegendKind> {
  /** Stable name, for example `fault.normal.certain`. */
  id: string
  kind: K
  group: 'lines' | 'points'
  title: string
  /** What an item drawn with this entry starts with. Of an attitude, strike and dip are those of the sample. */
  properties: ItemOf<K>['properties']
}

/** A row of the legend, and a pen of the palette: one for each symbol that looks different. */
export type LegendEntry = { [K in LegendKind]: EntryOf<K> }[LegendKind]

/** An item that has a legend entry. */
type ExplainedItem = ItemOf<LegendKind>

const lineId = (symbol: LineSymbol, confidence: LocationConfidence): string =>
  [symbol.kind, symbol.variant, confidence].filter((part) => part !== '').join('.')

function lineEntry(symbol: LineSymbol, locationConfidence: LocationConfidence): LegendEntry {
  const basis = {
    id: lineId(symbol, locationConfidence),
    group: 'lines' as const,
    title: `${symbol.title}, ${locationConfidence}`,
  }
  const { kind, variant } = symbol
  switch (kind) {
    case 'contact':
      return { ...basis, kind, properties: contactPropertiesSchema.parse({ locationConfidence }) }
    case 'fault':
      return {
        ...basis,
        kind,
        properties: faultPropertiesSchema.parse({ locationConfidence, type: variant }),
      }
    case 'axial-trace':
      return {
        ...basis,
        kind,
        properties: axialTracePropertiesSchema.parse({ locationConfidence, form: variant }),
      }
    case 'other-line':
      return {
        ...basis,
        kind,
        properties: otherLinePropertiesSchema.parse({ locationConfidence, type: variant }),
      }
  }
}

/** Planes shown as samples: striking north-east, so that the mark and its figure stand lower right. */
const samplePlanes: Record<AttitudeCase, { strike: number | null; dip: number; overturned: boolean }> = {
  inclined: { strike: 60, dip: 35, overturned: false },
  horizontal: { strike: null, dip: 0, overturned: false },
  vertical: { strike: 60, dip: 90, overturned: false },
  overturned: { strike: 60, dip: 75, overturned: true },
}

const attitudeId = (type: string, attitudeCase: AttitudeCase): string => `attitude.${type}.${attitudeCase}`

const attitudeEntries: LegendEntry[] = attitudes.flatMap(({ type, title, cases }) =>
  attitudeCases
    .filter((attitudeCase) => cases[attitudeCase] !== undefined)
    .map((attitudeCase): LegendEntry => ({
      id: attitudeId(type, attitudeCase),
      kind: 'attitude',
      group: 'points',
      title: `${title}, ${attitudeCase}`,
      properties: attitudePropertiesSchema.parse({ type, ...samplePlanes[attitudeCase] }),
    })),
)

const stationEntry: LegendEntry = {
  id: 'station',
  kind: 'station',
  group: 'points',
  title: 'Station',
  properties: stationPropertiesSchema.parse({}),
}

/** Every entry, in the order of the palette: lines by kind and confidence, then points. */
export const legendEntries: readonly LegendEntry[] = [
  ...lineSymbols.flatMap((symbol) => locationConfidences.map((confidence) => lineEntry(symbol, confidence))),
  ...attitudeEntries,
  stationEntry,
]

const entriesById: ReadonlyMap<string, LegendEntry> = new Map(legendEntries.map((entry) => [entry.id, entry]))

/** The entry that explains an item; undefined for unit labels, units and the sheet face, which the legend shows as swatches
 *  or not at all. Questioned identity has no entry of its own: the query in the line is the same for all. */
export function legendEntryOf(item: ExplainedItem): LegendEntry
export function legendEntryOf(item: Item): LegendEntry | undefined
export function legendEntryOf(item: Item): LegendEntry | undefined {
  switch (item.kind) {
    case 'contact':
    case 'fault':
    case 'axial-trace':
    case 'other-line':
      return entriesById.get(lineId(lineSymbolOf(item), item.properties.locationConfidence))
    case 'attitude':
      return entriesById.get(attitudeId(item.properties.type, attitudeCaseOf(item.properties)))
    case 'station':
      return stationEntry
    default:
      return undefined
  }
}

interface Size {
  width: Millimetres
  height: Millimetres
}

/** The sample of an entry at its true size, in a box with its origin at the lower left: a line across its middle, a point at
 *  its centre. What is higher or wider than the box is not cut. */
export function drawEntry(entry: LegendEntry, size: Size): DisplayList {
  if (entry.kind === 'attitude') return centred(drawAttitude(entry.properties, [0, 0], 0), size)
  if (entry.kind === 'station') return centred(stationMarks, size)
  const middle = size.height / 2
  return drawLine(
    lineSymbolOf(entry),
    [
      [0, middle],
      [size.width, middle],
    ],
    {
      locationConfidence: entry.properties.locationConfidence,
      identity: entry.properties.identity,
      attributes: { side: 1 },
      ...(showsPlunge(entry) ? { plunge: { degrees: 20, end: 'end', figure: false } } : {}),
    },
  )
}

/** The arrowhead of a plunge is explained by the trace that is located best. */
const showsPlunge = (entry: LegendEntry): boolean =>
  entry.kind === 'axial-trace' &&
  entry.properties.locationConfidence === 'certain' &&
  !variantOf(entry).startsWith('monocline')

function centred(marks: readonly Mark[], size: Size): Mark[] {
  const box = boundsOf(marks)
  if (!box) return []
  const dx = size.width / 2 - (box.x + box.width / 2)
  const dy = size.height / 2 - (box.y + box.height / 2)
  return placeMarks(marks, ([x, y]) => [x + dx, y + dy])
}

/** Letters of a swatch, and the room they leave at its sides. */
const swatchType = { size: 2.9, weight: 700, edge: 0.6 } as const

/** The swatch of a unit: its colour in a hairline frame, with its letters, made smaller where they would not fit. */
export function drawUnitSwatch(
  unit: Pick<UnitProperties, 'label' | 'colour'>,
  { width, height }: Size,
): DisplayList {
  const corners = polyline(
    [
      [0, 0],
      [width, 0],
      [width, height],
      [0, height],
    ],
    true,
  )
  const natural = measureText(unit.label, swatchType.size, swatchType.weight)
  const fit = Math.min(
    1,
    (width - 2 * swatchType.edge) / Math.max(natural, 0.1),
    (height * 0.8) / swatchType.size,
  )
  return [
    { mark: 'fill', path: corners, ink: unitInk(unit) },
    { mark: 'stroke', path: corners, width: 0.2, ink: 'black' },
    {
      mark: 'text',
      text: unit.label,
      at: [width / 2, height / 2],
      size: swatchType.size * fit,
      weight: swatchType.weight,
      ink: 'black',
      align: 'middle',
    },
  ]
}
