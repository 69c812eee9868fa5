/** What holds for every aluminium record: no crash, nothing missing passes, nothing unconfirmed is certain. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import { awsD12 } from '@shared/standards/aws-d1-2/index.ts'
import type { CouponSide, RangeContext } from '@shared/standards/rule.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, first, judge, pair, procedure, type Arc } from './records.ts'

const ARCS: readonly Arc[] = ['GMAW', 'GTAW', 'PAW', 'SMAW']
const ALL = { min: null, max: null, all: true }
const MUTATIONS: Record<string, (v: WeldingVariables) => void> = {
  'nothing': () => undefined,
  'no thickness': (v) => { v.thickness = null },
  'one end of thickness': (v) => { v.thickness = interval(null, 8, 'length') },
  'every thickness': (v) => { v.thickness = { ...ALL } },
  'wrong thickness': (v) => { v.thickness = interval(9, 2, 'length') },
  'a second thickness': (v) => { v.thicknessB = interval(6, null, 'length') },
  'no metals': (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: null, grade: null }) },
  'an unlisted alloy': (v) => { v.baseMetals.a.grade = '2024-T3' },
  'one metal': (v) => { Object.assign(v.baseMetals.b, { specification: null, grade: null }) },
  'by M-Number': (v) => { Object.assign(v.baseMetals.b, { specification: null, grade: null, d12MNumber: '22' }) },
  'no filler': (v) => { first(v).filler.added = false },
  'bare filler': (v) => { first(v).filler.classification = null },
  'no process': (v) => { first(v).process = null },
  'out of scope': (v) => { first(v).process = 'SAW' },
  'no position': (v) => { first(v).positions = [] },
  'vertical, open': (v) => { Object.assign(first(v), { positions: ['3G'], progression: null }) },
  'vertical, down': (v) => { Object.assign(first(v), { positions: ['3G'], progression: 'down' }) },
  'vertical, both': (v) => { Object.assign(first(v), { positions: ['3G'], progression: 'both' }) },
  'bare arc': (v) => { Object.assign(first(v).electrical, { currentType: null, transferMode: null, current: null, voltage: null, travelSpeed: null }) },
  'wrong arc': (v) => { Object.assign(first(v).electrical, { current: interval(9, 2, 'current'), voltage: { ...ALL }, travelSpeed: interval(null, 400, 'travelSpeed') }) },
  'no gas stated': (v) => { first(v).shieldingGas = null },
  'no gas used': (v) => { if (first(v).shieldingGas) Object.assign(first(v).shieldingGas!, { components: [], name: 'none', flow: null }) },
  'bare technique': (v) => { Object.assign(first(v).technique, { passesPerSide: null, initialCleaning: null, interpassCleaning: null }) },
  'a single layer': (v) => { first(v).technique.passesPerSide = 'single' },
  'one pass': (v) => { first(v).passes = [{ number: '1', layer: 'cap', fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }] },
  'two passes': (v) => { first(v).passes = ['1', '2'].map((number) => ({ number, layer: 'fill' as const, fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null })) },
  'a fillet': (v) => { v.joint.weld = 'fillet' },
  'partial penetration': (v) => { v.joint.penetration = 'partial' },
  'no backing stated': (v) => { v.joint.backing = null },
  'without backing': (v) => { v.joint.backing = 'none' },
  'no heat': (v) => { Object.assign(v.preheat, { minimum: null, interpassMaximum: null }); v.pwht.condition = null },
  'hot service': (v) => { v.serviceTemperature = quantity(90, 'temperature') },
  'pipe': (v) => { v.product = 'pipe' },
  'pipe of a diameter': (v) => { v.product = 'pipe'; v.diameter = interval(100, null, 'length') },
  'plate with a diameter': (v) => { v.diameter = interval(100, undefined, 'length') },
}
const names = Object.keys(MUTATIONS)

describe('any record is answered', () => {
  test.each(ARCS)('one or two things wrong: %s', (process) => {
    const wrong: string[] = []
    for (const one of names) {
      for (const other of names) {
        const assessment = judge(procedure({ process, change: MUTATIONS[one]! }), [coupon({ process, change: MUTATIONS[other]! })])
        for (const found of assessment.findings) if (/undefined|NaN|null|\[object/.test(found.sentence) || (found.verdict === 'cannot-tell' && found.missing.length === 0)) wrong.push(`${one}/${other}: ${found.ruleId}: ${found.sentence}`)
      }
      const alone = qualifyCoupon(coupon({ process, change: MUTATIONS[one]! }), 'aws-d1-2', '2014')
      for (const { reason, ruleId } of alone.ranges) if (/undefined|NaN|null/.test(reason)) wrong.push(`${one}: ${ruleId}: ${reason}`)
    }
    expect(wrong).toEqual([])
  }, 120_000)
  test('a rule asked out of place answers', () => {
    const wrong: string[] = []
    for (const process of ARCS) {
      for (const name of names) {
        const wps = procedure({ process, change: MUTATIONS[name]! })
        const tested = coupon({ process, change: MUTATIONS[name]! })
        const range: RangeContext = { edition: '2014', level: null, system: 'SI', toughness: false, procedure: wps.variables, block: null, coupons: [tested] }
        const weld: CouponSide = { coupon: tested, variables: tested.content.variables, block: null, role: 'full' }
        for (const rule of awsD12.rules) {
          for (const one of [weld, { ...weld, block: first(tested.content.variables) }]) {
            rule.range({ ...range, procedure: null }, one)
            for (const block of [null, first(wps.variables)]) {
              const context = { ...range, procedure: wps.variables, block, path: 'processes.0' }
              const own = rule.range(context, one)
              for (const sides of [[], [one], [one, weld]]) {
                const judged = rule.check(context, sides, own?.range ?? null)
                if (judged && /undefined|NaN/.test(judged.sentence)) wrong.push(`${name}: ${rule.meta.id}: ${judged.sentence}`)
              }
            }
          }
        }
      }
    }
    expect(wrong).toEqual([])
  }, 120_000)
  test('what is missing on either side never passes', () => {
    for (const name of ['no thickness', 'no metals', 'bare filler', 'no position', 'bare arc', 'bare technique', 'no backing stated', 'no heat']) {
      expect(judge(procedure({ change: MUTATIONS[name]! }), [coupon()]).verdict, name).not.toBe('within')
      expect(judge(procedure(), [coupon({ change: MUTATIONS[name]! })]).verdict, name).not.toBe('within')
    }
  })
})

describe('what is not confirmed', () => {
  const figure = fc.integer({ min: 1, max: 400 })
  test('is never outside, and within only for what was tested', () => {
    fc.assert(fc.property(figure, figure, (tested, asked) => {
      const at = (value: number) => (v: WeldingVariables): void => { v.thickness = interval(value / 10, undefined, 'length') }
      expect(finding(pair({}, at(tested), at(asked)), 'thickness').verdict).toBe(tested === asked ? 'within' : 'cannot-tell')
    }), { numRuns: 100 })
  })
  test('a wider reading never turns within into outside', () => {
    fc.assert(fc.property(figure, figure, figure, figure, (a, b, c, d) => {
      const amps = (min: number, max: number) => (v: WeldingVariables): void => { first(v).electrical.current = interval(Math.min(min, max), Math.max(min, max), 'current') }
      const narrow = finding(pair({}, amps(a, b), amps(c, d)), 'amperage').verdict
      const wide = finding(pair({}, amps(Math.min(a, b) - 1, Math.max(a, b) + 1), amps(c, d)), 'amperage').verdict
      expect(narrow === 'within' && wide !== 'within').toBe(false)
      expect(wide).not.toBe('outside')
    }), { numRuns: 100 })
  })
  test('at the boundary inches judge as millimetres do', () => {
    const typed = (value: number, unit: string) => (v: WeldingVariables): void => { v.thickness = interval(value, undefined, 'length', unit) }
    for (const system of ['SI', 'US'] as const) expect(finding(pair({ system }, typed(0.5, 'in'), typed(12.7, 'mm')), 'thickness').verdict).toBe('within')
    const heat = (system: 'SI' | 'US', value: number, unit: string) => finding(pair({ system }, () => undefined, (v) => { v.preheat.interpassMaximum = quantity(value, 'temperature', unit) }), 'highest-temperature').verdict
    expect([heat('SI', 120, '°C'), heat('SI', 120.1, '°C'), heat('US', 250, '°F'), heat('US', 250.1, '°F')]).toEqual(['within', 'outside', 'within', 'outside'])
  })
})
