/** Processes of the standard, and transfer by which GMAW may be welded. */
import { setRange } from '../../../ranges/set.ts'
import { cannotTell, list, names } from '../../common/wording.ts'
import type { Rule, RuleVerdict } from '../../rule.ts'
import { meta } from '../meta.ts'

export const process: Rule = {
  meta: meta('process', 'Welding process', 'Table 3.1', 'secondary', 'Course notes for the list; conditions of SMAW, plasma and transfer from memory', 'A process is covered only by a test weld made with it. GMAW is welded with spray or pulsed spray, not short-circuiting; plasma with variable polarity; SMAW only by agreement.', { withoutCoupon: true }),
  field: 'process',
  at: 'block',
  label: 'Welding process',
  range: (_context, side) => ({ range: setRange(side.block?.process ? [side.block.process] : []), tested: side.block?.process ?? null, reason: 'Another process is never covered.' }),
  check(context, sides) {
    const { block } = context
    const asked = block?.process
    if (!block || !asked) return null
    const plan = { kind: 'plan-coupon' as const, label: `Weld a coupon with ${asked}`, requirement: `A coupon welded with ${asked}.` }
    const limit = conditions(context.path, asked, block.electrical)
    if (limit?.verdict === 'outside') return limit
    if (sides.length === 0) {
      if (context.coupons.length === 0) return cannotTell('No coupon is linked; without a test no procedure is qualified, because none is prequalified.', [`a coupon welded with ${asked}`], { asked: [asked], fixes: [plan] })
      const unstated = context.coupons.filter((coupon) => coupon.content.variables.processes.some((one) => one.process === null))
      if (unstated.length > 0) return cannotTell(`${list(unstated.map((coupon) => coupon.number))} does not record its process.`, unstated.map((coupon) => `${coupon.number}: process`), { asked: [asked], fixes: [plan] })
      const had = [...new Set(context.coupons.flatMap((coupon) => coupon.content.variables.processes.flatMap((one) => one.process ?? [])))]
      return { verdict: 'outside', sentence: `${asked} is not covered: ${list(context.coupons.map((coupon) => coupon.number))} ${context.coupons.length > 1 ? 'were' : 'was'} welded with ${list(had)}.`, asked: [asked], range: setRange(had), tested: had, fixes: [plan] }
    }
    return limit ?? { verdict: 'within', sentence: `${asked} was welded on ${names(sides)}.`, asked: [asked], range: setRange([asked]) }
  },
}

/** What the standard asks of the process itself; null when nothing stands against it. */
function conditions(path: string, process: string, electrical: { transferMode: string | null; currentType: string | null }): RuleVerdict | null {
  if (process === 'SMAW') return cannotTell('SMAW of aluminium is for agreement between the parties; the record does not say whether there is one.', ['agreement on SMAW'], { asked: ['SMAW'], basis: 'memory' })
  if (process === 'GMAW') {
    const field = `${path}.electrical.transferMode`
    if (electrical.transferMode === 'short-circuiting') return { verdict: 'outside', sentence: 'GMAW of aluminium is welded with spray or pulsed spray, not with short-circuiting transfer.', asked: ['short-circuiting'], range: null, field, basis: 'memory', fixes: [{ kind: 'set', label: 'Set the transfer mode to spray', field, value: 'spray' }] }
    if (electrical.transferMode === 'spray' || electrical.transferMode === 'pulsed-spray') return null
    return cannotTell(electrical.transferMode === null ? 'The transfer mode is not stated; GMAW of aluminium is welded with spray or pulsed spray.' : 'Whether globular transfer is allowed for aluminium is not confirmed here.', ['procedure: electrical.transferMode'], { field, basis: 'memory', fixes: [{ kind: 'state', label: 'State the transfer mode', field }] })
  }
  if (process === 'PAW' && electrical.currentType !== 'AC' && electrical.currentType !== 'AC-balanced') {
    const field = `${path}.electrical.currentType`
    return cannotTell('The standard knows plasma welding with variable polarity; other current is not confirmed here.', ['procedure: electrical.currentType'], { field, basis: 'memory', fixes: [{ kind: 'state', label: 'State the current', field }] })
  }
  return null
}
