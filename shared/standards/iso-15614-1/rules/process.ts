/** 8.4.1: the ISO 4063 process, its degree of mechanisation, and the order of several processes in one test. */
import { setRange } from '../../../ranges/set.ts'
import type { ProcessBlock, WeldingVariables } from '../../../schemas/welding.ts'
import { isoProcessNumber } from '../../common/iso-names.ts'
import { nameBandRule } from '../../common/review-band.ts'
import { cannotTell, list } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { levelOf, levelTwoLimit } from '../levels.ts'
import { meta } from '../meta.ts'

const numbered = levelTwoLimit(
  nameBandRule({
    meta: meta('process', { title: 'Welding process', clause: '8.4.1', basis: 'memory', withoutCoupon: true, statement: 'A process is covered only by a coupon of the same ISO 4063 number, which follows from the process, the filler form and the gas; each variant of process 12 and autogenous TIG stand apart.' }),
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

const DEGREE: Readonly<Record<NonNullable<ProcessBlock['mechanisation']>, string>> = { manual: 'manual', semiautomatic: 'partly mechanised', machine: 'fully mechanised', automatic: 'automatic' }
const degree = (block: ProcessBlock | null): readonly string[] | null => (block?.mechanisation ? [DEGREE[block.mechanisation]] : null)

export const mechanisation = nameBandRule({
  meta: meta('mechanisation', { title: 'Degree of mechanisation', clause: '8.4.1', basis: 'memory', statement: 'At level 2 manual, partly mechanised, fully mechanised and automatic welding each need their own test; level 1 is believed not to limit it, which is not confirmed.' }),
  field: 'mechanisation',
  at: 'block',
  label: 'degree of mechanisation',
  asked: (context) => degree(context.block),
  tested: (_context, side) => degree(side.block),
  covers: (value, context) => (levelOf(context) === '1' ? { sure: value, maybe: 'any', why: 'Level 1 is believed not to limit the degree of mechanisation, which is not confirmed.' } : { sure: value }),
  because: 'Each degree of mechanisation is qualified by itself.',
})

const sequence = (variables: WeldingVariables): string[] => variables.processes.flatMap((block) => (block.process ? [isoProcessNumber(block) ?? block.process] : [])).filter((number, i, all) => all.indexOf(number) === i)

/** Judged once for the weld, by all linked coupons: a coupon of several processes keeps their order. */
export const processOrder: Rule = {
  meta: meta('process-order', { title: 'Order of processes', clause: '8.4.1', basis: 'memory', scope: 'weld', withoutCoupon: true, statement: 'Several processes in one joint are covered by one combined test in the same order, or by a separate test of each, every one within its own deposit.' }),
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
