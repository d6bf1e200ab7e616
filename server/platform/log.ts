import { randomUUID } from 'node:crypto'
import type { IncomingMessage } from 'node:http'
import { pino, type Logger } from 'pino'
import { pinoHttp, type HttpLogger } from 'pino-http'

/** The log of this process: one JSON object a line, on standard output. */
export const createLog = (level: string): Logger => pino({ level, base: { pid: process.pid } })

/** Logs every request by method, path and status. Cookies, bodies and the tokens of links never reach the log. */
export const logRequests = (logger: Logger): HttpLogger =>
  pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    serializers: {
      req: (request: IncomingMessage) => ({
        id: request.id,
        method: request.method,
        url: withoutTokens(request.url),
      }),
      res: (response: { statusCode: number }) => ({ statusCode: response.statusCode }),
    },
    // A refused request is the caller's fault and an everyday thing; ours are logged by the problem handler.
    customLogLevel: (_request, response) => (response.statusCode >= 500 ? 'warn' : 'info'),
  })

const withoutTokens = (url = ''): string => url.replace(/(\/links?\/)[^/?]+/, '$1…')
