/** The engine's word on a coupon, as it is typed. */
import { useDeferredValue, useMemo } from 'react'
import { qualifyCoupon } from '@shared/assessment/assess.ts'
import type { CouponQualification, Finding, TestVerdict, Verdict } from '@shared/schemas/assessment.ts'
import type { StandardId } from '@shared/schemas/common.ts'
import type { Coupon } from '@shared/schemas/records.ts'
import type { CouponContent } from '@shared/schemas/welding.ts'
import { placedRows } from '@/components/variables/catalogue.ts'
import { placeFindings } from '@/components/variables/findings.ts'

/** The coupon qualified under each of its standards, here in the browser; typing comes first, the verdicts follow. */
export function useQualifications(coupon: Pick<Coupon, 'id' | 'number' | 'state'>, content: CouponContent): CouponQualification[] {
  const judged = useDeferredValue(content)
  const { id, number, state } = coupon
  return useMemo(() => judged.variables.standards.map(({ standard, edition, level }) => qualifyCoupon({ id, number, certified: state === 'certified', content: judged }, standard, edition, level)), [judged, id, number, state])
}

export interface Missing {
  field: string
  message: string
  clause: string
}

/** What stands in the way of certification under any of the standards, each thing once. */
export function missingOf(qualifications: readonly CouponQualification[]): Missing[] {
  const found = new Map<string, Missing>()
  for (const { missing } of qualifications) for (const one of missing) if (!found.has(`${one.field} ${one.message}`)) found.set(`${one.field} ${one.message}`, one)
  return [...found.values()]
}

/** Missing facts of the weld as notes beside their rows of the sheet. */
export function missingNotes({ standard, edition, missing }: CouponQualification, content: CouponContent): Map<string, Finding[]> {
  const findings = missing
    .filter(({ field }) => field.startsWith('variables.'))
    .map(({ field, message, clause }): Finding => ({ ruleId: `record/${field}`, standard, edition, clause, title: message, verdict: 'cannot-tell', class: 'essential', field: field.replace('variables.', ''), processId: null, sentence: message, asked: null, range: null, tested: [], couponIds: [], missing: [], fixes: [], basis: 'read', source: '', reasoning: [] }))
  return placeFindings(findings, placedRows(content.variables.processes))
}

export const VERDICT_OF: Record<TestVerdict['verdict'], Verdict> = { pass: 'within', fail: 'outside', 'cannot-tell': 'cannot-tell' }

/** A verdict on a test, with the standard that gives it. */
export interface JudgedTest extends TestVerdict {
  standard: StandardId
  edition: string
}

/** Verdicts on one test, under each standard that judges it; what several say in the same words is said once. */
export function verdictsOn(qualifications: readonly CouponQualification[], testId: string): JudgedTest[] {
  const found = new Map<string, JudgedTest>()
  for (const { standard, edition, results } of qualifications) {
    for (const result of results) if (result.testId === testId && !found.has(`${result.clause} ${result.sentence}`)) found.set(`${result.clause} ${result.sentence}`, { ...result, standard, edition })
  }
  return [...found.values()]
}
