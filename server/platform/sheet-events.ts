import type { Response } from 'express'
import { Client } from 'pg'
import type { Logger } from 'pino'
import { pushSchema, type Push } from '@shared/api/events'
import { ANNOUNCEMENT_CHANNEL } from './announce'

/** Silence after which proxies may cut a stream, less a margin. */
const HEARTBEAT_MS = 20_000
const RECONNECT_MS = 1000
/** How soon a client comes back after its stream has ended. */
const CLIENT_RETRY_MS = 2000
/** A client that reads so slowly that this much waits for it is cut off, and asks again for what it missed. */
const MAX_WAITING_BYTES = 1_000_000

/** What a stream is about and needs to know. */
export interface Listening {
  /** Number of the sheet. */
  sheet: string
  response: Response
  /** What holds now: written first, so that nothing announced before the stream was open is missed. */
  readOpening(): Promise<Push[]>
  /** Whether the person may still listen; asked at each heartbeat. */
  mayStay(): Promise<boolean>
}

/** Hears announcements on one database connection per process, and tells them to the open clients of each sheet as
 *  server-sent events. */
export class SheetEvents {
  private readonly streams = new Map<string, Set<Stream>>()
  private client: Client | undefined
  private reconnecting: NodeJS.Timeout | undefined
  private closed = false

  constructor(
    private readonly databaseUrl: string,
    private readonly log: Logger,
  ) {}

  /** Begins to hear; from then on it reconnects by itself. */
  async open(): Promise<void> {
    const client = new Client({ connectionString: this.databaseUrl, application_name: 'sheetwright-events' })
    client.on('notification', ({ payload }) => this.tell(payload ?? ''))
    client.on('error', (fault) => this.lose(client, fault))
    client.on('end', () => this.lose(client))
    await client.connect()
    await client.query(`LISTEN ${ANNOUNCEMENT_CHANNEL}`)
    this.client = client
  }

  /** Streams a sheet's announcements until the client goes away. */
  async listen({ sheet, response, readOpening, mayStay }: Listening): Promise<void> {
    const stream = new Stream(response)
    const streams = this.streams.get(sheet) ?? new Set()
    this.streams.set(sheet, streams.add(stream))
    const heartbeat = setInterval(() => {
      mayStay().then(
        (stays) => (stays ? stream.beat() : stream.end()),
        () => stream.end(),
      )
    }, HEARTBEAT_MS)
    response.on('close', () => {
      clearInterval(heartbeat)
      streams.delete(stream)
      if (streams.size === 0 && this.streams.get(sheet) === streams) this.streams.delete(sheet)
    })
    stream.begin()
    for (const push of await readOpening()) stream.write(push)
  }

  /** Ends every stream and stops hearing. */
  async close(): Promise<void> {
    this.closed = true
    clearTimeout(this.reconnecting)
    this.endStreams()
    const { client } = this
    this.client = undefined
    await client?.end()
  }

  private tell(payload: string): void {
    const { sheet, push }: { sheet: string; push: unknown } = JSON.parse(payload)
    const known = pushSchema.safeParse(push)
    // During an upgrade a newer process may announce what this one does not know.
    if (!known.success) return
    for (const stream of this.streams.get(sheet) ?? []) stream.write(known.data)
  }

  /** What was announced while nobody heard is lost: ending the streams makes every client ask for it. */
  private lose(client: Client, fault?: Error): void {
    if (this.closed || this.client !== client) return
    this.client = undefined
    this.log.warn({ err: fault }, 'The connection that hears announcements is lost; trying again')
    this.endStreams()
    this.retry()
  }

  private retry(): void {
    this.reconnecting = setTimeout(() => {
      this.open().catch(() => {
        if (!this.closed) this.retry()
      })
    }, RECONNECT_MS)
  }

  private endStreams(): void {
    for (const stream of [...this.streams.values()].flatMap((streams) => [...streams])) stream.end()
  }
}

/** One client's open stream. */
class Stream {
  private lastRevision = -1

  constructor(private readonly response: Response) {}

  begin(): void {
    this.response.set({
      'Content-Type': 'text/event-stream',
      'Cache-Control': 'no-store',
      // Asks a proxy in between not to collect the stream.
      'X-Accel-Buffering': 'no',
    })
    this.response.flushHeaders()
    this.response.write(`retry: ${CLIENT_RETRY_MS}\n\n`)
  }

  /** Revisions only go up: the opening may have been read before something already told. */
  write(push: Push): void {
    if (push.event === 'revision') {
      if (push.revision <= this.lastRevision) return
      this.lastRevision = push.revision
    }
    const id = push.event === 'revision' ? `id: ${push.revision}\n` : ''
    this.response.write(`${id}event: ${push.event}\ndata: ${JSON.stringify(push)}\n\n`)
    if (this.response.writableLength > MAX_WAITING_BYTES) this.response.destroy()
  }

  beat(): void {
    this.response.write(': still here\n\n')
  }

  end(): void {
    this.response.end()
  }
}
