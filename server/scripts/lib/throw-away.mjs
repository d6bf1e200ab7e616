import { chmodSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { startCluster } from './cluster.mjs'

/** A PostgreSQL cluster for tests, in a folder of its own that `stop` removes. It may lose everything at any time.
 *  @returns {Promise<{ superuserUrl: string, stop(): Promise<void> }>} */
export async function startThrowAwayCluster() {
  const folder = mkdtempSync(join(tmpdir(), 'sheetwright-test-'))
  // PostgreSQL's own user has to pass through it.
  chmodSync(folder, 0o711)
  const remove = () => rmSync(folder, { recursive: true, force: true })
  try {
    const cluster = await startCluster({ dataFolder: folder, throwAway: true })
    return {
      superuserUrl: cluster.superuserUrl,
      async stop() {
        await cluster.stop()
        remove()
      },
    }
  } catch (fault) {
    remove()
    throw fault
  }
}
