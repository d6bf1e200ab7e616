import type { UnitProperties } from '../items/legend'
import { byRank, sameAge } from './rank'

/** Units that stand under one age heading, in their order. */
export interface AgeGroup<U> {
  /** Heading; empty where no age is stated. */
  age: string
  units: U[]
}

/** The legend's units under their age headings, youngest first. An age that comes twice with another between gets two
 *  headings: the order is the editor's, and is shown as it is. */
export function groupByAge<U extends { properties: UnitProperties }>(units: readonly U[]): AgeGroup<U>[] {
  const groups: AgeGroup<U>[] = []
  for (const unit of byRank(units)) {
    const last = groups.at(-1)
    if (last && sameAge(last.age, unit.properties.age)) last.units.push(unit)
    else groups.push({ age: unit.properties.age, units: [unit] })
  }
  return groups
}
