import { spawn } from 'node:child_process'
import { join } from 'node:path'
import { setTimeout } from 'node:timers/promises'
import { ensurePackages } from './lib/npm-packages.mjs'
import { findFreePort } from './lib/ports.mjs'
import { dataFolder, projectFolder } from './lib/project.mjs'
import { ended } from './lib/run.mjs'
import { fail, say } from './lib/say.mjs'
import { startServer } from './lib/server-process.mjs'
import { askedToStop, checkMachine, host, openDatabase, port, sayReady } from './lib/up.mjs'

/** `npm run dev`: as `npm start`, but Vite serves the client from its sources and the server begins again when its own
 *  change. Vite answers at PORT and passes calls on to the server behind it. */
async function main() {
  const stopping = askedToStop()
  await checkMachine()
  await ensurePackages()
  const database = await openDatabase()
  const serverPort = String(await findFreePort())
  const address = `http://${host}:${port}`
  const server = startServer({
    dataFolder,
    settings: {
      ...database.settings,
      SHEETWRIGHT_DATA: dataFolder,
      SHEETWRIGHT_URL: address,
      PORT: serverPort,
    },
    watch: true,
  })
  const vite = startVite(`http://${host}:${serverPort}`)
  try {
    const demoAccounts = await Promise.race([whenServing(serverPort), stopping, server.ended, ended(vite)])
    if (Array.isArray(demoAccounts)) {
      sayReady({ url: address, demoAccounts })
      await Promise.race([stopping, server.ended, ended(vite)])
    }
  } finally {
    say('\nStopping …')
    vite.kill('SIGTERM')
    await Promise.all([server.stop(), ended(vite)])
    await database.stop()
  }
}

/** The demo accounts, once the server answers. */
async function whenServing(serverPort) {
  for (;;) {
    const answer = await fetch(`http://${host}:${serverPort}/api/session`).catch(() => undefined)
    if (answer?.ok) return (await answer.json()).demoAccounts
    await setTimeout(300)
  }
}

const startVite = (api) =>
  spawn(
    process.execPath,
    [
      join(projectFolder, 'node_modules/vite/bin/vite.js'),
      '--host',
      host,
      '--port',
      String(port),
      '--strictPort',
    ],
    {
      cwd: projectFolder,
      env: { ...process.env, SHEETWRIGHT_API: api },
      stdio: ['ignore', 'inherit', 'inherit'],
      detached: true,
    },
  )

main()
  .catch(fail)
  .finally(() => process.exit())
