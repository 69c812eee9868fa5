/**
 * The shape of a rule and of a standard. A rule is data plus functions; nothing outside a standard's folder
 * knows what a clause says. To add a rule is to add a file and its cases.
 */
import type { Basis, Finding, CouponQualification, QualifiedSpan, Fix, VariableClass, Verdict, AssessedCoupon } from '../schemas/assessment.ts'
import type { StandardId } from '../schemas/common.ts'
import type { Process, ProcessBlock, WeldingVariables } from '../schemas/welding.ts'
import type { UnitSystem } from '../units/types.ts'

/** Class of a variable for one process; `dual` is supplementary with toughness and nonessential without. */
export type RuleClass = VariableClass | 'dual'

export interface RuleMeta {
  /** `<standard>/<file name>` */
  id: string
  title: string
  standard: StandardId
  clause: string
  /** Editions in which the rule binds; each must be listed in the standard. */
  editions: readonly string[]
  /** Class for each process to which the variable applies; a process that is absent has no such variable. */
  classes: Partial<Record<Process, RuleClass>>
  basis: Basis
  /** Basis of the class letters where it differs from that of the figures. */
  classBasis?: Basis
  source: string
  /** What the rule checks, in our own plain words, for the standard page. */
  statement: string
  /** `weld`: once for the weld; `process`: for each process block. */
  scope: 'weld' | 'process'
  /** How ranges of several agreeing coupons join: `union` (thickness, deposit …) or `each` (one coupon must cover it alone). */
  combine: 'union' | 'each'
}

/** What a rule reads of a coupon: one process block of one coupon. */
export interface CouponSide { coupon: AssessedCoupon; variables: WeldingVariables; block: ProcessBlock | null }

export interface RuleContext {
  edition: string
  level: '1' | '2' | null
  /** The system the record is judged in; the rule takes its printed figures from that set alone. */
  system: UnitSystem
  toughness: boolean | null
  /** Path prefix of the block under judgement, e.g. `processes.0`, or '' for the weld. */
  path: string
  procedure: WeldingVariables
  block: ProcessBlock | null
}

/** A range that one coupon gives for the rule's variable. */
export interface RuleRange {
  range: QualifiedSpan
  tested: number | string | null
  reason: string
  clause?: string
  basis?: Basis
  /** Without this the range is unknown: what the coupon record lacks. */
  missing?: readonly string[]
}

/** The rule's own verdict on what the procedure asks, given the range(s) that the coupon(s) qualify. */
export interface RuleVerdict {
  verdict: Verdict
  field?: string
  sentence: string
  asked: Finding['asked']
  range: QualifiedSpan | null
  tested?: Finding['tested']
  missing?: readonly string[]
  fixes?: readonly Fix[]
  reasoning?: readonly string[]
  clause?: string
  basis?: Basis
  class?: VariableClass
}

export interface Rule {
  meta: RuleMeta
  /** Field beside which the finding stands, relative to the context's path. */
  field: string
  label: string
  /** Range of qualification of one coupon; null when the variable has no range (or does not apply to this weld). */
  range(context: Omit<RuleContext, 'procedure' | 'block' | 'path'>, coupon: CouponSide): RuleRange | null
  /** Judge the procedure by the coupons' ranges (already joined where `combine` allows); null when the variable does not arise. */
  check(context: RuleContext, coupons: readonly CouponSide[], joined: QualifiedSpan | null): RuleVerdict | null
}

export interface Standard {
  id: StandardId
  name: string
  shortName: string
  editions: readonly { id: string; label: string; note: string | null }[]
  processes: readonly Process[]
  outOfScope: readonly string[]
  rules: readonly Rule[]
  /** Specimens asked for, results judged, what is missing for certification, and the ranges. */
  qualify(coupon: AssessedCoupon, edition: string, level: '1' | '2' | null): CouponQualification
}
