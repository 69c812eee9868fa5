import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { modesFor, panelCard, passesWithRanges, type PanelCardInput } from '../../../../shared/machines/panel-card.ts'
import { toStorage } from '../../../../shared/machines/panel-quantities.ts'
import { measuredAt } from '../../../../shared/machines/program-points.ts'
import type { PanelCard } from '../../../../shared/schemas/machines.ts'
import type { ProcessBlock, WeldingVariables } from '../../../../shared/schemas/welding.ts'
import { interval, quantity } from '../../../../shared/units/convert.ts'
import { feederMode, knobMode, machine, TODAY } from '../../../fixtures/machines.ts'
import { aluminiumProcedure, steelProcedure } from '../../../fixtures/samples.ts'

type Electrical = ProcessBlock['electrical']

/** A steel procedure with one wire process: 180–240 A, 24–29 V, 6.5–9 m/min, spray. */
function steel(electrical: Partial<Electrical> = {}, block: Partial<ProcessBlock> = {}): WeldingVariables {
  const { variables } = steelProcedure()
  const fill = variables.processes[1]
  if (!fill) throw new Error('no fill')
  return { ...variables, processes: [{ ...fill, passes: [], ...block, electrical: { ...fill.electrical, ...electrical } }] }
}
/** Pulsed ER5356, 1.2 mm, argon: 8–9 m/min, 22–23.5 V. */
function aluminium(electrical: Partial<Electrical> = {}, block: Partial<ProcessBlock> = {}): WeldingVariables {
  const { variables } = aluminiumProcedure()
  const pulse = variables.processes[0]
  if (!pulse) throw new Error('no pulse')
  return { ...variables, unitSystem: 'SI', processes: [{ ...pulse, passes: [], filler: { ...pulse.filler, diameters: [quantity(1.2, 'length')] }, ...block, electrical: { ...pulse.electrical, peakCurrent: null, backgroundCurrent: null, pulseFrequency: null, panel: null, current: null, voltage: interval(22, 23.5, 'voltage'), wireFeed: interval(8, 9, 'wireFeed'), ...electrical } }] }
}

const card = (variables: WeldingVariables, content = machine([feederMode()]), more: Partial<PanelCardInput> = {}): PanelCard =>
  panelCard({ variables, processId: null, machine: { number: 'M-001', content }, mode: content.modes[0]?.key ?? '', state: 'approved', today: TODAY, ...more })
const codes = ({ notices }: PanelCard, level?: string) => notices.filter((one) => level === undefined || one.level === level).map(({ code }) => code)
const said = ({ notices }: PanelCard, code: string) => notices.find((one) => one.code === code)?.message ?? ''
const line = ({ lines }: PanelCard, control: string) => lines.find((one) => one.control === control)

