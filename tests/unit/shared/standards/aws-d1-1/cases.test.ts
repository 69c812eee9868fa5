/** Published cases of AWS D1.1, each through the engine. */
import { describe, expect, test } from 'vitest'
import type { CouponContent, Position, WeldingVariables } from '@shared/schemas/welding.ts'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import { bendJudgement } from '@shared/standards/aws-d1-1/acceptance.ts'
import { details, fitUp, readDesignation, weldSize } from '@shared/standards/aws-d1-1/prequalified/joint-details.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import all from '../../../../fixtures/cases/aws-structural-procedure.json' with { type: 'json' }
import disputed from '../../../../fixtures/cases/disputed.json' with { type: 'json' }
import { bend, coupon, ends, finding, first, judge, pair, procedure, tension, visual, type Arc, type Given } from './records.ts'

interface Case { id: string; standard: string; edition: string; title: string; given: Record<string, unknown>; expect: Record<string, unknown>; source: string; basis: string }
const cases = (all as unknown as Case[]).filter(({ standard }) => standard.includes('D1.1'))
const num = (value: unknown): number => Number(value)

const metal = (text: string): { specification: string; grade: string | null } => {
  const found = /^(?:ASTM\s+)?([A-Z]\d+)\s*(?:Gr\s+)?(\w+)?/.exec(text.replace(/\s*\(.*\)$/, ''))
  return { specification: `ASTM ${found?.[1] ?? ''}`, grade: found?.[2] ?? null }
}
const setMetal = (variables: WeldingVariables, a: string, b = a): void => {
  Object.assign(variables.baseMetals.a, metal(a))
  Object.assign(variables.baseMetals.b, metal(b))
}
const PLACE: Record<string, { groove: Position; fillet: Position }> = { F: { groove: '1G', fillet: '1F' }, H: { groove: '2G', fillet: '2F' }, V: { groove: '3G', fillet: '3F' }, OH: { groove: '4G', fillet: '4F' } }
const TRANSFER: Record<string, 'short-circuiting' | 'pulsed-spray'> = { 'short-circuit': 'short-circuiting', 'pulsed spray': 'pulsed-spray' }

/** A draft judged as prequalified, and the finding of one condition. */
const prequalified = (one: Case, given: Given, rule: string) => {
  const draft = procedure(given)
  return finding(judge(draft, [], one.edition, 'prequalified'), `prequalified-${rule}`)
}

function preheatCase(one: Case): void {
  const { given: data, expect: wanted } = one
  for (const [system, key, thick] of [['SI', 'min_preheat_C', data.thickest_part_mm], ['US', 'min_preheat_F', data.thickest_part_in]] as const) {
    const unit = system === 'SI' ? '°C' : '°F'
    const at = (degrees: number) => prequalified(one, { system, thickness: num(thick), processes: [data.process as Arc], change(variables) {
      setMetal(variables, data.base_metal as string)
      if (data.electrode) first(variables).filler.classification = data.electrode as string
      variables.preheat.minimum = quantity(degrees, 'temperature', unit)
    } }, 'preheat')
    expect(at(num(wanted[key]))).toMatchObject({ verdict: 'within' })
    expect(at(num(wanted[key])).sentence).toContain(`category ${String(wanted.category)}`)
    expect(at(num(wanted[key]) - 1)).toMatchObject({ verdict: 'outside' })
  }
}

function couponRanges(given: Given, edition: string, content?: (content: CouponContent) => void) {
  const tested = coupon({ ...given, content })
  const qualification = qualifyCoupon(tested, 'aws-d1-1', edition)
  const range = (rule: string) => qualification.ranges.find(({ ruleId }) => ruleId === `aws-d1-1/${rule}`)?.range
  const specimens = Object.fromEntries(qualification.specimens.map(({ kind, required }) => [kind, required]))
  return { range, specimens, qualification }
}
const KIND: Record<string, string> = { reduced_section_tension: 'tension', root_bend: 'root-bend', face_bend: 'face-bend', side_bend: 'side-bend' }
function checkSpecimens(wanted: unknown, had: Record<string, number>): void {
  for (const [name, count] of Object.entries(wanted as Record<string, number>)) expect(had[KIND[name] ?? ''] ?? 0, name).toBe(count)
}

