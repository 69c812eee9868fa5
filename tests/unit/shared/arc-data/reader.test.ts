import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { ArcChoice } from '../../../../shared/schemas/arc-data.ts'
import { arcFiguresSchema, arcLayoutSchema } from '../../../../shared/schemas/arc-data.ts'
import { ArcReader } from '../../../../shared/arc-data/reader.ts'
import { ArcDataError } from '../../../../shared/arc-data/problem.ts'
import { csv, noise, square } from './signals.ts'

const read = (text: string | Uint8Array, choice: ArcChoice = {}) => {
  const reader = new ArcReader({ choice })
  reader.push(text)
  return reader.finish()
}
const refusal = (text: string | Uint8Array, choice: ArcChoice = {}): ArcDataError => {
  try {
    read(text, choice)
  } catch (error) {
    if (error instanceof ArcDataError) return error
    throw error
  }
  throw new Error('was read')
}
const steady = (count: number, current = 200, voltage = 25, rate = 1000) => Array.from({ length: count }, (_, k) => [k / rate, current, voltage] as const)

describe('power and energy', () => {
  it('of a rectangular pulse are those of the pulsed model: 3832 W where the meters say 3065.9 W', () => {
    // calculations.md 2.1: 400/50 A, 32/20 V, 120 Hz, 2.0 ms. Read with a step that divides the period.
    const { figures } = read(csv(square({ rate: 12_000, seconds: 5, frequency: 120, onTime: 0.002, peak: 400, background: 50 })))
    expect(figures.averageInstantaneousPower).toBeCloseTo(3832, -1)
    expect(figures.current.mean).toBeCloseTo(134, 0)
    expect(figures.current.rms).toBeCloseTo(200.7, 0)
    expect(figures.voltage.mean).toBeCloseTo(22.88, 1)
    expect(figures.meterPower).toBeCloseTo(3065.9, -1)
    expect(figures.meterError).toBeCloseTo(-20, 0)
    expect(figures.energy).toBeCloseTo(figures.averageInstantaneousPower * figures.arcTime, 6)
    arcFiguresSchema.parse(figures)
  })

  it('of a steady arc are volts times amperes, and the meters are right', () => {
    fc.assert(
      fc.property(fc.integer({ min: 11, max: 600 }), fc.integer({ min: 8, max: 44 }), fc.integer({ min: 20, max: 3000 }), (current, voltage, count) => {
        const { figures } = read(csv(steady(count, current, voltage)))
        expect(figures.averageInstantaneousPower).toBeCloseTo(current * voltage, 6)
        expect(figures.meterError).toBeCloseTo(0, 9)
        expect(figures.arcTime).toBeCloseTo((count - 1) / 1000, 9)
        expect(figures.energy).toBeCloseTo((current * voltage * (count - 1)) / 1000, 6)
        expect(figures.pulse).toBeNull()
      }),
      { numRuns: 40 },
    )
  })

  it('is v times i where volts fall as amperes rise, and the meters then say too much', () => {
    const { figures } = read(csv(square({ rate: 10_000, seconds: 3, frequency: 50, onTime: 0.01, peak: 300, background: 100, peakVoltage: 12, backgroundVoltage: 28 })))
    expect(figures.averageInstantaneousPower).toBeCloseTo((300 * 12 + 100 * 28) / 2, -2)
    expect(figures.meterError).toBeGreaterThan(20)
  })

  it('weights uneven steps, and counts nothing across a gap', () => {
    // A ramp in time steps that double: the trapezoid of p = 20·(100 + 100 t) is exact.
    const times = [0, 0.001, 0.003, 0.004, 0.006, 0.01, 0.011, 0.015, 0.02]
    const { figures } = read(['t;I;U', ...times.map((t) => `${t};${100 + 100 * t};20`)].join('\n'))
    expect(figures.energy).toBeCloseTo(20 * (100 * 0.02 + 50 * 0.02 ** 2), 9)
    const broken = steady(2000).map(([t, i, v]) => [t >= 1 ? t + 5 : t, i, v] as const)
    const parted = read(csv(broken)).figures
    expect(parted.gaps).toEqual({ count: 1, duration: expect.closeTo(5.001, 6) as number })
    expect(parted.arcTime).toBeCloseTo(1.998, 9)
    expect(parted.energy).toBeCloseTo(5000 * 1.998, 6)
    expect(parted.samplesPerSecond).toBeCloseTo(1000, 6)
  })

  it('spreads rows whose times are rounded', () => {
    const rows = square({ rate: 10_000, seconds: 2, frequency: 100, onTime: 0.003, peak: 350, background: 60 })
    const rounded = read(csv(rows, undefined, 3)).figures
    const exact = read(csv(rows)).figures
    expect(rounded.averageInstantaneousPower).toBeCloseTo(exact.averageInstantaneousPower, -1)
    expect(rounded.pulse?.frequency).toBeCloseTo(100, 1)
  })
})

