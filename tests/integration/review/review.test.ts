import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import {
  anItem,
  aSmallMap,
  decide,
  latestSubmission,
  putItems,
  release,
  submit,
} from '../../support/review-path'
import { aSheet, signInAs, startTestServer, type Agent, type TestServer } from '../../support/server'

let server: TestServer
let compiler: Agent
let editor: Agent
let approver: Agent
let administrator: Agent
let number: string
/** Revision with the small map on it. */
let revision: number

beforeAll(async () => {
  server = await startTestServer()
  compiler = await signInAs(server, 'compiler')
  editor = await signInAs(server, 'editor')
  approver = await signInAs(server, 'approver')
  administrator = await signInAs(server, 'administrator')
})
afterAll(() => server.close())

beforeEach(async () => {
  const sheet = await aSheet(server)
  number = sheet.number
  revision = await putItems(editor, number, sheet.revision, aSmallMap())
})

const stateOf = async (): Promise<string> => (await editor.get(`/api/sheets/${number}`)).body.state
const problemOf = (response: { status: number; body: { type?: string; detail?: string } }) => ({
  status: response.status,
  type: response.body.type,
})

describe('submitting', () => {
  it('pins the revision with what is in it, and makes the sheet read-only', async () => {
    const response = await submit(editor, number, revision, 'First edition')
    expect(response.status).toBe(201)
    expect(response.body).toMatchObject({
      revision,
      since: 0,
      message: 'First edition',
      decision: null,
      submittedBy: { name: 'Tove Orr' },
    })
    expect(response.body.digest).toMatch(/^[0-9a-f]{64}$/)
    expect(response.body.contents).toContainEqual({ kind: 'unit', items: 2 })
    expect(response.body.differences).toContainEqual({ kind: 'contact', added: 1, changed: 0, removed: 0 })
    expect(response.body.authors.map((author: { name: string }) => author.name)).toContain('Tove Orr')
    expect(await stateOf()).toBe('submitted')
    await expect(putItems(compiler, number, revision, [anotherAttitude()])).rejects.toThrow('wrong-state')
  })

  it('is for editors only', async () => {
    for (const agent of [compiler, approver, administrator]) {
      expect(problemOf(await submit(agent, number, revision))).toEqual({
        status: 403,
        type: '/problems/not-allowed',
      })
    }
    expect(await stateOf()).toBe('drafting')
  })

  it('refuses a revision that is not the latest, and a second submission', async () => {
    await putItems(compiler, number, revision, [anotherAttitude()])
    const stale = await submit(editor, number, revision)
    expect(problemOf(stale)).toEqual({ status: 409, type: '/problems/wrong-state' })
    expect(stale.body.detail).toContain(`revision ${revision + 1}`)
    expect((await submit(editor, number, revision + 1)).status).toBe(201)
    expect(problemOf(await submit(editor, number, revision + 1))).toEqual({
      status: 409,
      type: '/problems/wrong-state',
    })
  })

  it('refuses a sheet without anything on it', async () => {
    const empty = await aSheet(server)
    const response = await submit(editor, empty.number, empty.revision)
    expect(problemOf(response)).toEqual({ status: 409, type: '/problems/wrong-state' })
    expect(response.body.detail).toContain('nothing on the sheet')
  })

  it('refuses, while it can still be mended, what could not be printed', async () => {
    const unprintable = anItem({
      kind: 'unit',
      geometry: null,
      properties: { label: 'X', name: 'Holm Ж', colour: '#cf9d86', rank: 3 },
    })
    const next = await putItems(editor, number, revision, [unprintable])
    const before = await editor.get(`/api/sheets/${number}/submission/next`)
    expect(before.body.obstacle).toContain('“Ж”')
    expect(problemOf(await submit(editor, number, next))).toEqual({
      status: 422,
      type: '/problems/cannot-print',
    })
    expect(await stateOf()).toBe('drafting')
  })
})

