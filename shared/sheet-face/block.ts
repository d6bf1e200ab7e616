import type { Mark } from '../symbols/display-list'
import { polyline } from '../symbols/paths'
import type { Millimetres } from '../units'
import { linesHeight, textLines, wrapText, type TextStyle } from './text-block'

/** Something of known height that is set in a column: it is never taller than it says. */
export interface Block {
  height: Millimetres
  /** Marks of the block with its upper left corner at (x, top), page millimetres. */
  draw(x: Millimetres, top: Millimetres): Mark[]
  /** Does not end a column: a heading. */
  staysWithNext?: boolean
}

/** White space. At the head of a column it is left out. */
export const space = (height: Millimetres): Block & { isSpace: true } => ({
  height,
  draw: () => [],
  isSpace: true,
})

export const isSpace = (block: Block): boolean => 'isSpace' in block

/** A paragraph, wrapped to a width. An empty text takes no room. */
export function paragraph(
  text: string,
  width: Millimetres,
  style: TextStyle,
  options: { staysWithNext?: boolean } = {},
): Block {
  const lines = text === '' ? [] : wrapText(text, width, style)
  return {
    height: linesHeight(lines.length, style),
    draw: (x, top) => textLines(lines, { x, top }, style),
    ...options,
  }
}

/** A rule across a column. */
export const rule = (width: Millimetres, thickness: Millimetres): Block => ({
  height: thickness,
  draw: (x, top) => [
    {
      mark: 'stroke',
      path: polyline([
        [x, top - thickness / 2],
        [x + width, top - thickness / 2],
      ]),
      width: thickness,
      ink: 'frame',
    },
  ],
  staysWithNext: true,
})

/** Blocks one under another, as one block that is not broken. */
export function stack(blocks: readonly Block[]): Block {
  return {
    height: heightOf(blocks),
    draw(x, top) {
      let below = top
      return blocks.flatMap((block) => {
        const marks = block.draw(x, below)
        below -= block.height
        return marks
      })
    },
  }
}

export const heightOf = (blocks: readonly Block[]): Millimetres =>
  blocks.reduce((sum, block) => sum + block.height, 0)
