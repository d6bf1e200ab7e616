import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../../server/app'
import { AccountsService } from '../../../server/features/accounts/accounts.service'
import { SessionRow } from '../../../server/platform/session.entity'
import { ABSOLUTE_LIMIT_MS, IDLE_LIMIT_MS } from '../../../server/platform/http/session'
import { signInAs, startTestServer, type TestServer } from '../../support/server'
import { anonymous } from '../../support/sign-in'

let server: TestServer

beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())

const compiler = { email: 'compiler@merrow.example', password: 'merrow-compiler' }
const cookieOf = (response: { headers: Record<string, unknown> }): string => {
  const [cookie] = [response.headers['set-cookie']].flat()
  if (typeof cookie !== 'string') throw new Error('No cookie came.')
  return cookie
}

describe('signing in', () => {
  it('answers who it is, under a new session id and with a new token', async () => {
    const before = await request(server.url).get('/api/session')
    expect(before.body.account).toBeNull()
    const after = await request(server.url)
      .post('/api/session')
      .set('Cookie', cookieOf(before))
      .set('X-CSRF-Token', before.body.csrfToken)
      .send(compiler)
    expect(after.status).toBe(200)
    expect(after.body.account).toMatchObject({ name: 'Rosa Kelp', initials: 'RK', administrator: false })
    expect(after.body.csrfToken).not.toBe(before.body.csrfToken)
    const [oldId] = cookieOf(before).split(';')
    const [newId] = cookieOf(after).split(';')
    expect(newId).not.toBe(oldId)
    const fixed = await request(server.url).get('/api/session').set('Cookie', cookieOf(before))
    expect(fixed.body.account).toBeNull()
  })

  it('takes the e-mail in capitals and with spaces around it', async () => {
    const agent = await anonymous(server)
    const { status } = await agent
      .post('/api/session')
      .send({ ...compiler, email: ' Compiler@Merrow.example ' })
    expect(status).toBe(200)
  })

  it('gives a cookie that scripts cannot read and other sites cannot send', async () => {
    const cookie = cookieOf(await request(server.url).get('/api/session'))
    expect(cookie).toContain('HttpOnly')
    expect(cookie).toContain('SameSite=Lax')
    expect(cookie).toContain('Path=/')
  })

  it('is refused without the token of the page', async () => {
    const { status, body } = await request(server.url).post('/api/session').send(compiler)
    expect(status).toBe(403)
    expect(body.type).toBe('/problems/stale-form')
  })

  it('does not tell an unknown e-mail from a wrong password, neither in words nor in work', async () => {
    const agent = await anonymous(server)
    const timed = async (credentials: object) => {
      const begin = process.hrtime.bigint()
      const { status, body } = await agent.post('/api/session').send(credentials)
      return { status, detail: body.detail, ms: Number(process.hrtime.bigint() - begin) / 1e6 }
    }
    const fastest = async (credentials: object) => {
      const tries = [await timed(credentials), await timed(credentials), await timed(credentials)]
      return tries.reduce((best, each) => (each.ms < best.ms ? each : best))
    }
    const wrong = await fastest({ ...compiler, password: 'not it' })
    const unknown = await fastest({ email: 'nobody@merrow.example', password: 'not it' })
    expect({ ...wrong, ms: 0 }).toEqual({ ...unknown, ms: 0 })
    expect(wrong.status).toBe(401)
    // Without a hash to check, the answer would take a tenth of the time.
    expect(unknown.ms).toBeGreaterThan(wrong.ms / 3)
  })

  it('can be done many times, but not guessed many times', async () => {
    for (let time = 0; time < 15; time++) await signInAs(server, 'editor')
    const agent = await anonymous(server)
    const guess = (email: string) => agent.post('/api/session').send({ email, password: 'a guess' })
    const statuses: number[] = []
    for (let time = 0; time < 12; time++) statuses.push((await guess('guessed@merrow.example')).status)
    expect(statuses).toEqual([...Array<number>(10).fill(401), 429, 429])
    const closed = await guess('guessed@merrow.example')
    expect(closed.body.type).toBe('/problems/too-many-requests')
    expect((await guess('another@merrow.example')).status).toBe(401)
    await signInAs(server, 'editor')
  })
})

