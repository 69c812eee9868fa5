/** Published cases of AWS D1.2, and cases of our own. */
import { describe, expect, test } from 'vitest'
import { assess, qualifyCoupon } from '@shared/assessment/assess.ts'
import type { WeldingVariables } from '@shared/schemas/welding.ts'
import { bendSetUp } from '@shared/standards/aws-d1-2/acceptance.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import all from '../../../../fixtures/cases/aws-structural-procedure.json' with { type: 'json' }
import disputed from '../../../../fixtures/cases/disputed.json' with { type: 'json' }
import { bend, coupon, finding, first, judge, pair, problems, procedure, tension, type Arc, type Given } from './records.ts'

interface Case { id: string; standard: string; edition: string; title: string; given: Record<string, unknown>; expect: Record<string, unknown>; source: string; basis: string }
const cases = (all as unknown as Case[]).filter(({ standard }) => standard.includes('D1.2'))

const RUN: Record<string, (one: Case) => void> = {
  'd12p-g38'({ given: data, expect: wanted }) {
    const us = bendSetUp(procedure({ system: 'US', alloy: data.base_metal as string, filler: data.filler as string }).variables, 'US')
    expect(us).toMatchObject({ specimen: wanted.specimen_thickness_in, diameter: wanted.bend_diameter_in, ratio: wanted.ratio_t })
    expect(bendSetUp(procedure({ alloy: data.base_metal as string, filler: data.filler as string }).variables, 'SI')?.diameter).toBe(wanted.bend_diameter_mm)
  },
  'd12p-g39'({ given: data, expect: wanted, edition }) {
    const tested = (strengths: readonly number[], system: 'SI' | 'US' = 'SI') => qualifyCoupon(coupon({ system, alloy: data.base_metal as string, content: (content) => { content.tension = strengths.map((strength, i) => tension(`T${i + 1}`, strength)) } }), 'aws-d1-2', edition).results.filter(({ testId }) => testId.startsWith('T'))
    expect(tested(data.results_MPa as number[]).every(({ verdict }) => verdict === 'pass')).toBe(wanted.accept)
    expect(tested([Number(wanted.required_MPa)])[0]).toMatchObject({ verdict: 'pass' })
    expect(tested([Number(wanted.required_MPa) - 0.1])[0]).toMatchObject({ verdict: 'fail' })
    expect(tested([172], 'US')[0]?.sentence).toContain(`at least ${Number(wanted.required_ksi)} ksi`)
  },
  'd12p-g40'({ given: data, expect: wanted }) {
    for (const [system, degrees, unit] of [['SI', data.service_temperature_C, '°C'], ['US', data.service_temperature_F, '°F']] as const) {
      const verdicts = (data.candidate_fillers as string[]).map((filler) => [filler, finding(judge(procedure({ system, alloy: data.base_metal as string, filler, change: (v) => { v.serviceTemperature = quantity(Number(degrees), 'temperature', unit) } }), []), 'filler-choice').verdict] as const)
      expect(verdicts.filter(([, verdict]) => verdict === 'within').map(([filler]) => filler)).toEqual(wanted.suitable)
      expect(verdicts.filter(([, verdict]) => verdict === 'outside').map(([filler]) => filler)).toEqual(wanted.unsuitable)
    }
  },
}

