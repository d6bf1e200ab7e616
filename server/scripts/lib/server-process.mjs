import { spawn } from 'node:child_process'
import { existsSync, mkdirSync, openSync, renameSync, statSync } from 'node:fs'
import { join } from 'node:path'
import { projectFolder } from './project.mjs'
import { ended } from './run.mjs'

const MAX_LOG_BYTES = 20_000_000
/** Longer than the server itself gives its open requests. */
const PATIENCE_MS = 20_000

/** Starts the server; `ready` resolves with what it says once people can come (never while watching), undefined if it
 *  ends before that.
 *  @param {{ dataFolder: string, settings: NodeJS.ProcessEnv, watch?: boolean }} options
 *  @returns {{ child: import('node:child_process').ChildProcess, ready: Promise<Ready | undefined>, ended: Promise<void>,
 *    stop(): Promise<void> }}
 *  @typedef {import('../../main').ReadyMessage['ready']} Ready */
export function startServer({ dataFolder, settings, watch = false }) {
  const log = openLog(dataFolder)
  const program = watch
    ? ['node_modules/tsx/dist/cli.mjs', 'watch', '--clear-screen=false']
    : ['--import', 'tsx']
  const child = spawn(process.execPath, [...program, 'server/main.ts'], {
    cwd: projectFolder,
    env: { ...process.env, TSX_TSCONFIG_PATH: join(projectFolder, 'server/tsconfig.json'), ...settings },
    // tsx keeps the channel for itself when it watches.
    stdio: watch ? ['ignore', log, 'inherit'] : ['ignore', log, 'inherit', 'ipc'],
    // A group of its own: Ctrl-C reaches this script, which then stops the server once and in order.
    detached: true,
  })
  const ready = new Promise((resolve) => {
    child.on('message', (message) => {
      if (message && typeof message === 'object' && 'ready' in message) resolve(message.ready)
    })
    child.once('exit', () => resolve(undefined))
  })
  return {
    child,
    ready,
    ended: ended(child),
    /** Asks it to finish, and after a while ends it. */
    async stop() {
      child.kill('SIGTERM')
      const late = setTimeout(() => child.kill('SIGKILL'), PATIENCE_MS)
      await ended(child)
      clearTimeout(late)
    },
  }
}

/** The server's log; the one before is kept beside it when it has grown. */
function openLog(dataFolder) {
  mkdirSync(dataFolder, { recursive: true })
  const path = join(dataFolder, 'server.log')
  if (existsSync(path) && statSync(path).size > MAX_LOG_BYTES) renameSync(path, `${path}.1`)
  return openSync(path, 'a', 0o600)
}
