import { canRun, run } from './run.mjs'
import { say, Stop } from './say.mjs'

const isRoot = process.getuid?.() === 0

/** Installs Debian packages, whatever Debian this is.
 *  @throws {Stop} with the exact command to run, where we cannot */
export async function installPackages(packages, why) {
  const command = `${isRoot ? '' : 'sudo '}apt-get install -y --no-install-recommends ${packages.join(' ')}`
  if (!(await canRun('apt-get'))) {
    throw new Stop(
      `${why} This needs ${packages.join(' and ')}, which can be installed by itself only on Debian.`,
    )
  }
  say(`${why} Installing ${packages.join(', ')} …`)
  await refreshLists()
  const { code, output } = await asRoot([
    'apt-get',
    'install',
    '-y',
    '-q',
    '--no-install-recommends',
    ...packages,
  ])
  if (code !== 0)
    throw new Stop(`${output.trim()}\n\nThat did not work. Run this, then start again:\n  ${command}`)
}

/** Fetches the package lists if the machine has none of today; an old list names files that are gone. */
let refreshed = false
export async function refreshLists() {
  if (refreshed) return
  refreshed = true
  const { code, output } = await asRoot(['apt-get', 'update', '-q'])
  if (code !== 0) say(`The package lists could not be refreshed: ${output.trim().split('\n').at(-1)}`)
}

function asRoot(command) {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  if (isRoot) return run(command[0], command.slice(1), { env })
  // With a terminal sudo may ask for the password; without one it must not hang.
  const ask = process.stdin.isTTY ? [] : ['-n']
  const stdio = ['inherit', 'pipe', 'pipe']
  return run('sudo', [...ask, 'DEBIAN_FRONTEND=noninteractive', ...command], { env, stdio }).catch(
    (fault) => ({
      code: 1,
      output: `sudo cannot be run: ${fault.message}`,
    }),
  )
}
