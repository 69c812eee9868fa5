/** Faults that a reading of the rules against the reference found, each held here so that it stays mended. */
import { describe, expect, test } from 'vitest'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import type { Assessment, Finding } from '@shared/schemas/assessment.ts'
import { tensionTestSchema, type ProcedureContent, type WeldingVariables } from '@shared/schemas/welding.ts'
import { classificationKey } from '@shared/standards/asme-ix/rules/filler-classification.ts'
import { judgeTension } from '@shared/standards/asme-ix/tension.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, procedure, type Given, type GivenCoupon } from '../builders.ts'

type Change = (variables: WeldingVariables) => void
const first = (variables: WeldingVariables): WeldingVariables['processes'][number] => {
  const [block] = variables.processes
  if (!block) throw new Error('a record has a process')
  return block
}
const run = (rule: string, given: Given, ofProcedure?: Change, ofCoupon?: Change, edition?: string): Finding =>
  finding(judge(procedure({ ...given, change: ofProcedure }), [coupon({ ...given, change: ofCoupon })], edition), rule)

describe('a sentence names what is really missing', () => {
  test('a missing pass thickness is not a missing base metal thickness', () => {
    const wps = procedure({ thickness: [5, 40] })
    const found = finding(judge(wps, [coupon({ change: (v) => (first(v).maxPassThickness = null) })]), 'base-metal-thickness')
    expect(found.sentence).toBe("PQR-001 does not record the pass thickness maximum, so whether 5 mm to 40 mm is qualified can't be told.")
    expect(found).toMatchObject({ verdict: 'cannot-tell', missing: ['PQR-001: maxPassThickness'] })
    const open = finding(judge(procedure({ thickness: [5, 40], change: (v) => (first(v).maxPassThickness = null) }), [coupon()]), 'base-metal-thickness')
    expect(open).toMatchObject({ missing: ['procedure: processes.0.maxPassThickness'], fixes: [{ kind: 'state', field: 'processes.0.maxPassThickness' }] })
    expect(open.sentence).toContain('The procedure does not state the pass thickness maximum')
  })
  test('a coupon thickness given as a spread is not said to be absent', () => expect(finding(judge(procedure({ thickness: 20 }), [coupon({ thickness: [18, 20] })]), 'base-metal-thickness').sentence).toContain('does not record the base metal thickness as one figure'))
  test('the deposit limit that wants T says T', () => expect(run('deposit-thickness', {}, undefined, (v) => (v.thickness = null))).toMatchObject({ verdict: 'cannot-tell', missing: ['PQR-001: thickness'] }))
  test('a G class without trade name', () => expect(run('filler-classification', { toughness: true }, (v) => Object.assign(first(v).filler, { classification: 'E8018-G', tradeName: null }))).toMatchObject({ verdict: 'cannot-tell', field: 'processes.0.filler.tradeName', missing: ['procedure: processes.0.filler.tradeName'] }))
  test('Group Number of the second member, UNS number of a nonferrous one', () => {
    expect(run('base-metal-group', { toughness: true }, (v) => (v.baseMetals.b.groupNumber = null))).toMatchObject({ field: 'baseMetals.b.groupNumber', missing: ['procedure: baseMetals.b.groupNumber'] })
    expect(run('base-metal-group', { toughness: true, p: ['23', '23'] }, (v) => (v.baseMetals.a.uns = null)).missing).toEqual(['procedure: baseMetals.a.uns'])
    expect(run('base-metal-group', { toughness: true }, undefined, (v) => (v.baseMetals.a.groupNumber = null)).missing).toEqual(['PQR-001: baseMetals.a.groupNumber'])
  })
  test('the bead of a vertical weld', () => expect(run('vertical-uphill', { toughness: true, edition: '2017' }, (v) => { first(v).positions = ['3G']; first(v).technique.bead = null }, undefined, '2017').missing).toEqual(['procedure: processes.0.technique.bead']))
  test('a gas whose percentages do not make up 100', () => expect(run('shielding-gas', { processes: [['GMAW', 20]] }, (v) => (first(v).shieldingGas!.components = [{ gas: 'Ar', percent: 75 }, { gas: 'CO2', percent: 20 }]))).toMatchObject({ verdict: 'cannot-tell', missing: ['procedure: processes.0.shieldingGas.components'] }))
  test('what is missing for certification has the path of its field, and says what to record', () => {
    const missing = (change: Change): { field: string; message: string }[] => qualifyCoupon(coupon({ toughness: true, change }), 'asme-ix', '2021').missing
    expect(missing((v) => (first(v).maxPassThickness = null))).toMatchObject([{ field: 'variables.processes.0.maxPassThickness', message: 'Record the pass thickness maximum; the range of the base metal thickness follows from it.' }])
    expect(missing((v) => (first(v).electrical.waveformControlled = true)).map(({ field }) => field)).toEqual(['variables.processes.0.electrical.heatInputMethod'])
  })
})

