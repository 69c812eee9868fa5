import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { PanelControl } from '@shared/schemas/machines.ts'
import { newControl } from '@shared/machines/patterns.ts'
import { interval } from '@shared/units/convert.ts'
import { counterpartOf, curveOf, wireSentences, wiresOf } from '@/features/trials/components/curves.ts'
import { axesOf, labelsOf, pointsOf, scaleOf } from '@/features/trials/components/plot-data.ts'
import { stepped } from '@/features/trials/form/Stepper.tsx'
import { beadOf, measuredTravel, pulseBead } from '../../../../fixtures/trials.ts'

const control = (part: Partial<PanelControl>): PanelControl => newControl('pulseFrequency', { min: 20, max: 300, step: 1, ...part })

describe('a step on the panel', () => {
  it('lands on the control’s own positions, never off its scale', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 500 }), fc.constantFrom(0.05, 0.1, 0.5, 1, 2.5, 5), fc.constantFrom<1 | -1>(1, -1), (at, step, direction) => {
        const scale = control({ min: 10, max: 10 + step * 400, step })
        const value = 10 + (at / 500) * step * 400
        const next = stepped(value, direction, scale)
        expect(next).toBeGreaterThanOrEqual(scale.min)
        expect(next).toBeLessThanOrEqual(scale.max)
        const positions = (next - 10) / step
        expect(Math.abs(positions - Math.round(positions))).toBeLessThan(1e-6)
        if (direction === 1 && value < scale.max - step) expect(next).toBeGreaterThan(value)
        if (direction === -1 && value > scale.min + step) expect(next).toBeLessThan(value)
      }),
    )
  })
  it('goes up and back to where it was', () => expect(stepped(stepped(23.4, 1, control({ min: 10, max: 40, step: 0.1 })), -1, control({ min: 10, max: 40, step: 0.1 }))).toBe(23.4))
  it('starts in the middle of the scale where nothing is set', () => expect(stepped(null, 1, control({}))).toBe(160))
})

describe('plots', () => {
  const beads = [beadOf(1, pulseBead({}, { score: 5, measured: measuredTravel(450) })), beadOf(2, pulseBead({ feed: 7 }, { score: 2 })), beadOf(3, pulseBead({ feed: 7 }))]
  it('offer what at least two beads have, what varies first', () => {
    const axes = axesOf(beads, 'SI')
    expect(axes[0]).toMatchObject({ key: 'set:feed', unit: 'm/min' })
    expect(axes.map(({ key }) => key)).not.toContain('measured:travelSpeed')
    expect(axes.map(({ key }) => key)).toEqual(expect.arrayContaining(['set:peak', 'stick-out', 'figure:dropletVolume', 'figure:meanCurrent']))
  })
  it('stand in the reader’s units', () => {
    const [point] = pointsOf(beads, 'set:feed', 'stick-out', 'US')
    expect(point).toMatchObject({ number: 1, x: expect.closeTo(236.22, 2) as number, y: expect.closeTo(0.63, 2) as number })
  })
  it('name beads that stand on one another together', () => expect(labelsOf(pointsOf(beads, 'set:feed', 'set:peak', 'SI')).map(({ label }) => label)).toEqual(['1', '2, 3', '']))
  it('hold every value between round ticks', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -1e4, max: 1e4, noNaN: true }), { minLength: 1, maxLength: 20 }), (values) => {
        const { low, high, ticks } = scaleOf(values)
        expect(low).toBeLessThanOrEqual(Math.min(...values))
        expect(high).toBeGreaterThanOrEqual(Math.max(...values))
        expect(high).toBeGreaterThan(low)
        expect(ticks.length).toBeGreaterThan(1)
        expect(ticks.length).toBeLessThan(14)
      }),
    )
  })
})

describe('wire-feed curves', () => {
  const bead = beadOf(4, pulseBead({ feed: 8 }, { measured: { ...measuredTravel(450), current: interval(150, undefined, 'current') } }))
  it('put the beads’ own points beside the textbook curve', () => {
    const { curve, points, basis } = curveOf({ name: 'ER5356', diameter: 1.2 }, [], [bead], 15)
    // 0.75 mm/(A·s) × 100 A × 0.06
    expect(curve.find(({ current }) => current === 100)?.wireFeed).toBeCloseTo(4.5, 6)
    expect(points).toEqual([{ current: 150, wireFeed: 8, from: 'bead 4' }])
    expect(basis).toMatch(/basis: memory; good to about 15 %/)
  })
  it('fall with the thickness of the wire at one current', () => {
    const at = (diameter: number) => curveOf({ name: 'ER5356', diameter }, [], [], 15).curve.find(({ current }) => current === 150)?.wireFeed ?? 0
    expect(at(0.9)).toBeGreaterThan(at(1))
    expect(at(1)).toBeGreaterThan(at(1.2))
  })
  it('are not invented where no constant is known', () => {
    expect(curveOf({ name: 'ER308LSi', diameter: 1.2 }, [], [], 15)).toMatchObject({ curve: [], basis: 'No textbook constant is known for this wire.' })
    expect(curveOf({ name: 'ER5356', diameter: 1.6 }, [], [], 15)).toMatchObject({ curve: [], basis: expect.stringMatching(/do not reach this diameter/) as string })
  })
  it('come with what the trade knows of the two alloys and of thickness', () => {
    const said = wireSentences({ name: 'ER5356', diameter: 1.2 }, { name: 'AWS A5.10 ER4043', diameter: 1.6 })
    expect(said).toEqual([expect.stringMatching(/ER5356 wants some 10 to 20 % more feed/), expect.stringMatching(/2 to 3 V apart/), expect.stringMatching(/1.6 mm has 1.78 times the section of 1.2 mm/)])
    expect(wireSentences({ name: 'ER70S-6', diameter: 1 }, { name: 'ER70S-6', diameter: 1 })).toEqual([])
  })
  it('are held against another alloy of the same kind and size, or another size of the same', () => {
    const wires = wiresOf([bead], [])
    expect(counterpartOf(wires[0] ?? { name: '', diameter: 0 }, wires)).toEqual({ name: 'ER4043', diameter: 1.2 })
    const steel = [{ name: 'ER70S-6', diameter: 1.2 }, { name: 'ER5356', diameter: 1.2 }, { name: 'ER70S-6', diameter: 0.9 }]
    expect(counterpartOf(steel[0] ?? { name: '', diameter: 0 }, steel)).toEqual({ name: 'ER70S-6', diameter: 0.9 })
  })
  it('begin with the trial’s own wire', () => expect(wiresOf([bead], [])[0]).toEqual({ name: 'ER5356', diameter: 1.2 }))
})
