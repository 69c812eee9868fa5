/**
 * Judges a procedure by the coupons that support it, under one standard and edition. It runs a standard's rules and combines
 * coupons; it knows no clause.
 */
import type { Assessment, AssessedCoupon, CouponQualification, Finding, QualifiedRange, Verdict } from '../schemas/assessment.ts'
import type { Route, StandardId } from '../schemas/common.ts'
import type { ProcedureContent } from '../schemas/welding.ts'
import { getStandard } from '../standards/index.ts'
import type { Standard } from '../standards/rule.ts'
import { judgeBlock } from './block.ts'
import { contradictions } from './contradictions.ts'
import { couponContradictions } from './kept.ts'
import { memoryOf } from './plan.ts'
import { prepare } from './prepare.ts'
import { readsOf } from './reads.ts'

export interface AssessInput {
  procedure: ProcedureContent
  coupons: readonly AssessedCoupon[]
  standard: StandardId
  edition: string
  level?: '1' | '2' | null
  /** Absent = by test; `prequalified` judges the procedure without any coupon. */
  route?: Route
  /** Stored coupons that are not linked: offered as a cure where one would cover what is missing. */
  otherCoupons?: readonly AssessedCoupon[]
}

/** A finding of the runner itself rather than of a rule. */
type Plain = Pick<Finding, 'ruleId' | 'title' | 'field' | 'sentence' | 'missing'> & Partial<Finding>

const plainFinding = (input: AssessInput, given: Plain): Finding => ({
  standard: input.standard,
  edition: input.edition,
  clause: '',
  verdict: 'cannot-tell',
  class: 'essential',
  processId: null,
  asked: null,
  range: null,
  tested: [],
  couponIds: [],
  fixes: [],
  basis: 'common-practice',
  source: 'The record itself',
  reasoning: [],
  ...given,
})

/**
 * Every finding and range for a procedure and its coupons.
 * @param input the procedure, the linked coupons, and the standard and edition to judge by; nothing is changed
 * @returns the assessment; an unknown standard, edition or process gives a named "cannot tell" finding, never an error
 */
export function assess(given: AssessInput): Assessment {
  const route = given.route ?? 'test'
  // A prequalified procedure stands by itself: coupons that happen to be linked neither help nor harm it.
  const input = route === 'prequalified' ? { ...given, coupons: [], otherCoupons: [] } : given
  const { variables } = input.procedure
  const findings: Finding[] = []
  const ranges: QualifiedRange[] = []
  const standard = getStandard(input.standard)
  const hasRoute = standard ? (standard.routes ?? ['test']).includes(route) : false
  const prepared = standard && prepare(standard, input.edition, route)
  if (!standard) findings.push(plainFinding(input, { ruleId: 'assessment/standard', title: 'Standard', field: 'standards', sentence: `The rules of ${input.standard} are not in the program yet, so the procedure can't be judged by it.`, missing: [`rules of ${input.standard}`] }))
  else if (!prepared) findings.push(plainFinding(input, { ruleId: 'assessment/edition', title: 'Edition', field: 'standards', sentence: `Edition ${input.edition} of ${standard.shortName} is not known here; known are ${standard.editions.map(({ id }) => id).join(', ')}.`, missing: [`rules of the ${input.edition} edition`] }))
  else if (!hasRoute) findings.push(plainFinding(input, { ruleId: 'assessment/route', title: 'Route', field: 'standards', sentence: `${standard.shortName} has no prequalified procedures here: every procedure is supported by a qualification test.`, missing: ['a route by test'], fixes: [{ kind: 'state', label: 'Choose the route by test', field: 'standards' }] }))
  else {
    recordFindings(input, standard, findings)
    const { edition, coupons } = input
    const level = input.level ?? null
    const { unitSystem: system, toughnessRequired: toughness } = variables
    const out = { findings, ranges }
    const others = input.otherCoupons ?? []
    const memory = memoryOf(standard, prepared, coupons, { level, system, toughness })
    // Rules know a second member that is not there by its being the first: of values alone they could not tell one object from two.
    const isTold = variables.baseMetals.a !== variables.baseMetals.b
    const remembering = memory === null || !isTold ? null : { memory, reads: readsOf(memory.paths, variables) }
    if (prepared.weld.length > 0) judgeBlock(standard, prepared, { route, edition, level, system, toughness, procedure: variables, coupons, path: '', block: null }, others, remembering, out)
    for (let i = 0; i < variables.processes.length; i += 1) {
      const block = variables.processes[i] ?? null
      if (block) judgeBlock(standard, prepared, { route, edition, level, system, toughness, procedure: variables, coupons, path: `processes.${i}`, block }, others, remembering, out)
    }
  }
  return { standard: input.standard, edition: input.edition, unitSystem: variables.unitSystem, verdict: overall(findings), counts: count(findings), findings, ranges }
}

