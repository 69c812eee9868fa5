/** Records for tests of AWS D1.2: every variable stated, so that a test changes only what it is about. */
import type { AssessedCoupon, Assessment, Finding } from '@shared/schemas/assessment.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent, type ProcessBlock, type WeldingVariables } from '@shared/schemas/welding.ts'
import { assess } from '@shared/assessment/assess.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'
import type { Route } from '@shared/schemas/common.ts'

export type Arc = 'GMAW' | 'GTAW' | 'PAW' | 'SMAW'
export interface Given { process?: Arc; system?: UnitSystem; alloy?: string; filler?: string; change?: (variables: WeldingVariables) => void }

function variables({ process = 'GMAW', system = 'SI', alloy = '6061-T6', filler = 'ER5356' }: Given): unknown {
  const unit = system === 'SI' ? 'mm' : 'in'
  const metal = { specification: 'ASTM B209', grade: alloy }
  return {
    standards: [{ standard: 'aws-d1-2', edition: '2014' }],
    unitSystem: system,
    toughnessRequired: false,
    product: 'plate',
    joint: { weld: 'groove', type: 'butt', groove: 'single-v', penetration: 'full', backing: 'metal', backGouging: 'none' },
    baseMetals: { a: metal, b: metal },
    thickness: interval(system === 'SI' ? 10 : 0.375, undefined, 'length', unit),
    preheat: { minimum: quantity(20, 'temperature'), interpassMaximum: quantity(100, 'temperature') },
    pwht: { condition: 'none' },
    processes: [{
      id: process, process, mechanisation: 'semiautomatic', positions: ['1G'], progression: 'up',
      filler: { added: true, classification: filler, specification: 'AWS A5.10', diameters: [quantity(1.2, 'length')] },
      shieldingGas: process === 'SMAW' ? null : { components: [{ gas: 'Ar', percent: 100 }], flow: interval(20, undefined, 'gasFlow') },
      electrical: { currentType: process === 'GMAW' || process === 'SMAW' ? 'DCEP' : 'AC', transferMode: process === 'GMAW' ? 'spray' : null, current: interval(180, 200, 'current'), voltage: interval(24, 26, 'voltage'), travelSpeed: interval(400, 500, 'travelSpeed') },
      technique: { passesPerSide: 'multiple', initialCleaning: 'wire brush', interpassCleaning: 'wire brush' },
    }],
  }
}

export function procedure(given: Given = {}): ProcedureContent {
  const content = procedureContentSchema.parse({ title: 'Trial procedure', variables: variables(given) })
  given.change?.(content.variables)
  return content
}

export interface GivenCoupon extends Given { number?: string; content?: (content: CouponContent) => void }

export const tension = (id: string, strength: number): CouponContent['tension'][number] => ({ id, specimen: id, kind: 'reduced-section', width: quantity(20, 'length'), thickness: quantity(10, 'length'), diameter: null, load: quantity((strength * 200) / 1000, 'force'), reportedStrength: null, fracture: 'heat-affected-zone', fractureType: 'ductile' })
export const bend = (id: string, thickness = 3, former = 52, openings: CouponContent['bends'][number]['openings'] = []): CouponContent['bends'][number] => ({ id, specimen: id, kind: 'side', thickness: quantity(thickness, 'length'), formerDiameter: quantity(former, 'length'), angle: quantity(180, 'angle'), openings, inspected: true, broke: false })

export function coupon(given: GivenCoupon = {}): AssessedCoupon {
  const content = couponContentSchema.parse({ title: 'Trial coupon', variables: variables(given) })
  given.change?.(content.variables)
  content.tension = [tension('T1', 190), tension('T2', 185)]
  content.bends = [bend('B1'), bend('B2')]
  content.visual = { cracks: false, cratersFull: true, rootSound: true, profileAccepted: true, reinforcement: null, undercut: null, rootConcavity: null, meltThrough: null, weldThickness: null }
  Object.assign(content, { weldedOn: '2026-03-02', welder: 'A. Welder', laboratory: 'Trial laboratory', reportNumber: 'R-1', testedOn: '2026-03-09' })
  given.content?.(content)
  const number = given.number ?? 'PQR-001'
  return { id: number, number, certified: true, content }
}

export const first = (v: WeldingVariables): ProcessBlock => v.processes[0]!
export const judge = (wps: ProcedureContent, coupons: readonly AssessedCoupon[], route: Route = 'test'): Assessment => assess({ procedure: wps, coupons, standard: 'aws-d1-2', edition: '2014', level: null, route })
export const pair = (given: Given, tested: (v: WeldingVariables) => void, asked: (v: WeldingVariables) => void): Assessment => judge(procedure({ ...given, change: asked }), [coupon({ ...given, change: tested })])

export function finding(assessment: Assessment, rule: string): Finding {
  const found = assessment.findings.find(({ ruleId }) => ruleId === `aws-d1-2/${rule}` || ruleId === `assessment/${rule}`)
  if (!found) throw new Error(`no finding of ${rule}; there are ${assessment.findings.map((one) => one.ruleId).join(', ')}`)
  return found
}
export const problems = (assessment: Assessment): string[] => assessment.findings.filter((one) => one.verdict !== 'within' && one.class === 'essential').map((one) => `${one.ruleId}: ${one.verdict}: ${one.sentence}`)
