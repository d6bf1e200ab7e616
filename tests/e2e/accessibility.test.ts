import { AxeBuilder } from '@axe-core/playwright'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { enterAs, openPage, type DemoPerson } from '../support/people'
import { launchBrowser, startRunning, type Running } from '../support/running'

/** Rules that WCAG 2.2 asks for at levels A and AA. */
const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

type Visitor = DemoPerson | 'reader'

/** Every page, with something that is there once it is complete. */
const places: { who: Visitor; path: string; shows: string }[] = [
  { who: 'reader', path: '/', shows: 'Catalogue' },
  { who: 'reader', path: '/catalogue', shows: 'Catalogue' },
  { who: 'reader', path: '/sign-in', shows: 'Sign in' },
  { who: 'reader', path: '/problems/item-conflict', shows: 'Someone else changed the same items' },
  { who: 'reader', path: '/nowhere', shows: 'There is nothing at this address' },
  { who: 'reader', path: '/api-reference', shows: '/api/health' },
  { who: 'reader', path: '/symbols', shows: 'Every symbol, every case' },
  { who: 'compiler', path: '/sheets', shows: 'Gannet Head, Merrow Island' },
  { who: 'compiler', path: '/sheets/new', shows: 'New sheet' },
  { who: 'compiler', path: '/sheets/MI-14/compile', shows: 'Whole ledger' },
  { who: 'compiler', path: '/sheets/MI-14/intake', shows: 'Field files' },
  { who: 'compiler', path: '/sheets/MI-14/review', shows: 'toward edition 1' },
  { who: 'compiler', path: '/sheets/MI-14/ledger', shows: 'Every change of sheet MI-14' },
  { who: 'compiler', path: '/sheets/MI-14/compare?from=1', shows: 'CSV' },
  { who: 'administrator', path: '/administration', shows: 'Invite a person' },
]

let running: Running
let browser: Browser
const pages = new Map<Visitor, Page>()

beforeAll(async () => {
  running = await startRunning()
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser?.close()
  await running?.stop()
})

/** What a person with a screen reader or weak sight would stumble over, one line each. */
async function stumbles(page: Page): Promise<string[]> {
  const { passes, violations } = await new AxeBuilder({ page }).withTags(WCAG).analyze()
  // A page that did not load breaks no rule and keeps none either.
  expect(passes.length).toBeGreaterThan(5)
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map((node) => node.target.join(' ')).join(', ')}`)
}

/** The page of a visitor, who signs in once. */
async function pageOf(who: Visitor): Promise<Page> {
  const known = pages.get(who)
  if (known) return known
  const page = who === 'reader' ? await openPage(browser) : await enterAs(browser, running.url, who)
  pages.set(who, page)
  return page
}

describe.each(['light', 'dark'] as const)('in the %s theme', (colorScheme) => {
  it.each(places)('$path keeps WCAG 2.2 AA', async ({ who, path, shows }) => {
    const page = await pageOf(who)
    await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
    await page.goto(running.url + path)
    await page.getByText(shows).first().waitFor()
    expect(await stumbles(page)).toEqual([])
  })
})

describe('on a screen 360 px wide', () => {
  it.each(places.filter(({ path }) => !/compile|intake|new/.test(path)))(
    '$path needs no scrolling sideways',
    async ({ who, path, shows }) => {
      const page = await pageOf(who)
      await page.setViewportSize({ width: 360, height: 760 })
      await page.goto(running.url + path)
      await page.getByText(shows).first().waitFor()
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(360)
    },
  )
})
