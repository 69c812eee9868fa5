/** Tables 6.2 to 6.4 and 10.9: complete penetration covers all, partial penetration covers itself and fillets, a fillet only fillets. */
import { setRange } from '../../../ranges/set.ts'
import { list, names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { ownMeta } from '../meta.ts'
import { testKind, type TestKind } from '../ranges.ts'

const NAME: Record<TestKind, string> = { complete: 'complete-penetration groove', partial: 'partial-penetration groove', fillet: 'fillet' }
const COVERS: Record<TestKind, readonly TestKind[]> = { complete: ['complete', 'partial', 'fillet'], partial: ['partial', 'fillet'], fillet: ['fillet'] }
const CLAUSE: Record<TestKind, { clause: string; basis: 'read' | 'memory' }> = { complete: { clause: 'Table 10.9', basis: 'read' }, partial: { clause: 'Table 6.3', basis: 'memory' }, fillet: { clause: 'Table 6.4', basis: 'memory' } }

export const weldKind: Rule = {
  meta: ownMeta('weld-kind', 'Groove or fillet test', 'Table 6.2', 'memory', 'Complete penetration: note c of the tubular table read in 2015; Tables 6.3 and 6.4 from memory', 'A complete-penetration groove test covers every groove and fillet; a partial-penetration test covers partial penetration and fillets; a fillet test covers fillets only.'),
  field: 'joint.weld',
  at: 'weld',
  label: 'Kind of weld',
  range(_context, side) {
    const kind = testKind(side.variables)
    return { range: setRange(COVERS[kind].map((one) => NAME[one])), tested: NAME[kind], reason: `A ${NAME[kind]} test covers ${COVERS[kind].map((one) => `${NAME[one]}s`).join(', ')}.`, ...CLAUSE[kind] }
  },
  check(context, sides, joined) {
    if (joined?.type !== 'set') return null
    const kind = testKind(context.procedure)
    const tests = sides.map((side) => testKind(side.variables))
    const known = tests.map((test) => CLAUSE[test])[0]
    if (joined.values.includes(NAME[kind])) return { verdict: 'within', sentence: `${names(sides)} covers ${NAME[kind]}s.`, asked: [NAME[kind]], range: joined, ...known }
    const plan = kind === 'complete' ? 'A complete-penetration groove test.' : 'A groove test.'
    return { verdict: 'outside', sentence: `A ${NAME[kind]} is not covered: ${names(sides)} is a ${list([...new Set(tests.map((test) => NAME[test]))])} test.`, asked: [NAME[kind]], range: joined, ...known, fixes: [{ kind: 'plan-coupon', label: 'Weld a groove coupon', requirement: plan }] }
  },
}
