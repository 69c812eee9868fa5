/** Tables 6.2 to 6.4 and 10.9: complete penetration covers all, partial penetration covers itself and fillets, a fillet only fillets. */
import { setRange } from '../../../ranges/set.ts'
import type { Basis } from '../../../schemas/assessment.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { list, names, verb } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { ownMeta } from '../meta.ts'
import { coversAll, testKind, type TestKind } from '../ranges.ts'

const NAME: Record<TestKind, string> = { complete: 'complete-penetration groove', partial: 'partial-penetration groove', fillet: 'fillet' }
const COVERS: Record<TestKind, readonly TestKind[]> = { complete: ['complete', 'partial', 'fillet'], partial: ['partial', 'fillet'], fillet: ['fillet'] }
const CLAUSE: Record<Exclude<TestKind, 'complete'>, { clause: string; basis: 'memory' }> = { partial: { clause: 'Table 6.3', basis: 'memory' }, fillet: { clause: 'Table 6.4', basis: 'memory' } }
const clauseOf = (variables: WeldingVariables): { clause: string; basis: Basis } => {
  const kind = testKind(variables)
  if (kind !== 'complete') return CLAUSE[kind]
  const [clause, basis] = coversAll(variables)
  return { clause, basis }
}

export const weldKind: Rule = {
  meta: ownMeta('weld-kind', 'Groove or fillet test', 'Table 6.2', 'memory', 'Complete penetration: note c of the tubular table read in 2015; Tables 6.3 and 6.4 from memory', 'A complete-penetration groove test covers every groove and fillet; a partial-penetration test covers partial penetration and fillets; a fillet test covers fillets only.'),
  field: 'joint.weld',
  at: 'weld',
  label: 'Kind of weld',
  range(_context, side) {
    const kind = testKind(side.variables)
    return { range: setRange(COVERS[kind].map((one) => NAME[one])), tested: NAME[kind], reason: `A ${NAME[kind]} test covers ${list(COVERS[kind].map((one) => `${NAME[one]}s`))}.`, ...clauseOf(side.variables) }
  },
  check(context, sides, joined) {
    if (joined?.type !== 'set') return null
    const kind = testKind(context.procedure)
    const tests = sides.map((side) => testKind(side.variables))
    const known = sides.map((side) => clauseOf(side.variables))[0]
    if (joined.values.includes(NAME[kind])) return { verdict: 'within', sentence: `${names(sides)} ${verb(sides, 'covers', 'cover')} ${NAME[kind]}s.`, asked: [NAME[kind]], range: joined, ...known }
    const plan = kind === 'complete' ? 'A complete-penetration groove test.' : 'A groove test.'
    return { verdict: 'outside', sentence: `A ${NAME[kind]} is not covered: ${names(sides)} ${verb(sides, 'is', 'are')} of a ${list([...new Set(tests.map((test) => NAME[test]))])}.`, asked: [NAME[kind]], range: joined, ...known, fixes: [{ kind: 'plan-coupon', label: 'Weld a groove coupon', requirement: plan }] }
  },
}
