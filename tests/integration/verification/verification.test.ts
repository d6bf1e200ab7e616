import { readdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { selectAuditAfter } from '../../../server/features/verification/verification.queries'
import { VerificationService, type Finding } from '../../../server/features/verification/verification.service'
import { chainHash } from '../../../server/platform/audit'
import { aSmallMap, putItems, releaseEdition } from '../../support/review-path'
import { aSheet, signInAs, startTestServer, type TestServer, type TestSheet } from '../../support/server'

let server: TestServer
let sheet: TestSheet

beforeAll(async () => {
  server = await startTestServer()
  const people = { editor: await signInAs(server, 'editor'), approver: await signInAs(server, 'approver') }
  sheet = await aSheet(server)
  const items = aSmallMap()
  const revision = await putItems(people.editor, sheet.number, 1, items)
  expect((await releaseEdition(people, sheet.number, revision)).state).toBe('done')
  const [, , contact] = items
  if (contact?.kind !== 'contact') throw new Error('The small map has no contact.')
  await putItems(people.editor, sheet.number, revision, [
    { ...contact, properties: { ...contact.properties, note: 'seen again' } },
  ])
})
afterAll(() => server.close())

async function verify(): Promise<Record<Finding['part'], string[]>> {
  const { dataSource, services } = server
  const { storage, sheets, history } = services
  const findings = await new VerificationService(dataSource, storage, sheets, history).verify()
  return Object.fromEntries(findings.map(({ part, faults }) => [part, faults])) as Record<
    Finding['part'],
    string[]
  > // One of each part.
}

/** Alters rows as a superuser who takes the guards away, looks, and puts everything back as it was. */
async function withRows(table: string, alter: string, look: () => Promise<void>): Promise<void> {
  const unguarded = (sql: string) => server.asSuperuser(`SET session_replication_role = replica; ${sql}`)
  await unguarded(`CREATE TABLE kept AS TABLE ${table}`)
  try {
    await unguarded(alter)
    await look()
  } finally {
    await unguarded(`DELETE FROM ${table}; INSERT INTO ${table} TABLE kept; DROP TABLE kept`)
  }
}

describe('verify', () => {
  it('finds everything whole after ordinary work, and the audit trail out of the application’s reach', async () => {
    const { dataSource, services } = server
    const { storage, sheets, history } = services
    const findings = await new VerificationService(dataSource, storage, sheets, history).verify()
    expect(findings.map(({ part, faults, notes }) => [part, faults, notes])).toEqual([
      ['ledger', [], []],
      ['audit trail', [], []],
      ['editions', [], []],
    ])
    expect(findings[0]?.seen).toBe('1 sheets, 3 entries, 8 versions of items')
    expect(findings[2]?.seen).toMatch(/^1 editions with [3-9] files$/)
  })

  it('finds an entry of the audit trail that a superuser altered', async () => {
    const alter = `UPDATE audit_entry SET detail = detail || '{"decision": "returned"}' WHERE kind = 'decision'`
    await withRows('audit_entry', alter, async () => {
      const faults = (await verify())['audit trail']
      expect(faults).toHaveLength(1)
      expect(faults[0]).toMatch(/^entry \d+ was altered after it was written$/)
    })
    expect((await verify())['audit trail']).toEqual([])
  })

  it('finds an altered entry also where its own hash was made to fit', async () => {
    const [entry] = await selectAuditAfter(server.dataSource.manager, 1, 1)
    if (!entry) throw new Error('The trail has no second entry.')
    const forged = chainHash({ ...entry, accountId: null })
    const alter = `UPDATE audit_entry SET account_id = NULL, hash = '${forged}' WHERE number = 2`
    await withRows('audit_entry', alter, async () => {
      expect((await verify())['audit trail']).toEqual(['entry 3 does not follow from entry 2 as it is now'])
    })
  })

  it('finds entries taken out of the middle and off the end', async () => {
    await withRows('audit_entry', 'DELETE FROM audit_entry WHERE number IN (2, 3)', async () => {
      expect((await verify())['audit trail']).toEqual(['entries 2 to 3 are missing'])
    })
    const last = 'DELETE FROM audit_entry WHERE number = (SELECT max(number) FROM audit_entry)'
    await withRows('audit_entry', last, async () => {
      expect((await verify())['audit trail']).toMatchObject([expect.stringMatching(/^entry \d+ is missing$/)])
    })
  })

  it('finds a guard that is switched off', async () => {
    await server.asSuperuser('ALTER TABLE audit_entry DISABLE TRIGGER audit_entry_kept')
    expect((await verify())['audit trail']).toEqual([
      'the trigger audit_entry_kept on audit_entry is switched off',
    ])
    await server.asSuperuser('ALTER TABLE audit_entry ENABLE TRIGGER audit_entry_kept')
  })

  it('finds a gap in the ledger, and a sheet that does not stand at its newest entry', async () => {
    await withRows('revision', `DELETE FROM revision WHERE number = 2`, async () => {
      const faults = (await verify()).ledger
      expect(faults).toContain(`sheet ${sheet.number}: entry 3 follows entry 1: the numbers have a gap`)
      expect(faults.some((fault) => fault.includes('one of these entries does not exist'))).toBe(true)
    })
    await withRows('sheet', 'UPDATE sheet SET revision = 9', async () => {
      expect((await verify()).ledger).toEqual([
        `sheet ${sheet.number}: the sheet is at revision 9, but its newest entry is 3`,
      ])
    })
  })

  it('finds versions that run into each other, and an entry that changed more than it says', async () => {
    const overlap = `UPDATE item_version SET until = 4 WHERE until = 3`
    await withRows('item_version', overlap, async () => {
      const faults = (await verify()).ledger
      expect(faults.some((fault) => /the version from 2 to 4 runs into the one from 3/.test(fault))).toBe(
        true,
      )
    })
    const gone = `DELETE FROM item_version WHERE kind = 'attitude'`
    await withRows('item_version', gone, async () => {
      expect((await verify()).ledger).toEqual([
        `sheet ${sheet.number}: entry 2 says that it changed 6 items, but 5 have a version begun or ended there`,
      ])
    })
  })

  it('finds that what an edition was made of was altered', async () => {
    const alter = `UPDATE item_version SET properties = properties || '{"dip": 41}' WHERE kind = 'attitude'`
    await withRows('item_version', alter, async () => {
      expect((await verify()).editions).toEqual([
        `edition 1 of sheet ${sheet.number}: revision 2 is not what was approved and released`,
      ])
    })
  })

  it('finds a file of an edition that was altered', async () => {
    const [file] = await server.dataSource.query(
      `SELECT storage_key AS key FROM artefact WHERE name LIKE '%.geojson'`,
    )
    const path = join(server.services.config.dataFolder, 'files', file.key)
    expect(readdirSync(join(path, '..')).length).toBeGreaterThan(2)
    writeFileSync(path, 'something else')
    const faults = (await verify()).editions
    expect(faults).toHaveLength(1)
    expect(faults[0]).toMatch(/is not the file that was released: 14 bytes/)
  })
})
