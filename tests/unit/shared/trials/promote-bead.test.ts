import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fillerById, toFiller } from '@shared/library/filler-metals.ts'
import { baseMetalById, toBaseMetal } from '@shared/library/base-metals.ts'
import { panelCard } from '@shared/machines/panel-card.ts'
import { procedureContentSchema } from '@shared/schemas/welding.ts'
import { beadContentSchema, type Bead } from '@shared/schemas/trials.ts'
import { interval, quantity } from '@shared/units/convert.ts'
import { checkBead } from '@shared/trials/check-bead.ts'
import { copyBead } from '@shared/trials/copy-bead.ts'
import { promoteBead, type PromoteInput } from '@shared/trials/promote-bead.ts'
import { proposeRanges } from '@shared/trials/propose-ranges.ts'
import { beadOf, measuredTravel, pulseBead, pulseMachine, type Settings } from '../../../fixtures/trials.ts'

const scored = (number: number, score: number | null, settings: Settings, part = {}): Bead => beadOf(number, pulseBead(settings, { score, ...part }))
const rangeOf = (beads: readonly Bead[], chosen: Bead | undefined, key: string) => proposeRanges(beads, chosen?.id ?? '').ranges.find((range) => range.key === key)

describe('ranges from the beads around one', () => {
  const log = [scored(1, 2, { feed: 5 }, { faults: [{ fault: 'cold-lap', severity: 2 }] }), scored(2, 4, { feed: 5.6 }), scored(3, 5, { feed: 6 }), scored(4, 4, { feed: 6.6 }), scored(5, 1, { feed: 7.5 }), scored(6, 4, { feed: 8 }), scored(7, 3, { feed: 5.8 })]

  it('reach the good beads, stop short of the bad ones and never pass one', () => {
    const range = rangeOf(log, log[2], 'set:feed')
    expect(range).toMatchObject({ min: 5.6, max: 6.6, chosen: { lo: 6, hi: 6 } })
    expect(range?.because).toMatch(/Beads 2 and 4 scored 4 or better/)
    expect(range?.because).toMatch(/Bead 1 at 5 m\/min scored 2 \(cold lap, clear\): the range stops short of it/)
    expect(range?.because).toMatch(/Bead 6 scored well beyond that, and a bad bead lies between/)
  })

  it('have no room where only one bead is good', () => {
    const range = rangeOf([scored(1, 5, {}), scored(2, 3, { feed: 7 })], beadOf(1, pulseBead()), 'set:feed')
    expect(range).toMatchObject({ min: 6, max: 6 })
    expect(range?.because).toMatch(/Only bead 1 stands for this value, so there is no room/)
  })

  it('count only beads with the same machine, mode, wire, diameter, gas, metal and thickness, and name the others', () => {
    const others = [scored(2, 5, { feed: 9 }, { wire: 'ER4043', wireId: 'a510-er4043' }), scored(3, 5, { feed: 9 }, { wireDiameter: quantity(1.6, 'length') }), scored(4, 5, { feed: 9 }, { gas: { components: [{ gas: 'Ar', percent: 70 }, { gas: 'He', percent: 30 }] } }), scored(5, 5, { feed: 9 }, { modeKey: 'pulse' }), scored(6, 5, { feed: 9 }, { metal: '6082-T6', metalId: null }), scored(7, 5, { feed: 9 }, { thickness: quantity(3, 'length') })]
    const told = proposeRanges([scored(1, 5, {}), ...others], beadOf(1, pulseBead()).id)
    expect(told.leftOut).toEqual([{ number: 2, differsIn: 'wire' }, { number: 3, differsIn: 'wire diameter' }, { number: 4, differsIn: 'gas' }, { number: 5, differsIn: 'mode' }, { number: 6, differsIn: 'metal' }, { number: 7, differsIn: 'thickness' }])
    expect(told.ranges.every(({ min, max }) => min === max)).toBe(true)
  })

  it('count no bead of another position; one whose position is not said counts', () => {
    const flat = scored(1, 5, {}, { position: '1G' })
    const told = proposeRanges([flat, scored(2, 5, { feed: 5 }, { position: '4G' }), scored(3, 5, { feed: 6.4 }, { position: null })], flat.id)
    expect(told.leftOut).toEqual([{ number: 2, differsIn: 'position' }])
    expect(told.ranges.find(({ key }) => key === 'set:feed')).toMatchObject({ min: 6, max: 6.4 })
  })

  it('refuse a bead that was bad itself, and one without any figure', () => {
    expect(proposeRanges([scored(1, 2, {})], beadOf(1, pulseBead()).id).problems.join(' ')).toMatch(/Bead 1 scored 2: choose a bead that you would weld again/)
    expect(proposeRanges([beadOf(1, beadContentSchema.parse({}))], beadOf(1, pulseBead()).id).problems.join(' ')).toMatch(/no setting and no measured value/)
  })

  const manyBeads = fc.array(fc.record({ feed: fc.integer({ min: 20, max: 80 }), peak: fc.integer({ min: 30, max: 40 }), frequency: fc.integer({ min: 8, max: 16 }), score: fc.constantFrom(null, 1, 2, 3, 4, 5), speed: fc.option(fc.integer({ min: 30, max: 60 })) }), { minLength: 1, maxLength: 14 })
    .map((rows) => rows.map(({ feed, peak, frequency, score, speed }, index) => scored(index + 1, score, { feed: feed / 10, peak: peak * 10, frequency: frequency * 10 }, speed === null ? {} : { measured: measuredTravel(speed * 10) })))

  it('always hold the chosen value, and never a differing value of a bad bead', () => {
    fc.assert(
      fc.property(manyBeads, fc.nat(), (beads, pick) => {
        const chosen = beads[pick % beads.length]
        const { ranges } = proposeRanges(beads, chosen?.id ?? '')
        expect(ranges.length).toBeGreaterThanOrEqual(5)
        for (const { key, min, max, chosen: own } of ranges) {
          expect(min).toBeLessThanOrEqual(own.lo)
          expect(max).toBeGreaterThanOrEqual(own.hi)
          for (const bead of beads.filter(({ id, content }) => id !== chosen?.id && (content.score ?? 9) <= 2)) {
            const value = key.startsWith('set:') ? bead.content.settings.find(({ control }) => `set:${control}` === key)?.value : key === 'measured:travelSpeed' ? bead.content.measured.travelSpeed?.min?.si : undefined
            if (value !== undefined && value !== own.lo) expect(value < min || value > max, `${key} ${value} in ${min}–${max}`).toBe(true)
          }
        }
      }),
      { numRuns: 300 },
    )
  })

  it('reach no further than a good bead did', () => {
    fc.assert(
      fc.property(manyBeads, fc.nat(), (beads, pick) => {
        const chosen = beads[pick % beads.length]
        const range = rangeOf(beads, chosen, 'set:feed')
        const good = beads.filter(({ id, content }) => id === chosen?.id || (content.score ?? 0) >= 4).map(({ content }) => content.settings[0]?.value)
        expect(good).toContain(range?.min)
        expect(good).toContain(range?.max)
      }),
    )
  })
})

