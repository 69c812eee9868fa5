import { describe, expect, test } from 'vitest'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import type { BendTest, CouponContent, RunRow, TensionTest } from '@shared/schemas/welding.ts'
import { formerDiameter, judgeBend, judgeMacro } from '@shared/standards/asme-ix/acceptance.ts'
import { computedStress, judgeTension, specimenArea } from '@shared/standards/asme-ix/tension.ts'
import { role } from '@shared/standards/asme-ix/role.ts'
import { specimenRequirements } from '@shared/standards/asme-ix/specimens.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, procedure } from './builders.ts'

const { variables } = procedure()
const us = procedure({ system: 'US' }).variables
const tension = (more: Partial<TensionTest>): TensionTest => ({ id: 't1', specimen: 'T1', kind: 'reduced-section', width: null, thickness: null, diameter: null, load: null, reportedStrength: null, fracture: null, fractureType: null, ...more })
const bend = (more: Partial<BendTest>): BendTest => ({ id: 'b1', specimen: 'B1', kind: 'side', thickness: null, formerDiameter: null, angle: null, openings: [], inspected: true, broke: false, ...more })
const opening = (mm: number, corner = false, fromInternalFlaw: boolean | null = null): BendTest['openings'][number] => ({ size: quantity(mm, 'length'), corner, fromInternalFlaw })
const macro = (more: Partial<CouponContent['macros'][number]>): CouponContent['macros'][number] => ({ id: 'm1', specimen: 'M1', fusionComplete: true, cracks: false, leg1: quantity(8, 'length'), leg2: quantity(10, 'length'), ...more })

describe('tension (QW-153)', () => {
  test('stress follows from load and area', () => {
    expect(computedStress(tension({ width: quantity(19.05, 'length'), thickness: quantity(12.7, 'length'), load: quantity(118, 'force') }))).toBeCloseTo(487.7, 1)
    expect(computedStress(tension({ kind: 'turned', diameter: quantity(10, 'length'), load: quantity(40, 'force') }))).toBeCloseTo(509.3, 1)
    expect(specimenArea(tension({ kind: 'turned' }))).toBeNull()
    expect(specimenArea(tension({ width: quantity(0, 'length'), thickness: quantity(5, 'length') }))).toBeNull()
    expect(computedStress(tension({ width: quantity(20, 'length'), thickness: quantity(5, 'length') }))).toBeNull()
  })
  test('the computed stress goes before the reported one', () => {
    const judged = judgeTension(tension({ width: quantity(20, 'length'), thickness: quantity(10, 'length'), load: quantity(95, 'force'), reportedStrength: quantity(520, 'stress'), fracture: 'weld' }), variables)
    expect(judged).toMatchObject({ verdict: 'fail', computed: { value: 475, unit: 'MPa' } })
  })
  test('five per cent only for a break in the base metal', () => {
    for (const [fracture, verdict] of [['base-metal', 'pass'], ['weld', 'fail'], ['fusion-line', 'fail'], ['heat-affected-zone', 'cannot-tell'], [null, 'cannot-tell']] as const) {
      expect(judgeTension(tension({ reportedStrength: quantity(470, 'stress'), fracture }), variables).verdict).toBe(verdict)
      expect(judgeTension(tension({ reportedStrength: quantity(485, 'stress'), fracture }), variables).verdict).toBe('pass')
      expect(judgeTension(tension({ reportedStrength: quantity(400, 'stress'), fracture }), variables).verdict).toBe('fail')
    }
  })
  test('the weaker of two metals counts, and a missing figure is said', () => {
    const mixed = procedure({ change: (v) => (v.baseMetals.b.minTensile = quantity(415, 'stress')) }).variables
    expect(judgeTension(tension({ reportedStrength: quantity(416, 'stress'), fracture: 'weld' }), mixed).verdict).toBe('pass')
    const unknown = procedure({ change: (v) => (v.baseMetals.b.minTensile = null) }).variables
    expect(judgeTension(tension({ reportedStrength: quantity(500, 'stress') }), unknown).verdict).toBe('cannot-tell')
    expect(judgeTension(tension({}), variables).verdict).toBe('cannot-tell')
  })
  test('in customary units the sentence speaks ksi', () => expect(judgeTension(tension({ reportedStrength: quantity(72, 'stress', 'ksi') }), us).sentence).toContain('72 ksi'))
})

