import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { assess, overall, qualifyCoupon } from '@shared/assessment/assess.ts'
import { assessEach } from '@shared/assessment/throughput.ts'
import { assessmentSchema, couponQualificationSchema } from '@shared/schemas/assessment.ts'
import type { StandardId } from '@shared/schemas/common.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, problems, procedure } from '../standards/builders.ts'

const mm = (min: number | null, max?: number | null): ReturnType<typeof interval> => interval(min, max, 'length')
const better = { within: 2, 'cannot-tell': 1, outside: 0 }

describe('a clean set', () => {
  for (const process of ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW', 'PAW'] as const) {
    for (const toughness of [false, true]) {
      test(`${process} ${toughness ? 'with' : 'without'} toughness: the coupon's own values are within, in every edition`, () => {
        const given = { processes: [[process, 20]] as const, toughness }
        for (const edition of ['2017', '2019', '2021', '2023']) {
          const assessment = judge(procedure(given), [coupon(given)], edition)
          expect(problems(assessment)).toEqual([])
          expect(assessment.verdict).toBe('within')
          expect(assessment.findings.filter((one) => one.verdict === 'cannot-tell')).toEqual([])
          expect(assessmentSchema.parse(assessment)).toEqual(assessment)
        }
      })
    }
  }
})

describe('sentences, fixes and reasoning', () => {
  const assessment = judge(procedure({ thickness: [5, 25], processes: [['SMAW', 10]] }), [coupon({ thickness: 10, number: 'PQR-009' })])
  const thick = finding(assessment, 'base-metal-thickness')
  test('one plain sentence with the figures', () => expect(thick.sentence).toBe('25 mm is above the 20 mm (2T) that the 10 mm coupon of PQR-009 qualifies.'))
  test('the nearest value is offered, where it belongs', () => expect(thick.fixes[0]).toEqual({ kind: 'set', label: 'Set base metal thickness to 20 mm', field: 'thickness.max', value: quantity(20, 'length') }))
  test('what to weld is offered', () => expect(thick.fixes.at(-1)).toMatchObject({ kind: 'plan-coupon' }))
  test('the reasoning leads from T to the range', () => expect(thick.reasoning[0]).toContain('T = 10 mm gives 1.5 mm to 20 mm (2T) by QW-451.1'))
  test('the gauge has what it needs', () => expect(thick).toMatchObject({ field: 'thickness', asked: { min: 5, max: 25 }, tested: [10], couponIds: ['PQR-009'], processId: 'SMAW', range: { unit: 'mm', segments: [{ lower: { kind: 'closed', value: 1.5 }, upper: { kind: 'closed', value: 20 } }] } }))
  test('a stored coupon that covers it is offered', () => {
    const other = coupon({ thickness: 25, number: 'PQR-012' })
    const helped = judge(procedure({ thickness: [5, 25], processes: [['SMAW', 10]] }), [coupon({ thickness: 10 })], '2021', [other, coupon({ thickness: 3, number: 'PQR-013' })])
    expect(finding(helped, 'base-metal-thickness').fixes.filter((fix) => fix.kind === 'link-coupon')).toEqual([{ kind: 'link-coupon', label: 'Link PQR-012, which covers it', couponId: 'PQR-012' }])
  })
  test('applying a set fix cures the finding', () => {
    const wps = procedure({ thickness: [5, 25], processes: [['SMAW', 10]] })
    const fix = thick.fixes[0]
    if (fix?.kind !== 'set' || !wps.variables.thickness) throw new Error('no fix')
    wps.variables.thickness.max = fix.value as typeof wps.variables.thickness.max
    expect(finding(judge(wps, [coupon({ thickness: 10 })]), 'base-metal-thickness').verdict).toBe('within')
  })
})

