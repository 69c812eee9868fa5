/** What records are called in ISO terms, and the energy that they give. */
import { describe, expect, test } from 'vitest'
import { gasSymbol, isoPositions, isoProcessNumber, materialGroup, metalName, processFactor, secondMember } from '@shared/standards/common/iso-names.ts'
import type { GasMixture, Position, ProcessBlock, RunRow } from '@shared/schemas/welding.ts'
import { energyOf, factors, waveform } from '@shared/standards/iso-15614-1/energy.ts'
import { designation } from '@shared/standards/iso-15614-1/designation.ts'
import { rules } from '@shared/standards/iso-15614-1/rules/index.ts'
import { memberOf, runsOf, thickPass, throatOf } from '@shared/standards/iso-15614-1/sides.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { coupon, finding, judge, procedure, qualified, type Arc, type Given } from './builders.ts'

const blockOf = (process: Arc | 'OTHER', change: (block: ProcessBlock) => void = () => {}): ProcessBlock => {
  const { variables } = procedure({ processes: [[process === 'OTHER' ? 'SMAW' : process, 10]] })
  const block = variables.processes[0]!
  if (process === 'OTHER') block.process = 'OTHER'
  change(block)
  return block
}
const mixture = (parts: readonly (readonly [string, number])[], more: Partial<GasMixture> = {}): GasMixture => ({ libraryId: null, components: parts.map(([gas, percent]) => ({ gas: gas as 'Ar', percent })), isoSymbol: null, name: null, flow: null, ...more })

describe('ISO 4063 numbers', () => {
  const number = (process: Arc | 'OTHER', form: ProcessBlock['filler']['productForm'], gas?: GasMixture | null, more: Partial<ProcessBlock['filler']> = {}): string | null =>
    isoProcessNumber(blockOf(process, (block) => { Object.assign(block.filler, { productForm: form }, more); if (gas !== undefined) block.shieldingGas = gas }))
  const argon = mixture([['Ar', 100]])
  const active = mixture([['Ar', 82], ['CO2', 18]])
  const reducing = mixture([['Ar', 95], ['H2', 5]])
  test.each([
    ['111', number('SMAW', 'covered-electrode')],
    ['15', number('PAW', 'solid')],
    ['121', number('SAW', 'solid')],
    ['125', number('SAW', 'metal-cored')],
    ['124', number('SAW', 'solid', undefined, { supplemental: true })],
    [null, number('SAW', 'powder')],
    ['131', number('GMAW', 'solid', argon)],
    ['135', number('GMAW', 'solid', active)],
    ['133', number('GMAW', 'metal-cored', argon)],
    ['138', number('GMAW', 'metal-cored', active)],
    ['132', number('FCAW', 'flux-cored', argon)],
    ['136', number('FCAW', 'flux-cored', active)],
    ['114', number('FCAW', 'flux-cored', mixture([], { name: 'none' }))],
    [null, number('FCAW', 'flux-cored', null)],
    [null, number('GMAW', 'powder', argon)],
    ['141', number('GTAW', 'solid')],
    ['143', number('GTAW', 'flux-cored')],
    ['145', number('GTAW', 'insert', reducing)],
    ['146', number('GTAW', 'metal-cored', reducing)],
    ['142', number('GTAW', 'solid', argon, { added: false })],
    [null, number('GTAW', null)],
    [null, number('OTHER', 'solid')],
  ])('%s', (expected, found) => expect(found).toBe(expected))
})

test('positions by weld, product and direction', () => {
  const at = (positions: Position[], progression: ProcessBlock['progression'], product: 'plate' | 'pipe' = 'plate'): string[] | null => {
    const { variables } = procedure({ change: (v) => { v.product = product } })
    return isoPositions(variables, Object.assign(variables.processes[0]!, { positions, progression }))
  }
  expect(at(['1G', '2G', '3G', '4G'], 'up')).toEqual(['PA', 'PC', 'PF', 'PE'])
  expect(at(['3G'], 'both')).toEqual(['PF', 'PG'])
  expect(at(['3G'], null)).toBeNull()
  expect(at(['2F', '4F'], null)).toEqual(['PB', 'PD'])
  expect(at(['5G', '6G'], 'down', 'pipe')).toEqual(['PJ', 'J-L045'])
  expect(at(['5G'], 'up', 'plate')).toEqual(['PH'])
  expect(at([], 'up')).toBeNull()
})

