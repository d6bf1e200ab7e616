import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { Stop } from './say.mjs'

/** Holds a data folder for this process: two servers would take each other's database away. */
export function holdFolder(dataFolder) {
  mkdirSync(dataFolder, { recursive: true })
  const path = join(dataFolder, 'started-by')
  const holder = existsSync(path) ? readFileSync(path, 'utf8').trim() : ''
  if (holder && holder !== String(process.pid) && isOurs(holder)) {
    throw new Stop(
      `Sheetwright runs on ${dataFolder} already (process ${holder}). Stop that one first, or choose another folder and port:\n` +
        '  SHEETWRIGHT_DATA=… PORT=… npm start',
    )
  }
  writeFileSync(path, String(process.pid))
  return () => rmSync(path, { force: true })
}

/** The number of a process that has ended may belong to another program now. */
function isOurs(pid) {
  try {
    return /server\/scripts\/(start|dev|verify)\.mjs/.test(readFileSync(`/proc/${pid}/cmdline`, 'utf8'))
  } catch {
    return false
  }
}
