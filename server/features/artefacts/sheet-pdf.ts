import type { Page } from '@shared/api/sheets'
import type { SheetPart } from '@shared/sheet-face/compose-sheet'
import { replay } from '@shared/symbols/interpreter'
import type { ReportProgress } from '../../platform/jobs'
import { breathe } from './breathe'
import { openDocument, type PdfFacts } from './pdf-document'
import { pdfSurface, pdfTransform } from './pdf-surface'

/** The printed page as a PDF: one page of exactly the sheet's size, vectors only, Lato embedded. */
export async function sheetPdf(
  page: Page,
  parts: readonly SheetPart[],
  facts: PdfFacts,
  report: ReportProgress,
): Promise<Buffer> {
  const { document, bytes } = openDocument(page, facts)
  const surface = pdfSurface(document)
  const transform = pdfTransform(page.height)
  for (const [index, part] of parts.entries()) {
    await report(index / parts.length, `Drawing ${part.words}`)
    replay(part.draw(), surface, transform)
    await breathe()
  }
  document.end()
  return bytes
}
