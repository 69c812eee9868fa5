/** Where a draft stands between the person's typing and the server, as a pure state machine. */
import type { Revision } from '@shared/schemas/records.ts'
import { procedureContentSchema, type ProcedureContent } from '@shared/schemas/welding.ts'
import type { ProblemError } from '@/lib/problem.ts'
import { same } from './paths.ts'

export type Phase =
  | 'saved'
  /** Typed since; waits for typing to rest. */
  | 'changed'
  | 'saving'
  /** No connection or the server failed: kept here, tried again. */
  | 'unreachable'
  /** The server will not take it as it stands: waits for a change. */
  | 'refused'
  /** Somebody else saved first. */
  | 'conflict'
  /** The revision can't be edited any more. */
  | 'closed'

export interface Saving {
  phase: Phase
  /** Version that the next save must match. */
  version: number
  /** What the server holds at that version, as far as known here: the common ground of a merge. */
  base: ProcedureContent
  inFlight: ProcedureContent | null
  /** Something here is not on the server and not on its way. */
  dirty: boolean
  failures: number
  problem: ProblemError | null
  theirs: Revision | null
  savedAt: string
}

export type SavingEvent =
  | { type: 'edited'; content: ProcedureContent }
  | { type: 'sent'; content: ProcedureContent }
  | { type: 'stored'; revision: Pick<Revision, 'version' | 'updatedAt'> }
  | { type: 'failed'; problem: ProblemError; theirs: Revision | null }
  | { type: 'conflicted'; theirs: Revision; base: ProcedureContent }
  | { type: 'merged'; content: ProcedureContent }
  | { type: 'overtaken'; revision: Revision }

/** Trimmed and complete, as the server will keep it; a content that does not parse yet is taken as it is. */
export function settled(content: ProcedureContent): ProcedureContent {
  const parsed = procedureContentSchema.safeParse(content)
  return parsed.success ? parsed.data : content
}

export const startSaving = (revision: Pick<Revision, 'version' | 'content' | 'updatedAt'>): Saving => ({ phase: 'saved', version: revision.version, base: settled(revision.content), inFlight: null, dirty: false, failures: 0, problem: null, theirs: null, savedAt: revision.updatedAt })

/** ms until the next try: 2 s, 4 s, 8 s … at most half a minute. */
export const retryDelay = (failures: number): number => Math.min(30_000, 1000 * 2 ** Math.max(1, failures))

export function saving(state: Saving, event: SavingEvent): Saving {
  switch (event.type) {
    case 'edited': {
      const dirty = !same(settled(event.content), state.inFlight ?? state.base)
      if (state.phase === 'saving' || state.phase === 'conflict' || state.phase === 'closed') return dirty === state.dirty ? state : { ...state, dirty }
      if (!dirty) return state.phase === 'saved' ? state : { ...state, phase: 'saved', dirty, problem: null, failures: 0 }
      // While out of reach the retry goes on by its own clock; typing must not hasten it.
      if (state.phase === 'unreachable' || state.phase === 'changed') return state
      return { ...state, phase: 'changed', dirty, problem: null }
    }
    case 'sent':
      return { ...state, phase: 'saving', inFlight: settled(event.content), dirty: false }
    case 'stored': {
      const base = state.inFlight ?? state.base
      return { ...state, phase: state.dirty ? 'changed' : 'saved', version: event.revision.version, savedAt: event.revision.updatedAt, base, inFlight: null, failures: 0, problem: null, theirs: null }
    }
    case 'failed': {
      const { problem, theirs } = event
      const next = { ...state, inFlight: null, dirty: true, problem }
      if (theirs && theirs.state !== 'draft') return { ...next, phase: 'closed', theirs }
      if (theirs) return { ...next, phase: 'conflict', theirs }
      if (problem.status === 404) return { ...next, phase: 'closed' }
      const again = problem.status === 0 || problem.status >= 500 || problem.status === 401 || problem.status === 429
      return again ? { ...next, phase: 'unreachable', failures: state.failures + 1 } : { ...next, phase: 'refused' }
    }
    case 'conflicted':
      return { ...state, phase: 'conflict', theirs: event.theirs, base: event.base, dirty: true }
    case 'merged': {
      if (!state.theirs) return state
      const base = settled(state.theirs.content)
      const dirty = !same(settled(event.content), base)
      return { ...state, phase: dirty ? 'changed' : 'saved', version: state.theirs.version, savedAt: state.theirs.updatedAt, base, inFlight: null, dirty, failures: 0, problem: null, theirs: null }
    }
    case 'overtaken':
      // Only a page with nothing of its own may follow what somebody else saved.
      return state.phase === 'saved' && event.revision.version > state.version ? startSaving(event.revision) : state
  }
}