describe('bends (QW-163)', () => {
  test('3 mm passes, more does not; 1/8 in. in customary units', () => {
    expect(judgeBend(bend({ openings: [opening(3)] }), variables).verdict).toBe('pass')
    expect(judgeBend(bend({ openings: [opening(3.1)] }), variables).verdict).toBe('fail')
    // 1/8 in. is 3.175 mm: the system of the record decides.
    expect(judgeBend(bend({ openings: [opening(3.175)] }), us).verdict).toBe('pass')
    expect(judgeBend(bend({ openings: [opening(3.18)] }), us).verdict).toBe('fail')
  })
  test('corner openings count only when they come from a flaw inside', () => {
    expect(judgeBend(bend({ openings: [opening(6, true, false)] }), variables).verdict).toBe('pass')
    expect(judgeBend(bend({ openings: [opening(6, true, true)] }), variables).verdict).toBe('fail')
    expect(judgeBend(bend({ openings: [opening(6, true, null)] }), variables).verdict).toBe('cannot-tell')
    expect(judgeBend(bend({ openings: [opening(6, true, null), opening(5)] }), variables).verdict).toBe('fail')
  })
  test('broken, and not inspected', () => {
    expect(judgeBend(bend({ broke: true }), variables).verdict).toBe('fail')
    expect(judgeBend(bend({ inspected: false }), variables).verdict).toBe('cannot-tell')
  })
})

describe('macro sections of fillets (QW-183)', () => {
  const fillet = procedure({ change: (v) => (v.joint.weld = 'fillet') }).variables
  test('legs 3 mm apart pass, more do not', () => {
    expect(judgeMacro(macro({ leg2: quantity(11, 'length') }), fillet)).toMatchObject({ verdict: 'pass', computed: { value: 3 } })
    expect(judgeMacro(macro({ leg2: quantity(11.1, 'length') }), fillet).verdict).toBe('fail')
  })
  test('cracks, fusion and missing figures', () => {
    expect(judgeMacro(macro({ cracks: true }), fillet).verdict).toBe('fail')
    expect(judgeMacro(macro({ fusionComplete: false }), fillet).verdict).toBe('fail')
    expect(judgeMacro(macro({ cracks: null }), fillet).verdict).toBe('cannot-tell')
    expect(judgeMacro(macro({ leg1: null }), fillet).verdict).toBe('cannot-tell')
    expect(judgeMacro(macro({ leg1: null }), variables).verdict).toBe('pass')
  })
})

describe('bend former (QW-466.1)', () => {
  const of = (a: string, b = a): ReturnType<typeof procedure>['variables'] => procedure({ p: [a, b] }).variables
  test.each([
    ['1', [], 21, 40],
    ['23', [], null, 165],
    ['22', ['23'], null, 165],
    ['21', ['22'], null, 40],
    ['11A', [], null, 66.666666667],
    ['25', [], null, 66.666666667],
    ['49', [], null, 80],
    ['52', [], null, 100],
    ['1', ['36'], null, 165],
  ] as const)('P-No. %s, filler %j, elongation %s: %d mm for 10 mm', (p, f, e, diameter) => expect(formerDiameter(10, of(p), f, e)?.diameter).toBeCloseTo(diameter, 6))
  test('under 20 % elongation the table sets a maximum: t (100 - e) / e', () => expect(formerDiameter(10, of('1'), [], 10)).toEqual({ diameter: 90, how: 't (100 - e) / e', maximum: true }))
  test('under 3 % there is no bend; without P-Number nothing is said', () => {
    expect(formerDiameter(10, of('1'), [], 2)).toBeNull()
    expect(formerDiameter(10, procedure({ change: (v) => { v.baseMetals.a.pNumber = null; v.baseMetals.b.pNumber = null } }).variables, [], null)).toBeNull()
  })
})

