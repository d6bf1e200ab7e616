import { spawn } from 'node:child_process'
import { constants } from 'node:os'

/** Runs a program to its end.
 *  @param {{ show?: boolean } & import('node:child_process').SpawnOptions} [options] `show` lets its output through
 *  @returns {Promise<{ code: number, output: string }>} exit code, and what it wrote where that is not shown */
export function run(program, args, { show = false, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, { stdio: show ? 'inherit' : ['ignore', 'pipe', 'pipe'], ...options })
    let output = ''
    for (const stream of [child.stdout, child.stderr]) stream?.on('data', (part) => (output += part))
    child.on('error', reject)
    child.on('close', (code, signal) => resolve({ code: code ?? 128 + constants.signals[signal], output }))
  })
}

/** Whether a program can be called by its name. */
export const canRun = async (program) => (await run('sh', ['-c', `command -v ${program}`])).code === 0

/** Ends when a child has ended. */
export const ended = (child) =>
  new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) resolve()
    else child.once('exit', () => resolve())
  })
