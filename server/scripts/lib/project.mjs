import { fileURLToPath } from 'node:url'
import { resolve } from 'node:path'

/** The project's own folder. */
export const projectFolder = fileURLToPath(new URL('../../..', import.meta.url)).replace(/\/$/, '')

/** Folder for everything that the application keeps on this machine. */
export const dataFolder = resolve(projectFolder, process.env.SHEETWRIGHT_DATA || '.data')
