/** What the joint as a whole asks: deposits that fill it, passes, root layers on thicker metal, wire and flux classes, weld metal. */
import { describe, expect, test } from 'vitest'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import { outerEnds } from '@shared/ranges/numeric.ts'
import type { Finding, NumericRange } from '@shared/schemas/assessment.ts'
import { runRowSchema, type ProcessBlock, type RunRow, type WeldingVariables } from '@shared/schemas/welding.ts'
import { indicatorSystem } from '@shared/standards/asme-ix/rules/flux-wire-class.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, problems, procedure, type Given, type GivenCoupon } from '../builders.ts'

type Change = (variables: WeldingVariables) => void
const first = (variables: WeldingVariables): ProcessBlock => variables.processes[0]!
const mm = (value: number): ReturnType<typeof interval> => interval(value, undefined, 'length')
const top = (found: Finding): unknown => (found.range?.type === 'numeric' && found.range.segments.length > 0 ? outerEnds(found.range).upper : null)

describe('deposits fill a full-penetration groove (QW-202.2, QW-200.4)', () => {
  const tested = [coupon({ thickness: 25, processes: [['GTAW', 5], ['SMAW', 20]] })]
  const run = (gtaw: number | null, smaw: number | null, thickness: Given['thickness'] = 40, change?: Change): Finding | undefined =>
    judge(procedure({ thickness, processes: [['GTAW', gtaw], ['SMAW', smaw]], change }), tested).findings.find(({ ruleId }) => ruleId === 'asme-ix/joint-filled')
  test('10 and 30 mm fill 40 mm; 10 and 29.9 mm do not, and the sentence says how much is filled', () => {
    expect(run(10, 30)?.verdict).toBe('within')
    expect(run(10, 29.9)).toMatchObject({ verdict: 'cannot-tell', class: 'essential', clause: 'QW-202.2', basis: 'memory', asked: { min: 0, max: 40 }, sentence: "The deposits of GTAW and SMAW together come to 39.9 mm at most, so how a joint of 40 mm is filled with full penetration can't be told." })
    expect(run(10, 29.9)?.missing).toEqual(['procedure: processes.0.depositThickness (enough to fill the joint)', 'procedure: processes.1.depositThickness (enough to fill the joint)'])
  })
  test('it blocks, although every process stays inside its own limits', () => {
    const assessment = judge(procedure({ thickness: [5, 50], processes: [['GTAW', 10], ['SMAW', 30]] }), tested)
    expect(assessment.verdict).toBe('cannot-tell')
    expect(problems(assessment)).toHaveLength(1)
  })
  test('limiting the thickness cures it', () => {
    const fix = run(10, 20, [5, 50])?.fixes[0]
    expect(fix).toMatchObject({ kind: 'set', field: 'thickness.max', value: quantity(30, 'length') })
    expect(run(10, 20, [5, 30])?.verdict).toBe('within')
  })
  test('a deposit that is not stated', () => {
    expect(run(null, 20)).toMatchObject({ verdict: 'cannot-tell', missing: ['procedure: processes.0.depositThickness'] })
    expect(run(null, 20)?.sentence).toContain('the deposit of GTAW')
    // What the other fills alone needs no figure.
    expect(run(null, 40)?.verdict).toBe('within')
  })
  test('a joint that says that it is no repair must be filled as any other', () => {
    expect(run(10, 29.9, 40, (v) => (v.joint.work = null))?.verdict).toBe('cannot-tell')
  })
  test('the fixes of two deposits name their processes', () => {
    expect(run(null, null)?.fixes.map(({ label }) => label)).toEqual(['State the deposit thickness of GTAW', 'State the deposit thickness of SMAW'])
  })
  test('every thickness is filled only by a deposit without limit', () => {
    const all = (v: WeldingVariables): void => void (v.thickness = { min: null, max: null, all: true })
    expect(run(10, 30, 40, all)?.sentence).toContain('joints of every thickness')
    expect(run(10, 30, 40, (v) => { all(v); first(v).depositThickness = { min: null, max: null, all: true } })?.verdict).toBe('within')
  })
  test('of two members the thinner is what must be filled', () => {
    expect(run(5, 5, 10, (v) => (v.thicknessB = mm(40)))?.verdict).toBe('within')
    const thin = run(5, 4, 40, (v) => (v.thicknessB = mm(10)))
    expect(thin?.verdict).toBe('cannot-tell')
    expect(thin?.fixes.map(({ kind }) => kind)).toEqual(['state', 'state'])
    expect(run(5, 4, 40, (v) => (v.thicknessB = interval(12, 10, 'length')))).toBeUndefined()
  })
  test.each<[string, Change]>([
    ['partial penetration', (v) => (v.joint.penetration = 'partial')],
    ['a fillet', (v) => (v.joint.weld = 'fillet')],
    ['a repair', (v) => (v.joint.work = 'repair')],
    ['an autogenous pass', (v) => (first(v).filler.added = false)],
    ['a thickness that is not stated', (v) => (v.thickness = null)],
  ])('%s need not be filled so', (_name, change) => expect(run(2, 2, 40, change)).toBeUndefined())
})

