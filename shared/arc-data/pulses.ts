/**
 * Pulses found in a sampled current. The current is looked at in blocks: two levels are told apart by Otsu's threshold on the block's
 * histogram (Otsu 1979; between-class against total variance), and the crossings between them are timed with hysteresis, so that noise
 * on a level makes no pulse. The same is done on means of 16 and 256 samples, for pulses slower than a block.
 */
import type { ArcFigures } from '../schemas/arc-data.ts'

const BLOCK = 4096
const SMALLEST_BLOCK = 64
const BINS = 128
/** A sine reaches 0.81 and a triangle 0.75 between two classes; a square wave with some noise over 0.9. */
const APART = 0.86
const LEAST_SWING = 20
const LEAST_SHARE = 0.2
const LEAST_PULSES = 10

/** Times by size in 2 % steps, 1 µs to 1000 s, with their sums: median and a trimmed mean without keeping them. */
class Times {
  private readonly counts = new Float64Array(1040)
  private readonly sums = new Float64Array(1040)
  count = 0

  add(seconds: number): void {
    if (!(seconds > 0)) return
    const bin = Math.min(1039, Math.max(0, Math.floor(Math.log(seconds / 1e-6) / 0.02)))
    this.counts[bin] = (this.counts[bin] ?? 0) + 1
    this.sums[bin] = (this.sums[bin] ?? 0) + seconds
    this.count++
  }

  /** Mean of those within 20 % of the middle one, or one and a half steps where that is more, and what share of all they are. */
  usual(step: number): { mean: number; share: number } {
    let at = 0
    for (let below = this.counts[0] ?? 0; below < this.count / 2 && at < 1039; below += this.counts[at] ?? 0) at++
    let count = 0
    let sum = 0
    const reach = Math.ceil(Math.log(1 + Math.max(0.2, (1.5 * step) / (1e-6 * Math.exp(at * 0.02)))) / 0.02)
    for (let bin = Math.max(0, at - reach); bin <= Math.min(1039, at + reach); bin++) {
      count += this.counts[bin] ?? 0
      sum += this.sums[bin] ?? 0
    }
    return { mean: sum / count, share: count / this.count }
  }
}

class Scale {
  samples = 0
  pulsing = 0
  flat = 0
  readonly periods = new Times()
  readonly onTimes = new Times()
  private peakSum = 0
  private peaks = 0
  private baseSum = 0
  private bases = 0
  private readonly t = new Float64Array(BLOCK)
  private readonly i = new Float64Array(BLOCK)
  private readonly bins = new Float64Array(BINS)
  private n = 0
  private high: boolean | null = null
  private before = NaN
  private beforeAt = NaN
  private up = NaN
  private down = NaN
  private risen = NaN

  add(time: number, current: number): void {
    this.t[this.n] = time
    this.i[this.n] = current
    if (++this.n === BLOCK) this.block()
  }

  /** No pulse reaches across a stop or a gap. */
  break(): void {
    if (this.n >= SMALLEST_BLOCK) this.block()
    this.n = 0
    this.forget()
  }

  get peakCurrent(): number {
    return this.peakSum / this.peaks
  }
  get backgroundCurrent(): number {
    return this.baseSum / this.bases
  }

  private forget(): void {
    this.high = null
    this.before = this.risen = NaN
  }

  private block(): void {
    const { i, n } = this
    this.n = 0
    this.samples += n
    let low = Infinity
    let top = -Infinity
    let sum = 0
    for (let at = 0; at < n; at++) {
      const value = i[at] ?? 0
      if (value < low) low = value
      if (value > top) top = value
      sum += value
    }
    if (top - low < Math.max(LEAST_SWING, (LEAST_SHARE * sum) / n)) {
      this.flat += n
      this.forget()
      return
    }
    const levels = this.twoLevels(n, low, top)
    if (levels.apart < APART || levels.upper - levels.lower < Math.max(LEAST_SWING, (LEAST_SHARE * sum) / n)) {
      this.forget()
      return
    }
    this.pulsing += n
    this.edges(n, levels.lower, levels.upper)
  }

