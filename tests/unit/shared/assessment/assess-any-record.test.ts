/** Any record that the schemas accept: the engine answers, keeps its promises, and never throws. */
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { overall, qualifyCoupon } from '@shared/assessment/assess.ts'
import { assessmentSchema, couponQualificationSchema } from '@shared/schemas/assessment.ts'
import type { Process, WeldingVariables } from '@shared/schemas/welding.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, judge, procedure } from '../standards/builders.ts'

type Change = (variables: WeldingVariables) => void
const gas = (name: string | null, ...components: [string, number][]): WeldingVariables['processes'][number]['shieldingGas'] => ({ libraryId: null, components: components.map(([one, percent]) => ({ gas: one as 'Ar', percent })), isoSymbol: null, name, flow: components.length > 1 ? null : interval(10, 15, 'gasFlow') })

const first = (variables: WeldingVariables): WeldingVariables['processes'][number] => {
  const [block] = variables.processes
  if (!block) throw new Error('no block')
  return block
}

/** Values that a person may leave, by field. */
const CHANGES: Record<string, readonly Change[]> = {
  thickness: [null, interval(12, undefined, 'length'), interval(null, 30, 'length'), interval(8, null, 'length'), interval(50, 20, 'length'), { min: null, max: null, all: true }, interval(-4, undefined, 'length'), interval(5, 260, 'length')].map((value) => (v) => void (v.thickness = value)),
  thicknessB: [interval(60, undefined, 'length'), interval(9, undefined, 'length'), interval(60, 20, 'length'), { min: null, max: null, all: true }].map((value) => (v) => void (v.thicknessB = value)),
  deposit: [null, interval(0, undefined, 'length'), interval(30, undefined, 'length'), interval(null, 9, 'length'), { min: null, max: null, all: true }, interval(30, 3, 'length')].map((value) => (v) => void (first(v).depositThickness = value)),
  pass: [null, quantity(15, 'length'), quantity(-1, 'length'), quantity(12, 'length')].map((value) => (v) => void (first(v).maxPassThickness = value)),
  metals: [['4', '4'], ['8', '1'], ['43', '43'], ['51', '52'], ['11A', '11B'], ['23', '23'], ['10I', '10I'], ['25', '21'], [null, null], ['1', null], ['', '5A'], ['15E', '8']].map(([a, b]) => (v) => { v.baseMetals.a.pNumber = a ?? null; v.baseMetals.b.pNumber = b ?? null }),
  grades: [(v) => Object.assign(v.baseMetals.a, { uns: null, specification: null, groupNumber: null }), (v) => Object.assign(v.baseMetals.b, { uns: null, grade: null, groupNumber: 2 }), (v) => Object.assign(v.baseMetals.b, { uns: null, specification: null, grade: null, pNumber: null })],
  joint: [(v) => (v.joint.weld = 'fillet'), (v) => Object.assign(v.joint, { weld: 'fillet', pressureRetaining: false }), (v) => (v.joint.penetration = 'partial'), (v) => (v.joint.work = 'repair'), (v) => Object.assign(v.joint, { backing: 'none', groove: null, retainers: null, rootOpening: null, backGouging: null }), (v) => Object.assign(v.joint, { backing: 'ceramic', backingMaterial: null })],
  filler: [(v) => (first(v).filler.added = false), (v) => (first(v).filler.added = null), (v) => Object.assign(first(v).filler, { fNumber: null, aNumber: null }), (v) => Object.assign(first(v).filler, { fNumber: 'none', aNumber: 8 }), (v) => Object.assign(first(v).filler, { aNumber: null, depositComposition: '5Cr' }), (v) => Object.assign(first(v).filler, { classification: 'ER80S-G', diameters: [] }), (v) => Object.assign(first(v).filler, { classification: null, tradeName: null, diameters: [quantity(8, 'length')] }), (v) => Object.assign(first(v).filler, { productForm: null, consumableInsert: null, penetrationFlux: null })],
  flux: [(v) => Object.assign(first(v).filler, { fluxClassification: null, fluxTradeName: null }), (v) => Object.assign(first(v).filler, { fluxType: 'alloy', fluxIsRecrushedSlag: true }), (v) => Object.assign(first(v).filler, { fluxType: null, fluxIsRecrushedSlag: null }), (v) => Object.assign(first(v).filler, { supplemental: true, supplementalAlloyElement: true }), (v) => Object.assign(first(v).filler, { supplemental: true, supplementalVolume: quantity(20, 'percent') }), (v) => Object.assign(first(v).filler, { fluxIsRecrushedSlag: true, fluxTradeName: null }), (v) => Object.assign(first(v).filler, { supplemental: null })],
  heat: [(v) => (v.preheat.minimum = null), (v) => (v.preheat.interpassMaximum = null), (v) => (v.preheat.minimum = quantity(150, 'temperature')), (v) => (v.preheat.maintenance = null), (v) => (v.preheat.minimum = quantity(-50, 'temperature'))],
  pwht: (['none', 'below-lower-transformation', 'above-upper-transformation', 'above-upper-then-below-lower', 'between-transformations', 'within-range', 'solution-anneal', null] as const).flatMap((condition) => [(v: WeldingVariables) => Object.assign(v.pwht, { condition, temperature: interval(600, 620, 'temperature'), time: interval(60, 90, 'time') }), (v: WeldingVariables) => Object.assign(v.pwht, { condition, temperature: interval(null, 700, 'temperature'), time: interval(null, 30, 'time') }), (v: WeldingVariables) => Object.assign(v.pwht, { condition })]),
  gases: [gas('none'), gas(null), gas('Trade mix'), gas(null, ['Ar', 100]), gas(null, ['CO2', 100]), gas(null, ['Ar', 60], ['CO2', 20]), gas(null, ['N2', 90], ['H2', 10]), null].flatMap((mixture) => [(v: WeldingVariables) => void (first(v).shieldingGas = mixture), (v: WeldingVariables) => void (first(v).backingGas = mixture), (v: WeldingVariables) => void (first(v).trailingGas = mixture), (v: WeldingVariables) => void (first(v).plasmaGas = mixture)]),
  electrical: [{ heatInput: null }, { heatInput: null, voltage: null }, { heatInput: null, current: interval(null, 200, 'current') }, { heatInput: interval(2, null, 'heatInput') }, { heatInputMethod: 'volume' }, { waveformControlled: true }, { waveformControlled: true, heatInput: null }, { waveformControlled: null, pulsed: true }, { waveformControlled: true, heatInputMethod: 'instantaneous-energy' }, { transferMode: 'short-circuiting' }, { transferMode: null, currentType: null }, { currentType: 'AC-balanced' }, { current: null, wireFeed: null, pulsed: null, tungstenClassification: null }].map((value) => (v) => Object.assign(first(v).electrical, value)),
  technique: [{ passesPerSide: 'single', electrodes: 'multiple' }, { passesPerSide: null, electrodes: null }, { keyhole: null, closedChamber: null, thermalPreparation: null }, { keyhole: 'keyhole', closedChamber: true, thermalPreparation: true }, { bead: null, initialCleaning: null, nozzleSize: null, peening: null, contactTubeDistance: null }, { bead: 'weave', oscillation: null, electrodeSpacing: null, electrodes: 'multiple' }].map((value) => (v) => Object.assign(first(v).technique, value)),
  position: [(v) => (first(v).positions = []), (v) => (first(v).positions = ['3G', '4F']), (v) => Object.assign(first(v), { positions: ['6G'], progression: null }), (v) => Object.assign(first(v), { positions: ['5G'], progression: 'down' }), (v) => (first(v).mechanisation = 'automatic'), (v) => (first(v).mechanisation = null), (v) => (first(v).passes = [{ number: '1', layer: 'root', fillerDiameter: null, current: null, voltage: null, wireFeed: null, travelSpeed: null }])],
  record: [(v) => (v.toughnessRequired = null), (v) => (v.unitSystem = 'US'), (v) => (v.unitSystem = 'SI'), (v) => (first(v).process = null), (v) => (first(v).process = 'OTHER'), (v) => (v.diameter = interval(100, undefined, 'length'))],
}

