import { listen } from '../../support/listen'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { Push } from '@shared/api/events'
import { announce } from '../../../server/platform/announce'
import {
  aSheet,
  signInAs,
  startTestServer,
  type Agent,
  type TestServer,
  type TestSheet,
} from '../../support/server'

let server: TestServer
let compiler: Agent
let sheet: TestSheet

beforeAll(async () => {
  server = await startTestServer()
  compiler = await signInAs(server, 'compiler')
  sheet = await aSheet(server)
})
afterAll(() => server.close())

const PATIENCE_MS = 10_000

const listenTo = (number: string) => listen(server, compiler, `/api/sheets/${number}/events`)

const push = (number: string, what: Push) => server.dataSource.transaction((em) => announce(em, number, what))

describe('the stream of a sheet', () => {
  it('begins with what holds now, so that nothing before it is missed', async () => {
    const stream = await listenTo(sheet.number)
    await stream.heard('id: 1\nevent: revision\ndata: {"event":"revision","revision":1}\n\n')
    await stream.heard('event: state\ndata: {"event":"state","state":"drafting"}\n\n')
    stream.close()
  })

  it('tells what is announced for its sheet, and nothing of others', async () => {
    const other = await aSheet(server)
    const stream = await listenTo(sheet.number)
    await stream.heard('"drafting"')
    await push(other.number, { event: 'revision', revision: 77 })
    await push(sheet.number, { event: 'revision', revision: 5 })
    await stream.heard('id: 5\n')
    expect(stream.text()).not.toContain('77')
    stream.close()
  })

  it('tells nothing of a transaction that is taken back', async () => {
    const stream = await listenTo(sheet.number)
    await stream.heard('"drafting"')
    await expect(
      server.dataSource.transaction(async (em) => {
        await announce(em, sheet.number, { event: 'revision', revision: 98 })
        throw new Error('taken back')
      }),
    ).rejects.toThrow('taken back')
    await push(sheet.number, { event: 'revision', revision: 99 })
    await stream.heard('id: 99\n')
    expect(stream.text()).not.toContain('id: 98')
    stream.close()
  })

  it('ends when the hearing connection is lost, so that the client asks for what it missed; the next one works', async () => {
    const stream = await listenTo(sheet.number)
    await stream.heard('"drafting"')
    await server.dataSource.query(
      `SELECT pg_terminate_backend(pid) FROM pg_stat_activity
       WHERE application_name = 'sheetwright-events' AND datname = current_database()`,
    )
    await stream.ended()
    const hearing = async () => {
      const rows = await server.dataSource.query<unknown[]>(
        `SELECT FROM pg_stat_activity WHERE application_name = 'sheetwright-events' AND datname = current_database()`,
      )
      return rows.length
    }
    const limit = Date.now() + PATIENCE_MS
    while ((await hearing()) === 0 && Date.now() < limit)
      await new Promise((resolve) => setTimeout(resolve, 50))
    const next = await listenTo(sheet.number)
    await next.heard('"drafting"')
    await push(sheet.number, { event: 'revision', revision: 120 })
    await next.heard('id: 120\n')
    next.close()
  })
})

describe('an announcement', () => {
  it('carries numbers, not data: one that is too large is our mistake', async () => {
    const message = 'x'.repeat(9000)
    const job = {
      id: crypto.randomUUID(),
      kind: 'release',
      sheet: sheet.number,
      state: 'done',
      progress: 1,
      message,
    } as const
    await expect(push(sheet.number, { event: 'job', job })).rejects.toThrow(RangeError)
  })
})

describe('presence', () => {
  const page = '00000000-0000-4000-8000-0000000000aa'
  const seen = { page, extent: [284_000, 5_278_000, 286_000, 5_280_000], items: [] }

  it('is told to everyone on the sheet with the name of who is there, and kept nowhere', async () => {
    const stream = await listenTo(sheet.number)
    await stream.heard('"drafting"')
    const answer = await compiler.post(`/api/sheets/${sheet.number}/presence`).send(seen)
    expect(answer.status).toBe(204)
    await stream.heard(`"initials":"RK"},"presence":${JSON.stringify(seen)}`)
    stream.close()
    const later = await listenTo(sheet.number)
    await later.heard('"drafting"')
    expect(later.text()).not.toContain(page)
    later.close()
  })

  it.each([
    ['a page that has no id', { ...seen, page: 'mine' }],
    ['a place that is no number', { ...seen, extent: [0, 0, 'x', 1] }],
    ['more items than anyone has at hand', { ...seen, items: Array.from({ length: 21 }, () => page) }],
  ])('is refused with %s', async (_, body) => {
    const { status } = await compiler.post(`/api/sheets/${sheet.number}/presence`).send(body)
    expect(status).toBe(400)
  })
})
