import { composeSpecimenPages, specimenPage } from '@shared/specimen/compose-pages'
import { composeSpecimen } from '@shared/specimen/specimen'
import { replay } from '@shared/symbols/interpreter'
import { breathe } from './breathe'
import { openDocument, pageOf } from './pdf-document'
import { pdfSurface, pdfTransform } from './pdf-surface'

/** The same set gives the same bytes: the document carries no time of its own. */
const NO_TIME = new Date(0)

/** The whole symbol set as a PDF of A3 pages, vectors only, Lato embedded: at 100 % and 400 %, in colour and in one ink. */
export async function specimenPdf(): Promise<Buffer> {
  const { document, bytes } = openDocument(specimenPage, {
    title: 'Symbol set',
    author: 'Sheetwright',
    subject: 'Every symbol with its dimensions, driving attributes and cases',
    at: NO_TIME,
  })
  const surface = pdfSurface(document)
  const transform = pdfTransform(specimenPage.height)
  for (const [index, page] of composeSpecimenPages(composeSpecimen()).entries()) {
    if (index > 0) document.addPage(pageOf(specimenPage))
    replay(page, surface, transform)
    await breathe()
  }
  document.end()
  return bytes
}
