import { z } from 'zod'
import { lineGeometrySchema, noGeometrySchema, pointGeometrySchema } from './geometry'
import { sheetFacePropertiesSchema, unitPropertiesSchema } from './legend'
import {
  axialTracePropertiesSchema,
  contactPropertiesSchema,
  faultPropertiesSchema,
  otherLinePropertiesSchema,
} from './lines'
import {
  attitudePropertiesSchema,
  lineationPropertiesSchema,
  lineationWords,
  placeWords,
  stationPropertiesSchema,
  unitLabelPropertiesSchema,
} from './points'

const id = z.uuid()
const line = { id, geometry: lineGeometrySchema }
const point = { id, geometry: pointGeometrySchema }
const placeless = { id, geometry: noGeometrySchema }

/** Everything that makes a sheet is an item; its kind says what geometry and properties it has. */
export const itemSchema = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('contact'), ...line, properties: contactPropertiesSchema }),
    z.strictObject({ kind: z.literal('fault'), ...line, properties: faultPropertiesSchema }),
    z.strictObject({ kind: z.literal('axial-trace'), ...line, properties: axialTracePropertiesSchema }),
    z.strictObject({ kind: z.literal('other-line'), ...line, properties: otherLinePropertiesSchema }),
    z.strictObject({ kind: z.literal('attitude'), ...point, properties: attitudePropertiesSchema }),
    z.strictObject({ kind: z.literal('lineation'), ...point, properties: lineationPropertiesSchema }),
    z.strictObject({ kind: z.literal('station'), ...point, properties: stationPropertiesSchema }),
    z.strictObject({ kind: z.literal('unit-label'), ...point, properties: unitLabelPropertiesSchema }),
    z.strictObject({ kind: z.literal('unit'), ...placeless, properties: unitPropertiesSchema }),
    z.strictObject({ kind: z.literal('sheet-face'), ...placeless, properties: sheetFacePropertiesSchema }),
  ])
  .meta({ id: 'Item', description: 'An item of a sheet; geometry in the sheet CRS, metres.' })

export type Item = z.infer<typeof itemSchema>
export type ItemKind = Item['kind']
export type ItemOf<K extends ItemKind> = Extract<Item, { kind: K }>

export const lineKinds = ['contact', 'fault', 'axial-trace', 'other-line'] as const
export const pointKinds = ['attitude', 'lineation', 'station', 'unit-label'] as const
export const placelessKinds = ['unit', 'sheet-face'] as const
export const itemKinds = [...lineKinds, ...pointKinds, ...placelessKinds] as const

export type LineItem = ItemOf<(typeof lineKinds)[number]>
export type PointItem = ItemOf<(typeof pointKinds)[number]>

export const isLineItem = (item: Item): item is LineItem => item.geometry?.type === 'LineString'
export const isPointItem = (item: Item): item is PointItem => item.geometry?.type === 'Point'

/** What a person calls an item: a place and a lineation by its type, another by its kind. */
export function itemWord(item: Item): string {
  if (item.kind === 'station') return placeWords[item.properties.type]
  if (item.kind === 'lineation') return lineationWords[item.properties.type]
  return kindWords[item.kind].one
}

/** What a person calls one and several items of a kind. */
export const kindWords: Record<ItemKind, { one: string; many: string }> = {
  contact: { one: 'contact', many: 'contacts' },
  fault: { one: 'fault', many: 'faults' },
  'axial-trace': { one: 'axial trace', many: 'axial traces' },
  'other-line': { one: 'line', many: 'lines' },
  attitude: { one: 'attitude', many: 'attitudes' },
  lineation: { one: 'lineation', many: 'lineations' },
  station: { one: 'station', many: 'stations' },
  'unit-label': { one: 'unit label', many: 'unit labels' },
  unit: { one: 'unit', many: 'units' },
  'sheet-face': { one: 'sheet face', many: 'sheet faces' },
}
