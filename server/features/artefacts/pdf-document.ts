import PDFDocument from 'pdfkit'
import type { Page } from '@shared/api/sheets'
import { latoFiles } from './lato-files'
import { fontName, POINTS_PER_MM } from './pdf-surface'

/** What a PDF says about itself. */
export interface PdfFacts {
  title: string
  author: string
  subject: string
  /** Time of release; the same content at the same time gives the same bytes. */
  at: Date
}

/** Size of a page, in points, without edges of its own. */
export const pageOf = (page: Page): { size: [number, number]; margin: number } => ({
  size: [page.width * POINTS_PER_MM, page.height * POINTS_PER_MM],
  margin: 0,
})

/** A new document with its first page and Lato at hand; its bytes come once it is ended. */
export function openDocument(
  page: Page,
  { title, author, subject, at }: PdfFacts,
): { document: PDFKit.PDFDocument; bytes: Promise<Buffer> } {
  const document = new PDFDocument({
    ...pageOf(page),
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
  return { document, bytes: collect(document) }
}

function collect(document: PDFKit.PDFDocument): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = []
    document.on('data', (chunk: Buffer) => chunks.push(chunk))
    document.on('end', () => resolve(Buffer.concat(chunks)))
    document.on('error', reject)
  })
}
