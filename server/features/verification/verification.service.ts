import { createHash } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import { chainHash } from '../../platform/audit'
import type { Storage } from '../../platform/storage'
import { revisionDigest } from '../artefacts/digest'
import type { HistoryService } from '../ledger/history.service'
import type { SheetsService } from '../sheets/sheets.service'
import {
  countLedger,
  getAuditHead,
  mayAlterAudit,
  selectAuditAfter,
  selectEditionsToVerify,
  selectFilesOf,
  selectLedgerFaults,
  selectSleepingTriggers,
  type SealedEdition,
  type SealedFile,
} from './verification.queries'

/** What one part of the system was found to be. */
export interface Finding {
  part: 'ledger' | 'audit trail' | 'editions'
  /** What was looked at, in words. */
  seen: string
  /** What is wrong, and where; none where all is well. */
  faults: string[]
  /** What is right but could be better guarded. */
  notes: string[]
}

/** Entries of the audit trail read at a time. */
const BATCH = 2000

/** Walks everything that must never have changed, and says what has. It only reads. */
export class VerificationService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly storage: Storage,
    private readonly sheets: SheetsService,
    private readonly history: HistoryService,
  ) {}

  /** Ledger, audit trail and editions, as they are at one moment. */
  async verify(): Promise<Finding[]> {
    return this.dataSource.transaction('REPEATABLE READ', async (em) => [
      await this.verifyLedger(em),
      await this.verifyAudit(em),
      await this.verifyEditions(em),
    ])
  }

  private async verifyLedger(em: EntityManager): Promise<Finding> {
    const { sheets, entries, versions } = await countLedger(em)
    const faults = (await selectLedgerFaults(em)).map(({ sheet, what }) => `sheet ${sheet}: ${what}`)
    return {
      part: 'ledger',
      seen: `${sheets} sheets, ${entries} entries, ${versions} versions of items`,
      faults,
      notes: [],
    }
  }

  /** Every entry has to carry the hash of the one before and its own; the last has to be the one that the head names. */
  private async verifyAudit(em: EntityManager): Promise<Finding> {
    const faults: string[] = []
    const head = await getAuditHead(em)
    let last = { number: 0, hash: '0'.repeat(64) }
    for (;;) {
      const entries = await selectAuditAfter(em, last.number, BATCH)
      for (const entry of entries) {
        if (entry.number !== last.number + 1) faults.push(missing(last.number + 1, entry.number - 1))
        else if (entry.previous !== last.hash) {
          faults.push(`entry ${entry.number} does not follow from entry ${last.number} as it is now`)
        }
        if (chainHash(entry) !== entry.hash)
          faults.push(`entry ${entry.number} was altered after it was written`)
        last = entry
      }
      if (entries.length < BATCH) break
    }
    if (last.number < head.number) faults.push(missing(last.number + 1, head.number))
    else if (last.hash !== head.hash)
      faults.push(`the trail does not end with entry ${head.number} as it was written`)
    const sleeping = await selectSleepingTriggers(em)
    return {
      part: 'audit trail',
      seen: `${head.number} entries, the last with hash ${head.hash}`,
      faults: [...faults, ...sleeping.map((trigger) => `the trigger ${trigger} is switched off`)],
      notes: (await mayAlterAudit(em))
        ? ['the application’s database role may alter it: use a separate owner (DATABASE_OWNER_URL)']
        : [],
    }
  }

  /** What an edition was made of, and its files, have to have the checksums that they were sealed with. */
  private async verifyEditions(em: EntityManager): Promise<Finding> {
    const editions = await selectEditionsToVerify(em)
    const faults: string[] = []
    let files = 0
    for (const edition of editions) {
      const where = `edition ${edition.number} of sheet ${edition.sheet}`
      if ((await this.digestOf(em, edition)) !== edition.digest) {
        faults.push(`${where}: revision ${edition.revision} is not what was approved and released`)
      }
      for (const file of await selectFilesOf(em, edition.id)) {
        files += 1
        const fault = await this.faultOf(file)
        if (fault) faults.push(`${where}: ${fault}`)
      }
    }
    return { part: 'editions', seen: `${editions.length} editions with ${files} files`, faults, notes: [] }
  }

  private async digestOf(em: EntityManager, edition: SealedEdition): Promise<string> {
    const { sheetId, revision, title, scale } = edition
    const sheet = await this.sheets.get(sheetId, null, em)
    return revisionDigest(
      { ...sheet, title, scale },
      revision,
      await this.history.itemsAt(em, sheetId, revision),
    )
  }

  private async faultOf({ name, bytes, sha256, storageKey }: SealedFile): Promise<string | undefined> {
    const hash = createHash('sha256')
    let size = 0
    try {
      for await (const part of await this.storage.open(storageKey)) {
        hash.update(part)
        size += part.length
      }
    } catch (fault) {
      return `${name} cannot be read (${fault instanceof Error ? fault.message : String(fault)})`
    }
    if (hash.digest('hex') === sha256 && size === Number(bytes)) return undefined
    return `${name} is not the file that was released: ${size} bytes with another SHA-256`
  }
}

const missing = (from: number, to: number): string =>
  from === to ? `entry ${from} is missing` : `entries ${from} to ${to} are missing`
