import { locationConfidences, type LocationConfidence } from '../items/confidence'
import type { Item, ItemOf } from '../items/item'
import {
  axialTracePropertiesSchema,
  contactPropertiesSchema,
  faultPropertiesSchema,
  otherLinePropertiesSchema,
} from '../items/lines'
import type { Millimetres } from '../units'
import type { LineSymbol } from './definition'
import type { DisplayList, Mark } from './display-list'
import { lineSymbolOf, lineSymbols } from './draw-item'
import { drawLine } from './draw-line'
import type { LegendEntry, LegendKind, PointEntry } from './legend-entry'
import { boundsOf, placeMarks } from './place-marks'
import { keptInRow } from './sample-row'
import { drawPointEntry, pointEntries, pointEntryIdOf } from './point-entries'

export type { LegendEntry, LegendKind } from './legend-entry'

/** An item that has a legend entry. */
type ExplainedItem = ItemOf<LegendKind>

const lineId = (symbol: LineSymbol, confidence: LocationConfidence): string => `${symbol.id}.${confidence}`

function lineEntry(symbol: LineSymbol, locationConfidence: LocationConfidence): LegendEntry {
  const basis = {
    id: lineId(symbol, locationConfidence),
    group: 'lines' as const,
    title: `${symbol.title}, ${locationConfidence}`,
    ...(symbol.explains === undefined ? {} : { explains: symbol.explains }),
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

/** Every entry, in the order of the palette: lines by kind and confidence, then points. */
export const legendEntries: readonly LegendEntry[] = [
  ...lineSymbols.flatMap((symbol) => locationConfidences.map((confidence) => lineEntry(symbol, confidence))),
  ...pointEntries,
]

const entriesById: ReadonlyMap<string, LegendEntry> = new Map(legendEntries.map((entry) => [entry.id, entry]))

/** The entry that explains an item; undefined for unit labels, units and the sheet face, which the legend shows as swatches
 *  or not at all. What may stand on any line, as a query or a plunge, is explained by `line-marks.ts`. */
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
    case 'lineation':
    case 'station':
      return entriesById.get(pointEntryIdOf(item))
    default:
      return undefined
  }
}

interface Size {
  width: Millimetres
  height: Millimetres
}

/** The sample of an entry at its true size, in a box with its origin at the lower left: a point at its centre, a line across
 *  its middle, or as far off it as what stands on one side needs. What is higher or wider than the box is not cut. */
export function drawEntry(entry: LegendEntry, size: Size): DisplayList {
  if (isPointEntry(entry)) return centred(drawPointEntry(entry), size)
  const middle = size.height / 2
  const list = drawLine(
    lineSymbolOf(entry),
    [
      [0, middle],
      [size.width, middle],
    ],
    {
      locationConfidence: entry.properties.locationConfidence,
      identity: entry.properties.identity,
      attributes: { side: 1 },
    },
  )
  return keptInRow(list, size.height)
}

const isPointEntry = (entry: LegendEntry): entry is PointEntry => entry.group === 'points'

function centred(marks: readonly Mark[], size: Size): Mark[] {
  const box = boundsOf(marks)
  if (!box) return []
  const dx = size.width / 2 - (box.x + box.width / 2)
  const dy = size.height / 2 - (box.y + box.height / 2)
  return placeMarks(marks, ([x, y]) => [x + dx, y + dy])
}
