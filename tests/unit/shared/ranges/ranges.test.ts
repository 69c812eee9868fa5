import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { between, closed, containsInterval, containsValue, intersectNumeric, isCertain, nearest, numericRange, open, outerEnds, unionNumeric, UNKNOWN, unknownNumeric, UNLIMITED } from '@shared/ranges/numeric.ts'
import { containsNames, intersectSet, setRange, unionSet } from '@shared/ranges/set.ts'
import { intersect, union, unionAll } from '@shared/ranges/span.ts'
import type { Bound, NumericRange, SetRange } from '@shared/schemas/assessment.ts'

const mm = (...segments: { lower: Bound; upper: Bound }[]): NumericRange => numericRange('length', 'mm', segments)
const from = (lower: number, upper: number): NumericRange => between('length', 'mm', closed(lower), closed(upper))

const value = fc.integer({ min: -20, max: 60 })
const certain: fc.Arbitrary<Bound> = fc.oneof(value.map(closed), value.map(open), fc.constant(UNLIMITED))
const any: fc.Arbitrary<Bound> = fc.oneof({ weight: 4, arbitrary: certain }, { weight: 1, arbitrary: fc.constant(UNKNOWN) })
const rangeOf = (bound: fc.Arbitrary<Bound>): fc.Arbitrary<NumericRange> => fc.array(fc.record({ lower: bound, upper: bound }), { maxLength: 4 }).map((segments) => mm(...segments))
const known = rangeOf(certain)
const unsure = rangeOf(any)
const asked = fc.tuple(value, value).map(([a, b]) => ({ min: Math.min(a, b), max: Math.max(a, b) }))
const better = { within: 2, 'cannot-tell': 1, outside: 0 }

describe('numeric ranges', { timeout: 60_000 }, () => {
  test('union and intersection do not depend on order', () =>
    fc.assert(fc.property(unsure, unsure, (a, b) => {
      expect(unionNumeric(a, b)).toEqual(unionNumeric(b, a))
      expect(intersectNumeric(a, b)).toEqual(intersectNumeric(b, a))
    })))
  test('a range joined or met with itself stays', () =>
    fc.assert(fc.property(known, (a) => {
      expect(unionNumeric(a, a)).toEqual(a)
      expect(intersectNumeric(a, a)).toEqual(a)
    })))
  test('certain segments are disjoint and ascending', () =>
    fc.assert(fc.property(unsure, unsure, (a, b) => {
      const segments = unionNumeric(a, b).segments.filter(isCertain)
      segments.slice(1).forEach((segment, i) => {
        const before = segments[i]?.upper
        expect(before?.kind === 'unlimited' || segment.lower.kind === 'unlimited').toBe(false)
        if (before && 'value' in before && 'value' in segment.lower) expect(before.value < segment.lower.value || (before.value === segment.lower.value && before.kind === 'open' && segment.lower.kind === 'open')).toBe(true)
      })
    })))
  test('point by point: union is "or", intersection is "and"', () =>
    fc.assert(fc.property(known, known, value, (a, b, x) => {
      const inA = containsValue(a, x) === 'within'
      const inB = containsValue(b, x) === 'within'
      expect(containsValue(unionNumeric(a, b), x)).toBe(inA || inB ? 'within' : 'outside')
      expect(containsValue(intersectNumeric(a, b), x)).toBe(inA && inB ? 'within' : 'outside')
    })))
  test('what a range contains, its union with any other contains', () =>
    fc.assert(fc.property(unsure, unsure, asked, (a, b, x) => {
      expect(better[containsInterval(unionNumeric(a, b), x)]).toBeGreaterThanOrEqual(better[containsInterval(a, x)])
    })))
  test('an intersection never contains more than either', () =>
    fc.assert(fc.property(known, unsure, asked, (a, b, x) => {
      expect(better[containsInterval(intersectNumeric(a, b), x)]).toBeLessThanOrEqual(better[containsInterval(b, x)] === 0 ? 1 : better[containsInterval(b, x)])
      if (containsInterval(intersectNumeric(a, b), x) === 'within') expect([containsInterval(a, x), containsInterval(b, x)]).toEqual(['within', 'within'])
    })))
  test('nothing unknown ever gives "within"', () =>
    fc.assert(fc.property(fc.array(fc.tuple(any, any).filter(([l, u]) => l.kind === 'unknown' || u.kind === 'unknown'), { minLength: 1 }), asked, (bounds, x) => {
      expect(containsInterval(mm(...bounds.map(([lower, upper]) => ({ lower, upper }))), x)).not.toBe('within')
    })))
  test('an interval inside a certain one is inside too', () =>
    fc.assert(fc.property(known, asked, (a, x) => {
      if (containsInterval(a, x) === 'within') expect(containsValue(a, x.min)).toBe('within')
      if (containsInterval(a, x) === 'within') expect(containsValue(a, x.max)).toBe('within')
    })))
  test('the nearest value lies inside, and no closed end is nearer', () =>
    fc.assert(fc.property(known, value, (a, x) => {
      const found = nearest(a, x)
      if (found === null) return
      expect(containsValue(a, found)).toBe('within')
      for (const { lower, upper } of a.segments) for (const bound of [lower, upper]) if (bound.kind === 'closed') expect(Math.abs(found - x)).toBeLessThanOrEqual(Math.abs(bound.value - x))
    })))
  test('ranges that touch join, a gap stays', () => {
    expect(unionNumeric(from(1.5, 5), from(5, 40))).toEqual(from(1.5, 40))
    const gap = unionNumeric(from(1.5, 6), from(16, 50))
    expect(gap.segments).toHaveLength(2)
    expect(containsInterval(gap, { min: 5, max: 20 })).toBe('outside')
    expect(containsInterval(gap, { min: 16, max: 50 })).toBe('within')
    expect(unionNumeric(mm({ lower: closed(1), upper: open(5) }), mm({ lower: open(5), upper: closed(9) })).segments).toHaveLength(2)
  })
  test('three answers', () => {
    const upToUnknown = mm({ lower: closed(5), upper: UNKNOWN })
    expect(containsValue(upToUnknown, 4)).toBe('outside')
    expect(containsValue(upToUnknown, 6)).toBe('cannot-tell')
    expect(containsValue(unknownNumeric('length', 'mm'), 4)).toBe('cannot-tell')
    expect(containsInterval(from(1, 9), { min: 7, max: 3 })).toBe('cannot-tell')
    expect(containsInterval(from(1, 9), { min: 2, max: null })).toBe('outside')
    expect(containsInterval(between('length', 'mm', UNLIMITED, UNLIMITED), { min: null, max: null })).toBe('within')
    expect(containsValue(mm(), 1)).toBe('outside')
    expect(containsValue(between('length', 'mm', open(1), closed(2)), 1)).toBe('outside')
  })
  test('an unknown end keeps the certain part beside it', () => {
    const range = mm({ lower: closed(5), upper: closed(22) }, { lower: closed(5), upper: UNKNOWN })
    expect(containsInterval(range, { min: 6, max: 22 })).toBe('within')
    expect(containsInterval(range, { min: 6, max: 30 })).toBe('cannot-tell')
    expect(outerEnds(range)).toEqual({ lower: closed(5), upper: UNKNOWN })
    expect(outerEnds(mm())).toEqual({ lower: UNKNOWN, upper: UNKNOWN })
  })
  test('different measures do not combine', () => {
    expect(() => unionNumeric(from(1, 2), between('length', 'in', closed(1), closed(2)))).toThrow(RangeError)
    expect(() => intersectNumeric(from(1, 2), between('temperature', 'mm', closed(1), closed(2)))).toThrow(RangeError)
  })
})

