import { ApiProblem, noAnswer, parseProblem } from './problem'

/** A request as it goes over the wire. */
export interface Outgoing {
  method: string
  url: string
  headers: Record<string, string>
  body?: string | FormData
  signal?: AbortSignal
  /** Told how much of an upload has left, 0–1. */
  progress?: (part: number) => void
}

/** Sends a request; answers with what the JSON of a success holds, null where it is empty.
 *  @throws ApiProblem for every other answer and for none; AbortError where `signal` ended it */
export async function send(outgoing: Outgoing): Promise<unknown> {
  const { status, text } = outgoing.progress ? await sendWithProgress(outgoing) : await sendPlainly(outgoing)
  const body = parseJson(text)
  if (status >= 200 && status < 300) {
    if (body !== undefined) return body
    if (text === '') return null
  }
  throw new ApiProblem(parseProblem(status, body))
}

interface Arrived {
  status: number
  text: string
}

async function sendPlainly({ method, url, headers, body, signal }: Outgoing): Promise<Arrived> {
  try {
    const response = await fetch(url, { method, headers, body, signal, credentials: 'same-origin' })
    return { status: response.status, text: await response.text() }
  } catch (cause) {
    if (signal?.aborted) throw cause
    throw new ApiProblem(noAnswer(), { cause })
  }
}

/** fetch cannot tell how far an upload is; the older request can. */
function sendWithProgress({ method, url, headers, body, signal, progress }: Outgoing): Promise<Arrived> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest()
    request.open(method, url)
    for (const [name, value] of Object.entries(headers)) request.setRequestHeader(name, value)
    request.upload.onprogress = (event) => {
      if (event.lengthComputable) progress?.(event.loaded / event.total)
    }
    request.onload = () => resolve({ status: request.status, text: request.responseText })
    request.onerror = () => reject(new ApiProblem(noAnswer()))
    request.onabort = () => reject(new DOMException('The upload was cancelled.', 'AbortError'))
    signal?.addEventListener('abort', () => request.abort(), { once: true })
    request.send(body ?? null)
  })
}

/** undefined for what is not JSON. */
function parseJson(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}
