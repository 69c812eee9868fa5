/** Properties of both ISO standards: wider never narrows, units at a boundary, level 2 at level 1, and no record is too odd for an answer. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { assess, qualifyCoupon } from '@shared/assessment/assess.ts'
import { containsInterval } from '@shared/ranges/numeric.ts'
import type { NumericRange, QualifiedRange } from '@shared/schemas/assessment.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import { iso15614Part1 } from '@shared/standards/iso-15614-1/index.ts'
import { buttLevelOne, buttLevelTwo, diameterRange, filletThickness, throatRange } from '@shared/standards/iso-15614-1/tables.ts'
import { iso15614Part2 } from '@shared/standards/iso-15614-2/index.ts'
import { buttThickness, diameter, throat } from '@shared/standards/iso-15614-2/tables.ts'
import { interval } from '@shared/units/convert.ts'
import { coupon, EDITION, finding, judge, procedure, qualified } from './builders.ts'

const size = fc.integer({ min: 5, max: 4000 }).map((n) => n / 10)
const runs = fc.constantFrom('single' as const, 'multiple' as const)
const holds = (outer: NumericRange, inner: NumericRange): boolean => inner.segments.every(({ lower, upper }) => containsInterval(outer, { min: 'value' in lower ? lower.value : null, max: 'value' in upper ? upper.value : null }) === 'within')

describe('tables', () => {
  test('what may be covered holds what surely is; the tested size is covered wherever the table has a row', () => {
    fc.assert(fc.property(size, runs, fc.constantFrom(true, false, null), (t, run, pass) => {
      for (const reading of [buttLevelTwo(t, run), buttLevelOne(t, pass), filletThickness(t), throatRange(t, run, 10), throatRange(t, run, 40), diameterRange(t), buttThickness(t, run), throat(t), diameter(t)]) {
        expect(holds(reading.maybe, reading.sure)).toBe(true)
        if (reading.sure.segments.length > 0 && !(t > 100 && run === 'single')) expect(containsInterval(reading.maybe, { min: t, max: t })).toBe('within')
      }
    }))
  })
  test('row edges belong to the lower row', () => {
    const ends = (range: NumericRange): unknown[] => range.segments.map(({ lower, upper }) => ['value' in lower ? lower.value : null, 'value' in upper ? upper.value : null])
    expect(ends(buttLevelTwo(3, 'single').sure)).toEqual([[2.1, 3.9]])
    expect(ends(buttLevelTwo(12, 'single').sure)).toEqual([[6, 15.6]])
    expect(ends(buttLevelTwo(100, 'multiple').sure)).toEqual([[50, 200]])
    expect(ends(buttLevelTwo(100, 'single').sure)).toEqual([[50, 110]])
    expect(ends(buttLevelOne(1.5, false).sure)).toEqual([[1.5, 3]])
    expect(ends(buttLevelOne(10, false).sure)).toEqual([[1.5, 20]])
    expect(ends(buttLevelOne(150, false).sure)).toEqual([[5, 200]])
    expect(ends(diameterRange(25).sure)).toEqual([[12.5, 50]])
  })
})

describe('verdicts', () => {
  test('widening what is asked never turns outside into within, narrowing never within into outside', () => {
    fc.assert(fc.property(size, size, size, fc.constantFrom('1' as const, '2' as const), (t, low, more, level) => {
      const record = coupon({ thickness: t, level })
      const ask = (min: number, max: number): string => finding(judge(procedure({ thickness: [min, max], processes: [['GMAW', 1]], level }), [record], level), 'parent-thickness').verdict
      const narrow = ask(low, low)
      const wide = ask(low, low + more)
      if (wide === 'within') expect(narrow).toBe('within')
      if (narrow === 'outside') expect(wide).toBe('outside')
    }), { numRuns: 60 })
  })
  test('a second coupon never turns within into outside', () => {
    fc.assert(fc.property(size, size, size, (t, other, asked) => {
      const wps = procedure({ thickness: asked, processes: [['GMAW', 1]] })
      const alone = finding(judge(wps, [coupon({ thickness: t })]), 'parent-thickness').verdict
      const both = finding(judge(wps, [coupon({ thickness: t }), coupon({ thickness: other, number: 'PQR-002' })]), 'parent-thickness').verdict
      if (alone === 'within') expect(both).toBe('within')
    }), { numRuns: 40 })
  })
  test('a level 2 coupon qualifies no less at level 1', () => {
    fc.assert(fc.property(size, fc.boolean(), fc.boolean(), (t, impact, hardness) => {
      const record = coupon({ thickness: t, level: '2', impact, hardness })
      const at = (level: '1' | '2'): Map<string, QualifiedRange> => new Map(qualified(record, level).ranges.map((range) => [range.ruleId, range]))
      const one = at('1')
      for (const [id, range] of at('2')) {
        // Level 1 has no lower limit of heat input.
        if (id === 'iso-15614-1/heat-input-minimum') continue
        const wide = one.get(id)
        expect(wide, id).toBeDefined()
        if (!wide) continue
        if (range.range.type === 'numeric' && wide.range.type === 'numeric') {
          const sure = { ...range.range, segments: range.range.segments.filter(({ lower, upper }) => lower.kind !== 'unknown' && upper.kind !== 'unknown') }
          expect(holds(wide.range, sure), `${id} at ${t}`).toBe(true)
        } else if (range.range.type === 'set' && wide.range.type === 'set') {
          const { values, any } = wide.range
          expect(any || range.range.values.every((name) => values.includes(name)), id).toBe(true)
        }
      }
    }), { numRuns: 60 })
  })
  test('inches are judged by their exact millimetres', () => {
    const inches = (value: number) => (variables: WeldingVariables): void => { variables.unitSystem = 'US'; variables.thickness = interval(value, undefined, 'length', 'in') }
    const record = coupon({ thickness: 25.4, change: inches(1) })
    expect(finding(judge(procedure({ change: inches(0.5) }), [record]), 'parent-thickness').verdict).toBe('within')
    expect(finding(judge(procedure({ thickness: 12.7 }), [record]), 'parent-thickness').verdict).toBe('within')
    expect(finding(judge(procedure({ thickness: 12.69 }), [record]), 'parent-thickness').verdict).toBe('outside')
    expect(finding(judge(procedure({ change: inches(2) }), [coupon({ thickness: 25.4 })]), 'parent-thickness')).toMatchObject({ verdict: 'within', asked: { min: 50.8, max: 50.8 } })
  })
})

/** Takes whatever a record holds away, or turns it over, at random. */
function spoil(value: unknown, random: () => number, path = ''): unknown {
  if (Array.isArray(value)) return path === 'processes' || path === 'standards' ? value.map((item) => spoil(item, random)) : random() < 0.15 ? [] : value.map((item) => spoil(item, random))
  if (value === null || typeof value !== 'object') return value
  return Object.fromEntries(Object.entries(value).map(([key, item]) => {
    const optional = !['id', 'title', 'weld', 'type', 'penetration', 'product', 'unitSystem', 'si', 'unit', 'typed', 'standard', 'edition', 'processes', 'standards', 'joint', 'baseMetals', 'a', 'b', 'preheat', 'pwht', 'filler', 'electrical', 'technique', 'components', 'gas', 'percent', 'positions', 'passes', 'diameters', 'variables', 'supportingCoupons', 'runSheet', 'tension', 'bends', 'macros', 'toughness', 'hardness', 'kind', 'specimen', 'openings', 'method', 'place', 'scale', 'values', 'lateralExpansion', 'number', 'all', 'inspected', 'broke', 'ndt'].includes(key)
    if (optional && random() < 0.2) return [key, null]
    if (key === 'si' && typeof item === 'number' && random() < 0.1) return [key, -item]
    return [key, spoil(item, random, key)]
  }))
}

