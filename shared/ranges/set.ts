/** Algebra over ranges that are named values or combinations. `any` covers everything; `unknown` says that more may be covered. */
import type { SetRange, Verdict } from '../schemas/assessment.ts'

/** The given names, sorted and told once. */
export const setRange = (values: readonly string[], flags: { any?: boolean; unknown?: boolean } = {}): SetRange => ({
  type: 'set',
  values: values.length < 2 ? [...values] : [...new Set(values)].sort(),
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

/** `within` only when every asked name is certainly covered. Nothing asked can't be judged. */
export function containsNames(range: SetRange, asked: readonly string[]): Verdict {
  if (asked.length === 0) return 'cannot-tell'
  if (range.any || asked.every((name) => range.values.includes(name))) return 'within'
  return range.unknown ? 'cannot-tell' : 'outside'
}
