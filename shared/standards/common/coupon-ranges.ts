/** What one coupon qualifies by itself under a standard's rules, and what its record lacks for that. Any standard may use it. */
import type { AssessedCoupon, CouponQualification, QualifiedRange } from '../../schemas/assessment.ts'
import type { CouponSide, RangeContext, Rule } from '../rule.ts'
import type { CouponRole } from '../rule.ts'
import { fieldWords, lowerFirst } from './lacking.ts'
import { weakest } from './rule-kinds.ts'

export type Missing = CouponQualification['missing'][number]
export type CouponRange = QualifiedRange & { missing: readonly string[] }

export interface CouponRangesInput { coupon: AssessedCoupon; rules: readonly Rule[]; role: CouponRole; edition: string; level: '1' | '2' | null }

/** Every essential range of the coupon (supplementary ones where it was welded for toughness), judged in its own units. */
export function couponRanges({ coupon, rules, role, edition, level }: CouponRangesInput): CouponRange[] {
  const { variables } = coupon.content
  const out: CouponRange[] = []
  const toughness = variables.toughnessRequired === true || coupon.content.toughness.length > 0
  const context: RangeContext = { edition, level, system: variables.unitSystem, toughness, procedure: null, block: null, coupons: [coupon] }
  variables.processes.forEach((block, i) => {
    if (!block.process) return
    const side: CouponSide = { coupon, variables, block, role }
    for (const rule of rules) {
      const ruleClass = rule.meta.classes[block.process]
      if (!ruleClass || ruleClass === 'nonessential' || rule.meta.route === 'prequalified' || !rule.meta.editions.includes(edition)) continue
      if (!toughness && ruleClass !== 'essential') continue
      // Judged as if the coupon's own weld were asked: variables that do not arise for it give no range.
      if (rule.applies && !rule.applies({ ...context, procedure: variables, block, path: `processes.${i}` })) continue
      const range = rule.range(context, side)
      if (!range) continue
      const { classBasis, basis } = rule.meta
      out.push({
        ruleId: rule.meta.id,
        variable: rule.meta.title,
        label: rule.label,
        field: rule.at === 'block' ? `processes.${i}.${rule.field}` : rule.field,
        processId: block.id,
        process: block.process,
        class: ruleClass === 'essential' ? 'essential' : 'supplementary',
        range: range.range,
        tested: range.tested,
        couponId: coupon.id,
        clause: range.clause ?? rule.meta.clause,
        basis: weakest(range.basis ?? basis, (typeof classBasis === 'object' ? classBasis[block.process] : classBasis) ?? basis),
        reason: range.reason,
        missing: range.missing ?? [],
      })
    }
  })
  return out
}

const OF_THE_WELD = /^(?:thickness|diameter|baseMetals|joint|preheat|pwht|toughnessRequired|product)/

/** Fields of the coupon that its ranges lack, each once. */
export function missingFromRanges(ranges: readonly CouponRange[], number: string): Missing[] {
  const found = new Map<string, Missing>()
  for (const range of ranges) {
    for (const text of range.missing) {
      if (!text.startsWith(`${number}: `)) continue
      const path = text.slice(number.length + 2)
      const field = path.startsWith('runSheet') ? path : OF_THE_WELD.test(path) || !range.field.startsWith('processes.') && !/^(?:filler|electrical|technique|depositThickness|positions|progression|shieldingGas)/.test(path) ? `variables.${path}` : `variables.processes.${blockOf(range)}.${path}`
      if (!found.has(field)) found.set(field, { field, message: `Record the ${fieldWords(path)}: the range of ${lowerFirst(range.label)} follows from it.`, clause: range.clause })
    }
  }
  return [...found.values()]
}

/** Index of the block that a range belongs to; the first for a range of the weld. */
const blockOf = (range: CouponRange): string => /^processes\.(\d+)\./.exec(range.field)?.[1] ?? '0'

/** Dotted path of a test in the coupon by its id. */
export function fieldOfTest({ content }: AssessedCoupon, id: string): string {
  for (const kind of ['tension', 'bends', 'macros', 'toughness', 'ndt'] as const) {
    const index = (content[kind] ?? []).findIndex((test) => test.id === id)
    if (index >= 0) return `${kind}.${index}`
  }
  return 'visual'
}
