/** Ranges of 8.3 as recalled, beside those of EN 288-4, in mm: `sure` is what both allow, `maybe` what either does. */
import { closed, intersectNumeric, numericRange, unionNumeric, UNLIMITED } from '../../ranges/numeric.ts'
import type { NumericRange } from '../../schemas/assessment.ts'
import { tidy } from '../common/reading.ts'

export interface Reading { sure: NumericRange; maybe: NumericRange; how: string; why?: string }

/** A range in mm; null = no limit at that end. */
export const mm = (lower: number | null, upper: number | null): NumericRange =>
  numericRange('length', 'mm', [{ lower: lower === null ? UNLIMITED : closed(tidy(lower)), upper: upper === null ? UNLIMITED : closed(tidy(upper)) }])
export const nothing: NumericRange = numericRange('length', 'mm', [])

const WHY = 'The figures recalled and those of the standard before it differ there.'
const two = (recalled: NumericRange, before: NumericRange, how: string): Reading => ({ sure: intersectNumeric(recalled, before), maybe: unionNumeric(recalled, before), how, why: WHY })

/** Butt welds. @param runs null = not recorded: what both give is sure, what either gives may be */
export function buttThickness(t: number, runs: 'single' | 'multiple' | null): Reading {
  const recalled = t <= 3 ? mm(0.5 * t, 2 * t) : t <= 20 ? mm(3, 2 * t) : mm(0.8 * t, null)
  const how = t <= 3 ? '0.5t to 2t' : t <= 20 ? '3 mm to 2t' : '0.8t and up'
  const single = mm(0.8 * t, 1.1 * t)
  const multiple = t <= 3 ? mm(t, 2 * t) : t <= 12 ? mm(3, 2 * t) : t <= 100 ? mm(0.5 * t, Math.min(2 * t, 150)) : mm(0.5 * t, 1.5 * t)
  if (runs === null) return { sure: intersectNumeric(recalled, intersectNumeric(single, multiple)), maybe: unionNumeric(recalled, unionNumeric(single, multiple)), how, why: WHY }
  return two(recalled, runs === 'multiple' ? multiple : single, how)
}

export const throat = (a: number): Reading => (a < 10 ? { sure: mm(0.75 * a, 1.5 * a), maybe: mm(0.75 * a, 1.5 * a), how: '0.75a to 1.5a' } : two(mm(7.5, null), mm(10, null), '7.5 mm and up'))

export const diameter = (D: number): Reading => two(D <= 25 ? mm(0.5 * D, 2 * D) : mm(Math.max(0.5 * D, 25), null), D < 168.3 ? mm(0.5 * D, 2 * D) : mm(0.5 * D, null), D <= 25 ? '0.5D to 2D' : '0.5D, at least 25 mm, and up')
