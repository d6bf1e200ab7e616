import type { UnitProperties } from '../items/legend'
import { findTimeDivision } from '../time-scale/periods'

/** Distance between the ranks of neighbours that were never moved. */
export const RANK_STEP = 10

/** What ordering needs to know of a unit. */
export type Ranked = Pick<UnitProperties, 'rank' | 'age'>

/** Units from the youngest to the oldest, as the legend lists them. */
export const byRank = <U extends { properties: Ranked }>(units: readonly U[]): U[] =>
  units.toSorted((a, b) => a.properties.rank - b.properties.rank)

/** A rank between two neighbours; beyond the ends one step further. Undefined where two neighbours share a rank or
 *  stand so close that no number lies between them: then all need new ranks (see `ranksInOrder`). */
export function rankBetween(above: number | undefined, below: number | undefined): number | undefined {
  if (above === undefined && below === undefined) return RANK_STEP
  if (above === undefined) return (below ?? 0) - RANK_STEP
  if (below === undefined) return above + RANK_STEP
  const middle = (above + below) / 2
  return middle > above && middle < below ? middle : undefined
}

/** Fresh ranks for so many units, in steps. */
export const ranksInOrder = (count: number): number[] =>
  Array.from({ length: count }, (_, index) => (index + 1) * RANK_STEP)

/** Place of a new unit among the others by its age: after the last of its own age; else before the first older one;
 *  at the foot where the age names no division of the time scale. Index into `sorted`, 0 to its length.
 *  @param sorted units by rank, youngest first */
export function placeForAge(age: string, sorted: readonly Ranked[]): number {
  const same = sorted.findLastIndex((unit) => sameAge(unit.age, age))
  if (same >= 0) return same + 1
  const base = findTimeDivision(age)?.baseMa
  if (base === undefined) return sorted.length
  const older = sorted.findIndex((unit) => (findTimeDivision(unit.age)?.baseMa ?? -Infinity) > base)
  return older >= 0 ? older : sorted.length
}

/** Whether two ages stand under one heading. */
export const sameAge = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase()

/** Ranks that put a unit at another place of the list: of that unit alone where a number lies between its new neighbours,
 *  else of all. Ids with their new rank; empty where it stands there already.
 *  @param sorted units by rank   @param place index that the unit shall have afterwards */
export function ranksAfterMove(
  sorted: readonly { id: string; properties: Ranked }[],
  id: string,
  place: number,
): { id: string; rank: number }[] {
  const moved = sorted.find((unit) => unit.id === id)
  if (!moved || sorted.indexOf(moved) === place) return []
  const order = sorted.filter((unit) => unit !== moved)
  const rank = rankBetween(order[place - 1]?.properties.rank, order[place]?.properties.rank)
  if (rank !== undefined) return [{ id, rank }]
  order.splice(place, 0, moved)
  const ranks = ranksInOrder(order.length)
  return order.map((unit, index) => ({ id: unit.id, rank: ranks[index] ?? 0 }))
}
