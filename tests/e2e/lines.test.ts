import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Item, ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import { draw, enterAs, followErrors, waitUntilSaved } from '../support/people'
import { launchBrowser, startRunning, type Running } from '../support/running'

const SHEET = 'MI-14'
/** Free ground of the demo sheet, sheet metres; both lines run to the grid north. */
const FAULT: XY[] = [
  [291_500, 5_280_000],
  [291_500, 5_281_000],
]
const TRACE: XY[] = [
  [292_000, 5_280_000],
  [292_000, 5_281_000],
]

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

/** The line of a kind that ends where one was drawn, whichever end that is by now, as the server has it. */
async function drawnAt<K extends 'fault' | 'axial-trace'>(
  kind: K,
  line: XY[],
): Promise<ItemOf<K> | undefined> {
  const { items } = await compiler.evaluate(
    async (path) => (await (await fetch(path)).json()) as { items: Item[] },
    `/api/sheets/${SHEET}/items`,
  )
  const places = line.map((place) => place.join()).toSorted()
  return items.find(
    (item): item is ItemOf<K> =>
      item.kind === kind &&
      item.geometry?.type === 'LineString' &&
      item.geometry.coordinates
        .map((place) => place.join())
        .toSorted()
        .join() === places.join(),
  )
}

/** Picks a pen of the palette, behind "more" where nothing on the sheet uses it yet. */
async function pick(row: string): Promise<void> {
  const pen = compiler.locator(`[data-row="${row}"]`)
  const more = compiler.getByRole('button', { name: 'More to draw with…' })
  if ((await pen.count()) === 0) await more.click()
  await pen.first().click()
}

const enter = async (label: string | RegExp, text: string) => {
  const field = compiler.getByRole('textbox', { name: label, exact: true })
  await field.fill(text)
  await field.press('Enter')
}
const choose = (group: string, name: string) =>
  compiler.getByRole('radiogroup', { name: group }).getByRole('radio', { name }).click({ force: true })
const heading = (name: string) => compiler.getByRole('heading', { name }).waitFor()

describe('faults and folds that have sides', () => {
  it('gives a fault its dip, says its side by the ground, and keeps both when the line is turned round', async () => {
    await compiler.goto(`${running.url}/sheets/${SHEET}/compile`)
    await pick('fault.normal.certain')
    await draw(compiler, FAULT)
    await heading('Normal fault, down to the east')
    await enter('Dip', '95')
    await compiler.getByRole('alert').filter({ hasText: '0 to 90 degrees' }).waitFor()
    await enter('Dip', '62')
    await heading('Normal fault, down to the east, dipping 62°')
    await compiler.getByRole('button', { name: 'Reverse', exact: true }).click()
    await waitUntilSaved(compiler)
    expect((await drawnAt('fault', FAULT))?.properties).toMatchObject({ side: 'left', dip: 62 })
    await heading('Normal fault, down to the east, dipping 62°')
  })

  it('refuses, in words, to make a dipping fault rotational, and tells both ends of one that has none', async () => {
    await choose('Type of the fault', 'Rotational fault')
    await compiler.getByRole('alert').filter({ hasText: 'Clear the dip first' }).waitFor()
    await enter('Dip', '')
    await choose('Type of the fault', 'Rotational fault')
    await heading(
      'Rotational fault, down to the east at its northern end and to the west at its southern end',
    )
    await waitUntilSaved(compiler)
  })

  it('draws an overturned fold, takes its other side, and lets it plunge into a depression', async () => {
    await compiler.keyboard.press('Escape')
    await pick('axial-trace.overturned-syncline.certain')
    await draw(compiler, TRACE)
    await heading('Overturned syncline, limbs dip to the east')
    await compiler.getByRole('button', { name: 'Swap side' }).click()
    await heading('Overturned syncline, limbs dip to the west')
    await choose('How the axis goes down', 'Plunging both ways into a depression')
    await enter('Plunge', '21')
    await enter('Trend', '0')
    await enter(/^Toward 180°/, '12')
    await heading('plunging both ways into a depression: 21° toward 000°, 12° toward 180°')
    await waitUntilSaved(compiler)
    expect((await drawnAt('axial-trace', TRACE))?.properties).toMatchObject({
      form: 'overturned-syncline',
      side: 'left',
      plunge: 21,
      trend: 0,
      doubly: 'inward',
      otherPlunge: 12,
    })
    await compiler.getByRole('list', { name: 'Marks on lines' }).getByText('into a depression').waitFor()
  })

  it('leaves no error in the browser', () => expect(followErrors()).toEqual([]))
})
