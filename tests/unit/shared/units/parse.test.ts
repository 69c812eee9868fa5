import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { UNITS, fromSi, toSi } from '../../../../shared/units/convert.ts'
import { parseInterval, parseQuantity } from '../../../../shared/units/parse.ts'
import type { Dimension, UnitSystem } from '../../../../shared/units/types.ts'

const read = (text: string, dimension: Dimension, system: UnitSystem = 'SI') => {
  const reading = parseQuantity(text, dimension, system)
  if (!reading.ok) throw new Error(reading.message)
  return reading.quantity
}
const span = (text: string, dimension: Dimension, system: UnitSystem = 'SI') => {
  const reading = parseInterval(text, dimension, system)
  if (!reading.ok) throw new Error(reading.message)
  return [reading.interval.min?.si ?? null, reading.interval.max?.si ?? null, reading.interval.all]
}
const refusal = (text: string, dimension: Dimension, system: UnitSystem = 'SI') => {
  const reading = parseQuantity(text, dimension, system)
  return reading.ok ? null : reading.message
}

describe('one value', () => {
  test.each<[string, Dimension, UnitSystem, number, string]>([
    ['1/2 in', 'length', 'SI', 12.7, 'in'],
    ['1 1/2"', 'length', 'SI', 38.1, 'in'],
    ['1-1/2 in.', 'length', 'US', 38.1, 'in'],
    ['1½ inch', 'length', 'US', 38.1, 'in'],
    ['½″', 'length', 'SI', 12.7, 'in'],
    ['3/8"', 'length', 'SI', 9.525, 'in'],
    ['3/8', 'length', 'US', 9.525, 'in'],
    ['12.7 mm', 'length', 'US', 12.7, 'mm'],
    ['12,7', 'length', 'SI', 12.7, 'mm'],
    ['12,7mm', 'length', 'US', 12.7, 'mm'],
    ['.035', 'length', 'SI', 0.889, 'in'],
    ['.045', 'length', 'US', 1.143, 'in'],
    ['0.9', 'length', 'SI', 0.9, 'mm'],
    ['.6', 'length', 'SI', 0.6, 'mm'],
    ['1\u2009200 mm', 'length', 'SI', 1200, 'mm'],
    ['1,250.5 mm', 'length', 'SI', 1250.5, 'mm'],
    ['1.250,5 mm', 'length', 'SI', 1250.5, 'mm'],
    ['6 ft', 'length', 'SI', 1828.8, 'ft'],
    ['200 F', 'temperature', 'SI', 93.3333333333, '°F'],
    ['200°F', 'temperature', 'US', 93.3333333333, '°F'],
    ['93 C', 'temperature', 'US', 93, '°C'],
    ['93 deg C', 'temperature', 'SI', 93, '°C'],
    ['150°', 'temperature', 'SI', 150, '°C'],
    ['−29 °C', 'temperature', 'SI', -29, '°C'],
    ['315 ipm', 'wireFeed', 'SI', 8.001, 'in/min'],
    ['8 m/min', 'wireFeed', 'US', 8, 'm/min'],
    ['10 inches per minute', 'travelSpeed', 'SI', 254, 'in/min'],
    ['5 mm/sec', 'travelSpeed', 'SI', 300, 'mm/s'],
    ['38.1 kJ/in', 'heatInput', 'SI', 1.5, 'kJ/in'],
    ['30 cfh', 'gasFlow', 'SI', 14.158423296, 'ft³/h'],
    ['30 cubic feet per hour', 'gasFlow', 'SI', 14.158423296, 'ft³/h'],
    ['15 l/min', 'gasFlow', 'US', 15, 'L/min'],
    ['15 lpm', 'gasFlow', 'US', 15, 'L/min'],
    ['20 ft-lb', 'energy', 'SI', 27.1163589666, 'ft·lbf'],
    ['180 amps', 'current', 'SI', 180, 'A'],
    ['24 volts', 'voltage', 'SI', 24, 'V'],
    ['60 deg', 'angle', 'SI', 60, '°'],
    ['5 min', 'time', 'SI', 5, 'min'],
    ['2 hrs', 'time', 'SI', 120, 'h'],
    ['90 sec', 'duration', 'SI', 90, 's'],
    ['2.2 ms', 'pulseTime', 'SI', 2.2, 'ms'],
    ['70 ksi', 'stress', 'SI', 482.633010522, 'ksi'],
    ['22000 lbs', 'force', 'SI', 97.8608755363, 'lbf'],
  ])('%s as %s (%s) is %d', (text, dimension, system, si, unit) => {
    const quantity = read(text, dimension, system)
    expect(quantity.si).toBeCloseTo(si, 6)
    expect(quantity.unit).toBe(unit)
    expect(quantity.typed).toBe(text)
  })

  it('reads 1/2 in and 12.7 mm as the same length, to the last digit', () => {
    expect(read('1/2 in', 'length').si).toBe(read('12.7 mm', 'length').si)
  })
  it('keeps what was typed, trimmed', () => {
    expect(read('  1 1/2"  ', 'length').typed).toBe('1 1/2"')
  })

  test.each<[string, Dimension, RegExp]>([
    ['', 'length', /Write a length/],
    ['thick', 'length', /"thick" is not a length.*12\.7 mm/],
    ['24 V', 'length', /"24 V" is a voltage, not a length/],
    ['12 furlongs', 'length', /"furlongs" in "12 furlongs" is not a unit of length/],
    ['1,200 mm', 'length', /read as 1\.200 or as 1200/],
    ['1.2.3 mm', 'length', /one decimal sign/],
    ['1/0 in', 'length', /divides by nothing/],
    ['3/8', 'length', /no unit.*3\/8 in/],
    ['-5 mm', 'length', /below zero/],
    ['-300 C', 'temperature', /absolute zero/],
    ['18-22', 'voltage', /more than one number/],
    ['9'.repeat(40), 'length', /too large/],
    ['1'.repeat(70), 'length', /longer than 60/],
  ])('refuses %j as %s in words', (text, dimension, message) => {
    expect(refusal(text, dimension)).toMatch(message)
  })
})

