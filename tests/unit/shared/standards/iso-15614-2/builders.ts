/** Records for tests of ISO 15614-2: every variable stated. */
import { assess, qualifyCoupon } from '@shared/assessment/assess.ts'
import type { AssessedCoupon, Assessment, CouponQualification, Finding, TestVerdict } from '@shared/schemas/assessment.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type ProcedureContent, type ProcessBlock, type WeldingVariables } from '@shared/schemas/welding.ts'
import { judgeResults } from '@shared/standards/iso-15614-2/qualify.ts'
import { interval, quantity } from '@shared/units/convert.ts'

export interface GivenTwo {
  thickness?: number | readonly [number, number]
  process?: 'GMAW' | 'GTAW' | 'PAW'
  group?: string
  groupB?: string
  temper?: string | null
  ageing?: 'natural' | 'artificial' | null
  tensile?: number
  strengths?: readonly number[]
  change?: (variables: WeldingVariables, block: ProcessBlock) => void
  content?: (content: CouponContent) => void
  number?: string
}

function variables(given: GivenTwo): unknown {
  const thickness = given.thickness ?? 10
  const [min, max] = typeof thickness === 'number' ? [thickness, thickness] : thickness
  const metal = (group: string): unknown => ({ specification: 'EN 573-3', grade: `alloy of ${group}`, iso15608: group, minTensile: quantity(given.tensile ?? 275, 'stress'), minElongation: quantity(12, 'percent'), condition: given.temper === undefined ? 'O' : given.temper })
  const process = given.process ?? 'GMAW'
  return {
    standards: [{ standard: 'iso-15614-2', edition: '2005' }],
    toughnessRequired: false,
    hardnessRequired: false,
    joint: { weld: 'groove', groove: 'single-v', rootOpening: interval(1, 2, 'length'), backing: 'metal', backingMaterial: 'alloy of the parent', backGouging: 'none', weldedFromBothSides: false },
    baseMetals: { a: metal(given.group ?? '22.4'), b: metal(given.groupB ?? given.group ?? '22.4') },
    thickness: interval(min, max, 'length'),
    preheat: { minimum: quantity(20, 'temperature'), interpassMaximum: quantity(100, 'temperature'), maintenance: 'none' },
    postHeating: { used: false },
    pwht: { condition: 'none', ageing: given.ageing === undefined ? 'natural' : given.ageing },
    processes: [{
      id: 'p',
      process,
      mechanisation: process === 'GTAW' ? 'manual' : 'semiautomatic',
      depositThickness: interval(max, undefined, 'length'),
      filler: { added: true, classification: 'S Al 5356', specification: 'ISO 18273', tradeName: 'Larkfield Trial Wire', productForm: 'solid', diameters: [quantity(1.2, 'length')] },
      positions: ['1G'],
      progression: 'up',
      shieldingGas: { components: [{ gas: 'Ar', percent: 100 }], flow: interval(15, 18, 'gasFlow') },
      backingGas: { name: 'none' },
      plasmaGas: process === 'PAW' ? { components: [{ gas: 'Ar', percent: 100 }], flow: interval(1, 2, 'gasFlow') } : null,
      electrical: { currentType: process === 'GTAW' ? 'AC' : 'DCEP', transferMode: process === 'GMAW' ? 'spray' : null, pulsed: false, current: interval(180, 200, 'current'), voltage: interval(22, 24, 'voltage'), travelSpeed: interval(300, 400, 'travelSpeed'), wireFeed: interval(8, 9, 'wireFeed'), tungstenClassification: 'WLa 15', tungstenDiameter: quantity(3.2, 'length') },
      technique: { bead: 'stringer', oscillation: 'none', initialCleaning: 'degreased and brushed', interpassCleaning: 'brushed', passesPerSide: 'multiple', electrodes: 'single', contactTubeDistance: interval(15, 18, 'length'), nozzleSize: '16 mm' },
      passes: [{ number: '1', layer: 'root' }],
    }],
  }
}

const change = (given: GivenTwo, content: { variables: WeldingVariables }): void => {
  const block = content.variables.processes[0]
  if (block) given.change?.(content.variables, block)
}

export function procedureTwo(given: GivenTwo = {}): ProcedureContent {
  const content = procedureContentSchema.parse({ title: 'Trial procedure', variables: variables(given) })
  change(given, content)
  return content
}

export function couponTwo(given: GivenTwo = {}): AssessedCoupon {
  const content = couponContentSchema.parse({ title: 'Trial coupon', variables: variables(given) })
  change(given, content)
  content.ndt = (['VT', 'RT', 'PT'] as const).map((method) => ({ id: method, method, accepted: true, reportNumber: 'N-1', note: null }))
  content.tension = (given.strengths ?? [280, 282]).map((value, i) => ({ id: `t${i + 1}`, specimen: `T${i + 1}`, kind: 'reduced-section', width: null, thickness: null, diameter: null, load: null, reportedStrength: quantity(value, 'stress'), fracture: 'weld', fractureType: 'ductile' }))
  content.bends = (['face', 'face', 'root', 'root'] as const).map((kind, i) => ({ id: `b${i}`, specimen: `B${i}`, kind, thickness: quantity(10, 'length'), formerDiameter: quantity(70, 'length'), angle: quantity(180, 'angle'), openings: [], inspected: true, broke: false }))
  content.macros = [{ id: 'm1', specimen: 'M1', fusionComplete: true, cracks: false, leg1: null, leg2: null }]
  Object.assign(content, { weldedOn: '2026-03-02', welder: 'A. Welder', witness: 'An examiner', laboratory: 'Trial laboratory', reportNumber: 'R-1', testedOn: '2026-03-09' })
  given.content?.(content)
  const number = given.number ?? 'PQR-001'
  return { id: number, number, certified: true, content }
}

export const judgeResultsTwo = (coupon: AssessedCoupon): TestVerdict[] => judgeResults(coupon)
export const judgeTwo = (wps: ProcedureContent, coupons: readonly AssessedCoupon[]): Assessment => assess({ procedure: wps, coupons, standard: 'iso-15614-2', edition: '2005' })
export const qualifiedTwo = (coupon: AssessedCoupon): CouponQualification => qualifyCoupon(coupon, 'iso-15614-2', '2005')

export function findingTwo(assessment: Assessment, rule: string): Finding {
  const found = assessment.findings.find((one) => one.ruleId === `iso-15614-2/${rule}`)
  if (!found) throw new Error(`no finding of ${rule}; there are ${assessment.findings.map((one) => one.ruleId).join(', ')}`)
  return found
}