describe('specimens', () => {
  const kinds = (content: Parameters<typeof coupon>[0]): [string, number, number][] => specimenRequirements(coupon(content)).map((row) => [row.kind, row.required, row.recorded])
  test('four recorded side bends stand for face and root bends from 10 mm', () => expect(kinds({ thickness: 12 })).toEqual([['tension', 2, 2], ['side-bend', 4, 4]]))
  test('under 10 mm side bends do not stand in', () => expect(kinds({ thickness: 9 })).toEqual([['tension', 2, 2], ['face-bend', 2, 0], ['root-bend', 2, 0]]))
  test('3/8 in. opens the alternative in customary units; 9.8 mm does not in SI', () => {
    expect(kinds({ system: 'US', thickness: 0.375 })[1]).toEqual(['side-bend', 4, 4])
    expect(kinds({ thickness: 9.8 })[1]).toEqual(['face-bend', 2, 0])
  })
  test('longitudinal bends: QW-451.2', () => {
    const rows = specimenRequirements(coupon({ thickness: 25, content: (c) => { for (const b of c.bends) b.kind = 'longitudinal-face' } }))
    expect(rows.map((row) => [row.kind, row.required, row.clause])).toEqual([['tension', 2, 'QW-451.2'], ['longitudinal-face-bend', 2, 'QW-451.2'], ['longitudinal-root-bend', 2, 'QW-451.2']])
  })
  test('fillets: five sections of plate, four of pipe', () => {
    expect(kinds({ change: (v) => (v.joint.weld = 'fillet') })).toEqual([['macro', 5, 0]])
    expect(kinds({ change: (v) => { v.joint.weld = 'fillet'; v.product = 'pipe' } })).toEqual([['macro', 4, 0]])
  })
  test('nothing can be asked of a coupon without thickness', () => expect(kinds({ change: (v) => (v.thickness = null) })).toEqual([]))
})

describe('ready to certify', () => {
  const missing = (given: Parameters<typeof coupon>[0]): string[] => qualifyCoupon(coupon(given), 'asme-ix', '2021').missing.map((row) => row.field)
  test('a full record is ready', () => {
    const qualification = qualifyCoupon(coupon(), 'asme-ix', '2021')
    expect(qualification.missing).toEqual([])
    expect(qualification.readyToCertify).toBe(true)
    expect(qualification.results.every((result) => result.verdict === 'pass')).toBe(true)
  })
  test('one inch with two side bends is not', () => expect(missing({ thickness: 25.4, content: (c) => (c.bends = c.bends.slice(0, 2)) })).toEqual(['bends']))
  test('a failed bend, with its clause and place', () => {
    const qualification = qualifyCoupon(coupon({ content: (c) => (c.bends[2]!.openings = [opening(4)]) }), 'asme-ix', '2021')
    expect(qualification).toMatchObject({ readyToCertify: false, missing: [{ field: 'bends.2', clause: 'QW-202.1' }] })
  })
  test('what the record lacks, by field', () => {
    expect(missing({ content: (c) => { c.welder = null; c.weldedOn = null; c.tension = [] } })).toEqual(['weldedOn', 'welder', 'tension'])
    expect(missing({ change: (v) => (v.processes[0]!.filler.fNumber = null) })).toEqual(['variables.processes.0.filler.fNumber'])
    expect(missing({ change: (v) => (v.baseMetals.b.pNumber = null) })).toEqual(['variables.baseMetals.b.pNumber'])
    expect(missing({ change: (v) => (v.processes[0]!.depositThickness = null) })).toEqual(['variables.processes.0.depositThickness'])
    expect(missing({ change: (v) => (v.processes[0]!.process = null) })).toEqual(['variables.processes.0.process'])
  })
  test('no thickness is told once', () => expect(missing({ change: (v) => (v.thickness = null) }).filter((field) => field === 'variables.thickness')).toHaveLength(1))
  test('a former that is too large', () => expect(missing({ content: (c) => (c.bends[0]!.formerDiameter = quantity(60, 'length')) })).toEqual(['bends.0.formerDiameter']))
  test('a coupon welded for toughness waits for its results', () => expect(missing({ toughness: true, content: (c) => (c.toughness = []) })).toEqual(['toughness']))
  test('a coupon that only adds toughness needs no mechanical specimens', () => expect(missing({ toughness: true, tests: 'toughness' })).toEqual([]))
  test('fillet sections are judged and counted', () => {
    const five = [1, 2, 3, 4, 5].map((n) => macro({ id: `m${n}`, specimen: `M${n}` }))
    const given = { change: (v: typeof variables) => void (v.joint.weld = 'fillet'), content: (c: CouponContent) => { c.tension = []; c.bends = []; c.macros = five } }
    expect(missing(given)).toEqual([])
    expect(missing({ ...given, content: (c) => { given.content(c); c.macros = [...five.slice(1), macro({ id: 'm9', cracks: true })] } })).toEqual(['macros.4'])
  })
  test('roles', () => {
    expect(role(coupon())).toBe('mechanical')
    expect(role(coupon({ tests: 'full' }))).toBe('full')
    expect(role(coupon({ tests: 'toughness' }))).toBe('toughness-only')
    expect(role(coupon({ toughness: true, content: (c) => (c.toughness = []) }))).toBe('full')
  })
})

