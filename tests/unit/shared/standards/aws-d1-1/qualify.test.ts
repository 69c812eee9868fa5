/** A test weld by itself: specimens, acceptance with retests, and what is missing. */
import { describe, expect, test } from 'vitest'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import { plungerDiameter } from '@shared/standards/aws-d1-1/acceptance.ts'
import { clauseIn } from '@shared/standards/aws-d1-1/editions.ts'
import { hydrogenLimit, specification, strengthClass } from '@shared/standards/aws-d1-1/fillers.ts'
import { specimenCount } from '@shared/standards/aws-d1-1/specimens.ts'
import { groupsOf, preheatCategory } from '@shared/standards/aws-d1-1/steels.ts'
import { baseMetalSchema, fillerSchema } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { bend, coupon, first, tension, visual, type GivenCoupon } from './records.ts'

const qualify = (given: GivenCoupon = {}, edition = '2020') => qualifyCoupon(coupon(given), 'aws-d1-1', edition)
const content = (change: (c: CouponContent) => void, given: GivenCoupon = {}) => qualify({ ...given, content: change })
const macro = (cracks: boolean | null, fusionComplete: boolean | null, leg1: number | null = null, leg2: number | null = leg1): CouponContent['macros'][number] => ({ id: `m${leg1}${leg2}`, specimen: 'M1', cracks, fusionComplete, leg1: leg1 === null ? null : quantity(leg1, 'length'), leg2: leg2 === null ? null : quantity(leg2, 'length') })
const fillet = (more: (c: CouponContent) => void = () => undefined) => (c: CouponContent): void => {
  Object.assign(c.variables.joint, { weld: 'fillet', type: 'tee', filletLeg: interval(8, undefined, 'length') })
  c.tension = []
  c.bends = []
  c.macros = [macro(false, true, 8), macro(false, true, 9), macro(false, true, 8.5)]
  more(c)
}

describe('a complete test weld', () => {
  test.each(['SI', 'US'] as const)('is ready to certify: %s', (system) => {
    expect(qualify({ system }).missing).toEqual([])
    expect(qualify({ system }).readyToCertify).toBe(true)
  })
  test('shows a range for each essential variable, none of prequalification, CVN only when tested', () => {
    const ids = qualify({ processes: ['GMAW'] }).ranges.map(({ ruleId }) => ruleId)
    expect(ids).toEqual(expect.arrayContaining(['aws-d1-1/thickness', 'aws-d1-1/position', 'aws-d1-1/amperage', 'aws-d1-1/gas-flow', 'aws-d1-1/base-metal']))
    expect(ids.filter((id) => id.includes('prequalified') || id.includes('cvn'))).toEqual([])
    expect(qualify({ toughness: true }).ranges.filter(({ class: kind }) => kind === 'supplementary').length).toBeGreaterThan(5)
  })
  test('numbers its clauses as the edition does', () => {
    expect(qualify({}, '2015').results.map(({ clause }) => clause)).toEqual(['4.9.3', '4.9.3', '4.9.3.3', '4.9.3.3', '4.9.3.3', '4.9.3.3', '4.9.1', '4.9.2'])
    expect(clauseIn('2010', 'Table 10.9')).toBe('Table 4.2')
    expect(clauseIn('2015', 'Clause 1')).toBe('Clause 1')
    expect(clauseIn('2020', 'Table 6.5 row 1')).toBe('Table 6.5 row 1')
  })
})

