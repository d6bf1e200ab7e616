import { chmodSync, existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createDataSource, migrateAsOwner } from '../../../server/platform/database'
import { startCluster } from '../../../server/scripts/lib/cluster.mjs'
import { connected } from '../../support/database'

let folder: string
let cluster: Awaited<ReturnType<typeof startCluster>>

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'sheetwright-cluster-'))
  // PostgreSQL's own user has to pass through it.
  chmodSync(folder, 0o711)
  cluster = await startCluster({ dataFolder: folder, throwAway: true })
})
afterAll(async () => {
  await cluster.stop()
  rmSync(folder, { recursive: true, force: true })
})

/** Runs SQL on the application's database as the superuser. */
async function asSuperuser(sql: string): Promise<Record<string, unknown>[]> {
  const url = new URL(cluster.superuserUrl)
  url.pathname = '/sheetwright'
  return connected(url.href, async (client) => (await client.query(sql)).rows)
}

/** What of all that is forbidden the application's own role can do, once everything is set up as at a start. */
async function possibleDamage(): Promise<string[]> {
  await migrateAsOwner(cluster.ownerUrl, cluster.url)
  const application = await createDataSource(cluster.url).initialize()
  try {
    const tried = [
      'DELETE FROM audit_entry',
      'TRUNCATE audit_entry',
      'DROP TABLE audit_entry',
      'DELETE FROM revision',
    ]
    const refused: string[] = []
    for (const sql of tried) await application.query(sql).catch(() => refused.push(sql))
    await application.query(
      `INSERT INTO account (email, name, initials) VALUES (gen_random_uuid()::text, 'Nan Skua', 'NS')`,
    )
    return tried.filter((sql) => !refused.includes(sql))
  } finally {
    await application.destroy()
  }
}

describe('the private cluster', () => {
  it('gives the application a role of its own, which owns nothing and cannot rewrite what is kept', async () => {
    expect(await possibleDamage()).toEqual([])
    expect(
      await asSuperuser(
        `SELECT DISTINCT tableowner AS owner FROM pg_tables WHERE schemaname = 'public' ORDER BY owner`,
      ),
    ).toEqual([{ owner: 'postgres' }, { owner: 'sheetwright_owner' }])
    expect(await asSuperuser(`SELECT rolsuper FROM pg_roles WHERE rolname LIKE 'sheetwright%'`)).toEqual([
      { rolsuper: false },
      { rolsuper: false },
    ])
  })

  it('takes over a database of the first version, whose role owned everything', async () => {
    await asSuperuser(`
      REASSIGN OWNED BY sheetwright_owner TO sheetwright;
      DROP OWNED BY sheetwright_owner;
      DROP ROLE sheetwright_owner;`)
    const passwords = join(folder, 'postgres', 'passwords.json')
    expect(existsSync(passwords)).toBe(true)
    const { superuser, app } = JSON.parse(readFileSync(passwords, 'utf8'))
    writeFileSync(passwords, JSON.stringify({ superuser, app }))
    cluster = await startCluster({ dataFolder: folder, throwAway: true })
    expect(await possibleDamage()).toEqual([])
    expect(await asSuperuser('SELECT count(*)::integer AS people FROM account')).toEqual([{ people: 2 }])
  })
})
