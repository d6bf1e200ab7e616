import { randomUUID } from 'node:crypto'
import { createWriteStream } from 'node:fs'
import { mkdir, open, rename, rm, stat } from 'node:fs/promises'
import { dirname, join } from 'node:path'
import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'

/** Files of the application: what was brought, what was released. A key is a path of plain names, `intake/<id>/file`. */
export interface Storage {
  /** Stores a file whole or not at all; replaces what the key held. */
  put(key: string, source: Readable | Buffer): Promise<void>
  /** Reads a file; rejects if there is none. */
  open(key: string): Promise<Readable>
  /** Size in bytes; rejects if there is none. */
  size(key: string): Promise<number>
  /** Removes a file; nothing happens if there is none. */
  remove(key: string): Promise<void>
  has(key: string): Promise<boolean>
}

/** One name of a key: it begins with a letter or digit, so it is never hidden, never `.` or `..`. */
const KEY_PART = /^[A-Za-z0-9][A-Za-z0-9._-]{0,199}$/

/** Storage in a folder of this machine. */
export function folderStorage(folder: string): Storage {
  const pathOf = (key: string): string => join(folder, ...checkedParts(key))
  return {
    put: async (key, source) => writeWhole(pathOf(key), source),
    async open(key) {
      const file = await open(pathOf(key), 'r')
      return file.createReadStream()
    },
    size: async (key) => (await stat(pathOf(key))).size,
    remove: async (key) => rm(pathOf(key), { force: true }),
    async has(key) {
      const path = pathOf(key)
      return stat(path).then(
        (found) => found.isFile(),
        () => false,
      )
    },
  }
}

function checkedParts(key: string): string[] {
  const parts = key.split('/')
  if (!parts.every((part) => KEY_PART.test(part))) {
    throw new RangeError(
      `A storage key is plain names with slashes between them, not ${JSON.stringify(key)}.`,
    )
  }
  return parts
}

/** A reader never sees half a file: it is written aside, forced to disk, then moved into its place. */
async function writeWhole(path: string, source: Readable | Buffer): Promise<void> {
  const folder = dirname(path)
  await mkdir(folder, { recursive: true })
  const aside = join(folder, `.${randomUUID()}.part`)
  try {
    // `flush` makes the stream fsync before it closes.
    const target = createWriteStream(aside, { flags: 'wx', flush: true })
    await pipeline(Buffer.isBuffer(source) ? Readable.from([source]) : source, target)
    await rename(aside, path)
    await syncFolder(folder)
  } catch (cause) {
    await rm(aside, { force: true })
    throw cause
  }
}

/** The move itself is on disk only once the folder is. */
async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}
