// What the scripts tell a person, and how they run other programs. Plain Node: packages may not be installed yet.
import { spawn, spawnSync } from 'node:child_process'

/** One line of progress. */
export const say = (sentence) => console.log(`· ${sentence}`)

/** Stops with what went wrong and what to run. */
export class SetupError extends Error {}

/** Runs a program to its end and gives what it printed. @throws SetupError if it fails */
export function run(command, args, options = {}) {
  const done = spawnSync(command, args, { encoding: 'utf8', ...options })
  if (done.error || done.status !== 0) {
    const printed = [done.stdout, done.stderr, done.error?.message].filter(Boolean).join('\n').trim()
    throw new SetupError(`${command} ${args.join(' ')} failed:\n${printed.slice(-2000)}`)
  }
  return done.stdout ?? ''
}

/** Whether a program runs and succeeds. */
export const succeeds = (command, args, options = {}) =>
  spawnSync(command, args, { stdio: 'ignore', ...options }).status === 0

/** Runs a program with its output shown; resolves with its exit code. */
export function show(command, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: 'inherit', ...options })
    child.on('error', reject)
    child.on('exit', (code, signal) => resolve(signal ? 1 : (code ?? 1)))
  })
}

/** Runs a script's main function: a SetupError is shown as a sentence, and ends with exit code 1. */
export async function main(script) {
  try {
    process.exitCode = (await script()) ?? 0
  } catch (error) {
    console.error(error instanceof SetupError ? `\n${error.message}\n` : error)
    process.exitCode = 1
  }
}
