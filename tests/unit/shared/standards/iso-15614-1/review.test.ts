/** Held against the reference by a second reader: scope, members by name, one material by its match, impact tests, makes, gas by symbol alone, and how each figure is known. */
import { describe, expect, test } from 'vitest'
import type { CouponContent, ProcessBlock, WeldingVariables } from '@shared/schemas/welding.ts'
import { iso15614Part1 } from '@shared/standards/iso-15614-1/index.ts'
import { standardDetail } from '@shared/standards/catalogue.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, procedure, qualified, type Given } from './builders.ts'

type Change = (variables: WeldingVariables, block: ProcessBlock) => void
interface Row { why: string; rule: string; base?: Given; both?: Change; coupon?: Change; procedure?: Change; content?: (content: CouponContent) => void; verdict: 'within' | 'outside' | 'cannot-tell'; says?: string; missing?: string }

const mm = (min: number, max?: number): ReturnType<typeof interval> => interval(min, max, 'length')
const metal = (place: 'a' | 'b', iso15608: string | null, yieldStrength: number | null, grade: string): Change => ({ baseMetals }) => void Object.assign(baseMetals[place], { iso15608, grade, minYield: yieldStrength === null ? null : quantity(yieldStrength, 'stress') })
const both = (iso15608: string, yieldStrength: number, grade = 'another'): Change => (v, b) => { metal('a', iso15608, yieldStrength, grade)(v, b); metal('b', iso15608, yieldStrength, grade)(v, b) }
const fillet: Change = (v) => void Object.assign(v.joint, { weld: 'fillet', type: 'tee', filletThroat: mm(5) })
const gas = (isoSymbol: string | null, ...parts: [string, number][]): ProcessBlock['shieldingGas'] => ({ libraryId: null, components: parts.map(([name, percent]) => ({ gas: name as 'Ar', percent })), isoSymbol, name: null, flow: null })
const at = (position: string): Change => (_, b) => void (b.positions = [position as '1G'])
const all = (...changes: Change[]): Change => (v, b) => { for (const change of changes) change(v, b) }
const cored: Change = (_, b) => void Object.assign(b.filler, { productForm: 'metal-cored' })
const transfer = (mode: ProcessBlock['electrical']['transferMode']): Change => (_, b) => void (b.electrical.transferMode = mode)