describe('the arc', () => {
  it('is timed without what lies before, between and after; a short drop is no stop', () => {
    const at = (t: number) => (t < 1 || t >= 9 ? 0 : t >= 4 && t < 6 ? 1 : t >= 7 && t < 7.02 ? 0 : 180)
    const rows = Array.from({ length: 10_000 }, (_, k) => [k / 1000, at(k / 1000), at(k / 1000) > 10 ? 24 : 60] as const)
    const { figures } = read(csv(rows))
    expect(figures.stopCount).toBe(1)
    expect(figures.stops[0]?.from).toBeCloseTo(4, 2)
    expect(figures.stops[0]?.to).toBeCloseTo(6, 2)
    expect(figures.arcTime).toBeCloseTo(6, 1)
    expect(figures.voltage.mean).toBeLessThan(25)
    // The short drop belongs to the arc, the open circuit does not.
    expect(figures.current.min).toBe(0)
    const before = read(csv(rows.slice(0, 6900))).figures
    expect([before.current.min, before.voltage.max]).toEqual([180, 24])
  })

  it('alternating is found, compared by RMS, its power from v times i', () => {
    const rows = Array.from({ length: 20_000 }, (_, k) => {
      const sine = Math.sin((2 * Math.PI * 60 * k) / 10_000)
      return [k / 10_000, 200 * sine, 15 * sine] as const
    })
    const { figures } = read(csv(rows))
    expect(figures.alternating).toBe(true)
    expect(figures.averageInstantaneousPower).toBeCloseTo(1500, -1)
    expect(figures.meterError).toBeCloseTo(0, 1)
    expect(figures.stopCount).toBe(0)
    expect(figures.pulse).toBeNull()
  })

  it('with one lead turned round is told, and its energy is positive', () => {
    const { figures } = read(csv(steady(500, -150, 22)))
    expect(figures.averageInstantaneousPower).toBeCloseTo(3300, 6)
    expect(figures.said.join(' ')).toContain('the other way round')
  })

  it('that never burned refuses the file', () => {
    expect(refusal(csv(steady(500, 0.2, 22))).message).toMatch(/^No arc was found: .* 0\.2 A/)
    expect(read(csv(steady(500, 0.2, 22)), { currentUnit: 'kA' }).figures.current.mean).toBeCloseTo(200, 9)
  })
})

