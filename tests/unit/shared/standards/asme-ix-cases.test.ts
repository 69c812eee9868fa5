/** The published cases, each run through the engine as a record would be; a disputed case is reported by name. */
import { describe, expect, test } from 'vitest'
import cases from '../../../fixtures/cases/asme-ix-procedure.json' with { type: 'json' }
import disputed from '../../../fixtures/cases/disputed.json' with { type: 'json' }
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import { heatInputInstantaneous, heatInputMeter } from '@shared/calculations/heat-input.ts'
import { intersectNumeric, outerEnds } from '@shared/ranges/numeric.ts'
import type { AssessedCoupon, Assessment, NumericRange } from '@shared/schemas/assessment.ts'
import type { Process, WeldingVariables } from '@shared/schemas/welding.ts'
import { judgeBend } from '@shared/standards/asme-ix/acceptance.ts'
import { specimenRequirements } from '@shared/standards/asme-ix/specimens.ts'
import { judgeTension } from '@shared/standards/asme-ix/tension.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, problems, procedure, type Given, type GivenCoupon } from './builders.ts'

type Arc = Exclude<Process, 'OTHER'>
type Data = Record<string, unknown>
interface Case { id: string; edition: string; title: string; given: Data; expect: Data; source: string; basis: string }

const num = (value: unknown): number => value as number
const PWHT: Record<string, string> = { none: 'none', below_lower_transformation: 'below-lower-transformation', above_upper_transformation: 'above-upper-transformation' }
const TRANSFER: Record<string, string> = { spray: 'spray', short_circuiting: 'short-circuiting' }
const FILLER: Record<string, { f: string; form: 'covered-electrode' | 'solid' | 'flux-cored'; a: number | null }> = {
  E7018: { f: '4', form: 'covered-electrode', a: 1 },
  E6010: { f: '3', form: 'covered-electrode', a: 1 },
  'E8018-B2': { f: '4', form: 'covered-electrode', a: 3 },
  'ER70S-6': { f: '6', form: 'solid', a: 1 },
  'E71T-1C': { f: '6', form: 'flux-cored', a: 1 },
  ER5356: { f: '22', form: 'solid', a: null },
  ER4043: { f: '23', form: 'solid', a: null },
}

/** Figures that a case gives of a coupon, as a record. */
function given(data: Data): GivenCoupon {
  const system = data.governing_units === 'US' ? 'US' : 'SI'
  const T = num(system === 'US' ? data.coupon_thickness_in : (data.coupon_thickness_mm ?? 20))
  const deposits = (system === 'US' ? data.deposit_in : data.deposit_mm) as Record<Arc, number> | undefined
  const processes = deposits ? (Object.entries(deposits) as [Arc, number][]) : ([[(data.process as Arc | undefined) ?? 'SMAW', T]] as [Arc, number][])
  return {
    system,
    thickness: T,
    processes,
    toughness: (data.toughness as boolean | undefined) ?? false,
    ...(data.p_number ? { p: [data.p_number as string, data.p_number as string] as const } : {}),
    change(variables) {
      for (const block of variables.processes) {
        if (data.max_pass_mm !== undefined) block.maxPassThickness = quantity(num(data.max_pass_mm), 'length')
        if (data.transfer_mode) block.electrical.transferMode = TRANSFER[data.transfer_mode as string] as WeldingVariables['processes'][number]['electrical']['transferMode']
      }
      if (data.pwht_condition) variables.pwht.condition = PWHT[data.pwht_condition as string] as WeldingVariables['pwht']['condition']
    },
  }
}

const numeric = (range: unknown): NumericRange => range as NumericRange
const ends = (range: NumericRange): { min: number | null; max: number | 'unlimited' } => {
  const { lower, upper } = outerEnds(range)
  return { min: 'value' in lower ? lower.value : null, max: 'value' in upper ? upper.value : 'unlimited' }
}