describe('specimens', () => {
  test.each([
    ['complete', 10, 'SI', { tension: 2, face: 2, root: 2, side: 0, macro: 0, sideMayReplace: true }], ['complete', 10.1, 'SI', { tension: 2, face: 0, root: 0, side: 4, macro: 0, sideMayReplace: false }],
    ['complete', 3 / 8, 'US', { face: 2, root: 2, side: 0 }], ['partial', 8, 'SI', { tension: 2, face: 2, root: 2, side: 0, macro: 3 }], ['partial', 25, 'SI', { tension: 2, side: 4, macro: 3 }],
    ['fillet', 0, 'SI', { tension: 0, side: 0, macro: 3 }],
  ] as const)('%s %f %s', (kind, T, system, wanted) => expect(specimenCount(kind, T, system)).toMatchObject(wanted))
  test('no row, no number', () => {
    expect(specimenCount('complete', 2, 'SI')).toBeNull()
    expect(specimenCount('partial', 26, 'SI')).toBeNull()
    expect(qualify({ thickness: 2 }).missing.map(({ message }) => message).join()).toContain('no row for this test (2 mm)')
  })
  test('side bends may stand in at exactly 10 mm', () => {
    expect(qualify({ thickness: 10 }).specimens.map(({ kind, required, recorded }) => [kind, required, recorded])).toEqual([['tension', 2, 2], ['side-bend', 4, 4]])
    expect(content((c) => { c.bends = [bend('F1', 'face'), bend('F2', 'face'), bend('R1', 'root'), bend('R2', 'longitudinal-root')] }, { thickness: 8 }).missing).toEqual([])
    expect(content((c) => { c.bends = [bend('F1', 'face')] }, { thickness: 10 }).missing.map(({ message }) => message)).toEqual(['Face bends: 2 are required, 1 is recorded.', 'Root bends: 2 are required, 0 are recorded.'])
  })
  test('partial penetration asks for macro sections as well', () => {
    const partial = content((c) => { c.variables.joint.penetration = 'partial'; c.macros = [macro(false, true)]; c.ndt = [] })
    expect(partial.specimens.map(({ kind }) => kind)).toEqual(['macro', 'tension', 'side-bend'])
    // How large the weld came out is no part of the record: a person judges each section.
    expect(partial.missing.map(({ field }) => field)).toEqual(['macros', 'macros.0'])
    expect(partial.results.find(({ testId }) => testId.startsWith('m'))).toMatchObject({ verdict: 'cannot-tell' })
    expect(content((c) => { c.variables.joint.penetration = 'partial'; first(c.variables).depositThickness = null }).specimens).toEqual([])
  })
  test('a fillet test asks for three macro sections, no radiography', () => {
    expect(content(fillet((c) => { c.ndt = [] }))).toMatchObject({ readyToCertify: true, specimens: [{ kind: 'macro', required: 3, recorded: 3 }] })
  })
})

