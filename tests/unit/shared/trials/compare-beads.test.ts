import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { beadContentSchema } from '@shared/schemas/trials.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { beadFigures } from '@shared/trials/bead-figures.ts'
import { beadValues, settingOf, travelSpread } from '@shared/trials/bead-values.ts'
import { compareBeads, type BeadComparison } from '@shared/trials/compare-beads.ts'
import { measuredFromRecording } from '@shared/trials/from-recording.ts'
import { measuredTravel, pulseBead, pulseMachine, type Settings } from '../../../fixtures/trials.ts'

const [mode] = pulseMachine().modes
const figureOf = ({ figures }: BeadComparison, key: string) => figures.find((one) => one.key === key)
const brings = ({ advice }: BeadComparison) => advice.filter(({ kind }) => kind === 'bring').map(({ title }) => title)

const settingsArbitrary: fc.Arbitrary<Settings> = fc.record({ feed: fc.integer({ min: 10, max: 200 }).map((tenths) => tenths / 10), peak: fc.integer({ min: 150, max: 500 }), background: fc.integer({ min: 10, max: 140 }), frequency: fc.integer({ min: 20, max: 190 }), onTime: fc.integer({ min: 10, max: 50 }).map((tenths) => tenths / 10) })

describe('the figures of a bead', () => {
  it('are those of the worked example: 350/60 A, 1.5 ms, 150 Hz', () => {
    const { figures, pulsed, problems } = beadFigures(pulseBead({ frequency: 150 }))
    expect({ pulsed, problems }).toEqual({ pulsed: true, problems: [] })
    expect(figures.duty?.value).toBeCloseTo(0.225, 6)
    expect(figures.meanCurrent).toEqual({ value: expect.closeTo(125.25, 6) as number, how: 'model' })
    expect(figures.rmsCurrent?.value).toBeCloseTo(Math.sqrt(0.225 * 350 ** 2 + 0.775 * 60 ** 2), 6)
    expect(figures.power).toBeNull()
  })

  it('take the drop from the worked example: 1.2 mm, 6 m/min, 100 Hz', () => {
    const { figures } = beadFigures(pulseBead())
    expect(figures.dropletVolume?.value).toBeCloseTo(1.131, 3)
    expect(figures.dropletDiameter?.value).toBeCloseTo(1.29, 2)
  })

  it('tell duty and drop although the panel sets no currents, and say what is missing', () => {
    const whole = pulseBead()
    const { figures, notes } = beadFigures({ ...whole, settings: whole.settings.filter(({ sets }) => sets !== 'peakCurrent' && sets !== 'backgroundCurrent') })
    expect([figures.duty?.value, figures.dropletVolume?.value, figures.meanCurrent, figures.rmsCurrent]).toEqual([0.15, expect.closeTo(1.131, 3), null, null])
    expect(notes.join(' ')).toMatch(/Peak and background current are not both known/)
  })

  it('take the currents that a recorder measured where the panel sets none', () => {
    const whole = pulseBead({ frequency: 150 })
    const measured = { ...whole.measured, peakCurrent: quantity(350, 'current'), backgroundCurrent: quantity(60, 'current') }
    const { figures } = beadFigures({ ...whole, settings: whole.settings.filter(({ sets }) => sets !== 'peakCurrent' && sets !== 'backgroundCurrent'), measured })
    expect(figures.meanCurrent?.value).toBeCloseTo(125.25, 6)
  })

  it('give true power with both voltages, and that of the meters, said so, without', () => {
    const whole = pulseBead({ peak: 400, background: 50, frequency: 120, onTime: 2 })
    const volts = [{ control: 'pv', label: 'Peak V', sets: 'peakVoltage' as const, value: 32, unit: 'V' }, { control: 'bv', label: 'Background V', sets: 'backgroundVoltage' as const, value: 20, unit: 'V' }]
    const { figures } = beadFigures({ ...whole, settings: [...whole.settings, ...volts], measured: measuredTravel(400) })
    expect(figures.power).toEqual({ value: expect.closeTo(3832, 0) as number, how: 'model' })
    expect(figures.energyPerLength?.value).toBeCloseTo((3832 * 60) / 400 / 1000, 3)
    const meters = beadFigures({ ...whole, measured: { ...measuredTravel(400), current: interval(134, undefined, 'current'), voltage: interval(22.88, undefined, 'voltage') } })
    expect(meters.figures.power).toEqual({ value: expect.closeTo(3065.9, 0) as number, how: 'meters' })
    expect(meters.notes.join(' ')).toMatch(/In a pulsed arc that is off/)
    expect(meters.notes.join(' ')).not.toMatch(/as set/)
    const set = [{ control: 'v', label: 'Volts', sets: 'voltage' as const, value: 24, unit: 'V' }]
    const dialled = beadFigures(beadContentSchema.parse({ settings: set, measured: { ...measuredTravel(400), current: interval(150, undefined, 'current') } }))
    expect(dialled.figures.power?.value).toBe(3600)
    expect(dialled.notes.join(' ')).toMatch(/Power counts the volts as set, not as measured/)
  })

  it('refuse a pulse longer than its period, and a travel speed of nothing, in a sentence each', () => {
    const { figures, problems } = beadFigures(pulseBead({ frequency: 300, onTime: 4 }, { measured: measuredTravel(0) }))
    expect(problems.join(' ')).toMatch(/on-time of 4 ms leaves no background: at 300 Hz a period lasts 3\.33 ms/)
    expect(problems.join(' ')).toMatch(/Travel speed must be above 0/)
    expect([figures.duty, figures.meanCurrent, figures.energyPerLength]).toEqual([null, null, null])
  })

  it('work travel speed out from length and arc time where it was not measured itself', () => {
    const measured = { ...beadContentSchema.parse({}).measured, length: quantity(150, 'length'), arcTime: quantity(20, 'duration') }
    expect(travelSpread({ measured })).toEqual({ lo: 450, hi: 450 })
    expect(travelSpread({ measured: { ...measured, arcTime: quantity(0, 'duration') } })).toBeNull()
  })

  it('stand in storage units, whatever the panel prints', () => {
    const bead = pulseBead()
    const inches = { ...bead, settings: bead.settings.map((one) => (one.control === 'feed' ? { ...one, value: 335, unit: 'ipm' } : one)) }
    expect(settingOf(inches, 'wireFeed')).toBeCloseTo(8.509, 6)
    expect(beadValues(inches).find(({ key }) => key === 'set:feed')).toMatchObject({ value: expect.closeTo(8.509, 6) as number, unit: 'm/min' })
    const bare = { ...bead, settings: [{ control: 'feed', label: 'Wire', sets: 'wireFeed' as const, value: 6, unit: '' }] }
    expect(settingOf(bare, 'wireFeed')).toBeNull()
    expect(beadValues(bare)[0]).toMatchObject({ value: 6, unit: '', dimension: null })
  })
})

