import type { Mark } from '../symbols/display-list'
import type { Millimetres } from '../units'
import { heightOf, isSpace, type Block } from './block'

/** Tolerance of heights added up, millimetres: rounding only. */
const ROUNDING: Millimetres = 1e-6

/** Sets sections of blocks in columns of one height; undefined where they do not fit: nothing is ever cut. */
export type ColumnFill = (
  sections: readonly (readonly Block[])[],
  count: number,
  height: Millimetres,
) => Block[][] | undefined

/** Whole sections, shared out so that the highest column is as low as can be. */
export const fillWhole: ColumnFill = (sections, count, height) => {
  const shared = shareOut(sections.filter(isFilled), count).map(withoutLeadingSpace)
  return highest(shared) <= height + ROUNDING ? shared : undefined
}

/** Sections that run on from column to column, broken between blocks and never after a heading. */
export const fillRunningOn: ColumnFill = (sections, count, height) =>
  runOn(sections.filter(isFilled).flat(), count, height)

const isFilled = (section: readonly Block[]): boolean => section.length > 0

const highest = (columns: readonly (readonly Block[])[]): Millimetres => Math.max(0, ...columns.map(heightOf))

/** Neighbouring sections put together into at most `count` columns, the highest as low as can be. */
function shareOut(sections: readonly (readonly Block[])[], count: number): Block[][] {
  const whole = [sections.flat()]
  if (count <= 1 || sections.length <= 1) return whole
  return sections
    .slice(1)
    .map((_, index) => [
      sections.slice(0, index + 1).flat(),
      ...shareOut(sections.slice(index + 1), count - 1),
    ])
    .reduce((best, columns) => (highest(columns) < highest(best) ? columns : best), whole)
}

function runOn(blocks: readonly Block[], count: number, height: Millimetres): Block[][] | undefined {
  const columns: Block[][] = [[]]
  for (const group of keptTogether(blocks)) {
    const column = columns.at(-1) ?? []
    const added = column.length === 0 ? withoutLeadingSpace(group) : group
    if (heightOf([...column, ...added]) <= height + ROUNDING) {
      column.push(...added)
      continue
    }
    const moved = withoutLeadingSpace(group)
    if (heightOf(moved) > height + ROUNDING) return undefined
    if (moved.length > 0) columns.push(moved)
  }
  return columns.length <= count ? columns : undefined
}

/** White space at the head of a column would only set it lower than its neighbours. */
function withoutLeadingSpace(blocks: readonly Block[]): Block[] {
  const first = blocks.findIndex((block) => !isSpace(block))
  return first < 0 ? [] : blocks.slice(first)
}

/** Blocks with the headings that must not be parted from them. */
function keptTogether(blocks: readonly Block[]): Block[][] {
  const groups: Block[][] = []
  let open: Block[] = []
  for (const block of blocks) {
    open.push(block)
    if (block.staysWithNext) continue
    groups.push(open)
    open = []
  }
  return open.length > 0 ? [...groups, open] : groups
}

/** Marks of columns set side by side. */
export function drawColumns(
  columns: readonly (readonly Block[])[],
  at: { x: Millimetres; top: Millimetres; width: Millimetres; gutter: Millimetres },
): Mark[] {
  return columns.flatMap((column, index) => {
    const x = at.x + index * (at.width + at.gutter)
    let top = at.top
    return column.flatMap((block) => {
      const marks = block.draw(x, top)
      top -= block.height
      return marks
    })
  })
}
