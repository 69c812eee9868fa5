/** M-Numbers of the base metals. */
import type { Basis } from '../../../schemas/assessment.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { namedRule, weakest } from '../../common/rule-kinds.ts'
import type { Rule } from '../../rule.ts'
import { metals, mNumber, readAlloy } from '../alloys.ts'
import { meta, TABLE } from '../meta.ts'

/** One name for the pair whichever way round; the alloy itself where it has no M-Number. */
function pair(variables: WeldingVariables): string | null {
  const told = metals(variables).map((metal) => { const m = mNumber(metal)?.m; const alloy = readAlloy(metal)?.alloy; return m ? `M-${m}` : (alloy ?? null) })
  return told.some((one) => one === null) ? null : told.sort().join(' to ')
}
const pairBasis = (variables: WeldingVariables): Basis => metals(variables).map((metal) => mNumber(metal)?.basis ?? 'memory').reduce(weakest)

const base = namedRule({
  meta: meta('m-number', 'M-Number', 'Table 3.1', 'secondary', `${TABLE}; M-Numbers of Table 3.2 from the same notes`, 'Another M-Number or pair of M-Numbers.'),
  field: 'baseMetals.a.d12MNumber',
  at: 'weld',
  label: 'M-Number',
  asked(context) {
    const value = pair(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => pair(side.variables),
  because: 'A test covers the M-Numbers that it joined.',
})

export const baseMetal: Rule = {
  ...base,
  range(context, side) {
    const range = base.range(context, side)
    return range && { ...range, basis: pairBasis(side.variables) }
  },
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    return judged && { ...judged, basis: sides.map((side) => pairBasis(side.variables)).reduce(weakest, pairBasis(context.procedure)) }
  },
}