function plateCase({ given: data, expect: wanted, edition }: Case): void {
  for (const [system, thick, expected] of [['US', data.thickness_in, wanted.qualified_in], ['SI', data.thickness_mm, wanted.qualified_mm]] as const) {
    const { range, specimens, qualification } = couponRanges({ system, thickness: num(thick) }, edition, (content) => { content.bends = [] })
    const [min, max] = expected as [number, number | null]
    expect(ends(range('thickness'))).toEqual({ min, max })
    checkSpecimens(wanted.specimens, specimens)
    if (wanted.side_bends_may_replace && system === 'US') expect(qualification.specimens.some(({ alternative }) => alternative?.includes('side bend'))).toBe(true)
  }
}

function pipeCase(system: 'SI' | 'US', diameter: number, wall: number, edition: string) {
  const unit = system === 'SI' ? 'mm' : 'in'
  return couponRanges({ system, thickness: wall, change: (v) => { v.product = 'pipe'; v.diameter = interval(diameter, undefined, 'length', unit) } }, edition)
}

const decided = (one: Case, rule: string, given: Given, tested: (v: WeldingVariables) => void, asked: (v: WeldingVariables) => void) => {
  const found = finding(pair(given, tested, asked, one.edition), rule)
  expect(found.verdict).toBe(one.expect.requalify ? 'outside' : 'within')
  return found
}
const gas = (text: string) => (v: WeldingVariables): void => { first(v).shieldingGas!.components = [...text.matchAll(/(Ar|CO2) (\d+)/g)].map((match) => ({ gas: match[1] as 'Ar', percent: Number(match[2]) })) }

