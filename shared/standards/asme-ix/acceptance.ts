/** Whether guided bends (QW-163) and macro sections of fillets (QW-183) are accepted, and the bend former of QW-466.1. */
import type { TestVerdict } from '../../schemas/assessment.ts'
import type { BendTest, CouponContent, WeldingVariables } from '../../schemas/welding.ts'
import { figure, figureOrNull, tidy, unitOf } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import { pFamily, pNumber, pNumbers } from './members.ts'
import { FIGURES } from './ranges.ts'

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
  return factor(4, elongation === null ? '4 t, for an elongation of 20 % or more, which is not recorded' : '4 t')
}
