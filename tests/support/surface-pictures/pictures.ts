import { execFileSync } from 'node:child_process'
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import type { Page } from 'playwright-core'
import { PNG } from 'pngjs'
import { build } from 'vite'
import { latoWebFiles } from '../../../server/features/artefacts/lato-files'
import { sheetPdf } from '../../../server/features/artefacts/sheet-pdf'
import type { DisplayList } from '@shared/symbols/display-list'
import { toSvg } from '@shared/symbols/surfaces/svg'
import { launchBrowser } from '../browser'
import type * as inPage from './in-page'

export type SurfaceName = 'canvas' | 'svg' | 'pdf'

/** What is drawn: a list whose (0, 0) is the picture's lower left corner. */
export interface PictureRequest {
  list: DisplayList
  /** Millimetres; with `pxPerMm`, whole pixels. */
  size: { width: number; height: number }
  /** Device pixels to the millimetre: 10 is 254 dpi. */
  pxPerMm: number
  /** Colour beneath the drawing; white unless given. */
  ground?: `#${string}`
}

/** The three surfaces as makers of pictures. */
export interface SurfacePictures {
  draw(surface: SurfaceName, request: PictureRequest): Promise<PNG>
  /** Draws on canvas as the map does. */
  drawInView(...request: Parameters<typeof inPage.drawInView>): Promise<PNG>
  close(): Promise<void>
}

/** Opens a browser for canvas and SVG; PDF pages are made by our own code and rendered by poppler. */
export async function openSurfacePictures(): Promise<SurfacePictures> {
  const browser = await launchBrowser()
  const page = await browser.newPage()
  await page.setContent(`<style>${await lato()}body{margin:0}svg{display:block}</style><main></main>`)
  await page.addScriptTag({ content: await inPageScript() })
  const draw: Record<SurfaceName, (request: PictureRequest) => Promise<PNG>> = {
    canvas: (request) => onCanvas(page, request),
    svg: (request) => asSvg(page, request),
    pdf: asPdf,
  }
  return {
    draw: (surface, request) => draw[surface](request),
    drawInView: async (...request) =>
      pictureAt(await page.evaluate((given) => drawings.drawInView(...given), request)),
    close: () => browser.close(),
  }
}

async function onCanvas(
  page: Page,
  { list, size, pxPerMm, ground = '#ffffff' }: PictureRequest,
): Promise<PNG> {
  const address = await page.evaluate(
    (input) => drawings.drawOnCanvas(input.list, input.size, input.pxPerMm, input.ground),
    { list, size, pxPerMm, ground },
  )
  return pictureAt(address)
}

/** The picture that a data address holds. */
const pictureAt = (address: string): PNG =>
  PNG.sync.read(Buffer.from(address.slice(address.indexOf(',') + 1), 'base64'))

/** The bundle's name in the page. */
declare const drawings: typeof inPage

async function asSvg(page: Page, { list, size, pxPerMm, ground = '#ffffff' }: PictureRequest): Promise<PNG> {
  const [width, height] = [Math.round(size.width * pxPerMm), Math.round(size.height * pxPerMm)]
  const svg = toSvg(list, { x: 0, y: 0, ...size }).replace(
    /width="[^"]*" height="[^"]*"/,
    `width="${width}" height="${height}"`,
  )
  await page.setViewportSize({ width, height })
  await page.evaluate(
    ([markup, colour]) => {
      document.body.style.background = colour
      document.querySelector('main')?.replaceChildren(document.createRange().createContextualFragment(markup))
    },
    [svg, ground] as const,
  )
  await page.evaluate(() => document.fonts.ready.then(() => undefined))
  return PNG.sync.read(await page.screenshot())
}

async function asPdf({ list, size, pxPerMm, ground = '#ffffff' }: PictureRequest): Promise<PNG> {
  const { width, height } = size
  const whole: DisplayList = [
    {
      mark: 'fill',
      path: [['move', 0, 0], ['line', width, 0], ['line', width, height], ['line', 0, height], ['close']],
      ink: ground,
    },
    ...list,
  ]
  const facts = { title: 'Specimen', author: '', subject: '', at: new Date('2026-12-01T10:00:00Z') }
  const bytes = await sheetPdf(size, [{ words: 'specimen', draw: () => whole }], facts, () =>
    Promise.resolve(),
  )
  const folder = await mkdtemp(join(tmpdir(), 'sheetwright-picture-'))
  try {
    await writeFile(join(folder, 'page.pdf'), bytes)
    const [across, down] = [Math.round(width * pxPerMm), Math.round(height * pxPerMm)].map(String)
    // Of poppler's two renderers, this one leaves fine lines at their width; the other sets them on whole pixels.
    execFileSync('pdftocairo', [
      ...['-png', '-singlefile', '-r', String(pxPerMm * 25.4)],
      ...['-x', '0', '-y', '0', '-W', across ?? '', '-H', down ?? ''],
      ...[join(folder, 'page.pdf'), join(folder, 'page')],
    ])
    return PNG.sync.read(await readFile(join(folder, 'page.png')))
  } finally {
    await rm(folder, { recursive: true, force: true })
  }
}

/** The app's canvas surface as one script that hangs its functions on `drawings`. */
async function inPageScript(): Promise<string> {
  const project = (path: string): string => fileURLToPath(new URL(`../../../${path}`, import.meta.url))
  const built = await build({
    configFile: false,
    logLevel: 'silent',
    resolve: { alias: { '@shared': project('shared'), '@': project('src') } },
    build: {
      write: false,
      minify: false,
      lib: {
        entry: project('tests/support/surface-pictures/in-page.ts'),
        formats: ['iife'],
        name: 'drawings',
      },
    },
  })
  const [bundle] = Array.isArray(built) ? built : [built]
  if (!bundle || !('output' in bundle)) throw new TypeError('The drawing script was not built.')
  return bundle.output[0].code
}

async function lato(): Promise<string> {
  const faces = Object.entries(latoWebFiles).flatMap(([weight, files]) =>
    files.map(async ({ path, range }) => {
      const data = (await readFile(path)).toString('base64')
      return `@font-face{font-family:Lato;font-weight:${weight};unicode-range:${range};src:url(data:font/woff2;base64,${data})}`
    }),
  )
  return (await Promise.all(faces)).join('')
}