const RUN: Record<string, (one: Case) => void> = {
  'd11p-g01'(one) {
    const draft = procedure({ processes: ['GTAW'], thickness: num(one.given.thickness_mm), change: (v) => setMetal(v, one.given.base_metal as string) })
    const assessment = judge(draft, [], one.edition, 'prequalified')
    expect(assessment.verdict === 'within').toBe(one.expect.prequalified)
    expect(finding(assessment, 'prequalified-process')).toMatchObject({ verdict: 'outside' })
    expect(finding(assessment, 'prequalified-process').sentence).toContain('test')
  },
  'd11p-g02'(one) {
    const verdicts = (one.given.wps as { process: Arc; transfer: string }[]).map(({ process, transfer }) => prequalified(one, { processes: [process], change: (v) => { first(v).electrical.transferMode = TRANSFER[transfer] ?? null } }, 'process').verdict === 'within')
    expect(verdicts).toEqual(one.expect.process_may_be_prequalified)
  },
  'd11p-g03': preheatCase,
  'd11p-g04': preheatCase,
  'd11p-g05': preheatCase,
  'd11p-g06'(one) {
    const [a, b] = [one.given.part_1, one.given.part_2] as { base_metal: string; thickness_mm: number }[]
    const at = (degrees: number) => prequalified(one, { processes: [one.given.process as Arc], change(v) {
      setMetal(v, a!.base_metal, b!.base_metal)
      v.thickness = interval(a!.thickness_mm, undefined, 'length')
      v.thicknessB = interval(b!.thickness_mm, undefined, 'length')
      v.preheat.minimum = quantity(degrees, 'temperature')
    } }, 'preheat')
    expect(at(num(one.expect.min_preheat_C)).verdict).toBe('within')
    expect(at(num(one.expect.min_preheat_C) - 1).verdict).toBe('outside')
    const { sentence } = at(num(one.expect.min_preheat_C))
    expect(sentence).toContain(`category ${(one.expect.categories as string[]).join(' and ')}, up to ${num(one.expect.governing_thickness_mm)} mm`)
  },
  'd11p-g07'(one) {
    const at = (thick: number) => prequalified(one, { processes: ['FCAW'], positions: [PLACE.H!.groove], change(v) {
      first(v).maxPassThickness = quantity(thick, 'length')
      first(v).passes = [{ number: '1', layer: 'root', fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }]
    } }, 'pass-thickness')
    expect(at(num(one.given.root_pass_thickness_mm)).verdict).toBe('outside')
    expect(ends(at(num(one.given.root_pass_thickness_mm)).range).max).toBe(one.expect.limit_mm)
    expect(at(num(one.expect.limit_mm)).verdict).toBe('within')
  },
  'd11p-g08'(one) {
    const at = (system: 'SI' | 'US', size: number) => prequalified(one, { system, positions: [PLACE.V!.groove], change: (v) => { first(v).filler.classification = one.given.electrode as string; first(v).filler.diameters = [quantity(size, 'length', system === 'SI' ? 'mm' : 'in')] } }, 'electrode-diameter')
    expect(at('SI', num(one.given.electrode_diameter_mm)).verdict).toBe('outside')
    expect(ends(at('SI', num(one.given.electrode_diameter_mm)).range).max).toBe(one.expect.limit_mm)
    expect(at('US', 3 / 16).verdict).toBe('outside')
    expect(ends(at('US', 3 / 16).range).max).toBe(5 / 32)
    expect(at('US', 5 / 32).verdict).toBe('within')
  },
  'd11p-g09': filletPass,
  'd11p-g10': filletPass,
  'd11p-g11'(one) {
    const at = (amps: number, layer: 'fill' | 'cap') => prequalified(one, { processes: ['SAW'], change: (v) => { first(v).passes = [{ number: '2', layer, fillerDiameter: null, current: interval(amps, undefined, 'current'), voltage: null, wireFeed: null, travelSpeed: null }] } }, 'current')
    expect(at(num(one.given.amperage_A), 'fill').verdict === 'within').toBe(one.expect.within_limit)
    expect(ends(at(num(one.given.amperage_A), 'fill').range).max).toBe(one.expect.limit_A)
    expect(at(num(one.given.amperage_A), 'cap').verdict).toBe('within')
  },
  'd11p-g12'(one) {
    const at = (leg: number) => prequalified(one, { positions: ['2F'], change(v) {
      Object.assign(v.joint, { weld: 'fillet', type: 'tee', filletLeg: interval(leg, undefined, 'length') })
      v.thickness = interval(num(one.given.part_1_mm), undefined, 'length')
      v.thicknessB = interval(num(one.given.part_2_mm), undefined, 'length')
    } }, 'minimum-fillet')
    expect(at(num(one.expect.min_leg_mm)).verdict).toBe('within')
    expect(at(num(one.expect.min_leg_mm) - 1).verdict).toBe('outside')
    expect(at(num(one.expect.min_leg_mm)).sentence).toContain(`${num(one.expect.T_used_mm)} mm`)
  },
  'd11p-g13'(one) {
    const line = details.find(({ code, angle, opening }) => code === one.given.joint && angle === one.given.stated_angle_deg && opening !== 'T' && opening !== 'T/2' && opening[0].US === one.given.stated_root_opening_in)!
    const may = fitUp(line, { opening: num(one.given.stated_root_opening_in), face: null, angle: num(one.given.stated_angle_deg) }, 'US')
    expect([may.opening!.min, may.opening!.max]).toEqual(one.expect.root_opening_range_in)
    expect([may.angle!.min, may.angle!.max]).toEqual(one.expect.angle_range_deg)
    expect(line.places).toContain('overhead')
    const inside = (span: { min: number; max: number }, value: number): boolean => value >= span.min && value <= span.max
    expect(inside(may.opening!, num(one.given.measured_root_opening_in)) && inside(may.angle!, num(one.given.measured_angle_deg)) && (line.gas !== 'required' || one.given.external_gas)).toBe(one.expect.accept)
  },
  'd11p-g14'(one) {
    const line = details.find(({ code }) => code === one.given.joint)!
    const may = fitUp(line, { opening: num(one.given.stated_root_opening_in), face: 0, angle: num(one.given.stated_angle_deg) }, 'US')
    expect(may.opening!.max).toBe(one.expect.root_opening_max_in)
    expect(may.face!.max).toBe(Infinity)
    const measured = [[may.opening, one.given.measured_root_opening_in], [may.face, one.given.measured_root_face_in], [may.angle, one.given.measured_angle_deg]] as const
    expect(measured.every(([span, value]) => num(value) >= span!.min && num(value) <= span!.max)).toBe(one.expect.accept)
  },
  'd11p-g15'(one) {
    const read = readDesignation(one.given.designation as string)!
    expect({ joint: read.joints.map((joint) => (joint === 'tee' ? 'T' : joint)), penetration: read.penetration, weld_type: read.groove, process: read.processes }).toEqual(one.expect)
  },
  'd11p-g16'(one) {
    const line = details.find(({ code }) => code === one.given.joint)!
    expect(weldSize(line, num(one.given.groove_depth_in), 'vertical', 'US')).toBe(one.expect.weld_size_in)
    expect(weldSize(line, num(one.given.groove_depth_in), 'flat', 'US')).toBe(one.given.groove_depth_in)
  },
  'd11p-g17'(one) {
    const found = prequalified(one, { processes: ['SMAW'], change: (v) => { setMetal(v, one.given.base_metal as string); first(v).filler.classification = one.given.electrode as string } }, 'filler')
    expect(found.verdict).toBe('outside')
    expect(found.sentence).toContain('Group II needs')
    expect(found.basis).toBe('memory')
  },
  'd11p-g18': plateCase,
  'd11p-g19': plateCase,
  'd11p-g20': plateCase,
  'd11p-g21'(one) {
    const us = pipeCase('US', num(one.given.diameter_in), num(one.given.wall_in), one.edition)
    expect(ends(us.range('thickness'))).toEqual({ min: (one.expect.qualified_in as number[])[0], max: (one.expect.qualified_in as number[])[1] })
    expect(ends(us.range('diameter'))).toEqual({ min: one.expect.diameter_min_in, max: null })
    checkSpecimens(one.expect.specimens, us.specimens)
    const si = pipeCase('SI', num(one.given.diameter_mm), num(one.given.wall_mm), one.edition)
    expect(ends(si.range('thickness'))).toEqual({ min: (one.expect.qualified_mm as number[])[0], max: (one.expect.qualified_mm as number[])[1] })
  },
  'd11p-g22'(one) {
    const us = pipeCase('US', 6.625, 0.562, one.edition)
    expect(ends(us.range('thickness'))).toEqual({ min: (one.expect.qualified_in as number[])[0], max: null })
    expect(ends(us.range('diameter'))).toEqual({ min: one.expect.diameter_min_in, max: null })
    checkSpecimens(one.expect.specimens, us.specimens)
  },
  'd11p-g23'(one) {
    const at = (place: string) => finding(judge(procedure({ positions: [PLACE[place]!.groove] }), [coupon({ positions: ['3G'] })], one.edition), 'position').verdict
    for (const place of one.expect.covered as string[]) expect(at(place)).toBe('within')
    for (const place of one.expect.not_covered as string[]) expect(at(place)).toBe('outside')
    expect(finding(judge(procedure({ positions: ['1G', '2G', '3G'] }), [coupon({ positions: ['3G'] })], one.edition), 'position').verdict).toBe('outside')
  },
  'd11p-g24'(one) {
    const fillet = (leg: number, passes: 'single' | 'multiple') => (v: WeldingVariables): void => { Object.assign(v.joint, { weld: 'fillet', type: 'tee', groove: null, filletLeg: interval(leg, undefined, 'length') }); first(v).positions = ['2F']; first(v).technique.passesPerSide = passes }
    const tests = [coupon({ number: 'PQR-S', change: fillet(num(one.given.single_pass_tested_mm), 'single') }), coupon({ number: 'PQR-M', change: fillet(num(one.given.multiple_pass_tested_mm), 'multiple') })]
    const covered = (one.given.production as { type: 'single' | 'multiple'; leg_mm: number }[]).map(({ type, leg_mm }) => finding(judge(procedure({ change: fillet(leg_mm, type) }), tests, one.edition), 'fillet-size').verdict === 'within')
    expect(covered).toEqual(one.expect.covered)
  },
  'd11p-g25': basePair,
  'd11p-g26': basePair,
  'd11p-g27'(one) {
    const [low, high] = one.given.wps_amperage_A as [number, number]
    const found = decided(one, 'amperage', { processes: ['GMAW'] }, (v) => { first(v).electrical.current = interval(num(one.given.pqr_amperage_A), undefined, 'current') }, (v) => { first(v).electrical.current = interval(low, high, 'current') })
    expect(ends(found.range)).toEqual({ min: (one.expect.allowed_A as number[])[0], max: (one.expect.allowed_A as number[])[1] })
  },
  'd11p-g28'(one) {
    const [low, high] = one.given.wps_voltage_V as [number, number]
    const found = decided(one, 'voltage', { processes: ['FCAW'] }, (v) => { first(v).electrical.voltage = interval(num(one.given.pqr_voltage_V), undefined, 'voltage') }, (v) => { first(v).electrical.voltage = interval(low, high, 'voltage') })
    const [min, max] = one.expect.allowed_V as [number, number]
    expect(ends(found.range).min).toBeCloseTo(min, 2)
    expect(ends(found.range).max).toBeCloseTo(max, 2)
  },
  'd11p-g29': (one) => void decided(one, 'filler-diameter', { processes: ['GMAW'] }, (v) => { first(v).filler.diameters = [quantity(num(one.given.pqr_diameter_mm), 'length')] }, (v) => { first(v).filler.diameters = [quantity(num(one.given.wps_diameter_mm), 'length')] }),
  'd11p-g30'(one) {
    decided(one, 'filler-diameter', {}, (v) => { first(v).filler.diameters = [quantity(num(one.given.pqr_diameter_mm), 'length')] }, (v) => { first(v).filler.diameters = [quantity(num(one.given.wps_diameter_mm), 'length')] })
    decided(one, 'filler-diameter', { system: 'US' }, (v) => { first(v).filler.diameters = [quantity(num(one.given.pqr_diameter_in), 'length', 'in')] }, (v) => { first(v).filler.diameters = [quantity(num(one.given.wps_diameter_in), 'length', 'in')] })
  },
  'd11p-g31': (one) => void decided(one, 'shielding-gas', { processes: ['GMAW'] }, gas(one.given.pqr_gas as string), gas(one.given.wps_gas as string)),
  'd11p-g32'(one) {
    const filler = (name: unknown) => (v: WeldingVariables): void => void Object.assign(first(v).filler, { classification: name, specification: null })
    decided(one, 'filler-strength', {}, filler(one.given.pqr_filler), filler(one.given.wps_filler))
    decided(one, 'filler-specification', {}, filler(one.given.pqr_filler), filler(one.given.wps_filler))
    expect(judge(procedure({ change: filler(one.given.wps_filler) }), [coupon({ change: filler(one.given.pqr_filler) })]).verdict).toBe('within')
  },
  'd11p-g33': (one) => void decided(one, 'backing', {}, (v) => { v.joint.backing = 'metal' }, (v) => { Object.assign(v.joint, { backing: 'none', backGouging: one.given.wps_backgouging ? 'grinding' : 'none' }) }),
  'd11p-g34'(one) {
    const judged = bendJudgement(bend('B1', 'side', (one.given.surface_discontinuities_mm as number[]).map((size) => ({ size }))), 'SI')
    expect(judged.verdict === 'pass').toBe(one.expect.accept)
    expect(judged.sum).toBe(one.expect.sum_counted_mm)
  },
  'd11p-g35'(one) {
    const [crack] = one.given.corner_cracks as { length_mm: number; from_slag_or_fusion: boolean }[]
    const judged = bendJudgement(bend('B1', 'side', [{ size: crack!.length_mm, corner: true, flaw: crack!.from_slag_or_fusion }]), 'SI')
    expect(judged).toMatchObject({ disregarded: true, verdict: 'cannot-tell' })
    expect(judged.sentence).toMatch(/disregarded and a replacement/)
  },
  'd11p-g36'(one) {
    const { qualification } = couponRanges({}, one.edition, (content) => { content.visual = visual({ reinforcement: quantity(num(one.given.reinforcement_mm), 'length'), undercut: quantity(num(one.given.undercut_mm), 'length'), cracks: one.given.cracks as boolean }) })
    const result = qualification.results.find(({ testId }) => testId === 'visual')!
    expect(result.verdict === 'pass').toBe(one.expect.accept)
    expect(result.sentence).toContain(`over the ${num(one.expect.limit_mm)} mm`)
    expect(result.clause).toBe('6.10.1')
    expect(qualification.readyToCertify).toBe(false)
  },
  'd11p-g37'(one) {
    const strengths = one.given.results_MPa as number[]
    const { qualification } = couponRanges({}, one.edition, (content) => { setMetal(content.variables, one.given.base_metal as string); content.tension = strengths.map((strength, i) => tension(`T${i + 1}`, strength)) })
    const results = qualification.results.filter(({ testId }) => testId.startsWith('T'))
    expect(results.every(({ verdict }) => verdict === 'pass')).toBe(one.expect.accept)
    expect(strengths.filter((_, i) => results[i]?.verdict === 'fail')).toEqual(one.expect.failing)
    expect(results[0]?.sentence).toContain(`${num(one.given.specified_min_MPa)} MPa`)
  },
}

