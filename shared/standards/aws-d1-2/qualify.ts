/** An aluminium test weld by itself: results, what is missing for certification, and what it qualifies. */
import type { AssessedCoupon, CouponQualification, SpecimenRequirement, TestVerdict } from '../../schemas/assessment.ts'
import { judgeTension } from '../common/aws-tests.ts'
import { couponRanges, fieldOfTest, missingFromRanges, type Missing } from '../common/coupon-ranges.ts'
import { requiredStrength } from './alloys.ts'
import { bendJudgement, CLAUSES, formerIssue, macroJudgement } from './acceptance.ts'
import { role } from './role.ts'
import { rules } from './rules/index.ts'

function results({ content }: AssessedCoupon): TestVerdict[] {
  const { variables } = content
  const system = variables.unitSystem
  const required = requiredStrength(variables, system)
  const row = (kind: keyof typeof CLAUSES, testId: string, specimen: string, judged: Pick<TestVerdict, 'verdict' | 'sentence'>): TestVerdict => ({ testId, specimen, ...judged, ...CLAUSES[kind], computed: null })
  return [
    ...content.tension.map((test) => judgeTension(test, required?.value ?? null, system, { clause: CLAUSES.tension.clause, basis: required?.basis ?? CLAUSES.tension.basis })),
    ...content.bends.map((test) => row('bend', test.id, test.specimen, bendJudgement(test))),
    ...content.macros.map((test) => row('macro', test.id, test.specimen, macroJudgement(test))),
    ...(content.ndt ?? []).filter(({ accepted }) => accepted !== true).map((test) => row('ndt', test.id, test.method, test.accepted === false ? { verdict: 'fail', sentence: `${test.method} was not accepted.` } : { verdict: 'cannot-tell', sentence: `${test.method}: the result isn't recorded.` })),
    ...(content.visual?.cracks === true ? [row('macro', 'visual', 'Visual', { verdict: 'fail', sentence: 'Visual examination: there is a crack.' })] : []),
  ]
}

const UNKNOWN_COUNT = 'The number that the tables of Clause 3 ask is not confirmed here; look it up in your edition.'

/** Kinds of specimens without their number, which isn't confirmed. */
function specimens({ content }: AssessedCoupon): SpecimenRequirement[] {
  const row = (kind: string, label: string, recorded: number): SpecimenRequirement => ({ kind, label, required: 0, recorded, alternative: UNKNOWN_COUNT, clause: 'Table 3.4', basis: 'memory' })
  if (content.variables.joint.weld === 'fillet') return [row('macro', 'Macro sections', content.macros.length)]
  return [row('tension', 'Tension specimens', content.tension.length), row('bend', 'Bend specimens', content.bends.length)]
}

/**
 * Qualifies a test weld. Numbers of specimens and several limits aren't confirmed: at least one result of each kind is asked for,
 * and the rest is named as not known.
 */
export function qualify(coupon: AssessedCoupon, edition: string, level: '1' | '2' | null): CouponQualification {
  const { content } = coupon
  const { variables } = content
  const missing: Missing[] = []
  const need = (present: unknown, field: string, message: string, clause = 'Clause 3'): void => {
    if (!present) missing.push({ field, message, clause })
  }
  need(variables.thickness, 'variables.thickness', 'Record the thickness of the test weld.', 'Table 3.4')
  need(content.weldedOn, 'weldedOn', 'Record the date of welding.')
  need(content.welder, 'welder', 'Name the welder who welded the test weld.')
  need(content.laboratory, 'laboratory', 'Name the laboratory that tested it.')
  need(content.reportNumber, 'reportNumber', "Give the number of the laboratory's report.")
  variables.processes.forEach((block, i) => need(block.process, `variables.processes.${i}.process`, 'State the welding process.'))
  if (variables.joint.weld === 'fillet') need(content.macros.length > 0, 'macros', `Record the macro sections. ${UNKNOWN_COUNT}`)
  else {
    need(content.tension.length > 0, 'tension', `Record the tension results. ${UNKNOWN_COUNT}`, 'Table 3.4')
    need(content.bends.length > 0, 'bends', `Record the bend results. ${UNKNOWN_COUNT}`, 'Table 3.4')
  }
  need(content.visual, 'visual', 'Record the visual examination of the test weld.')
  const judged = results(coupon)
  for (const result of judged) if (result.verdict !== 'pass') missing.push({ field: fieldOfTest(coupon, result.testId), message: result.sentence, clause: result.clause })
  content.bends.forEach((bend, i) => {
    const issue = formerIssue(bend, variables, variables.unitSystem)
    if (issue) missing.push({ field: `bends.${i}.formerDiameter`, message: issue, clause: CLAUSES.bend.clause })
  })
  const ranges = couponRanges({ coupon, rules, role: role(coupon), edition, level })
  const known = new Set(missing.map(({ field }) => field))
  for (const row of missingFromRanges(ranges, coupon.number)) if (!known.has(row.field)) missing.push(row)
  return { standard: 'aws-d1-2', edition, specimens: specimens(coupon), results: judged, missing, readyToCertify: missing.length === 0, ranges: ranges.map(({ missing: _, ...range }) => range) }
}
