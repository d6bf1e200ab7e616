import 'reflect-metadata'
import { DataSource } from 'typeorm'
import { migrations } from '../migrations'
import { entities } from './entities'

/** Connections that one process keeps to PostgreSQL for its requests and jobs. */
const POOL_SIZE = 16

/** Any number, the same for every process of every version: two that start at once migrate one after the other. */
const MIGRATION_LOCK = 4_310_001

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

/** Brings the tables up to date, under an advisory lock that all processes on this database share. */
export async function migrate(dataSource: DataSource): Promise<void> {
  const lock = dataSource.createQueryRunner()
  try {
    await lock.query('SELECT pg_advisory_lock($1)', [MIGRATION_LOCK])
    await dataSource.runMigrations({ transaction: 'each' })
  } finally {
    // Also after a failure: a pooled connection would otherwise go on holding the lock.
    await lock.query('SELECT pg_advisory_unlock($1)', [MIGRATION_LOCK])
    await lock.release()
  }
}
