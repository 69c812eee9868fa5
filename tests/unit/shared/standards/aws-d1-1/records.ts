/** Records for tests of AWS D1.1: every variable stated, so that a test changes only what it is about. */
import type { AssessedCoupon, Assessment, Finding, NumericRange } from '@shared/schemas/assessment.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type Position, type ProcedureContent, type Process, type ProcessBlock, type WeldingVariables } from '@shared/schemas/welding.ts'
import type { Route } from '@shared/schemas/common.ts'
import { assess } from '@shared/assessment/assess.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'

export type Arc = Exclude<Process, 'OTHER' | 'PAW'>

const FILLERS: Record<Arc, { classification: string; specification: string; productForm: ProcessBlock['filler']['productForm']; mm: number; inch: number }> = {
  SMAW: { classification: 'E7018', specification: 'AWS A5.1', productForm: 'covered-electrode', mm: 3.2, inch: 0.125 },
  SAW: { classification: 'EM12K', specification: 'AWS A5.17', productForm: 'solid', mm: 3.2, inch: 0.125 },
  GMAW: { classification: 'ER70S-6', specification: 'AWS A5.18', productForm: 'solid', mm: 1.2, inch: 0.045 },
  FCAW: { classification: 'E71T-1C', specification: 'AWS A5.20', productForm: 'flux-cored', mm: 1.2, inch: 0.045 },
  GTAW: { classification: 'ER70S-2', specification: 'AWS A5.18', productForm: 'solid', mm: 2.4, inch: 0.09375 },
}

const unit = (system: UnitSystem): string => (system === 'SI' ? 'mm' : 'in')

/** A block with single settings, so that percentages have one PQR value. */
export function block(process: Arc, system: UnitSystem, positions: readonly Position[] = ['1G'], deposit = system === 'SI' ? 20 : 0.75): unknown {
  const filler = FILLERS[process]
  const gas = process === 'GMAW' || process === 'FCAW' || process === 'GTAW'
  const components = process === 'GTAW' ? [{ gas: 'Ar', percent: 100 }] : [{ gas: 'Ar', percent: 75 }, { gas: 'CO2', percent: 25 }]
  return {
    id: process,
    process,
    mechanisation: process === 'SAW' ? 'machine' : process === 'SMAW' || process === 'GTAW' ? 'manual' : 'semiautomatic',
    depositThickness: interval(deposit, undefined, 'length', unit(system)),
    maxPassThickness: quantity(system === 'SI' ? 3 : 0.125, 'length', unit(system)),
    filler: { classification: filler.classification, specification: filler.specification, productForm: filler.productForm, added: true, tradeName: 'Larkfield Trial Wire', diameters: [quantity(system === 'SI' ? filler.mm : filler.inch, 'length', unit(system))], supplemental: false, supplementalAlloyElement: false, fluxClassification: process === 'SAW' ? 'F7A2-EM12K' : null, fluxTradeName: process === 'SAW' ? 'Larkfield Trial Flux' : null, fluxType: process === 'SAW' ? 'neutral' : null, fluxIsRecrushedSlag: process === 'SAW' ? false : null },
    positions: [...positions],
    progression: 'up',
    shieldingGas: gas ? { components, flow: interval(20, undefined, 'gasFlow') } : null,
    electrical: {
      currentType: process === 'GTAW' ? 'DCEN' : 'DCEP', transferMode: process === 'GMAW' ? 'spray' : null, pulsed: false, waveformControlled: false, powerSource: process === 'GMAW' || process === 'FCAW' ? 'constant-voltage' : null,
      current: interval(200, undefined, 'current'), makerCurrent: interval(150, 250, 'current'), voltage: interval(27, undefined, 'voltage'), wireFeed: process === 'SMAW' || process === 'GTAW' ? null : interval(8, undefined, 'wireFeed'), travelSpeed: interval(300, undefined, 'travelSpeed'), heatInput: interval(null, 1.5, 'heatInput'), heatInputMethod: 'meter',
    },
    technique: { bead: 'stringer', oscillation: 'none', initialCleaning: 'grinding', interpassCleaning: 'brushing', passesPerSide: 'multiple', electrodes: 'single', electrodeCount: 1, travelAngle: quantity(5, 'angle'), normalAngle: quantity(0, 'angle'), hotWire: false, peening: 'none' },
  }
}

export interface Given {
  system?: UnitSystem
  thickness?: number | readonly [number, number]
  processes?: readonly Arc[]
  positions?: readonly Position[]
  toughness?: boolean | null
  steel?: readonly [string, string | null]
  change?: (variables: WeldingVariables) => void
}

function variables(given: Given): unknown {
  const system = given.system ?? 'SI'
  const thickness = given.thickness ?? (system === 'SI' ? 20 : 0.75)
  const [min, max] = typeof thickness === 'number' ? [thickness, thickness] : thickness
  const [specification, grade] = given.steel ?? ['ASTM A572', '50']
  const metal = { specification, grade, minTensile: quantity(450, 'stress'), minYield: quantity(345, 'stress') }
  return {
    standards: [{ standard: 'aws-d1-1', edition: '2020' }],
    unitSystem: system,
    toughnessRequired: given.toughness === undefined ? false : given.toughness,
    product: 'plate',
    joint: { weld: 'groove', type: 'butt', groove: 'single-v', penetration: 'full', includedAngle: interval(45, undefined, 'angle'), rootOpening: interval(system === 'SI' ? 6 : 0.25, undefined, 'length', unit(system)), rootFace: interval(0, undefined, 'length', unit(system)), backing: 'metal', backGouging: 'none' },
    baseMetals: { a: metal, b: metal },
    thickness: interval(min, max, 'length', unit(system)),
    preheat: { minimum: quantity(20, 'temperature'), interpassMaximum: quantity(200, 'temperature') },
    pwht: { condition: 'none' },
    processes: (given.processes ?? ['SMAW']).map((process) => block(process, system, given.positions, min)),
  }
}

