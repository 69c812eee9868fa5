/** A range of qualification in words. */
import type { NumericRange, QualifiedSpan, Segment, Verdict } from '@shared/schemas/assessment.ts'
import { figure } from '@/lib/figures.ts'

const withUnit = (value: number, unit: string) => `${figure(value)}${unit === '°' ? '' : ' '}${unit}`.trim()

function segmentInWords({ lower, upper }: Segment, unit: string): string {
  const low = 'value' in lower ? figure(lower.value) : null
  const high = 'value' in upper ? withUnit(upper.value, unit) : null
  if (lower.kind === 'unknown' || upper.kind === 'unknown') {
    if ('value' in lower) return `from ${withUnit(lower.value, unit)} to an end that is not known`
    if (high) return `from a start that is not known to ${high}`
    return 'not known'
  }
  if (low === null && high === null) return 'every value'
  if (low === null) return `${upper.kind === 'open' ? 'under' : 'up to'} ${high}`
  if (high === null) return `${lower.kind === 'open' ? 'over' : 'from'} ${'value' in lower ? withUnit(lower.value, unit) : ''} without limit`
  if ('value' in lower && 'value' in upper && lower.value === upper.value) return `${high} only`
  return `${lower.kind === 'open' ? 'over ' : ''}${low} ${upper.kind === 'open' ? 'to under' : 'to'} ${high}`
}

/** "5 to 20 mm, or from 50 mm without limit"; names for a set of names. */
export function boundsInWords(range: QualifiedSpan): string {
  if (range.type === 'set') {
    if (range.any) return 'every value'
    if (range.unknown && range.values.length === 0) return 'not known'
    return `${range.values.join(', ')}${range.unknown ? ', and possibly others' : ''}` || 'nothing'
  }
  if (range.segments.length === 0) return 'nothing'
  return range.segments.map((segment) => segmentInWords(segment, range.unit)).join(', or ')
}

/** A null end runs on without limit. */
export interface AskedInterval {
  min: number | null
  max: number | null
}

/** "5 to 25 mm", "at least 10 °C", "10 mm", "every value". */
export function askedInWords({ min, max }: AskedInterval, unit: string): string {
  if (min === null && max === null) return 'every value'
  if (min === null) return `at most ${withUnit(max ?? 0, unit)}`
  if (max === null) return `at least ${withUnit(min, unit)}`
  return min === max ? withUnit(min, unit) : `${figure(min)} to ${withUnit(max, unit)}`
}

/** The whole gauge as one text, for readers who don't see it. */
export function gaugeInWords(label: string, range: NumericRange | null, asked: AskedInterval | null, tested: readonly number[], unit: string, pieces: readonly { from: number | null; to: number | null; verdict: Verdict }[]): string {
  const parts = [range ? `Covered: ${boundsInWords({ ...range, unit })}.` : 'No range to compare with.']
  if (asked) parts.push(`Asked: ${askedInWords(asked, unit)}.`)
  for (const { from, to, verdict } of pieces)
    if (verdict !== 'within') parts.push(`${verdict === 'outside' ? 'Outside' : 'Cannot tell'}: ${askedInWords({ min: from, max: to }, unit)}.`)
  if (tested.length > 0) parts.push(`Welded at ${tested.map((value) => withUnit(value, unit)).join(', ')}.`)
  return `${label}. ${parts.join(' ')}`
}
