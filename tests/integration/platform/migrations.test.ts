import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { DataSource } from 'typeorm'
import { migrations } from '../../../server/migrations'
import { createDataSource, migrate } from '../../../server/platform/database'
import { emptyDatabase, type TestDatabase } from '../../support/database'

let database: TestDatabase
let dataSource: DataSource

beforeAll(async () => {
  database = await emptyDatabase()
  dataSource = await createDataSource(database.url).initialize()
})
afterAll(async () => {
  await dataSource.destroy()
  await database.drop()
})

const listTables = async (): Promise<string[]> => {
  const rows = await dataSource.query<{ name: string }[]>(
    `SELECT table_name AS name FROM information_schema.tables
     WHERE table_schema = 'public' AND table_type = 'BASE TABLE' ORDER BY table_name`,
  )
  return rows.map((row) => row.name)
}

describe('migrations', () => {
  it('give an empty database exactly the tables of the entities', async () => {
    await migrate(dataSource)
    const difference = await dataSource.driver.createSchemaBuilder().log()
    expect(difference.upQueries.map((query) => query.query)).toEqual([])
    expect(await listTables()).toEqual(
      expect.arrayContaining(dataSource.entityMetadatas.map((each) => each.tableName)),
    )
  })

  it('run once, also when several processes start together', async () => {
    const others = await Promise.all([1, 2, 3].map(() => createDataSource(database.url).initialize()))
    await Promise.all(others.map((other) => migrate(other)))
    await Promise.all(others.map((other) => other.destroy()))
    const [row] = await dataSource.query<{ count: number }[]>(
      'SELECT count(*)::integer AS count FROM migrations',
    )
    expect(row?.count).toBe(migrations.length)
  })

  it('can be taken back, one after the other', async () => {
    for (let left = migrations.length; left > 0; left--)
      await dataSource.undoLastMigration({ transaction: 'each' })
    expect(await listTables()).toEqual(['migrations', 'spatial_ref_sys'])
    await migrate(dataSource)
    expect(await listTables()).toContain('item_version')
  })
})
