import type { LocationConfidence } from '@shared/items/confidence'
import type { ItemOf } from '@shared/items/item'
import { normalizeAzimuth, toDegrees, toRadians, type Metres } from '@shared/units'
import type { Axis, Trace } from './axial-traces'
import type { Line } from './contours'
import { lengthOf } from './cut-lines'
import { foldName } from './fold-names'
import type { ItemFrame } from './item-frame'
import type { LineSubject, MapLine } from './linework'
import { middleOf, withStretch } from './stretches'
import type { Truth } from './truth'

/** Contacts of at least this length may be located less well along a part of them. */
const LONG: Metres = 2200
/** Faults of at least this length are located less well where they were not walked. */
const LONG_FAULT: Metres = 5000
/** Faults of at least this length state their dip. */
const WITH_DIP: Metres = 1500

/** Kinds of cover whose edge is seldom seen. */
const vagueCover = new Set(['peat', 'talus'])

/** Turns lines of the truth into items of a sheet. Near the neatline every line is as certain as on the next sheet. */
export class LineItems {
  constructor(
    private readonly frame: ItemFrame,
    private readonly truth: Truth,
  ) {}

  contacts({ line, concealed, subject }: MapLine): ItemOf<'contact'>[] {
    const note = subject.kind === 'unconformity' ? 'unconformity: worn folds beneath level beds' : ''
    return this.stretchesOf(line, concealed, subject).map(({ line: part, locationConfidence }) => {
      const isDoubtful = locationConfidence === 'inferred' && this.frame.random() < 0.4
      return {
        kind: 'contact',
        id: this.frame.id(),
        geometry: this.frame.line(part),
        properties: {
          ...basis(locationConfidence),
          ...(isDoubtful ? { identity: 'questionable', note: 'may be a change of facies' } : { note }),
        },
      }
    })
  }

  private stretchesOf(line: Line, concealed: boolean, subject: LineSubject) {
    const chance = this.frame.random()
    if (concealed) return [{ line, locationConfidence: 'concealed' as const }]
    if (subject.kind === 'cover') {
      const locationConfidence: LocationConfidence = vagueCover.has(subject.cover) ? 'approximate' : 'certain'
      return [{ line, locationConfidence }]
    }
    if (lengthOf(line) < LONG || chance > 0.45) return [{ line, locationConfidence: 'certain' as const }]
    return withStretch(
      line,
      [0.3 + chance / 4, 0.55 + chance / 2],
      chance < 0.28 ? 'approximate' : 'inferred',
    )
  }

  /** Drawn from south to north, so that the hanging wall lies on the right. */
  faults({ line, concealed, subject }: MapLine): ItemOf<'fault'>[] {
    const northward = (line[0]?.[1] ?? 0) > (line.at(-1)?.[1] ?? 0) ? line.toReversed() : line
    const stretches =
      concealed || lengthOf(line) < LONG_FAULT
        ? [{ line: northward, locationConfidence: concealed ? ('concealed' as const) : ('certain' as const) }]
        : withStretch(northward, [0.3, 0.52], 'approximate')
    const isThrust = subject.kind === 'thrust'
    return stretches.map(({ line: part, locationConfidence }) => ({
      kind: 'fault',
      id: this.frame.id(),
      geometry: this.frame.line(part),
      properties: {
        ...basis(locationConfidence),
        name: isThrust ? 'Gannet Head thrust' : 'Cormorant fault',
        type: isThrust ? 'thrust' : 'normal',
        side: 'right',
        dip: concealed || lengthOf(part) < WITH_DIP ? null : this.faultDip(subject, part),
      },
    }))
  }

  private faultDip(subject: LineSubject, line: Line): number {
    const { island, ground } = this.truth
    const surface = subject.kind === 'thrust' ? island.thrust(subject.side) : island.fault
    const at = middleOf(line)
    const [east, north, up] = surface.gradient(at, ground(at))
    return Math.round(toDegrees(Math.atan2(Math.hypot(east, north), Math.abs(up))))
  }

  other({ line, concealed, subject }: MapLine, type: 'dike' | 'vein' | 'marker-bed'): ItemOf<'other-line'> {
    return {
      kind: 'other-line',
      id: this.frame.id(),
      geometry: this.frame.line(line),
      properties: {
        ...basis(concealed ? 'concealed' : 'certain'),
        name: 'name' in subject ? subject.name : '',
        type,
      },
    }
  }

  trace({ hinge, series, line, concealed, overturned, axis }: Trace): ItemOf<'axial-trace'> {
    return {
      kind: 'axial-trace',
      id: this.frame.id(),
      geometry: this.frame.line(line),
      properties: {
        ...basis(concealed ? 'concealed' : 'certain'),
        name: foldName(this.truth.island, series, hinge),
        form: overturned ? `overturned-${hinge.form}` : hinge.form,
        // Axial surfaces lean toward the right of the lines, which run with the axes.
        side: 'right',
        ...this.plunges(axis, line),
      },
    }
  }

  private plunges(axis: Trace['axis'], line: Line) {
    const none = { plunge: null, trend: null, doubly: 'no' as const, otherPlunge: null }
    if (axis === null) return none
    if (!('atStart' in axis)) return { ...none, ...this.rounded(axis, line) }
    const [alongEast, alongNorth] = this.truth.island.axes.along
    const trend = toRadians(axis.atEnd.gridTrend)
    const goesOut = Math.sin(trend) * alongEast + Math.cos(trend) * alongNorth > 0
    return {
      ...this.rounded(axis.atEnd, line),
      doubly: goesOut ? ('outward' as const) : ('inward' as const),
      otherPlunge: Math.round(axis.atStart.plunge),
    }
  }

  private rounded({ gridTrend, plunge }: Axis, line: Line) {
    const trend = gridTrend + this.frame.convergenceAt(middleOf(line))
    return { plunge: Math.round(plunge), trend: normalizeAzimuth(Math.round(trend)) }
  }
}

const basis = (locationConfidence: LocationConfidence) => ({
  locationConfidence,
  identity: 'certain' as const,
  name: '',
  note: '',
})
