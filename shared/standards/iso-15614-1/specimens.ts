/** Tables 1 and 2: which tests a test piece takes at each level, and what of them is recorded. */
import type { AssessedCoupon, Basis, CouponQualification, SpecimenRequirement } from '../../schemas/assessment.ts'
import type { NdtTest } from '../../schemas/welding.ts'
import { metalName, secondMember, siSingle } from '../common/iso-names.ts'
import { specimenRow } from '../common/iso-tests.ts'
import { groupsOf, isNonMagnetic, ultrasonicAllowed } from './acceptance.ts'
import type { Level } from './levels.ts'
import { isBranch } from './weld-types.ts'
import { testThickness } from './sides.ts'

type Missing = CouponQualification['missing'][number]
export interface Extent { rows: SpecimenRequirement[]; missing: Missing[] }

const SIDE_FROM = 12
const IMPACT_FROM = 12
const EXTRA_SETS_ABOVE = 50

/** Both parents in 1.1, 8 or 41 to 48, save 1.1 to 8; null where a group isn't recorded. */
export function hardnessExempt(coupon: AssessedCoupon): boolean | null {
  const groups = groupsOf(coupon.content.variables)
  if (groups.length < 2) return null
  const kind = ({ main, text }: (typeof groups)[number]): string | null => (text === '1.1' ? '1.1' : main === 8 ? '8' : main >= 41 && main <= 48 ? 'nickel' : null)
  const kinds = groups.map(kind)
  return kinds.every((one) => one !== null) && !(kinds.includes('1.1') && kinds.includes('8'))
}

/** Whether impact sets are asked: by the thickness and the parent's own impact values, or by the application; null = not recorded. */
export function impactAsked(coupon: AssessedCoupon, level: Level): boolean | null {
  const { variables } = coupon.content
  if (variables.toughnessRequired === true) return true
  const t = testThickness(variables)
  if (level === '1' || (t !== null && t < IMPACT_FROM)) return false
  const specified = [variables.baseMetals.a.impactSpecified, secondMember(variables).impactSpecified]
  if (specified.includes(true)) return t === null ? null : true
  return specified.every((value) => value === false) ? false : null
}

/** Bend rows: root and face below 12 mm, side bends recommended from there, longitudinal ones for unlike metals. */
function bendRows(coupon: AssessedCoupon, table: string): SpecimenRequirement[] {
  const { bends, variables } = coupon.content
  const count = (kind: string): number => bends.filter((bend) => bend.kind === kind).length
  const clause = `${table}; 7.4.2`
  const longitudinal = count('longitudinal-face') + count('longitudinal-root')
  const unlike = metalName(variables.baseMetals.a) !== metalName(secondMember(variables))
  if (longitudinal > 0 && bends.length === longitudinal && unlike) return [specimenRow('longitudinal-face-bend', 'Longitudinal face bends', 1, count('longitudinal-face'), clause, 'read'), specimenRow('longitudinal-root-bend', 'Longitudinal root bends', 1, count('longitudinal-root'), clause, 'read')]
  const t = testThickness(variables)
  const flat = count('face') + count('root')
  if (t !== null && t >= SIDE_FROM && (count('side') > 0 || flat === 0)) return [specimenRow('side-bend', 'Side bends', 4, count('side'), clause, 'read', 'Two root and two face bends; side bends are recommended from 12 mm.')]
  const alternative = t !== null && t >= SIDE_FROM ? 'Four side bends, recommended from 12 mm.' : unlike ? 'One longitudinal root and one longitudinal face bend.' : null
  return [specimenRow('face-bend', 'Face bends', 2, count('face'), clause, 'read', alternative), specimenRow('root-bend', 'Root bends', 2, count('root'), clause, 'read', alternative)]
}

/** Impact sets: weld and heat-affected zone, that of each parent where they differ, twice above 50 mm. */
function impactRow(coupon: AssessedCoupon, table: string): SpecimenRequirement {
  const { variables, toughness } = coupon.content
  const zones = metalName(variables.baseMetals.a) === metalName(secondMember(variables)) ? 2 : 3
  const t = testThickness(variables)
  return specimenRow('impact', 'Impact sets of three', t !== null && t > EXTRA_SETS_ABOVE ? zones + 2 : zones, toughness.filter(({ values }) => values.length >= 3).length, `${table}; 7.4.4`, 'memory')
}

/** Which tests are asked of the coupon and how many are recorded; what must be known to tell is named. */
export function extent(coupon: AssessedCoupon, level: Level): Extent {
  const { variables, tension, macros, hardness, ndt = [] } = coupon.content
  const { joint } = variables
  const table = level === '2' ? '7.1 Table 2' : '7.1 Table 1'
  const fillet = joint.weld === 'fillet'
  const branch = isBranch(joint)
  const tee = !fillet && (joint.type === 'tee' || branch)
  const missing: Missing[] = []
  const basis: Basis = 'memory'
  const groups = groupsOf(variables)
  const had = (...methods: NdtTest['method'][]): number => Math.min(1, ndt.filter(({ method }) => methods.includes(method)).length)
  const rows = [specimenRow('visual', 'Visual testing, whole length', 1, had('VT'), table, basis)]
  if (level === '2') {
    const ut = ultrasonicAllowed(siSingle(variables.thickness, 'length'), groups)
    const D = siSingle(variables.diameter, 'length')
    if (!fillet && !(branch && D !== null && D <= 50)) rows.push(specimenRow('volumetric', ut === false ? 'Radiographic testing, whole length' : 'Radiographic or ultrasonic testing, whole length', 1, ut === false ? had('RT') : had('RT', 'UT'), table, basis, ut === false ? 'Ultrasonic testing may not replace it below 8 mm nor for groups 8, 10 and 41 to 48.' : null))
    const plain = isNonMagnetic(groups)
    rows.push(specimenRow('surface', plain ? 'Penetrant testing, whole length' : 'Penetrant or magnetic particle testing, whole length', 1, plain ? had('PT') : had('PT', 'MT'), table, basis))
  }
  if (!fillet && !tee) {
    rows.push(specimenRow('tension', 'Transverse tension specimens', 2, tension.length, `${table}; 7.4.1`, basis), ...bendRows(coupon, table))
    const asked = impactAsked(coupon, level)
    if (asked) rows.push(impactRow(coupon, table))
    if (asked === null) missing.push({ field: 'variables.baseMetals.a.impactSpecified', message: 'State whether the parent metal has specified impact values: from 12 mm that asks for impact tests.', clause: table })
  }
  const exempt = hardnessExempt(coupon)
  if (variables.hardnessRequired === true || (level === '2' && exempt === false)) rows.push(specimenRow('hardness', 'Hardness survey, HV10', 1, hardness.some(({ values }) => values.length > 0) ? 1 : 0, `${table}; 7.4.5`, basis))
  else if (level === '2' && exempt === null) missing.push({ field: 'variables.baseMetals.a.iso15608', message: 'State the ISO/TR 15608 group of both members: it decides whether hardness is tested.', clause: table })
  const sections = fillet || tee ? 2 : 1
  if (level === '2' || fillet) rows.push(specimenRow('macro', 'Macro sections', sections, macros.length, `${table}; 7.4.3`, basis))
  if (level === '1' && tee) missing.push({ field: 'variables.joint.type', message: 'What level 1 asks of T-joints and branches is not held here; look it up or test to level 2.', clause: table })
  return { rows, missing }
}
