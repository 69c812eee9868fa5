/** QW-407.1: every condition of heat treatment after welding is a qualification of its own. */
import { containsInterval, between, closed } from '../../../ranges/numeric.ts'
import type { WeldingVariables } from '../../../schemas/welding.ts'
import { figures, unitOf } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { lackWords } from '../../common/lacking.ts'
import { capital, names, show } from '../../common/wording.ts'
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

const RANGED: ReadonlySet<string> = new Set(['within-range', 'solution-anneal'])

/** Austenitic (P-No. 8) or duplex (P-No. 10H) metal throughout: a solution anneal is a treatment of its own there. */
const annealed = (variables: WeldingVariables): boolean => pNumbers(variables).every((p) => p === '8' || p === '10H')

/**
 * The condition in the words of the metal's own family; null when it can't be placed: a bare range or a solution anneal where the
 * transformation temperatures count, or a transformation temperature where a specified range counts. An anneal is within a range.
 */
function placed(variables: WeldingVariables): string | null {
  const { condition } = variables.pwht
  if (condition === null || condition === 'none') return condition
  const family = transforms(variables)
  if (family === null) return condition
  if (family === true) return RANGED.has(condition) ? (condition === 'solution-anneal' && annealed(variables) ? condition : null) : condition
  return RANGED.has(condition) ? 'within-range' : null
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
  // A range needs its temperatures too, so naming the condition alone is no cure.
  setValue: (name) => (RANGED.has(name) ? undefined : name),
  plan: (asked) => `A coupon heat treated as the procedure asks: ${asked.map((name) => WORDS[name] ?? name).join(', ')}.`,
})

export const pwhtCondition: Rule = {
  ...base,
  check(context, sides, joined) {
    const judged = base.check(context, sides, joined)
    if (!judged) return judged
    const { condition, temperature } = context.procedure.pwht
    const wrongFamily = [...(condition !== null && placed(context.procedure) === null ? ['procedure'] : []), ...sides.flatMap((side) => (side.variables.pwht.condition !== null && placed(side.variables) === null ? [side.coupon.number] : []))]
    if (judged.verdict === 'cannot-tell' && wrongFamily.length > 0) {
      const asRange = transforms(context.procedure) === false
      return { ...judged, sentence: asRange ? 'For these metals the condition must be given as a specified temperature range, not by transformation temperatures.' : 'For these metals the condition must be given by the transformation temperatures, not as a range.', missing: wrongFamily.map((record) => `${record}: pwht.condition`) }
    }
    if (judged.verdict !== 'within' || condition === null || !RANGED.has(condition)) return judged
    const asked = figures(temperature, 'temperature', context.system)
    const unit = unitOf('temperature', context.system)
    for (const side of sides) {
      const had = figures(side.variables.pwht.temperature, 'temperature', context.system)
      const low = had.min ?? had.max
      const high = had.max ?? had.min
      const missing = [...(asked.min === null || asked.max === null ? ['procedure: pwht.temperature'] : []), ...(low === null ? [`${side.coupon.number}: pwht.temperature`] : [])]
      if (asked.min === null || asked.max === null || low === null || high === null) return { ...judged, verdict: 'cannot-tell', sentence: `${capital(lackWords(missing))}, so the specified range can't be compared.`, missing, field: 'pwht.temperature' }
      if (containsInterval(between('temperature', unit, closed(asked.min), closed(asked.max)), { min: low, max: high }) !== 'within') {
        return { ...judged, verdict: 'outside', sentence: `${names([side])} was heat treated at ${show(low, unit)}${high === low ? '' : ` to ${show(high, unit)}`}, outside the ${show(asked.min, unit)} to ${show(asked.max, unit)} of the procedure.`, field: 'pwht.temperature', fixes: [{ kind: 'plan-coupon', label: 'Weld a coupon with that heat treatment', requirement: `A coupon heat treated at ${show(asked.min, unit)} to ${show(asked.max, unit)}.` }] }
      }
    }
    return judged
  },
}
