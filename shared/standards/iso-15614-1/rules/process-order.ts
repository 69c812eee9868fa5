/** 8.4.1: order of several processes in one test. */
import { setRange } from '../../../ranges/set.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { isoProcessNumber } from '../../common/iso-names.ts'
import { cannotTell, list } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { meta } from '../meta.ts'

const sequence = (variables: WeldingVariables): string[] => variables.processes.flatMap((block) => (block.process ? [isoProcessNumber(block) ?? block.process] : [])).filter((number, i, all) => all.indexOf(number) === i)

/** Judged once for the weld, by all linked coupons: a coupon of several processes keeps their order. */
export const processOrder: Rule = {
  meta: meta('process-order', { title: 'Order of processes', clause: '8.4.1', basis: 'memory', scope: 'weld', withoutCoupon: true, statement: 'Several processes in one joint are covered by one combined test in the same order, or by a separate test of each, every one within its own deposit. One process of a combined test may stand alone if its part was tested as the standard asks, which a record does not tell.' }),
  field: 'processes',
  at: 'weld',
  label: 'Order of processes',
  range: () => null,
  check(context, _sides): RuleVerdict | null {
    const asked = sequence(context.procedure)
    if (asked.length < 2 || context.coupons.length === 0) return null
    const tests = context.coupons.map((coupon) => sequence(coupon.content.variables))
    const inOrder = (test: readonly string[]): boolean => {
      const shared = test.filter((number) => asked.includes(number))
      return shared.every((number, i) => i === 0 || asked.indexOf(shared[i - 1] ?? '') < asked.indexOf(number))
    }
    const base = { asked, range: setRange(tests.map((test) => test.join(' then '))), tested: tests.map((test) => test.join(' then ')) }
    const supported = asked.every((number) => tests.some((test) => test.includes(number) && inOrder(test)))
    if (supported) return { ...base, verdict: 'within', sentence: `${asked.join(' then ')} is supported by ${list(context.coupons.map((coupon) => coupon.number))} in that order.` }
    if (!asked.every((number) => tests.some((test) => test.includes(number)))) return cannotTell(`Not every process of ${asked.join(' then ')} stands in a linked coupon, so their order can't be judged.`, asked.filter((number) => !tests.some((test) => test.includes(number))).map((number) => `a coupon welded with ${number}`), base)
    return { ...base, verdict: 'outside', sentence: `${asked.join(' then ')} is not covered: the coupons were welded in the order ${list(base.tested, 'or')}.`, fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon in that order', requirement: `A combined coupon welded with ${asked.join(' then ')}, or one of each process.` }] }
  },
}
