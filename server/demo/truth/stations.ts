import type { Degrees, Metres, XY } from '@shared/units'
import { contactHeights, markerBed } from './units'
import { planeOfGradient, type Block } from './field'
import type { Random } from './random'
import type { Truth } from './truth'
import { slope } from './vectors'

/** A place where the layers were measured, with what the field says there. */
export interface Station {
  at: XY
  block: Block
  gridStrike: Degrees
  dip: Degrees
  overturned: boolean
}

export interface Spacing {
  wanted: number
  apart: Metres
  /** Places to keep away from, for example unit labels. */
  clearOf: readonly XY[]
  clear: Metres
}

/** Places scattered over the folded rock, clear of contacts, fault, hinges, cover and one another. */
export function makeStations(truth: Truth, random: Random, spacing: Spacing): Station[] {
  const { width, height } = truth.extent
  const stations: Station[] = []
  for (let round = 0; round < spacing.wanted * 200 && stations.length < spacing.wanted; round++) {
    const at: XY = [150 + random() * (width - 300), 150 + random() * (height - 300)]
    if (stations.some((other) => distance(other.at, at) < spacing.apart)) continue
    if (spacing.clearOf.some((other) => distance(other, at) < spacing.clear)) continue
    if (!isClear(truth, at)) continue
    stations.push(stationAt(truth, at))
  }
  return stations
}

const distance = (a: XY, b: XY): Metres => Math.hypot(a[0] - b[0], a[1] - b[1])

/** What the field says at a place. */
export function stationAt(truth: Truth, at: XY): Station {
  const block = truth.onGround.blockAt(at)
  return { at, block, ...planeOfGradient(truth.field.gradient(at, truth.ground(at), block)) }
}

/** Room for a symbol: 100 m are 4 mm at 1:24 000. */
function isClear(truth: Truth, at: XY): boolean {
  const block = truth.onGround.blockAt(at)
  const height = truth.onGround.height(block)
  const steepness = Math.hypot(...slope(height, at))
  const near = [...contactHeights, markerBed.height].some(
    (level) => Math.abs(height(at) - level) < 90 * steepness,
  )
  const [across, hinges] = [truth.onGround.across(block)(at), truth.field.hinges]
  const onHinge = hinges.some((hinge) => Math.abs(across - hinge.across) < 110)
  const covered = truth.cover.some(({ surface, unit }) => surface(at) > (unit === 'peat' ? -0.25 : -90))
  return !near && !onHinge && !covered && Math.abs(truth.onGround.fault(at)) > 150
}