describe('bends', () => {
  const one = (...args: Parameters<typeof bend>) => content((c) => { c.bends = [bend(...args)] }).results.find(({ testId }) => testId === args[0])
  test.each([
    ['3 mm is allowed', [{ size: 3 }], 'pass'], ['3.1 mm is not', [{ size: 3.1 }], 'fail'],
    ['a sum of 10 mm is allowed', [{ size: 3 }, { size: 3 }, { size: 2.5 }, { size: 1.5 }], 'pass'], ['a sum over 10 mm is not', [{ size: 3 }, { size: 3 }, { size: 3 }, { size: 1.1 }], 'fail'],
    ['those of 1 mm are not added', [{ size: 3 }, { size: 3 }, { size: 3 }, { size: 1 }, { size: 1 }], 'pass'],
    ['a corner crack of 6 mm without flaw', [{ size: 6, corner: true, flaw: false }], 'pass'], ['a corner crack of 3 mm from slag', [{ size: 3, corner: true, flaw: true }], 'pass'],
    ['a corner crack of 3.5 mm from slag', [{ size: 3.5, corner: true, flaw: true }], 'fail'], ['a corner crack of unknown origin', [{ size: 4, corner: true }], 'cannot-tell'], ['a small one of unknown origin', [{ size: 2, corner: true }], 'pass'],
  ] as const)('%s: %s', (_name, openings, verdict) => expect(one('B1', 'side', openings)?.verdict).toBe(verdict))
  test('bent to less than 180°', () => {
    const of = (angle: number | null) => content((c) => { c.bends = [{ ...bend('B1'), angle: angle === null ? null : quantity(angle, 'angle') }] }).results.find(({ testId }) => testId === 'B1')?.verdict
    expect([of(90), of(180), of(null)]).toEqual(['cannot-tell', 'pass', 'pass'])
  })
  test('broken, or not looked at', () => {
    expect(content((c) => { c.bends = [{ ...bend('B1'), broke: true }] }).results.find(({ testId }) => testId === 'B1')?.verdict).toBe('fail')
    expect(content((c) => { c.bends = [{ ...bend('B1'), inspected: false }] }).results.find(({ testId }) => testId === 'B1')?.verdict).toBe('cannot-tell')
  })
  test('a disregarded specimen does not count, and its replacement settles it', () => {
    const long = bend('B4', 'side', [{ size: 7, corner: true, flaw: false }])
    const open = content((c) => { c.bends = ['B1', 'B2', 'B3'].map((id) => bend(id)).concat(long) })
    expect(open.specimens.find(({ kind }) => kind === 'side-bend')?.recorded).toBe(3)
    expect(open.readyToCertify).toBe(false)
    const settled = content((c) => { c.bends = ['B1', 'B2', 'B3', 'B5'].map((id) => bend(id)).concat(long) })
    expect(settled.results.find(({ testId }) => testId === 'B4')).toMatchObject({ verdict: 'pass' })
    expect(settled.missing).toEqual([])
  })
  test('plunger by yield strength', () => {
    expect([345, 346, 619, 620].map((y) => plungerDiameter(y, 'SI'))).toEqual([38.1, 50.8, 50.8, 63.5])
    expect([50, 51, 89.9, 90].map((y) => plungerDiameter(y, 'US'))).toEqual([1.5, 2, 2, 2.5])
  })
  test('a former that is too large is named; one for another thickness is not judged', () => {
    const of = (former: number | null, thickness = 10) => content((c) => { c.bends[0] = { ...bend('B1'), thickness: quantity(thickness, 'length'), formerDiameter: former === null ? null : quantity(former, 'length') } }).missing.map(({ field }) => field)
    expect(of(45)).toEqual(['bends.0.formerDiameter'])
    expect([of(38.1), of(45, 15), of(null)]).toEqual([[], [], []])
    expect(content((c) => { c.bends[0] = { ...bend('B1'), thickness: quantity(0.375, 'length', 'in'), formerDiameter: quantity(2, 'length', 'in') } }, { system: 'US' }).missing.map(({ message }) => message)).toEqual(['B1 was bent over 2 in; the plunger for this base metal is 1.5 in.'])
  })
})

describe('tension', () => {
  const of = (strength: number, given: GivenCoupon = {}, change: (c: CouponContent) => void = () => undefined) => content((c) => { c.tension = [tension('T1', strength), tension('T2', 520)]; change(c) }, given).results[0]
  test('the weaker metal rules, without allowance for a break in the base metal', () => {
    expect(of(449)).toMatchObject({ verdict: 'fail' })
    expect(of(449)?.sentence).toContain('also where it breaks in the base metal')
    expect(of(410, {}, (c) => { Object.assign(c.variables.baseMetals.b, { specification: 'ASTM A36', grade: null }) })?.verdict).toBe('pass')
    expect(of(440, {}, (c) => { c.tension[0]!.fracture = 'weld' })?.sentence).not.toContain('also where')
  })
  test('a steel that the table lacks counts by its recorded strength, or can\'t be told', () => {
    expect(of(480, { steel: ['EN 10025-2', 'S355J2'] })?.verdict).toBe('pass')
    expect(of(480, { steel: ['EN 10025-2', 'S355J2'] }, (c) => { c.variables.baseMetals.a.minTensile = null })?.verdict).toBe('cannot-tell')
    expect(of(480, { steel: ['ASTM A588', 'K'] })?.verdict).toBe('fail')
  })
  test('what is recorded decides how the stress is known', () => {
    const with_ = (more: Partial<CouponContent['tension'][number]>) => of(500, {}, (c) => { Object.assign(c.tension[0]!, more) })
    expect(with_({ load: null, reportedStrength: quantity(460, 'stress') })).toMatchObject({ verdict: 'pass', computed: null })
    expect(with_({ load: null })?.verdict).toBe('cannot-tell')
    expect(with_({ kind: 'turned', diameter: quantity(20, 'length'), width: null, load: quantity(150, 'force') })).toMatchObject({ verdict: 'pass' })
    expect(with_({ width: null, diameter: quantity(20, 'length'), load: quantity(100, 'force') })).toMatchObject({ verdict: 'fail' })
    expect(with_({ width: null })?.verdict).toBe('cannot-tell')
    expect(of(500, { system: 'US' })?.sentence).toContain('65 ksi')
  })
})

