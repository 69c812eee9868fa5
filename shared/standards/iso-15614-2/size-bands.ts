/** What the rules of size share. */
import { unknownNumeric } from '../../ranges/numeric.ts'
import { type Band } from '../common/review-band.ts'
import { show } from '../common/wording.ts'
import type { CouponSide, RangeContext } from '../rule.ts'
import { nothing, type Reading } from './tables.ts'

const unknown = unknownNumeric('length', 'mm')

/** A coupon that does not record the size. */
export const lacks = (side: CouponSide, field: string): Band => ({ sure: nothing, maybe: unknown, tested: null, reason: `${side.coupon.number} does not record it.`, missing: [`${side.coupon.number}: ${field}`] })

/** @param symbol as in the tables: t, a, D */
export const bandOf = (tested: number, symbol: string, reading: Reading): Band => ({ sure: reading.sure, maybe: reading.maybe, tested, reason: `${symbol} = ${show(tested, 'mm')}: ${reading.how}.`, why: reading.why })

/** The weld that is asked: the procedure's, or the coupon's own where it is judged by itself. */
export const weldAsked = (context: RangeContext, side: CouponSide): string => (context.procedure ?? side.variables).joint.weld
