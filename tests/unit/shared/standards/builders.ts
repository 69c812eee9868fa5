/** Records for tests: every variable stated, so that a test changes only what it is about. */
import type { AssessedCoupon, Assessment, Finding } from '@shared/schemas/assessment.ts'
import { couponContentSchema, procedureContentSchema, type CouponContent, type Process, type ProcedureContent, type ProcessBlock, type WeldingVariables } from '@shared/schemas/welding.ts'
import { assess } from '@shared/assessment/assess.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import type { UnitSystem } from '@shared/units/types.ts'

const FILLERS: Record<Exclude<Process, 'OTHER'>, { fNumber: string; classification: string; productForm: ProcessBlock['filler']['productForm'] }> = {
  SMAW: { fNumber: '4', classification: 'E7018', productForm: 'covered-electrode' },
  SAW: { fNumber: '6', classification: 'EM12K', productForm: 'solid' },
  GMAW: { fNumber: '6', classification: 'ER70S-6', productForm: 'solid' },
  FCAW: { fNumber: '6', classification: 'E71T-1C', productForm: 'flux-cored' },
  GTAW: { fNumber: '6', classification: 'ER70S-2', productForm: 'solid' },
  PAW: { fNumber: '6', classification: 'ER70S-2', productForm: 'solid' },
}

const lengthUnit = (system: UnitSystem): string => (system === 'SI' ? 'mm' : 'in')

export function block(process: Exclude<Process, 'OTHER'>, deposit: number | null, system: UnitSystem = 'SI', id = process as string): unknown {
  const gas = process === 'GMAW' || process === 'FCAW' || process === 'GTAW' || process === 'PAW'
  const mixture = process === 'GTAW' || process === 'PAW' ? [{ gas: 'Ar', percent: 100 }] : [{ gas: 'Ar', percent: 80 }, { gas: 'CO2', percent: 20 }]
  return {
    id,
    process,
    mechanisation: process === 'SAW' ? 'machine' : 'manual',
    depositThickness: deposit === null ? null : interval(deposit, undefined, 'length', lengthUnit(system)),
    maxPassThickness: quantity(system === 'SI' ? 3 : 0.125, 'length', lengthUnit(system)),
    filler: {
      ...FILLERS[process],
      added: true,
      aNumber: 1,
      tradeName: 'Larkfield Trial Wire',
      diameters: [quantity(system === 'SI' ? 3.2 : 0.125, 'length', lengthUnit(system))],
      supplemental: false,
      supplementalAlloyElement: false,
      consumableInsert: false,
      fluxClassification: 'F7A2-EM12K',
      fluxTradeName: 'Larkfield Trial Flux',
      fluxType: 'neutral',
      fluxIsRecrushedSlag: false,
      penetrationFlux: false,
    },
    positions: ['1G'],
    progression: 'up',
    shieldingGas: gas ? { components: mixture, flow: interval(12, 15, 'gasFlow') } : null,
    backingGas: { name: 'none' },
    trailingGas: { name: 'none' },
    plasmaGas: process === 'PAW' ? { components: [{ gas: 'Ar', percent: 100 }], flow: interval(1, 2, 'gasFlow') } : null,
    electrical: {
      currentType: 'DCEP',
      transferMode: process === 'GMAW' || process === 'FCAW' ? 'spray' : null,
      pulsed: false,
      waveformControlled: false,
      current: interval(150, 180, 'current'),
      voltage: interval(24, 26, 'voltage'),
      travelSpeed: interval(200, 250, 'travelSpeed'),
      heatInput: interval(null, 1.5, 'heatInput'),
      heatInputMethod: 'meter',
      tungstenClassification: 'EWLa-1.5',
      tungstenDiameter: quantity(2.4, 'length'),
    },
    technique: { bead: 'stringer', oscillation: 'none', initialCleaning: 'grinding', interpassCleaning: 'brushing', passesPerSide: 'multiple', electrodes: 'single', electrodeSpacing: quantity(15, 'length'), contactTubeDistance: interval(15, 20, 'length'), nozzleSize: '16 mm', peening: 'none', closedChamber: false, keyhole: 'melt-in', thermalPreparation: false },
  }
}

export interface Given {
  system?: UnitSystem
  thickness?: number | readonly [number, number]
  /** Deposit by process; the process list of the record. */
  processes?: readonly (readonly [Exclude<Process, 'OTHER'>, number | null])[]
  toughness?: boolean | null
  edition?: string
  p?: readonly [string, string]
  change?: (variables: WeldingVariables) => void
}