describe('a plain feeder', () => {
  it('is dialled in its own units and steps, inside the ranges, with the room left', () => {
    const made = card(steel())
    expect(codes(made, 'refuse')).toEqual([])
    expect(made.ready).toBe(true)
    expect(line(made, 'feed')).toMatchObject({ text: '7.8 m/min', min: 6.5, max: 9, scaleMin: 1, scaleMax: 20 })
    expect(line(made, 'volts')).toMatchObject({ text: '26.5 V', min: 24, max: 29 })
  })
  it('tells what its display shows, how fast to travel, and that arc volts are less than terminal volts', () => {
    const made = card(steel())
    expect(said(made, 'watch')).toContain('180–240 A')
    // 100 mm at 250 to 400 mm/min take 15 to 24 s.
    expect(said(made, 'travel')).toContain('100 mm in 15 to 24 s')
    expect(made.notices.find(({ code }) => code === 'arc-volts')).toMatchObject({ level: 'note', basis: 'common practice' })
    expect(made.mustMeasure).toEqual([])
  })
  it('narrows what its display may show by its known accuracy', () => {
    const made = card(steel(), machine([feederMode()], { calibration: { dueOn: '2027-06-01', accuracy: { current: 2.5 } } }))
    // 180 / 0.975 = 184.6 and 240 / 1.025 = 234.1, inward.
    expect(said(made, 'watch')).toContain('the reading stays at 185 to 234 A')
    expect(said(card(steel()), 'watch')).not.toContain('reading')
  })
  it('gives a travel speed or a feed of one figure as one time and one length, never with the ends crossed', () => {
    // 100 mm at 280 mm/min: 21.43 s; at 590 to 595 mm/min: 10.084 to 10.169 s.
    expect(said(card(steel({ travelSpeed: interval(280, undefined, 'travelSpeed') })), 'travel')).toContain('100 mm in 21.4 s')
    expect(said(card(steel({ travelSpeed: interval(590, 595, 'travelSpeed') })), 'travel')).toContain('100 mm in 10.1 s')
    const hidden = feederMode({ controls: [], displays: [] })
    const made = card({ ...steel({ wireFeed: interval(5.5, undefined, 'wireFeed') }), unitSystem: 'US' }, machine([hidden]))
    expect(made.mustMeasure.find((one) => one.quantity === 'wireFeed')?.text).toContain('21.66 in')
  })
  it('whose panel hides the feed has it measured by cut length', () => {
    const hidden = feederMode({ controls: [{ key: 'feed', label: 'Wire feed', sets: 'wireFeed', unit: '', min: 1, max: 10, step: 1, shown: false }], displays: [] })
    const made = card(steel(), machine([hidden]))
    expect(made.ready).toBe(true)
    expect(line(made, 'feed')).toMatchObject({ value: null, text: '—' })
    expect(codes(made, 'warn')).toEqual(expect.arrayContaining(['bare-scale', 'not-shown']))
    // One is "it", several are "them".
    expect(made.notices.find(({ code }) => code === 'not-shown')?.message).toMatch(/^The procedure limits [a-z, -]+ and [a-z -]+, which this panel does not show: measure them, see below\.$/)
    // 6.5 to 9 m/min for 6 s.
    expect(made.mustMeasure.find((one) => one.quantity === 'wireFeed')?.text).toContain('650 to 900 mm')
    expect(made.mustMeasure.map((one) => one.quantity)).toEqual(expect.arrayContaining(['current', 'voltage']))
  })
  it('in inches: 6 s of 100 in/min are 10 in', () => {
    const hidden = feederMode({ controls: [], displays: [] })
    const made = card({ ...steel({ wireFeed: interval(100, 200, 'wireFeed', 'in/min') }), unitSystem: 'US' }, machine([hidden]))
    expect(made.mustMeasure.find((one) => one.quantity === 'wireFeed')?.text).toContain('10 to 20 in')
    expect(codes(made, 'refuse')).toContain('no-controls')
  })
})

