import type { Artefact } from '@shared/api/catalogue'
import type { Face } from '@shared/api/faces'
import type { Sheet } from '@shared/api/sheets'
import type { Item } from '@shared/items/item'
import { sheetFaceOf } from '@shared/sheet-face/compose-margin'
import { composeSheet } from '@shared/sheet-face/compose-sheet'
import { citation, type EditionStatement } from '@shared/sheet-face/edition-statement'
import { groupThousands } from '@shared/sheet-face/figures'
import { problem } from '../../platform/problem'
import type { ReportProgress } from '../../platform/jobs'
import { manifest, sha256 } from './manifest'
import { sheetGeoJson } from './sheet-geojson'
import { sheetPdf } from './sheet-pdf'
import { sheetSvg } from './sheet-svg'

/** A finished file of an edition with its bytes. */
export interface EditionFile extends Artefact {
  content: Buffer
}

/** Everything that an edition is made from: one revision of one sheet. */
export interface EditionSource {
  sheet: Sheet
  items: readonly Item[]
  faces: readonly Face[]
  statement: EditionStatement
  digest: string
}

/** Shares of the work, by which progress is told. */
const PDF_SHARE = 0.6
const PICTURE_AT = 0.65
const DATA_AT = 0.8
const MANIFEST_AT = 0.95

/** Makes the files of an edition: printed page, its picture, data, and the manifest with their checksums. */
export async function makeEditionFiles(
  source: EditionSource,
  report: ReportProgress,
): Promise<EditionFile[]> {
  const { sheet, items, faces, statement } = source
  const composition = composeSheet({ sheet, items, faces, edition: statement })
  if (composition.outcome === 'cannot-print') throw problem('cannot-print', composition.reason)
  const { page, parts } = composition
  const facts = pdfFacts(source)
  const pdf = await sheetPdf(page, parts, facts, (progress, message) => report(progress * PDF_SHARE, message))
  await report(PICTURE_AT, 'Drawing the picture for the catalogue')
  const svg = await sheetSvg(page, parts)
  await report(DATA_AT, 'Writing the data as GeoJSON')
  const data = await sheetGeoJson({ sheet, items, faces, edition: statement })
  await report(MANIFEST_AT, 'Writing the manifest')
  const files = [
    editionFile('sheet.pdf', 'Map sheet for print', 'application/pdf', pdf),
    editionFile(
      'data.geojson',
      'Data of the sheet, GeoJSON in WGS 84',
      'application/geo+json',
      Buffer.from(data),
    ),
    editionFile('sheet.svg', 'Picture of the sheet', 'image/svg+xml', Buffer.from(svg)),
  ]
  const cited = citation(sheet, sheetFaceOf(items).authors, statement)
  const list = manifest(sheet, { ...statement, digest: source.digest, citation: cited }, files)
  return [
    ...files,
    editionFile(
      'manifest.json',
      'Manifest: what the edition is made of, with checksums',
      'application/json',
      list,
    ),
  ]
}

function editionFile(name: string, title: string, mediaType: string, content: Buffer): EditionFile {
  return { name, title, mediaType, bytes: content.length, sha256: sha256(content), content }
}

function pdfFacts({ sheet, items, statement }: EditionSource) {
  return {
    title: `Geologic map of ${sheet.title}`,
    author: sheetFaceOf(items).authors,
    subject: `Sheet ${sheet.number}, scale 1:${groupThousands(sheet.scale)}, edition ${statement.edition}, revision ${statement.revision}`,
    at: new Date(statement.released?.at ?? 0),
  }
}

/** What a file is called when it is downloaded: MI-14-edition-1.pdf, MI-14-edition-1-manifest.json. */
export function downloadName(sheetNumber: string, edition: number, name: string): string {
  const base = `${sheetNumber}-edition-${edition}`
  const [stem, ...rest] = name.split('.')
  const extension = rest.join('.')
  return stem === 'sheet' || stem === 'data' ? `${base}.${extension}` : `${base}-${name}`
}
