/** Whether test results are accepted: tension QW-153, guided bends QW-163, macro sections of fillets QW-183, bend former QW-466.1. */
import type { TestVerdict } from '../../schemas/assessment.ts'
import type { BendTest, CouponContent, TensionTest, WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figure, figureOrNull, tidy, unitOf } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import { pFamily, pNumber, pNumbers, secondMetal } from './members.ts'
import { FIGURES } from './ranges.ts'

/** Five per cent below the specified minimum is allowed for a break in the base metal only (QW-153.1(d); read). */
const BASE_METAL_BREAK = 0.95

/** Area of a tension specimen in mm²; null when its measures aren't recorded. */
export function specimenArea(test: TensionTest): number | null {
  if (test.kind === 'turned' || (test.diameter && !test.width)) return test.diameter && test.diameter.si > 0 ? (Math.PI * test.diameter.si ** 2) / 4 : null
  return test.width && test.thickness && test.width.si > 0 && test.thickness.si > 0 ? test.width.si * test.thickness.si : null
}

/** Stress from maximum load and least area, MPa; null when a figure is missing. */
export function computedStress(test: TensionTest): number | null {
  const area = specimenArea(test)
  return area === null || !test.load || test.load.si < 0 ? null : tidy((test.load.si * 1000) / area)
}

/** Specified minimum tensile strength that counts: of the weaker metal, MPa; null when one isn't recorded. */
export function requiredStrength(variables: WeldingVariables): number | null {
  const a = variables.baseMetals.a.minTensile?.si ?? null
  const b = secondMetal(variables).minTensile?.si ?? null
  return a === null || b === null ? null : Math.min(a, b)
}

const stressText = (mpa: number, system: UnitSystem): string => {
  const unit = unitOf('stress', system)
  const value = figure({ si: mpa, unit: 'MPa', typed: '' }, 'stress', system)
  return `${Math.round(value * 10) / 10} ${unit}`
}

/** Judges one tension specimen; the stress is computed from load and area, the reported one only where the measures are missing. */
export function judgeTension(test: TensionTest, variables: WeldingVariables): TestVerdict {
  const system = variables.unitSystem
  const base = { testId: test.id, specimen: test.specimen, clause: 'QW-153.1', basis: 'read' as const }
  const computed = computedStress(test)
  const stress = computed ?? test.reportedStrength?.si ?? null
  const shown = computed === null ? null : { label: 'Stress from load and area', value: tidy(figure({ si: computed, unit: 'MPa', typed: '' }, 'stress', system)), unit: unitOf('stress', system) }
  const minimum = requiredStrength(variables)
  const cannot = (sentence: string): TestVerdict => ({ ...base, verdict: 'cannot-tell', sentence, computed: shown })
  if (stress === null) return cannot(`${test.specimen} has neither load and size nor a reported strength.`)
  if (minimum === null) return cannot(`${test.specimen} reached ${stressText(stress, system)}, but the specified minimum strength of the base metal isn't recorded.`)
  const from = computed === null ? 'as reported' : 'from load and area'
  if (stress >= minimum) return { ...base, verdict: 'pass', sentence: `${test.specimen} reached ${stressText(stress, system)} (${from}); at least ${stressText(minimum, system)} is required.`, computed: shown }
  const floor = tidy(BASE_METAL_BREAK * minimum)
  if (stress >= floor) {
    if (test.fracture === null) return cannot(`${test.specimen} reached ${stressText(stress, system)}, under the ${stressText(minimum, system)} required; it passes only if it broke in the base metal, and where it broke isn't recorded.`)
    // Outside weld and interface: only a break in the base metal is surely that.
    if (test.fracture === 'base-metal') return { ...base, clause: 'QW-153.1(d)', verdict: 'pass', sentence: `${test.specimen} reached ${stressText(stress, system)} and broke in the base metal, where down to ${stressText(floor, system)} (5 % under ${stressText(minimum, system)}) is accepted.`, computed: shown }
    if (test.fracture === 'heat-affected-zone') return cannot(`${test.specimen} reached ${stressText(stress, system)} and broke in the heat-affected zone; whether that is base metal outside weld and interface must be judged by a person.`)
  }
  return { ...base, verdict: 'fail', sentence: `${test.specimen} reached ${stressText(stress, system)}; ${test.fracture === 'base-metal' ? `even in the base metal at least ${stressText(floor, system)}` : `at least ${stressText(minimum, system)}`} is required.`, computed: shown }
}

