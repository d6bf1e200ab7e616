import { Unzip, UnzipInflate, unzipSync, type UnzipFileInfo } from 'fflate'
import { unreadable, type Unreadable } from './read-outcome'

/** Most that the files taken out of an archive may hold together, bytes: four times the largest field file. */
export const MAX_UNPACKED_BYTES = 200_000_000
const MAX_ENTRIES = 2000

export interface Unpacked {
  outcome: 'unpacked'
  /** By their names in the archive, which are names and never paths to write to. */
  files: Map<string, Uint8Array>
  /** Names of what was left in the archive. */
  others: string[]
}

/** Whether a file begins as a zip archive does, with a file or, empty, with its end. */
export const isZip = (bytes: Uint8Array): boolean =>
  bytes[0] === 0x50 &&
  bytes[1] === 0x4b &&
  ((bytes[2] === 3 && bytes[3] === 4) || (bytes[2] === 5 && bytes[3] === 6))

/** Takes the wanted files out of a zip archive, in memory and within limits: one that says that it is too large is refused
 *  before anything is unpacked, one that is larger than it says as soon as that shows. Archives inside it stay shut.
 *  Source: PKWARE APPNOTE by way of fflate. */
export function unpack(bytes: Uint8Array, wanted: (name: string) => boolean): Unpacked | Unreadable {
  const entries: UnzipFileInfo[] = []
  try {
    unzipSync(bytes, { filter: (entry) => entries.push(entry) < 0 })
  } catch {
    return unreadable('The zip archive is not whole: its list of files cannot be read.')
  }
  const chosen = entries.filter(({ name }) => wanted(name))
  const refusal = findRefusal(entries, chosen)
  if (refusal) return unreadable(refusal)
  const files = inflate(bytes, new Map(chosen.map(({ name, originalSize }) => [name, originalSize])))
  if (!files) return unreadable('The zip archive is not whole: its files are not as long as it says.')
  const others = entries.map(({ name }) => name).filter((name) => !files.has(name) && !name.endsWith('/'))
  return { outcome: 'unpacked', files, others }
}

/** Bytes that are inflated at one go; they may give a thousand times as many. */
const STEP_BYTES = 65_536

/** The files with their sizes as announced; undefined where one is not as long as that. Unpacked step by step, so that one
 *  that swells beyond what it says is dropped while it is small. */
function inflate(bytes: Uint8Array, sizes: ReadonlyMap<string, number>): Map<string, Uint8Array> | undefined {
  const files = new Map([...sizes].map(([name, size]) => [name, { whole: new Uint8Array(size), length: 0 }]))
  let isBroken = false
  const unzip = new Unzip((entry) => {
    const file = files.get(entry.name)
    if (!file) return
    file.length = 0
    entry.ondata = (fault, chunk) => {
      isBroken ||= fault !== null || file.length + chunk.length > file.whole.length
      if (!isBroken) file.whole.set(chunk, file.length)
      file.length += chunk?.length ?? 0
    }
    entry.start()
  })
  unzip.register(UnzipInflate)
  try {
    for (let at = 0; at < bytes.length && !isBroken; at += STEP_BYTES) {
      unzip.push(bytes.subarray(at, at + STEP_BYTES), at + STEP_BYTES >= bytes.length)
    }
  } catch {
    return undefined
  }
  const isWhole = !isBroken && [...files.values()].every(({ whole, length }) => length === whole.length)
  return isWhole ? new Map([...files].map(([name, { whole }]) => [name, whole])) : undefined
}

function findRefusal(
  entries: readonly UnzipFileInfo[],
  chosen: readonly UnzipFileInfo[],
): string | undefined {
  if (entries.length > MAX_ENTRIES) {
    return `The zip archive holds ${entries.length} files; at most ${MAX_ENTRIES} are looked through.`
  }
  const unpacked = chosen.reduce((sum, { originalSize }) => sum + originalSize, 0)
  if (unpacked > MAX_UNPACKED_BYTES) {
    const megabytes = Math.ceil(unpacked / 1e6)
    return `Unpacked, the zip archive would fill ${megabytes} MB; up to ${MAX_UNPACKED_BYTES / 1e6} MB are read.`
  }
  const strange = chosen.find(({ compression }) => compression !== 0 && compression !== 8)
  return (
    strange && `“${strange.name.slice(0, 80)}” in the zip archive is packed in a way that is not read here.`
  )
}