describe('refusals, each with its reason and without a figure', () => {
  const volts = (min: number, max: number, step: number) => feederMode({ controls: [{ key: 'volts', label: 'Volts', sets: 'voltage', unit: 'V', min, max, step }] })
  test.each<[string, PanelCard, RegExp]>([
    ['off-scale', card(steel(), machine([volts(14, 23, 0.5)])), /24–29 V; the scale runs from 14\.0 to 23\.0 V/],
    ['step', card(steel({ voltage: interval(24.2, 24.8, 'voltage') }), machine([volts(14, 36, 1)])), /no position inside \(nearest: 24 V and 25 V\)/],
    ['out-of-reach', card(steel(), machine([feederMode({ reach: { current: { min: 20, max: 160 } } })])), /180–240 A; in this mode M-001 gives 20 to 160 A/],
    ['cannot-hold', card(steel({ voltage: interval(24, 25, 'voltage') }), machine([feederMode()], { calibration: { dueOn: '2027-06-01', accuracy: { voltage: 5 } } })), /± 5 %, which is wider/],
    ['process', card(steel({}, { process: 'FCAW' }), machine([feederMode({ processes: ['GMAW'] })])), /is for GMAW, not for FCAW/],
    ['transfer-mode', card(steel(), machine([feederMode({ transferModes: ['short-circuiting'] })])), /asks for spray transfer/],
    ['not-pulsed', card(aluminium(), machine([feederMode({ transferModes: [] })])), /does not pulse/],
    ['pulsed', card(steel({ pulsed: false }), machine([knobMode({ transferModes: [] })])), /pulses/],
    ['polarity', card(steel({ currentType: 'DCEN' })), /asks for DCEN.*gives DCEP/],
    ['power-source', card(steel({ powerSource: 'constant-current' })), /constant-current power source/],
    ['retired', card(steel(), machine([feederMode()], { retired: true })), /retired/],
    ['not-in-force', card(steel(), undefined, { state: 'withdrawn' }), /was withdrawn/],
    ['no-mode', card(steel(), undefined, { mode: 'none' }), /no such mode/],
    ['no-process', card(steel(), undefined, { processId: 'none' }), /no such process/],
    ['no-pass', card(steel(), undefined, { pass: '9' }), /no pass 9/],
    ['nothing-limited', card(steel({ current: null, voltage: null, wireFeed: null })), /states no electrical range/],
    ['no-range', card(steel({ voltage: interval(29, 24, 'voltage') })), /leaves no value/],
    ['program', card(steel({ pulsed: true, transferMode: 'pulsed-spray' }, { filler: { ...steel().processes[0]!.filler, classification: 'ER316L' } }), machine([knobMode()])), /None of the programs.*ER316L/],
    ['program-other-alloy', card(steel({ pulsed: true, transferMode: 'pulsed-spray' }), machine([knobMode()]), { program: 'alu' }), /aluminium 4xxx and aluminium 5xxx.*ER70S-6 is carbon or low-alloy steel/],
    ['no-points', card(steel({ pulsed: true, transferMode: 'pulsed-spray' }), machine([knobMode()])), /has not been measured.*three or four positions/],
  ])('%s', (code, made, reason) => {
    expect(codes(made, 'refuse')).toContain(code)
    expect(said(made, code)).toMatch(reason)
    expect(made.ready).toBe(false)
    for (const one of made.lines) expect(one).toMatchObject({ value: null, min: null, max: null, text: '—' })
  })
  it('come first', () => {
    const made = card(steel(), machine([volts(14, 23, 0.5)], { calibration: {} }))
    expect(made.notices.map(({ level }) => level)).toEqual([...made.notices.map(({ level }) => level)].sort((one, other) => ['refuse', 'warn', 'note'].indexOf(one) - ['refuse', 'warn', 'note'].indexOf(other)))
    expect(made.notices[0]?.level).toBe('refuse')
  })
})