function filletPass(one: Case): void {
  const { given: data, expect: wanted } = one
  const at = (leg: number) => prequalified(one, { processes: [data.process as Arc], positions: [PLACE[data.position as string]!.fillet], change(v) {
    Object.assign(v.joint, { weld: 'fillet', type: 'tee', filletLeg: interval(leg, undefined, 'length') })
    first(v).technique.passesPerSide = 'single'
  } }, 'single-pass-fillet')
  const found = at(num(data.single_pass_leg_mm))
  expect(found.verdict === 'within').toBe(wanted.within_limit)
  expect(ends(found.range).max).toBe(wanted.limit_mm)
  expect(at(num(wanted.limit_mm)).verdict).toBe('within')
  expect(at(num(wanted.limit_mm) + 0.5).verdict).toBe('outside')
}

function basePair(one: Case): void {
  const set = (names: unknown) => (v: WeldingVariables): void => {
    const [a, b] = names as [string, string]
    setMetal(v, a, b)
    const thick = /\((\d+) mm\)/.exec(a)?.[1]
    if (thick) v.thickness = interval(Number(thick), undefined, 'length')
  }
  const found = finding(pair({}, set(one.given.pqr_pair), set(one.given.wps_pair), one.edition), 'base-metal')
  expect(found.verdict).toBe(one.expect.covered ? 'within' : 'outside')
}

describe('published cases of AWS D1.1', () => {
  const reasons = new Map((disputed as { id: string; reason: string }[]).map((row) => [row.id, row.reason]))
  for (const one of cases) {
    const reason = reasons.get(one.id)
    const name = `${one.id} ${one.title} (${one.edition}; ${one.basis}: ${one.source})`
    const run = RUN[one.id]
    if (!run) test(name, () => expect.fail('no adapter runs this case'))
    else if (reason) test.fails(`disputed: ${name}: ${reason}`, () => run(one))
    else test(name, () => run(one))
  }
  test('every case is run', () => expect(cases.map(({ id }) => id).filter((id) => !RUN[id])).toEqual([]))
})
