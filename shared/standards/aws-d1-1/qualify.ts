/** A test weld by itself: specimens, results with retests, what is missing for certification, and what it qualifies. */
import type { AssessedCoupon, CouponQualification, SpecimenRequirement, TestVerdict } from '../../schemas/assessment.ts'
import type { UnitSystem } from '../../units/types.ts'
import { judgeTension } from '../common/aws-tests.ts'
import { couponRanges, fieldOfTest, missingFromRanges, type Missing } from '../common/coupon-ranges.ts'
import { tidy, unitOf } from '../common/reading.ts'
import { show } from '../common/wording.ts'
import { bendJudgement, CLAUSES, formerIssue, macroJudgement, ndtJudgement, requiredStrength, toughnessJudgement, visualJudgement } from './acceptance.ts'
import { clauseIn } from './editions.ts'
import { couponThickness, FIGURES, testKind } from './ranges.ts'
import { role } from './role.ts'
import { rules } from './rules/index.ts'
import { specimenRequirements } from './specimens.ts'

/** One result with the kind of specimen that it is, for retests. */
interface Result { kind: string; verdict: TestVerdict; disregarded: boolean }

function results(coupon: AssessedCoupon, edition: string): Result[] {
  const { content } = coupon
  const { variables } = content
  const system = variables.unitSystem
  const at = (kind: keyof typeof CLAUSES): { clause: string; basis: TestVerdict['basis'] } => ({ clause: clauseIn(edition, CLAUSES[kind].clause), basis: CLAUSES[kind].basis })
  const plain = (kind: string, clause: keyof typeof CLAUSES, testId: string, specimen: string, judged: Pick<TestVerdict, 'verdict' | 'sentence'>, computed: TestVerdict['computed'] = null): Result => ({ kind, disregarded: false, verdict: { testId, specimen, verdict: judged.verdict, sentence: judged.sentence, computed, ...at(clause) } })
  const strength = requiredStrength(variables, system)
  return [
    ...content.tension.map((test): Result => ({ kind: 'tension', disregarded: false, verdict: judgeTension(test, strength, system, at('tension')) })),
    ...content.bends.map((test): Result => {
      const judged = bendJudgement(test, system)
      return { ...plain(`${test.kind.replace('longitudinal-', '')}-bend`, 'bend', test.id, test.specimen, judged, { label: 'Sum of openings that count', value: judged.sum, unit: unitOf('length', system) }), disregarded: judged.disregarded }
    }),
    ...content.macros.map((test) => plain('macro', 'macro', test.id, test.specimen, macroJudgement(test, variables, system))),
    ...content.toughness.map((test) => plain('toughness', 'toughness', test.id, test.place, toughnessJudgement(test, variables))),
    ...(content.visual ? [plain('visual', 'visual', 'visual', 'Visual', visualJudgement(content.visual, variables, system))] : []),
    ...(content.ndt ?? []).map((test) => plain('ndt', 'ndt', test.id, test.method, ndtJudgement(test))),
  ]
}

/** How many more passes than required make good one failure: two specimens, or all of two more locations in thick material. */
const retestPasses = (required: number, thick: boolean): number => (thick ? required - 1 + 2 * required : required + 1)

/** A failure made good by its retests, and a disregarded specimen that was replaced, count as accepted. */
function withRetests(all: readonly Result[], specimens: readonly SpecimenRequirement[], T: number | null, system: UnitSystem, edition: string): TestVerdict[] {
  const thick = T !== null && T > FIGURES[system].retest
  const clause = clauseIn(edition, CLAUSES.retest.clause)
  return all.map((one) => {
    const required = specimens.find(({ kind }) => kind === one.kind)?.required ?? null
    if (required === null || one.verdict.verdict === 'pass') return one.verdict
    const same = all.filter(({ kind }) => kind === one.kind)
    const passes = same.filter(({ verdict }) => verdict.verdict === 'pass').length
    const failures = same.filter(({ verdict }) => verdict.verdict === 'fail').length
    if (one.disregarded && failures === 0 && passes >= required) return { ...one.verdict, verdict: 'pass', sentence: `${one.verdict.sentence} It was replaced.` }
    if (one.verdict.verdict !== 'fail') return one.verdict
    const how = thick ? `all specimens of this kind from two more locations (thicker than ${show(FIGURES[system].retest, unitOf('length', system))})` : 'two retests of this kind from the same weld'
    if (failures === 1 && passes >= retestPasses(required, thick)) return { ...one.verdict, verdict: 'pass', clause, basis: CLAUSES.retest.basis, sentence: `${one.verdict.sentence} Made good by ${how}, which passed.` }
    return { ...one.verdict, sentence: `${one.verdict.sentence} ${failures === 1 ? `It is made good if ${how} pass.` : 'More than one specimen of this kind failed.'}` }
  })
}