describe('warnings', () => {
  test.each([
    ['calibration-lapsed', { dueOn: '2026-11-30' }, 'warn'],
    ['calibration-unknown', {}, 'warn'],
    ['calibration-due', { dueOn: '2026-12-20' }, 'note'],
  ])('%s', (code, calibration, level) => {
    const made = card(steel(), machine([feederMode()], { calibration }))
    expect(made.notices.find((one) => one.code === code)).toMatchObject({ level, basis: expect.stringContaining('ISO 3834-2') as string })
    expect(made.ready).toBe(true)
  })
  it('of a draft: for trial beads only', () => {
    const made = card(steel(), undefined, { state: 'draft' })
    expect(said(made, 'not-approved')).toContain('trial beads only')
    expect(made.ready).toBe(true)
  })
  it('of passes with ranges of their own, until the pass is chosen', () => {
    const { variables } = steelProcedure()
    const whole = card(variables, machine([feederMode()]), { processId: 'fill' })
    expect(said(whole, 'pass-ranges')).toContain('Pass cap')
    expect(passesWithRanges(variables, 'fill')).toEqual(['cap'])
    const cap = card(variables, machine([feederMode()]), { processId: 'fill', pass: 'cap' })
    expect(codes(cap)).not.toContain('pass-ranges')
    expect(said(cap, 'watch')).toContain('180–210 A')
  })
  it('of a duty cycle that is outrun', () => {
    // 60 % · (150/180)² = 41.6 %
    expect(said(card(steel(), machine([feederMode()], { dutyCycle: { percent: 60, current: 150 } })), 'duty-cycle')).toContain('about 41 %')
    expect(codes(card(steel(), machine([feederMode()], { dutyCycle: { percent: 60, current: 180 } })))).not.toContain('duty-cycle')
  })
  it('of a missing crater fill, for aluminium and not for steel', () => {
    const pulse = feederMode({ kind: 'manual-pulse', transferModes: ['pulsed-spray'] })
    const made = card(aluminium(), machine([pulse]))
    expect(made.notices.find(({ code }) => code === 'no-crater-fill')).toMatchObject({ level: 'warn', message: expect.stringContaining('ER5356 is an aluminium filler') as string, basis: expect.stringContaining('secondary') as string })
    expect(codes(card(aluminium(), machine([{ ...pulse, has: { craterFill: true } }])))).not.toContain('no-crater-fill')
    expect(codes(card(steel()))).not.toContain('no-crater-fill')
    expect(codes(made)).toContain('pulse-settings')
  })
})

describe('the accuracy of the meters', () => {
  it('narrows what is dialled, and what the display may show', () => {
    const made = card(steel(), machine([feederMode({ controls: [{ key: 'amps', label: 'Amps', sets: 'current', unit: 'A', min: 5, max: 400, step: 1 }] })], { calibration: { dueOn: '2027-06-01', accuracy: { current: 2.5 } } }))
    expect(line(made, 'amps')).toMatchObject({ min: 185, max: 234 })
    expect(line(made, 'amps')?.because).toContain('± 2.5 %')
  })
})

