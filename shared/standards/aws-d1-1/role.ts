import type { AssessedCoupon } from '../../schemas/assessment.ts'
import type { CouponRole } from '../rule.ts'

/** What a test weld can prove where CVN is specified: one with CVN results and no mechanical ones only adds CVN to another record (secondary). */
export function role(coupon: AssessedCoupon): CouponRole {
  const { tension, bends, macros, toughness, variables } = coupon.content
  if (toughness.length > 0) return tension.length > 0 || bends.length > 0 || macros.length > 0 ? 'full' : 'toughness-only'
  return variables.toughnessRequired === true ? 'full' : 'mechanical'
}
