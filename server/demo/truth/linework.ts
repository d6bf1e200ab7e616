import type { Metres, XY } from '@shared/units'
import { levelLines, type Line } from './contours'
import type { CoverKind } from './cover'
import { cutLine, isClosed, lengthOf, thin, withNodes } from './cut-lines'
import type { Dike, Series, Side } from './island'
import { reachesEdge, sampleField } from './lattice'
import { atLevel, keptParts, sides, SHORTEST_RING, type Condition, type MapBounds } from './map-bounds'
import { foldedLayers, levelsOf, markerBeds, youngerLayers } from './units'
import type { Surface } from './vectors'

/** What a line of the map is. */
export type LineSubject =
  | { kind: 'contact'; level: Metres; series: Series; side: Side }
  | { kind: 'unconformity' | 'thrust'; side: Side }
  | { kind: 'fault' }
  | { kind: 'cover'; cover: CoverKind }
  | { kind: 'marker-bed'; name: string; level: Metres; series: Series; side: Side }
  | { kind: 'dike'; name: string }

/** A line of the map, metres from the island's origin. */
export interface MapLine {
  subject: LineSubject
  line: Line
  /** Whether it lies beneath younger cover. */
  concealed: boolean
}

/** How far a drawn line may depart from the true one: a twentieth of a pen's width at 1:24 000. */
const TOLERANCE: Metres = 0.6
const LONGEST_PIECE: Metres = 150
/** Concealed pieces bound nothing; shorter than two dots they only smudge. */
const SHORTEST_CONCEALED: Metres = 60

/** All linework of an extent, and the small closed contacts that were left out. Lines that meet share a vertex: what ends
 *  at others comes before them, so that they know where. */
export function makeLinework(bounds: MapBounds): { lines: MapLine[]; leftOut: Line[] } {
  const rock = [
    ...sides.flatMap((side) => foldedLines(bounds, side, 'lower')),
    ...sides.flatMap((side) => foldedLines(bounds, side, 'upper')),
    ...sides.flatMap((side) => youngerLines(bounds, side)),
    ...sides.flatMap((side) => thrustLines(bounds, side)),
    ...sides.flatMap((side) => unconformityLines(bounds, side)),
  ]
  const isSmall = ({ line }: MapLine) => isClosed(line) && lengthOf(line) < SHORTEST_RING
  return {
    leftOut: [...bounds.leftOut, ...rock.filter(isSmall).map(({ line }) => line)],
    lines: [
      ...rock.filter((line) => !isSmall(line)),
      ...bounds.truth.island.dikes.flatMap((dike) => dikeLines(bounds, dike)),
      ...faultLines(bounds),
      ...coverOutlines(bounds),
    ],
  }
}

/** A line before it is cut: where it is, what ends at it, and whether others must meet it. */
interface Uncut {
  lines: readonly Line[]
  own: Surface
  conditions: readonly Condition[]
  /** Places of other lines that end here. */
  nodes: readonly XY[]
  bounds: boolean
}

/** Those parts of a rock's lines that meet the conditions, with the nodes of what ends at them, cut where cover begins. */
function drawn(at: MapBounds, subject: LineSubject, uncut: Uncut): MapLine[] {
  const { lines, own, conditions, nodes, bounds } = uncut
  return lines
    .flatMap((line) => keptParts(line, own, conditions, bounds))
    .flatMap((line) => at.cutAtCover(withNodes(line, nodes), own, bounds))
    .filter(({ line, concealed }) => {
      if (!concealed) return true
      const isLong = lengthOf(line) > SHORTEST_CONCEALED
      return bounds && (isLong || reachesEdge(at.lattice.extent, line))
    })
    .map(({ line, concealed }) => ({
      subject,
      line: thin(line, nodes, TOLERANCE, LONGEST_PIECE),
      concealed,
    }))
}

