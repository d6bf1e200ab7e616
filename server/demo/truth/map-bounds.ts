import type { Metres, XY } from '@shared/units'
import type { Line } from './contours'
import type { CoverKind } from './cover'
import { cutLine } from './cut-lines'
import type { SpaceField } from './fold-belt'
import type { Series, Side } from './island'
import { nodesWhere, sample, sampleField, type Lattice, type Sampled } from './lattice'
import { settle } from './small-rings'
import type { Truth } from './truth'
import { foldedLayers, layerAt, youngerLayers } from './units'
import type { Surface } from './vectors'

/** A line at which others end: its surface, and the places where they do. */
export interface Bound {
  sampled: Sampled
  nodes: XY[]
}

/** On which side of a bound something lies. */
export interface Condition {
  bound: Bound
  sign: 1 | -1
}

/** An area of the map: what it shows, and a key that differs between areas that a line parts. */
export interface Area {
  key: string
  /** Label of the unit in the legend, or the kind of cover. */
  shows: string
  isCover: boolean
}

export const sides: readonly Side[] = ['west', 'east']

/** Closed lines shorter than this, some 15 mm on the map, are left out. */
export const SHORTEST_RING: Metres = 360

/** What divides the map of an extent: the faults, the base of the younger beds, the cover; without what is too small. */
export class MapBounds {
  /** Closed lines left out: what stands inside is shown as what surrounds them. */
  readonly leftOut: Line[] = []
  readonly fault: Bound
  readonly thrusts: Record<Side, Bound>
  readonly bases: Record<Side, Bound>
  readonly cover: readonly { kind: CoverKind; bound: Bound }[]

  constructor(
    readonly truth: Truth,
    readonly lattice: Lattice,
  ) {
    const { island, ground } = truth
    const ofField = (field: SpaceField) => this.settled(sampleField(field, ground, lattice))
    this.fault = ofField(island.fault)
    this.thrusts = { west: ofField(island.thrust('west')), east: ofField(island.thrust('east')) }
    this.bases = {
      west: ofField(island.height('younger', 'west')),
      east: ofField(island.height('younger', 'east')),
    }
    this.cover = truth.cover.map(({ kind, surface }) => ({
      kind,
      bound: this.settled(sample(surface, lattice)),
    }))
  }

  private settled(sampled: Sampled): Bound {
    const { sampled: cleared, leftOut } = settle(sampled, SHORTEST_RING)
    this.leftOut.push(...leftOut)
    return { sampled: cleared, nodes: [] }
  }

  /** Where a series crops out, cover aside. The highest bound comes first. */
  conditionsOf(series: Series, side: Side): Condition[] {
    const onSide: Condition = { bound: this.fault, sign: side === 'east' ? 1 : -1 }
    if (series === 'younger') return [onSide, { bound: this.bases[side], sign: 1 }]
    return [
      onSide,
      { bound: this.bases[side], sign: -1 },
      { bound: this.thrusts[side], sign: series === 'upper' ? 1 : -1 },
    ]
  }

  /** Samples a field where the conditions are met. */
  sampleWhere(field: SpaceField, conditions: readonly Condition[]): Sampled {
    const met = conditions.map(({ bound, sign }) => [bound.sampled, sign] as const)
    return sampleField(field, this.truth.ground, this.lattice, nodesWhere(this.lattice, met))
  }

  /** A line cut where cover begins; nothing is known beneath the sea.
   *  @param bounds whether the cover's outline gets a node where the line was cut */
  cutAtCover(line: Line, own: Surface, bounds: boolean): { line: Line; concealed: boolean }[] {
    return this.cover.reduce<{ line: Line; concealed: boolean }[]>(
      (pieces, { kind, bound }) =>
        pieces.flatMap((piece) => {
          if (piece.concealed) return [piece]
          const cut = cutLine(piece.line, own, bound.sampled.surface)
          if (bounds) bound.nodes.push(...cut.nodes)
          return cut.pieces
            .filter(({ positive }) => !(positive && kind === 'sea'))
            .map((part) => ({ line: part.line, concealed: part.positive }))
        }),
      [{ line, concealed: false }],
    )
  }

  /** The area of the map that a place belongs to. */
  areaAt(xy: XY): Area {
    const cover = this.cover.find(({ bound }) => bound.sampled.surface(xy) > 0)
    if (cover) return { key: cover.kind, shows: cover.kind, isCover: true }
    const side = this.fault.sampled.surface(xy) > 0 ? 'east' : 'west'
    const series = this.seriesAt(xy, side)
    const { island, ground } = this.truth
    const height = island.height(series, side).value(xy, ground(xy))
    const { label } = layerAt(series === 'younger' ? youngerLayers : foldedLayers, height)
    return { key: `${side} ${series} ${label}`, shows: label, isCover: false }
  }

  private seriesAt(xy: XY, side: Side): Series {
    if (this.bases[side].sampled.surface(xy) > 0) return 'younger'
    return this.thrusts[side].sampled.surface(xy) > 0 ? 'upper' : 'lower'
  }
}

/** The parts of a line that meet the conditions. @param bounds whether a bound gets a node where the line was cut */
export function keptParts(
  line: Line,
  own: Surface,
  conditions: readonly Condition[],
  bounds: boolean,
): Line[] {
  return conditions.reduce<Line[]>(
    (parts, { bound, sign }) =>
      parts.flatMap((part) => {
        const cut = cutLine(part, own, bound.sampled.surface)
        if (bounds) bound.nodes.push(...cut.nodes)
        return cut.pieces.filter(({ positive }) => positive === sign > 0).map((piece) => piece.line)
      }),
    [line],
  )
}

/** A sampled surface from whose values a level is taken away; its samples stay as they are. */
export const atLevel =
  ({ surface }: Sampled, level: Metres): Surface =>
  (xy) =>
    surface(xy) - level
