/** Times of the samples: strictly rising seconds from 0, whatever the file's time column is like. */
import { ArcDataError } from './problem.ts'

/** Rows that may share one rounded time. */
const MOST_ALIKE = 4096
const WARM_UP = 256
/** A step this many times the usual one is a gap. */
const GAP_STEPS = 10

export interface SampleSink {
  /** @param gap nothing was recorded between this sample and the one before */
  sample: (time: number, current: number, voltage: number, gap: boolean) => void
}

/** Spreads rows that share a rounded time evenly up to the next, and finds the gaps. */
export class Clock {
  gaps = 0
  gapTime = 0
  /** Usual step, s; known after the first steps or at the end. */
  step = 0
  last = 0
  samples = 0
  private readonly sink: SampleSink
  private readonly period: number | null
  private origin = NaN
  private groupTime = NaN
  private groupStep = 0
  private group = 0
  private readonly currents = new Float64Array(MOST_ALIKE)
  private readonly voltages = new Float64Array(MOST_ALIKE)
  private early: { t: number; i: number; v: number }[] | null = []

  /** @param samplesPerSecond where there is no time column; then `add` takes the number of the row from 0 as time */
  constructor(sink: SampleSink, samplesPerSecond: number | null) {
    this.sink = sink
    this.period = samplesPerSecond === null ? null : 1 / samplesPerSecond
  }

  /** @returns false when the time goes back, so that the row can't be used. @throws ArcDataError when the time stands still */
  add(line: number, time: number, current: number, voltage: number): boolean {
    if (this.period !== null) {
      this.emit(time * this.period, current, voltage)
      return true
    }
    if (Number.isNaN(this.origin)) this.origin = time
    const t = time - this.origin
    if (this.group > 0 && t < this.groupTime) return false
    if (this.group > 0 && t > this.groupTime) this.flush(t - this.groupTime)
    if (this.group === MOST_ALIKE) throw new ArcDataError(`From row ${line - MOST_ALIKE} on the time stands still for more than ${MOST_ALIKE} rows. Choose another time column, or say that there is none and give the sample rate.`, { row: line - MOST_ALIKE, asks: 'columns' })
    this.groupTime = t
    this.currents[this.group] = current
    this.voltages[this.group] = voltage
    this.group++
    return true
  }

  /** @throws ArcDataError when all rows have one time */
  end(): void {
    if (this.group > 1 && this.groupStep === 0) throw new ArcDataError('The time is the same in every row. Choose another time column, or say that there is none and give the sample rate.', { asks: 'columns' })
    if (this.group > 0) this.flush(this.groupStep)
    this.warm()
  }

  private flush(step: number): void {
    const usual = this.groupStep
    // Across a gap the rows before it stand as close as they did before.
    const spread = (usual > 0 && step > GAP_STEPS * usual ? usual : step) / this.group
    for (let at = 0; at < this.group; at++) this.emit(this.groupTime + at * spread, this.currents[at] ?? 0, this.voltages[at] ?? 0)
    if (!(usual > 0 && step > GAP_STEPS * usual)) this.groupStep = step
    this.group = 0
  }

  private emit(t: number, i: number, v: number): void {
    if (this.early) {
      this.early.push({ t, i, v })
      if (this.early.length > WARM_UP) this.warm()
      return
    }
    this.pass(t, i, v)
  }

  /** The usual step is the middle one of the first; only then is it known what is a gap. */
  private warm(): void {
    const { early } = this
    if (!early) return
    this.early = null
    const steps = early.slice(1).map(({ t }, at) => t - (early[at]?.t ?? 0)).sort((a, b) => a - b)
    this.step = this.period ?? steps[steps.length >> 1] ?? 0
    for (const { t, i, v } of early) this.pass(t, i, v)
  }

  private pass(t: number, i: number, v: number): void {
    const step = t - this.last
    const gap = this.samples > 0 && this.step > 0 && step > GAP_STEPS * this.step
    if (gap) {
      this.gaps++
      this.gapTime += step
    }
    this.samples++
    this.last = t
    this.sink.sample(t, i, v, gap)
  }
}
