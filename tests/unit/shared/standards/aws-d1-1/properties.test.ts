/** What holds for every record: no crash, nothing missing passes, wider coupons never lose, and inches judge as inches. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { CouponContent, Position, WeldingVariables } from '@shared/schemas/welding.ts'
import { assess, qualifyCoupon } from '@shared/assessment/assess.ts'
import { awsD11 } from '@shared/standards/aws-d1-1/index.ts'
import type { CouponSide, RangeContext } from '@shared/standards/rule.ts'
import { coveredPlaces } from '@shared/standards/aws-d1-1/positions.ts'
import { pipeLimits, plateLimits } from '@shared/standards/aws-d1-1/ranges.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, first, judge, pair, procedure, type Arc } from './records.ts'

const ARCS: readonly Arc[] = ['SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW']
const OPEN = { min: null, max: null, all: false }
const ALL = { min: null, max: null, all: true }
const WRONG = interval(9, 2, 'length')

/** What people leave out, mistype or contradict. */
const MUTATIONS: Record<string, (v: WeldingVariables) => void> = {
  'no thickness': (v) => { v.thickness = null },
  'open thickness': (v) => { v.thickness = { ...OPEN } },
  'every thickness': (v) => { v.thickness = { ...ALL } },
  'wrong thickness': (v) => { v.thickness = WRONG },
  'negative thickness': (v) => { v.thickness = interval(-5, undefined, 'length') },
  'only a greatest thickness': (v) => { v.thickness = interval(null, 12, 'length') },
  'a second thickness': (v) => { v.thicknessB = interval(12, undefined, 'length') },
  'a wrong second thickness': (v) => { v.thicknessB = WRONG },
  'no metals': (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: null, grade: null, d11Group: null }) },
  'an odd group': (v) => { for (const metal of [v.baseMetals.a, v.baseMetals.b]) Object.assign(metal, { specification: 'X', grade: null, d11Group: 'IX' }) },
  'a special steel': (v) => { Object.assign(v.baseMetals.a, { specification: 'ASTM A514', grade: 'B' }) },
  'no process': (v) => { first(v).process = null },
  'another process': (v) => { first(v).process = 'PAW' },
  'no position': (v) => { first(v).positions = [] },
  'all positions': (v) => { first(v).positions = ['1G', '2G', '3G', '4G', '5G', '6G', '6GR', '1F', '5F'] },
  'vertical, direction open': (v) => { Object.assign(first(v), { positions: ['3G'], progression: null }) },
  'vertical, both directions': (v) => { Object.assign(first(v), { positions: ['3G'], progression: 'both' }) },
  'bare filler': (v) => { Object.assign(first(v).filler, { classification: null, specification: null, diameters: [], tradeName: null, fluxClassification: null, fluxTradeName: null, fluxIsRecrushedSlag: null }) },
  'filler unsure': (v) => { first(v).filler.added = null },
  'no filler': (v) => { first(v).filler.added = false },
  'supplemental filler': (v) => { Object.assign(first(v).filler, { supplemental: true, supplementalAlloyElement: true }) },
  'supplemental filler unsure': (v) => { Object.assign(first(v).filler, { supplemental: null, supplementalAlloyElement: null }) },
  'alloy flux': (v) => { first(v).filler.fluxType = 'alloy' },
  'bare arc': (v) => { Object.assign(first(v).electrical, { currentType: null, transferMode: null, powerSource: null, current: null, makerCurrent: null, voltage: null, wireFeed: null, travelSpeed: null, heatInput: null }) },
  'any settings': (v) => { Object.assign(first(v).electrical, { current: { ...ALL }, voltage: { ...ALL }, wireFeed: { ...ALL }, travelSpeed: { ...ALL } }) },
  'wrong settings': (v) => { Object.assign(first(v).electrical, { current: interval(9, 2, 'current'), voltage: interval(9, 2, 'voltage'), wireFeed: interval(9, 2, 'wireFeed'), travelSpeed: interval(9, 2, 'travelSpeed'), heatInput: interval(9, 2, 'heatInput') }) },
  'one end of each setting': (v) => { Object.assign(first(v).electrical, { current: interval(200, null, 'current'), voltage: interval(null, 27, 'voltage'), wireFeed: interval(8, null, 'wireFeed'), travelSpeed: interval(null, 300, 'travelSpeed'), heatInput: interval(1, null, 'heatInput') }) },
  'a stopped arc': (v) => { Object.assign(first(v).electrical, { travelSpeed: interval(0, undefined, 'travelSpeed'), heatInput: null }) },
  'spread settings': (v) => { Object.assign(first(v).electrical, { current: interval(180, 220, 'current'), voltage: interval(25, 29, 'voltage'), travelSpeed: interval(250, 350, 'travelSpeed'), heatInput: null }) },
  'short-circuiting': (v) => { first(v).electrical.transferMode = 'short-circuiting' },
  'no gas stated': (v) => { first(v).shieldingGas = null },
  'no gas used': (v) => { first(v).shieldingGas = { ...first(v).shieldingGas!, components: [], name: 'none', flow: null } },
  'a gas in name only': (v) => { if (first(v).shieldingGas) Object.assign(first(v).shieldingGas!, { components: [], name: 'mix', flow: interval(9, 2, 'gasFlow') }) },
  'one end of gas flow': (v) => { if (first(v).shieldingGas) first(v).shieldingGas!.flow = interval(null, 20, 'gasFlow') },
  'bare technique': (v) => { Object.assign(first(v).technique, { bead: null, oscillation: null, passesPerSide: null, electrodes: null, electrodeCount: null, travelAngle: null, normalAngle: null, hotWire: null }) },
  'several electrodes': (v) => { Object.assign(first(v).technique, { electrodes: 'multiple', electrodeCount: 2, electrodeSpacing: quantity(15, 'length'), lateralSpacing: quantity(0, 'length'), parallelAngle: quantity(0, 'angle') }) },
  'several electrodes, bare': (v) => { Object.assign(first(v).technique, { electrodes: 'multiple', electrodeCount: null, electrodeSpacing: null }) },
  'weave beads': (v) => { first(v).technique.bead = 'weave' },
  'a single pass': (v) => { first(v).technique.passesPerSide = 'single' },
  'by machine': (v) => { first(v).mechanisation = 'machine' },
  'mechanisation open': (v) => { first(v).mechanisation = null },
  'hot wire by machine': (v) => { first(v).mechanisation = 'machine'; first(v).technique.hotWire = true },
  'no deposit': (v) => { first(v).depositThickness = null; first(v).maxPassThickness = null },
  'bare joint': (v) => { Object.assign(v.joint, { groove: null, includedAngle: null, bevelAngle: null, rootOpening: null, rootFace: null, backing: null, backGouging: null }) },
  'a square groove': (v) => { Object.assign(v.joint, { groove: 'square', includedAngle: null, rootFace: null }) },
  'a flare groove': (v) => { Object.assign(v.joint, { groove: 'flare-v', includedAngle: null }) },
  'a bevel on a tee': (v) => { Object.assign(v.joint, { groove: 'single-bevel', type: 'tee', includedAngle: null, bevelAngle: interval(45, undefined, 'angle') }) },
  'any joint': (v) => { Object.assign(v.joint, { includedAngle: { ...ALL }, rootOpening: { ...ALL }, rootFace: { ...ALL } }) },
  'a wrong joint': (v) => { Object.assign(v.joint, { includedAngle: interval(60, 30, 'angle'), rootOpening: WRONG, rootFace: WRONG }) },
  'one end of each joint dimension': (v) => { Object.assign(v.joint, { includedAngle: interval(null, 45, 'angle'), rootOpening: interval(6, null, 'length'), rootFace: interval(null, 0, 'length') }) },
  'gouged and unbacked': (v) => { Object.assign(v.joint, { backing: 'none', backGouging: 'grinding' }) },
  'gouged and backed': (v) => { v.joint.backGouging = 'grinding' },
  'unbacked': (v) => { v.joint.backing = 'none' },
  'partial penetration': (v) => { v.joint.penetration = 'partial' },
  'partial penetration without depth': (v) => { v.joint.penetration = 'partial'; first(v).depositThickness = null },
  'a fillet': (v) => { Object.assign(v.joint, { weld: 'fillet', type: 'tee', groove: null, filletLeg: interval(6, undefined, 'length') }); first(v).positions = ['2F'] },
  'a bare fillet': (v) => { Object.assign(v.joint, { weld: 'fillet', type: 'tee', groove: null }) },
  'a fillet with one end': (v) => { Object.assign(v.joint, { weld: 'fillet', type: 'tee', groove: null, filletLeg: interval(null, 6, 'length') }) },
  'pipe without diameter': (v) => { v.product = 'pipe' },
  'pipe': (v) => { v.product = 'pipe'; v.diameter = interval(324, undefined, 'length') },
  'pipe with one end': (v) => { v.product = 'pipe'; v.diameter = interval(null, 324, 'length') },
  'pipe of every diameter': (v) => { v.product = 'plate-and-pipe'; v.diameter = { ...ALL } },
  'standard pipe': (v) => { v.product = 'pipe'; v.diameter = interval(60.3, undefined, 'length'); v.thickness = interval(5.54, undefined, 'length') },
  'a turned pipe': (v) => { v.product = 'pipe'; v.diameter = interval(324, undefined, 'length'); v.pipeRotated = true; first(v).positions = ['5G'] },
  'no heat': (v) => { Object.assign(v.preheat, { minimum: null, interpassMaximum: null }); v.pwht.condition = null },
  'heat treated': (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation', time: interval(60, null, 'time'), temperature: interval(600, null, 'temperature') } },
  'heat treated, bare': (v) => { v.pwht = { ...v.pwht, condition: 'below-lower-transformation' } },
  'grain refined': (v) => { v.pwht = { ...v.pwht, condition: 'above-upper-then-below-lower', time: interval(60, undefined, 'time'), temperature: interval(900, 920, 'temperature') } },
  'passes': (v) => { first(v).passes = [{ number: '1', layer: 'root', fillerDiameter: quantity(3.2, 'length'), current: interval(200, null, 'current'), voltage: interval(27, undefined, 'voltage'), wireFeed: null, travelSpeed: null }, { number: '2', layer: null, fillerDiameter: null, current: WRONG, voltage: null, wireFeed: interval(8, undefined, 'wireFeed'), travelSpeed: null }] },
  'only root passes': (v) => { first(v).passes = [{ number: '1', layer: 'root', fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }] },
  'an odd designation': (v) => { v.joint.designation = 'Q' },
}
const names = Object.keys(MUTATIONS)
const sheet = (c: CouponContent): void => {
  c.runSheet = [{ id: 'r1', processId: c.variables.processes[0]?.id ?? '', pass: '1', layer: 'root', fillerDiameter: null, current: interval(200, undefined, 'current'), voltage: interval(27, undefined, 'voltage'), wireFeed: interval(8, undefined, 'wireFeed'), travelSpeed: interval(300, undefined, 'travelSpeed'), length: null, arcTime: null, instantaneousEnergy: null, interpass: null, note: null }]
}

