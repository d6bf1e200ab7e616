import { pushSchema, type Push } from '@shared/api/events'

export interface EventStream {
  close(): void
}

export interface EventStreamHandlers {
  push(push: Push): void
  /** The stream is open. @param again whether it was before: announcements may have been missed in between */
  connected(again: boolean): void
  lost(): void
}

/** Pause before a stream that the server refused is opened again, milliseconds. A merely broken one reconnects itself. */
const REOPEN_MS = 5000

/** Listens to what the server tells open clients of a sheet (server-sent events). What does not parse is ignored: a newer
 *  server may announce things that this page does not know. */
export function openEventStream(sheet: string, handlers: EventStreamHandlers): EventStream {
  let source: EventSource
  let timer: ReturnType<typeof setTimeout> | undefined
  let before = false
  const hear = (message: MessageEvent<string>): void => {
    const push = parsePush(message.data)
    if (push) handlers.push(push)
  }
  const connect = (): void => {
    source = new EventSource(`/api/sheets/${encodeURIComponent(sheet)}/events`)
    source.onopen = () => {
      handlers.connected(before)
      before = true
    }
    source.onerror = () => {
      handlers.lost()
      if (source.readyState === EventSource.CLOSED) timer = setTimeout(connect, REOPEN_MS)
    }
    source.onmessage = hear
    for (const option of pushSchema.options) source.addEventListener(option.shape.event.value, hear)
  }
  connect()
  return {
    close() {
      clearTimeout(timer)
      source.close()
    },
  }
}

function parsePush(data: string): Push | undefined {
  try {
    return pushSchema.safeParse(JSON.parse(data)).data
  } catch {
    return undefined
  }
}
