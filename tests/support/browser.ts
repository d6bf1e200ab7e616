import { chromium, type Browser, type Page } from 'playwright-core'
import { findProgram } from '../../server/scripts/lib/debian.mjs'

/** Debian's Chromium, without a window and without a call to the outside. */
export async function launchBrowser(): Promise<Browser> {
  const executablePath = findProgram('chromium')
  if (!executablePath) throw new Error('Chromium is missing: npm test installs it.')
  return chromium.launch({
    executablePath,
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  })
}

/** Everything that the page's console calls an error, and every uncaught one, as text. */
export function collectErrors(page: Page): string[] {
  const errors: string[] = []
  page.on('console', (message) => {
    if (message.type() === 'error') errors.push(`${message.text()} (${message.location().url})`)
  })
  page.on('pageerror', (error) => errors.push(error.message))
  return errors
}
