/** What every standard's rules share: reading records, wording findings, the two kinds of rule. */
import { describe, expect, test } from 'vitest'
import { between, closed, numericRange, open, UNKNOWN, UNLIMITED } from '@shared/ranges/numeric.ts'
import { setRange } from '@shared/ranges/set.ts'
import { figure, figures, gasName, isInert, isStated, single } from '@shared/standards/common/reading.ts'
import { betterEnd } from '@shared/standards/common/cures.ts'
import { figureRule, namedRule, weakest } from '@shared/standards/common/rule-kinds.ts'
import { list, names, notStated, showAsked, showInside, showRange, showSpan } from '@shared/standards/common/wording.ts'
import type { CouponSide, RuleContext, RuleMeta } from '@shared/standards/rule.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, procedure } from './builders.ts'

const length = (lower: Parameters<typeof between>[2], upper: Parameters<typeof between>[3]): ReturnType<typeof between> => between('length', 'mm', lower, upper)

describe('wording', () => {
  test('ranges', () => {
    expect(showRange(length(closed(5), closed(20)))).toBe('5 mm to 20 mm')
    expect(showRange(length(closed(5), closed(5)))).toBe('5 mm')
    expect(showRange(length(UNLIMITED, closed(20)))).toBe('up to 20 mm')
    expect(showRange(length(closed(5), UNLIMITED))).toBe('5 mm and up')
    expect(showRange(length(UNLIMITED, UNLIMITED))).toBe('any figure')
    expect(showRange(length(closed(5), UNKNOWN))).toBe('a range that is not known')
    expect(showRange(numericRange('length', 'mm', []))).toBe('nothing')
    expect(showRange(numericRange('length', 'mm', [{ lower: closed(1), upper: closed(2) }, { lower: closed(5), upper: closed(9) }]))).toBe('1 mm to 2 mm and 5 mm to 9 mm')
  })
  test('a bound that is itself not covered is never told as covered', () => {
    const parts = [length(open(16), open(30)), length(open(500), UNLIMITED), length(UNLIMITED, open(30)), length(closed(5), open(9)), length(open(5), closed(9))]
    expect(parts.map(showRange)).toEqual(['above 16 mm and below 30 mm', 'above 500 mm', 'below 30 mm', 'from 5 mm to below 9 mm', 'above 5 mm, up to 9 mm'])
    expect(showInside(numericRange('length', 'mm', [{ lower: closed(10), upper: closed(10) }, { lower: UNKNOWN, upper: UNKNOWN }]))).toBe('the 10 mm')
    expect(parts.slice(0, 2).map(showInside)).toEqual(['the range above 16 mm and below 30 mm', 'the range above 500 mm'])
  })
  test('nought is no limit of a size, but it is one of a temperature', () => {
    expect([showRange(length(closed(0), UNLIMITED)), showRange(between('temperature', '°C', closed(0), UNLIMITED)), showRange(length(closed(0), closed(9)))]).toEqual(['any figure', '0 °C and up', 'up to 9 mm'])
  })
  test('a fix writes a figure that can be set: inside an open bound, and short', () => {
    expect([betterEnd(length(open(16), open(30)), { min: 16, max: 20 }, 'min'), betterEnd(length(open(16), open(30)), { min: 20, max: 30 }, 'max')]).toEqual([16.1, 29.9])
    expect([betterEnd(length(closed(23.064), closed(26.536)), { min: 23, max: 25 }, 'min'), betterEnd(length(closed(23.064), closed(26.536)), { min: 24, max: 27 }, 'max')]).toEqual([23.1, 26.5])
    expect(betterEnd(length(closed(112.5), closed(187.5)), { min: 120, max: 200 }, 'max')).toBe(187.5)
    expect(betterEnd(between('length', 'in', closed(0), closed(1.3125)), { min: 1, max: 2 }, 'max')).toBe(1.3125)
  })
  test('a range after "lies inside"', () => {
    expect([length(closed(5), closed(20)), length(closed(-37), UNLIMITED), length(UNLIMITED, closed(20)), length(UNLIMITED, UNLIMITED), length(closed(0), UNLIMITED), length(closed(5), closed(5))].map(showInside)).toEqual(['the 5 mm to 20 mm', 'the range from -37 mm up', 'the range up to 20 mm', 'the range without limits', 'the range without limits', 'the 5 mm'])
  })
  test('several things aren\'t stated, one isn\'t', () => expect([notStated('positions', 'x').sentence, notStated('thickness', 'x').sentence]).toEqual(["Positions aren't stated in the procedure.", "Thickness isn't stated in the procedure."]))
  test('names', () => {
    expect([showSpan(null), showSpan(setRange([], { any: true })), showSpan(setRange([])), showSpan(setRange([], { unknown: true })), showSpan(setRange(['B', 'A'])), showSpan(length(closed(1), closed(2)))]).toEqual(['nothing', 'any', 'nothing', 'a range that is not known', 'A or B', '1 mm to 2 mm'])
    expect([list([]), list(['a']), list(['a', 'b', 'c'])]).toEqual(['', 'a', 'a, b and c'])
  })
  test('what is asked', () => expect([showAsked({ min: 1, max: 2 }, 'mm'), showAsked({ min: 2, max: 2 }, 'mm'), showAsked({ min: null, max: 2 }, 'mm'), showAsked({ min: 2, max: null }, 'mm'), showAsked({ min: null, max: null }, 'mm')]).toEqual(['1 mm to 2 mm', '2 mm', 'up to 2 mm', '2 mm and up', 'every size']))
})

