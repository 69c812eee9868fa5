import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { calibrationState, daysUntil, dayWords } from '../../../../shared/machines/calibration.ts'
import { dialFigures, dialStored, narrowed } from '../../../../shared/machines/dial.ts'
import { fromStorage, PANEL_QUANTITY, panelUnit, toStorage } from '../../../../shared/machines/panel-quantities.ts'
import { PANEL_QUANTITIES, type PanelControl, type PanelQuantity } from '../../../../shared/schemas/machines.ts'
import { UNITS } from '../../../../shared/units/convert.ts'

const control = (sets: PanelQuantity, unit: string, min: number, max: number, step: number | null): PanelControl => ({ key: 'c', label: 'C', where: null, sets, unit, min, max, step, shown: true })

describe('quantities of a panel', () => {
  it('have a usual unit that measures them', () => {
    for (const quantity of PANEL_QUANTITIES) {
      const { dimension, unit } = PANEL_QUANTITY[quantity]
      expect([quantity, panelUnit(quantity, unit) !== null]).toEqual([quantity, dimension !== null])
    }
  })
  test.each<[PanelQuantity, string, number, number | null]>([
    ['wireFeed', 'ipm', 100, 2.54],
    ['wireFeed', 'in/min', 320, 8.128],
    ['pulseOnTime', 's', 0.0019, 1.9],
    ['current', '%', 60, null],
    ['wireFeed', '', 5, null],
    ['knob', 'V', 5, null],
  ])('%s in %s', (quantity, unit, figure, stored) => {
    expect(toStorage(figure, quantity, unit)).toBe(stored)
    if (stored !== null) expect(fromStorage(stored, quantity, unit)).toBe(figure)
  })
})

describe('positions inside a range', () => {
  it('are rounded inward, in the panel’s own unit', () => {
    // 8.0 to 9.0 m/min is 314.96 to 354.33 in/min.
    expect(dialStored(control('wireFeed', 'in/min', 50, 700, 1), { lo: 8, hi: 9 })).toEqual({ ok: true, min: 315, max: 354, value: 335, positions: 40 })
    expect(dialStored(control('wireFeed', 'in/min', 50, 700, 10), { lo: 8, hi: 9 })).toMatchObject({ min: 320, max: 350 })
    expect(dialStored(control('voltage', 'V', 14, 36, 0.5), { lo: 22.8, hi: 24 })).toMatchObject({ min: 23, max: 24, positions: 3 })
  })
  it('count steps from the bottom of the scale', () => {
    expect(dialStored(control('current', 'A', 5, 300, 10), { lo: 20, hi: 40 })).toMatchObject({ min: 25, max: 35 })
  })
  it('keep a figure that stands exactly on a position', () => {
    expect(dialStored(control('pulseFrequency', 'Hz', 20, 300, 1), { lo: 120, hi: 120 })).toMatchObject({ min: 120, max: 120, value: 120, positions: 1 })
    expect(dialStored(control('pulseOnTime', 'ms', 0.5, 5, 0.1), { lo: 1.9, hi: 1.9 })).toMatchObject({ value: 1.9 })
  })
  it('say why there is none', () => {
    expect(dialStored(control('voltage', 'V', 14, 36, 2), { lo: 22.8, hi: 23.6 })).toEqual({ ok: false, why: 'step', below: 22, above: 24 })
    expect(dialStored(control('voltage', 'V', 14, 22, 0.1), { lo: 22.8, hi: 23.6 })).toEqual({ ok: false, why: 'off-scale', below: 22, above: null })
    expect(dialStored(control('wireFeed', '', 1, 10, 1), { lo: 5, hi: 6 })).toBeNull()
  })
  it('of a stepless knob are given to a readable figure, inward', () => {
    expect(dialStored(control('voltage', 'V', 10, 40, null), { lo: 22.83, hi: 23.97 })).toMatchObject({ min: 22.9, max: 23.9, value: 23.4, positions: null })
    expect(dialStored(control('voltage', 'V', 10, 40, null), { lo: 17, hi: 17 })).toMatchObject({ value: 17 })
  })
  it('of an open range end at the scale', () => {
    expect(dialStored(control('current', 'A', 5, 300, 5), { lo: -Infinity, hi: 52 })).toMatchObject({ min: 5, max: 50 })
  })
})

