import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import type { RestorePreview } from '@shared/api/restores'
import { lockSheet } from '../../../server/features/ledger/ledger.queries'
import { aContact, aLabel, anAttitude, aUnit, put, remove, useLedgerDesk } from '../../support/ledger-desk'

const desk = useLedgerDesk()

const preview = async (restore: object, agent = desk.editor): Promise<RestorePreview> => {
  const { status, body } = await agent.post(`/api/sheets/${desk.sheet}/restores/preview`).send(restore)
  expect(status).toBe(200)
  return body
}
const restore = (
  what: object,
  {
    agent = desk.editor,
    key = randomUUID() as string,
    base = 99,
    ...rest
  }: Record<string, unknown> & {
    agent?: typeof desk.editor
    key?: string
    base?: number
  } = {},
) =>
  agent
    .post(`/api/sheets/${desk.sheet}/restores`)
    .set('Idempotency-Key', key)
    .send({ restore: what, base, ...rest })

describe('going back to a revision', () => {
  it('is looked at first, and is then a new entry that makes the sheet as it was', async () => {
    const [kept, changed, gone] = [aContact(), aContact(), aContact()]
    await desk.post(desk.editor, [put(kept), put(changed), put(gone)])
    const then = await desk.items(2)
    await desk.post(desk.compiler, [put(aContact({ note: 'x' }, changed.id)), remove(gone.id)], { base: 2 })
    await desk.post(desk.compiler, [put(anAttitude())], { base: 3 })
    const what = { what: 'revision', revision: 2 }
    const seen = await preview(what)
    expect(seen).toMatchObject({ base: 4, obstacle: null, laterItems: 3 })
    expect(seen.counts).toEqual([
      { kind: 'attitude', added: 0, removed: 1, moved: 0, reattributed: 0 },
      { kind: 'contact', added: 1, removed: 0, moved: 0, reattributed: 1 },
    ])
    expect(seen.differences.map((each) => each.what).sort()).toEqual(['added', 'changed', 'removed'])
    expect(await desk.latest()).toBe(4)
    const { status, body } = await restore(what, { base: 4, undoLater: true })
    expect(status).toBe(201)
    expect(body.entry).toMatchObject({
      revision: 5,
      kind: 'restore',
      author: { name: 'Tove Orr' },
      message: 'restored the sheet as it was at revision 2',
      changed: 3,
    })
    expect(await desk.items()).toEqual(then)
    // Nothing is taken out of the ledger.
    expect(await desk.items(4)).not.toEqual(then)
  })

  it('is looked at without holding up who writes, or waiting for them', async () => {
    await desk.post(desk.editor, [put(aContact())])
    await desk.server.dataSource.transaction(async (em) => {
      await lockSheet(em, await desk.sheetId())
      expect((await preview({ what: 'revision', revision: 1 })).base).toBe(2)
    })
  })

  it('refuses to undo what was not accepted, naming item, person, time and revision', async () => {
    const contact = aContact({ name: 'Spindrift' })
    await desk.post(desk.editor, [put(contact)])
    await desk.post(desk.compiler, [put(aContact({ name: 'Spindrift', note: 'x' }, contact.id))], { base: 2 })
    const { status, body } = await restore({ what: 'revision', revision: 2 }, { base: 3 })
    expect(status).toBe(409)
    expect(body.type).toBe('/problems/later-changes')
    expect(body.detail).toBe(
      'This would undo a later change: contact Spindrift, changed by Rosa Kelp at revision 3.',
    )
    expect(body.items).toMatchObject([
      {
        id: contact.id,
        kind: 'contact',
        name: 'contact Spindrift',
        entries: [{ revision: 3, author: { name: 'Rosa Kelp' } }],
      },
    ])
    expect(Date.parse(body.items[0].entries[0].at)).toBeGreaterThan(0)
    expect(await desk.latest()).toBe(3)
  })

  it('never undoes what came after the preview', async () => {
    const contact = aContact()
    await desk.post(desk.editor, [put(contact)])
    await desk.post(desk.editor, [put(aContact({ note: 'seen' }, contact.id))], { base: 2 })
    const { base } = await preview({ what: 'revision', revision: 2 })
    await desk.post(desk.compiler, [put(aContact({ note: 'just now' }, contact.id))], { base })
    const { status, body } = await restore({ what: 'revision', revision: 2 }, { base, undoLater: true })
    expect(status).toBe(409)
    expect(body.items[0].entries.map((entry: { revision: number }) => entry.revision)).toEqual([4])
    expect((await desk.find(contact.id))?.properties).toMatchObject({ note: 'just now' })
  })
})

