import { readFile } from 'node:fs/promises'
import type { Page } from '@shared/api/sheets'
import type { SheetPart } from '@shared/sheet-face/compose-sheet'
import { rectangle } from '@shared/sheet-face/rectangle'
import type { Mark } from '@shared/symbols/display-list'
import { toSvg } from '@shared/symbols/surfaces/svg'
import { breathe } from './breathe'
import { latoWebFiles } from './lato-files'

/** The printed page as an SVG picture on paper. It carries its fonts, because a picture in a page cannot load any. */
export async function sheetSvg(page: Page, parts: readonly SheetPart[]): Promise<string> {
  const marks: Mark[] = [{ mark: 'fill', path: rectangle(0, 0, page.width, page.height), ink: 'paper' }]
  for (const part of parts) {
    for (const mark of part.draw()) marks.push(mark)
    await breathe()
  }
  const svg = toSvg(marks, { x: 0, y: 0, ...page })
  const start = svg.indexOf('>') + 1
  return `${svg.slice(0, start)}<style>${await fontFaces()}</style>${svg.slice(start)}`
}

async function fontFaces(): Promise<string> {
  const faces = Object.entries(latoWebFiles).flatMap(([weight, files]) =>
    files.map(async ({ path, range }) => {
      const data = (await readFile(path)).toString('base64')
      return `@font-face{font-family:Lato;font-weight:${weight};unicode-range:${range};src:url(data:font/woff2;base64,${data})}`
    }),
  )
  return (await Promise.all(faces)).join('')
}
