/** Lowest and highest of each stretch of samples in bounded memory: when full, neighbours are joined and stretches are twice as long. */
import type { ArcPlot } from '../schemas/arc-data.ts'

const MOST_STRETCHES = 2000

export class Decimator {
  private readonly from = new Float64Array(MOST_STRETCHES)
  private readonly to = new Float64Array(MOST_STRETCHES)
  private readonly currentMin = new Float64Array(MOST_STRETCHES)
  private readonly currentMax = new Float64Array(MOST_STRETCHES)
  private readonly voltageMin = new Float64Array(MOST_STRETCHES)
  private readonly voltageMax = new Float64Array(MOST_STRETCHES)
  /** Full stretches, samples in each, samples in the one that is being filled. */
  private full = 0
  private size = 1
  private filled = 0

  add(time: number, current: number, voltage: number): void {
    const at = this.full
    if (this.filled === 0) {
      this.from[at] = time
      this.currentMin[at] = this.currentMax[at] = current
      this.voltageMin[at] = this.voltageMax[at] = voltage
    } else {
      if (current < (this.currentMin[at] ?? 0)) this.currentMin[at] = current
      if (current > (this.currentMax[at] ?? 0)) this.currentMax[at] = current
      if (voltage < (this.voltageMin[at] ?? 0)) this.voltageMin[at] = voltage
      if (voltage > (this.voltageMax[at] ?? 0)) this.voltageMax[at] = voltage
    }
    this.to[at] = time
    if (++this.filled < this.size) return
    this.filled = 0
    if (++this.full === MOST_STRETCHES) this.join()
  }

  private join(): void {
    const { from, to, currentMin, currentMax, voltageMin, voltageMax } = this
    for (let at = 0; at < MOST_STRETCHES / 2; at++) {
      const [a, b] = [2 * at, 2 * at + 1]
      from[at] = from[a] ?? 0
      to[at] = to[b] ?? 0
      currentMin[at] = Math.min(currentMin[a] ?? 0, currentMin[b] ?? 0)
      currentMax[at] = Math.max(currentMax[a] ?? 0, currentMax[b] ?? 0)
      voltageMin[at] = Math.min(voltageMin[a] ?? 0, voltageMin[b] ?? 0)
      voltageMax[at] = Math.max(voltageMax[a] ?? 0, voltageMax[b] ?? 0)
    }
    this.full = MOST_STRETCHES / 2
    this.size *= 2
  }

  plot(): ArcPlot {
    const count = this.full + (this.filled > 0 ? 1 : 0)
    const first = (values: Float64Array) => [...values.subarray(0, count)]
    return {
      t: Array.from({ length: count }, (_, at) => Number((((this.from[at] ?? 0) + (this.to[at] ?? 0)) / 2).toPrecision(12))),
      currentMin: first(this.currentMin), currentMax: first(this.currentMax), voltageMin: first(this.voltageMin), voltageMax: first(this.voltageMax),
    }
  }
}
