import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { getEdition, listEditions } from '@shared/api/catalogue'
import { uploadIntake } from '@shared/api/intake'
import { createSheet, listSheets } from '@shared/api/sheets'
import { addressOf, ApiProblem, call, tieSession } from '@/api/client'
import { aProblem, fakeNetwork } from '../../../support/fake-network'

const tie = { csrfToken: vi.fn(() => 'token-1'), renewToken: vi.fn(async () => undefined), ended: vi.fn() }

beforeEach(() => {
  vi.clearAllMocks()
  tie.csrfToken.mockReturnValue('token-1')
  tieSession(tie)
})
afterEach(() => vi.unstubAllGlobals())

const aSheet = {
  number: 'MI-15',
  title: 'Tern Sound',
  scale: 24_000,
  srid: 32626,
  area: { by: 'metres', west: 0, south: 0, east: 1, north: 1 },
  page: { width: 841, height: 594 },
} as const

const refusalOf = async (attempt: Promise<unknown>): Promise<ApiProblem> => {
  const error = await attempt.then(
    () => undefined,
    (thrown: unknown) => thrown,
  )
  if (!(error instanceof ApiProblem)) throw new Error('No ApiProblem was thrown.')
  return error
}

describe('call', () => {
  it('fills parameters in, escaped, and leaves empty query values out', async () => {
    const sent = fakeNetwork(() => ({ body: [] }))
    await call(getEdition, { params: { sheet: 'A/B', edition: 2 } })
    await call(listEditions, { query: { text: undefined } })
    await call(listEditions, { query: { text: 'Gannet & Rill' } })
    expect(sent.map(({ url }) => url)).toEqual([
      '/api/catalogue/A%2FB/2',
      '/api/catalogue',
      '/api/catalogue?text=Gannet+%26+Rill',
    ])
  })

  it('sends the token with changes and not with reading', async () => {
    const sent = fakeNetwork(() => ({ body: {} }))
    await call(listSheets)
    await call(createSheet, { body: aSheet })
    expect(sent[0]?.headers).not.toHaveProperty('x-csrf-token')
    expect(sent[1]?.headers).toMatchObject({ 'x-csrf-token': 'token-1', 'content-type': 'application/json' })
    expect(sent[1]?.body).toEqual(aSheet)
  })

  it('sends an upload as a form with the file, without a JSON content type', async () => {
    const sent = fakeNetwork(() => ({ status: 201, body: {} }))
    const file = new File(['{}'], 'ridge traverse.geojson')
    await call(uploadIntake, { params: { sheet: 'MI-14' }, file })
    const form = sent[0]?.body
    expect(form).toBeInstanceOf(FormData)
    expect(form instanceof FormData && form.get('file')).toMatchObject({ name: 'ridge traverse.geojson' })
    expect(sent[0]?.headers).not.toHaveProperty('content-type')
  })

  it('gives null for an answer without content', async () => {
    fakeNetwork(() => ({ status: 204 }))
    expect(await call(listSheets)).toBeNull()
  })

  it('throws the problem that the server explains, with its places', async () => {
    const errors = [{ pointer: '/number', detail: 'There is already a sheet MI-15.' }]
    fakeNetwork(() => ({ status: 409, body: aProblem('number-taken', 409, { errors }) }))
    const refusal = await refusalOf(call(createSheet, { body: aSheet }))
    expect(refusal.slug).toBe('number-taken')
    expect(refusal.problem.errors).toEqual(errors)
    expect(refusal.message).toBe('What happened.')
  })

  it('makes a plain sentence of a network that is down', async () => {
    fakeNetwork(() => {
      throw new TypeError('Failed to fetch')
    })
    const refusal = await refusalOf(call(listSheets))
    expect(refusal.slug).toBe('unavailable')
    expect(refusal.problem.detail).toMatch(/^The server does not answer/)
    expect(refusal.cause).toBeInstanceOf(TypeError)
  })

  it.each([
    [502, '<html>Bad gateway</html>', 'unavailable'],
    [413, 'too large', 'file-too-large'],
    [500, '', 'unexpected'],
    [404, '{"error":"not ours"}', 'unexpected'],
    [200, '<html>a page instead of JSON</html>', 'unexpected'],
  ])('makes a problem of status %i with %j, which is not ours', async (status, text, slug) => {
    fakeNetwork(() => ({ status, text }))
    expect((await refusalOf(call(listSheets))).slug).toBe(slug)
  })

  it('lets a cancelled call end as cancelled, not as a network that is down', async () => {
    const control = new AbortController()
    fakeNetwork(() => {
      control.abort()
      throw new DOMException('aborted', 'AbortError')
    })
    await expect(call(listSheets, { signal: control.signal })).rejects.toMatchObject({ name: 'AbortError' })
  })
})

describe('call and the session', () => {
  it('renews the token of a stale page once and repeats the same request with it', async () => {
    tie.renewToken.mockImplementation(async () => void tie.csrfToken.mockReturnValue('token-2'))
    const sent = fakeNetwork((_, count) =>
      count === 1
        ? { status: 403, body: aProblem('stale-form', 403) }
        : { status: 201, body: { number: 'MI-15' } },
    )
    expect(await call(createSheet, { body: aSheet })).toEqual({ number: 'MI-15' })
    expect(sent.map(({ headers }) => headers['x-csrf-token'])).toEqual(['token-1', 'token-2'])
    expect(sent[1]?.body).toEqual(sent[0]?.body)
  })

  it('gives up when the page stays stale', async () => {
    const sent = fakeNetwork(() => ({ status: 403, body: aProblem('stale-form', 403) }))
    expect((await refusalOf(call(createSheet, { body: aSheet }))).slug).toBe('stale-form')
    expect(sent).toHaveLength(2)
  })

  it('does not repeat what a role forbids, though it has the same status', async () => {
    const sent = fakeNetwork(() => ({ status: 403, body: aProblem('not-allowed', 403) }))
    expect((await refusalOf(call(createSheet, { body: aSheet }))).slug).toBe('not-allowed')
    expect(sent).toHaveLength(1)
    expect(tie.renewToken).not.toHaveBeenCalled()
  })

  it('tells the session that it has ended, and not of a wrong password', async () => {
    fakeNetwork((_, count) => ({
      status: 401,
      body: aProblem(count === 1 ? 'wrong-credentials' : 'not-signed-in', 401),
    }))
    await refusalOf(call(listSheets))
    expect(tie.ended).not.toHaveBeenCalled()
    await refusalOf(call(listSheets))
    expect(tie.ended).toHaveBeenCalledOnce()
  })
})

describe('addressOf', () => {
  it('gives the address of a file to link to', () => {
    const path = '/catalogue/{sheet}/{edition}/files/{name}'
    expect(addressOf({ path }, { params: { sheet: 'MI-14', edition: 1, name: 'sheet.pdf' } })).toBe(
      '/api/catalogue/MI-14/1/files/sheet.pdf',
    )
  })
})
