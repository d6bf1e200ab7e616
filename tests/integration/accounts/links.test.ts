import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { Account } from '../../../server/features/accounts/account.entity'
import { Link } from '../../../server/features/accounts/link.entity'
import { aSheet, signIn, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'
import { anonymous } from '../../support/sign-in'

let server: TestServer
let administrator: Agent

beforeAll(async () => {
  server = await startTestServer()
  administrator = await signInAs(server, 'administrator')
})
afterAll(() => server.close())

const password = 'three plain words'
const tokenOf = (link: string): string => link.split('/').at(-1) ?? ''
const invite = (email: string, name = 'Ada Holm') => administrator.post('/api/accounts').send({ email, name })
const accept = async (token: string, person: object) =>
  (await anonymous(server)).post(`/api/links/${token}`).send(person)

describe('an invitation', () => {
  it('is made by an administrator, and signs its owner in once', async () => {
    const { status, body } = await invite('Ada@merrow.example')
    expect(status).toBe(201)
    expect(body.account).toMatchObject({ email: 'ada@merrow.example', initials: 'AH', active: false })
    expect(body.link.startsWith(`${server.url}/link/`)).toBe(true)
    const token = tokenOf(body.link)
    const seen = await (await anonymous(server)).get(`/api/links/${token}`)
    expect(seen.body).toEqual({ purpose: 'invitation', email: 'ada@merrow.example', name: 'Ada Holm' })
    const accepted = await accept(token, { email: 'ada@merrow.example', name: 'Ada Holm', password })
    expect(accepted.status).toBe(200)
    expect(accepted.body.account).toMatchObject({ name: 'Ada Holm', administrator: false })
    await signIn(server, 'ada@merrow.example', password)
    const again = await accept(token, {
      email: 'ada@merrow.example',
      name: 'Ada Holm',
      password: 'another long one',
    })
    expect(again.status).toBe(410)
    expect(again.body.type).toBe('/problems/link-used')
  })

  it('is kept as a hash: the database does not hold a link that works', async () => {
    const token = tokenOf((await invite('hashed@merrow.example')).body.link)
    const links = await server.dataSource.manager.find(Link)
    expect(JSON.stringify(links)).not.toContain(token)
  })

  it('works for one of two who use it at the same moment', async () => {
    const token = tokenOf((await invite('twice@merrow.example')).body.link)
    const person = { email: 'twice@merrow.example', name: 'Ada Holm' }
    const answers = await Promise.all([
      accept(token, { ...person, password }),
      accept(token, { ...person, password }),
    ])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410])
  })

  it('expires', async () => {
    const token = tokenOf((await invite('late@merrow.example')).body.link)
    await server.dataSource.query(
      `UPDATE link SET expires_at = now() - interval '1 second' WHERE used_at IS NULL`,
    )
    expect((await (await anonymous(server)).get(`/api/links/${token}`)).status).toBe(410)
    expect((await accept(token, { email: 'late@merrow.example', name: 'Ada', password })).status).toBe(410)
  })

  it('is void once the same person is invited again, and refused for someone who is in already', async () => {
    const first = tokenOf((await invite('again@merrow.example')).body.link)
    const second = tokenOf((await invite('again@merrow.example', 'Ada H. Holm')).body.link)
    const person = { email: 'again@merrow.example', name: 'Ada H. Holm', password }
    expect((await accept(first, person)).status).toBe(410)
    expect((await accept(second, person)).status).toBe(200)
    const third = await invite('again@merrow.example')
    expect(third.status).toBe(409)
    expect(third.body).toMatchObject({ type: '/problems/account-exists', errors: [{ pointer: '/email' }] })
  })

  it('is for one e-mail, and wants a password of 12 characters; a refusal does not use it up', async () => {
    const token = tokenOf((await invite('strict@merrow.example')).body.link)
    const other = await accept(token, { email: 'other@merrow.example', name: 'Ada', password })
    expect(other.body).toMatchObject({ type: '/problems/invalid-input', errors: [{ pointer: '/email' }] })
    const short = await accept(token, { email: 'strict@merrow.example', name: 'Ada', password: 'short' })
    expect(short.body).toMatchObject({ type: '/problems/invalid-input', errors: [{ pointer: '/password' }] })
    expect((await accept(token, { email: 'strict@merrow.example', name: 'Ada', password })).status).toBe(200)
  })
})

describe('the first administrator', () => {
  it('is made by a link that works once, and only while there is none', async () => {
    const { links, dataSource } = server.services
    const [first, second] = [
      await links.makeFirstAdministratorLink(),
      await links.makeFirstAdministratorLink(),
    ]
    const token = tokenOf(first ?? '')
    const seen = await (await anonymous(server)).get(`/api/links/${token}`)
    expect(seen.body).toEqual({ purpose: 'first-administrator', email: null, name: null })
    const taken = await accept(token, { email: 'editor@merrow.example', name: 'Tove Orr', password })
    expect(taken.body.type).toBe('/problems/account-exists')
    const made = await accept(token, { email: 'chief@merrow.example', name: 'Una Gray', password })
    expect(made.body.account).toMatchObject({ administrator: true, initials: 'UG' })
    const other = await accept(tokenOf(second ?? ''), {
      email: 'second@merrow.example',
      name: 'No',
      password,
    })
    expect(other.status).toBe(410)
    expect(await links.makeFirstAdministratorLink()).toBeUndefined()
    expect(await dataSource.manager.existsBy(Account, { email: 'second@merrow.example' })).toBe(false)
  })
})

describe('members', () => {
  it('get exactly the roles that are set, and none ends the membership', async () => {
    const sheet = await aSheet(server)
    const { body: accounts } = await administrator.get('/api/accounts')
    const approver = accounts.find(
      (account: { email: string }) => account.email === 'approver@merrow.example',
    )
    const set = (roles: string[]) =>
      administrator.put(`/api/sheets/${sheet.number}/members/${approver.id}`).send({ roles })
    const rolesNow = async () => {
      const { body } = await administrator.get(`/api/sheets/${sheet.number}/members`)
      return body.find((member: { email: string }) => member.email === 'approver@merrow.example')?.roles
    }
    expect(await rolesNow()).toEqual(['approver'])
    expect((await set(['editor', 'compiler', 'editor'])).status).toBe(204)
    expect(await rolesNow()).toEqual(['compiler', 'editor'])
    expect((await set([])).status).toBe(204)
    expect(await rolesNow()).toBeUndefined()
    const agent = await signInAs(server, 'approver')
    expect((await agent.get(`/api/sheets/${sheet.number}`)).status).toBe(404)
  })

  it('are not set by themselves: nobody raises their own role', async () => {
    const sheet = await aSheet(server)
    const { body } = await administrator.get('/api/session')
    const own = await administrator
      .put(`/api/sheets/${sheet.number}/members/${body.account.id}`)
      .send({ roles: ['approver'] })
    expect(own.status).toBe(403)
    expect(own.body.type).toBe('/problems/not-allowed')
  })

  it('have to exist, on a sheet that exists', async () => {
    const sheet = await aSheet(server)
    const nobody = '7d9f0a52-3a6f-4f0e-9d0e-1d6b8a3c2f11'
    const roles = { roles: ['compiler'] }
    expect(
      (await administrator.put(`/api/sheets/${sheet.number}/members/${nobody}`).send(roles)).status,
    ).toBe(404)
    expect((await administrator.put(`/api/sheets/NO-SHEET/members/${nobody}`).send(roles)).status).toBe(404)
  })
})
