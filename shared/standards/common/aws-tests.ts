/** Tension results as the structural standards judge them: no allowance for a break in the base metal. */
import type { Basis, TestVerdict } from '../../schemas/assessment.ts'
import type { TensionTest } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { inUnitOf, tidy, unitOf } from './reading.ts'
import { round } from './wording.ts'

/** Stress from maximum load and least area, MPa; null when a measure is missing. */
export function stressOf(test: TensionTest): number | null {
  const d = test.diameter?.si ?? 0
  const isRound = test.kind === 'turned' || (d > 0 && !test.width)
  const area = isRound ? (Math.PI * d ** 2) / 4 : (test.width?.si ?? 0) * (test.thickness?.si ?? 0)
  return area > 0 && test.load && test.load.si >= 0 ? tidy((test.load.si * 1000) / area) : null
}

/**
 * One tension specimen.
 * @param required least strength in the unit of `system` (MPa, ksi); null when it isn't known
 */
export function judgeTension(test: TensionTest, required: number | null, system: UnitSystem, reference: { clause: string; basis: Basis }): TestVerdict {
  const unit = unitOf('stress', system)
  const computed = stressOf(test)
  const mpa = computed ?? test.reportedStrength?.si ?? null
  const stress = mpa === null ? null : tidy(inUnitOf(mpa, 'stress', system))
  const base = { testId: test.id, specimen: test.specimen, ...reference, computed: computed === null || stress === null ? null : { label: 'Stress from load and area', value: stress, unit } }
  if (stress === null) return { ...base, verdict: 'cannot-tell', sentence: `${test.specimen} has neither load and size nor a reported strength.` }
  const had = `${test.specimen} reached ${Math.round(stress * 10) / 10} ${unit} (${computed === null ? 'as reported' : 'from load and area'})`
  if (required === null) return { ...base, verdict: 'cannot-tell', sentence: `${had}; the strength required of the base metal isn't known.` }
  const passed = stress >= required
  return { ...base, verdict: passed ? 'pass' : 'fail', sentence: `${had}; at least ${round(required)} ${unit} is required${!passed && test.fracture === 'base-metal' ? ', also where it breaks in the base metal' : ''}.` }
}