describe('coupons together', () => {
  test('agreeing coupons join their thickness ranges', () => {
    // 3 mm gives 1.5 to 6; 20 mm gives 5 to 40.
    const assessment = judge(procedure({ thickness: [1.5, 40], processes: [['SMAW', 40]] }), [coupon({ thickness: 3 }), coupon({ thickness: 20, number: 'PQR-2' })])
    expect(problems(assessment)).toEqual([])
    expect(finding(assessment, 'base-metal-thickness').couponIds).toEqual(['PQR-001', 'PQR-2'])
  })
  test('a gap between toughness records stays uncovered', () => {
    // With toughness: 3 mm gives 1.5 to 6, 25 mm gives 16 to 50.
    const records = [coupon({ thickness: 3, toughness: true }), coupon({ thickness: 25, number: 'PQR-2', toughness: true })]
    const found = finding(judge(procedure({ thickness: [5, 20], processes: [['SMAW', 5]], toughness: true }), records), 'toughness-thickness')
    expect(found.verdict).toBe('outside')
    expect(found.sentence).toContain('gap')
    expect(judge(procedure({ thickness: [16, 50], processes: [['SMAW', 50]], toughness: true }), records).verdict).toBe('within')
  })
  test('a coupon that disagrees lends no thickness', () => {
    const assessment = judge(procedure({ thickness: [1.5, 40], processes: [['SMAW', 10]] }), [coupon({ thickness: 3, change: (v) => (v.processes[0]!.filler.fNumber = '3') }), coupon({ thickness: 20, number: 'PQR-2' })])
    expect(finding(assessment, 'base-metal-thickness')).toMatchObject({ verdict: 'outside', couponIds: ['PQR-2'] })
    expect(finding(assessment, 'filler-f-number').verdict).toBe('within')
  })
  test('a coupon that may yet agree makes it "cannot tell"', () => {
    const assessment = judge(procedure({ thickness: [1.5, 40], processes: [['SMAW', 10]] }), [coupon({ thickness: 3, change: (v) => (v.processes[0]!.filler.fNumber = null) }), coupon({ thickness: 20, number: 'PQR-2' })])
    const found = finding(assessment, 'base-metal-thickness')
    expect(found.verdict).toBe('cannot-tell')
    expect(found.missing).toContain('PQR-001: filler.fNumber')
  })
  test('two coupons that each cover one variable do not together cover both', () => {
    const f3 = (v: WeldingVariables): void => void (v.processes[0]!.filler.fNumber = '3')
    const p4 = (v: WeldingVariables): void => { v.baseMetals.a.pNumber = '4'; v.baseMetals.b.pNumber = '4' }
    const assessment = judge(procedure({ change: (v) => { f3(v); p4(v) } }), [coupon({ change: f3 }), coupon({ number: 'PQR-2', change: p4 })])
    expect(assessment.verdict).toBe('outside')
    expect(assessment.findings.filter((one) => one.verdict === 'outside')).toHaveLength(1)
  })
  test('P-1 and P-8 records do not make P-1 to P-8', () => {
    const assessment = judge(procedure({ p: ['1', '8'] }), [coupon({ p: ['1', '1'] }), coupon({ p: ['8', '8'], number: 'PQR-2' })])
    expect(finding(assessment, 'base-metal-p-number').verdict).toBe('outside')
  })
  test('toughness added later: maximum of the first, greater minimum of both (published interpretation, 1 in. and 0.24 in.)', () => {
    const first = coupon({ system: 'US', thickness: 1, tests: 'mechanical' })
    const second = coupon({ system: 'US', thickness: 0.24, tests: 'toughness', toughness: true, number: 'PQR-2' })
    const wps = (min: number, max: number): ReturnType<typeof procedure> => procedure({ system: 'US', toughness: true, thickness: [min, max], processes: [['SMAW', 2]] })
    expect(problems(judge(wps(0.1875, 2), [first, second]))).toEqual([])
    expect(finding(judge(wps(0.18, 2), [first, second]), 'toughness-thickness').verdict).toBe('outside')
    expect(judge(wps(0.1875, 2.01), [first, second]).verdict).toBe('outside')
    expect(finding(judge(wps(0.1875, 2), [first]), 'toughness-tests').verdict).toBe('outside')
  })
  test('the toughness record alone must agree in the supplementary variables', () => {
    const first = coupon({ thickness: 25, tests: 'mechanical', change: (v) => (v.preheat.interpassMaximum = null) })
    const second = coupon({ thickness: 20, tests: 'toughness', toughness: true, number: 'PQR-2' })
    const wps = procedure({ toughness: true, thickness: [16, 50], processes: [['SMAW', 50]] })
    expect(problems(judge(wps, [first, second]))).toEqual([])
    // A record is never changed in place: what is edited is another object.
    const cooler = structuredClone(second)
    cooler.content.variables.preheat.interpassMaximum = quantity(100, 'temperature')
    expect(finding(judge(wps, [first, cooler]), 'interpass')).toMatchObject({ verdict: 'outside', couponIds: ['PQR-2'] })
  })
})