describe('pulses', () => {
  it('of any usual square wave are measured: frequency, levels, on-time', () => {
    fc.assert(
      fc.property(fc.integer({ min: 20, max: 400 }), fc.integer({ min: 10, max: 80 }), fc.integer({ min: 250, max: 565 }), fc.integer({ min: 20, max: 120 }), fc.integer({ min: 0, max: 5 }), fc.nat(1000), (frequency, duty, peak, background, share, seed) => {
        const onTime = duty / 100 / frequency
        fc.pre(onTime >= 0.0004 && 1 / frequency - onTime >= 0.0004)
        const { pulse } = read(csv(square({ rate: 10_000, seconds: 2, frequency, onTime, peak, background, noise: share / 100, seed }))).figures
        expect(pulse).not.toBeNull()
        expect(Math.abs((pulse?.frequency ?? 0) / frequency - 1)).toBeLessThan(0.01)
        expect(Math.abs((pulse?.onTime ?? 0) - onTime)).toBeLessThan(0.0001)
        expect(Math.abs((pulse?.peakCurrent ?? 0) - peak)).toBeLessThan(0.03 * (peak - background))
        expect(Math.abs((pulse?.backgroundCurrent ?? 0) - background)).toBeLessThan(0.03 * (peak - background))
        expect(Math.abs((pulse?.count ?? 0) - 2 * frequency)).toBeLessThan(2 + 0.01 * frequency)
      }),
      { numRuns: 25 },
    )
  })

  it('slower than a block are found too, as in pulsed GTAW', () => {
    const { pulse } = read(csv(square({ rate: 5000, seconds: 30, frequency: 1, onTime: 0.4, peak: 160, background: 40 }))).figures
    expect(pulse?.frequency).toBeCloseTo(1, 2)
    expect(pulse?.onTime).toBeCloseTo(0.4, 1)
  })

  it.each([
    ['a steady current with noise', (k: number, random: () => number) => 200 + 8 * random(), /not pulsed/],
    ['ripple of a rectifier', (k: number) => 200 + 60 * Math.sin((2 * Math.PI * 300 * k) / 10_000), /not told as pulsed/],
    ['short circuits at odd times', (() => {
      let left = 0
      let wait = 0
      return (_k: number, random: () => number) => {
        if (left > 0) left--
        else if (--wait <= 0) {
          left = 10 + Math.round(5 * random())
          wait = 20 + Math.round(150 * (random() + 1) ** 2)
        }
        return left > 0 ? 330 : 120
      }
    })(), /not at regular intervals/],
  ])('%s is not called pulsed', (_what, current, why) => {
    const random = noise(7)
    const { pulse, said } = read(csv(Array.from({ length: 40_000 }, (_, k) => [k / 10_000, current(k, random), 22] as const))).figures
    expect(pulse).toBeNull()
    expect(said.join(' ')).toMatch(why)
  })

  it('of few samples each are measured without leaning to the shorter', () => {
    const { pulse } = read(csv(square({ rate: 2000, seconds: 6, frequency: 110, onTime: 0.0021, peak: 388, background: 85 }))).figures
    expect(pulse?.onTime).toBeCloseTo(0.0021, 4)
    expect(pulse?.frequency).toBeCloseTo(110, 1)
  })

  it('sampled too slowly are not measured', () => {
    const { pulse } = read(csv(square({ rate: 300, seconds: 20, frequency: 120, onTime: 0.003, peak: 400, background: 50 }))).figures
    expect(pulse).toBeNull()
  })
})

describe('however the file is cut', () => {
  const text = csv(square({ rate: 10_000, seconds: 1.2, frequency: 90, onTime: 0.0025, peak: 380, background: 55, noise: 0.05 })).replace(/(\n[^\n]*){40}/, (part) => `${part}\nlost sample,,`)
  const bytes = new TextEncoder().encode(text)
  const whole = read(bytes)

  it('every figure and the plot are the same', () => {
    expect(whole.figures.badRows).toBe(1)
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 1, max: 70_000 }), { minLength: 1, maxLength: 12 }), (sizes) => {
        const reader = new ArcReader()
        for (let at = 0, turn = 0; at < bytes.length; turn++) {
          const size = sizes[turn % sizes.length] ?? 1
          reader.push(bytes.subarray(at, at + size))
          at += size
        }
        expect(reader.finish()).toEqual(whole)
      }),
      { numRuns: 25 },
    )
  })

  it('as text, with CR LF, or as UTF-16, too', () => {
    expect(read(text)).toEqual(whole)
    expect(read(text.replaceAll('\n', '\r\n')).figures).toEqual(whole.figures)
    for (const [first, encoding] of [[0xff, 'utf-16le'], [0xfe, 'utf-16be']] as const) {
      const wide = new Uint8Array(2 + text.length * 2)
      wide.set(first === 0xff ? [0xff, 0xfe] : [0xfe, 0xff])
      for (let at = 0; at < text.length; at++) wide[2 + at * 2 + (first === 0xff ? 0 : 1)] = text.charCodeAt(at)
      const reader = new ArcReader()
      for (let at = 0; at < wide.length; at += 4097) reader.push(wide.subarray(at, at + 4097))
      const { figures, layout } = reader.finish()
      expect(layout.encoding).toBe(encoding)
      expect(figures).toEqual(whole.figures)
    }
  })
})