const rows: Row[] = [
  { why: 'aluminium is no metal of this standard, even where coupon and procedure agree', rule: 'material-group', both: both('22.4', 120), verdict: 'cannot-tell', says: 'no group of steel or nickel' },
  { why: 'nor is a coupon of aluminium', rule: 'material-group', coupon: both('23.1', 120), verdict: 'cannot-tell', missing: 'PQR-001: baseMetals.a.iso15608' },
  { why: 'a sub-group that there is not', rule: 'material-group', both: both('1.7', 355), verdict: 'cannot-tell' },
  { why: 'nickel: the same group', rule: 'material-group', both: both('43', 240), verdict: 'within' },
  { why: 'nickel beyond the same group', rule: 'material-group', coupon: both('43', 240, 'x'), procedure: both('44', 240, 'y'), verdict: 'cannot-tell' },
  { why: 'steel for a nickel coupon', rule: 'material-group', coupon: both('43', 240, 'x'), procedure: both('1.1', 235, 'y'), verdict: 'outside' },
  { why: 'nickel to another partner', rule: 'material-group', coupon: both('43', 240, 'x'), procedure: all(metal('a', '43', 240, 'x'), metal('b', '8.1', 240, 'y')), verdict: 'cannot-tell' },
  { why: 'the yield of member B is what is missing', rule: 'material-group', both: all(metal('a', '1.2', 355, 'p'), metal('b', '1.2', 355, 'q')), procedure: all(metal('a', '1.2', 355, 'p'), metal('b', '1.1', null, 'r')), verdict: 'cannot-tell', missing: 'procedure: baseMetals.b.minYield', says: 'the procedure does not state' },
  { why: 'the group of member B is what is missing', rule: 'material-group', procedure: metal('b', null, 355, 'z'), verdict: 'cannot-tell', missing: 'procedure: baseMetals.b.iso15608' },
  { why: '5-4 covers its own pair', rule: 'material-group', coupon: all(metal('a', '5.1', 300, 'x'), metal('b', '4.1', 300, 'y')), procedure: all(metal('a', '5.1', 300, 'v'), metal('b', '4.1', 300, 'w')), verdict: 'within' },
  { why: '5-2 for 5-1 must be looked up', rule: 'material-group', coupon: all(metal('a', '5.1', 300, 'x'), metal('b', '2.1', 420, 'y')), procedure: all(metal('a', '5.1', 300, 'v'), metal('b', '1.1', 235, 'w')), verdict: 'cannot-tell' },
  { why: 'two members of a fillet, each by its match', rule: 'parent-thickness', base: { thickness: 10 }, both: all(fillet, (v) => (v.thicknessB = mm(25))), verdict: 'within' },
  { why: 'and the thick one by the thick one', rule: 'parent-thickness-second', base: { thickness: 10 }, both: all(fillet, (v) => (v.thicknessB = mm(25))), verdict: 'within' },
  { why: 'members the other way round', rule: 'parent-thickness', base: { thickness: 10 }, coupon: all(fillet, (v) => (v.thicknessB = mm(25))), procedure: all(fillet, (v) => { v.thickness = mm(25); v.thicknessB = mm(10) }), verdict: 'within' },
  { why: 'a thickness that only the other member covers', rule: 'parent-thickness', base: { thickness: 10 }, both: all(fillet, (v) => (v.thicknessB = mm(25))), procedure: (v) => (v.thickness = mm(22)), verdict: 'cannot-tell', says: 'two members' },
  { why: 'level 1 does not limit the diameter, so it need not be stated', rule: 'diameter', base: { level: '1' }, both: (v) => Object.assign(v, { product: 'pipe', diameter: mm(100) }), procedure: (v) => (v.diameter = null), verdict: 'within', says: 'Level 1' },
  { why: 'nor the throat', rule: 'fillet-throat', base: { level: '1' }, both: fillet, procedure: (v) => (v.joint.filletThroat = null), verdict: 'within', says: 'Level 1' },
  { why: 'group 10: impact alone from PF is not enough', rule: 'position', base: { impact: true }, both: both('10.1', 450), coupon: at('3G'), procedure: at('4G'), verdict: 'cannot-tell', says: 'group 10' },
  { why: 'other groups: impact from PF', rule: 'position', base: { impact: true }, coupon: at('3G'), procedure: at('4G'), verdict: 'within' },
  { why: 'impact asked colder than tested', rule: 'impact-tests', base: { impact: true }, procedure: (v) => (v.impactTemperature = quantity(-40, 'temperature')), verdict: 'cannot-tell', says: 'warmer' },
  { why: 'impact asked warmer than tested', rule: 'impact-tests', base: { impact: true }, procedure: (v) => (v.impactTemperature = quantity(0, 'temperature')), verdict: 'within' },
  { why: 'the tested temperature itself', rule: 'impact-tests', base: { impact: true }, verdict: 'within' },
  { why: 'temperature not stated', rule: 'impact-tests', base: { impact: true }, procedure: (v) => (v.impactTemperature = null), verdict: 'cannot-tell', missing: 'procedure: impactTemperature' },
  { why: 'temperature not recorded', rule: 'impact-tests', base: { impact: true }, content: (c) => { for (const set of c.toughness) set.temperature = null }, verdict: 'cannot-tell', missing: 'PQR-001: toughness' },
  { why: 'energy not reached', rule: 'impact-tests', base: { impact: true }, procedure: (v) => (v.impactEnergy = quantity(66, 'energy')), verdict: 'cannot-tell', says: '65 J' },
  { why: 'energy just reached', rule: 'impact-tests', base: { impact: true }, procedure: (v) => (v.impactEnergy = quantity(65, 'energy')), verdict: 'within' },
  { why: 'a butt without impact tests may stand up to 12 mm', rule: 'impact-tests', base: { impact: true, thickness: 10 }, content: (c) => (c.toughness = []), verdict: 'within', says: '12 mm' },
  { why: 'a fillet proves no impact values', rule: 'impact-tests', base: { impact: true }, both: fillet, content: (c) => (c.toughness = []), verdict: 'cannot-tell', missing: 'PQR-001: toughness' },
  { why: 'a butt without impact tests proves none for a fillet', rule: 'impact-tests', base: { impact: true }, procedure: fillet, content: (c) => (c.toughness = []), verdict: 'cannot-tell' },
  { why: 'a solid wire under flux', rule: 'filler-make', base: { impact: true, processes: [['SAW', 20]] }, both: (v) => (v.impactTemperature = quantity(-40, 'temperature')), procedure: (_, b) => (b.filler.tradeName = 'B'), verdict: 'cannot-tell', says: 'under flux' },
  { why: 'a cored wire under flux', rule: 'filler-make', base: { impact: true, processes: [['SAW', 20]] }, both: (v, b) => { v.impactTemperature = quantity(-40, 'temperature'); b.filler.productForm = 'flux-cored' }, procedure: (_, b) => (b.filler.tradeName = 'B'), verdict: 'outside' },
  { why: 'metal-cored wire recorded as cored: dip covers dip', rule: 'transfer-mode', base: { processes: [['FCAW', 20]] }, both: cored, coupon: transfer('short-circuiting'), procedure: transfer('spray'), verdict: 'outside' },
  { why: 'a symbol alone gives no share of carbon dioxide', rule: 'carbon-dioxide', procedure: (_, b) => (b.shieldingGas = gas('M21')), verdict: 'cannot-tell' },
]

