import type { RequestHandler } from 'express'
import connectPgSimple from 'connect-pg-simple'
import { csrfSync } from 'csrf-sync'
import session from 'express-session'
import type { Pool } from 'pg'
import type { Logger } from 'pino'
import { problem } from '../problem'

const HOUR_MS = 3_600_000
/** A session that nobody uses ends after this long: a working day. */
export const IDLE_LIMIT_MS = 12 * HOUR_MS
/** A session ends this long after signing in, however much it is used. */
export const ABSOLUTE_LIMIT_MS = 7 * 24 * HOUR_MS

declare module 'express-session' {
  interface SessionData {
    /** When the person signed in, milliseconds since 1970. */
    signedInAt?: number
  }
}

export interface SessionSettings {
  pool: Pool
  secret: string
  /** Address that people use: https makes cookies travel over https only. */
  url: string
  log: Logger
}

/** Sessions in PostgreSQL, named by a cookie that scripts cannot read and other sites cannot send. */
export function createSessions({ pool, secret, url, log }: SessionSettings): {
  middleware: RequestHandler
  close(): void
} {
  const { protocol, port } = new URL(url)
  const secure = protocol === 'https:'
  const Store = connectPgSimple(session)
  const store = new Store({
    pool,
    tableName: 'session',
    errorLog: (...faults: unknown[]) => log.error({ faults }, 'Sessions cannot be kept'),
  })
  const middleware = session({
    store,
    secret,
    // Cookies do not know ports: without it two servers on one machine would take each other's sessions.
    name: secure ? '__Host-sheetwright' : `sheetwright-${port || '80'}`,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    cookie: { httpOnly: true, sameSite: 'lax', secure, path: '/', maxAge: IDLE_LIMIT_MS },
  })
  return { middleware, close: () => store.close() }
}

/** Begins a session anew once it has reached its absolute limit. */
export const limitSessionAge: RequestHandler = (request, _response, next) => {
  const { signedInAt } = request.session
  if (signedInAt !== undefined && Date.now() - signedInAt > ABSOLUTE_LIMIT_MS)
    request.session.regenerate(next)
  else next()
}

const tokens = csrfSync({ getTokenFromRequest: (request) => request.get('X-CSRF-Token') })

/** The token that this session's page sends with every change; a new session has a new one. */
export const tokenOf = tokens.generateToken

/** Refuses a change that does not come from a page of this session. */
export const checkToken: (typeof tokens)['revokeToken'] = (request) => {
  if (!tokens.isRequestValid(request)) {
    throw problem('stale-form', 'This page was opened before you signed in or out, or too long ago.')
  }
}
