import { randomBytes } from 'node:crypto'
import { Client } from 'pg'
import { createDataSource, migrate } from '../../server/platform/database'

/** A database of one test file's own. */
export interface TestDatabase {
  url: string
  drop(): Promise<void>
}

const TEMPLATE = 'sheetwright_template'
/** Any number, the same for every test process. */
const TEMPLATE_LOCK = 4_310_900

/** A database with all tables and nothing in them, copied from one that the first test has migrated. */
export const migratedDatabase = async (): Promise<TestDatabase> => {
  await asSuperuser(makeTemplate)
  return makeDatabase(`TEMPLATE ${TEMPLATE}`)
}

/** A database with nothing in it. */
export const emptyDatabase = (): Promise<TestDatabase> => makeDatabase('')

async function makeDatabase(options: string): Promise<TestDatabase> {
  const name = `test_${randomBytes(8).toString('hex')}`
  await asSuperuser((client) => client.query(`CREATE DATABASE ${name} ${options}`))
  return {
    url: addressOf(name),
    drop: () =>
      asSuperuser(async (client) => void (await client.query(`DROP DATABASE ${name} WITH (FORCE)`))),
  }
}

/** One test process makes the template, the others wait for it. */
async function makeTemplate(client: Client): Promise<void> {
  await client.query('SELECT pg_advisory_lock($1)', [TEMPLATE_LOCK])
  const { rowCount } = await client.query('SELECT FROM pg_database WHERE datname = $1', [TEMPLATE])
  if (rowCount) return
  const part = `${TEMPLATE}_part`
  await client.query(`DROP DATABASE IF EXISTS ${part}`)
  await client.query(`CREATE DATABASE ${part}`)
  const dataSource = await createDataSource(addressOf(part)).initialize()
  try {
    await migrate(dataSource)
  } finally {
    await dataSource.destroy()
  }
  await client.query(`ALTER DATABASE ${part} RENAME TO ${TEMPLATE}`)
}

/** Runs something on a connection of its own, whose end also lets go of its locks. */
async function asSuperuser<T>(work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: clusterUrl() })
  await client.connect()
  try {
    return await work(client)
  } finally {
    await client.end()
  }
}

function addressOf(database: string): string {
  const url = new URL(clusterUrl())
  url.pathname = `/${database}`
  return url.href
}

function clusterUrl(): string {
  const url = process.env['SHEETWRIGHT_TEST_DATABASE_URL']
  if (!url) throw new Error('The test cluster is not running: tests/support/global-setup.ts starts it.')
  return url
}
