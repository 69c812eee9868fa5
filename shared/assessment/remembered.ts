/**
 * Answers of one rule by the values that it read. A rule is a pure function: what it reads first is always the same, and each
 * value decides what it reads next. So its answers form a tree of values, and a known answer is found by reading that much and no more.
 */
import { markAt, type Reads } from './reads.ts'

interface Step<T> {
  /** The path read here; `ANSWER` at the end of a branch. */
  path: number
  mark: unknown
  /** Where that mark leads. */
  next: Step<T> | null
  /** Where other marks lead. */
  more: Map<unknown, Step<T>> | null
  answer: T | null
}

export interface Remembered<T> {
  root: Step<T> | null
  /** Answers in the tree. */
  size: number
  /** Since it was last emptied or left alone. */
  hits: number
  misses: number
  /** Questions still to be answered without noting what is read, and how many it will be next time. */
  rest: number
  nextRest: number
}

const ANSWER = -1
/** Most answers kept for one rule and one choice of coupons. */
const MOST = 64
/** After so many answers it is seen whether any of them came again. */
const TRIAL = 32
/** A rule that is asked for something else nearly each time is left alone for so many questions, each time longer. */
const FIRST_REST = 500
const LONGEST_REST = 64_000

export const newRemembered = <T>(): Remembered<T> => ({ root: null, size: 0, hits: 0, misses: 0, rest: 0, nextRest: FIRST_REST })

/** The answer given before for the values that the procedure holds; null when there is none. */
export function recall<T>(remembered: Remembered<T>, reads: Reads): T | null {
  let step = remembered.root
  while (step !== null) {
    if (step.path === ANSWER) {
      remembered.hits += 1
      return step.answer
    }
    const mark = markAt(reads, step.path)
    step = step.mark === mark ? step.next : step.more === null ? null : (step.more.get(mark) ?? null)
  }
  return null
}

/** Whether the next answer is worth noting: not for a rule whose values hardly ever come again. */
export function isWorthNoting<T>(remembered: Remembered<T>): boolean {
  if (remembered.rest > 0) {
    remembered.rest -= 1
    return false
  }
  const { hits, misses, size, nextRest } = remembered
  remembered.misses += 1
  if (misses === 0 || (misses % TRIAL !== 0 && size < MOST)) return true
  if (hits >= misses) {
    if (size >= MOST) Object.assign(remembered, { root: null, size: 0, hits: 0, misses: 0 })
    remembered.nextRest = FIRST_REST
    return true
  }
  Object.assign(remembered, { root: null, size: 0, hits: 0, misses: 0, rest: nextRest, nextRest: Math.min(2 * nextRest, LONGEST_REST) })
  return false
}

/** Never asks this rule's reading again. */
export function giveUp<T>(remembered: Remembered<T>): void {
  Object.assign(remembered, { root: null, size: 0, rest: Infinity })
}

/** Keeps an answer. @param paths on which it rests, as they were read */
export function keep<T>(remembered: Remembered<T>, reads: Reads, paths: readonly number[], answer: T): void {
  const left = new Set(paths)
  let step = remembered.root
  remembered.size += 1
  if (step === null) {
    remembered.root = branch(reads, left, answer)
    return
  }
  while (step.path !== ANSWER) {
    left.delete(step.path)
    const mark = markAt(reads, step.path)
    const next: Step<T> | null | undefined = step.mark === mark ? step.next : step.more?.get(mark)
    if (!next) {
      step.more ??= new Map<unknown, Step<T>>()
      step.more.set(mark, branch(reads, left, answer))
      return
    }
    step = next
  }
  step.answer = answer
}

function branch<T>(reads: Reads, paths: ReadonlySet<number>, answer: T): Step<T> {
  let step: Step<T> = { path: ANSWER, mark: null, next: null, more: null, answer }
  for (const path of [...paths].reverse()) step = { path, mark: markAt(reads, path), next: step, more: null, answer: null }
  return step
}

/**
 * A copy to be kept. What rules make is nearly always let go at once, and memory is handled accordingly; if the very objects
 * were kept, all that the same lines make later would be handled as lasting too, at twice the cost of an assessment.
 */
export function lasting<T>(value: T): T {
  if (typeof value !== 'object' || value === null) return value
  if (Array.isArray(value)) return value.map(lasting) as T
  const copy: Record<string, unknown> = {}
  for (const [key, part] of Object.entries(value)) copy[key] = lasting(part as unknown)
  return copy as T
}