describe('retests', () => {
  const strengths = (...values: number[]) => (c: CouponContent): void => { c.tension = values.map((value, i) => tension(`T${i + 1}`, value)) }
  const failing = (values: number[], thickness = 20) => content(strengths(...values), { thickness }).results.find(({ testId }) => testId === 'T1')
  test('one failure asks for two more, both of which must pass', () => {
    expect(failing([440, 500])).toMatchObject({ verdict: 'fail' })
    expect(failing([440, 500])?.sentence).toContain('two retests')
    expect(failing([440, 500, 500])?.verdict).toBe('fail')
    expect(failing([440, 500, 500, 500])).toMatchObject({ verdict: 'pass', clause: '6.10.5' })
    expect(failing([440, 500, 500, 440])?.sentence).toContain('More than one')
  })
  test('over 38 mm all specimens of two more places', () => {
    expect(failing([440, 500, 500, 500], 40)?.verdict).toBe('fail')
    expect(failing([440, 500, 500, 500, 500, 500], 40)?.verdict).toBe('pass')
    expect(failing([440, 500], 40)?.sentence).toContain('two more locations')
  })
})

describe('macro sections', () => {
  test.each([
    ['a crack', macro(true, true, 8), 'fail'], ['incomplete fusion', macro(false, false, 8), 'fail'], ['nothing recorded', macro(null, null, 8), 'cannot-tell'], ['a short leg', macro(false, true, 8, 7.5), 'fail'], ['a leg not recorded', macro(false, true, 8, null), 'cannot-tell'], ['both legs', macro(false, true, 8), 'pass'],
  ] as const)('%s', (_name, section, verdict) => expect(content(fillet((c) => { c.macros = [section] })).results[0]?.verdict).toBe(verdict))
  test('of a groove need no legs', () => expect(content((c) => { c.macros = [macro(false, true)] }).results.find(({ testId }) => testId.startsWith('m'))?.verdict).toBe('pass'))
  test('without a specified leg can\'t be told', () => expect(content(fillet((c) => { c.variables.joint.filletLeg = null })).results[0]?.verdict).toBe('cannot-tell'))
})

describe('visual and non-destructive examination', () => {
  const of = (change: Parameters<typeof visual>[0], more: (c: CouponContent) => void = () => undefined) => content((c) => { c.visual = visual(change); more(c) }).results.find(({ testId }) => testId === 'visual')
  test.each([
    ['a crack', { cracks: true }, 'fail'], ['a crater', { cratersFull: false }, 'fail'], ['undercut over 1 mm', { undercut: quantity(1.1, 'length') }, 'fail'], ['undercut of 1 mm', { undercut: quantity(1, 'length') }, 'pass'],
    ['the root', { rootSound: false }, 'fail'], ['melt-through over 3 mm', { meltThrough: quantity(3.5, 'length') }, 'fail'], ['concavity over 2 mm', { rootConcavity: quantity(2.5, 'length'), weldThickness: quantity(21, 'length') }, 'fail'],
    ['concavity with enough weld', { rootConcavity: quantity(1, 'length'), weldThickness: quantity(20, 'length') }, 'pass'], ['concavity with too little weld', { rootConcavity: quantity(1, 'length'), weldThickness: quantity(19, 'length') }, 'fail'],
    ['concavity of unknown weld', { rootConcavity: quantity(1, 'length') }, 'cannot-tell'], ['undercut not recorded', { undercut: null }, 'cannot-tell'], ['several things not recorded', { cracks: null, reinforcement: null }, 'cannot-tell'],
  ] as const)('%s: %s', (_name, change, verdict) => expect(of(change)?.verdict).toBe(verdict))
  test('a fillet is judged by its profile, not by reinforcement', () => {
    const profile = (value: boolean | null) => content(fillet((c) => { c.visual = visual({ profileAccepted: value, reinforcement: null, rootSound: null }) })).results.find(({ testId }) => testId === 'visual')?.verdict
    expect([profile(true), profile(false), profile(null)]).toEqual(['pass', 'fail', 'cannot-tell'])
  })
  test.each([
    [{ accepted: false }, 'fail'], [{ accepted: null }, 'cannot-tell'], [{ wholeLength: false }, 'fail'], [{ wholeLength: null }, 'cannot-tell'], [{ method: 'MT' as const, wholeLength: null }, 'pass'],
  ])('%j is %s', (change, verdict) => expect(content((c) => { Object.assign(c.ndt![0]!, change) }).results.find(({ testId }) => testId === 'n1')?.verdict).toBe(verdict))
  test('a complete-penetration test needs radiography or ultrasonics', () => {
    expect(content((c) => { c.ndt = [{ id: 'n1', method: 'MT', accepted: true, reportNumber: null, note: null }]; c.visual = null }).missing.map(({ field }) => field)).toEqual(['visual', 'ndt'])
    expect(content((c) => { delete c.ndt }).missing.map(({ field }) => field)).toEqual(['ndt'])
  })
})

