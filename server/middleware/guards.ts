import express, { type Request, type RequestHandler } from 'express'
import helmet from 'helmet'
import type { Env } from '../config/env.ts'
import { badRequest, forbidden, HttpProblem } from './problem.ts'

/** Largest JSON body; files come as multipart with limits of their own. */
export const JSON_LIMIT = '1mb'

/** Strict headers. Styles may stand in elements because drawings and gauges set their measures there; scripts never. */
export function securityHeaders(env: Env): RequestHandler {
  const overTls = env.BASE_URL?.startsWith('https:') ?? false
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        scriptSrcAttr: ["'none'"],
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:', 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        workerSrc: ["'self'"],
        manifestSrc: ["'self'"],
        frameSrc: ["'self'", 'blob:'],
        objectSrc: ["'none'"],
        baseUri: ["'self'"],
        formAction: ["'self'"],
        frameAncestors: ["'self'"],
        ...(overTls && { upgradeInsecureRequests: [] }),
      },
    },
    strictTransportSecurity: overTls && env.NODE_ENV === 'production' ? { maxAge: 31_536_000 } : false,
    crossOriginOpenerPolicy: overTls ? { policy: 'same-origin' } : false,
    originAgentCluster: false,
    referrerPolicy: { policy: 'no-referrer' },
  })
}

const reads = ['GET', 'HEAD', 'OPTIONS']

/**
 * Refuses a change that another site's page asks this person's browser to make. Browsers say where a request comes from in
 * Sec-Fetch-Site or Origin; programs that are not browsers send neither and carry no cookie that they were not given.
 * Behind a proxy the Host may be the inner one, hence BASE_URL.
 */
export function sameOrigin(env: Pick<Env, 'BASE_URL'>): RequestHandler {
  const outer = env.BASE_URL ? new URL(env.BASE_URL).host : undefined
  return (req, _res, next) => {
    if (reads.includes(req.method)) {
      next()
      return
    }
    const site = req.get('sec-fetch-site')
    const origin = req.get('origin')
    const host = origin && URL.canParse(origin) ? new URL(origin).host : undefined
    const fromHere = host !== undefined && (host === req.get('host') || host === outer)
    const ok = site ? site === 'same-origin' : origin === undefined || fromHere
    next(ok ? undefined : forbidden('This change was asked for by a page of another site, so it was not made. Open Sidebend itself and try there.'))
  }
}

/** The JSON text may hold a NUL; PostgreSQL cannot store one. A literal backslash before `u0000` is let through to the closer look. */
const nulInJson = /\\u0000/

const holdsNul = (value: unknown): boolean =>
  typeof value === 'string' ? value.includes('\0') : typeof value === 'object' && value !== null && Object.entries(value).some(([key, inner]) => key.includes('\0') || holdsNul(inner))

const suspects = new WeakSet<object>()

const nulProblem = () => badRequest('The text holds a NUL character (code 0), which cannot be stored. Remove it; it often comes with text copied from another program.')

/** Browsers send `Content-Length: 0` with a change that carries no body. */
export const isEmpty = (req: Request): boolean => req.get('transfer-encoding') === undefined && Number(req.get('content-length') ?? 0) === 0

/** Reads JSON bodies and refuses what no address here can use: another media type, and NUL characters in body or address. */
export const requestBodies: RequestHandler[] = [
  (req, _res, next) => next(/%00/.test(req.url) ? nulProblem() : undefined),
  (req, _res, next) => {
    next(!isEmpty(req) && req.is(['application/json', 'multipart/form-data']) === false ? new HttpProblem(415, 'That could not be read', 'Send JSON (Content-Type: application/json), or files as multipart/form-data where files are asked for.') : undefined)
  },
  express.json({
    limit: JSON_LIMIT,
    type: 'application/json',
    verify: (req, _res, bytes) => {
      if (nulInJson.test(bytes.toString('latin1'))) suspects.add(req)
    },
  }),
  (req: Request, _res, next) => next(suspects.has(req) && holdsNul(req.body) ? nulProblem() : undefined),
]
