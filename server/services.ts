import { chmod, mkdir, open, readFile } from 'node:fs/promises'
import { randomBytes } from 'node:crypto'
import { join } from 'node:path'
import { Pool } from 'pg'
import type { Logger } from 'pino'
import type { DataSource } from 'typeorm'
import type { Config } from './config'
import { AccountsService } from './features/accounts/accounts.service'
import { LinksService } from './features/accounts/links.service'
import { AdministrationService } from './features/administration/administration.service'
import { EditionsService } from './features/editions/editions.service'
import { ReleaseService } from './features/editions/release.service'
import { FacesService } from './features/faces/faces.service'
import { HealthService } from './features/health/health.service'
import { IntakeService } from './features/intake/intake.service'
import { ComparisonService } from './features/ledger/comparison.service'
import { HistoryService } from './features/ledger/history.service'
import { LedgerService } from './features/ledger/ledger.service'
import { NamedRevisionsService } from './features/ledger/named-revisions.service'
import { RestoreService } from './features/ledger/restore.service'
import { handleReleases } from './features/review/review.jobs'
import { ReviewService } from './features/review/review.service'
import { SheetsService } from './features/sheets/sheets.service'
import { createDataSource, migrate, migrateAsOwner } from './platform/database'
import { createSessions } from './platform/http/session'
import { Jobs } from './platform/jobs'
import { createLog } from './platform/log'
import { SheetEvents } from './platform/sheet-events'
import { folderStorage, type Storage } from './platform/storage'

/** Connections that sessions are read and kept through. */
const SESSION_POOL_SIZE = 4

/** Every room's service, built once. */
export type Services = Awaited<ReturnType<typeof createServices>>

/** Connects, brings the database up to date and builds every service. */
export async function createServices(config: Config) {
  const log = createLog(config.logLevel)
  const uploadFolder = join(config.dataFolder, 'uploads')
  await mkdir(uploadFolder, { recursive: true })
  const secret = config.sessionSecret ?? (await keepSecret(join(config.dataFolder, 'session-secret')))
  if (config.databaseOwnerUrl) await migrateAsOwner(config.databaseOwnerUrl, config.databaseUrl)
  const dataSource = await createDataSource(config.databaseUrl).initialize()
  if (!config.databaseOwnerUrl) await migrate(dataSource)
  const rooms = createRooms(config, dataSource, log)
  const pool = new Pool({ connectionString: config.databaseUrl, max: SESSION_POOL_SIZE })
  pool.on('error', (fault) => log.error({ err: fault }, 'A connection for sessions broke'))
  const sessions = createSessions({ pool, secret, url: config.url, log })
  return {
    config,
    log,
    dataSource,
    uploadFolder,
    sessions,
    ...rooms,
    /** Lets go of everything; nothing may be asked of the services afterwards. */
    async close(): Promise<void> {
      sessions.close()
      await rooms.intake.close()
      await rooms.events.close()
      await rooms.jobs.stop()
      await pool.end()
      await dataSource.destroy()
    },
  }
}

function createRooms(config: Config, dataSource: DataSource, log: Logger) {
  const storage = openStorage(config)
  const jobs = new Jobs(dataSource, config.databaseUrl, log)
  const events = new SheetEvents(config.databaseUrl, log)
  const accounts = new AccountsService(dataSource, config.demo)
  const links = new LinksService(dataSource, config.url)
  const ledger = new LedgerService(dataSource)
  const history = new HistoryService(dataSource)
  const sheets = new SheetsService(dataSource, ledger)
  const faces = new FacesService(dataSource)
  const editions = new EditionsService(dataSource, storage)
  const release = new ReleaseService(dataSource, storage, sheets, history, faces)
  handleReleases(jobs, dataSource, release)
  return {
    storage,
    jobs,
    events,
    accounts,
    links,
    administration: new AdministrationService(dataSource, accounts, links),
    health: new HealthService(dataSource, config.version),
    sheets,
    ledger,
    history,
    names: new NamedRevisionsService(dataSource),
    comparisons: new ComparisonService(dataSource, editions),
    restores: new RestoreService(dataSource, ledger),
    faces,
    editions,
    intake: new IntakeService(dataSource, storage, ledger, sheets),
    review: new ReviewService(dataSource, jobs, sheets, history, editions),
  }
}

/** Where files are kept. */
export const openStorage = ({ dataFolder }: Pick<Config, 'dataFolder'>): Storage =>
  folderStorage(join(dataFolder, 'files'))

/** The secret in a file that only this user may read; made at the first start. */
async function keepSecret(path: string): Promise<string> {
  try {
    const file = await open(path, 'wx', 0o600)
    try {
      await file.writeFile(randomBytes(32).toString('hex'))
      await file.sync()
    } finally {
      await file.close()
    }
  } catch (fault) {
    if (!(fault instanceof Error && 'code' in fault && fault.code === 'EEXIST')) throw fault
    await chmod(path, 0o600)
  }
  return readFile(path, 'utf8')
}
