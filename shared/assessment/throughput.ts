import { assess, type AssessInput } from './assess.ts'

/**
 * Assesses the same input `times` over, for benchmarks; the caller holds the clock.
 * @returns how many findings were made in all, so that the work can't be skipped
 */
export function assessRepeatedly(input: AssessInput, times: number): number {
  let made = 0
  for (let i = 0; i < times; i += 1) made += assess(input).findings.length
  return made
}