describe('what can not be told', () => {
  test('no coupon linked', () => {
    const assessment = judge(procedure(), [])
    expect(assessment.verdict).toBe('cannot-tell')
    // What the procedure answers by itself needs no coupon.
    const essential = assessment.findings.filter((one) => one.class === 'essential' && one.ruleId !== 'asme-ix/joint-filled')
    expect(essential.length).toBeGreaterThan(8)
    for (const one of essential) {
      expect(one.verdict).toBe('cannot-tell')
      expect(one.sentence).toContain('no coupon supports this process')
    }
  })
  test('a coupon of another process never covers', () => {
    const assessment = judge(procedure({ processes: [['FCAW', 10]] }), [coupon({ processes: [['GMAW', 20]] })])
    expect(finding(assessment, 'process')).toMatchObject({ verdict: 'outside', clause: 'QW-401' })
    expect(assessment.verdict).toBe('outside')
  })
  test('a coupon without process', () => {
    const assessment = judge(procedure(), [coupon({ change: (v) => (v.processes[0]!.process = null) })])
    expect(finding(assessment, 'process').verdict).toBe('cannot-tell')
  })
  test('a process out of scope, or none', () => {
    for (const process of ['OTHER', null] as const) {
      const assessment = judge(procedure({ change: (v) => (v.processes[0]!.process = process) }), [coupon()])
      expect(finding(assessment, 'process').verdict).toBe('cannot-tell')
      expect(assessment.verdict).toBe('cannot-tell')
    }
  })
  test('an edition or a standard that is not there yet', () => {
    expect(judge(procedure(), [coupon()], '1998').findings).toMatchObject([{ ruleId: 'assessment/edition', verdict: 'cannot-tell' }])
    // Every standard of the list is in the program; one that is not there yet is made up.
    const unwritten = 'unwritten' as StandardId
    const assessment = assess({ procedure: procedure(), coupons: [coupon()], standard: unwritten, edition: '2005' })
    expect(assessment.findings).toMatchObject([{ ruleId: 'assessment/standard', verdict: 'cannot-tell' }])
    const unknownEdition = judge(procedure(), [coupon()], '1998')
    expect(assessmentSchema.parse(unknownEdition)).toEqual(unknownEdition)
    expect(qualifyCoupon(coupon(), unwritten, '2005')).toMatchObject({ readyToCertify: false, missing: [{ message: expect.stringContaining('not in the program') as string }] })
    expect(qualifyCoupon(coupon(), 'asme-ix', '1998').missing[0]?.message).toContain('1998')
  })
  test('toughness not stated', () => {
    const raise = (v: WeldingVariables): void => void (v.processes[0]!.electrical.heatInput = interval(null, 3, 'heatInput'))
    const found = finding(judge(procedure({ toughness: null, change: raise }), [coupon({ toughness: null })]), 'heat-input')
    expect(found).toMatchObject({ verdict: 'cannot-tell', class: 'supplementary' })
    expect(found.missing).toContain('procedure: toughnessRequired')
    expect(found.fixes[0]).toMatchObject({ kind: 'state', field: 'toughnessRequired' })
  })
  test('coupon not certified', () => {
    const assessment = judge(procedure(), [coupon({ certified: false })])
    expect(problems(assessment)).toHaveLength(1)
    expect(finding(assessment, 'certification').sentence).toBe("PQR-001 isn't certified yet, so it can't support a procedure until it is.")
  })
})

test('2023 says in the assessment that it is judged as 2021', () => {
  expect(finding(judge(procedure(), [coupon()], '2023'), 'edition-note')).toMatchObject({ verdict: 'within', class: 'not-a-variable', sentence: expect.stringContaining('2021') as string })
  expect(() => finding(judge(procedure(), [coupon()], '2021'), 'edition-note')).toThrow('no finding')
})

