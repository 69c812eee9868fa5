/** Signals and files for the tests of recordings; deterministic. */

/** Even noise in ±1, by a linear congruence. */
export function noise(seed = 1): () => number {
  let state = seed >>> 0
  return () => {
    state = (state * 1_664_525 + 1_013_904_223) >>> 0
    return state / 2_147_483_648 - 1
  }
}

export interface Square { rate: number; seconds: number; frequency: number; onTime: number; peak: number; background: number; peakVoltage?: number; backgroundVoltage?: number; noise?: number; seed?: number }

/** Rows of a square wave, `time,current,voltage`. */
export function square({ rate, seconds, frequency, onTime, peak, background, peakVoltage = 32, backgroundVoltage = 20, noise: share = 0, seed = 1 }: Square): [number, number, number][] {
  const random = noise(seed)
  return Array.from({ length: Math.round(rate * seconds) }, (_, k) => {
    const t = k / rate
    // Half a sample in, so that no edge falls onto a sample.
    const on = ((t + 0.5 / rate) * frequency) % 1 < onTime * frequency
    return [t, (on ? peak : background) + share * (peak - background) * random(), on ? peakVoltage : backgroundVoltage] as [number, number, number]
  })
}

export const csv = (rows: readonly (readonly [number, number, number])[], head = 'Time (s),Current (A),Voltage (V)', digits = 6): string => [head, ...rows.map(([t, i, v]) => `${t.toFixed(digits)},${i.toFixed(2)},${v.toFixed(2)}`)].join('\n')
