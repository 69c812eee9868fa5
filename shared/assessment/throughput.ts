import { assess, type AssessInput } from './assess.ts'

/**
 * Assesses each input once, for benchmarks; the caller holds the clock.
 * @returns how many findings were made in all, so that the work can't be skipped
 */
export function assessEach(inputs: readonly AssessInput[]): number {
  let made = 0
  for (const input of inputs) made += assess(input).findings.length
  return made
}
