/** Row 21 (GMAW, FCAW): a gas that the A5 specification of the filler does not cover. */
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { gasRule } from '../gas-rule.ts'

const listed = gasRule('gas_in_filler_spec')

/** The same gas is no change; for another the gases of each A5 specification would have to be known. */
export const gasInFillerSpec: Rule = {
  ...listed,
  check(context, sides, joined) {
    const judged = listed.check(context, sides, joined)
    if (judged?.verdict !== 'outside') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `The gas is not that of ${names(sides)}; whether the A5 specification of the filler covers it must be looked up there.`, missing: ['gases covered by the A5 specification of the filler'], fixes: [] }
  },
}
