import 'reflect-metadata'
import { DataSource } from 'typeorm'
import { migrations } from '../migrations'
import { entities } from './entities'
import { grantRights } from './rights'

/** Connections that one process keeps to PostgreSQL for its requests and jobs. */
const POOL_SIZE = 16

/** Any number, the same for every process of every version: two that start at once migrate one after the other. */
const MIGRATION_LOCK = 4_310_001

/** Brings the tables up to date as their owner, and gives the application's role its rights.
 *  @param ownerUrl address of the database for the role that owns the tables
 *  @param url address for the role that the application works as */
export async function migrateAsOwner(ownerUrl: string, url: string): Promise<void> {
  const owner = await createDataSource(ownerUrl).initialize()
  try {
    await migrate(owner, decodeURIComponent(new URL(url).username))
  } finally {
    await owner.destroy()
  }
}

/** The database behind one connection URL; not yet connected. Tables come from migrations only. */
export const createDataSource = (url: string): DataSource =>
  new DataSource({
    type: 'postgres',
    url,
    entities,
    migrations,
    synchronize: false,
    // The first migration creates the one extension; creating others would need rights that the role may lack.
    installExtensions: false,
    applicationName: 'sheetwright',
    poolSize: POOL_SIZE,
  })

/** Brings the tables up to date, under an advisory lock that all processes on this database share.
 *  @param role the application's role, where it is another than the one that migrates and so owns the tables: it is then
 *  given its rights and no more */
export async function migrate(dataSource: DataSource, role?: string): Promise<void> {
  const lock = dataSource.createQueryRunner()
  try {
    await lock.query('SELECT pg_advisory_lock($1)', [MIGRATION_LOCK])
    await dataSource.runMigrations({ transaction: 'each' })
    if (role !== undefined) await dataSource.transaction((em) => grantRights(em, role))
  } finally {
    // Also after a failure: a pooled connection would otherwise go on holding the lock.
    await lock.query('SELECT pg_advisory_unlock($1)', [MIGRATION_LOCK])
    await lock.release()
  }
}
