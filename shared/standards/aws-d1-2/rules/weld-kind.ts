/** Kind of weld: a test covers its own kind. */
import { setRange } from '../../../ranges/set.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { cannotTell, list, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const kind = ({ joint }: WeldingVariables): string => (joint.weld === 'fillet' ? 'fillet' : joint.penetration === 'partial' ? 'partial-penetration groove' : 'complete-penetration groove')

export const weldKind: Rule = {
  meta: meta('weld-kind', 'Kind of weld', 'Clause 3', 'memory', 'Tables 3.4 and 3.5 could not be confirmed', 'A test covers its own kind of weld. What a groove test covers besides is not confirmed; a fillet test, which has no tension and bend specimens, covers no groove.'),
  field: 'joint.weld',
  at: 'weld',
  label: 'Kind of weld',
  range: (_context, side) => ({ range: setRange([kind(side.variables)], { unknown: side.variables.joint.weld === 'groove' }), tested: kind(side.variables), reason: `A ${kind(side.variables)} test covers itself.` }),
  check(context, sides, joined) {
    if (joined?.type !== 'set') return null
    const asked = kind(context.procedure)
    if (joined.values.includes(asked)) return { verdict: 'within', sentence: `${names(sides)} is a ${asked} test.`, asked: [asked], range: joined }
    const plan = { kind: 'plan-coupon' as const, label: `Weld a ${asked} coupon`, requirement: `A ${asked} test.` }
    if (context.procedure.joint.weld === 'groove' && !joined.unknown) return { verdict: 'outside', sentence: `A ${asked} is not covered: ${names(sides)} is a fillet test without tension and bend specimens.`, asked: [asked], range: joined, basis: 'common-practice', fixes: [plan] }
    return cannotTell(`${names(sides)} is a ${list(joined.values)} test; whether it covers a ${asked} is not confirmed here.`, ['what the tables of Clause 3 give for this kind of weld'], { asked: [asked], range: joined, fixes: [plan] })
  },
}
