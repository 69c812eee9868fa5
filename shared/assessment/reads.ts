/**
 * What a rule reads of a procedure. Every value has a path; a trace notes the paths that were read while a rule worked, so that
 * its answer can be told again for any procedure that holds the same values at them.
 */
import type { WeldingVariables } from '../schemas/welding.ts'
import type { RuleContext } from '../standards/rule.ts'

/** Numbers of paths: the procedure is 0; every other path is a key of its parent. */
export interface Paths { parents: number[]; keys: string[]; children: Map<string, number>[] }

export const newPaths = (): Paths => ({ parents: [0], keys: [''], children: [new Map<string, number>()] })

function childOf({ parents, keys, children }: Paths, parent: number, key: string): number {
  const own = children[parent]
  let path = own?.get(key)
  if (path === undefined) {
    path = keys.length
    parents.push(parent)
    keys.push(key)
    children.push(new Map<string, number>())
    own?.set(key, path)
  }
  return path
}

const RECORD = Symbol('a record or a list')
const NOTHING = Symbol('no such key')
const ABSENT = Symbol('nothing to read it of')
/** Stands for the names of all keys of a record. */
const KEYS = ' keys'

/**
 * The values of one procedure by path, each looked up once. A mark is what can be compared: the value itself, or that it is a
 * record, is not there, or has no record around it; undefined = not looked up yet.
 */
export interface Reads {
  paths: Paths
  values: unknown[]
  marks: unknown[]
  /** Traces that may still be taken. */
  traces: number
}

/** Noting what is read takes far longer than reading: a few rules a run, so that no single run is slow. */
const MOST_TRACES = 6

export const readsOf = (paths: Paths, procedure: WeldingVariables): Reads => ({ paths, values: [procedure], marks: [RECORD], traces: MOST_TRACES })

/** What the procedure holds at a path, as a mark. */
export function markAt(reads: Reads, path: number): unknown {
  const known = reads.marks[path]
  return known === undefined ? lookUp(reads, path) : known
}

function lookUp(reads: Reads, path: number): unknown {
  const { paths, values, marks } = reads
  const parent = paths.parents[path] ?? 0
  if (marks[parent] === undefined) lookUp(reads, parent)
  const holder = values[parent]
  const key = paths.keys[path] ?? ''
  let mark: unknown = ABSENT
  if (typeof holder === 'object' && holder !== null) {
    const value: unknown = key === KEYS ? Object.keys(holder).join() : (holder as Record<string, unknown>)[key]
    values[path] = value
    mark = value === undefined ? NOTHING : typeof value === 'object' && value !== null ? RECORD : value
  }
  marks[path] = mark
  return mark
}

/** What is noted while a rule works. */
export interface Trace {
  reads: Reads
  /** Paths in the order in which they were read, each once. */
  read: Set<number>
  watched: Map<number, object>
  /** Something was done of which no paths can be noted. */
  lost: boolean
}

/** The context with its procedure watched. It is another object, so that what is kept by context is worked out anew. */
export function traceOf(reads: Reads, context: RuleContext): { trace: Trace; context: RuleContext } {
  const trace: Trace = { reads, read: new Set(), watched: new Map(), lost: false }
  let block = 0
  reads.traces -= 1
  if (context.block !== null) for (const key of context.path.split('.')) block = childOf(reads.paths, block, key)
  if (block !== 0) markAt(reads, block)
  return { trace, context: { ...context, procedure: watch(trace, 0) as WeldingVariables, block: context.block === null ? null : (watch(trace, block) as RuleContext['block']) } }
}

/** A stand-in for the record at a path: reading of it is noted, and what it holds is watched in turn. */
function watch(trace: Trace, path: number): object {
  let watched = trace.watched.get(path)
  if (watched === undefined) {
    const record = trace.reads.values[path] as object
    // The target is a blank one, because a frozen record would not let another object stand for what it holds.
    watched = new Proxy(Array.isArray(record) ? [] : {}, watcher(trace, path, record))
    trace.watched.set(path, watched)
  }
  return watched
}

function watcher(trace: Trace, path: number, record: object): ProxyHandler<object> {
  const note = (key: string): number => {
    const child = childOf(trace.reads.paths, path, key)
    trace.read.add(child)
    markAt(trace.reads, child)
    return child
  }
  const get = (key: string): unknown => {
    const value: unknown = (record as Record<string, unknown>)[key]
    if (typeof value === 'function') return value
    const child = note(key)
    return typeof value === 'object' && value !== null ? watch(trace, child) : value
  }
  const change = (): boolean => {
    trace.lost = true
    return false
  }
  return {
    get: (_, key) => (typeof key === 'symbol' ? (Reflect.get(record, key) as unknown) : get(key)),
    has(_, key) {
      if (typeof key === 'string') note(key)
      // A key that is there without a value is told apart from none by its record's keys alone.
      if (typeof key === 'string' && Reflect.has(record, key) && Reflect.get(record, key) === undefined) note(KEYS)
      return Reflect.has(record, key)
    },
    ownKeys() {
      note(KEYS)
      return Reflect.ownKeys(record)
    },
    getOwnPropertyDescriptor(target, key) {
      if (typeof key === 'symbol' || Object.hasOwn(target, key)) return Reflect.getOwnPropertyDescriptor(target, key)
      note(KEYS)
      return Object.hasOwn(record, key) ? { value: get(key), writable: true, enumerable: true, configurable: true } : undefined
    },
    set: change,
    defineProperty: change,
    deleteProperty: change,
    setPrototypeOf: change,
    preventExtensions: change,
  }
}

/**
 * The paths on which an answer rests, in the order in which they were read.
 * @returns null where the answer can't be told again: it holds a part of the procedure itself, or not all reading was noted
 */
export function pathsRead({ reads, read, watched, lost }: Trace, answer: unknown): number[] | null {
  if (lost || holds(answer, new Set(watched.values()), 0)) return null
  // A record that was read into is there: its own mark says nothing more.
  const readInto = new Set<number>()
  for (const path of read) readInto.add(reads.paths.parents[path] ?? 0)
  return [...read].filter((path) => !readInto.has(path))
}

const DEEPEST = 12

function holds(value: unknown, watched: ReadonlySet<unknown>, depth: number): boolean {
  if (typeof value !== 'object' || value === null) return false
  if (watched.has(value) || depth > DEEPEST) return true
  for (const part of Object.values(value)) if (holds(part, watched, depth + 1)) return true
  return false
}
