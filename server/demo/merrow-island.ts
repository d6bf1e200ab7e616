import type { NewSheet } from '@shared/api/sheets'
import { sheetProjection } from '@shared/geometry/projection'
import type { LonLat, XY } from '@shared/units'
import { generateSheet, type DemoSheet, type SheetOptions } from './truth/generate-sheet'
import type { Extent } from './truth/lattice'
import { makeTruth } from './truth/truth'

/** South-west corner of sheet MI-14, from which the island is measured, sheet metres. */
export const islandOrigin: XY = [284_000, 5_278_000]
const [WIDTH, HEIGHT] = [10_000, 11_000]

/** WGS 84 / UTM zone 26N, as PostGIS describes it. */
export const islandSrid = 32626
const zone26 = sheetProjection('+proj=utm +zone=26 +datum=WGS84 +units=m +no_defs')
export const toLonLat = (xy: XY): LonLat => zone26.toLonLat(xy)
/** Grid convergence at a place in sheet metres, degrees, clockwise positive. */
export const convergenceAt = (xy: XY): number => zone26.convergenceAt(xy)

/** Trend of the fold axes, degrees from true north. */
const FOLD_TREND = 28

/** What is true of Merrow Island. It and its survey are invented. */
export const merrowTruth = makeTruth(
  FOLD_TREND - convergenceAt([islandOrigin[0] + WIDTH / 2, islandOrigin[1] + HEIGHT / 2]),
)

/** A place in sheet metres as metres from the island's origin, and back. */
export const toIsland = ([east, north]: readonly [number, number]): XY => [
  east - islandOrigin[0],
  north - islandOrigin[1],
]
export const fromIsland = ([x, y]: XY): XY => [islandOrigin[0] + x, islandOrigin[1] + y]

/** A sheet of the island: how it is created, and what part of the truth it shows. */
export interface MerrowSheet {
  sheet: NewSheet
  extent: Extent
  options: SheetOptions
}

interface SheetPlan {
  number: string
  title: string
  seed: number
  /** South-west corner from the island's origin. */
  corner: XY
  attitudes: number
  prefix: string
}

function merrowSheet({ number, title, seed, corner, attitudes, prefix }: SheetPlan): MerrowSheet {
  const [west, south] = fromIsland(corner)
  const extent: Extent = { origin: corner, width: WIDTH, height: HEIGHT }
  return {
    extent,
    sheet: {
      number,
      title,
      scale: 24_000,
      srid: islandSrid,
      area: { by: 'metres', west, south, east: west + WIDTH, north: south + HEIGHT },
      page: { width: 841, height: 594 },
      attitudeConvention: 'strike-dip',
      authors: 'Rosa Kelp and Tove Orr',
    },
    options: {
      seed,
      truth: merrowTruth,
      extent,
      origin: islandOrigin,
      convergenceAt,
      measure: { attitudes },
      prefix,
      apart: 290,
    },
  }
}

/** The large demo sheet. */
export const gannetHead = merrowSheet({
  number: 'MI-14',
  title: 'Gannet Head, Merrow Island',
  seed: 14,
  corner: [0, 0],
  attitudes: 320,
  prefix: 'GH',
})

/** The sheets that adjoin it in the west and in the south. */
export const dulseSound = merrowSheet({
  number: 'MI-13',
  title: 'Dulse Sound, Merrow Island',
  seed: 13,
  corner: [-WIDTH, 0],
  attitudes: 60,
  prefix: 'DS',
})
export const stormcrest = merrowSheet({
  number: 'MI-18',
  title: 'Stormcrest, Merrow Island',
  seed: 18,
  corner: [0, -HEIGHT],
  attitudes: 140,
  prefix: 'SC',
})

/** What is on a demo sheet; the same on every machine. */
export const makeSheet = ({ options }: MerrowSheet): DemoSheet => generateSheet(options)

/** All demo sheets. */
export const merrowSheets: readonly MerrowSheet[] = [gannetHead, dulseSound, stormcrest]
