import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { AuditEntry } from '@shared/api/audit'
import { chainHash, keepAudit } from '../../../server/platform/audit'
import { aSmallMap, putItems, releaseEdition } from '../../support/review-path'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'
import { anonymous } from '../../support/sign-in'

let server: TestServer
let administrator: Agent

beforeAll(async () => {
  server = await startTestServer()
  administrator = await signInAs(server, 'administrator')
})
afterAll(() => server.close())

const list = async (query: object = {}): Promise<AuditEntry[]> =>
  (await administrator.get('/api/audit').query(query)).body.entries
const latest = async (kind: string): Promise<AuditEntry | undefined> => (await list({ kind, limit: 1 }))[0]
const idOf = async (who: string): Promise<string> => {
  const [row] = await server.dataSource.query('SELECT id FROM account WHERE email = $1', [
    `${who}@merrow.example`,
  ])
  return row.id
}

describe('the audit trail', () => {
  it('keeps sign-ins, refusals and sign-outs, with who and from where, and no password', async () => {
    const agent = await anonymous(server)
    await agent.post('/api/session').send({ email: 'Nobody@Merrow.example', password: 'guessed password' })
    expect(await latest('sign-in-refused')).toMatchObject({
      person: null,
      event: { email: 'nobody@merrow.example', address: expect.stringMatching(/127\.0\.0\.1/) },
    })
    const compiler = await signInAs(server, 'compiler')
    expect(await latest('sign-in')).toMatchObject({ person: { name: 'Rosa Kelp' } })
    await compiler.delete('/api/session').send({})
    expect(await latest('sign-out')).toMatchObject({ person: { name: 'Rosa Kelp' } })
    expect(JSON.stringify(await list())).not.toContain('guessed password')
  })

  it('keeps invitations, passwords set by link, and roles before and after', async () => {
    const email = 'nan.skua@merrow.example'
    const { body } = await administrator.post('/api/accounts').send({ email, name: 'Nan Skua' })
    expect(await latest('invitation')).toMatchObject({ person: { name: 'Ivo Skerry' }, event: { email } })
    const token = body.link.split('/').at(-1)
    const newcomer = await anonymous(server)
    await newcomer
      .post(`/api/links/${token}`)
      .send({ email, name: 'Nan Skua', password: 'long enough for us' })
    expect(await latest('password-set')).toMatchObject({ person: { name: 'Nan Skua' } })
    const { number } = await aSheet(server)
    const member = `/api/sheets/${number}/members/${body.account.id}`
    await administrator.put(member).send({ roles: ['compiler'] })
    await administrator.put(member).send({ roles: ['editor', 'compiler'] })
    expect(await latest('membership')).toMatchObject({
      sheet: number,
      person: { name: 'Ivo Skerry' },
      event: { email, before: ['compiler'], after: ['compiler', 'editor'] },
    })
  })

  it('keeps that who creates a sheet edits it', async () => {
    const editor = await signInAs(server, 'editor')
    const { status } = await editor.post('/api/sheets').send({
      number: 'AU-1',
      title: 'Audited sheet',
      scale: 24_000,
      srid: 32626,
      area: { by: 'metres', west: 284_000, south: 5_278_000, east: 294_000, north: 5_289_000 },
      page: { width: 841, height: 594 },
    })
    expect(status).toBe(201)
    expect(await list({ sheet: 'AU-1' })).toMatchObject([
      { person: { name: 'Tove Orr' }, event: { kind: 'membership', before: [], after: ['editor'] } },
    ])
  })

  it('keeps submission, decision and release, and downloads of what is not released', async () => {
    const people = { editor: await signInAs(server, 'editor'), approver: await signInAs(server, 'approver') }
    const { number } = await aSheet(server)
    const revision = await putItems(people.editor, number, 1, aSmallMap())
    expect((await releaseEdition(people, number, revision)).state).toBe('done')
    await people.editor.get(`/api/sheets/${number}/comparison.csv?from=1`)
    await people.editor.put(`/api/sheets/${number}/revisions/1/name`).send({ name: 'empty' })
    const kept = (await list({ sheet: number })).map(({ event, person }) => [event.kind, person?.name])
    expect(kept).toEqual([
      ['revision-named', 'Tove Orr'],
      ['download', 'Tove Orr'],
      ['release', 'Edda Marr'],
      ['release-asked', 'Edda Marr'],
      ['decision', 'Edda Marr'],
      ['submission', 'Tove Orr'],
    ])
    expect((await latest('download'))?.event).toEqual({
      kind: 'download',
      path: `/api/sheets/${number}/comparison.csv?from=1`,
    })
  })

  it('has nothing of what did not happen: the entry is in the transaction of its cause', async () => {
    const before = (await list({ limit: 1 }))[0]?.number
    const event = { kind: 'sign-out', address: 'here' } as const
    await expect(
      server.dataSource.transaction(async (em) => {
        await keepAudit(em, { event, accountId: null })
        throw new Error('The cause failed.')
      }),
    ).rejects.toThrow('The cause failed.')
    expect((await list({ limit: 1 }))[0]?.number).toBe(before)
  })

  it('is one chain, also when many add to it at once', async () => {
    const event = { kind: 'sign-out', address: 'here' } as const
    await Promise.all(
      Array.from({ length: 30 }, () =>
        server.dataSource.transaction((em) => keepAudit(em, { event, accountId: null })),
      ),
    )
    const rows = await server.dataSource.query(
      `SELECT number, at, kind, account_id AS "accountId", sheet, detail, previous, hash FROM audit_entry ORDER BY number`,
    )
    let previous = '0'.repeat(64)
    rows.forEach((row: Parameters<typeof chainHash>[0] & { hash: string }, index: number) => {
      expect(row.number).toBe(index + 1)
      expect(row.previous).toBe(previous)
      expect(chainHash(row)).toBe(row.hash)
      previous = row.hash
    })
    expect(rows.length).toBeGreaterThan(30)
  })

  it('is read by administrators, page by page, by kind, person and time', async () => {
    const first = (await administrator.get('/api/audit?limit=5')).body
    const second = (await administrator.get(`/api/audit?limit=5&before=${first.next}`)).body
    const numbers = [...first.entries, ...second.entries].map((entry: AuditEntry) => entry.number)
    expect(numbers).toEqual(Array.from({ length: 10 }, (_, index) => (numbers[0] ?? 0) - index))
    const mine = await list({ person: await idOf('administrator') })
    expect(new Set(mine.map(({ person }) => person?.name))).toEqual(new Set(['Ivo Skerry']))
    expect(await list({ since: '2100-01-01T00:00:00Z' })).toEqual([])
    expect((await list({ until: '2100-01-01T00:00:00Z', limit: 1 })).length).toBe(1)
    const editor = await signInAs(server, 'editor')
    expect((await editor.get('/api/audit')).status).toBe(403)
  })
})

