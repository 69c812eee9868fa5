/** Dotted paths in a procedure's content. A finding names a field of the weld's variables; the form names it from the content's root. */
import { fieldAt } from '@shared/comparison/fields.ts'
import { emptyInterval } from '@shared/schemas/welding.ts'

type Tree = Record<string, unknown>
const isTree = (value: unknown): value is Tree => typeof value === 'object' && value !== null

const OF_CONTENT = ['title', 'scope', 'notes', 'supportingCoupons']

/** The path from the content's root of a field as a finding names it: `thickness` → `variables.thickness`. */
export function contentPath(field: string): string {
  const head = field.split('.')[0] ?? ''
  return head === 'variables' || head === 'content' || OF_CONTENT.includes(head) ? field.replace(/^content\./, '') : `variables.${field}`
}

/** The opposite of `contentPath`: the field as a finding would name it. */
export const findingField = (path: string): string => path.replace(/^variables\./, '')

/** The value at a path; undefined where the way ends early. */
export function readPath(root: unknown, path: string): unknown {
  let at: unknown = root
  for (const key of path.split('.')) {
    if (!isTree(at)) return undefined
    at = at[key]
  }
  return at
}

/**
 * A copy of `root` with `value` at the path; nothing given is changed. An end written into an interval that was not stated makes
 * the interval, and an end written into "all" ends it.
 * @returns null when the path does not exist in this record
 */
export function writePath<T>(root: T, path: string, value: unknown): T | null {
  const keys = path.split('.')
  // An optional field that was never given is absent, and may be written.
  const mayBeAbsent = fieldAt(path) !== null
  const write = (at: unknown, index: number): unknown => {
    const key = keys[index]
    if (key === undefined) return value
    const end = index === keys.length - 1 && (key === 'min' || key === 'max')
    if (end && (at === null || at === undefined)) return { ...emptyInterval, [key]: value }
    if (!isTree(at) || (!(key in at) && (Array.isArray(at) || !mayBeAbsent))) return MISSING
    const below = write(at[key], index + 1)
    if (below === MISSING) return MISSING
    if (Array.isArray(at)) return at.map((item: unknown, position) => (position === Number(key) ? below : item))
    return end && 'all' in at ? { ...at, [key]: below, all: false } : { ...at, [key]: below }
  }
  const written = write(root, 0)
  return written === MISSING ? null : (written as T)
}
const MISSING = Symbol('no such path')

const stated = (tree: Tree): string[] => Object.keys(tree).filter((key) => tree[key] !== undefined)

/** Whether two contents say the same, whatever the order of their keys; a key that is undefined is not there. */
export function same(one: unknown, other: unknown): boolean {
  if (Object.is(one, other)) return true
  if (!isTree(one) || !isTree(other) || Array.isArray(one) !== Array.isArray(other)) return false
  const keys = stated(one)
  return keys.length === stated(other).length && keys.every((key) => key in other && same(one[key], other[key]))
}
