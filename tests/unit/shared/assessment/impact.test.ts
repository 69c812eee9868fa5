/** What a revision means: classes from the rules, standing from the linked coupons. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { revisionImpact } from '@shared/assessment/impact.ts'
import type { AssessedCoupon } from '@shared/schemas/assessment.ts'
import { revisionImpactSchema, type ImpactChange, type RevisionImpact } from '@shared/schemas/standards.ts'
import type { ProcedureContent, WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { block, coupon, procedure, type Given } from '../standards/builders.ts'
import { processBlockSchema } from '@shared/schemas/welding.ts'
import { standards } from '@shared/standards/index.ts'

type Change = (variables: WeldingVariables) => void
const first = (variables: WeldingVariables): WeldingVariables['processes'][number] => {
  const [own] = variables.processes
  if (!own) throw new Error('no block')
  return own
}
const asme = (before: ProcedureContent, after: ProcedureContent, coupons: readonly AssessedCoupon[] = [], edition = '2021'): RevisionImpact => revisionImpact({ before, after, standard: 'asme-ix', edition, coupons })
const revise = (change: Change, given: Given = {}, coupons: readonly AssessedCoupon[] = [coupon(given)]): RevisionImpact => asme(procedure(given), procedure({ ...given, change: (v) => { given.change?.(v); change(v) } }), coupons)
const only = ({ changes }: RevisionImpact): ImpactChange => {
  const [change] = changes
  if (!change || changes.length !== 1) throw new Error(`${changes.length} changes: ${changes.map(({ field }) => field).join(', ')}`)
  return change
}

describe('classes come from the rules', () => {
  test.each<[string, Change, Given, Partial<ImpactChange>]>([
    ['heat number', (v) => (v.baseMetals.a.heatNumber = 'H-77'), {}, { class: 'editorial', standing: 'revise only', ruleIds: [] }],
    ['filler lot', (v) => (first(v).filler.lot = 'L-2'), {}, { class: 'editorial', standing: 'revise only' }],
    ['root opening', (v) => (v.joint.rootOpening = interval(4, 5, 'length')), {}, { class: 'nonessential', standing: 'revise only', clause: 'QW-402.10' }],
    ['voltage, which a rule reads though it stands elsewhere', (v) => (first(v).electrical.voltage = interval(30, 32, 'voltage')), { processes: [['GMAW', 20]] }, { class: 'nonessential', clause: 'QW-409.8' }],
    ['gas flow', (v) => { const gas = first(v).shieldingGas; if (gas) gas.flow = interval(20, 25, 'gasFlow') }, { processes: [['GTAW', 20]] }, { class: 'nonessential', clause: 'QW-408.3' }],
    ['shielding gas', (v) => { const gas = first(v).shieldingGas; if (gas) gas.components = [{ gas: 'CO2', percent: 100 }] }, { processes: [['GMAW', 20]] }, { class: 'essential', standing: 'requalify', ruleIds: ['asme-ix/shielding-gas'] }],
    ['F-Number', (v) => (first(v).filler.fNumber = '3'), {}, { class: 'essential', standing: 'requalify', clause: 'QW-404.4' }],
    ['interpass without toughness', (v) => (v.preheat.interpassMaximum = quantity(300, 'temperature')), { toughness: false }, { class: 'editorial', standing: 'revise only', clause: 'QW-406.3', sentence: 'Interpass maximum is no variable here, because toughness is not required: revise the document.' }],
    ['interpass with toughness', (v) => (v.preheat.interpassMaximum = quantity(300, 'temperature')), { toughness: true }, { class: 'supplementary', standing: 'requalify', clause: 'QW-406.3' }],
    ['interpass while toughness is not stated', (v) => (v.preheat.interpassMaximum = quantity(300, 'temperature')), { toughness: null }, { class: 'supplementary', standing: 'cannot tell' }],
    ['polarity without toughness', (v) => (first(v).electrical.currentType = 'DCEN'), { toughness: false }, { class: 'nonessential', standing: 'revise only' }],
    ['preheat inside the step', (v) => (v.preheat.minimum = quantity(0, 'temperature')), {}, { class: 'essential', standing: 'still covered' }],
    ['the second member, though the rule stands at the first', (v) => (v.baseMetals.b.pNumber = '8'), {}, { class: 'essential', standing: 'requalify', ruleIds: ['asme-ix/base-metal-p-number'] }],
    ['maximum thickness inside 2T', (v) => (v.thickness = interval(5, 38, 'length')), { thickness: [5, 20], processes: [['SMAW', 20]] }, { class: 'essential' }],
  ])('%s', (_, change, given, expected) => {
    expect(only(revise(change, given))).toMatchObject(expected)
  })

  test('a title is editorial whatever the standard knows', () => {
    const before = procedure()
    const after = { ...before, title: 'Another title', notes: 'Read on site.' }
    for (const edition of ['2021', '1901']) expect(asme(before, after, [coupon()], edition).changes.map((one) => [one.field, one.class, one.standing])).toEqual([['title', 'editorial', 'revise only'], ['notes', 'editorial', 'revise only']])
  })

  test('current touches heat input where toughness counts', () => {
    const given: Given = { toughness: true, change: (v) => (first(v).electrical.heatInput = null) }
    const change = only(revise((v) => (first(v).electrical.current = interval(150, 260, 'current')), given))
    expect(change).toMatchObject({ class: 'supplementary', ruleIds: ['asme-ix/heat-input'] })
  })
})

describe('standing', () => {
  test('requalify names the coupon that would be needed, and the clause that judged', () => {
    const change = only(revise((v) => (v.thickness = interval(5, 60, 'length')), { thickness: [5, 20], processes: [['SMAW', 20]] }, [coupon({ thickness: 20 })]))
    expect(change).toMatchObject({ class: 'essential', standing: 'requalify', before: '5–20 mm', after: '5–60 mm' })
    expect(change.sentence).toContain('60 mm is above the 40 mm (2T)')
    expect(change.wanted).toMatch(/coupon/i)
  })

  test('a coupon that covers the new value leaves it covered', () => {
    const change = only(revise((v) => (v.thickness = interval(5, 60, 'length')), { thickness: [5, 20], processes: [['SMAW', 60]] }, [coupon({ thickness: 38, processes: [['SMAW', 38]] })]))
    expect(change).toMatchObject({ class: 'essential', standing: 'still covered', wanted: null })
  })

  test('without a coupon nothing is covered, and what to weld is said', () => {
    expect(only(revise((v) => (first(v).filler.fNumber = '3'), {}, []))).toMatchObject({ class: 'essential', standing: 'cannot tell', wanted: 'A coupon welded with SMAW.' })
  })

  test('a coupon that is not certified carries nothing yet', () => {
    const change = only(revise((v) => (v.preheat.minimum = quantity(0, 'temperature')), {}, [coupon({ certified: false })]))
    expect(change.standing).toBe('cannot tell')
    expect(change.sentence).toContain("is not certified yet, so can't support")
  })

  test('what was outside before is still outside, and is said to have been', () => {
    const change = only(revise((v) => (v.preheat.minimum = quantity(5, 'temperature')), { change: (v) => (v.preheat.minimum = quantity(10, 'temperature')) }, [coupon({ change: (v) => (v.preheat.minimum = quantity(150, 'temperature')) })]))
    expect(change.standing).toBe('requalify')
    expect(change.sentence).toContain('So it was before the change.')
  })

  test('a field that contradicts itself cannot be told', () => {
    expect(only(revise((v) => (v.thickness = interval(30, 10, 'length')))).standing).toBe('cannot tell')
  })

  test('an unknown edition, standard or process is never coverage', () => {
    const [before, after] = [procedure(), procedure({ change: (v) => (first(v).filler.fNumber = '3') })]
    expect(only(asme(before, after, [coupon()], '1901'))).toMatchObject({ class: 'essential', standing: 'cannot tell', clause: null })
    const stud: Change = (v) => (first(v).process = 'OTHER')
    expect(only(asme(procedure({ change: stud }), procedure({ change: (v) => { stud(v); v.preheat.method = 'flame' } }), [coupon()]))).toMatchObject({ class: 'essential', standing: 'cannot tell' })
  })

  test('the overall word is the worst, and says the whole procedure too', () => {
    const impact = revise((v) => { v.joint.rootOpening = interval(4, 5, 'length'); first(v).filler.fNumber = '3'; v.baseMetals.a.heatNumber = 'H-77' })
    expect(impact.overall).toMatchObject({ class: 'essential', standing: 'requalify', verdict: 'outside', counts: { editorial: 1, nonessential: 1, supplementary: 0, essential: 1 } })
    expect(impact.overall.sentence).toBe('A new qualification is needed under ASME IX: SMAW: F-Number.')
  })
})

describe('blocks', () => {
  const gtaw = processBlockSchema.parse(block('GTAW', 5))
  test('a process that is added needs its coupon', () => {
    const impact = revise((v) => v.processes.push(gtaw))
    const added = impact.changes.find(({ field }) => field === 'processes.1.process')
    expect(added).toMatchObject({ class: 'essential', standing: 'requalify', clause: 'QW-401' })
    expect(added?.wanted).toContain('A coupon welded with GTAW.')
  })

  test('a process that is taken out asks for nothing', () => {
    const impact = revise((v) => v.processes.splice(0, 1), { processes: [['GTAW', 5], ['SMAW', 15]] })
    const gone = impact.changes.find(({ label }) => label === 'GTAW: Process')
    expect(gone).toMatchObject({ class: 'essential', standing: 'still covered', after: null })
    expect(gone?.sentence).toContain('no longer arises')
    expect(impact.changes.some(({ standing }) => standing === 'requalify')).toBe(false)
  })

  test('blocks are known by id, wherever they stand', () => {
    const impact = revise((v) => { v.processes.reverse(); first(v).filler.fNumber = '3' }, { processes: [['GTAW', 5], ['SMAW', 15]] })
    expect(impact.changes.map(({ field, class: kind, standing }) => [field, kind, standing])).toEqual([['processes', 'editorial', 'revise only'], ['processes.0.filler.fNumber', 'essential', 'requalify']])
  })
})

const CHANGES: readonly Change[] = [
  (v) => (v.thickness = interval(5, 60, 'length')),
  (v) => (v.thickness = interval(8, 30, 'length')),
  (v) => (v.preheat.minimum = quantity(150, 'temperature')),
  (v) => (v.preheat.interpassMaximum = null),
  (v) => (v.pwht.condition = 'below-lower-transformation'),
  (v) => (v.toughnessRequired = true),
  (v) => (v.toughnessRequired = null),
  (v) => (v.baseMetals.b.pNumber = '8'),
  (v) => (v.baseMetals.a.grade = 'another grade'),
  (v) => (v.joint.backing = 'none'),
  (v) => (v.joint.weld = 'fillet'),
  (v) => (v.product = 'pipe'),
  (v) => (first(v).filler.fNumber = '3'),
  (v) => (first(v).filler.aNumber = null),
  (v) => (first(v).filler.classification = 'E8018'),
  (v) => (first(v).positions = ['3G']),
  (v) => (first(v).process = 'FCAW'),
  (v) => (first(v).shieldingGas = null),
  (v) => (first(v).depositThickness = interval(5, undefined, 'length')),
  (v) => (first(v).electrical.currentType = 'AC'),
  (v) => (first(v).electrical.heatInput = interval(null, 3, 'heatInput')),
  (v) => (first(v).technique.passesPerSide = 'single'),
  (v) => (first(v).passes = [{ number: '1', layer: 'root', fillerDiameter: null, current: interval(90, 100, 'current'), voltage: null, wireFeed: null, travelSpeed: null }]),
  (v) => v.processes.push(processBlockSchema.parse(block('PAW', 4, 'SI', 'second'))),
]
const EDITORIAL: readonly ((content: ProcedureContent) => void)[] = [
  (c) => (c.title = 'Another title'),
  (c) => (c.scope = 'Tanks'),
  (c) => (c.notes = 'Read on site.'),
  ({ variables }) => (variables.baseMetals.a.heatNumber = 'H-77'),
  ({ variables }) => (variables.baseMetals.b.certificate = 'C-1'),
  ({ variables }) => (first(variables).filler.lot = 'L-9'),
  ({ variables }) => (first(variables).technique.notes = 'Keep the arc short.'),
]
const some = fc.subarray([...CHANGES], { maxLength: 5 })
const scene = fc.record({ process: fc.constantFrom('SMAW' as const, 'SAW' as const, 'GMAW' as const, 'FCAW' as const, 'GTAW' as const, 'PAW' as const), toughness: fc.constantFrom(true, false, null), system: fc.constantFrom('SI' as const, 'US' as const), one: some, other: some, linked: fc.boolean() })
const build = ({ process, toughness, system }: { process: 'SMAW'; toughness: boolean | null; system: 'SI' | 'US' } | { process: 'SAW' | 'GMAW' | 'FCAW' | 'GTAW' | 'PAW'; toughness: boolean | null; system: 'SI' | 'US' }, changes: readonly Change[]): ProcedureContent => procedure({ toughness, system, processes: [[process, system === 'SI' ? 20 : 0.75]], change: (v) => changes.forEach((change) => change(v)) })

describe('whatever is changed', () => {
  test('no change, no row', () =>
    fc.assert(fc.property(scene, (given) => {
      const impact = asme(build(given, given.one), build(given, given.one), given.linked ? [coupon()] : [])
      expect(impact.changes).toEqual([])
      expect(impact.overall).toMatchObject({ class: null, standing: null, counts: { editorial: 0, nonessential: 0, supplementary: 0, essential: 0 } })
    }), { numRuns: 20 }))

  test('the class is the same forwards and backwards, and every row is in the schema', () =>
    fc.assert(fc.property(scene, (given) => {
      const [before, after] = [build(given, given.one), build(given, given.other)]
      const there = asme(before, after, given.linked ? [coupon()] : [])
      const back = asme(after, before, given.linked ? [coupon()] : [])
      expect(revisionImpactSchema.parse(there)).toEqual(there)
      const classes = ({ changes }: RevisionImpact): string[] => changes.map(({ field, class: kind }) => `${field} ${kind}`).sort()
      expect(classes(there)).toEqual(classes(back))
    }), { numRuns: 60 }))

  test('an essential change is never only revised, a lesser one never requalifies', () =>
    fc.assert(fc.property(scene, (given) => {
      for (const { class: kind, standing, ruleIds, clause, wanted, sentence } of asme(build(given, given.one), build(given, given.other), given.linked ? [coupon()] : []).changes) {
        expect(sentence).not.toBe('')
        if (kind === 'essential' || kind === 'supplementary') {
          expect(standing).not.toBe('revise only')
          expect(ruleIds.length).toBeGreaterThan(0)
          expect(clause).not.toBeNull()
        } else expect(standing).toBe('revise only')
        if (standing === 'requalify') expect(wanted).not.toBeNull()
        if (standing === 'still covered' || standing === 'revise only') expect(wanted).toBeNull()
      }
    }), { numRuns: 60 }))

  test('editorial fields never requalify', () =>
    fc.assert(fc.property(scene, fc.subarray([...EDITORIAL], { minLength: 1 }), (given, edits) => {
      const before = build(given, given.one)
      const after = structuredClone(before)
      edits.forEach((edit) => edit(after))
      const { changes, overall } = asme(before, after, given.linked ? [coupon()] : [])
      expect(changes).toHaveLength(edits.length)
      for (const change of changes) expect(change).toMatchObject({ class: 'editorial', standing: 'revise only', wanted: null })
      expect(overall).toMatchObject({ class: 'editorial', standing: 'revise only' })
    }), { numRuns: 40 }))

  test('a change that the standing calls covered has no blocking finding of its own rules', () =>
    fc.assert(fc.property(scene, (given) => {
      const { changes, overall } = asme(build(given, given.one), build(given, given.other), [coupon()])
      if (overall.verdict === 'within') for (const { standing } of changes) expect(['still covered', 'revise only']).toContain(standing)
    }), { numRuns: 40 }))

  // Every standard and route, with none of its clauses named here.
  const choices = standards.flatMap(({ id, editions, routes = ['test'] }) => routes.flatMap((route) => editions.map(({ id: edition }) => ({ standard: id, edition, route }))))
  test.each(choices)('$standard $edition by $route: classes hold both ways, and nothing essential is only revised', ({ standard, edition, route }) =>
    fc.assert(fc.property(scene, (given) => {
      const [before, after] = [build(given, given.one), build(given, given.other)]
      const classed = (from: ProcedureContent, to: ProcedureContent): RevisionImpact => revisionImpact({ before: from, after: to, standard, edition, level: null, route, coupons: given.linked ? [coupon()] : [] })
      const there = classed(before, after)
      expect(revisionImpactSchema.parse(there)).toEqual(there)
      expect(there.changes.map(({ field, class: kind }) => `${field} ${kind}`).sort()).toEqual(classed(after, before).changes.map(({ field, class: kind }) => `${field} ${kind}`).sort())
      for (const { class: kind, standing } of there.changes) expect(standing === 'revise only').toBe(kind === 'editorial' || kind === 'nonessential')
    }), { numRuns: 12 }))
})
