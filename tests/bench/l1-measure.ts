import { gzipSync } from 'node:zlib'
import { readFileSync } from 'node:fs'
process.env['SHEETWRIGHT_TEST_DATABASE_URL'] = readFileSync('/tmp/l1/url', 'utf8')
const { startTestServer, signInAs } = await import('../support/server')
const { fillSheet } = await import('./rows/l1-scratch')
const server = await startTestServer({}, { checkAnswers: false })
const editor = await signInAs(server, 'editor')
const time = async (name: string, work: () => Promise<unknown>) => { const t = performance.now(); const r = await work(); console.log(name, Math.round(performance.now() - t), 'ms', r ?? '') }
let sheet: any
await time('intake 100k', async () => { sheet = await fillSheet(server, 100_000) })
await server.asSuperuser('VACUUM ANALYZE')
const { history, restores, comparisons } = server.services
for (let i = 0; i < 3; i++) {
await time('new path text', async () => { const a = await history.listItems(sheet.id); const s = a.parts.join(''); return [s.length, i ? 0 : gzipSync(s).length, i ? 0 : gzipSync(s, { level: 1 }).length] })
await time('old path objects', async () => JSON.stringify({ revision: 2, items: await history.itemsAt(server.dataSource.manager, sheet.id, 2) }).length)
}
let raw = 0, packed = 0
for (const type of ['LINESTRING', 'POINT']) {
  const [row] = await server.dataSource.query(`SELECT ST_AsFlatGeobuf(item, false, 'geometry') AS file FROM (SELECT item_id::text AS id, kind, properties::text AS properties, geometry FROM item_version WHERE sheet_id = $1 AND until IS NULL AND GeometryType(geometry) = $2) AS item`, [sheet.id, type])
  raw += row.file.length; packed += gzipSync(row.file).length
}
console.log('fgb', raw, packed)
await time('compare page 500 of 100k', () => comparisons.compare(sheet.id, { from: '1', to: '2' }, { limit: 500 }).then((c) => c.differences.length))
await time('csv of 100k', async () => { let n = 0; for await (const p of await comparisons.table(sheet.id, { from: '1', to: '2' })) n += p.length; return n })
await time('compare nothing', () => comparisons.compare(sheet.id, { from: '2', to: '2' }, { limit: 500 }).then((c) => c.differences.length))
const [a] = await server.dataSource.query(`SELECT id, name, initials FROM account WHERE email = 'editor@merrow.example'`)
const author = { person: a, roles: ['editor'] as const }
await time('preview taking back 100k', () => restores.preview(sheet.id, author as any, { what: 'entry', revision: 2 }).then((p) => [p.counts, p.obstacle]))
await time('take back 100k', () => restores.restore(sheet.id, author as any, crypto.randomUUID(), { restore: { what: 'entry', revision: 2 }, base: 2, message: '', undoLater: false }).then((r) => r.entry.what))
await server.close()