const names = fc.subarray(['A', 'B', 'C', 'D'])
const sets: fc.Arbitrary<SetRange> = fc.record({ values: names, any: fc.boolean(), unknown: fc.boolean() }).map(({ values, any: all, unknown }) => setRange(all ? [] : values, { any: all, unknown: !all && unknown }))

describe('ranges of names', { timeout: 60_000 }, () => {
  test('commutative, idempotent, monotone', () =>
    fc.assert(fc.property(sets, sets, names, (a, b, x) => {
      expect(unionSet(a, b)).toEqual(unionSet(b, a))
      expect(intersectSet(a, b)).toEqual(intersectSet(b, a))
      expect(unionSet(a, a)).toEqual(a)
      expect(intersectSet(a, a)).toEqual(a)
      expect(better[containsNames(unionSet(a, b), x)]).toBeGreaterThanOrEqual(better[containsNames(a, x)])
    })))
  test('unknown never yields within beyond its names', () => {
    expect(containsNames(setRange(['A'], { unknown: true }), ['A'])).toBe('within')
    expect(containsNames(setRange(['A'], { unknown: true }), ['B'])).toBe('cannot-tell')
    expect(containsNames(setRange(['A']), ['A', 'B'])).toBe('outside')
    expect(containsNames(setRange([], { any: true }), ['Z'])).toBe('within')
    expect(containsNames(setRange(['A']), [])).toBe('cannot-tell')
  })
  test('either type, never both', () => {
    expect(unionAll([])).toBeNull()
    expect(unionAll([setRange(['A']), setRange(['B'])])).toEqual(setRange(['A', 'B']))
    expect(intersect(setRange(['A', 'B']), setRange(['B']))).toEqual(setRange(['B']))
    expect(intersect(from(1, 5), from(3, 9))).toEqual(from(3, 5))
    expect(() => union(setRange(['A']), from(1, 2))).toThrow(RangeError)
    expect(() => intersect(setRange(['A']), from(1, 2))).toThrow(RangeError)
  })
})
