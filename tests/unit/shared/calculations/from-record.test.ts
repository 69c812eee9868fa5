/** What a record gives each calculator, what it leaves open, and what a result would write back. */
import { describe, expect, it, test } from 'vitest'
import { BESIDE_BEND, BESIDE_HARDNESS, besideJoint, besideRow, toWrite } from '../../../../shared/calculations/beside.ts'
import { calculatorById, calculators, type Calculator } from '../../../../shared/calculations/catalogue.ts'
import { boxText, emptyTexts, exampleTexts, keptText, readAs, textsFromAddress } from '../../../../shared/calculations/calculator-texts.ts'
import { CALCULATOR_WORDS, findCalculators } from '../../../../shared/calculations/calculator-search.ts'
import { fromRecord, type CalculatorRecord } from '../../../../shared/calculations/from-record.ts'
import { weldFamily } from '../../../../shared/calculations/record-metals.ts'
import { baseMetalById, toBaseMetal } from '../../../../shared/library/base-metals.ts'
import { weldingVariablesSchema, type WeldingVariables } from '../../../../shared/schemas/welding.ts'
import { interval, quantity } from '../../../../shared/units/convert.ts'

const named = (id: string): Calculator => {
  const found = calculatorById(id)
  if (!found) throw new Error(`no calculator ${id}`)
  return found
}
const steel = { specification: 'A/SA-516', grade: '70', pNumber: '1', groupNumber: 2, iso15608: '11.1', d11Group: 'II' }
const weld = (change: object = {}, block: object = {}): WeldingVariables =>
  weldingVariablesSchema.parse({
    standards: [{ standard: 'asme-ix', edition: '2021' }],
    joint: { weld: 'groove', type: 'butt', groove: 'single-v', includedAngle: interval(60, undefined, 'angle'), rootOpening: interval(2, 3, 'length') },
    baseMetals: { a: steel, b: steel },
    thickness: interval(10, 25, 'length'),
    preheat: { minimum: quantity(50, 'temperature') },
    ...change,
    processes: [
      {
        id: 'p1',
        process: 'GMAW',
        filler: { classification: 'ER70S-6', productForm: 'solid', diameters: [quantity(1.2, 'length')] },
        shieldingGas: { components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }], flow: interval(15, 20, 'gasFlow') },
        electrical: { current: interval(200, 260, 'current'), voltage: interval(24, 28, 'voltage'), travelSpeed: interval(250, 400, 'travelSpeed'), wireFeed: interval(7, 9, 'wireFeed') },
        technique: { contactTubeDistance: interval(15, 19, 'length') },
        ...block,
      },
    ],
  })
const analysis = { c: 0.18, si: 0.4, mn: 1.45, cr: 0.05, ni: 0.03, mo: 0.01, cu: 0.04, v: 0.005 }
const record = (change: object = {}, block: object = {}, more: Partial<CalculatorRecord> = {}): CalculatorRecord => ({ variables: weld(change, block), ...more })
const textOf = (id: string, given: CalculatorRecord, key: string) => fromRecord(id, given, 0).taken[key]?.text
const run = (id: string, given: CalculatorRecord) => {
  const calculator = named(id)
  const filled = fromRecord(id, given, 0)
  return calculator.run({ ...emptyTexts(calculator), ...Object.fromEntries(Object.entries(filled.taken).map(([key, { text }]) => [key, text])) })
}

