import { execFileSync } from 'node:child_process'
import { expect } from 'vitest'
import type { Sheet } from '@shared/api/sheets'

/** Millimetres in a PDF point. */
const MM_PER_POINT = 25.4 / 72

/** One page of the sheet's size, its Lato embedded: read by poppler, which is not ours. */
export function expectPrintedPage(path: string, sheet: Sheet): void {
  const about = execFileSync('pdfinfo', [path], { encoding: 'utf8' })
  expect(about).toMatch(/^Pages:\s+1$/m)
  const [, width, height] = /^Page size:\s+([\d.]+) x ([\d.]+) pts/m.exec(about) ?? []
  expect(Number(width) * MM_PER_POINT).toBeCloseTo(sheet.page.width, 1)
  expect(Number(height) * MM_PER_POINT).toBeCloseTo(sheet.page.height, 1)
  const fonts = execFileSync('pdffonts', [path], { encoding: 'utf8' }).split('\n').slice(2).filter(Boolean)
  expect(fonts.length).toBeGreaterThan(0)
  for (const font of fonts) expect(font).toMatch(/Lato.*\s(yes) (yes|no) (yes|no)\s/)
}
