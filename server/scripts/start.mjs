import { ensureClient } from './lib/client-build.mjs'
import { ensurePackages } from './lib/npm-packages.mjs'
import { dataFolder } from './lib/project.mjs'
import { fail, say, Stop } from './lib/say.mjs'
import { startServer } from './lib/server-process.mjs'
import { askedToStop, checkMachine, openDatabase, sayReady } from './lib/up.mjs'

/** `npm start`: sets up what is missing, starts everything, and stops everything that it started. */
async function main() {
  const stopping = askedToStop()
  await checkMachine()
  await ensurePackages()
  await ensureClient()
  const database = await openDatabase()
  const settings = { NODE_ENV: 'production', SHEETWRIGHT_DATA: dataFolder, ...database.settings }
  say('Starting the server …')
  const server = startServer({ dataFolder, settings })
  try {
    const ready = await Promise.race([server.ready, stopping.then(() => 'stop')])
    if (ready === undefined)
      throw new Stop(`The server did not start; ${dataFolder}/server.log may say more.`)
    if (ready !== 'stop') {
      sayReady(ready)
      const end = await Promise.race([stopping.then(() => 'asked'), server.ended.then(() => 'crashed')])
      if (end === 'crashed')
        throw new Stop(`The server has ended by itself; ${dataFolder}/server.log may say why.`)
    }
  } finally {
    say('\nStopping …')
    await server.stop()
    await database.stop()
  }
  say('Everything is stopped.')
}

main()
  .catch(fail)
  .finally(() => process.exit())
