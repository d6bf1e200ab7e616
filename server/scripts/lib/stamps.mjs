// Work that is done once and again only when what it depends on has changed.
import { createHash } from 'node:crypto'
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { run, say } from './say.mjs'

export const projectFolder = join(import.meta.dirname ?? new URL('.', import.meta.url).pathname, '../../..')
const at = (...path) => join(projectFolder, ...path)

/** Installs the npm packages of the lockfile, unless they are there already. */
export function ensurePackages() {
  const stamp = at('node_modules', '.installed')
  const wanted = hashOf([at('package-lock.json')])
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return
  if (existsSync(at('node_modules', '.package-lock.json')) && isInstalled()) {
    writeFileSync(stamp, wanted)
    return
  }
  say('Installing npm packages from the lockfile (a minute or two)')
  run('npm', ['ci', '--no-audit', '--no-fund'], { cwd: projectFolder })
  writeFileSync(stamp, wanted)
}

/** Builds the client, unless the last build is of the same sources. */
export function ensureClient() {
  const stamp = at('dist', '.built')
  const sources = [
    'src',
    'shared',
    'styles',
    'client-assets',
    'index.html',
    'vite.config.ts',
    'package-lock.json',
  ]
  const wanted = hashOf(sources.map((path) => at(path)))
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return
  say('Building the client')
  run(process.execPath, [at('node_modules', 'vite', 'bin', 'vite.js'), 'build', '--logLevel', 'warn'], {
    cwd: projectFolder,
  })
  writeFileSync(stamp, wanted)
}

/** Whether npm finds every package of the lockfile in its place: true after an `npm install` by hand. */
function isInstalled() {
  const installed = JSON.parse(readFileSync(at('node_modules', '.package-lock.json'), 'utf8')).packages
  const locked = JSON.parse(readFileSync(at('package-lock.json'), 'utf8')).packages
  return Object.entries(locked).every(
    ([path, entry]) => path === '' || entry.optional || installed[path]?.version === entry.version,
  )
}

function hashOf(paths) {
  const hash = createHash('sha256')
  const add = (path) => {
    if (!existsSync(path)) return
    if (statSync(path).isDirectory()) for (const name of readdirSync(path).sort()) add(join(path, name))
    else hash.update(path.slice(projectFolder.length)).update(readFileSync(path))
  }
  for (const path of paths) add(path)
  return hash.digest('hex')
}