describe('published cases of AWS D1.2', () => {
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

type Change = (v: WeldingVariables) => void
interface Own { name: string; given?: Given; tested?: Change; asked: Change; rule: string; verdict: 'within' | 'outside' | 'cannot-tell'; says?: RegExp }

/** Our own: what section 7 of the standard's reference says, one variable at a time. */
const OWN: readonly Own[] = [
  { name: '4043 instead of 5356 is another F-Number', asked: (v) => { first(v).filler.classification = 'ER4043' }, rule: 'f-number', verdict: 'outside', says: /F-23 is not covered.*F-22/ },
  { name: '5183 instead of 5356 is the same F-Number', asked: (v) => { first(v).filler.classification = 'ER5183' }, rule: 'f-number', verdict: 'within' },
  { name: 'a filler that is not listed counts by its recorded number', asked: (v) => { Object.assign(first(v).filler, { classification: 'ER5087', fNumber: 'F-22' }) }, rule: 'f-number', verdict: 'within' },
  { name: 'a filler without number', asked: (v) => { first(v).filler.classification = 'LF-ALU' }, rule: 'f-number', verdict: 'cannot-tell' },
  { name: 'no filler instead of filler', asked: (v) => { first(v).filler.added = false }, rule: 'f-number', verdict: 'outside' },
  { name: '6082 stands in M-23 like 6061, by memory', asked: (v) => { v.baseMetals.a.grade = '6082-T6'; v.baseMetals.b.grade = '6082-T6' }, rule: 'm-number', verdict: 'within' },
  { name: '5083 is M-25', asked: (v) => { v.baseMetals.b.grade = '5083-H116' }, rule: 'm-number', verdict: 'outside', says: /M-23 to M-25/ },
  { name: 'a metal that is not named', asked: (v) => { Object.assign(v.baseMetals.a, { grade: null, specification: null }); Object.assign(v.baseMetals.b, { grade: null, specification: null }) }, rule: 'm-number', verdict: 'cannot-tell' },
  { name: 'a casting by its recorded M-Number', asked: (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: 'ASTM B26', grade: 'A356.0', d12MNumber: 'M-26' }) }, rule: 'm-number', verdict: 'outside' },
  { name: 'the tested thickness covers itself', asked: () => undefined, rule: 'thickness', verdict: 'within' },
  { name: 'another thickness is not confirmed', asked: (v) => { v.thickness = interval(12, undefined, 'length') }, rule: 'thickness', verdict: 'cannot-tell', says: /not confirmed/ },
  { name: 'every thickness is not confirmed', asked: (v) => { v.thickness = { min: null, max: null, all: true } }, rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'thickness that contradicts itself', asked: (v) => { v.thickness = interval(12, 3, 'length') }, rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'no thickness', asked: (v) => { v.thickness = null }, rule: 'thickness', verdict: 'cannot-tell' },
  { name: 'a coupon without thickness', tested: (v) => { v.thickness = null }, asked: () => undefined, rule: 'thickness', verdict: 'cannot-tell', says: /PQR-001/ },
  { name: 'amperage inside what was read', asked: (v) => { first(v).electrical.current = interval(185, 195, 'current') }, rule: 'amperage', verdict: 'within' },
  { name: 'amperage beyond what was read', asked: (v) => { first(v).electrical.current = interval(185, 205, 'current') }, rule: 'amperage', verdict: 'cannot-tell' },
  { name: 'voltage beyond what was read', asked: (v) => { first(v).electrical.voltage = interval(22, 26, 'voltage') }, rule: 'voltage', verdict: 'cannot-tell' },
  { name: 'travel speed beyond what was read', asked: (v) => { first(v).electrical.travelSpeed = interval(300, 450, 'travelSpeed') }, rule: 'travel-speed', verdict: 'cannot-tell' },
  { name: 'gas flow of the test', asked: () => undefined, rule: 'gas-flow', verdict: 'within' },
  { name: 'another gas flow', asked: (v) => { first(v).shieldingGas!.flow = interval(25, undefined, 'gasFlow') }, rule: 'gas-flow', verdict: 'cannot-tell' },
  { name: 'a coupon without gas flow', tested: (v) => { first(v).shieldingGas!.flow = null }, asked: () => undefined, rule: 'gas-flow', verdict: 'cannot-tell' },
  { name: 'another preheat', asked: (v) => { v.preheat.minimum = quantity(60, 'temperature') }, rule: 'preheat', verdict: 'cannot-tell' },
  { name: 'another position', asked: (v) => { first(v).positions = ['3G'] }, rule: 'position', verdict: 'cannot-tell', says: /not confirmed/ },
  { name: 'the position tested', asked: () => undefined, rule: 'position', verdict: 'within' },
  { name: 'a coupon without position', tested: (v) => { first(v).positions = [] }, asked: () => undefined, rule: 'position', verdict: 'cannot-tell' },
  { name: 'a procedure without position', asked: (v) => { first(v).positions = [] }, rule: 'position', verdict: 'cannot-tell' },
  { name: 'helium instead of argon', asked: (v) => { first(v).shieldingGas!.components = [{ gas: 'He', percent: 100 }] }, rule: 'shielding-gas', verdict: 'outside' },
  { name: 'another current', given: { process: 'GTAW' }, asked: (v) => { first(v).electrical.currentType = 'DCEN' }, rule: 'current-type', verdict: 'outside' },
  { name: 'backing left out', asked: (v) => { v.joint.backing = 'none' }, rule: 'backing', verdict: 'outside' },
  { name: 'backing added', tested: (v) => { v.joint.backing = 'none' }, asked: () => undefined, rule: 'backing', verdict: 'within' },
  { name: 'downhill after an uphill test', tested: (v) => { first(v).positions = ['3G'] }, asked: (v) => { Object.assign(first(v), { positions: ['3G'], progression: 'down' }) }, rule: 'vertical-progression', verdict: 'outside' },
  { name: 'both directions after a test of both', tested: (v) => { Object.assign(first(v), { positions: ['3G'], progression: 'both' }) }, asked: (v) => { Object.assign(first(v), { positions: ['3G'], progression: 'both' }) }, rule: 'vertical-progression', verdict: 'within' },
  { name: 'cleaning in other words', asked: (v) => { first(v).technique.initialCleaning = 'solvent' }, rule: 'cleaning', verdict: 'cannot-tell' },
  { name: 'cleaning is told in the words that were typed', asked: (v) => { first(v).technique.initialCleaning = 'Solvent  Wipe' }, rule: 'cleaning', verdict: 'cannot-tell', says: /not confirmed/ },
  { name: 'case and hyphens of cleaning don\'t matter', tested: (v) => { first(v).technique.initialCleaning = 'Stainless wire-brush' }, asked: (v) => { first(v).technique.initialCleaning = 'stainless Wire brush' }, rule: 'cleaning', verdict: 'within', says: /stainless wire brush, then/ },
  { name: 'the cleaning that is missing is named', asked: (v) => { first(v).technique.interpassCleaning = null }, rule: 'cleaning', verdict: 'cannot-tell', says: /interpass cleaning/ },
  { name: 'an alloy of magnesium that is not kept', given: { alloy: '5754-H111' }, asked: (v) => { v.preheat.interpassMaximum = quantity(100, 'temperature') }, rule: 'highest-temperature', verdict: 'cannot-tell', says: /5754/ },
  { name: '5052 has too little magnesium for a limit', given: { alloy: '5052-H32' }, asked: (v) => { v.preheat.interpassMaximum = quantity(200, 'temperature') }, rule: 'highest-temperature', verdict: 'within' },
  { name: 'cleaning not stated', asked: (v) => { first(v).technique.initialCleaning = null }, rule: 'cleaning', verdict: 'cannot-tell' },
  { name: 'a single layer after several', asked: (v) => { first(v).technique.passesPerSide = 'single' }, rule: 'layers', verdict: 'cannot-tell' },
  { name: 'heat treatment after an as-welded test', asked: (v) => { v.pwht.condition = 'within-range' }, rule: 'pwht', verdict: 'outside' },
  { name: 'interpass of 6061 over 120 °C', asked: (v) => { v.preheat.interpassMaximum = quantity(121, 'temperature') }, rule: 'highest-temperature', verdict: 'outside' },
  { name: 'interpass of 6061 of 120 °C', asked: (v) => { v.preheat.interpassMaximum = quantity(120, 'temperature') }, rule: 'highest-temperature', verdict: 'within' },
  { name: 'preheat of 6061 over 120 °C', asked: (v) => { v.preheat.minimum = quantity(150, 'temperature') }, rule: 'highest-temperature', verdict: 'outside', says: /Preheat/ },
  { name: 'no interpass temperature for 6061', asked: (v) => { v.preheat.interpassMaximum = null }, rule: 'highest-temperature', verdict: 'cannot-tell' },
  { name: '3003 has no highest temperature', given: { alloy: '3003-O' }, asked: (v) => { v.preheat.interpassMaximum = quantity(200, 'temperature') }, rule: 'highest-temperature', verdict: 'within' },
  { name: 'an alloy that is not named has an unknown limit', given: { alloy: 'plate' }, asked: () => undefined, rule: 'highest-temperature', verdict: 'cannot-tell' },
  { name: 'short-circuiting transfer', asked: (v) => { first(v).electrical.transferMode = 'short-circuiting' }, rule: 'process', verdict: 'outside' },
  { name: 'pulsed spray', asked: (v) => { first(v).electrical.transferMode = 'pulsed-spray' }, rule: 'process', verdict: 'within' },
  { name: 'globular transfer', asked: (v) => { first(v).electrical.transferMode = 'globular' }, rule: 'process', verdict: 'cannot-tell' },
  { name: 'transfer not stated', asked: (v) => { first(v).electrical.transferMode = null }, rule: 'process', verdict: 'cannot-tell' },
  { name: 'SMAW only by agreement', given: { process: 'SMAW' }, asked: () => undefined, rule: 'process', verdict: 'cannot-tell' },
  { name: 'plasma with variable polarity', given: { process: 'PAW' }, asked: () => undefined, rule: 'process', verdict: 'within' },
  { name: 'plasma with direct current', given: { process: 'PAW' }, asked: (v) => { first(v).electrical.currentType = 'DCEN' }, rule: 'process', verdict: 'cannot-tell' },
  { name: '4043 on 5083', given: { alloy: '5083-H116', filler: 'ER4043' }, asked: () => undefined, rule: 'filler-choice', verdict: 'outside' },
  { name: '6061 without filler', asked: (v) => { first(v).filler.added = false }, rule: 'filler-choice', verdict: 'cannot-tell' },
  { name: '1100 without filler', given: { alloy: '1100-O' }, asked: (v) => { first(v).filler.added = false }, rule: 'filler-choice', verdict: 'within' },
  { name: 'no filler stated', asked: (v) => { first(v).filler.classification = null }, rule: 'filler-choice', verdict: 'cannot-tell' },
  { name: 'a filler of which hot service is not known', given: { filler: 'ER1100' }, asked: (v) => { v.serviceTemperature = quantity(100, 'temperature') }, rule: 'filler-choice', verdict: 'cannot-tell' },
  { name: 'service of 65 °C is not hot', asked: (v) => { v.serviceTemperature = quantity(65, 'temperature') }, rule: 'filler-choice', verdict: 'within' },
  { name: 'a fillet after a groove test', asked: (v) => { v.joint.weld = 'fillet' }, rule: 'weld-kind', verdict: 'cannot-tell' },
  { name: 'a groove after a fillet test', tested: (v) => { v.joint.weld = 'fillet' }, asked: () => undefined, rule: 'weld-kind', verdict: 'outside' },
  { name: 'partial penetration after the same', tested: (v) => { v.joint.penetration = 'partial' }, asked: (v) => { v.joint.penetration = 'partial' }, rule: 'weld-kind', verdict: 'within' },
  { name: 'pipe after a plate test', asked: (v) => { v.product = 'pipe'; v.diameter = interval(100, undefined, 'length') }, rule: 'diameter', verdict: 'cannot-tell' },
  { name: 'the tested pipe', tested: (v) => { v.product = 'pipe'; v.diameter = interval(100, undefined, 'length') }, asked: (v) => { v.product = 'pipe'; v.diameter = interval(100, undefined, 'length') }, rule: 'diameter', verdict: 'within' },
  { name: 'all diameters', tested: (v) => { v.product = 'pipe'; v.diameter = interval(100, undefined, 'length') }, asked: (v) => { v.product = 'pipe'; v.diameter = { min: null, max: null, all: true } }, rule: 'diameter', verdict: 'cannot-tell' },
]