describe('CVN', () => {
  const of = (values: number[], energy: number | null = 50) => content((c) => { c.toughness[0]!.values = values.map((value) => quantity(value, 'energy')); c.variables.impactEnergy = energy === null ? null : quantity(energy, 'energy') }, { toughness: true })
  const verdict = (...args: Parameters<typeof of>) => of(...args).results.find(({ testId }) => testId === 'c1')?.verdict
  test('is judged by what the contract asks', () => {
    expect([verdict([60, 70, 65]), verdict([40, 70, 65]), verdict([40, 45, 50]), verdict([], 50), verdict([60], null)]).toEqual(['pass', 'cannot-tell', 'fail', 'cannot-tell', 'cannot-tell'])
    expect(of([]).missing.some(({ field }) => field === 'toughness')).toBe(true)
  })
  test('in the heat-affected zone it is named so', () => expect(content((c) => { c.toughness[0]!.place = 'heat-affected-zone' }, { toughness: true }).results.find(({ testId }) => testId === 'c1')?.sentence).toContain('heat-affected zone'))
  test('a weld for CVN alone needs no mechanical specimens', () => {
    const alone = content((c) => { c.tension = []; c.bends = []; c.variables.impactEnergy = quantity(50, 'energy') }, { toughness: true })
    expect(alone.missing).toEqual([])
  })
})

describe('what the record lacks', () => {
  test('is named by field', () => {
    const bare = content((c) => { Object.assign(c, { weldedOn: null, welder: null, laboratory: null, reportNumber: null, visual: null, ndt: [] }); c.variables.thickness = null; first(c.variables).process = null })
    expect(bare.missing.map(({ field }) => field)).toEqual(['variables.thickness', 'weldedOn', 'welder', 'laboratory', 'reportNumber', 'variables.processes.0.process', 'visual', 'ndt'])
  })
  test('and each essential variable that gives no range', () => {
    const bare = qualify({ processes: ['GMAW'], change: (v) => { first(v).electrical.voltage = null; v.preheat.minimum = null; first(v).positions = []; v.joint.backing = null } })
    expect(bare.missing.map(({ field }) => field)).toEqual(['variables.processes.0.positions', 'variables.processes.0.electrical.voltage', 'variables.joint.backing', 'variables.preheat.minimum'])
  })
  test('a failed test is named by its place', () => expect(content((c) => { c.tension[1] = tension('T2', 300) }).missing.map(({ field }) => field)).toEqual(['tension.1']))
})

