import type { z } from 'zod'
import type { Endpoint } from '@shared/api/endpoint'
import { problemSchema, problems, type Problem, type ProblemSlug } from '@shared/api/problems'
import { getSession } from '@shared/api/accounts'

/** The server answered that something stands in the way. Without any answer, `call` throws fetch's own TypeError. */
export class ApiProblem extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail)
  }
}

/** What a call of an endpoint needs; parts that the endpoint does not have may be left out. */
export interface CallInput<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> {
  params?: z.input<P>
  query?: z.input<Q>
  body?: z.input<B>
  /** Of an upload. */
  file?: File
  headers?: Record<string, string>
  signal?: AbortSignal
}

let csrfToken = ''
let onSignedOut: () => void = () => {}

/** Keeps the token that comes with each session answer. */
export const keepCsrfToken = (token: string): void => {
  csrfToken = token
}
/** Told when a call finds that the session has ended. */
export const whenSignedOut = (listener: () => void): void => {
  onSignedOut = listener
}

/** Calls an endpoint of the API and gives its answer.
 *  @throws ApiProblem with what the server says stands in the way; TypeError if there is no answer */
export async function call<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  A extends z.ZodType,
>(
  endpoint: Pick<Endpoint<P, Q, B, A>, 'id' | 'method' | 'path' | 'params' | 'query' | 'body' | 'answer'>,
  input: CallInput<P, Q, B> = {},
): Promise<z.output<A>> {
  const first = await send(endpoint, input)
  if (first.status !== 403 || (await peekSlug(first)) !== 'stale-form') return read(first)
  // The token ages with the session: take a fresh one, and try once more.
  await refreshCsrfToken()
  return read(await send(endpoint, input))
}

type Address = Pick<Endpoint, 'method' | 'path'>
type AnyInput = {
  params?: unknown
  query?: unknown
  body?: unknown
  file?: File
  headers?: Record<string, string>
  signal?: AbortSignal
}

function send({ method, path }: Address, input: AnyInput): Promise<Response> {
  const changes = method !== 'get'
  const hasJson = changes && !input.file && input.body !== undefined
  return fetch(addressOf(path, input), {
    method: method.toUpperCase(),
    credentials: 'same-origin',
    signal: input.signal ?? null,
    headers: {
      Accept: 'application/json',
      ...(hasJson && { 'Content-Type': 'application/json' }),
      ...(changes && { 'X-CSRF-Token': csrfToken }),
      ...input.headers,
    },
    body: input.file ? toForm(input.file) : hasJson ? JSON.stringify(input.body) : null,
  })
}

/** Address of an endpoint under /api, its parameters and query filled in. */
export function addressOf(
  path: string,
  { params, query }: { params?: unknown; query?: unknown } = {},
): string {
  const values = (params ?? {}) as Record<string, unknown>
  const filled = path.replace(/\{(\w+)\}/g, (_, name: string) => encodeURIComponent(String(values[name])))
  const search = new URLSearchParams()
  for (const [name, value] of Object.entries(query ?? {})) {
    if (value !== undefined && value !== '') search.set(name, String(value))
  }
  return `/api${filled}${search.size > 0 ? `?${search}` : ''}`
}

function toForm(file: File): FormData {
  const form = new FormData()
  form.append('file', file)
  return form
}

// The answer's schema is the server's to keep (its tests check it); parsing 100 000 items again here would cost seconds.
async function read<T>(response: Response): Promise<T> {
  if (response.ok) return (response.status === 204 ? null : await response.json()) as T
  const problem = await toProblem(response)
  if (problem.type === '/problems/not-signed-in') onSignedOut()
  throw new ApiProblem(problem)
}

async function peekSlug(response: Response): Promise<string | undefined> {
  const problem = await toProblem(response.clone())
  return problem.type.split('/').at(-1)
}

async function toProblem(response: Response): Promise<Problem> {
  const parsed = problemSchema.safeParse(await response.json().catch(() => null))
  return parsed.data ?? unknownProblem(response)
}

/** A proxy, or something else that is not ours, answered. */
function unknownProblem(response: Response): Problem {
  const slug: ProblemSlug =
    response.status === 413 ? 'file-too-large' : response.status >= 500 ? 'unavailable' : 'unexpected'
  const { title, todo } = problems[slug]
  return {
    type: `/problems/${slug}`,
    title,
    todo,
    status: response.status,
    detail: `The server answered ${response.status}.`,
    instance: '',
  }
}

async function refreshCsrfToken(): Promise<void> {
  const session = await read<z.output<typeof getSession.answer>>(await send(getSession, {}))
  keepCsrfToken(session.csrfToken)
}

/** What stands in the way, also where there was no answer at all. @throws whatever is neither */
export function toShownProblem(error: unknown): Problem {
  if (error instanceof ApiProblem) return error.problem
  if (!(error instanceof TypeError)) throw error
  return {
    type: '/problems/unavailable',
    title: 'The server does not answer',
    status: 0,
    detail: 'There is no connection to the server.',
    instance: '',
    todo: 'Check the network, then try again. What you typed is still here.',
  }
}