describe('our own cases of AWS D1.2', () => {
  test.each(OWN)('$name: $rule $verdict', ({ given, tested, asked, rule, verdict, says }) => {
    const found = finding(pair(given ?? {}, tested ?? (() => undefined), asked), rule)
    expect(found.sentence).not.toBe('')
    expect({ verdict: found.verdict, sentence: found.sentence }).toMatchObject({ verdict })
    if (says) expect(found.sentence).toMatch(says)
    if (verdict === 'cannot-tell') expect(found.missing.length).toBeGreaterThan(0)
  })
  test.each<Arc>(['GMAW', 'GTAW', 'PAW'])('a procedure like its coupon is within: %s', (process) => {
    expect(problems(judge(procedure({ process }), [coupon({ process })]))).toEqual([])
  })
  test('another process is never covered', () => {
    expect(finding(judge(procedure({ process: 'GTAW' }), [coupon()]), 'process')).toMatchObject({ verdict: 'outside', tested: ['GMAW'] })
    expect(finding(judge(procedure(), []), 'process')).toMatchObject({ verdict: 'cannot-tell' })
    expect(finding(judge(procedure({ process: 'GTAW' }), [coupon({ change: (v) => { first(v).process = null } })]), 'process').verdict).toBe('cannot-tell')
    expect(finding(judge(procedure({ process: 'GTAW' }), [coupon({ number: 'A' }), coupon({ number: 'B' })]), 'process').sentence).toContain('A and B were')
  })
  test('there is no prequalified route', () => {
    const assessment = judge(procedure(), [coupon()], 'prequalified')
    expect(assessment.verdict).toBe('cannot-tell')
    expect(assessment.findings.map(({ ruleId }) => ruleId)).toEqual(['assessment/route'])
  })
  test('an unknown edition is named', () => expect(assess({ procedure: procedure(), coupons: [], standard: 'aws-d1-2', edition: '1999' }).findings[0]?.ruleId).toBe('assessment/edition'))
})

