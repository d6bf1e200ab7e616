import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { projectFolder } from './project.mjs'
import { run } from './run.mjs'
import { say, Stop } from './say.mjs'

/** Installs the npm packages of the lockfile unless exactly those are there. */
export async function ensurePackages() {
  if (arePackagesInstalled()) return
  say('Installing npm packages from the lockfile; this takes a few minutes the first time …')
  // npm names itself to the scripts that it runs; without it, it is on the path.
  const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ['npm']
  const args = [...npm.slice(1), 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']
  const { code } = await run(npm[0], args, { show: true, cwd: projectFolder })
  if (code !== 0)
    throw new Stop('The npm packages could not be installed. Run this, then start again:\n  npm ci')
}

/** npm keeps a lockfile of what it has installed; it is written last, so an interrupted installation has none. */
function arePackagesInstalled() {
  const installedPath = join(projectFolder, 'node_modules/.package-lock.json')
  if (!existsSync(installedPath)) return false
  const wanted = readPackages(join(projectFolder, 'package-lock.json'))
  const installed = readPackages(installedPath)
  return Object.entries(wanted).every(
    ([path, { version, optional }]) => path === '' || optional || installed[path]?.version === version,
  )
}

const readPackages = (path) => JSON.parse(readFileSync(path, 'utf8')).packages
