import { randomUUID } from 'node:crypto'
import type { DataSource } from 'typeorm'
import type { Person } from '@shared/api/common'
import type { Face } from '@shared/api/faces'
import type { Sheet } from '@shared/api/sheets'
import type { Item } from '@shared/items/item'
import { CAUTION } from '@shared/sheet-face/caution'
import { sheetFaceOf } from '@shared/sheet-face/compose-margin'
import { citation, type EditionStatement } from '@shared/sheet-face/edition-statement'
import { announce } from '../../platform/announce'
import { keepAudit } from '../../platform/audit'
import type { Storage } from '../../platform/storage'
import type { ReportProgress } from '../../platform/jobs'
import { revisionDigest } from '../artefacts/digest'
import { makeEditionFiles, type EditionFile } from '../artefacts/edition-files'
import type { FacesService } from '../faces/faces.service'
import type { HistoryService } from '../ledger/history.service'
import type { SheetsService } from '../sheets/sheets.service'
import {
  findLatestEdition,
  insertArtefacts,
  insertEdition,
  lockReleasing,
  type NewEdition,
} from './editions.queries'

/** An approved revision, ready to become an edition. */
export interface Approved {
  submissionId: string
  sheetId: string
  revision: number
  digest: string
  approver: Person
}

/** Share of the work that making the files is; the rest is storing and sealing them. */
const MAKING_SHARE = 0.9

/** Makes editions out of approved revisions: all of it, or nothing. */
export class ReleaseService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly storage: Storage,
    private readonly sheets: SheetsService,
    private readonly history: HistoryService,
    private readonly faces: FacesService,
  ) {}

  /** Makes the files of the next edition, stores them and seals them; answers with its number. Where anything fails, no
   *  edition exists and no file stays. The sheet goes back to drafting with the edition, in one transaction. */
  async makeEdition(approved: Approved, report: ReportProgress): Promise<number> {
    await report(0, 'Reading the approved revision')
    const { sheet, items, faces, number } = await this.read(approved)
    if (revisionDigest(sheet, approved.revision, items) !== approved.digest) {
      throw new Error(`Revision ${approved.revision} of sheet ${sheet.number} is not what was approved.`)
    }
    const releasedAt = new Date()
    const statement: EditionStatement = {
      edition: number,
      revision: approved.revision,
      released: { at: releasedAt.toISOString(), approvedBy: approved.approver.name },
    }
    const source = { sheet, items, faces, statement, digest: approved.digest }
    const files = await makeEditionFiles(source, (progress, message) =>
      report(progress * MAKING_SHARE, message),
    )
    await report(MAKING_SHARE, 'Storing and sealing the edition')
    // Each attempt has its own folder, so that one that was given up cannot write over what another has sealed.
    const folder = `editions/${sheet.number}/${number}/${randomUUID()}`
    try {
      for (const file of files) await this.storage.put(`${folder}/${file.name}`, file.content)
      await this.seal(approved, toNewEdition(approved, sheet, items, statement, releasedAt), files, folder)
    } catch (cause) {
      for (const file of files) await this.storage.remove(`${folder}/${file.name}`)
      throw cause
    }
    return number
  }

  private async read(
    approved: Approved,
  ): Promise<{ sheet: Sheet; items: Item[]; faces: Face[]; number: number }> {
    const sheet = await this.sheets.get(approved.sheetId, null)
    return this.dataSource.transaction(async (em) => ({
      sheet,
      items: await this.history.itemsAt(em, approved.sheetId, approved.revision),
      faces: await this.faces.facesAt(em, approved.sheetId, approved.revision),
      number: ((await findLatestEdition(em, approved.sheetId))?.number ?? 0) + 1,
    }))
  }

  private async seal(
    approved: Approved,
    edition: NewEdition,
    files: readonly EditionFile[],
    folder: string,
  ): Promise<void> {
    await this.dataSource.transaction(async (em) => {
      const sheet = await lockReleasing(em, approved.sheetId)
      if (sheet.state !== 'releasing') {
        throw new Error(
          `Sheet ${sheet.number} is ${sheet.state}, not releasing: edition ${edition.number} stays unmade.`,
        )
      }
      const id = await insertEdition(em, approved.sheetId, edition)
      await insertArtefacts(
        em,
        id,
        files.map((file) => ({ ...file, storageKey: `${folder}/${file.name}` })),
      )
      await announce(em, sheet.number, { event: 'state', state: 'drafting' })
      const { revision, digest } = approved
      await keepAudit(em, {
        event: { kind: 'release', edition: edition.number, revision, digest },
        accountId: approved.approver.id,
        sheet: sheet.number,
      })
    })
  }
}

function toNewEdition(
  approved: Approved,
  sheet: Sheet,
  items: readonly Item[],
  statement: EditionStatement,
  releasedAt: Date,
): NewEdition {
  const { authors } = sheetFaceOf(items)
  return {
    number: statement.edition,
    submissionId: approved.submissionId,
    revision: approved.revision,
    digest: approved.digest,
    title: sheet.title,
    authors,
    scale: sheet.scale,
    srid: sheet.crs.srid,
    crsName: sheet.crs.name,
    footprint: sheet.footprint,
    citation: citation(sheet, authors, statement),
    caution: CAUTION,
    releasedAt,
    approvedBy: approved.approver.id,
  }
}