describe('rules', () => {
  const P8: Given = { p: ['8', '8'] }
  const pwht = (condition: WeldingVariables['pwht']['condition'], from?: number, to?: number): Change => (v) => Object.assign(v.pwht, { condition, temperature: from === undefined ? null : interval(from, to, 'temperature') })
  test('other metals take a specified range: transformation temperatures are no answer there', () => expect(run('pwht-condition', P8, pwht('below-lower-transformation'), pwht('below-lower-transformation'))).toMatchObject({ verdict: 'cannot-tell', missing: ['procedure: pwht.condition', 'PQR-001: pwht.condition'] }))
  test('a solution anneal is within a range, whose temperatures are compared', () => {
    expect(run('pwht-condition', P8, pwht('solution-anneal'), pwht('solution-anneal')).verdict).toBe('cannot-tell')
    expect(run('pwht-condition', P8, pwht('solution-anneal', 1040, 1100), pwht('solution-anneal', 1050, 1080)).verdict).toBe('within')
    expect(run('pwht-condition', P8, pwht('within-range', 1040, 1100), pwht('solution-anneal', 1050, 1080)).verdict).toBe('within')
    expect(run('pwht-condition', P8, pwht('solution-anneal', 1040, 1100), pwht('solution-anneal', 1000, 1080)).verdict).toBe('outside')
    expect(run('pwht-condition', { p: ['1', '1'] }, pwht('solution-anneal', 1040, 1100), pwht('solution-anneal', 1050, 1080)).verdict).toBe('cannot-tell')
  })
  test('autogenous welding has no A-Number, and a coupon without filler covers none', () => {
    const bare: Change = (v) => Object.assign(first(v).filler, { added: false, aNumber: null, fNumber: null, classification: null, productForm: null })
    const given: Given = { processes: [['GTAW', 3]], thickness: 3 }
    expect(judge(procedure({ ...given, change: bare }), [coupon({ ...given, change: bare })]).verdict).toBe('within')
    expect(run('filler-a-number', given, undefined, bare).verdict).toBe('outside')
  })
  test.each([['E308H-16', 'E308H-17'], ['E316H-15', 'E316H-16'], ['E2209-16', 'E2209-17'], ['E309LMo-16', 'E309LMo-17'], ['E410NiMo-15', 'E410NiMo-16'], ['E7018', 'E7016-H4R'], ['E71T-1CJ H8', 'E70T-1CJ']])('%s and %s are one classification for toughness', (a, b) => expect(classificationKey(a)).toEqual(classificationKey(b)))
  test.each([['E308H-16', 'E308-16'], ['E316L-16', 'E316-16'], ['E7018', 'E8018'], ['E71T-1C', 'E71T-1M']])('%s and %s are two', (a, b) => expect(classificationKey(a).key).not.toBe(classificationKey(b).key))
  test('a better impact suffix is covered, its loss is not', () => {
    const given: Given = { toughness: true, processes: [['FCAW', 20]] }
    const named = (classification: string): Change => (v) => (first(v).filler.classification = classification)
    expect(run('filler-classification', given, named('E71T-1CJ'), named('E71T-1C')).verdict).toBe('within')
    expect(run('filler-classification', given, named('E71T-1C'), named('E71T-1CJ')).verdict).toBe('outside')
  })
  test('the second member alone may be thin enough for QW-410.64', () => {
    const hot: Change = (v) => { v.thicknessB = interval(10, undefined, 'length'); first(v).technique.thermalPreparation = true }
    expect(run('thermal-preparation', { p: ['11A', '11A'] }, hot).verdict).toBe('outside')
  })
  test('a run sheet tells the interpass temperature where the summary does not', () => {
    const row = { id: 'r', processId: 'SMAW', pass: '1', layer: null, fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null, length: null, arcTime: null, instantaneousEnergy: null, interpass: quantity(150, 'temperature'), note: null }
    const tested: GivenCoupon = { toughness: true, change: (v) => (v.preheat.interpassMaximum = null), content: (c) => (c.runSheet = [row]) }
    expect(finding(judge(procedure({ toughness: true }), [coupon(tested)]), 'interpass')).toMatchObject({ verdict: 'within', tested: [150] })
  })
  test('a pass with hotter settings than its block counts for heat input', () => {
    const hot: Change = (v) => { first(v).electrical.heatInput = null; first(v).passes = [{ number: '2', layer: 'fill', fillerDiameter: null, current: interval(300, 350, 'current'), voltage: null, wireFeed: null, travelSpeed: null }] }
    const found = run('heat-input', { toughness: true }, hot)
    expect(found).toMatchObject({ verdict: 'outside', asked: { max: 2.73 } })
    expect(found.reasoning[1]).toContain('pass 2')
  })
  test('a limit that heat treatment may lift is not surely broken while the treatment is not recorded', () => {
    const hot: Change = (v) => (v.preheat.interpassMaximum = quantity(400, 'temperature'))
    expect(run('interpass', { toughness: true }, hot, (v) => (v.pwht.condition = null))).toMatchObject({ verdict: 'cannot-tell', missing: ['PQR-001: pwht.condition'] })
    expect(run('interpass', { toughness: true }, hot).verdict).toBe('outside')
  })
  test('a coupon can not deposit more than it is thick', () => {
    const over = judge(procedure({ thickness: [5, 20], processes: [['SMAW', 50]] }), [coupon({ thickness: 10, processes: [['SMAW', 25]] })])
    expect(over.verdict).toBe('cannot-tell')
    expect(finding(over, 'contradiction').sentence).toContain('more than the thickness of the metal')
  })
})

