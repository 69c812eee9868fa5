/** 8.4.1: the ISO 4063 process. */
import { setRange } from '../../../ranges/set.ts'
import { isoProcessNumber } from '../../common/iso-names.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { list } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

const numbered = levelTwoLimit(
  nameBandRule({
    meta: meta('process', { title: 'Welding process', clause: '8.4.1', basis: 'memory', withoutCoupon: true, statement: 'A process is covered only by a coupon of the same ISO 4063 number, which follows from the process, the filler form and the gas; each variant of process 12 and autogenous TIG stand apart. At level 1 a change of number within one process must be looked up.' }),
    field: 'process',
    at: 'block',
    label: 'ISO 4063 process',
    asked(context) {
      const number = context.block && isoProcessNumber(context.block)
      return number ? [number] : null
    },
    tested(_context, side) {
      const number = side.block && isoProcessNumber(side.block)
      return number ? [number] : null
    },
    because: 'Each process number is qualified by itself.',
    lacks: () => ['filler.productForm', 'shieldingGas'],
  }),
)

export const process: Rule = {
  ...numbered,
  check(context, sides) {
    const letters = context.block?.process
    if (!letters || !context.block) return null
    if (sides.length > 0) {
      const ranges = sides.flatMap((side) => numbered.range(context, side) ?? [])
      const values = [...new Set(ranges.flatMap(({ tested }) => (typeof tested === 'string' ? [tested] : [])))]
      return numbered.check(context, sides, setRange(values, { unknown: ranges.some(({ tested }) => tested === null) }))
    }
    const plan = { kind: 'plan-coupon' as const, label: `Weld a coupon with ${letters}`, requirement: `A coupon welded with ${letters}${isoProcessNumber(context.block) ? ` (${isoProcessNumber(context.block) ?? ''})` : ''}.` }
    const base = { asked: [letters], range: null, fixes: [plan] }
    if (context.coupons.length === 0) return { verdict: 'cannot-tell', sentence: 'No coupon is linked, so no coupon supports this process.', ...base, missing: [`a coupon welded with ${letters}`] }
    const unstated = context.coupons.filter((coupon) => coupon.content.variables.processes.some((block) => block.process === null))
    if (unstated.length > 0) return { verdict: 'cannot-tell', sentence: `${list(unstated.map((coupon) => coupon.number))} does not record its process.`, ...base, missing: unstated.map((coupon) => `${coupon.number}: process`) }
    const had = [...new Set(context.coupons.flatMap((coupon) => coupon.content.variables.processes.flatMap((block) => block.process ?? [])))]
    return { verdict: 'outside', sentence: `${letters} is not covered: the coupons were welded with ${list(had)}.`, ...base, range: setRange(had), tested: had }
  },
}