describe('signing out', () => {
  it('ends the session for whoever has its cookie', async () => {
    const agent = await signInAs(server, 'approver')
    const held = cookieOf(await agent.get('/api/session'))
    const { status, body } = await agent.delete('/api/session')
    expect(status).toBe(200)
    expect(body.account).toBeNull()
    const { body: later } = await request(server.url).get('/api/session').set('Cookie', held)
    expect(later.account).toBeNull()
  })
})

describe('a session', () => {
  it('ends when nobody has used it for its idle limit', async () => {
    const agent = await signInAs(server, 'compiler')
    const held = cookieOf(await agent.get('/api/session'))
    const { expire, sid } = await sessionOf(held)
    expect(expire.getTime() - Date.now()).toBeLessThanOrEqual(IDLE_LIMIT_MS + 1000)
    await server.dataSource.manager.update(SessionRow, { sid }, { expire: new Date(Date.now() - 1000) })
    expect((await agent.get('/api/sheets')).status).toBe(401)
  })

  it('ends at its absolute limit however much it is used', async () => {
    const agent = await signInAs(server, 'compiler')
    const held = cookieOf(await agent.get('/api/session'))
    expect((await agent.get('/api/sheets')).status).toBe(200)
    const { sid } = await sessionOf(held)
    await server.dataSource.query(
      `UPDATE session SET sess = jsonb_set(sess, '{signedInAt}', to_jsonb($2::bigint)) WHERE sid = $1`,
      [sid, Date.now() - ABSOLUTE_LIMIT_MS - 1000],
    )
    expect((await agent.get('/api/sheets')).status).toBe(401)
  })

  it('that has ended is said plainly in the middle of editing: sign in, not reload', async () => {
    const agent = await signInAs(server, 'compiler')
    const { sid } = await sessionOf(cookieOf(await agent.get('/api/session')))
    await server.dataSource.manager.delete(SessionRow, { sid })
    const { status, body } = await agent.post('/api/sheets/T-1/revisions').send({})
    expect(status).toBe(401)
    expect(body.type).toBe('/problems/not-signed-in')
  })
})

/** The stored session of a cookie: its value is `s:<id>.<signature>`, percent-encoded. */
async function sessionOf(cookie: string): Promise<SessionRow> {
  const sid = /s:([^.]+)\./.exec(decodeURIComponent(cookie))?.[1]
  if (!sid) throw new Error(`Not a session cookie: ${cookie}`)
  return server.dataSource.manager.findOneByOrFail(SessionRow, { sid })
}

describe('demo accounts', () => {
  it('are offered while the demo is served on loopback', async () => {
    const { body } = await request(server.url).get('/api/session')
    expect(body.demoAccounts.map((account: { email: string }) => account.email)).toContain(
      'editor@merrow.example',
    )
  })

  it('cannot sign in, and their sessions end, where the demo is not served', async () => {
    const held = cookieOf(await (await signInAs(server, 'compiler')).get('/api/session'))
    const elsewhere = createApp({
      ...server.services,
      accounts: new AccountsService(server.dataSource, false),
    })
    const { body, headers } = await request(elsewhere).get('/api/session')
    expect(body.demoAccounts).toEqual([])
    const refused = await request(elsewhere)
      .post('/api/session')
      .set('Cookie', cookieOf({ headers }))
      .set('X-CSRF-Token', body.csrfToken)
      .send(compiler)
    expect(refused.status).toBe(401)
    expect((await request(elsewhere).get('/api/session').set('Cookie', held)).body.account).toBeNull()
  })
})
