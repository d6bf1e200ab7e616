import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import type { Difference } from '@shared/changes/differences'
import { greatestDeparture } from '@shared/geometry/line-distance'
import type { XY } from '@shared/units'
import { selectEdits, countEdits } from '../../../server/features/ledger/comparison.queries'
import { aContact, aLabel, anAttitude, aUnit, put, remove, useLedgerDesk } from '../../support/ledger-desk'
import { plansOf } from '../../support/plans'
import { aSmallMap, putItems, releaseEdition } from '../../support/review-path'

const desk = useLedgerDesk()

const compare = (query: object) => desk.approver.get(`/api/sheets/${desk.sheet}/comparison`).query(query)
const movedTo = (end: number[], id: string) => ({
  ...aContact({}, id),
  geometry: { type: 'LineString', coordinates: [[285_000, 5_280_000], end] },
})

describe('comparing two revisions', () => {
  it('tells added, removed, moved and re-attributed items, legend and sheet face included', async () => {
    const [kept, gone, moved, unit] = [aContact(), aContact(), aContact(), aUnit()]
    await desk.post(desk.editor, [put(kept), put(gone), put(moved), put(unit)])
    const face = (await desk.items()).find((item) => item.kind === 'sheet-face')
    if (!face) throw new Error('The sheet has no sheet face.')
    const label = aLabel(unit.id)
    await desk.post(
      desk.editor,
      [
        remove(gone.id),
        put(movedTo([286_000, 5_281_030], moved.id)),
        put({ ...unit, properties: { ...unit.properties, name: 'Spindrift Limestone, upper part' } }),
        put({ ...face, properties: { ...face.properties, authors: 'Rosa Kelp' } }),
        put(label),
      ],
      { base: 2 },
    )
    const { status, body } = await compare({ from: '2', to: '3' })
    expect(status).toBe(200)
    expect(body).toMatchObject({ from: { revision: 2, edition: null }, to: { revision: 3 }, next: null })
    const byId = new Map<string, Difference>(body.differences.map((each: Difference) => [each.id, each]))
    expect(byId.size).toBe(5)
    expect(byId.get(gone.id)).toMatchObject({ what: 'removed', after: null })
    expect(byId.get(label.id)).toMatchObject({ what: 'added', before: null, kind: 'unit-label' })
    const { place } = byId.get(moved.id) ?? {}
    expect(place?.how).toBe('moved')
    expect(place?.metres).toBe(30)
    expect(byId.get(unit.id)?.fields).toEqual([
      { field: 'name', before: 'Spindrift Limestone', after: 'Spindrift Limestone, upper part' },
    ])
    expect(byId.get(face.id)?.fields.map(({ field }) => field)).toEqual(['authors'])
    expect(body.counts).toEqual([
      { kind: 'contact', added: 0, removed: 1, moved: 1, reattributed: 0 },
      { kind: 'sheet-face', added: 0, removed: 0, moved: 0, reattributed: 1 },
      { kind: 'unit', added: 0, removed: 0, moved: 0, reattributed: 1 },
      { kind: 'unit-label', added: 1, removed: 0, moved: 0, reattributed: 0 },
    ])
  })

  it('leaves out what was changed and changed back, and runs backwards as well', async () => {
    const contact = aContact()
    await desk.post(desk.editor, [put(contact)])
    await desk.post(desk.editor, [put(aContact({ note: 'x' }, contact.id))], { base: 2 })
    await desk.post(desk.editor, [put(aContact({}, contact.id))], { base: 3 })
    expect((await compare({ from: '2', to: 'latest' })).body.differences).toEqual([])
    expect((await compare({ from: '3', to: '1' })).body.differences).toMatchObject([{ what: 'removed' }])
    expect((await compare({ from: '0', to: '1' })).body.differences).toMatchObject([{ kind: 'sheet-face' }])
    expect((await compare({ from: '2', to: '2' })).body.differences).toEqual([])
  })

  it('pages by item', async () => {
    await desk.post(
      desk.editor,
      Array.from({ length: 7 }, () => put(aContact())),
    )
    const seen: string[] = []
    let after: string | undefined
    let pages = 0
    do {
      const { body } = await compare({ from: '1', limit: 3, ...(after ? { after } : {}) })
      expect(body.counts === null).toBe(pages > 0)
      seen.push(...body.differences.map((each: Difference) => each.id))
      after = body.next ?? undefined
      pages += 1
    } while (after)
    expect(pages).toBe(3)
    expect(new Set(seen).size).toBe(7)
  })

  it('takes an edition for the revision that it was made of', async () => {
    const revision = await putItems(desk.editor, desk.sheet, 1, aSmallMap())
    expect((await releaseEdition(desk, desk.sheet, revision)).state).toBe('done')
    const attitude = anAttitude()
    await desk.post(desk.editor, [put(attitude)], { base: revision })
    const { body } = await compare({ from: 'edition-1' })
    expect(body).toMatchObject({
      from: { revision, edition: 1 },
      to: { revision: revision + 1, edition: null },
    })
    expect(body.differences).toMatchObject([{ id: attitude.id, what: 'added' }])
  })

  it('refuses states that do not exist', async () => {
    expect((await compare({ from: '1', to: '9' })).body.errors[0].pointer).toBe('/to')
    expect((await compare({ from: 'edition-3' })).body.errors[0].pointer).toBe('/from')
    expect((await compare({ from: 'yesterday' })).status).toBe(400)
    expect((await compare({})).status).toBe(400)
  })

  it('measures as PostGIS does', async () => {
    // Outside check: ST_HausdorffDistance of the same lines in the same database.
    let seed = 7
    const random = () => (seed = (seed * 48_271) % 2_147_483_647) / 2_147_483_647
    const wander = (count: number): XY[] =>
      Array.from({ length: count }, (_, index) => [index * 40 + random() * 30, random() * 300])
    for (let round = 0; round < 20; round++) {
      const [a, b] = [wander(5 + round), wander(24 - round)]
      const text = (points: XY[]) => `LINESTRING(${points.map((point) => point.join(' ')).join(',')})`
      const [row] = await desk.server.dataSource.query<{ distance: number }[]>(
        'SELECT ST_HausdorffDistance(ST_GeomFromText($1), ST_GeomFromText($2)) AS distance',
        [text(a), text(b)],
      )
      expect(greatestDeparture(a, b)).toBeCloseTo(row?.distance ?? NaN, 9)
    }
  })
})

