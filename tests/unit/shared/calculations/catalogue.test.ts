/** The calculators as the page uses them: worked examples, addresses, bad input. */
import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { addressOfInputs, calculatorById, calculatorInputsSchema, calculators, CALCULATOR_GROUPS, calculatorsOf, exampleInputs, inputsFromAddress, runAddress, type Calculator, type CalculatorResult } from '../../../../shared/calculations/catalogue.ts'
import cases from '../../../fixtures/cases/calculations.json' with { type: 'json' }

const all = calculators.map((each) => [each.id, each] as const)
const named = (id: string): Calculator => {
  const found = calculatorById(id)
  if (!found) throw new Error(`no calculator ${id}`)
  return found
}
const numbersOf = (value: unknown): number[] => (typeof value === 'number' ? [value] : value !== null && typeof value === 'object' ? Object.values(value as Record<string, unknown>).flatMap(numbersOf) : [])
const clean = ({ value, figures, steps, shown }: CalculatorResult): boolean => numbersOf([value, figures, steps, shown.map((each) => each.value)]).every(Number.isFinite) && !JSON.stringify([steps, shown]).includes('NaN')

describe('the list', () => {
  it('names each calculator, input and address once', () => {
    expect(new Set(calculators.map(({ id }) => id)).size).toBe(calculators.length)
    for (const { id, inputs, outputs } of calculators) {
      expect(id).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/)
      const addresses = Object.values(inputs).map(({ address }) => address)
      expect(new Set(addresses).size, id).toBe(addresses.length)
      expect(new Set(outputs.map(({ key }) => key)).size, id).toBe(outputs.length)
    }
  })
  it('puts every calculator in a group, and leaves no group empty', () => {
    expect(CALCULATOR_GROUPS.flatMap(({ id }) => calculatorsOf(id).map((each) => each.id)).sort()).toEqual(calculators.map(({ id }) => id).sort())
    for (const { id } of CALCULATOR_GROUPS) expect(calculatorsOf(id), id).not.toHaveLength(0)
  })
  test.each(all)('%s states source, validity, formula and a sentence of purpose', (_id, { source, validity, formula, purpose }) => {
    expect(source.standard).not.toBe('')
    expect(source.note).not.toBe('')
    expect(['read', 'secondary', 'memory', 'common-practice']).toContain(source.basis)
    expect(validity).toMatch(/\.$/)
    expect(formula.length).toBeGreaterThan(0)
    expect(purpose).toMatch(/^[A-Z].*\.$/)
  })
  it('cites only cases that exist', () => {
    const ids = cases.map(({ id }) => id)
    for (const { id, example } of calculators) for (const cited of example.from.match(/calc-g-[a-z]+-\d+/g) ?? []) expect(ids, id).toContain(cited)
  })
})

describe('the worked example', () => {
  test.each(all)('%s comes out, with its working', (_id, calculator) => {
    const result = calculator.run(exampleInputs(calculator))
    expect(result.problems).toEqual([])
    const entries = Object.entries(calculator.example.expect)
    expect(entries.length).toBeGreaterThan(0)
    for (const [key, expected] of entries) {
      const value = result.shown.find((each) => each.key === key)?.value
      if (typeof expected === 'object' && expected !== null) expect(Math.abs(Number(value) - expected.value), `${key}: ${String(value)} against ${expected.value}`).toBeLessThanOrEqual(expected.within + 1e-9)
      else expect(value, key).toBe(expected)
    }
    if (result.value !== null) expect(result.steps.length).toBeGreaterThan(0)
    expect(clean(result)).toBe(true)
    expect(result.shown.map(({ text }) => text).every((text) => text !== '')).toBe(true)
  })
  test.each(all.filter(([id]) => id !== 'carbon-equivalents'))('%s lies inside its validity, so that a page opens without a warning', (_id, calculator) => {
    expect(calculator.run(exampleInputs(calculator)).validity).toEqual({ inside: true, said: [] })
  })
  it('shows five equivalents of one steel, of which one is outside and says so', () => {
    const calculator = named('carbon-equivalents')
    expect(calculator.run(exampleInputs(calculator)).validity).toEqual({ inside: false, said: ['Pcm is stated for C up to 0.17 %; this steel has 0.18 %.'] })
  })
})

describe('addresses', () => {
  test.each(all)('%s opens its example bare, and reads its own address back', (_id, calculator) => {
    expect(inputsFromAddress(calculator, '')).toEqual(exampleInputs(calculator))
    const address = addressOfInputs(calculator, exampleInputs(calculator))
    const again = runAddress(calculator, address)
    expect(again.problems).toEqual([])
    expect(again.inputs).toEqual(exampleInputs(calculator))
    expect(addressOfInputs(calculator, again.inputs ?? {})).toBe(address)
  })
  it('reads figures with units as a form does', () => {
    const result = runAddress(named('heat-input-meter'), 'v=24&i=180&s=10 in/min')
    expect(result.inputs).toEqual({ voltage: 24, current: 180, travelSpeed: 254 })
    expect(result.value).toBeCloseTo((24 * 180 * 60) / 254 / 1000, 12)
  })
  it('leaves empty what an address does not name, rather than take the example', () => {
    expect(runAddress(named('heat-input-meter'), 'v=24&i=180').problems).toEqual([{ input: 'travelSpeed', message: 'Travel speed is not given.' }])
    expect(runAddress(named('carbon-equivalents'), 'c=0.2&mn=1.2').value).toBeCloseTo(0.4, 12)
  })
  it('offers a schema by id, whose messages name the input', () => {
    const read = calculatorInputsSchema('heat-input-meter')?.safeParse({ voltage: '24', current: 'many', travelSpeed: '0' })
    expect(read?.error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)).toEqual([expect.stringMatching(/^current: Current: .*many/), 'travelSpeed: Travel speed must be above 0 mm/min; 0 mm/min was given.'])
    expect(calculatorInputsSchema('no-such')).toBeNull()
    expect(calculatorById('no-such')).toBeNull()
  })
})

