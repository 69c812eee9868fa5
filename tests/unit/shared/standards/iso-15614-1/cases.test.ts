/** The published cases of the ISO standards, each run through the engine as a record would be; a disputed case is reported by name. */
import { describe, expect, test } from 'vitest'
import cases from '../../../../fixtures/cases/iso-procedure.json' with { type: 'json' }
import disputed from '../../../../fixtures/cases/disputed.json' with { type: 'json' }
import type { Assessment, SetRange, Verdict } from '@shared/schemas/assessment.ts'
import type { Position, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { formerDiameter, judgeHardness } from '@shared/standards/iso-15614-1/acceptance.ts'
import { energyOf } from '@shared/standards/iso-15614-1/energy.ts'
import { judgeResults } from '@shared/standards/iso-15614-1/qualify.ts'
import { testedConsumablesRoute } from '@shared/standards/iso-15614-1/tested-consumables.ts'
import { processFactor } from '@shared/standards/common/iso-names.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { couponTwo, judgeResultsTwo } from '../iso-15614-2/builders.ts'
import { coupon, finding, judge, problems, procedure, qualified, span, type Arc, type Given, type GivenCoupon } from './builders.ts'

type Data = Record<string, unknown>
interface Case { id: string; standard: string; edition: string; title: string; given: Data; expect: Data; source: string; basis: string }

const num = (value: unknown): number => value as number
const ARC: Record<string, Arc> = { '111': 'SMAW', '135': 'GMAW', '141': 'GTAW' }
const WORD: Record<string, Verdict> = { qualified: 'within', not_qualified: 'outside', accepted: 'within' }
const flag = (value: unknown): boolean => value === true

/** The records that a case describes. */
function given(data: Data): GivenCoupon {
  const t = data.coupon_thickness_mm === undefined ? 20 : num(data.coupon_thickness_mm)
  const deposits = data.deposits_mm as Record<string, number> | undefined
  const fillet = data.joint === 'fillet'
  return {
    thickness: t,
    level: data.level === 1 ? '1' : '2',
    impact: flag(data.impact_required),
    hardness: flag(data.hardness_required),
    impactTested: flag(data.impact_tested),
    processes: deposits ? Object.entries(deposits).map(([number, s]) => [ARC[number]!, s] as const) : [[ARC[(data.process as string | undefined) ?? '135'] ?? 'GMAW', t]],
    change(variables) {
      if (fillet) Object.assign(variables.joint, { weld: 'fillet', type: 'tee', filletThroat: interval(num(data.throat_a_mm), undefined, 'length') })
      for (const block of variables.processes) {
        if (data.runs) block.technique.passesPerSide = data.runs === 'single' ? 'single' : 'multiple'
      }
    },
  }
}

const also = (base: GivenCoupon, more: (variables: WeldingVariables) => void): GivenCoupon => ({ ...base, change: (variables) => { base.change?.(variables); more(variables) } })

/** Verdict of one rule, which alone decides the weld. */
function decided(assessment: Assessment, rule: string, wanted: unknown): void {
  const verdict = WORD[wanted as string]
  expect(finding(assessment, rule).verdict, finding(assessment, rule).sentence).toBe(verdict)
  if (verdict === 'within') expect(problems(assessment)).toEqual([])
  else expect(assessment.findings.filter((one) => one.verdict === 'outside').map((one) => one.ruleId)).toContain(`iso-15614-1/${rule}`)
}

const thicknessCase = ({ given: data, expect: wanted }: Case): void => {
  const record = given(data)
  expect(span(coupon(record), 'parent-thickness')).toEqual(wanted.thickness_range_mm)
  if (data.production_thickness_mm !== undefined) decided(judge(procedure({ ...record, thickness: num(data.production_thickness_mm) }), [coupon(record)]), 'parent-thickness', wanted.verdict)
}

/** Both sides differ as given and in nothing else. */
const pair = (base: Given, ofCoupon: Partial<GivenCoupon>, ofProcedure: Given): Assessment => judge(procedure({ ...base, ...ofProcedure }), [coupon({ ...base, ...ofCoupon })])
const first = (change: (block: ProcessBlock, variables: WeldingVariables) => void): Given => ({ change0: change })

const groupCase = ({ given: data, expect: wanted }: Case): void => {
  const of = (side: Data): Given => {
    const metal = (group: unknown): readonly [string, number] => [group as string, num(side.ReH_MPa ?? 300)]
    return { a: metal(side.group ?? side.A), b: metal(side.group ?? side.B) }
  }
  decided(pair({}, of(data.coupon as Data), of(data.production as Data)), 'material-group', wanted.verdict)
}

const POSITION: Record<string, readonly [Position, 'up' | 'down']> = { PF: ['3G', 'up'], PG: ['3G', 'down'], PC: ['2G', 'up'] }
const at = (symbol: unknown): Given => first((block) => { const [position, progression] = POSITION[symbol as string]!; block.positions = [position]; block.progression = progression })
const positionCase = ({ given: data, expect: wanted }: Case): void => decided(pair({}, at(data.coupon_position), at(data.production_position)), 'position', wanted.verdict)

const heatCase = ({ given: data, expect: wanted }: Case): void => {
  const base: Given = { impact: flag(data.impact_required), hardness: flag(data.hardness_required) }
  const record = coupon({ ...base, change0: (block) => { block.electrical.heatInput = interval(num(data.coupon_heat_input_kJ_mm), undefined, 'heatInput') } })
  const [low, high] = wanted.heat_input_range_kJ_mm as [number | null, number | null]
  const { ranges } = qualified(record)
  expect(ranges.some((range) => range.ruleId === 'iso-15614-1/heat-input-maximum')).toBe(high !== null)
  expect(ranges.some((range) => range.ruleId === 'iso-15614-1/heat-input-minimum')).toBe(low !== null)
  const rule = high === null ? 'heat-input-minimum' : 'heat-input-maximum'
  expect(span(record, rule)).toEqual([low, high])
  const ask = (value: number): Verdict => finding(judge(procedure({ ...base, change0: (block) => { block.electrical.heatInput = interval(value, undefined, 'heatInput') } }), [record]), rule).verdict
  expect(ask(num(high ?? low))).toBe('within')
  expect(ask(num(high ?? low) + (high === null ? -0.001 : 0.001))).toBe('outside')
}

const RUN: Record<string, (one: Case) => void> = {}
for (let n = 1; n <= 7; n += 1) RUN[`iso1-g0${n}`] = thicknessCase
for (let n = 15; n <= 19; n += 1) RUN[`iso1-g${n}`] = groupCase
Object.assign(RUN, {
  'iso1-g08'({ given: data, expect: wanted }: Case) {
    const record = coupon(given(data))
    expect(span(record, 'parent-thickness', 'GTAW')).toEqual(wanted.parent_range_mm)
    for (const [number, limit] of Object.entries(wanted.deposit_max_mm as Record<string, number>)) expect(span(record, 'deposit-thickness', ARC[number])[1]).toBe(limit)
  },
  'iso1-g09'({ given: data, expect: wanted }: Case) {
    const { thin, thick } = data.production_thickness_mm as { thin: number; thick: number }
    const record = given(data)
    const unequal = (coupon0: GivenCoupon): Given => ({ ...coupon0, thickness: thin, processes: [['GMAW', thin]], change: (variables) => { coupon0.change?.(variables); variables.thicknessB = interval(thick, undefined, 'length') } })
    const assessment = judge(procedure(unequal(record)), [coupon(record)])
    decided(assessment, 'parent-thickness-second', wanted.verdict)
    expect(finding(assessment, 'parent-thickness').verdict).toBe('within')
    expect(finding(judge(procedure(unequal(record)), [coupon({ ...record, thickness: 29, processes: [['GMAW', 29]] })]), 'parent-thickness-second').verdict).toBe('outside')
  },
  'iso1-g10': ({ given: data, expect: wanted }: Case) => expect(span(coupon(given(data)), 'fillet-throat')).toEqual(wanted.throat_range_mm),
  'iso1-g11'({ given: data, expect: wanted }: Case) {
    const record = given(data)
    const asked = also(record, (variables) => void (variables.joint.filletThroat = interval(num(data.production_throat_mm), undefined, 'length')))
    decided(judge(procedure(asked), [coupon(record)]), 'fillet-throat', wanted.throat_verdict)
  },
  'iso1-g12'({ given: data, expect: wanted }: Case) {
    const record = coupon(also(given(data), (variables) => Object.assign(variables, { product: 'pipe', diameter: interval(num(data.coupon_diameter_mm), undefined, 'length') })))
    expect(span(record, 'diameter')).toEqual(wanted.diameter_range_mm)
  },
  'iso1-g13'({ given: data, expect: wanted }: Case) {
    const wps = (D: number): ReturnType<typeof procedure> => procedure(also(given(data), (variables) => Object.assign(variables, { product: 'pipe', diameter: interval(D, undefined, 'length'), pipeRotated: data.rotated })))
    decided(judge(wps(num(data.production_diameter_mm)), [coupon(given(data))]), 'diameter', wanted.verdict)
    expect(finding(judge(wps(500), [coupon(given(data))]), 'diameter').verdict).toBe('outside')
  },
  'iso1-g14'({ given: data, expect: wanted }: Case) {
    const record = coupon(also(given(data), (variables) => Object.assign(variables.joint, { type: 'tee', branch: 'set-on', branchAngle: interval(num(data.coupon_branch_angle_deg), undefined, 'angle') })))
    expect(span(record, 'branch-angle')).toEqual(wanted.branch_angle_range_deg)
  },
  'iso1-g20': heatCase,
  'iso1-g21': heatCase,
  'iso1-g22'({ given: data, expect: wanted }: Case) {
    const block = procedure({ change0: (one) => Object.assign(one.electrical, { heatInput: null, voltage: interval(num(data.U_V), undefined, 'voltage'), current: interval(num(data.I_A), undefined, 'current'), travelSpeed: interval(num(data.v_mm_s), undefined, 'travelSpeed', 'mm/s') }) }).variables.processes[0]!
    const known = energyOf(block)
    if ('missing' in known) throw new Error(known.missing.join())
    expect(known).toMatchObject({ kind: 'E', mean: expect.closeTo(num(wanted.arc_energy_kJ_mm), 6) as number })
    expect(Math.abs(known.mean * processFactor(block) - num(wanted.heat_input_kJ_mm))).toBeLessThanOrEqual(num(wanted.tolerance))
  },
  'iso1-g23'({ given: data, expect: wanted }: Case) {
    const heated = (value: unknown): Given => ({ change: (variables) => void (variables.preheat.minimum = quantity(num(value), 'temperature')) })
    decided(pair({}, heated(data.coupon_preheat_C), heated(data.production_preheat_C)), 'preheat', wanted.verdict)
  },
  'iso1-g24'({ given: data, expect: wanted }: Case) {
    const record = coupon({ change: (variables) => Object.assign(variables.pwht, { condition: 'below-lower-transformation', temperature: interval(num(data.coupon_pwht_C), undefined, 'temperature') }) })
    expect(span(record, 'pwht-temperature')).toEqual(wanted.pwht_range_C)
  },
  'iso1-g25'({ given: data, expect: wanted }: Case) {
    const gas = (share: unknown): Given => first((block) => { block.shieldingGas!.components = [{ gas: 'Ar', percent: 100 - num(share) }, { gas: 'CO2', percent: num(share) }] })
    const assessment = pair({}, gas(data.coupon_CO2_pct), gas(data.production_CO2_pct))
    decided(assessment, 'shielding-gas', wanted.verdict)
    expect((finding(assessment, 'shielding-gas').range as SetRange).values).toEqual([data.coupon_gas])
    expect(finding(assessment, 'shielding-gas').asked).toEqual([data.production_gas])
  },
  'iso1-g26'({ given: data, expect: wanted }: Case) {
    const mode: Record<string, 'short-circuiting' | 'spray'> = { dip: 'short-circuiting', spray: 'spray' }
    const set = (value: unknown): Given => first((block) => void (block.electrical.transferMode = mode[value as string] ?? null))
    decided(pair({}, set(data.coupon_transfer), set(data.production_transfer)), 'transfer-mode', wanted.verdict)
  },
  'iso1-g27'({ given: data, expect: wanted }: Case) {
    const cold = (name: string): Given => ({ change: (variables) => { variables.impactTemperature = quantity(num(data.impact_temperature_C), 'temperature'); variables.processes[0]!.filler.tradeName = name } })
    const base: Given = { impact: true, processes: [['SMAW', 20]] }
    decided(pair(base, cold('One'), cold('Another')), 'filler-make', wanted.verdict)
    expect(finding(pair(base, cold('One'), cold('One')), 'filler-make').verdict).toBe('within')
  },
  'iso1-g28': positionCase,
  'iso1-g29': positionCase,
  'iso1-g30'({ given: _, expect: wanted }: Case) {
    decided(pair({}, { change: (variables) => Object.assign(variables.joint, { backing: 'metal', backingMaterial: 'parent' }) }, {}), 'backing-and-sides', wanted.verdict)
  },
  'iso1-g31': ({ given: data, expect: wanted }: Case) => expect(Math.abs(formerDiameter(num(data.specimen_thickness_mm), num(data.parent_A_pct)) - num(wanted.former_mm))).toBeLessThanOrEqual(num(wanted.tolerance)),
  'iso1-g32'({ given: data, expect: wanted }: Case) {
    const openings = (data.flaws as { length_mm: number; at_corner: boolean }[]).map((flaw) => ({ size: quantity(flaw.length_mm, 'length'), corner: flaw.at_corner, fromInternalFlaw: null }))
    const record = (more: number): ReturnType<typeof coupon> => coupon({ content: (content) => { content.bends[0]!.openings = openings.map((one) => ({ ...one, size: quantity(one.size.si + (one.corner ? 0 : more), 'length') })) } })
    const verdict = (more: number): string | undefined => judgeResults(record(more), '2').find(({ testId }) => testId === 'b1')?.verdict
    expect(verdict(0)).toBe(wanted.verdict)
    expect(verdict(0.01)).toBe('fail')
  },
  'iso1-g33'({ given: data, expect: wanted }: Case) {
    const { variables } = coupon({ a: [data.group as string, 355], change: (one) => void (one.pwht.condition = data.heat_treated ? 'below-lower-transformation' : 'none') }).content
    const survey = (value: number): string => judgeHardness({ id: 'h', scale: 'HV10', place: 'heat-affected-zone', values: [value] }, variables, '2').verdict
    expect(survey(num(data.HV10_max_measured))).toBe(wanted.verdict)
    expect(survey(num(wanted.limit_HV10))).toBe('pass')
    expect(survey(num(wanted.limit_HV10) + 1)).toBe('fail')
  },
  'iso1-g34'({ given: data, expect: wanted }: Case) {
    const judged = (values: readonly number[]): ReturnType<typeof judgeResults>[number] => judgeResults(coupon({ impact: true, change: (variables) => void (variables.impactEnergy = quantity(num(data.required_mean_J), 'energy')), content: (content) => { content.toughness = [{ ...content.toughness[0]!, values: values.map((value) => quantity(value, 'energy')) }] } }), '2').find(({ testId }) => testId === 'i0')!
    const one = judged(data.values_J as number[])
    expect(one.verdict).toBe(wanted.verdict)
    expect(one.computed?.value).toBeCloseTo(num(wanted.mean_J), 1)
    expect(judged([35, num(wanted.one_individual_min_J), 28]).verdict).toBe('pass')
    expect(judged([40, num(wanted.one_individual_min_J) - 0.1, 28]).verdict).toBe('fail')
  },
  'iso1-g35'({ given: data, expect: wanted }: Case) {
    const bare = coupon({ ...given(data), a: [data.group as string, 355], change: (variables) => { variables.baseMetals.a.impactSpecified = data.specified_impact as boolean }, content: (content) => { content.bends = [] } })
    const rows = qualified(bare).specimens
    const required = (kind: string): number => rows.find((row) => row.kind === kind)?.required ?? 0
    expect({ VT_pct: required('visual') * 100, RT_or_UT_pct: required('volumetric') * 100, surface_pct: required('surface') * 100, tensile: required('tension'), bend: `${required('side-bend')} side recommended`, impact_sets: required('impact'), hardness: required('hardness') > 0, macro: required('macro') }).toEqual(wanted)
  },
  'iso1-g36'({ given: data, expect: wanted }: Case) {
    const rows = (method: 'UT' | 'RT', t: number): number | undefined => qualified(coupon({ thickness: t, a: [data.group as string, 355], content: (content) => { content.ndt = [{ id: 'x', method, accepted: true, reportNumber: null, note: null }] } })).specimens.find((row) => row.kind === 'volumetric')?.recorded
    expect(rows('UT', num(data.coupon_thickness_mm)) === 0).toBe(wanted.verdict === 'not_allowed')
    expect(rows(wanted.use as 'RT', num(data.coupon_thickness_mm))).toBe(1)
    expect(rows('UT', 8)).toBe(1)
  },
  'iso1-g37'({ given: data, expect: wanted }: Case) {
    const records = (level: unknown): GivenCoupon => ({ level: String(level) as '1' | '2' })
    decided(judge(procedure(records(data.required_level)), [coupon(records(data.record_level))], String(data.required_level) as '1'), 'level', wanted.verdict)
    expect(finding(judge(procedure(), [coupon(records(1))], '2'), 'level').verdict).toBe('outside')
  },
  'iso2-g38'({ given: data, expect: wanted }: Case) {
    const record = couponTwo({ group: data.group as string, temper: data.temper as string, ageing: data.post_weld as 'natural', tensile: num(data.parent_Rm_min_MPa), strengths: data.measured_MPa as number[] })
    const tension = judgeResultsTwo(record).filter(({ testId }) => testId.startsWith('t'))
    expect(tension.map(({ verdict }) => verdict)).toEqual((data.measured_MPa as number[]).map(() => wanted.verdict))
    expect(tension[0]?.sentence).toContain(`${num(wanted.required_MPa)} MPa`)
    expect(tension[0]?.sentence).toContain(`${num(wanted.T)}`)
    const weak = couponTwo({ group: data.group as string, temper: data.temper as string, ageing: 'natural', tensile: num(data.parent_Rm_min_MPa), strengths: [num(wanted.required_MPa) - 0.1] })
    expect(judgeResultsTwo(weak).find(({ testId }) => testId === 't1')?.verdict).toBe('fail')
  },
  'iso10-g39'({ given: data, expect: wanted }: Case) {
    const weld = (group: string): ReturnType<typeof testedConsumablesRoute> => testedConsumablesRoute(procedure({ thickness: num(data.thickness_mm), a: [group, 235], hardness: flag(data.hardness_specified), impact: flag(data.impact_specified), change: (variables) => { Object.assign(variables.preheat, { minimum: null, interpassMaximum: null }); variables.processes[0]!.electrical.heatInput = null } }).variables)
    expect(weld(data.group as string).available === 'no').toBe(wanted.verdict === 'not_available')
    expect(weld('1.1').available).toBe('yes')
  },
})

describe('published cases of ISO 15614-1, 15614-2 and 15610', () => {
  const reasons = new Map((disputed as { id: string; reason: string }[]).map((row) => [row.id, row.reason]))
  for (const one of cases as unknown as Case[]) {
    const reason = reasons.get(one.id)
    const name = `${one.id} ${one.title} (${one.standard}, ${one.edition}; ${one.basis}: ${one.source})`
    const run = RUN[one.id]
    if (!run) test(name, () => expect.fail('no adapter runs this case'))
    else if (reason) test.fails(`disputed: ${name}: ${reason}`, () => run(one))
    else test(name, () => run(one))
  }
  test('every case is run', () => expect(cases.map((one) => one.id).filter((id) => !RUN[id])).toEqual([]))
})
