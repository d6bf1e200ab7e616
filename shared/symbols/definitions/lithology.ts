import type { UnitProperties } from '../../items/legend'
import { beddedPatterns } from './lithology/bedded'
import { depositPatterns } from './lithology/deposits'
import { igneousPatterns } from './lithology/igneous'
import { metamorphicPatterns } from './lithology/metamorphic'
import type { LithologyPattern } from './lithology/pattern'

/** The area patterns, in the order in which they are offered. One ink, lines of 0.13 mm, sparse enough that linework and
 *  labels read on them. The standard's numbers for such patterns were not verified one by one, so none is given. */
export const lithologyPatterns: readonly LithologyPattern[] = [
  ...beddedPatterns,
  ...igneousPatterns,
  ...metamorphicPatterns,
  ...depositPatterns,
]

const patternsById: ReadonlyMap<UnitProperties['pattern'], LithologyPattern> = new Map(
  lithologyPatterns.map((pattern) => [pattern.id, pattern]),
)

/** The pattern that a unit states; undefined where it has none, as units written before there were patterns. */
export const findPattern = (pattern: UnitProperties['pattern']): LithologyPattern | undefined =>
  patternsById.get(pattern)