describe('reading', () => {
  test('contradictory and missing figures', () => {
    expect(figures(null, 'length', 'SI')).toEqual({ min: null, max: null, all: false, fault: false })
    expect(figures({ min: null, max: null, all: true }, 'length', 'SI').all).toBe(true)
    expect(figures(interval(9, 3, 'length'), 'length', 'SI').fault).toBe(true)
    expect(figures(interval(null, -3, 'length'), 'length', 'SI').fault).toBe(true)
    expect(figures(interval(-30, -3, 'temperature'), 'temperature', 'SI').fault).toBe(false)
  })
  test('one figure of a coupon', () => {
    expect([single(interval(9, undefined, 'length'), 'length', 'SI'), single(interval(9, 10, 'length'), 'length', 'SI'), single(interval(null, 10, 'length'), 'length', 'SI'), single(interval(9, null, 'length'), 'length', 'SI'), single(interval(0, undefined, 'length'), 'length', 'SI'), single(null, 'length', 'SI')]).toEqual([9, null, 10, 9, null, null])
    expect(single({ min: quantity(0.5, 'length', 'in'), max: null, all: false }, 'length', 'US')).toBe(0.5)
  })
  test('stated', () => expect([isStated(null), isStated(undefined), isStated(interval(null, null, 'length')), isStated(interval(1, null, 'length')), isStated({ min: null, max: null, all: true })]).toEqual([false, false, false, true, true]))
  test('gases', () => {
    const mixture = (name: string | null, ...parts: [string, number][]): Parameters<typeof gasName>[0] => ({ libraryId: null, components: parts.map(([gas, percent]) => ({ gas: gas as 'Ar', percent })), isoSymbol: null, name, flow: null })
    expect([gasName(null), gasName(mixture('None')), gasName(mixture(null)), gasName(mixture(null, ['Ar', 100])), gasName(mixture(null, ['CO2', 25], ['Ar', 75])), gasName(mixture(null, ['O2', 50], ['N2', 50])), gasName(mixture(null, ['Ar', 100], ['O2', 0]))]).toEqual([null, 'none', null, 'Ar 100 %', 'Ar 75 % + CO2 25 %', 'N2 50 % + O2 50 %', 'Ar 100 %'])
    expect([isInert(null), isInert(mixture('none')), isInert(mixture(null)), isInert(mixture(null, ['Ar', 70], ['He', 30])), isInert(mixture(null, ['Ar', 98], ['O2', 2]))]).toEqual([null, null, null, true, false])
  })
})

