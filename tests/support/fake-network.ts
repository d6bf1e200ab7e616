import { vi } from 'vitest'

/** What was sent, as far as tests look at it. */
export interface Sent {
  method: string
  url: string
  headers: Record<string, string>
  body: unknown
}

export interface Reply {
  status?: number
  body?: unknown
  /** Instead of JSON, for answers that are not ours. */
  text?: string
}

/** Stands in for the network under fetch: every request is put down and answered by `answer`; a thrown error is a network
 *  that is down. */
export function fakeNetwork(answer: (sent: Sent, count: number) => Reply | Promise<Reply>): Sent[] {
  const sent: Sent[] = []
  vi.stubGlobal('fetch', async (url: string, init: RequestInit = {}) => {
    const request: Sent = {
      method: init.method ?? 'GET',
      url,
      // A browser sends names in lower case; the fake window keeps them as they were written.
      headers: Object.fromEntries(
        [...new Headers(init.headers)].map(([name, value]) => [name.toLowerCase(), value]),
      ),
      body: typeof init.body === 'string' ? JSON.parse(init.body) : init.body,
    }
    sent.push(request)
    const { status = 200, body, text } = await answer(request, sent.length)
    const content = text ?? (body === undefined ? '' : JSON.stringify(body))
    return new Response(status === 204 ? null : content, { status })
  })
  return sent
}

/** A problem as the server writes it. */
export const aProblem = (slug: string, status: number, extras: Record<string, unknown> = {}) => ({
  type: `/problems/${slug}`,
  title: 'A title',
  status,
  detail: 'What happened.',
  instance: 'urn:uuid:00000000-0000-4000-8000-000000000000',
  todo: 'What to do.',
  ...extras,
})

export const anAccount = (extras: Record<string, unknown> = {}) => ({
  id: '00000000-0000-4000-8000-00000000000a',
  name: 'Rosa Kelp',
  initials: 'RK',
  email: 'compiler@merrow.example',
  administrator: false,
  ...extras,
})
