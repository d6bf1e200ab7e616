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
  const box = { x: 0, y: 0, ...page }
  const paper: Mark = { mark: 'fill', path: rectangle(0, 0, page.width, page.height), ink: 'paper' }
  const [head, ground, tail] = elements(toSvg([paper], box))
  const drawn: string[] = []
  for (const part of parts) {
    drawn.push(elements(toSvg(part.draw(), box))[1])
    await breathe()
  }
  return `${head}<style>${await fontFaces()}</style>${ground}${drawn.join('')}${tail}`
}

/** An SVG's start tag, what stands in it, and its end tag. */
function elements(svg: string): [head: string, content: string, tail: string] {
  const [start, end] = [svg.indexOf('>') + 1, svg.lastIndexOf('</svg>')]
  return [svg.slice(0, start), svg.slice(start, end), svg.slice(end)]
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