describe('every calculator', () => {
  test.each(calculators.map(({ id }) => id))('%s names only its own inputs, and a missing one is never taken as well', (id) => {
    for (const given of [record({}, {}, { chemistries: { a: analysis } }), record({ thickness: null, preheat: {} }, { electrical: {}, filler: {}, technique: {}, process: null })]) {
      const { taken, missing, ends } = fromRecord(id, given, 0)
      const keys = Object.keys(named(id).inputs)
      for (const key of [...Object.keys(taken), ...missing, ...Object.keys(ends?.least ?? {}), ...Object.keys(ends?.most ?? {})]) expect(keys).toContain(key)
      for (const key of missing) expect(taken).not.toHaveProperty(key)
      for (const [key, { text, from }] of Object.entries(taken)) {
        expect(`${key} ${text}`).not.toMatch(/NaN|undefined|null/)
        expect(from).not.toBe('')
      }
    }
  })
  test.each(calculators.map(({ id }) => id))('%s can read whatever a record gave it', (id) => {
    const result = run(id, record({}, {}, { chemistries: { a: analysis, b: analysis, filler: analysis }, bend: { thickness: quantity(10, 'length'), formerDiameter: quantity(40, 'length') }, hardness: { values: [180, 240] } }))
    const taken = fromRecord(id, record({}, {}, { chemistries: { a: analysis, b: analysis, filler: analysis } }), 0).taken
    for (const { input } of result.problems) expect(Object.keys(taken)).not.toContain(input)
  })
  it('says of an empty record only what is missing, and assumes in so many words', () => {
    const { taken, missing } = fromRecord('preheat-method-b', { variables: weldingVariablesSchema.parse({ standards: [{ standard: 'asme-ix', edition: '2021' }], processes: [{ id: 'p1' }] }) }, 0)
    expect(missing).toEqual(['cet', 'thickness', 'hydrogen', 'heatInput'])
    expect(Object.keys(taken)).toEqual(['ambient'])
    expect(taken.ambient).toMatchObject({ text: '20', assumed: true })
  })
})

describe('heat input', () => {
  it('is filled for its highest value, and both ends make the interval', () => {
    const given = record()
    const { taken, ends, said } = fromRecord('heat-input-meter', given, 0)
    expect([taken.voltage?.text, taken.current?.text, taken.travelSpeed?.text]).toEqual(['28', '260', '250'])
    expect(taken.travelSpeed?.from).toBe('Travel speed, lower end')
    expect(said[0]).toContain('highest heat input')
    const calculator = named('heat-input-meter')
    const results = { least: calculator.run(ends?.least ?? {}), most: calculator.run(ends?.most ?? {}) }
    // 24 × 200 × 60 / 400 = 720 J/mm; 28 × 260 × 60 / 250 = 1747.2 J/mm, rounded outward.
    expect(results.least.value).toBeCloseTo(0.72, 9)
    expect(results.most.value).toBeCloseTo(1.7472, 9)
    expect(toWrite('heat-input-meter', results, 'SI', 0)).toMatchObject({ field: 'processes.0.electrical.heatInput', text: '0.72 kJ/mm to 1.75 kJ/mm', value: { min: { si: 0.72 }, max: { si: 1.75 }, all: false } })
  })
  it('gives one end where there is one figure', () => {
    const given = record({}, { electrical: { current: interval(200, undefined, 'current'), voltage: interval(24, undefined, 'voltage'), travelSpeed: interval(300, undefined, 'travelSpeed') } })
    expect(fromRecord('heat-input-meter', given, 0).ends).toBeNull()
    expect(toWrite('heat-input-meter', { single: run('heat-input-meter', given) }, 'SI', 0)).toMatchObject({ field: 'processes.0.electrical.heatInput.max', value: { si: 0.96 } })
  })
  it('by ISO takes the process number from process, wire and gas', () => {
    expect(textOf('heat-input-iso', record(), 'process')).toBe('135')
    expect(textOf('heat-input-iso', record({}, { shieldingGas: { components: [{ gas: 'Ar', percent: 100 }] } }), 'process')).toBe('131')
    expect(textOf('heat-input-iso', record({}, { process: 'SMAW' }), 'process')).toBe('111')
    expect(textOf('heat-input-iso', record({}, { process: 'OTHER' }), 'process')).toBeUndefined()
  })
  it('has no meaning from meters where the waveform is controlled', () => {
    const controlled = weld({}, { electrical: { waveformControlled: true } })
    expect(besideRow('electrical.heatInput', controlled, controlled.processes[0] ?? null).slice(0, 2)).toEqual(['heat-input-power', 'heat-input-energy'])
  })
})

