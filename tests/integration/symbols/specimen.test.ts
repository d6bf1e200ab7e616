import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startTestServer, type TestServer } from '../../support/server'
import { anonymous } from '../../support/sign-in'

let server: TestServer
let folder: string
let path: string
let response: Awaited<ReturnType<typeof download>>

const download = async (headers: Record<string, string> = {}) =>
  (await anonymous(server)).get('/api/symbols/specimen.pdf').set(headers).responseType('blob')

beforeAll(async () => {
  server = await startTestServer()
  folder = mkdtempSync(join(tmpdir(), 'sheetwright-specimen-'))
  path = join(folder, 'symbol-set.pdf')
  response = await download()
  writeFileSync(path, response.body)
})
afterAll(async () => {
  rmSync(folder, { recursive: true, force: true })
  await server.close()
})

/** What poppler, which is not ours, says of the file. */
const ask = (program: string, ...more: string[]): string =>
  execFileSync(program, [path, ...more], { encoding: 'utf8', maxBuffer: 64_000_000 })

describe('the specimen as PDF', () => {
  it('is for everybody, as a file with a name', () => {
    expect(response.status).toBe(200)
    expect(response.headers['content-type']).toBe('application/pdf')
    expect(response.headers['content-disposition']).toBe('attachment; filename="symbol-set.pdf"')
  })

  it('has A3 pages on their side, all numbered', () => {
    const about = ask('pdfinfo')
    const pages = Number(/^Pages:\s+(\d+)$/m.exec(about)?.[1])
    // 420 × 297 mm are 1190.55 × 841.89 points.
    expect(about).toMatch(/^Page size:\s+1190\.55 x 841\.89 pts \(A3\)/m)
    expect(pages).toBeGreaterThan(20)
    expect(ask('pdftotext', '-f', String(pages), '-')).toContain(`Page ${pages} of ${pages}`)
  })

  it('embeds Lato and holds no picture: everything is drawn as vectors', () => {
    const fonts = execFileSync('pdffonts', [path], { encoding: 'utf8' }).split('\n').slice(2).filter(Boolean)
    expect(fonts.length).toBeGreaterThan(0)
    for (const font of fonts) expect(font).toMatch(/Lato.*\s(yes) (yes|no) (yes|no)\s/)
    expect(execFileSync('pdfimages', ['-list', path], { encoding: 'utf8' }).split('\n').slice(2)).toEqual([
      '',
    ])
  })

  it('says of every symbol what it means and what drives it', () => {
    const text = ask('pdftotext', '-layout', '-')
    for (const words of [
      'Thrust',
      'fault.thrust',
      'Overturned syncline',
      'Bedding',
      'Limestone',
      'Driven by',
    ]) {
      expect(text).toContain(words)
    }
    expect(text).toContain('FGDC-STD-013-2006: 2.2.1 (certain)')
  })

  it('is not sent again to whom it is known', async () => {
    const again = await download({ 'If-None-Match': response.headers['etag'] ?? '' })
    expect(again.status).toBe(304)
  })
})
