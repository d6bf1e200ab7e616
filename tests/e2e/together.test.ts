import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Sheet } from '@shared/api/sheets'
import type { Item, ItemOf } from '@shared/items/item'
import { enterAs, waitUntilSaved } from '../support/people'
import { launchBrowser, startRunning, type Running } from '../support/running'

const SHEET = 'MI-14'

let running: Running
let browser: Browser
let compiler: Page
let editor: Page
let contact: ItemOf<'contact'>

beforeAll(async () => {
  running = await startRunning()
  browser = await launchBrowser()
  compiler = await enterAs(browser, running.url, 'compiler')
  editor = await enterAs(browser, running.url, 'editor')
  const found = (await itemsSeenBy(compiler)).find((item) => item.kind === 'contact')
  if (found?.kind !== 'contact') throw new Error('The demo sheet has no contact.')
  contact = found
})

afterAll(async () => {
  await browser?.close()
  await running?.stop()
})

async function itemsSeenBy(page: Page): Promise<Item[]> {
  return page.evaluate(
    async (path) => ((await (await fetch(path)).json()) as { items: Item[] }).items,
    `/api/sheets/${SHEET}/items`,
  )
}

const stored = async (): Promise<ItemOf<'contact'>> =>
  (await itemsSeenBy(editor)).find(
    (item): item is ItemOf<'contact'> => item.id === contact.id,
  ) as ItemOf<'contact'>
const revision = async (): Promise<number> =>
  editor.evaluate(
    async (path) => ((await (await fetch(path)).json()) as Sheet).revision,
    `/api/sheets/${SHEET}`,
  )

async function openAtContact(page: Page): Promise<void> {
  await page.goto(`${running.url}/sheets/${SHEET}/compile?item=${contact.id}`)
  await page.getByRole('heading', { name: 'Contact' }).waitFor()
}

async function enter(page: Page, label: string, text: string): Promise<void> {
  await page.getByLabel(label, { exact: true }).fill(text)
  await page.getByLabel(label, { exact: true }).blur()
}

describe('two people on one sheet', () => {
  it('see that the other is there, and what they have selected', async () => {
    await openAtContact(compiler)
    await openAtContact(editor)
    await compiler.getByRole('button', { name: /^Tove Orr, editor, has the sheet open/ }).waitFor()
    await editor.getByRole('button', { name: /^Rosa Kelp, compiler, has the sheet open/ }).waitFor()
  })

  it('meet in the conflict panel when both changed the same, and settle it field by field', async () => {
    await compiler.context().setOffline(true)
    await enter(compiler, 'Name', 'North edge')
    await enter(compiler, 'Note', 'seen from the boat')
    await compiler.getByText(/2 changes waiting/).waitFor()
    await enter(editor, 'Name', 'Skua edge')
    await waitUntilSaved(editor)
    await compiler.context().setOffline(false)
    const panel = compiler.getByRole('alert').filter({ hasText: 'Someone else changed the same items' })
    await panel.getByText('Tove Orr').first().waitFor()
    await panel.getByLabel('Theirs of name: Skua edge').check()
    await panel.getByLabel('Yours of note: seen from the boat').check()
    await panel.getByRole('button', { name: 'Save what is chosen' }).click()
    await waitUntilSaved(compiler)
    expect((await stored()).properties).toMatchObject({ name: 'Skua edge', note: 'seen from the boat' })
  })
})

describe('a lost network and a closed page', () => {
  it('lose nothing: the edits arrive when the page is opened again', async () => {
    await openAtContact(compiler)
    const before = await revision()
    const context = compiler.context()
    await context.setOffline(true)
    await enter(compiler, 'Note', 'redrawn without a network')
    await compiler.getByText(/1 change waiting/).waitFor()
    await compiler.close()
    expect(await revision()).toBe(before)
    await context.setOffline(false)
    compiler = await context.newPage()
    await compiler.goto(`${running.url}/sheets/${SHEET}/compile`)
    await waitUntilSaved(compiler)
    await expect.poll(async () => (await stored()).properties.note).toBe('redrawn without a network')
    expect(await revision()).toBe(before + 1)
  })
})