test.each(rows.map((row) => [row.rule, row.why, row] as const))('%s: %s', (_rule, _why, row) => {
  const given = (change?: Change): Given => ({ ...row.base, change0: (block, variables) => { row.both?.(variables, block); change?.(variables, block) } })
  const tested = coupon({ ...given(row.coupon), ...(row.content ? { content: row.content } : {}) })
  const found = finding(judge(procedure(given(row.procedure)), [tested], row.base?.level ?? null), row.rule)
  expect(found.verdict, found.sentence).toBe(row.verdict)
  if (row.says) expect([found.sentence, ...found.reasoning].join(' ')).toContain(row.says)
  if (row.missing) expect(found.missing).toContain(row.missing)
  if (found.verdict === 'cannot-tell') expect(found.missing.length).toBeGreaterThan(0)
})

describe('coupons together', () => {
  test('group 10: both extremes carry both tests', () => {
    const one = (position: string, number: string, hardness: boolean): ReturnType<typeof coupon> => coupon({ impact: true, hardness: true, hardnessTested: hardness, number, change: (v) => { both('10.1', 450)(v, v.processes[0]!); v.processes[0]!.positions = [position as '1G'] } })
    const wps = procedure({ impact: true, hardness: true, change: (v) => { both('10.1', 450)(v, v.processes[0]!); v.processes[0]!.positions = ['4G'] } })
    expect(finding(judge(wps, [one('3G', 'HIGH', true), one('2G', 'LOW', true)]), 'position').verdict).toBe('within')
    expect(finding(judge(wps, [one('3G', 'HIGH', false), one('2G', 'LOW', true)]), 'position').verdict).toBe('cannot-tell')
  })

  test('the piece with another make counts at the highest heat input asked, of the same designation', () => {
    const cold = (name: string, heat: number, classification = 'E 42 4 B 42 H5'): Given => ({ impact: true, processes: [['SMAW', 20]], change0: (b, v) => { v.impactTemperature = quantity(-40, 'temperature'); Object.assign(b.filler, { tradeName: name, classification }); b.electrical.heatInput = interval(heat, heat, 'heatInput') } })
    const wps = procedure(cold('B', 1.2))
    const pieces = (heat: number, classification?: string): ReturnType<typeof coupon>[] => [coupon(cold('A', 1)), coupon({ ...cold('B', heat, classification), number: 'EXTRA', change: (v) => (v.pwht.condition = 'below-lower-transformation') })]
    const verdict = (heat: number, classification?: string): string => finding(judge(wps, pieces(heat, classification)), 'filler-make').verdict
    expect(verdict(1.2)).toBe('within')
    expect(verdict(1.1)).toBe('cannot-tell')
    expect(verdict(1.2, 'E 46 4 B 42 H5')).toBe('outside')
  })
})

test('no basis is better than the reference claims', () => {
  const { ruleList } = standardDetail(iso15614Part1)
  const basis = (id: string, process: string): string | undefined => ruleList.find((rule) => rule.id === `iso-15614-1/${id}`)?.classes.find((one) => one.process === process)?.basis
  expect([basis('shielding-gas', 'GMAW'), basis('shielding-gas', 'GTAW'), basis('shielding-gas', 'PAW')]).toEqual(['read', 'memory', 'memory'])
  expect([basis('contents-process', 'GMAW'), basis('contents-preheat', 'GMAW'), basis('contents-filler-make', 'GMAW')]).toEqual(['read', 'memory', 'memory'])
  // Only heads that were read in the list of contents, and clauses that were read in the text of 2004.
  const read = ruleList.filter((rule) => rule.basis === 'read').map((rule) => rule.id.slice('iso-15614-1/'.length))
  expect(read).toEqual(['level', 'flux', 'heat-input-maximum', 'heat-input-minimum', 'preheat', 'interpass', 'post-heating', 'pwht', 'pwht-temperature', 'initial-heat-treatment', 'shielding-gas', 'carbon-dioxide', 'contents-parent-metal', 'contents-thickness', 'contents-diameter', 'contents-process', 'contents-groove', 'contents-position', 'contents-preparation', 'contents-gouging', 'contents-backing'])
})

test('what is out of scope is named', () => {
  const told = iso15614Part1.outOfScope.join(' ')
  for (const word of ['311', '15614-7', '15614-8', '15613', '15610', '15611', '15612', 'beam, friction', 'manufacturer', 'tacking', 'run-out length', 'Annex A', 'Table 6']) expect(told).toContain(word)
})

test('a coupon of aluminium qualifies no steel', () => {
  const range = qualified(coupon({ change: (v) => { both('22.4', 120)(v, v.processes[0]!) } })).ranges.find(({ ruleId }) => ruleId === 'iso-15614-1/material-group')
  expect(range?.range).toMatchObject({ unknown: true, values: [] })
})
