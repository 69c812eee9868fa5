/** A recording read in one pass, from pieces of any size. */
import type { ArcChoice, ArcFigures, ArcLayout, ArcPlot } from '../schemas/arc-data.ts'
import { Clock } from './clock.ts'
import { Narrower, encodingOf } from './encoding.ts'
import { Accumulator } from './figures.ts'
import { guessLayout, HEAD_BYTES } from './layout.ts'
import { Decimator } from './plot.ts'
import { ArcDataError } from './problem.ts'
import { RowReader } from './rows.ts'

const BAD_KEPT = 20
/** More than so many rows, and more than that share of all, that can't be used: the file is refused. */
const BAD_ALLOWED = 3
const BAD_SHARE = 0.05
const BAD_EARLY = 1000

const TIME_FACTOR = { s: 1, ms: 1e-3, µs: 1e-6, none: 1 } as const
const CURRENT_FACTOR = { A: 1, kA: 1000, mA: 1e-3 } as const
const VOLTAGE_FACTOR = { V: 1, kV: 1000, mV: 1e-3 } as const

export interface ArcReading { layout: ArcLayout; figures: ArcFigures; plot: ArcPlot }
export interface ArcReaderOptions {
  /** What a person says of the columns; the rest is found. */
  choice?: ArcChoice
  /** As found before: reading again finds nothing anew. */
  layout?: ArcLayout
  /** s; only the samples within are plotted, and nothing is computed. */
  window?: { from: number; to: number }
}

/**
 * Give it the file piece by piece (`push`), then `finish`. Its memory does not grow with the file.
 * Average instantaneous power is the mean of v·i over the time in
 * which the arc burns, weighted by the steps (trapezoid); energy its integral (ASME IX QW-409.1(c); secondary).
 */
export class ArcReader {
  private readonly options: ArcReaderOptions
  private head: Uint8Array | null = new Uint8Array(HEAD_BYTES)
  private headLength = 0
  private layout: ArcLayout | null = null
  private doubts: readonly string[] = []
  private rows: RowReader | null = null
  private narrower: Narrower | null = null
  private clock: Clock | null = null
  private readonly accumulator = new Accumulator()
  private readonly decimator = new Decimator()
  private good = 0
  private badRows = 0
  private readonly bad: ArcFigures['bad'] = []
  private text: TextEncoder | null = null
  /** True once nothing that follows can matter: the window lies behind. */
  done = false

  constructor(options: ArcReaderOptions = {}) {
    this.options = options
  }

  /** Samples taken in so far. */
  get samples(): number {
    return this.good
  }

  /** @throws ArcDataError as soon as the file can't be read */
  push(piece: Uint8Array | string): void {
    let bytes = typeof piece === 'string' ? (this.text ??= new TextEncoder()).encode(piece) : piece
    if (this.head) {
      const taken = Math.min(bytes.length, HEAD_BYTES - this.headLength)
      this.head.set(bytes.subarray(0, taken), this.headLength)
      this.headLength += taken
      if (this.headLength < HEAD_BYTES) return
      this.begin(false)
      bytes = bytes.subarray(taken)
    }
    this.feed(bytes)
  }

  /** @throws ArcDataError when no arc, or no usable rows, were found */
  finish(): ArcReading {
    if (this.head) this.begin(true)
    this.rows?.end()
    this.clock?.end()
    const { layout, clock } = this
    if (!layout || !clock) throw new ArcDataError('The file is empty. Choose it again; it may not have been copied whole.')
    if (this.options.window) return { layout, figures: this.figuresOf(clock, null), plot: this.decimator.plot() }
    if (this.good < 2) throw this.tooFew()
    if (this.badRows > BAD_ALLOWED && this.badRows > (this.good + this.badRows) * BAD_SHARE) throw this.tooMany()
    if (!(this.accumulator.arcTime > 0)) {
      throw new ArcDataError(`No arc was found: the current never stays above 10 A (the highest is ${Number(this.accumulator.highestCurrent.toPrecision(3))} A). Check which column is the current and its unit.`, { asks: 'columns' })
    }
    return { layout, figures: this.figuresOf(clock, this.accumulator.result(clock.step)), plot: this.decimator.plot() }
  }

