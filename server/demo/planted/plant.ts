import type { Item } from '@shared/items/item'
import { seededRandom } from '../truth/random'
import { attributePlanters } from './attributes'
import { Bench, type Planted } from './bench'
import { edgePlanters } from './edges'
import { legendPlanters } from './legend'
import { lineworkPlanters } from './linework'
import { structurePlanters } from './structure'

/** One switch for each rule of the findings that an item can break. */
export const planters = {
  ...lineworkPlanters,
  ...attributePlanters,
  ...legendPlanters,
  ...structurePlanters,
  ...edgePlanters,
}
export type PlantedRule = keyof typeof planters
export const plantedRules = Object.keys(planters) as PlantedRule[] // Of an object that is written out above.

/** A sheet with errors planted into it, one for each rule that is named, none upon another; and what was planted where.
 *  Same items, same rules, same seed: same errors. */
export function plantErrors(
  items: readonly Item[],
  rules: readonly PlantedRule[],
  seed = 1,
): { items: Item[]; planted: Planted<PlantedRule>[] } {
  const bench = new Bench(items, seededRandom(seed))
  const planted = rules.map((rule) => ({ rule, ...planters[rule](bench) }))
  return { items: bench.items, planted }
}