describe('the gauge of pass thickness shows pass thickness (QW-403.9)', () => {
  const pass = (value: number | null): Change => (v) => void (first(v).maxPassThickness = value === null ? null : quantity(value, 'length'))
  const run = (ofCoupon: number | null, ofProcedure: number | null, thickness: number, more: Given = {}): Finding =>
    finding(judge(procedure({ ...more, thickness, change: pass(ofProcedure) }), [coupon({ ...more, thickness: 20, change: pass(ofCoupon) })]), 'pass-thickness')
  test('above 1.1T: up to 13 mm', () => {
    const found = run(6, 8, 30)
    expect(found).toMatchObject({ verdict: 'within', asked: { min: 0, max: 8 }, tested: [6] })
    expect(top(found)).toEqual({ kind: 'closed', value: 13 })
    expect(run(6, 13, 30).verdict).toBe('within')
    expect(run(6, 13.1, 30)).toMatchObject({ verdict: 'outside', asked: { min: 0, max: 13.1 }, fixes: [{ kind: 'set', field: 'processes.0.maxPassThickness', value: quantity(13, 'length') }, { kind: 'plan-coupon' }] })
  })
  test('up to 1.1T: any pass', () => {
    const found = run(14, 20, 22)
    expect(found.verdict).toBe('within')
    expect(top(found)).toEqual({ kind: 'unlimited' })
    expect(run(null, null, 22).verdict).toBe('within')
  })
  test('a thick pass of the coupon can not be mended by thinner passes', () => {
    const found = run(14, 3, 22.1)
    expect(found).toMatchObject({ verdict: 'outside', range: { segments: [] }, fixes: [{ kind: 'plan-coupon' }] })
    expect(found.sentence).toContain('however thin the passes are')
  })
  test('not stated, or the base metal not stated', () => {
    expect(run(6, null, 30)).toMatchObject({ verdict: 'cannot-tell', missing: ['procedure: processes.0.maxPassThickness'], fixes: [{ kind: 'set' }, { kind: 'state' }] })
    expect(run(null, 6, 30)).toMatchObject({ verdict: 'cannot-tell', missing: ['PQR-001: maxPassThickness'] })
    const open = (ofCoupon: number, ofProcedure: number): Finding => finding(judge(procedure({ change: (v) => { v.thickness = null; pass(ofProcedure)(v) } }), [coupon({ change: pass(ofCoupon) })]), 'pass-thickness')
    expect(open(6, 14)).toMatchObject({ verdict: 'cannot-tell', missing: ['procedure: thickness'], field: 'thickness' })
    expect(open(14, 6)).toMatchObject({ verdict: 'cannot-tell', missing: ['procedure: thickness'] })
    expect(open(6, 6).verdict).toBe('within')
  })
  test('1/2 in. in customary units', () => {
    const us = (size: number): Finding => finding(judge(procedure({ system: 'US', thickness: 1.5, change: (v) => (first(v).maxPassThickness = quantity(size, 'length', 'in')) }), [coupon({ system: 'US', thickness: 0.75 })]), 'pass-thickness')
    expect([us(0.5).verdict, us(0.51).verdict]).toEqual(['within', 'outside'])
  })
  test('a coupon by itself: 13 mm, or any on thin metal', () => {
    const range = (value: number): NumericRange => qualifyCoupon(coupon({ change: pass(value) }), 'asme-ix', '2021').ranges.find(({ ruleId }) => ruleId === 'asme-ix/pass-thickness')?.range as NumericRange
    expect([outerEnds(range(6)).upper, outerEnds(range(14)).upper]).toEqual([{ kind: 'closed', value: 13 }, { kind: 'unlimited' }])
  })
})

