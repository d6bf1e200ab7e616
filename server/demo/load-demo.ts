import type { DataSource, EntityManager } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import type { LedgerService, ServerEntry } from '../features/ledger/ledger.service'
import type { SheetsService } from '../features/sheets/sheets.service'
import type { Storage } from '../platform/storage'
import { Account } from '../features/accounts/account.entity'
import { Membership } from '../features/accounts/membership.entity'
import { SheetRow } from '../features/sheets/sheet.entity'
import { gannetHead, makeSheet, merrowSheets, merrowTruth, type MerrowSheet } from './merrow-island'
import { terrainFile } from './terrain-file'
import { longStory, shortStory, type Chapter } from './story'

/** What the demo is loaded through. */
export interface DemoServices {
  dataSource: DataSource
  sheets: SheetsService
  ledger: LedgerService
  storage: Storage
}

const HOUR_MS = 3_600_000
/** Any number will do, as long as every process uses the same one. */
const DEMO_LOCK = 4_310_014

type People = Record<Role | 'administrator', string>

/** Makes the demo sheets with their members, ledgers and elevation models, unless they are there. The demo accounts must exist. */
export async function loadDemo(services: DemoServices): Promise<void> {
  await loadSheets(services)
  for (const { sheet, extent } of merrowSheets) {
    const key = terrainKey(sheet.number)
    if (await services.storage.has(key)) continue
    await services.storage.put(key, terrainFile(merrowTruth.ground, extent))
  }
}

/** Where a demo sheet's elevation model lies in the storage. */
export const terrainKey = (sheetNumber: string): string => `demo/terrain/${sheetNumber}.tif`

async function loadSheets(services: DemoServices): Promise<void> {
  await services.dataSource.transaction(async (em) => {
    await em.query('SELECT pg_advisory_xact_lock($1)', [DEMO_LOCK])
    const people: People = {
      compiler: await accountId(em, 'compiler'),
      editor: await accountId(em, 'editor'),
      approver: await accountId(em, 'approver'),
      administrator: await accountId(em, 'administrator'),
    }
    for (const sheet of merrowSheets) {
      if (await em.existsBy(SheetRow, { number: sheet.sheet.number })) continue
      await loadSheet(services, em, people, sheet)
    }
  })
}

async function loadSheet(
  { sheets, ledger }: DemoServices,
  em: EntityManager,
  people: People,
  merrow: MerrowSheet,
): Promise<void> {
  const begin = Date.now()
  const hoursAgo = (hours: number) => new Date(begin - hours * HOUR_MS)
  const sheetId = await sheets.createWithin(em, merrow.sheet, people.administrator, hoursAgo(9 * 24))
  const roles: Role[] = ['compiler', 'editor', 'approver']
  await em.insert(
    Membership,
    roles.map((role) => ({ sheetId, accountId: people[role], role })),
  )
  const items = makeSheet(merrow)
  const chapters: Chapter[] = merrow === gannetHead ? longStory(items) : shortStory(items)
  for (const { by, hours, items: added, edits, provenance, ...entry } of chapters) {
    const written: ServerEntry = { ...entry, at: hoursAgo(hours) }
    if (added) {
      const rows = added.map((item, index) => ({ item, provenance: provenance?.(item, index) ?? null }))
      if (rows.length > 0) await ledger.appendItems(em, sheetId, people[by], rows, written)
    } else {
      await ledger.appendEdits(em, sheetId, people[by], edits ?? [], written)
    }
  }
}

async function accountId(em: EntityManager, who: Role | 'administrator'): Promise<string> {
  const { id } = await em.findOneByOrFail(Account, { email: `${who}@merrow.example` })
  return id
}
