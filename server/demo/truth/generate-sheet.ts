import type { ItemOf } from '@shared/items/item'
import type { Degrees, Metres, XY } from '@shared/units'
import { makeTraces } from './axial-traces'
import { ItemFrame } from './item-frame'
import { makeLabels, type Label } from './labels'
import { layLattice, type Extent } from './lattice'
import { LineItems } from './line-items'
import { makeLinework, type MapLine } from './linework'
import { MapBounds } from './map-bounds'
import { takeFinds, takeMeasured } from './measurements'
import { noNoise, type Noise } from './noise'
import { PointItems } from './point-items'
import { seededRandom } from './random'
import { cellsNear, rasterize } from './raster'
import { FreePlaces } from './stations'
import { labelsForRest, withoutSlivers } from './tidy'
import type { Truth } from './truth'
import { legendUnits, unitLabelOf } from './units'

export interface SheetOptions {
  seed: number
  truth: Truth
  /** Which part of the island the sheet shows. */
  extent: Extent
  /** The island's origin in sheet metres. */
  origin: XY
  /** Grid convergence at a place in sheet metres, degrees. */
  convergenceAt(xy: XY): Degrees
  /** How much is measured, if there is room: so many attitudes, or so many that all items are of this number. */
  measure: { attitudes: number } | { allItems: number }
  /** Letters before station numbers. */
  prefix: string
  /** Least distance between stations. */
  apart: Metres
  noise?: Noise
  /** Sides of the cells that lines and areas are found in. */
  cells?: { lines: Metres; areas: Metres }
}

/** Everything on a demo sheet, sorted as people would have brought it. */
export interface DemoSheet {
  units: ItemOf<'unit'>[]
  contacts: ItemOf<'contact'>[]
  coverContacts: ItemOf<'contact'>[]
  faults: ItemOf<'fault'>[]
  otherLines: ItemOf<'other-line'>[]
  traces: ItemOf<'axial-trace'>[]
  attitudes: ItemOf<'attitude'>[]
  lineations: ItemOf<'lineation'>[]
  stations: ItemOf<'station'>[]
  labels: ItemOf<'unit-label'>[]
  /** What the sheet was drawn from: where its areas end, and what room for stations is left. */
  survey: { bounds: MapBounds; places: FreePlaces }
}

/** Distance of a station from the edge of its area: 90 m are nearly 4 mm at 1:24 000. */
const CLEAR: Metres = 90

/** A sheet whose every line and figure follows from the known island. Same options, same sheet. */
export function generateSheet(options: SheetOptions): DemoSheet {
  const { seed, truth, extent, apart, noise = noNoise, cells = { lines: 40, areas: 25 } } = options
  const bounds = new MapBounds(truth, layLattice(extent, cells.lines, truth.ground))
  const linework = makeLinework(bounds)
  const { lines, leftOut: slivers } = withoutSlivers(linework.lines, extent)
  const traces = makeTraces(bounds)
  const raster = rasterize(bounds, cells.areas)
  const across = [...traces.map(({ line }) => line), ...lines.filter(boundsNothing).map(({ line }) => line)]
  const leftOut = [...linework.leftOut, ...slivers]
  const found = makeLabels(bounds, raster, across, leftOut)
  const labels = [...found, ...labelsForRest(bounds, lines, found, leftOut)]
  const near = cellsNear(raster, across, Math.round(CLEAR / cells.areas))
  const places = new FreePlaces(truth, raster, near, CLEAR, seededRandom(seed + 1), apart)
  for (const { at } of labels) places.occupy(at)

  const frame = new ItemFrame(options.origin, (xy) => options.convergenceAt(xy), seededRandom(seed))
  const lineItems = new LineItems(frame, truth)
  const pointItems = new PointItems(frame, truth, noise)
  const units = unitsShown(labels, frame)
  const contacts = lines.filter(isOf('contact', 'unconformity')).flatMap((line) => lineItems.contacts(line))
  const drawn = {
    units,
    contacts,
    coverContacts: lines.filter(isOf('cover')).flatMap((line) => lineItems.contacts(line)),
    faults: lines.filter(isOf('fault', 'thrust')).flatMap((line) => lineItems.faults(line)),
    otherLines: [
      ...lines.filter(isOf('marker-bed')).map((line) => lineItems.other(line, 'marker-bed')),
      ...lines.filter(isOf('dike')).map((line) => lineItems.other(line, 'dike')),
    ],
    traces: traces.map((trace) => lineItems.trace(trace)),
    stations: takeFinds(places, extent).map(({ station, type, name, note }) =>
      pointItems.find(station, type, name, note),
    ),
    labels: labels.map((label) => pointItems.label(label, units)),
  }
  const measured = takeMeasured(truth, places, {
    seed,
    ...wantedOf(options.measure, Object.values(drawn).flat().length),
  })
  const named = (index: number) => `${options.prefix}-${String(index + 1).padStart(3, '0')}`
  return {
    ...drawn,
    attitudes: measured.planes.map(({ station, type }, index) =>
      pointItems.attitude(station, type, named(index)),
    ),
    lineations: measured.lines.map(({ station, direction, onPlane }, index) =>
      pointItems.lineation(station, direction, onPlane, named(measured.planes.length + index)),
    ),
    survey: { bounds, places },
  }
}

/** The legend: those units that are on the sheet. */
function unitsShown(labels: readonly Label[], frame: ItemFrame): ItemOf<'unit'>[] {
  const shown = new Set(labels.map(({ shows }) => unitLabelOf(shows)))
  return legendUnits.flatMap((properties, index) =>
    shown.has(properties.label)
      ? [
          {
            kind: 'unit' as const,
            id: frame.id(),
            geometry: null,
            properties: { ...properties, rank: (index + 1) * 10 },
          },
        ]
      : [],
  )
}

/** With fourteen attitudes comes a lineation. */
function wantedOf(
  measure: SheetOptions['measure'],
  others: number,
): { attitudes: number; lineations: number } {
  if ('attitudes' in measure) {
    return { attitudes: measure.attitudes, lineations: Math.floor(measure.attitudes / 14) }
  }
  const left = Math.max(0, measure.allItems - others)
  const lineations = Math.floor(left / 15)
  return { attitudes: left - lineations, lineations }
}

/** All items of a sheet in one list. */
export const itemsOf = (sheet: DemoSheet) => [
  ...sheet.units,
  ...sheet.contacts,
  ...sheet.coverContacts,
  ...sheet.faults,
  ...sheet.otherLines,
  ...sheet.traces,
  ...sheet.attitudes,
  ...sheet.lineations,
  ...sheet.stations,
  ...sheet.labels,
]

const isOf =
  (...kinds: MapLine['subject']['kind'][]) =>
  ({ subject }: MapLine): boolean =>
    kinds.includes(subject.kind)

const boundsNothing = isOf('marker-bed', 'dike')