describe('one knob', () => {
  it('goes by the shop’s own points of the wire, where feed and volts both hold', () => {
    const made = card(aluminium(), machine([knobMode()]))
    // 8 to 9 m/min is knob 5 to 6, there 22 to 22.8 V; 23.5 V is not reached.
    expect(line(made, 'power')).toMatchObject({ min: 5, max: 6, value: 5.5, text: '5.5' })
    expect(line(made, 'arc')).toMatchObject({ value: 0, text: '0' })
    expect(said(made, 'program-lumps')).toMatch(/2 to 3 V apart.*measured with this wire/)
    expect(made).toMatchObject({ ready: true, program: 'alu', programLabel: 'Al 1.2' })
  })
  it('refuses where feed and volts are never both inside, with the figures', () => {
    const made = card(aluminium({ voltage: interval(24, 25, 'voltage') }), machine([knobMode()]))
    expect(said(made, 'no-knob')).toContain('at 5 to 6, voltage is 22 to 22.8 V; the procedure asks for 24–25 V')
  })
  it('never goes beyond the outermost point', () => {
    const made = card(aluminium({ wireFeed: interval(9.5, 14, 'wireFeed'), voltage: interval(20, 30, 'voltage') }), machine([knobMode()]))
    expect(line(made, 'power')).toMatchObject({ min: 6.5, max: 7 })
    expect(said(card(aluminium({ wireFeed: interval(11, 14, 'wireFeed') }), machine([knobMode()])), 'no-knob')).toContain('6 to 10 m/min')
  })
  it('of another alloy, under the same button, has no points', () => {
    const made = card(aluminium({}, { filler: { ...aluminium().processes[0]!.filler, classification: 'ER4043' } }), machine([knobMode()]))
    expect(said(made, 'no-points')).toMatch(/ER5356 1\.2 mm, argon.*Measure a few points with ER4043/)
    expect(codes(made)).toContain('program-lumps')
  })
  it('says when the points were made with another gas or the program is for another diameter', () => {
    const thick = card(aluminium({}, { filler: { ...aluminium().processes[0]!.filler, diameters: [quantity(1.6, 'length')] } }), machine([knobMode()]))
    expect(said(thick, 'program-other-diameter')).toContain('wire feed falls as the wire gets thicker')
    const mixed = card(aluminium({}, { shieldingGas: { ...aluminium().processes[0]!.shieldingGas!, isoSymbol: 'I3', components: [{ gas: 'Ar', percent: 70 }, { gas: 'He', percent: 30 }] } }), machine([knobMode()]))
    expect(codes(mixed)).toEqual(expect.arrayContaining(['program-other-gas', 'no-points']))
  })
  it('that shows wire feed itself needs no points, but then the volts are not foretold', () => {
    const leading = knobMode({ controls: [{ key: 'feed', label: 'Feed', sets: 'wireFeed', unit: 'in/min', min: 50, max: 700, step: 5 }], programs: [{ key: 'alu', label: 'AlMg', wires: ['ER5356'], diameters: [1.2], gases: ['argon'] }] })
    const made = card(aluminium(), machine([leading]))
    expect(line(made, 'feed')).toMatchObject({ min: 315, max: 350 })
    expect(codes(made, 'warn')).toContain('no-points')
  })
  it('keeps clear of points that contradict each other', () => {
    const mode = knobMode()
    const [alu] = mode.programs ?? []
    const uneven = knobMode({ programs: [{ ...alu!, measured: [{ wire: 'ER5356', diameter: 1.2, gas: 'argon', points: [{ knob: 4, wireFeed: 8.2 }, { knob: 5, wireFeed: 9.5 }, { knob: 6, wireFeed: 8.5 }, { knob: 8, wireFeed: 8.9 }] }] }] })
    const made = card(aluminium({ voltage: null }), machine([uneven]))
    expect(codes(made)).toEqual(expect.arrayContaining(['points-uneven', 'stretches', 'trim-unknown']))
    expect(line(made, 'power')).toMatchObject({ min: 5.5, max: 8 })
  })
})

describe('what the procedure itself writes for the machine', () => {
  const panel = (value: string) => ({ machine: 'm-001', mode: null, caution: null, settings: [{ control: 'wire feed', hint: null, value, unit: 'm/min', scaleMin: null, scaleMax: null, min: null, max: null }] })
  it('is dialled where it lies inside', () => {
    expect(line(card(steel({ panel: panel('7.2') })), 'feed')).toMatchObject({ value: 7.2, min: 6.5, max: 9 })
  })
  it('binds with its own bar where that is narrower, rounded inward', () => {
    const [setting] = panel('7.2').settings
    const barred = { ...panel('7.2'), settings: [{ ...setting!, min: 7.03, max: 7.68 }] }
    expect(line(card(steel({ panel: barred })), 'feed')).toMatchObject({ value: 7.2, min: 7.1, max: 7.6 })
    expect(line(card(steel({ panel: { ...barred, settings: [{ ...setting!, min: 5, max: 12 }] } })), 'feed')).toMatchObject({ min: 6.5, max: 9 })
    const unlimited = card(steel({ panel: barred, wireFeed: null }))
    expect(line(unlimited, 'feed')).toMatchObject({ value: 7.2, min: 7.1, max: 7.6 })
  })
  it('gives way, with a warning, where it does not', () => {
    const made = card(steel({ panel: panel('9.6') }))
    expect(line(made, 'feed')).toMatchObject({ value: 7.8 })
    expect(said(made, 'written-outside')).toContain('9.6 m/min')
  })
  it('of another machine is none of this one’s', () => {
    expect(line(card(steel({ panel: { ...panel('7.2'), machine: 'M-002' } })), 'feed')).toMatchObject({ value: 7.8 })
  })
})

