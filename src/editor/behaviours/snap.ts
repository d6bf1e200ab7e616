import { gridDistance } from '@shared/geometry/bearings'
import { snapToGrid } from '@shared/geometry/grid'
import type { Metres, XY } from '@shared/units'
import type { MapPort, SnapTarget } from '../map-port'
import { nearestOnLine } from '@shared/geometry/nearest'

/** Reach of snapping on screen, pixels. Vertices reach further than sides, so that a corner is never missed for its line. */
const VERTEX_REACH_PX = 11
const SIDE_REACH_PX = 8

export interface Snapped {
  /** The target's very own numbers where it is a vertex or point; on the 1 mm grid where it is a side. */
  at: XY
  to: SnapTarget | null
  /** Item that it snapped to; null for the neatline, for the line being drawn, and for nothing. */
  id: string | null
}

interface Candidate extends Snapped {
  to: SnapTarget
  distance: Metres
}

export interface SnapOptions {
  /** Vertices of the line being drawn that may be returned to, for example its first. */
  own?: readonly XY[]
  /** Items not to snap to: the ones being moved. */
  exclude?: ReadonlySet<string>
  /** What attracts: all, points alone (attitudes belong to stations), or nothing (snapping is off). */
  to?: 'all' | 'points' | 'nothing'
}

const priority: Record<SnapTarget, number> = { end: 0, point: 1, vertex: 1, line: 2 }

/** The place that a pointer means: an end of a line before its other vertices and stations, those before its side. */
export function snap(map: MapPort, at: XY, { own = [], exclude, to = 'all' }: SnapOptions = {}): Snapped {
  const free: Snapped = { at: snapToGrid(at), to: null, id: null }
  if (to === 'nothing') return free
  const px = map.metresPerPx()
  const reach = VERTEX_REACH_PX * px
  const found: Candidate[] = own.map((vertex) => candidate(vertex, 'end', null, at))
  for (const { id, line } of to === 'all' ? map.linesNear(at, reach) : []) {
    if (id !== null && exclude?.has(id)) continue
    line.forEach((vertex, index) => {
      const isEnd = id !== null && (index === 0 || index === line.length - 1)
      found.push(candidate(vertex, isEnd ? 'end' : 'vertex', id, at))
    })
    const side = nearestOnLine(line, at)
    if (side.distance <= SIDE_REACH_PX * px) found.push(candidate(snapToGrid(side.at), 'line', id, at))
  }
  for (const point of map.pointsNear(at, reach)) {
    if (!exclude?.has(point.id)) found.push(candidate(point.at, 'point', point.id, at))
  }
  const best = found
    .filter(({ distance }) => distance <= reach)
    .sort((a, b) => priority[a.to] - priority[b.to] || a.distance - b.distance)[0]
  return best ? { at: best.at, to: best.to, id: best.id } : free
}

const candidate = (vertex: XY, to: SnapTarget, id: string | null, at: XY): Candidate => ({
  at: vertex,
  to,
  id,
  distance: gridDistance(vertex, at),
})
