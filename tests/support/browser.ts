import { chromium, type Browser, type Page } from 'playwright-core'

/** Debian's Chromium without a window; nothing of it calls the outside. */
export const launchBrowser = (more: readonly string[] = []): Promise<Browser> =>
  chromium.launch({
    executablePath: process.env['SHEETWRIGHT_CHROMIUM'] ?? '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
      ...more,
    ],
  })

/** Collects what the page's console calls an error, and every uncaught one, as text. */
export function collectErrors(page: Page): string[] {
  const errors: string[] = []
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(`${message.text()} (${message.location().url})`)
  })
  page.on('pageerror', (error) => errors.push(error.message))
  return errors
}
