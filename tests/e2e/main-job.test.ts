import { createHash } from 'node:crypto'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { FeatureCollection } from 'geojson'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Edition } from '@shared/api/catalogue'
import type { Sheet } from '@shared/api/sheets'
import { isLineItem, type Item, type ItemKind, type ItemOf } from '@shared/items/item'
import type { XY } from '@shared/units'
import { demoFieldFiles } from '../../server/demo/field-files/field-files'
import { expectArrowDownPlunge } from '../support/arrows'
import { expectPrintedPage } from '../support/printed-page'
import { draw, enterAs, followErrors, goTo, openPage, waitUntilSaved } from '../support/people'
import { launchBrowser, startRunning, type Running } from '../support/running'

const SHEET = 'MI-14'

/** Free ground of the demo sheet, sheet metres. The trace runs about 029° true. */
const TRACE: XY[] = [
  [289_000, 5_283_000],
  [289_350, 5_283_650],
  [289_800, 5_284_400],
]
const CONTACT: XY[] = [
  [286_000, 5_280_500],
  [286_400, 5_280_900],
  [286_900, 5_281_000],
]
const OUTCROP: XY = [291_500, 5_280_000]

let running: Running
let browser: Browser
let folder: string
let compiler: Page
let editor: Page
let approver: Page

beforeAll(async () => {
  running = await startRunning()
  browser = await launchBrowser()
  folder = mkdtempSync(join(tmpdir(), 'sheetwright-e2e-'))
})

afterAll(async () => {
  await browser?.close()
  await running?.stop()
  if (folder) rmSync(folder, { recursive: true, force: true })
})

const ask = <T>(page: Page, path: string): Promise<T> =>
  page.evaluate(async (address) => (await fetch(address)).json() as Promise<T>, path)

async function itemsOf<K extends ItemKind>(page: Page, kind: K): Promise<ItemOf<K>[]> {
  const { items } = await ask<{ items: Item[] }>(page, `/api/sheets/${SHEET}/items`)
  return items.filter((item): item is ItemOf<K> => item.kind === kind)
}

/** What the API says to a call that the page does not offer this person. */
const push = (page: Page, path: string, body: unknown): Promise<{ status: number; type: string }> =>
  page.evaluate(
    async ([address, sent]) => {
      const { csrfToken } = (await (await fetch('/api/session')).json()) as { csrfToken: string }
      const answer = await fetch(address as string, {
        method: 'POST',
        headers: { 'Content-Type': 'application/json', 'X-CSRF-Token': csrfToken },
        body: JSON.stringify(sent),
      })
      return { status: answer.status, type: ((await answer.json()) as { type: string }).type }
    },
    [path, body] as const,
  )

/** The item of a kind whose line starts at a place. */
async function findDrawn<K extends 'contact' | 'axial-trace'>(kind: K, start: XY): Promise<ItemOf<K>> {
  const isIt = (item: Item): boolean =>
    isLineItem(item) && item.geometry.coordinates[0]?.join() === start.join()
  const found = (await itemsOf(compiler, kind)).find(isIt)
  if (!found) throw new Error(`No ${kind} starts at ${start.join(' ')}.`)
  return found
}

