/** Values inside the range that are nearest to what a procedure asks, as fixes that turn the finding within. */
import { containsInterval, isCertain, outerEnds } from '../../ranges/numeric.ts'
import type { Bound, Fix, NumericRange } from '../../schemas/assessment.ts'
import type { Interval, Quantity } from '../../schemas/common.ts'
import { quantity } from '../../units/convert.ts'
import type { Dimension } from '../../units/types.ts'
import { show, showAsked } from './wording.ts'

interface Asked { min: number | null; max: number | null }

export interface CureOf {
  label: string
  dimension: Dimension
  /** Full dotted path, and what stands there now. */
  field: string
  current: unknown
  range: NumericRange
  asked: Asked
  /** Ends of `asked` that are outside. */
  wrong: readonly ('min' | 'max')[]
}

/** Figures that a person would write down: four digits and common fractions of an inch stay, a longer one is no setting. */
const isPlain = (value: number, unit: string): boolean => Math.abs(value - Number(value.toPrecision(4))) < 1e-9 || (unit === 'in' && Number.isInteger(value * 64))

/** The figure at a bound that may be written: the bound itself, or, where that is not covered or too long, the next one of three digits inside. */
function settable(bound: Bound, inward: 1 | -1, unit: string): number[] {
  if (!('value' in bound)) return []
  const { value } = bound
  if (bound.kind === 'closed' && isPlain(value, unit)) return [value]
  const step = value === 0 ? 0.1 : 10 ** (Math.floor(Math.log10(Math.abs(value))) - 2)
  const whole = inward === 1 ? Math.ceil(value / step - 1e-9) : Math.floor(value / step + 1e-9)
  const short = Number(((bound.kind === 'open' && Math.abs(whole * step - value) < 1e-9 ? whole + inward : whole) * step).toPrecision(6))
  return bound.kind === 'closed' ? [short, value] : [short]
}

/** The nearest figure inside for one end; of those, one that brings all of `asked` inside where there is one. */
export function betterEnd(range: NumericRange, asked: Asked, end: 'min' | 'max'): number | null {
  const value = asked[end]
  if (value === null) {
    const outer = outerEnds(range)[end === 'max' ? 'upper' : 'lower']
    return settable(outer, end === 'max' ? -1 : 1, range.unit)[0] ?? null
  }
  const inside = (candidate: number): boolean => containsInterval(range, { min: candidate, max: candidate }) === 'within'
  const ends = range.segments.filter(isCertain).flatMap(({ lower, upper }) => [settable(lower, 1, range.unit), settable(upper, -1, range.unit)].flatMap((figures) => figures.find(inside) ?? []))
  ends.sort((a, b) => Math.abs(a - value) - Math.abs(b - value))
  if (inside(value)) ends.unshift(value)
  return ends.find((candidate) => containsInterval(range, { ...asked, [end]: candidate }) === 'within') ?? ends[0] ?? null
}

const isInterval = (value: unknown): value is Interval => typeof value === 'object' && value !== null && 'all' in value

/**
 * Set fixes of an interval: one for each end that is outside, or one for the whole interval where a change of one end alone
 * would leave the record contradicting itself. None where no such change would bring all of it inside.
 */
export function intervalCures({ label, dimension, field, current, range, asked, wrong }: CureOf): Fix[] {
  const { unit } = range
  const better: Asked = { ...asked }
  for (const end of wrong) better[end] = betterEnd(range, asked, end)
  if (wrong.length === 0 || wrong.some((end) => better[end] === null)) return []
  const one = asked.min !== null && asked.min === asked.max
  if (one) better.min = better.max = better[wrong[0] ?? 'max']
  // A rule of the upper end alone asks from nought: the record's own lower end is left, if it may be.
  const upperOnly = asked.min === 0 && !wrong.includes('min')
  if (better.min !== null && better.max !== null && better.min > better.max) return []
  if (containsInterval(range, better) !== 'within') return []
  const to = (value: number): Quantity => quantity(value, dimension, unit)
  const record = isInterval(current) ? current : null
  const fits = (end: 'min' | 'max'): boolean => {
    // Nothing is typed there: the whole interval is written, since an end has nowhere to go.
    if (record === null) return !upperOnly
    const [value, stays] = [better[end], end === 'max' ? record.min : record.max]
    return !record.all && stays !== null && value !== null && (end === 'max' ? stays.si <= to(value).si : stays.si >= to(value).si)
  }
  if (!one && (wrong.length === 2 ? record === null || !record.all : wrong.every(fits))) {
    return wrong.flatMap((end) => {
      const value = better[end]
      return value === null ? [] : [{ kind: 'set' as const, label: `Set ${label}${wrong.length === 2 ? ` ${end === 'min' ? 'minimum' : 'maximum'}` : ''} to ${show(value, unit)}`, field: `${field}.${end}`, value: to(value) }]
    })
  }
  const single = record !== null && record.min !== null && record.min.si === record.max?.si
  const max = better.max === null ? null : to(better.max)
  const min = upperOnly ? (single ? max : null) : better.min === null ? null : to(better.min)
  return [{ kind: 'set', label: `Set ${label} to ${upperOnly || better.min === better.max ? show(better.max ?? 0, unit) : showAsked(better, unit)}`, field, value: { min, max, all: false } satisfies Interval }]
}

/** What stands at a dotted path of a record; undefined where the path leads nowhere. */
export const valueAt = (record: unknown, path: string): unknown => path.split('.').reduce<unknown>((value, key) => (typeof value === 'object' && value !== null ? (value as Record<string, unknown>)[key] : undefined), record)