describe('preheat', () => {
  const given = (change: object = {}, block: object = {}) => record(change, { ...block, filler: { classification: 'ER70S-6', ...(block as { filler?: object }).filler } }, { chemistries: { a: analysis } })
  it('takes CET from the analysis, the thickest part and the lowest heat input with k', () => {
    const { taken } = fromRecord('preheat-method-b', given({ thicknessB: interval(30, 40, 'length') }), 0)
    expect(taken.cet).toEqual({ text: '0.33125', from: 'Analysis of metal A', analysis: true })
    expect(taken.thickness).toEqual({ text: '40', from: 'Thickness of B, upper end' })
    // 0.8 × 24 × 200 × 60 / 400 / 1000
    expect(taken.heatInput?.text).toBe('0.576')
  })
  it('reads hydrogen from the designator, and from nothing else', () => {
    expect(textOf('preheat-method-b', given({}, { process: 'SMAW', filler: { classification: 'E7018-H4R' } }), 'hydrogen')).toBe('4')
    expect(textOf('preheat-method-b', given({}, { filler: { classification: 'E 42 5 B 32 H5' } }), 'hydrogen')).toBe('5')
    expect(fromRecord('preheat-method-b', given(), 0).missing).toContain('hydrogen')
  })
  it('does not guess whether an ISO figure is arc energy or heat input', () => {
    const iso = { standards: [{ standard: 'iso-15614-1', edition: '2017', level: '2' }] }
    const stated = (heatInputQuantity: string | null) => textOf('preheat-method-b', given(iso, { electrical: { heatInput: interval(1, 2, 'heatInput'), heatInputQuantity } }), 'heatInput')
    expect(stated('heat-input')).toBe('1')
    expect(stated('arc-energy')).toBe('0.8')
    expect(stated(null)).toBeUndefined()
  })
  it('writes the figure rounded up, and the code’s own Fahrenheit for who reads it', () => {
    const table = named('preheat-d1-1-table')
    const result = table.run({ category: 'B', thickness: '50', system: 'US' })
    expect(toWrite('preheat-d1-1-table', { single: result }, 'US', null)).toMatchObject({ field: 'preheat.minimum', value: { unit: '°F', typed: '150 °F' } })
    const b = named('preheat-method-b').run({ cet: '0.35', thickness: '30', hydrogen: '5', heatInput: '1.5', ambient: '20' })
    expect(toWrite('preheat-method-b', { single: b }, 'SI', null)).toMatchObject({ field: 'preheat.minimum', value: { si: 120 }, text: '120 °C' })
  })
  it('tells the category only where both metals agree and the filler tells its hydrogen', () => {
    expect(textOf('preheat-d1-1-table', given(), 'category')).toBe('B')
    expect(textOf('preheat-d1-1-table', given({}, { process: 'SMAW', filler: { classification: 'E7018' } }), 'category')).toBe('B')
    const a36 = { baseMetals: { a: { specification: 'A36', d11Group: 'I' }, b: { specification: 'A36', d11Group: 'I' } } }
    expect(textOf('preheat-d1-1-table', given({ ...a36, thickness: interval(10, 15, 'length') }, { process: 'SMAW', filler: { classification: 'E6010' } }), 'category')).toBe('A')
    expect(textOf('preheat-d1-1-table', given({ baseMetals: { a: steel, b: {} } }, { process: 'SMAW', filler: { classification: 'unknown' } }), 'category')).toBeUndefined()
  })
  it('suggests by the chosen standard, and not at all for aluminium or austenitic steel', () => {
    expect(besideRow('preheat.minimum', weld({ standards: [{ standard: 'aws-d1-1', edition: '2020' }] }), null)[0]).toBe('preheat-d1-1-table')
    expect(besideRow('preheat.minimum', weld(), null)[0]).toBe('preheat-method-b')
    for (const metal of [{ iso15608: '22.3' }, { pNumber: '8' }, {}]) expect(besideRow('preheat.minimum', weld({ baseMetals: { a: metal, b: metal } }), null)).toEqual([])
  })
})

describe('cooling and hardness', () => {
  it('works t8/5 out of the draft and hands it to the hardness', () => {
    const given = record({}, {}, { chemistries: { a: analysis } })
    const t85 = run('cooling-time', given).value ?? NaN
    expect(t85).toBeGreaterThan(0)
    expect(Number(textOf('haz-hardness-yurioka', given, 't85'))).toBeCloseTo(t85, 2)
    expect(run('haz-hardness-yurioka', given).value).toBeGreaterThan(150)
  })
  it('leaves the two-dimensional factor of a fillet open, as it is a range', () => {
    const { taken, missing } = fromRecord('cooling-time', record({ joint: { weld: 'fillet', type: 'tee', filletLeg: interval(6, undefined, 'length') } }), 0)
    expect(taken.f3).toMatchObject({ text: '0.67', assumed: true })
    expect(missing).toContain('f2')
  })
})

