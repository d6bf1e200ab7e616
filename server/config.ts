import { readFileSync } from 'node:fs'
import { resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { z } from 'zod'

/** Settings of one process. */
export interface Config {
  /** Port to listen on; 0 takes a free one (tests). */
  port: number
  /** Address to listen on. */
  host: string
  /** Address that people use, without a slash at its end. */
  url: string
  databaseUrl: string
  /** Address of the same database for the role that owns its tables and migrates them; where it is not set, the
   *  application's role does both. */
  databaseOwnerUrl: string | undefined
  /** Folder for files: uploads, editions, the session secret. */
  dataFolder: string
  /** Folder of the built client. */
  clientFolder: string
  /** Whether the demo is loaded and its accounts may sign in; never beyond loopback. */
  demo: boolean
  /** Signs session cookies; kept in the data folder where it is not set. */
  sessionSecret: string | undefined
  /** Whether this process does jobs beside serving HTTP, or only one of both. */
  parts: { web: boolean; worker: boolean }
  logLevel: string
  version: string
}

/** Every setting that the environment can give. This is the only module that reads it. */
const environmentSchema = z.object({
  PORT: z.coerce.number().int().min(0).max(65535).default(4310),
  SHEETWRIGHT_HOST: z.string().min(1).default('127.0.0.1'),
  /** Behind a proxy: the address that people use, for links and for cookies that travel over https only. */
  SHEETWRIGHT_URL: z.url({ protocol: /^https?$/ }).optional(),
  DATABASE_URL: z
    .string({ error: 'A PostgreSQL address is needed: run npm start, or set DATABASE_URL.' })
    .min(1),
  DATABASE_OWNER_URL: z.string().min(1).optional(),
  SHEETWRIGHT_DATA: z.string().min(1).default('.data'),
  SHEETWRIGHT_DEMO: z.enum(['0', '1']).default('0'),
  /** The same for every process of one installation, if there are several. */
  SHEETWRIGHT_SESSION_SECRET: z.string().min(32, 'A session secret has at least 32 characters.').optional(),
  SHEETWRIGHT_PART: z.enum(['web', 'worker', 'both']).default('both'),
  SHEETWRIGHT_LOG: z.enum(['silent', 'fatal', 'error', 'warn', 'info', 'debug', 'trace']).default('info'),
})

const projectFolder = fileURLToPath(new URL('..', import.meta.url))

/** Settings of this process from its environment.
 *  @throws Error that names every setting that is wrong, in words */
export function readConfig(environment: NodeJS.ProcessEnv = process.env): Config {
  const parsed = environmentSchema.safeParse(environment)
  if (!parsed.success) {
    const faults = parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`)
    throw new Error(`The settings cannot be used.\n${faults.join('\n')}`)
  }
  const settings = parsed.data
  const url = settings.SHEETWRIGHT_URL ?? `http://${settings.SHEETWRIGHT_HOST}:${settings.PORT}`
  return {
    port: settings.PORT,
    host: settings.SHEETWRIGHT_HOST,
    url: url.replace(/\/$/, ''),
    databaseUrl: settings.DATABASE_URL,
    databaseOwnerUrl: settings.DATABASE_OWNER_URL,
    dataFolder: resolve(settings.SHEETWRIGHT_DATA),
    clientFolder: resolve(projectFolder, 'dist/client'),
    demo: settings.SHEETWRIGHT_DEMO === '1' && servesLoopbackOnly(settings.SHEETWRIGHT_HOST, url),
    sessionSecret: settings.SHEETWRIGHT_SESSION_SECRET,
    parts: { web: settings.SHEETWRIGHT_PART !== 'worker', worker: settings.SHEETWRIGHT_PART !== 'web' },
    logLevel: settings.SHEETWRIGHT_LOG,
    version: readVersion(),
  }
}

/** Demo passwords are published, so they work only where nobody else can reach the server. */
const servesLoopbackOnly = (host: string, url: string): boolean =>
  isLoopback(host) && isLoopback(new URL(url).hostname)

/** Whether a host name means this machine only. */
export const isLoopback = (host: string): boolean =>
  host === 'localhost' || host === '::1' || host === '[::1]' || /^127(\.\d{1,3}){3}$/.test(host)

function readVersion(): string {
  const { version }: { version: string } = JSON.parse(
    readFileSync(resolve(projectFolder, 'package.json'), 'utf8'),
  )
  return version
}
