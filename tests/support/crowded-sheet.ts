import type { Sheet } from '@shared/api/sheets'
import { itemSchema, type Item } from '@shared/items/item'
import type { LonLat, XY } from '@shared/units'
import { seededRandom, type Random } from '@shared/seeded-random'
import { sheetProjection } from '@shared/geometry/projection'

const WEST = 284_000
const SOUTH = 5_278_000
const EAST = 294_000
const NORTH = 5_289_000

/** A sheet of 10 × 11 km at 1:24 000, without a server. */
export function aCrowdedSheet(): Sheet {
  const proj4 = '+proj=utm +zone=26 +datum=WGS84 +units=m +no_defs'
  const { toLonLat } = sheetProjection(proj4)
  const neatline: XY[] = [
    [WEST, SOUTH],
    [EAST, SOUTH],
    [EAST, NORTH],
    [WEST, NORTH],
    [WEST, SOUTH],
  ]
  return {
    number: 'MI-14',
    title: 'Gannet Head, Merrow Island',
    scale: 24_000,
    crs: { srid: 32626, name: 'WGS 84 / UTM zone 26N', proj4 },
    neatline,
    footprint: neatline.map((xy): LonLat => toLonLat(xy)),
    page: { width: 841, height: 594 },
    state: 'drafting',
    revision: 1,
    edition: null,
    myRoles: [],
    lastEntry: null,
  }
}

/** So many lines and attitudes all over that sheet: of ten lines six are contacts, two faults with their decorations, one a
 *  plunging fold and one a marker bed; each in one of the four location confidences. */
export function crowdedItems(lines: number, attitudes: number): Item[] {
  const random = seededRandom(20_261_201)
  const confidences = ['certain', 'certain', 'approximate', 'inferred', 'concealed']
  const pick = <T>(of: readonly T[]): T => of[Math.floor(random() * of.length)] as T // The list is never empty.
  const idOf = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`
  const kinds = ['contact', 'contact', 'contact', 'contact', 'contact', 'contact', 'fault', 'fault']
  const drawn = Array.from({ length: lines }, (_, index) => {
    const kind = [...kinds, 'axial-trace', 'other-line'][index % 10] ?? 'contact'
    const coordinates = wavingLine(random)
    const locationConfidence = pick(confidences)
    const own =
      kind === 'fault'
        ? { type: pick(['unspecified', 'normal', 'thrust', 'left-lateral']) }
        : kind === 'axial-trace'
          ? { form: pick(['anticline', 'syncline']), plunge: 20, trend: 45 }
          : kind === 'other-line'
            ? { type: 'marker-bed' }
            : {}
    return { kind, geometry: { type: 'LineString', coordinates }, properties: { locationConfidence, ...own } }
  })
  const points = Array.from({ length: attitudes }, () => ({
    kind: 'attitude',
    geometry: {
      type: 'Point',
      coordinates: [WEST + random() * (EAST - WEST), SOUTH + random() * (NORTH - SOUTH)],
    },
    properties: {
      type: pick(['bedding', 'bedding', 'bedding', 'foliation', 'joint']),
      strike: Math.floor(random() * 360),
      dip: 1 + Math.floor(random() * 89),
    },
  }))
  return [...drawn, ...points].map((item, index) => itemSchema.parse({ id: idOf(index), ...item }))
}

/** A line of forty vertices, 400 to 1 600 m long. */
function wavingLine(random: Random): XY[] {
  const [east, north] = [WEST + random() * (EAST - WEST), SOUTH + random() * (NORTH - SOUTH)]
  const bearing = 0.6 + (random() - 0.5) * 0.8
  const step = (400 + random() * 1200) / 40
  return Array.from({ length: 40 }, (_, index): XY => {
    const [along, across] = [index * step, 30 * Math.sin(index / 4)]
    return [
      east + along * Math.sin(bearing) + across * Math.cos(bearing),
      north + along * Math.cos(bearing) - across * Math.sin(bearing),
    ]
  })
}
