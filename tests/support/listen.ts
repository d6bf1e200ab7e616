import type { Agent } from './sign-in'

const PATIENCE_MS = 10_000

/** An open stream of server-sent events. */
export interface Listener {
  status: number
  /** Everything that has come. */
  text(): string
  /** Resolves once a text has come. */
  heard(text: string): Promise<void>
  /** Resolves once the server has ended it. */
  ended(): Promise<void>
  close(): void
}

/** Opens a stream as the agent's person. Not through the agent itself: its library takes our hanging up for a fault. */
export async function listen(server: { url: string }, agent: Agent, path: string): Promise<Listener> {
  const ours = new AbortController()
  const response = await fetch(`${server.url}${path}`, {
    headers: { Cookie: await cookieOf(agent) },
    signal: ours.signal,
  })
  const state = { text: '', ended: false }
  const reading = read(response, (part) => (state.text += part))
    .catch(() => undefined)
    .then(() => (state.ended = true))
  return {
    status: response.status,
    text: () => state.text,
    heard: (text) =>
      until(
        () => state.text.includes(text),
        () => `Not heard: ${text}\nSo far:\n${state.text}`,
      ),
    async ended() {
      await until(
        () => state.ended,
        () => 'The stream has not ended.',
      )
      await reading
    },
    close: () => ours.abort(),
  }
}

async function read(response: Response, hear: (part: string) => void): Promise<void> {
  const decoder = new TextDecoder()
  for await (const part of response.body ?? []) hear(decoder.decode(part, { stream: true }))
}

/** The cookie of an agent's session: each answer brings it again. */
async function cookieOf(agent: Agent): Promise<string> {
  const { headers } = await agent.get('/api/session')
  const [cookie] = [headers['set-cookie']].flat()
  return cookie?.split(';')[0] ?? ''
}

async function until(what: () => boolean, complaint: () => string): Promise<void> {
  const limit = Date.now() + PATIENCE_MS
  while (!what()) {
    if (Date.now() > limit) throw new Error(complaint())
    await new Promise((resolve) => setTimeout(resolve, 20))
  }
}
