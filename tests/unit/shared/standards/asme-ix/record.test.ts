/** What a coupon's record says of itself: tension tests by sets, stress against load, run sheet against the recorded heat input. */
import { describe, expect, test } from 'vitest'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import type { Finding } from '@shared/schemas/assessment.ts'
import { runRowSchema, tensionTestSchema, type RunRow, type TensionTest, type WeldingVariables } from '@shared/schemas/welding.ts'
import { specimenRequirements } from '@shared/standards/asme-ix/specimens.ts'
import { stressDisagrees, tensionTests } from '@shared/standards/asme-ix/tension.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, procedure, type GivenCoupon } from '../builders.ts'

const strips = (...sizes: (number | null)[]): TensionTest[] => sizes.map((size, i) => tensionTestSchema.parse({ id: `t${i}`, specimen: `T${i + 1}`, width: quantity(19, 'length'), thickness: size === null ? null : quantity(size, 'length'), load: quantity(500 * 19 * (size ?? 10) / 1000, 'force'), fracture: 'base-metal' }))

describe('tension tests by sets (QW-151)', () => {
  test('two half-thickness specimens are one test, four are two', () => {
    expect(tensionTests(strips(19, 19), 40, 'SI')).toEqual({ tests: 1, left: [] })
    expect(tensionTests(strips(19, 19, 19, 19), 40, 'SI')).toEqual({ tests: 2, left: [] })
  })
  test('a set from which a further specimen could have been cut is none', () => expect(tensionTests(strips(15, 15), 60, 'SI')).toEqual({ tests: 0, left: ['T1', 'T2'] }))
  test('exactly half the thickness, twice', () => expect(tensionTests(strips(20, 20, 20), 40, 'SI')).toEqual({ tests: 1, left: ['T3'] }))
  test('up to 25 mm (1 in.) each specimen is a test; so is one of unknown size, and a turned one', () => {
    expect(tensionTests(strips(10, 10), 25, 'SI').tests).toBe(2)
    expect(tensionTests(strips(10, 10), 25.4, 'US').tests).toBe(0)
    expect(tensionTests(strips(10, 10), 1, 'US').tests).toBe(2)
    expect(tensionTests(strips(null, null), 40, 'SI').tests).toBe(2)
    expect(tensionTests(strips(10, 10).map((one) => ({ ...one, kind: 'turned' as const })), 40, 'SI').tests).toBe(2)
  })
  const row = (sizes: number[]): ReturnType<typeof specimenRequirements>[number] | undefined => specimenRequirements(coupon({ thickness: 40, content: (c) => (c.tension = strips(...sizes)) }))[0]
  test('the coupon is told how many count, and why', () => {
    expect(row([19, 19])).toMatchObject({ recorded: 1, required: 2, alternative: 'Specimens that together represent the thickness count as one.' })
    expect(row([19, 19, 19, 19])).toMatchObject({ recorded: 2 })
    expect(row([15])?.alternative).toContain('T1 is too thin to represent 40 mm')
    expect(row([39, 39])).toMatchObject({ recorded: 2, alternative: null })
    const missing = qualifyCoupon(coupon({ thickness: 40, content: (c) => (c.tension = strips(19, 19)) }), 'asme-ix', '2021').missing
    expect(missing).toMatchObject([{ field: 'tension', message: 'Tension specimens: 2 are required, 1 is recorded. Specimens that together represent the thickness count as one.' }])
  })
})

