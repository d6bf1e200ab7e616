import { spawn } from 'node:child_process'
import { join } from 'node:path'
import { startCluster } from './lib/cluster.mjs'
import { holdFolder } from './lib/one-at-a-time.mjs'
import { dataFolder, projectFolder } from './lib/project.mjs'
import { fail, Stop } from './lib/say.mjs'

/** `npm run verify`: walks ledger, audit trail and editions, also while the application runs. */
async function main() {
  const database = await openDatabase()
  try {
    process.exitCode = await verify(database.url)
  } finally {
    await database.stop()
  }
}

/** The database that DATABASE_URL names, or the private one; that is started if the application does not run. */
async function openDatabase() {
  if (process.env.DATABASE_URL) return { url: process.env.DATABASE_URL, stop: async () => {} }
  const letGo = holdIfFree()
  const cluster = await startCluster({ dataFolder })
  return {
    url: cluster.url,
    async stop() {
      if (!letGo) return
      await cluster.stop()
      letGo()
    },
  }
}

/** Holds the data folder, unless the application does: then the database is its to stop. */
function holdIfFree() {
  try {
    return holdFolder(dataFolder)
  } catch (fault) {
    if (fault instanceof Stop) return undefined
    throw fault
  }
}

const verify = (url) =>
  new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'server/verify.ts'], {
      cwd: projectFolder,
      env: {
        ...process.env,
        TSX_TSCONFIG_PATH: join(projectFolder, 'server/tsconfig.json'),
        DATABASE_URL: url,
        SHEETWRIGHT_DATA: dataFolder,
      },
      stdio: 'inherit',
    })
    child.once('error', reject)
    child.once('exit', (code) => resolve(code ?? 1))
  })

main()
  .catch(fail)
  .finally(() => process.exit())
