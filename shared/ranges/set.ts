/** Algebra over ranges that are named values or combinations. `any` covers everything; `unknown` says that more may be covered. */
import type { SetRange, Verdict } from '../schemas/assessment.ts'

/** Already sorted and told once, as most lists of names are. */
function isOrdered(values: readonly string[]): boolean {
  for (let i = 1; i < values.length; i += 1) if ((values[i - 1] ?? '') >= (values[i] ?? '')) return false
  return true
}

/** The given names, sorted and told once. */
export const setRange = (values: readonly string[], flags: { any?: boolean; unknown?: boolean } = {}): SetRange => ({
  type: 'set',
  values: isOrdered(values) ? values.slice() : [...new Set(values)].sort(),
  any: flags.any ?? false,
  unknown: flags.unknown ?? false,
})

export const ANY_SET: SetRange = Object.freeze(setRange([], { any: true }))
export const UNKNOWN_SET: SetRange = Object.freeze(setRange([], { unknown: true }))

/** Covered by either. */
export const unionSet = (a: SetRange, b: SetRange): SetRange =>
  a.any || b.any ? setRange([], { any: true }) : setRange([...a.values, ...b.values], { unknown: a.unknown || b.unknown })

/** Covered by both. */
export function intersectSet(a: SetRange, b: SetRange): SetRange {
  if (a.any) return b
  if (b.any) return a
  return setRange(a.values.filter((value) => b.values.includes(value)), { unknown: a.unknown || b.unknown })
}

function includesAll(values: readonly string[], asked: readonly string[]): boolean {
  for (const name of asked) if (!values.includes(name)) return false
  return true
}

/** `within` only when every asked name is certainly covered. Nothing asked can't be judged. */
export function containsNames(range: SetRange, asked: readonly string[]): Verdict {
  if (asked.length === 0) return 'cannot-tell'
  if (range.any || includesAll(range.values, asked)) return 'within'
  return range.unknown ? 'cannot-tell' : 'outside'
}
