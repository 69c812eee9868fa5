import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { commonStretches, isUneven, knobStretches, measuredAt, widest } from '../../../../shared/machines/program-points.ts'
import { familiesOf, isSameDiameter, isSameGas, isSameWire, readGas, wireFamily } from '../../../../shared/machines/wires.ts'
import { programPointSchema, type ProgramPoint } from '../../../../shared/schemas/machines.ts'
import { gasMixtureSchema } from '../../../../shared/schemas/welding.ts'

const points = (...rows: readonly (readonly [number, number | null])[]): ProgramPoint[] => rows.map(([knob, wireFeed]) => programPointSchema.parse({ knob, wireFeed }))

describe('measured points', () => {
  const rising = points([2, 4], [4, 8], [6, 9])
  it('are joined by straight lines and never carried on beyond', () => {
    expect(measuredAt(rising, 'wireFeed', 3)).toEqual({ low: 6, high: 6 })
    expect(measuredAt(rising, 'wireFeed', 6)).toEqual({ low: 9, high: 9 })
    expect(measuredAt(rising, 'wireFeed', 1.9)).toBeNull()
    expect(measuredAt(rising, 'wireFeed', 6.1)).toBeNull()
    expect(measuredAt(rising, 'voltage', 3)).toBeNull()
  })
  it('give the positions of a range', () => {
    expect(knobStretches(rising, 'wireFeed', { lo: 6, hi: 8.5 })).toEqual([{ lo: 3, hi: 5 }])
    expect(knobStretches(rising, 'wireFeed', { lo: 1, hi: 100 })).toEqual([{ lo: 2, hi: 6 }])
    expect(knobStretches(rising, 'wireFeed', { lo: 10, hi: 12 })).toEqual([])
    expect(knobStretches(points([5, 8]), 'wireFeed', { lo: 7, hi: 9 })).toEqual([{ lo: 5, hi: 5 }])
  })
  it('that fall again give each stretch for itself', () => {
    const hill = points([0, 4], [2, 8], [4, 4], [6, 8])
    expect(knobStretches(hill, 'wireFeed', { lo: 5, hi: 7 })).toEqual([{ lo: 0.5, hi: 1.5 }, { lo: 2.5, hi: 3.5 }, { lo: 4.5, hi: 5.5 }])
    expect(isUneven(hill, 'wireFeed')).toBe(true)
    expect(isUneven(rising, 'wireFeed')).toBe(false)
  })
  it('that contradict each other count as everything between', () => {
    const doubtful = points([0, 4], [2, 6], [2, 8], [4, 10])
    expect(measuredAt(doubtful, 'wireFeed', 2)).toEqual({ low: 6, high: 8 })
    expect(knobStretches(doubtful, 'wireFeed', { lo: 6, hi: 7 })).toEqual([])
    expect(knobStretches(doubtful, 'wireFeed', { lo: 6, hi: 8 })).toEqual([{ lo: 2, hi: 2 }])
    expect(isUneven(doubtful, 'wireFeed')).toBe(true)
  })
  it('have in common what both keep', () => {
    expect(commonStretches([{ lo: 0, hi: 3 }, { lo: 5, hi: 9 }], [{ lo: 2, hi: 6 }])).toEqual([{ lo: 2, hi: 3 }, { lo: 5, hi: 6 }])
    expect(widest([{ lo: 0, hi: 1 }, { lo: 4, hi: 7 }])).toEqual({ lo: 4, hi: 7 })
    expect(widest([])).toBeNull()
  })
  it('however they run, every position of a stretch keeps the range', () => {
    const figure = fc.integer({ min: 0, max: 200 }).map((value) => value / 10)
    fc.assert(
      fc.property(fc.array(fc.tuple(figure, figure.map((value) => value + 0.1)), { minLength: 1, maxLength: 12 }), figure, figure, fc.double({ min: 0, max: 1, noNaN: true }), (rows, from, width, share) => {
        const range = { lo: from, hi: from + width }
        const given = points(...rows)
        const stretches = knobStretches(given, 'wireFeed', range)
        for (const { lo, hi } of stretches) {
          const out = measuredAt(given, 'wireFeed', lo + share * (hi - lo))
          expect(out).not.toBeNull()
          expect(out?.low).toBeGreaterThanOrEqual(range.lo - 1e-6)
          expect(out?.high).toBeLessThanOrEqual(range.hi + 1e-6)
        }
        // And none is forgotten: whatever position keeps the range lies in a stretch.
        const knobs = given.map(({ knob }) => knob)
        const knob = Math.min(...knobs) + share * (Math.max(...knobs) - Math.min(...knobs))
        const out = measuredAt(given, 'wireFeed', knob)
        if (out && out.low > range.lo + 1e-6 && out.high < range.hi - 1e-6) expect(stretches.some(({ lo, hi }) => knob >= lo - 1e-6 && knob <= hi + 1e-6)).toBe(true)
      }),
      { numRuns: 500 },
    )
  })
})

