/** A cure must cure: set fixes applied to the draft leave the finding no longer outside, and a wider coupon never loses. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Finding } from '@shared/schemas/assessment.ts'
import type { ProcedureContent, WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, first, judge, pair, procedure, type Arc } from './records.ts'

type Change = (v: WeldingVariables) => void

/** The draft with every set fix of a finding applied. */
function cured(wps: ProcedureContent, { fixes }: Finding): ProcedureContent {
  const copy = structuredClone(wps)
  for (const fix of fixes) {
    if (fix.kind !== 'set') continue
    const path = fix.field.split('.')
    const last = path.pop() ?? ''
    const parent = path.reduce<Record<string, unknown>>((at, key) => at[key] as Record<string, unknown>, copy.variables as unknown as Record<string, unknown>)
    parent[last] = structuredClone(fix.value)
  }
  return copy
}

const ARCS: readonly Arc[] = ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW']
const number = (min: number, max: number) => fc.integer({ min: min * 10, max: max * 10 }).map((tenths) => tenths / 10)
const span = (low: number, high: number) => fc.tuple(number(low, high), number(low, high)).map(([a, b]) => [Math.min(a, b), Math.max(a, b)] as const)

/** Drafts that stray in one or several figures at once; the coupon stays as it is. */
const stray: fc.Arbitrary<Change> = fc
  .record({
    thickness: fc.option(span(2, 90)), second: fc.option(span(2, 90)), current: fc.option(span(60, 500)), pass: fc.option(span(60, 500)), voltage: fc.option(span(10, 50)), wireFeed: fc.option(span(2, 20)), travelSpeed: fc.option(span(50, 900)), flow: fc.option(span(2, 60)),
    opening: fc.option(span(0, 12)), face: fc.option(span(0, 9)), angle: fc.option(span(10, 90)), preheat: fc.option(number(-20, 200)), interpass: fc.option(number(50, 400)), heat: fc.option(number(0.2, 5)), diameter: fc.option(number(1, 8)), deposit: fc.option(span(1, 60)), leg: fc.option(span(1, 25)),
    current_: fc.option(fc.constantFrom('AC' as const, 'DCEN' as const)), transfer: fc.option(fc.constantFrom('short-circuiting' as const, 'globular' as const, 'pulsed-spray' as const)), partial: fc.boolean(),
  })
  .map((given): Change => (v) => {
    const block = first(v)
    const { electrical } = block
    const set = (pair: readonly [number, number] | null, dimension: Parameters<typeof interval>[2], put: (value: ReturnType<typeof interval>) => void): void => { if (pair) put(interval(pair[0], pair[1], dimension)) }
    set(given.thickness, 'length', (value) => { v.thickness = value })
    set(given.second, 'length', (value) => { v.thicknessB = value })
    set(given.current, 'current', (value) => { electrical.current = value })
    set(given.pass, 'current', (value) => { block.passes = [{ number: '1', layer: 'fill', fillerDiameter: null, current: value, voltage: null, wireFeed: null, travelSpeed: null }] })
    set(given.voltage, 'voltage', (value) => { electrical.voltage = value })
    set(given.wireFeed, 'wireFeed', (value) => { electrical.wireFeed = value })
    set(given.travelSpeed, 'travelSpeed', (value) => { electrical.travelSpeed = value })
    set(given.flow, 'gasFlow', (value) => { if (block.shieldingGas) block.shieldingGas.flow = value })
    set(given.opening, 'length', (value) => { v.joint.rootOpening = value })
    set(given.face, 'length', (value) => { v.joint.rootFace = value })
    set(given.angle, 'angle', (value) => { v.joint.includedAngle = value })
    set(given.deposit, 'length', (value) => { block.depositThickness = value })
    if (given.leg) { Object.assign(v.joint, { weld: 'fillet', type: 'tee', groove: null, filletLeg: interval(given.leg[0], given.leg[1], 'length') }); block.positions = ['2F']; block.technique.passesPerSide = 'single' }
    if (given.partial) v.joint.penetration = 'partial'
    if (given.preheat !== null) v.preheat.minimum = quantity(given.preheat, 'temperature')
    if (given.interpass !== null) v.preheat.interpassMaximum = quantity(given.interpass, 'temperature')
    if (given.heat !== null) electrical.heatInput = interval(null, given.heat, 'heatInput')
    if (given.diameter !== null) block.filler.diameters = [quantity(given.diameter, 'length')]
    if (given.current_) electrical.currentType = given.current_
    if (given.transfer && block.process === 'GMAW') electrical.transferMode = given.transfer
  })

