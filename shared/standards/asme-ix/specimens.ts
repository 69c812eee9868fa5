/** Specimens that tables QW-451.1 to QW-451.3 ask of a coupon, and what of them is recorded. */
import type { AssessedCoupon, Basis, SpecimenRequirement } from '../../schemas/assessment.ts'
import type { UnitSystem } from '../../units/types.ts'
import { list, show } from '../common/wording.ts'
import { unitOf } from '../common/reading.ts'
import { couponThickness, FIGURES, isLongitudinal } from './ranges.ts'
import { tensionTests } from './tension.ts'

export interface SpecimenCount {
  tension: number
  face: number
  root: number
  side: number
  macro: number
  longitudinal: boolean
  /** Four side bends may stand for two face and two root bends (note 5). */
  sideAlternative: boolean
  clause: string
  basis: Basis
}

/** Counts by thickness for a groove coupon. @param T in the system's unit */
export function grooveSpecimens(T: number, system: UnitSystem, longitudinal = false): SpecimenCount {
  const f = FIGURES[system]
  if (longitudinal) return { tension: 2, face: 2, root: 2, side: 0, macro: 0, longitudinal: true, sideAlternative: false, clause: 'QW-451.2', basis: 'memory' }
  const sideBends = T >= f.sideBends
  return { tension: 2, face: sideBends ? 0 : 2, root: sideBends ? 0 : 2, side: sideBends ? 4 : 0, macro: 0, longitudinal: false, sideAlternative: !sideBends && T >= f.low, clause: 'QW-451.1', basis: 'read' }
}

/** Macro sections of a fillet coupon: five of plate, four of pipe (secondary). */
export const filletSpecimens = (pipe: boolean): SpecimenCount => ({ tension: 0, face: 0, root: 0, side: 0, macro: pipe ? 4 : 5, longitudinal: false, sideAlternative: false, clause: 'QW-451.3', basis: 'secondary' })

/** Counts for a coupon; null when a groove coupon's thickness isn't known. */
export function requiredSpecimens(coupon: AssessedCoupon): SpecimenCount | null {
  const { variables } = coupon.content
  if (variables.joint.weld === 'fillet') return filletSpecimens(variables.product === 'pipe')
  const T = couponThickness({ variables }, variables.unitSystem)
  return T === null ? null : grooveSpecimens(T, variables.unitSystem, isLongitudinal({ coupon }))
}

/** Part-thickness specimens of a coupon over 25 mm (1 in.) count by sets. */
function tensionRow({ content }: AssessedCoupon, row: SpecimenRequirement): SpecimenRequirement {
  const system = content.variables.unitSystem
  const T = couponThickness({ variables: content.variables }, system)
  if (T === null || T <= FIGURES[system].tensionSets) return row
  const unit = unitOf('length', system)
  const { tests, left } = tensionTests(content.tension, T, system)
  const alternative = left.length > 0 ? `${list(left)} ${left.length === 1 ? 'is' : 'are'} too thin to represent ${show(T, unit)}; specimens that together represent the thickness count as one.` : tests < content.tension.length ? 'Specimens that together represent the thickness count as one.' : null
  return { ...row, recorded: tests, alternative }
}

/** What is asked for beside what is recorded; four recorded side bends stand for face and root bends where note 5 allows. */
export function specimenRequirements(coupon: AssessedCoupon): SpecimenRequirement[] {
  const asked = requiredSpecimens(coupon)
  if (!asked) return []
  const { tension, bends, macros } = coupon.content
  const count = (kind: string): number => bends.filter((bend) => bend.kind === kind).length
  const side = count('side')
  const row = (kind: string, label: string, required: number, recorded: number, alternative: string | null = null): SpecimenRequirement => ({ kind, label, required, recorded, alternative, clause: asked.clause, basis: asked.basis })
  if (asked.macro > 0) return [row('macro', 'Macro sections', asked.macro, macros.length)]
  const rows = [tensionRow(coupon, row('tension', 'Tension specimens', asked.tension, tension.length))]
  if (asked.side > 0) return [...rows, row('side-bend', 'Side bends', asked.side, side)]
  if (asked.sideAlternative && side > 0 && count('face') + count('root') === 0) return [...rows, { ...row('side-bend', 'Side bends', 4, side, 'Two face bends and two root bends.'), basis: 'memory' }]
  const alternative = asked.sideAlternative ? 'Four side bends may stand for the two face and two root bends.' : null
  const prefix = asked.longitudinal ? 'longitudinal-' : ''
  const name = asked.longitudinal ? 'Longitudinal ' : ''
  const label = (end: string): string => (name ? `${name}${end} bends` : `${end.charAt(0).toUpperCase()}${end.slice(1)} bends`)
  return [...rows, row(`${prefix}face-bend`, label('face'), asked.face, count(`${prefix}face`), alternative), row(`${prefix}root-bend`, label('root'), asked.root, count(`${prefix}root`), alternative)]
}
