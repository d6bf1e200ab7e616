import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { ensureClient } from '../../server/scripts/lib/client-build.mjs'
import { findFreePort } from '../../server/scripts/lib/ports.mjs'
import { startServer } from '../../server/scripts/lib/server-process.mjs'
import { migratedDatabase } from './database'

export { launchBrowser } from './browser'

/** The product itself, as it is started for people: a process and a database of its own, the demo, the built client. */
export interface Running {
  url: string
  /** Number of the server process. */
  pid: number
  stop(): Promise<void>
}

/** Starts the server on a free port and waits until people could come. */
export async function startRunning(settings: Record<string, string> = {}): Promise<Running> {
  await ensureClient()
  const database = await migratedDatabase()
  const dataFolder = mkdtempSync(join(tmpdir(), 'sheetwright-files-'))
  const server = startServer({
    dataFolder,
    settings: {
      NODE_ENV: 'production',
      PORT: String(await findFreePort()),
      DATABASE_URL: database.url,
      SHEETWRIGHT_DATA: dataFolder,
      SHEETWRIGHT_DEMO: '1',
      ...settings,
    },
  })
  const ready = await server.ready
  const { pid } = server.child
  if (ready === undefined || pid === undefined)
    throw new Error('The server ended before it was ready: see above.')
  return {
    url: ready.url,
    pid,
    async stop() {
      await server.stop()
      await database.drop()
      rmSync(dataFolder, { recursive: true, force: true })
    },
  }
}