describe('any record is answered', () => {
  test.each(ARCS)('one thing wrong on either side: %s', (process) => {
    const wrong: string[] = []
    for (const name of names) {
      for (const toughness of [true, false, null]) {
        const change = MUTATIONS[name]!
        const given = { processes: [process], toughness }
        const plain = coupon(given)
        const changed = coupon({ ...given, change, content: name.length % 2 === 0 ? sheet : undefined })
        for (const assessment of [judge(procedure({ ...given, change }), [plain]), judge(procedure(given), [changed]), judge(procedure({ ...given, change }), [changed, plain]), judge(procedure({ ...given, change }), [], '2015', 'prequalified')]) {
          for (const found of assessment.findings) {
            if (/undefined|NaN|null|\[object/.test(found.sentence) || (found.clause === '' && found.ruleId.startsWith('aws')) || (found.verdict === 'cannot-tell' && found.missing.length === 0)) wrong.push(`${name}: ${found.ruleId}: ${found.sentence}`)
          }
        }
        for (const range of qualifyCoupon(changed, 'aws-d1-1', '2020').ranges) if (/undefined|NaN|\[object/.test(range.reason)) wrong.push(`${name}: ${range.ruleId}: ${range.reason}`)
      }
    }
    expect(wrong).toEqual([])
  }, 120_000)
  test('several things wrong at once', () => {
    fc.assert(
      fc.property(fc.constantFrom(...ARCS), fc.constantFrom<'SI' | 'US'>('SI', 'US'), fc.uniqueArray(fc.constantFrom(...names), { maxLength: 5 }), fc.uniqueArray(fc.constantFrom(...names), { maxLength: 5 }), fc.constantFrom<'test' | 'prequalified'>('test', 'prequalified'), (process, system, ofProcedure, ofCoupon, route) => {
        const apply = (list: readonly string[]) => (v: WeldingVariables): void => list.forEach((name) => MUTATIONS[name]?.(v))
        const tested = coupon({ processes: [process], system, change: apply(ofCoupon), content: sheet })
        const assessment = judge(procedure({ processes: [process], system, change: apply(ofProcedure) }), [tested], '2020', route)
        expect(['within', 'outside', 'cannot-tell']).toContain(assessment.verdict)
        expect(qualifyCoupon(tested, 'aws-d1-1', '2010').ranges.length).toBeGreaterThanOrEqual(0)
      }),
      { numRuns: 300 },
    )
  }, 120_000)
  test('what is missing on either side never passes', () => {
    for (const process of ARCS) {
      for (const name of ['no thickness', 'no metals', 'no position', 'bare filler', 'bare arc', 'bare joint', 'no heat']) {
        const given = { processes: [process] }
        const change = MUTATIONS[name]!
        expect(judge(procedure({ ...given, change }), [coupon(given)]).verdict, `${process}: ${name}`).not.toBe('within')
        expect(judge(procedure(given), [coupon({ ...given, change })]).verdict, `${process}: ${name}`).not.toBe('within')
      }
    }
  })
  test('an edition or a level that is not known is named', () => {
    expect(assess({ procedure: procedure(), coupons: [coupon()], standard: 'aws-d1-1', edition: '1066' }).verdict).toBe('cannot-tell')
    expect(qualifyCoupon(coupon(), 'aws-d1-1', '1066').readyToCertify).toBe(false)
  })
})

describe('a rule asked out of place', () => {
  test('answers without a block, without coupons and without a range', () => {
    const wrong: string[] = []
    for (const process of ARCS) {
      for (const name of ['nothing', 'bare filler', 'no filler', 'partial penetration', 'a fillet', 'bare joint', 'passes', 'no thickness']) {
        const change = MUTATIONS[name] ?? (() => undefined)
        const wps = procedure({ processes: [process], change })
        const tested = coupon({ processes: [process], change })
        const range: RangeContext = { edition: '2020', level: null, system: 'SI', toughness: true, procedure: wps.variables, block: null, coupons: [tested] }
        const weld: CouponSide = { coupon: tested, variables: tested.content.variables, block: null, role: 'full' }
        const side = { ...weld, block: tested.content.variables.processes[0] ?? null }
        for (const rule of awsD11.rules) {
          for (const one of [weld, side]) {
            rule.range({ ...range, procedure: null }, one)
            for (const block of [null, wps.variables.processes[0] ?? null]) {
              const context = { ...range, procedure: wps.variables, block, path: 'processes.0' }
              const own = rule.range(context, one)
              for (const sides of [[], [one], [one, weld]]) {
                const judged = rule.check(context, sides, own?.range ?? null)
                if (judged && /undefined|NaN/.test(judged.sentence)) wrong.push(`${name}: ${rule.meta.id}: ${judged.sentence}`)
              }
            }
          }
        }
      }
    }
    expect(wrong).toEqual([])
  }, 120_000)
})

const RANK = { within: 0, 'cannot-tell': 1, outside: 2 } as const

describe('wider coupons never lose', () => {
  const thick = fc.integer({ min: 30, max: 400 }).map((tenths) => tenths / 10)
  test('a thicker plate never narrows the range', () => {
    fc.assert(fc.property(thick, thick, (a, b) => {
      const [thin, more] = [Math.min(a, b), Math.max(a, b)]
      const [x, y] = [plateLimits(thin, 'SI')!, plateLimits(more, 'SI')!]
      expect(y.upper === null || (x.upper !== null && y.upper >= x.upper)).toBe(true)
      expect(y.lower).toBe(x.lower)
      const [p, q] = [pipeLimits(thin, 'SI')!, pipeLimits(more, 'SI')!]
      expect(q.upper === null || (p.upper !== null && q.upper >= p.upper)).toBe(true)
    }))
  })
  test('one more coupon never makes the verdict worse', () => {
    fc.assert(fc.property(thick, thick, thick, thick, (low, more, tested, other) => {
      const wps = procedure({ thickness: [Math.min(low, more), Math.max(low, more)] })
      const one = judge(wps, [coupon({ thickness: tested })])
      const two = judge(wps, [coupon({ thickness: tested }), coupon({ number: 'PQR-002', thickness: other })])
      expect(RANK[two.verdict]).toBeLessThanOrEqual(RANK[one.verdict])
    }), { numRuns: 60 })
  })
  test('one more test position never takes a place away', () => {
    const position = fc.constantFrom<Position>('1G', '2G', '3G', '4G', '5G', '6G', '6GR', '1F', '2F', '3F', '4F', '5F')
    fc.assert(fc.property(fc.array(position), position, (list, one) => {
      const before = coveredPlaces(list)
      const after = coveredPlaces([...list, one])
      expect(before.every((place) => after.includes(place))).toBe(true)
    }))
  })
  test('wider readings never turn within into outside', () => {
    const amps = fc.integer({ min: 100, max: 400 })
    fc.assert(fc.property(amps, amps, fc.integer({ min: 0, max: 60 }), fc.integer({ min: 0, max: 60 }), amps, amps, (a, b, down, up, c, d) => {
      const asked = (v: WeldingVariables): void => { first(v).electrical.current = interval(Math.min(c, d), Math.max(c, d), 'current') }
      const tested = (min: number, max: number) => (v: WeldingVariables): void => { first(v).electrical.current = interval(min, max, 'current') }
      const [low, high] = [Math.min(a, b), Math.max(a, b)]
      const narrow = finding(pair({ processes: ['GMAW'] }, tested(low, high), asked), 'amperage').verdict
      const wide = finding(pair({ processes: ['GMAW'] }, tested(low - down, high + up), asked), 'amperage').verdict
      expect(narrow === 'within' && wide === 'outside').toBe(false)
    }), { numRuns: 150 })
  })
  test('a narrower procedure never gets worse', () => {
    fc.assert(fc.property(thick, thick, thick, (low, more, tested) => {
      const [min, max] = [Math.min(low, more), Math.max(low, more)]
      const wide = judge(procedure({ thickness: [min, max] }), [coupon({ thickness: tested })]).verdict
      const narrow = judge(procedure({ thickness: min }), [coupon({ thickness: tested })]).verdict
      expect(RANK[narrow]).toBeLessThanOrEqual(RANK[wide])
    }), { numRuns: 60 })
  })
})

describe('units at the boundary', () => {
  test.each([['3/8', 0.375, 9.525, 0.75], ['1/2', 0.5, 12.7, 1], ['3/4', 0.75, 19.05, 1.5]])('%s in. is the same typed in mm', (_name, inch, mm, most) => {
    const typed = (v: WeldingVariables): void => { v.thickness = interval(mm, undefined, 'length') }
    const inches = coupon({ system: 'US', thickness: inch })
    const metric = coupon({ system: 'US', change: typed, content: (c) => { first(c.variables).depositThickness = interval(mm, undefined, 'length') } })
    for (const tested of [inches, metric]) {
      expect(finding(judge(procedure({ system: 'US', thickness: most }), [tested]), 'thickness').verdict).toBe('within')
      expect(finding(judge(procedure({ system: 'US', thickness: most + 0.001 }), [tested]), 'thickness').verdict).toBe('outside')
    }
  })
  test('one inch is unlimited in inches, 25 mm in millimetres, each by its own row', () => {
    const of = (system: 'SI' | 'US', thickness: number) => finding(judge(procedure({ system, thickness: system === 'SI' ? 100 : 4 }), [coupon({ system, thickness })]), 'thickness').verdict
    expect([of('US', 1), of('US', 0.999), of('SI', 25), of('SI', 24.9)]).toEqual(['within', 'outside', 'within', 'outside'])
  })
  test('24 in. and 600 mm are a pair, never converted', () => {
    const of = (system: 'SI' | 'US', diameter: number) => finding(judge(procedure({ system, change: (v) => { v.product = 'pipe'; v.diameter = interval(diameter, undefined, 'length', system === 'SI' ? 'mm' : 'in') } }), [coupon({ system })]), 'diameter').verdict
    expect([of('SI', 600), of('SI', 599), of('US', 24), of('US', 23.9)]).toEqual(['within', 'outside', 'within', 'outside'])
  })
  test('25 °F and 15 °C are a pair, never converted', () => {
    const of = (system: 'SI' | 'US', had: number, asked: number, unit: string) => finding(pair({ system }, (v) => { v.preheat.minimum = quantity(had, 'temperature', unit) }, (v) => { v.preheat.minimum = quantity(asked, 'temperature', unit) }), 'preheat').verdict
    expect([of('SI', 100, 85, '°C'), of('SI', 100, 84.9, '°C'), of('US', 200, 175, '°F'), of('US', 200, 174.9, '°F')]).toEqual(['within', 'outside', 'within', 'outside'])
  })
})
