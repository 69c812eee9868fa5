import { randomUUID } from 'node:crypto'
import type { IncomingMessage, ServerResponse } from 'node:http'
import { pinoHttp, type HttpLogger } from 'pino-http'
import { withoutTokens, type Log } from '../config/log.ts'

const asGiven = /^[\w.-]{8,64}$/

/** Takes the caller's X-Request-Id when it is a plain one, so that a proxy's log and ours can be read together; sends it back. */
function requestId(req: IncomingMessage, res: ServerResponse): string {
  const given = req.headers['x-request-id']
  const id = typeof given === 'string' && asGiven.test(given) ? given : randomUUID()
  res.setHeader('X-Request-Id', id)
  return id
}

const quiet = new Set(['/healthz', '/readyz'])

/** One line a request: method, address without secrets, status, time. No bodies, no cookies. */
export const httpLog = (log: Log): HttpLogger =>
  pinoHttp({
    logger: log,
    genReqId: requestId,
    autoLogging: { ignore: (req) => quiet.has(req.url ?? '') },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'info'),
    serializers: {
      req: (req: { id: unknown; method: string; url: string; remoteAddress?: string }) => ({ id: req.id, method: req.method, url: withoutTokens(req.url), address: req.remoteAddress }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
    },
  })
