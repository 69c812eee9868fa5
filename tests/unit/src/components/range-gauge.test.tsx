// @vitest-environment jsdom
import { screen } from '@testing-library/react'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { containsInterval } from '@shared/ranges/numeric.ts'
import type { Bound, NumericRange } from '@shared/schemas/assessment.ts'
import { labelWidth, layoutGauge, spread } from '@/components/range-gauge/layout.ts'
import { RangeGauge } from '@/components/range-gauge/RangeGauge.tsx'
import { boundsInWords } from '@/components/range-gauge/words.ts'
import { closed, mm, open, unknown, unlimited } from '@/gallery/fixtures.ts'
import { show } from '../support/render.tsx'

const lay = (range: NumericRange | null, asked: { min: number | null; max: number | null } | null, tested: number[] = [], width = 340) => layoutGauge({ range, asked, tested, width, testedWord: 'coupon' })

describe('layoutGauge', () => {
  it('cuts what is asked at the bound and names the figure that sticks out', () => {
    const { pieces, labels } = lay(mm([closed(5), closed(20)]), { min: 5, max: 25 }, [10])
    expect(pieces.map(({ from, to, verdict }) => [from, to, verdict])).toEqual([
      [5, 20, 'within'],
      [20, 25, 'outside'],
    ])
    expect(labels.filter(({ row }) => row === 'top').map(({ text }) => text)).toEqual(['5', '20'])
    expect(labels.filter(({ row }) => row === 'bottom').map(({ text, tone }) => [text, tone])).toEqual([
      ['coupon 10', 'tested'],
      ['25', 'outside'],
    ])
  })
  it('leaves a gap between coupons uncovered', () => {
    const { blocks, pieces } = lay(mm([closed(5), closed(12)], [closed(20), closed(40)]), { min: 8, max: 30 })
    expect(blocks).toHaveLength(2)
    expect(pieces.map(({ verdict }) => verdict)).toEqual(['within', 'outside', 'within'])
  })
  it('runs an unlimited end to the edge with an arrow, an unknown one dotted', () => {
    expect(lay(mm([closed(5), unlimited]), null).blocks[0]).toMatchObject({ x2: 340, upper: 'arrow', certain: true })
    expect(lay(mm([closed(5), unknown]), { min: 8, max: 30 })).toMatchObject({ blocks: [{ upper: 'unknown', certain: false }], pieces: [{ verdict: 'cannot-tell' }] })
  })
  it('cannot tell without a range', () => {
    expect(lay(null, { min: 8, max: 30 }).pieces).toMatchObject([{ from: 8, to: 30, verdict: 'cannot-tell' }])
  })
  it('reads an unbounded ask as every value', () => {
    expect(lay(mm([unlimited, unlimited]), { min: null, max: null }).pieces).toMatchObject([{ x1: 0, x2: 340, verdict: 'within' }])
  })

  const value = fc.double({ min: 0.5, max: 200, noNaN: true, noDefaultInfinity: true }).map((one) => Math.round(one * 10) / 10)
  const bound: fc.Arbitrary<Bound> = fc.oneof(value.map(closed), value.map(open), fc.constant(unlimited))
  const segment = fc.tuple(bound, bound).filter(([lower, upper]) => !('value' in lower && 'value' in upper) || lower.value < upper.value)
  const range = segment.map((pair) => mm(pair))
  const ask = fc.tuple(value, value).map(([a, b]) => ({ min: Math.min(a, b), max: Math.max(a, b) }))

  it('judges the whole as its pieces say', () => {
    fc.assert(
      fc.property(range, ask, (given, asked) => {
        fc.pre(asked.min < asked.max)
        const { pieces } = lay(given, asked)
        expect(pieces[0]?.from).toBe(asked.min)
        expect(pieces.at(-1)?.to).toBe(asked.max)
        // An open bound touched by an end is one point outside, which no piece has width to show.
        const whole = containsInterval(given, asked)
        if (pieces.some(({ verdict }) => verdict === 'outside')) expect(whole).toBe('outside')
        const bounds = given.segments.flatMap(({ lower, upper }) => [lower, upper]).filter((one) => one.kind === 'open')
        if (whole === 'outside' && bounds.length === 0) expect(pieces.some(({ verdict }) => verdict === 'outside')).toBe(true)
      }),
    )
  })
  it('draws everything inside its width', () => {
    fc.assert(
      fc.property(range, ask, fc.array(value, { maxLength: 4 }), fc.integer({ min: 110, max: 900 }), (given, asked, tested, width) => {
        const { blocks, pieces, ticks } = lay(given, asked, tested, width)
        for (const { x1, x2 } of [...blocks, ...pieces]) {
          expect(x1).toBeGreaterThanOrEqual(-0.001)
          expect(x2).toBeLessThanOrEqual(width + 0.001)
          expect(x1).toBeLessThanOrEqual(x2 + 0.001)
        }
        for (const x of ticks) expect(x >= 0 && x <= width).toBe(true)
      }),
    )
  })
  it('never lets labels of a row overlap or leave the gauge', () => {
    fc.assert(
      fc.property(range, ask, fc.array(value, { maxLength: 6 }), fc.integer({ min: 110, max: 900 }), (given, asked, tested, width) => {
        const { labels } = lay(given, asked, tested, width)
        for (const row of ['top', 'bottom'] as const) {
          const boxes = labels.filter((label) => label.row === row).map(({ x, text, tone }) => {
            const half = labelWidth(text, tone === 'outside' || tone === 'cannot-tell') / 2
            return [x - half, x + half] as const
          })
          boxes.sort((a, b) => a[0] - b[0])
          boxes.forEach(([left, right], index) => {
            expect(left).toBeGreaterThanOrEqual(-0.001)
            expect(right).toBeLessThanOrEqual(width + 0.001)
            if (index > 0) expect(left).toBeGreaterThanOrEqual((boxes[index - 1]?.[1] ?? 0) - 0.001)
          })
        }
      }),
    )
  })
  it('drops a tested figure before one that is outside', () => {
    const kept = spread([{ x: 10, text: 'coupon 10', row: 'bottom', tone: 'tested' }, { x: 20, text: '25', row: 'bottom', tone: 'outside' }], 60)
    expect(kept.map(({ text }) => text)).toEqual(['25'])
  })
})

