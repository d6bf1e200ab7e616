// npm run dev: the same database as npm start, with hot reload of client and server.
import { join } from 'node:path'
import { runTogether } from './lib/children.mjs'
import { freePort } from './lib/cluster.mjs'
import { chosenPort, prepareInstallation } from './lib/installation.mjs'
import { main } from './lib/say.mjs'
import { projectFolder } from './lib/stamps.mjs'

await main(async () => {
  const port = chosenPort()
  const { environment, stop } = await prepareInstallation({ port })
  const serverPort = await freePort()
  const api = `http://127.0.0.1:${serverPort}`
  const env = { ...environment, TSX_TSCONFIG_PATH: join(projectFolder, 'server/tsconfig.json') }
  const at = (path) => join(projectFolder, 'node_modules', path)
  try {
    return await runTogether([
      {
        command: process.execPath,
        args: [at('tsx/dist/cli.mjs'), 'watch', '--clear-screen=false', 'server/main.ts'],
        options: {
          cwd: projectFolder,
          env: { ...env, PORT: String(serverPort), SHEETWRIGHT_URL: `http://127.0.0.1:${port}` },
        },
      },
      {
        command: process.execPath,
        args: [at('vite/bin/vite.js'), '--port', String(port), '--strictPort'],
        options: { cwd: projectFolder, env: { ...env, SHEETWRIGHT_API: api } },
      },
    ])
  } finally {
    stop()
  }
})