describe('wire', () => {
  it('goes from the draft’s amps to an interval of wire feed', () => {
    const { taken, ends } = fromRecord('wire-feed-from-current', record(), 0)
    expect(taken).toMatchObject({ material: { text: 'carbon-steel' }, diameter: { text: '1.2' }, current: { text: '230', from: 'Amps, middle' }, extension: { text: '17' } })
    expect(ends).toEqual({ least: { current: '200' }, most: { current: '260' } })
  })
  it('knows no burn-off of stainless steel, so it is not offered', () => {
    const stainless = weld({ baseMetals: { a: { pNumber: '8' }, b: { pNumber: '8' } } }, { filler: { classification: 'ER308L' } })
    expect(weldFamily(stainless, stainless.processes[0] ?? null)).toBe('stainless')
    expect(besideRow('electrical.wireFeed', stainless, stainless.processes[0] ?? null)).toEqual(['deposition-rate'])
    expect(besideRow('filler', stainless, stainless.processes[0] ?? null)).toEqual(['ferrite-dilution', 'ferrite-number'])
  })
  it('takes the filler before the base metal for the deposit', () => {
    const aluminium = weld({ baseMetals: { a: { iso15608: '22.3' }, b: { iso15608: '22.3' } } }, { filler: { classification: 'ER5356' } })
    expect(weldFamily(aluminium, aluminium.processes[0] ?? null)).toBe('aluminium')
  })
})

describe('joint, cost and tests', () => {
  it('carries the weld metal of the joint and the rate of the wire into the cost', () => {
    const row = baseMetalById('us-a36')
    const joint = { weld: 'groove', type: 'butt', groove: 'single-v', includedAngle: interval(60, undefined, 'angle'), rootOpening: interval(2, 3, 'length'), rootFace: interval(1, undefined, 'length') }
    const listed = record({ joint, baseMetals: { a: row ? toBaseMetal({ ...row }) : {}, b: {} } })
    const given = record({ joint })
    // Both steels weigh 7.85 g/cm³, one by its row of the library, one by its family.
    expect(fromRecord('cost', listed, 0).taken.weldMetal).toEqual(fromRecord('cost', given, 0).taken.weldMetal)
    const { taken, missing } = fromRecord('cost', given, 0)
    expect(Number(taken.weldMetal?.text)).toBeGreaterThan(0.3)
    expect(Number(taken.depositionRate?.text)).toBeGreaterThan(2)
    expect(taken.gasFlow?.text).toBe('17.5')
    expect(missing).toEqual(['length', 'operatorFactor', 'fillerPrice', 'gasPrice', 'labourRate'])
  })
  it('halves the included angle for the bevel', () => {
    expect(textOf('groove-weld', record(), 'bevelAngle')).toBe('30')
    expect(fromRecord('groove-weld', record(), 0).missing).toEqual(['rootFace'])
  })
  it('takes the lower elongation for the former, and writes no former: what was used is a fact', () => {
    const given = record({ baseMetals: { a: { ...steel, minElongation: quantity(21, 'percent') }, b: { ...steel, minElongation: quantity(16.7, 'percent') } } }, {}, { bend: { thickness: quantity(10, 'length'), formerDiameter: null } })
    expect(textOf('bend-former', given, 'elongation')).toBe('16.7')
    const result = run('bend-former', given)
    expect(result.value).toBeCloseTo(100 * 10 / 16.7 - 10, 6)
    expect(toWrite('bend-former', { single: result }, 'SI', null)).toBeNull()
  })
  it('takes the highest indentation', () => {
    expect(textOf('hardness-conversion', record({}, {}, { hardness: { values: [180, 244, 210] } }), 'figure')).toBe('244')
  })
  it('names only calculators that exist', () => {
    const every = ['preheat.minimum', 'electrical.heatInput', 'electrical.current', 'electrical.wireFeed', 'electrical.travelSpeed', 'electrical.peakCurrent', 'baseMetals.a', 'filler', 'filler.aNumber', 'shieldingGas', 'joint.filletLeg', 'joint.filletThroat', 'impactEnergy']
    const welds = [weld(), weld({ standards: [{ standard: 'iso-15614-1', edition: '2017', level: '2' }, { standard: 'aws-d1-1', edition: '2020' }] }), weld({ baseMetals: { a: { pNumber: '8' }, b: { pNumber: '8' } } }, { process: 'GTAW', filler: { classification: 'ER308L' } })]
    for (const one of welds) for (const id of [...every.flatMap((path) => besideRow(path, one, one.processes[0] ?? null)), ...besideJoint(one), ...BESIDE_BEND, ...BESIDE_HARDNESS]) expect(calculatorById(id), id).not.toBeNull()
  })
})