describe('properties', () => {
  const figure = (least: number, most: number) => fc.integer({ min: least * 100, max: most * 100 }).map((value) => value / 100)
  it('no figure of a card that is ready leaves the approved range', () => {
    fc.assert(
      fc.property(figure(3, 16), figure(0, 3), figure(15, 34), figure(0, 4), fc.constantFrom('m/min', 'in/min', 'cm/min'), fc.constantFrom(0.05, 0.1, 0.3, 1, 7), fc.constantFrom(0.1, 0.5, 1), fc.option(fc.constantFrom(1, 2.5, 10)), (feed, feedWidth, volts, voltsWidth, unit, feedStep, voltStep, accuracy) => {
        const scale = { 'm/min': 20, 'in/min': 790, 'cm/min': 2000 }[unit]
        const mode = feederMode({ controls: [{ key: 'feed', label: 'Feed', sets: 'wireFeed', unit, min: 1, max: scale, step: feedStep }, { key: 'volts', label: 'Volts', sets: 'voltage', unit: 'V', min: 14, max: 36, step: voltStep }] })
        const made = card(steel({ current: null, wireFeed: interval(feed, feed + feedWidth, 'wireFeed'), voltage: interval(volts, volts + voltsWidth, 'voltage') }), machine([mode], { calibration: { dueOn: '2027-01-01', accuracy: { voltage: accuracy } } }))
        for (const { quantity: of, unit: printed, value, min, max } of made.lines) {
          if (!made.ready) expect([value, min, max]).toEqual([null, null, null])
          const [lo, hi] = of === 'wireFeed' ? [feed, feed + feedWidth] : [volts, volts + voltsWidth]
          for (const shown of [value, min, max]) {
            if (shown === null) continue
            const stored = toStorage(shown, of, printed) ?? NaN
            const off = of === 'voltage' ? (accuracy ?? 0) / 100 : 0
            expect(stored * (1 - off)).toBeGreaterThanOrEqual(lo - 1e-9)
            expect(stored * (1 + off)).toBeLessThanOrEqual(hi + 1e-9)
          }
        }
      }),
      { numRuns: 200 },
    )
  })
  it('whatever the points, each knob position offered gives feed and volts inside', () => {
    const point = fc.record({ knob: figure(0, 10), wireFeed: figure(2, 16), voltage: figure(16, 28) })
    fc.assert(
      fc.property(fc.array(point, { minLength: 1, maxLength: 8 }), figure(4, 12), figure(0, 4), figure(18, 25), figure(0, 4), (points, feed, feedWidth, volts, voltsWidth) => {
        const [alu] = knobMode().programs ?? []
        const mode = knobMode({ programs: [{ ...alu!, measured: [{ wire: 'ER5356', diameter: 1.2, gas: 'argon', points }] }] })
        const content = machine([mode])
        const made = card(aluminium({ wireFeed: interval(feed, feed + feedWidth, 'wireFeed'), voltage: interval(volts, volts + voltsWidth, 'voltage') }), content)
        const given = content.modes[0]?.programs[0]?.measured[0]?.points ?? []
        const power = line(made, 'power')
        for (const knob of [power?.value, power?.min, power?.max]) {
          if (knob === null || knob === undefined) continue
          const [fed, arc] = [measuredAt(given, 'wireFeed', knob), measuredAt(given, 'voltage', knob)]
          expect(fed && fed.low >= feed && fed.high <= feed + feedWidth + 1e-9).toBe(true)
          expect(arc && arc.low >= volts && arc.high <= volts + voltsWidth + 1e-9).toBe(true)
        }
      }),
      { numRuns: 200 },
    )
  })
})

it('modes that are for the process come, those that pulse first where it pulses', () => {
  const content = machine([feederMode(), knobMode()])
  expect(modesFor(content.modes, aluminium().processes[0]).map(({ key }) => key)).toEqual(['knob', 'cv'])
  expect(modesFor(content.modes, steel({}, { process: 'FCAW' }).processes[0]).map(({ key }) => key)).toEqual(['cv'])
})