/** Ranges from the coupon itself. */
function couponCase(one: Case): void {
  const record = given(one.given)
  const tested: AssessedCoupon = coupon(record)
  const { ranges } = qualifyCoupon(tested, 'asme-ix', one.edition)
  const unit = record.system === 'US' ? 'in' : 'mm'
  const ruleOfThickness = record.toughness ? 'asme-ix/toughness-thickness' : 'asme-ix/base-metal-thickness'
  for (const [process] of record.processes ?? []) {
    const base = ends(numeric(ranges.find((range) => range.ruleId === ruleOfThickness && range.process === process)?.range))
    expect(base.min).toBeCloseTo(num(one.expect[`base_metal_min_${unit}`]), 3)
    expect(base.max).toBeCloseTo(num(one.expect[`base_metal_max_${unit}`]), 3)
    const limits = one.expect[`deposit_max_${unit}`] as Record<string, number> | undefined
    if (limits) expect(ends(numeric(ranges.find((range) => range.ruleId === 'asme-ix/deposit-thickness' && range.process === process)?.range)).max).toBeCloseTo(num(limits[process]), 3)
  }
  const wanted = one.expect.tests as Record<string, number> | undefined
  if (!wanted) return
  const unbent = coupon({ ...record, content: (content) => { content.bends = [] } })
  const rows = specimenRequirements(unbent)
  const count = (kind: string): number => rows.find((row) => row.kind === kind)?.required ?? 0
  expect({ tension: count('tension'), face_bend: count('face-bend'), root_bend: count('root-bend'), side_bend: count('side-bend') }).toEqual(wanted)
  if (one.expect.four_side_bends_alternative !== undefined) expect(rows.some((row) => row.alternative !== null)).toBe(one.expect.four_side_bends_alternative)
}

/** Verdict in the words of the cases. */
const worded = (assessment: Assessment): string => (assessment.verdict === 'within' ? 'qualified' : assessment.verdict === 'outside' ? 'requalify' : 'cannot tell')

/** A pair of records that differ as the case says and in nothing else. */
function pair(base: Given, ofCoupon: (variables: WeldingVariables) => void, ofProcedure: (variables: WeldingVariables) => void, coupons = 1): Assessment {
  const records = Array.from({ length: coupons }, (_, i) => coupon({ ...base, number: `PQR-${i + 1}`, change: ofCoupon }))
  return judge(procedure({ ...base, change: ofProcedure }), records)
}

const setFiller = (name: string) => (variables: WeldingVariables): void => {
  const filler = FILLER[name]
  const { filler: target } = variables.processes[0]!
  if (!filler) throw new Error(`no filler ${name}`)
  Object.assign(target, { classification: name, fNumber: filler.f, aNumber: filler.a, productForm: filler.form })
}

const setMetals = (p: readonly string[], group?: readonly number[]) => (variables: WeldingVariables): void => {
  variables.baseMetals.a.pNumber = p[0] ?? null
  variables.baseMetals.b.pNumber = p[1] ?? null
  if (group) {
    variables.baseMetals.a.groupNumber = group[0] ?? null
    variables.baseMetals.b.groupNumber = group[1] ?? null
  }
}

const gas = (text: string) => (variables: WeldingVariables): void => {
  const components = [...text.matchAll(/(\d+)% (Ar|CO2)/g)].map((match) => ({ gas: match[2] as 'Ar' | 'CO2', percent: Number(match[1]) }))
  variables.processes[0]!.shieldingGas!.components = components
}