describe('tension', () => {
  const verdict = (mpa: number, change: Change, system: 'SI' | 'US' = 'SI', fracture: 'weld' | 'base-metal' = 'weld'): ReturnType<typeof judgeTension> => judgeTension(tensionTestSchema.parse({ id: 't', specimen: 'T1', reportedStrength: quantity(mpa, 'stress'), fracture }), procedure({ system, p: ['23', '23'], change }).variables)
  const metal = (grade: string, uns: string, p: string | null, strength: number, unit = 'MPa'): Change => (v) => { for (const one of [v.baseMetals.a, v.baseMetals.b]) Object.assign(one, { grade, uns, pNumber: p, minTensile: quantity(strength, 'stress', unit) }) }
  test('6061-T6 is judged by its welded strength, not that of the plate', () => {
    expect(verdict(170, metal('6061-T6', 'A96061', '23', 290))).toMatchObject({ verdict: 'pass', basis: 'secondary' })
    expect(verdict(170, metal('6061-T6', 'A96061', '23', 290)).sentence).toContain('welded strength of 6061, not the 290 MPa of the unwelded temper')
    expect(verdict(160, metal('6061-T6', 'A96061', '23', 165)).verdict).toBe('fail')
  })
  test('another temper without a welded figure can not be told below the plate strength', () => {
    expect(verdict(200, metal('7020 T6', 'AW-7020', null, 350)).verdict).toBe('cannot-tell')
    expect(verdict(350, metal('7020 T6', 'AW-7020', null, 350)).verdict).toBe('pass')
    expect(verdict(200, metal('5083-O', 'A95083', '25', 275)).verdict).toBe('fail')
  })
  test('a minimum copied in MPa is not converted into a limit in ksi', () => {
    const carbon = metal('70', 'K02700', '1', 485)
    expect(verdict(484, carbon, 'US').verdict).toBe('cannot-tell')
    expect(verdict(486, carbon, 'US').verdict).toBe('pass')
    expect(verdict(480, carbon, 'US').verdict).toBe('fail')
    expect(verdict(484, metal('70', 'K02700', '1', 70, 'ksi'), 'US').verdict).toBe('pass')
    expect(verdict(484, carbon).verdict).toBe('fail')
  })
})

