import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { SHOWN_UNIT, UNITS, fromSi, interval, quantity } from '../../../../shared/units/convert.ts'
import { decimalsOf, formatInterval, formatNumber, formatQuantity } from '../../../../shared/units/format.ts'
import { parseInterval, parseQuantity } from '../../../../shared/units/parse.ts'
import type { Dimension, UnitSystem } from '../../../../shared/units/types.ts'

const typed = (text: string, dimension: Dimension, system: UnitSystem) => {
  const reading = parseQuantity(text, dimension, system)
  if (!reading.ok) throw new Error(reading.message)
  return reading.quantity
}
const typedSpan = (text: string, dimension: Dimension, system: UnitSystem) => {
  const reading = parseInterval(text, dimension, system)
  if (!reading.ok) throw new Error(reading.message)
  return reading.interval
}

describe('figures', () => {
  test.each<[number, Dimension, string, string]>([
    [12.7, 'length', 'mm', '12.7'],
    [12, 'length', 'mm', '12'],
    [12.7, 'length', 'in', '0.5'],
    [4.7625, 'length', 'in', '0.188'],
    [0.02, 'length', 'mm', '0.02'],
    [0, 'length', 'mm', '0'],
    [93.3333333333, 'temperature', '°C', '93'],
    [93.3333333333, 'temperature', '°F', '200'],
    [-0.3, 'temperature', '°C', '-0.3'],
    [1.0368, 'heatInput', 'kJ/mm', '1.04'],
    [1.0368, 'heatInput', 'kJ/in', '26.3'],
    [180.4, 'current', 'A', '180'],
    [22.25, 'voltage', 'V', '22.3'],
    [8.001, 'wireFeed', 'm/min', '8'],
    [8.001, 'wireFeed', 'in/min', '315'],
    [1.005, 'heatInput', 'kJ/mm', '1.01'],
  ])('%d of %s in %s reads %s', (si, dimension, unit, figure) => {
    expect(formatNumber(si, dimension, unit)).toBe(figure)
  })
  it('keeps trailing zeros for a column that aligns on the decimal', () => {
    expect(formatNumber(12, 'length', 'mm', true)).toBe('12.0')
    expect(formatNumber(1.5, 'heatInput', 'kJ/mm', true)).toBe('1.50')
  })
})

describe('quantities', () => {
  test.each<[string, Dimension, UnitSystem, UnitSystem, string]>([
    ['1/2 in', 'length', 'US', 'US', '1/2 in'],
    ['1/2"', 'length', 'SI', 'US', '1/2 in'],
    ['1/2 in', 'length', 'US', 'SI', '12.7 mm'],
    ['12,7', 'length', 'SI', 'SI', '12,7 mm'],
    ['.035', 'length', 'SI', 'US', '.035 in'],
    ['.035', 'length', 'SI', 'SI', '0.9 mm'],
    ['1.27 cm', 'length', 'SI', 'SI', '12.7 mm'],
    ['200 F', 'temperature', 'US', 'SI', '93 °C'],
    ['60', 'angle', 'SI', 'US', '60°'],
  ])('%s of %s written in %s reads in %s as %s', (text, dimension, written, shown, expected) => {
    expect(formatQuantity(typed(text, dimension, written), dimension, shown).text).toBe(expected)
  })
  it('shows as typed in any unit when asked, and never when told not to', () => {
    expect(formatQuantity(typed('1/2 in', 'length', 'US'), 'length', 'SI', { asTyped: true })).toEqual({ figure: '1/2', unit: 'in', text: '1/2 in' })
    expect(formatQuantity(typed('1/2 in', 'length', 'US'), 'length', 'US', { asTyped: false }).text).toBe('0.5 in')
  })
  it('does not trust a typed text that is not the stored figure', () => {
    expect(formatQuantity({ si: 12.7, unit: 'mm', typed: '99 mm' }, 'length', 'SI').text).toBe('12.7 mm')
  })
  it('keeps figure and unit apart', () => {
    expect(formatQuantity(quantity(24, 'voltage'), 'voltage', 'SI')).toEqual({ figure: '24', unit: 'V', text: '24 V' })
  })
})

describe('intervals', () => {
  test.each<[string, Dimension, UnitSystem, UnitSystem, string]>([
    ['18-22', 'voltage', 'SI', 'SI', '18–22 V'],
    ['3/16 - 1-1/2 in', 'length', 'US', 'US', '3/16 to 1-1/2 in'],
    ['3/16 - 1-1/2 in', 'length', 'US', 'SI', '4.8–38.1 mm'],
    ['max 25', 'length', 'SI', 'SI', '≤ 25 mm'],
    ['min 5', 'length', 'SI', 'SI', '≥ 5 mm'],
    ['10 ± 2', 'length', 'SI', 'SI', '8–12 mm'],
    ['-29 to -10', 'temperature', 'SI', 'SI', '-29 to -10 °C'],
    ['all', 'length', 'SI', 'SI', 'all'],
    ['12', 'length', 'SI', 'SI', '12 mm'],
  ])('%s of %s written in %s reads in %s as %s', (text, dimension, written, shown, expected) => {
    expect(formatInterval(typedSpan(text, dimension, written), dimension, shown).text).toBe(expected)
  })
  it('is empty when nothing is given', () => {
    expect(formatInterval({ min: null, max: null, all: false }, 'length', 'SI').text).toBe('')
  })
})

describe('round trip', () => {
  const dimensions = Object.keys(UNITS) as Dimension[]
  const anything = fc.record({ dimension: fc.constantFrom(...dimensions), system: fc.constantFrom<UnitSystem>('SI', 'US'), si: fc.integer({ min: 0, max: 100_000 }).map((n) => n / 100) })

  it('reading what is shown gives the figure back within half of the last digit', () => {
    fc.assert(
      fc.property(anything, ({ dimension, system, si }) => {
        const shown = SHOWN_UNIT[system][dimension]
        const written = formatQuantity({ si, unit: shown, typed: '' }, dimension, system)
        const again = typed(written.text, dimension, system)
        const half = 0.5 * 10 ** -decimalsOf(dimension, shown)
        expect(Math.abs(fromSi(again.si, dimension, shown) - fromSi(si, dimension, shown))).toBeLessThanOrEqual(half * 1.0001)
      }),
    )
  })
  it('is exact for a figure that was typed, and a second round changes nothing', () => {
    fc.assert(
      fc.property(anything, ({ dimension, system, si }) => {
        const first = typed(`${si}`, dimension, system)
        const written = formatQuantity(first, dimension, system)
        expect(typed(written.text, dimension, system).si).toBe(first.si)
      }),
    )
  })
  it('holds for intervals', () => {
    fc.assert(
      fc.property(anything, fc.integer({ min: 1, max: 1000 }), ({ dimension, system, si }, more) => {
        const shown = SHOWN_UNIT[system][dimension]
        const given = interval(si, si + more, dimension, shown)
        expect(typedSpan(formatInterval(given, dimension, system).text, dimension, system)).toMatchObject({ min: { si: given.min?.si }, max: { si: given.max?.si } })
      }),
    )
  })
})
