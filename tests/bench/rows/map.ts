import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { build, preview } from 'vite'
import { launchBrowser } from '../../support/browser'
import { spreadOf, type BenchRow } from '../measure'

const LINES = 20_000
const ATTITUDES = 5_000
const REPEATS = 3
/** Scales to look from, per cent of print size: the whole sheet, the print, and half as near again. */
const SCALES = [35, 100, 200] as const
const TARGET = 1.3

type Side = 'ours' | 'bare'

/** Milliseconds of both pages, by what was measured. */
type Noted = Map<string, Record<Side, number[]>>

/** Rows of the map: frames while a large sheet with its symbols is moved, and how long its picture takes, against a bare
 *  OpenLayers page with the same geometries as plain strokes. Chromium has no graphics processor here, and its frames are
 *  not held back to those of a screen. While the view moves ours shifts its last picture, and the reference replays what it
 *  has: each in its own usual way. */
export async function mapRows(): Promise<BenchRow[]> {
  const outDir = mkdtempSync(join(tmpdir(), 'sheetwright-map-pages-'))
  const input = (['ours', 'bare'] as const).map((side) => `tests/bench/map-pages/${side}.html`)
  await build({ publicDir: false, logLevel: 'error', build: { outDir, rolldownOptions: { input } } })
  const server = await preview({
    build: { outDir },
    preview: { port: 0, host: '127.0.0.1' },
    logLevel: 'error',
  })
  const browser = await launchBrowser(['--disable-frame-rate-limit', '--disable-gpu-vsync'])
  try {
    const base = `${server.resolvedUrls?.local[0] ?? ''}tests/bench/map-pages`
    const noted: Noted = new Map()
    for (let repeat = 0; repeat < REPEATS; repeat++) {
      for (const side of ['bare', 'ours'] as const) await measurePage(noted, side, browser, base)
    }
    return [...noted].map(([what, { ours, bare }]) => toRow(what, ours, bare))
  } finally {
    await browser.close()
    await server.close()
    rmSync(outDir, { recursive: true })
  }
}

async function measurePage(noted: Noted, side: Side, browser: Browser, base: string): Promise<void> {
  const page = await openPage(browser, `${base}/${side}.html#${LINES}-${ATTITUDES}`)
  const note = (what: string, values: readonly number[]): void => {
    const both = noted.get(what) ?? { ours: [], bare: [] }
    both[side].push(...values)
    noted.set(what, both)
  }
  note('first picture', [await page.evaluate(() => window.bench.firstPicture)])
  for (const percent of SCALES) {
    note(`whole picture at ${percent} %`, [await page.evaluate((to) => window.bench.show(to), percent)])
    for (const journey of ['pan', 'zoom'] as const) {
      const { moving } = await page.evaluate((which) => window.bench.run(which), journey)
      note(`frame of a ${journey} at ${percent} %`, moving)
    }
  }
  await page.close()
}

async function openPage(browser: Browser, address: string): Promise<Page> {
  const page = await browser.newPage({ viewport: { width: 1400, height: 900 } })
  page.on('pageerror', (error) => console.error(error.message))
  await page.goto(address)
  await page.waitForFunction(() => 'bench' in window, undefined, { timeout: 120_000 })
  return page
}

function toRow(what: string, ours: readonly number[], bare: readonly number[]): BenchRow {
  const [oursMs, referenceMs] = [spreadOf(ours), spreadOf(bare)]
  return {
    what: `${what}, ${LINES} lines and ${ATTITUDES} attitudes`,
    reference: 'bare OpenLayers, plain strokes',
    oursMs,
    referenceMs,
    ratio: oursMs.median / referenceMs.median,
    target: TARGET,
  }
}