describe('RangeGauge', () => {
  it('tells its whole content in words', () => {
    show(<RangeGauge label="Thickness, groove" range={mm([closed(5), closed(20)])} asked={{ min: 5, max: 25 }} tested={[10]} />)
    expect(screen.getByRole('img').getAttribute('aria-label')).toBe('Thickness, groove. Covered: 5 to 20 mm. Asked: 5 to 25 mm. Outside: 20 to 25 mm. Welded at 10 mm.')
  })
  it('can be read in the other system', () => {
    show(<RangeGauge label="Thickness" range={mm([closed(12.7), closed(25.4)])} asked={{ min: 12.7, max: 50.8 }} system="US" />)
    expect(screen.getByRole('img').getAttribute('aria-label')).toContain('Covered: 0.5 to 1 in. Asked: 0.5 to 2 in. Outside: 1 to 2 in.')
  })
  it('shows no figures when thin', () => {
    const { container } = show(<RangeGauge thin label="Thickness" range={mm([closed(5), closed(20)])} asked={{ min: 5, max: 25 }} tested={[10]} />)
    expect(container.querySelectorAll('text')).toHaveLength(0)
  })
})

describe('boundsInWords', () => {
  it.each([
    [mm([closed(5), closed(20)]), '5 to 20 mm'],
    [mm([closed(5), open(20)]), '5 to under 20 mm'],
    [mm([open(5), unlimited]), 'over 5 mm without limit'],
    [mm([unlimited, closed(20)]), 'up to 20 mm'],
    [mm([closed(5), unknown]), 'from 5 mm to an end that is not known'],
    [mm([closed(5), closed(12)], [closed(20), closed(40)]), '5 to 12 mm, or 20 to 40 mm'],
    [mm(), 'nothing'],
    [{ type: 'set', values: ['1G', '3G'], any: false, unknown: false } as const, '1G, 3G'],
    [{ type: 'set', values: [], any: true, unknown: false } as const, 'every value'],
  ])('%#', (range, words) => expect(boundsInWords('values' in range ? { ...range, values: [...range.values] } : range)).toBe(words))
})