describe('a recording of the arc', () => {
  const figures = { current: { mean: 133.96, rms: 200, min: 0, max: 410 }, voltage: { mean: 22.884, rms: 23, min: 0, max: 33 }, arcTime: 17.64, alternating: false, pulse: { frequency: 120, peakCurrent: 399.7, backgroundCurrent: 50.2, onTime: 2, count: 900 } }
  it('gives what the panel does not show as measured, and leaves the rest', () => {
    const measured = measuredFromRecording({ ...measuredTravel(450), current: interval(120, undefined, 'current') }, figures)
    expect(measured).toMatchObject({ travelSpeed: { min: { si: 450 } }, current: { min: { si: 134 }, max: { si: 134 } }, voltage: { min: { si: 22.9 } }, peakCurrent: { si: 400 }, backgroundCurrent: { si: 50 }, arcTime: { si: 17.6 } })
    expect(measuredFromRecording(measuredTravel(450), { ...figures, pulse: null, alternating: true })).toMatchObject({ current: { min: { si: 200 } }, peakCurrent: null, backgroundCurrent: null })
  })
  it('goes before any model of the power, and is compared only with another recording', () => {
    const [before, after] = [pulseBead({}, { measured: { ...measuredTravel(400), current: interval(134, undefined, 'current'), voltage: interval(23, undefined, 'voltage') } }), pulseBead({ feed: 7 }, { measured: { ...measuredTravel(400), current: interval(140, undefined, 'current'), voltage: interval(23, undefined, 'voltage') } })]
    expect(figureOf(compareBeads(before, after, mode, { before: 3832, after: 4000 }), 'power')).toMatchObject({ before: 3832, after: 4000, how: 'recorded', direction: 'up' })
    expect(figureOf(compareBeads(before, after, mode, { before: 3832, after: 4000 }), 'energyPerLength')?.after).toBeCloseTo(0.6, 9)
    expect(figureOf(compareBeads(before, after, mode, { before: 3832, after: null }), 'power')).toMatchObject({ before: 134 * 23, after: 140 * 23, how: 'meters' })
  })
})