describe('contradictions', () => {
  const cases: [string, string, (v: WeldingVariables) => void][] = [
    ['minimum above maximum', 'thickness', (v) => (v.thickness = mm(30, 10))],
    ['negative thickness', 'thickness', (v) => (v.thickness = mm(-5))],
    ['diameter on plate', 'diameter', (v) => (v.diameter = mm(100))],
    ['preheat above interpass', 'preheat.interpassMaximum', (v) => (v.preheat.minimum = quantity(300, 'temperature'))],
    ['negative pass', 'processes.0.maxPassThickness', (v) => (v.processes[0]!.maxPassThickness = quantity(-2, 'length'))],
    ['negative deposit', 'processes.0.depositThickness', (v) => (v.processes[0]!.depositThickness = mm(-2))],
    ['current upside down', 'processes.0.electrical.current', (v) => (v.processes[0]!.electrical.current = interval(200, 100, 'current'))],
  ]
  for (const [name, field, change] of cases) {
    test(`procedure: ${name}`, () => {
      const assessment = judge(procedure({ change }), [coupon()])
      expect(assessment.verdict).not.toBe('within')
      expect(finding(assessment, 'contradiction')).toMatchObject({ field, verdict: 'cannot-tell', missing: [`procedure: ${field}`] })
    })
    test(`coupon: ${name}`, () => {
      const assessment = judge(procedure(), [coupon({ change })])
      expect(assessment.verdict).not.toBe('within')
      expect(finding(assessment, 'contradiction')).toMatchObject({ couponIds: ['PQR-001'], verdict: 'cannot-tell' })
      expect(() => qualifyCoupon(coupon({ change }), 'asme-ix', '2021')).not.toThrow()
    })
  }
  test('a contradictory thickness is never judged', () => {
    expect(finding(judge(procedure({ change: (v) => (v.thickness = mm(30, 10)) }), [coupon()]), 'base-metal-thickness').verdict).toBe('cannot-tell')
    expect(finding(judge(procedure(), [coupon({ change: (v) => (v.thickness = mm(30, 10)) })]), 'base-metal-thickness').verdict).toBe('cannot-tell')
  })
})