describe('bad rows', () => {
  it('are named with their row, and left out', () => {
    const lines = csv(steady(200)).split('\n')
    lines[10] = '0.009,fault,25.00'
    lines[20] = '0.019,200.00'
    lines[30] = ''
    const { figures } = read(lines.join('\n'))
    expect(figures.bad).toEqual([
      { row: 11, text: '0.009,fault,25.00', why: 'the current (column 2) is not a number' },
      { row: 21, text: '0.019,200.00', why: 'the column of the voltage (column 3) is missing or empty' },
    ])
    expect(figures.rows).toBe(197)
    expect(figures.averageInstantaneousPower).toBeCloseTo(5000, 6)
  })

  it('too many refuse the file at the first, and at most twenty are kept', () => {
    const lines = csv(steady(1000)).split('\n').map((line, at) => (at > 100 && at % 10 === 0 ? 'x,y,z' : line))
    const refused = refusal(lines.join('\n'))
    expect(refused.row).toBe(111)
    expect(refused.message).toMatch(/^90 of 1000 rows cannot be used.*row 111, “x,y,z”: the time \(column 1\) is not a number/)
    const few = csv(steady(1000)).split('\n').map((line, at) => (at > 100 && at % 30 === 0 ? 'x,y,z' : line))
    expect(read(few.join('\n')).figures.bad).toHaveLength(20)
  })

  it('whose time goes back are named', () => {
    const lines = csv(steady(100)).split('\n')
    lines[50] = '0.001,200.00,25.00'
    expect(read(lines.join('\n')).figures.bad).toEqual([{ row: 51, text: '0.001', why: 'its time lies before that of the row above' }])
  })
})

describe('what can’t be read says so in a sentence', () => {
  it.each<[string, string | Uint8Array, RegExp]>([
    ['nothing', '', /is empty/],
    ['blank lines', '\n\n\n', /is empty/],
    ['a head without rows', 'Time (s),Current (A),Voltage (V)\n', /No rows of figures .*“Time \(s\),Current/],
    ['words', 'Dear all,\nplease find attached.\n', /No rows of figures/],
    ['one column', 'I\n1.5\n2.5\n3.5\n2.5\n', /Only one column/],
    ['bytes of a picture', Uint8Array.from({ length: 3000 }, (_, at) => (at * 7919) % 256), /not a text file/],
    ['a line without end', `t,i,u\n${'1,'.repeat(60_000)}`, /longer than|No rows|could not be told/],
    ['six columns without heads', 'a\n1,20,200,5,6,7\n2,21,180,8,2,9\n3,20,200,1,2,3\n', /could not be told from the 6 columns/],
    ['commas for both', 't,I,U\n0,1,20,3,180,2\n0,2,20,4,181,2\n0,3,20,4,182,2\n', /comma seems to stand both/],
    ['one sample', 'Time (s),Current (A),Voltage (V)\n0,200,25', /one sample only/],
  ])('%s', (_what, file, sentence) => {
    expect(refusal(file).message).toMatch(sentence)
  })

  it('a NUL within a row is that row’s fault', () => {
    const { bad } = read(csv(steady(300)).replace('0.100000,200.00', '0.100000,2\u00000.00')).figures
    expect(bad).toEqual([{ row: 102, text: '0.100000,2·0.00,25.00', why: 'the current (column 2) is not a number' }])
  })

  it('time that stands still', () => {
    expect(refusal(['t (s),I (A),U (V)', ...Array.from({ length: 300 }, () => '1.0,200,25')].join('\n')).message).toMatch(/time is the same in every row/)
    expect(refusal(['t (s),I (A),U (V)', '0,1,1', ...Array.from({ length: 5000 }, () => '1.0,200,25')].join('\n')).message).toMatch(/stands still/)
  })
})

it('plots within 2000 stretches without losing the highest or lowest', () => {
  fc.assert(
    fc.property(fc.integer({ min: 2, max: 30_000 }), fc.nat(), fc.nat(), (count, high, low) => {
      const rows = Array.from({ length: count }, (_, k) => [k / 1000, k === high % count ? 999 : 200, k === low % count ? 1 : 25] as const)
      const { plot } = read(csv(rows))
      expect(plot.t.length).toBeLessThanOrEqual(2000)
      expect(Math.max(...plot.currentMax)).toBe(999)
      expect(Math.min(...plot.voltageMin)).toBe(1)
      expect(plot.t.every((t, at) => at === 0 || t > (plot.t[at - 1] ?? 0))).toBe(true)
    }),
    { numRuns: 20 },
  )
})

it('reads a window again, in more detail', () => {
  const bytes = new TextEncoder().encode(csv(square({ rate: 10_000, seconds: 4, frequency: 120, onTime: 0.002, peak: 400, background: 50 })))
  const { layout, plot } = read(bytes)
  expect(plot.t.length).toBeLessThanOrEqual(2000)
  const reader = new ArcReader({ layout: arcLayoutSchema.parse(layout), window: { from: 1, to: 1.05 } })
  reader.push(bytes)
  expect(reader.done).toBe(true)
  const window = reader.finish().plot
  expect(window.t).toHaveLength(501)
  expect(window.currentMin).toEqual(window.currentMax)
})