/** Contradictions, coupons that are not certified, and what is out of scope: before any rule is asked. */
function recordFindings(input: AssessInput, standard: Standard, findings: Finding[]): void {
  const { variables } = input.procedure
  const note = standard.editions.find(({ id }) => id === input.edition)?.note
  if (note) findings.push(plainFinding(input, { ruleId: 'assessment/edition-note', title: 'Edition', field: 'standards', verdict: 'within', class: 'not-a-variable', sentence: note, missing: [], basis: 'secondary', source: standard.name }))
  for (const { field, sentence, processId } of contradictions(variables)) {
    findings.push(plainFinding(input, { ruleId: 'assessment/contradiction', title: 'Contradiction in the procedure', field, processId, sentence, missing: [`procedure: ${field}`], fixes: [{ kind: 'state', label: 'Correct the procedure', field }] }))
  }
  for (const coupon of input.coupons) {
    if (!coupon.certified) {
      const { clause, basis, source } = standard.certification
      findings.push(plainFinding(input, { ruleId: 'assessment/certification', title: 'Coupon certified', field: 'supportingCoupons', clause, basis, source, couponIds: [coupon.id], sentence: `${coupon.number} isn't certified yet, so it can't support a procedure until it is.`, missing: [`${coupon.number}: certification`] }))
    }
    for (const { field, sentence } of couponContradictions(coupon)) {
      findings.push(plainFinding(input, { ruleId: 'assessment/contradiction', title: 'Contradiction in a coupon', field: 'supportingCoupons', couponIds: [coupon.id], sentence: `${coupon.number}: ${sentence}`, missing: [`${coupon.number}: ${field}`] }))
    }
  }
  variables.processes.forEach((block, i) => {
    const field = `processes.${i}.process`
    if (block.process === null) findings.push(plainFinding(input, { ruleId: 'assessment/process', title: 'Welding process', field, processId: block.id, sentence: 'The welding process isn\'t stated, so nothing of it can be judged.', missing: [`procedure: ${field}`], fixes: [{ kind: 'state', label: 'State the welding process', field }] }))
    else if (!standard.processes.includes(block.process)) findings.push(plainFinding(input, { ruleId: 'assessment/process', title: 'Welding process', field, processId: block.id, sentence: `${block.process === 'OTHER' ? 'This process' : block.process} is outside the rules of ${standard.shortName} kept here.`, missing: [`rules of ${standard.shortName} for the process`] }))
  })
}

const RANK: Record<Verdict, number> = { within: 0, 'cannot-tell': 1, outside: 2 }

/** The worst verdict of those findings that count: essential, and supplementary while toughness is not ruled out. */
export function overall(findings: readonly Pick<Finding, 'class' | 'verdict'>[]): Verdict {
  let worst: Verdict = 'within'
  for (const finding of findings) {
    if ((finding.class === 'essential' || finding.class === 'supplementary') && RANK[finding.verdict] > RANK[worst]) worst = finding.verdict
  }
  return worst
}

/** How many findings of each verdict, leaving out what is no variable here. */
function count(findings: readonly Finding[]): Assessment['counts'] {
  const counts = { within: 0, outside: 0, cannotTell: 0 }
  for (const finding of findings) {
    if (finding.class === 'not-a-variable') continue
    if (finding.verdict === 'within') counts.within += 1
    else if (finding.verdict === 'outside') counts.outside += 1
    else counts.cannotTell += 1
  }
  return counts
}

/**
 * What a coupon still needs, how its results are judged and what it qualifies.
 * @returns for an unknown standard or edition: nothing required, not ready, with the reason under `missing`
 */
export function qualifyCoupon(coupon: AssessedCoupon, standard: StandardId, edition: string, level: '1' | '2' | null = null): CouponQualification {
  const known = getStandard(standard)
  if (known?.editions.some(({ id }) => id === edition)) return known.qualify(coupon, edition, level)
  const message = known ? `Edition ${edition} of ${known.shortName} is not known here.` : `The rules of ${standard} are not in the program yet.`
  return { standard, edition, specimens: [], results: [], missing: [{ field: 'variables.standards', message, clause: '' }], readyToCertify: false, ranges: [] }
}
