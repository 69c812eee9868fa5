/** Records for tests of ISO 15614-1: every variable stated, so that a test changes only what it is about. */
import { assess, qualifyCoupon } from '@shared/assessment/assess.ts'
import type { AssessedCoupon, Assessment, CouponQualification, Finding, NumericRange } from '@shared/schemas/assessment.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type Process, type ProcedureContent, type ProcessBlock, type WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'

export const EDITION = '2017+A1:2019'
export type Arc = Exclude<Process, 'OTHER'>

const FILLERS: Record<Arc, { classification: string; specification: string; productForm: ProcessBlock['filler']['productForm'] }> = {
  SMAW: { specification: 'ISO 2560-A', classification: 'E 42 4 B 42 H5', productForm: 'covered-electrode' },
  SAW: { specification: 'ISO 14171-A', classification: 'S2Si', productForm: 'solid' },
  GMAW: { specification: 'ISO 14341-A', classification: 'G 42 4 M21 3Si1', productForm: 'solid' },
  FCAW: { specification: 'ISO 17632-A', classification: 'T 42 2 P M21 1 H5', productForm: 'flux-cored' },
  GTAW: { specification: 'ISO 636-A', classification: 'W 42 5 W3Si1', productForm: 'solid' },
  PAW: { specification: 'ISO 636-A', classification: 'W 42 5 W3Si1', productForm: 'solid' },
}

export function block(process: Arc, deposit: number | null, id = process as string): unknown {
  const active = process === 'GMAW' || process === 'FCAW'
  const inert = process === 'GTAW' || process === 'PAW'
  return {
    id,
    process,
    mechanisation: process === 'SAW' ? 'machine' : process === 'GMAW' || process === 'FCAW' ? 'semiautomatic' : 'manual',
    depositThickness: deposit === null ? null : interval(deposit, undefined, 'length'),
    maxPassThickness: quantity(3, 'length'),
    filler: { ...FILLERS[process], added: true, tradeName: 'Larkfield Trial Wire', diameters: [quantity(1.2, 'length')], supplemental: false, fluxClassification: 'S A AB 1', fluxTradeName: 'Larkfield Trial Flux' },
    positions: ['1G'],
    progression: 'up',
    shieldingGas: active ? { components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }], flow: interval(12, 15, 'gasFlow') } : inert ? { components: [{ gas: 'Ar', percent: 100 }], flow: interval(8, 10, 'gasFlow') } : null,
    backingGas: { name: 'none' },
    plasmaGas: process === 'PAW' ? { components: [{ gas: 'Ar', percent: 100 }], flow: interval(1, 2, 'gasFlow') } : null,
    electrical: { currentType: 'DCEP', transferMode: active ? 'spray' : null, pulsed: false, waveformControlled: false, current: interval(180, 200, 'current'), voltage: interval(24, 26, 'voltage'), travelSpeed: interval(240, 300, 'travelSpeed'), wireFeed: interval(6, 7, 'wireFeed'), heatInput: interval(1, 1, 'heatInput'), heatInputQuantity: 'arc-energy', heatInputMethod: 'meter', tungstenClassification: 'WLa 15', tungstenDiameter: quantity(2.4, 'length') },
    technique: { bead: 'stringer', oscillation: 'none', initialCleaning: 'grinding', interpassCleaning: 'brushing', passesPerSide: 'multiple', electrodes: 'single', contactTubeDistance: interval(15, 20, 'length'), nozzleSize: '16 mm', keyhole: 'melt-in' },
    passes: [{ number: '1', layer: 'root' }],
  }
}

export interface Given {
  thickness?: number | readonly [number, number]
  processes?: readonly (readonly [Arc, number | null])[]
  impact?: boolean | null
  hardness?: boolean | null
  /** Group, and yield in MPa. */
  a?: readonly [group: string, yieldStrength: number]
  b?: readonly [group: string, yieldStrength: number]
  level?: '1' | '2' | null
  change?: (variables: WeldingVariables) => void
  change0?: (block: ProcessBlock, variables: WeldingVariables) => void
}

const metal = ([group, strength]: readonly [string, number]): unknown => ({ specification: 'EN 10025', grade: `S${strength} of ${group}`, iso15608: group, minYield: quantity(strength, 'stress'), minTensile: quantity(470, 'stress'), minElongation: quantity(22, 'percent'), condition: 'N', impactSpecified: true })

function variables(given: Given): unknown {
  const thickness = given.thickness ?? 20
  const [min, max] = typeof thickness === 'number' ? [thickness, thickness] : thickness
  const a = given.a ?? ['1.2', 355]
  return {
    standards: [{ standard: 'iso-15614-1', edition: EDITION, level: given.level === undefined ? '2' : given.level }],
    unitSystem: 'SI',
    toughnessRequired: given.impact === undefined ? false : given.impact,
    hardnessRequired: given.hardness === undefined ? false : given.hardness,
    impactTemperature: quantity(-20, 'temperature'),
    impactEnergy: quantity(27, 'energy'),
    joint: { weld: 'groove', groove: 'single-v', rootOpening: interval(2, 3, 'length'), backing: 'none', backGouging: 'none', weldedFromBothSides: false },
    baseMetals: { a: metal(a), b: metal(given.b ?? a) },
    thickness: interval(min, max, 'length'),
    preheat: { minimum: quantity(100, 'temperature'), interpassMaximum: quantity(200, 'temperature'), maintenance: 'none' },
    postHeating: { used: false },
    pwht: { condition: 'none' },
    processes: (given.processes ?? [['GMAW', typeof thickness === 'number' ? thickness : max]]).map(([process, deposit]) => block(process, deposit)),
  }
}