describe('wires', () => {
  test.each([
    ['ER5356', 'er 5356', true],
    ['ER5356', 'AWS A5.10 ER5356', true],
    ['ER70S-6', 'ER70S6', true],
    ['ER5356', 'ER4043', false],
    ['ER308L', 'ER308LSi', false],
    ['', 'ER4043', false],
  ])('%s and %s', (one, other, same) => expect(isSameWire(one, other)).toBe(same))
  test.each([
    ['ER4043', 'aluminium-4'],
    ['ER5356', 'aluminium-5'],
    ['S Al 5356 (AlMg5Cr(A))', 'aluminium-5'],
    ['ER5087', 'aluminium-5'],
    ['ER2209', 'stainless'],
    ['ER316L', 'stainless'],
    ['ER70S-6', 'steel'],
    ['E71T-1C', 'steel'],
    ['ERNiCr-3', 'nickel'],
    ['no such wire', undefined],
  ])('%s is of the family %s', (wire, family) => expect(wireFamily(wire)?.key).toBe(family))
  it('of two series of aluminium are two families', () => expect(familiesOf(['ER4043', 'ER4047', 'ER5356']).map(({ key }) => key)).toEqual(['aluminium-4', 'aluminium-5']))
  it('have nominal sizes', () => {
    expect(isSameDiameter(1.2, 1.143)).toBe(true)
    expect(isSameDiameter(1.2, 1.190625)).toBe(true)
    expect(isSameDiameter(0.9, 0.889)).toBe(true)
    expect(isSameDiameter(0.9, 1)).toBe(false)
    expect(isSameDiameter(0.8, 0.9)).toBe(false)
  })
})

describe('gases', () => {
  test.each([
    ['argon', 'Ar 100'],
    ['Ar', 'Ar 100'],
    ['82 Ar 18 CO2', 'Ar 82 CO2 18'],
    ['Ar/CO2 82/18', 'Ar 82 CO2 18'],
    ['Ar + 2 % O2', 'Ar 98 O2 2'],
    ['CO₂', 'CO2 100'],
    ['Argon CO2 8%', 'Ar 92 CO2 8'],
  ])('%s', (text, read) => expect(readGas(text)?.map(({ gas, percent }) => `${gas} ${percent}`).join(' ')).toBe(read))
  test.each(['purple', 'Ar 50 CO2 40', 'CO2 18 Ar', '100'])('%s cannot be read', (text) => expect(readGas(text)).toBeNull())
  it('are the same by what they hold, by symbol, or cannot be told', () => {
    const mix = gasMixtureSchema.parse({ components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 18 }] })
    expect(isSameGas('Ar/CO2 82/18', mix)).toBe(true)
    expect(isSameGas('M21', mix)).toBe(true)
    expect(isSameGas('I1', mix)).toBe(false)
    expect(isSameGas('argon', mix)).toBe(false)
    expect(isSameGas('the usual', mix)).toBeNull()
    expect(isSameGas('argon', null)).toBeNull()
  })
})
