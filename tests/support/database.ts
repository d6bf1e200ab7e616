import { randomUUID } from 'node:crypto'
import { chmodSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Client } from 'pg'
import { startCluster } from '../../server/scripts/lib/cluster.mjs'
import { ensurePostgres } from '../../server/scripts/lib/debian.mjs'

/** A database of one test file's own. */
export interface TestDatabase {
  url: string
  drop(): Promise<void>
}

let serverUrl: Promise<string> | undefined

/** An empty database in the test cluster: the one that npm test started, or, where a test file is run by itself, one that
 *  lives as long as this process. */
export async function freshDatabase(): Promise<TestDatabase> {
  const server = await (serverUrl ??= findServer())
  const name = `test_${randomUUID().replaceAll('-', '')}`
  await query(server, `CREATE DATABASE ${name}`)
  const url = new URL(server)
  url.pathname = `/${name}`
  return { url: url.href, drop: () => query(server, `DROP DATABASE IF EXISTS ${name} WITH (FORCE)`) }
}

async function findServer(): Promise<string> {
  const given = process.env['SHEETWRIGHT_TEST_DATABASE_URL']
  if (given) return given
  const folder = mkdtempSync(join(tmpdir(), 'sheetwright-test-'))
  // PostgreSQL runs as a user of its own, who has to get in.
  chmodSync(folder, 0o755)
  const cluster = await startCluster({ programs: ensurePostgres(), dataFolder: folder, durable: false })
  process.once('exit', () => {
    cluster.stop('immediate')
    rmSync(folder, { recursive: true, force: true })
  })
  return cluster.url('postgres')
}

async function query(url: string, sql: string): Promise<void> {
  const client = new Client({ connectionString: url })
  await client.connect()
  try {
    await client.query(sql)
  } finally {
    await client.end()
  }
}
