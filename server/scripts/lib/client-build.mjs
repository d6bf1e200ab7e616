import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { projectFolder } from './project.mjs'
import { run } from './run.mjs'
import { say, Stop } from './say.mjs'

/** Everything that the built client is made of. */
const SOURCES = [
  'index.html',
  'vite.config.ts',
  'package-lock.json',
  'tsconfig.json',
  'client-assets',
  'shared',
  'src',
  'styles',
]

/** Builds the client if its sources are not those of the last build. */
export async function ensureClient() {
  const stamp = join(projectFolder, 'dist/client-sources')
  const hash = hashSources()
  const isBuilt = existsSync(join(projectFolder, 'dist/client/index.html'))
  if (isBuilt && existsSync(stamp) && readFileSync(stamp, 'utf8') === hash) return
  say('Building the client …')
  rmSync(stamp, { force: true })
  const vite = join(projectFolder, 'node_modules/vite/bin/vite.js')
  const { code, output } = await run(process.execPath, [vite, 'build', '--logLevel', 'warn'], {
    cwd: projectFolder,
  })
  if (code !== 0) throw new Stop(`The client could not be built:\n${output}`)
  mkdirSync(join(projectFolder, 'dist'), { recursive: true })
  writeFileSync(stamp, hash)
}

/** SHA-256 over names and contents of all sources. */
function hashSources() {
  const hash = createHash('sha256')
  for (const source of SOURCES)
    for (const path of listFiles(source)) hash.update(path).update(readFileSync(join(projectFolder, path)))
  return hash.digest('hex')
}

function listFiles(path) {
  const whole = join(projectFolder, path)
  if (!existsSync(whole)) return []
  if (!statSync(whole).isDirectory()) return [path]
  return readdirSync(whole)
    .sort()
    .flatMap((name) => listFiles(join(path, name)))
}