function variables(given: Given): unknown {
  const system = given.system ?? 'SI'
  const thickness = given.thickness ?? (system === 'SI' ? 20 : 0.75)
  const [min, max] = typeof thickness === 'number' ? [thickness, thickness] : thickness
  const list = given.processes ?? [['SMAW', typeof thickness === 'number' ? thickness : max]]
  const metal = (p: string): unknown => ({ specification: 'SA-516', grade: `for P-No. ${p}`, pNumber: p, groupNumber: 1, uns: 'K02700', minTensile: quantity(485, 'stress'), minElongation: quantity(21, 'percent') })
  const [a, b] = given.p ?? ['1', '1']
  return {
    standards: [{ standard: 'asme-ix', edition: given.edition ?? '2021' }],
    unitSystem: system,
    toughnessRequired: given.toughness === undefined ? false : given.toughness,
    joint: { weld: 'groove', groove: 'single-v', rootOpening: interval(2, 3, 'length'), backing: 'metal', backingMaterial: 'carbon steel', retainers: false, backGouging: 'none' },
    baseMetals: { a: metal(a), b: metal(b) },
    thickness: interval(min, max, 'length', lengthUnit(system)),
    preheat: { minimum: quantity(20, 'temperature'), interpassMaximum: quantity(200, 'temperature'), maintenance: 'none' },
    pwht: { condition: 'none' },
    processes: list.map(([process, deposit]) => block(process, deposit, system)),
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
  tests?: 'mechanical' | 'full' | 'toughness'
}

export function coupon(given: GivenCoupon = {}): AssessedCoupon {
  const content = couponContentSchema.parse({ title: 'Trial coupon', variables: variables(given) })
  given.change?.(content.variables)
  const tests = given.tests ?? (given.toughness === true ? 'full' : 'mechanical')
  if (tests !== 'toughness') {
    content.tension = [1, 2].map((n) => ({ id: `t${n}`, specimen: `T${n}`, kind: 'reduced-section', width: quantity(19, 'length'), thickness: quantity(20, 'length'), diameter: null, load: quantity(200, 'force'), reportedStrength: null, fracture: 'base-metal', fractureType: 'ductile' }))
    content.bends = [1, 2, 3, 4].map((n) => ({ id: `b${n}`, specimen: `B${n}`, kind: 'side', thickness: quantity(10, 'length'), formerDiameter: quantity(40, 'length'), angle: quantity(180, 'angle'), openings: [], inspected: true, broke: false }))
  }
  if (tests !== 'mechanical') content.toughness = [{ id: 'c1', place: 'weld', temperature: quantity(-20, 'temperature'), size: '10 x 10', values: [quantity(60, 'energy'), quantity(70, 'energy'), quantity(65, 'energy')], lateralExpansion: [] }]
  Object.assign(content, { weldedOn: '2026-03-02', welder: 'A. Welder', laboratory: 'Trial laboratory', reportNumber: 'R-1', testedOn: '2026-03-09' })
  given.content?.(content)
  const number = given.number ?? 'PQR-001'
  return { id: number, number, certified: given.certified ?? true, content }
}

export const judge = (wps: ProcedureContent, coupons: readonly AssessedCoupon[], edition = '2021', otherCoupons: readonly AssessedCoupon[] = []): Assessment =>
  assess({ procedure: wps, coupons, standard: 'asme-ix', edition, level: null, otherCoupons })

/** The finding of one rule (`base-metal-thickness` …), of one process where several are judged. */
export function finding(assessment: Assessment, rule: string, processId?: string): Finding {
  const found = assessment.findings.find((one) => (one.ruleId === `asme-ix/${rule}` || one.ruleId === `assessment/${rule}`) && (processId === undefined || one.processId === processId))
  if (!found) throw new Error(`no finding of ${rule}; there are ${assessment.findings.map((one) => one.ruleId).join(', ')}`)
  return found
}

/** Blocking findings that are not within. */
export const problems = (assessment: Assessment): string[] =>
  assessment.findings.filter((one) => one.verdict !== 'within' && (one.class === 'essential' || one.class === 'supplementary')).map((one) => `${one.ruleId}: ${one.verdict}: ${one.sentence}`)
