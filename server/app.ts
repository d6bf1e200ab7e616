import { join } from 'node:path'
import compression from 'compression'
import express, { type Express, type Request, type Response, Router } from 'express'
import helmet from 'helmet'
import { mountAccounts } from './features/accounts/accounts.routes'
import { createPassport } from './features/accounts/passport'
import { mountAdministration } from './features/administration/administration.routes'
import { mountCatalogue } from './features/catalogue/catalogue.routes'
import { mountEvents } from './features/events/events.routes'
import { mountFaces } from './features/faces/faces.routes'
import { mountHealth } from './features/health/health.routes'
import { mountIntake } from './features/intake/intake.routes'
import { mountJobs } from './features/jobs/jobs.routes'
import { mountLedger } from './features/ledger/ledger.routes'
import { mountOpenApi } from './features/openapi/openapi.routes'
import { mountReview } from './features/review/review.routes'
import { mountSheets } from './features/sheets/sheets.routes'
import { mountSymbols } from './features/symbols/symbols.routes'
import { handleProblems } from './platform/http/problem-handler'
import { limitSessionAge } from './platform/http/session'
import { logRequests } from './platform/log'
import { problem } from './platform/problem'
import type { Services } from './services'

export interface AppOptions {
  /** Checks every answer against its contract before it is sent: for tests. */
  checkAnswers?: boolean
}

/** The application over its services: the API under /api, the client for every other address. */
export function createApp(services: Services, options: AppOptions = {}): Express {
  const { config } = services
  const app = express()
  app.disable('x-powered-by')
  // One proxy in front, if the address that people use is not our own: its word on the caller's address counts.
  app.set('trust proxy', new URL(config.url).protocol === 'https:' ? 1 : false)
  app.use(logRequests(services.log))
  app.use(secureHeaders(config.url))
  app.use(compression({ filter: mayCompress }))
  app.use('/api', createApi(services, options))
  app.use(...serveClient(config.clientFolder))
  app.use(handleProblems)
  return app
}

function createApi(services: Services, { checkAnswers = false }: AppOptions): Router {
  const { accounts, uploadFolder, sessions } = services
  const api = Router()
  const passport = createPassport(accounts)
  api.use((_request, response, next) => {
    response.locals.context = {
      access: accounts,
      uploadFolder,
      checkAnswers,
      noteDownload: (account, sheet, path) =>
        accounts.keepEvent({ kind: 'download', path }, account.id, sheet.number),
    }
    next()
  })
  // Before sessions: a balancer that asks for health should not touch them.
  mountHealth(api, services.health)
  mountOpenApi(api, services.config.version)
  mountCatalogue(api, services.editions)
  mountSymbols(api)
  api.use(sessions.middleware, limitSessionAge, passport.session())
  mountAccounts(api, accounts, services.links, passport)
  mountAdministration(api, services.administration)
  mountSheets(api, services.sheets)
  mountLedger(api, services)
  mountFaces(api, services.faces)
  mountIntake(api, services.intake)
  mountReview(api, services.review)
  mountJobs(api, services.jobs, accounts)
  mountEvents(api, services)
  api.use(() => {
    throw problem('not-found', 'The API has nothing at this address.')
  })
  return api
}

/** No script but our own files may run. Styles may stand inline, because Ant Design Vue writes its style elements while
 *  it runs; a style cannot run code. */
function secureHeaders(url: string) {
  const secure = new URL(url).protocol === 'https:'
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'", 'data:'],
        connectSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(secure ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: secure,
    referrerPolicy: { policy: 'same-origin' },
  })
}

/** A stream of events has to arrive as it is written, not when a compressor has collected enough. */
const mayCompress = (request: Request, response: Response): boolean =>
  !String(response.getHeader('Content-Type')).startsWith('text/event-stream') &&
  compression.filter(request, response)

/** The built client: its files by name, its page for every address that a person may open. */
function serveClient(folder: string) {
  // Names in assets/ carry a hash of the content, so they never change.
  const assets = express.static(join(folder, 'assets'), { immutable: true, maxAge: '1y', index: false })
  const files = express.static(folder, { index: false })
  const page = Router()
  page.use('/assets', assets, () => {
    throw problem('not-found', 'There is no such file.')
  })
  page.get('/{*path}', (request, response, next) => {
    if (!request.accepts('html')) throw problem('not-found', 'There is nothing at this address.')
    response.set('Cache-Control', 'no-cache')
    response.sendFile('index.html', { root: folder }, (fault) => fault && next(fault))
  })
  return [files, page] as const
}