describe('bad input', () => {
  const bad: readonly (readonly [string, Record<string, unknown>, string, RegExp])[] = [
    ['heat-input-meter', { voltage: 24, current: 180, travelSpeed: 0 }, 'travelSpeed', /^Travel speed must be above 0 mm\/min/],
    ['heat-input-meter', { voltage: -1, current: 180, travelSpeed: 250 }, 'voltage', /^Voltage must not be negative/],
    ['heat-input-meter', { voltage: '-3', current: 180, travelSpeed: 250 }, 'voltage', /^Voltage must not be negative/],
    ['heat-input-meter', { voltage: NaN, current: 180, travelSpeed: 250 }, 'voltage', /^Voltage is not given/],
    ['heat-input-meter', { voltage: Infinity, current: 180, travelSpeed: 250 }, 'voltage', /^Voltage is too large/],
    ['heat-input-iso', { process: '52', voltage: 24, current: 180, travelSpeed: 250 }, 'process', /^Process: "52" is none of the choices/],
    ['carbon-equivalents', { c: 0.2, mn: 60, cr: 50 }, 'mn', /adds up to 110.2 %, above 100 %; manganese of 60 %/],
    ['carbon-equivalents', { mn: 1 }, 'c', /^Carbon is not given/],
    ['ferrite-dilution', { dilution: 30, shareOfA: 50, aCr: 70, aNi: 40, fCr: 20 }, 'aCr', /^Base metal A: the composition adds up to 110 %/],
    ['ferrite-dilution', { dilution: 130, shareOfA: 50 }, 'dilution', /^Dilution by both base metals must be at most 100 %/],
    ['pulse', { peakCurrent: 400, backgroundCurrent: 50, frequency: 500, onTime: 2 }, 'onTime', /leaves no background/],
    ['pulse', { peakCurrent: 50, backgroundCurrent: 60, frequency: 100, onTime: 2 }, 'backgroundCurrent', /above the peak/],
    ['cooling-time', { heatInput: 1, preheat: 500, thickness: 20, f2: 1, f3: 1 }, 'preheat', /must be below 500 °C/],
    ['stub-efficiency', { efficiency: 70, electrodeLength: 350, stub: 350 }, 'stub', /leaves nothing/],
    ['gas-class', { argon: 82, carbonDioxide: 17 }, 'argon', /add up to 99 %/],
    ['groove-weld', { type: 'single-v', thickness: 10, rootOpening: 2, rootFace: 12, bevelAngle: 30, capWidth: 0, capHeight: 0, density: 7.85 }, '', /root face/i],
    ['groove-weld', { type: 'single-v', thickness: 10, rootOpening: 2, rootFace: 0, capWidth: 0, capHeight: 0, density: 7.85 }, 'bevelAngle', /^Bevel angle is not given/],
    ['fillet-throat', { leg: 8, legB: 6, angle: 60, density: 7.85 }, 'legB', /at 90° only/],
  ]
  test.each(bad)('%s %j names %s', (id, inputs, input, message) => {
    const result = named(id).run(inputs)
    expect(result.problems).toContainEqual({ input, message: expect.stringMatching(message) as string })
    expect(result.value).toBeNull()
    expect(result.figures).toBeNull()
    expect(result.shown).toEqual([])
  })
  const wild = fc.oneof(fc.double({ noDefaultInfinity: false, noNaN: false }), fc.double({ min: -1e3, max: 1e4, noNaN: true }), fc.constantFrom(0, -1, 1e308, 1e-308, '', null, 'x', '1/0', '10 in', true), fc.string({ maxLength: 8 }))
  test.each(all)('%s never throws and never answers NaN or Infinity', (_id, calculator) => {
    const shape = Object.fromEntries(Object.entries(calculator.inputs).map(([key, input]) => [key, input.kind === 'choice' ? fc.constantFrom(...input.options.map(({ value }) => value)) : fc.oneof({ weight: 3, arbitrary: fc.constant<unknown>(input.example) }, { weight: 2, arbitrary: wild })]))
    fc.assert(fc.property(fc.record(shape), (inputs) => {
      const result = calculator.run(inputs)
      expect(clean(result)).toBe(true)
      if (result.figures === null) {
        expect(result.problems.length).toBeGreaterThan(0)
        for (const { message } of result.problems) expect(message).toMatch(/[.!?]$/)
      } else expect(result.problems).toEqual([])
    }), { numRuns: 150 })
  })
})
