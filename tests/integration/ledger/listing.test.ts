import { randomUUID } from 'node:crypto'
import { beforeEach, describe, expect, it } from 'vitest'
import { selectPage } from '../../../server/features/ledger/listing.queries'
import { aContact, anAttitude, aUnit, put, remove, useLedgerDesk } from '../../support/ledger-desk'
import { plansOf } from '../../support/plans'

const desk = useLedgerDesk()

const ask = (query: object) => desk.approver.get(`/api/sheets/${desk.sheet}/revisions`).query(query)
const revisions = async (query: object): Promise<number[]> =>
  (await ask(query)).body.entries.map((entry: { revision: number }) => entry.revision)

describe('the ledger as a list', () => {
  const [contact, attitude, unit] = [aContact(), anAttitude({ station: '14' }), aUnit()]
  const ids = { contact: '', attitude: '' }

  beforeEach(async () => {
    ids.contact = contact.id = randomUUID()
    ids.attitude = attitude.id = randomUUID()
    unit.id = randomUUID()
    const moved = { ...anAttitude({ station: '14' }, ids.attitude) }
    moved.geometry = { type: 'Point', coordinates: [293_000, 5_288_000] }
    await desk.post(desk.compiler, [put(contact)], { message: 'ridge path' })
    await desk.post(desk.compiler, [put(attitude)], { base: 2 })
    await desk.post(desk.editor, [put(unit)], { base: 3 })
    await desk.post(desk.editor, [put(moved)], { base: 4 })
    await desk.post(desk.compiler, [put(anAttitude({ station: '14', dip: 53 }, ids.attitude))], { base: 5 })
    await desk.post(desk.compiler, [remove(ids.contact)], { base: 6 })
  })

  it('says what changed in words made from the versions, beside the message', async () => {
    const { entries } = (await ask({})).body
    const what = entries.map((entry: { what: string }) => entry.what)
    expect(what).toEqual([
      'removed 1 contact',
      'moved attitude 14; dip of attitude 14: 35 → 53',
      'moved attitude 14',
      'added unit Sp',
      'placed 1 attitude 14',
      'drew 1 contact',
      'set up the sheet face',
    ])
    expect(entries[5]).toMatchObject({ message: 'ridge path', what: 'drew 1 contact' })
  })

  it('is filtered by person, kind of entry, kind of item, item and text', async () => {
    const { body } = await desk.approver.get(`/api/sheets/${desk.sheet}/members`)
    const tove = body.find((member: { person: { name: string } }) => member.person.name === 'Tove Orr')
    expect(await revisions({ person: tove.person.id })).toEqual([5, 4])
    expect(await revisions({ kind: 'creation' })).toEqual([1])
    expect(await revisions({ itemKind: 'contact' })).toEqual([7, 2])
    expect(await revisions({ item: ids.attitude })).toEqual([6, 5, 3])
    expect(await revisions({ item: randomUUID() })).toEqual([])
    expect(await revisions({ text: 'RIDGE' })).toEqual([2])
    expect(await revisions({ text: 'attitude 14' })).toEqual([6, 5, 3])
    expect(await revisions({ text: '%' })).toEqual([])
    await desk.editor.put(`/api/sheets/${desk.sheet}/revisions/4/name`).send({ name: 'legend ready' })
    expect(await revisions({ text: 'legend ready' })).toEqual([4])
    expect(await revisions({ person: tove.person.id, itemKind: 'attitude' })).toEqual([5])
  })

  it('is filtered by place: where a thing is now, and where it was', async () => {
    expect(await revisions({ place: '292000,5287000,294000,5289000' })).toEqual([6, 5])
    expect(await revisions({ place: '284900,5279900,285100,5280100' })).toEqual([7, 2])
    expect(await revisions({ place: '285400,5280100,285600,5280300', itemKind: 'attitude' })).toEqual([
      6, 5, 3,
    ])
    // Inside the rectangle around the contact, but not on it.
    expect(await revisions({ place: '285800,5280100,285900,5280200' })).toEqual([])
    expect((await ask({ place: '1,2,3' })).status).toBe(400)
    expect((await ask({ place: '1,2,3,4;DROP' })).status).toBe(400)
  })

  it('is paged by cursor, also when filtered', async () => {
    const first = (await ask({ itemKind: 'attitude', limit: 2 })).body
    expect(first.next).toBe(5)
    const second = (await ask({ itemKind: 'attitude', limit: 2, before: first.next })).body
    expect(second.entries.map((entry: { revision: number }) => entry.revision)).toEqual([3])
    expect(second.next).toBeNull()
  })
})

describe('a page of a long history', () => {
  it('costs what it shows, and not what the ledger holds', async () => {
    const id = await desk.sheetId()
    const { dataSource } = desk.server
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    // Two people took turns for thirty thousand entries, all in the west but for the few above.
    await dataSource.query(
      `INSERT INTO revision (sheet_id, number, kind, author_id, message, changed, kinds, extent)
       SELECT $1, n, 'edit', (SELECT id FROM account ORDER BY email OFFSET n % 2 LIMIT 1), 'moved 1 contact', 0,
         '{contact}', ST_MakeEnvelope(284000, 5278000, 284100, 5278000 + n % 900, 32626)
       FROM generate_series(3, 30000) AS n`,
      [id],
    )
    await desk.server.asSuperuser('ANALYZE revision')
    const { body } = await desk.approver.get(`/api/sheets/${desk.sheet}/members`)
    const filters = [
      {},
      { person: body[0].person.id },
      { item: contact.id },
      { place: '285900,5280900,286100,5281100' },
    ]
    const plans = await plansOf(dataSource, async (em) => {
      for (const filter of filters) await selectPage(em, id, { filter, limit: 50 })
    })
    expect(plans).toHaveLength(filters.length)
    for (const plan of plans) {
      const scans = plan.scans('revision')
      expect(scans.every(({ index }) => index !== undefined)).toBe(true)
      expect(Math.max(...scans.map(({ rows }) => rows))).toBeLessThan(500)
    }
  })
})