/** Several records in one joint: the intersection of what each process may weld. */
function jointCase({ given: data, expect: wanted }: Case): void {
  const records = data.records as { process: Arc; coupon_thickness_mm: number; deposit_mm: number }[]
  const coupons = records.map((record) => coupon({ number: `PQR-${record.process}`, thickness: record.coupon_thickness_mm, processes: [[record.process, record.deposit_mm]] }))
  const wps = procedure({
    thickness: num(wanted.joint_base_metal_min_mm),
    processes: records.map((record) => [record.process, 4] as const),
    change(variables) {
      if (data.gtaw_role !== 'root') return
      variables.processes.find((block) => block.process === 'GTAW')!.passes = [{ number: '1', layer: 'root', fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }]
    },
  })
  const assessment = judge(wps, coupons)
  const joint = records.map((record) => numeric(finding(assessment, 'base-metal-thickness', record.process).range)).reduce((a, b) => intersectNumeric(a, b))
  expect(ends(joint)).toEqual({ min: wanted.joint_base_metal_min_mm, max: wanted.joint_base_metal_max_mm })
  for (const [process, limit] of Object.entries(wanted.deposit_max_mm as Record<string, number>)) expect(ends(numeric(finding(assessment, 'deposit-thickness', process).range)).max).toBeCloseTo(limit, 3)
  expect(problems(assessment)).toEqual([])
  // One step beyond either end of the intersection the joint is no longer covered.
  for (const beyond of [num(wanted.joint_base_metal_min_mm) - 0.1, num(wanted.joint_base_metal_max_mm) + 0.1]) {
    wps.variables.thickness = interval(beyond, undefined, 'length')
    expect(judge(wps, coupons).verdict).toBe('outside')
  }
}

/** Production weld of unequal members, partial penetration or a fillet. */
function productionCase({ given: data, expect: wanted }: Case): void {
  const record = given({ ...data, deposit_mm: data.deposit_mm ?? undefined })
  const fillet = data.production_weld === 'fillet'
  const tested = coupon({ ...record, change: (variables) => { record.change?.(variables); if (data.coupon_type === 'fillet') variables.joint.weld = 'fillet' } })
  const production = data.production_deposit_mm as Record<Arc, number> | undefined
  const wps = procedure({
    ...record,
    thickness: num(data.production_thin_mm ?? data.production_base_mm ?? 10),
    processes: (record.processes ?? []).map(([process]) => [process, production?.[process] ?? num(data.production_thin_mm ?? data.production_base_mm ?? 4)] as const),
    change(variables) {
      record.change?.(variables)
      if (data.production_thick_mm !== undefined) variables.thicknessB = interval(num(data.production_thick_mm), undefined, 'length')
      if (data.production_weld === 'partial_penetration_groove') variables.joint.penetration = 'partial'
      if (fillet) Object.assign(variables.joint, { weld: 'fillet', pressureRetaining: data.pressure_retaining, filletLeg: interval(num(data.fillet_leg_mm ?? 6), undefined, 'length') })
    },
  })
  const assessment = judge(wps, [tested])
  expect(worded(assessment), problems(assessment).join('\n')).toBe(wanted.verdict)
  if (wanted.limit_mm !== undefined) {
    const failed = finding(assessment, 'base-metal-thickness-second')
    expect(failed.verdict).toBe('outside')
    expect(ends(numeric(failed.range)).max).toBe(wanted.limit_mm)
  }
  if (wanted.base_metal_max !== undefined) expect(ends(numeric(finding(assessment, 'base-metal-thickness').range)).max).toBe(wanted.base_metal_max)
  for (const [process, limit] of Object.entries((wanted.deposit_max_mm ?? {}) as Record<string, number>)) expect(ends(numeric(finding(assessment, 'deposit-thickness', process).range)).max).toBe(limit)
}

/** One finding outside, and nothing else: the case's own variable decides. */
function decidedBy(assessment: Assessment, one: Case, rule: string): void {
  expect(worded(assessment), problems(assessment).join('\n')).toBe(one.expect.verdict)
  const decisive = finding(assessment, rule)
  expect(decisive.verdict).toBe(one.expect.verdict === 'requalify' ? 'outside' : 'within')
  if (one.expect.verdict === 'requalify') expect(assessment.findings.filter((other) => other.verdict === 'outside').map((other) => other.ruleId)).toContain(decisive.ruleId)
}