test('any record, however torn, is answered in whole sentences, and what can\'t be told names what is missing', () => {
  fc.assert(fc.property(fc.integer({ min: 1, max: 2 ** 31 - 1 }), fc.constantFrom(...iso15614Part1.processes), fc.boolean(), fc.constantFrom('1' as const, '2' as const, null), (seed, process, weld, level) => {
    let state = seed
    const random = (): number => { state = (Math.imul(state, 1103515245) + 12345) & 0x7fffffff; return state / 0x7fffffff }
    const joint = (variables: WeldingVariables): void => { if (weld) Object.assign(variables.joint, { weld: 'fillet', filletThroat: interval(5, 5, 'length') }); else Object.assign(variables, { product: 'pipe', diameter: interval(100, 100, 'length') }) }
    const base = { processes: [[process as 'GMAW', 10]] as const, impact: random() < 0.5, hardness: random() < 0.5, change: joint }
    const wps = spoil(procedure(base), random) as ReturnType<typeof procedure>
    const one = coupon(base)
    const torn = { ...one, content: spoil(one.content, random) as typeof one.content }
    for (const [standard, edition] of [['iso-15614-1', EDITION], ['iso-15614-2', '2005']] as const) {
      const assessment = assess({ procedure: wps, coupons: [torn], standard, edition, level })
      for (const found of assessment.findings) {
        expect(found.sentence.length).toBeGreaterThan(5)
        expect(found.sentence).not.toMatch(/undefined|NaN|\[object/)
        if (found.verdict === 'cannot-tell') expect(found.missing.length, found.ruleId).toBeGreaterThan(0)
      }
      const { missing } = qualifyCoupon(torn, standard, edition, level)
      for (const row of missing) expect(row.message).not.toMatch(/undefined|NaN/)
    }
  }), { numRuns: 150 })
})

describe('the lists of rules', () => {
  test.each([iso15614Part1, iso15614Part2])('$id: every rule has its clause, source, statement and a unique id', (standard) => {
    expect(new Set(standard.rules.map(({ meta }) => meta.id)).size).toBe(standard.rules.length)
    for (const { meta, field } of standard.rules) {
      expect(meta.id.startsWith(`${standard.id}/`)).toBe(true)
      expect(meta.standard).toBe(standard.id)
      expect(meta.clause).toMatch(/\d|Introduction/)
      expect(meta.statement.endsWith('.')).toBe(true)
      expect(meta.source.length).toBeGreaterThan(10)
      expect(Object.keys(meta.classes).length).toBeGreaterThan(0)
      expect(meta.editions).toEqual(standard.editions.map(({ id }) => id))
      expect(field).not.toBe('')
    }
  })
})

test('records in US units are told that they are judged by the SI figures', () => {
  const us = (variables: WeldingVariables): void => { variables.unitSystem = 'US' }
  const steps = (wps: boolean, one: boolean): string => finding(judge(procedure(wps ? { change: us } : {}), [coupon(one ? { change: us } : {})]), 'parent-thickness').reasoning.join(' ')
  for (const [wps, one] of [[true, true], [true, false], [false, true]] as const) {
    const told = steps(wps, one)
    expect(told).not.toContain('US figures')
    expect(told).toContain('by the SI figures, the only ones that ISO 15614-1 prints')
    expect(told.includes('The procedure is written in US units')).toBe(wps)
    expect(told.includes('PQR-001 is recorded in US units')).toBe(one)
  }
  expect(steps(false, false)).not.toContain('units')
})