const metalRow = baseMetalById('us-b209-6061-t6')
const fillerRow = fillerById('a510-er5356')
const input = (beads: readonly Bead[], chosen: Bead | undefined): PromoteInput => ({
  beads, chosenId: chosen?.id ?? '', title: '6061 bracket', standards: [{ standard: 'asme-ix', edition: '2023', level: null }], trial: { number: 'T-004', title: 'ER5356 on 6 mm' }, machine: { number: 'M-009', content: pulseMachine() },
  metal: metalRow && toBaseMetal(metalRow), filler: fillerRow && toFiller(fillerRow),
})

describe('a bead promoted', () => {
  const log = [scored(1, 4, { feed: 5.5 }), scored(2, 5, { feed: 6 }, { measured: { ...measuredTravel(450), current: interval(120, 126, 'current'), voltage: interval(22.1, 22.5, 'voltage') } }), scored(3, 4, { feed: 6.4, frequency: 110 })]

  it('is a procedure’s content with the bead’s own values, ranges, and the library’s numbers', () => {
    const { content } = promoteBead(input(log, log[1]))
    expect(procedureContentSchema.parse(content)).toEqual(content)
    const block = content?.variables.processes[0]
    expect(content?.variables.baseMetals.a).toMatchObject({ libraryId: 'us-b209-6061-t6', grade: expect.stringContaining('6061') as string, pNumber: '23' })
    expect(block).toMatchObject({ process: 'GMAW', mechanisation: 'semiautomatic', positions: ['2F'], filler: { libraryId: 'a510-er5356', classification: 'ER5356', fNumber: '22', diameters: [{ si: 1.2 }] }, shieldingGas: { components: [{ gas: 'Ar', percent: 100 }] } })
    expect(block?.electrical).toMatchObject({ currentType: 'DCEP', transferMode: 'pulsed-spray', pulsed: true, wireFeed: { min: { si: 5.5 }, max: { si: 6.4 } }, pulseFrequency: { min: { si: 100 }, max: { si: 110 } }, peakCurrent: { min: { si: 350 }, max: { si: 350 } }, current: { min: { si: 120 }, max: { si: 126 } }, travelSpeed: { min: { si: 450 } } })
    expect(block?.electrical.panel).toMatchObject({ machine: 'M-009', mode: 'Manual pulse', caution: expect.stringContaining('no crater fill') as string })
    expect(block?.electrical.panel?.settings[0]).toEqual({ control: 'Wire feed', hint: 'left knob', value: '6.0', unit: 'm/min', scaleMin: 1, scaleMax: 20, min: 5.5, max: 6.4 })
    expect(block?.technique.contactTubeDistance).toMatchObject({ min: { si: 16 }, max: { si: 16 } })
    expect(content?.variables.joint).toMatchObject({ weld: 'fillet', type: 'tee' })
    expect(content?.notes).toMatch(/^From T-004 \(ER5356 on 6 mm\), bead 2, scored 5 of 5/)
  })

  it('gives a panel card on the same machine that is ready and dials inside the ranges', () => {
    const { content } = promoteBead(input(log, log[1]))
    if (!content) throw new Error('no content')
    const card = panelCard({ variables: content.variables, state: 'draft', processId: 'p1', machine: { number: 'M-009', content: pulseMachine() }, mode: 'manual-pulse', today: '2026-12-01' })
    expect(card.notices.filter(({ level }) => level === 'refuse')).toEqual([])
    expect(card.lines.map(({ label, min, max }) => [label, min, max])).toEqual([['Wire feed', 5.5, 6.4], ['Peak', 350, 350], ['Background', 60, 60], ['Frequency', 100, 110], ['On-time', 1.5, 1.5]])
  })

  it('keeps what was only typed, and asks nothing of the library', () => {
    const typed = beadOf(1, pulseBead({}, { metalId: null, metal: 'old fence rail', wireId: null, wire: 'unlabelled spool', score: 4 }))
    const { content } = promoteBead({ ...input([typed], typed), metal: null, filler: null, machine: null })
    expect(content?.variables.baseMetals.a).toMatchObject({ libraryId: null, specification: 'old fence rail', pNumber: null })
    expect(content?.variables.processes[0]?.filler).toMatchObject({ classification: 'unlabelled spool', fNumber: null })
  })

  it('parses whatever the log was, or says why not', () => {
    fc.assert(
      fc.property(fc.array(fc.record({ feed: fc.integer({ min: 10, max: 200 }), score: fc.constantFrom(null, 1, 3, 5), speed: fc.integer({ min: 1, max: 900 }) }), { minLength: 1, maxLength: 6 }), (rows) => {
        const beads = rows.map(({ feed, score, speed }, index) => scored(index + 1, score, { feed: feed / 10 }, { measured: measuredTravel(speed) }))
        const { content, problems } = promoteBead(input(beads, beads[0]))
        if (rows[0]?.score === 1) expect([content, problems.length]).toEqual([null, 1])
        else expect(procedureContentSchema.safeParse(content).success).toBe(true)
      }),
    )
  })
})

