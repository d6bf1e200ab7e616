/** Line and column, from 1, of an offset in a text. */
export function lineAndColumn(text: string, offset: number): { line: number; column: number } {
  const before = text.slice(0, Math.max(0, offset))
  const lines = before.split(/\r\n|\r|\n/)
  return { line: lines.length, column: (lines.at(-1) ?? '').length + 1 }
}