const change: fc.Arbitrary<Change> = fc.constantFrom(...Object.values(CHANGES).flatMap((list) => list.map((one) => ({ one })))).map(({ one }) => one)
const changes = fc.array(change, { maxLength: 5 }).map((list): Change => (v) => list.forEach((one) => one(v)))
const process = fc.constantFrom<Exclude<Process, 'OTHER'>>('SMAW', 'SAW', 'GMAW', 'FCAW', 'GTAW', 'PAW')
const record = fc.record({ processes: fc.array(process, { minLength: 1, maxLength: 2 }), thickness: fc.constantFrom(1.2, 4, 8, 10, 13, 19, 25, 40, 160), change: changes, tests: fc.constantFrom('mechanical' as const, 'full' as const, 'toughness' as const), certified: fc.boolean() })
const scene = fc.record({
  edition: fc.constantFrom('2017', '2019', '2021', '2023'),
  system: fc.constantFrom('SI' as const, 'US' as const),
  toughness: fc.constantFrom(true, false, null),
  wps: record,
  coupons: fc.array(record, { maxLength: 3 }),
  shared: changes,
})

const RANK = { within: 0, 'cannot-tell': 1, outside: 2 }

describe('any record', () => {
  test('is answered in the schema, and the overall verdict is the worst that counts', () =>
    fc.assert(fc.property(scene, ({ edition, system, toughness, wps, coupons, shared }) => {
      const factor = system === 'SI' ? 1 : 25.4
      const build = (one: typeof wps): Parameters<typeof coupon>[0] => ({ system, toughness, thickness: one.thickness / factor, processes: one.processes.map((name) => [name, one.thickness / factor] as const), change: (v) => { shared(v); one.change(v) }, tests: one.tests, certified: one.certified })
      const records = coupons.map((one, i) => coupon({ ...build(one), number: `PQR-${i + 1}` }))
      const asked = procedure(build(wps))
      const assessment = judge(asked, records.slice(0, 2), edition, records.slice(2))
      assessmentSchema.parse(assessment)
      expect(assessment.verdict).toBe(overall(assessment.findings))
      for (const one of assessment.findings) {
        expect(one.sentence).toMatch(/^\S.*\.$/s)
        expect(one.sentence).not.toMatch(/undefined|null|NaN|Infinity/)
        if (one.verdict === 'cannot-tell') expect(one.missing.length, `${one.ruleId}: ${one.sentence}`).toBeGreaterThan(0)
        if (one.verdict === 'outside') expect(['essential', 'supplementary']).toContain(one.class)
        if (one.class === 'essential' || one.class === 'supplementary') expect(RANK[one.verdict]).toBeLessThanOrEqual(RANK[assessment.verdict])
      }
      if (records.length === 0) expect(assessment.verdict).not.toBe('within')
      for (const one of records) couponQualificationSchema.parse(qualifyCoupon(one, 'asme-ix', edition))
    }), { numRuns: 400, seed: 20261201 }), 120_000)
})
