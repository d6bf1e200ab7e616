import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Page } from 'playwright-core'
import { build, preview } from 'vite'
import { launchBrowser } from '../support/browser'

/** Frames of a pan and a zoom of a large sheet with its symbols, against a bare OpenLayers page with the same geometries as
 *  plain strokes, in one run: `npx tsx tests/bench/map-frames.ts [lines] [attitudes] [repeats]`. */
const [lines = 20_000, attitudes = 5_000, repeats = 3] = process.argv.slice(2).map(Number)
const scales = [35, 100, 200]

const median = (values: readonly number[]): number =>
  values.toSorted((a, b) => a - b)[values.length >> 1] ?? NaN
const share = (values: readonly number[], of: number): number =>
  values.toSorted((a, b) => a - b)[Math.floor(values.length * of)] ?? NaN

const outDir = mkdtempSync(join(tmpdir(), 'sheetwright-map-frames-'))
const pages = ['ours', 'bare'].map((name) => `tests/bench/map-frames/${name}.html`)
await build({ publicDir: false, logLevel: 'error', build: { outDir, rolldownOptions: { input: pages } } })
const server = await preview({
  build: { outDir },
  preview: { port: 0, host: '127.0.0.1' },
  logLevel: 'error',
})
const base = server.resolvedUrls?.local[0] ?? ''
const browser = await launchBrowser(['--disable-frame-rate-limit', '--disable-gpu-vsync'])

async function openPage(name: 'ours' | 'bare'): Promise<Page> {
  const page = await browser.newPage({ viewport: { width: 1400, height: 900 } })
  page.on('pageerror', (error) => console.error(error.message))
  await page.goto(`${base}tests/bench/map-frames/${name}.html#${lines}-${attitudes}`)
  await page.waitForFunction(() => 'bench' in window, undefined, { timeout: 120_000 })
  return page
}

console.log(`${lines} lines, ${attitudes} attitudes, ${repeats} repeats; medians, milliseconds`)
const noted = new Map<string, Record<'ours' | 'bare', number[]>>()
for (let repeat = 0; repeat < repeats; repeat++) {
  for (const name of ['bare', 'ours'] as const) {
    const page = await openPage(name)
    note('first picture', name, [await page.evaluate(() => window.bench.firstPicture)])
    for (const percent of scales) {
      note(`whole picture at ${percent} %`, name, [
        await page.evaluate((to) => window.bench.show(to), percent),
      ])
      for (const journey of ['pan', 'zoom'] as const) {
        const { moving } = await page.evaluate((which) => window.bench.run(which), journey)
        note(`frame of a ${journey} at ${percent} %`, name, moving)
      }
    }
    await page.close()
  }
}
console.table([...noted].map(([what, { ours, bare }]) => row(what, ours, bare)))
await browser.close()
await server.close()
rmSync(outDir, { recursive: true })

function note(what: string, name: 'ours' | 'bare', values: readonly number[]): void {
  const both = noted.get(what) ?? { ours: [], bare: [] }
  both[name].push(...values)
  noted.set(what, both)
}

function row(
  what: string,
  ours: readonly number[],
  bare: readonly number[],
): Record<string, string | number> {
  const round = (value: number): number => Math.round(value * 10) / 10
  return {
    what,
    ours: round(median(ours)),
    bare: round(median(bare)),
    ratio: Math.round((median(ours) / median(bare)) * 100) / 100,
    'ours 95 %': round(share(ours, 0.95)),
    'bare 95 %': round(share(bare, 0.95)),
    'ours longest': round(Math.max(...ours)),
    'bare longest': round(Math.max(...bare)),
  }
}
