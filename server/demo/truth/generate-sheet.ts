import type { ItemOf } from '@shared/items/item'
import type { StationType } from '@shared/items/points'
import type { Degrees, Metres, XY } from '@shared/units'
import { makeTraces } from './axial-traces'
import { ItemFrame } from './item-frame'
import { makeLabels } from './labels'
import { layLattice, type Extent } from './lattice'
import { LineItems } from './line-items'
import { makeLinework, type MapLine } from './linework'
import { MapBounds } from './map-bounds'
import { noNoise, type Noise } from './noise'
import { PointItems } from './point-items'
import { seededRandom } from './random'
import { cellsNear, rasterize } from './raster'
import { axisDirection, beddingNormal, dipAt, FreePlaces, type Measured, type Station } from './stations'
import { labelsForRest, withoutSlivers } from './tidy'
import type { Truth } from './truth'
import { legendUnits } from './units'

export interface SheetOptions {
  seed: number
  truth: Truth
  /** Which part of the island the sheet shows. */
  extent: Extent
  /** The island's origin in sheet metres. */
  origin: XY
  /** Grid convergence at a place in sheet metres, degrees. */
  convergenceAt(xy: XY): Degrees
  /** Attitudes on the sheet; fewer if there is no room. */
  attitudes: number
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
  const units = legendUnits.map((properties, index): ItemOf<'unit'> => ({
    kind: 'unit',
    id: frame.id(),
    geometry: null,
    properties: { ...properties, rank: (index + 1) * 10 },
  }))
  const finds = takeFinds(places, extent)
  const measured = takeMeasured(truth, places, options)
  const named = (index: number) => `${options.prefix}-${String(index + 1).padStart(3, '0')}`
  return {
    units,
    contacts: lines.filter(isOf('contact', 'unconformity')).flatMap((line) => lineItems.contacts(line)),
    coverContacts: lines.filter(isOf('cover')).flatMap((line) => lineItems.contacts(line)),
    faults: lines.filter(isOf('fault', 'thrust')).flatMap((line) => lineItems.faults(line)),
    otherLines: [
      ...lines.filter(isOf('marker-bed')).map((line) => lineItems.other(line, 'marker-bed')),
      ...lines.filter(isOf('dike')).map((line) => lineItems.other(line, 'dike')),
    ],
    traces: traces.map((trace) => lineItems.trace(trace)),
    attitudes: measured.planes.map(({ station, type }, index) =>
      pointItems.attitude(station, type, named(index)),
    ),
    lineations: measured.lines.map(({ station, direction, onPlane }, index) =>
      pointItems.lineation(station, direction, onPlane, named(measured.planes.length + index)),
    ),
    stations: finds.map(({ station, type, name, note }) => pointItems.find(station, type, name, note)),
    labels: labels.map((label) => pointItems.label(label, units)),
    survey: { bounds, places },
  }
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

interface Measurements {
  planes: { station: Station; type: Measured }[]
  lines: { station: Station; direction: NonNullable<ReturnType<typeof axisDirection>>; onPlane: boolean }[]
}

/** Units with a cleavage or foliation of their own, and what share of their stations measured it. */
const fabrics: Record<string, { type: Measured; share: number }> = {
  Ot: { type: 'cleavage', share: 0.4 },
  Dm: { type: 'cleavage', share: 0.25 },
  Ms: { type: 'cleavage', share: 0.2 },
  Zs: { type: 'foliation', share: 0.75 },
}
const JOINT_SHARE = 0.07

/** Level and upright beds, which are rare, before all others; then whatever there is, in the order of traverses. */
function takeMeasured(truth: Truth, places: FreePlaces, options: SheetOptions): Measurements {
  const random = seededRandom(options.seed + 2)
  const rare = Math.min(5, Math.floor(options.attitudes / 40))
  const upright = places.take(
    rare,
    (station) => station.rock.series === 'upper' && dipAt(truth, station) > 89.5,
  )
  const overturned = places.take(rare * 3, (station) => beddingNormal(truth, station)[2] < 0)
  const level = places.take(
    rare,
    (station) => station.rock.series === 'younger' && dipAt(truth, station) < 0.5,
  )
  const lines = places
    .take(Math.floor(options.attitudes / 14), ({ rock }) => rock.series !== 'younger')
    .flatMap((station) => {
      const direction = axisDirection(truth, station)
      return direction ? [{ station, direction, onPlane: random() < 0.5 }] : []
    })
  const others = places
    .take(options.attitudes - upright.length - overturned.length - level.length)
    .map((station) => ({
      station,
      type: typeOf(station, random()),
    }))
  const bedding = [...upright, ...overturned, ...level].map((station) => ({
    station,
    type: 'bedding' as const,
  }))
  return { planes: inTraverses([...bedding, ...others]), lines }
}

function typeOf({ rock }: Station, chance: number): Measured {
  const fabric = fabrics[rock.layer.label]
  if (fabric) return chance < fabric.share ? fabric.type : 'bedding'
  return chance < JOINT_SHARE && rock.series !== 'younger' ? 'joint' : 'bedding'
}

/** As traverses go: in strips from west to east, each from south to north. */
const inTraverses = <T extends { station: Station }>(members: readonly T[]): T[] =>
  members.toSorted(
    ({ station: { at: a } }, { station: { at: b } }) =>
      Math.floor(a[0] / 2500) - Math.floor(b[0] / 2500) || a[1] - b[1],
  )

/** What is found on the island, and in which units. */
const finds: readonly {
  type: StationType
  in: readonly string[]
  per100Km2: number
  name: string
  note: string
}[] = [
  { type: 'sample', in: ['Ov', 'Oe', 'Sr', 'Df', 'Zs'], per100Km2: 7, name: 'S', note: 'thin section' },
  {
    type: 'fossil-locality',
    in: ['Sd', 'Dl', 'Jm', 'Kl'],
    per100Km2: 4,
    name: 'F',
    note: 'corals and shells',
  },
  { type: 'quarry', in: ['Dl', 'Op', 'Df'], per100Km2: 3, name: 'Q', note: 'disused' },
  { type: 'spring', in: ['Jm', 'Trt', 'Dm', 'Sc'], per100Km2: 4, name: 'W', note: '' },
  { type: 'borehole', in: ['Js', 'Sr', 'Oe'], per100Km2: 2, name: 'B', note: 'water, 60 m' },
  { type: 'mine-adit', in: ['Ms', 'Sc', 'Ov'], per100Km2: 1, name: 'A', note: 'abandoned, blocked' },
  { type: 'tops-direction', in: ['Df', 'Oe', 'Op'], per100Km2: 5, name: '', note: 'graded beds' },
]

function takeFinds(places: FreePlaces, { width, height }: Extent) {
  const area = (width * height) / 1e8
  return finds.flatMap(({ type, in: labels, per100Km2, name, note }) =>
    places
      .take(Math.round(per100Km2 * area), ({ rock }) => labels.includes(rock.layer.label))
      .map((station, index) => ({ station, type, name: name && `${name}${index + 1}`, note })),
  )
}