describe('texts', () => {
  const { travelSpeed } = named('heat-input-meter').inputs
  if (!travelSpeed) throw new Error('no travel speed')
  it.each([
    ['SI', '250', '250'],
    ['US', '10', '10 in/min'],
    ['SI', '10 in/min', '10 in/min'],
    ['US', '250 mm/min', '250'],
    ['SI', '18-22', '18-22'],
    ['US', '1/2', '1/2 in/min'],
  ] as const)('%s: "%s" is kept as "%s"', (system, typed, kept) => expect(keptText(travelSpeed, typed, system)).toBe(kept))
  it('shows a kept text to each reader so that it reads back the same', () => {
    expect(boxText(travelSpeed, '10 in/min', 'US')).toBe('10')
    expect(boxText(travelSpeed, '10 in/min', 'SI')).toBe('10 in/min')
    expect(boxText(travelSpeed, '250', 'US')).toBe('250 mm/min')
    expect(readAs(travelSpeed, '250', 'US')).toBe('= 9.8 in/min')
    expect(readAs(travelSpeed, '250', 'SI')).toBeNull()
  })
  test.each(calculators.map(({ id }) => id))('%s: the example in inches comes to the example in millimetres', (id) => {
    const calculator = named(id)
    const [si, us] = [calculator.run(exampleTexts(calculator, 'SI')), calculator.run(exampleTexts(calculator, 'US'))]
    expect(us.problems).toEqual([])
    // A whole number of passes may fall on the other side of its limit.
    const room = id === 'passes' ? 1 : 0.1
    if (typeof si.value === 'number') expect(Math.abs((us.value ?? NaN) - si.value)).toBeLessThanOrEqual(Math.max(0.005 * Math.abs(si.value), room))
  })
  it('opens the example for an address that asks nothing, and what it asks otherwise', () => {
    const calculator = named('heat-input-meter')
    expect(textsFromAddress(calculator, new URLSearchParams(''), 'SI')).toEqual({ voltage: '24', current: '180', travelSpeed: '250' })
    expect(textsFromAddress(calculator, new URLSearchParams('v=30'), 'SI')).toEqual({ voltage: '30', current: '', travelSpeed: '' })
  })
})

describe('finding a calculator', () => {
  it('knows other names for each, and for none that is not there', () => {
    expect(Object.keys(CALCULATOR_WORDS).sort()).toEqual(calculators.map(({ id }) => id).sort())
  })
  it.each([
    ['preheat', 'preheat-method-b'],
    ['t8/5', 'cooling-time'],
    ['t85', 'cooling-time'],
    ['WFS', 'wire-feed-from-current'],
    ['Rockwell', 'hardness-conversion'],
    ['d1.1 preheat', 'preheat-d1-1-table'],
    ['Pcm', 'carbon-equivalents'],
    ['pitting', 'pren'],
    ['Séférian', 'preheat-seferian'],
    ['seferian', 'preheat-seferian'],
    ['cost', 'cost'],
  ])('"%s" finds %s first', (asked, id) => expect(findCalculators(asked)[0]?.id).toBe(id))
  it('finds nothing for what is not here', () => expect(findCalculators('zzz')).toEqual([]))
})

