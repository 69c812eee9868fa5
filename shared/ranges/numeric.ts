/**
 * Interval algebra over ranges of qualification. A range is a list of segments; a segment whose end is `unknown` may reach
 * anywhere in that direction, so no point of it is certain. Certain segments are kept disjoint and ascending;
 * segments with an unknown end follow them and may overlap, because what is not known can't be trimmed.
 */
import type { Bound, NumericRange, Segment, Verdict } from '../schemas/assessment.ts'

export const UNLIMITED: Bound = Object.freeze({ kind: 'unlimited' })
export const UNKNOWN: Bound = Object.freeze({ kind: 'unknown' })
export const closed = (value: number): Bound => ({ kind: 'closed', value })
export const open = (value: number): Bound => ({ kind: 'open', value })

/** What is asked: null means "no figure at that end", i.e. it runs on without limit. Both ends inclusive. */
export interface Asked { min: number | null; max: number | null }

/** -1, 0 or 1: which lower bound starts first. An open bound starts just after its value. */
function compareLower(a: Bound, b: Bound): number {
  const x = a.kind === 'closed' || a.kind === 'open' ? a.value : -Infinity
  const y = b.kind === 'closed' || b.kind === 'open' ? b.value : -Infinity
  if (x !== y) return x < y ? -1 : 1
  const p = a.kind === 'open' ? 1 : 0
  const q = b.kind === 'open' ? 1 : 0
  return p - q
}

/** -1, 0 or 1: which upper bound ends first. An open bound ends just before its value. */
function compareUpper(a: Bound, b: Bound): number {
  const x = a.kind === 'closed' || a.kind === 'open' ? a.value : Infinity
  const y = b.kind === 'closed' || b.kind === 'open' ? b.value : Infinity
  if (x !== y) return x < y ? -1 : 1
  const p = a.kind === 'open' ? -1 : 0
  const q = b.kind === 'open' ? -1 : 0
  return p - q
}

/** No point lies in it. */
function isEmpty({ lower, upper }: Segment): boolean {
  if (!('value' in lower) || !('value' in upper)) return false
  return lower.value > upper.value || (lower.value === upper.value && (lower.kind === 'open' || upper.kind === 'open'))
}

/** The next segment starts inside or right at the end of the one before, with no point between. */
function meets(upper: Bound, lower: Bound): boolean {
  if (!('value' in upper) || !('value' in lower)) return true
  return lower.value < upper.value || (lower.value === upper.value && (lower.kind === 'closed' || upper.kind === 'closed'))
}

export const isCertain = ({ lower, upper }: Segment): boolean => lower.kind !== 'unknown' && upper.kind !== 'unknown'

const bySegment = (a: Segment, b: Segment): number =>
  compareLower(a.lower, b.lower) || compareUpper(a.upper, b.upper) || a.lower.kind.localeCompare(b.lower.kind) || a.upper.kind.localeCompare(b.upper.kind)

/** What two coupons usually give, without sorting. */
function mergeTwo(a: Segment, b: Segment): Segment[] {
  const [first, second] = bySegment(a, b) <= 0 ? [a, b] : [b, a]
  if (!meets(first.upper, second.lower)) return [first, second]
  return [compareUpper(first.upper, second.upper) < 0 ? { lower: first.lower, upper: second.upper } : first]
}

/** Sorts, drops empty segments, merges certain ones that meet, and drops uncertain ones told twice. */
function normalise(segments: readonly Segment[]): Segment[] {
  const [one, two] = segments
  if (segments.length === 1 && one && !isEmpty(one)) return [one]
  if (segments.length === 2 && one && two && isCertain(one) && isCertain(two) && !isEmpty(one) && !isEmpty(two)) return mergeTwo(one, two)
  const certain: Segment[] = []
  const uncertain: Segment[] = []
  for (const segment of [...segments].sort(bySegment)) {
    if (isEmpty(segment)) continue
    if (!isCertain(segment)) {
      const last = uncertain.at(-1)
      if (!last || bySegment(last, segment) !== 0) uncertain.push(segment)
      continue
    }
    const last = certain.at(-1)
    if (last && meets(last.upper, segment.lower)) {
      if (compareUpper(last.upper, segment.upper) < 0) certain[certain.length - 1] = { lower: last.lower, upper: segment.upper }
    } else certain.push(segment)
  }
  return uncertain.length === 0 ? certain : [...certain, ...uncertain]
}

/** A range of `segments` in `unit`, in canonical order. */
export const numericRange = (dimension: string, unit: string, segments: readonly Segment[]): NumericRange => ({ type: 'numeric', dimension, unit, segments: normalise(segments) })

/** One segment from `lower` to `upper`. */
export const between = (dimension: string, unit: string, lower: Bound, upper: Bound): NumericRange => numericRange(dimension, unit, [{ lower, upper }])

/** Nothing is known of the range: every answer about it is "cannot tell". */
export const unknownNumeric = (dimension: string, unit: string): NumericRange => between(dimension, unit, UNKNOWN, UNKNOWN)

