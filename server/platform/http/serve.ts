import { Readable } from 'node:stream'
import { pipeline } from 'node:stream/promises'
import type { Request, RequestHandler, Response, Router } from 'express'
import type { z } from 'zod'
import { roles as allRoles, type Role } from '@shared/api/accounts'
import type { Access, Endpoint, Form } from '@shared/api/endpoint'
import { problem } from '../problem'
import type { SheetIdentity, SignedIn } from './access'
import { JsonParts } from './json-parts'
import { parseInput, parsePath } from './parse-input'
import { readJson, readUpload, removeUpload, type UploadedFile } from './read-body'
import { checkToken } from './session'

/** Who calls, and for members' endpoints on which sheet. */
type Caller<X extends Access> = X extends { to: 'members' }
  ? { account: SignedIn; sheet: SheetIdentity; roles: Role[] }
  : X extends { to: 'anyone' }
    ? { account?: SignedIn }
    : { account: SignedIn }

/** One call of an endpoint, parsed and let in. */
export type Call<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  X extends Access,
  F extends Form,
> = Caller<X> & {
  params: z.output<P>
  query: z.output<Q>
  body: z.output<B>
  /** A request header. */
  header(name: string): string | undefined
  request: Request
  response: Response
} & (F extends 'upload' ? { file: UploadedFile } : unknown)

/** What a handler gives back: the answer, whole or in parts, or nothing where it writes the response itself. */
type Answer<A extends z.ZodType, F extends Form> = F extends 'download' | 'events'
  ? void
  : z.input<A> | JsonParts

/** Mounts an endpoint: lets in whom its access allows, parses what came, answers what the handler gives.
 *  Order: signed in? token? path? sheet and role? query and body? So a stranger learns nothing from the later ones. */
export function serve<
  P extends z.ZodType,
  Q extends z.ZodType,
  B extends z.ZodType,
  A extends z.ZodType,
  X extends Access,
  F extends Form,
>(
  router: Router,
  endpoint: Endpoint<P, Q, B, A, X, F>,
  handler: (call: Call<P, Q, B, X, F>) => Promise<Answer<A, F>> | Answer<A, F>,
): void {
  const handle: RequestHandler = async (request, response) => {
    requireAccount(endpoint.access, request.user)
    if (endpoint.method !== 'get') checkToken(request)
    const params = parseParams(endpoint, request.params)
    const caller = await admit(endpoint, params, request.user, response)
    const query = parseInput(endpoint.query, { ...request.query })
    const { body, file } = await readInput(endpoint, request, response)
    try {
      if (endpoint.form === 'download' && caller.account && caller.sheet) {
        await response.locals.context.noteDownload(caller.account, caller.sheet, request.originalUrl)
      }
      const call = {
        ...caller,
        params,
        query,
        body,
        file,
        header: (name: string) => request.get(name),
        request,
        response,
      }
      // TypeScript cannot follow that `admit` and `readInput` give what the endpoint's own access and form promise.
      const answer = await handler(call as unknown as Call<P, Q, B, X, F>)
      if (endpoint.form === 'download' || endpoint.form === 'events') return
      if (answer instanceof JsonParts) await sendParts(endpoint, request, response, answer)
      else send(endpoint, response, answer)
    } finally {
      if (file) await removeUpload(file)
    }
  }
  router[endpoint.method](endpoint.path.replace(/\{(\w+)\}/g, ':$1'), handle)
}

function requireAccount(access: Access, account: SignedIn | undefined): void {
  if (access.to === 'anyone') return
  if (!account) throw problem('not-signed-in', 'This needs you to be signed in.')
  if (access.to === 'administrator' && !account.administrator) {
    throw problem('not-allowed', 'Only an administrator may do this.')
  }
}

/** A path that cannot name anything names nothing. */
function parseParams<P extends z.ZodType>(endpoint: Endpoint<P>, params: object): z.output<P> {
  const parsed = parsePath(endpoint.params, { ...params })
  if (parsed === undefined) throw problem('not-found', 'This address names nothing that there is.')
  return parsed
}

interface Admitted {
  account?: SignedIn | undefined
  sheet?: SheetIdentity
  roles?: Role[]
}

async function admit(
  endpoint: Endpoint,
  params: unknown,
  account: SignedIn | undefined,
  response: Response,
): Promise<Admitted> {
  const { access } = endpoint
  if (access.to !== 'members' || !account) return { account }
  const finder = response.locals.context.access
  const sheet = await finder.findSheet(sheetNumberOf(params))
  const roles = sheet ? await finder.listRoles(account.id, sheet.id) : []
  const mayKnow = roles.length > 0 || account.administrator
  if (!sheet || !mayKnow) throw problem('not-found', 'There is no such sheet, or you are not a member of it.')
  // Administrators look after every sheet, so they may read it; to change it they need a role like anybody else.
  const mayRead = endpoint.method === 'get' && access.roles.length === allRoles.length
  if (!roles.some((role) => access.roles.includes(role)) && !(account.administrator && mayRead)) {
    throw problem('not-allowed', `On this sheet this needs the role of ${access.roles.join(' or ')}.`)
  }
  return { account, sheet, roles }
}

function sheetNumberOf(params: unknown): string {
  if (
    typeof params === 'object' &&
    params !== null &&
    'sheet' in params &&
    typeof params.sheet === 'string'
  ) {
    return params.sheet
  }
  throw new TypeError('An endpoint for members names its sheet in the path.')
}

async function readInput<B extends z.ZodType>(
  endpoint: Endpoint<z.ZodType, z.ZodType, B>,
  request: Request,
  response: Response,
): Promise<{ body: z.output<B>; file?: UploadedFile }> {
  if (endpoint.form !== 'upload') {
    return {
      body: parseInput(endpoint.body, endpoint.method === 'get' ? {} : await readJson(request, response)),
    }
  }
  const { file, fields } = await readUpload(request, response, response.locals.context.uploadFolder)
  try {
    return { body: parseInput(endpoint.body, fields), file }
  } catch (fault) {
    await removeUpload(file)
    throw fault
  }
}

function send(endpoint: Endpoint, response: Response, answer: unknown): void {
  const status = endpoint.status ?? 200
  if (status === 204) {
    response.status(204).end()
    return
  }
  if (response.locals.context.checkAnswers) checkAnswer(endpoint, answer)
  response.status(status).json(answer)
}

/** Writes a large answer part by part, as fast as its reader takes it; nothing of it to a reader who has it already. */
async function sendParts(
  endpoint: Endpoint,
  request: Request,
  response: Response,
  { tag, parts }: JsonParts,
): Promise<void> {
  if (response.locals.context.checkAnswers) checkAnswer(endpoint, JSON.parse(parts.join('')))
  response.type('json').set({ ETag: `"${tag}"`, 'Cache-Control': 'private, no-cache' })
  if (request.fresh) {
    response.status(304).end()
    return
  }
  await pipeline(Readable.from(parts), response)
}

/** Answers follow the contract; a mistake in one is ours, so it is an unexpected problem. */
function checkAnswer(endpoint: Endpoint, answer: unknown): void {
  // What travels is JSON: undefined fields are gone, dates are text.
  const checked = endpoint.answer.safeParse(JSON.parse(JSON.stringify(answer)))
  if (!checked.success)
    throw new TypeError(`${endpoint.id} answers against its contract: ${checked.error.message}`)
}