describe('intervals', () => {
  test.each<[string, Dimension, UnitSystem, number | null, number | null]>([
    ['18-22', 'voltage', 'SI', 18, 22],
    ['18 – 22 V', 'voltage', 'SI', 18, 22],
    ['18V-22V', 'voltage', 'SI', 18, 22],
    ['18…22', 'voltage', 'SI', 18, 22],
    ['5 to 20', 'length', 'SI', 5, 20],
    ['5to20 mm', 'length', 'US', 5, 20],
    ['from 5 to 20 mm', 'length', 'SI', 5, 20],
    ['between 5 and 20 mm', 'length', 'SI', 5, 20],
    ['3/16 - 1-1/2 in', 'length', 'SI', 4.7625, 38.1],
    ['1/2-3/4"', 'length', 'SI', 12.7, 19.05],
    ['1-1/2-2 in', 'length', 'SI', 38.1, 50.8],
    ['1-1/2 in', 'length', 'SI', 38.1, 38.1],
    ['0-1/2 in', 'length', 'SI', 0, 12.7],
    ['.035-.045', 'length', 'SI', 0.889, 1.143],
    ['max 25', 'length', 'SI', null, 25],
    ['Max. 25 mm', 'length', 'SI', null, 25],
    ['up to 20', 'length', 'SI', null, 20],
    ['20 max', 'length', 'SI', null, 20],
    ['<= 20', 'length', 'SI', null, 20],
    ['≤20 mm', 'length', 'US', null, 20],
    ['min 5', 'length', 'SI', 5, null],
    ['>= 5', 'length', 'SI', 5, null],
    ['5 and over', 'length', 'SI', 5, null],
    ['5 mm min', 'length', 'SI', 5, null],
    ['5+', 'length', 'SI', 5, null],
    ['10 ± 2', 'length', 'SI', 8, 12],
    ['10 +/- 2 mm', 'length', 'US', 8, 12],
    ['60° ± 5°', 'angle', 'SI', 55, 65],
    ['200 A ± 10 %', 'current', 'SI', 180, 220],
    ['-29 to -10 C', 'temperature', 'SI', -29, -10],
    ['-29–-10', 'temperature', 'SI', -29, -10],
    ['200-300 F', 'temperature', 'SI', 93.3333333333, 148.888888889],
    ['5 min', 'time', 'SI', 5, 5],
    ['min 5', 'time', 'SI', 5, null],
    ['max 5 min', 'time', 'SI', null, 5],
    ['5 min min', 'time', 'SI', 5, null],
    ['1/2 in to 20 mm', 'length', 'SI', 12.7, 20],
  ])('%s as %s (%s) is %s to %s', (text, dimension, system, min, max) => {
    const [low, high, all] = span(text, dimension, system)
    expect(all).toBe(false)
    if (min === null) expect(low).toBeNull()
    else expect(low).toBeCloseTo(min, 6)
    if (max === null) expect(high).toBeNull()
    else expect(high).toBeCloseTo(max, 6)
  })

  test.each(['all', 'All sizes', 'any', 'all thicknesses'])('%s is every size', (text) => {
    expect(span(text, 'length')).toEqual([null, null, true])
  })

  it('keeps each end as typed', () => {
    const reading = parseInterval('3/16 - 1-1/2 in', 'length', 'US')
    expect(reading.ok && [reading.interval.min?.typed, reading.interval.max?.typed]).toEqual(['3/16', '1-1/2 in'])
  })
  it('keeps the whole text of a tolerance, as neither end was typed', () => {
    const reading = parseInterval('10 ± 2', 'length', 'SI')
    expect(reading.ok && [reading.interval.min?.typed, reading.interval.max?.typed]).toEqual(['10 ± 2', '10 ± 2'])
  })

  test.each<[string, RegExp]>([
    ['22-18', /runs downward.*18 to 22/],
    ['< 20', /includes its ends/],
    ['over 5', /includes its ends/],
    ['2 ± 5', /below zero/],
    ['10 ± 1/8 in ± 2', /./],
    ['max', /./],
    ['5 to', /./],
    ['thin', /not a length/],
    ['max 5 to 20', /more than one number/],
  ])('refuses %j in words', (text, message) => {
    const reading = parseInterval(text, 'length', 'SI')
    expect(reading.ok).toBe(false)
    expect(reading.ok ? '' : reading.message).toMatch(message)
  })
})

