/** A range of either type. */
import type { QualifiedSpan } from '../schemas/assessment.ts'
import { intersectNumeric, unionNumeric } from './numeric.ts'
import { intersectSet, unionSet } from './set.ts'

/** Covered by either. @throws RangeError when one is numeric and the other is not, or the units differ */
export function union(a: QualifiedSpan, b: QualifiedSpan): QualifiedSpan {
  if (a.type === 'numeric' && b.type === 'numeric') return unionNumeric(a, b)
  if (a.type === 'set' && b.type === 'set') return unionSet(a, b)
  throw new RangeError('A range of figures and a range of names have no union')
}

/** Covered by both. @throws RangeError when one is numeric and the other is not, or the units differ */
export function intersect(a: QualifiedSpan, b: QualifiedSpan): QualifiedSpan {
  if (a.type === 'numeric' && b.type === 'numeric') return intersectNumeric(a, b)
  if (a.type === 'set' && b.type === 'set') return intersectSet(a, b)
  throw new RangeError('A range of figures and a range of names have no intersection')
}

/** Joins the ranges of several coupons; null when there is none. */
export function unionAll(spans: readonly QualifiedSpan[]): QualifiedSpan | null {
  let joined: QualifiedSpan | null = null
  for (const span of spans) joined = joined === null ? span : union(joined, span)
  return joined
}
