/** The little of fontkit (which pdfkit sets type with) that a test asks of it. */
declare module 'fontkit' {
  interface Font {
    unitsPerEm: number
    capHeight: number
    characterSet: number[]
    glyphForCodePoint(code: number): { advanceWidth: number }
  }
  export function openSync(path: string): Font
}
