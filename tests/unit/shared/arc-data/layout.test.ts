import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { ArcChoice, ArcLayout } from '../../../../shared/schemas/arc-data.ts'
import { columnsToStartFrom } from '../../../../src/features/arc-data/sending.ts'
import { guessLayout } from '../../../../shared/arc-data/layout.ts'
import { RowReader } from '../../../../shared/arc-data/rows.ts'
import { readHeader } from '../../../../shared/arc-data/words.ts'

const guess = (text: string, choice: ArcChoice = {}) => guessLayout(new TextEncoder().encode(text), choice, true)
const body = (line: (k: number) => string) => Array.from({ length: 20 }, (_, k) => line(k)).join('\n')

describe('layout', () => {
  it.each<[string, string, Partial<ArcLayout>]>([
    ['comma and point', `Time (s),Current (A),Voltage (V)\n${body((k) => `${k / 1000},${200 + k},25.1`)}`, { delimiter: ',', decimal: '.', headerRows: 1, columns: { time: 0, current: 1, voltage: 2 }, timeUnit: 's' }],
    ['semicolon and decimal comma, German', `Zeit [ms];Strom [A];Spannung [V]\n${body((k) => `${k},5;${200 + k},0;25,1`)}`, { delimiter: ';', decimal: ',', columns: { time: 0, current: 1, voltage: 2 }, timeUnit: 'ms' }],
    ['tabs, other order, kA and mV', `U [mV]\tI [kA]\tt [µs]\n${body((k) => `25000\t0.2\t${k * 100}`)}`, { delimiter: '\t', columns: { time: 2, current: 1, voltage: 0 }, timeUnit: 'µs', currentUnit: 'kA', voltageUnit: 'mV' }],
    ['bars', `time|volts|amps\n${body((k) => `${k / 10}|25|${200 + (k % 3)}`)}`, { delimiter: '|', columns: { time: 0, current: 2, voltage: 1 } }],
    ['runs of spaces', `  t      I      U\n${body((k) => `  ${(k / 100).toFixed(2)}   ${200 + (k % 5)}.5   24.0`)}`, { delimiter: ' ', columns: { time: 0, current: 1, voltage: 2 } }],
    ['a preamble, then names and units in two lines', `Logger 7\nChannel settings;x\n\nTime;Wire feed;Current;Voltage\ns;m/min;A;V\n${body((k) => `${k / 50};8.1;${190 + (k % 7)};23.5`)}`, { delimiter: ';', headerRows: 5, columns: { time: 0, current: 2, voltage: 3 }, timeUnit: 's' }],
    ['set values beside readings', `Time (s),Current set (A),Current actual (A),Voltage set (V),Voltage actual (V)\n${body((k) => `${k / 50},200,198.5,25,24.6`)}`, { columns: { time: 0, current: 2, voltage: 4 } }],
    ['quotes', `"Time (s)","I (A)","U (V)"\n${body((k) => `"${k / 50}","200.5","24.6"`)}`, { columns: { time: 0, current: 1, voltage: 2 } }],
    ['French', `Temps (ms);Tension (V);Courant (A)\n${body((k) => `${k};25,3;200,1`)}`, { decimal: ',', columns: { time: 0, current: 2, voltage: 1 }, timeUnit: 'ms' }],
    ['a state in words', `Time (s);State;Current (A);Voltage (V)\n${body((k) => `${k / 100};weld;200;25`)}`, { columns: { time: 0, current: 2, voltage: 3 } }],
    ['only CR between lines', `Time (s),Current (A),Voltage (V)\n${body((k) => `${k / 1000},${200 + k},25.1`)}`.replaceAll('\n', '\r'), { headerRows: 1, columns: { time: 0, current: 1, voltage: 2 } }],
  ])('%s', (_what, text, expected) => {
    const found = guess(text)
    expect(found.layout).toMatchObject(expected)
    expect(found.needsRate).toBe(false)
  })

  it('without heads goes by the figures, and says that it is not sure', () => {
    const found = guess(body((k) => `${(k / 1000).toFixed(3)},24.${k % 10},${180 + (k % 9)}`))
    expect(found.layout).toMatchObject({ headerRows: 0, columns: { time: 0, current: 2, voltage: 1 } })
    expect(found.sure).toBe(false)
    expect(found.doubts.join(' ')).toContain('column 3 was taken by its figures')
  })

  it('asks for the sample rate where rows are only counted, or nothing tells the time', () => {
    for (const text of [`Sample,I (A),U (V)\n${body((k) => `${k + 1},200,25`)}`, `I (A),U (V)\n${body(() => '200,25')}`]) {
      const found = guess(text)
      expect(found.layout.columns.time).toBeNull()
      expect(found.needsRate).toBe(true)
      expect(guess(text, { samplesPerSecond: 10_000 })).toMatchObject({ needsRate: false, layout: { samplesPerSecond: 10_000, timeUnit: 'none' } })
    }
  })

  it('follows what a person chooses', () => {
    const text = `a,b,c,d\n${body((k) => `${k / 10},25,200,300`)}`
    expect(guess(text, { time: 0, voltage: 1, current: 3, timeUnit: 'ms' }).layout).toMatchObject({ columns: { time: 0, current: 3, voltage: 1 }, timeUnit: 'ms' })
    expect(guess(text, { time: -1, voltage: 1, current: 3, samplesPerSecond: 50 }).layout.columns.time).toBeNull()
    expect(() => guess(text, { time: 0, voltage: 1, current: 7 })).toThrow('Column 8 was chosen for the current, but the rows have 4 columns.')
    expect(() => guess(text, { time: 0, voltage: 1, current: 1 })).toThrow('a column of its own')
  })

  it('shows every column with its first values', () => {
    expect(guess(`Time (s),I (A),U (V)\n${body((k) => `${k / 1000},200,25`)}`).columns[1]).toEqual({ name: 'I (A)', values: ['200', '200', '200', '200', '200', '200'] })
  })
})