describe('bend set-up', () => {
  test.each([
    ['6061-T6', 'ER5356', 16.5, 52.4, 3], ['6061-O', 'ER5356', 20 / 3, 63.5, null], ['6061-O', 'ER4043', 16.5, 52.4, 3], ['5083-H116', 'ER5356', 20 / 3, 63.5, null],
    ['7005-T53', 'ER5356', 8, 76.2, null], ['2219-O', 'ER2319', 8, 76.2, null], ['3003-O', 'ER1100', 4, 38.1, null], ['5052-H32', 'ER5356', 4, 38.1, null],
  ] as const)('%s with %s: %f t', (alloy, filler, ratio, diameter, specimen) => {
    const setUp = bendSetUp(procedure({ alloy, filler }).variables, 'SI')
    expect(setUp?.ratio).toBeCloseTo(ratio, 9)
    expect(setUp).toMatchObject({ diameter, specimen })
  })
  test('a thinner specimen keeps the ratio', () => expect(bendSetUp(procedure({ alloy: '5052-H32' }).variables, 'SI', 5)?.diameter).toBe(20))
  test.each(['2219-T87', 'plate'])('%s falls under no line', (alloy) => expect(bendSetUp(procedure({ alloy, filler: 'ER2319' }).variables, 'SI')).toBeNull())
})

