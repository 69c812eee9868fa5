/** What is remembered of rules never shows: every assessment is as one of coupons that the engine has not met. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { assess, type AssessInput } from '@shared/assessment/assess.ts'
import { markAt, newPaths, pathsRead, readsOf, traceOf } from '@shared/assessment/reads.ts'
import { isWorthNoting, keep, lasting, newRemembered, recall } from '@shared/assessment/remembered.ts'
import type { AssessedCoupon } from '@shared/schemas/assessment.ts'
import type { ProcedureContent, WeldingVariables } from '@shared/schemas/welding.ts'
import type { RuleContext } from '@shared/standards/rule.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, procedure } from '../standards/builders.ts'
import * as structural from '../standards/aws-d1-1/records.ts'
import * as iso from '../standards/iso-15614-1/builders.ts'

type Edit = (variables: WeldingVariables) => void
const edits: readonly Edit[] = [
  ...[6, 12, 20, 45].map((size): Edit => (v) => void (v.thickness = interval(size, undefined, 'length'))),
  ...[5, 18, 60].map((size): Edit => (v) => v.processes.forEach((block) => void (block.depositThickness = interval(null, size, 'length')))),
  ...[null, 10, 90].map((degrees): Edit => (v) => void (v.preheat.minimum = degrees === null ? null : quantity(degrees, 'temperature'))),
  ...[180, 320].map((degrees): Edit => (v) => void (v.preheat.interpassMaximum = quantity(degrees, 'temperature'))),
  ...[0.5, 1.1, 3].map((most): Edit => (v) => v.processes.forEach(({ electrical }) => void (electrical.heatInput = interval(null, most, 'heatInput')))),
  ...['4', null].map((fNumber): Edit => (v) => v.processes.forEach(({ filler }) => void (filler.fNumber = fNumber))),
  (v) => void (v.joint.weld = 'fillet'),
  (v) => void (v.toughnessRequired = v.toughnessRequired === true ? null : true),
  (v) => void (v.unitSystem = v.unitSystem === 'SI' ? 'US' : 'SI'),
  (v) => void (v.thicknessB = interval(50, undefined, 'length')),
  (v) => v.processes.forEach((block, i) => void (block.id = `renamed ${i}`)),
  (v) => v.processes.forEach((block) => void (block.positions = ['3G', '2F'])),
  (v) => v.processes.forEach((block) => void (block.shieldingGas = null)),
  (v) => Object.assign(v.baseMetals.b, { pNumber: '8', iso15608: '8.1', d11Group: null }),
  (v) => Object.assign(v.baseMetals, { b: v.baseMetals.a }),
  (v) => Object.assign(v.baseMetals.a, { pNumber: null, iso15608: null }),
]

interface Scene { procedure: ProcedureContent; coupons: readonly AssessedCoupon[]; standard: AssessInput['standard']; edition: string; level?: '2' }
const scenes: readonly Scene[] = [
  { procedure: procedure({ toughness: true, processes: [['GTAW', 4], ['SMAW', 12]] }), coupons: [coupon({ toughness: true, processes: [['GTAW', 4], ['SMAW', 12]] }), coupon({ number: 'PQR-2', thickness: 25, processes: [['SMAW', 25]] })], standard: 'asme-ix', edition: '2021' },
  { procedure: structural.procedure({ processes: ['GMAW'] }), coupons: [structural.coupon({ processes: ['GMAW'] }), structural.coupon({ processes: ['GMAW'], number: 'PQR-2', thickness: 30 })], standard: 'aws-d1-1', edition: '2020' },
  { procedure: iso.procedure({ impact: true, processes: [['GMAW', 12]] }), coupons: [iso.coupon({ impact: true, processes: [['GMAW', 12]] }), iso.coupon({ number: 'WPQR-2', thickness: 20, processes: [['GMAW', 20]] })], standard: 'iso-15614-1', edition: iso.EDITION, level: '2' },
]

const edited = (given: ProcedureContent, list: readonly Edit[]): ProcedureContent => {
  const content = structuredClone(given)
  for (const edit of list) edit(content.variables)
  return content
}

describe('a procedure that is edited', () => {
  test.each(scenes)('$standard: is judged as if nothing were remembered', ({ procedure: start, coupons, ...by }) => {
    const verdicts = new Set<string>()
    fc.assert(fc.property(fc.array(fc.constantFrom(...edits), { maxLength: 4 }), fc.boolean(), (list, offers) => {
      const asked = edited(start, list)
      const others = offers ? [coupons[1]!] : []
      const linked = offers ? coupons.slice(0, 1) : coupons
      const known = assess({ ...by, procedure: asked, coupons: linked, otherCoupons: others })
      const anew = assess({ ...by, procedure: asked, coupons: structuredClone(linked), otherCoupons: structuredClone(others) })
      expect(known).toEqual(anew)
      for (const { verdict } of known.findings) verdicts.add(verdict)
    }), { numRuns: 150 })
    expect(verdicts).toEqual(new Set(['within', 'outside', 'cannot-tell']))
  })
  test('a record that can not be changed is judged alike', () => {
    const [{ coupons, ...by }] = scenes as [Scene]
    const freeze = (value: unknown): void => { if (typeof value === 'object' && value !== null) Object.values(Object.freeze(value)).forEach(freeze) }
    const frozen = structuredClone(by.procedure)
    freeze(frozen)
    const all = Array.from({ length: 20 }, () => assess({ ...by, coupons, procedure: frozen }))
    for (const one of all) expect(one).toEqual(assess({ ...by, coupons: structuredClone(coupons) }))
  })
  test('a record edited in place between two runs is judged as it stands', () => {
    const [{ coupons, ...by }] = scenes as [Scene]
    const own = structuredClone(by.procedure)
    for (let run = 0; run < 20; run += 1) assess({ ...by, coupons, procedure: own })
    own.variables.thickness = interval(400, undefined, 'length')
    expect(assess({ ...by, coupons, procedure: own })).toEqual(assess({ ...by, coupons: structuredClone(coupons), procedure: own }))
  })
})

const contextOf = (variables: WeldingVariables): RuleContext => ({ edition: '2021', level: null, system: 'SI', toughness: null, procedure: variables, block: variables.processes[0] ?? null, coupons: [], path: 'processes.0' })

describe('what a rule reads', () => {
  const { variables } = procedure()
  const traced = (read: (context: RuleContext) => unknown): unknown[] | null => {
    const reads = readsOf(newPaths(), variables)
    const { trace, context } = traceOf(reads, contextOf(variables))
    return pathsRead(trace, read(context))?.map((path) => markAt(reads, path)) ?? null
  }
  test('is noted value by value, each once, by the block and by the weld', () => {
    expect(traced(({ block, procedure: { processes, toughnessRequired } }) => [block?.process, processes[0]?.process, toughnessRequired])).toEqual([variables.toughnessRequired, 'SMAW'])
  })
  test('holds how many there are of what is gone through', () => {
    expect(traced(({ procedure: { processes } }) => processes.map(({ id }) => id))).toEqual([1, variables.processes[0]?.id])
  })
  test('holds which keys there are of what is copied', () => {
    const marks = traced(({ procedure: { preheat } }) => Object.keys({ ...preheat }).length)
    expect(marks).toContain(Object.keys(variables.preheat).join())
  })
  test('can not be told again where the answer holds a part of the procedure', () => {
    expect(traced(({ procedure: { thickness } }) => ({ asked: [thickness] }))).toBeNull()
    expect(traced(({ block }) => block)).toBeNull()
    expect(traced(({ procedure: { thickness } }) => ({ asked: [thickness?.max?.si] }))).not.toBeNull()
  })
  test('can not be told again where the rule tried to change it', () => {
    expect(traced((context) => { try { context.procedure.product = 'pipe' } catch { return 'refused' } return 'changed' })).toBeNull()
    expect(variables.product).toBe('plate')
  })
})

describe('answers by value', () => {
  const paths = newPaths()
  const readsFor = (variables: WeldingVariables) => readsOf(paths, variables)
  const ask = (variables: WeldingVariables) => {
    const reads = readsFor(variables)
    const { trace, context } = traceOf(reads, contextOf(variables))
    const answer = context.procedure.joint.weld === 'fillet' ? 'fillet' : `on ${context.procedure.joint.backingMaterial}`
    return { reads, answer, paths: pathsRead(trace, answer) ?? [] }
  }
  test('what decides the next reading leads to its own answers', () => {
    const remembered = newRemembered<string>()
    const groove = procedure().variables
    const fillet = edited(procedure(), [(v) => void (v.joint.weld = 'fillet')]).variables
    const other = edited(procedure(), [(v) => void (v.joint.backingMaterial = 'copper')]).variables
    for (const one of [groove, fillet]) {
      const { reads, answer, paths: read } = ask(one)
      keep(remembered, reads, read, answer)
    }
    expect(recall(remembered, readsFor(structuredClone(groove)))).toBe(`on ${groove.joint.backingMaterial}`)
    expect(recall(remembered, readsFor(structuredClone(fillet)))).toBe('fillet')
    expect(recall(remembered, readsFor(other))).toBeNull()
  })
  test('a rule that is asked for something else each time is left alone, and few answers are kept', () => {
    const remembered = newRemembered<string>()
    let noted = 0
    for (let n = 0; n < 2000; n += 1) {
      const { variables } = edited(procedure(), [(v) => void (v.joint.backingMaterial = `steel ${n}`)])
      const { reads, answer, paths: read } = ask(variables)
      expect(recall(remembered, reads)).toBeNull()
      if (!isWorthNoting(remembered)) continue
      keep(remembered, reads, read, answer)
      noted += 1
      expect(remembered.size).toBeLessThanOrEqual(64)
    }
    expect(noted).toBeGreaterThan(0)
    expect(noted).toBeLessThan(200)
  })
  test('a copy to be kept shares no object', () => {
    const given = { a: [1, { b: null }], c: 'd' }
    const copy = lasting(given)
    expect(copy).toEqual(given)
    expect(copy.a[1]).not.toBe(given.a[1])
  })
})
