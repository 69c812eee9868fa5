/** Temperature ranges, and what a coupon lacks of them. */
import { between, closed, numericRange, UNLIMITED, unknownNumeric } from '../../ranges/numeric.ts'
import type { NumericRange } from '../../schemas/assessment.ts'
import type { CouponSide } from '../rule.ts'

/** Step by which a quotation of the 2017 text lets preheat fall and interpass rise; to which level it belongs is not known. */
export const STEP = 50

export const WHY = 'A step of 50 °C is quoted for the 2017 edition without naming the level; the 2004 text has none.'

export const degrees = (lower: number | null, upper: number | null): NumericRange => between('temperature', '°C', lower === null ? UNLIMITED : closed(lower), upper === null ? UNLIMITED : closed(upper))

export const unknown = unknownNumeric('temperature', '°C')

export const nothing = numericRange('temperature', '°C', [])

export const lacking = (side: CouponSide, field: string, what: string) => ({ sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} has no ${what} recorded.`, missing: [`${side.coupon.number}: ${field}`] })
