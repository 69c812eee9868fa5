/** Where a record under somebody's hands stands between the typing and the server, as a pure state machine. */
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
  /** The record can't be edited any more. */
  | 'closed'

/** What is saved: a procedure revision, a coupon. */
export interface SavedRecord<C> {
  version: number
  content: C
  updatedAt: string
}

/** What the machine must know of a kind of record. */
export interface RecordRules<C, R extends SavedRecord<C>> {
  /** Trimmed and complete, as the server will keep it; a content that does not parse yet is taken as it is. */
  settle: (content: C) => C
  /** Whether it can still be written. */
  isOpen: (record: R) => boolean
}

export interface Saving<C, R extends SavedRecord<C>> {
  phase: Phase
  /** Version that the next save must match. */
  version: number
  /** What the server holds at that version, as far as known here: the common ground of a merge. */
  base: C
  inFlight: C | null
  /** Something here is not on the server and not on its way. */
  dirty: boolean
  failures: number
  problem: ProblemError | null
  theirs: R | null
  savedAt: string
}

export type SavingEvent<C, R extends SavedRecord<C>> =
  | { type: 'edited'; content: C }
  | { type: 'sent'; content: C }
  | { type: 'stored'; record: Pick<R, 'version' | 'updatedAt'> }
  | { type: 'failed'; problem: ProblemError; theirs: R | null }
  | { type: 'conflicted'; theirs: R; base: C }
  | { type: 'merged'; content: C }
  | { type: 'overtaken'; record: R }

export const startSaving = <C, R extends SavedRecord<C>>(record: SavedRecord<C>, { settle }: Pick<RecordRules<C, R>, 'settle'>): Saving<C, R> => ({ phase: 'saved', version: record.version, base: settle(record.content), inFlight: null, dirty: false, failures: 0, problem: null, theirs: null, savedAt: record.updatedAt })

/** ms until the next try: 2 s, 4 s, 8 s … at most half a minute. */
export const retryDelay = (failures: number): number => Math.min(30_000, 1000 * 2 ** Math.max(1, failures))

/** The state after an event. */
export function saving<C, R extends SavedRecord<C>>(state: Saving<C, R>, event: SavingEvent<C, R>, rules: RecordRules<C, R>): Saving<C, R> {
  const { settle } = rules
  switch (event.type) {
    case 'edited': {
      const dirty = !same(settle(event.content), state.inFlight ?? state.base)
      if (state.phase === 'saving' || state.phase === 'conflict' || state.phase === 'closed') return dirty === state.dirty ? state : { ...state, dirty }
      if (!dirty) return state.phase === 'saved' ? state : { ...state, phase: 'saved', dirty, problem: null, failures: 0 }
      // While out of reach the retry goes on by its own clock; typing must not hasten it.
      if (state.phase === 'unreachable' || state.phase === 'changed') return state
      return { ...state, phase: 'changed', dirty, problem: null }
    }
    case 'sent':
      return { ...state, phase: 'saving', inFlight: settle(event.content), dirty: false }
    case 'stored': {
      const base = state.inFlight ?? state.base
      return { ...state, phase: state.dirty ? 'changed' : 'saved', version: event.record.version, savedAt: event.record.updatedAt, base, inFlight: null, failures: 0, problem: null, theirs: null }
    }
    case 'failed': {
      const { problem, theirs } = event
      const next = { ...state, inFlight: null, dirty: true, problem }
      if (theirs && !rules.isOpen(theirs)) return { ...next, phase: 'closed', theirs }
      if (theirs) return { ...next, phase: 'conflict', theirs }
      if (problem.status === 404) return { ...next, phase: 'closed' }
      const again = problem.status === 0 || problem.status >= 500 || problem.status === 401 || problem.status === 429
      return again ? { ...next, phase: 'unreachable', failures: state.failures + 1 } : { ...next, phase: 'refused' }
    }
    case 'conflicted':
      return { ...state, phase: 'conflict', theirs: event.theirs, base: event.base, dirty: true }
    case 'merged': {
      if (!state.theirs) return state
      const base = settle(state.theirs.content)
      const dirty = !same(settle(event.content), base)
      return { ...state, phase: dirty ? 'changed' : 'saved', version: state.theirs.version, savedAt: state.theirs.updatedAt, base, inFlight: null, dirty, failures: 0, problem: null, theirs: null }
    }
    case 'overtaken':
      // Only a page with nothing of its own may follow what somebody else saved.
      return state.phase === 'saved' && event.record.version > state.version ? startSaving(event.record, rules) : state
  }
}
