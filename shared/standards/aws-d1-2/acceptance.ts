/** Results of an aluminium test weld: tension against the as-welded strength, bends with their own former, macro sections. */
import type { Basis, TestVerdict } from '../../schemas/assessment.ts'
import type { BendTest, CouponContent, WeldingVariables } from '../../schemas/welding.ts'
import type { UnitSystem } from '../../units/types.ts'
import { figureOrNull, tidy, unitOf } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import { fNumber, metals, mNumber, readAlloy } from './alloys.ts'

type Judged = Pick<TestVerdict, 'verdict' | 'sentence'>

export interface BendSetUp {
  /** Greatest former as a multiple of the specimen's thickness. */
  ratio: number
  ratioText: string
  /** Specimen thickness that the rule asks for; null = as the test piece gives it. */
  specimen: number | null
  /** Former for a specimen of thickness `t`, in the unit of the system. */
  diameter: number
}

/** Printed formers: for the thickness in the first place, the former in the second. */
const PRINTED = {
  SI: { '16.5': [3, 52.4], '8': [10, 76.2], '6 2/3': [10, 63.5], '4': [10, 38.1] },
  US: { '16.5': [1 / 8, 2.0625], '8': [3 / 8, 3], '6 2/3': [3 / 8, 2.5], '4': [3 / 8, 1.5] },
} as const

const RATIO = { '16.5': 16.5, '8': 8, '6 2/3': 20 / 3, '4': 4 } as const

/**
 * Bend set-up in the order in which the rule decides: F-23 filler or an M-23 metal that is not annealed, then M-27 and annealed M-24,
 * then M-25 and annealed M-23, then M-21 and M-22.
 * @param t specimen thickness in the system's unit; null = the printed one
 * @returns null where filler and metals fall under no line
 */
export function bendSetUp(variables: WeldingVariables, system: UnitSystem, t: number | null = null): BendSetUp | null {
  const members = metals(variables).map((metal) => ({ m: mNumber(metal)?.m ?? null, annealed: readAlloy(metal)?.temper === 'O' }))
  const fillers = variables.processes.map(({ filler }) => fNumber(filler))
  const any = (test: (member: { m: string | null; annealed: boolean }) => boolean): boolean => members.some(test)
  const line = fillers.includes('23') || any(({ m, annealed }) => m === '23' && !annealed) ? '16.5'
    : any(({ m, annealed }) => m === '27' || (m === '24' && annealed)) ? '8'
    : any(({ m, annealed }) => m === '25' || (m === '23' && annealed)) ? '6 2/3'
    : members.every(({ m }) => m === '21' || m === '22') ? '4' : null
  if (line === null) return null
  const [thickness, diameter] = PRINTED[system][line]
  const same = t === null || Math.abs(t - thickness) <= (system === 'SI' ? 0.6 : 0.005)
  return { ratio: RATIO[line], ratioText: `${line === '16.5' ? '16 1/2' : line} t`, specimen: line === '16.5' ? thickness : null, diameter: same ? diameter : tidy(RATIO[line] * t) }
}

/** A bend without any opening passes whatever the limits are; they aren't confirmed, so an opening can't be told. */
export function bendJudgement(test: BendTest): Judged {
  if (test.broke) return { verdict: 'fail', sentence: `${test.specimen} broke.` }
  if (test.openings.length > 0) return { verdict: 'cannot-tell', sentence: `${test.specimen} has ${test.openings.length === 1 ? 'an opening' : 'openings'}; the limits of this standard are not confirmed here.` }
  return test.inspected ? { verdict: 'pass', sentence: `${test.specimen} shows no opening.` } : { verdict: 'cannot-tell', sentence: `${test.specimen} has no inspection recorded.` }
}

/** Cracks and incomplete fusion fail; what else counts isn't confirmed. */
export function macroJudgement(test: CouponContent['macros'][number]): Judged {
  if (test.cracks === true) return { verdict: 'fail', sentence: `${test.specimen} shows a crack.` }
  if (test.fusionComplete === false) return { verdict: 'fail', sentence: `${test.specimen} shows incomplete fusion.` }
  return { verdict: 'cannot-tell', sentence: `${test.specimen}: ${test.cracks === null || test.fusionComplete === null ? "cracks or fusion aren't recorded" : 'no crack and fusion complete; what else the standard asks is not confirmed here'}.` }
}

/** What is wrong with the former or the specimen of a bend; null when nothing is, or nothing can be said. */
export function formerIssue(test: BendTest, variables: WeldingVariables, system: UnitSystem): string | null {
  const unit = unitOf('length', system)
  const t = figureOrNull(test.thickness, 'length', system)
  const used = figureOrNull(test.formerDiameter, 'length', system)
  const room = system === 'SI' ? 0.5 : 0.02
  const setUp = t === null || t <= 0 ? null : bendSetUp(variables, system, t)
  if (!setUp || t === null) return null
  if (setUp.specimen !== null && t > setUp.specimen + room) return `${test.specimen} is ${show(t, unit)} thick; with this filler and metal the specimen is thinned to ${show(setUp.specimen, unit)} and bent over ${show(PRINTED[system]['16.5'][1], unit)}.`
  if (used === null || used <= setUp.diameter + room) return null
  return `${test.specimen} was bent over ${show(used, unit)}; a ${show(t, unit)} specimen takes a former of ${show(setUp.diameter, unit)} (${setUp.ratioText}).`
}

export const CLAUSES: Record<'tension' | 'bend' | 'macro' | 'ndt', { clause: string; basis: Basis }> = {
  tension: { clause: 'Table 3.2', basis: 'secondary' },
  bend: { clause: 'Clause 3', basis: 'secondary' },
  macro: { clause: 'Clause 3', basis: 'memory' },
  ndt: { clause: 'Clause 3', basis: 'memory' },
}