  private begin(whole: boolean): void {
    const head = (this.head ?? new Uint8Array()).subarray(0, this.headLength)
    this.head = null
    const guess = guessLayout(head, this.options.layout ? choiceOf(this.options.layout) : this.options.choice, whole)
    if (guess.needsRate) throw new ArcDataError('No time column was found. Give the sample rate, in samples per second, or choose the column of the time.', { asks: 'samplesPerSecond' })
    const layout = this.options.layout ?? guess.layout
    this.layout = layout
    this.doubts = guess.doubts
    this.clock = new Clock({ sample: (t, i, v, gap) => this.take(t, i, v, gap) }, layout.samplesPerSecond)
    this.narrower = new Narrower(layout.encoding)
    const timeFactor = TIME_FACTOR[layout.timeUnit]
    const currentFactor = CURRENT_FACTOR[layout.currentUnit]
    const voltageFactor = VOLTAGE_FACTOR[layout.voltageUnit]
    const { clock } = this
    this.rows = new RowReader(layout, guess.eol, {
      row: (line, time, current, voltage) => {
        // Without a time column every row has its place, those that can't be used too.
        const at = layout.columns.time === null ? this.good + this.badRows : time * timeFactor
        if (clock.add(line, at, current * currentFactor, voltage * voltageFactor)) this.good++
        else this.refuse(line, String(time), 'its time lies before that of the row above')
      },
      bad: (line, text, why) => this.refuse(line, text, why),
    })
    this.feed(head.subarray(encodingOf(head).mark))
  }

  private feed(bytes: Uint8Array): void {
    if (this.done || !this.rows || !this.narrower) return
    this.rows.push(this.narrower.push(bytes))
  }

  private take(t: number, i: number, v: number, gap: boolean): void {
    const { window } = this.options
    if (window) {
      if (t > window.to) this.done = true
      else if (t >= window.from) this.decimator.add(t, i, v)
      return
    }
    this.decimator.add(t, i, v)
    this.accumulator.sample(t, i, v, gap)
  }

  private refuse(row: number, text: string, why: string): void {
    this.badRows++
    if (this.bad.length < BAD_KEPT) this.bad.push({ row, text, why })
    if (this.badRows >= BAD_EARLY && this.badRows > this.good) throw this.tooMany()
  }

  private tooMany(): ArcDataError {
    const first = this.bad[0]
    return new ArcDataError(`${this.badRows} of ${this.good + this.badRows} rows cannot be used, too many to trust the rest.${first ? ` The first is row ${first.row}, “${first.text}”: ${first.why}.` : ''} Mend the file, or choose other columns.`, { row: first?.row ?? null, asks: 'columns' })
  }

  private tooFew(): ArcDataError {
    const first = this.bad[0]
    return new ArcDataError(`The file holds ${this.good === 0 ? 'no sample' : 'one sample only'} that can be used; at least two are needed.${first ? ` Row ${first.row}, “${first.text}”: ${first.why}.` : ''}`, { row: first?.row ?? null })
  }

  private figuresOf(clock: Clock, burning: ReturnType<Accumulator['result']> | null): ArcFigures {
    const recorded = clock.last - clock.gapTime
    const samplesPerSecond = this.options.window || recorded <= 0 ? null : (clock.samples - 1 - clock.gaps) / recorded
    const none = { mean: 0, rms: 0, min: 0, max: 0 }
    return {
      rows: this.good, badRows: this.badRows, bad: this.bad, gaps: { count: clock.gaps, duration: clock.gapTime }, samplesPerSecond, duration: clock.last,
      ...(burning ?? { arcTime: 0, stops: [], stopCount: 0, current: none, voltage: none, averageInstantaneousPower: 0, energy: 0, meterPower: 0, meterError: 0, pulse: null, alternating: false }),
      said: [...this.doubts, ...this.remarks(clock, samplesPerSecond), ...(burning?.said ?? [])],
    }
  }

  private remarks(clock: Clock, samplesPerSecond: number | null): string[] {
    const said: string[] = []
    if (this.badRows > 0) said.push(`${this.badRows} ${this.badRows === 1 ? 'row was' : 'rows were'} left out.`)
    if (clock.gaps > 0) said.push(`${clock.gaps} ${clock.gaps === 1 ? 'gap' : 'gaps'} of ${Number(clock.gapTime.toPrecision(3))} s in all, in which nothing was recorded; nothing is counted across ${clock.gaps === 1 ? 'it' : 'them'}.`)
    if (samplesPerSecond !== null && samplesPerSecond < 1000) said.push(`Recorded with ${Number(samplesPerSecond.toPrecision(3))} samples a second. That is too slow to follow a pulsed arc; power sources that show instantaneous energy sample in the order of 10 000 a second.`)
    return said
  }
}

const choiceOf = ({ columns, timeUnit, currentUnit, voltageUnit, samplesPerSecond }: ArcLayout): ArcChoice => ({ time: columns.time ?? -1, current: columns.current, voltage: columns.voltage, currentUnit, voltageUnit, ...(timeUnit !== 'none' && { timeUnit }), ...(samplesPerSecond !== null && { samplesPerSecond }) })