describe('an end that the record leaves open', () => {
  const open = { min: null, all: false } as const
  it('a greatest heat input alone is never the lowest one: meters tell it, or it stays open', () => {
    const stated = { heatInput: { ...open, max: quantity(2.5, 'heatInput') }, heatInputQuantity: 'heat-input' as const }
    // 0.8 × 24 V × 200 A × 60 / 400 mm/min / 1000
    const metered = record({}, { electrical: { ...weld().processes[0]?.electrical, ...stated } })
    expect(textOf('preheat-method-b', metered, 'heatInput')).toBe('0.576')
    const bare = record({}, { electrical: stated })
    for (const id of ['preheat-method-b', 'preheat-method-a', 'cooling-time']) expect(fromRecord(id, bare, 0).missing).toContain('heatInput')
    expect(textOf('preheat-method-b', record({}, { electrical: { ...stated, heatInput: interval(1.1, 2.5, 'heatInput') } }), 'heatInput')).toBe('1.1')
  })
  it('a thickness without an upper end has no thickest part', () => {
    const upward = { min: quantity(10, 'length'), max: null, all: false }
    for (const id of ['preheat-method-b', 'preheat-method-a', 'preheat-d1-1-table', 'cooling-time']) expect(fromRecord(id, record({ thickness: upward }), 0).missing).toContain('thickness')
    expect(fromRecord('preheat-method-b', record({ thicknessB: upward }), 0).missing).toContain('thickness')
    expect(textOf('preheat-method-b', record({ thicknessB: interval(40, undefined, 'length') }), 'thickness')).toMatch(/^40/)
  })
  it('a fastest travel speed alone gives no highest heat input', () => {
    const { taken, missing, ends } = fromRecord('heat-input-meter', record({}, { electrical: { current: interval(200, 260, 'current'), voltage: interval(24, 28, 'voltage'), travelSpeed: { ...open, max: quantity(400, 'travelSpeed') } } }), 0)
    expect(taken).not.toHaveProperty('travelSpeed')
    expect(missing).toContain('travelSpeed')
    expect(ends).toBeNull()
  })
})

describe('the CET that decides', () => {
  const weak = { c: 0.08, mn: 1.2 }
  it('is that of the weld metal + 0.03 unless the parent’s is that much higher', () => {
    // CET of `analysis` 0.331; of C 0.22 Mn 1.5 it is 0.37, and 0.40 with 0.03 on top.
    const strong = fromRecord('preheat-method-b', record({}, {}, { chemistries: { a: analysis, filler: { c: 0.22, mn: 1.5 } } }), 0)
    expect(strong.taken.cet).toMatchObject({ text: '0.4', from: 'Analysis of filler, + 0.03', analysis: true })
    expect(textOf('preheat-method-b', record({}, {}, { chemistries: { a: analysis, filler: weak } }), 'cet')).toBe('0.33125')
  })
  it('is the parent’s with a word of warning where the filler has no analysis', () => {
    const { taken, said } = fromRecord('preheat-method-b', record({}, {}, { chemistries: { a: analysis } }), 0)
    expect(taken.cet?.text).toBe('0.33125')
    expect(said.join(' ')).toContain('the weld metal’s plus 0.03')
    expect(fromRecord('preheat-method-b', record({}, {}, { chemistries: { a: analysis, filler: weak } }), 0).said.join(' ')).not.toContain('plus 0.03')
  })
})

describe('rounding to the safe side', () => {
  it('keeps a heat input for a cooling time inside the aim', () => {
    const calculator = named('heat-input-for-cooling-time')
    const result = calculator.run(exampleTexts(calculator, 'SI'))
    expect(result.value).toBeCloseTo(1.6727, 3)
    expect(toWrite('heat-input-for-cooling-time', { single: result }, 'SI', 0)?.text).toBe('1.67 kJ/mm as the greatest')
    const us = toWrite('heat-input-for-cooling-time', { single: result }, 'US', 0)?.value
    expect(us && 'si' in us ? us.si : NaN).toBeLessThanOrEqual(result.value ?? 0)
  })
})

it('takes no deposition efficiency of a gas-shielded wire while the gas is not stated', () => {
  expect(textOf('deposition-rate', record(), 'efficiency')).toBe('96')
  expect(fromRecord('deposition-rate', record({}, { shieldingGas: null }), 0).missing).toContain('efficiency')
})