/** Judges one bend: no open discontinuity over 3 mm (1/8 in.); corner openings count only when they come from an internal flaw. */
export function judgeBend(test: BendTest, variables: WeldingVariables): TestVerdict {
  const system = variables.unitSystem
  const unit = unitOf('length', system)
  const limit = FIGURES[system].discontinuity
  const base = { testId: test.id, specimen: test.specimen, clause: 'QW-163', basis: 'read' as const, computed: null }
  if (test.broke) return { ...base, verdict: 'fail', sentence: `${test.specimen} broke.` }
  let unsure: string | null = null
  let largest = 0
  for (const opening of test.openings) {
    const size = figure(opening.size, 'length', system)
    if (size <= limit) {
      largest = Math.max(largest, size)
      continue
    }
    if (opening.corner && opening.fromInternalFlaw === false) continue
    if (opening.corner && opening.fromInternalFlaw === null) unsure = `${test.specimen} has a corner opening of ${show(size, unit)}; it counts only if it comes from lack of fusion, slag or another internal flaw, which isn't recorded.`
    else return { ...base, verdict: 'fail', sentence: `${test.specimen} has an opening of ${show(size, unit)}, over the ${show(limit, unit)} allowed.` }
  }
  if (unsure) return { ...base, verdict: 'cannot-tell', sentence: unsure }
  if (!test.inspected && test.openings.length === 0) return { ...base, verdict: 'cannot-tell', sentence: `${test.specimen} has no inspection recorded.` }
  return { ...base, verdict: 'pass', sentence: largest > 0 ? `${test.specimen}: the largest opening is ${show(largest, unit)}, not over the ${show(limit, unit)} allowed.` : `${test.specimen} shows no opening that counts.` }
}

/** Judges one macro section of a fillet: fusion complete, no cracks, legs not more than 3 mm (1/8 in.) apart (memory). */
export function judgeMacro(test: CouponContent['macros'][number], variables: WeldingVariables): TestVerdict {
  const system = variables.unitSystem
  const unit = unitOf('length', system)
  const limit = FIGURES[system].discontinuity
  const base = { testId: test.id, specimen: test.specimen, clause: 'QW-183', basis: 'memory' as const }
  const leg1 = figureOrNull(test.leg1, 'length', system)
  const leg2 = figureOrNull(test.leg2, 'length', system)
  const apart = leg1 === null || leg2 === null ? null : tidy(Math.abs(leg1 - leg2))
  const computed = apart === null ? null : { label: 'Difference of leg lengths', value: apart, unit }
  if (test.cracks === true) return { ...base, computed, verdict: 'fail', sentence: `${test.specimen} shows a crack.` }
  if (test.fusionComplete === false) return { ...base, computed, verdict: 'fail', sentence: `${test.specimen} shows incomplete fusion.` }
  if (apart !== null && apart > limit) return { ...base, computed, verdict: 'fail', sentence: `${test.specimen}: the legs differ by ${show(apart, unit)}, over the ${show(limit, unit)} allowed.` }
  const fillet = variables.joint.weld === 'fillet'
  if (test.cracks === null || test.fusionComplete === null || (fillet && apart === null)) return { ...base, computed, verdict: 'cannot-tell', sentence: `${test.specimen}: fusion, cracks${fillet ? ' or leg lengths' : ''} aren't all recorded.` }
  return { ...base, computed, verdict: 'pass', sentence: `${test.specimen}: fusion complete, no cracks${apart === null ? '' : `, legs ${show(apart, unit)} apart`}.` }
}

/**
 * Diameter A of the bend former for a specimen of thickness `t`, by QW-466.1 (read 2010; later editions group some P-Numbers otherwise).
 * @param elongation specified elongation of the base metal in per cent, null when not recorded
 * @returns the diameter in the unit of `t`, and how it comes about; `maximum` where the table sets only an upper limit
 */
export function formerDiameter(t: number, variables: WeldingVariables, fNumbers: readonly string[], elongation: number | null): { diameter: number; how: string; maximum: boolean } | null {
  const p = pNumbers(variables)
  if (p.length === 0) return null
  const has = (...families: string[]): boolean => p.some((one) => families.includes(one))
  const within = (low: number, high: number): boolean => p.some((one) => pFamily(one) >= low && pFamily(one) <= high)
  const a = pNumber(variables.baseMetals.a)
  const aluminium = within(21, 25)
  const factor = (value: number, how: string): { diameter: number; how: string; maximum: boolean } => ({ diameter: tidy(value * t), how, maximum: false })
  if ((has('23') && aluminium) || (aluminium && fNumbers.includes('23')) || has('35') || fNumbers.some((f) => f === '33' || f === '36' || f === '37')) return factor(16.5, '16 1/2 t')
  if (p.some((one) => pFamily(one) === 11) || (a === '25' && within(21, 25)) || has('25')) return factor(20 / 3, '6 2/3 t')
  if (has('52', '53', '61', '62')) return factor(10, '10 t')
  if (has('49', '51')) return factor(8, '8 t')
  if (elongation !== null && elongation < 20) {
    if (elongation < 3) return null
    return { diameter: tidy((t * (100 - elongation)) / elongation), how: 't (100 - e) / e', maximum: true }
  }
  return factor(4, '4 t')
}
