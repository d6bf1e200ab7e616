import type { Browser, Page } from 'playwright-core'
import { collectErrors } from './browser'

export type DemoPerson = 'compiler' | 'editor' | 'approver' | 'administrator'

const heard: string[][] = []

/** Every console error of every page opened here so far. */
export const followErrors = (): string[] => heard.flat()

/** A browser of its own for one person, nobody signed in. */
export async function openPage(browser: Browser): Promise<Page> {
  const context = await browser.newContext({ viewport: { width: 1680, height: 1050 }, acceptDownloads: true })
  const page = await context.newPage()
  page.setDefaultTimeout(12_000)
  heard.push(collectErrors(page))
  return page
}

/** Signs a person of the demo in, through the page. */
export async function enterAs(browser: Browser, url: string, person: DemoPerson): Promise<Page> {
  const page = await openPage(browser)
  await page.goto(`${url}/sign-in`)
  await page.getByLabel('E-mail').fill(`${person}@merrow.example`)
  await page.getByLabel('Password', { exact: true }).fill(`merrow-${person}`)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL('**/sheets')
  return page
}

/** Goes to a place of the open sheet by its word in the bar. */
export const goTo = (page: Page, place: string): Promise<void> =>
  page.getByRole('navigation', { name: 'Places of the sheet' }).getByRole('link', { name: place }).click()

/** Draws with the picked entry by typing places, as one does without a pointer; Enter in the empty field ends a line. */
export async function draw(page: Page, places: readonly (readonly [number, number])[]): Promise<void> {
  const field = page.getByLabel('Easting and northing, metres; Enter sets it')
  for (const [east, north] of places) {
    await field.fill(`${east} ${north}`)
    await field.press('Enter')
  }
  if (places.length < 2) return
  await page.getByLabel(/^Map face/).focus()
  await page.keyboard.press('Enter')
}

/** Waits until nothing of the page's work is on its way any more. */
export const waitUntilSaved = (page: Page): Promise<void> => page.getByText(/saved at revision/).waitFor()
