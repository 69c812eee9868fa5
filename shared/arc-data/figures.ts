/** What one pass over the samples yields, in bounded memory. */
import type { ArcFigures } from '../schemas/arc-data.ts'
import { PulseFinder } from './pulses.ts'

/** The arc burns from this current on; our own choice, documented on the recording's page. A. */
export const ARC_ON = 10
/** Below this it may have stopped … A */
export const ARC_OFF = 5
/** … and has, when it stays there so long; a short circuit or a zero crossing of alternating current is shorter. s */
export const STOP_AFTER = 0.05
const MOST_STOPS = 500

/** Sums over time of one stretch, by the trapezoid of each step. */
class Sums {
  time = 0
  current = 0
  voltage = 0
  currentSquared = 0
  voltageSquared = 0
  energy = 0
  currentMin = Infinity
  currentMax = -Infinity
  voltageMin = Infinity
  voltageMax = -Infinity

  extremes(i: number, v: number): void {
    if (i < this.currentMin) this.currentMin = i
    if (i > this.currentMax) this.currentMax = i
    if (v < this.voltageMin) this.voltageMin = v
    if (v > this.voltageMax) this.voltageMax = v
  }

  step(dt: number, i0: number, v0: number, i: number, v: number): void {
    const half = dt / 2
    this.time += dt
    this.current += half * (i0 + i)
    this.voltage += half * (v0 + v)
    this.currentSquared += half * (i0 * i0 + i * i)
    this.voltageSquared += half * (v0 * v0 + v * v)
    this.energy += half * (i0 * v0 + i * v)
  }

  join(other: Sums): void {
    this.time += other.time
    this.current += other.current
    this.voltage += other.voltage
    this.currentSquared += other.currentSquared
    this.voltageSquared += other.voltageSquared
    this.energy += other.energy
    if (other.currentMin === Infinity) return
    this.extremes(other.currentMin, other.voltageMin)
    this.extremes(other.currentMax, other.voltageMax)
  }
}

export type BurningFigures = Pick<ArcFigures, 'arcTime' | 'stops' | 'stopCount' | 'current' | 'voltage' | 'averageInstantaneousPower' | 'energy' | 'meterPower' | 'meterError' | 'pulse' | 'alternating' | 'said'>

export class Accumulator {
  private readonly sums = new Sums()
  private low = new Sums()
  private readonly pulses = new PulseFinder()
  private readonly stops: { from: number; to: number }[] = []
  private stopCount = 0
  private samples = 0
  private t0 = 0
  private i0 = 0
  private v0 = 0
  private burning = false
  /** The current is below ARC_OFF since then; NaN while it is not. */
  private lowSince = NaN
  private wentOut = NaN
  private sign = 0
  private turns = 0
  private highest = 0

  /** @param t strictly rising, s; `gap`: nothing was recorded since the sample before */
  sample(t: number, i: number, v: number, gap: boolean): void {
    const size = Math.abs(i)
    if (size > this.highest) this.highest = size
    if (gap && this.burning) {
      this.pulses.break()
      // Whether the arc burned across a gap is not known: it is looked at anew.
      if (size < ARC_OFF) this.goOut(Number.isNaN(this.lowSince) ? this.t0 : this.lowSince)
    }
    if (!this.burning) {
      if (size >= ARC_ON) this.ignite(t, i, v)
    } else if (Number.isNaN(this.lowSince)) {
      if (!gap && this.samples > 0) this.sums.step(t - this.t0, this.i0, this.v0, i, v)
      if (size < ARC_OFF) {
        this.lowSince = t
        // Its reading counts only when the arc turns out to have burned on.
        this.low = new Sums()
        this.low.extremes(i, v)
      } else {
        this.sums.extremes(i, v)
        this.pulses.add(t, size)
      }
    } else {
      if (!gap) this.low.step(t - this.t0, this.i0, this.v0, i, v)
      this.low.extremes(i, v)
      if (size >= ARC_ON) {
        this.sums.join(this.low)
        this.lowSince = NaN
        this.pulses.add(t, size)
      } else if (t - this.lowSince >= STOP_AFTER) this.goOut(this.lowSince)
    }
    if (this.burning && size >= ARC_ON) {
      const sign = i < 0 ? -1 : 1
      if (this.sign !== 0 && sign !== this.sign) this.turns++
      this.sign = sign
    }
    this.samples++
    this.t0 = t
    this.i0 = i
    this.v0 = v
  }

  private ignite(t: number, i: number, v: number): void {
    this.burning = true
    this.lowSince = NaN
    this.sums.extremes(i, v)
    if (!Number.isNaN(this.wentOut)) {
      this.stopCount++
      if (this.stops.length < MOST_STOPS) this.stops.push({ from: this.wentOut, to: t })
    }
    this.pulses.add(t, Math.abs(i))
  }

  private goOut(at: number): void {
    this.burning = false
    this.wentOut = at
    this.lowSince = NaN
    this.sign = 0
    this.pulses.break()
  }

  /** Highest current of all, A: where no arc was found it says why. */
  get highestCurrent(): number {
    return this.highest
  }
  get arcTime(): number {
    return this.sums.time
  }

  /** @param step usual time between two samples, s. Only where `arcTime` is above 0. */
  result(step: number): BurningFigures {
    const { sums } = this
    const mean = (sum: number) => sum / sums.time
    const rms = (squares: number) => Math.sqrt(squares / sums.time)
    const said: string[] = []
    const frequency = this.turns / 2 / sums.time
    // A few turns are noise about zero; alternating current turns all the time.
    const alternating = this.turns >= 10 && frequency >= 5
    const turned = sums.energy < 0
    if (turned) said.push('Volts times amperes came out negative, so one of the two leads was connected the other way round. The sign of power and energy was turned.')
    const energy = Math.abs(sums.energy)
    const power = energy / sums.time
    const current = { mean: mean(sums.current), rms: rms(sums.currentSquared), min: sums.currentMin, max: sums.currentMax }
    const voltage = { mean: mean(sums.voltage), rms: rms(sums.voltageSquared), min: sums.voltageMin, max: sums.voltageMax }
    const meterPower = alternating ? current.rms * voltage.rms : Math.abs(current.mean * voltage.mean)
    if (alternating) said.push(`Alternating current, about ${frequency.toFixed(0)} Hz. The power stays volts times amperes sample by sample; meters for alternating current show RMS values, so those are compared. Pulses are not looked for.`)
    const found = this.pulses.result(step)
    if (!alternating && found.why) said.push(found.why)
    if (this.stopCount > MOST_STOPS) said.push(`${this.stopCount} stops were counted; the first ${MOST_STOPS} are listed.`)
    return {
      arcTime: sums.time, stops: this.stops, stopCount: this.stopCount, current, voltage, averageInstantaneousPower: power, energy, meterPower,
      meterError: power > 0 ? (meterPower / power - 1) * 100 : 0, pulse: alternating ? null : found.pulse, alternating, said,
    }
  }
}