describe('a coupon by itself', () => {
  const qualify = (given: Parameters<typeof coupon>[0]) => qualifyCoupon(coupon(given), 'aws-d1-2', '2014')
  test('ready when all is recorded', () => {
    expect(qualify({}).missing).toEqual([])
    expect(qualify({})).toMatchObject({ readyToCertify: true, standard: 'aws-d1-2' })
  })
  test('numbers of specimens are named as not confirmed', () => {
    expect(qualify({}).specimens.map(({ kind, required, alternative }) => ({ kind, required, told: alternative?.includes('not confirmed') }))).toEqual([{ kind: 'tension', required: 0, told: true }, { kind: 'bend', required: 0, told: true }])
    expect(qualify({ content: (c) => { c.tension = []; c.bends = [] } }).missing.map(({ field }) => field)).toEqual(['tension', 'bends'])
  })
  test.each([
    ['5083-H116', 275], ['5083-H111', 270], ['5456-H321', 290], ['5456-H112', 285], ['5086-H32', 240], ['5454-O', 215], ['6063-T5', 115], ['6005A-T61', 165], ['3003-O', 95], ['3004-O', 150], ['2219-T87', 240], ['7005-T53', 275], ['5052-H32', 170],
  ] as const)('%s needs %i MPa', (alloy, needed) => {
    const results = (strength: number) => qualify({ alloy, content: (c) => { c.tension = [tension('T1', strength)]; c.bends = [] } }).results[0]
    expect(results(needed)?.verdict).toBe('pass')
    expect(results(needed - 1)?.verdict).toBe('fail')
  })
  test('of two alloys the lower strength counts', () => expect(qualify({ content: (c) => { c.variables.baseMetals.b.grade = '6063-T6'; c.tension = [tension('T1', 120)] } }).results[0]).toMatchObject({ verdict: 'pass', basis: 'memory' }))
  test.each(['6061', '5083', 'plate'])('%s without a listed temper gives no strength', (alloy) => expect(qualify({ alloy }).results[0]?.verdict).toBe('cannot-tell'))
  test('a temper may stand in its own field', () => expect(qualify({ alloy: '6061', content: (c) => { for (const metal of [c.variables.baseMetals.a, c.variables.baseMetals.b]) metal.condition = 'T6' } }).results[0]?.verdict).toBe('pass'))
  test('bends: no opening passes, an opening can\'t be told, a break fails', () => {
    const of = (change: Partial<ReturnType<typeof bend>>) => qualify({ content: (c) => { c.tension = []; c.bends = [{ ...bend('B1'), ...change }] } }).results[0]?.verdict
    expect([of({}), of({ openings: [{ size: quantity(1, 'length'), corner: false, fromInternalFlaw: null }] }), of({ openings: [1, 2].map((size) => ({ size: quantity(size, 'length'), corner: false, fromInternalFlaw: null })) }), of({ broke: true }), of({ inspected: false })]).toEqual(['pass', 'cannot-tell', 'cannot-tell', 'fail', 'cannot-tell'])
  })
  test('the former and the thinned specimen are checked', () => {
    const missing = (thickness: number, former: number, alloy = '6061-T6') => qualify({ alloy, content: (c) => { c.bends = [bend('B1', thickness, former)]; c.tension = [tension('T1', 300)] } }).missing.map(({ message }) => message)
    expect(missing(3, 52.4)).toEqual([])
    expect(missing(3, 60)[0]).toContain('52.4 mm (16 1/2 t)')
    expect(missing(10, 38)[0]).toContain('thinned to 3 mm')
    expect(missing(10, 70, '5083-H116')[0]).toContain('63.5 mm (6 2/3 t)')
    expect(missing(0, 70, '5083-H116')).toEqual([])
    expect(missing(10, 60, '5083-H116')).toEqual([])
  })
  test('a fillet coupon: crack and incomplete fusion fail, the rest is not confirmed', () => {
    const macro = (cracks: boolean | null, fusionComplete: boolean | null) => qualify({ content: (c) => { c.variables.joint.weld = 'fillet'; c.tension = []; c.bends = []; c.macros = [{ id: 'm1', specimen: 'M1', cracks, fusionComplete, leg1: null, leg2: null }] } })
    expect([macro(true, true), macro(false, false), macro(false, true), macro(null, null)].map(({ results }) => results[0]?.verdict)).toEqual(['fail', 'fail', 'cannot-tell', 'cannot-tell'])
    expect(macro(false, true).specimens.map(({ kind }) => kind)).toEqual(['macro'])
    expect(qualify({ content: (c) => { c.variables.joint.weld = 'fillet'; c.macros = [] } }).missing.some(({ field }) => field === 'macros')).toBe(true)
  })
  test('what was rejected or cracked fails', () => {
    const { results, missing } = qualify({ content: (c) => { c.ndt = [{ id: 'n1', method: 'RT', accepted: false, reportNumber: null, note: null }, { id: 'n2', method: 'UT', accepted: true, reportNumber: null, note: null }]; c.visual = { cracks: true, cratersFull: null, rootSound: null, profileAccepted: null, reinforcement: null, undercut: null, rootConcavity: null, meltThrough: null, weldThickness: null } } })
    expect(results.filter(({ verdict }) => verdict === 'fail').map(({ testId }) => testId)).toEqual(['n1', 'visual'])
    expect(missing.map(({ field }) => field)).toEqual(['ndt.0', 'visual'])
  })
  test('what the record lacks is named by field', () => {
    const bare = qualify({ content: (c) => { Object.assign(c, { weldedOn: null, welder: null, laboratory: null, reportNumber: null }); c.variables.thickness = null; first(c.variables).process = null } })
    expect(qualify({ content: (c) => { c.visual = null } }).missing.map(({ field }) => field)).toEqual(['visual'])
    expect(qualify({ content: (c) => { c.ndt = [{ id: 'n1', method: 'RT', accepted: null, reportNumber: null, note: null }] } }).missing.map(({ field }) => field)).toEqual(['ndt.0'])
    expect(bare.missing.map(({ field }) => field)).toEqual(['variables.thickness', 'weldedOn', 'welder', 'laboratory', 'reportNumber', 'variables.processes.0.process'])
    expect(qualify({ change: (v) => { first(v).electrical.current = null; v.pwht.condition = null } }).missing.map(({ field }) => field)).toEqual(['variables.processes.0.electrical.current', 'variables.pwht.condition'])
  })
})
