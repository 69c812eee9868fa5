import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { byKey, domainOf, envelope, moved, ticks, timeText, zoomed } from '../../../../../src/features/arc-data/plot-view.ts'

const whole = { from: 0, to: 20 }

describe('the plot of a recording', () => {
  it('has round ticks within what is shown', () => {
    expect(ticks(0, 412, 4)).toEqual([0, 200, 400])
    expect(ticks(0.4926, 0.5835, 9)).toEqual([0.5, 0.52, 0.54, 0.56, 0.58])
    expect(ticks(5, 5, 4)).toEqual([5])
    fc.assert(fc.property(fc.double({ min: -1e5, max: 1e5, noNaN: true }), fc.double({ min: 1e-3, max: 1e5, noNaN: true }), fc.integer({ min: 1, max: 12 }), (low, span, count) => {
      const found = ticks(low, low + span, count)
      expect(found.length).toBeLessThanOrEqual(count + 1)
      for (const tick of found) expect(tick >= low - span * 1e-6 && tick <= low + span * (1 + 1e-6)).toBe(true)
    }))
  })

  it('begins at 0 where that is near, and never cuts a reading', () => {
    expect(domainOf([50], [400])[0]).toBe(0)
    expect(domainOf([195], [205])[0]).toBeGreaterThan(180)
    expect(domainOf([], [])).toEqual([0, 1])
    expect(domainOf([-200], [200])[0]).toBeLessThan(-200)
  })

  it('draws from highest to lowest and back as one shape', () => {
    expect(envelope([0, 10], [1, 2], [5, 6], (value) => value)).toBe('M0.00,5.00L10.00,6.00L10.00,2.00L0.00,1.00Z')
    expect(envelope([], [], [], (value) => value)).toBe('')
  })

  it('zooms and moves within the recording', () => {
    expect(zoomed(whole, 0.5, whole)).toEqual({ from: 5, to: 15 })
    expect(zoomed({ from: 5, to: 15 }, 2, whole)).toEqual(whole)
    expect(moved({ from: 15, to: 20 }, 0.5, whole)).toEqual({ from: 15, to: 20 })
    expect(byKey('ArrowLeft', { from: 8, to: 12 }, whole)).toEqual({ from: 7, to: 11 })
    expect(byKey('0', { from: 8, to: 12 }, whole)).toEqual(whole)
    expect(byKey('x', whole, whole)).toBeNull()
    fc.assert(fc.property(fc.array(fc.constantFrom('+', '-', 'ArrowLeft', 'ArrowRight', 'Home'), { maxLength: 60 }), (keys) => {
      const end = keys.reduce((range, key) => byKey(key, range, whole) ?? range, whole)
      expect(end.from).toBeGreaterThanOrEqual(-1e-9)
      expect(end.to).toBeLessThanOrEqual(20 + 1e-9)
      expect(end.to).toBeGreaterThan(end.from)
    }))
  })

  it('tells times no finer than can be seen', () => {
    expect(timeText(0.4926479, 0.09)).toBe('492.6 ms')
    expect(timeText(12, 20)).toBe('12 s')
    expect(timeText(0, 20)).toBe('0 s')
  })
})
