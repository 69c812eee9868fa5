/** What went wrong, in words a person can act on: RFC 9457 problem details as an Error. */
import { problemSchema, type Problem } from '@shared/schemas/common.ts'

export class ProblemError extends Error {
  readonly problem: Problem
  constructor(problem: Problem) {
    super(problem.detail || problem.title)
    this.name = 'ProblemError'
    this.problem = problem
  }
  /** HTTP status; 0 when the server could not be reached. */
  get status(): number {
    return this.problem.status
  }
  get requestId(): string | undefined {
    return this.problem.requestId
  }
  /** The fields at fault, by dotted path. */
  get fields(): { field: string; message: string }[] {
    return this.problem.errors ?? []
  }
  /** On 409 or 412: the record as it now stands on the server. */
  get current(): unknown {
    return this.problem.current
  }
  get isConflict(): boolean {
    return this.status === 409 || this.status === 412
  }
}

const TITLES: Record<number, string> = { 401: 'Not signed in', 403: 'Not allowed', 404: 'Not found', 413: 'Too large', 429: 'Too many tries' }

/** Reads an error answer; an answer that is no problem document still gives a sentence. */
export function problemFrom(status: number, body: unknown): ProblemError {
  const parsed = problemSchema.safeParse(body)
  if (parsed.success) return new ProblemError(parsed.data)
  return new ProblemError({
    type: 'about:blank',
    title: TITLES[status] ?? (status >= 500 ? 'The server failed' : 'Refused'),
    status,
    detail: status >= 500 ? 'The server could not finish this. Nothing you typed is lost; try again in a moment.' : `The server refused this (${status}).`,
  })
}

/** The server could not be reached at all. */
export const unreachable = (): ProblemError =>
  new ProblemError({ type: 'about:blank', title: 'No connection', status: 0, detail: 'The server cannot be reached. Nothing you typed is lost; check the network and try again.' })

/** Any thrown thing as a problem, so that a page never has to guess. */
export function asProblem(error: unknown): ProblemError {
  if (error instanceof ProblemError) return error
  const detail = error instanceof Error && error.message ? error.message : 'Something in this page failed.'
  return new ProblemError({ type: 'about:blank', title: 'This page failed', status: -1, detail })
}
