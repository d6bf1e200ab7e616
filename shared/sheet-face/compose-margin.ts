import type { Sheet } from '../api/sheets'
import { sheetProjection } from '../geometry/projection'
import type { Item } from '../items/item'
import type { SheetFaceProperties } from '../items/legend'
import type { Mark } from '../symbols/display-list'
import { unitFills } from '../symbols/unit-fill'
import { marksInUse } from '../symbols/line-marks'
import type { Millimetres, XY } from '../units'
import { heightOf, space, stack, type Block } from './block'
import { colophon } from './colophon'
import { drawColumns, fillRunningOn, fillWhole, type ColumnFill } from './columns'
import { unitsById } from './compose-face'
import type { EditionStatement } from './edition-statement'
import { northDiagram } from './north-diagram'
import { neatlineBounds, pageLayout, type Box } from './page-layout'
import { findUnprintable } from './printable'
import { scaleBar, SCALE_BAR_HEIGHT } from './scale-bar'
import { cautionBox, creditsBlock, projectionBlock } from './statements'
import { entriesInUse, symbolsList } from './symbols-list'
import { titleBlock } from './title-block'
import { typeLadder, typeScale, type TypeScale } from './type-scale'
import { unitsList, type ListedUnit } from './units-list'

/** Room below the neatline for corner figures, and the white edge at the page's foot. */
const BELOW_FACE: Millimetres = 13
const FOOT: Millimetres = 9
const COLUMN_GUTTER: Millimetres = 12
/** White between title, columns and foot, at type factor 1. */
const BETWEEN: Millimetres = 4
/** Text columns: a narrower one cannot be read, a wider one loses the eye. */
const NARROWEST: Millimetres = 52
const WIDEST: Millimetres = 185
/** Narrowest column of the row of statements under the map face, and their largest type. */
const STATEMENT_WIDTH: Millimetres = 62
const STATEMENT_FACTOR = 1.35

export interface SheetFaceInput {
  sheet: Pick<Sheet, 'number' | 'title' | 'scale' | 'crs' | 'neatline' | 'page'>
  items: readonly Item[]
  edition: EditionStatement
}

export type MarginOutcome =
  | { outcome: 'composed'; marks: Mark[]; type: TypeScale }
  /** Nothing is left out to make things fit: the reason says what to do instead. */
  | { outcome: 'cannot-print'; reason: string }

/** What a sheet prints around its map face and in how many inks, from its one sheet-face item. */
export function sheetFaceOf(
  items: readonly Item[],
): Pick<SheetFaceProperties, 'authors' | 'credit' | 'printing'> {
  const item = items.find((candidate) => candidate.kind === 'sheet-face')
  return item?.kind === 'sheet-face' ? item.properties : { authors: '', credit: '', printing: 'colour' }
}

/** Composes everything around the map face: title, units, explanation of symbols, scale, norths, projection, credits
 *  and caution. Tries the largest type first and smaller or closer settings until all of it fits. */
export function composeMargin(input: SheetFaceInput): MarginOutcome {
  const layout = pageLayout(input.sheet)
  const room = roomProblem(layout.face, layout.margin)
  if (room !== undefined) return { outcome: 'cannot-print', reason: room }
  const set = setLargest(input, layout.face, layout.margin)
  if (!set) return { outcome: 'cannot-print', reason: tooFull(input.items, layout.margin) }
  return unprintable(set.marks) ?? { outcome: 'composed', ...set }
}

/** Steps of smaller type that are worth taking to keep sections whole. */
const STEPS_FOR_WHOLE = 2

/** The largest type in which everything fits, or one little smaller in which no section is broken. */
function setLargest(
  input: SheetFaceInput,
  face: Box,
  margin: Box,
): { marks: Mark[]; type: TypeScale } | undefined {
  const tryFrom = (types: readonly TypeScale[], fill: ColumnFill) => {
    for (const [index, type] of types.entries()) {
      const marks = setMargin(input, face, margin, { type, fill })
      if (marks) return { marks, type, index }
    }
    return undefined
  }
  const broken = tryFrom(typeLadder, fillRunningOn)
  const from = broken?.index ?? 0
  const whole = tryFrom(broken ? typeLadder.slice(from, from + 1 + STEPS_FOR_WHOLE) : typeLadder, fillWhole)
  const best = whole ?? broken
  return best && { marks: best.marks, type: best.type }
}

function roomProblem(face: Box, margin: Box): string | undefined {
  if (face.y < BELOW_FACE + SCALE_BAR_HEIGHT + FOOT) {
    return `The map face is ${face.height.toFixed(0)} mm high and does not leave room below it for the scale bar. Choose a higher page.`
  }
  const narrowest = NARROWEST * 0.8
  if (margin.width >= narrowest) return undefined
  return `The page leaves ${Math.max(0, margin.width).toFixed(0)} mm beside the map face; the legend needs at least ${narrowest.toFixed(0)} mm. Choose a wider page.`
}

function unprintable(marks: readonly Mark[]): MarginOutcome | undefined {
  const found = findUnprintable(marks)
  return (
    found && {
      outcome: 'cannot-print',
      reason: `The printed type, Lato, has no “${found.character}”, which stands in “${found.text}”. Write it with other letters.`,
    }
  )
}

