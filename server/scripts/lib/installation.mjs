// What start and dev share: everything from an empty machine to a database that the server can use.
import { resolve } from 'node:path'
import { ensureDatabase, isFree, startCluster } from './cluster.mjs'
import { ensurePostgres } from './debian.mjs'
import { say, SetupError } from './say.mjs'
import { ensurePackages, projectFolder } from './stamps.mjs'

/** Environment of the server, and how to stop what was started. */
export async function prepareInstallation({ port }) {
  if (!(await isFree(port))) {
    throw new SetupError(
      `Port ${port} is taken. Stop what uses it, or choose another: PORT=${port + 1} npm start`,
    )
  }
  ensurePackages()
  const dataFolder = resolve(projectFolder, process.env.SHEETWRIGHT_DATA ?? '.data')
  const environment = { ...process.env, PORT: String(port), SHEETWRIGHT_DATA: dataFolder }
  if (process.env.DATABASE_URL) return { environment, stop: () => {} }
  const programs = ensurePostgres()
  say('Starting the private database')
  const cluster = await startCluster({ programs, dataFolder })
  try {
    ensureDatabase(programs, cluster, 'sheetwright')
  } catch (error) {
    cluster.stop()
    throw error
  }
  return {
    environment: { SHEETWRIGHT_DEMO: '1', ...environment, DATABASE_URL: cluster.url('sheetwright') },
    stop: () => cluster.stop(),
  }
}

/** The port to serve on. */
export function chosenPort() {
  const port = Number(process.env.PORT ?? 4310)
  if (!Number.isInteger(port) || port < 1 || port > 65535)
    throw new SetupError(`PORT is ${process.env.PORT}; it has to be a number from 1 to 65535.`)
  return port
}
