import { createServer, type Server } from 'node:http'
import type { DemoAccount } from '@shared/api/accounts'
import { createApp } from './app'
import { readConfig } from './config'
import { loadDemoAccounts } from './features/accounts/demo-accounts'
import { loadDemo } from './demo/load-demo'
import { createServices, type Services } from './services'

/** How long open requests may take once the process is asked to stop. */
const GRACE_MS = 15_000

/** What the start script hears once people can come. */
export interface ReadyMessage {
  ready: { url: string; demoAccounts: DemoAccount[]; firstAdministratorLink: string | undefined }
}

async function main(): Promise<void> {
  const config = readConfig()
  const services = await createServices(config)
  if (config.demo) {
    await loadDemoAccounts(services.dataSource)
    await loadDemo(services)
  }
  await services.jobs.start({ work: config.parts.worker })
  const server = config.parts.web ? await listen(services) : undefined
  stopOnSignal(services, server)
  const firstAdministratorLink =
    config.parts.web && !config.demo ? await services.links.makeFirstAdministratorLink() : undefined
  tellReady({
    ready: { url: config.url, demoAccounts: services.accounts.listDemoAccounts(), firstAdministratorLink },
  })
}

async function listen(services: Services): Promise<Server> {
  const { host, port } = services.config
  await services.events.open()
  const server = createServer(createApp(services))
  await new Promise<void>((resolve, reject) => {
    server.once('error', (fault) => reject(toListenFault(fault, port)))
    server.listen(port, host, resolve)
  })
  return server
}

const toListenFault = (fault: Error, port: number): Error =>
  'code' in fault && fault.code === 'EADDRINUSE'
    ? new Error(`Port ${port} is taken by another program: stop it, or choose another port with PORT=….`)
    : fault

/** The start script prints it as sentences; without one it goes into the log. The link is a secret, so it is printed
 *  for whoever started the server, and never logged. */
function tellReady(message: ReadyMessage): void {
  if (process.send) {
    process.send(message)
    return
  }
  const { url, firstAdministratorLink } = message.ready
  process.stderr.write(`The server answers at ${url}\n`)
  if (firstAdministratorLink) {
    process.stderr.write(
      `Make the first administrator here (once, within a day): ${firstAdministratorLink}\n`,
    )
  }
}

/** Finishes what is open, then ends; a second signal ends at once. */
function stopOnSignal(services: Services, server: Server | undefined): void {
  let stopping = false
  const stop = async (): Promise<void> => {
    if (stopping) process.exit(1)
    stopping = true
    setTimeout(() => process.exit(1), GRACE_MS).unref()
    services.health.stop()
    const closed = server && closeServer(server)
    // Streams of events never end by themselves.
    await services.events.close()
    await closed
    await services.close()
    process.exit(0)
  }
  const onSignal = (): void => {
    stop().catch((fault: unknown) => {
      services.log.error({ err: fault }, 'Stopping failed')
      process.exit(1)
    })
  }
  process.on('SIGINT', onSignal)
  process.on('SIGTERM', onSignal)
  // The start script is gone: nobody could stop this process any more.
  process.on('disconnect', onSignal)
}

const closeServer = (server: Server): Promise<void> =>
  new Promise((resolve) => {
    server.close(() => resolve())
    server.closeIdleConnections()
  })

main().catch((fault: unknown) => {
  process.stderr.write(`${fault instanceof Error ? fault.message : String(fault)}\n`)
  process.exit(1)
})