describe('the main job, from sign-in to the released edition', () => {
  it('lets nobody in with a wrong password, and says so in place', async () => {
    const page = await openPage(browser)
    await page.goto(`${running.url}/sheets/${SHEET}/compile`)
    await page.getByLabel('E-mail').fill('compiler@merrow.example')
    await page.getByLabel('Password', { exact: true }).fill('merrow-editor')
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.getByText('There is no account with this e-mail and this password.').waitFor()
    expect(page.url()).toContain('/sign-in')
    await page.context().close()
  })

  it('lists the sheets, and creates one whose projected system is proposed from its area', async () => {
    editor = await enterAs(browser, running.url, 'editor')
    await editor.getByText('Gannet Head, Merrow Island').waitFor()
    await editor.getByRole('button', { name: 'New sheet' }).click()
    const edges = { West: '29°52\'30" W', East: "29°45' W", South: "47°30' N", North: '47°37\'30" N' }
    for (const [side, text] of Object.entries(edges)) await editor.getByLabel(`${side} edge`).fill(text)
    await editor.getByRole('textbox', { name: 'Scale' }).fill('24000')
    await editor.getByRole('textbox', { name: 'Number' }).fill('MI-15')
    await editor.getByRole('textbox', { name: 'Title' }).fill('Skua Haven, Merrow Island')
    await editor.getByText('WGS 84 / UTM zone 26N').first().waitFor()
    const create = editor.getByRole('button', { name: /^Create/ })
    // A double click makes one sheet, not two.
    await create.dblclick()
    await editor.waitForURL('**/sheets/MI-15/compile')
    const sheet = await ask<Sheet>(editor, '/api/sheets/MI-15')
    expect(sheet).toMatchObject({ scale: 24_000, revision: 1, state: 'drafting', myRoles: ['editor'] })
    expect(sheet.crs.srid).toBe(32626)
  })

  it('refuses a picture that calls itself KML, and an empty file', async () => {
    compiler = await enterAs(browser, running.url, 'compiler')
    await compiler.goto(`${running.url}/sheets/${SHEET}/intake`)
    const picture = join(folder, 'traces.kml')
    writeFileSync(picture, Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'))
    const empty = join(folder, 'empty.geojson')
    writeFileSync(empty, '')
    await compiler.getByLabel('Field files').setInputFiles([picture, empty])
    await compiler.getByText('Take it off the list').nth(1).waitFor()
    const said = (await compiler.getByRole('alert').allInnerTexts()).join(' ')
    expect(said).toMatch(/PNG/)
    expect(said).toMatch(/empty/i)
  })

  it('takes a GeoJSON and a KML in, each as one ledger entry, and lists what it refuses with reasons', async () => {
    const before = (await ask<Sheet>(compiler, `/api/sheets/${SHEET}`)).revision
    const brought = demoFieldFiles().filter(({ name }) => /traverse\.(geojson|kml)$/.test(name))
    for (const { name, bytes } of brought) {
      const path = join(folder, name)
      writeFileSync(path, bytes)
      await compiler.getByLabel('Field files').setInputFiles(path)
      await compiler.getByRole('heading', { name }).waitFor()
      const take = compiler.getByRole('button', { name: /^Take in \d+ items$/ })
      await take.waitFor()
      await compiler
        .getByText(/more than 90|along the strike/)
        .first()
        .waitFor()
      const wanted = Number(/\d+/.exec(await take.innerText())?.[0])
      const had = (await ask<{ items: Item[] }>(compiler, `/api/sheets/${SHEET}/items`)).items.length
      await take.click()
      await compiler.getByText('See it on the sheet').waitFor()
      const has = (await ask<{ items: Item[] }>(compiler, `/api/sheets/${SHEET}/items`)).items.length
      expect(has - had).toBe(wanted)
    }
    expect((await ask<Sheet>(compiler, `/api/sheets/${SHEET}`)).revision).toBe(before + 2)
    const stations = (await itemsOf(compiler, 'attitude')).map((attitude) => attitude.properties.station)
    expect(stations).toContain('RT-1')
    // Its dip is 95.
    expect(stations).not.toContain('RT-90')
  })

  it('draws a contact with its location confidence, by figures', async () => {
    await goTo(compiler, 'Compile')
    await compiler.locator('[data-row="contact.approximate"]').click()
    await draw(compiler, CONTACT)
    await waitUntilSaved(compiler)
    const contact = await findDrawn('contact', [286_000, 5_280_500])
    expect(contact.properties.locationConfidence).toBe('approximate')
    expect(contact.geometry.coordinates).toEqual(CONTACT)
  })

  it('moves a vertex with the pointer, takes it back and does it again', async () => {
    const moved = () =>
      findDrawn('contact', [286_000, 5_280_500]).then(({ geometry }) => geometry.coordinates[1])
    const { id } = await findDrawn('contact', [286_000, 5_280_500])
    await compiler.goto(`${running.url}/sheets/${SHEET}/compile?item=${id}&at=286400,5280900,200`)
    await compiler.getByRole('heading', { name: 'Contact' }).waitFor()
    await compiler.keyboard.press('e')
    const face = await compiler.getByLabel(/^Map face/).boundingBox()
    if (!face) throw new Error('The map face is not shown.')
    const [x, y] = [face.x + face.width / 2, face.y + face.height / 2]
    await compiler.mouse.move(x, y)
    await compiler.mouse.down()
    await compiler.mouse.move(x + 60, y, { steps: 6 })
    await compiler.mouse.up()
    await expect.poll(moved, { timeout: 10_000 }).not.toEqual([286_400, 5_280_900])
    const there = await moved()
    expect(there?.[0]).toBeGreaterThan(286_420)
    await compiler.keyboard.press('Control+z')
    await expect.poll(moved, { timeout: 10_000 }).toEqual([286_400, 5_280_900])
    await compiler.keyboard.press('Control+Shift+z')
    await expect.poll(moved, { timeout: 10_000 }).toEqual(there)
  })

  it('draws an anticline, refuses a trend across it, and points its plunge arrow down-plunge', async () => {
    await compiler.goto(`${running.url}/sheets/${SHEET}/compile`)
    await compiler.locator('[data-row="axial-trace.anticline.certain"]').click()
    await draw(compiler, TRACE)
    await compiler.getByRole('heading', { name: 'Anticline' }).waitFor()
    const enter = async (label: string, text: string) => {
      await compiler.getByLabel(label, { exact: true }).fill(text)
      await compiler.getByLabel(label, { exact: true }).press('Enter')
    }
    await enter('Plunge', '21')
    await enter('Trend', '120')
    await compiler
      .getByRole('alert')
      .filter({ hasText: /does not run along this trace/ })
      .waitFor()
    await enter('Trend', '28')
    await compiler.getByRole('heading', { name: 'Anticline, plunging 21° toward 028°' }).waitFor()
    await waitUntilSaved(compiler)
    const trace = await findDrawn('axial-trace', [289_000, 5_283_000])
    expect(trace.properties).toMatchObject({ form: 'anticline', plunge: 21, trend: 28 })
    expectArrowDownPlunge(trace, await ask<Sheet>(compiler, `/api/sheets/${SHEET}`))
  })

  it('reads an attitude as it is typed, echoes it in words, and refuses what cannot be', async () => {
    await compiler.keyboard.press('Escape')
    await compiler.locator('[data-row="attitude.bedding.inclined"]').click()
    await draw(compiler, [OUTCROP])
    const reading = compiler.getByRole('textbox', { name: 'Reading' })
    await compiler.getByText('045/40').first().waitFor()
    for (const [text, why] of [
      ['N45E 40NE', /along the strike/],
      ['045/95', /95 is more than 90/],
    ] as const) {
      await reading.fill(text)
      await reading.press('Enter')
      await compiler.getByRole('alert').filter({ hasText: why }).waitFor()
    }
    await reading.fill('N45E 40SE')
    await compiler.getByText('Strikes 045°, dips 40° toward 135° (south-east)').waitFor()
    await reading.press('Enter')
    await waitUntilSaved(compiler)
    const placed = (await itemsOf(compiler, 'attitude')).find(
      ({ geometry }) => geometry.coordinates.join() === OUTCROP.join(),
    )
    expect(placed?.properties).toMatchObject({ type: 'bedding', strike: 45, dip: 40, overturned: false })
    expect(placed?.properties.reading).toMatchObject({ text: 'N45E 40SE', northReference: 'true' })
  })

  it('shows another person’s change as it is made, and lets the editor keep the legend', async () => {
    await editor.goto(`${running.url}/sheets/${SHEET}/compile`)
    await editor.getByRole('button', { name: 'Add a unit' }).click()
    const form = editor.getByRole('form', { name: 'New unit' })
    await form.getByLabel('Label').fill('Qb')
    await form.getByLabel('Name').fill('Blown sand')
    await form.getByLabel('Age').fill('Quaternary')
    // The age proposes a colour, which the person then overrules.
    await form.getByLabel('Age').press('Tab')
    await form.getByLabel('Colour as #rrggbb').fill('#f4ecc8')
    await form.getByLabel('Description').fill('dunes behind the north beach')
    await form.getByRole('button', { name: 'Add to the legend' }).click()
    await waitUntilSaved(editor)
    // The compiler's margin shows it without a reload.
    await compiler.getByText('Blown sand').waitFor()
    const unit = (await itemsOf(editor, 'unit')).find(({ properties }) => properties.label === 'Qb')
    expect(unit?.properties).toMatchObject({ name: 'Blown sand', age: 'Quaternary', colour: '#f4ecc8' })
  })

  it('deletes what is selected', async () => {
    const { id } = await findDrawn('contact', [286_000, 5_280_500])
    await compiler.goto(`${running.url}/sheets/${SHEET}/compile?item=${id}`)
    await compiler.getByRole('heading', { name: 'Contact' }).waitFor()
    await compiler.getByRole('button', { name: 'Remove', exact: true }).click()
    await expect
      .poll(async () => (await itemsOf(compiler, 'contact')).some((contact) => contact.id === id), {
        timeout: 10_000,
      })
      .toBe(false)
  })

  it('is submitted by an editor, and read-only from then on', async () => {
    await goTo(editor, 'Review')
    await editor.getByRole('button', { name: /^Submit revision \d+$/ }).click()
    await editor
      .getByText(/submitted for review/)
      .first()
      .waitFor()
    const { state, revision } = await ask<Sheet>(editor, `/api/sheets/${SHEET}`)
    expect(state).toBe('submitted')
    const refused = await push(compiler, `/api/sheets/${SHEET}/release`, {})
    expect(refused).toEqual({ status: 403, type: '/problems/not-allowed' })
    expect((await ask<Sheet>(editor, `/api/sheets/${SHEET}`)).revision).toBe(revision)
  })

  it('is approved by another person and released with progress', async () => {
    approver = await enterAs(browser, running.url, 'approver')
    await approver.goto(`${running.url}/sheets/${SHEET}/review`)
    await approver.getByRole('button', { name: /^Approve revision \d+ for edition 1$/ }).click()
    await approver.getByRole('button', { name: 'Release edition 1' }).waitFor()
    const { digest } = await ask<{ digest: string }>(approver, `/api/sheets/${SHEET}/submission`)
    const again = await push(approver, `/api/sheets/${SHEET}/submission/decision`, {
      decision: 'approved',
      digest,
      note: '',
    })
    expect(again).toEqual({ status: 409, type: '/problems/already-decided' })
    await approver.getByRole('button', { name: 'Release edition 1' }).click()
    await approver
      .getByRole('link', { name: `Sheet ${SHEET}, edition 1, in the catalogue` })
      .waitFor({ timeout: 60_000 })
  })

  it('is in the public catalogue: one vector page at scale, the data, and checksums that match', async () => {
    const reader = await openPage(browser)
    await reader.goto(`${running.url}/catalogue`)
    await reader
      .getByRole('link', { name: /Gannet Head/ })
      .first()
      .click()
    await reader.waitForURL(`**/catalogue/${SHEET}/1`)
    const download = async (title: string): Promise<string> => {
      const [file] = await Promise.all([
        reader.waitForEvent('download'),
        reader.locator('.edition-files').getByRole('link', { name: title }).click(),
      ])
      const path = join(folder, file.suggestedFilename())
      await file.saveAs(path)
      return path
    }
    const edition = await ask<Edition>(reader, `/api/catalogue/${SHEET}/1`)
    const paths = new Map<string, string>()
    for (const file of edition.artefacts) paths.set(file.name, await download(file.title))
    const read = (name: string): Buffer => readFileSync(paths.get(name) ?? '')
    for (const file of edition.artefacts) {
      expect(createHash('sha256').update(read(file.name)).digest('hex'), file.name).toBe(file.sha256)
    }
    const manifest = JSON.parse(read('manifest.json').toString()) as {
      artefacts: { name: string; sha256: string }[]
    }
    expect(manifest.artefacts.map(({ name }) => name)).toEqual(
      expect.arrayContaining(['sheet.pdf', 'data.geojson']),
    )
    for (const file of manifest.artefacts) {
      expect(createHash('sha256').update(read(file.name)).digest('hex'), file.name).toBe(file.sha256)
    }
    const sheet = await ask<Sheet>(approver, `/api/sheets/${SHEET}`)
    expect(sheet).toMatchObject({ edition: 1, state: 'drafting' })
    expectPrintedPage(paths.get('sheet.pdf') ?? '', sheet)
    const data = JSON.parse(read('data.geojson').toString()) as FeatureCollection
    expect(data.features.some((feature) => feature.properties?.['station'] === 'RT-1')).toBe(true)
    await reader.context().close()
  })

  it('wrote no error to any console but those of refused calls', () => {
    expect(followErrors().filter((error) => !/status of 4\d\d/.test(error))).toEqual([])
  })
})