/** What the record itself lacks. */
function missingFromRecord({ content }: AssessedCoupon, edition: string): Missing[] {
  const missing: Missing[] = []
  const clause = clauseIn(edition, 'Clause 6')
  const need = (present: unknown, field: string, message: string, where = clause): void => {
    if (!present) missing.push({ field, message, clause: where })
  }
  const { variables } = content
  const kind = testKind(variables)
  if (kind !== 'fillet') need(variables.thickness, 'variables.thickness', 'Record the thickness of the test weld.')
  need(content.weldedOn, 'weldedOn', 'Record the date of welding.')
  need(content.welder, 'welder', 'Name the welder who welded the test weld.')
  need(content.laboratory, 'laboratory', 'Name the laboratory that tested it.')
  need(content.reportNumber, 'reportNumber', "Give the number of the laboratory's report.")
  variables.processes.forEach((block, i) => need(block.process, `variables.processes.${i}.process`, 'State the welding process.'))
  need(content.visual, 'visual', 'Record the visual examination of the test weld.', clauseIn(edition, CLAUSES.visual.clause))
  if (kind === 'complete') need((content.ndt ?? []).some(({ method }) => method === 'RT' || method === 'UT'), 'ndt', 'Record radiography or ultrasonics of the whole test weld, before specimens are cut; "not applicable" is not accepted for a complete-penetration groove.', clauseIn(edition, CLAUSES.ndt.clause))
  if (variables.toughnessRequired === true) need(content.toughness.some(({ values }) => values.length > 0), 'toughness', 'The test was welded for CVN; record the results.', clauseIn(edition, CLAUSES.toughness.clause))
  return missing
}

const MECHANICAL = { tension: 'tension', macro: 'macros' } as const

/**
 * Qualifies a test weld under one edition.
 * @returns specimens asked and recorded, each result judged (retests counted), what is still missing for certification, and the ranges
 */
export function qualify(coupon: AssessedCoupon, edition: string, level: '1' | '2' | null): CouponQualification {
  const { variables, bends } = coupon.content
  const system = variables.unitSystem
  const T = couponThickness(variables, system)
  const all = results(coupon, edition)
  const disregarded = new Set(all.filter((one) => one.disregarded).map(({ verdict }) => verdict.testId))
  const specimens = specimenRequirements(coupon, edition, (id) => !disregarded.has(id))
  const judged = withRetests(all, specimens, T, system, edition)
  const ranges = couponRanges({ coupon, rules, role: role(coupon), edition, level })
  const missing = missingFromRecord(coupon, edition)
  // A weld that only adds CVN to another record needs no mechanical specimens of its own.
  if (role(coupon) !== 'toughness-only') {
    if (specimens.length === 0 && testKind(variables) !== 'fillet' && variables.thickness) missing.push({ field: 'variables.thickness', message: `The tables have no row for this test${T === null ? '' : ` (${show(tidy(T), unitOf('length', system))})`}, so the specimens can't be told.`, clause: clauseIn(edition, 'Table 6.2') })
    for (const row of specimens) {
      if (row.recorded < row.required) missing.push({ field: MECHANICAL[row.kind as keyof typeof MECHANICAL] ?? 'bends', message: `${row.label}: ${row.required} are required, ${row.recorded} ${row.recorded === 1 ? 'is' : 'are'} recorded.`, clause: row.clause })
    }
  }
  for (const result of judged) if (result.verdict !== 'pass') missing.push({ field: fieldOfTest(coupon, result.testId), message: result.sentence, clause: result.clause })
  bends.forEach((_, i) => {
    const issue = formerIssue(coupon, i, edition)
    if (issue) missing.push(issue)
  })
  const known = new Set(missing.map(({ field }) => field))
  for (const row of missingFromRanges(ranges, coupon.number)) if (!known.has(row.field)) missing.push(row)
  return { standard: 'aws-d1-1', edition, specimens, results: judged, missing, readyToCertify: missing.length === 0, ranges: ranges.map(({ missing: _, ...range }) => range) }
}