describe('properties', () => {
  const dimensions = Object.keys(UNITS) as Dimension[]
  const measured = fc.constantFrom(...dimensions).chain((dimension) => fc.record({ dimension: fc.constant(dimension), unit: fc.constantFrom(...Object.keys(UNITS[dimension])), hundredths: fc.integer({ min: 0, max: 500_000 }) }))

  it('reads every unit by its own name, in either system', () => {
    fc.assert(
      fc.property(measured, fc.constantFrom<UnitSystem>('SI', 'US'), ({ dimension, unit, hundredths }, system) => {
        const quantity = read(`${hundredths / 100} ${unit}`, dimension, system)
        expect(quantity.si).toBe(toSi(hundredths / 100, dimension, unit))
        expect(fromSi(quantity.si, dimension, unit)).toBeCloseTo(hundredths / 100, 6)
      }),
    )
  })
  it('is monotone: a larger figure is never a smaller quantity', () => {
    fc.assert(
      fc.property(measured, fc.integer({ min: 1, max: 100_000 }), ({ dimension, unit, hundredths }, more) => {
        expect(read(`${(hundredths + more) / 100} ${unit}`, dimension).si).toBeGreaterThan(read(`${hundredths / 100} ${unit}`, dimension).si)
      }),
    )
  })
  it('never throws and always answers in words, whatever is typed', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.string({ unit: fc.constantFrom(...'0123456789 .,/-–±°"½maxinto<>≤CFVA%') })), fc.constantFrom(...dimensions), (text, dimension) => {
        const reading = parseInterval(text, dimension, 'US')
        if (!reading.ok) expect(reading.message).toMatch(/\.$/)
        else if (reading.interval.min && reading.interval.max) expect(reading.interval.min.si).toBeLessThanOrEqual(reading.interval.max.si)
      }),
      { numRuns: 400 },
    )
  })
})
