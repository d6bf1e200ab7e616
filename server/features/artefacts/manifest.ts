import { createHash } from 'node:crypto'
import type { Artefact } from '@shared/api/catalogue'
import type { Sheet } from '@shared/api/sheets'
import { CAUTION } from '@shared/sheet-face/caution'
import type { EditionStatement } from '@shared/sheet-face/edition-statement'

export const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex')

/** What an edition is made of, with the checksum of each file: enough to verify a download by hand. */
export function manifest(
  sheet: Pick<Sheet, 'number' | 'title' | 'scale' | 'crs'>,
  edition: EditionStatement & { digest: string; citation: string },
  artefacts: readonly Artefact[],
): Buffer {
  const content = {
    sheet: {
      number: sheet.number,
      title: sheet.title,
      scale: sheet.scale,
      crs: { srid: sheet.crs.srid, name: sheet.crs.name },
    },
    edition: edition.edition,
    revision: edition.revision,
    digest: { algorithm: 'SHA-256', of: 'the sheet and every item at the revision', value: edition.digest },
    releasedAt: edition.released?.at ?? null,
    approvedBy: edition.released?.approvedBy ?? null,
    citation: edition.citation,
    artefacts: artefacts.map(({ name, title, mediaType, bytes, sha256: checksum }) => ({
      name,
      title,
      mediaType,
      bytes,
      sha256: checksum,
    })),
    caution: CAUTION,
  }
  return Buffer.from(`${JSON.stringify(content, null, 2)}\n`)
}