const dimensioned = PANEL_QUANTITIES.filter((quantity) => PANEL_QUANTITY[quantity].dimension !== null)
const scales = fc.record({
  quantity: fc.constantFrom(...dimensioned),
  pick: fc.nat(),
  min: fc.integer({ min: -50_000, max: 500_000 }).map((value) => value / 1000),
  steps: fc.integer({ min: 1, max: 300 }),
  step: fc.oneof(fc.constantFrom(0.01, 0.05, 0.1, 0.25, 0.3, 0.5, 1, 5, 10), fc.double({ min: 0.001, max: 20, noNaN: true }).map((value) => Number(value.toPrecision(3)))),
  stepless: fc.boolean(),
  from: fc.integer({ min: -3000, max: 13_000 }).map((value) => value / 10_000),
  width: fc.oneof(fc.constant(0), fc.integer({ min: 0, max: 5000 }).map((value) => value / 10_000)),
})

describe('whatever range, unit and step', () => {
  it('every figure offered, converted back, lies in the range; where none is offered on a scale that reaches it, none exists', () => {
    fc.assert(
      fc.property(scales, ({ quantity, pick, min, steps, step, stepless, from, width }) => {
        const { dimension } = PANEL_QUANTITY[quantity]
        if (dimension === null) return
        const units = Object.keys(UNITS[dimension])
        const unit = units[pick % units.length] ?? ''
        const max = min + steps * step
        const one = control(quantity, unit, min, max, stepless ? null : step)
        const [lo, hi] = [min + from * (max - min), min + (from + width) * (max - min)].map((figure) => toStorage(figure, quantity, unit) ?? 0) as [number, number]
        const inside = (figure: number) => (toStorage(figure, quantity, unit) ?? NaN) >= lo && (toStorage(figure, quantity, unit) ?? NaN) <= hi
        const found = dialStored(one, { lo, hi })
        if (found?.ok) {
          for (const figure of [found.min, found.max, found.value]) expect([figure, inside(figure)]).toEqual([figure, true])
          expect(found.min).toBeLessThanOrEqual(found.value)
          expect(found.value).toBeLessThanOrEqual(found.max)
          expect(found.min).toBeGreaterThanOrEqual(min - 1e-9 * Math.abs(min))
          expect(found.max).toBeLessThanOrEqual(max + 1e-9 * Math.abs(max))
        } else if (!stepless) {
          for (let index = 0; index <= steps; index += 1) expect(inside(Number((min + index * step).toPrecision(12)))).toBe(false)
        }
      }),
      { numRuns: 400 },
    )
  })
  it('a reading inside the narrowed range is true to the range at either end of the meter’s accuracy', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 500, noNaN: true }), fc.double({ min: 0, max: 100, noNaN: true }), fc.double({ min: 0.1, max: 20, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (lo, width, percent, share) => {
        const span = narrowed({ lo, hi: lo + width }, percent)
        if (!span) return
        const reading = span.lo + share * (span.hi - span.lo)
        expect(reading * (1 - percent / 100)).toBeGreaterThanOrEqual(lo - 1e-9)
        expect(reading * (1 + percent / 100)).toBeLessThanOrEqual(lo + width + 1e-9)
      }),
    )
  })
})

it('a band of 180 to 220 A with a meter true to ± 2.5 % is aimed at from 185 to 214 A', () => {
  const held = narrowed({ lo: 180, hi: 220 }, 2.5)
  expect(held && dialFigures({ min: 0, max: 400, step: 1 }, held)).toMatchObject({ min: 185, max: 214 })
  expect(narrowed({ lo: 22.8, hi: 24 }, 10)).toBeNull()
})

describe('calibration', () => {
  test.each([
    [null, 'unknown'],
    ['2026-11-30', 'lapsed'],
    ['2026-12-01', 'due-soon'],
    ['2026-12-31', 'due-soon'],
    ['2027-01-01', 'current'],
  ])('due on %s is %s on 1 December 2026', (due, state) => {
    expect(calibrationState(due, '2026-12-01')).toBe(state)
  })
  it('is told in words', () => expect(dayWords('2026-12-09')).toBe('9 December 2026'))
  it('counts days over the end of a leap February', () => expect(daysUntil('2028-03-01', '2028-02-28')).toBe(2))
})