const change = (given: Given, content: { variables: WeldingVariables }): void => {
  given.change?.(content.variables)
  const first = content.variables.processes[0]
  if (first) given.change0?.(first, content.variables)
}

export function procedure(given: Given = {}): ProcedureContent {
  const content = procedureContentSchema.parse({ title: 'Trial procedure', variables: variables(given) })
  change(given, content)
  return content
}

export interface GivenCoupon extends Given {
  number?: string
  certified?: boolean
  /** Impact and hardness results on the coupon; as `impact` and `hardness` where absent. */
  impactTested?: boolean
  hardnessTested?: boolean
  content?: (content: CouponContent) => void
}

export function coupon(given: GivenCoupon = {}): AssessedCoupon {
  const content = couponContentSchema.parse({ title: 'Trial coupon', variables: variables(given) })
  change(given, content)
  content.ndt = [['v', 'VT'], ['r', 'RT'], ['p', 'PT']].map(([id, method]) => ({ id: id!, method: method as 'VT', accepted: true, reportNumber: 'N-1', note: null }))
  content.tension = [1, 2].map((n) => ({ id: `t${n}`, specimen: `T${n}`, kind: 'reduced-section', width: quantity(20, 'length'), thickness: quantity(20, 'length'), diameter: null, load: quantity(200, 'force'), reportedStrength: null, fracture: 'base-metal', fractureType: 'ductile' }))
  content.bends = [1, 2, 3, 4].map((n) => ({ id: `b${n}`, specimen: `B${n}`, kind: 'side', thickness: quantity(10, 'length'), formerDiameter: quantity(40, 'length'), angle: quantity(180, 'angle'), openings: [], inspected: true, broke: false }))
  content.macros = [{ id: 'm1', specimen: 'M1', fusionComplete: true, cracks: false, leg1: null, leg2: null }]
  if (given.impactTested ?? given.impact === true) {
    const values = [60, 70, 65].map((value) => quantity(value, 'energy'))
    content.toughness = (['weld', 'heat-affected-zone'] as const).map((place, i) => ({ id: `i${i}`, place, temperature: quantity(-20, 'temperature'), size: '10 x 10', values, lateralExpansion: [] }))
  }
  if (given.hardnessTested ?? given.hardness === true) content.hardness = [{ id: 'h1', scale: 'HV10', place: 'heat-affected-zone', values: [240, 260, 250] }]
  Object.assign(content, { weldedOn: '2026-03-02', welder: 'A. Welder', witness: 'An examiner', laboratory: 'Trial laboratory', reportNumber: 'R-1', testedOn: '2026-03-09' })
  given.content?.(content)
  const number = given.number ?? 'PQR-001'
  return { id: number, number, certified: given.certified ?? true, content }
}

export const judge = (wps: ProcedureContent, coupons: readonly AssessedCoupon[], level: '1' | '2' | null = null): Assessment => assess({ procedure: wps, coupons, standard: 'iso-15614-1', edition: EDITION, level })
export const qualified = (one: AssessedCoupon, level: '1' | '2' | null = null): CouponQualification => qualifyCoupon(one, 'iso-15614-1', EDITION, level)

export function finding(assessment: Assessment, rule: string, processId?: string): Finding {
  const found = assessment.findings.find((one) => (one.ruleId === `iso-15614-1/${rule}` || one.ruleId === `assessment/${rule}`) && (processId === undefined || one.processId === processId))
  if (!found) throw new Error(`no finding of ${rule}; there are ${assessment.findings.map((one) => one.ruleId).join(', ')}`)
  return found
}

/** Range that one coupon gives for a rule, as numbers; null = no limit. */
export function span(one: AssessedCoupon, rule: string, process?: Arc, level: '1' | '2' | null = null): readonly [number | null, number | null] {
  const found = qualified(one, level).ranges.find((range) => range.ruleId === `iso-15614-1/${rule}` && (process === undefined || range.process === process))
  if (!found || found.range.type !== 'numeric') throw new Error(`no numeric range of ${rule}`)
  return sureEnds(found.range)
}

/** Ends of the certain part. */
export function sureEnds(range: NumericRange): readonly [number | null, number | null] {
  const sure = range.segments.filter(({ lower, upper }) => lower.kind !== 'unknown' && upper.kind !== 'unknown')
  const [first, last] = [sure[0], sure.at(-1)]
  return [first && 'value' in first.lower ? first.lower.value : null, last && 'value' in last.upper ? last.upper.value : null]
}

/** Blocking findings that are not within. */
export const problems = (assessment: Assessment): string[] =>
  assessment.findings.filter((one) => one.verdict !== 'within' && (one.class === 'essential' || one.class === 'supplementary')).map((one) => `${one.ruleId}: ${one.verdict}: ${one.sentence}`)
