import type { Path } from '@shared/symbols/display-list'
import type { Surface, Tiling } from '@shared/symbols/interpreter'

type Pattern = ReturnType<PDFKit.PDFDocument['pattern']>

/** Tilings as a document's own uncoloured tiling patterns: each is written once, and takes its colour where it is used. */
export function pdfTiles(document: PDFKit.PDFDocument): (tiling: Tiling) => Pattern {
  const known = new Map<string, Pattern>()
  return (tiling) => {
    const { name, width, height, x, y } = tiling
    const key = [name, width, height, x, y].join(' ')
    const pattern =
      known.get(key) ?? document.pattern([x, y, x + width, y + height], width, height, cellContent(tiling))
    known.set(key, pattern)
    return pattern
  }
}

/** A cell as PDF content, without colours. Source: ISO 32000-1, 8.5 (paths) and 8.7.3 (tiling patterns). */
function cellContent(tiling: Tiling): string {
  const content = [`1 0 0 1 ${short(tiling.x)} ${short(tiling.y)} cm 1 j`]
  const surface: Pick<Surface, 'path'> = {
    path(path, paint) {
      if (paint.paint === 'fill') content.push(pathContent(path), 'f*')
      else content.push(`${short(paint.width)} w ${paint.cap === 'round' ? 1 : 0} J`, pathContent(path), 'S')
    },
  }
  tiling.draw(surface)
  return content.join('\n')
}

const operators = { move: 'm', line: 'l', curve: 'c', close: 'h' } as const

const pathContent = (path: Path): string =>
  path.map(([kind, ...numbers]) => [...numbers.map(short), operators[kind]].join(' ')).join('\n')

/** A ten-thousandth of a point is far finer than any print; PDF knows no exponents. */
const short = (value: number): string => String(Math.round(value * 10_000) / 10_000)