describe('two beads', () => {
  it('advise no frequency at which the on-time would fill the whole period', () => {
    // 250 Hz × 8.1 / 6 = 337.5 Hz, and 3 ms of it is a duty of 1.01.
    const told = compareBeads(pulseBead({ frequency: 250, onTime: 3 }), pulseBead({ feed: 8.1, frequency: 250, onTime: 3 }), mode)
    expect(brings(told)).toEqual([])
    expect(told.advice.find(({ title }) => title === 'Frequency can’t follow')?.why).toMatch(/no background is left/)
    expect(brings(compareBeads(pulseBead({ frequency: 250, onTime: 3 }), pulseBead({ feed: 7.8, frequency: 250, onTime: 3 }), mode))).toEqual(['Frequency to 325 Hz'])
  })

  it('with themselves: nothing changed, nothing to bring along', () => {
    fc.assert(
      fc.property(settingsArbitrary, fc.option(fc.integer({ min: 100, max: 900 })), (settings, speed) => {
        const bead = pulseBead(settings, speed === null ? {} : { measured: measuredTravel(speed) })
        const told = compareBeads(bead, structuredClone(bead), mode)
        expect(told).toMatchObject({ settings: [], circumstances: [], nothingChanged: true })
        expect(told.figures.filter(({ direction }) => direction === 'up' || direction === 'down')).toEqual([])
        expect(brings(told)).toEqual([])
      }),
    )
  })

  it('feed raised: the drop grows, and the frequency follows in step for the same drop', () => {
    const told = compareBeads(pulseBead(), pulseBead({ feed: 8 }), mode)
    expect(told.settings).toEqual([{ control: 'feed', label: 'Wire feed', unit: 'm/min', before: 6, after: 8, direction: 'up' }])
    expect(figureOf(told, 'dropletVolume')).toMatchObject({ direction: 'up', share: expect.closeTo(1 / 3, 6) as number })
    expect(figureOf(told, 'meanCurrent')).toMatchObject({ direction: 'same' })
    expect(brings(told)).toEqual(['Frequency to 133 Hz'])
    const [advice] = told.advice
    expect(advice).toMatchObject({ control: 'frequency', value: 133, unit: 'Hz', basis: 'calculated: the rectangular pulse' })
    expect(advice?.formula).toBe('f₂ = f₁ × feed₂ / feed₁ = 100 × 8 / 6')
  })

  it('bringing the frequency along does keep the drop', () => {
    fc.assert(
      fc.property(settingsArbitrary, fc.integer({ min: 10, max: 200 }).map((tenths) => tenths / 10), (settings, feed) => {
        const [before, after] = [pulseBead(settings), pulseBead({ ...settings, feed })]
        const advice = compareBeads(before, after, null).advice.find(({ kind, control, formula }) => kind === 'bring' && control === 'frequency' && formula.startsWith('f₂ = f₁ × feed'))
        fc.pre(advice?.value !== null && advice?.value !== undefined && advice.value * (settings.onTime ?? 1.5) < 1000)
        const followed = compareBeads(before, pulseBead({ ...settings, feed, frequency: advice?.value ?? 0 }), null)
        expect(Math.abs(figureOf(followed, 'dropletVolume')?.share ?? 1)).toBeLessThan(0.001)
      }),
    )
  })

  it('peak moved: on-time for the same detachment, and with it the frequency for the same mean', () => {
    const told = compareBeads(pulseBead(), pulseBead({ peak: 400 }), mode)
    // 1.5 × (350/400)² = 1.148 → 1.1 on steps of 0.1; mean 103.5 A: 1000 × 43.5 / 340 / 1.1 = 116.3 Hz.
    expect(brings(told)).toEqual(['On-time to 1.1 ms', 'Frequency to 116 Hz'])
    const followed = compareBeads(pulseBead(), pulseBead({ peak: 400, onTime: 1.1, frequency: 116 }), mode)
    expect(Math.abs(figureOf(followed, 'meanCurrent')?.share ?? 1)).toBeLessThan(0.005)
    expect(told.advice[0]?.basis).toMatch(/^memory/)
  })

  it('background moved: the frequency that keeps the mean', () => {
    // 1000 × (103.5 − 40) / (350 − 40) / 1.5 = 136.6 Hz
    expect(brings(compareBeads(pulseBead(), pulseBead({ background: 40 }), mode))).toEqual(['Frequency to 137 Hz'])
  })

  it('on-time moved: the frequency that keeps the mean, even with unknown currents', () => {
    expect(brings(compareBeads(pulseBead(), pulseBead({ onTime: 2 }), mode))).toEqual(['Frequency to 75 Hz'])
    const without = (bead: ReturnType<typeof pulseBead>) => ({ ...bead, settings: bead.settings.filter(({ sets }) => sets !== 'peakCurrent' && sets !== 'backgroundCurrent') })
    expect(brings(compareBeads(without(pulseBead()), without(pulseBead({ onTime: 2 })), mode))).toEqual(['Frequency to 75 Hz'])
  })

  it('frequency raised alone: the feed that keeps the drop', () => {
    expect(brings(compareBeads(pulseBead(), pulseBead({ frequency: 120 }), mode))).toEqual(['Wire feed to 7.2 m/min'])
  })

  it('an advice beyond the scale says that the control can’t follow', () => {
    const told = compareBeads(pulseBead({ feed: 4, frequency: 300, onTime: 1 }), pulseBead({ feed: 12, frequency: 300, onTime: 1 }), mode)
    expect(told.advice.find(({ title }) => title === 'Frequency can’t follow')).toMatchObject({ kind: 'watch', value: null, why: expect.stringContaining('900 Hz, which is beyond its scale') as string })
  })

  it('before the bead is welded, measured currents are taken from the one before and that is said', () => {
    const bare = (bead: ReturnType<typeof pulseBead>) => ({ ...bead, settings: bead.settings.filter(({ sets }) => sets !== 'peakCurrent' && sets !== 'backgroundCurrent') })
    const before = { ...bare(pulseBead()), measured: { ...measuredTravel(450), peakCurrent: quantity(350, 'current'), backgroundCurrent: quantity(60, 'current') } }
    const told = compareBeads(before, bare(pulseBead({ frequency: 120 })), mode)
    expect(figureOf(told, 'meanCurrent')).toMatchObject({ before: expect.closeTo(103.5, 6) as number, after: expect.closeTo(112.2, 6) as number, direction: 'up' })
    expect(told.notes.join(' ')).toMatch(/Taken as on the bead before until they are measured: peak current 350 A, background current 60 A, travel speed 450 mm\/min/)
  })

  it('tell another wire or gas as a circumstance, not as a setting', () => {
    const told = compareBeads(pulseBead(), pulseBead({}, { wire: 'ER4043', wireId: 'a510-er4043' }), mode)
    expect(told).toMatchObject({ settings: [], nothingChanged: false, circumstances: [{ key: 'wire', before: 'ER5356', after: 'ER4043' }] })
  })
})
