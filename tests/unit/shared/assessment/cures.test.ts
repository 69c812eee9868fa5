/** Every blocking "outside" says how it could be cured, and the cures cure. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { withValue } from '@shared/assessment/impact-paths.ts'
import type { AssessedCoupon, Finding } from '@shared/schemas/assessment.ts'
import { processBlockSchema, type Process, type ProcedureContent, type WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, judge, procedure, block } from '../standards/builders.ts'

type Change = (variables: WeldingVariables) => void
const first = (variables: WeldingVariables): WeldingVariables['processes'][number] => {
  const [own] = variables.processes
  if (!own) throw new Error('no block')
  return own
}
const CHANGES: readonly Change[] = [
  (v) => (v.thickness = interval(1, 300, 'length')),
  (v) => (v.thickness = { min: null, max: null, all: true }),
  (v) => (v.thicknessB = interval(400, undefined, 'length')),
  (v) => (first(v).maxPassThickness = quantity(15, 'length')),
  (v) => (first(v).depositThickness = interval(200, undefined, 'length')),
  (v) => (v.baseMetals.b.pNumber = '8'),
  (v) => (v.baseMetals.a.pNumber = '43'),
  (v) => (v.baseMetals.a.groupNumber = 3),
  (v) => (v.joint.weld = 'fillet'),
  (v) => (v.preheat.minimum = quantity(-80, 'temperature')),
  (v) => (v.preheat.interpassMaximum = quantity(500, 'temperature')),
  (v) => (v.pwht.condition = 'above-upper-transformation'),
  (v) => Object.assign(v.pwht, { condition: 'below-lower-transformation', temperature: interval(600, 620, 'temperature'), time: interval(60, 600, 'time') }),
  (v) => (first(v).filler.fNumber = '3'),
  (v) => (first(v).filler.aNumber = 8),
  (v) => (first(v).filler.added = false),
  (v) => (first(v).filler.productForm = 'powder'),
  (v) => Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(20, 'percent') }),
  (v) => (first(v).filler.supplementalAlloyElement = true),
  (v) => (first(v).filler.fluxClassification = 'F9A2-EM12K'),
  (v) => (first(v).filler.fluxType = 'alloy'),
  (v) => (first(v).filler.fluxType = 'active'),
  (v) => (first(v).filler.fluxIsRecrushedSlag = true),
  (v) => (first(v).filler.classification = 'E9018'),
  (v) => (first(v).filler.diameters = [quantity(8, 'length')]),
  (v) => Object.assign(first(v), { positions: ['3G'], progression: 'up' }),
  (v) => { const gas = first(v).shieldingGas; if (gas) gas.components = [{ gas: 'He', percent: 100 }] },
  (v) => { const gas = first(v).plasmaGas; if (gas) gas.components = [{ gas: 'He', percent: 100 }] },
  (v) => (first(v).backingGas = null),
  (v) => (first(v).electrical.transferMode = 'short-circuiting'),
  (v) => (first(v).electrical.currentType = 'AC'),
  (v) => (first(v).electrical.heatInput = interval(null, 9, 'heatInput')),
  (v) => Object.assign(first(v).technique, { passesPerSide: 'single', electrodes: 'multiple' }),
  (v) => (first(v).technique.keyhole = 'keyhole'),
  (v) => (first(v).technique.thermalPreparation = true),
  (v) => v.processes.push(processBlockSchema.parse(block('GTAW', 4, 'SI', 'second'))),
]
const shared = fc.constantFrom<Change | null>(null, (v) => { v.baseMetals.a.pNumber = '51'; v.baseMetals.b.pNumber = '51' }, (v) => (v.joint.weld = 'fillet'), (v) => (first(v).technique.closedChamber = true), (v) => (first(v).electrical.transferMode = 'short-circuiting'))
const scene = fc.record({ process: fc.constantFrom<Exclude<Process, 'OTHER'>>('SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW', 'PAW'), toughness: fc.boolean(), edition: fc.constantFrom('2017', '2021'), thickness: fc.constantFrom(4, 12, 20), common: shared, changes: fc.subarray([...CHANGES], { minLength: 1, maxLength: 4 }) })

const build = (given: { process: Exclude<Process, 'OTHER'>; toughness: boolean; thickness: number; common: Change | null; changes: readonly Change[] }): { wps: ProcedureContent; record: AssessedCoupon } => {
  const same = { toughness: given.toughness, thickness: given.thickness, processes: [[given.process, given.thickness] as const] }
  return { wps: procedure({ ...same, change: (v) => { given.common?.(v); given.changes.forEach((change) => change(v)) } }), record: coupon({ ...same, ...(given.common && { change: given.common }) }) }
}
const blocking = (findings: readonly Finding[]): Finding[] => findings.filter(({ class: kind, verdict }) => verdict === 'outside' && (kind === 'essential' || kind === 'supplementary'))
const again = (found: readonly Finding[], { ruleId, processId }: Finding): Finding | undefined => found.find((one) => one.ruleId === ruleId && one.processId === processId)

describe('cures', () => {
  test('each blocking "outside" names the coupon that would have to be welded', () => {
    const seen = new Map<string, Finding>()
    fc.assert(fc.property(scene, (given) => {
      const { wps, record } = build(given)
      for (const finding of blocking(judge(wps, [record], given.edition).findings)) {
        seen.set(finding.ruleId, finding)
        expect(finding.fixes.filter(({ kind }) => kind === 'plan-coupon'), `${finding.ruleId}: ${finding.sentence}`).not.toEqual([])
      }
    }), { numRuns: 250 })
    expect(seen.size).toBeGreaterThan(20)
  })

  test('a value that is offered lies inside: setting every end that is offered ends the finding', () =>
    fc.assert(fc.property(scene, (given) => {
      const { wps, record } = build(given)
      for (const finding of blocking(judge(wps, [record], given.edition).findings)) {
        const sets = finding.fixes.filter((fix) => fix.kind === 'set')
        if (sets.length === 0) continue
        let { variables } = wps
        for (const { field, value } of sets) {
          variables = withValue(variables, field, value)
          // An end written into "every size" ends it, as on the sheet.
          if (/\.(min|max)$/.test(field)) variables = withValue(variables, field.replace(/\.(min|max)$/, '.all'), false)
        }
        const cured = judge({ ...wps, variables }, [record], given.edition)
        expect(again(cured.findings, finding)?.verdict, `${finding.ruleId}: ${sets.map(({ label }) => label).join('; ')}`).not.toBe('outside')
      }
    }), { numRuns: 150 }))

  test('figures are offered the nearest value inside', () => {
    const found = judge(procedure({ change: (v) => (v.thickness = interval(2, 60, 'length')) }), [coupon()]).findings.find(({ ruleId }) => ruleId === 'asme-ix/base-metal-thickness')
    expect(found?.fixes.filter(({ kind }) => kind === 'set').map(({ label }) => label)).toEqual(['Set base metal thickness maximum to 40 mm', 'Set base metal thickness minimum to 5 mm'])
  })

  test('a stored coupon that covers it is offered, one that does not is not, and linking it ends the finding', () => {
    const wps = procedure({ change: (v) => (v.thickness = interval(5, 60, 'length')) })
    const [linked, thick, thin] = [coupon(), coupon({ number: 'PQR-THICK', thickness: 38, processes: [['SMAW', 38]] }), coupon({ number: 'PQR-THIN', thickness: 6, processes: [['SMAW', 6]] })]
    const found = judge(wps, [linked], '2021', [thin, thick]).findings.find(({ ruleId }) => ruleId === 'asme-ix/base-metal-thickness')
    expect(found?.verdict).toBe('outside')
    expect(found?.fixes.filter((fix) => fix.kind === 'link-coupon').map(({ couponId }) => couponId)).toEqual(['PQR-THICK'])
    expect(judge(wps, [linked, thick]).findings.find(({ ruleId }) => ruleId === 'asme-ix/base-metal-thickness')?.verdict).toBe('within')
  })
})
