import { createHash } from 'node:crypto'
import { chmodSync, chownSync, existsSync, mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { run } from './run.mjs'
import { say, Stop } from './say.mjs'

/** PostgreSQL refuses to run as root: then it runs as the user that Debian made for it. */
const SERVER_USER = 'postgres'
const isRoot = process.getuid?.() === 0

/** Where a private cluster lives, and how its programs are run there. */
export async function prepareHome(dataFolder) {
  // Nobody but its owner lists the folder; PostgreSQL's user has to pass through it.
  mkdirSync(dataFolder, { recursive: true, mode: isRoot ? 0o711 : 0o700 })
  const folder = await chooseHome(dataFolder)
  mkdirSync(folder, { recursive: true, mode: 0o700 })
  if (isRoot) {
    const { uid, gid } = await serverUser()
    chownSync(folder, uid, gid)
    chmodSync(folder, 0o700)
  }
  return {
    folder,
    /** Runs a program as the cluster's owner. */
    run: (program, args, options = {}) =>
      isRoot
        ? run('runuser', ['-u', SERVER_USER, '--', program, ...args], { cwd: '/', ...options })
        : run(program, args, { cwd: '/', ...options }),
    /** Gives a file of ours to the cluster's owner. */
    async own(path) {
      if (!isRoot) return
      const { uid, gid } = await serverUser()
      chownSync(path, uid, gid)
    },
  }
}

/** Inside the data folder, unless PostgreSQL's user cannot get there, as below /root. */
async function chooseHome(dataFolder) {
  const inside = join(dataFolder, 'postgres')
  if (!isRoot) return inside
  const name = createHash('sha256').update(dataFolder).digest('hex').slice(0, 12)
  const outside = `/var/lib/sheetwright-${name}`
  const { code } = await run('runuser', ['-u', SERVER_USER, '--', 'test', '-x', dataFolder], { cwd: '/' })
  if (code === 0) return inside
  if (!existsSync(outside)) {
    say(`PostgreSQL's user cannot enter ${dataFolder}: the database is kept in ${outside} instead.`)
  }
  return outside
}

async function serverUser() {
  const [uid, gid] = await Promise.all(
    ['-u', '-g'].map(async (flag) => {
      const { code, output } = await run('id', [flag, SERVER_USER])
      if (code !== 0)
        throw new Stop(`PostgreSQL runs as the user ${SERVER_USER}, who does not exist on this machine.`)
      return Number(output)
    }),
  )
  return { uid, gid }
}
