import type { NewSheet } from '@shared/api/sheets'
import { sheetProjection } from '@shared/geometry/projection'
import type { XY } from '@shared/units'
import { generateSheet, type DemoSheet, type SheetOptions } from './truth/generate-sheet'

const west = 284_000
const south = 5_278_000
const width = 10_000
const height = 11_000

/** The demo sheet as it is created. Merrow Island and its survey are invented. */
export const gannetHead: NewSheet = {
  number: 'MI-14',
  title: 'Gannet Head, Merrow Island',
  scale: 24_000,
  srid: 32626,
  area: { by: 'metres', west, south, east: west + width, north: south + height },
  page: { width: 841, height: 594 },
  attitudeConvention: 'strike-dip',
  authors: 'Rosa Kelp and Tove Orr',
}

/** WGS 84 / UTM zone 26N, as PostGIS describes it. */
const zone26 = sheetProjection('+proj=utm +zone=26 +datum=WGS84 +units=m +no_defs')
export const toLonLat = (xy: XY) => zone26.toLonLat(xy)

export const gannetHeadOptions: SheetOptions = {
  seed: 14,
  origin: [west, south],
  width,
  height,
  trend: 28,
  convergenceAt: (xy) => zone26.convergenceAt(xy),
  stations: 84,
  stationPrefix: 'GH',
}

/** What is on the demo sheet; the same on every machine. */
export const makeGannetHead = (): DemoSheet => generateSheet(gannetHeadOptions)