/** Contacts and marker beds of a folded series. A marker bed bounds nothing: nothing need meet it. */
function foldedLines(at: MapBounds, side: Side, series: 'lower' | 'upper'): MapLine[] {
  const conditions = at.conditionsOf(series, side)
  const sampled = at.sampleWhere(at.truth.island.height(series, side), conditions)
  const onLevel = (level: Metres, bounds: boolean): Uncut => ({
    lines: levelLines(sampled, level),
    own: atLevel(sampled, level),
    conditions,
    nodes: [],
    bounds,
  })
  return [
    ...levelsOf(foldedLayers).flatMap((level) =>
      drawn(at, { kind: 'contact', level, series, side }, onLevel(level, true)),
    ),
    ...markerBeds.flatMap(({ name, height }) =>
      drawn(at, { kind: 'marker-bed', name, level: height, series, side }, onLevel(height, false)),
    ),
  ]
}

function youngerLines(at: MapBounds, side: Side): MapLine[] {
  const series = 'younger'
  const conditions = at.conditionsOf(series, side)
  const sampled = at.sampleWhere(at.truth.island.height(series, side), conditions)
  return levelsOf(youngerLayers).flatMap((level) =>
    drawn(
      at,
      { kind: 'contact', level, series, side },
      {
        lines: levelLines(sampled, level),
        own: atLevel(sampled, level),
        conditions,
        nodes: [],
        bounds: true,
      },
    ),
  )
}

function thrustLines(at: MapBounds, side: Side): MapLine[] {
  const { sampled, nodes } = at.thrusts[side]
  const [onSide, beneathYounger] = at.conditionsOf('upper', side)
  const conditions = onSide && beneathYounger ? [onSide, beneathYounger] : []
  const uncut = { lines: levelLines(sampled, 0), own: sampled.surface, conditions, nodes, bounds: true }
  return drawn(at, { kind: 'thrust', side }, uncut)
}

function unconformityLines(at: MapBounds, side: Side): MapLine[] {
  const { sampled, nodes } = at.bases[side]
  const conditions = at.conditionsOf('younger', side).slice(0, 1)
  const uncut = { lines: levelLines(sampled, 0), own: sampled.surface, conditions, nodes, bounds: true }
  return drawn(at, { kind: 'unconformity', side }, uncut)
}

function faultLines(at: MapBounds): MapLine[] {
  const { sampled, nodes } = at.fault
  const uncut = { lines: levelLines(sampled, 0), own: sampled.surface, conditions: [], nodes, bounds: true }
  return drawn(at, { kind: 'fault' }, uncut)
}

/** A dike bounds nothing either. */
function dikeLines(at: MapBounds, { name, surface, extent }: Dike): MapLine[] {
  const sampled = sampleField(surface, at.truth.ground, at.lattice)
  const lines = levelLines(sampled, 0).flatMap((line) =>
    cutLine(line, sampled.surface, extent)
      .pieces.filter(({ positive }) => positive)
      .map((piece) => piece.line),
  )
  return drawn(
    at,
    { kind: 'dike', name },
    { lines, own: sampled.surface, conditions: [], nodes: [], bounds: false },
  )
}

/** Outlines of cover, each where no other cover lies on it; the lowest first, which ends at those above. */
function coverOutlines({ cover }: MapBounds): MapLine[] {
  return cover.toReversed().flatMap(({ kind, bound: { sampled, nodes } }, index) => {
    const above = cover.slice(0, cover.length - 1 - index)
    const conditions = above.map(({ bound }): Condition => ({ bound, sign: -1 }))
    return levelLines(sampled, 0)
      .filter((line) => !isClosed(line) || lengthOf(line) >= SHORTEST_RING)
      .flatMap((line) => keptParts(line, sampled.surface, conditions, true))
      .map((line) => ({
        subject: { kind: 'cover' as const, cover: kind },
        line: thin(withNodes(line, nodes), nodes, TOLERANCE, LONGEST_PIECE),
        concealed: false,
      }))
  })
}
