import type { Readable } from 'node:stream'
import type { Request, Response, Router } from 'express'
import { z } from 'zod'
import type { Endpoint } from '../../shared/schemas/endpoint.ts'
import { endpoints, type EndpointName } from '../../shared/schemas/endpoints.ts'
import type { Database, Tenant } from '../config/database.ts'
import type { Env } from '../config/env.ts'
import type { Log } from '../config/log.ts'
import type { Queue } from '../jobs/queue.ts'
import type { Mailer } from '../mail/mailer.ts'
import { isEmpty } from '../middleware/guards.ts'
import { badRequest, forbidden, HttpProblem, notSignedIn, problemOfZod } from '../middleware/problem.ts'
import { allows, type Actor } from '../policies/index.ts'
import { FileAnswer } from './file-answer.ts'

/** Where files are kept: originals, thumbnails, released PDFs. Keys are made by the program, never a name that somebody typed. */
export interface Storage {
  /** Keeps the bytes under the key for good before it resolves; a second put of a key replaces the first. */
  put: (key: string, bytes: Uint8Array) => Promise<void>
  /** @throws StoredFileMissing when there is no such file */
  get: (key: string) => Promise<Buffer>
  /** Keeps what the source yields, as `put` does, without holding it in memory; when the source throws, nothing is kept. */
  putStream: (key: string, source: AsyncIterable<Uint8Array>) => Promise<void>
  /** The file as a stream. @throws StoredFileMissing when there is no such file */
  open: (key: string) => Promise<Readable>
  /** Removing what is not there is no error. */
  remove: (key: string) => Promise<void>
}

/** What every route and job may use; made once at start-up (config/services.ts), replaced by tests. */
export interface Services {
  env: Env
  log: Log
  database: Database
  queue: Queue
  mailer: Mailer
  storage: Storage
}

type Parsed<N extends EndpointName, K extends 'params' | 'query' | 'body'> = z.output<(typeof endpoints)[N][K]>
export interface RouteContext<N extends EndpointName, A = Actor, T = Tenant, S extends Services = Services> {
  params: Parsed<N, 'params'>
  query: Parsed<N, 'query'>
  body: Parsed<N, 'body'>
  /** The version that the caller last read; required where the endpoint says `ifMatch`. */
  ifMatch: number
  actor: A
  tenant: T
  services: S
  req: Request
  res: Response
}
/** A query as the handler gets it, for services that list. */
export type QueryRead<N extends EndpointName> = Parsed<N, 'query'>
/** What the handler gives back is checked against the endpoint's response schema before it is sent. */
type Presented<N extends EndpointName> = z.input<(typeof endpoints)[N]['response']> | FileAnswer

function parseWith(schema: z.ZodType, input: unknown, where: string): unknown {
  const result = schema.safeParse(input)
  if (result.success) return result.data
  throw problemOfZod(result.error, input, where)
}

function readIfMatch(req: Request): number {
  const header = req.get('if-match')
  if (!header) throw new HttpProblem(428, 'Which version?', 'Send If-Match with the ETag you last read, so that nobody’s work is overwritten.')
  const version = /^(?:W\/)?"(\d{1,9})"$/.exec(header.trim())?.[1]
  if (version === undefined) throw badRequest('If-Match must be an ETag as sent by this address, like "3".')
  return Number(version)
}

/** What the caller sent, checked against the endpoint: media type first, then shape. */
function parseRequest<N extends EndpointName>(name: N, req: Request): Pick<RouteContext<N>, 'params' | 'query' | 'body' | 'ifMatch'> {
  const endpoint: Endpoint = endpoints[name]
  const wantsJson = !(endpoint.body instanceof z.ZodVoid)
  if (wantsJson && !isEmpty(req) && req.is('application/json') === false) throw new HttpProblem(415, 'That could not be read', 'Send the body as JSON, with Content-Type: application/json.')
  const body: unknown = req.body
  const parsed = {
    params: parseWith(endpoint.params, req.params, 'path'),
    query: parseWith(endpoint.query, req.query, 'query'),
    body: wantsJson ? parseWith(endpoint.body, body, 'body') : undefined,
    ifMatch: endpoint.ifMatch ? readIfMatch(req) : 0,
  }
  return parsed as Pick<RouteContext<N>, 'params' | 'query' | 'body' | 'ifMatch'>
}

async function present(name: EndpointName, res: Response, value: unknown): Promise<void> {
  const endpoint = endpoints[name]
  if (res.headersSent || res.writableEnded) return
  if (value instanceof FileAnswer) {
    value.send(res)
    return
  }
  if (endpoint.binary) throw new Error(`${name} did not send its file`)
  if (value === undefined) {
    res.status(endpoint.status).end()
    return
  }
  const body: unknown = await endpoint.response.parseAsync(value)
  const version = (body as { version?: unknown }).version
  if (typeof version === 'number') res.set('ETag', `"${version}"`)
  res.status(endpoint.status).json(body)
}

/** Mounts a route that runs before anybody is signed in. */
export function publicRoute<N extends EndpointName, S extends Services>(router: Router, services: S, name: N, act: (context: RouteContext<N, Actor | null, null, S>) => Promise<Presented<N>>): void {
  const endpoint = endpoints[name]
  router[endpoint.method](endpoint.path, async (req, res) => {
    const context: RouteContext<N, Actor | null, null, S> = { ...parseRequest(name, req), actor: actorOf(req), tenant: null, services, req, res }
    await present(name, res, await act(context))
  })
}

/** The signed-in person, or null. */
export const actorOf = (req: Request): Actor | null => (req.user as Actor | undefined) ?? null

/**
 * Mounts a route for signed-in people: gate by role, parse, act inside the organization's transaction, present.
 * The transaction rolls back when `act` throws.
 */
export function route<N extends EndpointName, S extends Services>(router: Router, services: S, name: N, act: (context: RouteContext<N, Actor, Tenant, S>) => Promise<Presented<N>>): void {
  const endpoint = endpoints[name]
  router[endpoint.method](endpoint.path, async (req, res) => {
    const actor = actorOf(req)
    if (!actor) throw notSignedIn()
    if (!allows(actor, endpoint.action)) throw forbidden()
    const parsed = parseRequest(name, req)
    const result = await services.database.withTenant(actor.organizationId, (tenant) => act({ ...parsed, actor, tenant, services, req, res }))
    await present(name, res, result)
  })
}
