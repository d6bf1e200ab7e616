import type { Access, Endpoint, Form } from '@shared/api/endpoint'
import type { z } from 'zod'
import { ApiProblem } from './problem'
import { send, type Outgoing } from './send'

export { ApiProblem } from './problem'

/** A part of the input may be left out where nothing in it is required. */
type Part<Name extends string, Value> =
  Record<string, never> extends Value ? { [N in Name]?: Value } : { [N in Name]: Value }

type FilePart<F extends Form> = F extends 'upload'
  ? Form extends F
    ? { file?: File }
    : { file: File }
  : unknown

/** What a call takes: the endpoint's parameters, query and body, the file of an upload. */
export type Input<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, F extends Form> = Part<
  'params',
  z.output<P>
> &
  Part<'query', z.input<Q>> &
  Part<'body', z.input<B>> &
  FilePart<F> & {
    headers?: Record<string, string>
    signal?: AbortSignal
    /** Told how much of an upload has left, 0–1. */
    progress?: (part: number) => void
  }

/** What the client needs of the session, and tells it. */
export interface SessionTie {
  csrfToken(): string
  /** Gets a fresh token where the server holds the page for out of date. */
  renewToken(): Promise<void>
  /** A call needed someone signed in, and nobody is any more. */
  ended(): void
}

let session: SessionTie = { csrfToken: () => '', renewToken: () => Promise.resolve(), ended: () => undefined }

/** The session store ties itself in, so that the client need not know it. */
export function tieSession(tie: SessionTie): void {
  session = tie
}

/** Calls an endpoint. A page that is out of date (signed in again elsewhere) is brought up to date once, unasked.
 *  @throws ApiProblem for whatever is not the answer, also for a network that is down */
export async function call<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  A extends z.ZodType,
  X extends Access,
  F extends Form,
>(
  endpoint: Endpoint<P, Q, B, A, X, F>,
  ...[input]: Record<string, never> extends Input<P, Q, B, F> ? [Input<P, Q, B, F>?] : [Input<P, Q, B, F>]
): Promise<z.output<A>> {
  const loose: LooseInput = input ?? {}
  try {
    return await attempt(endpoint, loose)
  } catch (error) {
    if (!(error instanceof ApiProblem)) throw error
    if (error.slug === 'stale-form') {
      await session.renewToken()
      return await attempt(endpoint, loose)
    }
    if (error.slug === 'not-signed-in') session.ended()
    throw error
  }
}

interface LooseInput {
  params?: unknown
  query?: unknown
  body?: unknown
  file?: File
  headers?: Record<string, string>
  signal?: AbortSignal
  progress?: (part: number) => void
}

async function attempt<A extends z.ZodType>(
  endpoint: Endpoint<z.ZodType, z.ZodType, z.ZodType, A>,
  input: LooseInput,
) {
  // The server makes its answers by the same schemas; reading a sheet of 100 000 items twice would cost seconds.
  return (await send(toOutgoing(endpoint, input))) as z.output<A>
}

function toOutgoing(endpoint: Endpoint, input: LooseInput): Outgoing {
  const headers: Record<string, string> = { Accept: 'application/json', ...input.headers }
  if (endpoint.method !== 'get') headers['X-CSRF-Token'] = session.csrfToken()
  const { signal, progress } = input
  const outgoing: Outgoing = {
    method: endpoint.method.toUpperCase(),
    url: addressOf(endpoint, input),
    headers,
    signal,
    progress,
  }
  if (input.file) outgoing.body = formOf(input.file, input.body)
  else if (input.body !== undefined) {
    headers['Content-Type'] = 'application/json'
    outgoing.body = JSON.stringify(input.body)
  }
  return outgoing
}

const record = (value: unknown): Record<string, unknown> => ({ ...(value as object | undefined) })

/** The address of an endpoint with its parameters filled in, under /api: for links to files. */
export function addressOf(
  endpoint: Pick<Endpoint, 'path'>,
  { params, query }: { params?: unknown; query?: unknown } = {},
): string {
  const values = record(params)
  const filled = endpoint.path.replace(/\{(\w+)\}/g, (_, name: string) =>
    encodeURIComponent(String(values[name])),
  )
  const search = new URLSearchParams()
  for (const [name, value] of Object.entries(record(query))) {
    if (value !== undefined && value !== null) search.set(name, String(value))
  }
  const suffix = search.toString()
  return `/api${filled}${suffix ? `?${suffix}` : ''}`
}

function formOf(file: File, fields: unknown): FormData {
  const form = new FormData()
  for (const [name, value] of Object.entries(record(fields))) {
    if (value !== undefined) form.append(name, typeof value === 'string' ? value : JSON.stringify(value))
  }
  // After the fields, so that a server reading in order knows them when the file comes.
  form.append('file', file, file.name)
  return form
}
