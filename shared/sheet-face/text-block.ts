import type { Ink, Mark, TextMark } from '../symbols/display-list'
import { measureText } from '../symbols/text-metrics'
import type { Millimetres } from '../units'

/** How a run of text is set. */
export interface TextStyle {
  /** Em size. */
  size: Millimetres
  weight: TextMark['weight']
  ink: Ink
  /** Space after each letter; for tracked capitals. */
  tracking?: Millimetres
  /** Distance of base lines, in em sizes. */
  leading: number
}

/** Width of a text in a style. */
export const textWidth = (text: string, style: TextStyle): Millimetres =>
  measureText(text, style.size, style.weight) + (style.tracking ?? 0) * text.length

/** Text broken into lines that are no wider than `width`. Breaks stand at spaces and after hyphens; a word that is wider
 *  than the line alone is broken where it must be, so that nothing ever runs out of its box. Line ends in the text stay. */
export function wrapText(text: string, width: Millimetres, style: TextStyle): string[] {
  return text.split(/\r?\n/).flatMap((paragraph) => wrapParagraph(paragraph, width, style))
}

function wrapParagraph(paragraph: string, width: Millimetres, style: TextStyle): string[] {
  const lines: string[] = []
  let line = ''
  for (const piece of breakable(paragraph, width, style)) {
    const longer = line + piece
    if (line !== '' && textWidth(longer.trimEnd(), style) > width) {
      lines.push(line.trimEnd())
      line = piece.trimStart()
    } else line = longer
  }
  return [...lines, line.trimEnd()].filter((text, index) => text !== '' || index === 0)
}

/** Pieces between which a line may end: words with the space after them, and parts of words that are too wide. */
function breakable(paragraph: string, width: Millimetres, style: TextStyle): string[] {
  const words = paragraph.match(/[^ -]*(?:-+| +|$)/g) ?? []
  return words
    .filter((word) => word !== '')
    .flatMap((word) => (textWidth(word.trimEnd(), style) > width ? [...word] : [word]))
}

/** Height of lines of text set in a style. */
export const linesHeight = (lines: number, style: TextStyle): Millimetres =>
  lines * style.size * style.leading

/** Marks of lines of text, the first one's line box beginning at `top`. */
export function textLines(
  lines: readonly string[],
  at: { x: Millimetres; top: Millimetres; align?: TextMark['align'] },
  style: TextStyle,
): Mark[] {
  return lines
    .map((text, index): TextMark => ({
      mark: 'text',
      text,
      at: [at.x, at.top - (index + 0.5) * style.size * style.leading],
      size: style.size,
      weight: style.weight,
      ink: style.ink,
      align: at.align ?? 'start',
      ...(style.tracking === undefined ? {} : { tracking: style.tracking }),
    }))
    .filter((mark) => mark.text !== '')
}
