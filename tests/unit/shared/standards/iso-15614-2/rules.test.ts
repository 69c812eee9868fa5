/** ISO 15614-2: each rule, the joint coefficient, extent of tests and acceptance. */
import { describe, expect, test } from 'vitest'
import type { ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { formerDiameter, jointCoefficient, temperOf } from '@shared/standards/iso-15614-2/strength.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { couponTwo, findingTwo, judgeResultsTwo, judgeTwo, procedureTwo, qualifiedTwo, type GivenTwo } from './builders.ts'

type Change = (variables: WeldingVariables, block: ProcessBlock) => void
interface Row { rule: string; base?: GivenTwo; both?: Change; coupon?: Change; procedure?: Change; verdict: 'within' | 'outside' | 'cannot-tell'; says?: string }

const mm = (min: number, max = min): ReturnType<typeof interval> => interval(min, max, 'length')
const thick = (min: number, max = min): Change => (v) => void (v.thickness = mm(min, max))
const fillet: Change = (v) => void Object.assign(v.joint, { weld: 'fillet', type: 'tee', filletThroat: mm(6) })
const pipe = (D: number | null): Change => (v) => void Object.assign(v, { product: 'pipe', diameter: D === null ? null : mm(D) })
const groups = (a: string | null, b = a): Change => (v) => { v.baseMetals.a.iso15608 = a; v.baseMetals.b.iso15608 = b }
const gas = (...parts: [string, number][]): ProcessBlock['shieldingGas'] => ({ libraryId: null, components: parts.map(([name, percent]) => ({ gas: name as 'Ar', percent })), isoSymbol: null, name: null, flow: null })
const filler = (classification: string | null): Change => (_, b) => void (b.filler.classification = classification)

const rows: Row[] = [
  { rule: 'process', verdict: 'within' },
  { rule: 'process', base: { process: 'GTAW' }, verdict: 'within' },
  { rule: 'process', base: { process: 'PAW' }, verdict: 'within' },
  { rule: 'process', procedure: (_, b) => (b.shieldingGas = gas(['Ar', 80], ['CO2', 20])), verdict: 'outside' },
  { rule: 'process', both: (_, b) => (b.shieldingGas = gas(['Ar', 80], ['CO2', 20])), verdict: 'outside' },
  { rule: 'process', base: { process: 'GTAW' }, both: (_, b) => (b.filler.added = false), verdict: 'cannot-tell', says: '2025' },
  { rule: 'process', procedure: (_, b) => (b.filler.productForm = null), verdict: 'cannot-tell' },
  { rule: 'material-group', verdict: 'within' },
  { rule: 'material-group', procedure: groups('22.3'), verdict: 'cannot-tell', says: 'magnesium' },
  { rule: 'material-group', coupon: groups('22.3'), verdict: 'outside' },
  { rule: 'material-group', procedure: groups('23.1'), verdict: 'outside' },
  { rule: 'material-group', coupon: groups('23.1', '22.4'), procedure: groups('22.4', '23.1'), verdict: 'within' },
  { rule: 'material-group', both: groups(null), verdict: 'within' },
  { rule: 'material-group', procedure: (v, b) => { groups(null)(v, b); for (const one of [v.baseMetals.a, v.baseMetals.b]) Object.assign(one, { grade: null, uns: null }) }, verdict: 'cannot-tell' },
  { rule: 'material-group', both: groups('1.2'), verdict: 'cannot-tell', says: 'no group of aluminium' },
  { rule: 'material-group', coupon: groups('43'), verdict: 'cannot-tell', says: 'no group of aluminium' },
  { rule: 'material-group', both: groups('22.9'), verdict: 'cannot-tell' },
  { rule: 'material-group', both: groups('22'), verdict: 'cannot-tell' },
  { rule: 'material-group', both: groups('21'), verdict: 'within' },
  { rule: 'parent-thickness', base: { thickness: 25 }, coupon: (_, b) => (b.technique.passesPerSide = null), procedure: thick(15), verdict: 'cannot-tell' },
  { rule: 'parent-thickness', procedure: thick(3, 20), verdict: 'within' },
  { rule: 'parent-thickness', procedure: thick(21), verdict: 'outside' },
  { rule: 'parent-thickness', base: { thickness: 25 }, procedure: thick(20, 50), verdict: 'within' },
  { rule: 'parent-thickness', base: { thickness: 25 }, procedure: thick(60), verdict: 'cannot-tell' },
  { rule: 'parent-thickness', base: { thickness: 25 }, procedure: thick(12), verdict: 'outside' },
  { rule: 'parent-thickness', base: { thickness: 2 }, procedure: thick(1.5), verdict: 'cannot-tell' },
  { rule: 'parent-thickness', base: { thickness: 120 }, procedure: thick(180), verdict: 'within' },
  { rule: 'parent-thickness', both: (_, b) => (b.technique.passesPerSide = 'single'), procedure: thick(8, 11), verdict: 'within' },
  { rule: 'parent-thickness', both: (_, b) => (b.technique.passesPerSide = 'single'), procedure: thick(15), verdict: 'cannot-tell' },
  { rule: 'parent-thickness', coupon: (_, b) => (b.technique.passesPerSide = null), procedure: thick(11), verdict: 'within' },
  { rule: 'parent-thickness', coupon: (v) => { v.thickness = null }, verdict: 'cannot-tell' },
  { rule: 'parent-thickness', both: fillet, procedure: thick(11), verdict: 'cannot-tell' },
  { rule: 'parent-thickness', both: fillet, verdict: 'within' },
  { rule: 'parent-thickness-second', procedure: (v) => (v.thicknessB = mm(30)), verdict: 'outside' },
  { rule: 'fillet-throat', both: fillet, procedure: (v) => (v.joint.filletThroat = mm(4.5, 9)), verdict: 'within' },
  { rule: 'fillet-throat', both: fillet, procedure: (v) => (v.joint.filletThroat = mm(9.1)), verdict: 'outside' },
  { rule: 'fillet-throat', both: fillet, procedure: (v) => Object.assign(v.joint, { filletThroat: null, filletLeg: mm(10) }), verdict: 'within' },
  { rule: 'fillet-throat', both: fillet, procedure: (v) => (v.joint.filletThroat = null), verdict: 'cannot-tell' },
  { rule: 'fillet-throat', both: (v, b) => { fillet(v, b); v.joint.filletThroat = mm(10) }, procedure: (v) => (v.joint.filletThroat = mm(8)), verdict: 'cannot-tell' },
  { rule: 'fillet-throat', procedure: fillet, verdict: 'cannot-tell', says: 'not held' },
  { rule: 'fillet-throat', both: fillet, coupon: (v) => (v.joint.filletThroat = null), verdict: 'cannot-tell' },
  { rule: 'diameter', both: pipe(200), procedure: pipe(100), verdict: 'within' },
  { rule: 'diameter', both: pipe(200), procedure: pipe(99), verdict: 'outside' },
  { rule: 'diameter', both: pipe(100), procedure: pipe(250), verdict: 'cannot-tell' },
  { rule: 'diameter', both: pipe(20), procedure: pipe(45), verdict: 'outside' },
  { rule: 'diameter', both: pipe(20), coupon: pipe(null), verdict: 'cannot-tell' },
  { rule: 'diameter', procedure: pipe(600), verdict: 'cannot-tell', says: 'plate' },
  { rule: 'position', verdict: 'within' },
  { rule: 'position', procedure: (_, b) => (b.positions = ['4G']), verdict: 'cannot-tell' },
  { rule: 'filler-type', procedure: filler('ER5183'), verdict: 'within' },
  { rule: 'filler-type', procedure: filler('ER4043'), verdict: 'cannot-tell', says: 'Types 4 and 5' },
  { rule: 'filler-type', coupon: filler('ER4043'), verdict: 'cannot-tell' },
  { rule: 'filler-type', procedure: filler('ER1100'), verdict: 'outside' },
  { rule: 'filler-type', coupon: filler('special'), verdict: 'cannot-tell' },
  { rule: 'filler-type', procedure: filler(null), verdict: 'cannot-tell' },
  { rule: 'preheat', verdict: 'within' },
  { rule: 'preheat', procedure: (v) => (v.preheat.minimum = quantity(60, 'temperature')), verdict: 'cannot-tell' },
  { rule: 'preheat', coupon: (v) => (v.preheat.minimum = null), verdict: 'cannot-tell' },
  { rule: 'preheat', procedure: (v) => (v.preheat.minimum = null), verdict: 'cannot-tell' },
  { rule: 'interpass', procedure: (v) => (v.preheat.interpassMaximum = quantity(80, 'temperature')), verdict: 'within' },
  { rule: 'interpass', procedure: (v) => (v.preheat.interpassMaximum = quantity(120, 'temperature')), verdict: 'cannot-tell' },
  { rule: 'joint-type', coupon: fillet, verdict: 'outside' },
  { rule: 'joint-type', procedure: fillet, verdict: 'cannot-tell' },
  { rule: 'joint-type', procedure: (v) => Object.assign(v.joint, { branch: 'set-on' }), verdict: 'cannot-tell' },
  { rule: 'joint-type', procedure: (v) => (v.joint.type = 'tee'), verdict: 'cannot-tell' },
  { rule: 'joint-type', procedure: (v) => (v.joint.penetration = 'partial'), verdict: 'cannot-tell' },
  { rule: 'backing-and-sides', procedure: (v) => (v.joint.backing = 'none'), verdict: 'cannot-tell' },
  { rule: 'backing-and-sides', both: (v) => Object.assign(v.joint, { weldedFromBothSides: null, backing: 'weld-metal' }), verdict: 'within' },
  { rule: 'backing-and-sides', procedure: (v) => Object.assign(v.joint, { weldedFromBothSides: null, backing: 'none' }), verdict: 'cannot-tell' },
  { rule: 'backing-and-sides', procedure: (v) => Object.assign(v.joint, { weldedFromBothSides: null }), verdict: 'within' },
  { rule: 'run-count', procedure: (_, b) => (b.technique.passesPerSide = 'single'), verdict: 'cannot-tell' },
  { rule: 'mechanisation', procedure: (_, b) => (b.mechanisation = 'automatic'), verdict: 'cannot-tell' },
  { rule: 'current-type', procedure: (_, b) => (b.electrical.pulsed = true), verdict: 'cannot-tell' },
  { rule: 'current-type', coupon: (_, b) => (b.electrical.pulsed = null), verdict: 'within' },
  { rule: 'current-type', base: { process: 'GTAW' }, coupon: (_, b) => (b.electrical.pulsed = null), verdict: 'cannot-tell' },
  { rule: 'current-type', base: { process: 'GTAW' }, coupon: (_, b) => (b.electrical.currentType = 'AC-balanced'), verdict: 'within' },
  { rule: 'transfer-mode', procedure: (_, b) => (b.electrical.transferMode = 'pulsed-spray'), verdict: 'cannot-tell' },
  { rule: 'wire-system', procedure: (_, b) => (b.technique.electrodes = null), verdict: 'within' },
  { rule: 'shielding-gas', procedure: (_, b) => (b.shieldingGas = gas(['Ar', 70], ['He', 30])), verdict: 'cannot-tell' },
  { rule: 'shielding-gas', both: (_, b) => (b.shieldingGas = gas(['Ar', 70], ['He', 30])), verdict: 'within' },
  { rule: 'backing-gas', base: { process: 'GTAW' }, procedure: (_, b) => (b.backingGas = gas(['Ar', 100])), verdict: 'cannot-tell' },
  { rule: 'plasma-gas', base: { process: 'PAW' }, verdict: 'within' },
  { rule: 'pwht', procedure: (v) => (v.pwht.condition = 'solution-anneal'), verdict: 'outside' },
  { rule: 'pwht', procedure: (v) => (v.pwht.condition = null), verdict: 'cannot-tell' },
  { rule: 'ageing', base: { group: '23.1', temper: 'T6' }, procedure: (v) => (v.pwht.ageing = 'artificial'), verdict: 'outside' },
  { rule: 'ageing', base: { group: '23.1', temper: 'T6' }, coupon: (v) => (v.pwht.ageing = null), verdict: 'cannot-tell' },
  { rule: 'temper', base: { group: '23.1', temper: 'T6' }, procedure: (v) => (v.baseMetals.b.condition = 'T4'), verdict: 'cannot-tell' },
  { rule: 'temper', base: { group: '23.1', temper: 'T6' }, procedure: (v) => (v.baseMetals.b.condition = null), verdict: 'cannot-tell' },
]

describe('rules of ISO 15614-2', () => {
  test.each(rows.map((row, i) => [i, row.rule, row.verdict, row] as const))('%i %s: %s', (_i, _rule, _verdict, row) => {
    const with0 = (change: Change | undefined): GivenTwo => ({ ...row.base, change: (v, b) => { row.both?.(v, b); change?.(v, b) } })
    const found = findingTwo(judgeTwo(procedureTwo(with0(row.procedure)), [couponTwo(with0(row.coupon))]), row.rule)
    expect(found.verdict, found.sentence).toBe(row.verdict)
    if (row.says) expect(found.sentence).toContain(row.says)
    if (found.verdict === 'cannot-tell') expect(found.missing.length).toBeGreaterThan(0)
  })

  test.each(['GMAW', 'GTAW', 'PAW'] as const)('a procedure like its coupon is within for %s', (process) => {
    const assessment = judgeTwo(procedureTwo({ process }), [couponTwo({ process })])
    expect(assessment.findings.filter((one) => one.verdict !== 'within').map((one) => one.sentence)).toEqual([])
    expect(qualifiedTwo(couponTwo({ process })).missing).toEqual([])
    expect(judgeTwo(procedureTwo({ process: 'GMAW', group: '23.1', temper: 'T6' }), [couponTwo({ group: '23.1', temper: 'T6' })]).verdict).toBe('within')
  })

  test('processes that are combined keep to what each deposited', () => {
    const combined = (s: number): GivenTwo => ({ change: (v, b) => { v.processes.push({ ...structuredClone(b), id: 'q', process: 'GTAW' }); for (const one of v.processes) one.depositThickness = mm(s) } })
    expect(findingTwo(judgeTwo(procedureTwo(combined(5)), [couponTwo(combined(5))]), 'deposit-thickness').verdict).toBe('within')
    expect(findingTwo(judgeTwo(procedureTwo(combined(6)), [couponTwo(combined(5))]), 'deposit-thickness').verdict).toBe('cannot-tell')
    expect(findingTwo(judgeTwo(procedureTwo({ ...combined(6), change: (v, b) => { combined(6).change?.(v, b); v.processes[0]!.depositThickness = { min: null, max: null, all: true } } }), [couponTwo(combined(5))]), 'deposit-thickness').verdict).toBe('cannot-tell')
    const unknown = couponTwo({ change: (v, b) => { combined(5).change?.(v, b); v.processes[0]!.depositThickness = null } })
    expect(findingTwo(judgeTwo(procedureTwo(combined(5)), [unknown]), 'deposit-thickness').missing).toEqual(['PQR-001: depositThickness'])
    expect(findingTwo(judgeTwo(procedureTwo({ ...combined(5), change: (v, b) => { combined(5).change?.(v, b); v.processes[0]!.depositThickness = interval(4, 2, 'length') } }), [couponTwo(combined(5))]), 'deposit-thickness').verdict).toBe('cannot-tell')
  })

  test('without a coupon, with one of another process, and with an unstated one', () => {
    expect(findingTwo(judgeTwo(procedureTwo(), []), 'process').verdict).toBe('cannot-tell')
    expect(findingTwo(judgeTwo(procedureTwo(), [couponTwo({ process: 'GTAW' })]), 'process').verdict).toBe('outside')
    expect(findingTwo(judgeTwo(procedureTwo(), [couponTwo({ change: (_, b) => (b.process = null) })]), 'process').verdict).toBe('cannot-tell')
  })
})

describe('strength', () => {
  test('joint coefficient by group, temper and ageing', () => {
    const T = (group: string, temper: string | null, ageing: 'natural' | 'artificial' | null = 'natural'): number | null => jointCoefficient(group, temperOf(temper), ageing)?.T ?? null
    expect([T('21', null), T('22.4', 'H116'), T('23.1', 'T4'), T('23.1', 'T4', 'artificial'), T('23.1', 'T651'), T('23.1', 'T5'), T('23.1', 'T6', 'artificial'), T('23.2', 'T4'), T('23.2', 'T6', 'artificial')]).toEqual([1, 1, 0.7, 0.7, 0.6, 0.6, 0.7, 0.95, 0.75])
    expect([T('23.2', 'T4', 'artificial'), T('23.2', 'T5'), T('23.1', 'F'), T('23.1', 'T6', null), T('24.1', 'T6'), T('26', null)]).toEqual([null, null, null, null, null, null])
    expect([temperOf('O'), temperOf('o/H111'), temperOf(null), temperOf('H321')]).toEqual(['O', 'O', null, null])
  })
  const first = (given: GivenTwo): { verdict: string; sentence: string } => judgeResultsTwo(couponTwo(given)).find(({ testId }) => testId === 't1')!
  test('tension', () => {
    expect(first({ strengths: [275] }).verdict).toBe('pass')
    expect(first({ strengths: [274.9] }).verdict).toBe('fail')
    expect(first({ temper: 'H116', strengths: [275] }).verdict).toBe('pass')
    expect(first({ temper: 'H116', strengths: [274] }).verdict).toBe('cannot-tell')
    expect(first({ temper: null, strengths: [200] }).verdict).toBe('cannot-tell')
    expect(first({ group: '23.1', temper: 'T4', ageing: 'artificial', strengths: [400] }).verdict).toBe('cannot-tell')
    expect(first({ group: '23.1', temper: 'T6', ageing: null }).sentence).toContain('aged')
    expect(first({ group: '23.1', temper: null }).sentence).toContain('temper')
    expect(first({ group: '23', temper: 'T6' }).sentence).toContain('23.1 and 23.2')
    expect(first({ group: '24.2', temper: 'T6' }).sentence).toContain('design specification')
    expect(first({ change: (v) => (v.baseMetals.a.iso15608 = null) }).verdict).toBe('cannot-tell')
    expect(first({ change: (v) => (v.baseMetals.b.minTensile = null) }).verdict).toBe('cannot-tell')
    // The weaker of both members counts.
    expect(first({ group: '23.1', groupB: '22.4', temper: 'T6', tensile: 300, strengths: [180] }).verdict).toBe('pass')
    expect(first({ group: '23.1', groupB: '22.4', temper: 'T6', tensile: 300, strengths: [179] }).verdict).toBe('cannot-tell')
  })
  test('bend former; little elongation is annealed first', () => {
    expect(formerDiameter(10, 12)).toBeCloseTo(73.333, 3)
    expect(formerDiameter(10, 5)).toBeNull()
    const fields = (given: GivenTwo): string[] => qualifiedTwo(couponTwo(given)).missing.map(({ field }) => field)
    expect(fields({ change: (v) => (v.baseMetals.a.minElongation = quantity(5, 'percent')) })).toContain('bends.0.formerDiameter')
    expect(fields({ change: (v) => (v.baseMetals.a.minElongation = null) })).toContain('variables.baseMetals.a.minElongation')
    expect(fields({ content: (content) => (content.bends[1]!.formerDiameter = quantity(80, 'length')) })).toEqual(['bends.1.formerDiameter'])
    expect(fields({ content: (content) => (content.bends[1]!.formerDiameter = null) })).toEqual([])
    expect(fields({ content: (content) => (content.bends = []) })).toEqual(['bends', 'bends'])
  })
})

test('extent of tests', () => {
  const rowsOf = (given: GivenTwo): Record<string, number> => Object.fromEntries(qualifiedTwo(couponTwo(given)).specimens.map(({ kind, required }) => [kind, required]))
  expect(rowsOf({})).toEqual({ visual: 1, volumetric: 1, surface: 1, tension: 2, 'face-bend': 2, 'root-bend': 2, macro: 1 })
  expect(rowsOf({ thickness: 12 })).toEqual({ visual: 1, volumetric: 1, surface: 1, tension: 2, 'side-bend': 4, macro: 1 })
  expect(rowsOf({ change: fillet })).toEqual({ visual: 1, surface: 1, macro: 2 })
  expect(rowsOf({ change: (v) => (v.joint.type = 'tee') })).toEqual({ visual: 1, volumetric: 1, surface: 1, macro: 2 })
  expect(rowsOf({ change: (v, b) => { pipe(50)(v, b); v.joint.branchAngle = interval(90, 90, 'angle') } })).toEqual({ visual: 1, surface: 1, macro: 2 })
  expect(qualifiedTwo(couponTwo()).specimens.at(-1)?.alternative).toContain('micro')
  expect(qualifiedTwo(couponTwo({ group: '21' })).specimens.at(-1)?.alternative).toBeNull()
  expect(qualifiedTwo(couponTwo({ content: (content) => (content.ndt = undefined) })).missing.filter(({ field }) => field === 'ndt')).toHaveLength(3)
  expect(qualifiedTwo(couponTwo({ group: '24.1' })).missing.map(({ message }) => message).join(' ')).toContain('design specification')
})
