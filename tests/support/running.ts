import { spawn } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { freePort } from '../../server/scripts/lib/cluster.mjs'
import { freshDatabase } from './database'

/** The product itself, as it is started for people: own process, own database with the demo, built client. */
export interface Running {
  url: string
  stop(): Promise<void>
}

const projectFolder = resolve(import.meta.dirname, '../..')
const READY = 'Sheetwright is ready at'

/** Starts the server on a free port and waits until it says that it is ready. The client has to be built. */
export async function startRunning(environment: Record<string, string> = {}): Promise<Running> {
  const database = await freshDatabase()
  const dataFolder = mkdtempSync(join(tmpdir(), 'sheetwright-files-'))
  const port = await freePort()
  const server = spawn(process.execPath, ['--import', 'tsx', join(projectFolder, 'server/main.ts')], {
    cwd: projectFolder,
    env: {
      ...process.env,
      NODE_ENV: 'production',
      TSX_TSCONFIG_PATH: join(projectFolder, 'server/tsconfig.json'),
      PORT: String(port),
      DATABASE_URL: database.url,
      SHEETWRIGHT_DATA: dataFolder,
      SHEETWRIGHT_DEMO: '1',
      ...environment,
    },
  })
  const ended = new Promise<void>((done) => server.once('close', () => done()))
  await new Promise<void>((ready, reject) => {
    let printed = ''
    const hear = (chunk: Buffer) => {
      printed += chunk.toString()
      if (printed.includes(READY)) ready()
    }
    server.stdout.on('data', hear)
    server.stderr.on('data', hear)
    server.once('close', (code) =>
      reject(new Error(`The server ended with ${code} before it was ready:\n${printed}`)),
    )
  })
  return {
    url: `http://127.0.0.1:${port}`,
    async stop() {
      server.kill('SIGTERM')
      await ended
      await database.drop()
      rmSync(dataFolder, { recursive: true, force: true })
    },
  }
}
