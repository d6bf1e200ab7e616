import { startCluster } from './cluster.mjs'
import { holdFolder } from './one-at-a-time.mjs'
import { isPortFree } from './ports.mjs'
import { dataFolder } from './project.mjs'
import { say, Stop } from './say.mjs'

/** Where people come to. */
export const port = Number(process.env.PORT || 4310)
export const host = process.env.SHEETWRIGHT_HOST || '127.0.0.1'

/** Refuses early what cannot end well. */
export async function checkMachine() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major < 20 || (major === 20 && minor < 19)) {
    throw new Stop(`Sheetwright needs Node.js 20.19 or newer; this is ${process.versions.node}.`)
  }
  if (!Number.isInteger(port) || port < 1 || port > 65535)
    throw new Stop(`PORT is not a port: ${process.env.PORT}.`)
  if (!(await isPortFree(port, host))) {
    throw new Stop(
      `Port ${port} is taken by another program. Stop it, or choose another port:\n  PORT=${port + 1} npm start`,
    )
  }
}

/** The database that the environment names, or the private cluster below the data folder.
 *  @returns settings for the server, and how to stop what was started */
export async function openDatabase() {
  const letGo = holdFolder(dataFolder)
  if (process.env.DATABASE_URL) {
    say('Using the database that DATABASE_URL names.')
    return { settings: {}, stop: async () => letGo() }
  }
  say('Starting the private database …')
  try {
    const cluster = await startCluster({ dataFolder })
    return {
      settings: {
        DATABASE_URL: cluster.url,
        DATABASE_OWNER_URL: cluster.ownerUrl,
        SHEETWRIGHT_DEMO: process.env.SHEETWRIGHT_DEMO || '1',
      },
      async stop() {
        await cluster.stop()
        letGo()
      },
    }
  } catch (fault) {
    letGo()
    throw fault
  }
}

/** Says where to go, and as whom. The first line is what other programs look for. */
export function sayReady({ url, demoAccounts, firstAdministratorLink }) {
  say(`\nSheetwright is ready at ${url}\n`)
  if (demoAccounts.length > 0) {
    say('Demo accounts, on this machine only:')
    for (const { email, password, name, role } of demoAccounts) {
      say(`  ${email.padEnd(32)}${password.padEnd(24)}${name}, ${role}`)
    }
  }
  if (firstAdministratorLink) {
    say(`Make the first administrator here; the link works once, within a day:\n  ${firstAdministratorLink}`)
  }
  say('\nCtrl-C stops everything.')
}

/** Resolves when somebody asks to stop. */
export const askedToStop = () =>
  new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, resolve)
  })