it.each([
  ['I [A]', 'current', { currentUnit: 'A' }],
  ['Current (kA)', 'current', { currentUnit: 'kA' }],
  ['Schweißstrom/A', 'current', { currentUnit: 'A' }],
  ['ArcVoltage_V', 'voltage', { voltageUnit: 'V' }],
  ['U', 'voltage', {}],
  ['Elapsed time, ms', 'time', { timeUnit: 'ms' }],
  ['Motor current (A)', null, {}],
  ['Power (W)', null, {}],
  ['Current setpoint (A)', 'current', { asked: true }],
])('the head %s', (head, meaning, more) => {
  expect(readHeader(head)).toMatchObject({ meaning, ...more })
})

describe('a column that is missing', () => {
  it('is named where the file has only time and one of the two', () => {
    expect(() => guess('time,volts\n0,24.1\n0.001,24.1\n0.002,24.2\n')).toThrow('The file has no column for the current beside the time and the voltage. A recording needs both volts and amperes: export it again with both.')
    expect(() => guess('time,amps\n0,180\n0.001,181\n0.002,180\n')).toThrow(/no column for the voltage beside the time and the current/)
  })

  it('leaves the columns that were told as they are', () => {
    let caught: unknown
    try { guess('a\n1,20,200,5,6,7\n2,21,180,8,2,9\n3,20,200,1,2,3\n', { voltage: 4 }) } catch (error) { caught = error }
    expect(caught).toMatchObject({ asks: 'columns', found: { voltage: 4 } })
  })

  it('takes the first that is free to choose from', () => {
    expect(columnsToStartFrom({})).toEqual({ time: -1, current: 0, voltage: 1 })
    expect(columnsToStartFrom({ time: 0, voltage: 1 })).toEqual({ time: 0, current: 2, voltage: 1 })
    expect(columnsToStartFrom({ current: 1, voltage: 1 })).toEqual({ time: -1, current: 1, voltage: 0 })
  })
})

describe('numbers', () => {
  const numberIn = (text: string, decimal: '.' | ',' = '.'): number | string => {
    let found: number | string = 'nothing'
    const reader = new RowReader({ delimiter: ';', decimal, headerRows: 0, columns: { time: null, current: 0, voltage: 1 } }, 10, { row: (_line, _time, current) => void (found = current), bad: (_line, _text, why) => void (found = why) })
    reader.push(new TextEncoder().encode(`${text};1\n`))
    return found
  }

  it('are the same double as Number gives', () => {
    fc.assert(fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
      expect(numberIn(String(value))).toBe(Number(String(value)))
      expect(numberIn(String(value).replace('.', ','), ',')).toBe(Number(String(value)))
    }))
    fc.assert(fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.integer({ min: 0, max: 12 }), (value, digits) => {
      expect(numberIn(value.toFixed(digits))).toBe(Number(value.toFixed(digits)))
    }))
  })

  it.each(['', ' ', '-', '.', '1.2.3', '12a', 'e5', '1e', '0x10', 'NaN', 'Infinity', '1e999', '1,5', '1 000'])('%j is none', (text) => {
    expect(typeof numberIn(text)).toBe('string')
  })

  it.each([[' 12.5 ', 12.5], ['"12.5"', 12.5], ['+3', 3], ['.5', 0.5], ['5.', 5], ['-1.5E+2', -150]])('%j is one', (text, value) => {
    expect(numberIn(text)).toBe(value)
  })
})
