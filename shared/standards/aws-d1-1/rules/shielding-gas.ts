/** Rows 19 and 21: another gas, mixture, nominal percentage or no gas; and a gas that the A5 specification does not cover. */
import { gasName } from '../../common/reading.ts'
import { namedRule } from '../../common/rule-kinds.ts'
import { names } from '../../common/wording.ts'
import type { Rule } from '../../rule.ts'
import { meta } from '../meta.ts'

const build = (variable: 'shielding_gas' | 'gas_in_filler_spec'): Rule =>
  namedRule({
    meta: meta(variable),
    field: 'shieldingGas',
    at: 'block',
    label: 'shielding gas',
    asked(context) {
      const name = context.block && gasName(context.block.shieldingGas)
      return name ? [name] : null
    },
    tested: (_context, side) => (side.block ? gasName(side.block.shieldingGas) : null),
    because: 'The nominal composition must be that of the test.',
    display: (name) => (name === 'none' ? 'no gas' : name),
  })

export const shieldingGas = build('shielding_gas')

const listed = build('gas_in_filler_spec')

/** The same gas is no change; for another the gases of each A5 specification would have to be known. */
export const gasInFillerSpec: Rule = {
  ...listed,
  check(context, sides, joined) {
    const judged = listed.check(context, sides, joined)
    if (judged?.verdict !== 'outside') return judged
    return { ...judged, verdict: 'cannot-tell', sentence: `The gas is not that of ${names(sides)}; whether the A5 specification of the filler covers it must be looked up there.`, missing: ['gases covered by the A5 specification of the filler'], fixes: [] }
  },
}