describe('deciding', () => {
  let digest: string
  beforeEach(async () => {
    digest = (await submit(editor, number, revision)).body.digest
  })

  it('approves what was shown, by an approver whose work is not in it', async () => {
    const response = await decide(approver, number, 'approved', digest, 'Sound.')
    expect(response.status).toBe(200)
    expect(response.body.decision).toMatchObject({
      decision: 'approved',
      by: { name: 'Edda Marr' },
      note: 'Sound.',
    })
    expect(await stateOf()).toBe('approved')
  })

  it('returns it to drafting with a note, and asks for the note', async () => {
    const bare = await decide(approver, number, 'returned', digest)
    expect(problemOf(bare)).toEqual({ status: 400, type: '/problems/invalid-input' })
    expect((await decide(approver, number, 'returned', digest, 'Contact ends in the open.')).status).toBe(200)
    expect(await stateOf()).toBe('drafting')
    expect((await latestSubmission(compiler, number)).decision?.note).toBe('Contact ends in the open.')
    await putItems(compiler, number, revision, [anotherAttitude()])
  })

  it('is for approvers only', async () => {
    for (const agent of [compiler, editor, administrator]) {
      const response = await decide(agent, number, 'approved', digest)
      expect(problemOf(response)).toEqual({ status: 403, type: '/problems/not-allowed' })
    }
    expect(await stateOf()).toBe('submitted')
  })

  it('refuses a digest other than that of the submission', async () => {
    const response = await decide(approver, number, 'approved', '0'.repeat(64))
    expect(problemOf(response)).toEqual({ status: 409, type: '/problems/digest-changed' })
    expect(await stateOf()).toBe('submitted')
  })

  it('refuses a second decision and says who made the first', async () => {
    await decide(approver, number, 'approved', digest)
    const second = await decide(approver, number, 'returned', digest, 'Changed my mind.')
    expect(problemOf(second)).toEqual({ status: 409, type: '/problems/already-decided' })
    expect(second.body.detail).toContain('Edda Marr')
    expect((await latestSubmission(editor, number)).decision?.decision).toBe('approved')
  })

  it('lets exactly one of several simultaneous decisions through', async () => {
    const answers = await Promise.all(
      Array.from({ length: 6 }, (_, index) =>
        decide(approver, number, index % 2 === 0 ? 'approved' : 'returned', digest, 'At once.'),
      ),
    )
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1)
    expect(answers.filter((answer) => answer.body.type === '/problems/already-decided')).toHaveLength(5)
  })

  it('tells everyone what stands in their way', async () => {
    expect((await latestSubmission(approver, number)).obstacle).toBeNull()
    expect((await latestSubmission(editor, number)).obstacle).toContain('Only an approver')
  })
})

describe('own work', () => {
  it('stops an approver who submitted it as editor, and one who changed something in it', async () => {
    const both = await aSheet(server, {
      roles: { editor: ['editor', 'approver'], compiler: ['compiler', 'approver'] },
    })
    const first = await putItems(editor, both.number, both.revision, aSmallMap())
    const latest = await putItems(compiler, both.number, first, [anotherAttitude()], 'one more attitude')
    const { digest } = (await submit(editor, both.number, latest)).body
    const bySubmitter = await decide(editor, both.number, 'approved', digest)
    expect(problemOf(bySubmitter)).toEqual({ status: 403, type: '/problems/own-work' })
    const byAuthor = await decide(compiler, both.number, 'approved', digest)
    expect(problemOf(byAuthor)).toEqual({ status: 403, type: '/problems/own-work' })
    expect(byAuthor.body.detail).toContain('one more attitude')
    expect((await latestSubmission(compiler, both.number)).obstacle).toContain('one more attitude')
    expect((await decide(approver, both.number, 'approved', digest)).status).toBe(200)
    expect(problemOf(await release(editor, both.number))).toEqual({ status: 403, type: '/problems/own-work' })
    expect(problemOf(await release(compiler, both.number))).toEqual({
      status: 403,
      type: '/problems/own-work',
    })
  })
})

describe('asking for the release', () => {
  it('is for approvers only, and only of an approved sheet', async () => {
    for (const agent of [compiler, editor, administrator]) {
      expect(problemOf(await release(agent, number))).toEqual({ status: 403, type: '/problems/not-allowed' })
    }
    expect(problemOf(await release(approver, number))).toEqual({ status: 409, type: '/problems/wrong-state' })
    await submit(editor, number, revision)
    expect(problemOf(await release(approver, number))).toEqual({ status: 409, type: '/problems/wrong-state' })
  })
})

function anotherAttitude() {
  return anItem({
    kind: 'attitude',
    geometry: { type: 'Point', coordinates: [290_000, 5_286_000] },
    properties: { strike: 30, dip: 25 },
  })
}
