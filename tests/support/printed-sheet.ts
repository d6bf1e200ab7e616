import type { Sheet } from '@shared/api/sheets'
import { sheetProjection } from '@shared/geometry/projection'
import { itemSchema, type Item } from '@shared/items/item'
import type { EditionStatement } from '@shared/sheet-face/edition-statement'
import type { DisplayList, TextMark } from '@shared/symbols/display-list'
import type { LonLat, XY } from '@shared/units'

const UTM_26N = '+proj=utm +zone=26 +datum=WGS84 +units=m +no_defs'

/** A closed rectangle, counter-clockwise. */
export const rectangleRing = (west: number, south: number, east: number, north: number): XY[] => [
  [west, south],
  [east, south],
  [east, north],
  [west, north],
  [west, south],
]

/** A sheet of 10 × 11 km at 1:24 000 on A1. */
export function aPrintedSheet(overrides: Partial<Sheet> = {}): Sheet {
  const neatline = overrides.neatline ?? rectangleRing(284_000, 5_278_000, 294_000, 5_289_000)
  const crs = overrides.crs ?? { srid: 32626, name: 'WGS 84 / UTM zone 26N', proj4: UTM_26N }
  const { toLonLat } = sheetProjection(crs.proj4)
  return {
    number: 'MI-14',
    title: 'Gannet Head, Merrow Island',
    scale: 24_000,
    crs,
    neatline,
    footprint: neatline.map((xy): LonLat => toLonLat(xy as XY)),
    page: { width: 841, height: 594 },
    state: 'drafting',
    revision: 37,
    edition: null,
    myRoles: [],
    lastEntry: null,
    ...overrides,
  }
}

export const released: EditionStatement = {
  edition: 1,
  revision: 37,
  released: { at: '2026-12-01T10:00:00.000Z', approvedBy: 'Edda Marr' },
}

const idOf = (number: number): string => `00000000-0000-4000-8000-${String(number).padStart(12, '0')}`

/** A legend of so many units, three to an age, each with a description of so many words. */
export function unitItems(count: number, words = 6): Item[] {
  return Array.from({ length: count }, (_, rank) =>
    itemSchema.parse({
      kind: 'unit',
      id: idOf(rank),
      geometry: null,
      properties: {
        label: `U${rank}`,
        name: `Unit number ${rank}`,
        age: `Age ${Math.floor(rank / 3)}`,
        colour: '#c9a26b',
        description: Array.from({ length: words }, (_, word) => `word${word}`).join(' '),
        rank,
      },
    }),
  )
}

/** One item of each sort that a small map has: contacts, a fault, a fold, attitudes. */
export function mapItems(): Item[] {
  const line = (north: number): object => ({
    type: 'LineString',
    coordinates: [
      [284_500, north],
      [293_500, north],
    ],
  })
  const point = { type: 'Point', coordinates: [289_000, 5_283_000] }
  return [
    { kind: 'contact', geometry: line(5_279_000), properties: {} },
    { kind: 'contact', geometry: line(5_280_000), properties: { locationConfidence: 'approximate' } },
    { kind: 'fault', geometry: line(5_281_000), properties: { type: 'normal' } },
    {
      kind: 'axial-trace',
      geometry: line(5_282_000),
      properties: { form: 'anticline', plunge: 21, trend: 90 },
    },
    { kind: 'attitude', geometry: point, properties: { strike: 45, dip: 40 } },
    { kind: 'attitude', geometry: point, properties: { strike: null, dip: 0 } },
  ].map((item, index) => itemSchema.parse({ id: idOf(900_000 + index), ...item }))
}

export const textsOf = (list: DisplayList): TextMark[] =>
  list.flatMap((mark) => (mark.mark === 'text' ? [mark] : mark.mark === 'group' ? textsOf(mark.marks) : []))
