import type { Item, LineItem } from '../items/item'
import type { Millimetres, MM } from '../units'
import type { LineSymbol } from './definition'
import type { DisplayList } from './display-list'
import { lineSymbols } from './draw-item'
import { drawLine } from './draw-line'
import type { LineDrawing } from './line-drawing'
import { keptInRow } from './sample-row'

/** Something that may stand on lines of several symbols and is explained once for all of them. */
export interface LineMark {
  /** Stable name, for example `mark.questioned`. */
  id: string
  /** What it means, as the legend says it. */
  title: string
  /** Kind of line that its sample is drawn on. */
  on: LineItem['kind']
  /** What of a line's drawing makes the mark. */
  drawing: Partial<LineDrawing>
  isOn(item: Item): boolean
}

const doubly =
  (way: 'outward' | 'inward') =>
  (item: Item): boolean =>
    item.kind === 'axial-trace' && item.properties.doubly === way

/** Every such mark, in the order of the legend. */
export const lineMarks: readonly LineMark[] = [
  {
    id: 'mark.questioned',
    title: '?, identity questionable',
    isOn: (item) => 'identity' in item.properties && item.properties.identity === 'questionable',
    on: 'contact',
    drawing: { identity: 'questionable' },
  },
  {
    id: 'mark.fault-dip',
    title: 'Way and angle of dip of a fault',
    isOn: (item) =>
      item.kind === 'fault' && item.properties.dip !== null && Math.round(item.properties.dip) > 0,
    on: 'fault',
    drawing: { dip: { degrees: 60, figure: true } },
  },
  {
    id: 'mark.plunge',
    title: 'Way and angle of plunge of a fold',
    isOn: (item) =>
      item.kind === 'axial-trace' &&
      item.properties.doubly === 'no' &&
      item.properties.plunge !== null &&
      Math.round(item.properties.plunge) > 0,
    on: 'axial-trace',
    drawing: { plunge: [{ end: 'end', points: 'out', degrees: 20 }] },
  },
  {
    id: 'mark.plunge-outward',
    title: 'Fold plunging both ways from a culmination',
    isOn: doubly('outward'),
    on: 'axial-trace',
    drawing: {
      plunge: [
        { end: 'start', points: 'out', degrees: null },
        { end: 'end', points: 'out', degrees: null },
      ],
    },
  },
  {
    id: 'mark.plunge-inward',
    title: 'Fold plunging both ways into a depression',
    isOn: doubly('inward'),
    on: 'axial-trace',
    drawing: {
      plunge: [
        { end: 'start', points: 'in', degrees: null },
        { end: 'end', points: 'in', degrees: null },
      ],
    },
  },
]

/** Marks that stand on the sheet's items, in the order of the legend. */
export function marksInUse(items: Iterable<Item>): LineMark[] {
  const missing = new Set(lineMarks)
  for (const item of items) {
    for (const mark of missing) if (mark.isOn(item)) missing.delete(mark)
    if (missing.size === 0) break
  }
  return lineMarks.filter((mark) => !missing.has(mark))
}

/** The sample of a mark at its true size, in a box with its origin at the lower left: on a line across its middle, or up
 *  its left half where an arrow stands beside the line. */
export function drawMark(
  { on, drawing }: LineMark,
  { width, height }: { width: Millimetres; height: Millimetres },
): DisplayList {
  const symbol = lineSymbols.find(({ kind }) => kind === on)
  if (!symbol) throw new RangeError(`There is no symbol for ${on}.`)
  const line: MM[] = drawing.dip
    ? [
        [width / 3, 0],
        [width / 3, height],
      ]
    : [
        [0, height / 2],
        [width, height / 2],
      ]
  // The mark alone: what the symbol itself shows has its own row.
  const plain: LineSymbol = { ...symbol }
  delete plain.decoration
  const list = drawLine(plain, line, {
    locationConfidence: 'certain',
    identity: 'certain',
    attributes: { side: -1 },
    ...drawing,
  })
  return keptInRow(list, height)
}
