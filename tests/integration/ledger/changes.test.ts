import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import type { Item } from '@shared/items/item'
import { aContact, anAttitude, put, remove, useLedgerDesk } from '../../support/ledger-desk'

const desk = useLedgerDesk()

describe('a change', () => {
  it('becomes the next entry and is there for everybody', async () => {
    const contact = aContact()
    const { status, body } = await desk.post(desk.compiler, [put(contact)])
    expect(status).toBe(201)
    expect(body).toMatchObject({
      revision: 2,
      altered: [],
      entry: {
        revision: 2,
        kind: 'edit',
        author: { name: 'Rosa Kelp' },
        message: 'drew 1 contact',
        changed: 1,
      },
    })
    expect(await desk.find(contact.id)).toMatchObject({
      ...contact,
      properties: { locationConfidence: 'certain', identity: 'certain' },
    })
    expect((await desk.editor.get(`/api/sheets/${desk.sheet}/items`)).body.revision).toBe(2)
  })

  it('keeps the message that its author wrote, and otherwise names what changed', async () => {
    const attitude = anAttitude()
    expect(
      (await desk.post(desk.compiler, [put(attitude)], { message: 'ridge path' })).body.entry.message,
    ).toBe('ridge path')
    const changed = put(anAttitude({ dip: 53 }, attitude.id))
    expect((await desk.post(desk.compiler, [changed], { base: 2 })).body.entry.message).toBe(
      'dip of attitude: 35 → 53',
    )
  })

  it('is all or nothing', async () => {
    const contact = aContact()
    const { status } = await desk.post(desk.compiler, [put(contact), remove(randomUUID())])
    expect(status).toBe(400)
    expect(await desk.find(contact.id)).toBeUndefined()
    expect(await desk.latest()).toBe(1)
  })

  it('is snapped to the 1 mm grid, and the answer carries what that altered', async () => {
    const attitude = {
      ...anAttitude(),
      geometry: { type: 'Point', coordinates: [285_500.12345, 5_280_200.98765] },
    }
    const contact = aContact()
    const { body } = await desk.post(desk.compiler, [put(attitude), put(contact)])
    expect(body.altered.map((item: Item) => item.id)).toEqual([attitude.id])
    expect(body.altered[0].geometry.coordinates).toEqual([285_500.123, 5_280_200.988])
    expect((await desk.find(attitude.id))?.geometry?.coordinates).toEqual([285_500.123, 5_280_200.988])
  })

  it('keeps coordinates exactly as they were answered', async () => {
    const contact = aContact()
    contact.geometry = {
      type: 'LineString',
      coordinates: Array.from({ length: 200 }, (_, index) => [
        284_000 + index * 7 + (index * 37) / 1000,
        5_278_000 + ((index * 911) % 1000) / 1000 + index,
      ]).map((point) => point.map((value) => Math.round(value * 1000) / 1000)),
    }
    await desk.post(desk.compiler, [put(contact)])
    expect((await desk.find(contact.id))?.geometry).toEqual(contact.geometry)
  })

  it('can bring back an item that was removed, under its id', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.compiler, [remove(contact.id)], { base: 2 })
    expect(await desk.find(contact.id)).toBeUndefined()
    expect((await desk.post(desk.compiler, [put(contact)], { base: 3 })).status).toBe(201)
    expect(await desk.find(contact.id)).toBeDefined()
  })
})

describe('the same call again', () => {
  it('gets the first answer and changes nothing', async () => {
    const key = randomUUID()
    const attitude = { ...anAttitude(), geometry: { type: 'Point', coordinates: [285_500.12345, 5_280_200] } }
    const first = await desk.post(desk.compiler, [put(attitude)], { key })
    await desk.post(desk.editor, [put(anAttitude({ dip: 50 }, attitude.id))], { base: 2 })
    const second = await desk.post(desk.compiler, [put(attitude)], { key })
    expect(second.status).toBe(201)
    expect(second.body).toEqual(first.body)
    expect(await desk.latest()).toBe(3)
  })

  it('sent ten times at once makes one entry', async () => {
    const key = randomUUID()
    const contact = aContact()
    const answers = await Promise.all(
      Array.from({ length: 10 }, () =>
        desk.post(desk.compiler, [put(contact)], { key }).then((response) => response),
      ),
    )
    expect(new Set(answers.map((answer) => JSON.stringify([answer.status, answer.body]))).size).toBe(1)
    expect(await desk.latest()).toBe(2)
  })

  it('is refused if the key comes with other changes', async () => {
    const key = randomUUID()
    await desk.post(desk.compiler, [put(aContact())], { key })
    const { status, body } = await desk.post(desk.compiler, [put(aContact())], { key })
    expect(status).toBe(409)
    expect(body.type).toBe('/problems/key-reused')
  })

  it('belongs to one person: another’s same key is another call', async () => {
    const key = randomUUID()
    await desk.post(desk.compiler, [put(aContact())], { key })
    expect((await desk.post(desk.editor, [put(aContact())], { key, base: 2 })).body.revision).toBe(3)
  })

  it('needs a key that is a UUID', async () => {
    const body = { base: 1, changes: [put(aContact())] }
    const without = await desk.compiler.post(`/api/sheets/${desk.sheet}/revisions`).send(body)
    expect(without.status).toBe(400)
    expect(without.body.detail).toContain('Idempotency-Key')
    expect((await desk.post(desk.compiler, [put(aContact())], { key: 'again' })).status).toBe(400)
  })
})

