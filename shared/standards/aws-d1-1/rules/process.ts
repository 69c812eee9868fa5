/** A process is covered only by a test welded with it; short-circuiting GMAW follows the GMAW column. */
import { setRange } from '../../../ranges/set.ts'
import { list } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { ownMeta } from '../meta.ts'

export const process: Rule = {
  meta: ownMeta('process', 'Welding process', 'Clause 6', 'memory', 'Clause 6, qualification by process; scope of the rules read in 2000 (3.2.1, 3.2.2)', 'A welding process is covered only by a test weld made with that process.', { withoutCoupon: true }),
  field: 'process',
  at: 'block',
  label: 'Welding process',
  range: (_context, side) => ({ range: setRange(side.block?.process ? [side.block.process] : []), tested: side.block?.process ?? null, reason: 'Another process is never covered.' }),
  check(context, sides) {
    const asked = context.block?.process
    if (!asked) return null
    if (sides.length > 0) return { verdict: 'within', sentence: `${asked} was welded on ${list([...new Set(sides.map((side) => side.coupon.number))])}.`, asked: [asked], range: setRange([asked]) }
    const plan = { kind: 'plan-coupon' as const, label: `Weld a coupon with ${asked}`, requirement: `A coupon welded with ${asked}.` }
    if (context.coupons.length === 0) return { verdict: 'cannot-tell', sentence: 'No coupon is linked, so no test supports this process.', asked: [asked], range: null, missing: [`a coupon welded with ${asked}`], fixes: [plan] }
    const unstated = context.coupons.filter((coupon) => coupon.content.variables.processes.some((block) => block.process === null))
    if (unstated.length > 0) return { verdict: 'cannot-tell', sentence: `${list(unstated.map((coupon) => coupon.number))} does not record its process.`, asked: [asked], range: null, missing: unstated.map((coupon) => `${coupon.number}: process`), fixes: [plan] }
    const had = [...new Set(context.coupons.flatMap((coupon) => coupon.content.variables.processes.flatMap((block) => block.process ?? [])))]
    return { verdict: 'outside', sentence: `${asked} is not covered: ${list(context.coupons.map((coupon) => coupon.number))} ${context.coupons.length > 1 ? 'were' : 'was'} welded with ${list(had)}.`, asked: [asked], range: setRange(had), tested: had, fixes: [plan] }
  },
}