function sameMeasure(a: NumericRange, b: NumericRange): void {
  if (a.dimension !== b.dimension || a.unit !== b.unit) throw new RangeError(`A range in ${a.unit} can't be combined with one in ${b.unit}`)
}

/** Covered by either. @throws RangeError when the units differ */
export function unionNumeric(a: NumericRange, b: NumericRange): NumericRange {
  sameMeasure(a, b)
  return numericRange(a.dimension, a.unit, [...a.segments, ...b.segments])
}

const laterLower = (a: Bound, b: Bound): Bound => (a.kind === 'unknown' || b.kind === 'unknown' ? UNKNOWN : compareLower(a, b) >= 0 ? a : b)
const earlierUpper = (a: Bound, b: Bound): Bound => (a.kind === 'unknown' || b.kind === 'unknown' ? UNKNOWN : compareUpper(a, b) <= 0 ? a : b)

/** Covered by both. @throws RangeError when the units differ */
export function intersectNumeric(a: NumericRange, b: NumericRange): NumericRange {
  sameMeasure(a, b)
  const segments: Segment[] = []
  for (const p of a.segments) for (const q of b.segments) segments.push({ lower: laterLower(p.lower, q.lower), upper: earlierUpper(p.upper, q.upper) })
  return numericRange(a.dimension, a.unit, segments)
}

/** The union of the given segments, unknown ends taken as reaching without limit, covers the whole of `asked`. */
function covers(segments: readonly Segment[], asked: Asked): boolean {
  if (segments.length === 0) return false
  const lower = asked.min === null ? UNLIMITED : closed(asked.min)
  const upper = asked.max === null ? UNLIMITED : closed(asked.max)
  if (segments.length === 1 && segments[0]) return compareLower(segments[0].lower, lower) <= 0 && compareUpper(segments[0].upper, upper) >= 0
  let reached: Bound | null = null
  for (const segment of [...segments].sort((a, b) => compareLower(a.lower, b.lower))) {
    if (reached === null) {
      if (compareLower(segment.lower, lower) > 0) return false
      if (!startsBy(segment.upper, lower)) continue
      reached = segment.upper
    } else {
      if (compareUpper(reached, upper) >= 0) return true
      if (!meets(reached, segment.lower)) return false
      if (compareUpper(segment.upper, reached) > 0) reached = segment.upper
    }
  }
  return reached !== null && compareUpper(reached, upper) >= 0
}

/** The segment's end is not before the asked start. */
function startsBy(upper: Bound, lower: Bound): boolean {
  if (!('value' in upper) || !('value' in lower)) return true
  return upper.value > lower.value || (upper.value === lower.value && upper.kind === 'closed')
}

/**
 * Whether the whole of `asked` lies in the range: `within` only when every point is certainly covered,
 * `outside` only when some point certainly is not, else `cannot-tell`.
 */
export function containsInterval(range: NumericRange, asked: Asked): Verdict {
  if (asked.min !== null && asked.max !== null && asked.min > asked.max) return 'cannot-tell'
  const [only] = range.segments
  if (range.segments.length === 1 && only) return covers(range.segments, asked) ? (isCertain(only) ? 'within' : 'cannot-tell') : 'outside'
  const certain = range.segments.every(isCertain) ? range.segments : range.segments.filter(isCertain)
  if (covers(certain, asked)) return 'within'
  if (certain.length === range.segments.length) return 'outside'
  return covers(range.segments, asked) ? 'cannot-tell' : 'outside'
}

export const containsValue = (range: NumericRange, value: number): Verdict => containsInterval(range, { min: value, max: value })

/** The inclusive value of the range that lies nearest to `value`; null when no end of a certain segment can be had. */
export function nearest(range: NumericRange, value: number): number | null {
  if (containsValue(range, value) === 'within') return value
  let best: number | null = null
  for (const segment of range.segments) {
    if (!isCertain(segment)) continue
    for (const bound of [segment.lower, segment.upper]) {
      if (bound.kind === 'closed' && (best === null || Math.abs(bound.value - value) < Math.abs(best - value))) best = bound.value
    }
  }
  return best
}

/** The part of the ascending certain segments that encloses or lies nearest below/above: the outer ends, for sentences. */
export function outerEnds(range: NumericRange): { lower: Bound; upper: Bound } {
  let lower: Bound | null = null
  let upper: Bound | null = null
  for (const segment of range.segments) {
    if (segment.lower.kind === 'unknown') lower = UNKNOWN
    else if (lower === null || (lower.kind !== 'unknown' && compareLower(segment.lower, lower) < 0)) lower = segment.lower
    if (segment.upper.kind === 'unknown') upper = UNKNOWN
    else if (upper === null || (upper.kind !== 'unknown' && compareUpper(segment.upper, upper) > 0)) upper = segment.upper
  }
  return { lower: lower ?? UNKNOWN, upper: upper ?? UNKNOWN }
}