function tooFull(items: readonly Item[], margin: Box): string {
  const units = unitsById(items).size
  const symbols = entriesInUse(items).length + marksInUse(items).length
  return `The legend (${units} units, ${symbols} symbols) does not fit the ${margin.width.toFixed(0)} × ${margin.height.toFixed(0)} mm beside the map face even in the smallest readable type. Choose a larger page or shorten the descriptions of units.`
}

interface Setting {
  type: TypeScale
  fill: ColumnFill
}

function setMargin(
  input: SheetFaceInput,
  face: Box,
  margin: Box,
  { type, fill }: Setting,
): Mark[] | undefined {
  const { sheet, edition } = input
  const { authors } = sheetFaceOf(input.items)
  const below = setBelowFace(input, face, type)
  const title = titleBlock(sheet, authors, edition, margin.width, type)
  const foot = colophon(sheet, authors, edition, margin.width, type)
  const [bottom, top] = [margin.y, margin.y + margin.height]
  const gap = BETWEEN * type.factor
  const rest = {
    ...margin,
    y: bottom + foot.height + gap,
    height: margin.height - title.height - foot.height - 2 * gap,
  }
  const columns = setColumns(input, rest, { type, fill }, below.hasStatements ? [] : ['statements'])
  return (
    columns && [
      ...title.draw(margin.x, top),
      ...columns,
      ...foot.draw(margin.x, bottom + foot.height),
      ...below.marks,
    ]
  )
}

/** The legend's units with their fills. */
function listedUnits(items: readonly Item[]): ListedUnit[] {
  const units = items.filter((item) => item.kind === 'unit')
  const fills = unitFills(units, sheetFaceOf(items).printing)
  return units.map(({ id, properties }) => ({ properties, fill: fills.get(id) ?? {} }))
}

function setColumns(
  { sheet, items, edition }: SheetFaceInput,
  box: Box,
  { type, fill }: Setting,
  extra: readonly 'statements'[],
): Mark[] | undefined {
  const units = listedUnits(items)
  const symbols = { entries: entriesInUse(items), marks: marksInUse(items) }
  for (const count of columnCounts(box.width, type)) {
    const gutter = gutterFor(type)
    const width = (box.width - (count - 1) * gutter) / count
    const statements = extra.flatMap(() =>
      statementBlocks({ sheet, items, edition }, width, type).flatMap((block) => [
        space(4 * type.factor),
        block,
      ]),
    )
    const sections = [unitsList(units, width, type), symbolsList(symbols, width, type), statements]
    const columns = fill(sections, count, box.height)
    if (columns) {
      return drawColumns(columns, { x: box.x, top: box.y + box.height, width, gutter })
    }
  }
  return undefined
}

/** Small type stands closer. */
const gutterFor = (type: TypeScale): Millimetres => COLUMN_GUTTER * Math.min(1, type.factor)

/** Numbers of columns that give readable widths, fewest first. */
function columnCounts(width: Millimetres, type: TypeScale): number[] {
  return [1, 2, 3, 4, 5, 6].filter((count) => {
    const each = (width - (count - 1) * gutterFor(type)) / count
    return each >= NARROWEST * type.factor && (each <= WIDEST || count === 6)
  })
}

const statementBlocks = (
  { sheet, items, edition }: SheetFaceInput,
  width: Millimetres,
  type: TypeScale,
): Block[] => {
  const { min, max } = neatlineBounds(sheet.neatline)
  const centre: XY = [(min[0] + max[0]) / 2, (min[1] + max[1]) / 2]
  const convergence = sheetProjection(sheet.crs.proj4).convergenceAt(centre)
  return [
    northDiagram(convergence, width, type),
    projectionBlock(sheet.crs, width, type),
    creditsBlock(sheetFaceOf(items), edition, width, type),
    cautionBox(width, type),
  ]
}

/** The scale bar under the map face and, where the page is high enough, the statements in a row below it. */
function setBelowFace(
  input: SheetFaceInput,
  face: Box,
  type: TypeScale,
): { marks: Mark[]; hasStatements: boolean } {
  const top = face.y - BELOW_FACE
  const bar = scaleBar(input.sheet.scale, face.width)
  const scale = bar.draw(face.x, top)
  const row = statementRow(input, face.width, typeScale(Math.min(type.factor, STATEMENT_FACTOR), 1.28))
  const rowTop = top - bar.height - 8
  if (!row || heightOf([row]) > rowTop - FOOT) return { marks: scale, hasStatements: false }
  return { marks: [...scale, ...row.draw(face.x, rowTop)], hasStatements: true }
}

function statementRow(input: SheetFaceInput, width: Millimetres, type: TypeScale): Block | undefined {
  const each = (width - 3 * COLUMN_GUTTER) / 4
  if (each < STATEMENT_WIDTH * type.factor) return undefined
  const blocks = statementBlocks(input, each, type)
  return {
    height: Math.max(...blocks.map((block) => block.height)),
    draw: (x, top) =>
      blocks.flatMap((block, index) => stack([block]).draw(x + index * (each + COLUMN_GUTTER), top)),
  }
}
