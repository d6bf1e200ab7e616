import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Express } from 'express'
import type { DataSource } from 'typeorm'
import { createApp, type AppOptions } from '../../server/app'
import { readConfig, type Config } from '../../server/config'
import { loadDemoAccounts } from '../../server/features/accounts/demo-accounts'
import { createServices, type Services } from '../../server/services'
import { connected, migratedDatabase } from './database'

export { signIn, signInAs, type Agent, type Who } from './sign-in'
export { aSheet, type TestSheet } from './sheets'

/** The whole server inside the test process, on a database of its own. Answers are checked against their contracts. */
export interface TestServer {
  app: Express
  url: string
  dataSource: DataSource
  services: Services
  /** Runs SQL as the database's superuser, who is held back by nothing but triggers. */
  asSuperuser(sql: string, values?: unknown[]): Promise<unknown[]>
  close(): Promise<void>
}

/** Starts a server with the four demo accounts, no sheet, and working jobs and events. */
export async function startTestServer(
  overrides: Partial<Config> = {},
  { checkAnswers = true }: AppOptions = {},
): Promise<TestServer> {
  const database = await migratedDatabase()
  const dataFolder = mkdtempSync(join(tmpdir(), 'sheetwright-files-'))
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port }: Pick<AddressInfo, 'port'> = addressOf(server.address())
  const url = `http://127.0.0.1:${port}`
  const environment = { DATABASE_URL: database.url, SHEETWRIGHT_DATA: dataFolder, SHEETWRIGHT_LOG: 'silent' }
  const services = await createServices({ ...readConfig(environment), port, url, demo: true, ...overrides })
  await loadDemoAccounts(services.dataSource)
  await services.events.open()
  await services.jobs.start({ work: true })
  const app = createApp(services, { checkAnswers })
  server.on('request', app)
  return {
    app,
    url,
    dataSource: services.dataSource,
    services,
    asSuperuser: (sql, values) =>
      connected(database.superuserUrl, async (client) => (await client.query(sql, values)).rows),
    async close() {
      const closed = new Promise((resolve) => server.close(resolve))
      await services.events.close()
      server.closeAllConnections()
      await closed
      await services.close()
      await database.drop()
      rmSync(dataFolder, { recursive: true, force: true })
    },
  }
}

function addressOf(address: string | AddressInfo | null): AddressInfo {
  if (address === null || typeof address === 'string') throw new Error('The test server has no port.')
  return address
}
