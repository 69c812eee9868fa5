/** Specimens that Tables 6.2, 6.3, 6.4 and 10.9 ask of a test weld, and what of them is recorded. */
import type { AssessedCoupon, Basis, SpecimenRequirement } from '../../schemas/assessment.ts'
import type { UnitSystem } from '../../units/types.ts'
import { clauseIn } from './editions.ts'
import { couponThickness, FIGURES, grooveDepth, isPipe, testKind, type TestKind } from './ranges.ts'

export interface SpecimenCount { tension: number; face: number; root: number; side: number; macro: number; sideMayReplace: boolean; clause: string; basis: Basis }

/** Counts by kind of test. @param T thickness (groove depth of a partial penetration) in the system's unit; null when the table has no row for it */
export function specimenCount(kind: TestKind, T: number, system: UnitSystem, pipe = false): SpecimenCount | null {
  const f = FIGURES[system]
  if (kind === 'fillet') return { tension: 0, face: 0, root: 0, side: 0, macro: 3, sideMayReplace: false, clause: 'Table 6.4', basis: 'memory' }
  if (T < f.least || (kind === 'partial' && T > f.plateHigh)) return null
  const thin = T <= f.low
  return {
    tension: 2,
    face: thin ? 2 : 0,
    root: thin ? 2 : 0,
    side: thin ? 0 : 4,
    macro: kind === 'partial' ? 3 : 0,
    sideMayReplace: kind === 'complete' && T === f.low,
    clause: kind === 'partial' ? 'Table 6.3' : pipe ? 'Table 10.9' : 'Table 6.2',
    basis: kind === 'complete' && pipe ? 'read' : 'memory',
  }
}

/** Counts for a coupon; null when its thickness (groove depth) isn't known or stands in no row. */
export function requiredSpecimens(coupon: AssessedCoupon): SpecimenCount | null {
  const { variables } = coupon.content
  const system = variables.unitSystem
  const kind = testKind(variables)
  const first = variables.processes[0] ?? null
  const T = kind === 'fillet' ? 0 : kind === 'partial' ? grooveDepth({ block: first }, system) : couponThickness(variables, system)
  return T === null ? null : specimenCount(kind, T, system, isPipe(variables))
}

/** Required beside recorded. @param counted bends that stand (a disregarded one does not) */
export function specimenRequirements(coupon: AssessedCoupon, edition: string, counted: (bendId: string) => boolean): SpecimenRequirement[] {
  const asked = requiredSpecimens(coupon)
  if (!asked) return []
  const { tension, bends, macros, variables } = coupon.content
  const clause = clauseIn(edition, asked.clause)
  const count = (end: 'face' | 'root' | 'side'): number => bends.filter((bend) => (bend.kind === end || bend.kind === `longitudinal-${end}`) && counted(bend.id)).length
  const row = (kind: string, label: string, required: number, recorded: number, alternative: string | null = null): SpecimenRequirement[] => (required === 0 ? [] : [{ kind, label, required, recorded, alternative, clause, basis: asked.basis }])
  const partial = testKind(variables) === 'partial'
  const macroText = partial ? 'Where the procedure is otherwise prequalified or qualified with complete penetration, the macro sections alone are enough.' : 'Where neither filler nor procedure is prequalified or otherwise qualified, a groove plate to verify the consumables is needed as well.'
  const macro = row('macro', 'Macro sections', asked.macro, macros.length, macroText)
  const sides = count('side')
  if (asked.sideMayReplace && sides > 0 && count('face') + count('root') === 0) return [...macro, ...row('tension', 'Tension specimens', asked.tension, tension.length), ...row('side-bend', 'Side bends', 4, sides, 'Two face bends and two root bends.')]
  const sideText = asked.sideMayReplace ? 'A side bend may stand for each face and root bend at this thickness.' : null
  return [
    ...macro,
    ...row('tension', 'Tension specimens', asked.tension, tension.length),
    ...row('face-bend', 'Face bends', asked.face, count('face'), sideText),
    ...row('root-bend', 'Root bends', asked.root, count('root'), sideText),
    ...row('side-bend', 'Side bends', asked.side, sides),
  ]
}
