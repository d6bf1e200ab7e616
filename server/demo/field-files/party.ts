import { normalizeAzimuth, type Azimuth, type Degrees, type Metres, type XY } from '@shared/units'
import { convergenceAt, fromIsland } from '../merrow-island'
import { levelLines, type Line } from '../truth/contours'
import { lengthOf } from '../truth/cut-lines'
import type { MapBounds } from '../truth/map-bounds'
import { atLevel, keptParts, sides } from '../truth/map-bounds'
import { fieldNoise, misplaced, tilted } from '../truth/noise'
import { planeOfGradient, type GridPlane } from '../truth/planes'
import { normal, type Random } from '../truth/random'
import { beddingNormal, type Station } from '../truth/stations'
import type { Truth } from '../truth/truth'

/** A bedding attitude as one person read it, whole degrees from true north, with what is true there. */
export interface Reading {
  station: string
  /** Where the receiver put it, sheet metres. */
  at: XY
  strike: Azimuth
  dip: Degrees
  overturned: boolean
  truth: { at: XY; plane: GridPlane; unit: string }
}

/** A piece of a trace as one person walked it, sheet metres. */
export interface Walked {
  name: string
  line: Line
  /** Stratigraphic height that it follows. */
  level: Metres
}

/** A bedding reading with the errors of the field. */
export function read(truth: Truth, station: Station, name: string, random: Random): Reading {
  const gradient = beddingNormal(truth, station)
  const { gridStrike, dip, overturned } = planeOfGradient(tilted(gradient, fieldNoise, random))
  const at = fromIsland(misplaced(station.at, fieldNoise, random))
  const whole = Math.min(89, Math.max(1, Math.round(dip)))
  return {
    station: name,
    at,
    strike: normalizeAzimuth(Math.round(gridStrike + convergenceAt(fromIsland(station.at)))),
    dip: whole,
    overturned,
    truth: {
      at: fromIsland(station.at),
      plane: planeOfGradient(gradient),
      unit: station.rock.layer.label,
    },
  }
}

/** Readings at places in turn, named with letters and a number; every ninth station is visited twice. */
export function readAll(
  truth: Truth,
  stations: readonly Station[],
  letters: string,
  random: Random,
): Reading[] {
  return stations.flatMap((station, index) => {
    const name = `${letters}-${index + 1}`
    const once = read(truth, station, name, random)
    return index % 9 === 4 ? [once, read(truth, station, name, random)] : [once]
  })
}

/** Length of a piece that is walked at one go. */
const WALK: Metres = 750
/** Pieces begin and end so far, at most, before or beyond where they should. */
const SLIP: Metres = 7
/** A party keeps so far from the neatline. */
const INSIDE: Metres = 120
const SHORTEST_WALK: Metres = 250

/** A level of stratigraphic height within the upper plate, walked piece by piece where it is seen: pieces overlap or fall
 *  short of one another by a few metres, and their vertices are as good as the receiver. */
export function walkLevel(bounds: MapBounds, level: Metres, name: string, random: Random): Walked[] {
  const { truth, lattice } = bounds
  const seen = sides.flatMap((side) => {
    const conditions = bounds.conditionsOf('upper', side)
    const sampled = bounds.sampleWhere(truth.island.height('upper', side), conditions)
    const own = atLevel(sampled, level)
    return levelLines(sampled, level)
      .flatMap((line) => keptParts(line, own, conditions, false))
      .flatMap((line) => bounds.cutAtCover(line, own, false))
      .filter(({ concealed }) => !concealed)
      .map(({ line }) => line)
  })
  const { origin, width, height } = lattice.extent
  const isInside = ([x, y]: XY): boolean =>
    Math.min(x - origin[0], y - origin[1], origin[0] + width - x, origin[1] + height - y) > INSIDE
  return seen
    .flatMap((line) => runsOf(line, isInside))
    .filter((line) => lengthOf(line) > SHORTEST_WALK)
    .flatMap((line) => walksAlong(line, random))
    .map((line) => ({
      name,
      level,
      line: line.map((place) => fromIsland(misplaced(place, { ...fieldNoise, position: 2 }, random))),
    }))
}

/** The runs of a line's vertices that pass. */
function runsOf(line: Line, passes: (at: XY) => boolean): Line[] {
  const runs: Line[] = [[]]
  for (const at of line) {
    if (passes(at)) runs.at(-1)?.push(at)
    else runs.push([])
  }
  return runs.filter((run) => run.length > 1)
}

/** A line in walks, whose joints slip. */
function walksAlong(line: Line, random: Random): Line[] {
  const length = lengthOf(line)
  const count = Math.max(1, Math.round(length / WALK))
  const slip = () => Math.max(-SLIP, Math.min(SLIP, 4 * normal(random)))
  return Array.from({ length: count }, (_, index) =>
    between(
      line,
      index === 0 ? 0 : (length * index) / count + slip(),
      index === count - 1 ? length : (length * (index + 1)) / count + slip(),
    ),
  )
}

/** The part of a line between two lengths along it, with a vertex every 40 m or so. */
function between(line: Line, from: Metres, to: Metres): Line {
  const steps = Math.max(1, Math.round((to - from) / 40))
  return Array.from({ length: steps + 1 }, (_, step) => pointAt(line, from + ((to - from) * step) / steps))
}

function pointAt(line: Line, along: Metres): XY {
  let left = along
  for (const [index, from] of line.entries()) {
    const to = line[index + 1]
    if (!to) return from
    const length = Math.hypot(to[0] - from[0], to[1] - from[1])
    if (left <= length && length > 0) {
      const share = left / length
      return [from[0] + (to[0] - from[0]) * share, from[1] + (to[1] - from[1]) * share]
    }
    left -= length
  }
  return [0, 0]
}
