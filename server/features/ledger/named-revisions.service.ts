import type { DataSource } from 'typeorm'
import type { NamedRevision } from '@shared/api/ledger'
import { keepAudit } from '../../platform/audit'
import { problem } from '../../platform/problem'
import { lockSheet } from './ledger.queries'
import { findByName, putName, removeName, selectNamedRevisions } from './named-revisions.queries'

/** Keeps the names that people put on revisions: checkpoints to find, compare and restore by. Naming is no change of the
 *  sheet, so it is allowed in every state. */
export class NamedRevisionsService {
  constructor(private readonly dataSource: DataSource) {}

  /** Named revisions of a sheet, newest first. */
  async list(sheetId: string): Promise<NamedRevision[]> {
    return selectNamedRevisions(this.dataSource.manager, sheetId)
  }

  /** Puts a name and a note on a revision, or changes them. */
  async put(
    sheetId: string,
    accountId: string,
    revision: number,
    { name, note }: { name: string; note: string },
  ): Promise<NamedRevision> {
    return this.dataSource.transaction(async (em) => {
      // Whoever names at the same time waits, so that the second of two equal names is told of the first.
      const sheet = await lockSheet(em, sheetId)
      if (revision > sheet.revision) throw noRevision(revision, sheet.revision)
      const other = await findByName(em, sheetId, name)
      if (other !== undefined && other !== revision) {
        const detail = `Revision ${other} of this sheet is named “${name}” already.`
        throw problem('name-taken', detail, { errors: [{ pointer: '/name', detail }] })
      }
      await putName(em, sheetId, { revision, name, note, by: accountId })
      await keepAudit(em, {
        event: { kind: 'revision-named', revision, name },
        accountId,
        sheet: sheet.number,
      })
      const [named] = await selectNamedRevisions(em, sheetId, [revision])
      if (!named) throw new Error(`Revision ${revision} of sheet ${sheet.number} was not named.`)
      return named
    })
  }

  /** Takes the name off a revision. */
  async remove(sheetId: string, accountId: string, revision: number): Promise<void> {
    await this.dataSource.transaction(async (em) => {
      const sheet = await lockSheet(em, sheetId)
      const name = await removeName(em, sheetId, revision)
      if (name === undefined) throw problem('not-found', `Revision ${revision} has no name.`)
      await keepAudit(em, {
        event: { kind: 'revision-unnamed', revision, name },
        accountId,
        sheet: sheet.number,
      })
    })
  }
}

const noRevision = (revision: number, latest: number) =>
  problem('not-found', `The sheet is at revision ${latest}; revision ${revision} does not exist yet.`)
