import { snapToGrid } from '@shared/geometry/grid'
import type { LocationConfidence } from '@shared/items/confidence'
import type { ItemOf } from '@shared/items/item'
import { formatAttitude } from '@shared/structure/attitude-words'
import { normalizeAzimuth, type Azimuth, type Degrees, type Metres, type XY } from '@shared/units'
import { makeTraces, type Trace } from './axial-traces'
import type { Line } from './contours'
import { makeLabels, type Label } from './labels'
import { lengthOf, makeLinework, withStretch, type MapLine } from './linework'
import { randomId, seededRandom, type Random } from './random'
import { makeStations, type Station } from './stations'
import { makeTruth, type Truth } from './truth'
import { coverUnits, layers, markerBed } from './units'

export interface SheetOptions {
  seed: number
  /** South-west corner, sheet metres. */
  origin: XY
  width: Metres
  height: Metres
  /** Trend of the fold axes, degrees from true north. */
  trend: Azimuth
  convergenceAt(xy: XY): Degrees
  /** Attitudes on the sheet. */
  stations: number
  /** Letters before station numbers. */
  stationPrefix: string
}

/** Everything on a demo sheet, sorted as people would have brought it. */
export interface DemoSheet {
  truth: Truth
  units: ItemOf<'unit'>[]
  contacts: ItemOf<'contact'>[]
  coverContacts: ItemOf<'contact'>[]
  faults: ItemOf<'fault'>[]
  markerBeds: ItemOf<'other-line'>[]
  traces: ItemOf<'axial-trace'>[]
  attitudes: ItemOf<'attitude'>[]
  labels: ItemOf<'unit-label'>[]
}

/** A demo sheet whose every line and figure follows from a known field. Same options, same sheet. */
export function generateSheet(options: SheetOptions): DemoSheet {
  const { origin, width, height } = options
  const centre: XY = [origin[0] + width / 2, origin[1] + height / 2]
  const truth = makeTruth({ width, height, gridTrend: options.trend - options.convergenceAt(centre) })
  const writer = new ItemWriter(options, seededRandom(options.seed))
  const units = writer.units()
  const { lines, leftOut } = makeLinework(truth)
  const labels = makeLabels(truth, leftOut)
  const stations = makeStations(truth, seededRandom(options.seed + 1), {
    wanted: options.stations,
    apart: 560,
    clearOf: labels.map((label) => label.at),
    clear: 200,
  })
  return {
    truth,
    units,
    contacts: lines.filter(isOf('contact')).flatMap((line) => writer.contacts(line)),
    coverContacts: lines.filter(isOf('cover')).flatMap((line) => writer.contacts(line)),
    faults: lines.filter(isOf('fault')).flatMap((line) => writer.faults(line)),
    markerBeds: lines.filter(isOf('marker-bed')).map((line) => writer.markerBed(line)),
    traces: makeTraces(truth).map((trace) => writer.trace(trace)),
    attitudes: sortedByPlace(stations).map((station, index) => writer.attitude(station, index + 1)),
    labels: labels.map((label) => writer.label(label, units)),
  }
}

const isOf =
  (kind: MapLine['kind']) =>
  (line: MapLine): boolean =>
    line.kind === kind

/** As traverses go: in strips from west to east, each from south to north. */
const sortedByPlace = (stations: readonly Station[]): Station[] =>
  stations.toSorted((a, b) => Math.floor(a.at[0] / 2500) - Math.floor(b.at[0] / 2500) || a.at[1] - b.at[1])

const foldNames: Record<Trace['hinge']['form'], readonly string[]> = {
  anticline: ['Puffin', 'Guillemot', 'Gannet', 'Tystie'],
  syncline: ['Shearwater', 'Skua', 'Dunlin', 'Whimbrel'],
}

/** Turns places and figures of the truth into items of the sheet. */
class ItemWriter {
  private readonly foldNumbers = new Map<string, string>()

  constructor(
    private readonly options: SheetOptions,
    private readonly random: Random,
  ) {}

  units(): ItemOf<'unit'>[] {
    const described = [...coverUnits, ...layers].map(
      ({ label, name, age, colour, pattern, description }) => ({
        label,
        name,
        age,
        colour,
        pattern,
        description,
      }),
    )
    return described.map((properties, index) => ({
      kind: 'unit',
      id: this.id(),
      geometry: null,
      properties: { ...properties, rank: (index + 1) * 10 },
    }))
  }