describe('readings of names', () => {
  const filler = (classification: string | null, more: object = {}) => fillerSchema.parse({ classification, ...more })
  test.each([
    ['SMAW', 'E7018', 70], ['SMAW', 'AWS E7018-1 H4R', 70], ['SMAW', 'E11018-M', 110], ['SMAW', 'E5518', 80], ['GMAW', 'ER70S-6', 70], ['GMAW', 'E80C-Ni1', 80], ['GMAW', 'ER49S-6', 70], ['GTAW', 'ER80S-B2', 80], ['FCAW', 'E101T1-K3C', 100], ['FCAW', 'E491T-1C', 70], ['FCAW', 'ER70S-6', null], ['SMAW', 'E9918', null], ['SMAW', 'basic', null],
  ] as const)('%s %s is of %s ksi', (process, name, ksi) => expect(strengthClass(process, filler(name))).toBe(ksi))
  test('SAW by its flux class', () => {
    expect(strengthClass('SAW', filler('EM12K', { fluxClassification: 'F8A2-ENi1-Ni1' }))).toBe(80)
    expect(strengthClass('SAW', filler('F7A2-EM12K'))).toBe(70)
    expect(strengthClass(null, filler('E7018'))).toBeNull()
  })
  test.each([
    ['SMAW', 'E7018', 'A5.1'], ['SMAW', 'E8018-C3', 'A5.5'], ['SMAW', 'E7018-1', 'A5.1'], ['GMAW', 'ER70S-6', 'A5.18'], ['GMAW', 'E70C-6M', 'A5.18'], ['GMAW', 'ER70S-A1', 'A5.28'], ['GMAW', 'E80C-Ni1', 'A5.28'], ['FCAW', 'E71T-1C', 'A5.20'], ['FCAW', 'E81T1-Ni1C', 'A5.29'], ['GMAW', 'LF', null],
  ] as const)('%s %s is of %s', (process, name, spec) => expect(specification(process, filler(name))).toBe(spec))
  test('SAW specification by its flux class', () => {
    expect(specification('SAW', filler('EM12K', { fluxClassification: 'F7A2-EM12K' }))).toBe('A5.17')
    expect(specification('SAW', filler('EM12K'))).toBeNull()
  })
  test.each([['E7018-H8', 8], ['E7018 H4R', 4], ['E7018', null], ['E7018-H16', 16], ['E7018-H5', null]] as const)('%s holds %s mL', (name, ml) => expect(hydrogenLimit(filler(name))).toBe(ml))
  test('no classification, no hydrogen', () => expect(hydrogenLimit(filler(null))).toBeNull())
  const metal = (specification_: string | null, grade: string | null, d11Group: string | null = null) => baseMetalSchema.parse({ specification: specification_, grade, d11Group })
  const at = (mm: number) => ({ min: mm, max: mm, all: false, fault: false })
  test.each([
    ['ASTM A53', 'Type E Gr. B', 'I'], ['A/SA-36', '—', 'I'], ['API 5L', 'X42 / L290', 'I'], ['API 5L', 'X52', 'II'], ['ASTM A709', 'Grade HPS 70W', 'IV'], ['A500', 'B (round)', 'I'], ['SA-537', 'Class 1', 'II'], ['ASTM A514:2018', 'Grade B', 'PQR'], ['A992/A992M', null, 'II'], ['A709M', '50W', 'II'],
  ] as const)('%s %s stands in Group %s', (spec, grade, group) => expect(groupsOf(metal(spec, grade), at(12), 'SI')).toEqual([group]))
  test('a recorded group stands where the list is silent', () => {
    expect(groupsOf(metal('EN 10025-2', 'S355J2', 'II'), at(12), 'SI')).toEqual(['II'])
    expect(groupsOf(metal('EN 10025-2', 'S355J2', 'V'), at(12), 'SI')).toBeNull()
    expect(groupsOf(metal(null, null), at(12), 'SI')).toBeNull()
  })
  test('categories of preheat', () => {
    expect(preheatCategory(metal('A1011', 'SS50'), ['II'], false, null)).toEqual({ category: 'A', basis: 'read' })
    expect(preheatCategory(metal('A36', null), ['II'], false, null)).toEqual({ category: 'A', basis: 'read' })
    expect(preheatCategory(metal('A36', null), ['I'], null, null)).toBeNull()
    expect(preheatCategory(metal('A913', '50'), ['II'], true, 16)).toEqual({ category: 'B', basis: 'read' })
  })
})
