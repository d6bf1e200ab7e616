import * as accounts from './accounts'
import * as audit from './audit'
import * as catalogue from './catalogue'
import * as comparisons from './comparisons'
import type { Endpoint } from './endpoint'
import * as events from './events'
import * as faces from './faces'
import * as health from './health'
import * as intake from './intake'
import * as jobs from './jobs'
import * as ledger from './ledger'
import * as openapi from './openapi'
import * as restores from './restores'
import * as review from './review'
import * as sheets from './sheets'
import * as symbols from './symbols'

const rooms = [
  health,
  accounts,
  audit,
  sheets,
  ledger,
  comparisons,
  restores,
  faces,
  intake,
  review,
  jobs,
  events,
  catalogue,
  symbols,
  openapi,
]

const isEndpoint = (value: unknown): value is Endpoint =>
  typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'access' in value

/** Every endpoint of the API. OpenAPI and the route × role test are made from it. */
export const endpoints: readonly Endpoint[] = rooms.flatMap((room) => Object.values(room).filter(isEndpoint))
