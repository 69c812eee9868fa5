import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { rowHeatInput, summarizeRunSheet, travelSpeedFrom } from '../../../../shared/calculations/run-sheet.ts'
import { beadArea, consumption, passesToFill } from '../../../../shared/calculations/weld-metal.ts'
import { processBlockSchema, runRowSchema, type RunRow } from '../../../../shared/schemas/welding.ts'
import { interval, quantity } from '../../../../shared/units/convert.ts'

const row = (given: Record<string, unknown> = {}): RunRow => runRowSchema.parse({ id: '1', processId: 'p1', pass: '1', current: interval(180, undefined, 'current'), voltage: interval(24, undefined, 'voltage'), travelSpeed: interval(250, undefined, 'travelSpeed'), ...given })

describe('travel speed', () => {
  it('is length over arc time', () => {
    expect(travelSpeedFrom(300, 60)).toBe(300)
    expect(travelSpeedFrom(250, 75)).toBe(200)
    expect(() => travelSpeedFrom(300, 0)).toThrow(RangeError)
  })
  it('and speed times time is the length again', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 5000 }), fc.integer({ min: 1, max: 3600 }), (length, seconds) => {
      expect((travelSpeedFrom(length, seconds) * seconds) / 60).toBeCloseTo(length, 6)
    }))
  })
})

describe('heat input of a row', () => {
  it('takes meter readings', () => {
    const reading = rowHeatInput(row(), false)
    expect(reading.heatInput?.max).toBeCloseTo(1.0368, 9)
    expect(reading).toMatchObject({ method: 'meter', missing: [], doubts: [] })
  })
  it('takes the speed from length and arc time', () => {
    expect(rowHeatInput(row({ travelSpeed: null, length: quantity(250, 'length'), arcTime: quantity(60, 'duration') }), false).heatInput?.max).toBeCloseTo(1.0368, 9)
  })
  it('is highest at the highest volts and amperes and the lowest speed', () => {
    const { heatInput } = rowHeatInput(row({ current: interval(150, 180, 'current'), voltage: interval(22, 24, 'voltage'), travelSpeed: interval(250, 300, 'travelSpeed') }), false)
    expect(heatInput?.max).toBeCloseTo((24 * 180 * 60) / 250 / 1000, 9)
    expect(heatInput?.min).toBeCloseTo((22 * 150 * 60) / 300 / 1000, 9)
  })
  it('prefers instantaneous energy', () => {
    expect(rowHeatInput(row({ instantaneousEnergy: quantity(38_000, 'energy'), length: quantity(127, 'length') }), true)).toMatchObject({ method: 'instantaneous-energy', heatInput: { min: 38 / 127, max: 38 / 127 } })
  })
  it('does not take meter readings of a controlled waveform', () => {
    const reading = rowHeatInput(row(), true)
    expect(reading.heatInput).toBeNull()
    expect(reading.missing.join()).toMatch(/instantaneous energy/)
  })
  it('names the doubt where the waveform is not stated', () => {
    expect(rowHeatInput(row(), null).doubts.join()).toMatch(/not stated/)
  })
  it('names everything that is missing', () => {
    expect(rowHeatInput(row({ voltage: null, travelSpeed: null }), false)).toMatchObject({ heatInput: null, missing: ['voltage', 'travel speed, or bead length and arc time'] })
    expect(rowHeatInput(row({ instantaneousEnergy: quantity(38_000, 'energy') }), true).missing).toEqual(['bead length'])
    expect(rowHeatInput(row({ travelSpeed: interval(0, undefined, 'travelSpeed') }), false).heatInput).toBeNull()
  })
  it('doubts a speed that length and time contradict', () => {
    expect(rowHeatInput(row({ length: quantity(250, 'length'), arcTime: quantity(30, 'duration') }), false).doubts.join()).toMatch(/give 500 mm\/min, the travel speed reads 250/)
  })
})

it('sums up the sheet by process block', () => {
  const blocks = [processBlockSchema.parse({ id: 'p1', electrical: { waveformControlled: false } }), processBlockSchema.parse({ id: 'p2', electrical: { waveformControlled: true } })]
  const rows = [row({ interpass: quantity(90, 'temperature') }), row({ id: '2', pass: '2', travelSpeed: interval(200, undefined, 'travelSpeed'), interpass: quantity(140, 'temperature') }), row({ id: '3', pass: '3', processId: 'p2' })]
  const [first, second] = summarizeRunSheet(rows, blocks)
  expect(first).toMatchObject({ passes: 2, complete: true, maxInterpass: 140 })
  expect(first?.heatInput?.max).toBeCloseTo(1.296, 9)
  expect(second).toMatchObject({ passes: 1, complete: false, heatInput: null, maxInterpass: null })
  expect(second?.missing[0]).toMatch(/^Pass 3: instantaneous energy/)
})

describe('consumption', () => {
  it('refuses a divisor of nothing', () => {
    expect(() => consumption({ weldMetalKgPerM: 1, lengthM: 1, efficiency: 0, depositionRate: 1, operatorFactor: 1, gasFlow: 0 })).toThrow(RangeError)
  })
  it('a bead twice as slow is twice as large, and needs half as many', () => {
    const one = beadArea({ wireDiameter: 1.2, wireFeed: 6, efficiency: 1, travelSpeed: 400 })
    expect(beadArea({ wireDiameter: 1.2, wireFeed: 6, efficiency: 1, travelSpeed: 200 })).toBeCloseTo(2 * one, 9)
    expect(passesToFill(10 * one, one)).toBe(10)
    expect(passesToFill(10 * one, 2 * one)).toBe(5)
  })
})
