import { execFileSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { FeatureCollection, Position } from 'geojson'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import type { Edition } from '@shared/api/catalogue'
import { CAUTION } from '@shared/sheet-face/caution'
import {
  anItem,
  aSmallMap,
  decide,
  jobEnd,
  latestSubmission,
  putItems,
  release,
  releaseEdition,
  submit,
} from '../../support/review-path'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'

let server: TestServer
let editor: Agent
let approver: Agent
let number: string
let revision: number
let edition: Edition
const folder = mkdtempSync(join(tmpdir(), 'sheetwright-editions-'))

beforeAll(async () => {
  server = await startTestServer()
  editor = await signInAs(server, 'editor')
  approver = await signInAs(server, 'approver')
  const sheet = await aSheet(server)
  number = sheet.number
  revision = await putItems(editor, number, sheet.revision, aSmallMap())
  const job = await releaseEdition({ editor, approver }, number, revision)
  expect(job).toMatchObject({ state: 'done', progress: 1, message: 'Edition 1 is released' })
  edition = (await request(server.url).get(`/api/catalogue/${number}/1`)).body
})
afterAll(async () => {
  await server.close()
  rmSync(folder, { recursive: true, force: true })
})

const download = (name: string) =>
  request(server.url)
    .get(`/api/catalogue/${number}/1/files/${name}`)
    .buffer(true)
    .parse((response, done) => {
      const chunks: Buffer[] = []
      response.on('data', (chunk: Buffer) => chunks.push(chunk))
      response.on('end', () => done(null, Buffer.concat(chunks)))
    })

const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex')

describe('a released edition', () => {
  it('is in the catalogue for everyone, and the sheet drafts on', async () => {
    expect(edition).toMatchObject({
      sheet: number,
      edition: 1,
      state: 'current',
      revision,
      approvedBy: { name: 'Edda Marr' },
      caution: CAUTION,
    })
    const list: Edition[] = (await request(server.url).get('/api/catalogue')).body
    expect(list.map((each) => each.sheet)).toContain(number)
    const found = await request(server.url).get('/api/catalogue').query({ text: number.toLowerCase() })
    expect(found.body).toHaveLength(1)
    expect((await request(server.url).get('/api/catalogue').query({ text: '%' })).body).toEqual([])
    const sheet = (await editor.get(`/api/sheets/${number}`)).body
    expect(sheet).toMatchObject({ state: 'drafting', edition: 1 })
    expect((await latestSubmission(editor, number)).edition).toBe(1)
  })

  it('serves its files with the checksums that catalogue and manifest state', async () => {
    const manifest = JSON.parse((await download('manifest.json')).body.toString())
    expect(manifest).toMatchObject({ edition: 1, revision, approvedBy: 'Edda Marr', caution: CAUTION })
    expect(manifest.digest.value).toBe((await latestSubmission(editor, number)).digest)
    expect(edition.artefacts.map((file) => file.name)).toEqual([
      'sheet.pdf',
      'data.geojson',
      'sheet.svg',
      'manifest.json',
    ])
    for (const file of edition.artefacts) {
      const { body, headers } = await download(file.name)
      expect(sha256(body)).toBe(file.sha256)
      expect(body.length).toBe(file.bytes)
      expect(headers['content-type']).toContain(file.mediaType)
      expect(headers['etag']).toBe(`"${file.sha256}"`)
    }
    for (const file of manifest.artefacts) {
      expect(edition.artefacts).toContainEqual(file)
    }
  })

  it('names downloads after sheet and edition, and answers 304 to who has them', async () => {
    const pdf = await download('sheet.pdf')
    expect(pdf.headers['content-disposition']).toBe(`attachment; filename="${number}-edition-1.pdf"`)
    const again = await request(server.url)
      .get(`/api/catalogue/${number}/1/files/sheet.pdf`)
      .set('If-None-Match', pdf.headers['etag'] ?? '')
    expect(again.status).toBe(304)
  })

  it('has no other files and no other editions', async () => {
    for (const name of ['passwords.txt', '..%2F..%2Fsession-secret', 'sheet.pdf%00']) {
      expect((await request(server.url).get(`/api/catalogue/${number}/1/files/${name}`)).status).toBe(404)
    }
    expect((await request(server.url).get(`/api/catalogue/${number}/2`)).status).toBe(404)
  })

  it('prints one page of exactly the sheet’s size with Lato embedded', async () => {
    const path = join(folder, 'sheet.pdf')
    writeFileSync(path, (await download('sheet.pdf')).body)
    const facts = execFileSync('pdfinfo', [path], { encoding: 'utf8' })
    expect(facts).toMatch(/Pages:\s+1\n/)
    const [, width, height] = /Page size:\s+([\d.]+) x ([\d.]+) pts/.exec(facts) ?? []
    const { page } = (await editor.get(`/api/sheets/${number}`)).body
    // pdfinfo prints points to a hundredth.
    expect(Math.abs(Number(width) - (page.width * 72) / 25.4)).toBeLessThan(0.006)
    expect(Math.abs(Number(height) - (page.height * 72) / 25.4)).toBeLessThan(0.006)
    const fonts = execFileSync('pdffonts', [path], { encoding: 'utf8' }).trim().split('\n').slice(2)
    expect(fonts.length).toBeGreaterThan(0)
    for (const font of fonts)
      expect(font).toMatch(/Lato-(Regular|Bold|Black)\s+CID TrueType\s+Identity-H\s+yes yes yes/)
    const words = execFileSync('pdftotext', [path, '-'], { encoding: 'utf8' }).replaceAll(/\s+/g, ' ')
    for (const part of [
      'Fulmar Sandstone',
      'Spindrift Limestone',
      'Contact, certain',
      'Approved by Edda Marr',
    ]) {
      expect(words).toContain(part)
    }
    expect(words).toContain('not for site-specific engineering')
    const images = execFileSync('pdfimages', ['-list', path], { encoding: 'utf8' })
      .trim()
      .split('\n')
      .slice(2)
    expect(images).toEqual([])
  })

  it('gives its data as GeoJSON inside the footprint, unit areas with their units', async () => {
    const data: FeatureCollection = JSON.parse((await download('data.geojson')).body.toString())
    const [west, east] = [
      Math.min(...edition.footprint.map(([lon]) => lon)),
      Math.max(...edition.footprint.map(([lon]) => lon)),
    ]
    const [south, north] = [
      Math.min(...edition.footprint.map(([, lat]) => lat)),
      Math.max(...edition.footprint.map(([, lat]) => lat)),
    ]
    // A straight neatline on the grid bows out of the box of its corners by a few metres at most.
    const slack = 1e-4
    const positions = data.features.flatMap(({ geometry }): Position[] => {
      if (geometry.type === 'Point') return [geometry.coordinates]
      if (geometry.type === 'LineString') return geometry.coordinates
      return geometry.type === 'Polygon' ? geometry.coordinates.flat() : []
    })
    expect(positions.length).toBeGreaterThan(10)
    for (const [lon = NaN, lat = NaN] of positions) {
      expect(lon).toBeGreaterThan(west - slack)
      expect(lon).toBeLessThan(east + slack)
      expect(lat).toBeGreaterThan(south - slack)
      expect(lat).toBeLessThan(north + slack)
    }
    const faces = data.features.filter((feature) => feature.properties?.['kind'] === 'face')
    expect(faces.map((face) => face.properties?.['unitLabel']).toSorted()).toEqual(['Df', 'Sp'])
  })

  it('cannot be altered, added to or deleted, whoever writes to the database', async () => {
    const forbidden = [
      `UPDATE edition SET title = 'Other'`,
      `UPDATE edition SET released_at = now()`,
      'DELETE FROM edition',
      'TRUNCATE edition CASCADE',
      `UPDATE artefact SET sha256 = repeat('0', 64)`,
      'DELETE FROM artefact',
      'TRUNCATE artefact',
      `INSERT INTO artefact SELECT edition_id, 'extra', 9, title, media_type, bytes, sha256, storage_key FROM artefact LIMIT 1`,
      `UPDATE submission SET decision = 'returned'`,
    ]
    for (const statement of forbidden) {
      await expect(server.asSuperuser(statement), statement).rejects.toThrow(
        /never altered|stand as they were/,
      )
    }
    expect((await request(server.url).get(`/api/catalogue/${number}/1`)).body).toEqual(edition)
  })
})

describe('the next edition', () => {
  it('needs something new, and supersedes the one before', async () => {
    const none = await submit(editor, number, revision)
    expect(none.body.type).toBe('/problems/wrong-state')
    expect(none.body.detail).toContain('Nothing has changed')
    const attitude = anItem({
      kind: 'attitude',
      geometry: { type: 'Point', coordinates: [290_000, 5_286_000] },
      properties: { strike: 30, dip: 25 },
    })
    const next = await putItems(editor, number, revision, [attitude])
    const submitted = await submit(editor, number, next)
    expect(submitted.body).toMatchObject({
      since: revision,
      differences: [{ kind: 'attitude', added: 1, changed: 0, removed: 0 }],
    })
    await decide(approver, number, 'approved', submitted.body.digest)
    const jobs = await Promise.all([release(approver, number), release(approver, number)])
    const accepted = jobs.filter((answer) => answer.status === 202)
    expect(new Set(accepted.map((answer) => answer.body.id)).size).toBe(1)
    await jobEnd(approver, accepted[0]?.body.id)
    const editions: Edition[] = (await request(server.url).get('/api/catalogue').query({ text: number })).body
    expect(editions.map((each) => [each.edition, each.state])).toEqual([
      [2, 'current'],
      [1, 'superseded'],
    ])
    expect((await download('sheet.pdf')).status).toBe(200)
  })
})

describe('a release that fails', () => {
  it('leaves no edition and no file, says so plainly, and can be asked for again', async () => {
    const sheet = await aSheet(server)
    const latest = await putItems(editor, sheet.number, sheet.revision, aSmallMap())
    const { digest } = (await submit(editor, sheet.number, latest)).body
    await decide(approver, sheet.number, 'approved', digest)
    const { storage } = server.services
    const stored: string[] = []
    const put = storage.put.bind(storage)
    const full = vi.spyOn(storage, 'put').mockImplementation(async (key, source) => {
      if (stored.length === 2) throw new Error('No space left on device')
      stored.push(key)
      await put(key, source)
    })
    const job = await jobEnd(approver, (await release(approver, sheet.number)).body.id)
    full.mockRestore()
    expect(job.state).toBe('failed')
    expect(job.message).toMatch(/^[A-Z].*\.$/)
    expect(job.message).not.toContain('No space left')
    expect(stored).toHaveLength(2)
    for (const key of stored) expect(await storage.has(key)).toBe(false)
    expect((await request(server.url).get(`/api/catalogue/${sheet.number}/1`)).status).toBe(404)
    expect((await editor.get(`/api/sheets/${sheet.number}`)).body).toMatchObject({
      state: 'approved',
      edition: null,
    })
    const again = await jobEnd(approver, (await release(approver, sheet.number)).body.id)
    expect(again.state).toBe('done')
    expect((await request(server.url).get(`/api/catalogue/${sheet.number}/1`)).status).toBe(200)
  })
})