describe('going back with one item', () => {
  it('gives it its earlier version, and lets the rest be', async () => {
    const [contact, other] = [aContact(), aContact()]
    await desk.post(desk.editor, [put(contact), put(other)])
    await desk.post(desk.editor, [put(aContact({ note: 'a' }, contact.id)), remove(other.id)], { base: 2 })
    const what = { what: 'item', item: contact.id, revision: 2 }
    const { body } = await restore(what, { base: 3, undoLater: true, message: 'the line was right' })
    expect(body.entry).toMatchObject({
      message: 'the line was right',
      what: 'changed note of contact',
      changed: 1,
    })
    expect((await desk.find(contact.id))?.properties).toMatchObject({ note: '' })
    expect(await desk.find(other.id)).toBeUndefined()
  })

  it('brings back one that was removed, as its person would by undoing', async () => {
    const contact = aContact()
    await desk.post(desk.compiler, [put(contact)])
    await desk.post(desk.compiler, [remove(contact.id)], { base: 2 })
    const what = { what: 'item', item: contact.id, revision: 2 }
    expect((await preview(what, desk.compiler)).message).toBe('restored contact as it was at revision 2')
    expect((await restore(what, { base: 3, undoLater: true, agent: desk.compiler })).status).toBe(201)
    expect(await desk.find(contact.id)).toBeDefined()
    const { body } = await desk.compiler.get(`/api/sheets/${desk.sheet}/items/${contact.id}/versions`)
    expect(
      body.map((version: { since: number; until: number | null }) => [version.since, version.until]),
    ).toEqual([
      [4, null],
      [2, 3],
    ])
  })
})

describe('taking back one entry', () => {
  it('takes back an intake whole, and what others drew meanwhile stays', async () => {
    const items = Array.from({ length: 30 }, () => aContact())
    await desk.post(desk.compiler, items.map(put), { message: 'took in ridge.geojson' })
    const own = anAttitude()
    await desk.post(desk.editor, [put(own)], { base: 2 })
    const what = { what: 'entry', revision: 2 }
    expect(await preview(what)).toMatchObject({
      laterItems: 0,
      message: 'took back entry 2: took in ridge.geojson',
      counts: [{ kind: 'contact', removed: 30 }],
    })
    expect((await restore(what, { base: 3 })).body.entry.what).toBe('removed 30 contacts')
    expect((await desk.items()).map((item) => item.kind).sort()).toEqual(['attitude', 'sheet-face'])
  })

  it('refuses where somebody built on it, naming what', async () => {
    const [contact, other] = [aContact(), aContact()]
    await desk.post(desk.compiler, [put(contact), put(other)])
    await desk.post(desk.editor, [put(aContact({ note: 'checked' }, contact.id))], { base: 2 })
    const { status, body } = await restore({ what: 'entry', revision: 2 }, { base: 3 })
    expect(status).toBe(409)
    expect(body.items).toMatchObject([
      { id: contact.id, entries: [{ revision: 3, author: { name: 'Tove Orr' } }] },
    ])
    expect((await restore({ what: 'entry', revision: 2 }, { base: 3, undoLater: true })).status).toBe(201)
  })

  it('refuses to take away a unit that labels use, the sheet face, and what is no change any more', async () => {
    const unit = aUnit()
    await desk.post(desk.editor, [put(unit)])
    await desk.post(desk.editor, [put(aLabel(unit.id))], { base: 2 })
    const used = await restore({ what: 'entry', revision: 2 }, { base: 3 })
    expect(used.status).toBe(422)
    expect(used.body.detail).toContain('Unit Sp is used by 1 unit label')
    expect(used.body.items).toEqual([unit.id])
    expect((await preview({ what: 'entry', revision: 2 })).obstacle).toContain('Unit Sp is used')
    expect((await preview({ what: 'entry', revision: 1 })).obstacle).toBe('The sheet face cannot be removed.')
    const nothing = await restore({ what: 'revision', revision: 3 }, { base: 3 })
    expect(nothing.body.type).toBe('/problems/nothing-to-restore')
    expect(await desk.latest()).toBe(3)
  })
})

describe('who may go back, and how', () => {
  it('keeps the legend to editors, and everything to a sheet in drafting', async () => {
    const unit = aUnit()
    await desk.post(desk.editor, [put(unit)])
    const what = { what: 'entry', revision: 2 }
    expect((await restore(what, { base: 2, agent: desk.compiler })).status).toBe(403)
    expect((await preview(what, desk.compiler)).obstacle).toContain('Only an editor')
    expect((await restore(what, { base: 2, agent: desk.approver })).status).toBe(403)
    await desk.server.dataSource.query(`UPDATE sheet SET state = 'submitted' WHERE number = $1`, [desk.sheet])
    expect((await restore(what, { base: 2 })).body.type).toBe('/problems/wrong-state')
    expect((await preview(what)).obstacle).toContain('submitted')
  })

  it('does it once for one key, and refuses revisions from the future', async () => {
    const contact = aContact()
    await desk.post(desk.editor, [put(contact)])
    const key = randomUUID()
    const what = { what: 'entry', revision: 2 }
    const [first, second] = await Promise.all([
      restore(what, { base: 2, key }).then((answer) => answer),
      restore(what, { base: 2, key }).then((answer) => answer),
    ])
    expect(first.body).toEqual(second.body)
    expect(await desk.latest()).toBe(3)
    expect((await restore(what, { base: 3, key })).body.type).toBe('/problems/key-reused')
    expect((await restore({ what: 'revision', revision: 9 }, { base: 3 })).body.errors[0].pointer).toBe(
      '/restore/revision',
    )
    expect((await restore(what, { base: 9 })).body.errors[0].pointer).toBe('/base')
    expect((await restore(what, { base: 3, key: 'again' })).status).toBe(400)
  })
})
