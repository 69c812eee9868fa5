/** A coupon by itself: tests asked and recorded, each result judged, what is missing for certification, and what it qualifies. */
import type { AssessedCoupon, CouponQualification, TestVerdict } from '../../schemas/assessment.ts'
import { siFigure } from '../common/iso-names.ts'
import { couponRanges, judgeBend, judgeImpact, judgeMacro, judgeNdt, judgeTension, missingFromRanges, missingFromRecord, missingResults, missingSpecimens, once, stressOf, type Missing } from '../common/iso-tests.ts'
import { tidy } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import { formerDiameter, judgeHardness, leastElongation, requiredStrength } from './acceptance.ts'
import { couponLevel, type Level } from './levels.ts'
import { rules } from './rules/index.ts'
import { extent } from './specimens.ts'

const QUALITY: Readonly<Record<Level, string>> = { '2': 'ISO 5817 level B, C for excess weld metal, convexity, throat and penetration', '1': 'the criteria of level 1 (no cracks, complete fusion and penetration; confirm in your edition)' }

/** Formers that are larger than the parent's ductility allows, and elongations that aren't recorded. */
function formerIssues(coupon: AssessedCoupon): Missing[] {
  const { bends, variables } = coupon.content
  const A = leastElongation(variables)
  if (bends.length > 0 && (A === null || A <= 0)) return [{ field: 'variables.baseMetals.a.minElongation', message: 'Record the specified minimum elongation of both members: the bend former follows from it.', clause: '7.4.2' }]
  return bends.flatMap((bend, i) => {
    const ts = siFigure(bend.thickness, 'length')
    const used = siFigure(bend.formerDiameter, 'length')
    if (A === null || ts === null || ts <= 0 || used === null) return []
    const former = formerDiameter(ts, A)
    // Half a millimetre of room: formers are made in steps.
    return used <= former + 0.5 ? [] : [{ field: `bends.${i}.formerDiameter`, message: `${bend.specimen} was bent over ${show(used, 'mm')}; a ${show(ts, 'mm')} specimen of a parent with ${A} % takes ${show(tidy(former), 'mm')} (${A >= 20 ? '4 ts' : '100 ts/A - ts'}).`, clause: '7.4.2' }]
  })
}

/** Tension at level 1 between 95 % and the minimum, broken in the parent: whether the allowance of ASME IX was taken over isn't known. */
function tension(test: AssessedCoupon['content']['tension'][number], required: number | null, level: Level): TestVerdict {
  const reference = { clause: '7.4.1', basis: 'read' as const }
  const judged = judgeTension(test, required === null ? { why: "The parent metal's specified minimum strength isn't recorded." } : { value: required, how: 'specified minimum of the weaker parent' }, reference)
  const stress = stressOf(test) ?? siFigure(test.reportedStrength, 'stress')
  if (judged.verdict !== 'fail' || level === '2' || test.fracture !== 'base-metal' || stress === null || required === null || stress < tidy(0.95 * required)) return judged
  return { ...judged, verdict: 'cannot-tell', basis: 'memory', sentence: `${judged.sentence.split(' If only')[0] ?? ''} It broke in the parent metal not more than 5 % below; whether level 1 allows that is not known here.` }
}

/** Every result of a coupon, judged. */
export function judgeResults(coupon: AssessedCoupon, level: Level): TestVerdict[] {
  const { content } = coupon
  const { variables } = content
  const required = requiredStrength(variables)
  const energy = siFigure(variables.impactEnergy, 'energy')
  const at = siFigure(variables.impactTemperature, 'temperature')
  return [
    ...(content.ndt ?? []).map((test) => judgeNdt(test, QUALITY[level], { clause: '7.5', basis: 'memory' })),
    ...content.tension.map((test) => tension(test, required, level)),
    ...content.bends.map((test) => judgeBend(test, { clause: '7.4.2', basis: 'read' })),
    ...content.macros.map((test) => judgeMacro(test, { clause: '7.4.3', basis: 'memory' })),
    ...content.toughness.map((test) => judgeImpact(test, energy, at, { clause: '7.4.4', basis: 'memory' })),
    ...content.hardness.map((test) => judgeHardness(test, variables, level)),
  ]
}

/**
 * Qualifies a coupon at a level.
 * @param asked the level to judge by; null takes the coupon's own, and level 2 where it names none
 */
export function qualify(coupon: AssessedCoupon, edition: string, asked: '1' | '2' | null): CouponQualification {
  const { variables } = coupon.content
  const level: Level = asked ?? couponLevel({ variables }) ?? '2'
  const tests = extent(coupon, level)
  const results = judgeResults(coupon, level)
  const ranges = couponRanges(coupon, rules, edition, level)
  const missing = once([...missingFromRecord(coupon, '9'), ...tests.missing, ...missingSpecimens(tests.rows), ...missingResults(coupon, results), ...formerIssues(coupon), ...missingFromRanges(ranges, coupon)])
  return { standard: 'iso-15614-1', edition, specimens: tests.rows, results, missing, readyToCertify: missing.length === 0, ranges: ranges.map(({ missing: _, ...range }) => range) }
}
