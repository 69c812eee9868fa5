/** Variables that heat treatment above the upper transformation temperature, or a solution anneal, takes away (QW-403.6, 404.7, 406.3, 409.1, 410.9, 410.10). */
import { lackWords } from '../common/lacking.ts'
import type { Rule } from '../rule.ts'
import { exemptByHeatTreatment } from './ranges.ts'

/** The rule with "outside" softened to "cannot tell" where a coupon does not record the heat treatment that would lift the limit. */
export const unlessHeatTreated = (rule: Rule): Rule => ({
  ...rule,
  check(context, sides, joined) {
    const judged = rule.check(context, sides, joined)
    // Without toughness the exemption does not arise: the variable is nonessential, or none.
    if (judged?.verdict !== 'outside' || context.toughness === false) return judged
    const missing = sides.filter((side) => exemptByHeatTreatment(side.variables) === null).map((side) => `${side.coupon.number}: pwht.condition`)
    return missing.length === 0 ? judged : { ...judged, verdict: 'cannot-tell', sentence: `${judged.sentence} But ${lackWords(missing)}, and some treatments lift this limit.`, missing }
  },
})