describe('the application’s database role', () => {
  it('may add to the audit trail, and neither change nor take from it', async () => {
    for (const statement of [
      `UPDATE audit_entry SET kind = 'sign-in'`,
      'DELETE FROM audit_entry',
      'TRUNCATE audit_entry',
      'ALTER TABLE audit_entry DISABLE TRIGGER ALL',
      'DROP TABLE audit_entry',
      'DELETE FROM audit_head',
      'UPDATE revision SET message = message',
      'DELETE FROM revision',
      `UPDATE item_version SET properties = '{}'`,
      'DELETE FROM item_version',
      'UPDATE edition SET digest = digest',
      'DELETE FROM artefact',
    ]) {
      await expect(server.dataSource.query(statement), statement).rejects.toThrow(
        /permission denied|must be owner/,
      )
    }
  })

  it('is not the only guard: even the owner only adds, unless the guard is taken away', async () => {
    await expect(server.asSuperuser(`UPDATE audit_entry SET kind = 'sign-in'`)).rejects.toThrow(
      'only ever added to',
    )
    await expect(server.asSuperuser('DELETE FROM audit_entry')).rejects.toThrow('only ever added to')
    await expect(server.asSuperuser('TRUNCATE audit_entry')).rejects.toThrow('only ever added to')
  })
})
