import { existsSync, readdirSync, realpathSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { installPackages, refreshLists } from './debian.mjs'
import { canRun, run } from './run.mjs'
import { Stop } from './say.mjs'

const DEBIAN_HOME = '/usr/lib/postgresql'

/** Folder of PostgreSQL's programs with PostGIS beside them; installs what is missing.
 *  @param {string | undefined} version major version that an existing cluster needs */
export async function findPostgres(version) {
  const present = await findPrograms(version)
  if (present && (await hasPostgis(present))) return present
  await installPackages(await packagesFor(version ?? majorOf(present)), 'PostgreSQL with PostGIS is missing.')
  const installed = await findPrograms(version)
  if (installed && (await hasPostgis(installed))) return installed
  throw new Stop(
    `PostgreSQL ${version ?? ''} with PostGIS was installed, but its programs are not in ${DEBIAN_HOME}.`,
  )
}

/** Newest installed version, or the one asked for. Where several are installed, one with PostGIS goes first. */
async function findPrograms(version) {
  const versions = existsSync(DEBIAN_HOME)
    ? readdirSync(DEBIAN_HOME).filter((name) => /^\d+$/.test(name))
    : []
  const folders = versions
    .filter((name) => version === undefined || name === version)
    .sort((a, b) => Number(b) - Number(a))
    .map((name) => join(DEBIAN_HOME, name, 'bin'))
    .filter((folder) => existsSync(join(folder, 'initdb')))
  for (const folder of folders) if (await hasPostgis(folder)) return folder
  return folders[0] ?? (await findOnPath(version))
}

/** Machines that are not Debian have one PostgreSQL, on the path. */
async function findOnPath(version) {
  if (!(await canRun('initdb'))) return undefined
  const { output } = await run('sh', ['-c', 'command -v initdb'])
  const folder = dirname(realpathSync(output.trim()))
  const { output: said } = await run(join(folder, 'initdb'), ['--version'])
  return version === undefined || said.includes(` ${version}.`) ? folder : undefined
}

async function hasPostgis(folder) {
  const version = majorOf(folder)
  if (version) return existsSync(`/usr/share/postgresql/${version}/extension/postgis.control`)
  const { output } = await run(join(folder, 'pg_config'), ['--sharedir']).catch(() => ({ output: '' }))
  return existsSync(join(output.trim(), 'extension/postgis.control'))
}

const majorOf = (folder) => /\/postgresql\/(\d+)\//.exec(folder ?? '')?.[1]

/** Debian names its current PostgreSQL by what the package `postgresql` depends on. */
async function packagesFor(version) {
  const current = version ?? (await currentVersion()) ?? (await refreshLists(), await currentVersion())
  if (!current)
    throw new Stop(
      'PostgreSQL with PostGIS is missing, and apt knows no package for it. Install both, then start again.',
    )
  return [version ? `postgresql-${version}` : 'postgresql', `postgresql-${current}-postgis-3`]
}

async function currentVersion() {
  const { output } = await run('apt-cache', ['depends', 'postgresql']).catch(() => ({ output: '' }))
  return /postgresql-(\d+)/.exec(output)?.[1]
}
