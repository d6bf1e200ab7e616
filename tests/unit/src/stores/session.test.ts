import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, expect, it, vi } from 'vitest'
import { listSheets } from '@shared/api/sheets'
import { call } from '@/api/client'
import { useSessionStore } from '@/stores/session'
import { anAccount, aProblem, fakeNetwork } from '../../../support/fake-network'

beforeEach(() => setActivePinia(createPinia()))
afterEach(() => vi.unstubAllGlobals())

const aSession = (account: ReturnType<typeof anAccount> | null, csrfToken = 'token') => ({
  account,
  csrfToken,
  demoAccounts: [],
})

it('asks once who is signed in, however many ask at the same time', async () => {
  const sent = fakeNetwork(() => ({ body: aSession(anAccount()) }))
  const session = useSessionStore()
  await Promise.all([session.load(), session.load()])
  await session.load()
  expect(sent).toHaveLength(1)
  expect(session.account?.name).toBe('Rosa Kelp')
})

it('asks again after the server did not answer', async () => {
  fakeNetwork((_, count) => (count === 1 ? { status: 502, text: '' } : { body: aSession(null) }))
  const session = useSessionStore()
  await expect(session.load()).rejects.toThrow(/does not answer/)
  await session.load()
  expect(session.account).toBeNull()
})

it('uses the token that came with signing in from then on', async () => {
  const sent = fakeNetwork(({ method, url }) => {
    if (url !== '/api/session') return { body: [] }
    return { body: method === 'POST' ? aSession(anAccount(), 'after') : aSession(null, 'before') }
  })
  const session = useSessionStore()
  await session.load()
  await session.enter('compiler@merrow.example', 'merrow-compiler')
  await session.leave()
  expect(sent.map(({ headers }) => headers['x-csrf-token'])).toEqual([undefined, 'before', 'after'])
})

it('keeps who it was when the session ends, and asks to sign in again', async () => {
  fakeNetwork(({ url }) =>
    url === '/api/session'
      ? { body: aSession(anAccount()) }
      : { status: 401, body: aProblem('not-signed-in', 401) },
  )
  const session = useSessionStore()
  await session.load()
  expect(session.hasEnded).toBe(false)
  await expect(call(listSheets)).rejects.toThrow()
  expect(session.hasEnded).toBe(true)
  expect(session.account?.name).toBe('Rosa Kelp')
  await session.enter('compiler@merrow.example', 'merrow-compiler')
  expect(session.hasEnded).toBe(false)
})

it('notices on renewing the token that the session has ended', async () => {
  fakeNetwork((_, count) => ({ body: count === 1 ? aSession(anAccount(), 'old') : aSession(null, 'new') }))
  const session = useSessionStore()
  await session.load()
  await session.renew()
  expect(session.hasEnded).toBe(true)
  expect(session.account?.name).toBe('Rosa Kelp')
})

it('does not speak of an ended session to somebody who never signed in', async () => {
  fakeNetwork(({ url }) =>
    url === '/api/session' ? { body: aSession(null) } : { status: 401, body: aProblem('not-signed-in', 401) },
  )
  const session = useSessionStore()
  await session.load()
  await expect(call(listSheets)).rejects.toThrow()
  expect(session.hasEnded).toBe(false)
})