  private twoLevels(n: number, low: number, top: number): { lower: number; upper: number; apart: number } {
    const { bins, i } = this
    bins.fill(0)
    const width = (top - low) / BINS
    for (let at = 0; at < n; at++) {
      const bin = Math.min(BINS - 1, Math.floor(((i[at] ?? 0) - low) / width))
      bins[bin] = (bins[bin] ?? 0) + 1
    }
    let total = 0
    let squares = 0
    for (let bin = 0; bin < BINS; bin++) {
      total += bin * (bins[bin] ?? 0)
      squares += bin * bin * (bins[bin] ?? 0)
    }
    const variance = squares / n - (total / n) ** 2
    let best = 0
    let lower = 0
    let upper = 0
    let count = 0
    let sum = 0
    for (let bin = 0; bin < BINS - 1; bin++) {
      count += bins[bin] ?? 0
      sum += bin * (bins[bin] ?? 0)
      if (count === 0 || count === n) continue
      const a = sum / count
      const b = (total - sum) / (n - count)
      const between = (count / n) * (1 - count / n) * (b - a) ** 2
      if (between > best) {
        best = between
        lower = a
        upper = b
      }
    }
    return { lower: low + (lower + 0.5) * width, upper: low + (upper + 0.5) * width, apart: variance > 0 ? best / variance : 0 }
  }

  private edges(n: number, lower: number, upper: number): void {
    const swing = upper - lower
    const middle = lower + swing / 2
    const on = lower + 0.65 * swing
    const off = lower + 0.35 * swing
    const plateau = lower + 0.75 * swing
    const floor = lower + 0.25 * swing
    for (let at = 0; at < n; at++) {
      const current = this.i[at] ?? 0
      const time = this.t[at] ?? 0
      if (current >= plateau) {
        this.peakSum += current
        this.peaks++
      } else if (current <= floor) {
        this.baseSum += current
        this.bases++
      }
      // NaN before the first sample: neither comparison holds.
      const crossed = this.beforeAt + ((middle - this.before) / (current - this.before)) * (time - this.beforeAt)
      if (this.before < middle && current >= middle) this.up = crossed
      if (current >= on && this.high !== true) {
        if (this.high === false) {
          if (!Number.isNaN(this.risen)) this.periods.add(this.up - this.risen)
          this.risen = this.up
        }
        this.high = true
      } else if (current <= off && this.high !== false) {
        if (this.high === true && !Number.isNaN(this.risen)) this.onTimes.add(this.fallen(crossed, current, middle))
        this.high = false
      }
      if (this.before >= middle && current < middle) this.down = crossed
      this.before = current
      this.beforeAt = time
    }
  }

  private fallen(crossed: number, current: number, middle: number): number {
    return (this.before >= middle && current < middle ? crossed : this.down) - this.risen
  }
}

/** Takes the current's samples while the arc burns; memory does not grow with them. */
export class PulseFinder {
  private readonly scales = [1, 16, 256].map((factor) => ({ factor, scale: new Scale(), count: 0, time: 0, current: 0 }))

  add(time: number, current: number): void {
    for (const one of this.scales) {
      if (one.factor === 1) {
        one.scale.add(time, current)
        continue
      }
      one.time += time
      one.current += current
      if (++one.count < one.factor) continue
      one.scale.add(one.time / one.factor, one.current / one.factor)
      one.count = one.time = one.current = 0
    }
  }

  break(): void {
    for (const one of this.scales) {
      one.scale.break()
      one.count = one.time = one.current = 0
    }
  }

  /** @param step usual time between two samples, s */
  result(step: number): { pulse: ArcFigures['pulse']; why: string | null } {
    this.break()
    let why: string | null = null
    for (const { scale, factor } of this.scales) {
      const judged = judge(scale, step * factor)
      if (judged.pulse) return judged
      why ??= judged.why
    }
    return { pulse: null, why }
  }
}

function judge(scale: Scale, step: number): { pulse: ArcFigures['pulse']; why: string | null } {
  const none = (why: string) => ({ pulse: null, why })
  if (scale.samples === 0) return none('Too few samples with the arc burning to look for pulses.')
  if (scale.flat > scale.samples * 0.5) return none('The current is not pulsed: it swings by less than 20 A or a fifth of its mean.')
  if (scale.periods.count < LEAST_PULSES || scale.pulsing < scale.samples * 0.5) return none('The current rises and falls, but not between two steady levels, so it is not told as pulsed.')
  const period = scale.periods.usual(step)
  const onTime = scale.onTimes.usual(step)
  if (period.mean < 4 * step || onTime.mean < 1.5 * step) return none('The current seems pulsed, but there are too few samples in a pulse to measure it. Record it with a higher sample rate.')
  if (period.share < 0.7) return none('The current jumps between two levels, but not at regular intervals, as in short-circuiting transfer: no pulse frequency is given.')
  return { pulse: { frequency: 1 / period.mean, peakCurrent: scale.peakCurrent, backgroundCurrent: scale.backgroundCurrent, onTime: onTime.mean, count: scale.periods.count + 1 }, why: null }
}
