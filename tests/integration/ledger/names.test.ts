import { describe, expect, it } from 'vitest'
import { aContact, put, useLedgerDesk } from '../../support/ledger-desk'

const desk = useLedgerDesk()

const name = (revision: number, body: object, agent = desk.compiler) =>
  agent.put(`/api/sheets/${desk.sheet}/revisions/${revision}/name`).send(body)
const unname = (revision: number) =>
  desk.compiler.delete(`/api/sheets/${desk.sheet}/revisions/${revision}/name`)
const listed = async () => (await desk.approver.get(`/api/sheets/${desk.sheet}/named-revisions`)).body

describe('a name on a revision', () => {
  it('says who put it there and when, and stands in the ledger and in a list of its own', async () => {
    await desk.post(desk.editor, [put(aContact())])
    const { status, body } = await name(2, { name: 'before the east half', note: 'walked with Tove' })
    expect(status).toBe(200)
    expect(body).toMatchObject({
      revision: 2,
      name: 'before the east half',
      note: 'walked with Tove',
      by: { name: 'Rosa Kelp' },
    })
    expect(Date.now() - Date.parse(body.at)).toBeLessThan(60_000)
    expect(await listed()).toEqual([body])
    const { entries } = (await desk.compiler.get(`/api/sheets/${desk.sheet}/revisions`)).body
    expect(entries.map((entry: { name: unknown }) => entry.name)).toEqual([body, null])
  })

  it('can be changed and taken off, and leaves the entry as it was', async () => {
    const before = (await desk.compiler.get(`/api/sheets/${desk.sheet}/revisions`)).body.entries[0]
    await name(1, { name: 'draft' })
    expect((await name(1, { name: 'first draft' }, desk.editor)).body).toMatchObject({
      name: 'first draft',
      by: { name: 'Tove Orr' },
    })
    expect((await unname(1)).status).toBe(204)
    expect(await listed()).toEqual([])
    expect((await unname(1)).status).toBe(404)
    expect((await desk.compiler.get(`/api/sheets/${desk.sheet}/revisions`)).body.entries[0]).toEqual(before)
  })

  it('is unique on its sheet, also when two give it at once, and free on another sheet', async () => {
    await desk.post(desk.editor, [put(aContact())])
    const answers = await Promise.all([name(1, { name: 'twin' }), name(2, { name: 'twin' }, desk.editor)])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    const refused = answers.find(({ status }) => status === 409)
    expect(refused?.body.type).toBe('/problems/name-taken')
    expect(refused?.body.errors[0].pointer).toBe('/name')
    await desk.takeNewSheet()
    expect((await name(1, { name: 'twin' })).status).toBe(200)
  })

  it('may be given while the sheet is submitted, but not by an approver, to no revision, or empty', async () => {
    await desk.server.dataSource.query(`UPDATE sheet SET state = 'submitted' WHERE number = $1`, [desk.sheet])
    expect((await name(1, { name: 'as submitted' })).status).toBe(200)
    expect((await name(1, { name: 'mine' }, desk.approver)).status).toBe(403)
    expect((await name(2, { name: 'tomorrow' })).status).toBe(404)
    expect((await name(1, { name: '  ' })).status).toBe(400)
  })
})