describe('two people', () => {
  it('merge by themselves when they change different items', async () => {
    const [a, b] = [aContact(), anAttitude()]
    await desk.post(desk.compiler, [put(a), put(b)])
    await desk.post(desk.editor, [put(aContact({ locationConfidence: 'inferred' }, a.id))], { base: 2 })
    const mine = await desk.post(desk.compiler, [put(anAttitude({ dip: 60 }, b.id))], { base: 2 })
    expect(mine.body.revision).toBe(4)
    expect((await desk.find(a.id))?.properties).toMatchObject({ locationConfidence: 'inferred' })
  })

  it('are shown base, theirs and yours when they change the same one, and nothing is stored', async () => {
    const [contact, other] = [aContact(), aContact()]
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.editor, [put(aContact({ note: 'theirs' }, contact.id))], { base: 2 })
    const { status, body } = await desk.post(
      desk.compiler,
      [put(other), put(aContact({ note: 'yours' }, contact.id))],
      { base: 2 },
    )
    expect(status).toBe(409)
    expect(body.type).toBe('/problems/item-conflict')
    expect(body.detail).toContain('Tove Orr')
    expect(body.items).toHaveLength(1)
    expect(body.items[0]).toMatchObject({
      id: contact.id,
      base: { properties: { note: '' } },
      theirs: { properties: { note: 'theirs' } },
      yours: { properties: { note: 'yours' } },
    })
    expect(await desk.find(other.id)).toBeUndefined()
  })

  it('merge on one item too when one moves it and the other says something else of it', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.editor, [put(aContact({ locationConfidence: 'inferred' }, contact.id))], { base: 2 })
    const geometry = {
      type: 'LineString',
      coordinates: [
        [285_000, 5_280_025],
        [286_000, 5_281_025],
      ],
    }
    const moved = { ...contact, geometry }
    const { status, body } = await desk.post(desk.compiler, [put(moved)], { base: 2 })
    expect(status).toBe(201)
    const stored = await desk.find(contact.id)
    expect(stored).toMatchObject({
      geometry,
      properties: { locationConfidence: 'inferred' },
    })
    expect(body.altered).toEqual([stored])
  })

  it('are told when one removed what the other changes, and the other way round', async () => {
    const [a, b] = [aContact(), aContact()]
    await desk.post(desk.compiler, [put(a), put(b)])
    await desk.post(desk.editor, [remove(a.id), put(aContact({ note: 'kept' }, b.id))], { base: 2 })
    const { body } = await desk.post(desk.compiler, [put(aContact({ note: 'mine' }, a.id)), remove(b.id)], {
      base: 2,
    })
    const byId = new Map(body.items.map((conflict: { id: string }) => [conflict.id, conflict]))
    expect(byId.get(a.id)).toMatchObject({ theirs: null, yours: { properties: { note: 'mine' } } })
    expect(byId.get(b.id)).toMatchObject({ theirs: { properties: { note: 'kept' } }, yours: null })
  })

  it('do not quarrel when both did the same', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    const changed = put(aContact({ note: 'covered by scree' }, contact.id))
    await desk.post(desk.editor, [changed], { base: 2 })
    expect((await desk.post(desk.compiler, [changed], { base: 2 })).status).toBe(201)
  })

  it('may settle a conflict on the newer base', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.editor, [put(aContact({ note: 'theirs' }, contact.id))], { base: 2 })
    expect(
      (await desk.post(desk.compiler, [put(aContact({ note: 'yours' }, contact.id))], { base: 3 })).status,
    ).toBe(201)
  })

  it('who are one person in two windows lose nothing either', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.compiler, [put(aContact({ note: 'first window' }, contact.id))], { base: 2 })
    const { status, body } = await desk.post(desk.compiler, [put(aContact({ note: 'second' }, contact.id))], {
      base: 2,
    })
    expect(status).toBe(409)
    expect(body.detail).toContain('elsewhere')
  })

  it('twelve at once leave a ledger without gaps', async () => {
    const answers = await Promise.all(
      Array.from({ length: 12 }, (_, index) =>
        desk
          .post(index % 2 ? desk.compiler : desk.editor, [put(aContact())])
          .then((response) => response.body.revision),
      ),
    )
    expect(answers.sort((a, b) => a - b)).toEqual(Array.from({ length: 12 }, (_, index) => index + 2))
  })
})