describe('root layers on thicker metal (QW-200.4(b))', () => {
  const roots: Change = (v) => (first(v).passes = [{ number: '1', layer: 'root', fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }])
  const run = (thickness: number, pass: number | null, more: GivenCoupon[] = []): Finding => {
    const fill = coupon({ thickness: 30, number: 'PQR-S', change: (v) => (first(v).maxPassThickness = pass === null ? null : quantity(pass, 'length')) })
    return finding(judge(procedure({ thickness, processes: [['GTAW', 4], ['SMAW', thickness]], change: roots }), [coupon({ thickness: 13, processes: [['GTAW', 13]], number: 'PQR-G' }), fill, ...more.map(coupon)]), 'base-metal-thickness', 'GTAW')
  }
  test('a pass thickness that the thicker record lacks leaves it open, not outside', () => {
    expect(run(60, 6).verdict).toBe('within')
    expect(run(60, null)).toMatchObject({ verdict: 'cannot-tell', missing: ['PQR-S: maxPassThickness'] })
    expect(run(60, null).sentence).toContain('PQR-S does not record the pass thickness maximum')
  })
  test('up to 1.1T of the thicker record it is sure whatever the passes were', () => {
    expect(run(33, null).verdict).toBe('within')
    expect(run(33, 20).verdict).toBe('within')
    expect(run(33.1, 20).verdict).toBe('outside')
  })
  test('another record that is complete makes it sure', () => expect(run(60, null, [{ thickness: 30, number: 'PQR-T' }]).verdict).toBe('within'))
})

describe('flux-wire classes of two systems (QW-404.9, QW-404.35)', () => {
  const run = (rule: string, ofProcedure: string, ofCoupon: string): Finding => {
    const given: Given = { toughness: true, processes: [['SAW', 20]] }
    const flux = (text: string): Change => (v) => (first(v).filler.fluxClassification = text)
    return finding(judge(procedure({ ...given, change: flux(ofProcedure) }), [coupon({ ...given, change: flux(ofCoupon) })]), rule)
  }
  test.each(['flux-wire-class', 'flux-wire-classification'])('%s: metric against customary can not be told', (rule) => {
    expect(run(rule, 'F48A2-EM12K', 'F7A2-EM12K').verdict).toBe('cannot-tell')
    expect(run(rule, 'F7A2-EM12K', 'F48A2-EM12K').sentence).toContain("can't be compared")
    expect(run(rule, 'F48A2-EM12K', 'F48A2-EM12K').verdict).toBe('within')
    expect(run(rule, 'F48A2-EM12K', 'F55A2-EM12K').verdict).toBe('outside')
    expect(run(rule, 'F8A2-EM12K', 'F7A2-EM12K').verdict).toBe('outside')
  })
  test('F11 is tens of ksi, F43 tens of MPa', () => expect(['F7A2', 'F11A2', 'F43A2', 'S384AB'].map(indicatorSystem)).toEqual(['customary class', 'customary class', 'metric class', 'class of another kind']))
})