describe('cures', () => {
  test.each(['test', 'prequalified'] as const)('what the set fixes give is no longer outside: %s', (route) => {
    let offered = 0
    fc.assert(fc.property(fc.constantFrom(...ARCS), fc.constantFrom<'SI' | 'US'>('SI', 'US'), stray, (process, system, change) => {
      const given = { processes: [process], system, toughness: true }
      const tested = coupon(given)
      const wps = procedure({ ...given, change })
      for (const found of judge(wps, [tested], '2020', route).findings) {
        if (found.verdict !== 'outside' || !found.fixes.some(({ kind }) => kind === 'set')) continue
        offered += 1
        const after = judge(cured(wps, found), [tested], '2020', route).findings.find(({ ruleId, processId }) => ruleId === found.ruleId && processId === found.processId)
        expect(after?.verdict === 'outside' ? `${found.ruleId}: ${found.sentence} → ${after.sentence} (${JSON.stringify(found.fixes)})` : 'cured').toBe('cured')
      }
    }), { numRuns: 150 })
    expect(offered).toBeGreaterThan(50)
  }, 120_000)
})

describe('a wider coupon', () => {
  test.each([
    ['thickness', 'thickness', (v: WeldingVariables, x: number) => { v.thickness = interval(x, undefined, 'length') }, 3, 120],
    ['diameter of a large pipe', 'filler-diameter', (v: WeldingVariables, x: number) => { first(v).filler.diameters = [quantity(x, 'length')] }, 1, 8],
  ] as const)('of more %s never turns within into outside above it', (_name, rule, put, low, high) => {
    fc.assert(fc.property(number(low, high), number(low, high), number(low, high), (a, b, asked) => {
      const of = (x: number) => finding(pair({ positions: ['1G'] }, (v) => put(v, x), (v) => put(v, asked)), rule).verdict
      expect(of(Math.min(a, b)) === 'within' && of(Math.max(a, b)) === 'outside').toBe(false)
    }), { numRuns: 80 })
  })
  test('lower preheat and higher interpass of the test never lose', () => {
    const degrees = fc.integer({ min: 0, max: 300 })
    fc.assert(fc.property(degrees, degrees, degrees, (a, b, asked) => {
      const preheat = (x: number) => finding(pair({}, (v) => { v.preheat.minimum = quantity(x, 'temperature') }, (v) => { v.preheat.minimum = quantity(asked, 'temperature') }), 'preheat').verdict
      const interpass = (x: number) => finding(pair({ toughness: true }, (v) => { v.preheat.interpassMaximum = quantity(x, 'temperature') }, (v) => { v.preheat.interpassMaximum = quantity(asked, 'temperature') }), 'cvn-interpass').verdict
      expect(preheat(Math.max(a, b)) === 'within' && preheat(Math.min(a, b)) === 'outside').toBe(false)
      expect(interpass(Math.min(a, b)) === 'within' && interpass(Math.max(a, b)) === 'outside').toBe(false)
    }), { numRuns: 80 })
  })
})

describe('the unit in which a figure was typed', () => {
  test('never changes a verdict at the boundary', () => {
    const inch = (rule: string, tested: Change, put: (v: WeldingVariables, value: number, unit: string) => void, value: number): void => {
      const [inches, metric] = [[value, 'in'], [value * 25.4, 'mm']].map(([figure, unit]) => finding(pair({ system: 'US' }, tested, (v) => put(v, Number(figure), String(unit))), rule).verdict)
      expect(metric, `${rule} ${value}`).toBe(inches)
    }
    for (const value of [0.125, 0.375, 0.5, 0.75, 1, 1.5, 1.501]) inch('thickness', (v) => { v.thickness = interval(0.75, undefined, 'length', 'in') }, (v, x, unit) => { v.thickness = interval(x, undefined, 'length', unit) }, value)
    for (const value of [0.1875, 0.186, 0.25]) inch('root-opening', () => undefined, (v, x, unit) => { v.joint.rootOpening = interval(x, undefined, 'length', unit) }, value)
    const heat = (unit: string, value: number) => finding(pair({ system: 'US' }, (v) => { v.preheat.minimum = quantity(200, 'temperature', '°F') }, (v) => { v.preheat.minimum = quantity(value, 'temperature', unit) }), 'preheat').verdict
    expect([heat('°F', 175), heat('°C', (175 - 32) / 1.8)]).toEqual(['within', 'within'])
  })
})
