import type { AssessedCoupon } from '../../schemas/assessment.ts'
import type { CouponRole } from '../rule.ts'

/**
 * Whether a coupon can prove toughness, by its tests and by what it was welded for (QW-401.1; read 2017): a coupon with toughness tests
 * and no mechanical ones only adds toughness to another record.
 */
export function role(coupon: AssessedCoupon): CouponRole {
  const { tension, bends, macros, toughness, variables } = coupon.content
  const mechanical = tension.length > 0 || bends.length > 0 || macros.length > 0
  if (toughness.length > 0) return mechanical ? 'full' : 'toughness-only'
  return variables.toughnessRequired === true ? 'full' : 'mechanical'
}