/** Writes a value at a dotted path, as the drafting screen does. */
function write(content: ProcedureContent, path: string, value: unknown): void {
  const keys = path.split('.')
  const last = keys.pop() ?? ''
  const holder = keys.reduce<Record<string, unknown>>((at, key) => at[key] as Record<string, unknown>, content.variables as unknown as Record<string, unknown>)
  holder[last] = value
}

describe('applying set fixes turns the finding within', () => {
  const q = (value: number): ReturnType<typeof quantity> => quantity(value, 'length')
  const changes: Readonly<Record<string, readonly [Given, Change, Change?]>> = {
    'one thickness, too thick': [{}, (v) => (v.thickness = interval(60, undefined, 'length'))],
    'one thickness, too thin': [{}, (v) => (v.thickness = interval(2, undefined, 'length'))],
    'thickness on both ends': [{}, (v) => (v.thickness = interval(2, 60, 'length'))],
    'only a maximum typed': [{}, (v) => (v.thickness = interval(null, 60, 'length'))],
    'every thickness': [{}, (v) => (v.thickness = { min: null, max: null, all: true })],
    'one deposit': [{}, (v) => (first(v).depositThickness = interval(300, undefined, 'length'))],
    'a deposit from a minimum above the limit': [{ thickness: 10 }, (v) => (first(v).depositThickness = interval(30, 40, 'length'))],
    'several electrodes, one too thick': [{ toughness: true }, (v) => (first(v).filler.diameters = [q(3.2), q(8), q(9)])],
    'one electrode, too thick': [{ toughness: true }, (v) => (first(v).filler.diameters = [q(8)])],
    'preheat and interpass': [{ toughness: true }, (v) => { v.preheat.minimum = quantity(-60, 'temperature'); v.preheat.interpassMaximum = quantity(300, 'temperature') }],
    'heat input cap': [{ toughness: true }, (v) => (first(v).electrical.heatInput = interval(2, undefined, 'heatInput'))],
    'heat input from settings': [{ toughness: true }, (v) => { first(v).electrical.heatInput = null; first(v).electrical.current = interval(300, 320, 'current') }],
    'transfer mode': [{ processes: [['GMAW', 20]] }, (v) => (first(v).electrical.transferMode = 'short-circuiting')],
    'A-Number and F-Number': [{}, (v) => { first(v).filler.aNumber = 3; first(v).filler.fNumber = '3' }],
    'heat treatment': [{}, (v) => (v.pwht.condition = 'below-lower-transformation')],
    'none where the coupon was treated in a range': [{ p: ['8', '8'] }, () => undefined, (v) => Object.assign(v.pwht, { condition: 'within-range', temperature: interval(1050, 1060, 'temperature') })],
    'supplemental filler left out': [{ processes: [['SAW', 20]] }, () => undefined, (v) => Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(10, 'percent') })],
    'thick passes': [{ thickness: 20 }, (v) => { first(v).maxPassThickness = q(15); v.thickness = interval(5, 40, 'length') }],
  }
  const setFixes = (assessment: Assessment): Finding[] => assessment.findings.filter((one) => one.verdict === 'outside' && one.fixes.some(({ kind }) => kind === 'set'))
  test.each(Object.entries(changes))('%s', (_name, [given, change, ofCoupon]) => {
    const make = (): ProcedureContent => procedure({ ...given, change })
    const tested = [coupon({ ...given, change: ofCoupon })]
    for (const found of setFixes(judge(make(), tested))) {
      const cured = make()
      for (const fix of found.fixes) if (fix.kind === 'set') write(cured, fix.field, fix.value)
      const after = judge(cured, tested)
      expect([found.ruleId, finding(after, found.ruleId.replace('asme-ix/', ''), found.processId ?? undefined).verdict]).toEqual([found.ruleId, 'within'])
      expect(after.findings.filter(({ ruleId }) => ruleId === 'assessment/contradiction')).toEqual([])
    }
  })
  test('no fix is offered that would not cure', () => {
    expect(finding(judge(procedure({ thickness: [50, 60] }), [coupon()]), 'base-metal-thickness').fixes.map(({ kind }) => kind)).toEqual(['plan-coupon'])
    const spray = run('transfer-mode', { processes: [['GMAW', 20]] }, (v) => (first(v).electrical.transferMode = 'short-circuiting'))
    expect(spray.fixes[0]).toMatchObject({ kind: 'set', value: 'spray' })
  })
})
