import { mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { Readable } from 'node:stream'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { folderStorage, type Storage } from '../../../../server/platform/storage'

let folder: string
let storage: Storage

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'sheetwright-storage-'))
  storage = folderStorage(join(folder, 'files'))
})
afterEach(() => rmSync(folder, { recursive: true }))

async function textOf(key: string): Promise<string> {
  const chunks: Buffer[] = []
  for await (const chunk of await storage.open(key)) chunks.push(chunk)
  return Buffer.concat(chunks).toString()
}

describe('storage in a folder', () => {
  it('gives back what was put, from a buffer and from a stream', async () => {
    await storage.put('intake/a/file', Buffer.from('buffer'))
    await storage.put('intake/b/file', Readable.from(['str', 'eam']))
    expect(await textOf('intake/a/file')).toBe('buffer')
    expect(await textOf('intake/b/file')).toBe('stream')
    expect(await storage.size('intake/b/file')).toBe(6)
  })

  it('keeps an empty file', async () => {
    await storage.put('empty', Buffer.alloc(0))
    expect(await storage.size('empty')).toBe(0)
  })

  it('replaces a file whole', async () => {
    await storage.put('a', Buffer.from('a long first text'))
    await storage.put('a', Buffer.from('short'))
    expect(await textOf('a')).toBe('short')
  })

  it('keeps the old file and leaves nothing aside when a source breaks off', async () => {
    await storage.put('a', Buffer.from('old'))
    async function* breaksOff() {
      yield 'half a new'
      throw new Error('the line went dead')
    }
    await expect(storage.put('a', Readable.from(breaksOff()))).rejects.toThrow('the line went dead')
    expect(await textOf('a')).toBe('old')
    expect(readdirSync(join(folder, 'files'))).toEqual(['a'])
  })

  it('tells what is there, and removes it; removing nothing is no fault', async () => {
    expect(await storage.has('a')).toBe(false)
    await storage.put('a', Buffer.from('x'))
    expect(await storage.has('a')).toBe(true)
    await storage.remove('a')
    await storage.remove('a')
    expect(await storage.has('a')).toBe(false)
    await expect(storage.open('a')).rejects.toThrow('ENOENT')
    await expect(storage.size('a')).rejects.toThrow('ENOENT')
  })

  it.each([
    '../outside',
    'a/../../outside',
    '/etc/passwd',
    '',
    'a//b',
    '.',
    '.hidden',
    'a/.',
    'a\\b',
    'a\0b',
    'a/',
  ])('refuses a key that is no path of plain names: %j', async (key) => {
    writeFileSync(join(folder, 'outside'), 'kept')
    await expect(storage.put(key, Buffer.from('x'))).rejects.toThrow(RangeError)
    await expect(storage.open(key)).rejects.toThrow(RangeError)
    await expect(storage.size(key)).rejects.toThrow(RangeError)
    await expect(storage.remove(key)).rejects.toThrow(RangeError)
    await expect(storage.has(key)).rejects.toThrow(RangeError)
    expect(readdirSync(folder)).toEqual(['outside'])
  })
})
