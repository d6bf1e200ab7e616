import { locationConfidences } from '../items/confidence'
import { attitudes } from '../symbols/definitions/attitudes'
import { contacts } from '../symbols/definitions/contacts'
import { faults } from '../symbols/definitions/faults'
import { folds } from '../symbols/definitions/folds'
import { lineations } from '../symbols/definitions/lineations'
import { lithologyPatterns } from '../symbols/definitions/lithology'
import { otherLines } from '../symbols/definitions/other-lines'
import { places } from '../symbols/definitions/points'
import type { LineSymbol, PointFacts, Published } from '../symbols/definition'
import type { LithologyPattern } from '../symbols/definitions/lithology/pattern'
import { rectangle } from '../sheet-face/rectangle'
import type { Mark } from '../symbols/display-list'
import { drawFace } from '../symbols/draw-face'
import { printed } from '../symbols/one-ink'
import { unitFills, type Printing, type UnitFill } from '../symbols/unit-fill'
import { attitudeDimensions, drawingDimensions, lineDimensions, tileDimensions } from './dimensions'
import { inWords, specimenCase, type PublishedNumber, type SpecimenEntry, type SpecimenFamily } from './entry'
import { furniture } from './furniture'
import { lineCases } from './line-cases'
import { pointCases, type PointSort } from './point-cases'

/** The whole symbol set: a family for each file of definitions, an entry for each symbol in its array, every case of each. */
export const composeSpecimen = (): SpecimenFamily[] => [
  family('contacts', 'Contacts', contacts.map(lineEntry)),
  family('faults', 'Faults', faults.map(lineEntry)),
  family('folds', 'Folds', folds.map(lineEntry)),
  family('other-lines', 'Dikes, veins, marker beds', otherLines.map(lineEntry)),
  family(
    'attitudes',
    'Attitudes of planes',
    attitudes.map((symbol) => {
      const entry = pointEntry({ kind: 'attitude', type: symbol.type }, symbol)
      return { ...entry, dimensions: attitudeDimensions(symbol, entry.cases[0]?.marks ?? []) }
    }),
  ),
  family(
    'lineations',
    'Lineations and minor folds',
    lineations.map((symbol) => pointEntry({ kind: 'lineation', type: symbol.type }, symbol)),
  ),
  family(
    'places',
    'Places',
    places.map((symbol) => pointEntry({ kind: 'station', type: symbol.type }, symbol)),
  ),
  family('lithology', 'Rocks and deposits', lithologyPatterns.map(patternEntry)),
  family('furniture', 'Furniture of the sheet', furniture()),
]

const family = (id: string, title: string, entries: readonly SpecimenEntry[]): SpecimenFamily => ({
  id,
  title,
  entries,
})

const lineEntry = (symbol: LineSymbol): SpecimenEntry => ({
  id: symbol.id,
  meaning: symbol.explains === undefined ? symbol.title : `${symbol.title}: ${symbol.explains}`,
  dimensions: lineDimensions(symbol),
  drivenBy: symbol.drivenBy.map(inWords),
  published: locationConfidences.flatMap((confidence): PublishedNumber[] => {
    const [plain, queried] = [symbol.published?.[confidence], symbol.publishedQueried?.[confidence]]
    return [
      ...(plain ? [{ of: confidence, ...plain }] : []),
      ...(queried ? [{ of: `${confidence}, queried`, ...queried }] : []),
    ]
  }),
  cases: lineCases(symbol),
})

function pointEntry(sort: PointSort, symbol: PointFacts): SpecimenEntry {
  const cases = pointCases(sort, symbol)
  return {
    id: `${sort.kind}.${sort.type}`,
    meaning: symbol.title,
    dimensions: drawingDimensions(cases[0]?.marks ?? []),
    drivenBy: symbol.drivenBy.map(inWords),
    published: numberForAll(symbol.published),
    cases,
  }
}

const numberForAll = (published: Published | undefined): PublishedNumber[] =>
  published ? [{ of: '', ...published }] : []

/** A swatch of the legend's size, and an area in which the pattern can be seen to have no seams. */
const SWATCHES = [
  { caption: 'swatch', width: 12, height: 7 },
  { caption: 'area', width: 34, height: 22 },
] as const
/** A unit's colour for a pattern to stand on. */
const SAMPLE_COLOUR = '#dfcfae'

function patternEntry({ id, title, tile }: LithologyPattern): SpecimenEntry {
  const unit = { id, properties: { colour: SAMPLE_COLOUR, pattern: id, rank: 0 } }
  const fillIn = (printing: Printing): UnitFill => unitFills([unit], printing).get(id) ?? {}
  return {
    id: `lithology.${id}`,
    meaning: title,
    dimensions: tileDimensions(tile),
    drivenBy: ['pattern of the unit', 'colour of the unit', 'printing of the sheet'],
    published: [],
    cases: SWATCHES.map(({ caption, width, height }) => {
      const path = rectangle(0, 0, width, height)
      const drawn = (printing: Printing): Mark[] => [
        ...drawFace(path, fillIn(printing), [0, 0]),
        { mark: 'stroke', path, width: 0.2, ink: 'black' },
      ]
      return { ...specimenCase(caption, drawn('colour')), oneInk: printed(drawn('one-ink'), 'one-ink') }
    }),
  }
}