describe('heat input from the run sheet', () => {
  const row = (more: Partial<RunRow>): RunRow => ({ id: 'r', processId: 'SMAW', pass: '1', layer: null, fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null, length: null, arcTime: null, instantaneousEnergy: null, interpass: null, note: null, ...more })
  const limit = (rows: RunRow[], waveform = false): unknown => {
    const tested = coupon({ toughness: true, change: (v) => Object.assign(v.processes[0]!.electrical, { heatInput: null, waveformControlled: waveform }), content: (c) => (c.runSheet = rows) })
    return finding(judge(procedure({ toughness: true, change: (v) => Object.assign(v.processes[0]!.electrical, { heatInput: interval(null, 1.5, 'heatInput'), waveformControlled: waveform, heatInputMethod: 'instantaneous-energy' }) }), [tested]), 'heat-input')
  }
  const volts = interval(25, undefined, 'voltage')
  const amps = interval(180, undefined, 'current')
  test('the largest row is the limit; speed may come from length and arc time', () => {
    // 25 × 180 × 60 / 200 = 1.35; over 100 mm in 36 s (166.7 mm/min) 1.62.
    expect(limit([row({ voltage: volts, current: amps, travelSpeed: interval(200, undefined, 'travelSpeed') })])).toMatchObject({ verdict: 'outside', tested: [1.35] })
    expect(limit([row({ voltage: volts, current: amps, length: quantity(100, 'length'), arcTime: quantity(36, 'duration') })])).toMatchObject({ verdict: 'within', tested: [1.62] })
  })
  test('with waveform control only instantaneous energy counts', () => {
    expect(limit([row({ voltage: volts, current: amps, travelSpeed: interval(100, undefined, 'travelSpeed') })], true)).toMatchObject({ verdict: 'cannot-tell' })
    expect(limit([row({ instantaneousEnergy: quantity(160000, 'energy'), length: quantity(100, 'length') })], true)).toMatchObject({ verdict: 'within', tested: [1.6] })
  })
  test('rows of another process, and rows without readings, do not count', () => {
    expect(limit([row({ processId: 'other', voltage: volts, current: amps, travelSpeed: interval(50, undefined, 'travelSpeed') }), row({})])).toMatchObject({ verdict: 'outside' })
  })
})
