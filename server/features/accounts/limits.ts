import type { Request, RequestHandler, Response } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { run } from '../../platform/http/read-body'
import { problem } from '../../platform/problem'

const WINDOW_MS = 15 * 60_000
/** Failures within the window before one e-mail is closed to one address. */
const FAILURES_PER_EMAIL = 10
/** Failures within the window before an address is closed. */
const FAILURES_PER_ADDRESS = 100

/** Counts only tries that fail: who signs in a hundred times is not guessing. */
const countFailures = (limit: number, keyOf: (request: Request) => string): RequestHandler =>
  rateLimit({
    windowMs: WINDOW_MS,
    limit,
    keyGenerator: keyOf,
    skipSuccessfulRequests: true,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (_request, _response, next) =>
      next(problem('too-many-requests', 'There were too many failed tries; wait a quarter of an hour.')),
  })

const addressOf = (request: Request): string => ipKeyGenerator(request.ip ?? '')

function emailOf({ body }: Request): string {
  const email: unknown = body?.email
  return typeof email === 'string' ? email.trim().toLowerCase() : ''
}

/** Slows down whoever guesses passwords or links. Calls are counted per process. */
export function createLimits(): { signIn: Limit; links: Limit } {
  const perEmail = countFailures(FAILURES_PER_EMAIL, (request) => `${addressOf(request)} ${emailOf(request)}`)
  const perAddress = countFailures(FAILURES_PER_ADDRESS, addressOf)
  const links = countFailures(FAILURES_PER_ADDRESS, addressOf)
  return {
    async signIn(request, response) {
      await run(perAddress, request, response)
      await run(perEmail, request, response)
    },
    links: (request, response) => run(links, request, response),
  }
}

/** Throws 'too-many-requests' once there were too many failures. */
export type Limit = (request: Request, response: Response) => Promise<void>