const RUN: Record<string, (one: Case) => void> = {}
for (let n = 1; n <= 17; n += 1) RUN[`ixp-g${String(n).padStart(2, '0')}`] = couponCase
for (const n of [18, 19, 20, 21, 22, 23]) RUN[`ixp-g${n}`] = productionCase
for (const n of [24, 25]) RUN[`ixp-g${n}`] = jointCase
Object.assign(RUN, {
  'ixp-g26': (one: Case) => decidedBy(pair({}, setMetals(one.given.coupon_p as string[]), setMetals(one.given.production_p as string[])), one, 'base-metal-p-number'),
  'ixp-g27': (one: Case) => decidedBy(pair({}, setMetals(one.given.coupon_p as string[]), setMetals(one.given.production_p as string[])), one, 'base-metal-p-number'),
  'ixp-g28'(one: Case) {
    const records = (one.given.records as { p: string[]; group: number[] }[]).map((record, i) => coupon({ toughness: true, number: `PQR-${i + 1}`, change: setMetals(record.p, record.group) }))
    const wps = procedure({ toughness: true, change: setMetals(one.given.production_p as string[], one.given.production_group as number[]) })
    decidedBy(judge(wps, records), one, 'base-metal-group')
    expect(judge(wps, records.slice(0, 1)).verdict).toBe('outside')
  },
  'ixp-g29': (one: Case) => decidedBy(pair({}, setFiller(one.given.pqr_filler as string), setFiller(one.given.wps_filler as string)), one, 'filler-f-number'),
  'ixp-g30'(one: Case) {
    const metals = { processes: [['GMAW', 20]] as const, p: ['23', '23'] as const }
    const assessment = pair(metals, setFiller(one.given.pqr_filler as string), setFiller(one.given.wps_filler as string))
    decidedBy(assessment, one, 'filler-f-number')
    expect(finding(assessment, 'filler-f-number').range).toMatchObject({ values: [`F-${num(one.expect.pqr_f)}`] })
    expect(finding(assessment, 'filler-f-number').asked).toEqual([`F-${num(one.expect.wps_f)}`])
  },
  'ixp-g31'(one: Case) {
    const assessment = pair({}, setFiller(one.given.pqr_filler as string), setFiller(one.given.wps_filler as string))
    decidedBy(assessment, one, 'filler-a-number')
    expect(finding(assessment, 'filler-f-number').verdict === 'within').toBe(one.expect.same_f_number)
  },
  'ixp-g32'(one: Case) {
    const assessment = pair({ processes: [['GMAW', 20]] }, setFiller(one.given.pqr_filler as string), setFiller(one.given.wps_filler as string))
    decidedBy(assessment, one, 'filler-product-form')
    expect(finding(assessment, 'filler-f-number').verdict === 'within').toBe(one.expect.same_f_number)
  },
  'ixp-g33'(one: Case) {
    const preheat = (value: unknown) => (variables: WeldingVariables): void => void (variables.preheat.minimum = quantity(num(value), 'temperature'))
    const assessment = pair({}, preheat(one.given.pqr_preheat_C), preheat(one.given.wps_preheat_min_C))
    decidedBy(assessment, one, 'preheat')
    expect(ends(numeric(finding(assessment, 'preheat').range)).min).toBe(one.expect.lowest_wps_preheat_C)
  },
  'ixp-g34'(one: Case) {
    const interpass = (value: unknown) => (variables: WeldingVariables): void => void (variables.preheat.interpassMaximum = quantity(num(value), 'temperature'))
    const assessment = pair({ toughness: true }, interpass(one.given.pqr_interpass_max_C), interpass(one.given.wps_interpass_max_C))
    decidedBy(assessment, one, 'interpass')
    expect(ends(numeric(finding(assessment, 'interpass').range)).max).toBe(one.expect.highest_wps_interpass_C)
  },
  'ixp-g35'(one: Case) {
    const pwht = (value: unknown) => (variables: WeldingVariables): void => void (variables.pwht.condition = PWHT[value as string] as WeldingVariables['pwht']['condition'])
    decidedBy(pair({}, pwht(one.given.pqr_pwht), pwht(one.given.wps_pwht)), one, 'pwht-condition')
  },
  'ixp-g36': (one: Case) => decidedBy(pair({ processes: [['GMAW', 20]] }, gas(one.given.pqr_gas as string), gas(one.given.wps_gas as string)), one, 'shielding-gas'),
  'ixp-g37'(one: Case) {
    const transfer = (value: unknown) => (variables: WeldingVariables): void => void (variables.processes[0]!.electrical.transferMode = TRANSFER[value as string] as 'spray')
    decidedBy(pair({ processes: [['GMAW', 20]] }, transfer(one.given.pqr_transfer), transfer(one.given.wps_transfer)), one, 'transfer-mode')
  },
  'ixp-g38': ({ given: data, expect: wanted }: Case) => expect(heatInputMeter({ voltage: num(data.voltage_V), current: num(data.current_A), travelSpeed: num(data.travel_speed_mm_per_min) }) * 1000).toBeCloseTo(num(wanted.heat_input_J_per_mm), 6),
  'ixp-g39': ({ given: data, expect: wanted }: Case) => expect(heatInputInstantaneous({ power: num(data.power_W), arcTime: num(data.arc_time_s), length: num(data.bead_length_mm) }) * 1000).toBeCloseTo(num(wanted.heat_input_J_per_mm), 6),
  'ixp-g40'({ given: data, expect: wanted }: Case) {
    const { variables } = procedure({ change: (v) => { v.baseMetals.a.minTensile = quantity(num(data.specified_min_MPa), 'stress'); v.baseMetals.b.minTensile = quantity(num(data.specified_min_MPa), 'stress') } })
    const specimen = (strength: number): Parameters<typeof judgeTension>[0] => ({ id: 't', specimen: 'T1', kind: 'reduced-section', width: null, thickness: null, diameter: null, load: null, reportedStrength: quantity(strength, 'stress'), fracture: 'base-metal', fractureType: null })
    expect(judgeTension(specimen(num(data.result_MPa)), variables).verdict).toBe(wanted.verdict)
    expect(judgeTension(specimen(num(wanted.floor_MPa)), variables).verdict).toBe('pass')
    expect(judgeTension(specimen(num(wanted.floor_MPa) - 0.01), variables).verdict).toBe('fail')
  },
  'ixp-g41'({ given: data, expect: wanted }: Case) {
    const { variables } = procedure()
    const bend = (size: number): Parameters<typeof judgeBend>[0] => ({ id: 'b', specimen: 'B1', kind: 'side', thickness: null, formerDiameter: null, angle: null, openings: [{ size: quantity(size, 'length'), corner: data.corner as boolean, fromInternalFlaw: null }], inspected: true, broke: false })
    expect(judgeBend(bend(num(data.opening_mm)), variables).verdict).toBe(wanted.verdict)
    expect(judgeBend(bend(num(data.opening_mm) + 0.01), variables).verdict).toBe('fail')
  },
  'ixp-g42'({ given: data, expect: wanted }: Case) {
    const at = (position: unknown) => (variables: WeldingVariables): void => void (variables.processes[0]!.positions = [position as '1G'])
    const assessment = pair({ toughness: data.toughness as boolean }, at(data.pqr_position), at(data.wps_position))
    expect(wanted.verdict).toBe('no_requalification')
    expect(problems(assessment)).toEqual([])
    expect(finding(assessment, 'position')).toMatchObject({ class: 'nonessential', verdict: 'within' })
  },
  'ixp-g43'({ given: data, expect: wanted }: Case) {
    const { certified_by_organization: certified } = data.pqr as { certified_by_organization: boolean }
    const assessment = judge(procedure(), [coupon({ certified })])
    expect(assessment.verdict === 'within').toBe(wanted.usable_as_support)
    expect(finding(assessment, 'certification').clause).toBe('QW-201')
    expect(judge(procedure(), [coupon({ certified: true })]).verdict).toBe('within')
  },
})

describe('published cases of ASME IX', () => {
  const reasons = new Map((disputed as { id: string; reason: string }[]).map((row) => [row.id, row.reason]))
  for (const one of cases as Case[]) {
    const reason = reasons.get(one.id)
    const name = `${one.id} ${one.title} (${one.edition}; ${one.basis}: ${one.source})`
    const run = RUN[one.id]
    if (!run) test(name, () => expect.fail('no adapter runs this case'))
    else if (reason) test.fails(`disputed: ${name}: ${reason}`, () => run(one))
    else test(name, () => run(one))
  }
  test('every case is run', () => expect(cases.map((one) => one.id).filter((id) => !RUN[id])).toEqual([]))
})
