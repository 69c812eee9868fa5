import type { AssessedCoupon } from '../../schemas/assessment.ts'
import type { CouponRole } from '../rule.ts'

/** Nothing confirmed asks for toughness of aluminium here: every test weld stands for itself. */
export const role = (_coupon: AssessedCoupon): CouponRole => 'full'