describe('copying the last bead', () => {
  const bead = pulseBead({}, { score: 2, note: 'hisses', faults: [{ fault: 'soot', severity: 3 }], measured: measuredTravel(450) })
  it('keeps machine, wire and settings, changes one thing, and starts what is looked at and measured empty', () => {
    const next = copyBead(bead, { settings: [{ control: 'frequency', value: 90 }, { control: 'not-there', value: 1 }] })
    expect(next).toEqual({ ...bead, settings: bead.settings.map((one) => (one.control === 'frequency' ? { ...one, value: 90 } : one)), score: null, note: null, faults: [], measured: beadContentSchema.parse({}).measured })
  })
})

describe('what can’t be in a bead', () => {
  it.each([
    ['travel speed of nothing', { measured: measuredTravel(0) }, 'measured.travelSpeed', /Travel speed must be above 0/],
    ['ends the wrong way round', { measured: { ...measuredTravel(400), current: interval(150, 120, 'current') } }, 'measured.current', /Swap them or correct one/],
    ['gas shares short of 100 %', { gas: { components: [{ gas: 'Ar', percent: 82 }, { gas: 'CO2', percent: 8 }] } }, 'gas', /sum to 90 %/],
    ['a wire without thickness', { wireDiameter: quantity(0, 'length') }, 'wireDiameter', /must be above 0/],
    ['a background above the peak', { measured: { ...measuredTravel(400), peakCurrent: quantity(100, 'current'), backgroundCurrent: quantity(120, 'current') } }, 'measured.backgroundCurrent', /above the peak/],
    ['a fault twice', { faults: [{ fault: 'soot', severity: 1 }, { fault: 'soot', severity: 2 }] }, 'faults', /named twice/],
  ])('%s is told at its field', (_what, part, field, sentence) => {
    const found = checkBead(beadContentSchema.parse({ ...pulseBead(), ...part }))
    expect(found).toEqual([{ field, message: expect.stringMatching(sentence) as string }])
  })
  it('is nothing of a good bead', () => expect(checkBead(pulseBead({}, { measured: measuredTravel(450) }))).toEqual([]))
})