describe('properties', { timeout: 60_000 }, () => {
  const size = fc.integer({ min: 10, max: 2000 }).map((tenths) => tenths / 10)
  test('a thicker coupon never loses the upper end of what a thinner one covered', () =>
    fc.assert(fc.property(size, size, size, (a, b, asked) => {
      const [thin, thick] = a < b ? [a, b] : [b, a]
      const at = (T: number): keyof typeof better => finding(judge(procedure({ thickness: asked, processes: [['SMAW', 1]] }), [coupon({ thickness: T })]), 'base-metal-thickness').verdict
      // Only the lower end may rise with T (1.5 to 5 mm).
      if (asked >= 5 && at(thin) === 'within' && asked <= thick * 2) expect(at(thick)).toBe('within')
    }), { numRuns: 60 }))
  test('linking one more coupon never turns thickness from within to outside', () =>
    fc.assert(fc.property(size, size, size, (T, more, asked) => {
      const wps = procedure({ thickness: asked, processes: [['SMAW', 1]] })
      const before = finding(judge(wps, [coupon({ thickness: T })]), 'base-metal-thickness').verdict
      const after = finding(judge(wps, [coupon({ thickness: T }), coupon({ thickness: more, number: 'PQR-2' })]), 'base-metal-thickness').verdict
      expect(better[after]).toBeGreaterThanOrEqual(better[before])
    }), { numRuns: 60 }))
  test('the unit in which a figure is typed never changes a verdict, not even at the boundary', () =>
    fc.assert(fc.property(size, fc.constantFrom(-0.1, 0, 0.1), (T, step) => {
      const limit = Math.round((T >= 38 && T <= 150 ? 200 : T > 150 ? 1.33 * T : 2 * T) * 1e6) / 1e6 + step
      const verdictOf = (unit: string, factor: number): string => {
        const wps = procedure({ processes: [['SMAW', 1]] })
        wps.variables.thickness = interval(Math.round((limit / factor) * 1e12) / 1e12, undefined, 'length', unit)
        const tested = coupon({ thickness: 20, processes: [['SMAW', 20]] })
        tested.content.variables.thickness = interval(Math.round((T / factor) * 1e12) / 1e12, undefined, 'length', unit)
        return finding(judge(wps, [tested]), 'base-metal-thickness').verdict
      }
      const typed = verdictOf('mm', 1)
      expect(typed).toBe(step > 0 ? 'outside' : 'within')
      expect(verdictOf('in', 25.4)).toBe(typed)
      expect(verdictOf('cm', 10)).toBe(typed)
    }), { numRuns: 60 }))
  test('the overall verdict is never better than the worst finding that counts, and never worse', () =>
    fc.assert(fc.property(fc.array(fc.record({ class: fc.constantFrom('essential', 'supplementary', 'nonessential', 'not-a-variable'), verdict: fc.constantFrom('within', 'outside', 'cannot-tell') })), (findings) => {
      const list = findings as Parameters<typeof overall>[0]
      const worst = Math.min(2, ...list.filter((one) => one.class === 'essential' || one.class === 'supplementary').map((one) => better[one.verdict]))
      expect(better[overall(list)]).toBe(worst)
    })))
  test('blanking any one field of either record never turns outside into within, and never throws', () => {
    const wps = procedure({ toughness: true, thickness: [16, 45], processes: [['GMAW', 45]], change: (v) => (v.processes[0]!.electrical.transferMode = 'short-circuiting') })
    const tested = coupon({ toughness: true, processes: [['GMAW', 20]] })
    expect(judge(wps, [tested]).verdict).toBe('outside')
    const blank = (root: object, path: string[]): void => {
      for (const [key, value] of Object.entries(root as Record<string, unknown>)) {
        if (value !== null && typeof value === 'object' && !Array.isArray(value) && !('si' in value)) blank(value, [...path, key])
        if (value === null || Array.isArray(value) || ['processes', 'joint', 'baseMetals', 'a', 'b', 'preheat', 'pwht', 'filler', 'electrical', 'technique', 'process', 'weld', 'standards', 'unitSystem', 'product', 'penetration', 'type', 'id'].includes(key)) continue
        Object.assign(root, { [key]: null })
        const assessment = judge(wps, [tested])
        expect(assessment.verdict, [...path, key].join('.')).not.toBe('within')
        Object.assign(root, { [key]: value })
      }
    }
    blank(wps.variables, [])
    blank(wps.variables.processes[0]!, ['processes.0'])
    blank(tested.content.variables, ['coupon'])
    blank(tested.content.variables.processes[0]!, ['coupon.processes.0'])
  })
  test('blanking a field of a clean set never gives outside', () => {
    for (const process of ['SMAW', 'SAW', 'GMAW', 'GTAW', 'PAW'] as const) {
      const wps = procedure({ toughness: true, processes: [[process, 20]] })
      const tested = coupon({ toughness: true, processes: [[process, 20]] })
      for (const record of [wps.variables, tested.content.variables]) {
        for (const part of [record, record.preheat, record.pwht, record.baseMetals.a, record.processes[0]!, record.processes[0]!.filler, record.processes[0]!.electrical, record.processes[0]!.technique] as object[]) {
          for (const [key, value] of Object.entries(part as Record<string, unknown>)) {
            // Blanking the toughness statement changes the question, heat input is then computed, structural keys can't be blank.
            if (value === null || ['standards', 'unitSystem', 'toughnessRequired', 'product', 'joint', 'baseMetals', 'preheat', 'pwht', 'processes', 'id', 'process', 'filler', 'electrical', 'technique', 'passes', 'heatInput'].includes(key)) continue
            Object.assign(part, { [key]: Array.isArray(value) ? [] : null })
            const assessment = judge(wps, [tested])
            expect(assessment.findings.filter((one) => one.verdict === 'outside').map((one) => one.sentence), `${process} ${key}`).toEqual([])
            Object.assign(part, { [key]: value })
          }
        }
      }
      expect(judge(wps, [tested]).verdict).toBe('within')
    }
  })
  test('inputs are not changed', () => {
    const wps = procedure({ toughness: true })
    const tested = coupon({ toughness: true })
    const before = JSON.stringify([wps, tested])
    judge(wps, [tested], '2021', [coupon({ number: 'PQR-3' })])
    qualifyCoupon(tested, 'asme-ix', '2021')
    expect(JSON.stringify([wps, tested])).toBe(before)
  })
  test('a repeated run makes the same findings', () => {
    const input = { procedure: procedure(), coupons: [coupon()], standard: 'asme-ix' as const, edition: '2021' }
    expect(assessEach([input, input, input])).toBe(3 * assess(input).findings.length)
    expect(assess(input)).toEqual(assess(input))
  })
})

test('a coupon qualification fits its schema', () => {
  const qualification = qualifyCoupon(coupon({ toughness: true }), 'asme-ix', '2021')
  expect(couponQualificationSchema.parse(qualification)).toEqual(qualification)
})
