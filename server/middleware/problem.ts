import type { ErrorRequestHandler } from 'express'
import { BaseError, ConnectionError, ForeignKeyConstraintError, UniqueConstraintError } from 'sequelize'
import { ZodError } from 'zod'
import type { Problem } from '../../shared/schemas/common.ts'

/** An error that a person can act on; becomes RFC 9457 problem details. */
export class HttpProblem extends Error {
  readonly status: number
  readonly title: string
  readonly errors: Problem['errors']
  readonly current: unknown
  /** Seconds until it is worth trying again. */
  readonly retryAfter: number | undefined
  constructor(status: number, title: string, detail: string, extra: { errors?: Problem['errors']; current?: unknown; retryAfter?: number } = {}) {
    super(detail)
    this.status = status
    this.title = title
    this.errors = extra.errors
    this.current = extra.current
    this.retryAfter = extra.retryAfter
  }
}

export const badRequest = (detail: string, errors?: Problem['errors']) => new HttpProblem(400, 'That could not be read', detail, { errors })
export const notSignedIn = () => new HttpProblem(401, 'Not signed in', 'Sign in and try again; what you typed is kept on this page.')
export const forbidden = (detail = 'Your roles do not allow this. An administrator can change them.') => new HttpProblem(403, 'Not allowed', detail)
export const notFound = (what = 'record') => new HttpProblem(404, 'Not found', `There is no such ${what} here. It may have been removed, or the address is mistyped.`)
export const conflict = (detail: string, current?: unknown) => new HttpProblem(409, 'Somebody else saved first', detail, { current })
export const unprocessable = (title: string, detail: string, errors?: Problem['errors']) => new HttpProblem(422, title, detail, { errors })

const shown = (value: unknown): string => {
  const text = typeof value === 'string' ? `"${value}"` : JSON.stringify(value)
  return text === undefined ? 'nothing' : text.length > 80 ? `${text.slice(0, 77)}…` : text
}

const valueAt = (input: unknown, path: readonly PropertyKey[]): unknown =>
  path.reduce<unknown>((at, key) => (typeof at === 'object' && at !== null ? (at as Record<PropertyKey, unknown>)[key] : undefined), input)

/** Names each field, the value it held and what would be right. `where` is 'body', 'query' or 'path'. */
export function problemOfZod(error: ZodError, input: unknown, where: string): HttpProblem {
  const errors = error.issues.slice(0, 50).map((issue) => {
    const value = valueAt(input, issue.path)
    const field = issue.path.map(String).join('.') || where
    return { field, message: issue.message, value: value === undefined ? undefined : shown(value) }
  })
  const first = errors[0]
  const detail = first ? `${first.field}${first.value === undefined ? ' is missing or not given' : ` holds ${first.value}`}: ${first.message}` : 'The request does not have the expected shape.'
  return badRequest(errors.length > 1 ? `${detail} (and ${errors.length - 1} more)` : detail, errors)
}

const bodyParserTypes: Record<string, [number, string]> = {
  'entity.parse.failed': [400, 'The body is not valid JSON.'],
  'entity.too.large': [413, 'The request is larger than this address accepts.'],
  'encoding.unsupported': [415, 'The body has an encoding that is not accepted here.'],
  'charset.unsupported': [415, 'Send the body as UTF-8.'],
  'request.aborted': [400, 'The request ended before all of it arrived.'],
  'request.size.invalid': [400, 'The body is not as long as its Content-Length says.'],
}

const codeOf = (error: unknown): string => {
  const original = (error as { original?: { code?: unknown } }).original
  const code = original?.code ?? (error as { code?: unknown }).code
  return typeof code === 'string' ? code : ''
}

/** Malformed input that only the database notices (a NUL in a string, a figure out of range) is the caller's, not a fault of ours. */
const databaseProblems: Record<string, HttpProblem> = {
  '22P02': badRequest('A value does not have the form that its field wants.'),
  '22003': badRequest('A figure is larger than its field can hold.'),
  '22021': badRequest('The text holds a character that cannot be stored.'),
  '22P05': badRequest('The text holds a character that cannot be stored.'),
  '22007': badRequest('A date does not have the form YYYY-MM-DD.'),
  '22008': badRequest('A date is outside the calendar.'),
  '40001': conflict('Two changes met. Try once more.'),
  '40P01': conflict('Two changes met. Try once more.'),
}

/** The database is away or will not take another connection: nobody's request is wrong, and a moment later it may work. */
const databaseAway = new Set(['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT', '53300', '57P01', '57P02', '57P03', '08000', '08001', '08003', '08006'])
const isDatabaseAway = (error: unknown): boolean => error instanceof ConnectionError || databaseAway.has(codeOf(error)) || (error instanceof Error && /^Connection terminated|^Client has encountered a connection error/.test(error.message))
const unavailable = () => new HttpProblem(503, 'The database does not answer', 'Wait a moment and try again; what you typed is kept on this page.', { retryAfter: 5 })

/** Turns whatever was thrown into a problem; unknown errors become a 500 that says nothing of the inside. */
export function problemOf(error: unknown): HttpProblem {
  if (error instanceof HttpProblem) return error
  if (error instanceof ZodError) return problemOfZod(error, undefined, 'body')
  if (error instanceof UniqueConstraintError) return new HttpProblem(409, 'Already there', 'A record with that name, number or address is there already.')
  if (error instanceof ForeignKeyConstraintError) return unprocessable('A linked record is missing', 'A record that this one points to is not there.')
  const known = databaseProblems[codeOf(error)]
  if (known) return known
  if (codeOf(error) === 'SB001') return conflict((error as Error).message)
  if (isDatabaseAway(error)) return unavailable()
  if (error instanceof BaseError) return new HttpProblem(500, 'Something went wrong', 'The fault is ours and has been logged. Nothing was saved; try again.')
  const { type, status } = error as { type?: unknown; status?: unknown }
  const parsed = typeof type === 'string' ? bodyParserTypes[type] : undefined
  if (parsed) return new HttpProblem(parsed[0], 'That could not be read', parsed[1])
  if (error instanceof URIError) return badRequest('The address holds a broken % sequence.')
  if (typeof status === 'number' && status >= 400 && status < 500) return new HttpProblem(status, 'That could not be read', 'The request could not be read.')
  return new HttpProblem(500, 'Something went wrong', 'The fault is ours and has been logged. Nothing was saved; try again.')
}

/** Last in the chain: problem details as JSON, with the request id that the log has too. */
export const problemHandler: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) {
    next(error)
    return
  }
  const problem = problemOf(error)
  const requestId = typeof req.id === 'string' ? req.id : undefined
  if (problem.status >= 500) req.log.error({ err: error }, 'request failed')
  const body: Problem = { type: 'about:blank', title: problem.title, status: problem.status, detail: problem.message, instance: req.originalUrl.split('?')[0], requestId, errors: problem.errors, current: problem.current }
  if (problem.retryAfter !== undefined) res.set('Retry-After', String(problem.retryAfter))
  res.status(problem.status).type('application/problem+json').send(JSON.stringify(body))
}
