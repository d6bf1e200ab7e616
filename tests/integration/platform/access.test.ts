import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { endpoints } from '@shared/api'
import type { Endpoint } from '@shared/api/endpoint'
import { roles as allRoles, type Role } from '@shared/api/accounts'
import { aSheet, signIn, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'
import { listen } from '../../support/listen'
import { anonymous } from '../../support/sign-in'

/** Whoever may call at all: strangers, people without a role on the sheet, members by role, administrators. */
const callers = ['anonymous', 'stranger', ...allRoles, 'administrator'] as const
type Caller = (typeof callers)[number]

/** What access alone answers: nobody there, nothing there for you, or not your role. */
type Refusal = 401 | 403 | 404

let server: TestServer
let sheet: string
const agents = new Map<Caller, Agent>()

beforeAll(async () => {
  server = await startTestServer()
  for (const who of [...allRoles, 'administrator'] as const) agents.set(who, await signInAs(server, who))
  agents.set('anonymous', await anonymous(server))
  agents.set('stranger', await signInStranger())
  sheet = (await aSheet(server)).number
})
afterAll(() => server.close())

/** Somebody with an account who belongs to no sheet. */
async function signInStranger(): Promise<Agent> {
  const { link } = await server.services.administration.invite(
    { email: 'stranger@merrow.example', name: 'Sam Strand', administrator: false },
    null,
  )
  const token = link.split('/').at(-1) ?? ''
  const password = 'quite a long password'
  await server.services.links.accept(token, {
    email: 'stranger@merrow.example',
    name: 'Sam Strand',
    password,
  })
  return signIn(server, 'stranger@merrow.example', password)
}

/** What the contract says of a caller, read from `access` and nothing else; undefined where they are let in. */
function expectedRefusal({ access, method }: Endpoint, caller: Caller): Refusal | undefined {
  if (access.to === 'anyone') return undefined
  if (caller === 'anonymous') return 401
  if (access.to === 'signed-in') return undefined
  if (access.to === 'administrator') return caller === 'administrator' ? undefined : 403
  if (caller === 'stranger') return 404
  const isForEveryMember = allRoles.every((role) => access.roles.includes(role))
  if (caller === 'administrator') return method === 'get' && isForEveryMember ? undefined : 403
  return access.roles.includes(caller) ? undefined : 403
}

const params: Record<string, () => string> = {
  sheet: () => sheet,
  srid: () => '32626',
  edition: () => '1',
  revision: () => '1',
  name: () => 'sheet.pdf',
  token: () => 'a-token-that-nobody-has-made',
}

/** A call that gets as far as access allows: its body is empty, so most of what is let in is refused for that. */
async function statusOf(endpoint: Endpoint, caller: Caller): Promise<{ status: number; slug: string }> {
  const agent = agents.get(caller)
  if (!agent) throw new Error(`Nobody is ${caller}.`)
  const path = endpoint.path.replace(/\{(\w+)\}/g, (_, name: string) => (params[name] ?? randomUUID)())
  if (endpoint.form === 'events') {
    // A stream never ends: its head is the answer.
    const stream = await listen(server, agent, `/api${path}`)
    stream.close()
    return { status: stream.status, slug: '' }
  }
  const call = agent[endpoint.method](`/api${path}`)
  const { status, body } = endpoint.method === 'get' ? await call : await call.send({})
  return { status, slug: String(body?.type ?? '').replace('/problems/', '') }
}

/** Endpoints that end the caller's session or begin another one stand in tests of their own. */
const changesSession = ['signOut', 'signIn']

/** What a call that was let in may still answer with these statuses, for another reason than access. */
const otherReasons = ['not-found', 'own-work', 'wrong-credentials']

const table = endpoints
  .filter(({ id }) => !changesSession.includes(id))
  .map((endpoint) => [`${endpoint.method} ${endpoint.path}`, endpoint] as const)

describe.each(table)('%s', (_, endpoint) => {
  it.each(callers)('lets in whom its access allows: %s', async (caller) => {
    const refusal = expectedRefusal(endpoint, caller)
    const { status, slug } = await statusOf(endpoint, caller)
    if (refusal !== undefined) {
      const slugs = { 401: 'not-signed-in', 403: 'not-allowed', 404: 'not-found' }
      if (endpoint.form !== 'events') expect(slug).toBe(slugs[refusal])
      expect(status).toBe(refusal)
    } else if ([401, 403, 404].includes(status)) {
      expect(otherReasons).toContain(slug)
      expect(endpoint.problems).toContain(slug)
    } else {
      expect(status).toBeLessThan(500)
    }
  })
})

describe('the list of endpoints', () => {
  it('is mounted whole: each answers something other than an address that does not exist', async () => {
    const detail = 'The API has nothing at this address.'
    for (const endpoint of endpoints.filter(({ form }) => form !== 'events')) {
      const path = endpoint.path.replace(/\{(\w+)\}/g, (_, name: string) => (params[name] ?? randomUUID)())
      const { body } = await (await anonymous(server))[endpoint.method](`/api${path}`)
      expect(body?.detail, endpoint.id).not.toBe(detail)
    }
  })

  it('names every endpoint once', () => {
    const ids = endpoints.map(({ id }) => id)
    expect(new Set(ids).size).toBe(ids.length)
    const places = endpoints.map(({ method, path }) => `${method} ${path}`)
    expect(new Set(places).size).toBe(places.length)
  })

  it('asks of every change that is not for anyone a role or an account', () => {
    const open = endpoints.filter(({ method, access }) => method !== 'get' && access.to === 'anyone')
    expect(open.map(({ id }) => id).sort()).toEqual(['acceptLink', 'signIn', 'signOut'])
  })
})

describe('roles', () => {
  it.each(allRoles)('hold on the sheet they were given for, not on another: %s', async (role: Role) => {
    const other = await aSheet(server, { roles: { [role]: [] } })
    const agent = agents.get(role)
    expect((await agent?.get(`/api/sheets/${sheet}`))?.status).toBe(200)
    expect((await agent?.get(`/api/sheets/${other.number}`))?.status).toBe(404)
  })
})
