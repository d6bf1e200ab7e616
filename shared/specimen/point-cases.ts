import { itemSchema, type ItemKind } from '../items/item'
import { normalizeAzimuth, toRadians, type Degrees, type Millimetres, type XY } from '../units'
import type { LegendEntry } from '../symbols/legend-entry'
import type { DisplayList, Mark } from '../symbols/display-list'
import { drawItem } from '../symbols/draw-item'
import { polyline } from '../symbols/paths'
import { drawPointEntry, pointEntries } from '../symbols/point-entries'
import { specimenCase, type SpecimenCase } from './entry'
import { specimenFrame } from './line-cases'

/** Directions of a compass rose, and how far its symbols stand from its middle. */
const ROSE_STEP: Degrees = 22.5
const ROSE_RADIUS: Millimetres = 21
const ID = '00000000-0000-4000-8000-000000000000'

type PointKind = 'attitude' | 'lineation' | 'station'

/** A kind of point and its type: what picks a symbol. */
export interface PointSort {
  kind: PointKind
  type: string
}

function draw({ kind, type }: PointSort, set: object, coordinates: XY = [0, 0]): DisplayList {
  const geometry = { type: 'Point', coordinates }
  return drawItem(itemSchema.parse({ id: ID, kind, geometry, properties: { type, ...set } }), specimenFrame)
}

type DrawCase = (sort: PointSort) => SpecimenCase

const caseOf =
  (caption: string, set: object): DrawCase =>
  (sort) =>
    specimenCase(caption, draw(sort, set))

/** The symbol in all directions of the compass, each standing in its own direction from the middle.
 *  @param setFor properties for one direction */
const rose =
  (caption: string, setFor: (azimuth: Degrees) => object): DrawCase =>
  (sort) => {
    const around = Array.from({ length: 360 / ROSE_STEP }, (_, index) => index * ROSE_STEP)
    const marks = around.flatMap((azimuth) => {
      const turn = toRadians(azimuth)
      const at: XY = [ROSE_RADIUS * Math.sin(turn), ROSE_RADIUS * Math.cos(turn)]
      return draw(sort, setFor(normalizeAzimuth(azimuth)), at)
    })
    return specimenCase(caption, [...northMark, ...marks])
  }

/** A short line to the north of a rose's middle, so that it can be read by itself. */
const northMark: Mark[] = [
  {
    mark: 'stroke',
    path: polyline([
      [0, -3],
      [0, 3],
    ]),
    width: 0.13,
    ink: 'frame',
  },
  { mark: 'text', text: 'N', at: [0, 5], size: 2.3, weight: 700, ink: 'frame', align: 'middle' },
]

/** Cases that show what an attribute does to a point's drawing, beside those that have a legend entry of their own. */
export const pointAttributeCases: Readonly<Record<string, readonly DrawCase[]>> = {
  strike: [rose('strikes all round the compass', (strike) => ({ strike, dip: 35 }))],
  dip: [2, 45, 88].map((dip) => caseOf(`dips ${dip}°`, { strike: 30, dip })),
  overturned: [caseOf('overturned, dips 20°', { strike: 210, dip: 20, overturned: true })],
  undulating: [],
  'tops known': [
    caseOf('vertical, top to the north-west', { strike: 60, dip: 90, overturned: true, topsKnown: true }),
    caseOf('vertical, top to the south-east', { strike: 60, dip: 90, topsKnown: true }),
  ],
  trend: [rose('trends all round the compass', (trend) => ({ trend, plunge: 25 }))],
  plunge: [2, 60, 88].map((plunge) => caseOf(`plunges ${plunge}°`, { trend: 60, plunge })),
  plane: [
    caseOf('on a vertical plane', {
      trend: 60,
      plunge: 30,
      plane: { type: 'foliation', strike: 60, dip: 90 },
    }),
  ],
  azimuth: [
    rose('all round the compass', (azimuth) => ({ azimuth })),
    caseOf('azimuth not stated', { azimuth: null }),
  ],
}

/** All cases of a point symbol: those that the legend explains, then what its attributes do besides.
 *  @param title the symbol's, which captions do not repeat */
export const pointCases = (
  sort: PointSort,
  { title, drivenBy }: { title: string; drivenBy: readonly string[] },
): SpecimenCase[] => [
  ...pointEntries
    .filter((entry) => isOfSort(entry, sort))
    .map((entry) => specimenCase(captionOf(entry.title, title), drawPointEntry(entry))),
  ...drivenBy
    .flatMap((attribute) => (pointAttributeCases[attribute] ?? []).map((drawCase) => drawCase(sort)))
    // Roses are large: the small ones stand together before them.
    .toSorted((a, b) => Number(isRose(a)) - Number(isRose(b))),
]

const isRose = ({ box }: SpecimenCase): boolean => box.height > ROSE_RADIUS

const isOfSort = (entry: LegendEntry, { kind, type }: { kind: ItemKind; type: string }): boolean =>
  entry.kind === kind && 'type' in entry.properties && entry.properties.type === type

/** What a legend title adds to the symbol's: `inclined` of `Bedding, inclined`. */
function captionOf(entryTitle: string, title: string): string {
  const rest = entryTitle.slice(title.length).replace(/^,\s*/, '').trim()
  return rest === '' ? title.toLowerCase() : rest
}