describe('weld metal volume in place of heat input (QW-409.1(b))', () => {
  const feeds = (feed: ReturnType<typeof interval> | null, speed: ReturnType<typeof interval> | null, size = 1.2): Change => (v) => {
    Object.assign(first(v).electrical, { heatInputMethod: 'volume', wireFeed: feed, travelSpeed: speed })
    first(v).filler.diameters = [quantity(size, 'length')]
  }
  const feed = (a: number, b?: number): ReturnType<typeof interval> => interval(a, b ?? a, 'wireFeed')
  const speed = (a: number, b?: number): ReturnType<typeof interval> => interval(a, b ?? a, 'travelSpeed')
  const run = (ofProcedure: Change, ofCoupon: Change, more: Partial<GivenCoupon> = {}): Finding => {
    const given: Given = { toughness: true, processes: more.processes ?? [['GMAW', 20]] }
    return finding(judge(procedure({ ...given, change: ofProcedure }), [coupon({ ...given, ...more, change: ofCoupon })]), 'heat-input')
  }
  test('more wire for the same length of weld is outside, as much is within', () => {
    // 8 m/min at 400 mm/min is 20 mm of wire for each mm of weld.
    expect(run(feeds(feed(8), speed(400)), feeds(feed(8), speed(400)))).toMatchObject({ verdict: 'within', basis: 'memory', tested: [20], asked: { min: 0, max: 20 } })
    expect(run(feeds(feed(8), speed(390)), feeds(feed(8), speed(400)))).toMatchObject({ verdict: 'outside', fixes: [{ kind: 'plan-coupon' }] })
    expect(run(feeds(feed(4), speed(400)), feeds(feed(8), speed(400))).verdict).toBe('within')
  })
  test('the worst pass of the procedure counts', () => {
    const passes: Change = (v) => { feeds(feed(8), speed(400))(v); first(v).passes = [{ number: '1', layer: null, fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }, { number: '2', layer: 'fill', fillerDiameter: null, current: null, voltage: null, wireFeed: feed(10), travelSpeed: null }] }
    expect(run(passes, feeds(feed(8), speed(400)))).toMatchObject({ verdict: 'outside', asked: { max: 25 } })
    const open: Change = (v) => { passes(v); first(v).electrical.travelSpeed = null }
    expect(run(open, feeds(feed(8), speed(400)))).toMatchObject({ verdict: 'cannot-tell' })
  })
  test('the largest row of the run sheet counts for the coupon', () => {
    const row = (a: number, b: number, id: string): RunRow => runRowSchema.parse({ id, processId: 'GMAW', pass: id, wireFeed: feed(a), travelSpeed: speed(b) })
    expect(run(feeds(feed(9), speed(400)), feeds(feed(8), speed(400)), { content: (c) => (c.runSheet = [row(8, 400, '1'), row(9, 400, '2')]) })).toMatchObject({ verdict: 'within', tested: [22.5] })
  })
  test('spread readings are sure only up to their middle', () => {
    const spread = feeds(feed(8), speed(360, 440))
    expect(run(feeds(feed(8), speed(400)), spread).verdict).toBe('within')
    expect(run(feeds(feed(8), speed(380)), spread)).toMatchObject({ verdict: 'cannot-tell', missing: ['PQR-001: electrical.wireFeed (as one figure)'] })
  })
  test.each<[string, Change, Change, Partial<GivenCoupon>]>([
    ['another size of wire', feeds(feed(8), speed(400)), feeds(feed(8), speed(400), 1.6), {}],
    ['another form of wire', (v) => { feeds(feed(8), speed(400))(v); first(v).filler.productForm = 'metal-cored' }, feeds(feed(8), speed(400)), {}],
    ['supplemental filler', feeds(feed(8), speed(400)), (v) => { feeds(feed(8), speed(400))(v); first(v).filler.supplemental = true }, {}],
    ['a process without wire feed', feeds(null, speed(400)), feeds(null, speed(400)), { processes: [['SMAW', 20]] }],
    ['wire feed not recorded', feeds(feed(8), speed(400)), feeds(null, speed(400)), {}],
    ['travel speed of nought', feeds(feed(8), speed(400)), feeds(feed(8), speed(0)), {}],
    ['wire feed not stated', feeds(null, null), feeds(feed(8), speed(400)), {}],
  ])('%s can not be told', (_name, ofProcedure, ofCoupon, more) => {
    const found = run(ofProcedure, ofCoupon, more)
    expect(found.verdict).toBe('cannot-tell')
    expect(found.missing.length).toBeGreaterThan(0)
  })
  test('heat treatment lifts it, as it lifts heat input', () => {
    const hot: Change = (v) => { feeds(feed(8), speed(400))(v); v.pwht.condition = 'above-upper-transformation' }
    expect(run(feeds(feed(20), speed(100)), hot).verdict).toBe('within')
  })
  test('a coupon by volume does not support a procedure by energy', () => expect(run((v) => (first(v).electrical.heatInputMethod = 'meter'), feeds(feed(8), speed(400)))).toMatchObject({ verdict: 'cannot-tell' }))
})
