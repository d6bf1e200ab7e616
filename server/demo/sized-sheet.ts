import type { NewSheet } from '@shared/api/sheets'
import type { Metres } from '@shared/units'
import { convergenceAt, fromIsland, islandOrigin, islandSrid, merrowTruth } from './merrow-island'
import { generateSheet, type DemoSheet } from './truth/generate-sheet'
import type { Extent } from './truth/lattice'
import { noNoise, type Noise } from './truth/noise'

/** A sheet of any size, for benchmarks. */
export interface SizedSheet {
  sheet: NewSheet
  items: DemoSheet
}

export interface SizedOptions {
  /** How many items the sheet has in all: about a hundred to a hundred thousand. */
  items: number
  seed?: number
  noise?: Noise
  /** Items on a square kilometre: 18 unless given, closer together than on the demo sheets; with 6 half of them are lines
   *  and labels, on three times the ground. */
  perKm2?: number
  number?: string
}

/** Up to this many items the sheet is worked out as finely as the demo sheets. */
const FINE_ITEMS = 5000

/** A part of the island, or of the land that its folds go on into, with as many items as are asked for: lines and labels as
 *  they come, then attitudes until the number is reached. Same options, same sheet. */
export function sizedSheet({
  items,
  seed = 1,
  noise = noNoise,
  perKm2 = 18,
  number = `BM-${items}`,
}: SizedOptions): SizedSheet {
  const width: Metres = Math.round(Math.sqrt(items / perKm2 / 1.1) * 10) * 100
  const extent: Extent = { origin: [0, 0], width, height: Math.round(width * 1.1) }
  const [west, south] = fromIsland(extent.origin)
  const cells = items <= FINE_ITEMS ? { lines: 40, areas: 25 } : { lines: 80, areas: 60 }
  return {
    sheet: {
      number,
      title: `Benchmark of ${items} items`,
      // The face stays some 42 cm wide.
      scale: Math.max(1000, Math.round(width / 420) * 1000),
      srid: islandSrid,
      area: { by: 'metres', west, south, east: west + width, north: south + extent.height },
      page: { width: 841, height: 594 },
      attitudeConvention: 'strike-dip',
      authors: 'Rosa Kelp and Tove Orr',
    },
    items: generateSheet({
      seed,
      truth: merrowTruth,
      extent,
      origin: islandOrigin,
      convergenceAt,
      measure: { allItems: items },
      prefix: 'BM',
      apart: 100,
      noise,
      cells,
    }),
  }
}
