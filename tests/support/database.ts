import { randomBytes } from 'node:crypto'
import { Client } from 'pg'
import { createDataSource, migrate } from '../../server/platform/database'

/** A database of one test file's own. */
export interface TestDatabase {
  /** Address for the application's own role, which has the rights of a real installation and no more. */
  url: string
  /** Address for the superuser, who may do anything. */
  superuserUrl: string
  drop(): Promise<void>
}

const TEMPLATE = 'sheetwright_template'
/** Any number, the same for every test process. */
const TEMPLATE_LOCK = 4_310_900
/** The roles that every private cluster has. */
const APP = 'sheetwright'
const OWNER = 'sheetwright_owner'
/** Of both roles, in tests only. */
const PASSWORD = 'test'

/** A database with all tables and nothing in them, copied from one that the first test has migrated. */
export async function migratedDatabase(): Promise<TestDatabase> {
  await asSuperuser(makeTemplate)
  const name = await makeDatabase(`TEMPLATE ${TEMPLATE} OWNER ${OWNER}`)
  // Rights on a database are not copied with it.
  await asSuperuser((client) => client.query(`GRANT CREATE ON DATABASE ${name} TO ${APP}`))
  return { url: addressOf(name, APP), superuserUrl: addressOf(name), drop: () => drop(name) }
}

/** A database with nothing in it, whose address is the superuser's. */
export async function emptyDatabase(): Promise<TestDatabase> {
  const name = await makeDatabase('')
  return { url: addressOf(name), superuserUrl: addressOf(name), drop: () => drop(name) }
}

async function makeDatabase(options: string): Promise<string> {
  const name = `test_${randomBytes(8).toString('hex')}`
  await asSuperuser((client) => client.query(`CREATE DATABASE ${name} ${options}`))
  return name
}

const drop = (name: string): Promise<void> =>
  asSuperuser(async (client) => void (await client.query(`DROP DATABASE ${name} WITH (FORCE)`)))

/** One test process makes the template, the others wait for it. */
async function makeTemplate(client: Client): Promise<void> {
  await client.query('SELECT pg_advisory_lock($1)', [TEMPLATE_LOCK])
  const { rowCount } = await client.query('SELECT FROM pg_database WHERE datname = $1', [TEMPLATE])
  if (rowCount) return
  const part = `${TEMPLATE}_part`
  for (const role of [APP, OWNER]) await client.query(`ALTER ROLE ${role} PASSWORD '${PASSWORD}'`)
  await client.query(`DROP DATABASE IF EXISTS ${part}`)
  await client.query(`CREATE DATABASE ${part} OWNER ${OWNER}`)
  await connected(addressOf(part), (inside) => inside.query('CREATE EXTENSION postgis'))
  const owner = await createDataSource(addressOf(part, OWNER)).initialize()
  try {
    await migrate(owner, APP)
  } finally {
    await owner.destroy()
  }
  await client.query(`ALTER DATABASE ${part} RENAME TO ${TEMPLATE}`)
}

const asSuperuser = <T>(work: (client: Client) => Promise<T>): Promise<T> => connected(clusterUrl(), work)

/** Runs something on a connection of its own, whose end also lets go of its locks. */
export async function connected<T>(url: string, work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: url })
  await client.connect()
  try {
    return await work(client)
  } finally {
    await client.end()
  }
}

/** Address of a database for a role; for the superuser, if none is named. */
function addressOf(database: string, role?: string): string {
  const url = new URL(clusterUrl())
  url.pathname = `/${database}`
  if (role !== undefined) {
    url.username = role
    url.password = PASSWORD
  }
  return url.href
}

function clusterUrl(): string {
  const url = process.env['SHEETWRIGHT_TEST_DATABASE_URL']
  if (!url) throw new Error('The test cluster is not running: tests/support/global-setup.ts starts it.')
  return url
}
