import Flatbush from 'flatbush'
import type { Item, ItemOf, PointItem } from '@shared/items/item'
import { importanceOf, planesApart, type Standing } from '@shared/symbols/importance'
import { pointEntryIdOf } from '@shared/symbols/point-entries'
import { mmPerMetreAtScale } from '@shared/symbols/frame'
import type { Degrees, Metres, Millimetres } from '@shared/units'

/** Two symbols nearer than this crowd each other: a strike line is 5.6 mm long and its figure stands
 *  beside it. Near print size, where everything is shown
 *  however crowded, only the nearest give way. */
const CLEAR: Millimetres = 7
/** Unit letters are smaller, and were given room in print. */
const LABELS_CLEAR: Millimetres = 5
const shareAt = (step: number): number => Math.min(1, 0.2 + 0.2 * step)
/** Steps to the octave at which symbols drop out when one zooms out. */
const STEPS_PER_OCTAVE = 4
/** Steps that are told apart: beyond, a sheet is smaller than its symbols. */
const MOST_STEPS = 28
/** Neighbours of the same sort that a plane is compared with. */
const NEIGHBOURS = 3

/** Points with a symbol. Unit letters give way to one another only: an area without any says less than a crowded one. */
type ThinnedPoint = Exclude<PointItem, { kind: 'unit-label' }>

/** The step of a zoom: 0 from the print's size on, where everything is shown; then growing with every step farther out.
 *  @param relative ground millimetres in symbol millimetres, as a share of those of the print */
export const thinningStep = (relative: number): number =>
  relative > 0.999 ? 0 : Math.min(MOST_STEPS, Math.max(1, Math.ceil(-Math.log2(relative) * STEPS_PER_OCTAVE)))

/** For every crowded point, the farthest step of zooming out at which it is still shown; those that have room at all steps are
 *  not listed. Decided over the whole sheet, so panning changes nothing; from the farthest step
 *  inward, each step keeping what the one before showed, so a symbol once shown stays shown when one zooms in.
 *  @param scale denominator of the printed scale */
export function thinOut(points: readonly PointItem[], scale: number): Map<Item, number> {
  const symbols = points.filter((item): item is ThinnedPoint => item.kind !== 'unit-label')
  const labels = points.filter((item) => item.kind === 'unit-label')
  return new Map([
    ...lastSteps(byImportance(symbols), CLEAR, scale),
    ...lastSteps(rareFirst(labels), LABELS_CLEAR, scale),
  ])
}

/** @param waiting the most important first   @param clearMm what one keeps clear of another */
function lastSteps(waiting: readonly PointItem[], clearMm: Millimetres, scale: number): Map<Item, number> {
  const steps = new Map<Item, number>()
  const shown = new Neighbourhood()
  let left = waiting
  for (let step = MOST_STEPS; step >= 1 && left.length > 0; step--) {
    const clear = clearanceAt(step, clearMm, scale)
    shown.spread(clear)
    left = left.filter((item) => {
      if (shown.hasWithin(item.geometry.coordinates, clear)) return true
      shown.add(item.geometry.coordinates)
      if (step < MOST_STEPS) steps.set(item, step)
      return false
    })
  }
  for (const item of left) steps.set(item, 0)
  return steps
}

/** Ground that a symbol keeps clear at a step; steps end where the zoom is farthest in them. */
const clearanceAt = (step: number, clearMm: Millimetres, scale: number): Metres =>
  ((clearMm * shareAt(step)) / mmPerMetreAtScale(scale)) * 2 ** (step / STEPS_PER_OCTAVE)

/** Labels of the rarest unit first, so that every unit keeps one as long as may be; of equals, always the same one. */
function rareFirst(labels: readonly ItemOf<'unit-label'>[]): readonly PointItem[] {
  const counts = new Map<string, number>()
  for (const { properties } of labels) counts.set(properties.unit, (counts.get(properties.unit) ?? 0) + 1)
  const countOf = (label: ItemOf<'unit-label'>): number => counts.get(label.properties.unit) ?? 0
  return labels.toSorted((a, b) => countOf(a) - countOf(b) || (a.id < b.id ? -1 : 1))
}

/** The most important first; of equals, always the same one. */
function byImportance(places: readonly ThinnedPoint[]): ThinnedPoint[] {
  const distinctness = distinctnessOf(places)
  const sorts = new Map(places.map((item) => [item, pointEntryIdOf(item)]))
  const counts = new Map<string, number>()
  for (const sort of sorts.values()) counts.set(sort, (counts.get(sort) ?? 0) + 1)
  const standingOf = (item: ThinnedPoint): Standing => ({
    distinctness: distinctness.get(item) ?? 0,
    alike: counts.get(sorts.get(item) ?? '') ?? 1,
  })
  return places
    .map((item) => ({ item, importance: importanceOf(item, standingOf(item)) }))
    .toSorted((a, b) => b.importance - a.importance || (a.item.id < b.item.id ? -1 : 1))
    .map(({ item }) => item)
}

/** How far each attitude is from the like ones nearest to it; one that stands alone is as distinct as can be. */
function distinctnessOf(places: readonly ThinnedPoint[]): Map<ThinnedPoint, Degrees> {
  const found = new Map<ThinnedPoint, Degrees>()
  const attitudes = places.filter((item) => item.kind === 'attitude')
  for (const type of new Set(attitudes.map((item) => item.properties.type))) {
    const like = attitudes.filter((item) => item.properties.type === type)
    const tree = new Flatbush(like.length)
    for (const { geometry } of like) tree.add(geometry.coordinates[0], geometry.coordinates[1])
    tree.finish()
    for (const item of like) {
      const [east, north] = item.geometry.coordinates
      const near = tree.neighbors(east, north, NEIGHBOURS + 1).flatMap((index) => like[index] ?? [])
      const apart = near
        .filter((other) => other !== item)
        .map((other) => planesApart(item.properties, other.properties))
      found.set(item, Math.min(90, ...apart))
    }
  }
  return found
}

/** One number for a square: rows and columns of a sheet's metres fit in 26 bits each. */
const squareKey = (column: number, row: number): number => column * 2 ** 26 + row

/** Places by squares of the ground, to ask whether one is near. */
class Neighbourhood {
  private readonly places: (readonly [number, number])[] = []
  private squares = new Map<number, (readonly [number, number])[]>()
  private size: Metres = 1

  /** Sets the squares' size; questions reach one square around. */
  spread(size: Metres): void {
    this.size = size
    this.squares = new Map()
    for (const place of this.places) this.put(place)
  }

  add(place: readonly [number, number]): void {
    this.places.push(place)
    this.put(place)
  }

  hasWithin([east, north]: readonly [number, number], reach: Metres): boolean {
    const [column, row] = [Math.floor(east / this.size), Math.floor(north / this.size)]
    for (let x = column - 1; x <= column + 1; x++) {
      for (let y = row - 1; y <= row + 1; y++) {
        const near = this.squares.get(squareKey(x, y))
        if (near?.some(([e, n]) => (e - east) ** 2 + (n - north) ** 2 < reach * reach)) return true
      }
    }
    return false
  }

  private put(place: readonly [number, number]): void {
    const key = squareKey(Math.floor(place[0] / this.size), Math.floor(place[1] / this.size))
    const known = this.squares.get(key)
    if (known) known.push(place)
    else this.squares.set(key, [place])
  }
}