describe('reported stress against load and area (QW-152)', () => {
  const [strip] = strips(20)
  const reported = (mpa: number): TensionTest => ({ ...strip!, reportedStrength: quantity(mpa, 'stress') })
  test('1 % is rounding, more is a contradiction', () => {
    expect(stressDisagrees(reported(505))).toBeNull()
    expect(stressDisagrees(reported(495))).toBeNull()
    expect(stressDisagrees(reported(505.1))).toEqual({ computed: 500, reported: 505.1 })
    expect(stressDisagrees(strip!)).toBeNull()
    expect(stressDisagrees({ ...reported(700), load: null })).toBeNull()
  })
  test('it stands in the way of certifying', () => {
    const found = qualifyCoupon(coupon({ content: (c) => (c.tension[0] = reported(530)) }), 'asme-ix', '2021')
    expect(found.readyToCertify).toBe(false)
    expect(found.missing).toMatchObject([{ field: 'tension.0.reportedStrength', clause: 'QW-152', message: 'T1: load and area give 500 MPa, but 530 MPa is reported. Check the load, the size and the report.' }])
  })
})

describe('recorded heat input against the run sheet (QW-409.1)', () => {
  // 25 V and 180 A: 270 mm/min gives 1 kJ/mm.
  const row = (perMinute: number | null, id = 'r'): RunRow => runRowSchema.parse({ id, processId: 'SMAW', pass: id, voltage: interval(25, undefined, 'voltage'), current: interval(180, undefined, 'current'), travelSpeed: perMinute === null ? null : interval(perMinute, undefined, 'travelSpeed') })
  const tested = (stated: number, ...rows: RunRow[]): GivenCoupon => ({ toughness: true, change: (v: WeldingVariables) => (v.processes[0]!.electrical.heatInput = interval(null, stated, 'heatInput')), content: (c) => (c.runSheet = rows) })
  const run = (asked: number, given: GivenCoupon): Finding => finding(judge(procedure({ toughness: true, change: (v) => (v.processes[0]!.electrical.heatInput = interval(null, asked, 'heatInput')) }), [coupon(given)]), 'heat-input')
  test('a record above its run sheet supports only what the run sheet gives, and says so', () => {
    expect(run(1, tested(1.9, row(270))).verdict).toBe('within')
    const found = run(1.5, tested(1.9, row(270)))
    expect(found).toMatchObject({ verdict: 'outside', tested: [1] })
    expect(found.sentence).toContain('PQR-001 records a heat input of 1.9 kJ/mm, but the readings of its run sheet give 1 kJ/mm at most; the lower counts')
    expect(found.reasoning.join(' ')).toContain('the lower counts')
  })
  test('a record below its run sheet stands, and the difference is named', () => {
    const found = run(1.2, tested(1.2, row(135)))
    expect(found).toMatchObject({ verdict: 'within', tested: [1.2] })
    expect(found.sentence).toContain('give 2 kJ/mm')
    expect(run(1.3, tested(1.2, row(135))).verdict).toBe('outside')
  })
  test('2 % is rounding', () => {
    expect(run(1.02, tested(1.02, row(270)))).toMatchObject({ verdict: 'within', tested: [1.02] })
    expect(run(1.03, tested(1.03, row(270))).verdict).toBe('outside')
    expect(run(1, tested(0.98, row(270))).sentence).not.toContain('run sheet')
  })
  test('a row without readings may have been the hottest, so nothing is contradicted', () => expect(run(1.9, tested(1.9, row(270), row(null, '2')))).toMatchObject({ verdict: 'within', tested: [1.9] }))
  test('a contradiction that is spread shows both ends', () => {
    const spread: RunRow = { ...row(270), current: interval(170, 190, 'current') }
    expect(run(1.05, tested(1.9, spread))).toMatchObject({ verdict: 'cannot-tell' })
    expect(run(1.05, tested(1.9, spread)).sentence).toContain('give 1 kJ/mm to 1.0556 kJ/mm at most')
  })
  test('it stands in the way of certifying', () => {
    expect(qualifyCoupon(coupon(tested(1.9, row(270))), 'asme-ix', '2021').missing).toMatchObject([{ field: 'variables.processes.0.electrical.heatInput', clause: 'QW-409.1' }])
    expect(qualifyCoupon(coupon(tested(1, row(270))), 'asme-ix', '2021').missing).toEqual([])
  })
})
