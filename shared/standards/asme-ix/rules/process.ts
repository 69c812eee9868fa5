/** QW-401: a change of welding process is always essential; no coupon of another process covers it. */
import { setRange } from '../../../ranges/set.ts'
import { list, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { editionsUntil } from '../editions.ts'

export const process: Rule = {
  meta: {
    id: 'asme-ix/process',
    title: 'Welding process',
    standard: 'asme-ix',
    clause: 'QW-401',
    editions: editionsUntil(undefined),
    classes: { SMAW: 'essential', SAW: 'essential', GMAW: 'essential', FCAW: 'essential', GTAW: 'essential', PAW: 'essential' },
    basis: 'read',
    source: 'QW-401, 2017',
    statement: 'A welding process is covered only by a coupon welded with that process.',
    scope: 'process',
    combine: 'each',
    withoutCoupon: true,
  },
  field: 'process',
  at: 'block',
  label: 'Welding process',
  range: (_context, side) => ({ range: setRange(side.block?.process ? [side.block.process] : []), tested: side.block?.process ?? null, reason: 'Another process is never covered.' }),
  check(context, sides) {
    const asked = context.block?.process
    if (!asked) return null
    if (sides.length > 0) return { verdict: 'within', sentence: `${asked} was welded on ${names(sides)}.`, asked: [asked], range: setRange([asked]) }
    const plan = { kind: 'plan-coupon' as const, label: `Weld a coupon with ${asked}`, requirement: `A coupon welded with ${asked}.` }
    if (context.coupons.length === 0) return { verdict: 'cannot-tell', sentence: `No coupon is linked, so no coupon supports this process.`, asked: [asked], range: null, missing: [`a coupon welded with ${asked}`], fixes: [plan] }
    const unstated = context.coupons.filter((coupon) => coupon.content.variables.processes.some((block) => block.process === null))
    if (unstated.length > 0) return { verdict: 'cannot-tell', sentence: `${list(unstated.map((coupon) => coupon.number))} does not record its process.`, asked: [asked], range: null, missing: unstated.map((coupon) => `${coupon.number}: process`), fixes: [plan] }
    const had = [...new Set(context.coupons.flatMap((coupon) => coupon.content.variables.processes.flatMap((block) => block.process ?? [])))]
    return { verdict: 'outside', sentence: `${asked} is not covered: ${list(context.coupons.map((coupon) => coupon.number))} ${context.coupons.length > 1 ? 'were' : 'was'} welded with ${list(had)}.`, asked: [asked], range: setRange(had), tested: had, fixes: [plan], reasoning: ['A change of process always needs a new qualification.'] }
  },
}
