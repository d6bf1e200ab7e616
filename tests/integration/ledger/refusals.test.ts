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
  const ids = (changes: unknown[]) =>
    (changes as { id?: string; item?: { id: string } }[]).map(({ id, item }) => id ?? item?.id)

  const refusedAt = async (changes: unknown[], pointer: string, base = 1, agent = desk.editor) => {
    const before = await desk.latest()
    const { status, body } = await desk.post(agent, changes, { base })
    expect(status).toBe(400)
    expect(body.errors[0].pointer).toBe(pointer)
    expect(body.errors[0].detail).toMatch(/\.$/)
    // Whatever the fault, the item that it is about is named.
    if (pointer.startsWith('/changes/')) expect(ids(changes)).toContain(body.errors[0].item)
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

  const shaped = (type: string, coordinates: unknown) => ({
    ...aContact(),
    geometry: { type, coordinates },
  })
  const ring = (last: number[]) => [[285_000, 5_280_000], [286_000, 5_280_000], [286_000, 5_281_000], last]

  it('refuses a geometry of another type: areas, closed or not, several lines, a point for a line', async () => {
    for (const geometry of [
      shaped('Polygon', [ring([285_000, 5_280_000])]),
      shaped('Polygon', [ring([285_000, 5_280_001])]),
      shaped('MultiLineString', [ring([285_000, 5_281_000])]),
      shaped('Point', [285_000, 5_280_000]),
    ]) {
      expect(await refusedAt([put(geometry)], '/changes/0/item/geometry/type')).toContain('LineString')
    }
    const attitude = { ...anAttitude(), geometry: aContact().geometry }
    expect(await refusedAt([put(attitude)], '/changes/0/item/geometry/type')).toContain('Point')
    await refusedAt([put({ ...aContact(), geometry: null })], '/changes/0/item/geometry')
    await refusedAt([put({ ...aUnit(), geometry: aContact().geometry })], '/changes/0/item/geometry')
    const high = shaped('LineString', [
      [285_000, 5_280_000, 12],
      [285_000, 5_281_000, 14],
    ])
    expect(await refusedAt([put(high)], '/changes/0/item/geometry/coordinates/0')).toContain('two numbers')
  })

  it('refuses what lies outside the region of the sheet’s system, naming the item and the place', async () => {
    const far = shaped('LineString', [
      [285_000, 5_280_000],
      [9_000_000, 5_281_000],
    ])
    const detail = await refusedAt([put(aContact()), put(far)], '/changes/1/item/geometry/coordinates')
    expect(detail).toContain('9000000 5281000')
    const lonLat = shaped('LineString', [
      [-29.85, 47.63],
      [-29.84, 4_000_000_000],
    ])
    await refusedAt([put(lonLat)], '/changes/0/item/geometry/coordinates/1/1')
  })

  it('refuses numbers that are none, however they are written', async () => {
    const send = (coordinates: string) =>
      desk.editor
        .post(`/api/sheets/${desk.sheet}/revisions`)
        .set('Idempotency-Key', randomUUID())
        .set('Content-Type', 'application/json')
        .send(
          JSON.stringify({ base: 1, changes: [put(aContact())] }).replace(
            /"coordinates":.*?\]\]/,
            coordinates,
          ),
        )
    const infinite = await send('"coordinates":[[1,1],[1e999,2]]')
    expect(infinite.status).toBe(400)
    expect(infinite.body.errors[0].pointer).toBe('/changes/0/item/geometry/coordinates/1/0')
    const none = await send('"coordinates":[[1,1],[NaN,2]]')
    expect(none.status).toBe(400)
    expect(none.body.detail).toBe('The body is not JSON.')
    expect(await desk.latest()).toBe(1)
  })

  it('refuses a line of a million vertices, and goes on answering', async () => {
    const long = shaped(
      'LineString',
      Array.from({ length: 1_000_000 }, (_, index) => [285_000 + (index % 1000), 5_280_000 + index / 1000]),
    )
    expect(await refusedAt([put(long)], '/changes/0/item/geometry/coordinates')).toContain('100000 vertices')
    expect((await desk.post(desk.editor, [put(aContact())])).status).toBe(201)
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
