/** 8.4.1: the ISO 4063 process. */
import { setRange } from '../../../ranges/set.ts'
import { isoProcessNumber } from '../../common/iso-names.ts'
import { list } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { asTested } from '../as-tested.ts'

const NUMBERS = ['131', '141', '15']

const numbered = asTested({ file: 'process', title: 'Welding process', clause: '8.4.1', field: 'process', at: 'block', label: 'ISO 4063 process', statement: 'Processes 131, 141 and 15, each by itself; the number follows from process, filler form and gas. Autogenous TIG (142) belongs to the edition of 2025, which is not held.', read: (_, block) => isoProcessNumber(block), covers: (value) => (NUMBERS.includes(value) ? { sure: [value] } : value === '142' ? { sure: [], maybe: ['142'], why: 'Process 142 belongs to the edition of 2025, which is not held here.' } : { sure: [], why: `Process ${value} is none of those for which this standard is written (131, 141 and 15).` }) })

/** Judged without coupons too: no coupon of another process covers it. */
export const process: Rule = {
  ...numbered,
  meta: { ...numbered.meta, withoutCoupon: true },
  check(context, sides) {
    const letters = context.block?.process
    if (!letters) return null
    if (sides.length > 0) {
      const tested = sides.flatMap((side) => numbered.range(context, side)?.tested ?? [])
      return numbered.check(context, sides, setRange(tested.map(String)))
    }
    const plan = { kind: 'plan-coupon' as const, label: `Weld a coupon with ${letters}`, requirement: `A coupon welded with ${letters}.` }
    const had = [...new Set(context.coupons.flatMap((coupon) => coupon.content.variables.processes.flatMap((block) => block.process ?? [])))]
    if (had.length === 0) return { verdict: 'cannot-tell', sentence: context.coupons.length === 0 ? 'No coupon is linked, so no coupon supports this process.' : 'The coupons do not record their process.', asked: [letters], range: null, missing: [`a coupon welded with ${letters}`], fixes: [plan] }
    return { verdict: 'outside', sentence: `${letters} is not covered: the coupons were welded with ${list(had)}.`, asked: [letters], range: setRange(had), tested: had, fixes: [plan] }
  },
}
