import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Item, ItemKind, ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import { draw, enterAs, followErrors, waitUntilSaved } from '../support/people'
import { launchBrowser, startRunning, type Running } from '../support/running'

const SHEET = 'MI-14'
/** Free ground of the demo sheet, sheet metres. */
const OUTCROP: XY = [291_500, 5_280_000]
const SHOWING: XY = [291_700, 5_280_300]

let running: Running
let browser: Browser
let compiler: Page

beforeAll(async () => {
  running = await startRunning()
  browser = await launchBrowser()
  compiler = await enterAs(browser, running.url, 'compiler')
})

afterAll(async () => {
  await browser?.close()
  await running?.stop()
})

/** The point of a kind that was placed somewhere, as the server has it. */
async function placedAt<K extends ItemKind>(kind: K, at: XY): Promise<ItemOf<K> | undefined> {
  const { items } = await compiler.evaluate(
    async (path) => (await (await fetch(path)).json()) as { items: Item[] },
    `/api/sheets/${SHEET}/items`,
  )
  return items.find(
    (item): item is ItemOf<K> => item.kind === kind && item.geometry?.coordinates.join() === at.join(),
  )
}

/** Picks a pen of the palette, behind "more" where nothing on the sheet uses it yet. */
async function pick(row: string): Promise<void> {
  const pen = compiler.locator(`[data-row="${row}"]`)
  const more = compiler.getByRole('button', { name: 'More to draw with…' })
  if ((await pen.count()) === 0) await more.click()
  await pen.first().click()
}

describe('lineations and places, from the notebook to the sheet', () => {
  it('reads a line on its plane as it is typed, warns where the two contradict, and keeps what is right', async () => {
    await compiler.goto(`${running.url}/sheets/${SHEET}/compile`)
    await pick('lineation.lineation.on-foliation')
    await draw(compiler, [OUTCROP])
    const line = compiler.getByRole('textbox', { name: 'Reading', exact: true })
    const plane = compiler.getByRole('textbox', { name: 'Its reading' })
    await line.fill('120/95')
    await line.press('Enter')
    await compiler.getByRole('alert').filter({ hasText: 'Plunge 95 is more than 90' }).waitFor()
    await plane.fill('045/40')
    await line.fill('135/60')
    await compiler.getByText('The line 135/60 lies 20° off the plane 045/40').waitFor()
    await line.fill('40→135')
    await compiler.getByText(/^Lineation, plunges 40° toward 135°/).waitFor()
    await line.press('Enter')
    await waitUntilSaved(compiler)
    expect((await placedAt('lineation', OUTCROP))?.properties).toMatchObject({
      type: 'lineation',
      trend: 135,
      plunge: 40,
      plane: { type: 'foliation', strike: 45, dip: 40, overturned: false },
      reading: { text: '40→135', convention: 'trend-plunge' },
    })
  })

  it('places an adit and asks which way it goes in', async () => {
    await compiler.keyboard.press('Escape')
    await pick('station.mine-adit')
    await draw(compiler, [SHOWING])
    await waitUntilSaved(compiler)
    const adit = await placedAt('station', SHOWING)
    expect(adit?.properties).toMatchObject({ type: 'mine-adit', azimuth: null })
    await compiler.goto(`${running.url}/sheets/${SHEET}/compile?item=${adit?.id}`)
    const toward = compiler.getByRole('textbox', { name: 'Goes in toward' })
    await toward.fill('N45E')
    await toward.press('Enter')
    await compiler.getByRole('heading', { name: 'Mine adit, goes in toward 045°' }).waitFor()
    await waitUntilSaved(compiler)
    expect((await placedAt('station', SHOWING))?.properties.azimuth).toBe(45)
  })

  it('leaves no error in the browser', () => expect(followErrors()).toEqual([]))
})
