// npm start: from a fresh machine to a running Sheetwright.
import { join } from 'node:path'
import { runTogether } from './lib/children.mjs'
import { chosenPort, prepareInstallation } from './lib/installation.mjs'
import { main } from './lib/say.mjs'
import { ensureClient, projectFolder } from './lib/stamps.mjs'

await main(async () => {
  const { environment, stop } = await prepareInstallation({ port: chosenPort() })
  try {
    ensureClient()
    return await runTogether([
      {
        command: process.execPath,
        args: ['--import', 'tsx', join(projectFolder, 'server/main.ts')],
        options: {
          cwd: projectFolder,
          env: { ...environment, TSX_TSCONFIG_PATH: join(projectFolder, 'server/tsconfig.json') },
        },
      },
    ])
  } finally {
    stop()
  }
})
