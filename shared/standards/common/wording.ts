/** Sentences of findings: plain words with the figures, in the units of the record. */
import type { Fix, NumericRange, QualifiedSpan, RuleVerdictAsked, Segment } from './types.ts'
import type { CouponSide, RuleVerdict } from '../rule.ts'

/** Rounded for reading: four decimals, without trailing zeros. */
export const round = (value: number): number => Math.round(value * 10000) / 10000

export const show = (value: number, unit: string): string => `${round(value)} ${unit}`

/** A text of each item, told once, in order. Quicker than a set for the few coupons that a procedure has. */
export function distinct<T>(items: readonly T[], text: (item: T) => string): string[] {
  const out: string[] = []
  for (const item of items) {
    const one = text(item)
    if (!out.includes(one)) out.push(one)
  }
  return out
}

const numberOf = (side: CouponSide): string => side.coupon.number

/** "PQR-1", "PQR-1 and PQR-2", "PQR-1, PQR-2 and PQR-3"; a coupon is named once. */
export function names(sides: readonly CouponSide[]): string {
  return sides.length === 1 && sides[0] ? sides[0].coupon.number : list(distinct(sides, numberOf))
}

/** The verb that agrees with the named coupons. */
export const verb = (sides: readonly CouponSide[], one: string, several: string): string => (sides.length > 1 && distinct(sides, numberOf).length > 1 ? several : one)

/** Words joined as in a sentence. */
export function list(words: readonly string[], last = 'and'): string {
  if (words.length < 2) return words[0] ?? ''
  if (words.length === 2) return `${words[0] ?? ''} ${last} ${words[1] ?? ''}`
  return `${words.slice(0, -1).join(', ')} ${last} ${words.at(-1) ?? ''}`
}

/** "5 mm to 20 mm", "from 5 mm, no upper limit", several parts joined by "and". */
export function showRange(range: NumericRange): string {
  const { segments, unit } = range
  if (segments.length === 0) return 'nothing'
  return segments.length === 1 && segments[0] ? showSegment(segments[0], unit) : list(segments.map((segment) => showSegment(segment, unit)))
}

/** A range after "lies inside": "the 5 mm to 20 mm", "the range from 5 mm up", "the range up to 20 mm", "the range without limits". */
export function showInside(whole: NumericRange): string {
  // What lies inside lies in a part that is known; a part that can't be told is not spoken of.
  const known = whole.segments.filter(({ lower, upper }) => lower.kind !== 'unknown' && upper.kind !== 'unknown')
  const range = known.length > 0 && known.length < whole.segments.length ? { ...whole, segments: known } : whole
  const [only] = range.segments
  const shown = showRange(range)
  if (range.segments.length !== 1 || !only) return `the ${shown}`
  if (shown === 'any figure') return 'the range without limits'
  if (only.upper.kind === 'unlimited' && only.lower.kind === 'closed') return `the range from ${show(only.lower.value, range.unit)} up`
  return /^(?:up to|above|below|from) /.test(shown) ? `the range ${shown}` : `the ${shown}`
}

/** A bound that is itself not covered is said as "above" or "below", never as if it were. */
function showSegment({ lower, upper }: Segment, unit: string): string {
  if (lower.kind === 'unknown' || upper.kind === 'unknown') return 'a range that is not known'
  const top = upper.kind === 'unlimited' ? null : `${upper.kind === 'open' ? 'below' : 'up to'} ${show(upper.value, unit)}`
  // Nought is no limit of a size; of a temperature it is one.
  const fromNought = 'value' in lower && lower.kind === 'closed' && lower.value === 0 && unit !== '°C' && unit !== '°F'
  if (lower.kind === 'unlimited' || (fromNought && (upper.kind === 'unlimited' || upper.value !== 0))) return top ?? 'any figure'
  if (lower.kind === 'open') return `above ${show(lower.value, unit)}${top === null ? '' : upper.kind === 'open' ? ` and ${top}` : `, ${top}`}`
  if (upper.kind === 'unlimited') return `${show(lower.value, unit)} and up`
  if (upper.kind === 'open') return `from ${show(lower.value, unit)} to below ${show(upper.value, unit)}`
  return lower.value === upper.value ? show(lower.value, unit) : `${show(lower.value, unit)} to ${show(upper.value, unit)}`
}

export const showSpan = (span: QualifiedSpan | null): string =>
  span === null ? 'nothing' : span.type === 'numeric' ? showRange(span) : span.any ? 'any' : span.values.length === 0 ? (span.unknown ? 'a range that is not known' : 'nothing') : list(span.values, 'or')

/** The interval asked, in words. */
export function showAsked(asked: { min: number | null; max: number | null }, unit: string): string {
  if (asked.min !== null && asked.max !== null) return asked.min === asked.max ? show(asked.min, unit) : asked.min === 0 ? `up to ${show(asked.max, unit)}` : `${show(asked.min, unit)} to ${show(asked.max, unit)}`
  if (asked.max !== null) return `up to ${show(asked.max, unit)}`
  if (asked.min !== null) return `${show(asked.min, unit)} and up`
  return 'every size'
}

/** With a capital first letter; a text that starts with a figure or a capital stays as it is. */
export function capital(text: string): string {
  const first = text.charCodeAt(0)
  return first < 97 ? text : text.charAt(0).toUpperCase() + text.slice(1)
}

/** "Cannot tell", with exactly what is missing. */
export const cannotTell = (sentence: string, missing: readonly string[], more: Partial<RuleVerdict> = {}): RuleVerdict => ({ verdict: 'cannot-tell', sentence, asked: null, range: null, missing, ...more })

/** Labels that name several things. */
const SEVERAL = /^(?:positions|passes|sides)\b/

/** The procedure does not say it. */
export const notStated = (label: string, field: string, more: Partial<RuleVerdict> = {}): RuleVerdict =>
  cannotTell(`${capital(label)} ${SEVERAL.test(label) ? "aren't" : "isn't"} stated in the procedure.`, [`procedure: ${field}`], { field, fixes: [stateFix(label, field)], ...more })

export const stateFix = (label: string, field: string): Fix => ({ kind: 'state', label: `State the ${label}`, field })

/** The coupons lack what would give the range. */
export function couponLacks(label: string, field: string, sides: readonly CouponSide[], asked: RuleVerdictAsked, range: QualifiedSpan | null): RuleVerdict {
  return cannotTell(`${names(sides)} ${verb(sides, 'does', 'do')} not record the ${label}, so what is qualified can't be told.`, sides.map((side) => `${side.coupon.number}: ${field}`), { asked, range, fixes: [] })
}