describe('a comparison as a file', () => {
  it('is a table with a row per field that differs', async () => {
    const attitude = anAttitude({ station: '=14' })
    await desk.post(desk.editor, [put(attitude)])
    await desk.post(
      desk.editor,
      [put(anAttitude({ station: '=14', dip: 53, note: 'a, "b"' }, attitude.id))],
      {
        base: 2,
      },
    )
    const { status, headers, text } = await desk.approver.get(
      `/api/sheets/${desk.sheet}/comparison.csv?from=2&to=3`,
    )
    expect(status).toBe(200)
    expect(headers['content-type']).toBe('text/csv; charset=utf-8')
    expect(headers['content-disposition']).toBe(`attachment; filename=${desk.sheet}-2-3.csv`)
    expect(text.split('\r\n')).toEqual([
      '\ufeffitem,kind,name,what,place,moved at most (m),field,before,after',
      `${attitude.id},attitude,attitude =14,changed,,,dip,35,53`,
      `${attitude.id},attitude,attitude =14,changed,,,note,,"a, ""b"""`,
      '',
    ])
  })

  it('is a feature collection in longitude and latitude, before and after', async () => {
    const attitude = anAttitude()
    await desk.post(desk.editor, [put(attitude), put(aUnit())])
    const moved = { ...attitude, geometry: { type: 'Point', coordinates: [285_600, 5_280_200] } }
    await desk.post(desk.editor, [put(moved)], { base: 2 })
    const { status, headers, body } = await desk.approver
      .get(`/api/sheets/${desk.sheet}/comparison.geojson?from=2`)
      .buffer()
      .parse((response, done) => {
        let text = ''
        response.on('data', (part: Buffer) => (text += part))
        response.on('end', () => done(null, JSON.parse(text)))
      })
    expect(status).toBe(200)
    expect(headers['content-type']).toContain('application/geo+json')
    expect(body.features.map((each: { id: string }) => each.id)).toEqual([
      `${attitude.id}/before`,
      `${attitude.id}/after`,
    ])
    // Outside check: PROJ, through PostGIS.
    const [row] = await desk.server.dataSource.query(
      `SELECT ST_X(g) AS lon, ST_Y(g) AS lat FROM ST_Transform(ST_SetSRID(ST_MakePoint(285600, 5280200), 32626), 4326) AS g`,
    )
    const [lon, lat] = body.features[1].geometry.coordinates
    expect(lon).toBeCloseTo(row.lon, 7)
    expect(lat).toBeCloseTo(row.lat, 7)
    const empty = await desk.approver.get(`/api/sheets/${desk.sheet}/comparison.geojson?from=3`).buffer()
    expect(empty.status).toBe(200)
  })
})

describe('what a comparison costs', () => {
  it('is found through indexes, whatever else is on the sheet', async () => {
    const id = await desk.sheetId()
    const { dataSource } = desk.server
    await dataSource.query(
      `INSERT INTO item_version (item_id, since, sheet_id, kind, geometry, properties)
       SELECT gen_random_uuid(), 1, $1, 'contact',
         ST_SetSRID(ST_MakeLine(ST_MakePoint(284000 + n % 100, n), ST_MakePoint(284100, n + 5)), 32626), '{}'
       FROM generate_series(1, 20000) AS n`,
      [id],
    )
    await desk.server.asSuperuser('ANALYZE item_version')
    await desk.post(desk.editor, [put(aContact({}, randomUUID())), put(anAttitude())])
    const span = { sheetId: id, from: 1, to: 2 }
    const plans = await plansOf(dataSource, async (em) => {
      expect(await selectEdits(em, span, { limit: 500 })).toHaveLength(2)
      await countEdits(em, span)
    })
    expect(plans).toHaveLength(2)
    for (const plan of plans) {
      expect(plan.scans('item_version').every((scan) => scan.index !== undefined)).toBe(true)
      // Rows that were looked at belong to what changed, two items and their versions; not to the 20 000 others.
      expect(Math.max(...plan.scans('item_version').map((scan) => scan.rows))).toBeLessThan(50)
    }
  })
})
