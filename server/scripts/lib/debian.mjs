// Debian packages: found by what they bring, so that no version is written down here.
import { existsSync, readdirSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { run, say, SetupError, succeeds } from './say.mjs'

const isRoot = process.getuid?.() === 0
const POSTGRES_HOME = '/usr/lib/postgresql'

/** Path of a program, or undefined. */
export const findProgram = (name) =>
  (process.env.PATH ?? '')
    .split(delimiter)
    .map((folder) => join(folder, name))
    .find((path) => existsSync(path))

/** Folder of the newest installed PostgreSQL server's programs that has PostGIS beside it, or undefined. */
export function findPostgres() {
  if (!existsSync(POSTGRES_HOME)) return undefined
  return readdirSync(POSTGRES_HOME)
    .filter((version) => existsSync(join(POSTGRES_HOME, version, 'bin', 'postgres')))
    .filter((version) => existsSync(`/usr/share/postgresql/${version}/extension/postgis.control`))
    .sort((a, b) => Number(b) - Number(a))
    .map((version) => join(POSTGRES_HOME, version, 'bin'))[0]
}

/** Installs PostgreSQL and PostGIS of this Debian, unless they are there. Gives the folder of the server's programs. */
export function ensurePostgres() {
  const found = findPostgres()
  if (found) return found
  say('Installing PostgreSQL and PostGIS from Debian')
  update()
  const version = postgresVersion()
  install(['postgresql', `postgresql-${version}-postgis-3`])
  const installed = findPostgres()
  if (!installed) {
    throw new SetupError(
      `PostgreSQL with PostGIS is still missing after installing. Run\n  ${aptGet} install postgresql postgresql-${version}-postgis-3\nand look at what it prints.`,
    )
  }
  return installed
}

/** Installs Debian packages that bring programs, unless the programs are there. @param wanted { program: package } */
export function ensurePrograms(wanted) {
  const missing = Object.entries(wanted)
    .filter(([program]) => !findProgram(program))
    .map(([, debianPackage]) => debianPackage)
  if (missing.length === 0) return
  say(`Installing ${missing.join(', ')} from Debian`)
  update()
  install(missing)
}

/** The PostgreSQL version that this Debian's own package depends on, or that is installed without PostGIS. */
function postgresVersion() {
  const depends = run('apt-cache', ['depends', 'postgresql'])
  const version = /Depends: postgresql-(\d+)/.exec(depends)?.[1]
  if (!version)
    throw new SetupError(
      `This Debian offers no PostgreSQL. Run\n  ${aptGet} install postgresql\nand look at what it prints.`,
    )
  return version
}

const aptGet = isRoot ? 'apt-get' : 'sudo apt-get'

const update = () => apt(['update', '-q'])
const install = (packages) => apt(['install', '-y', '-q', '--no-install-recommends', ...packages])

function apt(args) {
  if (!findProgram('apt-get')) {
    throw new SetupError(
      'This is no Debian system: apt-get is missing. Install PostgreSQL with PostGIS, Chromium and poppler by your own means, or set DATABASE_URL.',
    )
  }
  const quiet = ['DEBIAN_FRONTEND=noninteractive', 'apt-get', ...args]
  if (!isRoot && !succeeds('sudo', ['-n', 'true'])) {
    throw new SetupError(
      `Root rights are needed to install Debian packages. Run\n  sudo apt-get ${args.join(' ')}\nthen start again.`,
    )
  }
  try {
    if (isRoot) run('env', quiet)
    else run('sudo', ['-n', 'env', ...quiet])
  } catch (error) {
    throw new SetupError(`${error.message}\n\nRun\n  ${aptGet} ${args.join(' ')}\nthen start again.`)
  }
}
