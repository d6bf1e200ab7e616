// Child processes that end with the script, whatever ends it.
import { spawn } from 'node:child_process'

const GRACE_MS = 10_000

/** Starts programs; resolves with an exit code when the first of them ends or the script is told to stop. All others are
 *  stopped before it resolves. */
export function runTogether(programs) {
  return new Promise((resolve) => {
    const children = programs.map(({ command, args, options }) =>
      // A group of its own: Ctrl-C in a terminal reaches only this script, which then stops them in order.
      spawn(command, args, { stdio: 'inherit', detached: true, ...options }),
    )
    let code
    const stop = (exitCode) => {
      if (code !== undefined) return
      code = exitCode
      for (const child of children) signalGroup(child, 'SIGTERM')
      setTimeout(() => children.forEach((child) => signalGroup(child, 'SIGKILL')), GRACE_MS).unref()
    }
    let running = children.length
    for (const child of children) {
      child.on('error', () => stop(1))
      child.on('close', (exitCode) => {
        running -= 1
        stop(exitCode ?? 1)
        if (running === 0) resolve(code)
      })
    }
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => stop(0))
  })
}

function signalGroup(child, signal) {
  if (child.exitCode !== null || child.signalCode !== null || child.pid === undefined) return
  try {
    process.kill(-child.pid, signal)
  } catch {
    // It has just ended.
  }
}