describe('kinds of rule', () => {
  const meta: RuleMeta = { id: 'trial/rule', title: 'Trial', standard: 'asme-ix', clause: 'none', editions: ['2021'], classes: { SMAW: 'essential' }, basis: 'read', source: 'trial', statement: 'trial', scope: 'weld', combine: 'each' }
  const wps = procedure().variables
  const context: RuleContext = { edition: '2021', level: null, system: 'SI', toughness: false, procedure: wps, block: null, coupons: [], path: '' }
  const tested = coupon()
  const sides: CouponSide[] = [{ coupon: tested, variables: tested.content.variables, block: null, role: 'mechanical' }]
  const figureOf = (asked: { min: number | null; max: number | null } | null | 'fault'): ReturnType<typeof figureRule> => figureRule({ meta, field: 'diameter', at: 'weld', label: 'diameter', dimension: 'length', asked: () => asked, range: () => null })
  const named = (asked: string[] | null, applies?: () => boolean): ReturnType<typeof namedRule> => namedRule({ meta, field: 'trial', at: 'weld', label: 'trial', applies, asked: () => asked, tested: () => undefined, because: 'trial' })
  test('a figure', () => {
    const range = length(closed(5), closed(20))
    expect(figureOf(null).check(context, sides, range)).toMatchObject({ verdict: 'cannot-tell', missing: ['procedure: diameter'] })
    expect(figureOf('fault').check(context, sides, range)?.sentence).toContain('contradicts itself')
    expect(figureOf({ min: 6, max: 7 }).check(context, sides, null)).toBeNull()
    expect(figureOf({ min: 1, max: 30 }).check(context, sides, range)).toMatchObject({ verdict: 'outside', sentence: '30 mm is above the 20 mm that PQR-001 qualifies, and 1 mm is below the 5 mm that PQR-001 qualifies.', fixes: [{ field: 'diameter.max' }, { field: 'diameter.min' }, { kind: 'plan-coupon' }] })
    expect(figureOf({ min: null, max: null }).check(context, sides, range)).toMatchObject({ verdict: 'outside', sentence: expect.stringContaining('No upper limit is above the 20 mm') as string, fixes: [{ value: { si: 20 } }, { value: { si: 5 } }, {}] })
    expect(figureOf({ min: 1, max: 2 }).check(context, sides, numericRange('length', 'mm', []))?.sentence).toContain('qualifies nothing here')
    expect(figureOf({ min: 1, max: 2 }).check(context, sides, length(UNKNOWN, UNKNOWN))).toMatchObject({ verdict: 'cannot-tell' })
    expect(() => figureOf({ min: 1, max: 2 }).check(context, sides, setRange(['A']))).toThrow(TypeError)
  })
  test('a gap: the end is moved to where the whole lies on one side of it', () => {
    const gap = numericRange('length', 'mm', [{ lower: closed(1), upper: closed(6) }, { lower: closed(16), upper: closed(50) }])
    expect(figureOf({ min: 8, max: 20 }).check(context, sides, gap)).toMatchObject({ verdict: 'outside', sentence: expect.stringContaining('gap') as string, fixes: [{ label: 'Set diameter to 16 mm', field: 'diameter.min' }, { kind: 'plan-coupon' }] })
  })
  test('a name', () => {
    expect(named(['A']).check(context, sides, setRange(['A']))?.verdict).toBe('within')
    expect(named([]).check(context, sides, setRange(['A']))?.verdict).toBe('cannot-tell')
    expect(named(['A']).check(context, sides, null)).toBeNull()
    expect(named(['A'], () => false).check(context, sides, setRange(['A']))).toBeNull()
    expect(named(['A']).check(context, sides, setRange([]))?.sentence).toBe('Trial: A is not covered; PQR-001 qualifies none.')
    expect(named(['A']).range(context, sides[0]!)).toBeNull()
    expect(() => named(['A']).check(context, sides, length(closed(1), closed(2)))).toThrow(TypeError)
  })
  test('a coupon is named once', () => expect(names([...sides, ...sides])).toBe('PQR-001'))
  test('the weaker basis shows', () => expect([weakest('read', 'memory'), weakest('secondary', 'read'), weakest('read', 'read')]).toEqual(['memory', 'secondary', 'read']))
})

describe('a figure typed in inches or degrees Fahrenheit', () => {
  test('is read as it was typed, whatever storage keeps of it', () => {
    for (const [dimension, unit, from, to] of [['temperature', '°F', -40, 1200], ['length', 'in', 1, 400], ['travelSpeed', 'in/min', 1, 90], ['wireFeed', 'in/min', 40, 700]] as const) {
      for (let value = from; value <= to; value += 1) expect(figure(quantity(value, dimension, unit), dimension, 'US')).toBe(value)
    }
    expect(figure(quantity(1 / 32, 'length', 'in'), 'length', 'US')).toBe(1 / 32)
    expect(figure(quantity(12.7, 'length', 'mm'), 'length', 'US')).toBe(0.5)
  })
})
