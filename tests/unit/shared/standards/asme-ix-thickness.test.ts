/** Further cases of thickness and base metal, each with the clause that it rests on. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { outerEnds } from '@shared/ranges/numeric.ts'
import type { NumericRange } from '@shared/schemas/assessment.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import { baseMetalLimit, depositLimit, FIGURES, toughnessFloor } from '@shared/standards/asme-ix/ranges.ts'
import { coveredPairs, coveredPairsPlasma } from '@shared/standards/asme-ix/rules/base-metal-p-number.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, problems, procedure } from './builders.ts'

const ends = (T: number, system: 'SI' | 'US' = 'SI', longitudinal = false): [number | null, number | null] => {
  const { lower, upper } = baseMetalLimit(T, 'SMAW', system, longitudinal)
  return [lower, upper]
}

describe('QW-451.1 at its boundaries', () => {
  test.each([
    ['SI', 1.49, 1.49, 2.98],
    ['SI', 1.5, 1.5, 3],
    ['SI', 10, 1.5, 20],
    ['SI', 10.01, 5, 20.02],
    ['SI', 37.99, 5, 75.98],
    ['SI', 38, 5, 200],
    ['SI', 150, 5, 200],
    ['SI', 150.01, 5, 199.5133],
    ['US', 0.0625, 0.0625, 0.125],
    ['US', 0.375, 0.0625, 0.75],
    ['US', 0.376, 0.1875, 0.752],
    ['US', 1.5, 0.1875, 8],
    ['US', 6, 0.1875, 8],
    ['US', 6.01, 0.1875, 7.9933],
  ] as const)('%s T = %d: %d to %d', (system, T, lower, upper) => expect(ends(T, system)).toEqual([lower, upper]))
  test('9.8 mm is not over 10 mm, but 0.386 in. is over 3/8 in.', () => {
    const tested = coupon({ thickness: 9.8 })
    expect(finding(judge(procedure({ thickness: 2, processes: [['SMAW', 1]] }), [tested]), 'base-metal-thickness').verdict).toBe('within')
    const customary = judge(procedure({ system: 'US', thickness: 0.08, processes: [['SMAW', 0.04]] }), [tested])
    expect(finding(customary, 'base-metal-thickness').verdict).toBe('outside')
    expect(finding(customary, 'base-metal-thickness').reasoning.join(' ')).toContain('recorded in SI units')
  })
  test('deposit: the 19 mm step, and 2T never above what 2t gives under it', () => {
    expect(depositLimit(40, 18.9, 'SMAW', 'SI').upper).toBe(37.8)
    expect(depositLimit(40, 19, 'SMAW', 'SI').upper).toBe(200)
    expect(depositLimit(30, 19, 'SMAW', 'SI').upper).toBe(60)
    expect(depositLimit(160, 19, 'SMAW', 'SI').upper).toBe(212.8)
  })
  test('QW-451.2: no 200 mm row with longitudinal bends', () => {
    expect(ends(50, 'SI', true)).toEqual([5, 100])
    expect(depositLimit(50, 25, 'SMAW', 'SI', true)).toMatchObject({ upper: 50, clause: 'QW-451.2', basis: 'memory' })
  })
  test('a process outside note 3 gets 2T', () => expect(baseMetalLimit(50, 'OTHER', 'SI').upper).toBe(100))
  test('QW-403.6 floor: 6 mm gives 6, just under gives half', () => {
    expect([toughnessFloor(5.9, 'SI'), toughnessFloor(6, 'SI'), toughnessFloor(16, 'SI'), toughnessFloor(30, 'SI')]).toEqual([2.95, 6, 16, 16])
    expect(toughnessFloor(0.24, 'US')).toBe(0.12)
  })
  test('1.2 mm with toughness: the table minimum of 1.2 is greater than T/2', () => {
    const found = finding(judge(procedure({ toughness: true, thickness: 1.2, processes: [['GTAW', 1]] }), [coupon({ toughness: true, thickness: 1.2, processes: [['GTAW', 1.2]] })]), 'toughness-thickness')
    expect(outerEnds(found.range as NumericRange).lower).toEqual({ kind: 'closed', value: 1.2 })
  })
  test('every coupon covers its own thickness, in both systems', () =>
    fc.assert(fc.property(fc.integer({ min: 5, max: 30000 }), fc.constantFrom('SI' as const, 'US' as const), (n, system) => {
      const T = system === 'SI' ? n / 100 : n / 3000
      const { lower, upper } = baseMetalLimit(T, 'SMAW', system)
      expect(lower ?? 0).toBeLessThanOrEqual(T)
      expect(upper ?? 0).toBeGreaterThanOrEqual(T)
    })))
  test('the printed figures of both systems are separate', () => expect(FIGURES.US.thick * 25.4).not.toBe(FIGURES.SI.thick))
})

describe('pass thickness (QW-403.9)', () => {
  const thick = (mm: number | null) => (v: WeldingVariables): void => void (v.processes[0]!.maxPassThickness = mm === null ? null : quantity(mm, 'length'))
  const run = (ofCoupon: number | null, ofProcedure: number | null, asked: number, process: 'SAW' | 'GTAW' = 'SAW', deposit = asked): ReturnType<typeof judge> =>
    judge(procedure({ thickness: asked, processes: [[process, deposit]], change: thick(ofProcedure) }), [coupon({ thickness: 20, processes: [[process, 20]], change: thick(ofCoupon) })])
  test('exactly 13 mm does not narrow', () => expect(run(13, 6, 40).verdict).toBe('within'))
  test('a thick pass of the procedure narrows too, and limiting it is the cure', () => {
    const found = finding(run(6, 14, 30), 'pass-thickness')
    expect(found.verdict).toBe('outside')
    expect(found.fixes[0]).toMatchObject({ kind: 'set', field: 'processes.0.maxPassThickness', value: quantity(13, 'length') })
  })
  test('a thick pass of the coupon', () => {
    const assessment = run(14, 6, 22.1)
    expect(finding(assessment, 'base-metal-thickness')).toMatchObject({ verdict: 'outside', clause: 'QW-403.8' })
    expect(finding(assessment, 'base-metal-thickness').sentence).toContain('22 mm (1.1T)')
    expect(run(14, 6, 22).verdict).toBe('within')
  })
  test('not recorded: up to 1.1 T it does not matter, above it can not be told', () => {
    expect(run(null, 6, 22).verdict).toBe('within')
    const assessment = run(null, 6, 22.1)
    expect(assessment.verdict).toBe('cannot-tell')
    expect(finding(assessment, 'pass-thickness').missing).toEqual(['PQR-001: maxPassThickness'])
    expect(finding(run(6, null, 30), 'pass-thickness').missing).toEqual(['procedure: processes.0.maxPassThickness'])
    expect(finding(run(null, null, 41), 'base-metal-thickness').verdict).not.toBe('within')
  })
  test('a deposit of 13 mm can not hold a thicker pass', () => expect(finding(run(6, null, 40, 'SAW', 13), 'pass-thickness').verdict).toBe('within'))
  test('GTAW has no such variable', () => expect(run(20, 20, 40, 'GTAW').verdict).toBe('within'))
})

describe('short-circuiting to 2019 (QW-403.10, QW-404.32)', () => {
  const short = (v: WeldingVariables): void => void (v.processes[0]!.electrical.transferMode = 'short-circuiting')
  const run = (T: number, asked: number, deposit: number, edition: string): ReturnType<typeof judge> => judge(procedure({ thickness: asked, processes: [['GMAW', deposit]], change: short }), [coupon({ thickness: T, processes: [['GMAW', T]], change: short })], edition)
  test('8 mm coupon, 9 mm asked: outside in 2019, within in 2021', () => {
    expect(finding(run(8, 9, 8, '2019'), 'short-circuit-thickness').verdict).toBe('outside')
    expect(finding(run(8, 8.8, 9, '2019'), 'short-circuit-deposit').verdict).toBe('outside')
    expect(run(8, 9, 9, '2021').verdict).toBe('within')
  })
  test('13 mm has no extra limit', () => expect(problems(run(13, 26, 26, '2019'))).toEqual([]))
  test('T or t not recorded', () => {
    for (const blank of [(v: WeldingVariables): void => void (v.thickness = null), (v: WeldingVariables): void => void (v.processes[0]!.depositThickness = null)]) {
      const assessment = judge(procedure({ thickness: 8, processes: [['GMAW', 8]], change: short }), [coupon({ thickness: 8, processes: [['GMAW', 8]], change: (v) => { short(v); blank(v) } })], '2019')
      expect(assessment.verdict).toBe('cannot-tell')
    }
  })
})

describe('lifted limits', () => {
  const second = (mm: number) => (v: WeldingVariables): void => void (v.thicknessB = interval(mm, undefined, 'length'))
  const unequal = (T: number, thin: number, thick: number, p = '1'): ReturnType<typeof judge> => judge(procedure({ p: [p, p], thickness: thin, processes: [['SMAW', Math.min(thin, thick)]], change: second(thick) }), [coupon({ p: [p, p], thickness: T })])
  test('QW-202.4(b)(2): 37.9 mm does not lift, 38 mm does', () => {
    expect(unequal(37.9, 10, 300).verdict).toBe('outside')
    expect(unequal(38, 10, 300).verdict).toBe('within')
  })
  test('QW-202.4(b)(1): P-No. 8 from 6 mm, P-No. 1 not', () => {
    expect(unequal(6, 5, 100, '8').verdict).toBe('within')
    expect(unequal(5.9, 5, 100, '8').verdict).toBe('outside')
    expect(unequal(6, 5, 100, '1').verdict).toBe('outside')
  })
  test('the thinner member stays in the table, whichever member it is', () => {
    expect(unequal(50, 300, 4).verdict).toBe('outside')
    expect(unequal(50, 300, 10).verdict).toBe('within')
  })
  test('a thick pass is not lifted', () => {
    const tested = coupon({ thickness: 40, change: (v) => (v.processes[0]!.maxPassThickness = quantity(14, 'length')) })
    expect(judge(procedure({ thickness: 10, processes: [['SMAW', 4]], change: second(300) }), [tested]).verdict).toBe('outside')
  })
  test('QW-202.3: repair and build-up from 38 mm', () => {
    const run = (T: number, work?: 'repair' | 'build-up'): string => judge(procedure({ thickness: 400, processes: [['SMAW', 10]], change: (v) => (v.joint.work = work) }), [coupon({ thickness: T })]).verdict
    expect([run(38, 'repair'), run(38, 'build-up'), run(37, 'repair'), run(38)]).toEqual(['within', 'within', 'outside', 'outside'])
  })
  test('QW-202.2(b): partial penetration lifts the base metal, not the deposit', () => {
    const run = (T: number, deposit: number): string => judge(procedure({ thickness: 400, processes: [['SMAW', deposit]], change: (v) => (v.joint.penetration = 'partial') }), [coupon({ thickness: T, processes: [['SMAW', 15]] })]).verdict
    expect([run(40, 30), run(40, 31), run(30, 30)]).toEqual(['within', 'outside', 'outside'])
  })
  test('a coupon of two plates: each P-Number by its own T', () => {
    const tested = coupon({ p: ['1', '8'], thickness: 10, change: second(20) })
    const run = (first: number, other: number): string => judge(procedure({ p: ['1', '8'], thickness: first, processes: [['SMAW', 4]], change: second(other) }), [tested]).verdict
    expect(run(2, 10)).toBe('within')
    expect(run(2, 4)).toBe('outside')
    expect(run(21, 10)).toBe('outside')
  })
  test('a coupon whose second plate contradicts itself can not be judged', () => {
    const tested = coupon({ thickness: 10, change: (v) => (v.thicknessB = interval(5, 8, 'length')) })
    expect(finding(judge(procedure({ thickness: 5, processes: [['SMAW', 4]] }), [tested]), 'base-metal-thickness').verdict).toBe('cannot-tell')
  })
})

describe('several records in one joint (QW-200.4)', () => {
  const roots = (layer: 'root' | 'fill') => (v: WeldingVariables): void => void (v.processes[0]!.passes = [{ number: '1', layer, fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }])
  const run = (rootT: number, thickness: number, layer: 'root' | 'fill', rootDeposit = 4): ReturnType<typeof judge> =>
    judge(procedure({ thickness, processes: [['GTAW', rootDeposit], ['SMAW', thickness]], change: roots(layer) }), [coupon({ thickness: rootT, processes: [['GTAW', rootT]], number: 'PQR-G' }), coupon({ thickness: 50, number: 'PQR-S' })])
  test('the exception is closed under 13 mm and for other layers', () => {
    expect(problems(run(13, 150, 'root'))).toEqual([])
    expect(run(12.9, 150, 'root').verdict).toBe('outside')
    expect(run(13, 150, 'fill').verdict).toBe('outside')
  })
  test('on thicker metal root layers go to 2t', () => {
    expect(finding(run(20, 150, 'root', 40), 'deposit-thickness', 'GTAW')).toMatchObject({ verdict: 'within' })
    expect(finding(run(20, 150, 'root', 41), 'deposit-thickness', 'GTAW')).toMatchObject({ verdict: 'outside' })
  })
  test('2t, not 2T, where a thin deposit of a thick coupon makes the root', () => {
    const tested = [coupon({ thickness: 30, processes: [['GTAW', 20]], number: 'PQR-G' }), coupon({ thickness: 50, number: 'PQR-S' })]
    const wps = (deposit: number, thickness: number): ReturnType<typeof procedure> => procedure({ thickness, processes: [['GTAW', deposit], ['SMAW', 40]], change: roots('root') })
    expect(finding(judge(wps(41, 150), tested), 'deposit-thickness', 'GTAW')).toMatchObject({ verdict: 'outside', })
    expect(finding(judge(wps(41, 60), tested), 'deposit-thickness', 'GTAW').verdict).toBe('within')
  })
  test('one coupon of two processes: T serves both, t is each its own', () => {
    const tested = coupon({ thickness: 25, processes: [['GTAW', 4], ['SMAW', 21]] })
    expect(problems(judge(procedure({ thickness: [5, 50], processes: [['GTAW', 8], ['SMAW', 50]] }), [tested]))).toEqual([])
    expect(finding(judge(procedure({ thickness: [5, 50], processes: [['GTAW', 8.1], ['SMAW', 50]] }), [tested]), 'deposit-thickness', 'GTAW').verdict).toBe('outside')
  })
})

describe('fillets', () => {
  const fillet = (pressure: boolean | null) => (v: WeldingVariables): void => { v.joint.weld = 'fillet'; v.joint.pressureRetaining = pressure }
  const run = (ofCoupon: 'groove' | 'fillet', pressure: boolean | null): string => judge(procedure({ thickness: 300, processes: [['SMAW', 50]], change: fillet(pressure) }), [coupon({ thickness: 6, change: (v) => (v.joint.weld = ofCoupon) })]).verdict
  test('a groove coupon covers every fillet, a fillet coupon those without pressure', () => expect([run('groove', true), run('groove', null), run('fillet', false), run('fillet', true), run('fillet', null)]).toEqual(['within', 'within', 'within', 'outside', 'cannot-tell']))
  test('a fillet coupon covers no groove', () => expect(finding(judge(procedure(), [coupon({ change: (v) => (v.joint.weld = 'fillet') })]), 'weld-kind').verdict).toBe('outside'))
})

describe('P-Numbers (QW-424.1)', () => {
  test.each([
    ['1', '1', ['P-1 to P-1'], 'read'],
    ['3', '3', ['P-3 to P-3', 'P-3 to P-1'], 'read'],
    ['5A', '5A', ['P-5A to P-5A', 'P-5A to P-4', 'P-5A to P-3', 'P-5A to P-1'], 'read'],
    ['15E', '15E', ['P-15E to P-15E', 'P-15E to P-5B', 'P-5B to P-5B'], 'read'],
    ['15E', '1', ['P-15E to P-1', 'P-5B to P-1'], 'read'],
    ['3', '5A', ['P-5A to P-4', 'P-5A to P-3', 'P-5A to P-1'], 'memory'],
    ['4', '1', ['P-4 to P-3', 'P-4 to P-1'], 'memory'],
    ['1', '8', ['P-8 to P-1'], 'read'],
    ['9A', '9A', ['P-9A to P-9A'], 'read'],
  ])('%s to %s', (a, b, pairs, basis) => expect(coveredPairs(a, b)).toEqual({ pairs, basis }))
  test('plasma: only melt-in covers downwards', () => {
    expect(coveredPairsPlasma('4', '4', true).pairs).toEqual(['P-4 to P-4', 'P-4 to P-3', 'P-4 to P-1'])
    expect(coveredPairsPlasma('4', '4', false).pairs).toEqual(['P-4 to P-4'])
    const run = (technique: 'melt-in' | 'keyhole' | null): string => finding(judge(procedure({ p: ['4', '1'], processes: [['PAW', 5]] }), [coupon({ p: ['4', '4'], processes: [['PAW', 20]], change: (v) => (v.processes[0]!.technique.keyhole = technique) })]), 'base-metal-p-number-plasma').verdict
    expect([run('melt-in'), run('keyhole'), run(null)]).toEqual(['within', 'outside', 'cannot-tell'])
  })
  test('a P-4 coupon covers neither P-3 nor P-1 to themselves', () => {
    const run = (a: string, b: string): string => finding(judge(procedure({ p: [a, b] }), [coupon({ p: ['4', '4'] })]), 'base-metal-p-number').verdict
    expect([run('1', '4'), run('3', '3'), run('3', '1'), run('1', '1')]).toEqual(['within', 'outside', 'outside', 'outside'])
  })
  test('however the number is written', () => expect(finding(judge(procedure({ p: ['P-1', 'p 1'] }), [coupon()]), 'base-metal-p-number').verdict).toBe('within'))
  test('a metal without P-Number covers itself and leaves the rest open', () => {
    const nameless = (uns: string | null) => (v: WeldingVariables): void => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { pNumber: null, uns, specification: null }) }
    const run = (ofCoupon: string | null, ofProcedure: string | null): string => finding(judge(procedure({ change: nameless(ofProcedure) }), [coupon({ change: nameless(ofCoupon) })]), 'base-metal-p-number').verdict
    expect([run('K91560', 'K91560'), run('K91560', 'K91561'), run(null, 'K91560'), run(null, null)]).toEqual(['within', 'cannot-tell', 'cannot-tell', 'cannot-tell'])
    expect(finding(judge(procedure(), [coupon({ change: nameless('K91560') })]), 'base-metal-p-number').verdict).toBe('cannot-tell')
  })
  test('the second metal left empty is the first again', () => {
    const same = (v: WeldingVariables): void => void Object.assign(v.baseMetals.b, { pNumber: null, uns: null, specification: null, grade: null })
    expect(finding(judge(procedure({ change: same }), [coupon()]), 'base-metal-p-number').verdict).toBe('within')
  })
})

describe('Group Numbers (QW-403.5)', () => {
  const groups = (a: number | null, b: number | null) => (v: WeldingVariables): void => { v.baseMetals.a.groupNumber = a; v.baseMetals.b.groupNumber = b }
  const run = (asked: [number | null, number | null], ...had: [number | null, number | null][]): string => finding(judge(procedure({ toughness: true, change: groups(...asked) }), had.map((g, i) => coupon({ toughness: true, number: `PQR-${i}`, change: groups(...g) }))), 'base-metal-group').verdict
  test('one coupon of two Groups covers each to itself and to the other', () => expect([run([1, 2], [2, 1]), run([1, 1], [1, 2]), run([2, 2], [1, 2]), run([3, 3], [1, 2])]).toEqual(['within', 'within', 'within', 'outside']))
  test('two records make the pair, one does not', () => expect([run([1, 2], [1, 1], [2, 2]), run([1, 2], [1, 1]), run([1, 3], [1, 1], [2, 2])]).toEqual(['within', 'outside', 'outside']))
  test('not recorded', () => expect([run([1, null], [1, 1]), run([1, 1], [null, 1])]).toEqual(['cannot-tell', 'cannot-tell']))
  test('two records lend the pair only if both cover the rest', () => {
    const records = [coupon({ toughness: true, change: groups(1, 1) }), coupon({ toughness: true, number: 'PQR-2', change: (v) => { groups(2, 2)(v); v.processes[0]!.filler.fNumber = '3' } })]
    expect(judge(procedure({ toughness: true, change: groups(1, 2) }), records).verdict).toBe('outside')
  })
  test('nonferrous metals go by UNS number', () => {
    const uns = (text: string | null) => (v: WeldingVariables): void => { v.baseMetals.a.uns = text; v.baseMetals.b.uns = text }
    const of = (asked: string | null, had: string | null): string => finding(judge(procedure({ toughness: true, p: ['43', '43'], change: uns(asked) }), [coupon({ toughness: true, p: ['43', '43'], change: uns(had) })]), 'base-metal-group').verdict
    expect([of('N06625', 'N06625'), of('N06625', 'N06600'), of(null, 'N06600')]).toEqual(['within', 'outside', 'cannot-tell'])
  })
})
