import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import type { Item } from '@shared/items/item'
import { aContact, anAttitude, put, remove, useLedgerDesk } from '../../support/ledger-desk'

const desk = useLedgerDesk()

describe('history', () => {
  it('gives the sheet as it was at any revision', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.compiler, [put(aContact({ note: 'scree' }, contact.id))], { base: 2 })
    await desk.post(desk.compiler, [remove(contact.id)], { base: 3 })
    expect(await desk.find(contact.id, 1)).toBeUndefined()
    expect((await desk.find(contact.id, 2))?.properties).toMatchObject({ note: '' })
    expect((await desk.find(contact.id, 3))?.properties).toMatchObject({ note: 'scree' })
    expect(await desk.find(contact.id, 4)).toBeUndefined()
    expect((await desk.compiler.get(`/api/sheets/${desk.sheet}/items?revision=9`)).status).toBe(400)
  })

  it('gives every version of one item with who wrote it, newest first', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.editor, [put(aContact({ note: 'scree' }, contact.id))], { base: 2 })
    const { body } = await desk.approver.get(`/api/sheets/${desk.sheet}/items/${contact.id}/versions`)
    expect(body).toMatchObject([
      {
        since: 3,
        until: null,
        item: { properties: { note: 'scree' } },
        entry: { author: { name: 'Tove Orr' } },
      },
      { since: 2, until: 3, item: { properties: { note: '' } }, entry: { author: { name: 'Rosa Kelp' } } },
    ])
    expect((await desk.approver.get(`/api/sheets/${desk.sheet}/items/${randomUUID()}/versions`)).status).toBe(
      404,
    )
  })

  it('gives what changed since a revision: put, removed, and the entries', async () => {
    const [a, b, c] = [aContact(), aContact(), aContact()]
    await desk.post(desk.compiler, [put(a), put(b)])
    await desk.post(desk.editor, [put(aContact({ note: 'x' }, a.id)), remove(b.id), put(c)], { base: 2 })
    const { body } = await desk.compiler.get(`/api/sheets/${desk.sheet}/changes?since=2`)
    expect(body.revision).toBe(3)
    expect(body.put.map((item: Item) => item.id).sort()).toEqual([a.id, c.id].sort())
    expect(body.removed).toEqual([b.id])
    expect(body.entries.map((entry: { revision: number }) => entry.revision)).toEqual([3])
    const none = await desk.compiler.get(`/api/sheets/${desk.sheet}/changes?since=3`)
    expect(none.body).toMatchObject({ revision: 3, put: [], removed: [], entries: [] })
    expect((await desk.compiler.get(`/api/sheets/${desk.sheet}/changes?since=8`)).status).toBe(400)
  })

  it('pages the ledger, newest first', async () => {
    for (let base = 1; base < 5; base++) await desk.post(desk.compiler, [put(aContact())], { base })
    const first = (await desk.compiler.get(`/api/sheets/${desk.sheet}/revisions?limit=3`)).body
    expect(first.entries.map((entry: { revision: number }) => entry.revision)).toEqual([5, 4, 3])
    const second = (
      await desk.compiler.get(`/api/sheets/${desk.sheet}/revisions?limit=3&before=${first.next}`)
    ).body
    expect(second.entries.map((entry: { revision: number }) => entry.revision)).toEqual([2, 1])
    expect(second.next).toBeNull()
  })

  it('tells what differs between two revisions, leaving out what was changed and changed back', async () => {
    const [a, b] = [aContact(), aContact()]
    await desk.post(desk.compiler, [put(a), put(b)])
    await desk.post(desk.editor, [put(aContact({ note: 'x' }, a.id)), remove(b.id)], { base: 2 })
    await desk.post(desk.compiler, [put(aContact({}, a.id))], { base: 3 })
    const id = await desk.sheetId()
    const { manager } = desk.server.dataSource
    const edits = await desk.server.services.history.differences(manager, id, 2, 4)
    expect(edits).toMatchObject([{ before: { id: b.id }, after: null }])
    const authors = await desk.server.services.history.authorsBetween(manager, id, 1, 4)
    expect(authors.map((author) => author.name)).toEqual(['Rosa Kelp', 'Tove Orr'])
  })
})

describe('bulk', () => {
  it('takes in five thousand lines as one entry', async () => {
    const id = await desk.sheetId()
    const [author] = await desk.server.dataSource.query(
      `SELECT id FROM account WHERE email = 'compiler@merrow.example'`,
    )
    const rows = Array.from({ length: 5000 }, (_, index) => ({
      item: {
        kind: 'contact' as const,
        id: randomUUID(),
        geometry: {
          type: 'LineString' as const,
          coordinates: [
            [285_000.0004 + index, 5_280_000] as [number, number],
            [285_000 + index, 5_281_000] as [number, number],
          ],
        },
        properties: {
          locationConfidence: 'certain' as const,
          identity: 'certain' as const,
          name: '',
          note: '',
        },
      },
      provenance: { file: 'many.geojson', record: index + 1, attributes: {}, conversions: [] },
    }))
    const entry = await desk.server.dataSource.transaction((em) =>
      desk.server.services.ledger.appendItems(em, id, author.id, rows, {
        kind: 'intake',
        message: 'took in many',
      }),
    )
    expect(entry).toMatchObject({ revision: 2, kind: 'intake', changed: 5000, message: 'took in many' })
    expect(await desk.items()).toHaveLength(5001)
    const first = rows[0]?.item.id ?? ''
    const { body } = await desk.compiler.get(`/api/sheets/${desk.sheet}/items/${first}/versions`)
    expect(body[0]).toMatchObject({ provenance: { file: 'many.geojson', record: 1 } })
    expect(body[0].item.geometry.coordinates[0]).toEqual([285_000, 5_280_000])
  })
})

describe('all items of a sheet', () => {
  it('come as one answer with a tag of its revision, and not again to who has them', async () => {
    const attitude = anAttitude({ note: 'a "quoted" line\nand another, ü' })
    await desk.post(desk.editor, [put(attitude), put(aContact())])
    const path = `/api/sheets/${desk.sheet}/items`
    const first = await desk.editor.get(path)
    expect(first.body.items).toHaveLength(3)
    expect(await desk.find(attitude.id)).toMatchObject({
      properties: { note: 'a "quoted" line\nand another, ü' },
    })
    const tag = first.headers['etag'] ?? ''
    expect((await desk.editor.get(path).set('If-None-Match', tag)).status).toBe(304)
    await desk.post(desk.editor, [put(aContact())], { base: 2 })
    const second = await desk.editor.get(path).set('If-None-Match', tag)
    expect([second.status, second.body.items.length]).toEqual([200, 4])
    expect((await desk.editor.get(`${path}?revision=2`)).headers['etag']).toBe(tag)
  })
})