test('gas symbols, groups and names of metals', () => {
  expect([gasSymbol(null), gasSymbol(mixture([], { name: 'none' })), gasSymbol(mixture([['Ar', 98], ['CO2', 2]])), gasSymbol(mixture([['Ar', 50]])), gasSymbol(mixture([], { isoSymbol: 'ISO 14175-M21' })), gasSymbol(mixture([], { isoSymbol: 'Z' })), gasSymbol(mixture([]))]).toEqual([null, 'none', 'M12', null, 'M21', null, null])
  const { a } = procedure().variables.baseMetals
  expect([materialGroup({ ...a, iso15608: 'Group 8' }), materialGroup({ ...a, iso15608: null }), materialGroup({ ...a, iso15608: 'x' })]).toEqual([{ main: 8, sub: null, text: '8' }, null, null])
  expect([metalName({ ...a, grade: null, uns: 'K 02700' }), metalName({ ...a, grade: null, uns: null })]).toEqual(['K02700', null])
  const single = procedure({ change: (v) => { Object.assign(v.baseMetals.b, { iso15608: null, uns: null, specification: null, grade: null }) } }).variables
  expect(secondMember(single)).toBe(single.baseMetals.a)
  expect([processFactor(blockOf('SAW')), processFactor(blockOf('GTAW')), processFactor(blockOf('PAW')), processFactor(blockOf('GMAW'))]).toEqual([1, 0.6, 0.6, 0.8])
})

test.each([
  ['E 42 4 B 42 H5', 'ISO', 'E424B', 5],
  ['ISO 2560-A - E 46 6 1Ni B 42 H5', 'AWS', 'E4661NIB42', 5],
  ['E7018-H4R', 'AWS', 'E70 basic', 4],
  ['E8018-B2', 'AWS', 'E80 basicB2', null],
  ['E7018-1', 'AWS', 'E7018I1', null],
  ['ER70S-6', 'AWS', 'ER70S6', null],
] as const)('designation %s', (text, system, key, hydrogen) => {
  const { filler } = blockOf('SMAW', (block) => { block.filler.classification = text; block.filler.specification = null })
  const read = designation(filler)
  expect(read?.hydrogen).toBe(hydrogen)
  if (text !== 'ISO 2560-A - E 46 6 1Ni B 42 H5' && text !== 'E7018-1') expect(read).toEqual({ system, key, hydrogen })
})

describe('energy', () => {
  const row = (more: Partial<RunRow>): RunRow => ({ id: 'r', processId: 'GMAW', pass: '1', layer: 'fill', fillerDiameter: null, current: interval(200, undefined, 'current'), voltage: interval(25, undefined, 'voltage'), wireFeed: null, travelSpeed: interval(300, undefined, 'travelSpeed'), length: null, arcTime: null, instantaneousEnergy: null, interpass: null, note: null, ...more })
  const tested = (rows: RunRow[], change0: Given['change0'] = (block) => { block.electrical.heatInput = null }): ReturnType<typeof energyOf> => {
    const one = coupon({ change0, content: (content) => { content.runSheet = rows } })
    return energyOf(one.content.variables.processes[0]!, one)
  }
  test('from the run sheet: lowest, mean and highest of its rows', () => {
    expect(tested([row({}), row({ travelSpeed: interval(200, undefined, 'travelSpeed') })])).toEqual({ low: 1, mean: 1.25, high: 1.5, kind: 'E', from: 'from the run sheet' })
    expect(tested([row({ travelSpeed: null, length: quantity(300, 'length'), arcTime: quantity(60, 'duration') })])).toMatchObject({ mean: 1 })
    expect(tested([row({ instantaneousEnergy: quantity(600000, 'energy'), length: quantity(300, 'length') })])).toMatchObject({ mean: 2 })
    expect(tested([row({ processId: 'other' }), row({ current: null })])).toMatchObject({ from: 'from voltage, current and travel speed' })
    expect(tested([row({ travelSpeed: interval(0, undefined, 'travelSpeed') })])).toMatchObject({ from: 'from voltage, current and travel speed' })
    const waved: Given['change0'] = (block) => Object.assign(block.electrical, { heatInput: null, waveformControlled: true })
    expect(tested([row({})], waved)).toMatchObject({ missing: ['electrical.heatInput (from instantaneous energy or power, because the waveform is controlled)'] })
    expect(tested([row({ instantaneousEnergy: quantity(300000, 'energy'), length: quantity(300, 'length') })], waved)).toMatchObject({ mean: 1 })
  })
  test('a stated cap has no floor for a procedure and is one value on a coupon', () => {
    const cap = interval(null, 1.4, 'heatInput')
    expect(energyOf(blockOf('GMAW', (block) => { block.electrical.heatInput = cap }))).toMatchObject({ low: 0, high: 1.4 })
    expect(tested([], (block) => { block.electrical.heatInput = cap })).toMatchObject({ low: 1.4, mean: 1.4, high: 1.4 })
  })
  test('factors between heat input and arc energy', () => {
    const block = blockOf('GMAW')
    expect([factors('E', 'E', block), factors('E', 'Q', block), factors('Q', 'E', block), factors(null, 'E', block), factors(null, null, block)]).toEqual([{ least: 1, greatest: 1 }, { least: 0.8, greatest: 0.8 }, { least: 1.25, greatest: 1.25 }, { least: 1, greatest: 1.25 }, { least: 0.8, greatest: 1.25 }])
    expect(factors(null, null, blockOf('SAW'))).toEqual({ least: 1, greatest: 1 })
  })
  test('waveform', () => {
    const of = (more: Partial<ProcessBlock['electrical']>): boolean | null => waveform({ ...blockOf('GMAW').electrical, ...more })
    expect([of({}), of({ waveformControlled: true }), of({ waveformControlled: null }), of({ waveformControlled: null, pulsed: true }), of({ waveformControlled: null, pulsed: null, transferMode: 'pulsed-spray' })]).toEqual([false, true, false, null, null])
  })
})