  /** Some contacts are located less well along a part of them. */
  contacts({ line, concealed, kind }: MapLine): ItemOf<'contact'>[] {
    const chance = this.random()
    const isLong = lengthOf(line) > 2200
    const stretches =
      concealed || !isLong || chance > 0.45 || kind === 'cover'
        ? [{ line, locationConfidence: this.confidenceOf(concealed, kind === 'cover' && chance < 0.5) }]
        : withStretch(line, [0.3 + chance / 4, 0.55 + chance / 2], chance < 0.28 ? 'approximate' : 'inferred')
    return stretches.map((stretch) => ({
      kind: 'contact',
      id: this.id(),
      geometry: this.lineGeometry(stretch.line),
      properties: this.lineProperties(stretch.locationConfidence),
    }))
  }

  /** Drawn from south to north, so that the down-thrown block lies on the right. */
  faults({ line, concealed }: MapLine): ItemOf<'fault'>[] {
    const northward = (line[0]?.[1] ?? 0) > (line.at(-1)?.[1] ?? 0) ? line.toReversed() : line
    const stretches =
      concealed || lengthOf(line) < 5000
        ? [{ line: northward, locationConfidence: this.confidenceOf(concealed, false) }]
        : withStretch(northward, [0.3, 0.52], 'approximate')
    return stretches.map((stretch) => ({
      kind: 'fault',
      id: this.id(),
      geometry: this.lineGeometry(stretch.line),
      properties: {
        ...this.lineProperties(stretch.locationConfidence),
        name: 'Cormorant fault',
        type: 'normal',
        side: 'right',
        dip: null,
      },
    }))
  }

  markerBed({ line }: MapLine): ItemOf<'other-line'> {
    return {
      kind: 'other-line',
      id: this.id(),
      geometry: this.lineGeometry(line),
      properties: { ...this.lineProperties('certain'), name: markerBed.name, type: 'marker-bed' },
    }
  }

  trace({ hinge, line, concealed, axis }: Trace): ItemOf<'axial-trace'> {
    const middle = this.toSheet(line[Math.floor(line.length / 2)] ?? [0, 0])
    return {
      kind: 'axial-trace',
      id: this.id(),
      geometry: this.lineGeometry(line),
      properties: {
        ...this.lineProperties(this.confidenceOf(concealed, false)),
        name: this.foldName(hinge),
        form: hinge.form,
        side: 'right',
        plunge: axis && Math.round(axis.plunge),
        trend: axis && normalizeAzimuth(Math.round(axis.gridTrend + this.options.convergenceAt(middle))),
        doubly: 'no',
        otherPlunge: null,
      },
    }
  }

  attitude(station: Station, number: number): ItemOf<'attitude'> {
    const at = this.toSheet(station.at)
    const plane = {
      strike: normalizeAzimuth(Math.round(station.gridStrike + this.options.convergenceAt(at))),
      dip: Math.round(station.dip),
      overturned: station.overturned,
    }
    return {
      kind: 'attitude',
      id: this.id(),
      geometry: { type: 'Point', coordinates: at },
      properties: {
        type: 'bedding',
        ...plane,
        station: `${this.options.stationPrefix}-${String(number).padStart(3, '0')}`,
        reading: {
          text: formatAttitude(plane, 'strike-dip'),
          convention: 'strike-dip',
          northReference: 'true',
          declination: null,
        },
        note: '',
      },
    }
  }

  label({ at, unit }: Label, units: readonly ItemOf<'unit'>[]): ItemOf<'unit-label'> {
    const cover = coverUnits.findIndex((described) => described.cover === unit)
    const item = units[typeof unit === 'number' ? coverUnits.length + unit : cover]
    if (!item) throw new RangeError(`There is no unit ${unit}.`)
    return {
      kind: 'unit-label',
      id: this.id(),
      geometry: { type: 'Point', coordinates: this.toSheet(at) },
      properties: { unit: item.id, identity: 'certain', note: '' },
    }
  }

  /** Folds are named in the order in which they are met, from west to east; both blocks know a fold by one name. */
  private foldName({ form, across }: Trace['hinge']): string {
    const key = `${form} ${across}`
    const taken = [...this.foldNumbers.keys()].filter((other) => other.startsWith(form)).length
    const name = this.foldNumbers.get(key) ?? `${foldNames[form][taken] ?? 'Outer'} ${form}`
    this.foldNumbers.set(key, name)
    return name
  }

  private confidenceOf(concealed: boolean, vague: boolean): LocationConfidence {
    if (concealed) return 'concealed'
    return vague ? 'approximate' : 'certain'
  }

  private lineProperties(locationConfidence: LocationConfidence) {
    return { locationConfidence, identity: 'certain' as const, name: '', note: '' }
  }

  private lineGeometry(line: Line) {
    return { type: 'LineString' as const, coordinates: line.map((place) => this.toSheet(place)) }
  }

  private toSheet([x, y]: XY): XY {
    return snapToGrid([this.options.origin[0] + x, this.options.origin[1] + y])
  }

  private id(): string {
    return randomId(this.random)
  }
}
