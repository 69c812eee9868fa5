/** QW-407.1: every condition of heat treatment after welding is a qualification of its own. */
import { containsInterval, between, closed } from '../../../ranges/numeric.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { figures, unitOf } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { names, show } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { pFamily, pNumbers } from '../members.ts'
import { meta } from '../meta.ts'

const WORDS: Record<string, string> = {
  none: 'no heat treatment',
  'below-lower-transformation': 'below the lower transformation temperature',
  'above-upper-transformation': 'above the upper transformation temperature',
  'above-upper-then-below-lower': 'above the upper, then below the lower transformation temperature',
  'between-transformations': 'between the transformation temperatures',
  'within-range': 'within a temperature range',
  'solution-anneal': 'solution anneal',
}

/** P-No. 1 to 6 and 9 to 15 have the five conditions by transformation temperature; null when no P-Number is known. */
function transforms(variables: WeldingVariables): boolean | null {
  const families = pNumbers(variables).map(pFamily)
  if (families.length === 0) return null
  return families.some((p) => (p >= 1 && p <= 6) || (p >= 9 && p <= 15))
}

/** A condition in the words of the other family can't be placed. */
const placed = (variables: WeldingVariables): string | null => {
  const { condition } = variables.pwht
  return condition === 'within-range' && transforms(variables) === true ? null : condition
}

const base = namedRule({
  meta: meta('QW-407.1', 'pwht-condition'),
  field: 'pwht.condition',
  at: 'weld',
  label: 'heat treatment condition',
  asked(context) {
    const value = placed(context.procedure)
    return value ? [value] : null
  },
  tested: (_context, side) => placed(side.variables),
  because: 'P-No. 1 to 6 and 9 to 15: none, below lower, above upper, above upper then below lower, and between the transformation temperatures; other metals: none, or within a specified range.',
  display: (name) => WORDS[name] ?? name,
  setValue: (name) => name,
  plan: (asked) => `A coupon heat treated as the procedure asks: ${asked.map((name) => WORDS[name] ?? name).join(', ')}.`,
})

export const pwhtCondition: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    const { condition, temperature } = context.procedure.pwht
    if (judged?.verdict === 'cannot-tell' && condition === 'within-range' && placed(context.procedure) === null) {
      return { ...judged, sentence: 'For these metals the condition must be given by the transformation temperatures, not as a range.' }
    }
    if (judged?.verdict !== 'within' || condition !== 'within-range') return judged
    const asked = figures(temperature, 'temperature', context.system)
    const unit = unitOf('temperature', context.system)
    for (const side of sides) {
      const had = figures(side.variables.pwht.temperature, 'temperature', context.system)
      if (asked.min === null || asked.max === null || (had.min ?? had.max) === null) return { ...judged, verdict: 'cannot-tell', sentence: "The heat treatment temperatures aren't recorded on both sides, so the specified range can't be compared.", missing: [...(asked.min === null || asked.max === null ? ['procedure: pwht.temperature'] : []), ...((had.min ?? had.max) === null ? [`${side.coupon.number}: pwht.temperature`] : [])], field: 'pwht.temperature' }
      const low = had.min ?? had.max ?? 0
      const high = had.max ?? had.min ?? 0
      if (containsInterval(between('temperature', unit, closed(asked.min), closed(asked.max)), { min: low, max: high }) !== 'within') {
        return { ...judged, verdict: 'outside', sentence: `${names([side])} was heat treated at ${show(low, unit)}, outside the ${show(asked.min, unit)} to ${show(asked.max, unit)} of the procedure.`, field: 'pwht.temperature', fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon with that heat treatment', requirement: `A coupon heat treated at ${show(asked.min, unit)} to ${show(asked.max, unit)}.` }] }
      }
    }
    return judged
  },
}
