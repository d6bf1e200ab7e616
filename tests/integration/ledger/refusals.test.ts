import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { aContact, aLabel, anAttitude, aUnit, put, remove, useLedgerDesk } from '../../support/ledger-desk'

const desk = useLedgerDesk()

describe('who may change what', () => {
  it('lets only compilers and editors change a sheet', async () => {
    expect((await desk.post(desk.approver, [put(aContact())])).status).toBe(403)
    expect((await desk.post(desk.administrator, [put(aContact())])).status).toBe(403)
    expect(await desk.latest()).toBe(1)
  })

  it('keeps legend and sheet face to editors', async () => {
    const unit = aUnit()
    const refused = await desk.post(desk.compiler, [put(unit)])
    expect(refused.status).toBe(403)
    expect(refused.body.detail).toBe('Only an editor of this sheet changes the unit Sp of the legend.')
    expect((await desk.post(desk.editor, [put(unit)])).status).toBe(201)
    expect((await desk.post(desk.compiler, [remove(unit.id)], { base: 2 })).status).toBe(403)
    const face = (await desk.items()).find((item) => item.kind === 'sheet-face')
    if (!face) throw new Error('The sheet has no sheet face.')
    const renamed = { ...face, properties: { ...face.properties, authors: 'Rosa Kelp' } }
    expect((await desk.post(desk.compiler, [put(renamed)], { base: 2 })).status).toBe(403)
    expect((await desk.post(desk.editor, [put(renamed)], { base: 2 })).status).toBe(201)
  })

  it('lets nobody change a sheet that is not in drafting', async () => {
    await desk.server.dataSource.query(`UPDATE sheet SET state = 'submitted' WHERE number = $1`, [desk.sheet])
    const { status, body } = await desk.post(desk.compiler, [put(aContact())])
    expect(status).toBe(409)
    expect(body.type).toBe('/problems/wrong-state')
    expect(body.detail).toContain('submitted')
  })
})

describe('wrong input', () => {
  const refusedAt = async (changes: unknown[], pointer: string, base = 1, agent = desk.editor) => {
    const before = await desk.latest()
    const { status, body } = await desk.post(agent, changes, { base })
    expect(status).toBe(400)
    expect(body.errors[0].pointer).toBe(pointer)
    expect(body.errors[0].detail).toMatch(/\.$/)
    expect(await desk.latest()).toBe(before)
    return body.errors[0].detail as string
  }

  it('refuses a base from the future', async () => {
    expect(await refusedAt([put(aContact())], '/base', 7)).toContain('revision 7')
  })

  it('names an unknown item that was to be removed, and one that has been removed', async () => {
    const id = randomUUID()
    expect(await refusedAt([remove(id)], '/changes/0')).toContain(id)
    const contact = aContact()
    await desk.post(desk.editor, [put(contact)])
    await desk.post(desk.editor, [remove(contact.id)], { base: 2 })
    expect(await refusedAt([remove(contact.id)], '/changes/0', 3)).toContain('revision 3')
  })

  it('refuses an item of another sheet', async () => {
    const contact = aContact()
    await desk.post(desk.editor, [put(contact)])
    await desk.takeNewSheet()
    expect(await refusedAt([put(contact)], '/changes/0')).toContain('another sheet')
    expect(await refusedAt([remove(contact.id)], '/changes/0')).toContain('another sheet')
  })

  it('refuses one item twice, another kind for an item, a second sheet face, and none', async () => {
    const contact = aContact()
    await refusedAt([put(contact), put(contact)], '/changes/1')
    await desk.post(desk.editor, [put(contact)])
    const fault = { ...contact, kind: 'fault' }
    expect(await refusedAt([put(fault)], '/changes/0', 2)).toContain('is a contact and cannot become a fault')
    const face = { kind: 'sheet-face', id: randomUUID(), geometry: null, properties: {} }
    expect(await refusedAt([put(face)], '/changes/0', 2)).toContain('one sheet face')
    const own = (await desk.items()).find((item) => item.kind === 'sheet-face')
    expect(await refusedAt([remove(own?.id ?? '')], '/changes/0', 2)).toContain('cannot be removed')
  })

  it('refuses a label of a unit that is not in the legend, and takes both together', async () => {
    const unit = aUnit()
    await refusedAt([put(aLabel(unit.id))], '/changes/0/item/properties/unit')
    expect((await desk.post(desk.editor, [put(aLabel(unit.id)), put(unit)])).status).toBe(201)
  })

  it('refuses to remove a unit that labels use, and says how many do', async () => {
    const unit = aUnit()
    const labels = [aLabel(unit.id), aLabel(unit.id)]
    await desk.post(desk.editor, [put(unit), ...labels.map(put)])
    expect(await refusedAt([remove(unit.id)], '/changes/0', 2)).toContain('Unit Sp is used by 2 unit labels')
    const together = [remove(unit.id), ...labels.map((label) => remove(label.id))]
    expect((await desk.post(desk.editor, together, { base: 2 })).status).toBe(201)
  })

  it('refuses a line without length, a dip of 95, a number that is none, and too few vertices', async () => {
    const flat = aContact()
    flat.geometry = {
      type: 'LineString',
      coordinates: [
        [1, 1],
        [1.0001, 1.0001],
      ],
    }
    await refusedAt([put(flat)], '/changes/0/item/geometry/coordinates')
    await refusedAt([put(anAttitude({ dip: 95 }))], '/changes/0/item/properties/dip')
    await refusedAt(
      [put({ ...anAttitude(), geometry: { type: 'Point', coordinates: [null, 5] } })],
      '/changes/0/item/geometry/coordinates/0',
    )
    const single = { ...aContact(), geometry: { type: 'LineString', coordinates: [[1, 1]] } }
    await refusedAt([put(single)], '/changes/0/item/geometry/coordinates')
  })

  it('refuses an empty change set and an unknown kind', async () => {
    await refusedAt([], '/changes')
    expect((await desk.post(desk.editor, [put({ ...aContact(), kind: 'volcano' })])).status).toBe(400)
  })

  it('refuses text that cannot be stored', async () => {
    expect((await desk.post(desk.editor, [put(aContact({ note: 'a\u0000b' }))])).status).toBe(400)
    expect((await desk.post(desk.editor, [put(aContact({ note: 'a\ud800b' }))])).status).toBe(400)
  })
})