export function procedure(given: Given = {}): ProcedureContent {
  const content = procedureContentSchema.parse({ title: 'Trial procedure', variables: variables(given) })
  given.change?.(content.variables)
  return content
}

export interface GivenCoupon extends Given {
  number?: string
  certified?: boolean
  content?: (content: CouponContent) => void
}

export const tension = (id: string, strength: number): CouponContent['tension'][number] => ({ id, specimen: id, kind: 'reduced-section', width: quantity(20, 'length'), thickness: quantity(20, 'length'), diameter: null, load: quantity((strength * 400) / 1000, 'force'), reportedStrength: null, fracture: 'base-metal', fractureType: 'ductile' })
export const bend = (id: string, kind: CouponContent['bends'][number]['kind'] = 'side', openings: readonly { size: number; unit?: string; corner?: boolean; flaw?: boolean | null }[] = []): CouponContent['bends'][number] => ({
  id, specimen: id, kind, thickness: quantity(10, 'length'), formerDiameter: quantity(38, 'length'), angle: quantity(180, 'angle'), inspected: true, broke: false,
  openings: openings.map(({ size, unit: of = 'mm', corner = false, flaw = null }) => ({ size: quantity(size, 'length', of), corner, fromInternalFlaw: flaw })),
})

export const visual = (change: Partial<NonNullable<CouponContent['visual']>> = {}): NonNullable<CouponContent['visual']> => ({ cracks: false, cratersFull: true, rootSound: true, profileAccepted: true, reinforcement: quantity(2, 'length'), undercut: quantity(0.5, 'length'), rootConcavity: null, meltThrough: null, weldThickness: null, ...change })

export function coupon(given: GivenCoupon = {}): AssessedCoupon {
  const content = couponContentSchema.parse({ title: 'Trial coupon', variables: variables(given) })
  given.change?.(content.variables)
  content.tension = [tension('T1', 500), tension('T2', 510)]
  content.bends = ['B1', 'B2', 'B3', 'B4'].map((id) => bend(id))
  content.visual = visual()
  content.ndt = [{ id: 'n1', method: 'RT', wholeLength: true, accepted: true, reportNumber: 'R-2', note: null }]
  if (given.toughness === true) content.toughness = [{ id: 'c1', place: 'weld', temperature: quantity(-20, 'temperature'), size: '10 x 10', values: [quantity(60, 'energy'), quantity(70, 'energy'), quantity(65, 'energy')], lateralExpansion: [] }]
  Object.assign(content, { weldedOn: '2026-03-02', welder: 'A. Welder', laboratory: 'Trial laboratory', reportNumber: 'R-1', testedOn: '2026-03-09' })
  given.content?.(content)
  const number = given.number ?? 'PQR-001'
  return { id: number, number, certified: given.certified ?? true, content }
}

export const first = (variables: WeldingVariables): ProcessBlock => variables.processes[0]!

export const judge = (wps: ProcedureContent, coupons: readonly AssessedCoupon[], edition = '2020', route: Route = 'test'): Assessment => assess({ procedure: wps, coupons, standard: 'aws-d1-1', edition, level: null, route })

/** A procedure and a coupon alike but for what each changes. */
export const pair = (given: Given, tested: (variables: WeldingVariables) => void, asked: (variables: WeldingVariables) => void, edition = '2020'): Assessment => judge(procedure({ ...given, change: asked }), [coupon({ ...given, change: tested })], edition)

/** The finding of one rule, of one process where several are judged. */
export function finding(assessment: Assessment, rule: string, processId?: string): Finding {
  const found = assessment.findings.find((one) => (one.ruleId === `aws-d1-1/${rule}` || one.ruleId === `assessment/${rule}`) && (processId === undefined || one.processId === processId))
  if (!found) throw new Error(`no finding of ${rule}; there are ${assessment.findings.map((one) => one.ruleId).join(', ')}`)
  return found
}

export const problems = (assessment: Assessment): string[] => assessment.findings.filter((one) => one.verdict !== 'within' && (one.class === 'essential' || one.class === 'supplementary')).map((one) => `${one.ruleId}: ${one.verdict}: ${one.sentence}`)

/** Ends of a range of one certain segment; null = unlimited. */
export function ends(range: unknown): { min: number | null; max: number | null } {
  const numeric = range as NumericRange
  const segment = numeric.segments[0]
  if (numeric.type !== 'numeric' || numeric.segments.length !== 1 || !segment) throw new Error(`not one segment: ${JSON.stringify(range)}`)
  return { min: 'value' in segment.lower ? segment.lower.value : null, max: 'value' in segment.upper ? segment.upper.value : null }
}
