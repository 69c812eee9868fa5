/**
 * The shape of a rule and of a standard. A rule is data plus functions; nothing outside a standard's folder
 * knows what a clause says. To add a rule is to add a file and its cases.
 */
import type { Basis, Finding, CouponQualification, QualifiedSpan, Fix, VariableClass, Verdict, AssessedCoupon } from '../schemas/assessment.ts'
import type { Route, StandardId } from '../schemas/common.ts'
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
  /** Basis of the class letters where it differs from that of the figures, for all processes or by process. */
  classBasis?: Basis | Partial<Record<Process, Basis>>
  source: string
  /** What the rule checks, in our own plain words, for the standard page. */
  statement: string
  /** `weld`: once for the weld; `process`: for each process block. */
  scope: 'weld' | 'process'
  /**
   * How coupons combine. `each`: one coupon must cover it alone. `union`: ranges of agreeing coupons join (thickness, deposit …).
   * `jointly`: a coupon that covers it alone is preferred, else agreeing coupons may cover together what none covers alone.
   */
  combine: 'union' | 'each' | 'jointly'
  /** The route that the rule belongs to; absent = every route. */
  route?: Route
  /** Judged by the procedure alone: `check` is called even when no coupon supports the process. */
  withoutCoupon?: boolean
}

/**
 * What a coupon can prove where toughness is required: `full` has mechanical and toughness tests, `mechanical` has no toughness tests,
 * `toughness-only` adds toughness to another coupon.
 */
export type CouponRole = 'full' | 'mechanical' | 'toughness-only'

/** What a rule reads of a coupon: one process block of one coupon. */
export interface CouponSide { coupon: AssessedCoupon; variables: WeldingVariables; block: ProcessBlock | null; role: CouponRole }

/** What a range may depend on besides the coupon. `procedure` is null where a coupon is judged by itself. */
export interface RangeContext {
  edition: string
  level: '1' | '2' | null
  /** The system the record is judged in; the rule takes its printed figures from that set alone. */
  system: UnitSystem
  toughness: boolean | null
  procedure: WeldingVariables | null
  block: ProcessBlock | null
  /** Every coupon that is linked, also those of other processes. */
  coupons: readonly AssessedCoupon[]
  /** Absent = by test. */
  route?: Route
}

export interface RuleContext extends RangeContext {
  procedure: WeldingVariables
  /** Path prefix of the block under judgement, e.g. `processes.0`, or '' for the weld. */
  path: string
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
  /** Where it differs from the rule's own field: a full dotted path. */
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
  /** Field beside which the finding stands: relative to the process block where `at` is `block`, else to the weld. */
  field: string
  at: 'weld' | 'block'
  label: string
  /** Whether the variable arises for this procedure at all; absent = always. */
  applies?(context: RuleContext): boolean
  /** Range of qualification of one coupon; null when the variable has no range (or does not apply to this coupon). */
  range(context: RangeContext, coupon: CouponSide): RuleRange | null
  /** Joins the ranges of agreeing coupons where a plain union is not right. */
  join?(context: RangeContext, coupons: readonly CouponSide[], ranges: readonly (RuleRange | null)[]): QualifiedSpan | null
  /** Judge the procedure by the coupons' ranges (already joined where `combine` allows); null when the variable does not arise. */
  check(context: RuleContext, coupons: readonly CouponSide[], joined: QualifiedSpan | null): RuleVerdict | null
}

export interface Standard {
  id: StandardId
  name: string
  shortName: string
  editions: readonly { id: string; label: string; note: string | null }[]
  processes: readonly Process[]
  /** The one unit system that the standard prints; absent = both, and a record is judged by the set in which it is written. */
  units?: UnitSystem
  /** Routes by which a procedure may be supported; absent = by test alone. */
  routes?: readonly Route[]
  outOfScope: readonly string[]
  rules: readonly Rule[]
  /** The clause by which a coupon must be certified before it may support a procedure. */
  certification: { clause: string; basis: Basis; source: string }
  /** What the coupon can prove where toughness is required. */
  role(coupon: AssessedCoupon): CouponRole
  /** Specimens asked for, results judged, what is missing for certification, and the ranges. */
  qualify(coupon: AssessedCoupon, edition: string, level: '1' | '2' | null): CouponQualification
}
