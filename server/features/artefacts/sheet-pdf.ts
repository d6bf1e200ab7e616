import PDFDocument from 'pdfkit'
import type { Page } from '@shared/api/sheets'
import type { SheetPart } from '@shared/sheet-face/compose-sheet'
import { replay } from '@shared/symbols/interpreter'
import type { ReportProgress } from '../../platform/jobs'
import { breathe } from './breathe'
import { latoFiles } from './lato-files'
import { fontName, pdfSurface, pdfTransform, POINTS_PER_MM } from './pdf-surface'

/** What a PDF says about itself. */
export interface PdfFacts {
  title: string
  author: string
  subject: string
  /** Time of release; the same sheet at the same time gives the same bytes. */
  at: Date
}

/** The printed page as a PDF: one page of exactly the sheet's size, vectors only, Lato embedded. */
export async function sheetPdf(
  page: Page,
  parts: readonly SheetPart[],
  facts: PdfFacts,
  report: ReportProgress,
): Promise<Buffer> {
  const document = openDocument(page, facts)
  const bytes = collect(document)
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

function openDocument(page: Page, { title, author, subject, at }: PdfFacts): PDFKit.PDFDocument {
  const document = new PDFDocument({
    size: [page.width * POINTS_PER_MM, page.height * POINTS_PER_MM],
    margin: 0,
    lang: 'en',
    displayTitle: true,
    info: {
      Title: title,
      Author: author,
      Subject: subject,
      Creator: 'Sheetwright',
      Producer: 'Sheetwright',
      CreationDate: at,
      ModDate: at,
    },
  })
  for (const weight of [400, 700, 900] as const) document.registerFont(fontName(weight), latoFiles[weight])
  return document
}

function collect(document: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = []
    document.on('data', (chunk: Buffer) => chunks.push(chunk))
    document.on('end', () => resolve(Buffer.concat(chunks)))
    document.on('error', reject)
  })
}
