/** A coupon by itself: tests asked and recorded, each result judged, what is missing for certification, and what it qualifies. */
import type { AssessedCoupon, Basis, CouponQualification, SpecimenRequirement, TestVerdict } from '../../schemas/assessment.ts'
import { materialGroup, secondMember, siFigure, siSingle } from '../common/iso-names.ts'
import { couponRanges, judgeBend, judgeMacro, judgeNdt, judgeTension, missingFromRanges, missingFromRecord, missingResults, missingSpecimens, once, specimenRow, type Missing } from '../common/iso-tests.ts'
import { show } from '../common/wording.ts'
import { rules } from './rules/index.ts'
import { formerDiameter, requiredStrength } from './strength.ts'

const CLAUSE = '7.1'
const SIDE_FROM = 12

/** Tests of a butt, of a branch or T-joint, and of a fillet (EN 288-4 from a handbook, recalled as carried over). */
export function specimens(coupon: AssessedCoupon): SpecimenRequirement[] {
  const { variables, tension, bends, macros, ndt = [] } = coupon.content
  const basis: Basis = 'memory'
  const had = (...methods: string[]): number => (ndt.some(({ method }) => methods.includes(method)) ? 1 : 0)
  const count = (kind: string): number => bends.filter((bend) => bend.kind === kind).length
  const fillet = variables.joint.weld === 'fillet'
  const branch = (variables.joint.branch ?? null) !== null || (variables.joint.branchAngle ?? null) !== null
  const tee = !fillet && (branch || variables.joint.type === 'tee')
  const D = siSingle(variables.diameter, 'length')
  const rows = [specimenRow('visual', 'Visual testing, whole length', 1, had('VT'), CLAUSE, basis)]
  if (!fillet && !(branch && D !== null && D <= 50)) rows.push(specimenRow('volumetric', 'Radiographic or ultrasonic testing, whole length', 1, had('RT', 'UT'), CLAUSE, basis))
  rows.push(specimenRow('surface', 'Penetrant testing, whole length', 1, had('PT'), CLAUSE, basis))
  if (!fillet && !tee) {
    const t = siSingle(variables.thickness, 'length')
    rows.push(specimenRow('tension', 'Transverse tension specimens', 2, tension.length, CLAUSE, basis))
    if (t !== null && t >= SIDE_FROM) rows.push(specimenRow('side-bend', 'Side bends', 4, count('side'), CLAUSE, basis))
    else rows.push(specimenRow('face-bend', 'Face bends', 2, count('face'), CLAUSE, basis), specimenRow('root-bend', 'Root bends', 2, count('root'), CLAUSE, basis))
  }
  const micro = !fillet && !tee && [variables.baseMetals.a, secondMember(variables)].some((metal) => [22, 23].includes(materialGroup(metal)?.main ?? 0))
  rows.push(specimenRow('macro', 'Macro sections', fillet || tee ? 2 : 1, macros.length, CLAUSE, basis, micro ? 'EN 288-4 also asks for a micro section of groups 22 and 23.' : null))
  return rows
}

/** Every result of a coupon, judged. */
export function judgeResults({ content }: AssessedCoupon): TestVerdict[] {
  const required = requiredStrength(content.variables)
  const reference = { clause: '7.4.2', basis: 'memory' as const }
  const tension = content.tension.map((test): TestVerdict => {
    const judged = judgeTension(test, required, reference)
    // Only a bound is known: below it the true requirement may still be met.
    return judged.verdict === 'fail' && 'bound' in required && required.bound ? { ...judged, verdict: 'cannot-tell' } : judged
  })
  return [
    ...(content.ndt ?? []).map((test) => judgeNdt(test, 'ISO 10042 level B, C for excess weld metal, convexity, throat and penetration', { clause: '7.5', basis: 'memory' })),
    ...tension,
    ...content.bends.map((test) => judgeBend(test, { clause: '7.4.3', basis: 'memory' })),
    ...content.macros.map((test) => judgeMacro(test, { clause: '7.4.4', basis: 'memory' })),
  ]
}

function formerIssues({ content }: AssessedCoupon): Missing[] {
  const { variables, bends } = content
  const elongations = [variables.baseMetals.a, secondMember(variables)].map((metal) => siFigure(metal.minElongation, 'percent'))
  const [a, b] = elongations
  const A = typeof a === 'number' && typeof b === 'number' ? Math.min(a, b) : null
  if (bends.length === 0) return []
  if (A === null || A <= 0) return [{ field: 'variables.baseMetals.a.minElongation', message: 'Record the specified minimum elongation of both members: the bend former follows from it.', clause: '7.4.3' }]
  return bends.flatMap((bend, i) => {
    const ts = siFigure(bend.thickness, 'length')
    const used = siFigure(bend.formerDiameter, 'length')
    if (ts === null || used === null || ts <= 0) return []
    const former = formerDiameter(ts, A)
    if (former === null) return [{ field: `bends.${i}.formerDiameter`, message: `With ${A} % elongation the specimen is annealed before bending, and the former follows from the elongation of the annealed metal, which a person must check.`, clause: '7.4.3' }]
    return used <= former + 0.5 ? [] : [{ field: `bends.${i}.formerDiameter`, message: `${bend.specimen} was bent over ${show(used, 'mm')}; a ${show(ts, 'mm')} specimen of a parent with ${A} % takes ${show(former, 'mm')} (100 ts/A - ts).`, clause: '7.4.3' }]
  })
}

/** Qualifies a coupon; the standard has no levels. */
export function qualify(coupon: AssessedCoupon, edition: string): CouponQualification {
  const rows = specimens(coupon)
  const results = judgeResults(coupon)
  const ranges = couponRanges(coupon, rules, edition, null)
  const required = requiredStrength(coupon.content.variables)
  const unknown: Missing[] = 'why' in required && rows.some(({ kind }) => kind === 'tension') ? [{ field: required.field, message: required.why, clause: '7.4.2' }] : []
  const missing = once([...missingFromRecord(coupon, '9'), ...unknown, ...missingSpecimens(rows), ...missingResults(coupon, results), ...formerIssues(coupon), ...missingFromRanges(ranges, coupon)])
  return { standard: 'iso-15614-2', edition, specimens: rows, results, missing, readyToCertify: missing.length === 0, ranges: ranges.map(({ missing: _, ...range }) => range) }
}
