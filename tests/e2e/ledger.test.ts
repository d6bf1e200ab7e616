import type { Browser, Locator, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { LedgerRow } from '@shared/api/ledger'
import type { ItemOf } from '@shared/items/item'
import { enterAs, waitUntilSaved } from '../support/people'
import { launchBrowser, startRunning, type Running } from '../support/running'

const SHEET = 'MI-14'
/** What the demo's ledger says of the intake that is taken back here. */
const INTAKE = /east-traverses\.geojson/
const NAME = 'before the spring visit'
const WHY = 'read again on the spring visit'

let running: Running
let browser: Browser
let page: Page
let reading: ItemOf<'attitude'>

beforeAll(async () => {
  running = await startRunning()
  browser = await launchBrowser()
  page = await enterAs(browser, running.url, 'editor')
  reading = await anAttitudeOf(await theIntake())
})

afterAll(async () => {
  await browser?.close()
  await running?.stop()
})

const ask = async <T>(path: string): Promise<T> =>
  page.evaluate(async (url) => (await (await fetch(url)).json()) as T, `/api/sheets/${SHEET}/${path}`)

async function theIntake(): Promise<LedgerRow> {
  const { entries } = await ask<{ entries: LedgerRow[] }>('revisions?kind=intake')
  const found = entries.find(({ message }) => INTAKE.test(message))
  if (!found) throw new Error('The demo sheet has no intake of the east traverses.')
  return found
}

/** An attitude that the intake brought and nobody has changed since. */
async function anAttitudeOf({ revision }: LedgerRow): Promise<ItemOf<'attitude'>> {
  const { differences } = await ask<{ differences: { after: ItemOf<'attitude'> }[] }>(
    `comparison?from=${revision - 1}&to=${revision}`,
  )
  const { items } = await ask<{ items: { id: string }[] }>('items')
  const now = new Map(items.map((item) => [item.id, JSON.stringify(item)]))
  const found = differences.find(({ after }) => now.get(after.id) === JSON.stringify(after))
  if (!found) throw new Error('Every attitude of the intake has been changed.')
  return found.after
}

const openLedger = async (): Promise<void> => {
  await page.goto(`${running.url}/sheets/${SHEET}/ledger`)
  await entry(INTAKE).waitFor()
}
const entry = (words: RegExp): Locator => page.getByRole('button', { name: words, expanded: false })
const entryNumbers = (): Promise<string[]> => page.locator('.entry .number').allTextContents()
const revision = async (): Promise<number> => (await ask<{ revision: number }>('items')).revision

describe('the ledger of a sheet', () => {
  it('is searched by kind and words, and the address keeps what is searched by', async () => {
    await openLedger()
    const all = await entryNumbers()
    await page.getByLabel('Entries').selectOption('Intakes')
    await expect
      .poll(() => entryNumbers())
      .toHaveLength((await ask<{ entries: unknown[] }>('revisions?kind=intake')).entries.length)
    await page.getByLabel('Words').fill('east-traverses')
    await page.getByLabel('Words').press('Enter')
    await expect.poll(() => entryNumbers()).toEqual([String((await theIntake()).revision)])
    await page.reload()
    await expect.poll(() => entryNumbers()).toEqual([String((await theIntake()).revision)])
    await page.goto(`${running.url}/sheets/${SHEET}/ledger?text=no+such+words`)
    await page.getByText('No entry answers to all of this.').waitFor()
    await page.getByRole('link', { name: 'Show all entries' }).click()
    await expect.poll(() => entryNumbers()).toEqual(all)
  })

  it('is searched by a place and by an item that come from the map', async () => {
    await page.goto(`${running.url}/sheets/${SHEET}/compile?item=${reading.id}`)
    await page.getByRole('button', { name: 'Who changed this' }).click()
    await page.getByRole('link', { name: 'Its entries in the ledger' }).click()
    await page.getByRole('heading', { name: `Versions of attitude ${reading.properties.station}` }).waitFor()
    await expect.poll(() => entryNumbers()).toEqual([String((await theIntake()).revision)])
    await page.goBack()
    await page.getByRole('link', { name: 'In view' }).click()
    await page.waitForURL(/place=/)
    await page.getByRole('button', { name: 'Anywhere' }).click()
    await expect.poll(() => page.url()).not.toContain('place=')
  })

  it('takes a name for how the sheet is now, and why the next changes are made', async () => {
    await page.goto(`${running.url}/sheets/${SHEET}/compile?item=${reading.id}`)
    await page.getByRole('button', { name: 'Checkpoint' }).click()
    await page.getByLabel('Name', { exact: true }).fill(NAME)
    await page.getByRole('button', { name: 'Name it' }).click()
    await page.getByRole('button', { name: 'Checkpoint' }).waitFor()
    const named = await revision()
    await page.getByLabel('Why you make the next changes').fill(WHY)
    await page.getByLabel('Note', { exact: true }).fill('beds undulate')
    await page.getByLabel('Note', { exact: true }).blur()
    await waitUntilSaved(page)
    await expect.poll(() => revision()).toBe(named + 1)
    await openLedger()
    await entry(new RegExp(`^${named} ${NAME}`)).waitFor()
    await entry(new RegExp(WHY)).click()
    await page.getByText(/changed note of attitude/).waitFor()
  })
})

describe('two states of a sheet', () => {
  it('are chosen in the ledger and lie over each other; a row leads to its place', async () => {
    await openLedger()
    await page
      .getByLabel('From', { exact: true })
      .selectOption({ label: `${(await revision()) - 1}, ${NAME}` })
    await page.getByRole('link', { name: 'Compare', exact: true }).click()
    const row = page.getByRole('button', { name: `Attitude ${reading.properties.station}` })
    await row.click()
    expect(await row.getAttribute('aria-pressed')).toBe('true')
    await page.getByText('attitude: 1 re-attributed').waitFor()
    await page.getByText('beds undulate').waitFor()
  })

  it('are swiped by keyboard', async () => {
    await page.getByRole('button', { name: 'Swipe' }).click()
    const line = page.getByRole('slider')
    await line.focus()
    const before = Number(await line.inputValue())
    await page.keyboard.press('ArrowRight')
    expect(Number(await line.inputValue())).toBeGreaterThan(before)
    await page.keyboard.press('End')
    expect(await line.inputValue()).toBe('100')
  })

  it('are kept as files', async () => {
    for (const [name, holds] of [
      ['CSV', 'beds undulate'],
      ['GeoJSON', '"FeatureCollection"'],
    ] as const) {
      const href = await page.getByRole('link', { name, exact: true }).getAttribute('href')
      const text = await page.evaluate(async (url) => (await fetch(url)).text(), href ?? '')
      expect(text).toContain(holds)
    }
  })
})

describe('going back', () => {
  it('refuses to take an intake back over later changes, and names them', async () => {
    await openLedger()
    await entry(INTAKE).click()
    await page.getByRole('button', { name: 'Take this entry back' }).click()
    await page.getByText(/This would remove \d+ attitudes\./).waitFor()
    const later = page.locator('.later')
    await later.getByText(/Not without undoing later changes of \d+ items?:/).waitFor()
    await later.getByText(`Tove Orr: ${WHY}`).waitFor()
    expect(await page.getByRole('button', { name: 'Take it back' }).isDisabled()).toBe(true)
  })

  it('does so as a new entry once these may be undone too', async () => {
    const before = await revision()
    await page.getByLabel('Undo these later changes too').check()
    await page.getByRole('button', { name: 'Take it back' }).click()
    await page.getByText(/Done, as revision/).waitFor()
    expect(await revision()).toBe(before + 1)
    const { items } = await ask<{ items: { id: string }[] }>('items')
    expect(items.some(({ id }) => id === reading.id)).toBe(false)
    await entry(new RegExp(`^${before + 1} took back entry`)).waitFor()
  })

  it('goes back to a named revision, with all that was there', async () => {
    const before = await revision()
    await entry(new RegExp(`^\\d+ ${NAME}`)).click()
    await page.getByRole('button', { name: /^Go back to revision/ }).click()
    await page.getByText(/This would bring back \d+ attitudes/).waitFor()
    await page.getByLabel('Undo these later changes too').check()
    await page.getByRole('button', { name: /^Go back to \d+$/ }).click()
    await page.getByText(/Done, as revision/).waitFor()
    expect(await revision()).toBe(before + 1)
    const { items } = await ask<{ items: { id: string }[] }>('items')
    expect(items.find(({ id }) => id === reading.id)).toEqual(reading)
  })

  it('brings an earlier version of one item back from its history', async () => {
    await page.goto(`${running.url}/sheets/${SHEET}/compile?item=${reading.id}`)
    await page.getByLabel('Note', { exact: true }).fill('a slip of the pen')
    await page.getByLabel('Note', { exact: true }).blur()
    await waitUntilSaved(page)
    await page.getByRole('button', { name: 'Who changed this' }).click()
    const earlier = page.getByRole('button', { name: 'Bring this version back' })
    // Taken in, noted, brought back with the whole sheet; the slip of the pen is the one that holds.
    await expect.poll(() => earlier.count()).toBe(3)
    await earlier.first().click()
    await page.getByLabel('Undo these later changes too').check()
    await page.getByRole('button', { name: 'Bring it back' }).click()
    await expect.poll(() => page.getByLabel('Note', { exact: true }).inputValue()).toBe('')
  })
})
