import type { Item, ItemOf, LineItem } from '../items/item'
import type { UnitProperties } from '../items/legend'
import type { LineSymbol } from './definition'
import { contacts } from './definitions/contacts'
import { faults } from './definitions/faults'
import { folds } from './definitions/folds'
import { otherLines } from './definitions/other-lines'
import type { DisplayList } from './display-list'
import { drawAttitude } from './draw-attitude'
import { drawLine } from './draw-line'
import { drawLineation } from './draw-lineation'
import { drawPlace } from './draw-place'
import { drawUnitLabel, unitLabelText, type LabelStand } from './draw-unit-label'
import { toMm, type DrawingFrame } from './frame'
import type { LineDrawing } from './line-drawing'
import { placeMarks } from './place-marks'
import { plungeHeads } from './plunge-heads'

/** What some items' drawings depend on besides themselves. */
export interface DrawingContext {
  unitOf(id: string): UnitProperties | undefined
  /** Where the letters of a unit label stand, if not at its place. */
  standOf?(label: string): LabelStand | undefined
}

/** All line symbols, in the order of the palette. */
export const lineSymbols: readonly LineSymbol[] = [...contacts, ...faults, ...folds, ...otherLines]

/** The type or form that picks a line's symbol within its kind. */
export function variantOf(item: Pick<LineItem, 'kind' | 'properties'>): string {
  if ('type' in item.properties) return item.properties.type
  return 'form' in item.properties ? item.properties.form : ''
}

/** The symbol of a line item. */
export function lineSymbolOf(item: Pick<LineItem, 'kind' | 'properties'>): LineSymbol {
  const variant = variantOf(item)
  const symbol = lineSymbols.find(
    (candidate) => candidate.kind === item.kind && candidate.variant === variant,
  )
  if (!symbol) throw new RangeError(`There is no symbol for ${item.kind} ${variant}.`)
  return symbol
}

/** An item as a display list, in the frame's millimetres: a line whole, a point about its place. Units and the sheet face
 *  have no drawing of their own and give an empty list.
 *  @param context where unit labels find their letters; a label without one is drawn `?` */
export function drawItem(item: Item, frame: DrawingFrame, context?: DrawingContext): DisplayList {
  switch (item.kind) {
    case 'contact':
    case 'fault':
    case 'axial-trace':
    case 'other-line':
      return drawLineItem(item, frame)
    case 'attitude':
    case 'lineation':
    case 'station':
      return drawPointItem(item, frame)
    case 'unit-label':
      return drawUnitLabel(
        unitLabelText(item.properties, (id) => context?.unitOf(id)),
        toMm(frame, item.geometry.coordinates),
        context?.standOf?.(item.id),
      )
    case 'unit':
    case 'sheet-face':
      return []
  }
}

function drawPointItem(item: ItemOf<'attitude' | 'lineation' | 'station'>, frame: DrawingFrame): DisplayList {
  const place = item.geometry.coordinates
  const [at, convergence] = [toMm(frame, place), frame.convergenceAt(place)]
  switch (item.kind) {
    case 'attitude':
      return drawAttitude(item.properties, at, convergence)
    case 'lineation':
      return drawLineation(item.properties, at, convergence)
    case 'station':
      return drawPlace(item.properties, at, convergence)
  }
}

function drawLineItem(item: LineItem, frame: DrawingFrame): DisplayList {
  // Measured from the line's own first vertex, so that rounding is the same wherever the drawing begins, and moved there last.
  const { coordinates } = item.geometry
  const start = coordinates[0] ?? frame.origin
  const own = { ...frame, origin: start }
  const points = coordinates.map((place) => toMm(own, place))
  const [dx, dy] = toMm(frame, start)
  const { locationConfidence, identity } = item.properties
  const isLeft = 'side' in item.properties && item.properties.side === 'left'
  const list = drawLine(lineSymbolOf(item), points, {
    locationConfidence,
    identity,
    attributes: { side: isLeft ? 1 : -1 },
    ...(item.kind === 'axial-trace'
      ? { plunge: plungeHeads(item, (place) => frame.convergenceAt(place)) }
      : {}),
    ...(item.kind === 'fault' ? dipOf(item) : {}),
  })
  return dx === 0 && dy === 0 ? list : placeMarks(list, ([x, y]) => [x + dx, y + dy])
}

/** A fault plane's dip, by the whole degrees that are printed; one that lies flat dips nowhere. */
const dipOf = ({ properties: { dip } }: ItemOf<'fault'>): Pick<LineDrawing, 'dip'> =>
  dip === null || Math.round(dip) === 0 ? {} : { dip: { degrees: dip, figure: true } }