test('figures that the tables start from', () => {
  const { variables } = procedure()
  const block = variables.processes[0]!
  block.technique.passesPerSide = null
  expect(runsOf(variables, block)).toBeNull()
  block.passes = [1, 2, 3].map((n) => ({ ...block.passes[0]!, number: String(n) }))
  expect(runsOf(variables, block)).toBe('multiple')
  const twice = procedure({ thickness: 14, processes: [['GTAW', 4], ['GMAW', 10]] }).variables
  expect(runsOf(twice, twice.processes[0]!)).toBe('multiple')
  const one = coupon({ thickness: 20, change0: (each) => { each.maxPassThickness = null } })
  expect(thickPass({ coupon: one, variables: one.content.variables, block: null, role: 'full' }, 13)).toBe(false)
  expect(throatOf(procedure({ change: (v) => { v.joint.filletThroat = null; v.joint.filletLeg = interval(10, 10, 'length') } }).variables)).toEqual({ min: 7.071, max: 7.071 })
  const unequal = (a: readonly [number, number], b: readonly [number, number] | 'all'): [string, string] => {
    const { variables: asked } = procedure({ change: (v) => { v.thickness = interval(a[0], a[1], 'length'); v.thicknessB = b === 'all' ? { min: null, max: null, all: true } : interval(b[0], b[1], 'length') } })
    return [memberOf(asked, 'a'), memberOf(asked, 'b')]
  }
  expect([unequal([10, 20], [10, 30]), unequal([10, 30], [10, 20]), unequal([10, 20], [10, 20]), unequal([5, 20], [10, 20]), unequal([5, 20], 'all')]).toEqual([['thin', 'thick'], ['thick', 'thin'], ['single', 'single'], ['thin', 'thick'], ['thin', 'thick']])
  expect(memberOf(null, 'a')).toBe('single')
})

test('every rule answers a bare coupon and a bare procedure', () => {
  const bare = coupon({ change: (v) => { v.thickness = null; v.diameter = null; v.preheat.minimum = null } , change0: (block) => Object.assign(block, { positions: [], mechanisation: null, shieldingGas: null, backingGas: null, depositThickness: null, electrical: { ...block.electrical, currentType: null, transferMode: null, heatInput: null, voltage: null } }) })
  const assessment = judge(procedure(), [bare])
  expect(assessment.verdict).toBe('cannot-tell')
  expect(finding(assessment, 'shielding-gas').missing).toEqual(['PQR-001: shieldingGas'])
  const { missing } = qualified(bare)
  expect(missing.map(({ field }) => field)).toEqual(expect.arrayContaining(['variables.thickness', 'variables.processes.0.positions', 'variables.processes.0.mechanisation', 'variables.processes.0.shieldingGas']))
  expect(rules.filter(({ meta }) => meta.classes.GMAW === 'essential').length).toBeGreaterThan(20)
  // Whatever the rule set, an unlisted process of the procedure is unsupported by name.
  expect(finding(judge(procedure({ processes: [['PAW', 20]] }), [coupon()]), 'plasma-gas').missing).toEqual(['a coupon welded with PAW'])
})
